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
import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.function.Function;

/** Puts zones in order, worst first: by place, then share of the drive, then saving. */
final class Ranking {
    private static final Level[] LEVELS = Level.values();
    /** How many overloaded zones are looked at for each that is wanted, since some were answered or filtered out. */
    private static final int READ = 2;
    private static final Comparator<RankedZone> BY_NUMBERS = Comparator
            .<RankedZone>comparingDouble(zone -> zone.driveShare().orElse(-1)).reversed()
            .thenComparing(Comparator.<RankedZone>comparingDouble(zone ->
                    zone.saving().map(Saving::wh).orElse(-1.0)).reversed());
    private static final Comparator<RankedZone> WORST_FIRST = Comparator.comparing(RankedZone::place)
            .thenComparing(BY_NUMBERS).thenComparing(RankedZone::zone);

    private final Instant now;
    private final LocalDate today;
    private final RankQuery query;
    private final Function<ZoneId, Collection<Answered>> answers;

    Ranking(ZonedDateTime now, RankQuery query, Function<ZoneId, Collection<Answered>> answers) {
        this.now = now.toInstant();
        this.today = now.toLocalDate();
        this.query = query;
        this.answers = answers;
    }

    List<RankedZone> rank(List<ZoneRow> rows) {
        return rows.stream().filter(row -> row.names().registered() || row.standing().visit().isPresent())
                .map(this::ranked).filter(query::holds).sorted(WORST_FIRST).toList();
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
