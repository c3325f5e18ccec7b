package bedmark.survey;

import bedmark.document.Branch;
import bedmark.document.Node;
import java.math.BigDecimal;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.Collections;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.UUID;

/**
 * Invented bundles of several tablets that saw the same plant: overlapping surveys, corrections, two opinions of one
 * survey, registers that were changed, clocks that are wrong, keys in another order.
 */
final class RandomPacks {
    private static final OffsetDateTime NOON = OffsetDateTime.parse("2026-03-01T12:00:00+01:00");

    private final Random random;

    RandomPacks(long seed) {
        this.random = new Random(seed);
    }

    Random random() {
        return random;
    }

    /** Up to so many bundles, with the device that signed each. */
    List<Merge> merges(int atMost, List<Bundle> bundles) {
        List<Merge> merges = new ArrayList<>();
        int count = 3 + random.nextInt(atMost - 2);
        for (int i = 0; i < count; i++) {
            Bundle bundle = bundle();
            bundles.add(bundle);
            merges.add(Merge.of(bundle, "device " + random.nextInt(3)));
        }
        return merges;
    }

    private Bundle bundle() {
        List<Branch> surveys = new ArrayList<>();
        for (int id = 1; id <= 5; id++) {
            if (random.nextInt(2) == 0) {
                surveys.add(survey(id));
            }
        }
        Collections.shuffle(surveys, random);
        Branch register = Branch.EMPTY.with("plant", shuffled(plant()))
                .with("forms", Node.Series.of(shuffled(Branch.EMPTY.with("id", "zone")
                        .with("version", Node.number(1 + random.nextInt(2)))
                        .with("title", "zone " + random.nextInt(2)))))
                .with("rounds", Node.Series.of(shuffled(Branch.EMPTY.with("id", "r" + random.nextInt(2))
                        .with("name", "north " + random.nextInt(2)))));
        return Bundle.of(id(100 + random.nextInt(4)), NOON.plusHours(random.nextInt(5) - 2L), Branch.EMPTY, register,
                "caution", surveys);
    }

    private Branch plant() {
        return Branch.EMPTY.with("id", "p" + random.nextInt(2)).with("name", "quarry " + random.nextInt(2))
                .with("conveyors", Node.Series.of(Branch.EMPTY.with("id", "c")))
                .with("transfers", Node.Series.of(Branch.EMPTY.with("id", "t").with("conveyor", "c")));
    }

    private Branch survey(int number) {
        Branch survey = Branch.EMPTY.with("id", id(number).toString()).with("transfer", "t")
                .with("notes", random.nextInt(6) == 0 ? "other" : "as seen")
                .with("readings", shuffled(Branch.EMPTY.with("a", Node.number(new BigDecimal(
                        random.nextInt(9) == 0 ? "9.5" : "9.50"))).with("b", Node.flag(true))))
                .with("assessment", Branch.EMPTY.with("made", Node.number(random.nextInt(9))));
        return shuffled(number < 4 ? survey : survey.with("revision", Node.number(2))
                .with("supersedes", id(1 + random.nextInt(2)).toString()));
    }

    private Branch shuffled(Branch branch) {
        List<String> keys = new ArrayList<>(branch.members().keySet());
        Collections.shuffle(keys, random);
        Branch other = Branch.EMPTY;
        for (String key : keys) {
            other = other.with(key, branch.members().get(key));
        }
        return other;
    }

    static UUID id(int number) {
        return new UUID(0x4000L, 0x8000000000000000L + number);
    }

    /** What each survey is said to be, found the simple way. */
    static Map<UUID, List<Branch>> told(List<Bundle> bundles) {
        Map<UUID, List<Branch>> told = new HashMap<>();
        for (Bundle bundle : bundles) {
            for (Survey survey : bundle.surveys()) {
                List<Branch> so = told.computeIfAbsent(survey.id(), unknown -> new ArrayList<>());
                Branch document = survey.document().without("assessment");
                if (!so.contains(document)) {
                    so.add(document);
                }
            }
        }
        return told;
    }
}
