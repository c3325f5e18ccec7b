package bedmark.office;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.survey.Bundle;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Duration;
import java.time.OffsetDateTime;
import java.time.format.DateTimeFormatter;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.UUID;

/**
 * Three simulated tablets whose rounds overlap: corrections, corrections of corrections, the same survey corrected
 * on two of them, the same revision told in two ways, a register that changes under way, one clock that is fast by
 * days and one that is slow.
 */
final class Tablets {
    private static final Duration[] SKEW = {Duration.ZERO, Duration.ofDays(9), Duration.ofHours(-30)};
    private static final OffsetDateTime BEGUN = OffsetDateTime.parse("2026-03-02T07:00:00+01:00");

    private final Random random;
    private final Bundle base = Offices.sample("round-2026-03");
    private final List<List<Branch>> held = List.of(new ArrayList<>(), new ArrayList<>(), new ArrayList<>());
    private final Map<String, Branch> everywhere = new HashMap<>();

    Tablets(long seed) {
        random = new Random(seed);
    }

    /** A survey made once more at noon of another day, as a first revision. */
    static Branch fresh(Branch survey, String day) {
        return survey.without("supersedes").without("photos").with("revision", Node.number(1))
                .with("id", UUID.nameUUIDFromBytes(day.getBytes(StandardCharsets.UTF_8)).toString())
                .with("startedAt", day + "T12:00:00+01:00").with("completedAt", day + "T12:20:00+01:00");
    }

    Path key(Path folder, int tablet) {
        return folder.resolve("tablet" + tablet);
    }

    /** Packs of some days of work, in the order in which they were made. */
    List<Path> packs(Path folder, int days) {
        List<Path> packs = new ArrayList<>();
        for (int day = 0; day < days; day++) {
            for (int tablet = 0; tablet < SKEW.length; tablet++) {
                OffsetDateTime now = BEGUN.plusDays(7L * day).plusHours(tablet).plus(SKEW[tablet]);
                work(tablet, now);
                packs.add(Offices.pack(bundle(day, tablet, now.plusHours(9)), key(folder, tablet),
                        folder.resolve("packs").resolve("day" + day + "-tablet" + tablet + ".zip")));
            }
        }
        return packs;
    }

    private Bundle bundle(int day, int tablet, OffsetDateTime at) {
        Branch plant = base.document().branch("plant").orElseThrow();
        // In the middle of the work the site pays more for its power, and says so in the register.
        Branch tariff = plant.branch("tariff").orElseThrow().with("note", day < 2 ? "old price" : "new price");
        List<Branch> surveys = held.get(tablet);
        List<Branch> sent = surveys.subList(Math.max(0, surveys.size() - 6), surveys.size());
        Bundle made = Offices.with(base, "bundle" + day + "-" + tablet, DateTimeFormatter.ISO_OFFSET_DATE_TIME.format(at), sent);
        return new Bundle(made.document().with("plant", plant.with("tariff", tariff)));
    }

    private void work(int tablet, OffsetDateTime now) {
        List<Branch> mine = held.get(tablet);
        for (int i = 0; i < 3; i++) {
            Branch visit = pick(base.document().branches("surveys"));
            mine.add(told(visit.without("supersedes").with("id", id()).with("revision", Node.number(1)), now,
                    tablet));
        }
        // Another tablet's survey goes on here, and may be corrected on both.
        if (!everywhere.isEmpty()) {
            Branch other = pick(new ArrayList<>(everywhere.values()));
            mine.add(told(other.with("supersedes", other.text("id").orElseThrow()).with("id", id())
                    .with("revision", Node.number(revision(other) + 1)), now.plusHours(2), tablet));
            mine.add(pick(new ArrayList<>(everywhere.values())));
        }
        if (random.nextInt(3) == 0) {
            mine.add(pick(mine).with("notes", "told otherwise on tablet " + tablet));
        }
        mine.forEach(survey -> everywhere.put(survey.text("id").orElseThrow(), survey));
        distinct(mine);
    }

    /** A bundle holds a survey once. */
    private static void distinct(List<Branch> surveys) {
        Map<String, Branch> last = new LinkedHashMap<>();
        surveys.forEach(survey -> {
            last.remove(survey.text("id").orElseThrow());
            last.put(survey.text("id").orElseThrow(), survey);
        });
        surveys.clear();
        surveys.addAll(last.values());
    }

    private static int revision(Branch survey) {
        return survey.number("revision").orElseThrow().intValueExact();
    }

    private Branch told(Branch survey, OffsetDateTime now, int tablet) {
        return survey.with("startedAt", Node.time(now)).with("completedAt", Node.time(now.plusMinutes(12)))
                .with("notes", "tablet " + tablet + ", " + random.nextInt(1000)).without("photos");
    }

    private <T> T pick(List<T> some) {
        return some.get(random.nextInt(some.size()));
    }

    private String id() {
        return new UUID(random.nextLong(), random.nextLong()).toString();
    }
}
