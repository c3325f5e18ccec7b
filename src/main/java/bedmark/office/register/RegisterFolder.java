package bedmark.office.register;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Fault;
import bedmark.journal.NamedPath;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.LinkedHashMap;
import java.util.Map;

/** A register as tables in a folder: all of them are written before the first takes the place of an earlier one. */
public final class RegisterFolder {
    private RegisterFolder() {
    }

    /**
     * Writes the tables.
     *
     * @param head as {@link RegisterTables#of} takes it
     * @param out  the folder; made where it is not there
     * @return how many tables
     * @throws Refused {@code folder-is-file}, {@code folder-unreadable}, {@code file-is-folder}, {@code file-not-plain},
     *                 {@code export-not-saved}; tables that were there are as they were, unless one could not take its place
     *                 after others had
     */
    public static int write(Branch head, Path out) {
        Map<String, String> tables = RegisterTables.of(head);
        Map<Path, Path> parts = new LinkedHashMap<>();
        try {
            NamedPath.requireFolderOrNothing(out);
            Files.createDirectories(out);
            for (Map.Entry<String, String> table : tables.entrySet()) {
                Path target = out.resolve(table.getKey());
                NamedPath.requireTarget(target);
                Path part = out.resolve("." + table.getKey() + ".part");
                parts.put(part, target);
                Files.writeString(part, table.getValue());
            }
            for (Map.Entry<Path, Path> part : parts.entrySet()) {
                Files.move(part.getKey(), part.getValue(), StandardCopyOption.REPLACE_EXISTING);
            }
            return tables.size();
        } catch (IOException e) {
            throw new Refused(Defect.in(out.toString(), "export-not-saved", Fault.reason(e)), e);
        } finally {
            parts.keySet().forEach(part -> part.toFile().delete());
        }
    }
}
