package bedmark.survey;

import static bedmark.document.Refused.below;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.engine.Conventions;
import bedmark.engine.Prices;
import bedmark.engine.Settings;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.flow.LengthConventions;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealRates;
import bedmark.engine.seal.SealType;
import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.uncertainty.Instruments;
import bedmark.engine.verdict.Certainty;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Limits;
import bedmark.engine.verdict.Rule;
import bedmark.engine.verdict.Sense;
import bedmark.quantity.Quantity;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;
import java.util.function.Supplier;

/**
 * What a site decided, read from its register: {@code limits}, {@code sealRates}, {@code instruments} and
 * {@code method} of the plant. What it leaves out keeps the reference's number; a limit of a rule that
 * this version does not know is kept in the document and not used.
 */
final class SiteSettings {
    private static final String LIMITS = "limits";
    private static final String CERTAINTY = "certainty";

    private SiteSettings() {
    }

    /**
     * The settings of a plant.
     *
     * @param base what holds where the plant decides nothing
     * @throws Refused where a row names what the engine does not know, or a number cannot be; the place is a pointer
     *                 within the plant
     */
    static Settings of(Branch plant, Settings base) {
        return sound(() -> {
            Settings settings = base.with(limits(plant, base.limits())).with(certainty(plant, base.certainty()))
                    .with(sealRates(plant, base.sealRates())).with(instruments(plant, base.instruments()))
                    .with(conventions(plant, base.conventions())).with(prices(plant));
            return plant.text("method").map(code -> settings.with(
                    word(DragMethod::ofCode, code, Pointer.of("method")))).orElse(settings);
        });
    }

    /**
     * Reads something of the plant.
     *
     * @throws Refused also for a number that cannot be
     */
    static <T> T sound(Supplier<T> reading) {
        try {
            return reading.get();
        } catch (ImpossibleReading e) {
            throw new Refused(Defect.in(e.readingName().replaceFirst("^/plant", ""), e.code(),
                    e.arguments().toArray(String[]::new)), e);
        }
    }

    private static Limits limits(Branch plant, Limits base) {
        Branch rows = plant.branch(LIMITS).orElse(Branch.EMPTY);
        Limits limits = base;
        for (String code : rows.members().keySet()) {
            Optional<Rule> named = Rule.ofCode(code);
            if (named.isEmpty()) {
                continue;
            }
            Pointer place = Pointer.of(LIMITS, code);
            Rule rule = named.get();
            Branch row = below(place, () -> rows.branch(code).orElse(Branch.EMPTY));
            Limit known = base.of(rule);
            OptionalDouble near = below(place, () -> number(row, "near", known.near()));
            OptionalDouble overloaded = below(place, () -> number(row, "overloaded", known.overloaded()));
            if (rule.sense() == Sense.OVER && overloaded.isPresent() && near.orElse(0) > overloaded.getAsDouble()) {
                throw new Refused(Defect.at(place.child("near"), "limit-order-wrong",
                        Double.toString(near.getAsDouble()), Double.toString(overloaded.getAsDouble())));
            }
            boolean moved = !near.equals(known.near()) || !overloaded.equals(known.overloaded());
            Limit limit = moved ? Limit.ofSite(near, overloaded) : known;
            boolean enabled = below(place, () -> row.flag("enabled")).orElse(known.on());
            limits = limits.with(rule, new Limit(limit.near(), limit.overloaded(), enabled, limit.source(),
                    limit.assumption()));
        }
        return limits;
    }

    /** How the site computes; a friction factor of ISO 5048 that it set is taken as it stands. */
    private static Conventions conventions(Branch plant, Conventions standard) {
        Branch rows = plant.branch(LIMITS).orElse(Branch.EMPTY);
        return below(Pointer.of(LIMITS), () -> {
            Optional<Double> onBelt = number(rows, "beltGrip");
            Optional<Double> onBoards = number(rows, "boardGrip");
            Conventions chosen = onBelt.isEmpty() && onBoards.isEmpty() ? standard
                    : standard.withGrip(onBelt.orElse(standard.beltGrip().value()),
                            onBoards.orElse(standard.boardGrip().value()));
            return chosen.with(new LengthConventions(flag(rows, "lengthBySpeed"), flag(rows, "lengthByAcceleration"),
                            flag(rows, "lengthLeast")))
                    .withIncline(flag(rows, "inclineInAcceleration")).withSpread(flag(rows, "methodSpread"))
                    .withTrials(trials(rows, standard.trials()));
        });
    }

    private static int trials(Branch rows, int standard) {
        return rows.number("monteCarloTrials").map(number -> {
            try {
                return number.intValueExact();
            } catch (ArithmeticException e) {
                throw new Refused(Defect.at(Pointer.of("monteCarloTrials"), "trials-impossible",
                        number.toPlainString(), Integer.toString(Conventions.MOST_TRIALS)), e);
            }
        }).orElse(standard);
    }

    private static Prices prices(Branch plant) {
        Optional<Branch> tariff = plant.branch("tariff");
        OptionalDouble energy = tariff.isEmpty() ? OptionalDouble.empty()
                : below(Pointer.of("tariff"), () -> number(tariff.get(), "energy", OptionalDouble.empty()));
        Optional<String> currency = tariff.flatMap(row -> below(Pointer.of("tariff"), () -> row.text("currency")));
        return new Prices(energy, currency, number(plant, "co2Factor", OptionalDouble.empty()));
    }

    private static boolean flag(Branch rows, String key) {
        return rows.flag(key).orElse(true);
    }

    private static Certainty certainty(Branch plant, Certainty standard) {
        Branch row = plant.branch(LIMITS).flatMap(limits -> limits.branch(CERTAINTY)).orElse(Branch.EMPTY);
        Pointer place = Pointer.of(LIMITS, CERTAINTY);
        return below(place, () -> new Certainty(number(row, "overloaded").orElse(standard.overloaded()),
                number(row, "undecided").orElse(standard.undecided()), number(row, "near").orElse(standard.near())));
    }

    private static SealRates sealRates(Branch plant, SealRates base) {
        SealRates rates = base;
        List<Branch> rows = plant.branches("sealRates");
        for (int i = 0; i < rows.size(); i++) {
            Pointer place = Pointer.of("sealRates").child(i);
            Branch row = rows.get(i);
            Optional<Double> rate = below(place, () -> row.quantity("rate")).map(Quantity::si);
            if (rate.isPresent()) {
                rates = new SealRates(rate.get(), rates.multipliers());
                continue;
            }
            SealType type = word(SealType::ofCode, text(row, "type", place), place.child("type"));
            SealCondition condition = word(SealCondition::ofCode, text(row, "condition", place),
                    place.child("condition"));
            double multiplier = below(place, () -> number(row, "multiplier")).orElseThrow(() ->
                    new Refused(Defect.at(place, "key-absent", "multiplier")));
            rates = rates.with(type, condition, multiplier);
        }
        return rates;
    }

    private static Instruments instruments(Branch plant, Instruments base) {
        Instruments instruments = base;
        List<Branch> rows = plant.branches("instruments");
        for (int i = 0; i < rows.size(); i++) {
            Pointer place = Pointer.of("instruments").child(i);
            Branch row = rows.get(i);
            Instrument instrument = word(Instrument::ofCode, text(row, "kind", place), place.child("kind"));
            Optional<Double> spread = below(place, () -> instrument.relative() ? number(row, "relative")
                    : row.quantity("standardUncertainty").map(Quantity::si));
            String key = instrument.relative() ? "relative" : "standardUncertainty";
            instruments = instruments.with(instrument, spread.orElseThrow(() ->
                    new Refused(Defect.at(place, "key-absent", key))));
        }
        return instruments;
    }

    private static String text(Branch row, String key, Pointer place) {
        return below(place, () -> row.text(key)).orElseThrow(() ->
                new Refused(Defect.at(place, "key-absent", key)));
    }

    private static <T> T word(Function<String, Optional<T>> words, String code, Pointer place) {
        return words.apply(code).orElseThrow(() -> new Refused(Defect.at(place, "word-unknown", code)));
    }

    private static Optional<Double> number(Branch row, String key) {
        return row.number(key).map(BigDecimal::doubleValue);
    }

    private static OptionalDouble number(Branch row, String key, OptionalDouble known) {
        return number(row, key).map(OptionalDouble::of).orElse(known);
    }
}
