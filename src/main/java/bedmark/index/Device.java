package bedmark.index;

import bedmark.document.Branch;
import java.util.Objects;
import java.util.UUID;

/** The identity of a tablet, made on first start and kept with the store. */
public record Device(UUID id, String name) {
    public Device {
        Objects.requireNonNull(id);
        Objects.requireNonNull(name);
    }

    /** The {@code device} object of a bundle. */
    public Branch document() {
        return Branch.EMPTY.with("id", id.toString()).with("name", name);
    }
}
