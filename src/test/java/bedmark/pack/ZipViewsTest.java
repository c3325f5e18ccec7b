package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import bedmark.document.Refused;
import bedmark.journal.Progress;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The second line of defence, tried by itself: what our own view would let pass by mistake. */
class ZipViewsTest {
    private static final Work NO_WORK = new Work(Progress.NONE, 0);

    @TempDir
    Path folder;
    private final List<PackEntry> own = new ArrayList<>();
    private final Map<String, byte[]> kept = new HashMap<>();
    private Path file;
    private ZipForge forge;

    @BeforeEach
    void writeArchive() throws IOException {
        Map<String, byte[]> files = new LinkedHashMap<>();
        files.put("a", BagForge.text("one"));
        files.put("b", BagForge.text("two"));
        files.put("c", BagForge.text("three"));
        forge = ZipForge.of(files);
        file = Files.write(folder.resolve("views.zip"), forge.build());
        files.forEach((name, content) -> own.add(new PackEntry(
                new ZipSlot(name, false, 0, 0, 0, 0, 0, 0, 0), name, Map.of("sha256", Sha256.hex(content)),
                Optional.empty())));
    }

    private PackContent content() {
        return new PackContent(own, Map.of(), kept);
    }

    private void differ() {
        assertEquals("zip-views-differ", assertThrows(Refused.class,
                () -> ZipViews.check(file, content(), NO_WORK)).defect().code());
    }

    private void withOwn(int index, UnaryOperator<PackEntry> change) {
        own.set(index, change.apply(own.get(index)));
    }

    @Test
    void viewsThatAgreeAreAccepted() throws IOException {
        ZipViews.check(file, content(), NO_WORK);
    }

    @Test
    void anotherNameIsNoticed() {
        withOwn(1, entry -> new PackEntry(new ZipSlot("x", false, 0, 0, 0, 0, 0, 0, 0), "x", entry.digests(),
                entry.doubt()));
        differ();
    }

    @Test
    void otherContentIsNoticed() {
        withOwn(2, entry -> new PackEntry(entry.slot(), entry.name(), own.get(0).digests(), entry.doubt()));
        differ();
    }

    @Test
    void otherContentOfAFileThatIsKeptIsNoticed() throws IOException {
        kept.put("c", BagForge.text("three"));
        ZipViews.check(file, content(), NO_WORK);
        for (String other : List.of("thre", "threee", "thrie", "", "hree")) {
            kept.put("c", BagForge.text(other));
            differ();
        }
    }

    @Test
    void oneEntryMoreOrLessIsNoticed() {
        PackEntry last = own.remove(2);
        differ();
        own.add(last);
        own.add(last);
        differ();
    }

    @Test
    void anEntryThatOnlyOneLibraryViewSeesIsNoticed() throws IOException {
        forge.entries.get(2).localOnly = true;
        Files.write(file, forge.build());
        differ();
        own.remove(2);
        differ();
    }

    @Test
    void anArchiveThatOneLibraryViewCanNotReadIsNoticed() throws IOException {
        forge.entries.get(1).localCrc++;
        Files.write(file, forge.build());
        differ();
    }
}
