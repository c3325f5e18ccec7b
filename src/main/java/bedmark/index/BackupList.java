package bedmark.index;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.journal.Digest;
import bedmark.journal.FileLayer;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import java.io.IOException;
import java.io.InputStream;
import java.math.BigDecimal;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.UUID;

/**
 * The list {@code backup.json} of a backup: whose it is, how far it goes, and every file with its digest. It is written
 * last and in one step, so that a backup is whole where its list is.
 *
 * @param device whose store it is
 * @param upTo   the last journal entry that it holds
 * @param sealed whether it takes the store's passphrase
 */
record BackupList(Device device, OffsetDateTime madeAt, long upTo, boolean sealed, List<Item> items) {
    static final String NAME = "backup.json";
    static final String FORMAT = "bedmark.backup";
    private static final int VERSION = 1;
    private static final int LONGEST = 64 << 20;

    BackupList {
        items = List.copyOf(items);
    }

    /**
     * One file.
     *
     * @param file   its name in a store
     * @param bytes  its length
     * @param sha256 its digest, hexadecimal
     */
    record Item(String file, long bytes, String sha256) {

        /** Its name in the backup: that of the store and a part of the digest, so that no version replaces another. */
        String as() {
            return file + "." + sha256.substring(0, 12);
        }

        private Branch document() {
            return Branch.EMPTY.with("file", file).with("as", as()).with("bytes", Node.number(bytes))
                    .with("sha256", sha256);
        }
    }

    byte[] text() {
        return JsonWriter.indented(Branch.EMPTY.with("format", FORMAT).with("version", Node.number(VERSION))
                .with("device", device.document()).with("madeAt", Node.time(madeAt)).with("upTo", Node.number(upTo))
                .with("sealed", Node.flag(sealed))
                .with("files", new Node.Series(items.stream().map(item -> (Node) item.document()).toList())));
    }

    String sha256() {
        return Digest.of(text()).hex();
    }

    /**
     * The list in a backup's folder; nothing where there is none.
     *
     * @throws Refused {@code backup-list-damaged}, {@code version-unknown}
     */
    static Optional<BackupList> read(Path folder, FileLayer files) throws IOException {
        Path file = folder.resolve(NAME);
        if (!files.exists(file)) {
            return Optional.empty();
        }
        byte[] text;
        try (InputStream content = new LayerStream(files.read(file))) {
            text = content.readNBytes(LONGEST);
        }
        try {
            return Optional.of(of(JsonReader.read(text).root()));
        } catch (Refused e) {
            if (e.defect().code().equals("version-unknown")) {
                throw e;
            }
            throw new Refused(Defect.in(file.toString(), "backup-list-damaged"), e);
        } catch (IllegalArgumentException | ArithmeticException e) {
            throw new Refused(Defect.in(file.toString(), "backup-list-damaged"), e);
        }
    }

    private static BackupList of(Branch document) {
        BigDecimal version = document.number("version").orElseThrow(IllegalArgumentException::new);
        if (!FORMAT.equals(document.text("format").orElse(""))) {
            throw new IllegalArgumentException("no list of a backup");
        } else if (version.compareTo(BigDecimal.valueOf(VERSION)) != 0) {
            throw new Refused(Defect.at(Pointer.of("version"), "version-unknown", version.toPlainString(),
                    Integer.toString(VERSION)));
        }
        List<Item> items = new ArrayList<>();
        for (Branch item : document.branches("files")) {
            items.add(new Item(item.text("file").filter(BackupList::isSafe)
                    .orElseThrow(IllegalArgumentException::new),
                    item.number("bytes").orElseThrow(IllegalArgumentException::new).longValueExact(),
                    item.text("sha256").filter(digest -> digest.matches("[0-9a-f]{64}"))
                            .orElseThrow(IllegalArgumentException::new)));
        }
        Branch device = document.branch("device").orElseThrow(IllegalArgumentException::new);
        UUID id = device.uuid("id").orElseThrow(IllegalArgumentException::new);
        return new BackupList(new Device(id, device.text("name").orElse("")),
                document.time("madeAt").orElseThrow(IllegalArgumentException::new),
                document.number("upTo").orElseThrow(IllegalArgumentException::new).longValueExact(),
                document.flag("sealed").orElse(false), items);
    }

    /** A list from elsewhere names files of a store and nothing else. */
    private static boolean isSafe(String name) {
        return name.equals(PassphraseFile.NAME) || name.equals(PassphraseFile.TWIN)
                || name.matches("(journal|photos)/[0-9A-Za-z][0-9A-Za-z.-]*") && !name.contains("..");
    }
}
