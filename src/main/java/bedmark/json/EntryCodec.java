package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.UUID;

/** Journal entries as JSON: who, when and which device around one act. */
public final class EntryCodec {
    private EntryCodec() {
    }

    /** The payload of an entry. */
    public static byte[] write(Entry entry) {
        Map<String, Node> head = new LinkedHashMap<>();
        head.put("sequence", Node.number(entry.sequence()));
        head.put("at", Node.time(entry.at()));
        head.put("person", Node.text(entry.person()));
        head.put("device", Node.text(entry.device().toString()));
        head.put("act", Node.text(entry.act().code()));
        entry.act().about().ifPresent(survey -> head.put("survey", Node.text(survey.toString())));
        return JsonWriter.compact(act(entry.act(), new Branch(head)));
    }

    private static Branch act(Act act, Branch branch) {
        if (act instanceof Act.RegisterTaken taken) {
            return branch.with("register", taken.register());
        } else if (act instanceof Act.SurveyTaken taken) {
            return branch.with("document", taken.document());
        } else if (act instanceof Act.WalkStarted started) {
            return branch.with("round", started.round());
        } else if (act instanceof Act.WalkFinished finished) {
            return branch.with("round", finished.round());
        } else if (act instanceof Act.SurveyOpened opened) {
            return branch.with("document", opened.document());
        } else if (act instanceof Act.RevisionOpened opened) {
            return branch.with("supersedes", opened.supersedes().toString()).with("why", opened.why())
                    .with("document", opened.document());
        } else if (act instanceof Act.AnswerSet set) {
            Branch placed = branch.with("where", set.where().toString());
            return set.answer().map(answer -> placed.with("answer", answer)).orElse(placed);
        } else if (act instanceof Act.AnswerUndone undone) {
            return branch.with("undone", Node.number(undone.undone()));
        } else if (act instanceof Act.PhotoAttached attached) {
            return branch.with("photo", attached.photo());
        } else if (act instanceof Act.PhotoCaptioned captioned) {
            return branch.with("photo", captioned.photo()).with("caption", captioned.caption());
        } else if (act instanceof Act.PhotoDetached detached) {
            return branch.with("photo", detached.photo());
        } else if (act instanceof Act.PointProposed proposed) {
            return branch.with("id", proposed.id().toString()).with("proposal", proposed.proposal());
        } else if (act instanceof Act.SurveyCompleted completed) {
            Branch signed = branch.with("signedOffBy", completed.signedOffBy());
            return completed.completedAt().map(at -> signed.with("completedAt", Node.time(at))).orElse(signed);
        } else if (act instanceof Act.SurveysQueued queued) {
            return branch.with("surveys", ids(queued.surveys()));
        } else if (act instanceof Act.PackExported exported) {
            return branch.with("surveys", ids(exported.surveys())).with("pack", exported.pack())
                    .with("sha256", exported.sha256()).with("folder", exported.folder());
        } else if (act instanceof Act.ReceiptNoted noted) {
            return branch.with("surveys", ids(noted.surveys())).with("receipt", noted.receipt());
        } else if (act instanceof Act.OfficeActed office) {
            return OfficeDeedCodec.write(office.deed(), branch);
        }
        if (act instanceof Act.BackupMade made) {
            return branch.with("folder", made.folder()).with("upTo", Node.number(made.upTo()))
                    .with("sha256", made.sha256());
        }
        throw new IllegalStateException("an act without a form on disk: " + act.code());
    }

    /**
     * Reads a payload back.
     *
     * @throws Refused where it is no entry that this version knows
     */
    public static Entry read(byte[] payload) {
        Branch branch = JsonReader.readOwn(payload).root();
        return new Entry(number(branch, "sequence"), branch.time("at").orElseThrow(() -> absent("at")),
                text(branch, "person"), uuid(branch, "device"), act(branch));
    }

    private static Act act(Branch branch) {
        String code = text(branch, "act");
        return switch (code) {
            case "register-taken" -> new Act.RegisterTaken(branch(branch, "register"));
            case "survey-taken" -> new Act.SurveyTaken(uuid(branch, "survey"), branch(branch, "document"));
            case "walk-started" -> new Act.WalkStarted(text(branch, "round"));
            case "walk-finished" -> new Act.WalkFinished(text(branch, "round"));
            case "survey-opened" -> new Act.SurveyOpened(uuid(branch, "survey"), branch(branch, "document"));
            case "revision-opened" -> new Act.RevisionOpened(uuid(branch, "survey"), uuid(branch, "supersedes"),
                    text(branch, "why"), branch(branch, "document"));
            case "answer-set" -> new Act.AnswerSet(uuid(branch, "survey"), Pointer.parse(text(branch, "where")),
                    branch.get("answer"));
            case "answer-undone" -> new Act.AnswerUndone(uuid(branch, "survey"), number(branch, "undone"));
            case "photo-attached" -> new Act.PhotoAttached(uuid(branch, "survey"), branch(branch, "photo"));
            case "photo-captioned" -> new Act.PhotoCaptioned(uuid(branch, "survey"), text(branch, "photo"),
                    text(branch, "caption"));
            case "photo-detached" -> new Act.PhotoDetached(uuid(branch, "survey"), text(branch, "photo"));
            case "point-proposed" -> new Act.PointProposed(uuid(branch, "id"), branch(branch, "proposal"));
            case "survey-completed" -> new Act.SurveyCompleted(uuid(branch, "survey"), text(branch, "signedOffBy"),
                    branch.time("completedAt"));
            case "surveys-queued" -> new Act.SurveysQueued(ids(branch));
            case "pack-exported" -> new Act.PackExported(ids(branch), text(branch, "pack"), text(branch, "sha256"),
                    text(branch, "folder"));
            case "receipt-noted" -> new Act.ReceiptNoted(ids(branch), branch(branch, "receipt"));
            case "backup-made" -> new Act.BackupMade(text(branch, "folder"), number(branch, "upTo"),
                    text(branch, "sha256"));
            default -> new Act.OfficeActed(OfficeDeedCodec.read(code, branch).orElseThrow(() ->
                    new Refused(Defect.at(Pointer.of("act"), "word-unknown", code))));
        };
    }

    private static Node ids(List<UUID> surveys) {
        return new Node.Series(surveys.stream().map(id -> Node.text(id.toString())).toList());
    }

    private static List<UUID> ids(Branch branch) {
        List<UUID> ids = new ArrayList<>();
        for (Node item : branch.series("surveys")) {
            ids.add(uuid(Branch.EMPTY.with("surveys", item), "surveys"));
        }
        return ids;
    }

    private static String text(Branch branch, String key) {
        return branch.text(key).orElseThrow(() -> absent(key));
    }

    private static UUID uuid(Branch branch, String key) {
        return branch.uuid(key).orElseThrow(() -> absent(key));
    }

    private static Branch branch(Branch branch, String key) {
        return branch.branch(key).orElseThrow(() -> absent(key));
    }

    private static long number(Branch branch, String key) {
        try {
            return branch.number(key).orElseThrow(() -> absent(key)).longValueExact();
        } catch (ArithmeticException e) {
            throw new Refused(Defect.at(Pointer.of(key), "kind-wrong", "whole-number"), e);
        }
    }

    private static Refused absent(String key) {
        return new Refused(Defect.at(Pointer.of(key), "key-absent", key));
    }
}
