package bedmark.pack;

import java.io.File;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.nio.file.attribute.FileAttribute;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.Set;

/** The disk of this machine. */
final class SystemDisk implements Disk {
    private static final boolean WINDOWS = File.separatorChar == '\\';

    @Override
    public Output create(Path file, boolean ownerOnly) throws IOException {
        boolean posix = file.getFileSystem().supportedFileAttributeViews().contains("posix");
        FileAttribute<?>[] rights = ownerOnly && posix ? new FileAttribute<?>[] {
            PosixFilePermissions.asFileAttribute(PosixFilePermissions.fromString("rw-------"))
        } : new FileAttribute<?>[0];
        return new ChannelOutput(FileChannel.open(file,
                Set.of(StandardOpenOption.CREATE_NEW, StandardOpenOption.WRITE), rights));
    }

    @Override
    public void move(Path from, Path to) throws IOException {
        Files.move(from, to, StandardCopyOption.ATOMIC_MOVE);
    }

    /** Windows refuses to open a folder and keeps names by itself. */
    @Override
    public void forceFolder(Path folder) throws IOException {
        if (!WINDOWS) {
            try (FileChannel channel = FileChannel.open(folder, StandardOpenOption.READ)) {
                channel.force(true);
            }
        }
    }

    @Override
    public void delete(Path file) throws IOException {
        Files.deleteIfExists(file);
    }

    @Override
    public long free(Path folder) throws IOException {
        return Files.getFileStore(folder).getUsableSpace();
    }

    private static final class ChannelOutput extends Output {
        private final FileChannel channel;

        ChannelOutput(FileChannel channel) {
            this.channel = channel;
        }

        @Override
        public void write(int single) throws IOException {
            write(new byte[] {(byte) single}, 0, 1);
        }

        @Override
        public void write(byte[] bytes, int from, int length) throws IOException {
            ByteBuffer buffer = ByteBuffer.wrap(bytes, from, length);
            while (buffer.hasRemaining()) {
                channel.write(buffer);
            }
        }

        @Override
        void force() throws IOException {
            channel.force(true);
        }

        @Override
        public void close() throws IOException {
            channel.close();
        }
    }
}
