package bedmark.command;

import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.journal.NamedPath;
import bedmark.survey.LevelWord;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Copies a store to a folder or stick and proves the copy. */
@Command(name = "backup", mixinStandardHelpOptions = true,
        description = "Copies a store's journal and photos to a folder or stick and proves the copy; an earlier backup "
                + "there is brought up to date. The backup of an encrypted store stays encrypted.",
        footer = {"", "Exit codes: 0 made and proved; 3 not made, with the reason in one line."})
final class StoreBackupCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Parameters(paramLabel = "DIR", description = "The store's folder.")
    private Path folder;

    @Option(names = "--to", paramLabel = "DIR", required = true,
            description = "Folder or stick; the backup gets a folder of its own in it.")
    private Path target;

    @Mixin
    private PassphraseOption passphrase = new PassphraseOption();

    StoreBackupCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        NamedPath.requireFolder(folder);
        InputFile.requireNoOffice(folder, "backup");
        NamedPath.requireFolder(target);
        StoreOptions options = StoreOptions.of("tablet").withClock(surroundings.clock())
                .withLevels(new LevelWord()::of).withPassphrase(passphrase.of(folder, surroundings));
        Path made;
        try (Store store = Store.openExisting(folder, options);
             ProgressLine progress = new ProgressLine(surroundings)) {
            made = store.backup(target, "", progress::at);
        }
        surroundings.say("store.backed-up", made);
        return ExitCode.FINE;
    }
}
