package bedmark.report;

import bedmark.document.Branch;
import bedmark.form.FieldForm;
import bedmark.journal.Progress;
import bedmark.json.SurveyForm;
import bedmark.office.JudgedZone;
import bedmark.office.OfficeStore;
import bedmark.office.Place;
import bedmark.office.RankQuery;
import bedmark.office.RankedZone;
import bedmark.survey.Assessor;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What a report tells.
 *
 * @param madeAt when it was made, by the office's clock
 * @param plants the names of the plants in it
 * @param zones  every loading zone, worst first
 */
public record ReportContent(OffsetDateTime madeAt, List<String> plants, List<ReportZone> zones) {

    public ReportContent {
        plants = List.copyOf(plants);
        zones = List.copyOf(zones);
    }

    /**
     * Gathers it from an office store.
     *
     * @param query    which zones
     * @param progress told of the zones, and asked whether to stop
     * @return nothing where it was stopped
     */
    public static Optional<ReportContent> of(OfficeStore store, RankQuery query, OffsetDateTime madeAt,
                                             Progress progress) {
        List<RankedZone> ranked = store.rank(query, progress);
        Gathering gathering = new Gathering(store);
        List<ReportZone> zones = new ArrayList<>();
        for (RankedZone zone : ranked) {
            if (progress.cancelled()) {
                return Optional.empty();
            }
            progress.at(zones.size(), ranked.size());
            zones.add(gathering.zone(zone));
        }
        return Optional.of(new ReportContent(madeAt, zones.stream().map(zone -> zone.ranked().names().plant())
                .filter(name -> !name.isEmpty()).distinct().sorted().toList(), zones));
    }

    /** The zones that stand at a place. */
    public List<ReportZone> at(Place... places) {
        List<Place> wanted = List.of(places);
        return zones.stream().filter(zone -> wanted.contains(zone.ranked().place())).toList();
    }

    /** The zones that were judged. */
    public List<ReportZone> examined() {
        return zones.stream().filter(zone -> zone.examined().isPresent()).toList();
    }

    /** Zones under way: registers and forms are read once. */
    private static final class Gathering {
        private final OfficeStore store;
        private final Map<Register, Assessor> assessors = new IdentityHashMap<>();
        private final Map<String, List<Branch>> forms = new HashMap<>();

        Gathering(OfficeStore store) {
            this.store = store;
        }

        ReportZone zone(RankedZone ranked) {
            Optional<Examined> examined = store.judged(ranked.zone()).map(judged -> examined(judged, ranked));
            boolean seen = examined.isPresent() && ranked.place() != Place.NOT_INSPECTED;
            return new ReportZone(ranked, examined, seen ? Optional.empty() : visit(ranked));
        }

        private Examined examined(JudgedZone judged, RankedZone ranked) {
            return new Examined(judged, store.judgedToday(ranked.zone()),
                    assessors.computeIfAbsent(judged.register(), Assessor::new),
                    form(judged.survey(), ranked.zone().plant()));
        }

        private Optional<Survey> visit(RankedZone ranked) {
            return store.merged(ranked.zone()).last().flatMap(copy ->
                    Optional.ofNullable(store.surveys(List.of(copy.digest())).get(copy.digest())));
        }

        private FieldForm form(Survey survey, String plant) {
            return SurveyForm.of(survey, forms.computeIfAbsent(plant, key -> store.head(key)
                    .map(head -> head.branches("forms")).orElse(List.of())));
        }
    }
}
