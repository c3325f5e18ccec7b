package bedmark.screen.office;

import bedmark.document.Refused;
import bedmark.screen.part.Texts;
import bedmark.wording.TypedDay;
import bedmark.wording.Wording;
import java.time.LocalDate;
import java.util.Optional;
import java.util.function.Consumer;
import javafx.beans.property.StringProperty;
import javafx.scene.control.DatePicker;
import javafx.scene.control.Label;
import javafx.scene.control.TextField;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/**
 * A day that is typed, or picked from a calendar. What stands in the field counts, whether or not it was confirmed
 * there; what can't be read stays in it, with a sentence below.
 */
final class DayField extends VBox {
    private final Wording wording;
    private final TypedDay typed;
    private final TextField field = new TextField();
    private final DatePicker calendar = new DatePicker();
    private final Label trouble = Texts.trouble("");

    /** @param text what is typed, kept by whoever sends it */
    DayField(Wording wording, String id, String name, StringProperty text) {
        this.wording = wording;
        this.typed = new TypedDay(wording);
        getStyleClass().add("day-field");
        field.setId(id);
        field.setPromptText(name);
        field.setAccessibleText(name);
        field.textProperty().bindBidirectional(text);
        field.textProperty().addListener((property, before, now) -> tell(""));
        field.focusedProperty().addListener((property, before, now) -> {
            if (!now) {
                look();
            }
        });
        HBox.setHgrow(field, Priority.ALWAYS);
        tell("");
        getChildren().addAll(new HBox(field, calendar(id, name)), trouble);
    }

    /** The calendar alone: what a picker does with typing that it can't read would lose it. */
    private DatePicker calendar(String id, String name) {
        calendar.setId(id + "-calendar");
        calendar.setAccessibleText(name);
        calendar.setEditable(false);
        calendar.getEditor().setVisible(false);
        calendar.getEditor().setMinWidth(0);
        calendar.getEditor().setPrefWidth(0);
        calendar.setMinWidth(USE_PREF_SIZE);
        calendar.setOnShowing(event -> calendar.setValue(day().orElse(null)));
        calendar.valueProperty().addListener((property, before, now) -> {
            if (now != null) {
                field.setText(wording.day(now));
            }
        });
        return calendar;
    }

    private void tell(String sentence) {
        trouble.setText(sentence);
        trouble.setVisible(!sentence.isEmpty());
        trouble.setManaged(!sentence.isEmpty());
    }

    private Optional<LocalDate> day() {
        try {
            return typed.read(field.getText());
        } catch (Refused e) {
            return Optional.empty();
        }
    }

    /** Says at the field what is wrong with it, where something is. */
    private boolean look() {
        try {
            typed.read(field.getText());
            return true;
        } catch (Refused e) {
            tell(wording.sentence(e.defect()));
            return false;
        }
    }

    /** Hands on the day that stands in the field, or leads back to it where that can't be read. */
    void read(Consumer<Optional<LocalDate>> then) {
        if (look()) {
            then.accept(day());
        } else {
            field.requestFocus();
        }
    }
}
