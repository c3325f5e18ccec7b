package bedmark.screen.start;

import bedmark.screen.Heads;
import bedmark.screen.SidedScreen;
import bedmark.screen.Workplace;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.FootBar;
import bedmark.screen.part.Labels;
import bedmark.screen.part.Pair;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Texts;
import bedmark.screen.part.Weight;
import bedmark.screen.start.NewPlantModel.Size;
import bedmark.screen.start.NewPlantModel.Text;
import bedmark.screen.theme.Icon;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import javafx.scene.Node;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.TextField;
import javafx.scene.control.ToggleButton;
import javafx.scene.layout.Priority;
import javafx.scene.layout.TilePane;
import javafx.scene.layout.VBox;

/** Asks of a new plant what a first transfer point needs to be judged. */
public final class NewPlantView extends SidedScreen {
    private static final int MATERIALS_ACROSS = 3;

    private final NewPlantModel model;
    private final Wording wording;
    private final VBox questions = new VBox();
    private final ScrollPane scroll = new ScrollPane(questions);
    private final PlantSizes sizes;
    private final Map<Text, TextField> fields = new EnumMap<>(Text.class);
    private final TilePane materials = new TilePane();
    private final Label trouble = Texts.trouble("");
    private VBox ownName = new VBox();

    /** @param back to where the person came from; also taken once there is a plant */
    public NewPlantView(Workplace workplace, NewPlantModel model, Runnable back) {
        super("summary");
        this.model = model;
        this.wording = workplace.wording();
        this.sizes = new PlantSizes(wording, model, questions, this::said);
        ActionButton foot = ActionButton.with(Icon.BACK, ContentDisplay.LEFT, Weight.QUIET,
                wording.text("screen.start.title"), back);
        foot.setId("foot-back");
        ActionButton make = ActionButton.with(Icon.CHECK, ContentDisplay.LEFT, Weight.PRIMARY,
                wording.text("first.make"), this::make);
        make.setId("make-plant");
        frame(Heads.head(workplace, listening, wording.text("screen.name"), wording.text("first.plant.title")),
                new FootBar(Optional.of(foot), Optional.empty(), Optional.of(make)));
        trouble.setId("plant-trouble");
        trouble.managedProperty().bind(trouble.textProperty().isNotEmpty());
        questions.getStyleClass().add("questions");
        scroll.setFitToWidth(true);
        scroll.setFocusTraversable(false);
        scroll.getStyleClass().add("form-scroll");
        body.getStyleClass().add("notes-body");
        body.setCenter(scroll);
        side.getStyleClass().add("summary");
        side.getChildren().add(sizes.keys());
        VBox.setVgrow(sizes.keys(), Priority.ALWAYS);
        ask();
        listening.onChange(workplace.siteProperty(), site -> site.ifPresent(made -> back.run()));
        listening.onChange(model.troubleProperty(), defect -> trouble.setText(defect.map(wording::sentence)
                .orElse("")));
    }

    private void ask() {
        ownName = field(Text.MATERIAL);
        ownName.managedProperty().bind(ownName.visibleProperty());
        materials.getStyleClass().addAll("material-tiles", "many");
        materials.setPrefColumns(MATERIALS_ACROSS);
        model.materials().forEach(row -> materials.getChildren().add(tile(row.text("id").orElseThrow(),
                row.text("name").orElseThrow(), () -> model.choose(row))));
        materials.getChildren().add(tile("own", wording.text("first.material.own"), model::chooseOwn));
        materials.widthProperty().addListener((property, before, now) -> materials.setPrefTileWidth(
                Math.floor((now.doubleValue() - materials.getHgap() * (MATERIALS_ACROSS - 1)) / MATERIALS_ACROSS)));
        chosen();
        questions.getChildren().setAll(Texts.wrapped(wording.text("first.plant.words")), trouble,
                new Pair(field(Text.PLANT), field(Text.BELT)), new SectionHeader(wording.text("first.belt")),
                sizes.row(Size.WIDTH, Size.TROUGH, Size.CENTRE_ROLL),
                new SectionHeader(wording.text("first.point")),
                new Pair(field(Text.TAG), field(Text.FROM)),
                new SectionHeader(wording.text("first.material")), materials, ownName,
                sizes.row(Size.DENSITY, Size.SURCHARGE), Labels.wrapped("what", wording.text("first.material.words")));
    }

    private VBox field(Text text) {
        String code = text.name().toLowerCase(Locale.ROOT);
        String question = wording.text("first.text." + code);
        TextField field = new TextField();
        field.textProperty().bindBidirectional(model.text(text));
        field.setId("plant-" + code);
        field.setAccessibleText(question);
        field.getStyleClass().add("secondary-target");
        fields.put(text, field);
        Label label = new Label(question);
        label.setLabelFor(field);
        VBox box = new VBox(label, field);
        box.getStyleClass().add("question");
        return box;
    }

    private ToggleButton tile(String id, String name, Runnable choose) {
        ToggleButton tile = new ToggleButton(name);
        tile.setId("material-" + id);
        tile.setAccessibleText(wording.text("first.material") + ": " + name);
        tile.getStyleClass().add("secondary-target");
        tile.setMaxWidth(Double.MAX_VALUE);
        tile.setWrapText(true);
        tile.setOnAction(event -> {
            choose.run();
            chosen();
            sizes.show();
            said();
        });
        return tile;
    }

    private void chosen() {
        String id = model.ownMaterial() ? "own" : model.material().orElse("");
        for (Node tile : materials.getChildren()) {
            ((ToggleButton) tile).setSelected(tile.getId().equals("material-" + id));
        }
        ownName.setVisible(model.ownMaterial());
    }

    /** What was missing a moment ago may be there now. */
    private void said() {
        trouble.setText("");
    }

    /** Names what is still missing and leads to the first of it; else the plant is made. */
    private void make() {
        List<Text> texts = model.textGaps();
        List<Size> numbers = model.sizeGaps();
        if (texts.isEmpty() && numbers.isEmpty() && model.materialSaid()) {
            model.make();
            return;
        }
        List<String> names = new ArrayList<>();
        texts.forEach(text -> names.add(wording.text("first.text." + text.name().toLowerCase(Locale.ROOT))));
        if (!model.materialSaid()) {
            names.add(wording.text("first.material"));
        }
        numbers.forEach(size -> names.add(sizes.name(size)));
        trouble.setText(wording.text("first.missing", String.join(", ", names)));
        if (!texts.isEmpty()) {
            fields.get(texts.get(0)).requestFocus();
        } else if (!numbers.isEmpty()) {
            sizes.focus(numbers.get(0));
        }
        scroll.setVvalue(0);
    }

    @Override
    public void turned(boolean portrait) {
        super.turned(portrait);
        sizes.keys().turned(portrait);
    }

    @Override
    public void shown() {
        fields.get(Text.PLANT).requestFocus();
    }

    @Override
    public void left() {
        fields.forEach((text, field) -> field.textProperty().unbindBidirectional(model.text(text)));
        super.left();
    }
}
