package bedmark.command;

import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.journal.NamedPath;
import bedmark.survey.LevelWord;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** Throws a store's index away and makes it anew from the journal. */
@Command(name = "rebuild", mixinStandardHelpOptions = true,
        description = "Makes a store's database anew from its journal; the journal itself is never touched.")
final class StoreRebuildCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Parameters(paramLabel = "DIR", description = "The store's folder.")
    private Path folder;

    @Mixin
    private PassphraseOption passphrase = new PassphraseOption();

    StoreRebuildCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        NamedPath.requireFolder(folder);
        InputFile.requireNoOffice(folder, "rebuild");
        long entries;
        try (ProgressLine progress = new ProgressLine(surroundings)) {
            entries = Store.rebuild(folder, StoreOptions.of("").withClock(surroundings.clock())
                    .withLevels(new LevelWord()::of).withPassphrase(passphrase.of(folder, surroundings))
                    .withProgress(progress::at));
        }
        surroundings.say("command.store.rebuilt", folder, entries);
        return ExitCode.FINE;
    }
}
