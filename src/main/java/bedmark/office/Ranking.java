package bedmark.office;

import bedmark.engine.verdict.Level;
import bedmark.index.office.OfficeTables;
import bedmark.index.office.PackedZone;
import bedmark.index.office.Standing;
import bedmark.index.office.Verdict;
import bedmark.index.office.ZoneGist;
import bedmark.index.office.ZoneRow;
import bedmark.survey.merge.Copy;
import bedmark.survey.merge.ZoneId;
import java.time.Duration;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZonedDateTime;
import java.util.AbstractList;
import java.util.Arrays;
import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.RandomAccess;
import java.util.function.Consumer;
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
    private static final Comparator<Ordered> BY_NUMBERS =
            Comparator.comparingDouble(Ordered::driveShare).thenComparingDouble(Ordered::saving).reversed();
    private static final Comparator<Ordered> WORST_FIRST =
            Comparator.comparing(Ordered::place).thenComparing(BY_NUMBERS).thenComparing(one -> one.zone.zone());

    /**
     * A zone beside what it is put in order by.
     *
     * @param held the findings that were accepted or shelved and stay away
     */
    private record Ordered(PackedZone zone, Place place, double driveShare, double saving, List<Answered> held) {
    }

    /** Zones in their order, each put together when it is looked at: of very many, few are. */
    private final class Listed extends AbstractList<RankedZone> implements RandomAccess {
        private final Ordered[] zones;

        Listed(Ordered[] zones) {
            this.zones = zones;
        }

        @Override
        public RankedZone get(int index) {
            return ranked(zones[index]);
        }

        @Override
        public int size() {
            return zones.length;
        }
    }

    private final Instant now;
    private final LocalDate today;
    private final RankQuery query;
    private final boolean all;
    private final Function<ZoneId, Collection<Answered>> answers;

    /** @param answers asked by several threads at once while this thread waits for them, and not later */
    Ranking(ZonedDateTime now, RankQuery query, Function<ZoneId, Collection<Answered>> answers) {
        this.now = now.toInstant();
        this.today = now.toLocalDate();
        this.query = query;
        this.all = query.holdsAll();
        this.answers = answers;
    }

    /** What is true of the zones now; whatever happens to them later does not change it. */
    List<RankedZone> rank(List<PackedZone> rows) {
        return new Listed(ordered(rows));
    }

    private Ordered[] ordered(List<PackedZone> rows) {
        Stream<PackedZone> zones = rows.size() > MANY ? rows.parallelStream() : rows.stream();
        Ordered[] ordered = zones.<Ordered>mapMulti(this::list).toArray(Ordered[]::new);
        Arrays.parallelSort(ordered, WORST_FIRST);
        return ordered;
    }

    /** Nothing where no register holds the zone and nobody was there, or where it is not asked for. */
    private void list(PackedZone zone, Consumer<Ordered> list) {
        ZoneGist gist = zone.gist();
        if (gist.registered() || gist.visited()) {
            Ordered ordered = ordered(zone, gist);
            if (all || query.holds(ranked(ordered))) {
                list.accept(ordered);
            }
        }
    }

    /**
     * The head of the list from overloaded zones alone: what was answered only ever takes one out of them.
     *
     * @return nothing where there are too few of them to say
     */
    Optional<List<RankedZone>> head(OfficeTables tables, int atMost) {
        int read = READ * atMost;
        List<PackedZone> rows = tables.worst(Level.OVERLOADED.ordinal(), read);
        Ordered[] found = Stream.of(ordered(rows)).filter(one -> one.place == Place.OVERLOADED)
                .toArray(Ordered[]::new);
        if (found.length <= atMost) {
            return Optional.empty();
        }
        // Behind the last one that was read may stand others with its very numbers.
        PackedZone last = rows.get(rows.size() - 1);
        boolean settled = rows.size() < read || BY_NUMBERS.compare(found[atMost - 1], ordered(last, last.gist())) < 0;
        return settled ? Optional.of(new Listed(Arrays.copyOf(found, atMost))) : Optional.empty();
    }

    private Ordered ordered(PackedZone zone, ZoneGist gist) {
        Collection<Answered> known = gist.findings() ? answers.apply(zone.zone()) : List.of();
        Level level = gist.level() == Verdict.NONE.level() ? Level.INCOMPLETE : LEVELS[gist.level()];
        List<Answered> held = List.of();
        if (!known.isEmpty()) {
            Verdict verdict = zone.row().verdict().orElseThrow();
            List<FindingLine> findings = FindingLine.read(verdict.findings());
            held = findings.stream().flatMap(line -> known.stream()
                    .filter(one -> one.rule() == line.rule() && one.holds(line, today))).toList();
            level = held.isEmpty() ? level : open(verdict.incomplete(), findings, held);
        }
        return new Ordered(zone, place(gist, level), gist.driveShare().orElse(UNKNOWN), gist.saving().orElse(UNKNOWN),
                held);
    }

    /** The level that is left when what was answered is taken out. */
    private static Level open(boolean incomplete, List<FindingLine> findings, List<Answered> held) {
        Level open = incomplete ? Level.INCOMPLETE : Level.WITHIN;
        for (FindingLine line : findings) {
            if (held.stream().noneMatch(one -> one.rule() == line.rule())) {
                open = open.or(line.level());
            }
        }
        return open;
    }

    private Place place(ZoneGist gist, Level open) {
        if (!gist.surveyed()) {
            return Place.NOT_INSPECTED;
        }
        return switch (open) {
            case OVERLOADED -> Place.OVERLOADED;
            case UNDECIDED -> Place.UNDECIDED;
            case INCOMPLETE -> Place.INCOMPLETE;
            case NEAR, WITHIN -> !gist.inspected() ? Place.NOT_INSPECTED : stale(instant(gist.moment())) ? Place.STALE
                    : open == Level.NEAR ? Place.NEAR : Place.WITHIN;
        };
    }

    RankedZone ranked(PackedZone zone) {
        return ranked(ordered(zone, zone.gist()));
    }

    private RankedZone ranked(Ordered ordered) {
        ZoneRow row = ordered.zone.row();
        Standing standing = row.standing();
        Optional<Level> level = row.verdict().map(one -> LEVELS[one.level()]);
        Verdict verdict = row.verdict().orElse(Verdict.NONE);
        Optional<Instant> surveyed = instant(standing.moment());
        Optional<Instant> visited = standing.visited().equals(standing.moment()) ? surveyed
                : instant(standing.visited());
        boolean clockWrong = standing.clockWrong() || surveyed.filter(this::ahead).isPresent()
                || visited.filter(this::ahead).isPresent();
        return new RankedZone(row.names(), ordered.place, level, standing.latest(), surveyed, age(surveyed),
                stale(surveyed), standing.visitStatus(), visited, verdict.driveShare(), verdict.skirtPower(),
                verdict.energyWh(), verdict.cost(), verdict.co2(), verdict.energyKind(), verdict.currency(),
                saving(verdict), FindingLine.read(verdict.findings()), ordered.held, standing.clashes(), clockWrong);
    }

    private static Optional<Saving> saving(Verdict verdict) {
        return verdict.remedy().isPresent() && verdict.savingWh().isPresent()
                ? Optional.of(new Saving(verdict.remedy().get(), verdict.savingWh().getAsDouble(),
                verdict.savingCost(), verdict.savingCo2())) : Optional.empty();
    }

    /** Whether a day lies ahead that no clock can be right about. */
    private boolean ahead(Instant moment) {
        return moment.isAfter(now.plus(Copy.SLACK));
    }

    /** Never negative. */
    private Optional<Duration> age(Optional<Instant> surveyed) {
        return surveyed.filter(at -> !ahead(at))
                .map(at -> at.isAfter(now) ? Duration.ZERO : Duration.between(at, now));
    }

    /** Nobody knows how old a result is that a wrong clock dated ahead. */
    private boolean stale(Optional<Instant> surveyed) {
        return surveyed.isPresent() && age(surveyed).filter(age -> age.compareTo(query.staleAfter()) <= 0).isEmpty();
    }

    private static Optional<Instant> instant(OptionalLong moment) {
        return moment.isPresent() ? Optional.of(Instant.ofEpochMilli(moment.getAsLong())) : Optional.empty();
    }
}
