package bedmark.report;

import bedmark.engine.verdict.Level;
import bedmark.office.JudgedZone;
import bedmark.office.trend.Change;
import bedmark.office.trend.Measure;
import bedmark.office.trend.Observation;
import bedmark.office.trend.Outlook;
import bedmark.office.trend.Series;
import bedmark.office.trend.ZoneTrend;
import bedmark.quantity.Dimension;
import bedmark.wording.Wording;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** A zone over time in words, in one person's language and units. */
public final class TrendTelling {
    private static final double DAYS_A_YEAR = 365.25;

    private final Wording wording;

    public TrendTelling(Wording wording) {
        this.wording = wording;
    }

    /**
     * Everything, a line each.
     *
     * @param own   the latest result by the register that it was made with
     * @param today the same by today's
     */
    public List<String> lines(ZoneTrend trend, Optional<JudgedZone> own, Optional<JudgedZone> today) {
        List<String> lines = new ArrayList<>();
        for (Series series : trend.series()) {
            say(lines, "", "office.trend." + series.measure().code());
            for (Observation one : series.observations()) {
                say(lines, "  ", one.replaced() ? "office.trend.replaced" : "office.trend.point",
                        one.at().atZone(ZoneOffset.UTC).toLocalDate(), value(series.measure(), one.value()),
                        value(series.measure(), 2 * one.standardUncertainty()), one.revision());
            }
            series.near().ifPresent(limit -> say(lines, "  ", "office.trend.limit-near",
                    value(series.measure(), limit)));
            series.overloaded().ifPresent(limit -> say(lines, "  ", "office.trend.limit",
                    value(series.measure(), limit)));
            outlook(lines, series);
        }
        lines.addAll(around(trend, own, today));
        return lines;
    }

    /** What one measure comes to. */
    public List<String> outlook(Series series) {
        List<String> lines = new ArrayList<>();
        outlook(lines, series);
        return lines.stream().map(String::strip).toList();
    }

    /** What changed, what waits for a person, how often to look, and how the latest result is judged. */
    public List<String> around(ZoneTrend trend, Optional<JudgedZone> own, Optional<JudgedZone> today) {
        List<String> lines = new ArrayList<>();
        trend.changes().forEach(change -> say(lines, "", "office.trend.change." + change.kind().code(),
                change.at().atZone(ZoneOffset.UTC).toLocalDate(), change.from(), change.to()));
        if (trend.clashes() > 0) {
            say(lines, "", "office.trend.clashes", trend.clashes());
        }
        if (trend.undated() > 0) {
            say(lines, "", "office.trend.undated", trend.undated());
        }
        say(lines, "", "office.interval." + trend.interval().reason().code(), trend.interval().days(),
                wording.format().computed(trend.interval().pfDays().orElse(0), 0));
        if (own.isPresent()) {
            lines.add(judged(own, today));
        }
        return lines;
    }

    /** How the latest result is judged by the register that it was made with, and by today's. */
    public String judged(Optional<JudgedZone> own, Optional<JudgedZone> today) {
        return level(own).equals(level(today)) ? wording.text("office.trend.judged-alike", level(own))
                : wording.text("office.trend.judged", level(own), level(today));
    }

    /** What a drawing of one measure over time shows, line by line. */
    public String drawn(Series series, List<Change> changes) {
        List<String> told = new ArrayList<>();
        say(told, "", "office.trend." + series.measure().code());
        series.overloaded().ifPresent(limit -> say(told, "", "office.trend.drawn-over",
                value(series.measure(), limit)));
        series.near().ifPresent(limit -> say(told, "", "office.trend.drawn-near", value(series.measure(), limit)));
        if (series.observations().stream().anyMatch(one -> one.standardUncertainty() > 0)) {
            say(told, "", "office.trend.drawn-bar");
        }
        if (series.observations().stream().anyMatch(Observation::replaced)) {
            say(told, "", "office.trend.drawn-replaced");
        }
        if (!(series.outlook() instanceof Outlook.TooFew)) {
            say(told, "", "office.trend.drawn-fit");
        }
        if (!changes.isEmpty()) {
            say(told, "", "office.trend.drawn-change");
        }
        return String.join(" · ", told);
    }

    private String level(Optional<JudgedZone> judged) {
        return judged.map(one -> one.assessment().level()).map(Level::code)
                .map(code -> wording.text("verdict.level." + code)).orElse("-");
    }

    private void outlook(List<String> lines, Series series) {
        Measure measure = series.measure();
        if (series.outlook() instanceof Outlook.TooFew few) {
            say(lines, "  ", "office.trend.too-few", few.surveys(), few.needed());
        } else if (series.outlook() instanceof Outlook.Level level) {
            say(lines, "  ", "office.trend.level", value(measure, level.line().lower() * DAYS_A_YEAR),
                    value(measure, level.line().upper() * DAYS_A_YEAR), wording.format().computed(
                            level.test().probability(), 3));
        } else if (series.outlook() instanceof Outlook.Trend found) {
            say(lines, "  ", found.line().slope() > 0 ? "office.trend.rising" : "office.trend.falling",
                    value(measure, found.line().slope() * DAYS_A_YEAR),
                    value(measure, found.line().lower() * DAYS_A_YEAR),
                    value(measure, found.line().upper() * DAYS_A_YEAR),
                    wording.format().computed(found.test().probability(), 3),
                    wording.percent(found.line().confidence()));
            found.near().ifPresent(reached -> reached(lines, "office.trend.near-reached", reached));
            found.overloaded().ifPresent(reached -> reached(lines, "office.trend.overloaded-reached", reached));
        }
    }

    /** Where even the steepest line takes longer than ten years there is no day to tell. */
    private void reached(List<String> lines, String key, Outlook.Reached reached) {
        if (reached.earliest().day().isEmpty()) {
            say(lines, "  ", key + "-far");
        } else if (reached.expected().day().isEmpty()) {
            say(lines, "  ", key + "-late", end(reached.earliest()), end(reached.latest()));
        } else {
            say(lines, "  ", key, end(reached.expected()), end(reached.earliest()), end(reached.latest()));
        }
    }

    private String end(Outlook.When when) {
        return when.day().map(LocalDate::toString).orElseGet(() -> wording.text(when instanceof Outlook.Beyond
                ? "office.trend.beyond" : "office.trend.open"));
    }

    /** A value of a measure with its unit. */
    public String value(Measure measure, double si) {
        return switch (measure) {
            case DEPTH -> wording.computed(si, wording.units().smallLength());
            case DRAG -> wording.computed(si, wording.units().unit(Dimension.FORCE));
            case POWER -> wording.computed(si, wording.units().unit(Dimension.POWER));
            case SEALS -> wording.percent(si);
        };
    }

    private void say(List<String> lines, String before, String key, Object... details) {
        lines.add(before + Wording.plain(wording.text(key, details)));
    }
}
