package bedmark.pack;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.journal.FileLayer;
import bedmark.journal.Progress;
import bedmark.survey.Bundle;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Supplier;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A pack is written whole or not at all, and why not is said. */
class PackWriterTest {
    private static final Map<String, byte[]> PHOTOS = Map.of("a.png", BagForge.PHOTO, "b.jpg", Samples.jpeg(200, 200));
    private static final Supplier<IOException> BROKEN = () -> new IOException("Input/output error");

    @TempDir
    Path folder;
    private Path stick;
    private Path out;
    private DeviceKey key;
    private PhotoSource source;

    @BeforeEach
    void prepare() throws IOException {
        key = DeviceKey.of(folder.resolve("store"));
        source = Samples.folder(folder.resolve("photos"), PHOTOS);
        stick = Files.createDirectory(folder.resolve("stick"));
        out = stick.resolve("round.zip");
    }

    private void refused(String code, Bundle bundle) throws IOException {
        refused(code, FileLayer.disk(), bundle, out, Progress.NONE);
        assertEquals(List.of(), Packs.names(stick));
    }

    private Refused refused(String code, FileLayer disk, Bundle bundle, Path target, Progress progress) {
        Refused refused = assertThrows(Refused.class,
                () -> new PackWriter(disk).writePack(bundle, source, key, target, progress));
        assertEquals(code, refused.defect().code(), refused::getMessage);
        return refused;
    }

    @Test
    void photosThatAreNotThereOrNotTheOnesAreRefusedByName() throws IOException {
        refused("pack-photo-missing", Samples.bundle(Map.of("c.png", BagForge.PHOTO)));
        refused("pack-photo-differs", Samples.bundle(Map.of("a.png", Samples.png(3, 3))));
        byte[] sameSize = BagForge.PHOTO.clone();
        sameSize[sameSize.length - 1] ^= 1;
        refused("pack-photo-differs", Samples.bundle(Map.of("a.png", sameSize)));
        Refused named = refused("pack-photo-missing", FileLayer.disk(),
                Samples.bundle(Map.of("c.png", BagForge.PHOTO)), out, Progress.NONE);
        assertEquals("c.png", named.defect().where());
    }

    @Test
    void whatTheReaderWouldRefuseIsNotWritten() throws IOException {
        byte[] text = BagForge.text("no photo");
        Files.write(folder.resolve("photos/c.png"), text);
        refused("pack-photo-kind", Samples.bundle(Map.of("c.png", text)));
        Branch claim = Samples.claim("a.png", BagForge.PHOTO);
        refused("name-parent", Samples.bundle(List.of(claim.with("file", "../photos/a.png"))));
        refused("name-reserved", Samples.bundle(List.of(claim.with("file", "aux.png"))));
        refused("zip-name-clash", Samples.bundle(List.of(claim, claim.with("file", "A.PNG"))));
        refused("key-absent", Samples.bundle(List.of(claim.without("bytes"))));
        refused("key-absent", new Bundle(Samples.bundle(PHOTOS).document().without("createdAt")));
        refused("key-absent", new Bundle(Samples.bundle(PHOTOS).document().without("id")));
        Node.Series full = new Node.Series(Collections.nCopies(250_001, Node.flag(true)));
        refused("pack-bundle-too-full", new Bundle(Samples.bundle(PHOTOS).document().with("x", full)));
        refused("pack-bundle-too-large", new Bundle(Samples.bundle(PHOTOS).document()
                .with("x", "x".repeat(17_000_000))));
    }

    @Test
    void aPhotoThatChangesWhileItIsPackedIsRefused() throws IOException {
        Path photo = folder.resolve("photos/b.jpg");
        byte[] changed = PHOTOS.get("b.jpg").clone();
        changed[changed.length / 2] ^= 1;
        Progress meddling = (done, total) -> {
            if (done == total / 2) {
                try {
                    Files.write(photo, changed);
                } catch (IOException e) {
                    throw new UncheckedIOException(e);
                }
            }
        };
        refused("pack-photo-differs", FileLayer.disk(), Samples.bundle(PHOTOS), out, meddling);
        assertEquals(List.of(), Packs.names(stick));
    }

    @Test
    void theFolderAroundThePhotosWillDoToo() {
        source = PhotoSource.folder(folder);
        PackWriter.write(Samples.bundle(PHOTOS), source, key, out, Progress.NONE);
        assertEquals(2, PackReader.open(out, PackLimits.STANDARD).photos().size());
    }

    @Test
    void aSourceMayFindPhotosByTheirDigest() {
        String digest = Sha256.hex(BagForge.PHOTO);
        PackWriter.write(Samples.bundle(Map.of("c.png", BagForge.PHOTO)), (name, sha256) -> sha256.equals(digest)
                ? Optional.of(PhotoSource.file(folder.resolve("photos/a.png"))) : Optional.empty(), key, out, Progress.NONE);
        assertEquals("c.png", PackReader.open(out, PackLimits.STANDARD).photos().get(0).name());
    }

    @Test
    void whyTheFolderTakesNoPackIsSaid() throws IOException {
        Bundle bundle = Samples.bundle(PHOTOS);
        refused("pack-folder-missing", FileLayer.disk(), bundle, stick.resolve("gone/round.zip"), Progress.NONE);
        refused("pack-target-folder", FileLayer.disk(), bundle, stick, Progress.NONE);
        refused("pack-folder-read-only", new FailingDisk(1, true, () -> new AccessDeniedException(out.toString())),
                bundle, out, Progress.NONE);
        refused("pack-folder-read-only", new FailingDisk(1, true, () -> new IOException("Read-only file system")),
                bundle, out, Progress.NONE);
        refused("pack-disk-full", new FailingDisk(5, true, () -> new IOException("No space left on device")),
                bundle, out, Progress.NONE);
        FailingDisk small = new FailingDisk(0, false, BROKEN);
        small.free = 1_000;
        refused("pack-disk-full", small, Samples.bundle(PHOTOS), out, Progress.NONE);
        FailingDisk full = new FailingDisk(4, false, BROKEN);
        full.free = 0;
        refused("pack-disk-full", full, bundle, out, Progress.NONE);
        assertEquals(List.of(), Packs.names(stick));
    }

    @Test
    void aStickPulledOutWhileWritingIsSaid() throws IOException {
        Progress pulling = (done, total) -> {
            if (done == total / 2) {
                try {
                    Files.deleteIfExists(stick);
                } catch (IOException e) {
                    throw new UncheckedIOException(e);
                }
            }
        };
        refused("pack-folder-missing", FileLayer.disk(), Samples.bundle(PHOTOS), out, pulling);
    }

    /** Each step in turn fails, once and for good; only after the move may the new pack be there, and then whole. */
    @ParameterizedTest
    @ValueSource(booleans = {false, true})
    void anyFailingStepLeavesTheOldPackOrTheWholeNewOne(boolean forGood) throws IOException {
        FailingDisk counting = new FailingDisk(0, false, BROKEN);
        new PackWriter(counting).writePack(Samples.bundle(PHOTOS), source, key, out, Progress.NONE);
        byte[] whole = Files.readAllBytes(out);
        byte[] older = BagForge.text("an older pack");
        assertEquals(List.of("close", "move", "force folder"),
                counting.steps.subList(counting.steps.size() - 3, counting.steps.size()));
        for (int step = 1; step <= counting.steps.size(); step++) {
            Files.write(out, older);
            refused("pack-not-saved", new FailingDisk(step, forGood, BROKEN), Samples.bundle(PHOTOS), out,
                    Progress.NONE);
            assertEquals(List.of("round.zip"), Packs.names(stick));
            assertArrayEquals(step < counting.steps.size() ? older : whole, Files.readAllBytes(out), "step " + step);
        }
    }

    @Test
    void cancellingAnywhereLeavesNothing() throws IOException {
        int heard = cancelledAfter(Integer.MAX_VALUE);
        Files.delete(out);
        for (int last = 1; last < heard; last++) {
            int after = last;
            assertEquals("pack-cancelled",
                    assertThrows(Refused.class, () -> cancelledAfter(after)).defect().code());
            assertEquals(List.of(), Packs.names(stick));
        }
    }

    private int cancelledAfter(int calls) {
        int[] heard = {0};
        PackWriter.write(Samples.bundle(PHOTOS), source, key, out, new Progress() {
            @Override
            public void at(long done, long total) {
                heard[0]++;
            }

            @Override
            public boolean cancelled() {
                return heard[0] >= calls;
            }
        });
        return heard[0];
    }

    @Test
    void anInterruptedThreadCancels() throws IOException {
        Progress interrupting = (done, total) -> {
            if (done == total / 2) {
                Thread.currentThread().interrupt();
            }
        };
        refused("pack-cancelled", FileLayer.disk(), Samples.bundle(PHOTOS), out, interrupting);
        assertTrue(Thread.interrupted());
        assertEquals(List.of(), Packs.names(stick));
    }

    @Test
    void whatAKilledAttemptLeftIsRemoved() throws IOException {
        Files.write(stick.resolve(".round.zip.0badcafe.part"), new byte[10]);
        Files.write(stick.resolve(".other.zip.0badcafe.part"), new byte[10]);
        PackWriter.write(Samples.bundle(PHOTOS), source, key, out, Progress.NONE);
        assertEquals(List.of(".other.zip.0badcafe.part", "round.zip"), Packs.names(stick));
    }
}
