package bedmark.screen;

import bedmark.document.Defect;
import bedmark.screen.start.RefusedView;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.time.Clock;
import java.util.concurrent.CountDownLatch;
import javafx.application.Platform;
import javafx.stage.Stage;

/** The window in place of one that could not be opened. */
public final class RefusalWindow {
    private RefusalWindow() {
    }

    /**
     * Opens the window and returns when it is closed. Where there is no display it returns at once: who has none reads
     * the terminal. Not to be called by the screen.
     *
     * @param preferences how the person likes the screen
     * @param clock       by which it may be set for night
     */
    public static void show(Preferences preferences, Defect why, Clock clock) {
        ToolkitNotes.hush();
        CountDownLatch closed = new CountDownLatch(1);
        try {
            Platform.startup(() -> { });
        } catch (IllegalStateException e) {
            // The toolkit runs already: it was made ready while the store was to be opened.
        } catch (UnsupportedOperationException e) {
            return;
        }
        Platform.runLater(() -> stage(preferences, why, clock).setOnHidden(event -> closed.countDown()));
        try {
            closed.await();
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    private static Stage stage(Preferences preferences, Defect why, Clock clock) {
        Stage stage = new Stage();
        RefusedView view = new RefusedView(new Wording(new Words(preferences.locale()), preferences.units()), why,
                stage::close);
        stage.setTitle(Windows.TITLE);
        BedmarkApp.show(stage, view, preferences, clock);
        stage.show();
        return stage;
    }
}
