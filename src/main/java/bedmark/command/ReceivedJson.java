package bedmark.command;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.json.JsonWriter;
import bedmark.office.Received;
import bedmark.survey.merge.Clash;
import bedmark.survey.merge.Copy;
import bedmark.wording.Wording;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Optional;

/** What came of packs as JSON lines; what is not known is absent. */
final class ReceivedJson {
    private final Wording wording;

    ReceivedJson(Wording wording) {
        this.wording = wording;
    }

    /** @param receipt where the receipt was written */
    String line(Received received, Optional<Path> receipt) {
        Branch branch = document(received);
        branch = receipt.isPresent() ? branch.with("receipt", receipt.get().toString()) : branch;
        return new String(JsonWriter.compact(branch), StandardCharsets.UTF_8);
    }

    private Branch document(Received received) {
        if (received instanceof Received.Taken taken) {
            return in("received", taken.file(), taken.pack(), taken.device(), taken.fingerprint())
                    .with("newSurveys", Node.number(taken.fresh())).with("knownSurveys", Node.number(taken.known()))
                    .with("clockAheadS", Node.number(taken.clock()))
                    .with("clashes", new Node.Series(taken.clashes().stream().map(ReceivedJson::document).toList()));
        } else if (received instanceof Received.AlreadyHere here) {
            return in("known", here.file(), here.pack(), here.device(), here.fingerprint());
        }
        return new RefusalText(wording).document((Received.Turned) received).with("outcome", "refused");
    }

    private static Branch in(String outcome, Path file, String sha256, String tablet, String fingerprint) {
        Branch branch = Branch.EMPTY.with("outcome", outcome).with("file", file.toString()).with("sha256", sha256);
        // A tablet without a name goes by its fingerprint.
        return (tablet.equals(fingerprint) ? branch : branch.with("tablet", tablet)).with("fingerprint", fingerprint);
    }

    private static Node document(Clash clash) {
        return Branch.EMPTY.with("kind", clash.kind().code())
                .with("transfer", clash.sides().get(0).zone().transfer())
                .with("sides", new Node.Series(clash.sides().stream().map(ReceivedJson::document).toList()));
    }

    private static Node document(Copy side) {
        return Branch.EMPTY.with("digest", side.digest()).with("survey", side.id().toString())
                .with("revision", Node.number(side.revision()));
    }
}
