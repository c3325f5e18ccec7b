package bedmark.office;

import bedmark.engine.Assessment;
import bedmark.engine.verdict.Level;
import bedmark.index.office.ZoneNames;
import bedmark.office.FlatColumn.FlatRow;
import bedmark.survey.Act;
import bedmark.survey.OfficeDeed;
import bedmark.survey.Survey;
import bedmark.survey.merge.Clash;
import bedmark.survey.merge.Copy;
import bedmark.survey.merge.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;

/**
 * A conflict that waits for a person, with what tells its sides apart.
 *
 * @param sides in time order
 */
public record Conflict(ZoneNames names, Clash.Kind kind, List<Side> sides) {

    /**
     * One of the contents that can't all be right.
     *
     * @param device the tablet whose pack brought it first; its key where it has no name
     * @param judged by the register that it was made with; nothing where it can't be judged
     */
    public record Side(Copy copy, Survey survey, String device, Optional<Assessment> judged) {

        /** Its verdict; nothing where it can't be judged. */
        public Optional<Level> level() {
            return judged.map(Assessment::level);
        }
    }

    public Conflict {
        sides = List.copyOf(sides);
    }

    /**
     * The conflicts of an office, by plant and zone.
     *
     * @param plant the plant's id, where only its conflicts are asked for
     */
    public static List<Conflict> waiting(OfficeStore store, Optional<String> plant) {
        List<ZoneNames> clashing = store.ask(tables -> tables.zones().stream()
                .filter(zone -> zone.row().standing().clashes() > 0).map(zone -> zone.row().names())
                .filter(names -> plant.filter(id -> !id.equals(names.zone().plant())).isEmpty()).toList());
        Map<ZoneId, ZoneNames> byZone = clashing.stream().collect(Collectors.toMap(ZoneNames::zone,
                Function.identity()));
        List<Conflict> conflicts = new ArrayList<>();
        byZone.keySet().stream().sorted().forEach(zone -> store.merged(zone).clashes().forEach(clash ->
                conflicts.add(of(store, byZone.get(zone), clash))));
        return conflicts;
    }

    /** A conflict of a zone, with what its sides hold. */
    public static Conflict of(OfficeStore store, ZoneNames names, Clash clash) {
        return new Conflict(names, clash.kind(), store.rows(clash.sides().stream().map(Copy::digest).toList())
                .stream().map(row -> side(store, row)).toList());
    }

    private static Side side(OfficeStore store, FlatRow row) {
        Optional<String> pack = store.ask(tables -> tables.packOf(row.copy().digest()));
        String device = store.packs().stream().map(entry -> ((Act.OfficeActed) entry.act()).deed())
                .map(OfficeDeed.PackReceived.class::cast)
                .filter(received -> pack.equals(Optional.of(received.sha256()))).findFirst()
                .map(received -> received.deviceName().isBlank() ? received.fingerprint() : received.deviceName())
                .orElse("");
        return new Side(row.copy(), row.survey(), device, FlatColumn.judged(row).map(JudgedZone::assessment));
    }

    /** What the sides say differently. */
    public List<Difference> differences() {
        return Difference.among(sides.stream().map(Side::survey).toList());
    }
}
