package bedmark.screen.zone;

import bedmark.document.Pointer;
import bedmark.form.Section;
import bedmark.screen.Listening;
import bedmark.screen.part.CautionStrip;
import bedmark.screen.part.SectionHeader;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javafx.scene.control.ScrollPane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** The form: the rows of all sections in one list, the active one always in sight, and the caution beside it. */
final class FormPane extends VBox {
    private final ZoneModel model;
    private final Wording wording;
    private final VBox list = new VBox();
    private final ScrollPane scroll = new ScrollPane(list);
    private final SectionHeader header = new SectionHeader("");
    private final CautionStrip caution = new CautionStrip("");
    private List<RowView> rows = List.of();

    FormPane(ZoneModel model, Wording wording, Listening listening) {
        this.model = model;
        this.wording = wording;
        getStyleClass().add("form-pane");
        list.getStyleClass().add("rows");
        scroll.getStyleClass().add("form-scroll");
        scroll.setFitToWidth(true);
        scroll.setHbarPolicy(ScrollPane.ScrollBarPolicy.NEVER);
        scroll.setFocusTraversable(false);
        scroll.setMinHeight(0);
        VBox.setVgrow(scroll, Priority.ALWAYS);
        getChildren().addAll(header, scroll, caution);
        listening.to(model.rowsProperty(), this::layOut);
        listening.onChange(model.surveyProperty(), survey -> update());
        listening.onChange(model.typedProperty(), typed -> update());
        listening.onChange(model.noteProperty(), note -> update());
        listening.onChange(model.beltStateProperty(), state -> sayCaution());
        listening.to(model.inHandProperty(), inHand -> activated());
    }

    /** The caution, for whoever has a better place for it while there is no room here. */
    CautionStrip caution() {
        return caution;
    }

    /** Leaves the head and the caution out where large keys take the room, or takes them in again. */
    void shrink(boolean small) {
        if (small) {
            getChildren().setAll(scroll);
        } else {
            getChildren().setAll(header, scroll, caution);
        }
    }

    private void layOut(List<SlotRow> wanted) {
        List<Pointer> places = wanted.stream().map(SlotRow::place).toList();
        if (places.equals(rows.stream().map(row -> row.row().place()).toList())
                && wanted.equals(rows.stream().map(RowView::row).toList())) {
            return;
        }
        List<RowView> made = new ArrayList<>();
        list.getChildren().clear();
        Optional<Section> section = Optional.empty();
        for (SlotRow row : wanted) {
            if (!section.equals(Optional.of(row.section()))) {
                section = Optional.of(row.section());
                if (!made.isEmpty()) {
                    list.getChildren().add(new SectionHeader(title(row.section())));
                }
            }
            RowView view = rows.stream().filter(known -> known.row().equals(row)).findFirst()
                    .orElseGet(() -> new RowView(row, model, wording));
            made.add(view);
            list.getChildren().add(view);
        }
        rows = made;
        update();
        activated();
    }

    private String title(Section section) {
        return section.title().in(wording.words().language());
    }

    private void update() {
        rows.forEach(RowView::update);
    }

    private void activated() {
        update();
        active().ifPresent(row -> {
            header.titleProperty().set(title(row.row().section()));
            header.asideProperty().set(wording.text("screen.zone.place", rows.indexOf(row) + 1, rows.size()));
            row.focusActive();
            reveal(row);
        });
        sayCaution();
    }

    private Optional<RowView> active() {
        return rows.stream().filter(RowView::holdsActive).findFirst();
    }

    /** Brings the row in sight with the one before it where there is room for both; no row is cut at the top. */
    private void reveal(RowView row) {
        applyCss();
        layout();
        double room = scroll.getViewportBounds().getHeight();
        double all = list.getBoundsInLocal().getHeight();
        if (room <= 0 || all <= room) {
            return;
        }
        int index = rows.indexOf(row);
        double wanted = row.getBoundsInParent().getMinY();
        if (row.getHeight() > room + 1) {
            wanted = row.activeBox().map(box -> list.sceneToLocal(box.localToScene(box.getLayoutBounds())).getMinY())
                    .orElse(wanted);
        } else if (index > 0 && rows.get(index - 1).row().section().equals(row.row().section())) {
            double before = rows.get(index - 1).getBoundsInParent().getMinY();
            if (row.getBoundsInParent().getMaxY() - before <= room + 1) {
                wanted = before;
            }
        }
        scroll.setVvalue(Math.max(0, Math.min(1, wanted / (all - room))));
    }

    private void sayCaution() {
        String kind = active().flatMap(row -> row.row().field().head().caution())
                .map(found -> found.code()).orElse("always");
        String state = model.beltStateProperty().get().map(now -> now.running() ? "running" : "isolated")
                .orElse("unsaid");
        String key = kind.equals("always") || kind.equals("speed") ? kind : kind + "-" + state;
        caution.textProperty().set(wording.text("screen.caution." + key));
    }

    /** Puts the focus on the active box. */
    void focusActive() {
        active().ifPresent(RowView::focusActive);
        active().ifPresent(this::reveal);
    }
}
