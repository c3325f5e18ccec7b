package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.form.Range;
import bedmark.json.FieldShape.Floor;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import java.math.BigDecimal;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;

/** Finds units of the wrong dimension and ranges that contradict themselves or each other. */
final class MeasureCheck {
    private final List<Defect> found;

    MeasureCheck(List<Defect> found) {
        this.found = found;
    }

    /** Checks a measure. */
    void measure(Branch measure, Pointer where, FieldShape.Wanted wanted) {
        Dimension dimension = measure.text("dimension").flatMap(Dimension::ofCode).orElseThrow();
        int before = found.size();
        if (!wanted.dimensions().contains(dimension)) {
            found.add(Defect.at(where.child("dimension"), "dimension-wrong", dimension.code(),
                    wanted.dimensions().get(0).code()));
        }
        Set<String> offered = new HashSet<>();
        List<Branch> units = measure.branches("units");
        for (int i = 0; i < units.size(); i++) {
            Pointer place = where.child("units").child(i).child("unit");
            String code = units.get(i).text("unit").orElseThrow();
            unit(code, dimension, place);
            if (!offered.add(code)) {
                found.add(Defect.at(place, "unit-twice", code));
            }
        }
        for (String system : List.of("metric", "us")) {
            String code = measure.text(system).orElseThrow();
            if (!offered.contains(code)) {
                found.add(Defect.at(where.child(system), "unit-not-offered", code));
            }
        }
        for (String range : List.of("plausible", "possible")) {
            for (String end : List.of("from", "above", "to")) {
                Pointer unit = where.child(range).child(end).child("unit");
                measure.at(Pointer.of(range, end, "unit")).filter(Node.Text.class::isInstance)
                        .ifPresent(code -> unit(((Node.Text) code).value(), dimension, unit));
            }
        }
        if (found.size() == before) {
            ranges(measure, where, FormReader::quantity, Quantity.BY_SIZE);
            floor(FormReader.range(measure, "possible", end -> FormReader.quantity(end).value()), where,
                    wanted.floor());
        }
    }

    /** Checks a plain number. */
    void count(Branch count, Pointer where, Floor floor) {
        ranges(count, where, FormReader::number, Comparator.naturalOrder());
        floor(FormReader.range(count, "possible", FormReader::number), where, floor);
    }

    /** All units begin at the same zero. */
    private void floor(Range<BigDecimal> possible, Pointer where, Floor floor) {
        int low = possible.low().map(BigDecimal::signum).orElse(-1);
        if (floor != Floor.ANYWHERE && low < 0) {
            found.add(Defect.at(where.child("possible"), "possible-below-zero"));
        } else if (floor == Floor.ABOVE_ZERO && low == 0 && !possible.excluded()) {
            found.add(Defect.at(where.child("possible"), "possible-holds-zero"));
        }
    }

    private void unit(String code, Dimension dimension, Pointer where) {
        Optional<Unit> unit = Unit.ofCode(code);
        if (unit.isEmpty()) {
            found.add(Defect.at(where, "unit-unknown", code));
        } else if (unit.get().dimension() != dimension) {
            found.add(Defect.at(where, "unit-wrong", code,
                    String.join(", ", Unit.of(dimension).stream().map(Unit::code).toList())));
        }
    }

    private <T> void ranges(Branch measure, Pointer where, Function<Node, T> end, Comparator<T> order) {
        Range<T> plausible = FormReader.range(measure, "plausible", end);
        Range<T> possible = FormReader.range(measure, "possible", end);
        boolean ordered = true;
        if (!plausible.isOrdered(order)) {
            found.add(Defect.at(where.child("plausible"), "range-reversed"));
            ordered = false;
        }
        if (!possible.isOrdered(order)) {
            found.add(Defect.at(where.child("possible"), "range-reversed"));
            ordered = false;
        }
        if (ordered && !possible.encloses(plausible, order)) {
            found.add(Defect.at(where.child("plausible"), "plausible-outside-possible"));
        }
    }
}
