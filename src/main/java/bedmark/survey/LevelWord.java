package bedmark.survey;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.engine.verdict.Level;
import java.util.List;
import java.util.Optional;

/**
 * Judges one survey in a word, for lists: the level of its verdict by the register that it was made with. The survey is
 * judged alone: what the other zones of its conveyor ask of the drive comes in where the whole round is judged, so that
 * its {@code skirts-over-budget} may say more there. Keeps the assessor of the register that it met last, since lists
 * hold many surveys of one register.
 */
public final class LevelWord {
    private Branch known = Branch.EMPTY;
    private Optional<Assessor> assessor = Optional.empty();

    /**
     * The level's word.
     *
     * @param survey   the survey's document
     * @param register an object with the {@code plant}
     * @return {@code incomplete} where the survey can't be judged
     */
    public synchronized String of(Branch survey, Branch register) {
        try {
            Branch plant = register.branch("plant").orElse(Branch.EMPTY);
            if (assessor.isEmpty() || plant != known) {
                assessor = Optional.of(new Assessor(new Register(plant)));
                known = plant;
            }
            return assessor.get().assess(new Survey(survey), List.of()).level().code();
        } catch (Refused e) {
            return Level.INCOMPLETE.code();
        }
    }
}
