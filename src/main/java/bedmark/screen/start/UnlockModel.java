package bedmark.screen.start;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.Store;
import bedmark.vault.Passphrase;
import java.util.Optional;
import java.util.concurrent.Executor;
import java.util.function.Consumer;
import java.util.function.Function;
import javafx.beans.property.BooleanProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleBooleanProperty;

/** Opens a store that is encrypted, with what the person types; that takes time and is done beside the screen. */
public final class UnlockModel {
    private final Function<Passphrase, Store> opening;
    private final Executor screen;
    private final BooleanProperty busy = new SimpleBooleanProperty();
    private final ReadOnlyObjectWrapper<Optional<Defect>> trouble = new ReadOnlyObjectWrapper<>(Optional.empty());

    /**
     * @param opening opens the store, or refuses
     * @param screen  runs what touches the screen
     */
    public UnlockModel(Function<Passphrase, Store> opening, Executor screen) {
        this.opening = opening;
        this.screen = screen;
    }

    public BooleanProperty busyProperty() {
        return busy;
    }

    /** Why it did not open. */
    public ReadOnlyObjectProperty<Optional<Defect>> troubleProperty() {
        return trouble.getReadOnlyProperty();
    }

    /** Tries; {@code opened} is told by the screen's executor. */
    public void open(String typed, Consumer<Store> opened) {
        if (busy.get() || typed.isEmpty()) {
            return;
        }
        busy.set(true);
        trouble.set(Optional.empty());
        Thread trying = new Thread(() -> attempt(typed, opened), "unlock");
        trying.setDaemon(true);
        trying.start();
    }

    private void attempt(String typed, Consumer<Store> opened) {
        try {
            Store store = opening.apply(Passphrase.of(typed));
            screen.execute(() -> {
                busy.set(false);
                opened.accept(store);
            });
        } catch (Refused e) {
            screen.execute(() -> {
                busy.set(false);
                trouble.set(Optional.of(e.defect()));
            });
        }
    }
}
