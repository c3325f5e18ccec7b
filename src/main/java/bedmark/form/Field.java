package bedmark.form;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import java.util.List;
import java.util.Optional;

/** One thing that a form asks. */
public sealed interface Field permits TextField, NumberField, QuantityField, ChoiceField, FlagField, SpeedField,
        StationsField, SealsField {

    Head head();

    default String key() {
        return head().key();
    }

    /** The place of the answer in a survey. */
    default Pointer where() {
        return head().where();
    }

    /** All places of a survey that the field asks for. */
    default List<Pointer> places() {
        return List.of(where());
    }

    /**
     * All places of a survey that {@link #judge} looks at, those that the field asks for among them: while nothing
     * changes there, its judgement stays.
     */
    default List<Pointer> judgedBy() {
        return places();
    }

    /** Whether both surveys hold the same wherever {@link #judge} looks: then it says the same of both. */
    default boolean judgesAlike(Branch one, Branch other) {
        return one == other || judgedBy().stream().allMatch(place -> one.at(place).equals(other.at(place)));
    }

    /** What the survey holds; an empty text, list or object is no answer. */
    default Optional<Node> answer(Branch survey) {
        return saying(survey.at(where()));
    }

    /** Whether nothing is missing from the answer. */
    default boolean answered(Branch survey) {
        return answer(survey).isPresent();
    }

    /**
     * Judges the answer as it stands in a survey. To judge before it is saved, pass the survey with the answer put
     * in.
     *
     * @param survey the survey's document
     * @param last   the document of the survey before this one of the same zone; empty where there is none
     * @return nothing where the answer is absent, or sound
     */
    List<Judgement> judge(Branch survey, Branch last);

    /** The node, where it says something. */
    static Optional<Node> saying(Optional<Node> node) {
        return node.filter(Field::says);
    }

    private static boolean says(Node node) {
        if (node instanceof Node.Text text) {
            return !text.value().isBlank();
        } else if (node instanceof Node.Series series) {
            return !series.items().isEmpty();
        } else if (node instanceof Branch branch) {
            return !branch.members().isEmpty();
        }
        return !(node instanceof Node.Blank);
    }
}
