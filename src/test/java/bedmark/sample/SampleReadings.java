package bedmark.sample;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.quantity.BeltState;
import bedmark.quantity.Quality;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.stream.Stream;

/** The readings of one visit as a person wrote them down: off one physical state, with the errors of instruments. */
final class SampleReadings {
    private final SampleState state;
    private final SampleVisit visit;
    private final SampleZone zone;
    private final SampleHand hand;
    private final int zonesOfConveyor;
    private Branch readings = Branch.EMPTY;

    private SampleReadings(SampleState state, int zonesOfConveyor) {
        this.state = state;
        this.visit = state.visit();
        this.zone = state.zone();
        this.hand = SampleHand.valueOf(visit.habit().text("units").toUpperCase(Locale.ROOT));
        this.zonesOfConveyor = zonesOfConveyor;
    }

    /** The {@code readings} of the survey. */
    static Branch of(SampleState state, int zonesOfConveyor) {
        return new SampleReadings(state, zonesOfConveyor).all();
    }

    /** A reading on the running belt, so many minutes after the person arrived. */
    static Quantity running(Quantity reading, SampleState state, int minutes) {
        return reading.withQuality(Quality.MEASURED).readAt(state.visit().time().plusMinutes(minutes))
                .withBeltState(BeltState.RUNNING_LOADED);
    }

    private Branch all() {
        geometry();
        SampleSpeed.of(state, hand, visit.habit().text("speed")).members().forEach(this::put);
        depths();
        put("seals", SampleSeals.of(visit.saidOrHabit("seals"), zone.written("designZoneLength")));
        drive();
        visit.said("material").ifPresent(material -> put("materialRunning", Node.text(material)));
        visit.said("moisture").ifPresent(moisture -> put("moisture", Branch.write(SampleQuantity.parse(moisture))));
        return visit.said("open").map(this::only).orElse(readings);
    }

    private void put(String key, Node value) {
        readings = readings.with(key, value);
    }

    private void geometry() {
        put("loadingZoneLength", Branch.write(zone.written("designZoneLength").withQuality(Quality.MEASURED)));
        if (visit.isolated()) {
            for (String board : List.of("skirtSpacing", "skirtHeight")) {
                put(board, Branch.write(zone.written(board).withQuality(Quality.MEASURED)));
            }
        }
    }

    private void depths() {
        String method = visit.habit().text("depths");
        put("depthMethod", Node.text(method));
        List<Quantity> positions = state.positions();
        List<Quantity> depths = visit.said("depths").map(SampleReadings::millimetres)
                .orElseGet(() -> state.bed().areas().stream().map(area -> raw(method, area)).toList());
        List<Node> stations = new ArrayList<>();
        for (int i = 0; i < positions.size(); i++) {
            Quantity depth = depths.get(i).withQuality(quality(i + 1))
                    .readAt(visit.time().plusMinutes(visit.isolated() ? 16 : 6).plusSeconds(10L * i))
                    .withBeltState(visit.isolated() ? BeltState.ISOLATED : BeltState.RUNNING_LOADED);
            stations.add(Branch.EMPTY.with("position", positions.get(i)).with("depth", depth));
        }
        put("bedDepths", new Node.Series(stations));
    }

    /** The person's mark beside the depth at a station, counted from 1. */
    private Quality quality(int station) {
        if (visit.all("suspect").anyMatch(Integer.toString(station)::equals)) {
            return Quality.SUSPECT;
        }
        return visit.isolated() ? Quality.MEASURED : Quality.ESTIMATED;
    }

    /** What a method reads of a bed of that area. */
    private Quantity raw(String method, double area) {
        double level = zone.trough().level(area);
        if (level < 0 && !method.equals("at-centre")) {
            throw new IllegalStateException(visit.transfer() + ": the bed lies " + level + " m under the boards");
        }
        return hand.depth(switch (method) {
            case "from-board-top" -> zone.transfer("skirtHeight") - level;
            case "at-centre" -> zone.trough().centreDepth(area);
            default -> level;
        }, visit.isolated());
    }

    private static List<Quantity> millimetres(String depths) {
        return Stream.of(depths.split(",")).map(text -> Quantity.of(text.strip(), Unit.MILLIMETRE)).toList();
    }

    private void drive() {
        if (visit.habit().yes("scale")) {
            Quantity scale = visit.said("scale").map(SampleQuantity::parse)
                    .orElseGet(() -> hand.flow(state.read(state.flow(), 0.008)));
            put("throughput", Branch.write(running(scale, state, 4)));
        }
        if (visit.habit().yes("meter")) {
            Quantity power = hand.power(state.read(state.power(zonesOfConveyor), 0.01));
            put("runningPower", Branch.write(running(power, state, 5)));
        }
    }

    /** The readings that are there while the survey is still open. */
    private Branch only(String keys) {
        Branch kept = Branch.EMPTY;
        for (Map.Entry<String, Node> reading : readings.members().entrySet()) {
            boolean depthMethod = reading.getKey().equals("depthMethod") && keys.contains("bedDepths");
            if (depthMethod || List.of(keys.split(", ")).contains(reading.getKey())) {
                kept = kept.with(reading.getKey(), reading.getValue());
            }
        }
        return kept;
    }
}
