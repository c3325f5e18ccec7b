package bedmark.screen.office;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.office.RoundDesk;
import bedmark.office.register.Draft;
import bedmark.office.register.RegisterChange;
import bedmark.office.register.RegisterDesk;
import bedmark.office.register.RegisterGrid;
import bedmark.office.register.RegisterImport;
import bedmark.office.register.RegisterTables;
import bedmark.office.register.Table;
import bedmark.office.register.Tables;
import bedmark.pack.RoundFile;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleObjectProperty;

/** A plant's register on the office's screen: shown as tables, edited cell by cell, taken in and written out. */
public final class RegisterModel {
    private final OfficeDesk desk;
    private final ObjectProperty<Optional<String>> plant = new SimpleObjectProperty<>(Optional.empty());
    private final ObjectProperty<String> list = new SimpleObjectProperty<>("transfers");
    private final ReadOnlyObjectWrapper<Optional<RegisterGrid>> grid = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ReadOnlyObjectWrapper<Optional<Draft>> draft = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ReadOnlyObjectWrapper<Optional<Path>> written = new ReadOnlyObjectWrapper<>(Optional.empty());
    private List<String> plants = List.of();

    RegisterModel(OfficeDesk desk) {
        this.desk = desk;
        plant.addListener((property, before, now) -> look());
        list.addListener((property, before, now) -> look());
        desk.ask(progress -> List.copyOf(desk.store().registers().keySet()), known -> {
            plants = known;
            plant.set(known.stream().findFirst());
        });
    }

    private void look() {
        String wanted = list.get();
        plant.get().ifPresent(id -> desk.ask(progress -> RegisterGrid.of(head(Optional.of(id)), wanted), found ->
                grid.set(Optional.of(found))));
    }

    private Branch head(Optional<String> id) {
        return new RegisterDesk(desk.store()).head(id, List.of());
    }

    public List<String> plants() {
        return plants;
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

    /** What an import would do, until it is taken over or left. */
    public ReadOnlyObjectProperty<Optional<Draft>> draftProperty() {
        return draft.getReadOnlyProperty();
    }

    /** Where something was written last. */
    public ReadOnlyObjectProperty<Optional<Path>> writtenProperty() {
        return written.getReadOnlyProperty();
    }

    /** Changes one cell, as an import of one row would. */
    public void edit(int row, String key, String text) {
        String id = plant.get().orElseThrow();
        RegisterGrid shown = grid.get().orElseThrow();
        RegisterChange change = new RegisterChange(shown.list(), Optional.of(shown.identity(row)), Map.of(key, text));
        String person = desk.person();
        desk.change(progress -> {
            Draft made = RegisterImport.changed(head(Optional.of(id)), change);
            if (!made.sound()) {
                throw new Refused(made.defects().get(0));
            }
            new RegisterDesk(desk.store()).take(made, "edit", person);
            return true;
        }, done -> look());
    }

    /** Reads the tables of a folder; nothing is taken in yet. */
    public void read(Path folder) {
        Optional<String> id = plant.get();
        desk.ask(progress -> {
            List<Table> tables = new ArrayList<>();
            files(folder).forEach(file -> tables.addAll(Tables.read(file)));
            return RegisterImport.draft(head(id), tables, Map.of());
        }, made -> draft.set(Optional.of(made)));
    }

    private static List<Path> files(Path folder) {
        try (Stream<Path> held = Files.list(folder)) {
            List<Path> files = held.filter(file -> file.getFileName().toString().toLowerCase(Locale.ROOT)
                    .matches(".*\\.(csv|xlsx)")).sorted().toList();
            if (files.isEmpty()) {
                throw new Refused(Defect.in(folder.toString(), "table-none"));
            }
            return files;
        } catch (IOException e) {
            throw new Refused(Defect.in(folder.toString(), "folder-absent"), e);
        }
    }

    /** Takes the draft over. */
    public void take() {
        Draft made = draft.get().orElseThrow();
        String person = desk.person();
        desk.change(progress -> {
            new RegisterDesk(desk.store()).take(made, "import", person);
            return true;
        }, done -> {
            draft.set(Optional.empty());
            look();
        });
    }

    /** Leaves the draft. */
    public void leave() {
        draft.set(Optional.empty());
    }

    /** Writes the register as tables. */
    public void write(Path folder) {
        Optional<String> id = plant.get();
        desk.ask(progress -> {
            try {
                for (Map.Entry<String, String> file : RegisterTables.of(head(id)).entrySet()) {
                    Files.writeString(folder.resolve(file.getKey()), file.getValue());
                }
                return folder;
            } catch (IOException e) {
                throw new Refused(Defect.in(folder.toString(), "export-not-saved", String.valueOf(e.getMessage())),
                        e);
            }
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
