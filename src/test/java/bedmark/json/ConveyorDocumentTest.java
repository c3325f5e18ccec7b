package bedmark.json;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Pointer;
import bedmark.survey.Assessor;
import bedmark.survey.Plants;
import bedmark.survey.Survey;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class ConveyorDocumentTest {
    private static final String SITE = ",'tariff':{'energy':0.2,'currency':'EUR'},'co2Factor':0.4,"
            + "'siteFactors':[{'factor':0.1,'standardUncertainty':0.01,'fittedAt':'2026-02-03T10:00:00Z'}]";
    private static final Survey FINE = Plants.survey("t1", "'throughput':{'value':700,'unit':'t/h'},"
            + "'runningPower':{'value':40,'unit':'kW'}");
    private static final Survey DOUBTFUL = Plants.survey("t2", "'bedDepths':[{'position':{'value':3,'unit':'m'},"
            + "'depth':{'value':160,'unit':'mm','quality':'suspect'}}],'throughput':{'value':700,'unit':'t/h'}");
    private static final Survey LACKING = Plants.survey("t3", "'seals':[]");

    private static Branch written(String plant, Survey... surveys) {
        Assessor.Judged judged = new Assessor(Plants.register(plant)).judge(List.of(surveys));
        return AssessmentWriter.list(judged.surveys(), judged.conveyors(), "Take care.");
    }

    private static Branch assessment(Branch list, int turn) {
        return (Branch) list.at(Pointer.of("surveys").child(turn).child("assessment")).orElseThrow();
    }

    @Test
    void whatIsWrittenFollowsItsSchema() {
        for (String plant : List.of("", SITE, SITE + ",'method':'site'", ",'limits':{'methodSpread':false}")) {
            Document document = JsonReader.read(JsonWriter.indented(written(plant, FINE, DOUBTFUL, LACKING)));
            assertEquals(List.of(), new SchemaCheck("assessment.schema.json").check(document), plant);
        }
    }

    @Test
    void theSpreadOfTheMethodsIsWrittenBesideTheUncertainty() {
        Branch one = assessment(written(SITE, FINE), 0);
        Branch spread = one.branch("methodSpread").orElseThrow();
        assertEquals(List.of("tabulated", "rankine", "iso-5048", "site"), one.branches("methods").stream()
                .map(method -> method.text("method").orElseThrow()).toList());
        assertFalse(spread.branches("reasons").isEmpty());
        double apart = spread.number("standardUncertaintyN").orElseThrow().doubleValue();
        double alone = one.branch("uncertainty").orElseThrow().number("skirtDragN").orElseThrow().doubleValue();
        double both = one.branch("uncertaintyWithSpread").orElseThrow().number("skirtDragN").orElseThrow()
                .doubleValue();
        assertEquals(Math.hypot(alone, apart), both, 1e-9);
    }

    @Test
    void moneyAndCarbonAreWrittenWhereTheSiteKnowsThem() {
        Branch priced = assessment(written(SITE, FINE), 0);
        assertEquals(Optional.of("EUR"), priced.text("currency"));
        double energy = priced.number("energyWhPerYear").orElseThrow().doubleValue();
        assertEquals(energy / 1000 * 0.2, priced.number("energyCostPerYear").orElseThrow().doubleValue(), 1e-6);
        assertEquals(energy / 1000 * 0.4, priced.number("co2KgPerYear").orElseThrow().doubleValue(), 1e-6);
        assertTrue(priced.branches("remedies").stream().anyMatch(remedy -> remedy.has("savedCostPerYear")
                && remedy.has("savedCo2KgPerYear") && remedy.has("driveShare")));
        Branch unpriced = assessment(written("", FINE), 0);
        assertFalse(unpriced.has("currency") || unpriced.has("energyCostPerYear") || unpriced.has("co2KgPerYear"));
    }

    @Test
    void anUndecidedVerdictSaysWhatToReadAgainAndHowWell() {
        Branch doubtful = assessment(written("", FINE, DOUBTFUL), 1);
        assertEquals(Optional.of("undecided"), doubtful.text("level"));
        assertEquals(Optional.of("/readings/bedDepths/0/depth"), doubtful.text("repeat"));
        assertTrue(doubtful.has("repeatFor") && doubtful.has("repeatStandardUncertainty"));
        Branch drawn = assessment(written(",'limits':{'monteCarloTrials':2000}", FINE, DOUBTFUL), 1);
        assertTrue(drawn.branches("findings").stream()
                .anyMatch(finding -> finding.text("by").equals(Optional.of("monte-carlo"))));
        Survey thin = Plants.survey("t1", "'bedDepths':[{'position':{'value':3,'unit':'m'},'depth':{'value':80,"
                + "'unit':'mm'}}]");
        assertFalse(assessment(written("", thin), 0).has("repeat"));
    }

    @Test
    void aConveyorIsWrittenOnce() {
        List<Branch> conveyors = written("", DOUBTFUL, FINE, LACKING).branches("conveyors");
        assertEquals(2, conveyors.size());
        Branch first = conveyors.get(0);
        assertEquals(Optional.of("c1"), first.text("conveyor"));
        assertEquals(Optional.of("r"), first.text("round"));
        assertEquals(Optional.of("undecided"), first.text("level"));
        assertEquals(Optional.of("t2"), first.text("leadingZone"));
        assertTrue(first.has("leading") && first.has("driveShare") && first.has("uncertainty"));
        assertEquals(0, first.number("zonesLacking").orElseThrow().intValue());
        assertEquals(2, first.branches("findings").size());
        assertFalse(conveyors.get(1).has("driveShare") || conveyors.get(1).has("leadingZone"));
        assertEquals(1, conveyors.get(1).number("zonesLacking").orElseThrow().intValue());
    }

    @Test
    void refusedVerdictsAreWritten() {
        Assessor assessor = new Assessor(new bedmark.survey.Register(Plants.read(("{" + Plants.ROWS + "}")
                .replace("'id':'t1'", "'id':'t1','beltFeeder':true"))));
        Branch feeder = AssessmentWriter.write(assessor.assess(FINE, List.of(DOUBTFUL)));
        assertEquals(Optional.of("hopper-load-outside"), feeder.branches("refused").get(0).text("because"));
    }
}
