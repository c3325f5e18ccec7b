package bedmark.sample;

import bedmark.json.BundleReader;
import bedmark.json.JsonWriter;
import bedmark.survey.Bundle;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Map;

/** The files of the demo plant: those in {@code sample-surveys/}, and those that the tables make. */
final class SampleFiles {
    /** Where the committed files lie. */
    static final Path FOLDER = Path.of("sample-surveys");
    /** The committed photos. */
    static final SamplePhotos PHOTOS = new SamplePhotos(FOLDER.resolve("photos"));

    private SampleFiles() {
    }

    /** A committed bundle, read as the program reads any. */
    static Bundle committed(SampleRound round) {
        try {
            return BundleReader.read(Files.readAllBytes(FOLDER.resolve(round.file())));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** The bundles as the tables make them, by file name. */
    static Map<String, byte[]> made() {
        Map<String, byte[]> files = new LinkedHashMap<>();
        for (SampleRound round : SampleRound.ALL) {
            files.put(round.file(), JsonWriter.indented(round.bundle(PHOTOS).document()));
        }
        return files;
    }

    /** Draws the photos that are not there, and then writes the bundles. */
    static void write() throws IOException {
        Files.createDirectories(PHOTOS.folder());
        for (String name : SamplePicture.ALL.keySet()) {
            if (!Files.exists(PHOTOS.folder().resolve(name))) {
                Files.write(PHOTOS.folder().resolve(name), SamplePicture.encoded(name));
            }
        }
        for (Map.Entry<String, byte[]> file : made().entrySet()) {
            Files.write(FOLDER.resolve(file.getKey()), file.getValue());
        }
    }
}
