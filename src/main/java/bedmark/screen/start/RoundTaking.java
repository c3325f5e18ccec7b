package bedmark.screen.start;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.Store;
import bedmark.index.SurveyQuery;
import bedmark.journal.NamedPath;
import bedmark.journal.NotSaved;
import bedmark.pack.RoundFile;
import bedmark.screen.Workplace;
import bedmark.survey.Act;
import bedmark.survey.QueueState;
import bedmark.survey.RoundIntake;
import bedmark.survey.Survey;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import java.util.stream.Stream;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;

/** Takes the office's round file in; what is under way on the tablet goes on. */
public final class RoundTaking {
    private final Workplace workplace;
    private final ReadOnlyObjectWrapper<Optional<Outcome>> outcome = new ReadOnlyObjectWrapper<>(Optional.empty());

    /** What came of it. */
    public sealed interface Outcome {
    }

    /** The office is not known here; a person compares the fingerprint and accepts it. */
    public record Unknown(RoundFile file) implements Outcome {
    }

    /**
     * It is in.
     *
     * @param rounds  rounds that can be walked
     * @param results last results that were not here
     * @param notes   what the office wants to be known at the points
     */
    public record Taken(int rounds, int results, int notes) implements Outcome {
    }

    /** It was refused; nothing changed. */
    public record Failed(Defect why) implements Outcome {
    }

    public RoundTaking(Workplace workplace) {
        this.workplace = workplace;
    }

    public ReadOnlyObjectProperty<Optional<Outcome>> outcomeProperty() {
        return outcome.getReadOnlyProperty();
    }

    /** Takes the newest round file of a folder in. */
    public void take(Path folder) {
        work(() -> {
            RoundFile file = RoundFile.read(newest(folder));
            return RoundIntake.trusts(workplace.store().register(), file.fingerprint().text()) ? put(file)
                    : new Unknown(file);
        });
    }

    /** The person compared the fingerprint. */
    public void accept(Unknown unknown) {
        work(() -> put(unknown.file()));
    }

    private void work(Supplier<Outcome> work) {
        outcome.set(Optional.empty());
        workplace.longWork().execute(() -> {
            Outcome came;
            try {
                came = work.get();
            } catch (Refused e) {
                came = new Failed(e.defect());
            } catch (NotSaved e) {
                came = new Failed(e.defect());
            }
            Outcome shown = came;
            workplace.screen().execute(() -> outcome.set(Optional.of(shown)));
        });
    }

    private static Path newest(Path folder) {
        NamedPath.requireFolder(folder);
        try (Stream<Path> files = Files.list(folder)) {
            return files.filter(file -> file.getFileName().toString().endsWith(RoundFile.ENDING))
                    .max(Comparator.comparing((Path file) -> file.toFile().lastModified())
                            .thenComparing(Path::getFileName))
                    .orElseThrow(() -> new Refused(Defect.in(folder.toString(), "round-file-none")));
        } catch (IOException e) {
            throw new Refused(Defect.in(folder.toString(), "folder-unreadable"), e);
        }
    }

    private Outcome put(RoundFile file) {
        Store store = workplace.store();
        List<Survey> underWay = new ArrayList<>();
        store.surveys(SurveyQuery.ALL.in(QueueState.OPEN, QueueState.COMPLETED, QueueState.QUEUED,
                QueueState.EXPORTED)).forEach(line -> store.history(line.id()).ifPresent(history ->
                underWay.add(history.survey())));
        Branch document = file.document();
        List<Act> acts = RoundIntake.acts(document, file.fingerprint().text(), store.register(), underWay,
                id -> store.survey(id).isPresent());
        // The results first: the register is what says that the file is in.
        acts.subList(1, acts.size()).forEach(act -> store.append(workplace.preferences().person(), act));
        workplace.adopt(acts.get(0));
        return new Taken(document.branches("rounds").size(), acts.size() - 1, document.branches("notes").size());
    }
}
