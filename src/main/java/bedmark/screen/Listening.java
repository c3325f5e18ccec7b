package bedmark.screen;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;
import javafx.beans.value.ChangeListener;
import javafx.beans.value.ObservableValue;

/** The listeners of one screen, so that all of them can be taken away when it leaves the stage. */
public final class Listening {
    private final List<Runnable> endings = new ArrayList<>();

    /** Tells the value now and whenever it changes. */
    public <T> void to(ObservableValue<T> value, Consumer<? super T> told) {
        told.accept(value.getValue());
        onChange(value, told);
    }

    /** Tells the value whenever it changes. */
    public <T> void onChange(ObservableValue<T> value, Consumer<? super T> told) {
        ChangeListener<T> listener = (property, before, now) -> told.accept(now);
        value.addListener(listener);
        endings.add(() -> value.removeListener(listener));
    }

    /** Does something more when the listening ends. */
    public void onEnd(Runnable ending) {
        endings.add(ending);
    }

    /** Listens to nothing any more. */
    public void end() {
        endings.forEach(Runnable::run);
        endings.clear();
    }
}
