package bedmark.command;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.office.OfficeOptions;
import bedmark.office.OfficeStore;
import bedmark.survey.merge.ZoneId;
import java.nio.file.Path;
import picocli.CommandLine.Option;

/** The office store that a command works on, and who works. */
final class OfficeDesk {
    @Option(names = "--store", paramLabel = "DIR",
            description = "The office's folder, made when it is not there (default: .bedmark-office in your home).")
    private Path store;

    @Option(names = "--person", paramLabel = "NAME",
            description = "Who does this, for the office's records (default: your login name).")
    private String person;

    OfficeStore open(Surroundings surroundings, ProgressLine progress) {
        return OfficeStore.open(folder(), OfficeOptions.of(surroundings.clock()).withProgress(progress::at));
    }

    private Path folder() {
        return store == null ? Path.of(System.getProperty("user.home"), ".bedmark-office") : store;
    }

    String person() {
        return person == null ? System.getProperty("user.name", "") : person;
    }

    /**
     * The zone that a person named by its id or tag.
     *
     * @throws Refused {@code zone-unknown}
     */
    static ZoneId zone(OfficeStore store, String named) {
        return store.zone(named).orElseThrow(() -> new Refused(Defect.in(named, "zone-unknown")));
    }
}
