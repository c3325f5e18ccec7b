package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.survey.OfficeDeed;
import bedmark.survey.merge.ZoneId;
import java.math.BigDecimal;
import java.time.DateTimeException;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import java.util.UUID;

/** What the office did, as JSON. */
public final class OfficeDeedCodec {
    private OfficeDeedCodec() {
    }

    /** A deed's keys behind those of {@code head}. */
    static Branch write(OfficeDeed deed, Branch head) {
        if (deed instanceof OfficeDeed.PackReceived pack) {
            Branch branch = head.with("sha256", pack.sha256()).with("file", pack.file())
                    .with("bytes", Node.number(pack.bytes())).with("fingerprint", pack.fingerprint());
            branch = with(branch, "bundle", pack.bundle().map(UUID::toString));
            branch = pack.createdAt().isPresent()
                    ? branch.with("createdAt", Node.time(pack.createdAt().get())) : branch;
            return with(branch, "tablet", pack.device().map(UUID::toString)).with("tabletName", pack.deviceName());
        } else if (deed instanceof OfficeDeed.DeviceTrusted trusted) {
            return head.with("fingerprint", trusted.fingerprint()).with("name", trusted.name());
        } else if (deed instanceof OfficeDeed.FindingAnswered answered) {
            return with(zone(head, answered.zone()).with("finding", answered.finding())
                    .with("answer", answered.answer().code()).with("reason", answered.reason()),
                    "until", answered.until().map(LocalDate::toString)).with("content", answered.survey())
                    .with("before", answered.before());
        } else if (deed instanceof OfficeDeed.FindingReopened reopened) {
            return zone(head, reopened.zone()).with("finding", reopened.finding()).with("reason", reopened.reason());
        } else if (deed instanceof OfficeDeed.ActionSet action) {
            return with(zone(head.with("action", action.action().toString()), action.zone())
                    .with("finding", action.finding()).with("text", action.text()).with("owner", action.owner()),
                    "due", action.due().map(LocalDate::toString)).with("workOrder", action.workOrder())
                    .with("done", Node.flag(action.done()));
        } else if (deed instanceof OfficeDeed.RegisterChanged changed) {
            return head.with("plant", changed.plant()).with("head", changed.head()).with("why", changed.why());
        } else if (deed instanceof OfficeDeed.ClashSettled settled) {
            return zone(head, settled.zone()).with("setAside", new Node.Series(settled.setAside().stream()
                    .map(Node::text).toList())).with("reason", settled.reason());
        } else if (deed instanceof OfficeDeed.RoundSent sent) {
            return head.with("plant", sent.plant()).with("file", sent.file()).with("sha256", sent.sha256());
        }
        throw new IllegalStateException("a deed without a form on disk: " + deed.code());
    }

    /** The deed of that code; nothing where no deed has it. */
    static Optional<OfficeDeed> read(String code, Branch branch) {
        return Optional.ofNullable(switch (code) {
            case "pack-received" -> new OfficeDeed.PackReceived(text(branch, "sha256"), text(branch, "file"),
                    branch.number("bytes").map(BigDecimal::longValue).orElse(0L), text(branch, "fingerprint"),
                    branch.uuid("bundle"), branch.time("createdAt"), branch.uuid("tablet"),
                    text(branch, "tabletName"));
            case "device-trusted" -> new OfficeDeed.DeviceTrusted(text(branch, "fingerprint"), text(branch, "name"));
            case "finding-answered" -> new OfficeDeed.FindingAnswered(zone(branch), text(branch, "finding"),
                    OfficeDeed.Answer.ofCode(text(branch, "answer")).orElseThrow(() ->
                            new Refused(Defect.at(Pointer.of("answer"), "word-unknown", text(branch, "answer")))),
                    text(branch, "reason"), day(branch, "until"), text(branch, "content"),
                    branch.branch("before").orElseThrow(() -> absent("before")));
            case "finding-reopened" -> new OfficeDeed.FindingReopened(zone(branch), text(branch, "finding"),
                    text(branch, "reason"));
            case "action-set" -> new OfficeDeed.ActionSet(branch.uuid("action").orElseThrow(() -> absent("action")),
                    zone(branch), text(branch, "finding"), text(branch, "text"), text(branch, "owner"),
                    day(branch, "due"), text(branch, "workOrder"), branch.flag("done").orElse(false));
            case "register-changed" -> new OfficeDeed.RegisterChanged(text(branch, "plant"),
                    branch.branch("head").orElseThrow(() -> absent("head")), text(branch, "why"));
            case "clash-settled" -> new OfficeDeed.ClashSettled(zone(branch), texts(branch, "setAside"),
                    text(branch, "reason"));
            case "round-sent" -> new OfficeDeed.RoundSent(text(branch, "plant"), text(branch, "file"),
                    text(branch, "sha256"));
            default -> null;
        });
    }

    private static Branch zone(Branch branch, ZoneId zone) {
        return branch.with("plant", zone.plant()).with("transfer", zone.transfer());
    }

    private static ZoneId zone(Branch branch) {
        return new ZoneId(text(branch, "plant"), text(branch, "transfer"));
    }

    private static Branch with(Branch branch, String key, Optional<String> text) {
        return text.map(value -> branch.with(key, value)).orElse(branch);
    }

    private static String text(Branch branch, String key) {
        return branch.text(key).orElseThrow(() -> absent(key));
    }

    private static List<String> texts(Branch branch, String key) {
        return branch.series(key).stream().map(item -> {
            if (item instanceof Node.Text text) {
                return text.value();
            }
            throw new Refused(Defect.at(Pointer.of(key), "kind-wrong", "text"));
        }).toList();
    }

    private static Optional<LocalDate> day(Branch branch, String key) {
        return branch.text(key).map(text -> {
            try {
                return LocalDate.parse(text);
            } catch (DateTimeException e) {
                throw new Refused(Defect.at(Pointer.of(key), "time-wrong", text), e);
            }
        });
    }

    private static Refused absent(String key) {
        return new Refused(Defect.at(Pointer.of(key), "key-absent", key));
    }
}
