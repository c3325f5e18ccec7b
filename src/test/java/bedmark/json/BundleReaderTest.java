package bedmark.json;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.survey.Bundle;
import bedmark.words.Words;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.UUID;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class BundleReaderTest {
    private static final String LENGTH = "/surveys/0/readings/loadingZoneLength";
    private static final String STATION = "/surveys/0/readings/bedDepths/1";
    private static final String SEAL = "/surveys/0/readings/seals/0";

    private static byte[] sample() {
        try (InputStream text = BundleReaderTest.class.getResourceAsStream("bundle.json")) {
            return text.readAllBytes();
        } catch (IOException e) {
            throw new IllegalStateException(e);
        }
    }

    /** The sample with one value replaced, wherever it lies. */
    private static byte[] changed(String where, String json) {
        Node value = JsonReader.read(("{\"v\":" + json + "}").getBytes(StandardCharsets.UTF_8)).root().members()
                .get("v");
        return JsonWriter.indented(replace(JsonReader.read(sample()).root(), Pointer.parse(where).tokens(), value));
    }

    private static Node replace(Node node, List<String> way, Node value) {
        if (way.isEmpty()) {
            return value;
        }
        List<String> rest = way.subList(1, way.size());
        if (node instanceof Branch branch) {
            return branch.with(way.get(0),
                    replace(branch.members().getOrDefault(way.get(0), Branch.EMPTY), rest, value));
        }
        List<Node> items = new ArrayList<>(((Node.Series) node).items());
        int index = Integer.parseInt(way.get(0));
        items.set(index, replace(items.get(index), rest, value));
        return new Node.Series(items);
    }

    private static Defect refusal(byte[] bytes) {
        Defect defect = assertThrows(Refused.class, () -> BundleReader.read(bytes)).defect();
        for (Locale language : Words.LANGUAGES) {
            Words words = new Words(language);
            Object[] arguments = Stream.concat(Stream.of(defect.where()), defect.details().stream()).toArray();
            assertTrue(words.has("defect." + defect.code()), defect.code());
            assertTrue(words.text("defect." + defect.code(), arguments).lines().count() == 1);
        }
        return defect;
    }

    @Test
    void everythingThatIsReadIsWrittenAgain() {
        Bundle bundle = BundleReader.read(sample());
        assertEquals(3, bundle.surveys().size());
        assertEquals(JsonReader.read(sample()).root(), bundle.document());
        assertEquals(bundle.document(), BundleReader.read(JsonWriter.compact(bundle.document())).document());
    }

    @Test
    void revisionNamesWhatItSupersedes() {
        Bundle bundle = BundleReader.read(sample());
        assertTrue(bundle.surveys().get(0).supersedes().isEmpty());
        assertEquals(UUID.fromString("0b2f6c1e-6f0e-4f6f-9a70-0d0e3f8f1a03"),
                bundle.surveys().get(1).supersedes().orElseThrow());
    }

    @Test
    void whatAVerdictNeedsMayBeMissing() {
        assertEquals(3, BundleReader.read(changed("/surveys/0/readings", "{}")).surveys().size());
        assertEquals(3, BundleReader.read(changed("/surveys/0/readings/seals", "[]")).surveys().size());
        assertEquals(3, BundleReader.read(changed("/surveys/0/readings/bedDepths", "[{}]")).surveys().size());
        assertEquals(3, BundleReader.read(changed(LENGTH, "null")).surveys().size());
        assertEquals(3, BundleReader.read(changed("/plant/conveyors/0", "{\"id\":\"c1\"}")).surveys().size());
    }

    @Test
    void smallestBundleIsRead() {
        byte[] text = "{\"format\":\"bedmark.bundle\",\"version\":1,\"plant\":{},\"surveys\":[]}"
                .getBytes(StandardCharsets.UTF_8);
        assertEquals(List.of(), BundleReader.read(text).surveys());
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '~', value = {
        "/format | ~\"bedmark.assessment\"~ | format-unknown | /format",
        "/version | 2 | version-unknown | /version",
        "/version | 1.5 | version-unknown | /version",
        "/version | ~\"1\"~ | kind-wrong | /version",
        "/plant | null | key-absent | ",
        "/surveys | {} | kind-wrong | /surveys",
        "/surveys/0/id | ~\"7\"~ | uuid-wrong | /surveys/0/id",
        "/surveys/0/id | null | key-absent | /surveys/0",
        "/surveys/1/id | ~\"0b2f6c1e-6f0e-4f6f-9a70-0d0e3f8f1a03\"~ | survey-twice | /surveys/1/id",
        "/surveys/1/supersedes | ~\"none\"~ | uuid-wrong | /surveys/1/supersedes",
        "/surveys/0/revision | 0 | number-too-small | /surveys/0/revision",
        "/surveys/0/revision | 1.5 | kind-wrong | /surveys/0/revision",
        "/surveys/0/revision | 1000000000000 | number-too-large | /surveys/0/revision",
        "/surveys/0/transfer | ~\"t9\"~ | transfer-unknown | /surveys/0/transfer",
        "/surveys/0/startedAt | ~\"yesterday\"~ | time-wrong | /surveys/0/startedAt",
        "/surveys/0/inspectionStatus | ~\"maybe\"~ | word-wrong | /surveys/0/inspectionStatus",
        "/surveys/0/photos/0/sha256 | ~\"00\"~ | text-wrong | /surveys/0/photos/0/sha256",
        "/surveys/0/observations | [] | kind-wrong | /surveys/0/observations",
        "/rounds/0/points/1/transfer | ~\"t9\"~ | transfer-unknown | /rounds/0/points/1/transfer",
        "/plant/transfers/1/conveyor | ~\"c9\"~ | conveyor-unknown | /plant/transfers/1/conveyor",
        "/plant/transfers/0/material | ~\"ore\"~ | material-unknown | /plant/transfers/0/material",
        "/plant/conveyors/1/id | ~\"c1\"~ | id-twice | /plant/conveyors/1/id",
        "/plant/conveyors/0/id | ~\"\"~ | value-empty | /plant/conveyors/0/id",
        "/plant/conveyors/0/driveEfficiency | 1.2 | number-too-large | /plant/conveyors/0/driveEfficiency",
        "/plant/conveyors/0/driveEfficiency | 0 | number-not-positive | /plant/conveyors/0/driveEfficiency",
        "/plant/materials/0/skirtFrictionFactor | -1 | number-negative | /plant/materials/0/skirtFrictionFactor",
        "/plant/method | ~\"guess\"~ | word-wrong | /plant/method",
        "/plant/instruments/0/kind | ~\"eye\"~ | word-wrong | /plant/instruments/0/kind",
        "/plant/instruments/0 | {\"kind\":\"tape\",\"relative\":0.1} | key-absent | /plant/instruments/0",
        "/plant/instruments/1/standardUncertainty/unit | ~\"mm\"~ | unit-wrong "
            + "| /plant/instruments/1/standardUncertainty/unit",
        "/plant/instruments/2 | {\"kind\":\"belt-scale\"} | key-absent | /plant/instruments/2",
        "/plant/sealRates/1 | {\"type\":\"oblique\",\"multiplier\":1} | key-absent | /plant/sealRates/1",
        "/plant/sealRates/1/multiplier | -1 | number-negative | /plant/sealRates/1/multiplier",
        "/plant/limits/bed-over-board/near | ~\"0.8\"~ | kind-wrong | /plant/limits/bed-over-board/near"})
    void whatIsWrongIsNamedWithItsPlace(String where, String json, String code, String place) {
        Defect defect = refusal(changed(where, json));
        assertEquals(code, defect.code());
        String found = defect.where();
        assertEquals(place == null ? "" : place, found.substring(0, found.lastIndexOf('(')).strip());
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '~', value = {
        LENGTH + "/value | 0 | number-not-positive", LENGTH + "/value | -6 | number-not-positive",
        LENGTH + "/value | ~\"6\"~ | kind-wrong", LENGTH + "/unit | ~\"mph\"~ | unit-wrong",
        LENGTH + "/unit | ~\"kg/s\"~ | unit-wrong", LENGTH + "/quality | ~\"sure\"~ | word-wrong",
        LENGTH + "/standardUncertainty | -0.1 | number-negative", LENGTH + "/at | ~\"08:31\"~ | time-wrong",
        LENGTH + "/beltState | ~\"off\"~ | word-wrong",
        STATION + "/depth/value | -1 | number-negative", STATION + "/position/value | -1 | number-negative",
        STATION + "/position/value | 6.2 | station-outside-zone", STATION + "/position/value | 3.000 | station-twice",
        STATION + "/depthMethod | ~\"by-eye\"~ | word-wrong",
        SEAL + "/side | ~\"top\"~ | word-wrong", SEAL + "/type | ~\"brush\"~ | word-wrong",
        SEAL + "/condition | ~\"old\"~ | word-wrong", SEAL + "/length/value | 0 | number-not-positive",
        "/surveys/0/readings/beltTiming/elapsed/value | 0 | number-not-positive",
        "/surveys/0/readings/beltTiming/revolutions | -2 | number-negative",
        "/surveys/0/readings/throughput/value | -1 | number-negative",
        "/surveys/0/readings/runningPower/unit | ~\"t/h\"~ | unit-wrong",
        "/surveys/0/readings/moisture/unit | ~\"mm\"~ | unit-wrong",
        "/plant/conveyors/0/beltWidth/unit | ~\"deg\"~ | unit-wrong",
        "/plant/conveyors/0/ratedPower/value | 0 | number-not-positive",
        "/plant/conveyors/0/skirtPowerBudget/unit | ~\"mm\"~ | unit-wrong",
        "/plant/materials/0/bulkDensity/unit | ~\"t/h\"~ | unit-wrong",
        "/plant/transfers/0/designThroughput/unit | ~\"kW\"~ | unit-wrong"})
    void impossibleValuesAndUnitsAreRefused(String where, String json, String code) {
        byte[] text = changed(where, json);
        Document.Place place = JsonReader.read(text).placeOf(Pointer.parse(where)).orElseThrow();
        Defect defect = refusal(text);
        assertEquals(code, defect.code());
        assertTrue(defect.where().endsWith("(" + place.line() + ":" + place.column() + ")")
                || code.startsWith("station-"), defect.where());
        assertTrue(defect.where().startsWith(where) || code.startsWith("station-"), defect.where());
    }

    @Test
    void firstDefectInTheTextIsTheReason() {
        byte[] text = ("{\"format\":\"bedmark.bundle\",\"version\":1,\n\"surveys\":[{\"id\":5,\"transfer\":6}],\n"
                + "\"plant\":[]}").getBytes(StandardCharsets.UTF_8);
        assertEquals("/surveys/0/id (2:18)", refusal(text).where());
    }

    @ParameterizedTest
    @ValueSource(strings = {"2016-12-31T23:59:60Z", "2026-03-01 08:30:00Z", "2026-03-01T08:30Z", "2026-02-30T08:30:00Z",
        "2026-03-01T08:30:00", "2026-03-01T08:30:00+23:00", "2026-03-01T24:00:00Z",
        "2026-03-01T08:30:00-00:00"})
    void timesOutsideTheCalendarAreRefused(String time) {
        assertEquals("time-wrong", refusal(changed(LENGTH + "/at", '"' + time + '"')).code());
        assertEquals("time-wrong", refusal(changed("/surveys/0/startedAt", '"' + time + '"')).code());
    }

    @ParameterizedTest
    @ValueSource(strings = {"2026-03-01T08:30:00Z", "2026-03-01t08:30:00z", "2026-03-01T08:30:00.123456789-09:30",
        "2024-02-29T23:59:59+14:00"})
    void timesThatPassCanBeRead(String time) {
        Bundle bundle = BundleReader.read(changed("/surveys/0/startedAt", '"' + time + '"'));
        assertTrue(bundle.surveys().get(0).startedAt().isPresent());
    }
}
