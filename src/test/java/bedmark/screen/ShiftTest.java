package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.index.SurveyQuery;
import bedmark.json.BundleReader;
import bedmark.screen.part.FieldBox;
import bedmark.screen.part.Named;
import bedmark.survey.Act;
import bedmark.survey.Adoption;
import bedmark.survey.Bundle;
import bedmark.survey.QueueState;
import bedmark.survey.Survey;
import com.sun.management.HotSpotDiagnosticMXBean;
import java.lang.management.ManagementFactory;
import java.lang.ref.WeakReference;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.UUID;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import javafx.event.Event;
import javafx.event.EventType;
import javafx.scene.Scene;
import javafx.scene.control.ButtonBase;
import javafx.scene.input.KeyCode;
import javafx.scene.input.KeyEvent;
import javafx.stage.Stage;
import javax.management.ObjectName;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * A shift of twelve hours in a few minutes: every point is surveyed and photographed, and in between language, light
 * and orientation change. Small in the suite; {@code -Dbedmark.shift.points=80} is the whole of it.
 */
class ShiftTest {
    private static final int POINTS = Integer.getInteger("bedmark.shift.points", 6);
    private static final int CHANGES = Math.max(4, POINTS / 2);
    /** Points that are walked before the heap is first weighed, so that what is loaded once is loaded. */
    private static final int WARM_UP = Math.max(2, POINTS / 4);
    private static final double GROWTH = 1.05;
    /** The first points fill the caches of the toolkit and the store; a whole shift is granted nothing for that. */
    private static final long STILL_FILLING = POINTS >= 80 ? 0 : 4 << 20;
    /** Language, light and orientation change in turn: after so many changes all is as at first. */
    private static final int EVERY_LOOK = 6;
    private static final int LANGUAGE = 0;
    private static final int LIGHT = 1;
    private static final int PAST = 300;
    private static final String ROUND = "shift";
    private static final Path SAMPLES = Path.of("sample-surveys");

    @TempDir
    private Path temp;

    private TabletApp app;
    private boolean warm;
    private final List<WeakReference<Screen>> screens = new ArrayList<>();

    @Test
    void aShiftLeavesTheHeapWhereItWasAndNoScreenBehind() throws Exception {
        try (TabletApp opened = new TabletApp(temp.resolve("store"), Optional.empty(), temp, Clock.systemUTC(), 1280,
                800)) {
            app = opened;
            takePlant();
            press("caution-read");
            press("start-walk");
            app.until(() -> app.has("search"));
            long before = 0;
            int changed = 0;
            for (int i = 0; i < POINTS; i++) {
                survey(i);
                while (changed * POINTS < (i + 1) * CHANGES) {
                    change(changed++);
                }
                if (i == WARM_UP - 1) {
                    everyLookOnce();
                    warm = true;
                    before = weighed();
                }
            }
            assertEquals(CHANGES, changed);
            long after = weighed();
            assertEquals(POINTS, app.workplace().store().surveys(SurveyQuery.ALL.ofRound(ROUND)
                    .in(QueueState.COMPLETED)).size());
            screens.add(new WeakReference<>(app.shell().screen()));
            assertEquals(List.of(), left(), "screens that something still holds");
            Files.writeString(Path.of("target", "shift.txt"), POINTS + " points, " + CHANGES + " changes: " + before
                    + " bytes, " + after + " bytes\n");
            assertTrue(after <= before * GROWTH + STILL_FILLING, "the heap went from " + before + " to " + after);
        }
    }

    /** The demo plant's register with as many points as the shift has, all in one round. */
    private void takePlant() throws Exception {
        Bundle sample = BundleReader.read(Files.readAllBytes(SAMPLES.resolve("round-2026-03.json")));
        Branch plant = sample.document().branch("plant").orElseThrow();
        List<Branch> known = plant.branches("transfers");
        List<Node> transfers = new ArrayList<>();
        List<Node> points = new ArrayList<>();
        for (int i = 0; i < POINTS; i++) {
            String id = "P-" + (100 + i);
            transfers.add(known.get(i % known.size()).with("id", id).with("tag", id));
            points.add(Branch.EMPTY.with("transfer", id));
        }
        Act.RegisterTaken taken = (Act.RegisterTaken) Adoption.register(List.of(sample));
        Branch register = taken.register().with("plant", plant.with("transfers", new Node.Series(transfers)))
                .with("rounds", Node.Series.of(Branch.EMPTY.with("id", ROUND).with("name", "Shift")
                        .with("points", new Node.Series(points))));
        app.workplace().adopt(new Act.RegisterTaken(register));
        takePast(sample);
        Glass.on(() -> {
            app.workplace().preferencesProperty().set(app.workplace().preferences().withPerson("A. Vale"));
            app.shell().toStart();
            return null;
        });
        app.settle();
    }

    /** Rounds of the past, as many as a store keeps at hand: what is at hand of this shift takes their place. */
    private void takePast(Bundle sample) {
        List<Survey> known = sample.surveys();
        for (int i = 0; i < PAST; i++) {
            UUID id = UUID.nameUUIDFromBytes(new byte[] {(byte) i, (byte) (i >> 8)});
            Branch document = known.get(i % known.size()).document().without("assessment").without("photos")
                    .with("id", id.toString()).with("transfer", "P-" + (100 + i % POINTS)).with("round", "past-" + i);
            app.workplace().store().append("A. Vale", new Act.SurveyTaken(id, document));
            app.workplace().store().history(id);
        }
    }

    private void survey(int point) throws Exception {
        String id = "P-" + (100 + point);
        press("stop-" + id);
        app.until(() -> app.has("verdict"));
        for (String length : List.of("5", "700", "300")) {
            number(length);
        }
        type("1");
        number(decimal("1", "8"));
        type("1");
        number("1");
        number(Integer.toString(100 + point));
        seal("1");
        press("add-seals");
        seal("2");
        everyLookOnce();
        press("foot-notes");
        app.until(() -> app.has("to-readings"));
        everyLookOnce();
        Path photo = SAMPLES.resolve("photos").resolve(point % 2 == 0 ? "tp-03-spillage.jpg" : "tp-10-torn-seal.png");
        app.workplace().store().attachPhoto(photo, app.workplace().store().open(ROUND).get(0).id(), "A. Vale",
                OffsetDateTime.now(), "");
        press("to-readings");
        app.until(() -> app.has("foot-done"));
        press("foot-done");
        app.settle();
        press(app.has("foot-round") ? "foot-round" : "to-settings");
        app.settle();
        if (app.has("settings-done")) {
            press("settings-done");
        }
        app.until(() -> app.has("search"));
    }

    private void seal(String side) throws Exception {
        type(side);
        type("1");
        type("1");
        number("5");
    }

    private String decimal(String whole, String part) {
        return whole + app.workplace().wording().format().decimalSign() + part;
    }

    /** What the toolkit keeps of each look it keeps from the first time on: style sheets read, surfaces made. */
    private void everyLookOnce() throws Exception {
        for (int i = 0; i < EVERY_LOOK && !warm; i++) {
            change(i);
        }
    }

    /** Language, light and orientation in turn. */
    private void change(int number) throws Exception {
        Glass.on(() -> {
            Preferences now = app.workplace().preferences();
            Stage stage = (Stage) app.shell().scene().getWindow();
            switch (number % 3) {
                case LANGUAGE -> app.workplace().preferencesProperty().set(now.withLocale(
                        now.locale().equals(Locale.ENGLISH) ? Locale.forLanguageTag("es") : Locale.ENGLISH));
                case LIGHT -> app.workplace().preferencesProperty().set(now.withNight(!now.night()));
                default -> {
                    double width = stage.getWidth();
                    stage.setWidth(stage.getHeight());
                    stage.setHeight(width);
                }
            }
            return null;
        });
        app.settle();
    }

    private void press(String id) throws Exception {
        note();
        Glass.on(() -> {
            Scene scene = app.shell().scene();
            scene.getRoot().applyCss();
            scene.getRoot().layout();
            ButtonBase button = (ButtonBase) Named.find(scene.getRoot(), id).orElse(null);
            assertNotNull(button, id);
            button.fire();
            return null;
        });
        app.settle();
        note();
    }

    /** Remembers the screen that is shown, weakly. */
    private void note() throws Exception {
        Screen now = Glass.on(() -> app.shell().screen());
        if (screens.stream().noneMatch(known -> known.get() == now)) {
            screens.add(new WeakReference<>(now));
        }
    }

    private void number(String text) throws Exception {
        type(text);
        String cell = active();
        enter();
        if (active().equals(cell)) {
            // It was questioned once; the second press says that it is meant.
            enter();
        }
    }

    private void enter() throws Exception {
        Glass.on(() -> {
            key(KeyEvent.KEY_PRESSED, "", KeyCode.ENTER);
            return null;
        });
        app.settle();
    }

    private String active() throws Exception {
        return Glass.on(() -> app.shell().scene().getRoot().lookupAll(".field-box").stream()
                .map(FieldBox.class::cast).filter(box -> box.activeProperty().get()).map(FieldBox::getId).findFirst()
                .orElse(""));
    }

    /** The keys as the toolkit would send them, without the time that a robot takes. */
    private void type(String text) throws Exception {
        for (char sign : text.toCharArray()) {
            Glass.on(() -> {
                key(KeyEvent.KEY_TYPED, String.valueOf(sign), KeyCode.UNDEFINED);
                return null;
            });
        }
        app.settle();
    }

    private void key(EventType<KeyEvent> kind, String text, KeyCode code) {
        Scene scene = app.shell().scene();
        javafx.scene.Node target = scene.getFocusOwner() == null ? scene.getRoot() : scene.getFocusOwner();
        Event.fireEvent(target, new KeyEvent(kind, text, text, code, false, false, false, false));
    }

    /**
     * The heap with as little at hand as possible: the toolkit keeps the styles that it resolved until the sheets
     * change, so that after an hour of one light there are more of them than after a minute.
     */
    private long weighed() throws Exception {
        change(LIGHT);
        change(LIGHT);
        return heap();
    }

    /**
     * The bytes in use once all rubbish is gone and what is held softly, which is until memory is asked for: the virtual
     * machine of the tests lets go of it at once. Bare pixels do not count: without a graphics card the toolkit draws on
     * arrays of them, from a pool of its own that has its own bound.
     */
    private static long heap() throws Exception {
        assertEquals("0", ManagementFactory.getPlatformMXBean(HotSpotDiagnosticMXBean.class)
                .getVMOption("SoftRefLRUPolicyMSPerMB").getValue(), "weighed without -XX:SoftRefLRUPolicyMSPerMB=0");
        Glass.on(() -> null);
        System.gc();
        String classes = (String) ManagementFactory.getPlatformMBeanServer().invoke(
                new ObjectName("com.sun.management:type=DiagnosticCommand"), "gcClassHistogram",
                new Object[] {new String[0]}, new String[] {String[].class.getName()});
        Matcher row = Pattern.compile("(?m)^\\s*\\d+:\\s+\\d+\\s+(\\d+)\\s+(\\S+)").matcher(classes);
        long bytes = 0;
        while (row.find()) {
            bytes += row.group(2).equals("[I") ? 0 : Long.parseLong(row.group(1));
        }
        assertTrue(bytes > 1 << 20, classes);
        return bytes;
    }

    private List<String> left() throws Exception {
        Screen shown = Glass.on(() -> app.shell().screen());
        return screens.stream().map(WeakReference::get).filter(screen -> screen != null && screen != shown)
                .map(screen -> screen.getClass().getSimpleName()).toList();
    }
}
