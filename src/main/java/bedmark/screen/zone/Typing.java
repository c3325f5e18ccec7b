package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.form.StationsField;
import bedmark.quantity.BeltState;
import bedmark.quantity.NumberEntry;
import bedmark.quantity.Quality;
import bedmark.quantity.Quantity;
import bedmark.quantity.QuantityFormat;
import bedmark.quantity.TypedNumber;
import bedmark.quantity.Unit;
import java.math.BigDecimal;
import java.math.MathContext;
import java.time.Clock;
import java.time.OffsetDateTime;
import java.time.temporal.ChronoUnit;
import java.util.Locale;
import java.util.Optional;

/**
 * What typing into a cell comes to, and what stands in a cell as the pad edits it.
 *
 * @param locale    whose decimal sign is typed
 * @param clock     the time that a reading carries
 * @param beltState what the belt does, as far as the person said so
 */
record Typing(Locale locale, Clock clock, Optional<BeltState> beltState) {
    private static final BigDecimal QUARTER = new BigDecimal("0.25");
    private static final BigDecimal QUARTERS = BigDecimal.valueOf(4);
    private static final MathContext CONVERTED = new MathContext(4);

    /**
     * An answer, or why there is none.
     *
     * @param answer   what is stored
     * @param rejected why the typing is no number
     */
    record Read(Optional<Node> answer, Optional<TypedNumber.Reason> rejected) {
        static final Read NOTHING = new Read(Optional.empty(), Optional.empty());
    }

    /**
     * Reads the typing of a cell.
     *
     * @param suspect whether the reading that stands in the cell is marked as suspect
     */
    Read read(ZoneModel.InHand inHand, String typed, boolean suspect) {
        Slot slot = inHand.slot();
        if (slot instanceof Slot.TextSlot) {
            return new Read(Optional.of(Node.text(typed)), Optional.empty());
        }
        NumberEntry entry = new NumberEntry(locale);
        TypedNumber number = inHand.unit().map(unit -> entry.read(typed, unit)).orElseGet(() -> entry.read(typed));
        if (number instanceof TypedNumber.Rejected rejected) {
            return new Read(Optional.empty(), Optional.of(rejected.reason()));
        }
        TypedNumber.Accepted accepted = (TypedNumber.Accepted) number;
        return new Read(Optional.of(inHand.unit()
                .<Node>map(unit -> Branch.write(reading(slot, accepted.in(unit), suspect)))
                .orElseGet(() -> Node.number(accepted.value()))), Optional.empty());
    }

    private Quantity reading(Slot slot, Quantity quantity, boolean suspect) {
        return slot instanceof Slot.MeasureSlot measured && measured.markable()
                ? stamped(quantity).withQuality(quality(slot, suspect)) : quantity;
    }

    /** A depth starts as estimated unless the belt is isolated; other readings as measured; a suspicion stays. */
    private Quality quality(Slot slot, boolean suspect) {
        if (suspect) {
            return Quality.SUSPECT;
        }
        boolean isolated = beltState.filter(state -> !state.running()).isPresent();
        return isDepth(slot) && !isolated ? Quality.ESTIMATED : Quality.MEASURED;
    }

    /** The reading with its time and the belt's state. */
    Quantity stamped(Quantity quantity) {
        Quantity timed = quantity.readAt(OffsetDateTime.now(clock).truncatedTo(ChronoUnit.SECONDS));
        return beltState.map(timed::withBeltState).orElse(timed);
    }

    static boolean isDepth(Slot slot) {
        return slot.field() instanceof StationsField && slot.where().last().equals("depth");
    }

    /** What stands in a cell, without signs that the pad does not know; converted where another unit is typed now. */
    String editable(Optional<Node> answer, Optional<Unit> unit) {
        if (answer.isEmpty()) {
            return "";
        }
        Node node = answer.get();
        if (node instanceof Node.Decimal number) {
            return local(number.value());
        } else if (node instanceof Node.Text text) {
            return text.value();
        }
        return SlotWords.quantity(node).flatMap(read -> unit.map(wanted -> in(wanted, read))).orElse("");
    }

    private String in(Unit wanted, Quantity read) {
        return read.unit() == wanted ? read.entered().orElseGet(() -> local(read.value()))
                : local(wanted.convert(read.value(), read.unit()).round(CONVERTED).stripTrailingZeros());
    }

    private String local(BigDecimal number) {
        return number.toPlainString().replace('.', new QuantityFormat(locale).decimalSign());
    }

    /** The number one step further, never below zero; nothing where no number stands there. */
    Optional<String> stepped(ZoneModel.InHand inHand, String now, int direction) {
        BigDecimal step = inHand.slot() instanceof Slot.MeasureSlot measured
                ? measured.measure().step(inHand.unit().orElseThrow())
                : inHand.slot() instanceof Slot.CountSlot counted ? counted.count().step() : BigDecimal.ZERO;
        return new NumberEntry(locale).read(now.isEmpty() ? "0" : now) instanceof TypedNumber.Accepted accepted
                ? Optional.of(written(accepted.value().add(step.multiply(BigDecimal.valueOf(direction)))
                        .max(BigDecimal.ZERO), inHand.unit(), step)) : Optional.empty();
    }

    /** A stepped number as a person would type it: by quarters where inches go by quarters. */
    private String written(BigDecimal number, Optional<Unit> unit, BigDecimal step) {
        BigDecimal[] whole = number.divideAndRemainder(BigDecimal.ONE);
        BigDecimal quarters = whole[1].multiply(QUARTERS);
        if (!unit.equals(Optional.of(Unit.INCH)) || step.compareTo(QUARTER) != 0
                || quarters.stripTrailingZeros().scale() > 0) {
            return local(number);
        }
        String fraction = switch (quarters.intValueExact()) {
            case 1 -> "1/4";
            case 2 -> "1/2";
            case 3 -> "3/4";
            default -> "";
        };
        String inches = whole[0].signum() == 0 && !fraction.isEmpty() ? "" : whole[0].toBigInteger().toString();
        return (inches + " " + fraction).strip();
    }
}
