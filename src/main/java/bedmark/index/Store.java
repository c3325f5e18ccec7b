package bedmark.index;

import bedmark.document.Branch;
import bedmark.document.Refused;
import bedmark.journal.FileLayer;
import bedmark.journal.NotSaved;
import bedmark.journal.Progress;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.QueueState;
import bedmark.survey.SurveyHistory;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;

/**
 * The store of one device, in one folder: {@code journal/} is the truth, {@code photos/} its files, {@code index/} a
 * database that can be thrown away, {@code device.json} the identity. One program at a time. All methods may be
 * called from any thread, interrupted or not; they wait for the store's own thread.
 */
public final class Store implements AutoCloseable {
    private Store() {
    }

    /**
     * Opens a store, and makes it where the folder is empty or missing.
     *
     * @throws Refused {@code store-locked} where another program has it open; {@code store-…} where the folder can't
     *                 be used
     */
    public static Store open(Path folder, StoreOptions options) {
        throw new UnsupportedOperationException();
    }

    /**
     * Proves a store that need not be open, without changing a byte.
     *
     * @throws Refused {@code store-missing} where the folder holds no store
     */
    public static StoreCheck check(Path folder, FileLayer files, Progress progress) {
        throw new UnsupportedOperationException();
    }

    /**
     * Throws the index away and makes it anew from the journal.
     *
     * @return the number of entries taken in
     * @throws Refused as {@link #open(Path, StoreOptions)}; {@code store-missing} where the folder holds no store
     */
    public static long rebuild(Path folder, StoreOptions options) {
        throw new UnsupportedOperationException();
    }

    public Path folder() {
        throw new UnsupportedOperationException();
    }

    public Device device() {
        throw new UnsupportedOperationException();
    }

    /** What opening found and did. */
    public Opening opening() {
        throw new UnsupportedOperationException();
    }

    /**
     * Saves an act: when this returns, it is on the medium.
     *
     * @param person who did it
     * @return the entry with its sequence number and time
     * @throws NotSaved where it is not on the medium
     * @throws Refused  {@code survey-unknown}, {@code survey-known}, {@code act-unfit} where the act is impossible as
     *                  things stand; nothing was written
     */
    public Entry append(String person, Act act) {
        throw new UnsupportedOperationException();
    }

    /**
     * Copies a photo into the store, untouched, and saves that it is attached.
     *
     * @param source  a JPEG or PNG file; it stays where it is
     * @param caption may be empty
     * @throws NotSaved as {@link #append(String, Act)}
     * @throws Refused  {@code photo-unreadable}, {@code photo-unfit}, and those of {@link #append(String, Act)}
     */
    public Entry attachPhoto(Path source, UUID survey, String person, OffsetDateTime takenAt, String caption) {
        throw new UnsupportedOperationException();
    }

    /** As {@link #attachPhoto(Path, UUID, String, OffsetDateTime, String)}, from memory. */
    public Entry attachPhoto(byte[] photo, UUID survey, String person, OffsetDateTime takenAt, String caption) {
        throw new UnsupportedOperationException();
    }

    /** Where the file of a photo of a survey lies. */
    public Path photoFile(Branch photo) {
        throw new UnsupportedOperationException();
    }

    /** The latest register: {@code plant}, {@code forms}, {@code rounds}. */
    public Optional<Branch> register() {
        throw new UnsupportedOperationException();
    }

    /** A survey as it stands, with every change, read from the journal. */
    public Optional<SurveyHistory> history(UUID survey) {
        throw new UnsupportedOperationException();
    }

    /** The surveys that a query asks for, in the order in which they were opened. */
    public List<SurveyLine> surveys(SurveyQuery query) {
        throw new UnsupportedOperationException();
    }

    public Optional<SurveyLine> survey(UUID id) {
        throw new UnsupportedOperationException();
    }

    /** The current surveys of a round that are not completed. */
    public List<SurveyLine> open(String round) {
        throw new UnsupportedOperationException();
    }

    /**
     * The last result of a transfer point: the inspected survey that was completed last and that no completed
     * revision replaces.
     *
     * @param before leaves out this survey and what was completed after it
     */
    public Optional<Branch> latestFinished(String transfer, Optional<UUID> before) {
        throw new UnsupportedOperationException();
    }

    /** How many surveys are in each state; every state has a number. */
    public Map<QueueState, Long> counts() {
        throw new UnsupportedOperationException();
    }

    /** The surveys that wait for export, in the order in which they were opened. */
    public List<SurveyLine> queue() {
        throw new UnsupportedOperationException();
    }

    /** The newest walk of a round. */
    public Optional<Walk> walk(String round) {
        throw new UnsupportedOperationException();
    }

    /** The newest walk of each round, the one started last first. */
    public List<Walk> walks() {
        throw new UnsupportedOperationException();
    }

    /** The packs that left, newest first. */
    public List<Export> exports() {
        throw new UnsupportedOperationException();
    }

    /** When an entry was last forced to the medium; after opening, the time of the last entry. */
    public Optional<OffsetDateTime> savedAt() {
        throw new UnsupportedOperationException();
    }

    /** Adds an observer until the returned handle is run. */
    public Runnable observe(StoreObserver observer) {
        throw new UnsupportedOperationException();
    }

    /** Proves the whole store in the calling thread, while others go on saving. */
    public StoreCheck check(Progress progress) {
        throw new UnsupportedOperationException();
    }

    /** Waits for what was begun, closes the index cleanly and gives the lock up. Closing again does nothing. */
    @Override
    public void close() {
        throw new UnsupportedOperationException();
    }
}
