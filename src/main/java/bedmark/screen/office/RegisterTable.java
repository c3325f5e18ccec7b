package bedmark.screen.office;

import bedmark.office.register.RegisterGrid;
import bedmark.screen.Listening;
import bedmark.screen.office.RegisterLine.Shown;
import bedmark.screen.theme.Density;
import bedmark.wording.Wording;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import javafx.scene.control.Label;
import javafx.scene.control.TableColumn;
import javafx.scene.control.TableView;

/** One list of the register as a table whose cells are typed into where they stand. */
final class RegisterTable extends TableView<RegisterLine> {
    /** Width of a character and around a text, and how wide a column becomes by itself (mm, as the letters are). */
    private static final double CHARACTER = 1.62;
    private static final double AROUND = 5.1;
    private static final double NARROWEST = 13.6;
    private static final double WIDEST = 56;

    private final RegisterModel model;
    private final Wording wording;
    private final Density density;
    private List<String> keys = List.of();
    private String list = "";

    RegisterTable(RegisterModel model, Wording wording, Density density, Listening listening) {
        this.model = model;
        this.wording = wording;
        this.density = density;
        setId("register-table");
        setEditable(true);
        getSelectionModel().setCellSelectionEnabled(true);
        setPlaceholder(new Label(wording.text("office.register.empty")));
        setItems(model.lines());
        // Whoever types while the screen goes has typed it.
        listening.onEnd(() -> edit(-1, null));
    }

    /** Shows the columns of a list; the same ones stay. */
    void show(Optional<RegisterGrid> grid) {
        grid.filter(one -> !one.list().equals(list)).ifPresent(one -> {
            list = one.list();
            keys = one.keys();
            getColumns().setAll(IntStream.range(0, keys.size()).mapToObj(i -> column(one, i)).toList());
        });
    }

    private TableColumn<RegisterLine, Shown> column(RegisterGrid grid, int index) {
        String key = grid.keys().get(index);
        String head = RegisterWords.column(wording, key);
        TableColumn<RegisterLine, Shown> column = new TableColumn<>(head);
        column.setId("column-" + key);
        column.setSortable(false);
        column.setReorderable(false);
        int longest = grid.rows().stream().mapToInt(row -> row.get(index).length()).max().orElse(0);
        column.setPrefWidth(density.mm(Math.min(WIDEST, Math.max(NARROWEST, AROUND + CHARACTER * Math.max(longest,
                head.length())))));
        column.setCellValueFactory(cell -> cell.getValue().cell(index));
        column.setCellFactory(made -> new RegisterCell(model, key, index > 0));
        return column;
    }

    /** Types into the new row. */
    void begin() {
        int row = model.lines().size() - 1;
        scrollTo(row);
        scrollToColumnIndex(0);
        layout();
        requestFocus();
        getSelectionModel().clearAndSelect(row, getColumns().get(0));
        edit(row, getColumns().get(0));
    }

    /** The row that was chosen, unless it is a new one. */
    Optional<List<String>> chosen() {
        return Optional.ofNullable(getSelectionModel().getSelectedItem()).flatMap(RegisterLine::identity);
    }
}
