package bedmark.screen.office;

import bedmark.screen.office.RegisterLine.Shown;
import java.util.List;
import java.util.Optional;
import javafx.css.PseudoClass;
import javafx.scene.control.TableCell;
import javafx.scene.control.TableColumn;
import javafx.scene.control.TextField;
import javafx.scene.input.KeyCode;
import javafx.scene.input.KeyEvent;
import javafx.scene.input.MouseButton;

/** A cell of the register: a click or Enter types into it, leaving it takes over, Escape takes back. */
final class RegisterCell extends TableCell<RegisterLine, Shown> {
    private static final PseudoClass WAITING = PseudoClass.getPseudoClass("waiting");

    private final RegisterModel model;
    private final String key;
    /** Whether a row that is there already may be typed over here. */
    private final boolean open;
    private final TextField field = new TextField();
    private Optional<List<String>> row = Optional.empty();
    private String before = "";

    RegisterCell(RegisterModel model, String key, boolean open) {
        this.model = model;
        this.key = key;
        this.open = open;
        field.focusedProperty().addListener((property, was, now) -> {
            if (!now && isEditing()) {
                cancelEdit();
            }
        });
        field.addEventFilter(KeyEvent.KEY_PRESSED, this::key);
        setOnMouseClicked(event -> {
            if (event.getButton() == MouseButton.PRIMARY && !isEmpty() && !isEditing()) {
                getTableView().edit(getIndex(), getTableColumn());
            }
        });
    }

    private void key(KeyEvent event) {
        if (event.getCode() == KeyCode.ENTER) {
            cancelEdit();
            getTableView().requestFocus();
            event.consume();
        } else if (event.getCode() == KeyCode.ESCAPE) {
            field.setText(before);
            cancelEdit();
            getTableView().requestFocus();
            event.consume();
        } else if (event.getCode() == KeyCode.TAB) {
            next(event.isShiftDown() ? -1 : 1);
            event.consume();
        }
    }

    /** Types on in the neighbouring column. */
    private void next(int step) {
        int at = getTableView().getColumns().indexOf(getTableColumn()) + step;
        int index = getIndex();
        if (at < 0 || at >= getTableView().getColumns().size()) {
            cancelEdit();
            getTableView().requestFocus();
            return;
        }
        TableColumn<RegisterLine, ?> column = getTableView().getColumns().get(at);
        getTableView().scrollToColumn(column);
        getTableView().layout();
        getTableView().getSelectionModel().clearAndSelect(index, column);
        getTableView().edit(index, column);
    }

    @Override
    public void startEdit() {
        RegisterLine line = isEmpty() ? null : getTableRow().getItem();
        if (line == null || line.identity().isPresent() && !open) {
            return;
        }
        super.startEdit();
        if (isEditing()) {
            row = line.identity();
            before = getItem().text();
            field.setText(before);
            setText(null);
            setGraphic(field);
            field.requestFocus();
            field.selectAll();
        }
    }

    /** However a cell is left, what was typed into it is typed. */
    @Override
    public void cancelEdit() {
        boolean edited = isEditing();
        super.cancelEdit();
        if (edited) {
            setGraphic(null);
            show(getItem());
            if (!field.getText().strip().equals(before)) {
                model.edit(row, key, field.getText());
            }
        }
    }

    @Override
    protected void updateItem(Shown shown, boolean empty) {
        super.updateItem(shown, empty);
        if (!isEditing()) {
            setGraphic(null);
            show(empty ? null : shown);
        }
    }

    private void show(Shown shown) {
        setText(shown == null ? null : shown.text());
        pseudoClassStateChanged(WAITING, shown != null && shown.waiting());
    }
}
