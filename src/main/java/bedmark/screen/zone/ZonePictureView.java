package bedmark.screen.zone;

import bedmark.picture.Sheet;
import bedmark.picture.Snap;
import bedmark.picture.ZonePicture;
import bedmark.picture.ZoneSketch;
import bedmark.screen.theme.Density;
import java.util.List;
import java.util.Optional;
import javafx.css.CssMetaData;
import javafx.css.Styleable;
import javafx.scene.AccessibleRole;
import javafx.scene.canvas.Canvas;
import javafx.scene.input.MouseButton;
import javafx.scene.input.MouseEvent;
import javafx.scene.layout.Region;

/**
 * Draws the zone picture as large as there is room, and lets a finger pull the bed: press on a handle to take a station
 * in hand, pull it to change its depth; press beside the handles and a station is made there. Nothing happens on
 * hovering. Everything that it can do has fields and buttons elsewhere; its accessible text comes from outside.
 */
public final class ZonePictureView extends Region {
    private static final List<CssMetaData<? extends Styleable, ?>> META_DATA =
            InkColours.with(Region.getClassCssMetaData());
    private static final double SLACK_MM = 1;

    private final Canvas canvas = new Canvas();
    private final Paper paper = new Paper();
    private final InkColours inks = new InkColours(this, paper::requestLayout);
    private final FontMeasure fonts = new FontMeasure();
    private final Density density;
    private final PullListener listener;
    private ZoneSketch sketch;
    private Snap snap = Snap.METRIC;
    private Optional<ZonePicture> picture = Optional.empty();
    private Optional<Pull> pull = Optional.empty();
    private boolean ofSpeed;
    private double spedFrom;
    private double corner;

    public ZonePictureView(ZoneSketch first, Density density, PullListener listener) {
        this.sketch = first;
        this.density = density;
        this.listener = listener;
        getStyleClass().add("zone-picture");
        setAccessibleRole(AccessibleRole.IMAGE_VIEW);
        canvas.setManaged(false);
        paper.setManaged(false);
        getChildren().add(paper);
        setMinSize(density.mm(60), density.mm(30));
        addEventHandler(MouseEvent.MOUSE_PRESSED, this::press);
        addEventHandler(MouseEvent.MOUSE_DRAGGED, this::drag);
        addEventHandler(MouseEvent.MOUSE_RELEASED, this::release);
    }

    /** Shows a sketch; depths that are pulled snap to the steps of {@code snap}. */
    public void show(ZoneSketch changed, Snap steps) {
        sketch = changed;
        snap = steps;
        picture = pull.isPresent() ? picture.map(held -> held.pulledTo(changed)) : Optional.empty();
        paper.requestLayout();
    }

    /** Whether a finger pulls the belt rather than the bed. */
    public void pullsSpeed(boolean speed) {
        ofSpeed = speed;
    }

    /** Keeps the drawing clear of what stands over its upper right corner. */
    public void keepCorner(double height) {
        if (corner != height) {
            corner = height;
            picture = Optional.empty();
            paper.requestLayout();
        }
    }

    /** The picture as it is laid out now; nothing before the first layout. */
    public Optional<ZonePicture> picture() {
        return picture;
    }

    private void press(MouseEvent event) {
        if (event.getButton() != MouseButton.PRIMARY) {
            return;
        }
        event.consume();
        if (ofSpeed) {
            spedFrom = event.getX();
            return;
        }
        pull = picture.flatMap(laid -> Pull.at(event.getX(), event.getY(), laid, sketch, snap));
        pull.map(Pull::grip).ifPresent(grip -> {
            if (grip instanceof Grip.OfStation station) {
                listener.touched(station.index());
            } else {
                listener.pulled(grip, pull.orElseThrow().depth(event.getY()), PullListener.Phase.MOVING);
            }
        });
    }

    private void drag(MouseEvent event) {
        if (ofSpeed) {
            listener.sped((event.getX() - spedFrom) / density.perMm());
            spedFrom = event.getX();
        }
        pull.ifPresent(held -> tell(held, event, PullListener.Phase.MOVING));
        event.consume();
    }

    private void tell(Pull held, MouseEvent event, PullListener.Phase phase) {
        switch (held.way(event.getX(), event.getY(), density.mm(SLACK_MM))) {
            case DEPTH -> listener.pulled(held.grip(), held.depth(event.getY()), phase);
            case ALONG -> listener.moved(((Grip.OfStation) held.grip()).index(), held.position(event.getX()), phase);
            case STILL -> {
                if (held.grip() instanceof Grip.AtPlace) {
                    listener.pulled(held.grip(), held.depth(event.getY()), phase);
                }
            }
        }
    }

    private void release(MouseEvent event) {
        Optional<Pull> ended = pull;
        pull = Optional.empty();
        ended.ifPresent(held -> tell(held, event, PullListener.Phase.RELEASED));
        picture = Optional.empty();
        paper.requestLayout();
        event.consume();
    }

    @Override
    protected void layoutChildren() {
        paper.resizeRelocate(0, 0, getWidth(), getHeight());
    }

    /** What is drawn on: drawing anew is no matter of the layout around it. */
    private final class Paper extends Region {
        Paper() {
            getChildren().add(canvas);
        }

        @Override
        protected void layoutChildren() {
            draw(Math.floor(getWidth()), Math.floor(getHeight()));
        }
    }

    private void draw(double width, double height) {
        if (width < 1 || height < 1) {
            return;
        }
        boolean resized = width != canvas.getWidth() || height != canvas.getHeight();
        canvas.setWidth(width);
        canvas.setHeight(height);
        if (picture.isEmpty() || resized) {
            picture = Optional.of(ZonePicture.of(sketch, new Sheet(width, height, corner, density.perMm()), fonts));
        }
        canvas.getGraphicsContext2D().clearRect(0, 0, width, height);
        new MarkPainter(canvas.getGraphicsContext2D(), inks::of, fonts).paint(picture.orElseThrow().drawing());
    }

    InkColours inks() {
        return inks;
    }

    @Override
    public List<CssMetaData<? extends Styleable, ?>> getCssMetaData() {
        return META_DATA;
    }

    public static List<CssMetaData<? extends Styleable, ?>> getClassCssMetaData() {
        return META_DATA;
    }
}
