package bedmark.survey;

/** How far a survey is on its way to the office. It moves forward only; a correction is a new revision. */
public enum QueueState {
    OPEN,
    COMPLETED,
    QUEUED,
    EXPORTED,
    RECEIVED;

    /** Whether a survey in this state may go to {@code next}; an exported one may be exported again. */
    public boolean leadsTo(QueueState next) {
        return switch (this) {
            case OPEN -> next == COMPLETED;
            case COMPLETED -> next == QUEUED;
            case QUEUED -> next == EXPORTED;
            case EXPORTED -> next == EXPORTED || next == RECEIVED;
            case RECEIVED -> next == EXPORTED || next == RECEIVED;
        };
    }

    /**
     * The state after a move. A survey that was already received stays received when it is exported once more.
     *
     * @throws IllegalStateException where the move is none of the legal ones
     */
    public QueueState moveTo(QueueState next) {
        if (!leadsTo(next)) {
            throw new IllegalStateException("a survey does not go from " + this + " to " + next);
        }
        return this == RECEIVED ? RECEIVED : next;
    }
}
