package bedmark.screen.zone;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

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
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.screen.Glass;
import bedmark.screen.Scribe;
import bedmark.screen.part.FieldBox;
import bedmark.screen.part.Judgement;
import bedmark.screen.part.QualityButton;
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
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.UUID;
import javafx.scene.Parent;
import javafx.scene.control.Labeled;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A row makes its words anew only where something changed that they are made of; nobody may see that it does not. */
class RowViewTest {
    private static final int ACTS = 400;
    private static final List<String> TYPED = List.of("1", "2.4", "45", "4500", "0.3", "262", "1/", "-", "");

    @TempDir
    private Path temp;

    private final Random random = new Random(20261202);
    private final Wording wording = new Wording(new Words(Locale.ENGLISH), UnitSystem.METRIC);
    private final Map<SlotRow, RowView> rows = new HashMap<>();
    private final List<Runnable> written = new ArrayList<>();
    private Store store;
    private Scribe scribe;
    private ZoneModel model;

    @BeforeEach
    void openASurvey() throws Exception {
        Bundle plant = BundleReader.read(Files.readAllBytes(Path.of("sample-surveys/round-under-way.json")));
        FieldForm form = FormReader.read(JsonReader.read(Files.readAllBytes(Path.of("field-forms/loading-zone.json"))));
        store = Store.open(temp.resolve("store"), StoreOptions.of("tablet").withFiles(new QuickLayer()));
        scribe = new Scribe(store, written::add);
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

    @AfterEach
    void close() {
        scribe.close();
        store.close();
    }

    @Test
    void rowShownAnewSaysWhatARowBuiltNowSays() throws Exception {
        Glass.on(() -> {
            for (int i = 0; i < ACTS; i++) {
                act();
                for (SlotRow row : model.rowsProperty().get()) {
                    RowView shown = rows.computeIfAbsent(row, this::build);
                    shown.update();
                    assertEquals(seen(build(row)), seen(shown), "row " + row.place() + " after act " + i);
                }
            }
            return null;
        });
        assertTrue(rows.size() > 20, "the form is walked");
    }

    @Test
    void qualityThatCannotBeIsTakenBackFromItsButton() throws Exception {
        Glass.on(() -> {
            model.activate(BedLines.depth(0));
            model.typedProperty().set("262");
            model.next();
            RowView shown = build(row(BedLines.depth(0)));
            QualityButton button = (QualityButton) shown.lookup(".quality");
            assertEquals(Quality.ESTIMATED, button.qualityProperty().get());
            button.qualityProperty().set(Quality.MEASURED);
            model.mark(Quality.MEASURED);
            shown.update();
            assertEquals(Quality.ESTIMATED, button.qualityProperty().get(), "the belt is not isolated");
            return null;
        });
    }

    @Test
    void stationIsJudgedAnewWhenTheZoneTurnsOutShorter() throws Exception {
        Glass.on(() -> {
            enter(Survey.READINGS.child("loadingZoneLength"), "4");
            enter(BedLines.position(0), "3");
            RowView shown = build(row(BedLines.position(0)));
            assertEquals(List.of(Judgement.NONE, Judgement.NONE), judgements(shown));
            enter(Survey.READINGS.child("loadingZoneLength"), "2");
            model.activateFirst();
            shown.update();
            assertEquals(List.of(Judgement.WRONG, Judgement.NONE), judgements(shown), "it stands outside the zone");
            enter(Survey.READINGS.child("loadingZoneLength"), "5");
            shown.update();
            assertEquals(List.of(Judgement.NONE, Judgement.NONE), judgements(shown));
            return null;
        });
    }

    private void enter(Pointer where, String number) {
        model.activate(where);
        model.chooseUnit(Unit.METRE);
        model.typedProperty().set(number);
        model.keep();
    }

    private SlotRow row(Pointer where) {
        return model.rowsProperty().get().stream()
                .filter(row -> row.slots().stream().anyMatch(slot -> slot.where().equals(where))).findFirst()
                .orElseThrow();
    }

    private static List<Judgement> judgements(RowView row) {
        return row.lookupAll(".field-box").stream().map(box -> ((FieldBox) box).judgementProperty().get()).toList();
    }

    private RowView build(SlotRow row) {
        return new RowView(row, model, wording, false);
    }

    /** One thing that a person may do. */
    private void act() {
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

    /** All that a row shows. */
    private static List<String> seen(RowView row) {
        List<String> seen = new ArrayList<>();
        seen.add(row.said().toString());
        look(row, seen);
        return seen;
    }

    private static void look(javafx.scene.Node node, List<String> seen) {
        if (!node.isVisible()) {
            return;
        }
        seen.add(node.getClass().getSimpleName() + " " + node.isManaged()
                + node.getPseudoClassStates().stream().map(Object::toString).sorted().toList()
                + (node instanceof Labeled labeled ? " " + labeled.getText() : ""));
        if (node instanceof FieldBox box) {
            seen.add(box.activeProperty().get() + " " + box.freshProperty().get() + " " + box.carriedProperty().get()
                    + " " + box.judgementProperty().get());
        }
        if (node instanceof Parent parent) {
            parent.getChildrenUnmodifiable().forEach(child -> look(child, seen));
        }
    }
}
