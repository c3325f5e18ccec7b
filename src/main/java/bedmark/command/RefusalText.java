package bedmark.command;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.json.JsonWriter;
import bedmark.office.Received;
import bedmark.office.Refusal;
import bedmark.office.Sender;
import bedmark.wording.Wording;
import java.nio.charset.StandardCharsets;
import java.util.Optional;

/** A pack that was refused, as a line and as JSON. */
final class RefusalText {
    private final Wording wording;

    RefusalText(Wording wording) {
        this.wording = wording;
    }

    /** Why it was refused and whom it is from, in one line. */
    String reason(Received.Turned turned) {
        StringBuilder line = new StringBuilder(wording.sentence(turned.why()));
        turned.unsaid().ifPresent(sender -> line.append(' ')
                .append(wording.text("office.sender." + sender.code(), sender.told())));
        if (!turned.kept()) {
            line.append(' ').append(wording.text("office.receive.unkept"));
        }
        return Wording.plain(line.toString());
    }

    /** The same, with the file that it is about. */
    String about(Received.Turned turned) {
        return BedmarkCommand.about(turned.file(), turned.why(), reason(turned));
    }

    String line(Refusal refusal) {
        String again = refusal.first().equals(refusal.last()) ? ""
                : " " + wording.text("office.refused.first", wording.moment(refusal.first()));
        return Wording.plain(wording.moment(refusal.last()) + ", " + about(refusal.turned()) + again);
    }

    String json(Refusal refusal) {
        return new String(JsonWriter.compact(document(refusal.turned()).with("firstAt", Node.time(refusal.first()))
                .with("lastAt", Node.time(refusal.last()))), StandardCharsets.UTF_8);
    }

    /** As an object; what is not known is absent. */
    Branch document(Received.Turned turned) {
        Branch branch = Branch.EMPTY.with("file", turned.file().toString());
        if (turned.content().isPresent()) {
            branch = branch.with("sha256", turned.content().get().sha256())
                    .with("bytes", Node.number(turned.content().get().bytes()));
        }
        branch = with(branch, "sender", turned.sender().map(sender -> sender.fingerprint().isEmpty() ? "unproved"
                : sender.trusted() ? "trusted" : "untrusted"));
        branch = with(branch, "tablet", turned.sender().flatMap(Sender::name));
        return with(branch, "fingerprint", turned.fingerprint()).with("code", turned.why().code())
                .with("reason", wording.sentence(turned.why()));
    }

    private static Branch with(Branch branch, String key, Optional<String> text) {
        return text.isPresent() ? branch.with(key, text.get()) : branch;
    }
}
