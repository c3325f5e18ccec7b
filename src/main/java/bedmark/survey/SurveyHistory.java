package bedmark.survey;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A survey as the fold of its journal entries: what it holds now, how far it is on its way, and every change.
 *
 * @param base    the survey without its answers: as it was opened, with its photos
 * @param survey  the survey as it stands
 * @param state   how far it is on its way
 * @param changes every answer that was set, oldest first, undone ones among them
 */
public record SurveyHistory(Branch base, Survey survey, QueueState state, List<Change> changes) {

    /** Where a survey tells what it and its predecessors correct, oldest first. */
    public static final String REVISIONS = "revisions";

    /**
     * One answer as it was set.
     *
     * @param before what stood there
     * @param after  what stands there since; nothing where it was cleared
     * @param undone whether the change was taken back
     */
    public record Change(long sequence, OffsetDateTime at, String person, Pointer where, Optional<Node> before,
                         Optional<Node> after, boolean undone) {
        private Change takenBack() {
            return new Change(sequence, at, person, where, before, after, true);
        }
    }

    public SurveyHistory {
        changes = List.copyOf(changes);
    }

    /**
     * The history after one more entry of the same survey.
     *
     * @throws IllegalStateException where the act is impossible in the survey's state
     */
    public static Optional<SurveyHistory> after(Optional<SurveyHistory> history, Entry entry) {
        Act act = entry.act();
        if (act instanceof Act.SurveyOpened opened) {
            return Optional.of(begun(opened.document(), QueueState.OPEN));
        }
        if (act instanceof Act.RevisionOpened opened) {
            return Optional.of(begun(chained(entry, opened), QueueState.OPEN));
        }
        if (act instanceof Act.SurveyTaken taken) {
            return Optional.of(begun(taken.document(), QueueState.RECEIVED));
        }
        return history.map(known -> known.next(entry));
    }

    private static SurveyHistory begun(Branch document, QueueState state) {
        return new SurveyHistory(document, new Survey(document), state, List.of());
    }

    /** A revision tells what it corrects, why and by whom, after what the corrected one tells of its own past. */
    private static Branch chained(Entry entry, Act.RevisionOpened opened) {
        List<Node> revisions = new ArrayList<>(opened.document().series(REVISIONS));
        String corrected = opened.supersedes().toString();
        for (Branch earlier : opened.document().branches(REVISIONS)) {
            if (earlier.text("id").filter(corrected::equals).isPresent()) {
                return opened.document();
            }
        }
        revisions.add(Branch.EMPTY.with("id", corrected)
                .with("revision", Node.number(new Survey(opened.document()).revision() - 1L))
                .with("why", opened.why()).with("correctedBy", entry.person())
                .with("correctedAt", Node.time(entry.at())));
        return opened.document().with(REVISIONS, new Node.Series(revisions));
    }

    /** The newest change that still counts: what an undo would take back. */
    public Optional<Change> newest() {
        for (int i = changes.size() - 1; i >= 0; i--) {
            if (!changes.get(i).undone()) {
                return Optional.of(changes.get(i));
            }
        }
        return Optional.empty();
    }

    /** The changes of one place, and of what lies below it, oldest first. */
    public List<Change> of(Pointer where) {
        return changes.stream().filter(change -> where.holds(change.where())).toList();
    }

    private SurveyHistory next(Entry entry) {
        Act act = entry.act();
        if (act instanceof Act.AnswerSet set) {
            return answered(entry, set);
        }
        if (act instanceof Act.AnswerUndone undone) {
            return undone(undone.undone());
        }
        if (act instanceof Act.PhotoAttached attached) {
            List<Branch> photos = new ArrayList<>(survey.photos());
            photos.add(attached.photo());
            return withPhotos(photos);
        }
        if (act instanceof Act.PhotoCaptioned captioned) {
            return withPhotos(survey.photos().stream().map(photo -> !isPhoto(photo, captioned.photo()) ? photo
                    : captioned.caption().isBlank() ? photo.without("caption")
                    : photo.with("caption", captioned.caption())).toList(), captioned.photo());
        }
        if (act instanceof Act.PhotoDetached detached) {
            return withPhotos(survey.photos().stream().filter(photo -> !isPhoto(photo, detached.photo())).toList(),
                    detached.photo());
        }
        if (act instanceof Act.SurveyCompleted completed) {
            Branch finished = survey.document().with("completedAt",
                    Node.time(completed.completedAt().orElse(entry.at())));
            Branch signed = completed.signedOffBy().isBlank() ? finished
                    : finished.with("signedOffBy", completed.signedOffBy());
            return new SurveyHistory(base, new Survey(signed), state.moveTo(QueueState.COMPLETED), changes);
        }
        if (act instanceof Act.SurveysQueued) {
            return moved(QueueState.QUEUED);
        }
        if (act instanceof Act.PackExported) {
            return moved(QueueState.EXPORTED);
        }
        if (act instanceof Act.ReceiptNoted) {
            return moved(QueueState.RECEIVED);
        }
        return this;
    }

    private static boolean isPhoto(Branch photo, String id) {
        return photo.text("id").equals(Optional.of(id));
    }

    private SurveyHistory withPhotos(List<Branch> photos, String changed) {
        if (survey.photos().stream().noneMatch(photo -> isPhoto(photo, changed))) {
            throw new IllegalStateException("photo " + changed + " is not attached");
        }
        return withPhotos(photos);
    }

    /** Photos belong to what undoing an answer starts from, so that it takes none away. */
    private SurveyHistory withPhotos(List<Branch> photos) {
        requireOpen();
        Node.Series series = new Node.Series(List.copyOf(photos));
        return new SurveyHistory(base.with("photos", series), new Survey(survey.document().with("photos", series)),
                state, changes);
    }

    private SurveyHistory answered(Entry entry, Act.AnswerSet set) {
        requireOpen();
        Branch document = survey.document();
        Optional<Node> before = document.at(set.where());
        List<Change> longer = new ArrayList<>(changes);
        longer.add(new Change(entry.sequence(), entry.at(), entry.person(), set.where(), before, set.answer(), false));
        return new SurveyHistory(base, new Survey(put(document, set.where(), set.answer())), state, longer);
    }

    /** Takes one change back: what the other changes make of the opened survey stands. */
    private SurveyHistory undone(long sequence) {
        requireOpen();
        List<Change> marked = new ArrayList<>();
        boolean found = false;
        Branch document = base;
        for (Change change : changes) {
            boolean meant = change.sequence() == sequence && !change.undone();
            found |= meant;
            Change kept = meant ? change.takenBack() : change;
            marked.add(kept);
            if (!kept.undone()) {
                document = put(document, kept.where(), kept.after());
            }
        }
        if (!found) {
            throw new IllegalStateException("entry " + sequence + " is no change that can be undone");
        }
        return new SurveyHistory(base, new Survey(document), state, marked);
    }

    private static Branch put(Branch document, Pointer where, Optional<Node> answer) {
        return answer.map(node -> document.with(where, node)).orElseGet(() -> document.without(where));
    }

    private SurveyHistory moved(QueueState next) {
        return new SurveyHistory(base, survey, state.moveTo(next), changes);
    }

    private void requireOpen() {
        if (state != QueueState.OPEN) {
            throw new IllegalStateException("survey " + survey.id() + " is completed; a correction is a new revision");
        }
    }
}
