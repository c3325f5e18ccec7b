package bedmark.engine.working;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class FormulaTest {
    private static final Formula LEVEL = new Formula("level", "h",
            "max(0, (b1 − l3)/(2 · cos λ)) + π · s′² + √b1", "Σ h", "D");

    /** Functions, numbers and π are no signs; a prime and a figure belong to their sign, a square does not. */
    @Test
    void signsStandOnceEachInTheirOrder() {
        assertEquals(List.of("b1", "l3", "λ", "s′"), LEVEL.signs());
        assertEquals(List.of(), Formula.of("nothing", "y", "min(0, sin 1) · tan π", "A").signs());
    }

    @Test
    void onlyWholeSignsAreReplaced() {
        assertEquals("max(0, (0.7 − l3)/(2 · cos λ)) + π · s′² + √0.7", LEVEL.substituted(Map.of("b1", "0.7", "b", "9",
                "s", "8")));
        assertEquals("$1 + \\2", Formula.of("sum", "y", "a + b", "D").substituted(Map.of("a", "$1", "b", "\\2")));
    }

    @Test
    void aFormulaOfOtherSignsIsOtherwiseTheSame() {
        assertEquals(new Formula("level", "hr", "max(0, (br − l3)/(2 · cos λ)) + π · s′² + √br", "Σ h", "D"),
                LEVEL.withSigns(Map.of("h", "hr", "b1", "br")));
        assertEquals(LEVEL, LEVEL.withSigns(Map.of()));
        assertEquals(new Formula("sum", "y", "a + b", "", "S5, R"), Formula.of("sum", "y", "a + b", "S5, R"));
    }

    /** What came out of a step goes into the next one by the sign of its formula, and is nobody's reading. */
    @Test
    void theOutcomeOfAStepCarriesItsSign() {
        Symbol read = new Symbol("b1", 0.7, "m", Optional.of("/readings/skirtSpacing"));
        Step step = new Step("half-spacing", Formula.of("half-spacing", "c", "b1/2", "D"), List.of(read), 0.35,
                OptionalDouble.of(0.0025), "m");
        assertEquals(new Symbol("c", 0.35, "m", Optional.empty()), step.outcome());
    }

    @Test
    void aWorkingFindsTheFirstStepOfAResultAndChangesNoMore() {
        Step first = step("y", 1);
        List<Step> steps = new ArrayList<>(List.of(step("x", 0), first, step("y", 2)));
        List<Working.Input> inputs = new ArrayList<>();
        Working working = new Working(inputs, steps);
        inputs.add(new Working.Input(new Symbol("a", 1, "1", Optional.empty()), 0));
        steps.clear();
        assertEquals(Optional.of(first), working.stepOf("y"));
        assertEquals(Optional.empty(), working.stepOf("z"));
        assertEquals(3, working.steps().size());
        assertEquals(List.of(), working.inputs());
        assertThrows(UnsupportedOperationException.class, () -> first.symbols().clear());
    }

    private static Step step(String result, double value) {
        return new Step(result, Formula.of(result, "y", "0", "D"), new ArrayList<>(), value, OptionalDouble.empty(),
                "1");
    }
}
