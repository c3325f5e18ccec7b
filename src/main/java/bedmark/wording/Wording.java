package bedmark.wording;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.engine.Assumption;
import bedmark.form.Field;
import bedmark.form.FieldForm;
import bedmark.form.Judgement;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import bedmark.quantity.QuantityFormat;
import bedmark.quantity.TypedNumber;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.words.Words;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.time.format.DateTimeFormatter;
import java.util.Map;
import java.util.Optional;

/**
 * How one person is told things.
 *
 * @param words the language, and with it the number format
 * @param units the unit system of results
 * @param liked for a unit of that system the one of the same dimension that the person likes better
 */
public record Wording(Words words, UnitSystem units, Map<Unit, Unit> liked) {
    public Wording {
        liked = Map.copyOf(liked);
    }

    /** The units of a system as they are. */
    public Wording(Words words, UnitSystem units) {
        this(words, units, Map.of());
    }

    /** The unit that the person likes better than a usual one; that one itself where there is none. */
    public Unit liked(Unit usual) {
        return liked.getOrDefault(usual, usual);
    }

    /** The unit in which results of a dimension are shown. */
    public Unit unit(Dimension dimension) {
        return liked(units.unit(dimension));
    }

    /** The unit in which depths, gaps and widths are shown. */
    public Unit smallLength() {
        return liked(units.smallLength());
    }

    /** The text of a key (see {@link Words#text}). */
    public String text(String key, Object... arguments) {
        return words.text(key, arguments);
    }

    public QuantityFormat format() {
        return new QuantityFormat(words.locale());
    }

    /** The symbol of a unit. */
    public String symbol(Unit unit) {
        return text("unit." + unit.key());
    }

    /** A day of the calendar, with its month in letters: figures alone are read one way here and another there. */
    public String day(LocalDate day) {
        return DateTimeFormatter.ofPattern("d MMM uuuu", words.locale()).format(day);
    }

    /** A day and the time of day there. */
    public String moment(OffsetDateTime at) {
        return day(at.toLocalDate()) + ", " + DateTimeFormatter.ofPattern("HH:mm").format(at);
    }

    /** A computed number in a unit, with its symbol. */
    public String computed(double si, Unit unit) {
        return QuantityFormat.with(format().computed(si, unit), unit, symbol(unit));
    }

    /** A quantity as it was entered, with its unit's symbol. */
    public String entered(Quantity quantity) {
        return QuantityFormat.with(format().entered(quantity), quantity.unit(), symbol(quantity.unit()));
    }

    /** A share as a whole percentage; a small one is not rounded to nothing. */
    public String percent(double share) {
        return percent(share > 0 && share < 0.01 ? "< 1" : format().computed(share * 100, 0));
    }

    /** A probability as a whole percentage: what was measured is never certain, however far the tail reaches. */
    public String probability(double probability) {
        return probability > 0.99 ? percent("> 99") : probability < 0.01 ? percent("< 1") : percent(probability);
    }

    private String percent(String number) {
        return QuantityFormat.with(number, Unit.PERCENT, symbol(Unit.PERCENT));
    }

    /**
     * A defect in one sentence; a detail that is a code of its own is put in words ({@code code.detail}), and so is the
     * system's kind of failure where that is all that is known ({@code reason.detail}). A newer program may have
     * written one down that this one has no words for.
     */
    public String sentence(Defect defect) {
        if (!words.has("defect." + defect.code())) {
            return sentence(Defect.in(defect.where(), "unworded", defect.code()));
        }
        Object[] arguments = new Object[defect.details().size() + 1];
        arguments[0] = defect.where().isEmpty() ? "/" : defect.where();
        for (int i = 0; i < defect.details().size(); i++) {
            arguments[i + 1] = defect.details().get(i);
        }
        for (int i = 1; i < arguments.length; i++) {
            String own = "defect." + defect.code() + "." + arguments[i];
            String key = words.has(own) ? own : "defect.reason." + arguments[i];
            arguments[i] = words.has(key) ? text(key, arguments) : arguments[i];
        }
        return plain(text("defect." + defect.code(), arguments));
    }

    /** One line: what an input brought along may hold line ends, and what commands a terminal or turns its text. */
    public static String plain(String text) {
        return text.replaceAll("\\R|[\\p{Cntrl}\\u202A-\\u202E\\u2066-\\u2069]", " ");
    }

    /** A judgement in one sentence. */
    public String sentence(Judgement judgement, Field field) {
        Object[] arguments = new Object[judgement.details().size() + 1];
        arguments[0] = field.head().label().in(words.language());
        for (int i = 0; i < judgement.details().size(); i++) {
            arguments[i + 1] = shown(judgement.details().get(i));
        }
        return text("judgement." + judgement.code(), arguments);
    }

    /** Why a typing is no number. */
    public String sentence(TypedNumber.Reason reason) {
        return text("entry." + reason.code());
    }

    /** A detail of a judgement for people. */
    private String shown(Node node) {
        if (node instanceof Node.Text text) {
            return text.value();
        } else if (node instanceof Node.Decimal decimal) {
            return format().exact(decimal.value());
        } else if (node instanceof Branch branch) {
            try {
                return entered(branch.asQuantity());
            } catch (Refused e) {
                return branch.members().keySet().toString();
            }
        }
        return String.valueOf(node);
    }

    /** Something that was taken for granted, in one sentence. */
    public String assumption(Assumption assumption, FieldForm form) {
        Object[] arguments = assumption.arguments().stream()
                .map(argument -> argument.startsWith("/") ? reading(argument, form) : spoken(argument)).toArray();
        return text("assumption." + assumption.code(), arguments);
    }

    /** A label as it stands within a sentence: a capital at its start is no name, unless more of them follow. */
    private String inSentence(String label) {
        boolean plain = label.length() > 1 && Character.isUpperCase(label.charAt(0))
                && Character.isLowerCase(label.charAt(1));
        return plain ? label.substring(0, 1).toLowerCase(words.locale()) + label.substring(1) : label;
    }

    /** An argument of the engine for people: a number in the locale's form, a code in words. */
    private String spoken(String argument) {
        try {
            return format().computed(Double.parseDouble(argument), argument.matches("[0-9]+") ? 0 : 3);
        } catch (NumberFormatException e) {
            String key = "assumption.word." + argument;
            return words.has(key) ? text(key) : argument;
        }
    }

    /**
     * What people call what is asked for: the whole table where a reading stands in one.
     *
     * @param name a JSON Pointer as the engine names its readings
     */
    public String asked(String name, FieldForm form) {
        return form.fieldAt(Pointer.parse(name)).map(field -> inSentence(field.head().label().in(words.language())))
                .orElseGet(() -> reading(name, form));
    }

    /**
     * What people call a reading or a registered number.
     *
     * @param name a JSON Pointer as the engine names its readings
     */
    public String reading(String name, FieldForm form) {
        Pointer place = Pointer.parse(name);
        Optional<String> line = place.tokens().stream().filter(token -> Pointer.index(token) >= 0).findFirst()
                .map(index -> format().computed(Double.parseDouble(index) + 1, 0));
        String label = form.fieldAt(place).map(field -> inSentence(field.head().label().in(words.language())))
                .orElseGet(() -> {
                    String key = "register." + place.last();
                    return words.has(key) ? text(key) : name;
                });
        return line.map(number -> text("register.line", label, number)).orElse(label);
    }
}
