package bedmark.screen.office;

import bedmark.office.register.Draft;
import bedmark.office.register.Draft.Mapped;
import bedmark.office.register.Meanings;
import bedmark.office.register.RegisterGrid;
import bedmark.quantity.Unit;
import bedmark.screen.part.Texts;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import javafx.scene.Node;
import javafx.scene.control.ComboBox;
import javafx.scene.control.Label;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.VBox;

/** What each table that was read is taken for, and each of its columns: shown, and chosen anew where it is wrong. */
final class RegisterMapping extends VBox {
    private final ImportModel model;
    private final Wording wording;

    /** @param code what it stands for; empty for what is not taken in, or for no unit */
    private record Choice(String code, String text) {
        @Override
        public String toString() {
            return text;
        }
    }

    RegisterMapping(ImportModel model, Draft draft, Wording wording) {
        this.model = model;
        this.wording = wording;
        getStyleClass().add("mapping");
        for (String source : model.sources()) {
            List<Mapped> columns = draft.mapping().stream().filter(one -> one.source().equals(source)).toList();
            Optional<String> list = columns.stream().map(Mapped::list).findFirst();
            HBox table = new HBox(new Label(source), choices("table " + source, source, lists(),
                    undecided(draft, source) ? Optional.empty() : Optional.of(list.orElse("")),
                    chosen -> model.holds(source, chosen)));
            table.getStyleClass().add("table");
            FlowPane row = new FlowPane();
            row.getStyleClass().add("filters");
            columns.forEach(column -> row.getChildren().add(card(column)));
            getChildren().addAll(table, row);
        }
    }

    private static boolean undecided(Draft draft, String source) {
        return draft.defects().stream().anyMatch(defect -> defect.code().equals("table-unknown")
                && defect.where().equals(source));
    }

    private List<Choice> lists() {
        List<Choice> lists = new ArrayList<>(List.of(none()));
        RegisterGrid.lists().forEach(list -> lists.add(new Choice(list, RegisterWords.list(wording, list))));
        return lists;
    }

    private Choice none() {
        return new Choice("", wording.text("office.register.column-none"));
    }

    private Node card(Mapped column) {
        String place = column.source() + " " + column.head();
        List<Choice> keys = new ArrayList<>(List.of(none()));
        Meanings.keys(column.list()).forEach(key -> keys.add(new Choice(key, RegisterWords.column(wording, key))));
        Label head = Texts.wrapped(column.head());
        head.getStyleClass().add("soft");
        VBox card = new VBox(head, choices("column " + place, place, keys, Optional.of(column.key()), chosen ->
                model.means(column.source(), column.head(), chosen, Optional.empty())));
        List<Unit> units = Meanings.units(column.list(), column.key());
        if (!units.isEmpty()) {
            List<Choice> codes = new ArrayList<>(List.of(new Choice("", wording.text("office.register.unit-none"))));
            units.forEach(unit -> codes.add(new Choice(unit.code(), wording.symbol(unit))));
            card.getChildren().add(choices("unit " + place, place, codes, Optional.of(column.unit()), chosen ->
                    model.means(column.source(), column.head(), column.key(), Unit.ofCode(chosen))));
        }
        return card;
    }

    /** @param now what is chosen already: that could not be chosen once more, and nothing is shown as if it were */
    private ComboBox<Choice> choices(String id, String place, List<Choice> choices, Optional<String> now,
                                     Consumer<String> choose) {
        ComboBox<Choice> box = new ComboBox<>();
        box.setId(id.replaceAll("[^\\p{L}\\p{N}]+", "-"));
        box.setAccessibleText(place);
        box.getItems().setAll(choices);
        box.setPromptText(wording.text("office.register.list-choose"));
        now.ifPresent(code -> box.setValue(choices.stream().filter(one -> one.code().equals(code)).findFirst()
                .orElse(choices.get(0))));
        box.valueProperty().addListener((property, before, chosen) -> choose.accept(chosen.code()));
        return box;
    }
}
