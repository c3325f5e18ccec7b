package bedmark.screen.office;

import bedmark.office.RankQuery;
import bedmark.report.ReportContent;
import bedmark.report.ReportFile;
import bedmark.report.ReportOptions;
import bedmark.report.paper.PaperSize;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.nio.file.Path;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.util.Locale;
import java.util.Optional;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleObjectProperty;

/** What report is wanted, and its writing. */
public final class ReportModel {
    private final OfficeDesk desk;
    private final ObjectProperty<ReportFile.Kind> kind = new SimpleObjectProperty<>(ReportFile.Kind.PDF);
    private final ObjectProperty<Locale> language;
    private final ObjectProperty<PaperSize> paper = new SimpleObjectProperty<>(PaperSize.A4);
    private final ReadOnlyObjectWrapper<Optional<Path>> written = new ReadOnlyObjectWrapper<>(Optional.empty());

    ReportModel(OfficeDesk desk) {
        this.desk = desk;
        this.language = new SimpleObjectProperty<>(desk.preferences().locale());
    }

    /** Writes the report beside the screen into a folder, under a name that tells its day and language. */
    public void write(Path folder) {
        ReportFile.Kind wanted = kind.get();
        Wording wording = new Wording(new Words(language.get()), desk.preferences().units());
        PaperSize size = paper.get();
        Path file = folder.resolve("bedmark-" + LocalDate.now(desk.clock()) + "-" + language.get().getLanguage()
                + wanted.ending());
        written.set(Optional.empty());
        desk.ask(progress -> {
            Optional<ReportContent> content = ReportContent.of(desk.store(), RankQuery.ALL,
                    OffsetDateTime.now(desk.clock()), progress);
            content.ifPresent(one -> ReportFile.write(file, wanted, one, new ReportOptions(wording, size,
                    desk.store()::photo, wording.text("screen.name"), progress)));
            return content.map(one -> file);
        }, written::set);
    }

    public ObjectProperty<ReportFile.Kind> kindProperty() {
        return kind;
    }

    public ObjectProperty<Locale> languageProperty() {
        return language;
    }

    public ObjectProperty<PaperSize> paperProperty() {
        return paper;
    }

    /** The file that was written last. */
    public ReadOnlyObjectProperty<Optional<Path>> writtenProperty() {
        return written.getReadOnlyProperty();
    }
}
