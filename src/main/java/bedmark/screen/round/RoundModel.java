package bedmark.screen.round;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.index.Store;
import bedmark.index.SurveyLine;
import bedmark.index.SurveyQuery;
import bedmark.screen.Site;
import bedmark.screen.Workplace;
import bedmark.survey.Act;
import bedmark.survey.InspectionStatus;
import bedmark.survey.PlannedAction;
import bedmark.survey.QueueState;
import bedmark.survey.Register;
import bedmark.survey.Round;
import bedmark.survey.Survey;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import java.util.function.BiConsumer;
import java.util.function.Consumer;
import javafx.beans.property.BooleanProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleBooleanProperty;
import javafx.beans.property.SimpleStringProperty;
import javafx.beans.property.StringProperty;

/** The round that is walked: its stops in walking order, what was found, what is still to do. */
public final class RoundModel {
    private final Workplace workplace;
    private final Round round;
    private final StringProperty search = new SimpleStringProperty("");
    private final BooleanProperty waitingOnly = new SimpleBooleanProperty();
    private final ReadOnlyObjectWrapper<List<RoundRow>> rows = new ReadOnlyObjectWrapper<>(List.of());
    private final ReadOnlyObjectWrapper<List<RoundRow>> shown = new ReadOnlyObjectWrapper<>(List.of());

    public RoundModel(Workplace workplace, Round round) {
        this.workplace = workplace;
        this.round = round;
        search.addListener((property, before, now) -> filter());
        waitingOnly.addListener((property, before, now) -> filter());
        reload();
    }

    public Round round() {
        return round;
    }

    /** All stops. */
    public ReadOnlyObjectProperty<List<RoundRow>> rowsProperty() {
        return rows.getReadOnlyProperty();
    }

    /** The stops that hold what was typed. */
    public ReadOnlyObjectProperty<List<RoundRow>> shownProperty() {
        return shown.getReadOnlyProperty();
    }

    /** What is searched for. */
    public StringProperty searchProperty() {
        return search;
    }

    /** Reads the round anew from the store. */
    public void reload() {
        Site site = workplace.site();
        Store store = workplace.store();
        Map<String, SurveyLine> lines = new HashMap<>();
        store.surveys(SurveyQuery.ALL.ofRound(round.id()).current()).forEach(line ->
                lines.put(line.transfer(), line));
        Map<String, String> areas = site.register().areaNames();
        List<Round.Point> points = round.points().stream()
                .filter(point -> site.register().transfer(point.transfer()).isPresent()).toList();
        List<List<SurveyLine>> last = store.surveys(points.stream().map(point -> last(point.transfer())).toList());
        List<RoundRow> read = new ArrayList<>();
        for (int i = 0; i < points.size(); i++) {
            Round.Point point = points.get(i);
            read.add(row(site.register().transfer(point.transfer()).orElseThrow(), site.register(), areas,
                    Optional.ofNullable(lines.get(point.transfer())), last.get(i).stream().findFirst(),
                    point.dueBy().or(round::dueBy)));
        }
        rows.set(List.copyOf(read));
        filter();
    }

    private RoundRow row(Register.Transfer transfer, Register register, Map<String, String> areas,
                         Optional<SurveyLine> line, Optional<SurveyLine> last, Optional<LocalDate> dueBy) {
        String conveyor = register.conveyorOf(transfer).tag();
        return new RoundRow(transfer.id(), transfer.tag(),
                transfer.from().map(from -> from + " \u2192 " + conveyor).orElse(conveyor),
                transfer.area().map(area -> areas.getOrDefault(area, area)).orElse(""), line,
                last.map(found -> new RoundRow.Last(found.level(), found.completedAt().or(found::startedAt)
                        .map(OffsetDateTime::toLocalDate))), dueBy, notes(transfer, last));
    }

    /** What the office noted there and knows to be open, and what the last survey left open. */
    private int notes(Register.Transfer transfer, Optional<SurveyLine> last) {
        return transfer.document().series("officeNotes").size() + last.map(SurveyLine::leftOpen).orElse(0)
                + PlannedAction.of(transfer.document(), "openActions").size();
    }

    /** Asks what other rounds found at a transfer point last. */
    private SurveyQuery last(String transfer) {
        return SurveyQuery.ALL.ofTransfer(transfer).besideRound(round.id()).current().inspected()
                .in(QueueState.COMPLETED, QueueState.QUEUED, QueueState.EXPORTED, QueueState.RECEIVED).newest(1);
    }

    private void filter() {
        String typed = search.get();
        shown.set(rows.get().stream().filter(row -> !waitingOnly.get() || row.waits())
                .filter(row -> typed.isBlank() || row.matches(typed)).toList());
    }

    /** Whether only the stops are shown that still wait. */
    public BooleanProperty waitingOnlyProperty() {
        return waitingOnly;
    }

    public LocalDate today() {
        return LocalDate.now(workplace.clock());
    }

    /** How many stops wait though their day has passed. */
    public long overdue() {
        return rows.get().stream().filter(row -> row.overdue(today())).count();
    }

    /** What was found on this round beside the register, in the order in which it was proposed. */
    public List<Branch> proposals() {
        return workplace.store().proposals().stream()
                .filter(proposal -> proposal.text("round").equals(Optional.of(round.id()))).toList();
    }

    /**
     * Proposes a transfer point that is not in the register; the office decides about it.
     *
     * @param after the registered stop behind which it lies on the walk
     */
    public void propose(String tag, String from, String onto, Optional<String> after, String note, Runnable then) {
        UUID id = UUID.randomUUID();
        Branch[] proposal = {Branch.EMPTY.with("id", id.toString()).with("round", round.id()).with("tag", tag.strip())};
        BiConsumer<String, String> put = (key, text) -> {
            if (!text.isBlank()) {
                proposal[0] = proposal[0].with(key, text.strip());
            }
        };
        put.accept("from", from);
        put.accept("onto", onto);
        put.accept("note", note);
        after.ifPresent(stop -> {
            put.accept("after", stop);
            workplace.site().register().transfer(stop).flatMap(Register.Transfer::area)
                    .ifPresent(area -> put.accept("area", area));
        });
        put.accept("proposedBy", person());
        Branch made = proposal[0].with("proposedAt", Node.time(OffsetDateTime.now(workplace.clock())
                .truncatedTo(ChronoUnit.SECONDS)));
        workplace.scribe().save(person(), new Act.PointProposed(id, made), entry -> {
            reload();
            then.run();
        });
    }

    /** Takes a proposal back. */
    public void withdraw(Branch proposal, Runnable then) {
        proposal.uuid("id").ifPresent(id -> workplace.scribe().save(person(),
                new Act.PointProposed(id, Branch.EMPTY), entry -> {
                    reload();
                    then.run();
                }));
    }

    /** How many stops need nothing more. */
    public long done() {
        return rows.get().stream().filter(row -> row.progress() == RoundRow.Progress.DONE
                || row.progress() == RoundRow.Progress.SKIPPED).count();
    }

    /** The first stop that still needs something, behind the given one and then from the start. */
    public Optional<RoundRow> nextToDo(String after) {
        List<RoundRow> all = rows.get();
        int from = index(after) + 1;
        for (int i = 0; i < all.size(); i++) {
            RoundRow row = all.get((from + i) % all.size());
            if (!row.transfer().equals(after) && (row.progress() == RoundRow.Progress.TO_DO
                    || row.progress() == RoundRow.Progress.BEGUN)) {
                return Optional.of(row);
            }
        }
        return Optional.empty();
    }

    /** The stop before or behind one in walking order. */
    public Optional<RoundRow> beside(String transfer, int step) {
        int wanted = index(transfer) + step;
        return wanted >= 0 && wanted < rows.get().size() ? Optional.of(rows.get().get(wanted)) : Optional.empty();
    }

    /** The stop at a transfer point. */
    public Optional<RoundRow> row(String transfer) {
        return beside(transfer, 0);
    }

    /** Where a stop stands in walking order; -1 for none. */
    int index(String transfer) {
        for (int i = 0; i < rows.get().size(); i++) {
            if (rows.get().get(i).transfer().equals(transfer)) {
                return i;
            }
        }
        return -1;
    }

    /**
     * The survey of a stop, begun where there is none yet.
     *
     * @param then gets the survey's id on the screen
     */
    public void survey(RoundRow row, Consumer<UUID> then) {
        if (row.survey().isPresent()) {
            then.accept(row.survey().get().id());
            return;
        }
        Survey begun = begin(row);
        workplace.scribe().save(person(), new Act.SurveyOpened(begun.id(), begun.document()), entry -> {
            reload();
            then.accept(begun.id());
        });
    }

    private Survey begin(RoundRow row) {
        var form = workplace.site().form(Optional.empty());
        return Survey.begin(UUID.randomUUID(), round.id(), row.transfer(), form.id(), form.version(), person(),
                OffsetDateTime.now(workplace.clock()).truncatedTo(ChronoUnit.SECONDS));
    }

    /** Says that a stop is not inspected, and why. */
    public void skip(RoundRow row, InspectionStatus status, String reason) {
        survey(row, id -> {
            answer(id, "inspectionStatus", status.code());
            answer(id, "statusReason", reason);
            workplace.scribe().save(person(), new Act.SurveyCompleted(id, person()), entry -> reload());
        });
    }

    /**
     * Opens a correction of a completed survey.
     *
     * @param then gets the row with the new revision
     */
    public void correct(UUID completed, String why, Consumer<RoundRow> then) {
        Survey old = workplace.store().history(completed).orElseThrow().survey();
        UUID id = UUID.randomUUID();
        Branch document = old.document().with("id", id.toString()).with("revision", Node.number(old.revision() + 1L))
                .with("supersedes", completed.toString()).with("revisionReason", why)
                .without("completedAt").without("signedOffBy");
        workplace.scribe().save(person(), new Act.RevisionOpened(id, completed, why, document), entry -> {
            reload();
            rows.get().stream().filter(row -> row.transfer().equals(old.transfer())).findFirst().ifPresent(then);
        });
    }

    private void answer(UUID survey, String key, String text) {
        workplace.scribe().save(person(), new Act.AnswerSet(survey, Pointer.of(key), Optional.of(Node.text(text))),
                entry -> { });
    }

    private String person() {
        return workplace.preferences().person();
    }

    /** The surveys of this round at the conveyor of a transfer point, for judging its drive. */
    public List<Survey> companions(String transfer) {
        Register register = workplace.site().register();
        String conveyor = register.transfer(transfer).orElseThrow().conveyor();
        List<Survey> companions = new ArrayList<>();
        for (RoundRow row : rows.get()) {
            if (!row.transfer().equals(transfer) && row.survey().isPresent()
                    && register.transfer(row.transfer()).orElseThrow().conveyor().equals(conveyor)) {
                workplace.store().history(row.survey().get().id())
                        .ifPresent(history -> companions.add(history.survey()));
            }
        }
        return companions;
    }

    /** The last finished survey of a transfer point before the given one. */
    public Optional<Branch> last(String transfer, UUID before) {
        return workplace.store().latestFinished(transfer, Optional.of(before));
    }
}
