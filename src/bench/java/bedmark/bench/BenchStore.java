package bedmark.bench;

import bedmark.document.Node;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.json.BundleReader;
import bedmark.screen.BedmarkApp;
import bedmark.survey.Act;
import bedmark.survey.Adoption;
import bedmark.survey.Bundle;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.util.ArrayList;
import java.util.List;
import java.util.UUID;
import java.util.stream.Stream;

/** A tablet's store after years of service: the sample plant, its rounds walked again and again. */
final class BenchStore {
    private static final Path SAMPLES = Path.of("sample-surveys");
    private static final String PERSON = "A. Vale";

    private BenchStore() {
    }

    /** Fills a store until it holds about so many surveys; the last round is under way. */
    static void fill(Path folder, int surveys) throws IOException {
        List<Bundle> bundles = new ArrayList<>();
        try (Stream<Path> files = Files.list(SAMPLES)) {
            for (Path file : files.filter(each -> each.toString().endsWith(".json")).sorted().toList()) {
                bundles.add(BundleReader.read(Files.readAllBytes(file)));
            }
        }
        StoreOptions options = BedmarkApp.options(Clock.systemUTC());
        try (Store store = Store.open(folder, options)) {
            store.append(PERSON, Adoption.register(bundles));
            int held = 0;
            for (int turn = 0; held < surveys; turn++) {
                Bundle walked = bundles.get(turn % (bundles.size() - 1));
                for (Act act : Adoption.surveys(walked, false)) {
                    if (act instanceof Act.SurveyTaken taken) {
                        UUID id = new UUID(turn, held++);
                        store.append(PERSON, new Act.SurveyTaken(id, taken.document().without("photos")
                                .without("supersedes").with("id", new Node.Text(id.toString()))));
                    }
                }
            }
            for (Act act : Adoption.surveys(bundles.get(bundles.size() - 1), true)) {
                store.append(PERSON, act instanceof Act.SurveyOpened opened
                        ? new Act.SurveyOpened(opened.survey(), opened.document().without("photos")) : act);
            }
        }
    }
}
