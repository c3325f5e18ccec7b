package bedmark.json;

import static org.junit.jupiter.api.Assertions.assertEquals;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.OfficeDeed;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class EntryCodecTest {
    private static final UUID SURVEY = UUID.fromString("00000000-0000-4000-8000-000000000001");
    private static final UUID OTHER = UUID.fromString("00000000-0000-4000-8000-000000000002");
    private static final Branch SOMETHING = Branch.EMPTY.with("key", "value").with("n", Node.flag(true));

    static Stream<Act> acts() {
        return Stream.of(
                new Act.RegisterTaken(SOMETHING), new Act.SurveyTaken(SURVEY, SOMETHING), new Act.WalkStarted("r1"),
                new Act.WalkFinished("r1"), new Act.SurveyOpened(SURVEY, SOMETHING),
                new Act.RevisionOpened(SURVEY, OTHER, "wrong belt", SOMETHING),
                new Act.AnswerSet(SURVEY, Pointer.parse("/readings/beltSpeed"), Optional.of(SOMETHING)),
                new Act.AnswerSet(SURVEY, Pointer.parse("/notes"), Optional.empty()),
                new Act.AnswerUndone(SURVEY, 7), new Act.PhotoAttached(SURVEY, SOMETHING),
                new Act.PhotoCaptioned(SURVEY, "p1", "left seal"), new Act.PhotoDetached(SURVEY, "p1"),
                new Act.PointProposed(OTHER, SOMETHING), new Act.PointProposed(OTHER, Branch.EMPTY),
                new Act.SurveyCompleted(SURVEY, "R. Okafor"),
                new Act.SurveyCompleted(SURVEY, "", Optional.of(OffsetDateTime.parse("2026-03-01T08:52:10+01:00"))),
                new Act.OfficeActed(new OfficeDeed.DeviceTrusted("ab12", "tablet 3")),
                new Act.SurveysQueued(List.of(SURVEY, OTHER)),
                new Act.PackExported(List.of(SURVEY), "a.zip", "00ff", "/somewhere"),
                new Act.BackupMade("/stick", 12, "00ff"), new Act.ReceiptNoted(List.of(OTHER), SOMETHING));
    }

    @ParameterizedTest
    @MethodSource("acts")
    void everyActComesBackAsItWas(Act act) {
        Entry entry = new Entry(12, OffsetDateTime.parse("2026-03-01T08:30:00+01:00"), "A. Person", OTHER, act);
        assertEquals(entry, EntryCodec.read(EntryCodec.write(entry)));
    }

    @Test
    void noActIsLeftOut() {
        Set<Class<?>> tried = acts().map(Object::getClass).collect(Collectors.toSet());
        assertEquals(Set.of(Act.class.getPermittedSubclasses()), tried);
    }
}
