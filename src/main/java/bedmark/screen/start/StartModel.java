package bedmark.screen.start;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.json.BundleReader;
import bedmark.journal.NotSaved;
import bedmark.screen.Site;
import bedmark.screen.Workplace;
import bedmark.survey.Act;
import bedmark.survey.Adoption;
import bedmark.survey.Bundle;
import bedmark.survey.Round;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import javafx.beans.binding.Bindings;
import javafx.beans.binding.BooleanBinding;
import javafx.beans.property.BooleanProperty;
import javafx.beans.property.DoubleProperty;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleBooleanProperty;
import javafx.beans.property.SimpleDoubleProperty;
import javafx.beans.property.SimpleObjectProperty;
import javafx.beans.property.SimpleStringProperty;
import javafx.beans.property.StringProperty;

/** The start of a walk: who, which round, the caution read; on an empty store the offer of the demo plant. */
public final class StartModel {
    private final Workplace workplace;
    private final StringProperty person = new SimpleStringProperty();
    private final ObjectProperty<Round> round = new SimpleObjectProperty<>();
    private final BooleanProperty cautionRead = new SimpleBooleanProperty();
    private final DoubleProperty loading = new SimpleDoubleProperty(-1);
    private final ReadOnlyObjectWrapper<Optional<Defect>> trouble = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final BooleanBinding ready;
    private final RoundTaking taking;

    public StartModel(Workplace workplace) {
        this.workplace = workplace;
        this.taking = new RoundTaking(workplace);
        person.set(workplace.preferences().person());
        person.addListener((property, before, now) ->
                workplace.preferencesProperty().set(workplace.preferences().withPerson(now.strip())));
        round.addListener((property, before, now) -> recall());
        person.addListener((property, before, now) -> recall());
        chooseRound();
        recall();
        ready = Bindings.createBooleanBinding(() -> !person.get().isBlank() && round.get() != null
                && cautionRead.get(), person, round, cautionRead);
    }

    /** Told when there is another plant: the chosen round as it is now, else the one that was walked last and is not finished, else the first one. */
    public void chooseRound() {
        List<Round> rounds = rounds();
        Optional<Round> kept = Optional.ofNullable(round.get()).flatMap(chosen -> rounds.stream()
                .filter(one -> one.id().equals(chosen.id())).findFirst());
        if (kept.isPresent()) {
            round.set(kept.get());
            return;
        }
        round.set(workplace.store().walks().stream().filter(walk -> walk.underWay())
                .flatMap(walk -> rounds.stream().filter(one -> one.id().equals(walk.round()))).findFirst()
                .orElse(rounds.isEmpty() ? null : rounds.get(0)));
    }

    /** The caution is acknowledged once a walk: whoever goes on with their own need not do so again. */
    private void recall() {
        if (round.get() != null && goesOn()) {
            cautionRead.set(true);
        }
    }

    /** Whether the chosen round is being walked by this person already. */
    public boolean goesOn() {
        return workplace.store().walk(round.get().id()).filter(walk -> walk.underWay()
                && walk.person().equals(person.get().strip())).isPresent();
    }

    public StringProperty personProperty() {
        return person;
    }

    public ObjectProperty<Round> roundProperty() {
        return round;
    }

    /** Whether the person has said that the caution is read, on this walk. */
    public BooleanProperty cautionReadProperty() {
        return cautionRead;
    }

    /** Whether the walk can start. */
    public BooleanBinding ready() {
        return ready;
    }

    /** How far the demo plant is loaded, 0 to 1; negative while nothing is loaded. */
    public DoubleProperty loadingProperty() {
        return loading;
    }

    public ReadOnlyObjectProperty<Optional<Defect>> troubleProperty() {
        return trouble.getReadOnlyProperty();
    }

    /** Takes the office's round files in. */
    public RoundTaking taking() {
        return taking;
    }

    public boolean hasPlant() {
        return workplace.siteProperty().get().isPresent();
    }

    public boolean canLoadDemo() {
        return !hasPlant() && workplace.samples().isPresent();
    }

    public List<Round> rounds() {
        return workplace.siteProperty().get().map(Site::rounds).orElse(List.of());
    }

    /** Starts the walk, or goes on with it. */
    public void start(Runnable then) {
        Round chosen = round.get();
        Runnable setOut = () -> {
            workplace.walkMemory().begin(chosen, person.get().strip());
            then.run();
        };
        if (goesOn()) {
            setOut.run();
            return;
        }
        workplace.scribe().save(person.get().strip(), new Act.WalkStarted(chosen.id()), entry -> setOut.run());
    }

    /** Loads the demo plant with its past rounds and the one under way. */
    public void loadDemo() {
        Path folder = workplace.samples().orElseThrow();
        loading.set(0);
        trouble.set(Optional.empty());
        workplace.longWork().execute(() -> {
            Optional<Defect> failed = Optional.empty();
            try {
                load(folder);
            } catch (Refused e) {
                failed = Optional.of(e.defect());
            } catch (NotSaved e) {
                failed = Optional.of(e.defect());
            } catch (IOException e) {
                failed = Optional.of(Defect.in(folder.toString(), "file-unreadable"));
            }
            Optional<Defect> outcome = failed;
            workplace.screen().execute(() -> {
                loading.set(-1);
                trouble.set(outcome);
            });
        });
    }

    private void load(Path folder) throws IOException {
        List<Path> files;
        try (Stream<Path> all = Files.list(folder)) {
            files = all.filter(file -> file.toString().endsWith(".json")).sorted().toList();
        }
        List<Bundle> bundles = new ArrayList<>();
        for (Path file : files) {
            bundles.add(BundleReader.read(Files.readAllBytes(file)));
        }
        List<Act> acts = new ArrayList<>();
        for (int i = 0; i < bundles.size(); i++) {
            acts.addAll(Adoption.surveys(bundles.get(i), i == bundles.size() - 1));
        }
        workplace.adopt(Adoption.register(bundles));
        for (int i = 0; i < acts.size(); i++) {
            adopt(acts.get(i), folder);
            double share = (i + 1.0) / acts.size();
            workplace.screen().execute(() -> loading.set(share));
        }
    }

    /** Photos of the demo plant lie beside its bundles; each is attached from its file like any other. */
    private void adopt(Act act, Path folder) {
        String person = workplace.preferences().person();
        if (!(act instanceof Act.SurveyOpened opened)) {
            workplace.store().append(person, act);
            return;
        }
        List<Branch> photos = opened.document().branches("photos");
        workplace.store().append(person, new Act.SurveyOpened(opened.survey(), opened.document().without("photos")));
        for (Branch photo : photos) {
            workplace.store().attachPhoto(folder.resolve(photo.text("file").orElse("")), opened.survey(), person,
                    photo.time("takenAt").orElseThrow(), photo.text("caption").orElse(""));
        }
    }
}
