package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.form.Choice;
import bedmark.form.FieldForm;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.journal.QuickLayer;
import bedmark.json.BundleReader;
import bedmark.json.FormReader;
import bedmark.json.JsonReader;
import bedmark.quantity.BeltState;
import bedmark.quantity.Quality;
import bedmark.quantity.UnitSystem;
import bedmark.screen.Scribe;
import bedmark.survey.Act;
import bedmark.survey.Assessor;
import bedmark.survey.Bundle;
import bedmark.survey.Survey;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Random;
import java.util.UUID;

/** A transfer point that was just opened, and somebody who does anything there that a person may do. */
final class Fidget implements AutoCloseable {
    private static final List<String> TYPED = List.of("1", "2.4", "45", "4500", "0.3", "262", "1/", "-", "");

    private final Random random = new Random(20261202);
    private final Wording wording = new Wording(new Words(Locale.ENGLISH), UnitSystem.METRIC);
    private final Store store;
    private final Scribe scribe;
    private final ZoneModel model;

    Fidget(Path folder) throws Exception {
        Bundle plant = BundleReader.read(Files.readAllBytes(Path.of("sample-surveys/round-under-way.json")));
        FieldForm form = FormReader.read(JsonReader.read(Files.readAllBytes(Path.of("field-forms/loading-zone.json"))));
        store = Store.open(folder, StoreOptions.of("tablet").withFiles(new QuickLayer()));
        scribe = new Scribe(store, told -> { });
        UUID id = UUID.randomUUID();
        store.append("A. Vale", new Act.SurveyOpened(id, Survey.begin(id, "r", "TP-22", form.id(), form.version(),
                "A. Vale", OffsetDateTime.now()).document()));
        Branch last = plant.surveys().stream().map(Survey::document)
                .filter(survey -> survey.at(Survey.READINGS.child("bedDepths")).isPresent()).findFirst().orElseThrow();
        model = new ZoneModel(new ZoneSetting(form, store.history(id).orElseThrow(), plant.register(),
                new Assessor(plant.register()), List.of(), Optional.of(last), scribe, "A. Vale", Clock.systemUTC()),
                UnitSystem.METRIC, Locale.ENGLISH);
        model.likeUnits(wording::liked);
    }

    ZoneModel model() {
        return model;
    }

    Wording wording() {
        return wording;
    }

    SlotRow row(Pointer where) {
        return model.rowsProperty().get().stream()
                .filter(row -> row.slots().stream().anyMatch(slot -> slot.where().equals(where))).findFirst()
                .orElseThrow();
    }

    /** One thing that a person may do. */
    void act() {
        List<Slot> slots = model.slots();
        switch (random.nextInt(12)) {
            case 0, 1 -> model.activate(slots.get(random.nextInt(slots.size())));
            case 2, 3, 4 -> model.typedProperty().set(TYPED.get(random.nextInt(TYPED.size())));
            case 5, 6 -> model.next();
            case 7 -> model.switchUnit();
            case 8 -> model.sayBeltState(BeltState.values()[random.nextInt(BeltState.values().length)]);
            case 9 -> model.mark(Quality.values()[random.nextInt(Quality.values().length)]);
            case 10 -> choose(slots.get(random.nextInt(slots.size())));
            default -> any().run();
        }
    }

    private Runnable any() {
        return List.<Runnable>of(model::undo, model::clear, model::back, () -> model.step(1), model.tables()::carryOver,
                () -> model.unitsProperty().set(random.nextBoolean() ? UnitSystem.METRIC : UnitSystem.US))
                .get(random.nextInt(6));
    }

    private void choose(Slot slot) {
        List<Choice> choices = SlotWords.choices(slot);
        if (slot instanceof Slot.FlagSlot) {
            model.set(slot, Optional.of(Node.flag(random.nextBoolean())));
        } else if (!choices.isEmpty()) {
            model.set(slot, Optional.of(Node.text(choices.get(random.nextInt(choices.size())).code())));
        }
    }

    @Override
    public void close() {
        scribe.close();
        store.close();
    }
}
