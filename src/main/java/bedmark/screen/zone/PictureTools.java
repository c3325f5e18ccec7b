package bedmark.screen.zone;

import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.wording.Wording;
import javafx.scene.control.ContentDisplay;
import javafx.scene.layout.HBox;

/**
 * The buttons over the picture, for what a finger does on it: a station made, the one in hand taken out, the belt run
 * faster or slower to see what comes of it. Three at a time: in the question of speed they are those of speed.
 */
final class PictureTools extends HBox {
    private final ActionButton add;
    private final ActionButton take;
    private final ActionButton whatIf;
    private final ActionButton slower;
    private final ActionButton faster;
    private final ActionButton end;

    /** What the buttons do. */
    interface Work {
        void addStation();

        void takeStation();

        /** Asks what another speed would bring, or ends it. */
        void askSpeed(boolean asked);

        /** One step faster or slower. */
        void step(int direction);
    }

    PictureTools(Wording wording, Work work) {
        getStyleClass().add("picture-tools");
        add = tool("add-station", Icon.PLUS, wording.text("zone.tool.add"), wording.text("zone.tool.add-name"),
                work::addStation);
        take = tool("take-station", Icon.CROSS, wording.text("zone.tool.take"), wording.text("zone.tool.take-name"),
                work::takeStation);
        whatIf = tool("what-if", Icon.SPEED, wording.text("zone.tool.speed"), wording.text("zone.tool.speed-name"),
                () -> work.askSpeed(true));
        slower = tool("slower", Icon.MINUS, wording.text("zone.tool.slower"), wording.text("zone.tool.slower-name"),
                () -> work.step(-1));
        faster = tool("faster", Icon.PLUS, wording.text("zone.tool.faster"), wording.text("zone.tool.faster-name"),
                () -> work.step(1));
        end = tool("what-if-end", Icon.BACK, wording.text("zone.tool.end"), wording.text("zone.tool.end-name"),
                () -> work.askSpeed(false));
        show(false);
    }

    private static ActionButton tool(String id, Icon icon, String face, String name, Runnable action) {
        ActionButton tool = ActionButton.with(icon, ContentDisplay.TOP, Weight.PLAIN, face, action);
        tool.setId(id);
        tool.setAccessibleText(name);
        tool.setMinWidth(0);
        return tool;
    }

    /** Shows the buttons of the speed, or those of the bed. */
    void show(boolean speed) {
        if (speed) {
            getChildren().setAll(slower, faster, end);
        } else {
            getChildren().setAll(add, take, whatIf);
        }
    }

    /**
     * Lets those buttons be pressed that can do something now.
     *
     * @param open  whether the survey takes answers
     * @param held  whether a station is in hand
     * @param speed whether it is known what another speed would bring
     */
    void offer(boolean open, boolean held, boolean speed) {
        add.setDisable(!open);
        take.setDisable(!open || !held);
        whatIf.setDisable(!speed);
    }
}
