package bedmark.command;

import bedmark.dispatch.ReceiptBook;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.journal.NamedPath;
import bedmark.pack.Fingerprint;
import bedmark.pack.ReceiptReader;
import bedmark.pack.SignedReceipt;
import bedmark.survey.LevelWord;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Reads receipts of the office into a store. */
@Command(name = "receipt", mixinStandardHelpOptions = true,
        description = "Reads the office's receipts: surveys that it has with the same content count as received.",
        footer = {"", "Exit codes: 0 noted; 1 the office has some surveys with another content;",
            "2 bad use; 3 a receipt was refused, with the reason in one line."})
final class StoreReceiptCommand implements Callable<Integer> {
    private final Surroundings surroundings;

    @Spec
    private CommandSpec spec;

    @Parameters(index = "0", paramLabel = "DIR", description = "The store's folder.")
    private Path folder;

    @Parameters(index = "1", paramLabel = "RECEIPT", description = "A receipt, or a folder that holds receipts.")
    private Path given;

    @Option(names = "--trust", paramLabel = "FINGERPRINT",
            description = "Key of an office that this store does not know yet; compare it with the office first.")
    private List<String> trusted = List.of();

    @Mixin
    private PassphraseOption passphrase = new PassphraseOption();

    StoreReceiptCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() throws Exception {
        NamedPath.requireFolder(folder);
        InputFile.requireNoOffice(folder, "receipt");
        Set<Fingerprint> vouched = new HashSet<>();
        for (String typed : trusted) {
            vouched.add(Fingerprint.parse(typed).orElseThrow(() ->
                    new ParameterException(spec.commandLine(), "--trust '" + typed + "' is no fingerprint")));
        }
        boolean differing = false;
        try (Store store = Store.openExisting(folder, StoreOptions.of("tablet").withClock(surroundings.clock())
                .withLevels(new LevelWord()::of).withPassphrase(passphrase.of(folder, surroundings)))) {
            ReceiptBook book = new ReceiptBook(store);
            for (Path file : ReceiptBook.find(given)) {
                ReceiptBook.Outcome outcome = BedmarkCommand.in(file, () -> {
                    SignedReceipt signed = ReceiptReader.read(file);
                    book.requireTrusted(signed, vouched);
                    return book.note(signed, "");
                });
                surroundings.say("queue.receipt",
                        OfficeNameCommand.named(surroundings, outcome.receipt().office().name()),
                        outcome.received().size(), outcome.known().size());
                if (!outcome.differing().isEmpty()) {
                    surroundings.err().println("bedmark: " + surroundings.words().text("queue.receipt-differs",
                            outcome.differing().size()));
                    differing = true;
                }
            }
        }
        return differing ? ExitCode.DIFFERING : ExitCode.FINE;
    }
}
