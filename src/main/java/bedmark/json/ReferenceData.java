package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.engine.Settings;
import java.io.IOException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * Materials, limits, seal rates, belt speeds and instruments as files: those that ship with the program, or those of a
 * folder in which a site edited them. A file that the folder lacks is the one that ships.
 */
public final class ReferenceData {
    private final Map<ReferenceFile, Branch> files;

    private ReferenceData(Map<ReferenceFile, Branch> files) {
        this.files = files;
    }

    /** The files that ship with the program. */
    public static ReferenceData shipped() {
        Map<ReferenceFile, Branch> files = new EnumMap<>(ReferenceFile.class);
        for (ReferenceFile file : ReferenceFile.values()) {
            files.put(file, JsonReader.read(file.shipped()).root());
        }
        return new ReferenceData(files);
    }

    /**
     * The files of a folder.
     *
     * @throws Refused where the folder cannot be read or holds none of them, or with the first fault of a file
     */
    public static ReferenceData read(Path folder) {
        Map<ReferenceFile, Branch> files = new EnumMap<>(shipped().files);
        List<Finding> findings = new ArrayList<>();
        Map<ReferenceFile, Document> read = read(folder, findings);
        findings.stream().findFirst().ifPresent(finding -> {
            Defect defect = finding.defect();
            String where = finding.file().isEmpty() ? defect.where()
                    : folder.resolve(finding.file()) + (defect.where().startsWith("/") ? " " + defect.where() : "");
            throw new Refused(new Defect(defect.code(), where, defect.details()));
        });
        read.forEach((file, document) -> files.put(file, document.root()));
        return new ReferenceData(files);
    }

    /**
     * Checks the files of a folder.
     *
     * @return nothing where every file is sound; in the order of files and lines
     * @throws Refused where the folder can't be read
     */
    public static List<Finding> check(Path folder) {
        List<Finding> findings = new ArrayList<>();
        read(folder, findings);
        return List.copyOf(findings);
    }

    /** A fault of a file: where it stands, the row it is in, and what is wrong. */
    public record Finding(String file, int line, int column, String key, Defect defect) {
    }

    private static Map<ReferenceFile, Document> read(Path folder, List<Finding> findings) {
        Map<ReferenceFile, Document> documents = new EnumMap<>(ReferenceFile.class);
        List<Path> paths = paths(folder);
        if (paths.isEmpty()) {
            findings.add(new Finding("", 0, 0, "", Defect.in(folder.toString(), "reference-none")));
        }
        for (Path path : paths) {
            String name = path.getFileName().toString();
            ReferenceFile.ofName(name).ifPresentOrElse(
                    file -> read(file, path, findings).ifPresent(document -> documents.put(file, document)),
                    () -> findings.add(new Finding(name, 1, 1, "", Defect.in(name, "reference-file-unknown",
                            String.join(", ", names())))));
        }
        return documents;
    }

    private static Optional<Document> read(ReferenceFile file, Path path, List<Finding> findings) {
        String name = file.fileName();
        try {
            Document document = JsonFile.read(path);
            List<Defect> defects = ReferenceCheck.check(file, document);
            defects.forEach(defect -> findings.add(finding(name, document, defect)));
            return defects.isEmpty() ? Optional.of(document) : Optional.empty();
        } catch (IOException e) {
            findings.add(new Finding(name, 1, 1, "", Defect.in(name, "file-unreadable")));
        } catch (Refused e) {
            Defect defect = e.defect();
            boolean placed = defect.code().equals("json-unreadable");
            findings.add(new Finding(name, placed ? Integer.parseInt(defect.details().get(0)) : 1,
                    placed ? Integer.parseInt(defect.details().get(1)) : 1, "", defect));
        }
        return Optional.empty();
    }

    private static Finding finding(String name, Document document, Defect defect) {
        Pointer where = Pointer.parse(defect.where());
        Document.Place place = document.placeOf(where).orElseThrow();
        return new Finding(name, place.line(), place.column(), where.isRoot() ? "" : where.last(), defect);
    }

    private static List<String> names() {
        return Stream.of(ReferenceFile.values()).map(ReferenceFile::fileName).toList();
    }

    private static List<Path> paths(Path folder) {
        List<Path> paths = new ArrayList<>();
        try (DirectoryStream<Path> entries = Files.newDirectoryStream(folder, "*.json")) {
            entries.forEach(paths::add);
        } catch (IOException e) {
            throw new Refused(Defect.in(folder.toString(), "folder-unreadable"), e);
        }
        paths.removeIf(path -> path.toString().endsWith(".schema.json"));
        paths.sort(null);
        return paths;
    }

    /**
     * Writes the files that ship, with their schemas, for a site to edit.
     *
     * @return the files written
     * @throws Refused where one of them is there already, before any is written, or where one cannot be written
     */
    public static List<Path> write(Path folder) {
        Map<Path, byte[]> contents = new LinkedHashMap<>();
        for (ReferenceFile file : ReferenceFile.values()) {
            contents.put(folder.resolve(file.fileName()), file.shipped());
            contents.put(folder.resolve(file.schemaName()), file.schema());
        }
        contents.keySet().stream().filter(Files::exists).findFirst().ifPresent(there -> {
            throw new Refused(Defect.in(there.toString(), "reference-file-exists"));
        });
        List<Path> begun = new ArrayList<>();
        try {
            Files.createDirectories(folder);
            for (Map.Entry<Path, byte[]> file : contents.entrySet()) {
                Files.createFile(file.getKey());
                begun.add(file.getKey());
                Files.write(file.getKey(), file.getValue());
            }
        } catch (IOException e) {
            // A part of them would stand in the way of the next attempt.
            begun.forEach(file -> file.toFile().delete());
            throw new Refused(Defect.in(folder.toString(), "folder-unwritable"), e);
        }
        return List.copyOf(contents.keySet());
    }

    /** The defaults of every plant that decides nothing itself. */
    public Settings settings() {
        return new ReferenceSettings(files).settings();
    }

    /**
     * The plant with what its materials take from the table: each that names a row by {@code reference} takes the
     * numbers that it does not state itself.
     *
     * @throws Refused where it names none of the table's; the place is a pointer within the plant
     */
    public Branch filled(Branch plant) {
        return new ReferenceMaterials(files.get(ReferenceFile.MATERIALS)).filled(plant);
    }

    /**
     * The materials whose density and surcharge angle the table knows, each as a plant's material that names its row:
     * what a plant begins with that has no register yet.
     *
     * @param language of the names
     */
    public List<Branch> materials(String language) {
        return new ReferenceMaterials(files.get(ReferenceFile.MATERIALS)).complete(language);
    }
}
