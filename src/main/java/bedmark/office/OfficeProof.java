package bedmark.office;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.office.OfficeTables;
import bedmark.index.office.RowId;
import bedmark.journal.Digest;
import bedmark.journal.Fault;
import bedmark.journal.FileLayer;
import bedmark.journal.Progress;
import bedmark.survey.Act;
import bedmark.survey.OfficeDeed;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Set;
import java.util.TreeSet;

/**
 * Proves an office in a folder: the journal, every pack by its digest, and every row of the tables against those that
 * are made anew from journal and packs beside them.
 *
 * @param packs   how many packs there are
 * @param rows    how many rows the tables have
 * @param defects what is not as it was written
 */
public record OfficeProof(int packs, int rows, List<Defect> defects) {
    private static final String BESIDE = "proof";
    private static final int CHUNK = 256 << 10;

    public OfficeProof {
        defects = List.copyOf(defects);
    }

    private record Told(int packs, Map<RowId, String> rows, List<Defect> defects) {
        static Told by(OfficeStore store, Progress progress) {
            store.judgeWaiting(progress);
            return new Told(store.packs().size(), store.ask(OfficeTables::rowDigests), store.found());
        }
    }

    /**
     * Proves an office; its journal, packs and tables stay as they are.
     *
     * @throws Refused as {@link OfficeStore#open(Path, OfficeOptions)}
     */
    public static OfficeProof of(Path folder, OfficeOptions options) {
        List<Defect> defects = new ArrayList<>();
        Told told;
        try (OfficeStore store = OfficeStore.open(folder, options)) {
            told = Told.by(store, options.progress());
            store.packs().forEach(entry -> {
                if (entry.act() instanceof Act.OfficeActed acted
                        && acted.deed() instanceof OfficeDeed.PackReceived pack) {
                    prove(folder.resolve(OfficeStore.PACKS).resolve(pack.sha256() + ".zip"), pack, defects);
                }
            });
        }
        Told anew;
        try (OfficeStore store = OfficeStore.beside(folder, BESIDE, options)) {
            anew = Told.by(store, options.progress());
        } finally {
            drop(folder.resolve(BESIDE), options.files());
        }
        Set<Defect> found = new TreeSet<>(Comparator.comparing(Defect::toString));
        found.addAll(told.defects());
        found.addAll(anew.defects());
        defects.addAll(found);
        Set<RowId> rows = new TreeSet<>(told.rows().keySet());
        rows.addAll(anew.rows().keySet());
        rows.stream().filter(row -> !Objects.equals(told.rows().get(row), anew.rows().get(row))).forEach(row ->
                defects.add(Defect.in(row.table(), "office-row-differs", row.key())));
        return new OfficeProof(told.packs(), told.rows().size(), defects);
    }

    private static void prove(Path file, OfficeDeed.PackReceived pack, List<Defect> defects) {
        if (!Files.isRegularFile(file)) {
            defects.add(Defect.in(file.toString(), "office-pack-lost", pack.file()));
            return;
        }
        MessageDigest sha = Digest.sha256();
        byte[] chunk = new byte[CHUNK];
        try (InputStream input = Files.newInputStream(file)) {
            for (int count = input.read(chunk); count >= 0; count = input.read(chunk)) {
                sha.update(chunk, 0, count);
            }
        } catch (IOException e) {
            defects.add(Defect.in(file.toString(), "pack-unreadable", Fault.reason(e)));
            return;
        }
        if (!Digest.ofBytes(sha.digest()).hex().equals(pack.sha256())) {
            defects.add(Defect.in(file.toString(), "office-pack-damaged", pack.file()));
        }
    }

    private static void drop(Path folder, FileLayer files) {
        try {
            if (files.exists(folder)) {
                for (Path file : files.list(folder)) {
                    files.delete(file);
                }
                files.delete(folder);
            }
        } catch (IOException e) {
            throw new Refused(Fault.defect("store", e, files, folder), e);
        }
    }
}
