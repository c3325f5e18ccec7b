package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Defect;
import java.time.Clock;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.TimeUnit;
import javafx.scene.Scene;
import javafx.scene.control.Label;
import javafx.scene.input.KeyCode;
import javafx.stage.Window;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.testfx.api.FxRobot;
import org.testfx.util.WaitForAsyncUtils;

/** Who starts a second program on one store by its icon has no terminal to read. */
class RefusalWindowTest {

    @ParameterizedTest
    @CsvSource({"en, false, is open in another program", "es, true, está abierto en otro programa"})
    void refusalIsReadInAWindowAndEnterClosesIt(String language, boolean night, String said) throws Exception {
        Glass.on(() -> null);
        Preferences liked = Preferences.standard().withLocale(Locale.forLanguageTag(language)).withNight(night);
        CompletableFuture<Void> closed = CompletableFuture.runAsync(() ->
                RefusalWindow.show(liked, Defect.in("/survey/store", "store-locked"), Clock.systemUTC()));
        WaitForAsyncUtils.waitFor(30, TimeUnit.SECONDS, () -> Glass.on(() -> shown().isPresent()));
        Scene scene = Glass.on(() -> shown().orElseThrow());
        List<String> findings = Glass.on(() -> {
            scene.getRoot().applyCss();
            scene.getRoot().layout();
            assertTrue(((Label) scene.lookup("#refusal")).getText().contains(said));
            return ScreenScan.of(scene, Shell.density(liked));
        });
        assertEquals(List.of(), findings);
        new FxRobot().type(KeyCode.ENTER);
        closed.get(30, TimeUnit.SECONDS);
    }

    private static Optional<Scene> shown() {
        return Window.getWindows().stream().map(Window::getScene)
                .filter(scene -> scene.lookup("#refusal") != null).findFirst();
    }
}
