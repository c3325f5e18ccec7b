package bedmark.screen;

import bedmark.screen.round.RoundModel;
import bedmark.screen.round.RoundRow;

/** The ways from screen to screen. */
public interface Navigator {

    /** To the start of a walk. */
    void toStart();

    /** To the questions about a new plant, and from there back to the start. */
    void toNewPlant();

    /** To the round that is walked. */
    void toRound(RoundModel round);

    /** To a transfer point; its survey is begun where there is none. */
    void toZone(RoundModel round, RoundRow row);

    /** To the actions and photos of a transfer point; its survey is begun where there is none. */
    void toNotes(RoundModel round, RoundRow row);

    /** To the end of the walk. */
    void toFinish(RoundModel round);

    /**
     * To the store's own screen.
     *
     * @param back the way back from there
     */
    void toStore(Runnable back);

    /** To the queue and the export. */
    void toQueue(RoundModel round);

    /** To the settings, and from there back to the screen that is shown now. */
    void toSettings();
}
