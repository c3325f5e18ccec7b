package bedmark.json;

import bedmark.document.Branch;
import bedmark.engine.Conventions;
import bedmark.engine.Settings;
import bedmark.engine.flow.MaximumBeltSpeed;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealRates;
import bedmark.engine.seal.SealType;
import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.uncertainty.Instruments;
import bedmark.engine.uncertainty.Reading;
import bedmark.engine.verdict.Certainty;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Limits;
import bedmark.engine.verdict.Rule;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Reference data that was found sound, as settings of the engine. A number that is the engine's own but for the
 * rounding of its unit is taken for that number, and one that was moved away from it loses the mark of what was
 * published: from then on it is the site's.
 */
final class ReferenceSettings {
    private static final double ROUNDING = 1e-12;

    private final Map<ReferenceFile, Branch> files;

    ReferenceSettings(Map<ReferenceFile, Branch> files) {
        this.files = files;
    }

    Settings settings() {
        Settings standard = Settings.standard();
        Conventions known = standard.conventions();
        Branch limits = files.get(ReferenceFile.LIMITS);
        return standard.with(limits(limits)).with(certainty(limits))
                .with(known.withGrip(grip(limits, "beltGrip", known.beltGrip()),
                        grip(limits, "boardGrip", known.boardGrip())))
                .with(sealRates(files.get(ReferenceFile.SEAL_RATES)))
                .with(instruments(files.get(ReferenceFile.INSTRUMENTS)))
                .with(speeds(files.get(ReferenceFile.SPEED_CLASSES)));
    }

    private static Limits limits(Branch file) {
        Limits limits = Limits.standard();
        for (Branch row : file.branches("rules")) {
            Rule rule = Rule.ofCode(row.text("rule").orElseThrow()).orElseThrow();
            Limit known = rule.limit();
            OptionalDouble near = number(row, "near");
            OptionalDouble overloaded = number(row, "overloaded");
            String mark = row.text("mark").orElseThrow();
            boolean on = row.flag("enabled").orElse(true);
            boolean same = near.equals(known.near()) && overloaded.equals(known.overloaded());
            String source = same || !mark.equals(known.source()) ? mark : "site";
            Limit limit = new Limit(near, overloaded, on, source, source.equals("A") || source.equals("site"));
            limits = limit.equals(known) ? limits : limits.with(rule, limit);
        }
        return limits;
    }

    private static Certainty certainty(Branch file) {
        return file.branch("certainty").map(row -> new Certainty(number(row, "overloaded").orElseThrow(),
                number(row, "undecided").orElseThrow(), number(row, "near").orElseThrow()))
                .orElse(Certainty.standard());
    }

    /** A range is taken as equally likely all over (JCGM 100, 4.3.7); without one the number stands as it is. */
    private static Reading grip(Branch file, String of, Reading known) {
        Optional<Branch> row = file.branches("friction").stream()
                .filter(one -> one.text("of").equals(Optional.of(of))).findFirst();
        return row.map(found -> {
            OptionalDouble from = number(found, "from");
            OptionalDouble to = number(found, "to");
            double spread = from.isPresent() && to.isPresent()
                    ? (to.getAsDouble() - from.getAsDouble()) / 2 / Math.sqrt(3) : 0;
            return new Reading(known.name(), number(found, "value").orElseThrow(),
                    snapped(spread, known.standardUncertainty()));
        }).orElse(known);
    }

    private static SealRates sealRates(Branch file) {
        SealRates standard = SealRates.standard();
        SealRates rates = new SealRates(snapped(file.quantity("rate").orElseThrow().si(), standard.rate()), Map.of());
        for (Branch row : file.branches("multipliers")) {
            SealType type = SealType.ofCode(row.text("type").orElseThrow()).orElseThrow();
            SealCondition condition = SealCondition.ofCode(row.text("condition").orElseThrow()).orElseThrow();
            double multiplier = number(row, "multiplier").orElseThrow();
            if (multiplier != standard.multiplier(type, condition)) {
                rates = rates.with(type, condition, multiplier);
            }
        }
        return rates;
    }

    private static Instruments instruments(Branch file) {
        Instruments instruments = Instruments.standard();
        for (Branch row : file.branches("instruments")) {
            Instrument kind = Instrument.ofCode(row.text("kind").orElseThrow()).orElseThrow();
            double spread = kind.relative() ? number(row, "relative").orElseThrow()
                    : row.quantity("standardUncertainty").orElseThrow().si();
            double used = snapped(spread, kind.spread());
            instruments = used == kind.spread() ? instruments : instruments.with(kind, used);
        }
        return instruments;
    }

    private static MaximumBeltSpeed speeds(Branch file) {
        List<MaximumBeltSpeed.Row> rows = new ArrayList<>();
        for (Branch row : file.branches("speeds")) {
            rows.add(new MaximumBeltSpeed.Row(SpeedClass.ofCode(row.text("speedClass").orElseThrow()).orElseThrow(),
                    ReferenceCheck.width(row).orElseThrow().si(), row.has("aboveWidth"),
                    row.quantity("speed").orElseThrow().si()));
        }
        rows.sort((one, other) -> Double.compare(one.width(), other.width()));
        MaximumBeltSpeed standard = MaximumBeltSpeed.standard();
        return same(rows, standard) ? standard : new MaximumBeltSpeed(rows);
    }

    private static boolean same(List<MaximumBeltSpeed.Row> rows, MaximumBeltSpeed standard) {
        return rows.size() == standard.rows().size() && standard.rows().stream().allMatch(known ->
                rows.stream().anyMatch(row -> row.material() == known.material() && row.above() == known.above()
                        && snapped(row.width(), known.width()) == known.width()
                        && snapped(row.speed(), known.speed()) == known.speed()));
    }

    private static double snapped(double number, double known) {
        return Math.abs(number - known) <= ROUNDING * Math.abs(known) ? known : number;
    }

    private static OptionalDouble number(Branch row, String key) {
        return row.number(key).map(BigDecimal::doubleValue).map(OptionalDouble::of).orElse(OptionalDouble.empty());
    }
}
