package bedmark.pack;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.json.JsonReader;
import bedmark.json.ReceiptText;
import bedmark.json.RoundText;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;

/** What travels between tablets and an office, each as one file. */
public enum FileKind {
    /** Surveys, from a tablet to the office. */
    PACK("pack", ".zip"),
    /** The next round, from the office to the tablets. */
    ROUND("round", RoundFile.ENDING),
    /** What the office has, back to the tablet. */
    RECEIPT("receipt", ReceiptWriter.ENDING);

    private final String code;
    private final String ending;

    FileKind(String code, String ending) {
        this.code = code;
        this.ending = ending;
    }

    public String code() {
        return code;
    }

    /**
     * What a file is; whether it is sound is another question. It is told by what it holds, since a file keeps its kind
     * when its name is changed; by its name only where that says nothing, so that a damaged file is refused as what it
     * was.
     *
     * @throws Refused {@code file-kind-unknown}, {@code file-unreadable}
     */
    public static FileKind of(Path file) {
        String name = file.getFileName().toString().toLowerCase(Locale.ROOT);
        return held(file).or(() -> Stream.of(values()).filter(kind -> name.endsWith(kind.ending)).findFirst())
                .orElseThrow(() -> new Refused(Defect.in(file.toString(), "file-kind-unknown")));
    }

    /**
     * Whether a file begins like an archive.
     *
     * @throws Refused {@code file-unreadable}
     */
    public static boolean isArchive(Path file) {
        byte[] start = read(file, 2);
        return start.length == 2 && start[0] == 'P' && start[1] == 'K';
    }

    private static Optional<FileKind> held(Path file) {
        if (isArchive(file)) {
            return Optional.of(PACK);
        }
        byte[] bytes = read(file, RoundFile.LONGEST + 1);
        return bytes.length > RoundFile.LONGEST ? Optional.empty() : format(bytes).flatMap(format ->
                switch (format) {
                    case RoundText.FORMAT -> Optional.of(ROUND);
                    case ReceiptText.FORMAT -> Optional.of(RECEIPT);
                    default -> Optional.empty();
                });
    }

    private static Optional<String> format(byte[] bytes) {
        try {
            return JsonReader.read(bytes).root().text("format");
        } catch (Refused e) {
            return Optional.empty();
        }
    }

    private static byte[] read(Path file, int atMost) {
        try (InputStream stream = Files.newInputStream(file)) {
            return stream.readNBytes(atMost);
        } catch (IOException e) {
            throw new Refused(Defect.in(file.toString(), "file-unreadable"), e);
        }
    }
}
