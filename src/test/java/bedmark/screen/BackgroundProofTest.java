package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.index.Store;
import bedmark.index.StoreCheck;
import bedmark.index.StoreOptions;
import bedmark.survey.Act;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.List;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.CopyOnWriteArrayList;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class BackgroundProofTest {
    private static final Duration AT_ONCE = Duration.ZERO;

    @TempDir
    private Path folder;

    @Test
    void damageThatNoListShowsIsTold() throws Exception {
        try (Store store = filled()) {
            Path segment = folder.resolve("journal/00000001.journal");
            byte[] bytes = Files.readAllBytes(segment);
            bytes[bytes.length / 2] ^= 1;
            Files.write(segment, bytes);
            CompletableFuture<StoreCheck> told = new CompletableFuture<>();
            BackgroundProof proof = new BackgroundProof(store, AT_ONCE, told::complete);
            assertFalse(told.get(1, TimeUnit.MINUTES).sound());
            proof.close();
        }
    }

    @Test
    void soundStoreIsNotSpokenOfAndIsLetGo() {
        List<StoreCheck> told = new CopyOnWriteArrayList<>();
        try (Store store = filled()) {
            new BackgroundProof(store, AT_ONCE, told::add).close();
            new BackgroundProof(store, Duration.ofHours(1), told::add).close();
        }
        assertEquals(List.of(), told);
        try (Store again = Store.open(folder, StoreOptions.of("tablet"))) {
            assertTrue(again.register().isPresent());
        }
    }

    private Store filled() {
        Store store = Store.open(folder, StoreOptions.of("tablet"));
        for (int i = 0; i < 20; i++) {
            store.append("A. Vale", new Act.RegisterTaken(Branch.EMPTY.with("id", "plant " + i)));
        }
        return store;
    }
}
