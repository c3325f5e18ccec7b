package bedmark.document;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class PointerTest {

    /** RFC 6901, section 4: no sign, no leading zero, and nothing but digits. */
    @ParameterizedTest
    @CsvSource({"0,0", "7,7", "10,10", "999999999,999999999", "1000000000,-1", "99999999999999999999,-1", "'',-1",
        "01,-1", "00,-1", "-1,-1", "+1,-1", "1a,-1", "' 1',-1", "-,-1", "\u0661,-1", "depth,-1"})
    void placeWithinAListIsWrittenOneWay(String token, int index) {
        assertEquals(index, Pointer.index(token));
    }
}
