package bedmark.index;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.survey.Act;
import bedmark.survey.QueueState;
import bedmark.survey.Survey;
import bedmark.survey.SurveyHistory;
import java.io.IOException;
import java.io.InputStream;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.UUID;
import java.util.stream.Collectors;

/**
 * Takes the surveys of another tablet's backup over, so that a walk goes on here: open ones stay open, completed ones
 * leave from here, and what the office confirmed is a result. Doing it again changes nothing; a survey that is here
 * with another content is told and left alone.
 */
final class HandOver {
    private final Store store;
    private final BackupContent from;
    private final String person;
    private final List<UUID> taken = new ArrayList<>();
    private final List<UUID> known = new ArrayList<>();
    private final List<UUID> differing = new ArrayList<>();

    HandOver(Store store, BackupContent from, String person) {
        this.store = store;
        this.from = from;
        this.person = person;
    }

    /** @throws Refused {@code restore-other-plant}, {@code photo-missing}, and those of {@link Store#append} */
    Restored run() throws IOException {
        List<UUID> fresh = from.surveys().stream().filter(survey -> store.survey(survey).isEmpty()).toList();
        register(fresh);
        for (UUID survey : from.surveys()) {
            SurveyHistory theirs = from.history(survey).orElseThrow();
            Optional<SurveyHistory> ours = store.history(survey);
            if (ours.isEmpty()) {
                photos(theirs.survey());
                take(survey, theirs);
                taken.add(survey);
            } else {
                finish(survey, theirs, ours.get());
            }
        }
        return new Restored(false, taken, known, differing);
    }

    /** The register comes along where this store has none, or none that knows all transfer points. */
    private void register(List<UUID> fresh) {
        Optional<Branch> theirs = from.register();
        Optional<Branch> ours = store.register();
        if (theirs.isEmpty() || fresh.isEmpty()) {
            return;
        }
        if (ours.isPresent() && !plant(ours.get()).equals(plant(theirs.get()))) {
            throw new Refused(Defect.in(from.folder().toString(), "restore-other-plant", plant(theirs.get()),
                    plant(ours.get())));
        }
        Set<String> points = ours.map(HandOver::points).orElseGet(TreeSet::new);
        boolean all = fresh.stream().flatMap(survey -> from.history(survey).stream())
                .allMatch(history -> points.contains("transfer " + history.survey().transfer())
                        && history.survey().round().filter(round -> !points.contains("round " + round)).isEmpty());
        if (ours.isEmpty() || !all) {
            store.append(person, new Act.RegisterTaken(theirs.get()));
        }
    }

    private static String plant(Branch register) {
        return register.branch("plant").flatMap(plant -> plant.text("id").or(() -> plant.text("name"))).orElse("");
    }

    private static Set<String> points(Branch register) {
        Set<String> points = register.branch("plant").map(plant -> plant.branches("transfers")).orElse(List.of())
                .stream().flatMap(transfer -> transfer.text("id").stream()).map(id -> "transfer " + id)
                .collect(Collectors.toCollection(TreeSet::new));
        register.branches("rounds").stream().flatMap(round -> round.text("id").stream())
                .forEach(id -> points.add("round " + id));
        return points;
    }

    private void photos(Survey survey) throws IOException {
        for (Branch photo : survey.photos()) {
            if (!PhotoShelf.isShelved(photo) || store.photo(photo).isPresent()) {
                continue;
            }
            String name = photo.text("file").orElse("");
            try (InputStream content = from.photo(photo).orElseThrow(() ->
                    new Refused(Defect.in(name, "photo-missing")))) {
                Branch kept = store.keepPhoto(content, name);
                if (!kept.text("file").equals(photo.text("file"))) {
                    throw new Refused(Defect.in(name, "photo-differs", photo.text("sha256").orElse("")));
                }
            }
        }
    }

    private void take(UUID survey, SurveyHistory theirs) {
        Branch document = theirs.survey().document();
        if (theirs.state() == QueueState.RECEIVED) {
            store.append(person, new Act.SurveyTaken(survey, document));
            return;
        }
        Branch open = document.without("completedAt").without("signedOffBy");
        Optional<Act.RevisionOpened> revision = from.revision(survey)
                .filter(one -> store.survey(one.supersedes()).isPresent());
        store.append(person, revision.isPresent()
                ? new Act.RevisionOpened(survey, revision.get().supersedes(), revision.get().why(), open)
                : new Act.SurveyOpened(survey, open));
        complete(survey, theirs);
    }

    private void complete(UUID survey, SurveyHistory theirs) {
        if (theirs.state() != QueueState.OPEN) {
            Branch document = theirs.survey().document();
            store.append(person, new Act.SurveyCompleted(survey, document.text("signedOffBy").orElse(""),
                    theirs.survey().completedAt()));
        }
    }

    /** A taking over that was cut short between opening and completing is ended here. */
    private void finish(UUID survey, SurveyHistory theirs, SurveyHistory ours) {
        Branch document = theirs.survey().document();
        if (same(document, ours.survey().document())) {
            known.add(survey);
        } else if (ours.state() == QueueState.OPEN && ours.changes().isEmpty()
                && same(document.without("completedAt").without("signedOffBy"), ours.survey().document())) {
            complete(survey, theirs);
            taken.add(survey);
        } else {
            differing.add(survey);
        }
    }

    private static boolean same(Branch theirs, Branch ours) {
        return theirs.members().equals(ours.members());
    }
}
