package bedmark.index;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Defect;
import java.util.List;
import java.util.UUID;
import java.util.function.Function;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;

/** An index that knows of no entry, proved against a journal that has one. */
class IndexProofTest {
    private final Database database = Database.inMemory();
    private final Index empty = Index.begin(database, LevelOf.NONE, (sequence, place) -> {
        throw new AssertionError("no entry is known");
    }, UUID.randomUUID());

    /** The index of a store that is open: the first entry was saved just after it was asked what it knows. */
    private final class InUse implements IndexProof.Asker {
        @Override
        public <T> T ask(Function<Index, T> question) {
            return question.apply(empty);
        }

        @Override
        public boolean isInUse() {
            return true;
        }
    }

    @AfterEach
    void close() {
        database.close();
    }

    @Test
    void indexThatNobodyUsesIsMissing() {
        IndexProof proof = new IndexProof(new IndexProof.OfClosed(empty));
        proof.begin(true);
        assertFalse(proof.end(1));
        assertEquals(List.of(Defect.in("index", "index-missing")), proof.defects());
    }

    @Test
    void indexThatHearsOfTheFirstEntryMeanwhileIsSound() {
        IndexProof proof = new IndexProof(new InUse());
        proof.begin(true);
        assertTrue(proof.end(1));
        assertEquals(List.of(), proof.defects());
    }
}
