package bedmark.index;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.journal.QuickLayer;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.survey.Act;
import bedmark.survey.Survey;
import bedmark.vault.Passphrase;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Optional;
import java.util.UUID;

/** Invented acts for the tests of the store. */
final class StoreScript {
    static final String PERSON = "R. Okafor";
    static final String ROUND = "round-1";
    static final OffsetDateTime NOON = OffsetDateTime.parse("2026-03-01T12:00:00Z");
    static final Passphrase SECRET = Passphrase.chosen("skirt and board");
    /** Enough rounds for tests, which guess no passphrases. */
    static final int FEW = 1000;
    static final byte[] PHOTO = photo("a heap of coal");

    private StoreScript() {
    }

    /** Goes on by one second each time it is read. */
    static final class TickingClock extends Clock {
        private Instant now = NOON.toInstant();

        @Override
        public ZoneId getZone() {
            return ZoneOffset.UTC;
        }

        @Override
        public Clock withZone(ZoneId zone) {
            return this;
        }

        @Override
        public synchronized Instant instant() {
            now = now.plus(Duration.ofSeconds(1));
            return now;
        }
    }

    static StoreOptions options() {
        return StoreOptions.of("tablet 7").withClock(new TickingClock())
                .withLevels((survey, register) -> "level " + survey.branch("readings").orElse(Branch.EMPTY).members()
                        .size() + " of " + register.branch("plant").flatMap(plant -> plant.text("name")).orElse("-"));
    }

    /** The same for a store that is sealed. */
    static StoreOptions options(boolean sealed) {
        return sealed ? options().withPassphrase(Optional.of(SECRET)) : options();
    }

    /** An empty store that is sealed, where that is wanted. */
    static Path home(Path folder, boolean sealed) {
        if (sealed) {
            new StoreFolder(folder, options().withFiles(new QuickLayer()), FEW).seal(SECRET);
        }
        return folder;
    }

    static byte[] photo(String content) {
        byte[] text = content.getBytes(StandardCharsets.UTF_8);
        byte[] photo = new byte[text.length + 3];
        photo[0] = (byte) 0xFF;
        photo[1] = (byte) 0xD8;
        photo[2] = (byte) 0xFF;
        System.arraycopy(text, 0, photo, 3, text.length);
        return photo;
    }

    static UUID id(int number) {
        return new UUID(0x4000L, 0x8000000000000000L + number);
    }

    static Act.RegisterTaken register(String plant) {
        return new Act.RegisterTaken(Branch.EMPTY.with("plant", Branch.EMPTY.with("name", plant)));
    }

    static Act.SurveyOpened opened(UUID survey, String transfer) {
        return new Act.SurveyOpened(survey, Survey.begin(survey, ROUND, transfer, "loading-zone", 1, PERSON, NOON)
                .document());
    }

    static Act.AnswerSet speed(UUID survey, String metresPerSecond) {
        return answer(survey, "/readings/beltSpeed", Branch.write(new Quantity(new BigDecimal(metresPerSecond),
                Unit.ofCode("m/s").orElseThrow(), Optional.empty(), Optional.empty(), Optional.empty(),
                Optional.empty(), Optional.empty())));
    }

    static Act.AnswerSet answer(UUID survey, String where, Node answer) {
        return new Act.AnswerSet(survey, Pointer.parse(where), Optional.of(answer));
    }

    static Act.SurveyTaken taken(UUID survey, String transfer, String completedAt) {
        return new Act.SurveyTaken(survey, Survey.begin(survey, "round-0", transfer, "loading-zone", 1, PERSON, NOON)
                .document().with("completedAt", completedAt));
    }

    static Act.RevisionOpened revision(UUID survey, Survey corrected) {
        return new Act.RevisionOpened(survey, corrected.id(), "wrong belt", corrected.document()
                .with("id", survey.toString()).with("revision", Node.number(corrected.revision() + 1L))
                .with("supersedes", corrected.id().toString()).without("completedAt"));
    }

    /** A whole small round: two surveys, one of them corrected, exported and received. */
    static void walk(Store store) {
        store.append("", register("Northern plant"));
        store.append("", taken(id(90), "T1", "2026-01-01T10:00:00Z"));
        store.append(PERSON, new Act.WalkStarted(ROUND));
        store.append(PERSON, opened(id(1), "T1"));
        store.append(PERSON, speed(id(1), "2.50"));
        long wrong = store.append(PERSON, speed(id(1), "25.0")).sequence();
        store.append(PERSON, new Act.AnswerUndone(id(1), wrong));
        store.attachPhoto(PHOTO, id(1), PERSON, NOON, "left skirt");
        store.append(PERSON, new Act.SurveyCompleted(id(1), PERSON));
        store.append(PERSON, opened(id(2), "T2"));
        store.append(PERSON, answer(id(2), "/inspectionStatus", Node.text("not-accessible")));
        store.append(PERSON, new Act.SurveyCompleted(id(2), PERSON));
        store.append(PERSON, new Act.SurveysQueued(List.of(id(1), id(2))));
        store.append(PERSON, new Act.PackExported(List.of(id(1), id(2)), "a.zip", "00ff", "/stick"));
        store.append("", new Act.ReceiptNoted(List.of(id(2)), Branch.EMPTY.with("office", "main")));
        store.append(PERSON, revision(id(3), store.history(id(1)).orElseThrow().survey()));
        store.append(PERSON, speed(id(3), "2.55"));
        store.append(PERSON, new Act.WalkFinished(ROUND));
    }
}
