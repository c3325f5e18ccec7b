package bedmark.screen.zone;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.engine.verdict.Level;
import bedmark.form.FieldForm;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.json.BundleReader;
import bedmark.json.FormReader;
import bedmark.json.JsonReader;
import bedmark.quantity.BeltState;
import bedmark.quantity.Quality;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.screen.Scribe;
import bedmark.survey.Act;
import bedmark.survey.Assessor;
import bedmark.survey.Bundle;
import bedmark.survey.QueueState;
import bedmark.survey.Survey;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.InstantSource;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.UUID;
import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ZoneModelTest {
    private static final UUID ID = UUID.fromString("00000000-0000-4000-8000-0000000000aa");
    private static final Pointer LENGTH = Pointer.parse("/readings/loadingZoneLength");
    private static final Pointer SPEED = Pointer.parse("/readings/beltSpeed");
    private static final Pointer DEPTH = Pointer.parse("/readings/bedDepths/0/depth");

    @TempDir
    private Path temp;

    private volatile Instant now = Instant.parse("2026-10-01T08:00:00Z");
    private final Clock clock = ((InstantSource) () -> now).withZone(ZoneOffset.UTC);
    private final LinkedBlockingQueue<Runnable> screen = new LinkedBlockingQueue<>();
    private Store store;
    private Scribe scribe;
    private ZoneModel model;

    @BeforeEach
    void openASurvey() throws Exception {
        Bundle bundle = BundleReader.read(Files.readAllBytes(Path.of("sample-surveys/round-under-way.json")));
        FieldForm form = FormReader.read(JsonReader.read(Files.readAllBytes(Path.of("field-forms/loading-zone.json"))));
        store = Store.open(temp.resolve("store"), StoreOptions.of("tablet").withClock(clock));
        store.append("A. Vale", new Act.SurveyOpened(ID, Survey.begin(ID, "r", "TP-22", form.id(), form.version(),
                "A. Vale", OffsetDateTime.now(clock)).document()));
        scribe = new Scribe(store, screen::add);
        model = new ZoneModel(new ZoneSetting(form, store.history(ID).orElseThrow(), bundle.register(),
                new Assessor(bundle.register()), List.of(), Optional.empty(), scribe, "A. Vale", clock),
                UnitSystem.METRIC, Locale.ENGLISH);
    }

    @AfterEach
    void close() {
        scribe.close();
        store.close();
    }

    private void settle() throws InterruptedException {
        while (scribe.waitingProperty().get() > 0) {
            Runnable next = screen.poll(20, TimeUnit.SECONDS);
            assertTrue(next != null, "the scribe answers");
            next.run();
        }
    }

    private void type(Pointer where, String text) throws InterruptedException {
        model.activate(where);
        model.typedProperty().set(text);
        model.next();
        settle();
    }

    private Branch journal() {
        return store.history(ID).orElseThrow().survey().document();
    }

    private Quantity read(Pointer where) {
        return ((Branch) journal().at(where).orElseThrow()).asQuantity();
    }

    @Test
    void readingIsAsOldAsItsLastSign() throws Exception {
        type(LENGTH, "4.50");
        now = now.plusSeconds(60);
        model.activate(LENGTH);
        model.typedProperty().set("4.5");
        now = now.plusSeconds(60);
        model.typedProperty().set("4.55");
        OffsetDateTime typed = OffsetDateTime.now(clock);
        now = now.plusSeconds(60);
        model.keep();
        settle();
        assertEquals(Optional.of(typed), read(LENGTH).at());
        model.activate(LENGTH);
        model.typedProperty().set("4.55");
        assertEquals(Optional.of(OffsetDateTime.now(clock)),
                ((Branch) model.surveyProperty().get().at(LENGTH).orElseThrow()).asQuantity().at());
    }

    @Test
    void workBeginsAtTheFirstGap() {
        assertEquals(LENGTH, model.active().where());
    }

    @Test
    void typingCountsAtOnceAndIsSavedWhenTheCellIsLeft() throws Exception {
        model.typedProperty().set("4.50");
        assertEquals("4.50", ((Branch) model.surveyProperty().get().at(LENGTH).orElseThrow()).asQuantity().value()
                .toPlainString());
        assertFalse(journal().at(LENGTH).isPresent());
        model.next();
        settle();
        assertEquals("4.50", read(LENGTH).value().toPlainString());
        assertEquals(Optional.of(OffsetDateTime.now(clock)), read(LENGTH).at());
    }

    @Test
    void unfinishedNumberKeepsItsCellInHand() {
        model.chooseUnit(Unit.FOOT);
        model.typedProperty().set("4 1/");
        model.activate(SPEED);
        assertEquals(LENGTH, model.active().where());
        assertEquals("4 1/", model.typedProperty().get());
        assertTrue(model.noteProperty().get().orElseThrow() instanceof Note.NoNumber);
    }

    @Test
    void implausibleNumberIsQuestionedOnceAndThenBelieved() throws Exception {
        type(LENGTH, "45");
        assertEquals(LENGTH, model.active().where());
        assertTrue(model.noteProperty().get().isPresent());
        assertEquals("45", read(LENGTH).value().toPlainString());
        model.next();
        assertFalse(model.active().where().equals(LENGTH));
    }

    @Test
    void impossibleNumberIsSavedAndStandsOutUntilItIsMended() throws Exception {
        type(LENGTH, "4500");
        Slot length = model.slots().stream().filter(slot -> slot.where().equals(LENGTH)).findFirst().orElseThrow();
        assertEquals("4500", read(LENGTH).value().toPlainString());
        assertTrue(model.impossible(length).isPresent());
        assertFalse(model.complete("A. Vale"));
        assertEquals(LENGTH, model.active().where());
        type(LENGTH, "4.5");
        assertFalse(model.impossible(length).isPresent());
    }

    @Test
    void depthIsEstimatedUnlessTheBeltIsIsolated() throws Exception {
        type(DEPTH, "120");
        assertEquals(Optional.of(Quality.ESTIMATED), read(DEPTH).quality());
        model.sayBeltState(BeltState.ISOLATED);
        type(DEPTH, "121");
        assertEquals(Optional.of(Quality.MEASURED), read(DEPTH).quality());
        assertEquals(Optional.of(BeltState.ISOLATED), read(DEPTH).beltState());
    }

    @Test
    void depthOnARunningBeltIsNotMarkedAsMeasured() throws Exception {
        model.sayBeltState(BeltState.RUNNING_LOADED);
        type(DEPTH, "120");
        model.activate(DEPTH);
        model.mark(Quality.MEASURED);
        settle();
        assertTrue(model.noteProperty().get().orElseThrow() instanceof Note.IsolateFirst);
        assertEquals(Optional.of(Quality.ESTIMATED), read(DEPTH).quality());
        model.mark(Quality.SUSPECT);
        settle();
        assertEquals(Optional.of(Quality.SUSPECT), read(DEPTH).quality());
    }

    @Test
    void anotherWayOfReadingTheSpeedClearsTheOneBefore() throws Exception {
        type(SPEED, "2");
        Slot way = model.slots().stream().filter(Slot.WaySlot.class::isInstance).findFirst().orElseThrow();
        model.set(way, Optional.of(Node.text("pulleySpeed")));
        settle();
        assertFalse(journal().at(SPEED).isPresent());
        assertTrue(model.slots().stream().anyMatch(slot -> slot.where().last().equals("rotation")));
    }

    @Test
    void undoLeadsBackToTheBeginning() throws Exception {
        Branch opened = journal();
        type(LENGTH, "5");
        type(SPEED, "2");
        type(DEPTH, "120");
        type(DEPTH, "130");
        for (int i = 0; i < 4; i++) {
            model.undo();
            settle();
        }
        assertEquals(opened.at(LENGTH), journal().at(LENGTH));
        assertEquals(opened, journal());
        assertEquals(opened, model.surveyProperty().get());
        model.undo();
        settle();
        assertEquals(opened, journal());
    }

    @Test
    void undoRightBehindAChangeWaitsUntilItIsSaved() throws Exception {
        model.activate(LENGTH);
        model.typedProperty().set("5");
        model.next();
        model.undo();
        settle();
        settle();
        assertFalse(model.surveyProperty().get().at(LENGTH).isPresent());
        assertFalse(journal().at(LENGTH).isPresent());
    }

    @Test
    void pulledBedIsAStationThatIsEstimated() throws Exception {
        type(LENGTH, "5");
        Quantity position = Quantity.of("1000", Unit.MILLIMETRE);
        model.tables().pull(0, position, Quantity.of("215", Unit.MILLIMETRE));
        settle();
        assertEquals("215", read(DEPTH).value().toPlainString());
        assertEquals(Optional.of(Quality.ESTIMATED), read(DEPTH).quality());
        assertEquals("1000", read(Pointer.parse("/readings/bedDepths/0/position")).value().toPlainString());
        model.tables().pull(0, position, Quantity.of("220", Unit.MILLIMETRE));
        settle();
        assertEquals("220", read(DEPTH).value().toPlainString());
        assertEquals(DEPTH, model.active().where());
    }

    @Test
    void linesOfATableComeAndGo() throws Exception {
        type(DEPTH, "120");
        model.tables().addLine(Pointer.parse("/readings/bedDepths"));
        settle();
        assertEquals(Pointer.parse("/readings/bedDepths/1/position"), model.active().where());
        model.tables().removeLine(Pointer.parse("/readings/bedDepths/1"));
        model.tables().removeLine(Pointer.parse("/readings/bedDepths/0"));
        settle();
        assertFalse(journal().at(Pointer.parse("/readings/bedDepths")).isPresent());
    }

    @Test
    void languageAndUnitsNeverChangeAStoredValue() throws Exception {
        type(LENGTH, "4.5");
        Branch before = journal();
        model.unitsProperty().set(UnitSystem.US);
        model.localeProperty().set(Locale.forLanguageTag("es"));
        model.activate(LENGTH);
        model.switchUnit();
        model.next();
        settle();
        assertEquals(before, journal());
    }

    @Test
    void decimalCommaIsReadWhereTheLocaleWritesOne() throws Exception {
        model.localeProperty().set(Locale.forLanguageTag("es"));
        type(LENGTH, "4,5");
        assertEquals("4.5", read(LENGTH).value().toPlainString());
    }

    @Test
    void completingLeadsToTheFirstGapAndIsDoneWithoutOne() throws Exception {
        type(LENGTH, "5");
        assertFalse(model.complete("A. Vale"));
        assertTrue(model.noteProperty().get().orElseThrow() instanceof Note.Gap);
        type(SPEED, "1.5");
        type(Pointer.parse("/readings/bedDepths/0/position"), "1");
        type(DEPTH, "120");
        for (String side : List.of("left", "right")) {
            int line = side.equals("left") ? 0 : 1;
            Pointer place = Pointer.parse("/readings/seals").child(line);
            if (line == 1) {
                model.tables().addLine(Pointer.parse("/readings/seals"));
                settle();
            }
            answer(place.child("side"), side);
            answer(place.child("type"), "vertical");
            answer(place.child("condition"), "sound");
            type(place.child("length"), "5");
        }
        assertTrue(model.outcomeProperty().get().assessment().orElseThrow().level() != Level.INCOMPLETE);
        assertTrue(model.complete("A. Vale"));
        settle();
        assertEquals(QueueState.COMPLETED, store.history(ID).orElseThrow().state());
        model.set(model.active(), Optional.empty());
        settle();
        assertFalse(model.open());
    }

    private void answer(Pointer where, String code) throws InterruptedException {
        model.activate(where);
        model.set(model.active(), Optional.of(Node.text(code)));
        settle();
    }
}
