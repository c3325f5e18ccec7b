package bedmark.bench;

import bedmark.index.Store;
import bedmark.screen.BedmarkApp;
import java.lang.management.ManagementFactory;
import java.nio.file.Path;
import java.time.Clock;
import java.util.Optional;
import javafx.animation.AnimationTimer;
import javafx.application.Application;
import javafx.application.Platform;
import javafx.scene.Node;
import javafx.scene.Scene;
import javafx.scene.control.ButtonBase;
import javafx.scene.control.Label;
import javafx.scene.control.TextInputControl;
import javafx.scene.layout.StackPane;
import javafx.stage.Stage;
import javafx.stage.Window;

/**
 * A program that starts and prints how long that took and how much of the heap is in use then: the milliseconds from the
 * start of the virtual machine to the second frame of a bare window, or to that of the round that is under way.
 */
public final class StartProbe {
    private static final long LOOK_MILLIS = 1;

    private StartProbe() {
    }

    /** @param arguments {@code bare}, or {@code app} and the store's folder */
    public static void main(String[] arguments) {
        boolean app = arguments[0].equals("app");
        Thread looking = new Thread(() -> begin(app ? "search" : "bare"));
        looking.setDaemon(true);
        looking.start();
        if (!app) {
            Application.launch(Bare.class);
            return;
        }
        Clock clock = Clock.systemUTC();
        Path folder = Path.of(arguments[1]);
        BedmarkApp.prepare();
        try (Store store = Store.open(folder, BedmarkApp.options(clock))) {
            BedmarkApp.open(store, clock, Optional.empty(), false);
        }
    }

    /** Begins to watch the frames as soon as there is a toolkit. */
    private static void begin(String goal) {
        while (true) {
            try {
                Platform.runLater(() -> new Watch(goal).start());
                return;
            } catch (IllegalStateException e) {
                pause();
            }
        }
    }

    private static void pause() {
        try {
            Thread.sleep(LOOK_MILLIS);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    /** Does at each frame what the person would do next, and ends at the second frame of the goal. */
    private static final class Watch extends AnimationTimer {
        private final String goal;
        private int frames;

        Watch(String goal) {
            this.goal = goal;
        }

        @Override
        public void handle(long now) {
            for (Window window : Window.getWindows()) {
                Scene scene = window.getScene();
                if (scene.lookup("#" + goal) != null) {
                    frames++;
                } else if (scene.lookup("#person") instanceof TextInputControl person) {
                    person.setText("A. Vale");
                    press(scene.lookup("#caution-read"));
                    press(scene.lookup("#start-walk"));
                }
            }
            if (frames == 2) {
                ended();
            }
        }

        private static void press(Node node) {
            if (node instanceof ButtonBase button && !button.isDisabled()) {
                button.fire();
            }
        }
    }

    private static void ended() {
        long taken = System.currentTimeMillis() - ManagementFactory.getRuntimeMXBean().getStartTime();
        System.gc();
        long used = ManagementFactory.getMemoryMXBean().getHeapMemoryUsage().getUsed();
        System.out.println("started " + taken + " " + used);
        System.out.flush();
        Runtime.getRuntime().halt(0);
    }

    /** One label in a window. */
    public static final class Bare extends Application {
        @Override
        public void start(Stage stage) {
            Label label = new Label("Bedmark");
            label.setId("bare");
            stage.setScene(new Scene(new StackPane(label), 1280, 800));
            stage.show();
        }
    }
}
