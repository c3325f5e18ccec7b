package bedmark.index.office;

import bedmark.survey.InspectionStatus;
import bedmark.survey.merge.ZoneId;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/**
 * A zone as it stands, packed as the table {@code zone_block} keeps it: a list of all zones reads, holds and sorts them
 * so, and only what somebody looks at is unpacked. May be used by any thread.
 */
public final class PackedZone {
    private static final int ROOM = 256;
    private static final int PARTS = 5;
    private static final byte[] NONE = {};
    private static final Optional<InspectionStatus> SEEN = Optional.of(InspectionStatus.INSPECTED);

    /** Plant and transfer point, and then blocks of names, standing and verdict; the last is empty without one. */
    private final byte[] bytes;
    private final int at;

    PackedZone(byte[] bytes, int at) {
        this.bytes = bytes;
        this.at = at;
    }

    public static PackedZone of(ZoneRow row) {
        PackedWriter out = new PackedWriter(ROOM);
        write(out, row.zone(), pack(row.names()), pack(row.standing()),
                row.verdict().map(PackedZone::pack).orElse(NONE));
        return new PackedZone(out.bytes(), 0);
    }

    /** @param verdict empty where there is none */
    static void write(PackedWriter out, ZoneId zone, byte[] names, byte[] standing, byte[] verdict) {
        out.text(zone.plant()).text(zone.transfer()).block(names).block(standing).block(verdict);
    }

    /** A zone of a block. */
    static Optional<PackedZone> find(byte[] block, ZoneId zone) {
        PackedReader in = ZoneBlock.proved(block);
        while (!in.atEnd()) {
            int at = in.at();
            in.pass();
            if (in.text().equals(zone.transfer())) {
                return Optional.of(new PackedZone(block, at));
            }
            in.pass();
            in.pass();
            in.pass();
        }
        return Optional.empty();
    }

    /** Passes a zone over. */
    static void pass(PackedReader in) {
        for (int part = 0; part < PARTS; part++) {
            in.pass();
        }
    }

    static byte[] pack(ZoneNames names) {
        return new PackedWriter(ROOM).flag(names.registered()).text(names.plant()).text(names.area())
                .text(names.conveyor()).text(names.conveyorTag()).text(names.tag()).text(names.asset())
                .text(names.material()).bytes();
    }

    static byte[] pack(Standing standing) {
        boolean inspected = standing.visitStatus().filter(one -> one == InspectionStatus.INSPECTED).isPresent();
        boolean same = standing.visit().equals(standing.latest());
        PackedWriter out = new PackedWriter(ROOM).flag(inspected).whole(standing.moment()).digest(standing.latest())
                .flag(same);
        if (!same) {
            out.digest(standing.visit());
        }
        if (!inspected) {
            out.text(standing.visitStatus().map(Enum::name));
        }
        return out.whole(standing.visited()).count(standing.clashes()).flag(standing.clockWrong()).bytes();
    }

    static byte[] pack(Verdict verdict) {
        return new PackedWriter(ROOM).count(verdict.level()).flag(verdict.incomplete()).real(verdict.driveShare())
                .real(verdict.savingWh()).text(verdict.remedy()).text(verdict.findings()).real(verdict.skirtPower())
                .real(verdict.savingCost()).real(verdict.savingCo2()).real(verdict.energyWh()).real(verdict.cost())
                .real(verdict.co2()).text(verdict.energyKind()).text(verdict.currency()).bytes();
    }

    public ZoneId zone() {
        return zone(new PackedReader(bytes, at));
    }

    static ZoneId zone(PackedReader in) {
        return new ZoneId(in.text(), in.text());
    }

    /** All of it. */
    public ZoneRow row() {
        PackedReader in = new PackedReader(bytes, at);
        ZoneId zone = zone(in);
        return new ZoneRow(names(in, zone), standing(in, zone), verdict(in));
    }

    private static ZoneNames names(PackedReader in, ZoneId zone) {
        in.open();
        boolean registered = in.flag();
        return new ZoneNames(zone, in.text(), in.text(), in.text(), in.text(), in.text(), in.text(), in.text(),
                registered);
    }

    private static Standing standing(PackedReader in, ZoneId zone) {
        in.open();
        boolean inspected = in.flag();
        OptionalLong moment = in.whole();
        Optional<String> latest = in.digest();
        Optional<String> visit = in.flag() ? latest : in.digest();
        Optional<InspectionStatus> status = inspected ? SEEN : in.someText().map(InspectionStatus::valueOf);
        return new Standing(zone, visit, status, in.whole(), latest, moment, in.count(), in.flag());
    }

    private static Optional<Verdict> verdict(PackedReader in) {
        if (in.open() == 0) {
            return Optional.empty();
        }
        int level = in.count();
        boolean incomplete = in.flag();
        OptionalDouble driveShare = in.real();
        OptionalDouble saving = in.real();
        Optional<String> remedy = in.someText();
        String findings = in.text();
        return Optional.of(new Verdict(level, incomplete, driveShare, in.real(), saving, in.real(), in.real(), remedy,
                in.real(), in.real(), in.real(), in.someText(), in.someText(), findings));
    }

    /** What it is put in order by. */
    public ZoneGist gist() {
        PackedReader in = new PackedReader(bytes, at);
        in.pass();
        in.pass();
        PackedReader names = in.block();
        boolean registered = names.flag();
        PackedReader standing = in.block();
        boolean inspected = standing.flag();
        OptionalLong moment = standing.whole();
        boolean surveyed = standing.passDigest();
        boolean visited = standing.flag() ? surveyed : standing.passDigest();
        if (in.open() == 0) {
            return new ZoneGist(registered, visited, inspected, surveyed, moment, Verdict.NONE.level(),
                    OptionalDouble.empty(), OptionalDouble.empty(), false);
        }
        int level = in.count();
        in.flag();
        OptionalDouble driveShare = in.real();
        OptionalDouble saving = in.real();
        boolean remedy = in.passSome();
        return new ZoneGist(registered, visited, inspected, surveyed, moment, level, driveShare,
                remedy ? saving : OptionalDouble.empty(), in.count() > 0);
    }
}
