package bedmark.screen.notes;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.journal.NotSaved;
import bedmark.photo.PhotoFacts;
import bedmark.screen.Workplace;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.PlannedAction;
import bedmark.survey.QueueState;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.time.ZoneId;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.UUID;
import java.util.stream.Stream;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;

/** Actions and photos of one survey, and what the office and the last survey say about its transfer point. */
public final class NotesModel {
    private final Workplace workplace;
    private final Optional<Branch> last;
    private final ReadOnlyObjectWrapper<SurveyHistory> history;
    private final ReadOnlyObjectWrapper<Optional<Defect>> trouble = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final CameraModel camera;
    private int onTheWay;

    /**
     * Opens the notes of a survey.
     *
     * @param last the last finished survey of the same transfer point
     */
    public NotesModel(Workplace workplace, SurveyHistory history, Optional<Branch> last) {
        this.workplace = workplace;
        this.last = last;
        this.history = new ReadOnlyObjectWrapper<>(history);
        this.camera = new CameraModel(workplace, () -> photos().stream()
                .flatMap(photo -> photo.text("sha256").stream()).toList());
    }

    /** The survey as the journal has it. */
    public ReadOnlyObjectProperty<SurveyHistory> historyProperty() {
        return history.getReadOnlyProperty();
    }

    /** The newest photos of the watched folder. */
    public CameraModel camera() {
        return camera;
    }

    /** Why the last photo was not attached. */
    public ReadOnlyObjectProperty<Optional<Defect>> troubleProperty() {
        return trouble.getReadOnlyProperty();
    }

    /** Whether the survey still takes actions and photos. */
    public boolean open() {
        return history.get().state() == QueueState.OPEN;
    }

    public Register.Transfer transfer() {
        return workplace.site().register().transfer(survey().transfer()).orElseThrow();
    }

    private Survey survey() {
        return history.get().survey();
    }

    public List<PlannedAction> actions() {
        return PlannedAction.of(survey().document(), PlannedAction.KEY);
    }

    /** What the office knows to be open here and what the last survey left open, without what this one speaks of. */
    public List<PlannedAction> openBefore() {
        List<PlannedAction> known = new ArrayList<>(actions());
        List<PlannedAction> before = new ArrayList<>();
        Stream.concat(PlannedAction.of(transfer().document(), "openActions").stream(),
                        last.stream().flatMap(survey -> PlannedAction.of(survey, PlannedAction.KEY).stream()))
                .filter(action -> !action.done() && !action.what().isEmpty()).forEach(action -> {
                    if (known.stream().noneMatch(action::sameAs)) {
                        known.add(action);
                        before.add(action);
                    }
                });
        return before;
    }

    /** Something that the office wants whoever stands here to know. */
    public record OfficeNote(String text, String by, String at) {
    }

    public List<OfficeNote> officeNotes() {
        return transfer().document().series("officeNotes").stream().filter(Branch.class::isInstance)
                .map(node -> (Branch) node).map(note -> new OfficeNote(PlannedAction.NONE.with("what",
                        note.text("text").orElse("")).what(), note.text("by").orElse(""), note.text("at").orElse("")))
                .filter(note -> !note.text().isEmpty()).toList();
    }

    /** An action about which nothing is said but where: at this asset, in a week. */
    public PlannedAction fresh() {
        return PlannedAction.NONE.with("assetId", transfer().document().text("assetId").orElse(""))
                .withBy(Optional.of(today().plusWeeks(1)));
    }

    public LocalDate today() {
        return LocalDate.now(workplace.clock());
    }

    /** Puts an action in the place of another, or behind the last one. */
    public void put(OptionalInt place, PlannedAction action) {
        List<PlannedAction> all = new ArrayList<>(actions());
        if (place.isPresent()) {
            all.set(place.getAsInt(), action);
        } else {
            all.add(action);
        }
        save(all);
    }

    public void remove(int place) {
        List<PlannedAction> all = new ArrayList<>(actions());
        all.remove(place);
        save(all);
    }

    private void save(List<PlannedAction> all) {
        save(new Act.AnswerSet(survey().id(), Pointer.of(PlannedAction.KEY), all.isEmpty() ? Optional.empty()
                : Optional.of(PlannedAction.series(all))));
    }

    public List<Branch> photos() {
        return survey().photos();
    }

    /** Writes a photo's caption. */
    public void caption(String photo, String caption) {
        save(new Act.PhotoCaptioned(survey().id(), photo, caption.strip()));
    }

    /** Takes a photo off the survey. */
    public void detach(String photo) {
        save(new Act.PhotoDetached(survey().id(), photo));
    }

    private void save(Act act) {
        if (open()) {
            workplace.scribe().save(person(), act, this::taken);
        }
    }

    private void taken(Entry entry) {
        SurveyHistory.after(Optional.of(history.get()), entry).ifPresent(history::set);
    }

    /** How many photos are being attached now. */
    public int attaching() {
        return onTheWay;
    }

    /** Copies a photo into the store and attaches it, beside the screen; the file stays where it is, untouched. */
    public void attach(Path file) {
        if (!open()) {
            return;
        }
        onTheWay++;
        trouble.set(Optional.empty());
        UUID survey = survey().id();
        String person = person();
        workplace.longWork().execute(() -> {
            Optional<Entry> attached = Optional.empty();
            Optional<Defect> failed = Optional.empty();
            try {
                failed = PhotoFacts.doubt(file);
                if (failed.isEmpty()) {
                    attached = Optional.of(workplace.store().attachPhoto(file, survey, person, takenAt(file), ""));
                }
            } catch (IOException e) {
                failed = Optional.of(Defect.in(file.toString(), "photo-unreadable"));
            } catch (Refused e) {
                failed = Optional.of(e.defect());
            } catch (NotSaved e) {
                failed = Optional.of(e.defect());
            }
            Optional<Entry> entry = attached;
            Optional<Defect> why = failed;
            workplace.screen().execute(() -> {
                onTheWay--;
                trouble.set(why);
                entry.ifPresent(this::taken);
            });
        });
    }

    private OffsetDateTime takenAt(Path file) throws IOException {
        ZoneId zone = workplace.clock().getZone();
        OffsetDateTime now = OffsetDateTime.now(workplace.clock());
        OffsetDateTime modified = Files.getLastModifiedTime(file).toInstant().atZone(zone).toOffsetDateTime();
        return PhotoFacts.of(file).takenAt(zone, modified, now).truncatedTo(ChronoUnit.SECONDS);
    }

    private String person() {
        return workplace.preferences().person();
    }
}
