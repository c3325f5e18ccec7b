package bedmark.screen.office;

import bedmark.engine.verdict.Rule;
import bedmark.office.FindingLine;
import bedmark.office.RankedZone;
import bedmark.screen.Listening;
import bedmark.survey.merge.ZoneId;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.function.Function;
import javafx.beans.property.ObjectProperty;
import javafx.scene.control.ComboBox;
import javafx.scene.control.Label;
import javafx.scene.control.ListView;
import javafx.scene.input.KeyCode;
import javafx.scene.layout.ColumnConstraints;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;
import javafx.util.StringConverter;

/** The loading zones of all plants, worst first. */
final class WorstView extends VBox {
    private static final List<Integer> AGES = List.of(30, 90, 200, 365);
    /** Below this width a row has no room for the area beside the name. */
    private static final double NARROW = 1000;

    private final WorstModel model;
    private final Wording wording;
    private final GridPane filters = new GridPane();
    private boolean narrow;

    WorstView(OfficeDesk desk, WorstModel model, Listening listening, Consumer<ZoneId> open) {
        this.model = model;
        this.wording = desk.wording();
        getStyleClass().add("room");
        filters.getStyleClass().add("filters");
        listening.to(model.allProperty(), all -> layOut());
        ListView<RankedZone> list = new ListView<>(model.zones());
        list.setId("zones");
        list.setCellFactory(view -> new ZoneCell(wording, () -> narrow));
        widthProperty().addListener((property, before, now) -> {
            if (narrow != now.doubleValue() < NARROW) {
                narrow = !narrow;
                layOut();
                list.refresh();
            }
        });
        list.setPlaceholder(new Label(wording.text("office.worst.none")));
        list.setOnMouseClicked(event -> chosen(list, open));
        list.setOnKeyPressed(event -> {
            if (event.getCode() == KeyCode.ENTER) {
                chosen(list, open);
            }
        });
        VBox.setVgrow(list, Priority.ALWAYS);
        getChildren().addAll(filters, list);
        focusedProperty().addListener((property, before, now) -> {
            if (now) {
                list.requestFocus();
            }
        });
    }

    private static void chosen(ListView<RankedZone> list, Consumer<ZoneId> open) {
        Optional.ofNullable(list.getSelectionModel().getSelectedItem()).map(RankedZone::zone).ifPresent(open);
    }

    /** The filters in one row, or in two where the window is held upright. */
    private void layOut() {
        List<VBox> all = filters();
        int columns = narrow ? all.size() / 2 : all.size();
        filters.getChildren().clear();
        filters.getColumnConstraints().clear();
        for (int i = 0; i < columns; i++) {
            ColumnConstraints column = new ColumnConstraints();
            column.setPercentWidth(100.0 / columns);
            filters.getColumnConstraints().add(column);
        }
        for (int i = 0; i < all.size(); i++) {
            filters.add(all.get(i), i % columns, i / columns);
        }
    }

    private List<VBox> filters() {
        return List.of(
                filter("area", model.areaProperty(), model.choices(zone -> some(zone.names().area())), text -> text),
                filter("material", model.materialProperty(), model.choices(zone -> some(zone.names().material())),
                        text -> text),
                filter("finding", model.findingProperty(), model.<Rule>choices(zone -> zone.open().stream()
                        .map(FindingLine::rule).toList()), rule -> wording.text("rule." + rule.code())),
                filter("age", model.daysProperty(), AGES, days -> wording.text("office.worst.older", days)));
    }

    private static List<String> some(String text) {
        return text.isBlank() ? List.of() : List.of(text);
    }

    private <T> VBox filter(String name, ObjectProperty<Optional<T>> chosen, List<T> choices,
                            Function<T, String> shown) {
        ComboBox<Optional<T>> box = new ComboBox<>();
        box.setId("filter-" + name);
        box.setMaxWidth(Double.MAX_VALUE);
        List<Optional<T>> items = new ArrayList<>(List.of(Optional.empty()));
        choices.forEach(choice -> items.add(Optional.of(choice)));
        box.getItems().setAll(items);
        box.setValue(chosen.get());
        box.setAccessibleText(wording.text("office.worst." + name));
        box.setConverter(new StringConverter<>() {
            @Override
            public String toString(Optional<T> choice) {
                return choice == null || choice.isEmpty() ? wording.text("office.worst.any")
                        : shown.apply(choice.get());
            }

            @Override
            public Optional<T> fromString(String text) {
                return Optional.empty();
            }
        });
        box.valueProperty().addListener((property, before, now) -> chosen.set(now));
        Label label = new Label(wording.text("office.worst." + name));
        label.getStyleClass().add("caption");
        label.setLabelFor(box);
        return new VBox(label, box);
    }
}
