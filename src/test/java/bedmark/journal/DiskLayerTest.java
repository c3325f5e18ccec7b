package bedmark.journal;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.net.StandardProtocolFamily;
import java.net.UnixDomainSocketAddress;
import java.nio.channels.ServerSocketChannel;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class DiskLayerTest {
    @TempDir
    private Path folder;

    /** A socket stands for every name that is no file: nobody means to put a pack in the place of a device. */
    @Test
    void whatIsNoFileIsNeverReplaced() throws IOException {
        Path from = Files.writeString(folder.resolve("pack.part"), "pack");
        Path device = folder.resolve("s");
        try (ServerSocketChannel socket = ServerSocketChannel.open(StandardProtocolFamily.UNIX)) {
            socket.bind(UnixDomainSocketAddress.of(device));
            assertThrows(IOException.class, () -> FileLayer.disk().move(from, device));
            assertFalse(Files.isRegularFile(device));
            assertTrue(Files.exists(from));
        }
    }

    @Test
    void aFolderThatNobodyMayMakeIsNotSaidToBeGone() {
        Path never = folder.resolve("never");
        assertEquals(Fault.READ_ONLY, Fault.of(new AccessDeniedException(never.toString()), FileLayer.disk(), never));
        assertEquals(Fault.VANISHED, Fault.of(new NoSuchFileException(never.toString()), FileLayer.disk(), never));
    }

    @Test
    void aReasonIsTheSystemsOwnWithoutThePath() {
        assertEquals("File name too long",
                Fault.reason(new FileSystemException("/stick/a.part", null, "File name too long")));
        assertEquals("AccessDeniedException", Fault.reason(new AccessDeniedException("/stick/a.part")));
        assertEquals("IOException", Fault.reason(new IOException()));
    }
}
