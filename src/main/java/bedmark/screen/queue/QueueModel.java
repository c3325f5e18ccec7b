package bedmark.screen.queue;

import bedmark.dispatch.Dispatch;
import bedmark.index.Export;
import bedmark.index.Store;
import bedmark.index.SurveyLine;
import bedmark.index.SurveyQuery;
import bedmark.pack.WrittenPack;
import bedmark.screen.Errand;
import bedmark.screen.Workplace;
import bedmark.survey.Act;
import bedmark.survey.QueueState;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;

/** The way to the office: what is completed, what is queued, what left, and what the office confirmed. */
public final class QueueModel {
    private final Workplace workplace;
    private final Errand errand;
    private final ReceiptsModel receipts;
    private final ReadOnlyObjectWrapper<List<SurveyLine>> completed = new ReadOnlyObjectWrapper<>(List.of());
    private final ReadOnlyObjectWrapper<List<SurveyLine>> queued = new ReadOnlyObjectWrapper<>(List.of());
    private final ReadOnlyObjectWrapper<List<SurveyLine>> awaited = new ReadOnlyObjectWrapper<>(List.of());
    private final ReadOnlyObjectWrapper<List<Export>> exports = new ReadOnlyObjectWrapper<>(List.of());
    private final ReadOnlyObjectWrapper<Optional<Left>> left = new ReadOnlyObjectWrapper<>(Optional.empty());

    /**
     * What the person gets for a pack that left.
     *
     * @param fingerprint of the device key that signed it
     */
    public record Left(Path file, String sha256, String fingerprint, int surveys, OffsetDateTime at) {
    }

    public QueueModel(Workplace workplace) {
        this.workplace = workplace;
        this.errand = new Errand(workplace);
        this.receipts = new ReceiptsModel(workplace, errand);
        reload();
    }

    /** Reads the queue anew from the store. */
    public void reload() {
        Store store = workplace.store();
        completed.set(store.surveys(SurveyQuery.ALL.in(QueueState.COMPLETED).current()));
        queued.set(store.queue());
        awaited.set(store.surveys(SurveyQuery.ALL.in(QueueState.EXPORTED)));
        exports.set(store.exports());
    }

    public ReadOnlyObjectProperty<List<SurveyLine>> completedProperty() {
        return completed.getReadOnlyProperty();
    }

    public ReadOnlyObjectProperty<List<SurveyLine>> queuedProperty() {
        return queued.getReadOnlyProperty();
    }

    /** Surveys that left and that the office has not confirmed. */
    public ReadOnlyObjectProperty<List<SurveyLine>> awaitedProperty() {
        return awaited.getReadOnlyProperty();
    }

    public ReadOnlyObjectProperty<List<Export>> exportsProperty() {
        return exports.getReadOnlyProperty();
    }

    public ReadOnlyObjectProperty<Optional<Left>> leftProperty() {
        return left.getReadOnlyProperty();
    }

    /** What takes time here: an export, or receipts that are read. */
    public Errand errand() {
        return errand;
    }

    public ReceiptsModel receipts() {
        return receipts;
    }

    /** Puts all completed surveys into the queue. */
    public void queueAll() {
        List<UUID> ids = completed.get().stream().map(SurveyLine::id).toList();
        if (!ids.isEmpty()) {
            workplace.scribe().save(person(), new Act.SurveysQueued(ids), entry -> reload());
        }
    }

    /** Exports what is queued into a folder; the surveys leave the queue only once the pack is safe there. */
    public void export(Path folder) {
        export(queued.get().stream().map(SurveyLine::id).toList(), folder);
    }

    /** Exports what left once more, the same pack. */
    public void exportAgain(Export export, Path folder) {
        export(export.surveys(), folder);
    }

    private void export(List<UUID> ids, Path folder) {
        if (ids.isEmpty() || errand.running()) {
            return;
        }
        workplace.preferencesProperty().set(workplace.preferences().withExportFolder(folder.toString()));
        left.set(Optional.empty());
        receipts.clear();
        String notice = workplace.wording().text("command.notice");
        String person = person();
        errand.run(progress -> {
            WrittenPack pack = new Dispatch(workplace.store()).export(ids, folder, notice, person, progress);
            return new Left(pack.file(), pack.sha256(), pack.fingerprint().toString(), ids.size(),
                    OffsetDateTime.now(workplace.clock()));
        }, written -> {
            left.set(Optional.of(written));
            reload();
        });
    }

    /** Reads the office's receipts from a folder or stick. */
    public void readReceipts(Path given) {
        left.set(Optional.empty());
        receipts.read(given, this::reload);
    }

    private String person() {
        return workplace.preferences().person();
    }
}
