package bedmark.screen.office;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Progress;
import bedmark.office.PackFolder;
import bedmark.office.Received;
import bedmark.office.Refusal;
import bedmark.office.Refusals;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.OfficeDeed;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.Executors;
import java.util.concurrent.ScheduledExecutorService;
import java.util.concurrent.TimeUnit;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.collections.FXCollections;
import javafx.collections.ObservableList;

/** Takes packs in that are dropped, chosen or put into a watched folder, and tells what came of each. */
public final class ReceiveModel {
    private static final int LOOK_EVERY_SECONDS = 2;
    private static final int EARLIER_SHOWN = 200;

    private final OfficeDesk desk;
    private final ObservableList<Received> received = FXCollections.observableArrayList();
    private final ReadOnlyObjectWrapper<List<Earlier>> earlier = new ReadOnlyObjectWrapper<>(List.of());
    private final Map<Received, Path> receipts = new HashMap<>();
    private final ReadOnlyObjectWrapper<List<Refusal>> refused = new ReadOnlyObjectWrapper<>(List.of());
    private final ReadOnlyObjectWrapper<Optional<Path>> watched = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ScheduledExecutorService watch = Executors.newSingleThreadScheduledExecutor(run -> {
        Thread thread = new Thread(run, "office-watch");
        thread.setDaemon(true);
        return thread;
    });
    private volatile Optional<PackFolder> folder = Optional.empty();

    /**
     * A pack that was received before this window was opened.
     *
     * @param device the tablet's name; its key where it has none
     */
    public record Earlier(String file, String device, OffsetDateTime at) {
    }

    /** What came of packs, where their receipts are, why the first was not written, and what is still refused. */
    private record Came(List<Received> packs, Map<Received, Path> receipts, Optional<Defect> unwritten,
                        Optional<List<Refusal>> refused) {
    }

    /** A model at a desk; what came before it is told apart from what comes now. */
    public ReceiveModel(OfficeDesk desk) {
        this.desk = desk;
        watch.scheduleWithFixedDelay(this::look, LOOK_EVERY_SECONDS, LOOK_EVERY_SECONDS, TimeUnit.SECONDS);
    }

    /** What came, the newest first. */
    public ObservableList<Received> received() {
        return received;
    }

    /** Where the receipt of something that came was written; nothing where there is none. */
    public Optional<Path> receiptOf(Received came) {
        return Optional.ofNullable(receipts.get(came));
    }

    /** What came before, the newest first; not more of it than anybody looks through. */
    public ReadOnlyObjectProperty<List<Earlier>> earlierProperty() {
        return earlier.getReadOnlyProperty();
    }

    /** Looks up what came before. */
    void lookBack() {
        desk.ask(progress -> earlier(desk.store().packs()), earlier::set);
    }

    /** What was refused, whenever that was, and is not in; the last refused first. */
    public ReadOnlyObjectProperty<List<Refusal>> refusedProperty() {
        return refused.getReadOnlyProperty();
    }

    /** Those among them that nothing above tells of; what is told above has the same words. */
    List<Refusal> refusedBefore() {
        Set<String> told = received.stream().flatMap(one -> one instanceof Received.Turned turned
                ? Stream.of(Refusals.key(turned)) : Stream.empty()).collect(Collectors.toSet());
        return refused.get().stream().filter(one -> !told.contains(Refusals.key(one.turned()))).toList();
    }

    /** Looks up what is still refused. */
    void lookAtRefused() {
        desk.ask(progress -> refusals(), refused::set);
    }

    /** Nobody waits for a pack any more. */
    public void putAway(Refusal refusal) {
        desk.ask(progress -> {
            new Refusals(desk.store(), desk.clock()).putAway(refusal);
            return refusals();
        }, refused::set);
    }

    private List<Refusal> refusals() {
        return new Refusals(desk.store(), desk.clock()).open();
    }

    /** What came is told even where the list of the refused can't be read. */
    private Optional<List<Refusal>> stillRefused() {
        try {
            return Optional.of(refusals());
        } catch (Refused e) {
            return Optional.empty();
        }
    }

    private static List<Earlier> earlier(List<Entry> packs) {
        List<Earlier> found = new ArrayList<>();
        for (Entry entry : packs.subList(Math.max(0, packs.size() - EARLIER_SHOWN), packs.size())) {
            if (entry.act() instanceof Act.OfficeActed acted
                    && acted.deed() instanceof OfficeDeed.PackReceived pack) {
                found.add(0, new Earlier(pack.file(), pack.deviceName().isBlank() ? pack.fingerprint()
                        : pack.deviceName(), entry.at()));
            }
        }
        return List.copyOf(found);
    }

    public ReadOnlyObjectProperty<Optional<Path>> watchedProperty() {
        return watched.getReadOnlyProperty();
    }

    /** Watches a folder from now on; nothing ends the watch, as does whatever keeps packs of it from coming in. */
    public void watch(Optional<Path> chosen) {
        folder = chosen.map(PackFolder::new);
        watched.set(chosen);
    }

    /** Looks into the watched folder once; it is looked at by itself every few seconds. */
    void look() {
        try {
            List<Path> whole = folder.map(PackFolder::look).orElse(List.of());
            if (!whole.isEmpty()) {
                desk.onScreen(() -> desk.change(progress -> takeAll(whole, progress), this::show));
            }
        } catch (Refused e) {
            // The folder is gone; it may come back, and is looked for again.
            return;
        }
    }

    /** Where not all of them came in, the watch ends: whoever begins it anew is given them once more. */
    private Came takeAll(List<Path> whole, Progress progress) {
        boolean all = false;
        try {
            Came came = take(whole, progress);
            all = came.packs().size() == whole.size();
            return came;
        } finally {
            if (!all) {
                desk.onScreen(() -> watch(Optional.empty()));
            }
        }
    }

    /** Takes packs in, and those that lie in folders. */
    public void receive(List<Path> given) {
        desk.change(progress -> {
            List<Path> files = new ArrayList<>();
            given.forEach(one -> files.addAll(Files.isDirectory(one) ? PackFolder.packs(one) : List.of(one)));
            return take(files, progress);
        }, this::show);
    }

    /** The person compared the fingerprint: the device is trusted, and its pack received. */
    public void trust(Received.Turned turned) {
        desk.change(progress -> {
            desk.store().trust(turned.fingerprint().orElseThrow(), "", desk.person());
            return take(List.of(turned.file()), progress);
        }, came -> {
            received.remove(turned);
            show(came);
        });
    }

    private Came take(List<Path> files, Progress progress) {
        List<Received> packs = desk.store().receive(files, desk.person(), progress);
        Map<Received, Path> written = new HashMap<>();
        List<Defect> unwritten = new ArrayList<>();
        packs.forEach(one -> one.confirmed().ifPresent(receipt -> {
            try {
                written.put(one, desk.store().write(receipt, one.file().toAbsolutePath().getParent()));
            } catch (Refused e) {
                // The pack is in; the same pack received again writes its receipt again.
                unwritten.add(e.defect());
            }
        }));
        return new Came(packs, written, unwritten.stream().findFirst(), stillRefused());
    }

    private void show(Came came) {
        receipts.putAll(came.receipts());
        came.packs().forEach(one -> received.add(0, one));
        came.refused().ifPresent(refused::set);
        came.unwritten().ifPresent(desk::tell);
    }

    /** Watches no folder any more. */
    public void close() {
        watch.shutdownNow();
    }
}
