package bedmark.command;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.StoreFolder;
import bedmark.index.StoreOptions;
import bedmark.survey.LevelWord;
import bedmark.vault.Passphrase;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Turns encryption on for a store, or changes its passphrase. */
@Command(name = "encrypt", mixinStandardHelpOptions = true,
        description = "Encrypts a store's journal, photos and index under a passphrase; with --change, changes the "
                + "passphrase of one that is encrypted. A lost passphrase can not be recovered by anybody.",
        footer = {"", "What lay there unencrypted is deleted, but a memory chip may keep traces of it until it is used",
            "again. Backups that were made before stay as they were made.",
            "Exit codes: 0 done; 3 not done, with the reason in one line."})
final class StoreEncryptCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Parameters(paramLabel = "DIR", description = "The store's folder.")
    private Path folder;

    @Option(names = "--passphrase-file", paramLabel = "FILE",
            description = "File that holds the new passphrase; without it the terminal asks.")
    private Optional<Path> fresh;

    @Option(names = "--change", description = "Changes the passphrase of a store that is encrypted.")
    private boolean change;

    @Option(names = "--old-passphrase-file", paramLabel = "FILE",
            description = "With --change: file that holds the passphrase until now; without it the terminal asks.")
    private Optional<Path> old;

    StoreEncryptCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        InputFile.requireNoOffice(folder, "encrypt");
        StoreOptions options = StoreOptions.of("tablet").withClock(surroundings.clock())
                .withLevels(new LevelWord()::of);
        String done = change ? "store.passphrase.changed"
                : new StoreFolder(folder, options).holdsStore() ? "store.encrypted" : "store.encrypted-new";
        if (change) {
            Passphrase until = old.map(PassphraseOption::read).or(() -> ask("store.passphrase").map(Passphrase::of))
                    .orElseThrow(StoreEncryptCommand::missing);
            new StoreFolder(folder, options).changePassphrase(until, chosen());
        } else {
            Passphrase passphrase = chosen();
            try (ProgressLine progress = new ProgressLine(surroundings)) {
                new StoreFolder(folder, options.withProgress(progress::at)).seal(passphrase);
            }
        }
        surroundings.say(done, folder);
        surroundings.say("store.unlock.lost");
        return ExitCode.FINE;
    }

    /** The new one; asked for twice, since nobody sees what is typed. */
    private Passphrase chosen() {
        if (fresh.isPresent()) {
            return Passphrase.chosen(PassphraseOption.text(fresh.get()));
        }
        Passphrase first = Passphrase.chosen(ask("store.passphrase.new").orElseThrow(StoreEncryptCommand::missing));
        Passphrase again = Passphrase.of(ask("store.passphrase.again").orElseThrow(StoreEncryptCommand::missing));
        if (!first.sameAs(again)) {
            throw new Refused(Defect.in("", "passphrases-differ"));
        }
        return first;
    }

    private Optional<String> ask(String key) {
        return PassphraseOption.ask(surroundings.words().text(key));
    }

    private static Refused missing() {
        return new Refused(Defect.in("", "passphrase-missing"));
    }
}
