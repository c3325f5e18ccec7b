package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.quantity.UnitSystem;
import bedmark.screen.part.TopBar;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Light;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.util.List;
import java.util.Locale;
import javafx.scene.Scene;
import javafx.scene.layout.BorderPane;
import org.junit.jupiter.api.Test;

class SavedMarkTest {

    @Test
    void headHasRoomForWhateverIsSaidInEachLanguageAndIsNotLaidOutForIt() throws Exception {
        for (Locale language : Words.LANGUAGES) {
            Wording wording = new Wording(new Words(language), UnitSystem.METRIC);
            Glass.on(() -> {
                TopBar bar = new TopBar();
                bar.keepRoomFor(SavedMark.longest(wording));
                bar.asideProperty().set(wording.text("screen.saving"));
                BorderPane root = new BorderPane();
                root.setTop(bar);
                Scene scene = Glass.show(root, Light.DAY, Density.standard(), 1280, 100);
                for (String said : List.of(wording.text("screen.not-saved"), wording.text("screen.saved", "20:48:59"))) {
                    bar.asideProperty().set(said);
                    assertFalse(bar.isNeedsLayout(), said);
                    root.applyCss();
                    root.layout();
                    assertTrue(bar.lookup(".aside").getLayoutX() >= 0, said + " stands over what is beside it");
                }
                scene.getWindow().hide();
                return null;
            });
        }
    }
}
