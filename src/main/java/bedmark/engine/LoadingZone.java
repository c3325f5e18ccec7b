package bedmark.engine;

import bedmark.engine.bed.DepthMethod;
import bedmark.engine.bed.Station;
import bedmark.engine.flow.SpeedClass;
import bedmark.engine.seal.SealCondition;
import bedmark.engine.seal.SealSegment;
import bedmark.engine.seal.SealType;
import bedmark.engine.seal.Side;
import bedmark.engine.uncertainty.Reading;
import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * Everything that is known of one loading zone, read or registered. Whatever is not known is simply not there.
 *
 * @param data       the single numbers, in SI
 * @param stations   the bed depths along the zone; kept in order of position
 * @param seals      the seals of both sides
 * @param speedClass the material's class of belt speed
 * @param marks      what is true of the zone or its material; a mark that is absent is not true
 * @param unfinished the places (JSON Pointers) of rows that were begun and lack a number, such as
 *                   {@code /readings/bedDepths/1/depth}; they keep the zone incomplete
 */
public record LoadingZone(Map<Datum, Reading> data, List<Station> stations, List<SealSegment> seals,
        Optional<SpeedClass> speedClass, Set<Mark> marks, List<String> unfinished) {

    /** What is true of a zone or its material. */
    public enum Mark {
        /** Much air comes with the material: 0.5 m³/s or more. */
        HIGH_AIR_FLOW,
        /** The material flows freely. */
        FREE_FLOWING,
        /** The belt draws its material from a hopper that stands on it. */
        BELT_FEEDER,
        /** The conveyor is skirted along all of its length: there is no open belt after the boards. */
        FULLY_SKIRTED
    }

    /** A zone of which nothing is known. */
    public static final LoadingZone UNKNOWN =
            new LoadingZone(Map.of(), List.of(), List.of(), Optional.empty(), Set.of(), List.of());

    public LoadingZone {
        Map<Datum, Reading> ordered = new EnumMap<>(Datum.class);
        ordered.putAll(data);
        data = Collections.unmodifiableMap(ordered);
        stations = stations.stream().sorted(Comparator.comparingDouble(station -> station.position().value())).toList();
        seals = List.copyOf(seals);
        marks = Set.copyOf(marks);
        unfinished = List.copyOf(unfinished);
    }

    /** The number, where it is known. */
    public Optional<Reading> get(Datum datum) {
        return Optional.ofNullable(data.get(datum));
    }

    public boolean is(Mark mark) {
        return marks.contains(mark);
    }

    /** Whether some seal is in one of those conditions. */
    public boolean hasSeals(Set<SealCondition> conditions) {
        for (SealSegment segment : seals) {
            if (conditions.contains(segment.condition())) {
                return true;
            }
        }
        return false;
    }

    /** The same zone with a number set; it takes the name of its place. */
    public LoadingZone with(Datum datum, double value, double standardUncertainty) {
        Map<Datum, Reading> changed = new EnumMap<>(Datum.class);
        changed.putAll(data);
        changed.put(datum, new Reading(datum.pointer(), value, standardUncertainty));
        return with(changed);
    }

    /** The same zone with those numbers and no others. */
    public LoadingZone with(Map<Datum, Reading> numbers) {
        return new LoadingZone(numbers, stations, seals, speedClass, marks, unfinished);
    }

    /** The same zone without that number. */
    public LoadingZone without(Datum datum) {
        Map<Datum, Reading> changed = new EnumMap<>(Datum.class);
        changed.putAll(data);
        changed.remove(datum);
        return with(changed);
    }

    /** The same zone with those depths and no others. */
    public LoadingZone withStations(List<Station> depths) {
        return new LoadingZone(data, depths, seals, speedClass, marks, unfinished);
    }

    /** The same zone with one more depth (m), named by its turn. */
    public LoadingZone withStation(double position, double raw, DepthMethod method, double uncertainty) {
        String row = "/readings/bedDepths/" + stations.size();
        List<Station> longer = new ArrayList<>(stations);
        longer.add(new Station(Reading.exact(row + "/position", position),
                new Reading(row + "/depth", raw, uncertainty), method));
        return withStations(longer);
    }

    /** The same zone with those seals and no others. */
    public LoadingZone withSeals(List<SealSegment> segments) {
        return new LoadingZone(data, stations, segments, speedClass, marks, unfinished);
    }

    /** The same zone with one more segment of seal (m), named by its turn. */
    public LoadingZone withSeal(Side side, SealType type, SealCondition condition, double length, double uncertainty) {
        List<SealSegment> longer = new ArrayList<>(seals);
        longer.add(new SealSegment(side, type, condition,
                new Reading("/readings/seals/" + seals.size() + "/length", length, uncertainty)));
        return withSeals(longer);
    }

    public LoadingZone withSpeedClass(SpeedClass known) {
        return new LoadingZone(data, stations, seals, Optional.of(known), marks, unfinished);
    }

    public LoadingZone withMark(Mark mark) {
        Set<Mark> more = EnumSet.of(mark);
        more.addAll(marks);
        return new LoadingZone(data, stations, seals, speedClass, more, unfinished);
    }

    public LoadingZone withUnfinished(List<String> places) {
        return new LoadingZone(data, stations, seals, speedClass, marks, places);
    }
}
