package bedmark.engine;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.bed.Station;
import bedmark.engine.drag.DragMethod;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealRates;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.seal.SealType;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.uncertainty.Instruments;
import bedmark.engine.uncertainty.Reading;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/**
 * A file of {@code golden/}: a title, where its numbers come from, a mark, then either a zone or a formula with its
 * arguments, and what must come of it. See {@code golden/README.md}.
 */
record GoldenCase(String file, JsonNode root) {

    /** One number or word that must come out. */
    record Expectation(String result, String value, double tolerance) {
    }

    static GoldenCase read(Path file) {
        try {
            return new GoldenCase(file.getFileName().toString(), new ObjectMapper().readTree(file.toFile()));
        } catch (IOException e) {
            throw new IllegalArgumentException(file + ": " + e.getMessage(), e);
        }
    }

    String text(String key) {
        return root.path(key).asText("").strip();
    }

    boolean isFormula() {
        return root.has("formula");
    }

    Map<String, Double> arguments() {
        Map<String, Double> arguments = new LinkedHashMap<>();
        root.path("arguments").properties().forEach(entry ->
                arguments.put(entry.getKey(), GoldenUnits.si(entry.getValue().asText())));
        return arguments;
    }

    List<Expectation> expectations() {
        List<Expectation> expectations = new ArrayList<>();
        root.path("expect").forEach(node -> expectations.add(new Expectation(node.path("result").asText(),
                node.path("value").asText(), node.path("tolerance").asDouble(0))));
        return expectations;
    }

    Settings settings() {
        Settings settings = Settings.standard();
        JsonNode node = root.path("settings");
        if (node.has("beltGrip")) {
            settings = settings.withGrip(node.path("beltGrip").asDouble(), node.path("boardGrip").asDouble());
        }
        if (node.has("method")) {
            settings = settings.with(DragMethod.ofCode(node.path("method").asText()).orElseThrow());
        }
        SealRates rates = settings.sealRates();
        for (JsonNode row : node.path("sealMultipliers")) {
            rates = rates.with(SealType.ofCode(row.path("type").asText()).orElseThrow(),
                    SealCondition.ofCode(row.path("condition").asText()).orElseThrow(),
                    row.path("multiplier").asDouble());
        }
        return settings.with(rates).with(instruments());
    }

    LoadingZone zone() {
        JsonNode node = root.path("zone");
        Map<Datum, Reading> data = new EnumMap<>(Datum.class);
        node.path("data").properties().forEach(entry -> {
            Datum datum = Datum.ofPointer(entry.getKey()).orElseThrow(
                    () -> new IllegalArgumentException(file + ": no datum " + entry.getKey()));
            data.put(datum, instruments().reading(datum.pointer(), GoldenUnits.si(entry.getValue().asText()),
                    datum.instrument()));
        });
        LoadingZone zone = LoadingZone.UNKNOWN.with(data).withStations(stations(node)).withSeals(seals(node));
        if (node.has("speedClass")) {
            zone = zone.withSpeedClass(SpeedClass.ofCode(node.path("speedClass").asText()).orElseThrow());
        }
        for (JsonNode mark : node.path("marks")) {
            zone = zone.withMark(LoadingZone.Mark.valueOf(mark.asText().toUpperCase(Locale.ROOT).replace('-', '_')));
        }
        return zone;
    }

    private List<Station> stations(JsonNode node) {
        List<Station> stations = new ArrayList<>();
        for (JsonNode row : node.path("stations")) {
            String place = "/readings/bedDepths/" + stations.size();
            stations.add(new Station(reading(place + "/position", row.path("position"), Instrument.TAPE),
                    reading(place + "/depth", row.path("depth"), Instrument.DEPTH_MEASURED),
                    DepthMethod.ofCode(row.path("method").asText("at-board")).orElseThrow()));
        }
        return stations;
    }

    private List<SealSegment> seals(JsonNode node) {
        List<SealSegment> seals = new ArrayList<>();
        for (JsonNode row : node.path("seals")) {
            seals.add(new SealSegment(Side.ofCode(row.path("side").asText()).orElseThrow(),
                    SealType.ofCode(row.path("type").asText()).orElseThrow(),
                    SealCondition.ofCode(row.path("condition").asText("sound")).orElseThrow(),
                    reading("/readings/seals/" + seals.size() + "/length", row.path("length"), Instrument.TAPE)));
        }
        return seals;
    }

    private Reading reading(String name, JsonNode node, Instrument instrument) {
        return instruments().reading(name, GoldenUnits.si(node.asText()), instrument);
    }

    /** The site's instruments; all of them exact unless the case asks for their uncertainties. */
    private Instruments instruments() {
        Instruments instruments = Instruments.standard();
        if (root.path("uncertainties").asBoolean(false)) {
            return instruments;
        }
        for (Instrument instrument : Instrument.values()) {
            instruments = instruments.with(instrument, 0);
        }
        return instruments;
    }
}
