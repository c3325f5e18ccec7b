package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;

import bedmark.index.office.PackedZone;
import bedmark.index.office.Standing;
import bedmark.index.office.Verdict;
import bedmark.index.office.ZoneNames;
import bedmark.index.office.ZoneRow;
import bedmark.survey.InspectionStatus;
import bedmark.survey.merge.ZoneId;
import java.time.ZoneOffset;
import java.time.ZonedDateTime;
import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class RankingTest {
    private static final Comparator<RankedZone> ORDER = Comparator.comparing(RankedZone::place)
            .thenComparing(zone -> zone.driveShare().orElse(-1), Comparator.reverseOrder())
            .thenComparing(zone -> zone.saving().map(Saving::wh).orElse(-1.0), Comparator.reverseOrder())
            .thenComparing(zone -> zone.zone().key());

    private final Random random = new Random(12);

    @ParameterizedTest
    @ValueSource(ints = {0, 1, 300, 25_000})
    void zonesAreInTheSameOrderHoweverManyThereAreAndHoweverTheyCome(int zones) {
        List<PackedZone> rows = new ArrayList<>();
        for (int i = 0; i < zones; i++) {
            rows.add(row(String.format("TP-%05d", i)));
        }
        ZonedDateTime now = Offices.NOW.instant().atZone(ZoneOffset.UTC);
        Ranking ranking = new Ranking(now, RankQuery.ALL, zone -> List.of());
        List<RankedZone> ranked = ranking.rank(rows);
        assertEquals(rows.stream().map(ranking::ranked).sorted(ORDER).toList(), ranked);
        Collections.shuffle(rows, random);
        assertEquals(ranked, ranking.rank(rows));
    }

    /** Few different numbers, so that many zones differ in nothing but their ids. */
    private PackedZone row(String transfer) {
        ZoneId zone = new ZoneId("plant", transfer);
        ZoneNames names = new ZoneNames(zone, "Plant", "Area", "C1", "C1", transfer, "", "Limestone", true);
        boolean seen = random.nextInt(8) > 0;
        Standing standing = new Standing(zone, some(seen, "d"), some(seen, InspectionStatus.INSPECTED),
                OptionalLong.empty(), some(seen, "d"),
                seen ? OptionalLong.of(Offices.NOW.millis()) : OptionalLong.empty(), 0, false);
        OptionalDouble share = number();
        Verdict verdict = new Verdict(random.nextInt(5), false, share, number(), number(), OptionalDouble.empty(),
                OptionalDouble.empty(), some(random.nextBoolean(), "widen-boards"), number(), OptionalDouble.empty(),
                OptionalDouble.empty(), Optional.of("electrical"), Optional.of("EUR"), "");
        return PackedZone.of(new ZoneRow(names, standing, some(seen, verdict)));
    }

    private OptionalDouble number() {
        return random.nextInt(5) == 0 ? OptionalDouble.empty() : OptionalDouble.of(random.nextInt(4) / 4.0);
    }

    private static <T> Optional<T> some(boolean there, T value) {
        return there ? Optional.of(value) : Optional.empty();
    }
}
