package bedmark.json;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Optional;
import java.util.stream.Stream;

/** The files of reference data that a site may edit, each with its schema. */
public enum ReferenceFile {
    /** Skirtboard friction factors, handbook densities and angles, surcharge by repose. */
    MATERIALS("materials"),
    /** Limits of the rules, how sure a verdict must be, friction factors of ISO 5048. */
    LIMITS("limits"),
    /** Drag of the seals and its multipliers. */
    SEAL_RATES("seal-rates"),
    /** Highest belt speeds by class of material. */
    SPEED_CLASSES("speed-classes"),
    /** Standard uncertainties. */
    INSTRUMENTS("instruments");

    private final String word;

    ReferenceFile(String word) {
        this.word = word;
    }

    /** The file of that name. */
    public static Optional<ReferenceFile> ofName(String name) {
        return Stream.of(values()).filter(file -> file.fileName().equals(name)).findFirst();
    }

    /** The file's name in a folder. */
    public String fileName() {
        return word + ".json";
    }

    /** The name of its schema's file. */
    public String schemaName() {
        return "reference-" + word + ".schema.json";
    }

    /** The bytes that ship with the program. */
    byte[] shipped() {
        return resource("/bedmark/reference/" + fileName());
    }

    /** The bytes of its schema. */
    byte[] schema() {
        return resource("/bedmark/schema/" + schemaName());
    }

    private static byte[] resource(String name) {
        try (InputStream stream = ReferenceFile.class.getResourceAsStream(name)) {
            return stream.readAllBytes();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
