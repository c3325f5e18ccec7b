package bedmark.screen.store;

import bedmark.index.Restored;
import bedmark.index.StoreCheck;
import bedmark.index.StoreFacts;
import bedmark.screen.Errand;
import bedmark.screen.Workplace;
import bedmark.survey.QueueState;
import bedmark.vault.Passphrase;
import java.nio.file.Path;
import java.util.Map;
import java.util.Optional;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;

/** How the store does: what is known at once, the proof in the background, the backup, and taking another's over. */
public final class StoreModel {
    private final Workplace workplace;
    private final Errand errand;
    private final ReadOnlyObjectWrapper<StoreFacts> facts = new ReadOnlyObjectWrapper<>();
    private final ReadOnlyObjectWrapper<Outcome> outcome = new ReadOnlyObjectWrapper<>(new Outcome.Nothing());

    /** What the last work here came to. */
    public sealed interface Outcome {

        /** Nothing was done yet. */
        record Nothing() implements Outcome {
        }

        /** The store was proved. */
        record Proved(StoreCheck check) implements Outcome {
        }

        /** A backup stands there. */
        record BackedUp(Path folder) implements Outcome {
        }

        /** Another tablet's surveys were taken over. */
        record TakenOver(Restored restored) implements Outcome {
        }
    }

    public StoreModel(Workplace workplace) {
        this.workplace = workplace;
        this.errand = new Errand(workplace);
        reload();
    }

    private void reload() {
        facts.set(workplace.store().facts());
    }

    public ReadOnlyObjectProperty<StoreFacts> factsProperty() {
        return facts.getReadOnlyProperty();
    }

    public ReadOnlyObjectProperty<Outcome> outcomeProperty() {
        return outcome.getReadOnlyProperty();
    }

    /** What takes time here. */
    public Errand errand() {
        return errand;
    }

    /** How many surveys are in each state. */
    public Map<QueueState, Long> counts() {
        return workplace.store().counts();
    }

    /** Proves the store while others go on saving. */
    public void prove() {
        errand.run(progress -> workplace.store().check(progress), check -> told(new Outcome.Proved(check)));
    }

    /** Backs the store up into a folder or onto a stick. */
    public void backUp(Path folder) {
        workplace.preferencesProperty().set(workplace.preferences().withExportFolder(folder.toString()));
        String person = workplace.preferences().person();
        errand.run(progress -> workplace.store().backup(folder, person, progress),
                made -> told(new Outcome.BackedUp(made)));
    }

    /**
     * Takes the surveys of another tablet's backup over.
     *
     * @param passphrase where that one is encrypted
     */
    public void takeOver(Path backup, Optional<Passphrase> passphrase) {
        String person = workplace.preferences().person();
        errand.run(progress -> {
            Restored restored = workplace.store().takeOver(backup, passphrase, person, progress);
            workplace.reread();
            return restored;
        }, restored -> told(new Outcome.TakenOver(restored)));
    }

    private void told(Outcome told) {
        reload();
        outcome.set(told);
    }
}
