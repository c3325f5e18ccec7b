package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Pointer;
import bedmark.form.Field;
import bedmark.form.Section;
import bedmark.screen.Listening;
import bedmark.screen.part.AfterLayout;
import bedmark.screen.part.CautionStrip;
import bedmark.screen.part.FieldBox;
import bedmark.screen.part.Island;
import bedmark.screen.part.Judgement;
import bedmark.screen.part.SectionHeader;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import javafx.application.Platform;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/**
 * The form: the rows of all sections in one list, the active one always in sight, and the caution beside it. Only the
 * rows around the active one are built at once; the others follow a few at a time, so that a long form opens as fast as
 * a short one.
 */
final class FormPane extends VBox {
    private static final int AHEAD = 4;
    private static final int AT_A_TIME = 4;

    private final ZoneModel model;
    private final Wording wording;
    private final boolean large;
    private final VBox list = new VBox();
    private final ScrollPane scroll = new ScrollPane(list);
    private final SectionHeader header = new SectionHeader("");
    private final CautionStrip caution = new CautionStrip("");
    private final Label aside = new Label();
    private List<RowPlace> rows = List.of();
    private Branch shown;
    private Optional<RowPlace> inHand = Optional.empty();
    /** Which rows are in the list: from the one to before the other. */
    private int from;
    private int to;
    private boolean filling;
    private boolean upright;
    /** Whether the active row has to be brought in sight once all rows have their places. */
    private boolean revealing;

    /** @param large whether large keys take the room: one row is shown, and what is said of it stands elsewhere */
    FormPane(ZoneModel model, Wording wording, Listening listening, boolean large) {
        this.model = model;
        this.wording = wording;
        this.large = large;
        this.shown = model.keptProperty().get();
        getStyleClass().add("form-pane");
        list.getStyleClass().add("rows");
        scroll.getStyleClass().add("form-scroll");
        scroll.setFitToWidth(true);
        scroll.setHbarPolicy(ScrollPane.ScrollBarPolicy.NEVER);
        scroll.setFocusTraversable(false);
        scroll.setMinHeight(0);
        aside.getStyleClass().addAll("message", "aside");
        aside.setWrapText(true);
        aside.setMinHeight(USE_PREF_SIZE);
        aside.managedProperty().bind(aside.visibleProperty());
        aside.visibleProperty().bind(aside.textProperty().isNotEmpty());
        if (large) {
            scroll.getStyleClass().add("one-row");
            getChildren().addAll(header, scroll);
        } else {
            Island room = new Island(scroll);
            VBox.setVgrow(room, Priority.ALWAYS);
            getChildren().addAll(new Island(header), room, caution);
        }
        AfterLayout.in(this, this::laidOut);
        sceneProperty().addListener((property, before, now) -> fill());
        // Rows that came in above the active one, or grew, have moved it.
        list.heightProperty().addListener((property, before, now) -> revealing = true);
        listening.to(model.rowsProperty(), this::layOut);
        listening.onChange(model.keptProperty(), this::kept);
        listening.onChange(model.typedProperty(), typed -> typed());
        listening.onChange(model.noteProperty(), note -> typed());
        listening.onChange(model.beltStateProperty(), state -> {
            sayCaution();
            // What is being typed carries the belt's state, and may be no measurement any more.
            typed();
        });
        listening.to(model.inHandProperty(), inHand -> activated());
    }

    /** The caution and what is said of the active row, for whoever has a better place while there is no room here. */
    List<javafx.scene.Node> elsewhere() {
        return large ? List.of(caution, aside) : List.of();
    }

    private void layOut(List<SlotRow> wanted) {
        if (wanted.equals(rows.stream().map(RowPlace::row).toList())) {
            return;
        }
        Map<Pointer, RowPlace> known = new HashMap<>();
        rows.forEach(row -> known.put(row.row().place(), row));
        List<RowPlace> made = new ArrayList<>();
        for (SlotRow row : wanted) {
            RowPlace place = Optional.ofNullable(known.get(row.place())).filter(before -> before.row().equals(row))
                    .orElseGet(() -> new RowPlace(row, model, wording, large));
            place.turned(upright);
            made.add(place);
        }
        boolean first = rows.isEmpty();
        rows = made;
        int index = active().map(rows::indexOf).orElse(0);
        from = first ? Math.max(0, index - AHEAD / 2) : 0;
        to = first ? Math.min(rows.size(), index + AHEAD) : rows.size();
        list.getChildren().setAll(lines(from, to));
        activated();
        fill();
    }

    /** The rows of a range, each section but the first with its title before it. */
    private List<javafx.scene.Node> lines(int first, int end) {
        List<javafx.scene.Node> lines = new ArrayList<>();
        for (int i = first; i < end; i++) {
            Section section = rows.get(i).row().section();
            if (i > 0 && !section.equals(rows.get(i - 1).row().section())) {
                lines.add(new SectionHeader(title(section)));
            }
            lines.add(rows.get(i));
        }
        return lines;
    }

    /** Takes more rows into the list: those behind it, then those before it. */
    private void lengthen(int count) {
        if (to < rows.size()) {
            int end = Math.min(rows.size(), to + count);
            list.getChildren().addAll(lines(to, end));
            to = end;
        } else if (from > 0) {
            int first = Math.max(0, from - count);
            list.getChildren().addAll(0, lines(first, from));
            from = first;
        }
    }

    /** Builds the rows that are still to come, a few at a time, so that keys get their turn in between. */
    private void fill() {
        if (!filling) {
            filling = true;
            Platform.runLater(this::fillSome);
        }
    }

    private void fillSome() {
        filling = false;
        if (getScene() == null || getScene().getWindow() == null || !getScene().getWindow().isShowing()) {
            return;
        }
        lengthen(AT_A_TIME);
        List<RowPlace> next = rows.subList(from, to).stream().filter(row -> !row.isBuilt()).limit(AT_A_TIME).toList();
        next.forEach(row -> {
            row.build();
            row.applyCss();
        });
        if (!next.isEmpty() || from > 0 || to < rows.size()) {
            reveal();
            fill();
        }
    }

    /** Told when the tablet is turned. */
    void turned(boolean portrait) {
        upright = portrait;
        rows.forEach(row -> row.turned(portrait));
    }

    private String title(Section section) {
        return section.title().in(wording.words().language());
    }

    /** Shows the rows anew that a change of the survey can have changed. */
    private void kept(Branch now) {
        Branch before = shown;
        shown = now;
        boolean marks = !before.at(CarriedOver.MARKS).equals(now.at(CarriedOver.MARKS));
        Map<Field, Boolean> same = new IdentityHashMap<>();
        for (RowPlace place : rows) {
            Field field = place.row().field();
            // The offer to take over moves on from field to field.
            if (marks || CarriedOver.isPlain(field.key())
                    || !same.computeIfAbsent(field, asked -> asked.judgesAlike(before, now))) {
                place.update();
            }
        }
    }

    private void typed() {
        active().ifPresent(row -> {
            row.update();
            say(row);
        });
    }

    /** At glove size only what is wrong or doubtful is said beside the picture; how to read it is one tap away. */
    private void say(RowPlace row) {
        RowView.Said said = row.built().said();
        aside.setText(said.judgement() == Judgement.NONE ? "" : said.words());
    }

    private void activated() {
        inHand.ifPresent(RowPlace::update);
        inHand = active();
        inHand.ifPresent(row -> {
            int index = rows.indexOf(row);
            while (index < from || index >= to) {
                lengthen(rows.size());
            }
            rows.subList(Math.max(0, index - AHEAD / 2), Math.min(rows.size(), index + AHEAD))
                    .forEach(RowPlace::build);
            row.update();
            say(row);
            header.titleProperty().set(title(row.row().section()));
            header.asideProperty().set(wording.text("screen.zone.place", Integer.toString(index + 1),
                    Integer.toString(rows.size())));
            row.built().focusActive();
            reveal();
        });
        sayCaution();
    }

    private Optional<RowPlace> active() {
        return rows.stream().filter(RowPlace::holdsActive).findFirst();
    }

    /** The box of the active cell. */
    Optional<FieldBox> activeBox() {
        return active().flatMap(row -> row.built().activeBox());
    }

    /** Brings the active row in sight in the frame that shows it: a layout of its own would cost as much as the key. */
    private void reveal() {
        revealing = true;
        Platform.requestNextPulse();
    }

    private void laidOut() {
        if (revealing) {
            revealing = false;
            inHand.ifPresent(this::reveal);
        }
    }

    /** Brings the row in sight with the one before it where there is room for both; no row is cut at the top. */
    private void reveal(RowPlace row) {
        double room = scroll.getViewportBounds().getHeight();
        double all = list.getBoundsInLocal().getHeight();
        if (room <= 0 || all <= room) {
            return;
        }
        int index = rows.indexOf(row);
        double wanted = row.getBoundsInParent().getMinY();
        if (row.getHeight() > room + 1) {
            wanted = row.built().activeBox()
                    .map(box -> list.sceneToLocal(box.localToScene(box.getLayoutBounds())).getMinY()).orElse(wanted);
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
        active().ifPresent(row -> {
            row.built().focusActive();
            reveal();
        });
    }
}
