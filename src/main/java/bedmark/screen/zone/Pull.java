package bedmark.screen.zone;

import bedmark.picture.Handle;
import bedmark.picture.SideScale;
import bedmark.picture.Snap;
import bedmark.picture.ZonePicture;
import bedmark.picture.ZoneSketch;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.IntStream;

/** One finger on the picture, from press to release. The scale stays that of the press. */
final class Pull {
    private final Grip grip;
    private final SideScale scale;
    private final Snap snap;
    private final double pressedX;
    private final double pressedY;
    private final double grabbed;
    private boolean moving;

    private Pull(Grip grip, SideScale scale, Snap snap, double x, double y, double grabbed) {
        this.grip = grip;
        this.scale = scale;
        this.snap = snap;
        this.pressedX = x;
        this.pressedY = y;
        this.grabbed = grabbed;
    }

    /** Takes hold of what lies under the finger; nothing where that is neither a handle nor the plot. */
    static Optional<Pull> at(double x, double y, ZonePicture picture, ZoneSketch sketch, Snap snap) {
        Optional<Handle> handle = picture.handleAt(x, y);
        if (handle.isPresent()) {
            return handle.map(held -> new Pull(new Grip.OfStation(held.station()), picture.scale(), snap, x, y,
                    y - held.y()));
        }
        if (!picture.placesStations() || !picture.isPlot(x, y)) {
            return Optional.empty();
        }
        Snap.Stepped position = snap.position(picture.scale().position(x), picture.scale().length());
        OptionalInt there = IntStream.range(0, sketch.stations().size()).filter(index ->
                Math.abs(sketch.stations().get(index).position() - position.metres()) < position.step() / 2)
                .findFirst();
        Grip grip = there.isPresent() ? new Grip.OfStation(there.getAsInt()) : new Grip.AtPlace(position);
        return Optional.of(new Pull(grip, picture.scale(), snap, x, y, 0));
    }

    Grip grip() {
        return grip;
    }

    /** Whether the finger has moved on far enough to mean it; from then on it always has. */
    boolean moves(double x, double y, double slack) {
        moving = moving || Math.hypot(x - pressedX, y - pressedY) > slack;
        return moving;
    }

    /** The depth under the finger, from where on the handle it took hold. */
    Snap.Stepped depth(double y) {
        return snap.depth(scale.depth(y - grabbed));
    }
}
