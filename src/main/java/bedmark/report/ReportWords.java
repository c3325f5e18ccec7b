package bedmark.report;

import bedmark.engine.Assessment;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.office.Place;
import bedmark.survey.InspectionStatus;
import bedmark.survey.Survey;
import bedmark.wording.Telling;
import bedmark.wording.Wording;
import java.time.OffsetDateTime;
import java.time.format.DateTimeFormatter;
import java.util.Comparator;
import java.util.Optional;
import java.util.OptionalDouble;

/** The words and numbers of a report for one reader. */
final class ReportWords {
    private static final DateTimeFormatter DAY = DateTimeFormatter.ofPattern("yyyy-MM-dd");
    private static final double MEGA = 1e6;
    private static final double TONNE = 1000;

    private final Wording wording;

    ReportWords(Wording wording) {
        this.wording = wording;
    }

    Wording wording() {
        return wording;
    }

    String text(String key, Object... arguments) {
        return wording.text(key, arguments);
    }

    /** A day as everybody reads it, whatever the country. */
    String day(OffsetDateTime at) {
        return DAY.format(at);
    }

    String place(Place place) {
        return text("report.place." + place.code());
    }

    /** An energy a year with its unit. */
    String energy(double wh) {
        return text("action.megawatt-hours", wording.format().computed(wh / MEGA, 2));
    }

    /** A sum of money, rounded to what an estimate is worth. */
    String money(double sum, String currency) {
        return text("report.money", wording.format().computed(sum, 0), currency);
    }

    /** CO₂ in tonnes. */
    String tonnes(double kg) {
        return text("report.tonnes", wording.format().computed(kg / TONNE, 1));
    }

    String share(OptionalDouble share) {
        return share.isPresent() ? wording.percent(share.getAsDouble()) : "–";
    }

    /** When a zone was last judged. */
    String examined(ReportZone zone) {
        return zone.examined().flatMap(Examined::at).map(this::day).orElse("–");
    }

    /** In a clause, why a zone stands where it stands. */
    String why(ReportZone zone) {
        if (zone.examined().isEmpty() || zone.ranked().place() == Place.NOT_INSPECTED) {
            return zone.visit().map(this::status).orElseGet(() -> text("report.never"));
        }
        Assessment assessment = zone.examined().get().assessment();
        Telling telling = new Telling(wording, zone.examined().get().form());
        Optional<Finding> today = Telling.leading(assessment);
        Optional<Finding> then = assessment.findingsAtDesign().stream().max(Comparator.comparing(Finding::level));
        boolean worseThen = assessment.levelAtDesignFeed().filter(level -> level.compareTo(assessment.level()) > 0)
                .isPresent();
        if (worseThen && then.isPresent()) {
            return text("report.at-design", telling.clause(then.get()));
        }
        return assessment.level() == Level.INCOMPLETE && !assessment.missingRequired().isEmpty()
                ? text("report.waits", wording.reading(assessment.missingRequired().get(0),
                        zone.examined().get().form()))
                : today.map(telling::clause).orElse("–");
    }

    /** What came of a visit that brought no result. */
    String status(Survey visit) {
        if (visit.inspectionStatus() == InspectionStatus.INSPECTED) {
            return visit.startedAt().map(at -> text("report.under-way", day(at)))
                    .orElseGet(() -> text("report.under-way-somewhen"));
        }
        String word = text("screen.status." + visit.inspectionStatus().code());
        return visit.document().text("statusReason").filter(reason -> !reason.isBlank())
                .map(reason -> text("report.status", word, reason)).orElse(word);
    }
}
