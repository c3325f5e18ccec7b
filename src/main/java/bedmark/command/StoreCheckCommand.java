package bedmark.command;

import bedmark.index.Store;
import bedmark.index.StoreCheck;
import bedmark.journal.FileLayer;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Parameters;

/** Proves a store without changing a byte. */
@Command(name = "check", mixinStandardHelpOptions = true,
        description = "Proves a store: every entry, the chain, the photos, and that the index says the same.",
        footer = {"", "Exit codes: 0 sound; 3 something is wrong, each in one line."})
final class StoreCheckCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Parameters(paramLabel = "DIR", description = "The store's folder.")
    private Path folder;

    StoreCheckCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        StoreCheck check;
        try (ProgressLine progress = new ProgressLine(surroundings)) {
            check = Store.check(folder, FileLayer.disk(), progress::at);
        }
        surroundings.out().println(surroundings.words().text("command.store.counts", check.segments(),
                check.entries(), check.photos()));
        check.torn().forEach(file ->
                surroundings.out().println(surroundings.words().text("command.store.torn", file)));
        check.defects().forEach(defect -> surroundings.err().println("bedmark: "
                + surroundings.wording().sentence(defect)));
        if (check.sound()) {
            surroundings.out().println(surroundings.words().text("command.store.sound", folder));
        }
        return check.sound() ? ExitCode.FINE : ExitCode.UNREADABLE;
    }
}
