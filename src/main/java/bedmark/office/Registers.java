package bedmark.office;

import bedmark.index.office.PlantRow;
import bedmark.json.JsonReader;
import bedmark.survey.Register;
import java.util.LinkedHashMap;
import java.util.Map;

/** The registers that were read last, by the digests of what they were read from. Used by one thread. */
final class Registers {
    private static final int KEPT = 32;

    private final Map<String, Register> read = new LinkedHashMap<>(KEPT, 0.75f, true) {
        @Override
        protected boolean removeEldestEntry(Map.Entry<String, Register> eldest) {
            return size() > KEPT;
        }
    };

    /** The register of a plant's row. */
    Register of(PlantRow row) {
        return read.computeIfAbsent(row.digest(), digest -> read(row));
    }

    static Register read(PlantRow row) {
        return new Register(JsonReader.read(row.content()).root().branch("plant").orElseThrow());
    }
}
