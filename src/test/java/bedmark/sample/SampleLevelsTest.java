package bedmark.sample;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.engine.Assessment;
import bedmark.engine.verdict.Finding;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Rule;
import bedmark.json.AssessmentWriter;
import bedmark.survey.Assessor;
import bedmark.survey.Assessor.Assessed;
import bedmark.survey.Bundle;
import bedmark.survey.InspectionStatus;
import bedmark.survey.Survey;
import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.UUID;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;

/** What the engine says of the committed demo plant, and that the history of its zones makes sense. */
class SampleLevelsTest {
    private static final SampleRound AUTUMN = SampleRound.ALL.get(0);
    private static final SampleRound SPRING = SampleRound.ALL.get(1);
    private static final SampleRound UNDER_WAY = SampleRound.ALL.get(2);

    /** The inspected surveys that no other corrects, with what the engine says of them now. */
    private static List<Assessed> current(SampleRound round) {
        Bundle bundle = SampleFiles.committed(round);
        Set<UUID> corrected = bundle.surveys().stream().flatMap(survey -> survey.supersedes().stream())
                .collect(Collectors.toSet());
        return new Assessor(bundle.register()).assess(bundle.surveys()).stream()
                .filter(one -> one.survey().inspectionStatus() == InspectionStatus.INSPECTED)
                .filter(one -> !corrected.contains(one.survey().id())).toList();
    }

    private static Map<String, Assessment> byTransfer(SampleRound round) {
        return current(round).stream().collect(Collectors.toMap(one -> one.survey().transfer(), Assessed::assessment,
                (first, second) -> second, TreeMap::new));
    }

    private static Set<String> at(Level level, SampleRound round) {
        return byTransfer(round).entrySet().stream().filter(one -> one.getValue().level() == level)
                .map(Map.Entry::getKey).collect(Collectors.toCollection(TreeSet::new));
    }

    @Test
    void roundUnderWayShowsEveryLevel() {
        assertEquals(Set.of("TP-08", "TP-14"), at(Level.OVERLOADED, UNDER_WAY));
        assertEquals(Set.of("TP-05"), at(Level.UNDECIDED, UNDER_WAY));
        assertEquals(Set.of("TP-12", "TP-18"), at(Level.INCOMPLETE, UNDER_WAY));
        assertEquals(Set.of("TP-03", "TP-10", "TP-11"), at(Level.NEAR, UNDER_WAY));
        assertEquals(10, at(Level.WITHIN, UNDER_WAY).size());
    }

    @Test
    void pastRoundsAreThoseOfAHealthyPlant() {
        assertEquals(Set.of("TP-21"), at(Level.OVERLOADED, AUTUMN));
        assertEquals(Set.of("TP-03", "TP-22", "TP-24"), at(Level.NEAR, AUTUMN));
        assertEquals(Set.of("TP-13"), at(Level.UNDECIDED, SPRING));
        assertEquals(Set.of("TP-08", "TP-15", "TP-22", "TP-24"), at(Level.NEAR, SPRING));
        double within = at(Level.WITHIN, AUTUMN).size() + at(Level.WITHIN, SPRING).size();
        double share = within / (current(AUTUMN).size() + current(SPRING).size());
        assertTrue(share > 0.75 && share < 0.85, "within: " + share);
    }

    @Test
    void onUndecidedTheEngineIsNotSure() {
        for (Assessment undecided : List.of(byTransfer(UNDER_WAY).get("TP-05"), byTransfer(SPRING).get("TP-13"))) {
            double probability = undecided.findings().stream().filter(finding -> finding.level() == Level.UNDECIDED)
                    .mapToDouble(finding -> finding.probabilityOverloaded().orElseThrow()).max().orElseThrow();
            assertTrue(probability > 0.15 && probability < 0.85, "sure by " + probability);
            assertTrue(undecided.repeat().isPresent());
        }
    }

    @Test
    void everyRuleSpeaksSomewhere() {
        Set<Rule> spoken = EnumSet.noneOf(Rule.class);
        for (SampleRound round : SampleRound.ALL) {
            current(round).forEach(one -> one.assessment().findings().stream()
                    .filter(finding -> finding.level() != Level.WITHIN).map(Finding::rule).forEach(spoken::add));
        }
        assertEquals(EnumSet.allOf(Rule.class), spoken);
    }

    @Test
    void bedOfTheStackerFeedFallsBehindFromRoundToRound() {
        double pace = 1;
        for (SampleRound round : SampleRound.ALL) {
            double next = observed(byTransfer(round).get("TP-08"), Rule.BED_BEHIND_BELT);
            assertTrue(next < pace - 0.1, round.name() + ": " + next);
            pace = next;
        }
        Assessment now = byTransfer(UNDER_WAY).get("TP-08");
        assertEquals(0.52, pace, 0.01);
        assertEquals(1.79, observed(now, Rule.BED_OVER_DESIGN), 0.01);
        assertEquals("free-bed", now.remedies().get(0).code());
        assertTrue(now.remedies().get(0).refusedBecause().isEmpty());
    }

    @Test
    void gypsumZoneWasMendedAndStaysSo() {
        assertEquals(Level.OVERLOADED, byTransfer(AUTUMN).get("TP-21").level());
        assertEquals(Level.WITHIN, byTransfer(SPRING).get("TP-21").level());
        assertEquals(Level.WITHIN, byTransfer(UNDER_WAY).get("TP-21").level());
    }

    @Test
    void healthyZoneAtHalfFeedIsOverloadedAtDesignFeed() {
        Assessment half = byTransfer(UNDER_WAY).get("TP-07");
        assertEquals(Level.WITHIN, half.level());
        assertEquals(Level.OVERLOADED, half.levelAtDesignFeed().orElseThrow());
    }

    @Test
    void storedAssessmentsAreWhatTheEngineSays() {
        for (SampleRound round : SampleRound.ALL) {
            Bundle bundle = SampleFiles.committed(round);
            for (Assessed one : new Assessor(bundle.register()).assess(bundle.surveys())) {
                Branch stored = one.survey().document().branch("assessment").orElseThrow();
                AssessmentWriter.write(one.assessment()).members().forEach((key, value) ->
                        assertEquals(Optional.of(value), stored.get(key), one.survey().transfer() + " " + key));
            }
        }
    }

    @Test
    void oneSurveyIsCorrectedAndSaysWhy() {
        List<Survey> spring = SampleFiles.committed(SPRING).surveys();
        Branch second = spring.stream().filter(survey -> survey.revision() == 2).map(Survey::document).findFirst()
                .orElseThrow();
        Survey first = spring.stream().filter(survey -> survey.id().equals(second.uuid("supersedes").orElseThrow()))
                .findFirst().orElseThrow();
        assertEquals("TP-09", first.transfer());
        assertTrue(second.text("revisionReason").orElseThrow().length() > 20);
        assertTrue(second.time("completedAt").orElseThrow().isAfter(first.completedAt().orElseThrow()));
    }

    private static double observed(Assessment assessment, Rule rule) {
        return assessment.findings().stream().filter(finding -> finding.rule() == rule).findFirst().orElseThrow()
                .observed();
    }
}
