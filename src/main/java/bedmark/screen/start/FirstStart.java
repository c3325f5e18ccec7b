package bedmark.screen.start;

import bedmark.screen.Navigator;
import bedmark.screen.Workplace;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Labels;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.wording.Wording;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.control.ProgressBar;
import javafx.scene.layout.VBox;

/** What a store without a plant can begin with: the office's round, a new plant, the demo plant. */
final class FirstStart extends VBox {
    private final Wording wording;

    /** @param office takes the office's round in */
    FirstStart(Workplace workplace, StartModel model, Navigator navigator, RoundTakingPane office) {
        wording = workplace.wording();
        getStyleClass().add("questions-inside");
        model.troubleProperty().get().ifPresent(defect -> getChildren().add(Texts.trouble(wording.sentence(defect))));
        double share = model.loadingProperty().get();
        if (share >= 0) {
            ProgressBar bar = new ProgressBar(share);
            bar.setMaxWidth(Double.MAX_VALUE);
            getChildren().addAll(Texts.wrapped(wording.text("screen.start.loading")), bar);
            return;
        }
        Label title = Texts.wrapped(wording.text("first.title"));
        title.getStyleClass().add("card-title");
        getChildren().addAll(title, way("first.take.title", "first.take.words", office));
        if (NewPlantModel.offered(workplace)) {
            getChildren().add(way("first.new.title", "first.new.words",
                    button("new-plant", "first.new", navigator::toNewPlant)));
        }
        if (model.canLoadDemo()) {
            getChildren().add(way("first.demo.title", "first.demo.words",
                    button("load-demo", "screen.start.load-demo", model::loadDemo)));
        }
    }

    private ActionButton button(String id, String key, Runnable press) {
        ActionButton button = new ActionButton(Weight.PLAIN, wording.text(key), press);
        button.setId(id);
        button.setMaxWidth(Double.MAX_VALUE);
        return button;
    }

    private VBox way(String title, String words, Node what) {
        VBox way = new VBox(Labels.wrapped("rule-name", wording.text(title)), Texts.wrapped(wording.text(words)),
                what);
        way.getStyleClass().add("question");
        return way;
    }
}
