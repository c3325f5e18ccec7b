package bedmark.screen.office;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.NotSaved;
import bedmark.office.RoundDesk;
import bedmark.office.register.Draft;
import bedmark.office.register.RegisterChange;
import bedmark.office.register.RegisterDesk;
import bedmark.office.register.RegisterFolder;
import bedmark.office.register.RegisterGrid;
import bedmark.office.register.RegisterImport;
import bedmark.pack.RoundFile;
import bedmark.screen.office.RegisterLine.Shown;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Consumer;
import java.util.stream.IntStream;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.ReadOnlyBooleanProperty;
import javafx.beans.property.ReadOnlyBooleanWrapper;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleObjectProperty;
import javafx.collections.FXCollections;
import javafx.collections.ObservableList;

/** A plant's register on the office's screen: shown as tables, edited cell by cell, and written out. */
public final class RegisterModel {
    private final OfficeDesk desk;
    private final ObjectProperty<Optional<String>> plant = new SimpleObjectProperty<>(Optional.empty());
    private final ObjectProperty<String> list = new SimpleObjectProperty<>("transfers");
    private final ReadOnlyObjectWrapper<Optional<RegisterGrid>> grid = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ReadOnlyObjectWrapper<List<String>> plants = new ReadOnlyObjectWrapper<>(List.of());
    private final ReadOnlyObjectWrapper<List<RegisterEdits.Waiting>> refused =
            new ReadOnlyObjectWrapper<>(List.of());
    private final ReadOnlyObjectWrapper<Optional<Defect>> stays = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ReadOnlyBooleanWrapper fresh = new ReadOnlyBooleanWrapper();
    private final ReadOnlyObjectWrapper<Optional<Path>> written = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ObservableList<RegisterLine> lines = FXCollections.observableArrayList();
    private final ImportModel importing;
    private final RegisterEdits edits = new RegisterEdits();
    /** The lists in which a new row is being typed. */
    private final Set<List<String>> begun = new HashSet<>();

    RegisterModel(OfficeDesk desk) {
        this.desk = desk;
        this.importing = new ImportModel(desk, plant);
        plant.addListener((property, before, now) -> lookElsewhere());
        list.addListener((property, before, now) -> lookElsewhere());
        importing.draftProperty().addListener((property, before, now) -> workOn());
        desk.changesProperty().addListener((property, before, now) -> refresh());
        desk.preferencesProperty().addListener((property, before, now) -> {
            if (!before.locale().equals(now.locale())) {
                grid.get().ifPresent(shown -> show());
            }
        });
        refresh();
    }

    /** Looks at the register anew, since it may have changed elsewhere. */
    void refresh() {
        desk.ask(progress -> List.copyOf(desk.store().registers().keySet()), known -> {
            plants.set(known);
            if (plant.get().filter(known::contains).isPresent()) {
                look();
            } else {
                plant.set(known.stream().findFirst());
            }
        });
    }

    private void lookElsewhere() {
        workOn();
        look();
    }

    /** What was told of the work before has been seen. */
    private void workOn() {
        stays.set(Optional.empty());
        written.set(Optional.empty());
    }

    private void look() {
        String wanted = list.get();
        Optional<String> of = plant.get();
        of.ifPresent(id -> desk.ask(progress -> RegisterGrid.of(head(of), wanted), found -> {
            // Whoever has gone on to another list since is not brought back.
            if (wanted.equals(list.get()) && of.equals(plant.get())) {
                grid.set(Optional.of(found));
                show();
            }
        }));
    }

    /** Shows the rows of the grid with what waits over them; rows that are the same stay, with what is typed there. */
    private void show() {
        RegisterGrid shown = grid.get().orElseThrow();
        List<Optional<List<String>>> rows = new ArrayList<>();
        IntStream.range(0, shown.rows().size()).forEach(row -> rows.add(Optional.of(shown.identity(row))));
        fresh.set(begun.contains(List.of(plant.get().orElse(""), shown.list())));
        if (fresh.get()) {
            rows.add(Optional.empty());
        }
        List<List<Shown>> cells = new ArrayList<>();
        for (int row = 0; row < rows.size(); row++) {
            cells.add(cells(shown, rows.get(row), row));
        }
        if (lines.stream().map(RegisterLine::identity).toList().equals(rows)) {
            IntStream.range(0, cells.size()).forEach(row -> lines.get(row).show(cells.get(row)));
        } else {
            lines.setAll(IntStream.range(0, cells.size()).mapToObj(row -> new RegisterLine(rows.get(row),
                    cells.get(row))).toList());
        }
        refused.set(edits.refused(plant.get().orElse(""), shown.list()));
    }

    private List<Shown> cells(RegisterGrid shown, Optional<List<String>> row, int index) {
        List<Shown> cells = new ArrayList<>();
        for (int i = 0; i < shown.keys().size(); i++) {
            String held = row.isPresent() ? shown.rows().get(index).get(i) : "";
            String key = shown.keys().get(i);
            Optional<String> typed = edits.text(cell(row, key));
            cells.add(new Shown(RegisterUnits.shown(desk.wording(), shown.list(), key, typed.orElse(held)),
                    typed.isPresent()));
        }
        return cells;
    }

    private RegisterEdits.Cell cell(Optional<List<String>> row, String key) {
        return new RegisterEdits.Cell(plant.get().orElse(""), list.get(), row, key);
    }

    private Branch head(Optional<String> id) {
        return new RegisterDesk(desk.store()).head(id, List.of());
    }

    public ReadOnlyObjectProperty<List<String>> plantsProperty() {
        return plants.getReadOnlyProperty();
    }

    public ObjectProperty<Optional<String>> plantProperty() {
        return plant;
    }

    /** The list that is shown: {@code transfers} and so on. */
    public ObjectProperty<String> listProperty() {
        return list;
    }

    public ReadOnlyObjectProperty<Optional<RegisterGrid>> gridProperty() {
        return grid.getReadOnlyProperty();
    }

    /** What is taken in from tables of other programs, for the plant that is shown. */
    ImportModel importing() {
        return importing;
    }

    /** Where something was written, until something else is done. */
    public ReadOnlyObjectProperty<Optional<Path>> writtenProperty() {
        return written.getReadOnlyProperty();
    }

    /** The rows that are shown. */
    public ObservableList<RegisterLine> lines() {
        return lines;
    }

    /** What was refused of the list that is shown, and waits to be mended or taken back. */
    ReadOnlyObjectProperty<List<RegisterEdits.Waiting>> refusedProperty() {
        return refused.getReadOnlyProperty();
    }

    /** Why a row that was to be taken away stays, until something else is done. */
    ReadOnlyObjectProperty<Optional<Defect>> staysProperty() {
        return stays.getReadOnlyProperty();
    }

    /** Whether a new row is being typed. */
    public ReadOnlyBooleanProperty freshProperty() {
        return fresh.getReadOnlyProperty();
    }

    /**
     * A cell was typed into: it is taken over at once with what waits in its row, or waits with the reason; a new row
     * waits until it is taken in as a whole.
     */
    public void edit(Optional<List<String>> row, String key, String text) {
        RegisterEdits.Cell cell = cell(row, key);
        workOn();
        edits.typed(cell, RegisterUnits.typed(cell.list(), key, text.strip()));
        show();
        if (row.isPresent()) {
            tryRow(cell);
        }
    }

    private void tryRow(RegisterEdits.Cell last) {
        Map<String, String> tried = Map.copyOf(edits.row(last));
        RegisterChange change = new RegisterChange(last.list(), last.row(), tried);
        change(last.plant(), change, defects -> {
            if (defects.isEmpty()) {
                edits.hold(last, tried);
                if (last.row().isEmpty()) {
                    begun.remove(List.of(last.plant(), last.list()));
                }
            } else {
                edits.refuse(last, tried, defects);
            }
        });
    }

    /** What is refused is told apart from what fails, since it stays with its cell. */
    private void change(String id, RegisterChange change, Consumer<List<Defect>> then) {
        String person = desk.person();
        desk.change(progress -> {
            try {
                Draft made = RegisterImport.changed(head(Optional.of(id)), change);
                if (made.sound()) {
                    new RegisterDesk(desk.store()).take(made, "edit", person);
                }
                return made.defects();
            } catch (Refused e) {
                return List.of(e.defect());
            } catch (NotSaved e) {
                return List.of(e.defect());
            }
        }, then);
    }

    /** Takes back what was typed into a cell; what else waits in its row is tried again. */
    void revert(RegisterEdits.Cell cell) {
        edits.forget(cell);
        show();
        if (cell.row().isPresent() && !edits.row(cell).isEmpty()) {
            tryRow(cell);
        }
    }

    /** Begins a new row. */
    public void begin() {
        workOn();
        begun.add(List.of(plant.get().orElse(""), list.get()));
        show();
    }

    /** Takes the new row in. */
    public void takeRow() {
        RegisterEdits.Cell first = cell(Optional.empty(), grid.get().orElseThrow().keys().get(0));
        if (edits.text(first).isEmpty()) {
            // A row without a single text is refused at its first cell.
            edits.typed(first, "");
        }
        tryRow(first);
    }

    /** Leaves the new row. */
    public void leaveRow() {
        edits.forgetRow(cell(Optional.empty(), ""));
        begun.remove(List.of(plant.get().orElse(""), list.get()));
        show();
    }

    /** Takes a row away; one that is still named stays, and what names it is said. */
    public void remove(List<String> row) {
        RegisterEdits.Cell removed = cell(Optional.of(row), "");
        workOn();
        change(removed.plant(), RegisterChange.removal(removed.list(), row), defects -> {
            if (defects.isEmpty()) {
                edits.forgetRow(removed);
            } else {
                stays.set(Optional.of(RegisterWords.of(desk.wording(), removed, defects.get(0))));
            }
        });
    }

    /** Writes the register as tables. */
    public void write(Path folder) {
        Optional<String> id = plant.get();
        desk.ask(progress -> {
            RegisterFolder.write(head(id), folder);
            return folder;
        }, done -> written.set(Optional.of(done)));
    }

    /** Writes the next round for the tablets. */
    public void send(Path folder) {
        String id = plant.get().orElse("");
        String person = desk.person();
        desk.change(progress -> {
            OffsetDateTime now = OffsetDateTime.now(desk.clock());
            Path file = folder.resolve(id.replaceAll("[^A-Za-z0-9_-]", "_") + "-"
                    + now.toLocalDate() + RoundFile.ENDING);
            new RoundDesk(desk.store()).send(id, List.of(), file, now, person);
            return file;
        }, done -> written.set(Optional.of(done)));
    }
}
