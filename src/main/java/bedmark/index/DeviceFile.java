package bedmark.index;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.journal.FileLayer;
import bedmark.json.JsonReader;
import bedmark.json.JsonWriter;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.util.Optional;
import java.util.UUID;

/** The file of a store, {@code device.json} on a tablet, which says whose it is. */
public final class DeviceFile {
    public static final String NAME = "device.json";
    private static final int LONGEST = 64 << 10;

    private final Path folder;
    private final FileLayer files;
    private final String name;

    DeviceFile(Path folder, FileLayer files) {
        this(folder, files, NAME);
    }

    /** @param name of the file, where it is not the one of a tablet's store */
    public DeviceFile(Path folder, FileLayer files, String name) {
        this.folder = folder;
        this.files = files;
        this.name = name;
    }

    /**
     * The identity that the file holds. A file that can't be understood is put aside, and counts as missing.
     */
    public Optional<Device> read() throws IOException {
        Path file = folder.resolve(name);
        if (!files.exists(file)) {
            return Optional.empty();
        }
        ByteBuffer bytes;
        try (FileLayer.Input input = files.read(file)) {
            bytes = ByteBuffer.allocate((int) Math.min(input.size(), LONGEST));
            input.read(0, bytes);
        }
        try {
            Branch document = JsonReader.read(bytes.array()).root();
            Optional<Device> device = document.uuid("id").map(id -> new Device(id, document.text("name").orElse("")));
            if (device.isPresent()) {
                return device;
            }
        } catch (Refused e) {
            // Nothing depends on it: the journal knows the identity too.
        }
        files.move(file, folder.resolve(name + ".unreadable"));
        return Optional.empty();
    }

    /** Makes the file, for an identity that is known already or a new one. */
    public Device write(Optional<UUID> known, String called) throws IOException {
        Device device = new Device(known.orElseGet(UUID::randomUUID), called);
        Path part = folder.resolve(name + ".part");
        files.delete(part);
        try (FileLayer.Output output = files.create(part)) {
            output.write(ByteBuffer.wrap(JsonWriter.indented(device.document())));
            output.force();
        }
        files.move(part, folder.resolve(name));
        files.forceFolder(folder);
        return device;
    }
}
