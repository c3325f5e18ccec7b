package bedmark.command;

import bedmark.office.OfficeOptions;
import bedmark.office.OfficeStore;
import java.nio.file.Path;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** The office store that a command works on, and who works. */
final class OfficeDesk {
    @Option(names = "--store", paramLabel = "DIR|URL",
            description = {"The office's folder, made when it is not there (default: .bedmark-office in your home),",
                "or jdbc:postgresql:… for an office that several desks share."})
    private String store;

    @Option(names = "--desk", paramLabel = "DIR",
            description = "This desk's own folder where the store is a server (default: .bedmark-office in your home).")
    private Path own;

    @Option(names = "--person", paramLabel = "NAME",
            description = "Who does this, for the office's records (default: your login name).")
    private String person;

    @Spec(Spec.Target.MIXEE)
    private CommandSpec spec;

    OfficeStore open(Surroundings surroundings, ProgressLine progress) {
        OfficeOptions options = OfficeOptions.of(surroundings.clock()).withProgress(progress::at);
        Path home = Path.of(System.getProperty("user.home"), OfficeStore.USUAL_FOLDER);
        if (store != null && OfficeStore.isServer(store)) {
            return OfficeStore.open(store, own == null ? home : own, options);
        } else if (store != null && store.startsWith("jdbc:")) {
            throw new ParameterException(spec.commandLine(),
                    "--store '" + store + "' names a server that is not known; use a folder or jdbc:postgresql:…");
        }
        return OfficeStore.open(store == null ? home : Path.of(store), options);
    }

    String person() {
        return person == null ? System.getProperty("user.name", "") : person;
    }
}
