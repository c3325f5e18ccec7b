package bedmark.office.trend;

import bedmark.engine.Result;
import bedmark.engine.uncertainty.Estimate;
import bedmark.office.JudgedZone;
import bedmark.quantity.Quantity;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * Something about a zone that is not as it was on the survey before: what follows is not the same story, and is not
 * read as one trend with what was before.
 *
 * @param at   the first survey after it
 * @param from how it was
 * @param to   how it is since
 */
public record Change(Kind kind, Instant at, String from, String to) {
    /** A belt speed that differs by no more is the same (share). An assumption. */
    private static final double SAME_SPEED = 0.10;

    /** What changed. */
    public enum Kind {
        MATERIAL("material"),
        SPEED("speed"),
        SEALS("seals"),
        BOARDS("boards");

        private final String code;

        Kind(String code) {
            this.code = code;
        }

        public String code() {
            return code;
        }
    }

    /** What changed from one survey to the next. */
    static List<Change> between(JudgedZone before, JudgedZone after) {
        List<Change> changes = new ArrayList<>();
        Instant at = Instant.ofEpochMilli(after.copy().moment());
        add(changes, Kind.MATERIAL, at, material(before), material(after));
        double was = speed(before);
        double is = speed(after);
        if (was > 0 && is > 0 && Math.abs(is - was) > SAME_SPEED * Math.max(was, is)) {
            changes.add(new Change(Kind.SPEED, at, number(was), number(is)));
        }
        boolean renewed = Measure.SEALS.of(before.survey(), before.assessment()).map(Estimate::value).orElse(0.0)
                > Measure.SEALS.of(after.survey(), after.assessment()).map(Estimate::value).orElse(1.0);
        if (renewed || !types(before).equals(types(after))) {
            changes.add(new Change(Kind.SEALS, at, seals(before), seals(after)));
        }
        add(changes, Kind.BOARDS, at, boards(before), boards(after));
        return changes;
    }

    private static void add(List<Change> changes, Kind kind, Instant at, String from, String to) {
        if (!from.equals(to)) {
            changes.add(new Change(kind, at, from, to));
        }
    }

    private static String material(JudgedZone zone) {
        String id = zone.survey().readings().text("materialRunning").or(() -> zone.register()
                .transfer(zone.survey().transfer()).flatMap(transfer -> transfer.material())).orElse("");
        return Optional.ofNullable(zone.register().materials().get(id)).map(material -> material.name()).orElse(id);
    }

    private static double speed(JudgedZone zone) {
        return zone.assessment().get(Result.BELT_SPEED).map(Estimate::value).orElse(0.0);
    }

    private static String types(JudgedZone zone) {
        return zone.survey().readings().branches("seals").stream().map(seal -> seal.text("type").orElse(""))
                .filter(type -> !type.equals("none")).distinct().sorted().collect(Collectors.joining(" "));
    }

    private static String seals(JudgedZone zone) {
        return zone.survey().readings().branches("seals").stream().map(seal -> seal.text("type").orElse("") + ":"
                + seal.text("condition").orElse("")).distinct().sorted().collect(Collectors.joining(" "));
    }

    private static String boards(JudgedZone zone) {
        return List.of("skirtSpacing", "skirtHeight").stream().map(key -> zone.survey().readings().quantity(key)
                .or(() -> zone.register().transfer(zone.survey().transfer()).flatMap(transfer ->
                        transfer.quantity(key))).map(Quantity::si).map(Change::number).orElse("-"))
                .collect(Collectors.joining(" x "));
    }

    private static String number(double si) {
        return Double.toString(Math.round(si * 1000) / 1000.0);
    }
}
