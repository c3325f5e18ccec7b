package bedmark.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Refused;
import bedmark.engine.Assessment;
import bedmark.engine.Conventions;
import bedmark.engine.LoadingZone;
import bedmark.engine.Result;
import bedmark.engine.Settings;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Rule;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.survey.Assessor.AssessedConveyor;
import bedmark.survey.Assessor.Judged;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import java.util.UUID;
import org.junit.jupiter.api.Test;

class AssessorTest {
    private static final Assessor ASSESSOR = new Assessor(Plants.register(""));
    private static final Survey ONE = Plants.survey("t1", "");
    private static final Survey TWO = Plants.survey("t2", "'throughput':{'value':900,'unit':'t/h'}");
    private static final Survey THREE = Plants.survey("t3", "");

    @Test
    void aSurveyIsJudgedTheSameAloneWithCompanionsAndInItsBundle() {
        Judged judged = ASSESSOR.judge(List.of(TWO, THREE, ONE));
        assertEquals(List.of(TWO, THREE, ONE), judged.surveys().stream().map(Assessor.Assessed::survey).toList());
        assertEquals(ASSESSOR.assess(ONE, List.of(TWO)), judged.surveys().get(2).assessment());
        assertEquals(ASSESSOR.assess(TWO, List.of(ONE, TWO)), judged.surveys().get(0).assessment());
        assertEquals(ASSESSOR.assess(THREE, List.of(ONE)), judged.surveys().get(1).assessment());
        assertEquals(judged.surveys(), ASSESSOR.assess(List.of(TWO, THREE, ONE)));
    }

    @Test
    void eachConveyorOfEachRoundIsSummedOnce() {
        List<AssessedConveyor> conveyors = ASSESSOR.judge(List.of(TWO, THREE, ONE)).conveyors();
        assertEquals(List.of("c1", "c2"), conveyors.stream().map(AssessedConveyor::conveyor).toList());
        AssessedConveyor first = conveyors.get(0);
        assertEquals("r", first.round());
        assertEquals(List.of(ONE, TWO), first.surveys(), "in the register's order");
        assertEquals(OptionalInt.of(0), first.assessment().leadingZone());
        assertEquals(0, first.assessment().lacking());
        double sum = first.assessment().zones().stream()
                .mapToDouble(zone -> zone.get(Result.DRIVE_SHARE).orElseThrow().value()).sum();
        assertEquals(sum, first.assessment().get(Result.DRIVE_SHARE).orElseThrow().value(), 1e-12);
        assertEquals(1, ASSESSOR.judge(List.of(ONE)).conveyors().get(0).assessment().lacking());
    }

    @Test
    void ofTwoSurveysOfOneTransferPointTheLastCountsInTheSum() {
        Survey again = Plants.survey("t1", "'notes':1");
        Judged judged = ASSESSOR.judge(List.of(ONE, TWO, again));
        assertEquals(List.of(again, TWO), judged.conveyors().get(0).surveys());
        assertEquals(3, judged.surveys().size());
        assertEquals(ASSESSOR.assess(ONE, List.of(TWO)), judged.surveys().get(0).assessment());
    }

    @Test
    void aSupersededSurveyIsJudgedButDoesNotCount() {
        Survey corrected = new Survey(Plants.survey("t1", "'notes':2").document()
                .with("supersedes", ONE.id().toString()));
        Judged judged = ASSESSOR.judge(List.of(corrected, TWO, ONE));
        assertEquals(List.of(corrected, TWO), judged.conveyors().get(0).surveys());
        assertEquals(3, judged.surveys().size());
    }

    @Test
    void aSurveyThatCannotBeIsRefusedInItsPlace() {
        Survey impossible = Plants.survey("t2", "'loadingZoneLength':{'value':-6,'unit':'m'}");
        Refused refused = assertThrows(Refused.class, () -> ASSESSOR.judge(List.of(ONE, impossible)));
        assertEquals("/surveys/1/readings/loadingZoneLength", refused.defect().where());
        Assessment beside = ASSESSOR.assess(ONE, List.of(impossible));
        assertTrue(beside.findings().stream().noneMatch(found -> found.rule() == Rule.SKIRTS_OVER_BUDGET));
        assertThrows(Refused.class, () -> ASSESSOR.assess(Plants.survey("t9", ""), List.of()));
    }

    /** The skirts of both zones stand at the budget, give or take; the zone without readings has no part in it yet. */
    @Test
    void aZoneWithoutReadingsIsIncompleteWhereItsConveyorIsUndecided() {
        Survey read = Plants.survey("t1", "");
        Survey empty = new Survey(read.document().with("id", UUID.randomUUID().toString()).with("transfer", "t2")
                .with("readings", Branch.EMPTY));
        double power = new Assessor(Plants.register("")).assess(read, List.of()).get(Result.DRIVE_POWER).orElseThrow()
                .value();
        Branch plant = Plants.register("").document();
        List<Node> conveyors = plant.branches("conveyors").stream().map(conveyor -> (Node) conveyor.with(
                "skirtPowerBudget", Quantity.of(BigDecimal.valueOf(power), Unit.WATT))).toList();
        Assessor assessor = new Assessor(new Register(plant.with("conveyors", new Node.Series(conveyors))));
        assertEquals(Level.UNDECIDED, assessor.assess(read, List.of(empty)).level());
        Assessment found = assessor.assess(empty, List.of(read));
        assertEquals(Level.UNDECIDED, found.findings().stream().filter(finding ->
                finding.rule() == Rule.SKIRTS_OVER_BUDGET).findFirst().orElseThrow().level());
        assertEquals(Optional.empty(), found.repeat());
    }

    @Test
    void flagsOfTheRegisterReachTheEngine() {
        Register register = new Register(Plants.read(("{" + Plants.ROWS + "}")
                .replace("'id':'t1'", "'id':'t1','beltFeeder':true,'highAirFlow':true")
                .replace("'id':'c1'", "'id':'c1','fullySkirted':true").replace("'id':'stone'",
                        "'id':'stone','freeFlowing':true")));
        assertEquals(Set.of(LoadingZone.Mark.values()), new Assessor(register).zone(ONE).marks());
        assertEquals(Set.of(), ASSESSOR.zone(ONE).marks());
    }

    @Test
    void theSitesConventionsAndPricesAreRead() {
        Settings settings = new Assessor(Plants.register(",'limits':{'beltGrip':0.55,'lengthBySpeed':false,"
                + "'lengthByAcceleration':false,'lengthLeast':true,'inclineInAcceleration':false,"
                + "'methodSpread':false,'monteCarloTrials':500},'tariff':{'energy':0.21,'currency':'EUR'},"
                + "'co2Factor':0.35")).settings();
        Conventions conventions = settings.conventions();
        assertEquals(0.55, conventions.beltGrip().value());
        assertEquals(0.6, conventions.boardGrip().value());
        assertEquals(List.of(false, false, true), List.of(conventions.lengths().bySpeed(),
                conventions.lengths().byAcceleration(), conventions.lengths().least()));
        assertEquals(List.of(false, false), List.of(conventions.incline(), conventions.spread()));
        assertEquals(500, conventions.trials());
        assertEquals(0.21, settings.prices().energy().orElseThrow());
        assertEquals(0.35, settings.prices().co2().orElseThrow());
        assertEquals(Optional.of("EUR"), settings.prices().currency());
        assertEquals(Conventions.standard(), ASSESSOR.settings().conventions());
        assertTrue(ASSESSOR.settings().prices().energy().isEmpty());
    }

    @Test
    void conventionsAndPricesThatCannotBeAreRefusedWithTheirPlace() {
        refused("/limits/monteCarloTrials", ",'limits':{'monteCarloTrials':1.5}");
        refused("/limits/monteCarloTrials", ",'limits':{'monteCarloTrials':-1}");
        refused("/tariff/energy", ",'tariff':{'energy':-1}");
        refused("/tariff/energy", ",'tariff':{'energy':'cheap'}");
        refused("/limits/lengthLeast", ",'limits':{'lengthLeast':1}");
        refused("/co2Factor", ",'co2Factor':-1");
    }

    private static void refused(String where, String plant) {
        assertEquals(where, assertThrows(Refused.class, () -> new Assessor(Plants.register(plant))).defect().where());
    }
}
