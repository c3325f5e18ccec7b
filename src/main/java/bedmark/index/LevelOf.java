package bedmark.index;

import bedmark.document.Branch;

/** Judges a survey in a word for lists, so that the index needs no engine. */
@FunctionalInterface
public interface LevelOf {

    /** Judges nothing. */
    LevelOf NONE = (survey, register) -> "";

    /**
     * @param survey   the survey's document as it stands
     * @param register {@code plant}, {@code forms} and {@code rounds} that held when the survey last changed
     * @return a short text; one that can't be found, or an exception, counts as an empty one
     */
    String level(Branch survey, Branch register);
}
