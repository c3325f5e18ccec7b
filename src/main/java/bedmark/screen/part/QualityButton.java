package bedmark.screen.part;

import bedmark.quantity.Quality;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.IconView;
import java.util.EnumSet;
import java.util.Objects;
import java.util.Set;
import java.util.function.Consumer;
import java.util.function.Function;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.SimpleObjectProperty;
import javafx.scene.control.Button;

/**
 * Says how far a reading can be trusted, in word and sign; each press goes on to the next quality that is possible (a
 * depth on a running belt cannot be measured).
 */
public final class QualityButton extends Button {
    private final ObjectProperty<Quality> quality;
    private final ObjectProperty<Set<Quality>> possible =
            new SimpleObjectProperty<>(this, "possible", EnumSet.allOf(Quality.class));

    /**
     * @param word   the word for each quality
     * @param chosen told what the person chose
     */
    public QualityButton(Quality first, Function<Quality, String> word, Consumer<Quality> chosen) {
        quality = new SimpleObjectProperty<>(this, "quality", Objects.requireNonNull(first));
        getStyleClass().add("quality");
        quality.subscribe(now -> {
            setText(word.apply(now));
            setAccessibleText(word.apply(now));
            setGraphic(new IconView(switch (now) {
                case MEASURED -> Icon.MEASURED;
                case ESTIMATED -> Icon.ESTIMATED;
                case SUSPECT -> Icon.SUSPECT;
            }));
        });
        setOnAction(event -> {
            quality.set(next());
            chosen.accept(quality.get());
        });
    }

    public ObjectProperty<Quality> qualityProperty() {
        return quality;
    }

    /** What can be chosen; at least one. */
    public ObjectProperty<Set<Quality>> possibleProperty() {
        return possible;
    }

    private Quality next() {
        Quality[] all = Quality.values();
        for (int step = 1; step <= all.length; step++) {
            Quality candidate = all[(quality.get().ordinal() + step) % all.length];
            if (possible.get().contains(candidate)) {
                return candidate;
            }
        }
        return quality.get();
    }
}
