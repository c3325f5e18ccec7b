package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.quantity.Quantity;
import bedmark.survey.Bundle;
import bedmark.survey.Register;
import bedmark.survey.Round;
import bedmark.survey.Survey;
import com.fasterxml.jackson.core.JsonStreamContext;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;

/**
 * Reads bundles: strict JSON, the published schema, then what no schema tells (ids that must exist, stations within
 * the zone). The first defect in the text is the one reason of the refusal, with pointer, line and column. What a
 * verdict needs and is absent is no defect.
 */
public final class BundleReader {
    private BundleReader() {
    }

    /** Compiled when the first bundle is read, not when the program starts. */
    private static final class Compiled {
        private static final SchemaCheck SCHEMA = new SchemaCheck("bundle.schema.json");
    }

    /**
     * Reads a bundle.
     *
     * @param bytes UTF-8
     * @throws Refused where it is none, of another version, or holds something impossible
     */
    public static Bundle read(byte[] bytes) {
        return bundle(JsonReader.read(bytes));
    }

    /**
     * As {@link #read(byte[])}, for whoever judges anew: assessments are read as strictly, and what they hold is not
     * kept. They are most of a bundle.
     */
    public static Bundle readUnjudged(byte[] bytes) {
        return bundle(JsonReader.read(bytes, BundleReader::isAssessment));
    }

    private static boolean isAssessment(JsonStreamContext object) {
        JsonStreamContext survey = object.getParent();
        return "assessment".equals(survey.getCurrentName()) && survey.getParent().inArray()
                && "surveys".equals(survey.getParent().getParent().getCurrentName())
                && survey.getParent().getParent().getParent().inRoot();
    }

    private static Bundle bundle(Document document) {
        try {
            FormatCheck.require(document.root(), Bundle.FORMAT, Bundle.VERSION);
            Compiled.SCHEMA.check(document).stream().findFirst().ifPresent(defect -> {
                throw new Refused(defect);
            });
            Bundle bundle = new Bundle(document.root());
            check(bundle);
            return bundle;
        } catch (Refused e) {
            throw new Refused(document.placed(e.defect()), e);
        }
    }

    private static void check(Bundle bundle) {
        Register register = bundle.register();
        List<Round> rounds = bundle.rounds();
        for (int i = 0; i < rounds.size(); i++) {
            List<Round.Point> points = rounds.get(i).points();
            for (int k = 0; k < points.size(); k++) {
                if (register.transfer(points.get(k).transfer()).isEmpty()) {
                    throw new Refused(Defect.at(Pointer.of("rounds").child(i).child("points").child(k)
                            .child("transfer"), "transfer-unknown", points.get(k).transfer()));
                }
            }
        }
        List<Survey> surveys = bundle.surveys();
        Map<UUID, Integer> revisions = new HashMap<>();
        surveys.forEach(survey -> revisions.put(survey.id(), survey.revision()));
        for (int i = 0; i < surveys.size(); i++) {
            checkOrder(surveys.get(i), Pointer.of("surveys").child(i), revisions);
            Pointer where = Pointer.of("surveys").child(i).child("readings");
            try {
                checkStations(surveys.get(i).readings());
            } catch (Refused e) {
                throw new Refused(e.defect().below(where), e);
            }
        }
    }

    /** Revisions that replace each other in a ring would leave none that counts. */
    private static void checkOrder(Survey survey, Pointer where, Map<UUID, Integer> revisions) {
        survey.supersedes().filter(older -> revisions.getOrDefault(older, 0) >= survey.revision()).ifPresent(older -> {
            throw new Refused(Defect.at(where.child("supersedes"), "revision-order-wrong", older.toString(),
                    Integer.toString(survey.revision())));
        });
    }

    private static void checkStations(Branch readings) {
        Optional<Quantity> length = readings.quantity("loadingZoneLength");
        List<Quantity> seen = new ArrayList<>();
        List<Branch> stations = readings.branches("bedDepths");
        for (int i = 0; i < stations.size(); i++) {
            Pointer where = Pointer.of("bedDepths").child(i).child("position");
            Optional<Quantity> position = stations.get(i).quantity("position");
            if (position.isEmpty()) {
                continue;
            }
            if (length.filter(end -> Quantity.BY_SIZE.compare(position.get(), end) > 0).isPresent()) {
                throw new Refused(Defect.at(where, "station-outside-zone", show(position.get()),
                        show(length.get())));
            }
            if (seen.stream().anyMatch(other -> Quantity.BY_SIZE.compare(other, position.get()) == 0)) {
                throw new Refused(Defect.at(where, "station-twice", show(position.get())));
            }
            seen.add(position.get());
        }
    }

    private static String show(Quantity quantity) {
        return quantity.value().toPlainString() + " " + quantity.unit().code();
    }
}
