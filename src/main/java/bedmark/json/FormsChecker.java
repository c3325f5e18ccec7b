package bedmark.json;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import java.io.IOException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Checks all field forms of a folder: its {@code .json} files but for the schemas among them. */
public final class FormsChecker {

    /**
     * A fault of a form file.
     *
     * @param file   the file's name in the folder; empty for the folder itself
     * @param line   from 1; 0 for the folder
     * @param column from 1; 0 for the folder
     * @param key    the key of the field, else of the section, else the key in the form, that is at fault
     * @param defect what is wrong; its sentence says how to mend it
     */
    public record Finding(String file, int line, int column, String key, Defect defect) {
    }

    private final List<Finding> findings = new ArrayList<>();
    private final Map<String, String> seen = new HashMap<>();

    private FormsChecker() {
    }

    /**
     * Checks a folder.
     *
     * @return nothing where every form is sound; in the order of files and lines
     * @throws Refused where the folder can't be read
     */
    public static List<Finding> check(Path folder) {
        FormsChecker checker = new FormsChecker();
        List<Path> files = files(folder);
        if (files.isEmpty()) {
            checker.findings.add(new Finding("", 0, 0, "", Defect.in(folder.toString(), "forms-none")));
        }
        files.forEach(checker::read);
        return List.copyOf(checker.findings);
    }

    private static List<Path> files(Path folder) {
        List<Path> files = new ArrayList<>();
        try (DirectoryStream<Path> entries = Files.newDirectoryStream(folder, "*.json")) {
            entries.forEach(files::add);
        } catch (IOException e) {
            throw new Refused(Defect.in(folder.toString(), "folder-unreadable"), e);
        }
        files.removeIf(file -> file.toString().endsWith(".schema.json"));
        files.sort(null);
        return files;
    }

    private void read(Path path) {
        String file = path.getFileName().toString();
        Document document;
        try {
            document = JsonFile.read(path);
        } catch (IOException e) {
            findings.add(new Finding(file, 1, 1, "", Defect.in(file, "file-unreadable")));
            return;
        } catch (Refused e) {
            findings.add(unreadable(file, e.defect()));
            return;
        }
        List<Defect> defects = FormCheck.check(document);
        defects.forEach(defect -> findings.add(finding(file, document, defect)));
        if (defects.isEmpty()) {
            Branch root = document.root();
            String form = root.text("id").orElseThrow() + " " + root.number("version").orElseThrow();
            Optional.ofNullable(seen.putIfAbsent(form, file)).ifPresent(other -> findings.add(finding(file, document,
                    Defect.at(Pointer.of("id"), "form-twice", form, other))));
        }
    }

    private static Finding unreadable(String file, Defect defect) {
        boolean placed = defect.code().equals("json-unreadable");
        return new Finding(file, placed ? Integer.parseInt(defect.details().get(0)) : 1,
                placed ? Integer.parseInt(defect.details().get(1)) : 1, "", defect);
    }

    private static Finding finding(String file, Document document, Defect defect) {
        Pointer where = Pointer.parse(defect.where());
        Document.Place place = document.placeOf(where).orElseThrow();
        return new Finding(file, place.line(), place.column(), key(document.root(), where), defect);
    }

    /** The key of the field or section around a place, else the last key on the way to it. */
    private static String key(Branch root, Pointer where) {
        List<String> tokens = where.tokens();
        for (int length : new int[] {4, 2}) {
            if (tokens.size() >= length && tokens.get(0).equals("sections")
                    && (length == 2 || tokens.get(2).equals("fields"))) {
                Optional<Node> key = root.at(new Pointer(tokens.subList(0, length)).child("key"));
                if (key.filter(Node.Text.class::isInstance).isPresent()) {
                    return ((Node.Text) key.get()).value();
                }
            }
        }
        return where.isRoot() ? "" : where.last();
    }
}
