package bedmark.survey;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.quantity.Quantity;
import java.math.BigDecimal;
import java.time.DateTimeException;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;

/**
 * Something that is to be done at a zone: a typed view over one of a survey's {@code actions}, which keeps every key
 * that this version does not know.
 */
public record PlannedAction(Branch document) {
    /** The key of the actions in a survey. */
    public static final String KEY = "actions";

    /** An action about which nothing is said yet. */
    public static final PlannedAction NONE = new PlannedAction(Branch.EMPTY);

    /**
     * The seal to order.
     *
     * @param type   its code; nothing where it is left open
     * @param length of one piece
     */
    public record SealOrder(Optional<String> type, Optional<Quantity> width, Optional<Quantity> thickness,
                            Optional<Quantity> length, OptionalInt pieces) {
        /** Nothing to order. */
        public static final SealOrder NONE = new SealOrder(Optional.empty(), Optional.empty(), Optional.empty(),
                Optional.empty(), OptionalInt.empty());

        Branch document() {
            Branch[] made = {Branch.EMPTY};
            type.ifPresent(code -> made[0] = made[0].with("type", code));
            width.ifPresent(size -> made[0] = made[0].with("width", size));
            thickness.ifPresent(size -> made[0] = made[0].with("thickness", size));
            length.ifPresent(size -> made[0] = made[0].with("length", size));
            pieces.ifPresent(count -> made[0] = made[0].with("pieces", Node.number(count)));
            return made[0];
        }
    }

    /** The actions of a survey, or of whatever else names some, in their order. */
    public static List<PlannedAction> of(Branch holder, String key) {
        return holder.series(key).stream().filter(Branch.class::isInstance)
                .map(node -> new PlannedAction((Branch) node)).toList();
    }

    /** The actions as a survey holds them. */
    public static Node series(List<PlannedAction> actions) {
        List<Node> items = new ArrayList<>();
        actions.forEach(action -> items.add(action.document));
        return new Node.Series(items);
    }

    public String what() {
        return words("what");
    }

    public String who() {
        return words("who");
    }

    public String workOrder() {
        return words("workOrder");
    }

    public String assetId() {
        return words("assetId");
    }

    /** The day by which; nothing where none is named, or in words that are no day. */
    public Optional<LocalDate> by() {
        try {
            return Optional.of(words("by")).filter(text -> !text.isEmpty()).map(LocalDate::parse);
        } catch (DateTimeException e) {
            return Optional.empty();
        }
    }

    /** Whether it was found done. */
    public boolean done() {
        return document.get("done").equals(Optional.of(Node.flag(true)));
    }

    public Optional<SealOrder> seal() {
        return document.get("seal").filter(Branch.class::isInstance).map(node -> {
            Branch seal = (Branch) node;
            return new SealOrder(Optional.of(text(seal, "type")).filter(code -> !code.isEmpty()), size(seal, "width"),
                    size(seal, "thickness"), size(seal, "length"), seal.get("pieces").stream()
                    .filter(Node.Decimal.class::isInstance).map(count -> ((Node.Decimal) count).value())
                    .filter(count -> count.signum() > 0 && count.compareTo(BigDecimal.valueOf(10_000)) < 0)
                    .mapToInt(BigDecimal::intValue).findFirst());
        });
    }

    private static Optional<Quantity> size(Branch seal, String key) {
        try {
            return seal.quantity(key);
        } catch (Refused e) {
            return Optional.empty();
        }
    }

    private String words(String key) {
        return text(document, key);
    }

    private static String text(Branch branch, String key) {
        return branch.get(key).filter(Node.Text.class::isInstance).map(node -> ((Node.Text) node).value().strip())
                .orElse("");
    }

    /** The same action with a text; an empty one takes the key away. */
    public PlannedAction with(String key, String text) {
        return new PlannedAction(text.isBlank() ? document.without(key) : document.with(key, text.strip()));
    }

    public PlannedAction withBy(Optional<LocalDate> day) {
        return with("by", day.map(LocalDate::toString).orElse(""));
    }

    /** The same action, found done. */
    public PlannedAction asDone() {
        return new PlannedAction(document.with("done", Node.flag(true)));
    }

    public PlannedAction withSeal(SealOrder seal) {
        Branch written = seal.document();
        return new PlannedAction(written.members().isEmpty() ? document.without("seal")
                : document.with("seal", written));
    }

    /**
     * Whether both speak of the same thing to do: by the work order's number where one of them has one, else by what
     * is to be done.
     */
    public boolean sameAs(PlannedAction other) {
        return workOrder().isEmpty() && other.workOrder().isEmpty() ? what().equalsIgnoreCase(other.what())
                : workOrder().equalsIgnoreCase(other.workOrder());
    }
}
