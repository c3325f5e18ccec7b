package bedmark.screen;

import javafx.application.Application;

/** What all windows of the program begin with. */
public final class Windows {
    /** What stands above a window. */
    public static final String TITLE = "Bedmark";
    /** How wide a window is at first (px). */
    public static final double WIDTH = 1280;
    /** How high a window is at first (px). */
    public static final double HEIGHT = 800;

    private Windows() {
    }

    /**
     * Opens a window and returns when it is closed.
     *
     * @return false where there is no display to open a window on
     */
    public static boolean launch(Class<? extends Application> window) {
        ToolkitNotes.hush();
        try {
            Application.launch(window);
            return true;
        } catch (UnsupportedOperationException e) {
            return false;
        }
    }
}
