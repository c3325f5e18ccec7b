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
    private final ReadOnlyObjectWrapper<Optional<Outcome>> outcome = new ReadOnlyObjectWrapper<>(Optional.empty());

    /** Where a report was to be written, and whether it was; else it was stopped and everything is as before. */
    public record Outcome(Path file, boolean written) {
    }

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
        outcome.set(Optional.empty());
        desk.ask(progress -> {
            Optional<ReportContent> content = ReportContent.of(desk.store(), RankQuery.ALL,
                    OffsetDateTime.now(desk.clock()), progress);
            boolean written = content.isPresent() && ReportFile.write(file, wanted, content.get(), new ReportOptions(
                    wording, size, desk.store()::photo, wording.text("screen.name"), progress));
            return Optional.of(new Outcome(file, written));
        }, outcome::set);
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

    /** What came of the last writing; nothing before the first and while one is under way. */
    public ReadOnlyObjectProperty<Optional<Outcome>> outcomeProperty() {
        return outcome.getReadOnlyProperty();
    }
}
