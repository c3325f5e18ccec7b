package bedmark.screen.office;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.NamedPath;
import bedmark.office.register.Draft;
import bedmark.office.register.Meanings;
import bedmark.office.register.RegisterDesk;
import bedmark.office.register.RegisterImport;
import bedmark.office.register.Table;
import bedmark.office.register.Tables;
import bedmark.quantity.Unit;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.value.ObservableValue;

/** Tables that are to be taken into a plant's register: read, given their meaning, drawn up, taken over or left. */
final class ImportModel {
    private final OfficeDesk desk;
    private final ObservableValue<Optional<String>> plant;
    private final ReadOnlyObjectWrapper<Optional<Draft>> draft = new ReadOnlyObjectWrapper<>(Optional.empty());
    private List<Table> tables = List.of();
    private Meanings meanings = Meanings.AS_NAMED;

    /** @param plant the plant that is shown */
    ImportModel(OfficeDesk desk, ObservableValue<Optional<String>> plant) {
        this.desk = desk;
        this.plant = plant;
    }

    /** What an import would do, until it is taken over or left. */
    ReadOnlyObjectProperty<Optional<Draft>> draftProperty() {
        return draft.getReadOnlyProperty();
    }

    /** Reads the tables of a folder; nothing is taken in yet. */
    void read(Path folder) {
        desk.ask(progress -> {
            List<Table> read = new ArrayList<>();
            files(folder).forEach(file -> read.addAll(Tables.read(file)));
            return read;
        }, read -> {
            tables = List.copyOf(read);
            draw(Meanings.AS_NAMED);
        });
    }

    private static List<Path> files(Path folder) {
        NamedPath.requireFolder(folder);
        try (Stream<Path> held = Files.list(folder)) {
            List<Path> files = held.filter(file -> file.getFileName().toString().toLowerCase(Locale.ROOT)
                    .matches(".*\\.(csv|xlsx)")).sorted().toList();
            if (files.isEmpty()) {
                throw new Refused(Defect.in(folder.toString(), "table-none"));
            }
            return files;
        } catch (IOException e) {
            throw new Refused(Defect.in(folder.toString(), "folder-unreadable"), e);
        }
    }

    private void draw(Meanings meant) {
        Optional<String> id = plant.getValue();
        meanings = meant;
        List<Table> drawn = tables;
        desk.ask(progress -> RegisterImport.draft(new RegisterDesk(desk.store()).head(id, List.of()), drawn, meant),
                made -> draft.set(Optional.of(made)));
    }

    /** The tables that were read, by where they come from. */
    List<String> sources() {
        return tables.stream().map(Table::source).toList();
    }

    /** A table holds that list; none where it is empty. */
    void holds(String source, String holding) {
        draw(meanings.holding(source, holding));
    }

    /** A column is that, in that unit; it is not taken in where the key is empty. */
    void means(String source, String head, String key, Optional<Unit> unit) {
        draw(meanings.with(new Meanings.Head(source, head), key, unit));
    }

    /** Takes the draft over. */
    void take() {
        Draft made = draft.get().orElseThrow();
        String person = desk.person();
        desk.change(progress -> {
            new RegisterDesk(desk.store()).take(made, "import", person);
            return true;
        }, done -> draft.set(Optional.empty()));
    }

    /** Leaves the draft. */
    void leave() {
        draft.set(Optional.empty());
    }
}
