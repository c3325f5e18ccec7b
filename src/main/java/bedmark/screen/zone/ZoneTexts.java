package bedmark.screen.zone;

import bedmark.form.Texts;

/** The words of table cells that the program itself lays out. */
final class ZoneTexts {
    static final Texts POSITION = Texts.of("From the start", "Desde el inicio");
    static final Texts DEPTH = Texts.of("Depth", "Profundidad");
    static final Texts SIDE = Texts.of("Side", "Lado");
    static final Texts TYPE = Texts.of("Type", "Tipo");
    static final Texts CONDITION = Texts.of("Condition", "Estado");
    static final Texts LENGTH = Texts.of("Length", "Longitud");

    private ZoneTexts() {
    }
}
