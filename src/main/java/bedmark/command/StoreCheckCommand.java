package bedmark.command;

import bedmark.index.Store;
import bedmark.index.StoreCheck;
import bedmark.index.StoreFacts;
import bedmark.journal.FileLayer;
import bedmark.journal.NamedPath;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.nio.file.Path;
import java.time.format.DateTimeFormatter;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** Proves a store without changing a byte. */
@Command(name = "check", mixinStandardHelpOptions = true,
        description = "Proves a store: every entry, the chain, the photos, and that the index says the same.",
        footer = {"", "Exit codes: 0 sound; 3 something is wrong, each in one line."})
final class StoreCheckCommand implements Callable<Integer> {
    private static final DateTimeFormatter TIME = DateTimeFormatter.ofPattern("yyyy-MM-dd HH:mm:ss");

    private final Surroundings surroundings;

    @Parameters(paramLabel = "DIR", description = "The store's folder.")
    private Path folder;

    @Mixin
    private PassphraseOption passphrase = new PassphraseOption();

    StoreCheckCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        NamedPath.requireFolder(folder);
        InputFile.requireNoOffice(folder, "check");
        StoreCheck check;
        try (ProgressLine progress = new ProgressLine(surroundings)) {
            check = Store.check(folder, FileLayer.disk(), passphrase.of(folder, surroundings), progress::at);
        }
        surroundings.say("command.store.counts", check.segments(), check.entries(), check.photos());
        tell(check.facts());
        check.torn().forEach(file ->
                surroundings.say("command.store.torn", file));
        check.defects().forEach(defect -> surroundings.err().println("bedmark: "
                + surroundings.wording().sentence(defect)));
        if (check.sound()) {
            surroundings.say("command.store.sound", folder);
        }
        return check.sound() ? ExitCode.FINE : ExitCode.UNREADABLE;
    }

    private void tell(StoreFacts facts) {
        Words words = surroundings.words();
        surroundings.out().println(words.text("command.store.saved", facts.savedAt().map(TIME::format)
                .orElse(words.text("store.never"))));
        surroundings.out().println(facts.freeBytes() <= 0 ? words.text("command.store.free-unknown")
                : words.text("command.store.free", Long.toString(facts.freeBytes() / 1_000_000)));
        surroundings.out().println(facts.backup().map(made -> words.text("store.backup.last", TIME.format(made.at()),
                Wording.plain(made.folder()), facts.notBackedUp())).orElseGet(() -> words.text("store.backup.none")));
        surroundings.out().println(words.text(facts.sealed() ? "command.store.sealed" : "command.store.plain"));
    }
}
