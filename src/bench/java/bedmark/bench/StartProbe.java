package bedmark.bench;

import bedmark.Bedmark;
import com.sun.management.OperatingSystemMXBean;
import java.lang.management.ManagementFactory;
import java.util.List;
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
 * A program that starts and prints how long that took, how long its threads were busy, and how much of the heap is in
 * use then: from the start of the virtual machine to the second frame of a bare window, or of a screen of the app.
 */
public final class StartProbe {
    private static final long LOOK_MILLIS = 1;
    /** The goal that is reached by going on with a walk; and an end by the battery instead of by closing the window. */
    private static final String ROUND = "search";
    private static final String CUT = "cut";
    private static final double NANOS_TO_MILLI = 1e6;

    private StartProbe() {
    }

    /**
     * Starts.
     *
     * @param arguments {@code bare} or {@code app}, the id of what is in sight on the screen that is waited for, and
     *                  {@code cut} for an end without closing anything
     */
    public static void main(String[] arguments) {
        Thread looking = new Thread(() -> begin(arguments[1], arguments.length > 2 && arguments[2].equals(CUT)));
        looking.setDaemon(true);
        looking.start();
        if (arguments[0].equals("bare")) {
            Application.launch(Bare.class);
        } else {
            Bedmark.main();
        }
    }

    /** Begins to watch the frames as soon as there is a toolkit. */
    private static void begin(String goal, boolean cut) {
        while (true) {
            try {
                Platform.runLater(() -> new Watch(goal, cut).start());
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
        private final boolean cut;
        private int frames;

        Watch(String goal, boolean cut) {
            this.goal = goal;
            this.cut = cut;
        }

        @Override
        public void handle(long now) {
            for (Window window : List.copyOf(Window.getWindows())) {
                Scene scene = window.getScene();
                if (scene.lookup("#" + goal) != null) {
                    frames++;
                } else if (goal.equals(ROUND) && scene.lookup("#person") instanceof TextInputControl person) {
                    person.setText("A. Vale");
                    press(scene.lookup("#caution-read"));
                    press(scene.lookup("#start-walk"));
                }
            }
            if (frames == 2) {
                stop();
                tell();
                if (cut) {
                    Runtime.getRuntime().halt(0);
                }
                Platform.exit();
            }
        }

        private static void press(Node node) {
            if (node instanceof ButtonBase button && !button.isDisabled()) {
                button.fire();
            }
        }
    }

    private static void tell() {
        long taken = System.currentTimeMillis() - ManagementFactory.getRuntimeMXBean().getStartTime();
        OperatingSystemMXBean system = ManagementFactory.getPlatformMXBean(OperatingSystemMXBean.class);
        double busy = system.getProcessCpuTime() / NANOS_TO_MILLI;
        System.gc();
        long used = ManagementFactory.getMemoryMXBean().getHeapMemoryUsage().getUsed();
        System.out.println("started " + taken + " " + busy + " " + used);
        System.out.flush();
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
