package bedmark.survey.merge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ZoneIdTest {
    private static final List<String> IDS = List.of("", "TP-1", "a/b", "/", "~", "~1", "a~0/1", "Förderer 7");

    @Test
    void everyKeyIsThatOfOneZone() {
        for (String plant : IDS) {
            for (String transfer : IDS) {
                ZoneId zone = new ZoneId(plant, transfer);
                assertEquals(zone, ZoneId.ofKey(zone.key()));
            }
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "plant", "plant/TP-1", "/plant", "/plant/TP/1", "/a~1b/TP/1"})
    void whatIsNoKeyIsNoZone(String key) {
        assertThrows(IllegalArgumentException.class, () -> ZoneId.ofKey(key));
    }
}
