package bedmark.screen.arrival;

import bedmark.office.OfficeOptions;
import bedmark.office.OfficeStore;
import bedmark.office.Received;
import bedmark.pack.FileKind;
import bedmark.screen.Errand;
import bedmark.screen.FolderChoice;
import bedmark.screen.Preferences;
import bedmark.screen.PreferencesFile;
import bedmark.screen.office.OfficeDesk;
import bedmark.screen.office.ReceiveModel;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.nio.file.Path;
import java.time.Clock;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Executor;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.stream.Stream;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleObjectProperty;

/** Looks at one file that came: proves it beside the screen, and lets the office receive a pack. */
public final class ArrivalModel implements AutoCloseable {
    private static final String PREFERENCES = ".bedmark-preferences.json";

    private final Path file;
    private final FileKind kind;
    private final Path home;
    private final Clock clock;
    private final Executor screen;
    private final FolderChoice folders;
    private final ObjectProperty<Preferences> preferences;
    private final ExecutorService work = Executors.newSingleThreadExecutor(run -> {
        Thread thread = new Thread(run, "arrival-work");
        thread.setDaemon(true);
        return thread;
    });
    private final Errand errand;
    private final ReadOnlyObjectWrapper<Optional<Arrived>> arrived = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ReadOnlyObjectWrapper<Optional<Reception>> reception =
            new ReadOnlyObjectWrapper<>(Optional.empty());
    private boolean closed;

    /**
     * An office that is open, and what it received.
     *
     * @param desk      where the office's work is done
     * @param receiving takes the pack in
     */
    public record Reception(OfficeDesk desk, ReceiveModel receiving) {

        /** What came of the pack when it was last tried. */
        public Optional<Received> outcome() {
            return receiving.received().stream().findFirst();
        }

        /** Whether a person is to vouch for the pack's device first. */
        boolean asks() {
            return outcome().filter(came -> came instanceof Received.Turned turned && turned.untrusted()).isPresent();
        }

        /** Whether the office has the pack, now or since before. */
        boolean in() {
            return outcome().filter(came -> !(came instanceof Received.Turned)).isPresent();
        }
    }

    /**
     * Begins to prove the file at once.
     *
     * @param home    the person's, where the way to their office is remembered
     * @param screen  runs what touches the screen
     * @param folders asks for a folder
     */
    public ArrivalModel(Path file, FileKind kind, Path home, Clock clock, Executor screen, FolderChoice folders) {
        this.file = file.toAbsolutePath().normalize();
        this.kind = kind;
        this.home = home;
        this.clock = clock;
        this.screen = screen;
        this.folders = folders;
        this.preferences = new SimpleObjectProperty<>(preferences(home));
        PreferencesFile kept = new PreferencesFile(home, PREFERENCES);
        preferences.addListener((property, before, now) -> kept.write(now));
        this.errand = new Errand(work, screen);
        prove();
    }

    /** How a person likes such a window: as it was left, else as at the office in their home. */
    public static Preferences preferences(Path home) {
        return new PreferencesFile(home, PREFERENCES).kept().orElseGet(() ->
                new PreferencesFile(home.resolve(OfficeStore.USUAL_FOLDER)).read());
    }

    /** Proves the file, once more where it was refused. */
    public void prove() {
        arrived.set(Optional.empty());
        errand.run(progress -> Arrived.read(file, kind, progress), read -> arrived.set(Optional.of(read)));
    }

    public Path file() {
        return file;
    }

    public FileKind kind() {
        return kind;
    }

    public Clock clock() {
        return clock;
    }

    public FolderChoice folders() {
        return folders;
    }

    /** The proof, and then the opening of the office: its progress, its trouble, a way to stop it. */
    public Errand errand() {
        return errand;
    }

    /** What the file holds; nothing until it is proved. */
    public ReadOnlyObjectProperty<Optional<Arrived>> arrivedProperty() {
        return arrived.getReadOnlyProperty();
    }

    /** The office that receives; nothing until one is open. */
    public ReadOnlyObjectProperty<Optional<Reception>> receptionProperty() {
        return reception.getReadOnlyProperty();
    }

    public ObjectProperty<Preferences> preferencesProperty() {
        return preferences;
    }

    public Preferences preferences() {
        return preferences.get();
    }

    public Wording wording() {
        return new Wording(new Words(preferences().locale()), preferences().units(), preferences().chosenUnits());
    }

    /** The office that received last, else the one in the person's home; nothing where neither is there. */
    public Optional<Path> knownOffice() {
        return Stream.concat(preferences().officeFolder().map(Path::of).stream(),
                Stream.of(home.resolve(OfficeStore.USUAL_FOLDER))).filter(OfficeStore::isOffice).findFirst();
    }

    /** A folder as people say it: from their home on, where it lies there. */
    String shown(Path folder) {
        return Wording.plain(folder.startsWith(home) ? Path.of("~").resolve(home.relativize(folder)).toString()
                : folder.toString());
    }

    /**
     * Opens an office and lets it receive the pack. An office is begun where the folder is empty; its own reasons to
     * refuse are those of {@link OfficeStore#open}.
     */
    public void receive(Path folder) {
        Optional<Reception> here = reception.get().filter(open -> open.desk().store().folder()
                .equals(folder.toAbsolutePath().normalize()));
        if (here.isPresent()) {
            here.get().receiving().receive(List.of(file));
            return;
        }
        letGo();
        errand.run(progress -> OfficeStore.open(folder, OfficeOptions.of(clock).withProgress(progress)),
                store -> opened(store, folder));
    }

    private void opened(OfficeStore store, Path folder) {
        if (closed) {
            store.close();
            return;
        }
        preferences.set(preferences().withOfficeFolder(folder.toString()));
        OfficeDesk desk = new OfficeDesk(store, clock, screen, folders);
        Reception open = new Reception(desk, new ReceiveModel(desk));
        reception.set(Optional.of(open));
        open.receiving().receive(List.of(file));
    }

    /** Leaves the office to the window that goes on with it and closes it. */
    public Optional<OfficeDesk> handOver() {
        Optional<Reception> open = reception.get();
        open.ifPresent(one -> one.receiving().close());
        reception.set(Optional.empty());
        return open.map(Reception::desk);
    }

    private void letGo() {
        handOver().ifPresent(OfficeDesk::close);
    }

    @Override
    public void close() {
        closed = true;
        errand.cancel();
        work.shutdown();
        letGo();
    }
}
