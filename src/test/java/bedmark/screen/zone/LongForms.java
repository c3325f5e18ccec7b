package bedmark.screen.zone;

import bedmark.form.Count;
import bedmark.form.Field;
import bedmark.form.FieldForm;
import bedmark.form.Group;
import bedmark.form.Head;
import bedmark.form.NumberField;
import bedmark.form.Range;
import bedmark.form.Section;
import bedmark.form.Texts;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Forms with as many fields as one likes, all of them shown. */
public final class LongForms {
    private static final int OF_A_SECTION = 10;

    private LongForms() {
    }

    public static FieldForm of(int fields) {
        List<Section> sections = new ArrayList<>();
        for (int from = 0; from < fields; from += OF_A_SECTION) {
            List<Field> some = new ArrayList<>();
            for (int i = from; i < Math.min(fields, from + OF_A_SECTION); i++) {
                some.add(new NumberField(Head.of("field" + i, Group.OBSERVATIONS, Texts.of("Field " + i, "Campo " + i)),
                        new Count(Range.open(), Range.of(BigDecimal.ZERO, BigDecimal.TEN), BigDecimal.ONE)));
            }
            sections.add(new Section("section" + from, Texts.of("Section " + from, "Parte " + from),
                    Optional.empty(), some));
        }
        return new FieldForm("form-" + fields, 1, Texts.of("Long", "Largo"), sections);
    }
}
