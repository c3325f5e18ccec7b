package bedmark.screen.notes;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.time.Instant;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CameraFolderTest {
    private static final Instant NOON = Instant.parse("2026-09-22T12:00:00Z");

    @TempDir
    private Path folder;

    private void shot(String name, int bytes, int minute) throws IOException {
        Path file = Files.write(folder.resolve(name), new byte[bytes]);
        Files.setLastModifiedTime(file, FileTime.from(NOON.plusSeconds(60L * minute)));
    }

    private static List<String> names(List<CameraFolder.Shot> shots) {
        return shots.stream().map(shot -> shot.file().getFileName().toString()).toList();
    }

    @Test
    void newestPhotosComeFirstAndNothingElseCounts() throws IOException {
        shot("IMG_1.jpg", 10, 1);
        shot("IMG_3.JPEG", 10, 3);
        shot("IMG_2.png", 10, 2);
        shot("notes.txt", 10, 4);
        shot(".hidden.jpg", 10, 5);
        shot("empty.jpg", 0, 6);
        Files.createDirectory(folder.resolve("folder.jpg"));
        CameraFolder camera = new CameraFolder(folder);
        assertEquals(List.of(), camera.look(9), "one look does not tell whether a file is whole");
        assertEquals(List.of("IMG_3.JPEG", "IMG_2.png", "IMG_1.jpg"), names(camera.look(9)));
        assertEquals(List.of("IMG_3.JPEG", "IMG_2.png"), names(camera.look(2)));
    }

    @Test
    void aPhotoThatIsStillBeingWrittenWaits() throws IOException {
        shot("IMG_1.jpg", 10, 1);
        CameraFolder camera = new CameraFolder(folder);
        camera.look(2);
        shot("IMG_1.jpg", 500, 2);
        assertEquals(List.of(), camera.look(2));
        assertEquals(List.of("IMG_1.jpg"), names(camera.look(2)));
    }

    @Test
    void aFolderThatIsGoneIsSaid() {
        CameraFolder camera = new CameraFolder(folder.resolve("stick"));
        assertThrows(IOException.class, () -> camera.look(2));
    }
}
