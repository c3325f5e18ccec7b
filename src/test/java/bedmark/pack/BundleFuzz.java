package bedmark.pack;

import bedmark.document.Refused;
import bedmark.json.AssessmentWriter;
import bedmark.json.BundleReader;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import bedmark.survey.Assessor;
import bedmark.survey.Bundle;
import bedmark.survey.Survey;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;

/**
 * A target for coverage-guided fuzzing: any bytes are a bundle or are refused. A bundle is assessed and written, and
 * what was written reads back as the same document.
 */
public final class BundleFuzz {
    private BundleFuzz() {
    }

    /** Loads what the first input needs, which is no part of its time. */
    public static void fuzzerInitialize() {
        fuzzerTestOneInput(HostilePacks.bundle(BagForge.PHOTO).getBytes(StandardCharsets.UTF_8));
    }

    /** The name and form that fuzzers look for. */
    public static void fuzzerTestOneInput(byte[] data) {
        try {
            Bundle bundle = BundleReader.read(data);
            byte[] written = JsonWriter.compact(bundle.document());
            byte[] again = JsonWriter.compact(JsonReader.read(written).root());
            if (!Arrays.equals(written, again)) {
                throw new IllegalStateException("what was written reads back as another document");
            }
            assess(bundle);
        } catch (Refused e) {
            PackFuzz.requireWorded(e);
        }
    }

    private static void assess(Bundle bundle) {
        Assessor assessor = new Assessor(bundle.register());
        for (Survey survey : bundle.surveys()) {
            try {
                AssessmentWriter.write(assessor.assess(survey, List.of()));
            } catch (Refused e) {
                PackFuzz.requireWorded(e);
            }
        }
    }
}
