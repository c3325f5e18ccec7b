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
    private Way way = Way.STILL;

    /** What a finger turned out to mean. */
    enum Way {
        STILL,
        /** The depth follows it. */
        DEPTH,
        /** The station follows it along the zone. */
        ALONG
    }

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

    /**
     * What the finger means once it has moved on far enough; that is decided once. A depth is pulled by the least
     * movement up or down, a station moved only by a plain movement along the belt.
     */
    Way way(double x, double y, double slack) {
        if (way == Way.STILL && Math.abs(y - pressedY) > slack) {
            way = Way.DEPTH;
        } else if (way == Way.STILL && grip instanceof Grip.OfStation && Math.abs(x - pressedX) > 4 * slack) {
            way = Way.ALONG;
        }
        return way;
    }

    /** The place under the finger. */
    Snap.Stepped position(double x) {
        return snap.position(scale.position(x), scale.length());
    }

    /** The depth under the finger, from where on the handle it took hold. */
    Snap.Stepped depth(double y) {
        return snap.depth(scale.depth(y - grabbed));
    }
}
