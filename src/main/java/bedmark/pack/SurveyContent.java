package bedmark.pack;

import bedmark.json.Canonical;
import bedmark.survey.Survey;

/** What makes two surveys the same: everything that people entered, wherever the keys stand in the file. */
public final class SurveyContent {
    private SurveyContent() {
    }

    /**
     * The digest of a survey's content: SHA-256 over its JSON without {@code assessment} (which anyone computes anew
     * from the readings), without spaces, keys sorted by their UTF-16 units at every depth, numbers as they were
     * entered with their trailing zeros, UTF-8.
     *
     * @return 64 lower-case hexadecimal digits
     */
    public static String sha256(Survey survey) {
        return Sha256.hex(Canonical.bytes(survey.document().without("assessment")));
    }
}
