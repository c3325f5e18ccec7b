package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.quantity.UnitSystem;
import bedmark.words.Words;
import java.nio.file.Path;
import java.time.Clock;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import javafx.scene.Node;
import javafx.scene.Parent;
import javafx.scene.control.Labeled;
import javafx.scene.control.ScrollPane;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.junit.jupiter.api.io.TempDir;

/** The working of a transfer point on the screen: reached from its rules, whole, in the person's language and units. */
class WorkingPaneTest {
    private static final String SHOTS = System.getProperty("bedmark.shots");

    @TempDir
    private Path temp;

    private TabletApp app;

    @Test
    void theWorkingIsShownFromTheRulesAndLeadsBackToThem() throws Exception {
        try (TabletApp opened = open(1280, 800)) {
            app = opened;
            app.click("every-rule");
            app.click("show-working");
            assertFalse(app.has("show-working"));
            assertEquals(List.of(), cut());
            List<String> texts = texts();
            assertTrue(texts.stream().anyMatch(text -> text.matches(
                    "F = Fm \\+ Fs = .* = [0-9.\\u00a0\\u202f ]+N ± .*\\(.*lbf\\)")), texts::toString);
            assertTrue(texts.contains("FINDINGS (in brackets how likely it lies beyond the limit, from 1 % up)"),
                    texts::toString);
            assertTrue(texts.stream().noneMatch(text -> text.contains("{0}") || text.contains("/readings/")));
            Glass.on(() -> {
                ScrollPane sheet = (ScrollPane) app.node("working-sheet");
                double all = sheet.getContent().getBoundsInLocal().getHeight();
                assertTrue(all > sheet.getViewportBounds().getHeight(), "there is more than a screen of it");
                assertTrue(sheet.getContent().getBoundsInLocal().getWidth()
                        <= sheet.getViewportBounds().getWidth() + 1, "no formula reaches beyond the pane");
                return null;
            });
            app.click("working-close");
            assertTrue(app.has("show-working"));
            app.click("rules-close");
            assertTrue(app.has("zone-picture"));
        }
    }

    @Test
    void itSpeaksThePersonsLanguageAndUnits() throws Exception {
        try (TabletApp opened = open(800, 1280)) {
            app = opened;
            prefer(Locale.forLanguageTag("es"), UnitSystem.US, true);
            app.click("every-rule");
            app.click("show-working");
            assertEquals(List.of(), cut());
            List<String> texts = texts();
            assertTrue(texts.stream().anyMatch(text -> text.contains("22620,59479·Cs·J2")), texts::toString);
            assertTrue(texts.stream().anyMatch(text -> text.matches("F = Fm \\+ Fs = .*lbf ± [0-9.,\\u00a0\\u202f ]+\\)")),
                    texts::toString);
        }
    }

    /** Pictures of every look, to be looked at: {@code -Dbedmark.shots=DIR}. */
    @Test
    @EnabledIfSystemProperty(named = "bedmark.shots", matches = ".+")
    void noLineIsCutInAnyLook() throws Exception {
        for (boolean wide : new boolean[] {true, false}) {
            try (TabletApp opened = open(wide ? 1280 : 800, wide ? 800 : 1280)) {
                app = opened;
                for (Locale language : Words.LANGUAGES) {
                    for (boolean night : new boolean[] {false, true}) {
                        prefer(language, night ? UnitSystem.US : UnitSystem.METRIC, night);
                        app.click("every-rule");
                        app.click("show-working");
                        assertEquals(List.of(), cut());
                        shoot(wide + "-" + language + "-" + night);
                    }
                }
            }
        }
    }

    private TabletApp open(double width, double height) throws Exception {
        TabletApp opened = new TabletApp(temp.resolve("store-" + width), Optional.of(Path.of("sample-surveys")), temp,
                Clock.systemUTC(), width, height);
        app = opened;
        app.setOutOnDemo();
        app.click("stop-TP-08");
        app.until(() -> app.has("verdict"));
        return opened;
    }

    private void prefer(Locale language, UnitSystem units, boolean night) throws Exception {
        Glass.on(() -> {
            app.workplace().preferencesProperty().set(app.workplace().preferences().withLocale(language)
                    .withUnits(units).withNight(night));
            return null;
        });
        app.settle();
    }

    private List<String> texts() throws Exception {
        return Glass.on(() -> labels(app.node("working-sheet")).stream().map(Labeled::getText).toList());
    }

    /** The labels that do not show all of their text. */
    private List<String> cut() throws Exception {
        return Glass.on(() -> labels(app.node("working-sheet")).stream()
                .filter(label -> label.getHeight() + 1 < label.prefHeight(label.getWidth()))
                .map(Labeled::getText).toList());
    }

    private static List<Labeled> labels(Node node) {
        List<Labeled> found = new ArrayList<>();
        if (node instanceof Labeled label) {
            found.add(label);
        } else if (node instanceof ScrollPane scroll) {
            found.addAll(labels(scroll.getContent()));
        } else if (node instanceof Parent parent) {
            parent.getChildrenUnmodifiable().forEach(child -> found.addAll(labels(child)));
        }
        return found;
    }

    private void shoot(String name) throws Exception {
        app.picture(Path.of(SHOTS, name + "-0.png"));
        for (double part : new double[] {0.45, 1}) {
            Glass.on(() -> {
                ((ScrollPane) app.node("working-sheet")).setVvalue(part);
                return null;
            });
            app.picture(Path.of(SHOTS, name + "-" + part + ".png"));
        }
    }
}
