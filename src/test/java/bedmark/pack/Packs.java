package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import bedmark.document.Refused;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;

/** Opens forged packs in a folder of their own. */
final class Packs {
    private Packs() {
    }

    static ReadPack open(Path folder, byte[] bytes) throws IOException {
        return open(folder, bytes, PackLimits.STANDARD);
    }

    static ReadPack open(Path folder, byte[] bytes, PackLimits limits) throws IOException {
        Path file = folder.resolve("forged.zip");
        Files.write(file, bytes);
        return PackReader.open(file, limits);
    }

    /** The pack is refused with this code, and the folder holds what it held. */
    static Refused assertRefused(String code, Path folder, byte[] bytes) throws IOException {
        return assertRefused(code, folder, bytes, PackLimits.STANDARD);
    }

    static Refused assertRefused(String code, Path folder, byte[] bytes, PackLimits limits) throws IOException {
        Refused refused = assertThrows(Refused.class, () -> open(folder, bytes, limits));
        assertEquals(code, refused.defect().code(), refused::getMessage);
        assertEquals(List.of("forged.zip"), names(folder));
        assertArrayEquals(bytes, Files.readAllBytes(folder.resolve("forged.zip")));
        return refused;
    }

    static List<String> names(Path folder) throws IOException {
        try (Stream<Path> files = Files.list(folder)) {
            return files.map(file -> file.getFileName().toString()).sorted().toList();
        }
    }
}
