package bedmark.command;

import bedmark.index.Restored;
import bedmark.index.StoreFolder;
import bedmark.index.StoreOptions;
import bedmark.journal.NamedPath;
import bedmark.survey.LevelWord;
import bedmark.vault.Passphrase;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Brings a backup to this device. */
@Command(name = "restore", mixinStandardHelpOptions = true,
        description = "Makes a store of a backup, with its whole history and an identity of its own; where the folder "
                + "holds a store already, that one takes the backup's surveys over. Doing it again changes nothing.",
        footer = {"", "Exit codes: 0 restored; 1 some surveys are there with another content and were left alone;",
            "3 not restored, with the reason in one line."})
final class StoreRestoreCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Parameters(paramLabel = "BACKUP", description = "The backup's folder, or the one that holds it.")
    private Path backup;

    @Option(names = "--to", paramLabel = "DIR", required = true, description = "The store's folder.")
    private Path folder;

    @Option(names = "--backup-passphrase-file", paramLabel = "FILE",
            description = "File that holds the passphrase of the backup, where it is not that of the store.")
    private Optional<Path> backupPassphrase;

    @Mixin
    private PassphraseOption passphrase = new PassphraseOption();

    StoreRestoreCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        NamedPath.requireFolder(backup);
        InputFile.requireNoOffice(folder, "restore");
        NamedPath.requireFolderOrNothing(folder);
        StoreOptions options = StoreOptions.of("tablet").withClock(surroundings.clock())
                .withLevels(new LevelWord()::of);
        boolean sealed = new StoreFolder(folder, options).sealed();
        Optional<Passphrase> given = passphrase.of(folder, surroundings);
        Optional<Passphrase> ofBackup = backupPassphrase.map(PassphraseOption::read).or(() -> given)
                .or(() -> new StoreFolder(folder, options).takesPassphrase(backup)
                        ? PassphraseOption.ask(surroundings.words().text("store.passphrase.backup"))
                                .map(Passphrase::of) : Optional.empty());
        Restored restored;
        try (ProgressLine progress = new ProgressLine(surroundings)) {
            restored = new StoreFolder(folder, options.withProgress(progress::at)
                    .withPassphrase(sealed ? given : Optional.empty())).restore(backup, ofBackup, "");
        }
        surroundings.say(restored.fresh() ? "store.restored" : "store.taken-over",
                restored.taken().size(), restored.known().size(), folder);
        if (!restored.differing().isEmpty()) {
            surroundings.err().println("bedmark: "
                    + surroundings.words().text("store.differing", restored.differing().size()));
        }
        return restored.differing().isEmpty() ? ExitCode.FINE : ExitCode.DIFFERING;
    }
}
