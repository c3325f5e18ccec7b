package bedmark.bench;

import bedmark.index.Store;
import bedmark.screen.BedmarkApp;
import bedmark.screen.Shell;
import bedmark.screen.Workplace;
import bedmark.screen.part.Named;
import bedmark.screen.zone.FormOpening;
import java.lang.management.ManagementFactory;
import java.nio.file.Path;
import java.time.Clock;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.concurrent.CountDownLatch;
import javafx.animation.AnimationTimer;
import javafx.application.Platform;
import javafx.beans.property.SimpleStringProperty;
import javafx.beans.property.StringProperty;
import javafx.event.Event;
import javafx.scene.Node;
import javafx.scene.Scene;
import javafx.scene.control.ButtonBase;
import javafx.scene.control.Label;
import javafx.scene.control.TextInputControl;
import javafx.scene.input.KeyCode;
import javafx.scene.input.KeyEvent;
import javafx.scene.layout.StackPane;
import javafx.stage.Stage;

/**
 * A person at the screen: opens transfer points again and again, then types depths, a key a frame, in turn with a label
 * in a bare window that follows a property. Prints what the screen's thread did for each.
 */
public final class ScreenProbe {
    private static final String POINT = "TP-08";
    private static final String DEPTH = "#slot-readings-bedDepths-0-depth";
    private static final int WARM_UP = 30;
    private static final int FORM_TURNS = 60;

    private ScreenProbe() {
    }

    /** @param arguments the store's folder, how often to open, how many keys */
    public static void main(String[] arguments) throws Exception {
        int opens = Integer.parseInt(arguments[1]);
        int keys = Integer.parseInt(arguments[2]);
        CountDownLatch done = new CountDownLatch(1);
        try (Store store = Store.open(Path.of(arguments[0]), BedmarkApp.options(Clock.systemUTC()))) {
            Platform.startup(() -> {
                Workplace workplace = new Workplace(store, Clock.systemUTC(), Platform::runLater,
                        (title, begin) -> Optional.empty(), Optional.empty());
                Shell shell = new Shell(workplace, 1280, 800);
                Stage stage = new Stage();
                stage.setScene(shell.scene());
                stage.show();
                new Person(workplace, shell.scene(), opens, keys, done).start();
            });
            done.await();
        }
        System.out.flush();
        System.exit(0);
    }

    /** What the screen's thread itself worked so far (ms): a busy machine makes it wait, but does not make it work. */
    private static double worked() {
        return ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime() / 1e6;
    }

    private static void tell(String what, double[] millis) {
        double[] sorted = millis.clone();
        Arrays.sort(sorted);
        System.out.printf(Locale.ROOT, "%s %.4f %.4f %.4f%n", what, sorted[sorted.length / 2],
                sorted[(int) (sorted.length * 0.95)], sorted[(int) (sorted.length * 0.99)]);
    }

    /** Does one thing at each frame. */
    private static final class Person extends AnimationTimer {
        private final Workplace workplace;
        private final Scene scene;
        private final CountDownLatch done;
        private final int opens;
        private final List<Double> opened = new ArrayList<>();
        private final List<Double> workedForOpening = new ArrayList<>();
        private final int keys;
        private Optional<Typist> typist = Optional.empty();
        private double workedBefore;
        private long pressed;
        private boolean waiting;
        private final Runnable laidOut = this::laidOut;

        Person(Workplace workplace, Scene scene, int opens, int keys, CountDownLatch done) {
            this.workplace = workplace;
            this.scene = scene;
            this.opens = opens;
            this.done = done;
            this.keys = keys;
        }

        /** The point is open once its first frame is laid out. */
        private void laidOut() {
            if (waiting && scene.lookup("#verdict") != null) {
                opened.add((System.nanoTime() - pressed) / 1e6);
                workedForOpening.add(worked() - workedBefore);
                waiting = false;
            }
        }

        @Override
        public void handle(long now) {
            if (waiting) {
                return;
            }
            // Looking for a node makes more garbage than a key does, so nothing is looked for while keys are measured.
            if (typist.isPresent()) {
                type(typist.get(), now);
            } else if (scene.lookup("#person") instanceof TextInputControl person) {
                person.setText("A. Vale");
                press("caution-read");
                press("start-walk");
            } else if (opened.size() < WARM_UP + opens) {
                openOrReturn();
            } else if (scene.lookup("#correct") != null) {
                press("correct");
            } else if (scene.lookup("#pad-next") == null) {
                Optional.ofNullable(scene.lookup(DEPTH)).ifPresent(Node::requestFocus);
            } else {
                typist = Optional.of(new Typist(scene, keys));
            }
        }

        private void type(Typist typist, long now) {
            if (typist.typed(now)) {
                stop();
                tell("open", opened.stream().skip(WARM_UP).mapToDouble(Double::doubleValue).toArray());
                tell("open-work", workedForOpening.stream().skip(WARM_UP).mapToDouble(Double::doubleValue).toArray());
                typist.tell();
                System.out.printf(Locale.ROOT, "form %.4f%n", formRatio());
                done.countDown();
            }
        }

        /** The time that a form of 200 fields takes to open, over that of one of 20. */
        private double formRatio() {
            StackPane room = new StackPane();
            Stage stage = new Stage();
            stage.setScene(new Scene(room, 490, 300));
            stage.getScene().getStylesheets().setAll(scene.getStylesheets());
            stage.show();
            return FormOpening.ratio(workplace, room, 200, 20, FORM_TURNS);
        }

        private void openOrReturn() {
            if (scene.lookup("#verdict") != null) {
                press("foot-round");
            } else if (Named.find(scene.getRoot(), "stop-" + POINT).isPresent()) {
                waiting = true;
                workedBefore = worked();
                pressed = System.nanoTime();
                scene.removePostLayoutPulseListener(laidOut);
                press("stop-" + POINT);
                // Behind all that the new screen itself does at the end of a layout.
                scene.addPostLayoutPulseListener(laidOut);
            }
        }

        private void press(String name) {
            Node node = Named.find(scene.getRoot(), name).orElse(null);
            if (node instanceof ButtonBase button && !button.isDisabled()) {
                button.fire();
            }
        }
    }

    /**
     * Adds up what one change costs the screen's thread: the handling itself, then style and layout of its frame, and
     * what whoever listens for the end of that layout does; so it is made once all of them are there.
     */
    private static final class Watch {
        private final double[] taken;
        private final double[] worked;
        private int at = -1;
        private double since;
        private double workedSince;

        Watch(Scene scene, int changes) {
            taken = new double[changes];
            worked = new double[changes];
            scene.addPreLayoutPulseListener(this::go);
            scene.addPostLayoutPulseListener(() -> {
                pause();
                at = -1;
            });
        }

        void begin(int change) {
            at = change;
            go();
        }

        private void go() {
            since = System.nanoTime() / 1e6;
            workedSince = ScreenProbe.worked();
        }

        private void pause() {
            if (at >= 0) {
                taken[at] += System.nanoTime() / 1e6 - since;
                worked[at] += ScreenProbe.worked() - workedSince;
            }
        }

    }

    /** Types depths and places of stations, other ones each time, and changes a label in a bare window, in turn. */
    private static final class Typist {
        /** Keys from one return to the first depth to the next. */
        private static final int TABLE = 16;
        private static final String TYPED = "162\r0.5\r165\r1.5\r" + "172\r0.6\r175\r1.6\r";
        private static final double FRAME = 1000 / 60.0;

        private final Scene scene;
        private final StringProperty text = new SimpleStringProperty("");
        private final Scene bare;
        private final int keys;
        private final Watch keyWatch;
        private final Watch labelWatch;
        private int turn = -2 * WARM_UP;
        private long lastFrame;
        private int keysMissed;
        private int labelsMissed;

        Typist(Scene scene, int keys) {
            this.scene = scene;
            this.keys = keys;
            Label label = new Label();
            label.textProperty().bind(text);
            bare = new Scene(new StackPane(label), 200, 100);
            Stage stage = new Stage();
            stage.setScene(bare);
            stage.show();
            keyWatch = new Watch(scene, keys);
            labelWatch = new Watch(bare, keys);
        }

        /** Whether all is typed. */
        boolean typed(long now) {
            double sinceLast = (now - lastFrame) / 1e6;
            if (turn > 0) {
                boolean missed = sinceLast > 1.5 * FRAME;
                keysMissed += missed && turn % 2 == 1 ? 1 : 0;
                labelsMissed += missed && turn % 2 == 0 ? 1 : 0;
            }
            lastFrame = now;
            if (turn >= 2 * keys) {
                return true;
            }
            int at = Math.floorDiv(turn, 2);
            boolean key = Math.floorMod(turn, 2) == 0;
            if (key) {
                key(at);
            } else {
                label(at);
            }
            turn++;
            return false;
        }

        private void key(int at) {
            char sign = TYPED.charAt(Math.floorMod(at, TYPED.length()));
            if (Math.floorMod(at, TABLE) == 0) {
                Optional.ofNullable(scene.lookup(DEPTH)).ifPresent(Node::requestFocus);
            }
            Node target = scene.getFocusOwner();
            keyWatch.begin(at);
            Event.fireEvent(target, sign == '\r'
                    ? new KeyEvent(KeyEvent.KEY_PRESSED, "", "", KeyCode.ENTER, false, false, false, false)
                    : new KeyEvent(KeyEvent.KEY_TYPED, String.valueOf(sign), "", KeyCode.UNDEFINED, false, false,
                            false, false));
            keyWatch.pause();
        }

        private void label(int at) {
            labelWatch.begin(at);
            text.set(Integer.toString(at));
            labelWatch.pause();
        }

        void tell() {
            ScreenProbe.tell("key", keyWatch.taken);
            ScreenProbe.tell("key-work", keyWatch.worked);
            ScreenProbe.tell("label", labelWatch.taken);
            System.out.printf(Locale.ROOT, "missed %.5f %.5f%n", 100.0 * keysMissed / keys,
                    100.0 * labelsMissed / keys);
        }
    }
}
