package bedmark.office.trend;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.engine.verdict.Level;
import bedmark.office.FindingLine;
import bedmark.office.JudgedZone;
import java.math.BigDecimal;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;

/** A zone's trend as a document: SI, the unit in the key where there is one; what can't be said is absent. */
public final class TrendDocument {
    private TrendDocument() {
    }

    /**
     * A zone's trend.
     *
     * @param own   the latest result by the register that it was made with
     * @param today the same by today's
     */
    public static Branch of(ZoneTrend trend, Optional<JudgedZone> own, Optional<JudgedZone> today) {
        return judged(judged(of(trend), "judgedByOwnRegister", own), "judgedByTodaysRegister", today);
    }

    private static Branch of(ZoneTrend trend) {
        return Branch.EMPTY.with("format", "bedmark.trend").with("version", Node.number(1))
                .with("plant", trend.zone().plant()).with("transfer", trend.zone().transfer())
                .with("series", series(trend.series(), TrendDocument::series))
                .with("changes", series(trend.changes(), change -> Branch.EMPTY.with("kind", change.kind().code())
                        .with("at", change.at().toString()).with("from", change.from()).with("to", change.to())))
                .with("interval", number(Branch.EMPTY.with("days", Node.number(trend.interval().days()))
                        .with("because", trend.interval().reason().code()), "daysFromNearToOverloaded",
                        trend.interval().pfDays()))
                .with("clashes", Node.number(trend.clashes())).with("undated", Node.number(trend.undated()));
    }

    private static Branch judged(Branch document, String key, Optional<JudgedZone> zone) {
        return zone.map(one -> {
            Branch judged = Branch.EMPTY.with("survey", one.copy().id().toString())
                    .with("revision", Node.number(one.copy().revision()))
                    .with("level", one.assessment().level().code());
            Optional<Level> design = one.assessment().levelAtDesignFeed();
            judged = design.isPresent() ? judged.with("levelAtDesignFeed", design.get().code()) : judged;
            return document.with(key, judged.with("findings", series(FindingLine.of(one.assessment()),
                    TrendDocument::finding)));
        }).orElse(document);
    }

    private static Branch finding(FindingLine line) {
        Branch document = Branch.EMPTY.with("code", line.rule().code()).with("unit", line.rule().unit());
        document = line.today().isPresent() ? document.with("today", seen(line.today().get())) : document;
        return line.atDesign().isPresent() ? document.with("atDesignFeed", seen(line.atDesign().get())) : document;
    }

    private static Branch seen(FindingLine.Seen seen) {
        return Branch.EMPTY.with("level", seen.level().code()).with("observed", number(seen.observed()))
                .with("standardUncertainty", number(seen.standardUncertainty()));
    }

    /** The unit that a measure's values carry. */
    static String unit(Measure measure) {
        return switch (measure) {
            case DEPTH -> "m";
            case DRAG -> "N";
            case POWER -> "W";
            case SEALS -> "1";
        };
    }

    private static Branch series(Series series) {
        Branch branch = Branch.EMPTY.with("measure", series.measure().code()).with("unit", unit(series.measure()));
        branch = number(number(branch, "near", series.near()), "overloaded", series.overloaded());
        branch = series.begun().equals(Instant.EPOCH) ? branch : branch.with("since", series.begun().toString());
        branch = branch.with("observations", series(series.observations(), one -> Branch.EMPTY
                        .with("at", one.at().toString()).with("value", number(one.value()))
                        .with("standardUncertainty", number(one.standardUncertainty()))
                        .with("survey", one.survey().toString()).with("revision", Node.number(one.revision()))
                        .with("replaced", Node.flag(one.replaced()))));
        return branch.with("outlook", outlook(series.outlook()));
    }

    private static Branch outlook(Outlook outlook) {
        if (outlook instanceof Outlook.TooFew few) {
            return Branch.EMPTY.with("says", "too-few-surveys").with("surveys", Node.number(few.surveys()))
                    .with("needed", Node.number(few.needed()));
        } else if (outlook instanceof Outlook.Level level) {
            return fit(Branch.EMPTY.with("says", "no-trend"), level.line(), level.test());
        }
        Outlook.Trend trend = (Outlook.Trend) outlook;
        Branch branch = fit(Branch.EMPTY.with("says", trend.line().slope() > 0 ? "rising" : "falling"), trend.line(),
                trend.test());
        if (trend.near().isPresent()) {
            branch = branch.with("nearReached", reached(trend.near().get()));
        }
        return trend.overloaded().isPresent() ? branch.with("overloadedReached", reached(trend.overloaded().get()))
                : branch;
    }

    private static Branch fit(Branch branch, TheilSen line, MannKendall test) {
        return branch.with("slopePerDay", number(line.slope())).with("slopePerDayLower", number(line.lower()))
                .with("slopePerDayUpper", number(line.upper())).with("confidence", number(line.confidence()))
                .with("mannKendallS", Node.number(test.s())).with("probability", number(test.probability()))
                .with("exact", Node.flag(test.exact()));
    }

    private static Branch reached(Outlook.Reached reached) {
        return end(end(end(Branch.EMPTY, "expected", reached.expected()), "earliest", reached.earliest()), "latest",
                reached.latest());
    }

    /** A day; where there is none, why: later than ten years after the last survey, or never. */
    private static Branch end(Branch branch, String key, Outlook.When when) {
        return when.day().map(day -> branch.with(key, day.toString())).orElseGet(() ->
                branch.with(key + "Is", when instanceof Outlook.Beyond ? "beyond-ten-years" : "never"));
    }

    private static Branch number(Branch branch, String key, OptionalDouble value) {
        return value.isPresent() ? branch.with(key, number(value.getAsDouble())) : branch;
    }

    private static Node number(double value) {
        return Node.number(BigDecimal.valueOf(value));
    }

    private static <T> Node series(List<T> items, Function<T, Branch> document) {
        return new Node.Series(items.stream().map(item -> (Node) document.apply(item)).toList());
    }
}
