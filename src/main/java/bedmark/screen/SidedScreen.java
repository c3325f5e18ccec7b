package bedmark.screen;

import java.util.Optional;
import javafx.scene.Node;
import javafx.scene.control.ScrollPane;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** A screen of two parts: what is worked on, and beside it, or below it on an upright tablet, what it comes to. */
public abstract class SidedScreen implements Screen {
    /** The listeners of the screen; they end when it leaves the stage. */
    protected final Listening listening = new Listening();
    /** Holds the part that is worked on in its centre. */
    protected final BorderPane body = new BorderPane();
    /** The part beside it. */
    protected final VBox side = new VBox();
    private final String sideClass;
    private Optional<ScrollPane> sideScroll = Optional.empty();
    private Node head;
    private Node foot;

    /** @param sideClass what the style sheets know the side by */
    protected SidedScreen(String sideClass) {
        this.sideClass = sideClass;
    }

    /** Gives the screen its head and foot. */
    protected final void frame(Node top, Node bottom) {
        head = top;
        foot = bottom;
    }

    @Override
    public final Node head() {
        return head;
    }

    @Override
    public final Node body() {
        return body;
    }

    @Override
    public final Node foot() {
        return foot;
    }

    @Override
    public void turned(boolean portrait) {
        body.setRight(null);
        body.setBottom(null);
        side.getStyleClass().setAll(sideClass, portrait ? "portrait" : "landscape");
        if (portrait) {
            body.setBottom(side);
        } else {
            body.setRight(side);
        }
        sideScroll.ifPresent(scroll -> {
            scroll.maxHeightProperty().unbind();
            if (portrait) {
                scroll.maxHeightProperty().bind(body.heightProperty().multiply(0.5));
            } else {
                scroll.setMaxHeight(Double.MAX_VALUE);
            }
        });
    }

    /** A long column that scrolls. */
    protected static ScrollPane scrolling(VBox content) {
        ScrollPane scroll = new ScrollPane(content);
        scroll.setFitToWidth(true);
        scroll.getStyleClass().add("form-scroll");
        return scroll;
    }

    /** Fills the side with a column that scrolls; upright it takes at most the lower half. */
    protected final void scrollSide(VBox content) {
        ScrollPane scroll = scrolling(content);
        side.getChildren().add(scroll);
        VBox.setVgrow(scroll, Priority.ALWAYS);
        sideScroll = Optional.of(scroll);
    }

    @Override
    public void shown() {
        body.requestFocus();
    }

    @Override
    public void left() {
        listening.end();
    }
}
