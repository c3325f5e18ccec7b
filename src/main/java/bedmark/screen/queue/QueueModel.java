package bedmark.screen.queue;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.Export;
import bedmark.index.Store;
import bedmark.index.SurveyLine;
import bedmark.index.SurveyQuery;
import bedmark.journal.NotSaved;
import bedmark.journal.Progress;
import bedmark.pack.DeviceKey;
import bedmark.pack.PackWriter;
import bedmark.pack.PhotoSource;
import bedmark.pack.WrittenPack;
import bedmark.screen.Site;
import bedmark.screen.Workplace;
import bedmark.survey.Act;
import bedmark.survey.Bundle;
import bedmark.survey.QueueState;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.time.format.DateTimeFormatter;
import java.time.temporal.ChronoUnit;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import java.util.concurrent.atomic.AtomicBoolean;
import javafx.beans.property.DoubleProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleDoubleProperty;

/** The way to the office: what is completed, what is queued, what left, and the receipt of the last pack. */
public final class QueueModel {
    private static final DateTimeFormatter NAME_TIME = DateTimeFormatter.ofPattern("yyyyMMdd-HHmmss");

    private final Workplace workplace;
    private final ReadOnlyObjectWrapper<List<SurveyLine>> completed = new ReadOnlyObjectWrapper<>(List.of());
    private final ReadOnlyObjectWrapper<List<SurveyLine>> queued = new ReadOnlyObjectWrapper<>(List.of());
    private final ReadOnlyObjectWrapper<List<Export>> exports = new ReadOnlyObjectWrapper<>(List.of());
    private final ReadOnlyObjectWrapper<Optional<Receipt>> receipt = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ReadOnlyObjectWrapper<Optional<Defect>> trouble = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final DoubleProperty progress = new SimpleDoubleProperty(-1);
    private final AtomicBoolean cancelled = new AtomicBoolean();

    /**
     * What the person gets for a pack that left.
     *
     * @param fingerprint of the device key that signed it
     */
    public record Receipt(Path file, String sha256, String fingerprint, int surveys, OffsetDateTime at) {
    }

    public QueueModel(Workplace workplace) {
        this.workplace = workplace;
        reload();
    }

    /** Reads the queue anew from the store. */
    public void reload() {
        Store store = workplace.store();
        completed.set(store.surveys(SurveyQuery.ALL.in(QueueState.COMPLETED).current()));
        queued.set(store.queue());
        exports.set(store.exports());
    }

    public ReadOnlyObjectProperty<List<SurveyLine>> completedProperty() {
        return completed.getReadOnlyProperty();
    }

    public ReadOnlyObjectProperty<List<SurveyLine>> queuedProperty() {
        return queued.getReadOnlyProperty();
    }

    public ReadOnlyObjectProperty<List<Export>> exportsProperty() {
        return exports.getReadOnlyProperty();
    }

    public ReadOnlyObjectProperty<Optional<Receipt>> receiptProperty() {
        return receipt.getReadOnlyProperty();
    }

    public ReadOnlyObjectProperty<Optional<Defect>> troubleProperty() {
        return trouble.getReadOnlyProperty();
    }

    /** How far the export is, 0 to 1; negative while none runs. */
    public DoubleProperty progressProperty() {
        return progress;
    }

    /** Puts all completed surveys into the queue. */
    public void queueAll() {
        List<UUID> ids = completed.get().stream().map(SurveyLine::id).toList();
        if (!ids.isEmpty()) {
            workplace.scribe().save(person(), new Act.SurveysQueued(ids), entry -> reload());
        }
    }

    /** Stops the export that runs; nothing half-written stays behind. */
    public void cancel() {
        cancelled.set(true);
    }

    /** Exports what is queued into a folder; the surveys leave the queue only once the pack is safe there. */
    public void export(Path folder) {
        List<UUID> ids = queued.get().stream().map(SurveyLine::id).toList();
        if (ids.isEmpty() || progress.get() >= 0) {
            return;
        }
        workplace.preferencesProperty().set(workplace.preferences().withExportFolder(folder.toString()));
        cancelled.set(false);
        progress.set(0);
        trouble.set(Optional.empty());
        Site site = workplace.site();
        String notice = workplace.wording().text("command.notice");
        workplace.longWork().execute(() -> {
            try {
                Receipt written = write(ids, folder, site, notice);
                workplace.screen().execute(() -> finished(Optional.of(written), Optional.empty()));
            } catch (Refused e) {
                workplace.screen().execute(() -> finished(Optional.empty(), Optional.of(e.defect())));
            } catch (NotSaved e) {
                workplace.screen().execute(() -> finished(Optional.empty(), Optional.of(e.defect())));
            }
        });
    }

    private Receipt write(List<UUID> ids, Path folder, Site site, String notice) {
        Store store = workplace.store();
        OffsetDateTime now = OffsetDateTime.now(workplace.clock()).truncatedTo(ChronoUnit.SECONDS);
        Bundle bundle = new Departure(store, site).bundle(ids, UUID.randomUUID(), now, notice);
        DeviceKey key = DeviceKey.of(store.folder());
        Path out = folder.resolve("bedmark-" + NAME_TIME.format(now) + "-"
                + bundle.document().text("id").orElseThrow().substring(0, 8) + ".zip");
        WrittenPack pack = PackWriter.write(bundle, PhotoSource.folder(store.folder().resolve("photos")), key, out,
                new Progress() {
                    @Override
                    public void at(long done, long total) {
                        double share = total == 0 ? 0 : (double) done / total;
                        workplace.screen().execute(() -> progress.set(share));
                    }

                    @Override
                    public boolean cancelled() {
                        return cancelled.get();
                    }
                });
        store.append(person(), new Act.PackExported(ids, out.getFileName().toString(), pack.sha256(),
                folder.toString()));
        return new Receipt(out, pack.sha256(), key.fingerprint().toString(), ids.size(), now);
    }

    private void finished(Optional<Receipt> written, Optional<Defect> failed) {
        progress.set(-1);
        receipt.set(written);
        trouble.set(failed);
        reload();
    }

    private String person() {
        return workplace.preferences().person();
    }
}
