package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.uncertainty.Instrument;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import java.util.stream.Stream;

/**
 * Finds every fault of a file of reference data: first those against its schema, and where there are none those that no
 * schema tells.
 */
final class ReferenceCheck {
    private static final Map<ReferenceFile, SchemaCheck> SCHEMAS = new EnumMap<>(ReferenceFile.class);

    static {
        for (ReferenceFile file : ReferenceFile.values()) {
            SCHEMAS.put(file, new SchemaCheck(file.schemaName()));
        }
    }

    private final Branch root;
    private final List<Defect> found = new ArrayList<>();

    private ReferenceCheck(Branch root) {
        this.root = root;
    }

    /** The faults of a file in the order in which they stand in its text. */
    static List<Defect> check(ReferenceFile file, Document document) {
        List<Defect> againstSchema = SCHEMAS.get(file).check(document);
        if (!againstSchema.isEmpty()) {
            return againstSchema;
        }
        ReferenceCheck check = new ReferenceCheck(document.root());
        switch (file) {
            case MATERIALS -> check.materials();
            case LIMITS -> check.limits();
            case SEAL_RATES -> check.once("multipliers", row -> word(row, "type") + " " + word(row, "condition"));
            case SPEED_CLASSES -> check.speeds();
            case INSTRUMENTS -> check.instruments();
        }
        return check.found.stream().sorted(document.inTextOrder()).toList();
    }

    private void materials() {
        for (String list : List.of("factors", "properties", "leftOut")) {
            once(list, row -> word(row, "id"));
        }
        each("properties", (place, row) -> {
            range(place, row, "bulkDensity");
            range(place, row, "angleOfRepose");
        });
        once("surcharges", row -> row.quantity("fromRepose").orElseThrow().value().stripTrailingZeros()
                .toPlainString());
        each("surcharges", (place, row) -> Stream.of("fromRepose", "surchargeAngle").forEach(key ->
                angle(place.child(key), row.quantity(key).orElseThrow())));
    }

    private void range(Pointer place, Branch row, String key) {
        row.branch(key).ifPresent(range -> {
            Quantity from = range.quantity("from").orElseThrow();
            Quantity to = range.quantity("to").orElseThrow();
            if (Quantity.BY_SIZE.compare(from, to) > 0) {
                found.add(Defect.at(place.child(key), "range-reversed", from.value().toPlainString(),
                        to.value().toPlainString()));
            }
            if (from.unit().dimension() == Dimension.ANGLE) {
                angle(place.child(key).child("to"), to);
            }
        });
    }

    private void angle(Pointer place, Quantity angle) {
        if (angle.si() > Math.toRadians(89)) {
            found.add(Defect.at(place.child("value"), "number-too-large", angle.value().toPlainString(), "89°"));
        }
    }

    private void limits() {
        once("rules", row -> word(row, "rule"));
        once("friction", row -> word(row, "of"));
        root.branch("certainty").ifPresent(row -> {
            if (number(row, "undecided").compareTo(number(row, "overloaded")) > 0) {
                found.add(Defect.at(Pointer.of("certainty", "undecided"), "number-too-large",
                        number(row, "undecided").toPlainString(), number(row, "overloaded").toPlainString()));
            }
        });
        each("friction", (place, row) -> {
            Optional<BigDecimal> from = row.number("from");
            Optional<BigDecimal> to = row.number("to");
            if (from.isPresent() && to.isPresent() && from.get().compareTo(to.get()) > 0) {
                found.add(Defect.at(place.child("to"), "range-reversed", from.get().toPlainString(),
                        to.get().toPlainString()));
            }
        });
    }

    private void speeds() {
        once("classes", row -> word(row, "speedClass"));
        once("speeds", row -> word(row, "speedClass") + " "
                + width(row).map(width -> Double.toString(width.si())).orElse(""));
        Set<String> classes = new HashSet<>();
        each("speeds", (place, row) -> {
            classes.add(word(row, "speedClass"));
            if (row.has("fromWidth") == row.has("aboveWidth")) {
                found.add(Defect.at(place, "speed-row-width"));
            }
        });
        Stream.of(SpeedClass.values()).map(SpeedClass::code).filter(code -> !classes.contains(code)).forEach(code ->
                found.add(Defect.at(Pointer.of("speeds"), "speed-table-incomplete", code)));
    }

    /** The width at which a row begins. */
    static Optional<Quantity> width(Branch row) {
        return row.quantity("fromWidth").or(() -> row.quantity("aboveWidth"));
    }

    private void instruments() {
        once("instruments", row -> word(row, "kind"));
        each("instruments", (place, row) -> {
            Instrument kind = Instrument.ofCode(word(row, "kind")).orElseThrow();
            String wanted = kind.relative() ? "relative" : "standardUncertainty";
            if (!row.has(wanted)) {
                found.add(Defect.at(place, "key-absent", wanted));
            } else if (!kind.relative()) {
                Dimension dimension = kind.angle() ? Dimension.ANGLE : Dimension.LENGTH;
                Quantity spread = row.quantity(wanted).orElseThrow();
                if (spread.unit().dimension() != dimension) {
                    found.add(Defect.at(place.child(wanted).child("unit"), "unit-of-wrong-kind",
                            spread.unit().code()));
                }
            }
        });
    }

    /** Something to do with a row and its place. */
    private interface Visit {
        void row(Pointer place, Branch row);
    }

    private void each(String list, Visit visit) {
        List<Branch> rows = root.branches(list);
        for (int i = 0; i < rows.size(); i++) {
            visit.row(Pointer.of(list).child(i), rows.get(i));
        }
    }

    private void once(String list, Function<Branch, String> key) {
        Set<String> seen = new HashSet<>();
        each(list, (place, row) -> {
            if (!seen.add(key.apply(row))) {
                found.add(Defect.at(place, "reference-row-twice", key.apply(row)));
            }
        });
    }

    private static String word(Branch row, String key) {
        return row.text(key).orElseThrow();
    }

    private static BigDecimal number(Branch row, String key) {
        return row.number(key).orElseThrow();
    }
}
