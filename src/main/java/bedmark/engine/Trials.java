package bedmark.engine;

import bedmark.engine.drag.DragMethod;
import bedmark.engine.uncertainty.Distribution;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.verdict.Chance;
import bedmark.engine.verdict.Rule;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Random;

/** Draws the readings of the zones of one conveyor many times, and computes each drawing by the one set of formulas. */
final class Trials {
    private static final double HALF_OF_RECTANGLE = Math.sqrt(3);
    private static final Rule[] RULES = Rule.values();

    private final Settings settings;
    private final int number;
    private final List<Drawn> zones = new ArrayList<>();

    /** @param number of trials, at least one */
    Trials(List<LoadingZone> surveyed, Settings settings, int number) {
        this.settings = settings;
        this.number = number;
        surveyed.forEach(zone -> zones.add(new Drawn(zone)));
    }

    /** Draws everything; one result for each zone, in their order. */
    List<MonteCarlo> run(long seed) {
        Random random = new Random(seed);
        for (int trial = 0; trial < number; trial++) {
            Draw draw = new Draw(random);
            double methods = HALF_OF_RECTANGLE * draw.even();
            Shares sum = new Shares(0, 0);
            for (Drawn zone : zones) {
                sum = sum.plus(zone.draw(trial, draw, methods));
            }
            for (Drawn zone : zones) {
                zone.conveyor(trial, sum);
            }
        }
        return zones.stream().map(Drawn::summary).toList();
    }

    /** Shares of the rated power. */
    private record Shares(double today, double atDesign) {
        Shares plus(Shares other) {
            return new Shares(today + other.today, atDesign + other.atDesign);
        }
    }

    /** One zone with everything that came of it so far; what is not known in a trial is marked by NaN. */
    private final class Drawn {
        private final LoadingZone surveyed;
        private final Observations asRead;
        private final double spreadToday;
        private final double spreadAtDesign;
        private final Map<Result, double[]> results = new EnumMap<>(Result.class);
        private final Map<DragMethod, double[]> methods = new EnumMap<>(DragMethod.class);
        private final Map<Rule, double[]> today = new EnumMap<>(Rule.class);
        private final Map<Rule, double[]> atDesign = new EnumMap<>(Rule.class);

        Drawn(LoadingZone surveyed) {
            this.surveyed = surveyed;
            ZoneFacts zone = new ZoneFacts(Sources.uncertain(surveyed, settings)).certain();
            FeedFacts feed = FeedFacts.today(zone);
            asRead = new Observations(feed, feed);
            spreadToday = feed.spreadOfShare();
            spreadAtDesign = FeedFacts.atDesign(zone).value().map(FeedFacts::spreadOfShare).orElse(spreadToday);
        }

        /** @param apart where the methods stand in this trial: in standard uncertainties of their spread */
        Shares draw(int trial, Draw draw, double apart) {
            ZoneFacts zone = new ZoneFacts(Sources.drawn(surveyed, settings, draw));
            FeedFacts feed = FeedFacts.today(zone);
            Deduced<FeedFacts> design = FeedFacts.atDesign(zone);
            Results.of(feed).forEach((result, value) -> note(results, result, trial, value));
            feed.methods().forEach((method, value) -> note(methods, method, trial, value));
            observe(trial, today, new Observations(feed, feed), 0);
            if (design.isKnown()) {
                observe(trial, atDesign, new Observations(feed, design.get()),
                        apart * (spreadAtDesign - spreadToday));
            }
            return new Shares(share(feed) + apart * spreadToday,
                    share(design.isKnown() ? design.get() : feed) + apart * spreadAtDesign);
        }

        private void observe(int trial, Map<Rule, double[]> noted, Observations observations, double driveApart) {
            for (Rule rule : RULES) {
                if (rule != Rule.SKIRTS_OVER_BUDGET) {
                    note(noted, rule, trial, observations.of(rule));
                }
            }
            if (driveApart != 0 && noted.containsKey(Rule.DRIVE_NEAR_RATING)) {
                noted.get(Rule.DRIVE_NEAR_RATING)[trial] += driveApart;
            }
        }

        /** Notes what all the zones take together. */
        void conveyor(int trial, Shares sum) {
            if (asRead.of(Rule.SKIRTS_OVER_BUDGET).isKnown()) {
                note(today, Rule.SKIRTS_OVER_BUDGET, trial, sum.today());
                note(atDesign, Rule.SKIRTS_OVER_BUDGET, trial, sum.atDesign());
            }
        }

        private <K extends Enum<K>> void note(Map<K, double[]> noted, K key, int trial, Deduced<Uncertain> value) {
            if (value.isKnown()) {
                note(noted, key, trial, value.get().value());
            } else if (noted.containsKey(key)) {
                noted.get(key)[trial] = Double.NaN;
            }
        }

        private <K extends Enum<K>> void note(Map<K, double[]> noted, K key, int trial, double value) {
            double[] values = noted.get(key);
            if (values == null) {
                values = new double[number];
                Arrays.fill(values, 0, trial, Double.NaN);
                noted.put(key, values);
            }
            values[trial] = value;
        }

        MonteCarlo summary() {
            return new MonteCarlo(number, distributions(Result.class, results),
                    distributions(DragMethod.class, methods), chances(today), chances(atDesign));
        }

        private <K extends Enum<K>> Map<K, Distribution> distributions(Class<K> keys, Map<K, double[]> noted) {
            Map<K, Distribution> distributions = new EnumMap<>(keys);
            noted.forEach((key, values) -> {
                if (isComplete(values)) {
                    distributions.put(key, Distribution.of(values));
                }
            });
            return distributions;
        }

        private Map<Rule, Chance> chances(Map<Rule, double[]> noted) {
            Map<Rule, Chance> chances = new EnumMap<>(Rule.class);
            noted.forEach((rule, values) -> {
                if (isComplete(values)) {
                    chances.put(rule, Chance.of(rule, values, asRead.limit(rule)));
                }
            });
            return chances;
        }
    }

    private static double share(FeedFacts feed) {
        return feed.driveShare().isKnown() ? feed.driveShare().get().value() : 0;
    }

    private static boolean isComplete(double[] values) {
        for (double value : values) {
            if (Double.isNaN(value)) {
                return false;
            }
        }
        return true;
    }
}
