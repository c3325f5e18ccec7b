package bedmark.screen.notes;

import java.io.IOException;
import java.nio.file.DirectoryIteratorException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.BasicFileAttributes;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/**
 * The folder that the tablet's camera app fills. It is looked at again and again, which works on every medium; a photo
 * counts once it was the same at two looks, since a camera may still be writing it.
 */
final class CameraFolder {
    private static final List<String> ENDINGS = List.of(".jpg", ".jpeg", ".png");
    /** More files than this are not looked through: the newest photos matter, not an archive. */
    private static final int MOST = 20_000;

    /** One photo in the folder, as it was when looked at. */
    record Shot(Path file, Instant modified, long bytes) {
    }

    private final Path folder;
    private Map<Path, Shot> seen = new HashMap<>();

    CameraFolder(Path folder) {
        this.folder = folder;
    }

    boolean isAt(Path path) {
        return folder.equals(path);
    }

    /**
     * The newest photos that have come to rest, newest first.
     *
     * @throws IOException where the folder can't be read
     */
    List<Shot> look(int atMost) throws IOException {
        Map<Path, Shot> now = new HashMap<>();
        try (DirectoryStream<Path> files = Files.newDirectoryStream(folder, CameraFolder::isPhoto)) {
            for (Path file : files) {
                BasicFileAttributes facts = Files.readAttributes(file, BasicFileAttributes.class);
                if (facts.isRegularFile() && facts.size() > 0 && now.size() < MOST) {
                    now.put(file, new Shot(file, facts.lastModifiedTime().toInstant(), facts.size()));
                }
            }
        } catch (DirectoryIteratorException e) {
            throw e.getCause();
        }
        List<Shot> rested = new ArrayList<>(now.values());
        rested.removeIf(shot -> !shot.equals(seen.get(shot.file())));
        seen = now;
        rested.sort(Comparator.comparing(Shot::modified).reversed().thenComparing(Shot::file));
        return List.copyOf(rested.subList(0, Math.min(atMost, rested.size())));
    }

    private static boolean isPhoto(Path file) {
        String name = file.getFileName().toString().toLowerCase(Locale.ROOT);
        return !name.startsWith(".") && ENDINGS.stream().anyMatch(name::endsWith);
    }
}
