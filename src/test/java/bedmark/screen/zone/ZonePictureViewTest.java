package bedmark.screen.zone;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.picture.Handle;
import bedmark.picture.Ink;
import bedmark.picture.SideScale;
import bedmark.picture.Sketches;
import bedmark.picture.Snap;
import bedmark.picture.ZoneSketch;
import bedmark.screen.Glass;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Light;
import bedmark.screen.theme.Theme;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.function.Consumer;
import javafx.event.Event;
import javafx.event.EventType;
import javafx.scene.Scene;
import javafx.scene.image.WritableImage;
import javafx.scene.input.MouseButton;
import javafx.scene.input.MouseEvent;
import javafx.scene.layout.StackPane;
import javafx.scene.paint.Color;
import org.junit.jupiter.api.Test;

class ZonePictureViewTest {
    private final List<String> heard = new ArrayList<>();
    private final PullListener listener = new PullListener() {
        @Override
        public void touched(int station) {
            heard.add("touched " + station);
        }

        @Override
        public void pulled(Grip grip, Snap.Stepped depth, Phase phase) {
            heard.add(grip + " " + depth.steps() + " " + phase);
        }

        @Override
        public void moved(int station, Snap.Stepped position, Phase phase) {
            heard.add("moved " + station + " to " + position.steps() + " " + phase);
        }

        @Override
        public void sped(double forward) {
            heard.add("sped " + Math.round(forward));
        }
    };

    private void withView(ZoneSketch sketch, Snap snap, Consumer<ZonePictureView> work)
            throws Exception {
        Glass.on((Callable<String>) () -> {
            ZonePictureView view = new ZonePictureView(sketch, Density.standard(), listener);
            view.show(sketch, snap);
            Scene scene = Glass.show(new StackPane(view), Light.DAY, Density.standard(), 770, 400);
            work.accept(view);
            scene.getWindow().hide();
            return "";
        });
    }

    private static void mouse(ZonePictureView view, EventType<MouseEvent> type, double x, double y) {
        Event.fireEvent(view, new MouseEvent(type, x, y, x, y, MouseButton.PRIMARY, 1, false, false, false, false,
                true, false, false, true, false, true, null));
    }

    @Test
    void handleIsTouchedAndPulled() throws Exception {
        withView(Sketches.gravel(), Snap.METRIC, view -> {
            SideScale scale = view.picture().orElseThrow().scale();
            Handle handle = view.picture().orElseThrow().handles().get(1);
            mouse(view, MouseEvent.MOUSE_PRESSED, handle.x() + 5, handle.y() + 8);
            mouse(view, MouseEvent.MOUSE_DRAGGED, handle.x() + 5, scale.y(0.251) + 8);
            mouse(view, MouseEvent.MOUSE_RELEASED, handle.x() + 5, scale.y(0.249) + 8);
        });
        assertEquals(List.of("touched 1", "OfStation[index=1] 50 MOVING", "OfStation[index=1] 50 RELEASED"), heard);
    }

    @Test
    void touchAloneChangesNoDepth() throws Exception {
        withView(Sketches.gravel(), Snap.METRIC, view -> {
            Handle handle = view.picture().orElseThrow().handles().get(3);
            mouse(view, MouseEvent.MOUSE_PRESSED, handle.x(), handle.y());
            mouse(view, MouseEvent.MOUSE_DRAGGED, handle.x() + 1, handle.y() + 2);
            mouse(view, MouseEvent.MOUSE_RELEASED, handle.x() + 1, handle.y() + 2);
        });
        assertEquals(List.of("touched 3"), heard);
    }

    @Test
    void stationIsMadeWhereTheFingerGoes() throws Exception {
        withView(Sketches.gravel(), Snap.METRIC, view -> {
            SideScale scale = view.picture().orElseThrow().scale();
            mouse(view, MouseEvent.MOUSE_PRESSED, scale.x(3.04), scale.y(0.1));
            mouse(view, MouseEvent.MOUSE_DRAGGED, scale.x(3.3), scale.y(0.153));
            mouse(view, MouseEvent.MOUSE_RELEASED, scale.x(3.3), scale.y(0.158));
        });
        String place = "AtPlace[position=Stepped[steps=61, step=0.05]] ";
        assertEquals(List.of(place + "20 MOVING", place + "31 MOVING", place + "32 RELEASED"), heard);
    }

    @Test
    void plainMovementAlongTheBeltMovesAStation() throws Exception {
        withView(Sketches.gravel(), Snap.METRIC, view -> {
            SideScale scale = view.picture().orElseThrow().scale();
            Handle handle = view.picture().orElseThrow().handles().get(1);
            mouse(view, MouseEvent.MOUSE_PRESSED, handle.x(), handle.y());
            mouse(view, MouseEvent.MOUSE_DRAGGED, handle.x() + 10, handle.y() + 2);
            mouse(view, MouseEvent.MOUSE_DRAGGED, scale.x(3.01), handle.y() + 3);
            mouse(view, MouseEvent.MOUSE_RELEASED, scale.x(3.01), handle.y() + 40);
        });
        assertEquals(List.of("touched 1", "moved 1 to 60 MOVING", "moved 1 to 60 RELEASED"), heard);
    }

    @Test
    void depthThatDriftsAlongTheBeltStaysADepth() throws Exception {
        withView(Sketches.gravel(), Snap.METRIC, view -> {
            SideScale scale = view.picture().orElseThrow().scale();
            Handle handle = view.picture().orElseThrow().handles().get(1);
            mouse(view, MouseEvent.MOUSE_PRESSED, handle.x(), handle.y());
            mouse(view, MouseEvent.MOUSE_DRAGGED, handle.x() + 8, handle.y() + 8);
            mouse(view, MouseEvent.MOUSE_RELEASED, handle.x() + 90, scale.y(0.1));
        });
        assertEquals(List.of("touched 1", "OfStation[index=1] 20 RELEASED"),
                List.of(heard.get(0), heard.get(heard.size() - 1)));
    }

    @Test
    void fingerPullsTheBeltWhileSpeedIsAskedFor() throws Exception {
        withView(Sketches.gravel(), Snap.METRIC, view -> {
            Handle handle = view.picture().orElseThrow().handles().get(1);
            view.pullsSpeed(true);
            mouse(view, MouseEvent.MOUSE_PRESSED, handle.x(), handle.y());
            mouse(view, MouseEvent.MOUSE_DRAGGED, handle.x() + 5 * Density.standard().perMm(), handle.y() + 50);
            mouse(view, MouseEvent.MOUSE_DRAGGED, handle.x() + 3 * Density.standard().perMm(), handle.y() + 50);
            mouse(view, MouseEvent.MOUSE_RELEASED, handle.x(), handle.y());
        });
        assertEquals(List.of("sped 5", "sped -2"), heard);
    }

    @Test
    void oneClickIsEnough() throws Exception {
        ZoneSketch empty = Sketches.of(List.of(), 3, 0.3, 0.15);
        withView(empty, Snap.INCH, view -> {
            SideScale scale = view.picture().orElseThrow().scale();
            mouse(view, MouseEvent.MOUSE_PRESSED, scale.x(1), scale.y(9.5 * 0.0254));
            mouse(view, MouseEvent.MOUSE_RELEASED, scale.x(1), scale.y(9.5 * 0.0254));
        });
        String place = "AtPlace[position=Stepped[steps=20, step=0.0508]] ";
        assertEquals(List.of(place + "38 MOVING", place + "38 RELEASED"), heard);
    }

    @Test
    void pressOffThePlotOrInAnUnknownZoneDoesNothing() throws Exception {
        withView(Sketches.gravel(), Snap.METRIC, view -> {
            mouse(view, MouseEvent.MOUSE_PRESSED, 765, 5);
            mouse(view, MouseEvent.MOUSE_RELEASED, 765, 5);
        });
        withView(Sketches.nothingKnown(), Snap.METRIC, view -> {
            SideScale scale = view.picture().orElseThrow().scale();
            mouse(view, MouseEvent.MOUSE_PRESSED, scale.plot().centre().x(), scale.plot().centre().y());
            mouse(view, MouseEvent.MOUSE_RELEASED, scale.plot().centre().x(), scale.plot().centre().y());
        });
        assertEquals(List.of(), heard);
    }

    @Test
    void hoveringDoesNothing() throws Exception {
        withView(Sketches.gravel(), Snap.METRIC, view -> {
            Handle handle = view.picture().orElseThrow().handles().get(1);
            mouse(view, MouseEvent.MOUSE_ENTERED, handle.x(), handle.y());
            mouse(view, MouseEvent.MOUSE_MOVED, handle.x(), handle.y());
        });
        assertEquals(List.of(), heard);
    }

    @Test
    void pictureStaysUnderTheFingerWhilePulling() throws Exception {
        withView(Sketches.gravel(), Snap.METRIC, view -> {
            SideScale before = view.picture().orElseThrow().scale();
            Handle handle = view.picture().orElseThrow().handles().get(2);
            mouse(view, MouseEvent.MOUSE_PRESSED, handle.x(), handle.y());
            List<ZoneSketch.Station> pulled = new ArrayList<>(Sketches.gravel().stations());
            pulled.set(2, Sketches.station(4.0, 0.8, true));
            ZoneSketch heaped = Sketches.of(pulled, 6.4, 0.35, 0.15);
            view.show(heaped, Snap.METRIC);
            view.layout();
            assertEquals(before, view.picture().orElseThrow().scale());
            mouse(view, MouseEvent.MOUSE_RELEASED, handle.x(), handle.y());
            view.layout();
            assertTrue(view.picture().orElseThrow().scale().top() > 0.8);
        });
    }

    @Test
    void coloursFollowTheLight() throws Exception {
        Glass.on(() -> {
            ZonePictureView view = new ZonePictureView(Sketches.gravel(), Density.standard(), listener);
            Scene scene = Glass.show(new StackPane(view), Light.DAY, Density.standard(), 770, 400);
            Color day = view.inks().of(Ink.BED);
            WritableImage before = view.snapshot(null, null);
            Theme.apply(scene, Light.NIGHT, Density.standard());
            scene.getRoot().applyCss();
            scene.getRoot().layout();
            assertNotEquals(day, view.inks().of(Ink.BED));
            assertNotEquals(before.getPixelReader().getArgb(60, 300),
                    view.snapshot(null, null).getPixelReader().getArgb(60, 300));
            scene.getWindow().hide();
            return "";
        });
    }
}
