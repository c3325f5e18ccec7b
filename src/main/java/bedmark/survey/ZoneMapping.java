package bedmark.survey;

import static bedmark.document.Refused.below;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.engine.Datum;
import bedmark.engine.LoadingZone;
import bedmark.engine.bed.DepthMethod;
import bedmark.engine.bed.Station;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.seal.SealType;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.uncertainty.Instruments;
import bedmark.engine.uncertainty.Reading;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;

/**
 * The one way from a survey and its register to the engine's loading zone: every single number goes by its
 * {@link Datum}, whose place says where it stands.
 */
final class ZoneMapping {
    private static final String POSITION = "position";
    private static final String DEPTH = "depth";
    private static final String DEPTH_METHOD = "depthMethod";

    /** Where each datum stands, read once: a key on the screen maps a zone. */
    private static final Map<Datum, Place> PLACES = places();

    private final Map<String, Branch> sources;
    private final Taking taking;
    private final List<String> unfinished = new ArrayList<>();

    /**
     * Where a datum stands.
     *
     * @param source the document that it stands in
     * @param holder the object in it that holds the datum
     * @param base   that object's place as refusals name it
     */
    private record Place(Pointer whole, String source, Pointer holder, Pointer base) {
        static Place of(Pointer whole) {
            List<String> tokens = whole.tokens();
            int last = tokens.size() - 1;
            return new Place(whole, tokens.get(0), new Pointer(tokens.subList(1, last)),
                    new Pointer(tokens.subList(0, last)));
        }

        String key() {
            return whole.last();
        }
    }

    private ZoneMapping(Map<String, Branch> sources, Instruments instruments) {
        this.sources = sources;
        taking = new Taking(instruments);
    }

    /**
     * Maps one survey.
     *
     * @throws Refused where a value has the wrong kind or dimension, or a word is unknown; the place is a pointer
     *                 within the survey, or below {@code /conveyor}, {@code /transfer}, {@code /material}
     */
    static LoadingZone map(Survey survey, Register register, Instruments instruments, SiteFactors factors) {
        Register.Transfer transfer = register.transfer(survey.transfer()).orElseThrow(() ->
                new Refused(Defect.at(Pointer.of("transfer"), "transfer-unknown", survey.transfer())));
        LoadingZone zone = new ZoneMapping(Map.of(
                "readings", survey.readings(),
                "transfer", transfer.document(),
                "conveyor", register.conveyorOf(transfer).document(),
                "material", material(survey, transfer, register).map(Register.Material::document)
                        .orElse(Branch.EMPTY)), instruments).zone();
        return factors.of(survey, register).map(row -> withFactor(zone, row)).orElse(zone);
    }

    private static LoadingZone withFactor(LoadingZone zone, SiteFactors.Row row) {
        Map<Datum, Reading> data = new EnumMap<>(Datum.class);
        data.putAll(zone.data());
        row.factor().ifPresent(factor -> data.put(Datum.SITE_FACTOR, factor));
        row.sealRate().ifPresent(rate -> data.put(Datum.SITE_SEAL_RATE, rate));
        return zone.with(data);
    }

    /** The material that really ran, else the one that the register expects. */
    static Optional<Register.Material> material(Survey survey, Register.Transfer transfer, Register register) {
        Optional<String> running = below(Survey.READINGS, () -> survey.readings().text("materialRunning"));
        running.filter(id -> !register.materials().containsKey(id)).ifPresent(id -> {
            throw new Refused(Defect.at(Survey.READINGS.child("materialRunning"), "material-unknown", id));
        });
        return running.or(transfer::material).map(register.materials()::get);
    }

    /**
     * The dimension that a datum must have; nothing where it is a plain number. A new number of the engine is one
     * row here.
     */
    static Optional<Dimension> dimension(Datum datum) {
        return switch (datum) {
            case ZONE_LENGTH, TIMED_BELT_LENGTH, PULLEY_DIAMETER, READ_SPACING, READ_HEIGHT, BELT_WIDTH, CENTRE_ROLL,
                    BELT_LENGTH, DESIGN_BED_DEPTH, REGISTER_SPACING, REGISTER_HEIGHT, REGISTER_ZONE_LENGTH,
                    IMPACT_LENGTH, LUMP_SIZE -> Optional.of(Dimension.LENGTH);
            case BELT_SPEED, DESIGN_SPEED, FEED_VELOCITY -> Optional.of(Dimension.SPEED);
            case TIMED_ELAPSED -> Optional.of(Dimension.TIME);
            case PULLEY_ROTATION -> Optional.of(Dimension.FREQUENCY);
            case THROUGHPUT, DESIGN_THROUGHPUT -> Optional.of(Dimension.MASS_FLOW);
            case RUNNING_POWER, RATED_POWER -> Optional.of(Dimension.POWER);
            case TROUGH_ANGLE, INCLINE, ANGLE_OF_REPOSE, SURCHARGE_ANGLE -> Optional.of(Dimension.ANGLE);
            case BULK_DENSITY -> Optional.of(Dimension.DENSITY);
            case SKIRT_POWER_BUDGET -> Optional.of(Dimension.RATIO);
            case TIMED_REVOLUTIONS, DRIVE_EFFICIENCY, MOTOR_EFFICIENCY, LOADED_HOURS, SKIRT_FRICTION_FACTOR,
                    WALL_FRICTION, SITE_FACTOR, SITE_SEAL_RATE -> Optional.empty();
        };
    }

    private static Map<Datum, Place> places() {
        Map<Datum, Place> places = new EnumMap<>(Datum.class);
        for (Datum datum : Datum.values()) {
            places.put(datum, Place.of(Pointer.parse(datum.pointer())));
        }
        return places;
    }

    /** Whether some depth names no method of its own and the survey none for all: then it is taken at the board. */
    static boolean takesDepthsAtBoard(Survey survey) {
        return !survey.readings().has(DEPTH_METHOD)
                && survey.readings().branches("bedDepths").stream().anyMatch(row -> !row.has(DEPTH_METHOD));
    }

    private LoadingZone zone() {
        Map<Datum, Reading> data = new EnumMap<>(Datum.class);
        for (Datum datum : Datum.values()) {
            number(datum).ifPresent(reading -> data.put(datum, reading));
        }
        LoadingZone zone = LoadingZone.UNKNOWN.with(data).withStations(stations()).withSeals(seals())
                .withUnfinished(unfinished);
        if (flag("transfer", "highAirFlow")) {
            zone = zone.withMark(LoadingZone.Mark.HIGH_AIR_FLOW);
        }
        if (flag("transfer", "beltFeeder")) {
            zone = zone.withMark(LoadingZone.Mark.BELT_FEEDER);
        }
        if (flag("conveyor", "fullySkirted")) {
            zone = zone.withMark(LoadingZone.Mark.FULLY_SKIRTED);
        }
        if (flag("material", "freeFlowing")) {
            zone = zone.withMark(LoadingZone.Mark.FREE_FLOWING);
        }
        Optional<SpeedClass> speedClass = word(sources.get("material"), Pointer.of("material"), "speedClass",
                SpeedClass::ofCode);
        return speedClass.isPresent() ? zone.withSpeedClass(speedClass.get()) : zone;
    }

    private boolean flag(String source, String key) {
        return below(Pointer.of(source), () -> sources.get(source).flag(key)).orElse(false);
    }

    /** What the documents of the survey hold; what was fitted from the site's drives stands elsewhere. */
    private Optional<Reading> number(Datum datum) {
        Place place = PLACES.get(datum);
        Optional<Branch> found = sources.getOrDefault(place.source(), Branch.EMPTY).at(place.holder())
                .filter(Branch.class::isInstance).map(Branch.class::cast).filter(holder -> holder.has(place.key()));
        if (found.isEmpty()) {
            return Optional.empty();
        }
        Branch holder = found.get();
        if (datum == Datum.SKIRT_POWER_BUDGET) {
            return below(place.base(), () -> holder.quantity(place.key()))
                    .flatMap(budget -> budget(budget, place.whole()));
        }
        return below(place.base(), () -> dimension(datum)
                .map(dimension -> holder.quantity(place.key())
                        .map(quantity -> reading(place.whole(), quantity, dimension, datum.instrument())))
                .orElseGet(() -> holder.number(place.key())
                        .map(value -> taking.plain(datum.pointer(), value.doubleValue(), datum.instrument()))));
    }

    /** A budget is a share of the rated power, or a power; one without a rated power waits for it. */
    private Optional<Reading> budget(Quantity budget, Pointer place) {
        Dimension dimension = budget.unit().dimension();
        if (dimension == Dimension.POWER) {
            return below(Pointer.of("conveyor"), () -> sources.get("conveyor").quantity("ratedPower"))
                    .map(Quantity::si).filter(power -> power > 0)
                    .map(rated -> taking.plain(place.toString(), budget.si() / rated, Instrument.EXACT));
        } else if (dimension == Dimension.RATIO) {
            return Optional.of(taking.plain(place.toString(), budget.si(), Instrument.EXACT));
        }
        throw new Refused(Defect.at(place.child("unit"), "unit-of-wrong-kind", budget.unit().code()));
    }

    private Reading reading(Pointer place, Quantity quantity, Dimension dimension, Instrument instrument) {
        return taking.reading(place.toString(), quantity, dimension, instrument);
    }

    private List<Station> stations() {
        Branch readings = sources.get("readings");
        Optional<DepthMethod> common = word(readings, Survey.READINGS, DEPTH_METHOD, DepthMethod::ofCode);
        List<Branch> rows = below(Survey.READINGS, () -> readings.branches("bedDepths"));
        List<Station> stations = new ArrayList<>();
        for (int i = 0; i < rows.size(); i++) {
            Pointer place = Survey.READINGS.child("bedDepths").child(i);
            Branch row = rows.get(i);
            Optional<Quantity> position = required(row, place, POSITION);
            Optional<Quantity> depth = required(row, place, DEPTH);
            DepthMethod method = word(row, place, DEPTH_METHOD, DepthMethod::ofCode).or(() -> common)
                    .orElse(DepthMethod.AT_BOARD);
            if (position.isPresent() && depth.isPresent()) {
                stations.add(below(place, () -> new Station(
                        reading(place.child(POSITION), position.get(), Dimension.LENGTH, Instrument.EXACT),
                        reading(place.child(DEPTH), depth.get(), Dimension.LENGTH, Taking.depth(depth.get(), method)),
                        method)));
            }
        }
        stations.sort(Comparator.comparingDouble(station -> station.position().value()));
        return stations;
    }

    private List<SealSegment> seals() {
        List<Branch> rows = below(Survey.READINGS, () -> sources.get("readings").branches("seals"));
        List<SealSegment> seals = new ArrayList<>();
        for (int i = 0; i < rows.size(); i++) {
            Pointer place = Survey.READINGS.child("seals").child(i);
            Branch row = rows.get(i);
            Optional<Side> side = requiredWord(row, place, "side", Side::ofCode);
            Optional<SealType> type = requiredWord(row, place, "type", SealType::ofCode);
            Optional<SealCondition> condition = type.filter(known -> known == SealType.NONE).isPresent()
                    ? word(row, place, "condition", SealCondition::ofCode).or(() -> Optional.of(SealCondition.SOUND))
                    : requiredWord(row, place, "condition", SealCondition::ofCode);
            Optional<Quantity> length = required(row, place, "length");
            if (side.isPresent() && type.isPresent() && condition.isPresent() && length.isPresent()) {
                seals.add(new SealSegment(side.get(), type.get(), condition.get(), below(place, () ->
                        reading(place.child("length"), length.get(), Dimension.LENGTH, Instrument.TAPE))));
            }
        }
        return seals;
    }

    private Optional<Quantity> required(Branch row, Pointer place, String key) {
        Optional<Quantity> quantity = below(place, () -> row.quantity(key));
        if (quantity.isEmpty()) {
            unfinished.add(place.child(key).toString());
        }
        return quantity;
    }

    private <T> Optional<T> requiredWord(Branch row, Pointer place, String key, Function<String, Optional<T>> words) {
        Optional<T> word = word(row, place, key, words);
        if (word.isEmpty()) {
            unfinished.add(place.child(key).toString());
        }
        return word;
    }

    private static <T> Optional<T> word(Branch row, Pointer place, String key, Function<String, Optional<T>> words) {
        return below(place, () -> row.text(key)).map(code -> words.apply(code).orElseThrow(() ->
                new Refused(Defect.at(place.child(key), "word-unknown", code))));
    }
}
