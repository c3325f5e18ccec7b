package bedmark.command;

import static bedmark.command.BedmarkCommand.in;

import bedmark.document.Branch;
import bedmark.journal.NamedPath;
import bedmark.pack.FileKind;
import bedmark.pack.ReceiptReader;
import bedmark.pack.RoundFile;
import bedmark.pack.SignedReceipt;
import bedmark.survey.Register;
import java.nio.file.Path;

/** Shows one file in a window of its own; without a display it says so and prints what is in the file. */
final class FileShowing {
    private final Surroundings surroundings;

    FileShowing(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    int show(Path file) throws Exception {
        NamedPath.requireFile(file);
        if (surroundings.showing().show(file)) {
            return ExitCode.FINE;
        }
        FileKind kind = FileKind.of(file);
        surroundings.say("command.no-display-file");
        return switch (kind) {
            case PACK -> PackVerifyCommand.verify(surroundings, file);
            case ROUND -> round(file);
            case RECEIPT -> receipt(file);
        };
    }

    private int round(Path file) throws Exception {
        RoundFile read = in(file, () -> RoundFile.read(file));
        Branch document = read.document();
        String office = document.branch("office").flatMap(one -> one.text("name")).orElse("");
        surroundings.say("command.file.round", file, named(office),
                document.branches("rounds").size(), new Register(document.branch("plant").orElseThrow()).name(),
                read.fingerprint());
        surroundings.say("arrival.belongs.round", surroundings.words().text("office.take.button"));
        return ExitCode.FINE;
    }

    private int receipt(Path file) throws Exception {
        SignedReceipt read = in(file, () -> ReceiptReader.read(file));
        surroundings.say("command.file.receipt", file, named(read.receipt().office().name()),
                read.receipt().items().size(), read.receipt().pack(), read.fingerprint());
        surroundings.say("arrival.belongs.receipt", surroundings.words().text("queue.read-receipts"),
                surroundings.words().text("screen.queue.title"));
        return ExitCode.FINE;
    }

    private String named(String office) {
        return office.isBlank() ? surroundings.words().text("arrival.nameless") : office;
    }
}
