package bedmark.office.register;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.verdict.Rule;
import bedmark.engine.verdict.Sense;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/** What no single cell tells of a register; what stood there before and is not touched is nobody's fault now. */
final class RegisterProof {
    private static final List<String> NAMED = List.of("conveyors", "transfers");
    private static final List<String> NAMES = List.of("tag", "assetId");

    /** Under which key a loading zone names a row of another list. */
    private static final Map<String, String> REFERENCES = Map.of("areas", "area", "materials", "material",
            "conveyors", "conveyor");

    /** What names a row where a factor does; factors have no id. */
    private static final String FACTORS = "siteFactors";

    private final Map<String, Map<String, Branch>> before;
    private final Map<String, Map<String, Branch>> now;
    private final List<Branch> factors;

    /**
     * A proof of a change.
     *
     * @param now     the lists as they become, by name and id; may still change between the questions
     * @param factors the factors that the site fitted, which no list shows
     */
    RegisterProof(Map<String, Map<String, Branch>> before, Map<String, Map<String, Branch>> now,
                  List<Branch> factors) {
        this.before = before;
        this.now = now;
        this.factors = List.copyOf(factors);
    }

    /** What is wrong with one row that says something new. */
    List<Defect> row(String list, Branch row, String where) {
        List<Defect> defects = new ArrayList<>();
        if (list.equals("conveyors")) {
            lessThan(row.quantity("centreRollLength"), row.quantity("beltWidth"), where, "row-roll-over-belt", defects);
        } else if (list.equals("transfers")) {
            lessThan(row.quantity("skirtSpacing"), belt(now, row), where, "row-boards-over-belt", defects);
        } else if (list.equals(Column.LIMITS)) {
            limits(row, where, defects);
        } else if (list.equals(Column.PLANT)) {
            PlantSheet.proof(row, where).ifPresent(defects::add);
        } else if (list.equals(Column.INSTRUMENTS)) {
            instrument(row, where).ifPresent(defects::add);
        }
        return defects;
    }

    /** Whether something of the register still names a row that is to go. */
    Optional<Defect> used(String list, String id, String where) {
        Stream<Branch> users = list.equals("transfers")
                ? now.get(Column.ROUNDS).values().stream().filter(round -> round.branches("points").stream()
                        .anyMatch(point -> names(point, "transfer", id)))
                : now.get("transfers").values().stream().filter(row -> REFERENCES.containsKey(list)
                        && names(row, REFERENCES.get(list), id));
        return users.findFirst().map(row -> row.text("id").orElse(""))
                .or(() -> factors.stream().anyMatch(row -> REFERENCES.containsKey(list)
                        && fitted(row, REFERENCES.get(list), id)) ? Optional.of(FACTORS) : Optional.empty())
                .map(user -> Defect.in(where, "row-still-used", user));
    }

    /** A factor holds for what it names, and each pair of readings behind it may name the drive that it was read at. */
    private static boolean fitted(Branch factor, String key, String id) {
        return names(factor, key, id) || factor.branches("pairs").stream().anyMatch(pair -> names(pair, key, id));
    }

    private static boolean names(Branch row, String key, String id) {
        return row.text(key).equals(Optional.of(id));
    }

    /** Lengths and angles have an uncertainty in their unit, everything else one as a share of the value. */
    private static Optional<Defect> instrument(Branch row, String where) {
        Instrument kind = row.text("kind").flatMap(Instrument::ofCode).orElseThrow();
        if (kind.relative()) {
            return row.has("relative") && !row.has("standardUncertainty") ? Optional.empty()
                    : Optional.of(Defect.in(where, "row-uncertainty-share", kind.code()));
        }
        Dimension wanted = kind.angle() ? Dimension.ANGLE : Dimension.LENGTH;
        boolean fits = row.quantity("standardUncertainty").filter(one -> one.unit().dimension() == wanted).isPresent();
        return fits && !row.has("relative") ? Optional.empty() : Optional.of(Defect.in(where,
                kind.angle() ? "row-uncertainty-angle" : "row-uncertainty-length", kind.code()));
    }

    /**
     * What is wrong between the rows once all of them are known.
     *
     * @param places where the rows stand that were taken in, by list and id
     */
    List<Defect> whole(Map<String, Map<String, String>> places) {
        List<Defect> defects = new ArrayList<>();
        now.get("transfers").forEach((id, row) -> {
            String conveyor = row.text("conveyor").orElse("");
            String where = places.get("conveyors").get(conveyor);
            if (where != null && row.equals(before.get("transfers").get(id))
                    && !belt(before, row).equals(belt(now, row))) {
                lessThan(row.quantity("skirtSpacing"), belt(now, row), where + " beltWidth",
                        "row-boards-over-belt", defects);
            }
        });
        for (String list : NAMED) {
            NAMES.forEach(key -> once(list, key, places.get(list), defects));
        }
        return defects;
    }

    private static Optional<Quantity> belt(Map<String, Map<String, Branch>> lists, Branch transfer) {
        return Optional.ofNullable(lists.get("conveyors").get(transfer.text("conveyor").orElse("")))
                .flatMap(conveyor -> conveyor.quantity("beltWidth"));
    }

    private void once(String list, String key, Map<String, String> places, List<Defect> defects) {
        Map<String, String> first = new HashMap<>();
        now.get(list).forEach((id, row) -> row.text(key).ifPresent(name -> {
            String other = first.putIfAbsent(name, id);
            if (other != null && fresh(list, id, key, name)) {
                defects.add(Defect.in(places.get(id), "row-name-twice", key, name, other));
            } else if (other != null && fresh(list, other, key, name)) {
                defects.add(Defect.in(places.get(other), "row-name-twice", key, name, id));
            }
        }));
    }

    private boolean fresh(String list, String id, String key, String name) {
        return !before.get(list).getOrDefault(id, Branch.EMPTY).text(key).equals(Optional.of(name));
    }

    private static void lessThan(Optional<Quantity> small, Optional<Quantity> large, String where, String code,
                                 List<Defect> defects) {
        if (small.isPresent() && large.isPresent() && Quantity.BY_SIZE.compare(small.get(), large.get()) >= 0) {
            defects.add(Defect.in(where, code, show(small.get()), show(large.get())));
        }
    }

    private static String show(Quantity quantity) {
        return quantity.value().toPlainString() + " " + quantity.unit().code();
    }

    /** Near comes before overloaded on the way out of the limits, which is downwards for some rules. */
    private static void limits(Branch row, String where, List<Defect> defects) {
        Optional<BigDecimal> near = row.number("near");
        Optional<BigDecimal> over = row.number("overloaded");
        boolean under = row.text("rule").flatMap(Rule::ofCode).filter(rule -> rule.sense() == Sense.UNDER).isPresent();
        if (near.isPresent() && over.isPresent() && near.get().compareTo(over.get()) * (under ? -1 : 1) > 0) {
            defects.add(Defect.in(where, "row-limits-crossed", near.get().toPlainString(),
                    over.get().toPlainString()));
        }
    }
}
