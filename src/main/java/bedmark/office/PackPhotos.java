package bedmark.office;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.Fault;
import bedmark.journal.Progress;
import bedmark.json.BundleReader;
import bedmark.pack.PackLimits;
import bedmark.pack.PackReader;
import bedmark.pack.PackedPhoto;
import bedmark.pack.ReadPack;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;

/** The photos of packs that were taken in; used by the store's own thread. */
final class PackPhotos {
    private static final int OPEN_AT_MOST = 8;

    private final PackShelf shelf;
    private final PackLimits limits;
    private final Map<String, ReadPack> open = new HashMap<>();

    PackPhotos(PackShelf shelf, PackLimits limits) {
        this.shelf = shelf;
        this.limits = limits;
    }

    /** The bytes of a photo of a pack; nothing where the pack holds none of that digest. */
    Optional<byte[]> bytes(Books books, String pack, String sha256) {
        if (!shelf.has(pack)) {
            books.ask(() -> books.tables().pack(pack)).ifPresent(content -> shelf.lay(pack, content));
        }
        if (!open.containsKey(pack)) {
            if (open.size() > OPEN_AT_MOST) {
                open.clear();
            }
            open.put(pack, new PackReader(limits, BundleReader::readUnjudged).open(shelf.file(pack),
                    Progress.NONE));
        }
        ReadPack read = open.get(pack);
        Optional<PackedPhoto> found = read.photos().stream().filter(one -> one.sha256().equals(sha256)).findFirst();
        if (found.isEmpty()) {
            return Optional.empty();
        }
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try {
            read.copy(found.get(), bytes);
            return Optional.of(bytes.toByteArray());
        } catch (IOException e) {
            throw new Refused(Defect.in(shelf.file(pack).toString(), "pack-unreadable", Fault.reason(e)), e);
        }
    }
}
