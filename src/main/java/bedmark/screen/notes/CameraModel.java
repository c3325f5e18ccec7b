package bedmark.screen.notes;

import bedmark.document.Defect;
import bedmark.journal.Digest;
import bedmark.screen.Workplace;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.Executors;
import java.util.concurrent.ScheduledExecutorService;
import java.util.concurrent.TimeUnit;
import java.util.function.Supplier;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;

/** The newest photos of the watched folder that are not attached yet, looked for while the screen is shown. */
public final class CameraModel {
    /** How many photos are offered. */
    static final int OFFERED = 2;
    private static final long EVERY_MILLIS = 1500;
    private static final int LOOKED_AT = 12;

    private final Workplace workplace;
    private final Supplier<List<String>> attached;
    private final ReadOnlyObjectWrapper<List<Path>> shots = new ReadOnlyObjectWrapper<>(List.of());
    private final ReadOnlyObjectWrapper<Optional<Defect>> trouble = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final Map<CameraFolder.Shot, String> digests = new HashMap<>();
    private Optional<CameraFolder> watched = Optional.empty();
    private Optional<ScheduledExecutorService> watch = Optional.empty();

    /** @param attached the digests of the photos that are on the survey, hexadecimal; asked on the screen */
    public CameraModel(Workplace workplace, Supplier<List<String>> attached) {
        this.workplace = workplace;
        this.attached = attached;
    }

    /** The photos on offer, newest first. */
    public ReadOnlyObjectProperty<List<Path>> shotsProperty() {
        return shots.getReadOnlyProperty();
    }

    /** Why the folder can't be looked into. */
    public ReadOnlyObjectProperty<Optional<Defect>> troubleProperty() {
        return trouble.getReadOnlyProperty();
    }

    /** Begins to watch the folder that the person set, where one is set. */
    public void watch() {
        leave();
        workplace.preferences().watchedFolder().map(Path::of).ifPresent(path -> {
            // Shown anew, the screen goes on from what was seen before.
            CameraFolder folder = watched.filter(known -> known.isAt(path)).orElseGet(() -> new CameraFolder(path));
            watched = Optional.of(folder);
            ScheduledExecutorService eye = Executors.newSingleThreadScheduledExecutor(run -> {
                Thread thread = new Thread(run, "camera-folder");
                thread.setDaemon(true);
                return thread;
            });
            watch = Optional.of(eye);
            eye.scheduleWithFixedDelay(() -> look(folder), 0, EVERY_MILLIS, TimeUnit.MILLISECONDS);
        });
    }

    /** Watches no longer. */
    public void leave() {
        watch.ifPresent(ScheduledExecutorService::shutdownNow);
        watch = Optional.empty();
    }

    private void look(CameraFolder folder) {
        try {
            List<CameraFolder.Shot> newest = folder.look(LOOKED_AT);
            for (CameraFolder.Shot shot : newest) {
                if (!digests.containsKey(shot)) {
                    digests.put(shot, digest(shot.file()));
                }
            }
            digests.keySet().retainAll(newest);
            Map<CameraFolder.Shot, String> known = Map.copyOf(digests);
            workplace.screen().execute(() -> offer(newest, known));
        } catch (IOException e) {
            workplace.screen().execute(() -> trouble.set(Optional.of(Defect.in(
                    workplace.preferences().watchedFolder().orElse(""), "folder-unreadable"))));
        }
    }

    private void offer(List<CameraFolder.Shot> newest, Map<CameraFolder.Shot, String> known) {
        List<String> has = attached.get();
        List<Path> offered = new ArrayList<>();
        for (CameraFolder.Shot shot : newest) {
            if (offered.size() < OFFERED && !has.contains(known.get(shot))) {
                offered.add(shot.file());
            }
        }
        trouble.set(Optional.empty());
        if (!offered.equals(shots.get())) {
            shots.set(List.copyOf(offered));
        }
    }

    private static String digest(Path file) throws IOException {
        MessageDigest sha = Digest.sha256();
        byte[] chunk = new byte[1 << 16];
        try (InputStream in = Files.newInputStream(file)) {
            for (int count = in.read(chunk); count > 0; count = in.read(chunk)) {
                sha.update(chunk, 0, count);
            }
        }
        return Digest.ofBytes(sha.digest()).hex();
    }
}
