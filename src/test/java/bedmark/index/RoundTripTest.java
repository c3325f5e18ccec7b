package bedmark.index;

import static bedmark.index.StoreScript.NOON;
import static bedmark.index.StoreScript.PERSON;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.json.BundleReader;
import bedmark.json.JsonWriter;
import bedmark.survey.Act;
import bedmark.survey.Adoption;
import bedmark.survey.Bundle;
import bedmark.survey.QueueState;
import bedmark.survey.Survey;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.UUID;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What comes in with a bundle goes out with the next one, whether this version knows it or not. */
class RoundTripTest {
    private static final Path BUNDLE = Path.of("src/test/resources/bedmark/json/bundle.json");

    @TempDir
    private Path temp;

    private static Bundle taken() throws IOException {
        return BundleReader.read(Files.readAllBytes(BUNDLE));
    }

    private Bundle throughAStore(Bundle bundle, boolean underWay) {
        try (Store store = Store.open(temp.resolve("store"), StoreScript.options())) {
            store.append(PERSON, Adoption.register(List.of(bundle)));
            for (Act act : Adoption.surveys(bundle, underWay)) {
                store.append(PERSON, act);
            }
        }
        try (Store store = Store.open(temp.resolve("store"), StoreScript.options())) {
            List<Branch> surveys = new ArrayList<>();
            for (Survey survey : bundle.surveys()) {
                surveys.add(store.history(survey.id()).orElseThrow().survey().document());
            }
            Bundle made = Bundle.of(UUID.randomUUID(), NOON, store.device().document(),
                    store.register().orElseThrow(), "A notice.", surveys);
            return BundleReader.read(JsonWriter.indented(made.document()));
        }
    }

    @ParameterizedTest
    @ValueSource(booleans = {true, false})
    void everyKeySurvivesTheStore(boolean underWay) throws IOException {
        Bundle bundle = taken();
        Branch out = throughAStore(bundle, underWay).document();
        for (String key : List.of("plant", "forms", "rounds", "x-root")) {
            assertEquals(bundle.document().get(key), out.get(key), key);
        }
        List<Branch> surveys = bundle.document().branches("surveys");
        for (int i = 0; i < surveys.size(); i++) {
            assertEquals(surveys.get(i).without("assessment"), out.branches("surveys").get(i));
        }
    }

    @Test
    void whatIsNestedAsDeepAsABundleMayBeSurvivesTheStore() throws IOException {
        String deep = "[".repeat(62) + "]".repeat(62);
        Bundle bundle = BundleReader.read(Files.readString(BUNDLE).replace("\"x-plant\": true",
                "\"x-plant\": " + deep).getBytes(StandardCharsets.UTF_8));
        assertEquals(bundle.document().get("plant"), throughAStore(bundle, false).document().get("plant"));
    }

    @Test
    void digitsAndSecondsStandAsTheyWereWritten() throws IOException {
        String out = new String(JsonWriter.indented(throughAStore(taken(), true).document()), StandardCharsets.UTF_8);
        for (String digits : List.of("0.1280", "20.0", "2.50", "\"9 1/2\"", "2026-03-01T08:30:00+01:00",
                "2026-03-01T08:52:10.25+01:00")) {
            assertTrue(out.contains(digits), digits);
        }
    }

    @Test
    void roundUnderWayKeepsWhatWasCompletedWhenAndByWhom() throws IOException {
        Bundle bundle = taken();
        throughAStore(bundle, true);
        try (Store store = Store.open(temp.resolve("store"), StoreScript.options())) {
            Survey first = bundle.surveys().get(0);
            SurveyLine line = store.survey(first.id()).orElseThrow();
            assertEquals(QueueState.COMPLETED, line.state());
            assertEquals(first.completedAt(), line.completedAt());
            assertEquals(QueueState.OPEN, store.survey(bundle.surveys().get(1).id()).orElseThrow().state());
        }
    }
}
