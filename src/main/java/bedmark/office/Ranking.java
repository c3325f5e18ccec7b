package bedmark.office;

import bedmark.engine.verdict.Level;
import bedmark.index.office.OfficeTables;
import bedmark.index.office.Verdict;
import bedmark.index.office.ZoneRow;
import bedmark.survey.InspectionStatus;
import bedmark.survey.merge.ZoneId;
import java.time.Duration;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZonedDateTime;
import java.util.Arrays;
import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.function.Function;
import java.util.stream.Stream;

/** Puts zones in order, worst first: by place, then share of the drive, then saving. */
final class Ranking {
    private static final Level[] LEVELS = Level.values();
    /** How many overloaded zones are looked at for each that is wanted, since some were answered or filtered out. */
    private static final int READ = 2;
    /** From so many on it pays to share the work among the processors. */
    private static final int MANY = 10_000;
    private static final double UNKNOWN = -1;
    private static final Comparator<RankedZone> BY_NUMBERS = (one, other) -> byNumbers(driveShare(one),
            driveShare(other), saving(one), saving(other));
    private static final Comparator<Keyed> WORST_FIRST = (one, other) -> {
        int place = one.place.compareTo(other.place);
        int numbers = place != 0 ? place : byNumbers(one.driveShare, other.driveShare, one.saving, other.saving);
        return numbers != 0 ? numbers : one.zone.zone().compareTo(other.zone.zone());
    };

    /** A zone beside the numbers that it is sorted by, each looked up once. */
    private record Keyed(RankedZone zone, Place place, double driveShare, double saving) {
        static Keyed of(RankedZone zone) {
            return new Keyed(zone, zone.place(), Ranking.driveShare(zone), Ranking.saving(zone));
        }
    }

    private static double driveShare(RankedZone zone) {
        return zone.driveShare().orElse(UNKNOWN);
    }

    private static double saving(RankedZone zone) {
        return zone.saving().isPresent() ? zone.saving().get().wh() : UNKNOWN;
    }

    /** The larger numbers first. */
    private static int byNumbers(double share, double otherShare, double saving, double otherSaving) {
        int shares = Double.compare(otherShare, share);
        return shares != 0 ? shares : Double.compare(otherSaving, saving);
    }

    private final Instant now;
    private final LocalDate today;
    private final RankQuery query;
    private final Function<ZoneId, Collection<Answered>> answers;

    /** @param answers asked by several threads at once while this thread waits for them */
    Ranking(ZonedDateTime now, RankQuery query, Function<ZoneId, Collection<Answered>> answers) {
        this.now = now.toInstant();
        this.today = now.toLocalDate();
        this.query = query;
        this.answers = answers;
    }

    List<RankedZone> rank(List<ZoneRow> rows) {
        Stream<ZoneRow> zones = rows.size() > MANY ? rows.parallelStream() : rows.stream();
        Keyed[] keyed = zones.filter(row -> row.names().registered() || row.standing().visit().isPresent())
                .map(this::ranked).filter(query::holds).map(Keyed::of).toArray(Keyed[]::new);
        Arrays.parallelSort(keyed, WORST_FIRST);
        return Stream.of(keyed).map(Keyed::zone).toList();
    }

    /**
     * The head of the list from overloaded zones alone: what was answered only ever takes one out of them.
     *
     * @return nothing where there are too few of them to say
     */
    Optional<List<RankedZone>> head(OfficeTables tables, int atMost) {
        int read = READ * atMost;
        List<ZoneRow> rows = tables.worst(Level.OVERLOADED.ordinal(), read);
        List<RankedZone> found = rank(rows).stream().filter(zone -> zone.place() == Place.OVERLOADED).toList();
        if (found.size() <= atMost) {
            return Optional.empty();
        }
        // Behind the last one that was read may stand others with its very numbers.
        RankedZone last = found.get(atMost - 1);
        boolean settled = rows.size() < read || BY_NUMBERS.compare(last, ranked(rows.get(read - 1))) < 0;
        return settled ? Optional.of(found.subList(0, atMost)) : Optional.empty();
    }

    RankedZone ranked(ZoneRow row) {
        Optional<Verdict> verdict = row.verdict();
        List<FindingLine> findings = verdict.map(Verdict::findings).filter(text -> !text.isEmpty())
                .map(FindingLine::read).orElse(List.of());
        Collection<Answered> known = findings.isEmpty() ? List.of() : answers.apply(row.names().zone());
        List<Answered> held = known.isEmpty() ? List.of() : findings.stream().flatMap(line -> known.stream()
                .filter(one -> one.rule() == line.rule() && one.holds(line, today))).toList();
        Optional<Instant> surveyed = instant(row.standing().moment());
        Optional<Duration> age = surveyed.map(at -> at.isAfter(now) ? Duration.ZERO : Duration.between(at, now));
        boolean stale = age.filter(own -> own.compareTo(query.staleAfter()) > 0).isPresent();
        Optional<Level> level = verdict.map(one -> LEVELS[one.level()]);
        return new RankedZone(row.names(), place(row, open(verdict, findings, held), stale), level,
                row.standing().latest(), surveyed, age, stale, row.standing().visitStatus(),
                instant(row.standing().visited()), real(verdict, Verdict::driveShare),
                real(verdict, Verdict::skirtPower), real(verdict, Verdict::energyWh), real(verdict, Verdict::cost),
                real(verdict, Verdict::co2), verdict.flatMap(Verdict::energyKind), verdict.flatMap(Verdict::currency),
                saving(verdict), findings, held, row.standing().clashes(), row.standing().clockWrong());
    }

    /** The level that is left when what was answered is taken out. */
    private static Optional<Level> open(Optional<Verdict> verdict, List<FindingLine> findings, List<Answered> held) {
        if (verdict.isEmpty() || held.isEmpty()) {
            return verdict.map(one -> LEVELS[one.level()]);
        }
        Level open = verdict.get().incomplete() ? Level.INCOMPLETE : Level.WITHIN;
        for (FindingLine line : findings) {
            if (held.stream().noneMatch(one -> one.rule() == line.rule())) {
                open = open.or(line.level());
            }
        }
        return Optional.of(open);
    }

    private static Place place(ZoneRow row, Optional<Level> open, boolean stale) {
        if (row.standing().latest().isEmpty()) {
            return Place.NOT_INSPECTED;
        }
        Level level = open.orElse(Level.INCOMPLETE);
        if (level == Level.WITHIN || level == Level.NEAR) {
            boolean seen = row.standing().visitStatus().filter(one -> one == InspectionStatus.INSPECTED).isPresent();
            Place healthy = level == Level.NEAR ? Place.NEAR : Place.WITHIN;
            return !seen ? Place.NOT_INSPECTED : stale ? Place.STALE : healthy;
        }
        return switch (level) {
            case OVERLOADED -> Place.OVERLOADED;
            case UNDECIDED -> Place.UNDECIDED;
            default -> Place.INCOMPLETE;
        };
    }

    private static Optional<Saving> saving(Optional<Verdict> verdict) {
        return verdict.filter(one -> one.remedy().isPresent() && one.savingWh().isPresent()).map(one ->
                new Saving(one.remedy().get(), one.savingWh().getAsDouble(), one.savingCost(), one.savingCo2()));
    }

    private static OptionalDouble real(Optional<Verdict> verdict, Function<Verdict, OptionalDouble> number) {
        return verdict.map(number).orElse(OptionalDouble.empty());
    }

    private static Optional<Instant> instant(OptionalLong moment) {
        return moment.isPresent() ? Optional.of(Instant.ofEpochMilli(moment.getAsLong())) : Optional.empty();
    }
}
