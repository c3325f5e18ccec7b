package bedmark.screen.zone;

import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.form.FieldForm;
import bedmark.form.StationsField;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.journal.QuickLayer;
import bedmark.json.BundleReader;
import bedmark.json.FormReader;
import bedmark.json.JsonReader;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.screen.Scribe;
import bedmark.screen.pad.PadCommand;
import bedmark.screen.pad.PadKey;
import bedmark.screen.pad.PadModel;
import bedmark.screen.pad.PadSetup;
import bedmark.survey.Act;
import bedmark.survey.Assessor;
import bedmark.survey.Bundle;
import bedmark.survey.Survey;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Random;
import java.util.UUID;
import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Slips of the decimal sign over the sample plant: each transfer point is surveyed again with readings near those of
 * its last survey, typed key by key. What is typed right is rarely questioned, what slipped nearly always.
 */
class DecadeSlipTest {
    private static final int ENTRIES = 1_000;

    /** A reading that can slip, and the standard deviation of the logarithm of its change since the last survey. */
    private record Kind(String key, double change) {
    }

    private static final List<Kind> KINDS = List.of(new Kind("loadingZoneLength", 0.02), new Kind("skirtSpacing", 0.02),
            new Kind("skirtHeight", 0.03), new Kind("beltSpeed", 0.1), new Kind("throughput", 0.25),
            new Kind("runningPower", 0.2), new Kind("depth", 0.3));

    @TempDir
    private Path temp;

    private final LinkedBlockingQueue<Runnable> screen = new LinkedBlockingQueue<>();
    private final Random random = new Random(5);
    private final List<Point> points = new ArrayList<>();
    private Store store;
    private Scribe scribe;

    /** A transfer point with the pad as the screen wires it. */
    private final class Point {
        private final ZoneModel model;
        private final Branch last;
        private final PadModel pad = new PadModel(this::typed);

        Point(ZoneModel model, Branch last) {
            this.model = model;
            this.last = last;
        }

        private void typed(PadCommand command) {
            if (command instanceof PadCommand.Typed text) {
                model.typedProperty().set(text.text());
            }
        }

        /** Types a number key by key; whether something was questioned or refused on the way or on leaving. */
        boolean isQuestioned(Pointer where, Unit unit, String keys) throws InterruptedException {
            model.activate(where);
            model.chooseUnit(unit);
            pad.open(new PadSetup('.', false, false, Optional.empty(), Optional.empty()), "");
            boolean refused = false;
            for (char key : keys.toCharArray()) {
                pad.press(key == '.' ? PadKey.DECIMAL : PadKey.digit(key - '0'));
                refused |= pad.noteProperty().get().isPresent();
            }
            Slot slot = model.active();
            model.next();
            boolean stays = model.active().where().equals(where)
                    && model.noteProperty().get().filter(Note::isDoubt).isPresent();
            boolean questioned = refused || stays || model.impossible(slot).isPresent();
            settle();
            model.activate(where);
            model.clear();
            settle();
            return questioned;
        }
    }

    @BeforeEach
    void openEachPoint() throws Exception {
        Bundle past = BundleReader.read(Files.readAllBytes(Path.of("sample-surveys/round-2026-03.json")));
        FieldForm form = FormReader.read(JsonReader.read(Files.readAllBytes(Path.of("field-forms/loading-zone.json"))));
        store = Store.open(temp.resolve("store"), StoreOptions.of("tablet").withFiles(new QuickLayer()));
        scribe = new Scribe(store, screen::add);
        Assessor assessor = new Assessor(past.register());
        for (Survey last : past.surveys()) {
            if (last.readings().has("bedDepths")) {
                UUID id = UUID.randomUUID();
                store.append("A. Vale", new Act.SurveyOpened(id, Survey.begin(id, "r", last.transfer(), form.id(),
                        form.version(), "A. Vale", OffsetDateTime.now()).document()));
                points.add(new Point(new ZoneModel(new ZoneSetting(form, store.history(id).orElseThrow(),
                        past.register(), assessor, List.of(), Optional.of(last.document()), scribe, "A. Vale",
                        Clock.systemUTC()), UnitSystem.METRIC, Locale.ENGLISH), last.document()));
            }
        }
        assertTrue(points.size() > 5, "there is a plant to slip in");
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

    /** A number as it should be typed. */
    private record Truth(Point point, Pointer where, Quantity reading) {
    }

    private Truth truth() {
        while (true) {
            Point point = points.get(random.nextInt(points.size()));
            Kind kind = KINDS.get(random.nextInt(KINDS.size()));
            Pointer where = Survey.READINGS.child(kind.key());
            Optional<Node> then = point.last.at(where);
            if (kind.key().equals("depth")) {
                List<Branch> stations = new Survey(point.last).readings().branches("bedDepths");
                int line = random.nextInt(stations.size());
                place(point, stations.get(line));
                where = BedLines.depth(0);
                then = stations.get(line).get("depth");
            }
            Optional<Quantity> read = then.flatMap(SlotWords::quantity).filter(found -> found.si() > 0);
            if (read.isPresent()) {
                return new Truth(point, where, changed(read.get(), kind.change()));
            }
        }
    }

    /** A station near the one of the last survey, since nobody stands on the same spot twice. */
    private void place(Point point, Branch station) {
        Optional<Node> method = station.get("depthMethod").or(() -> point.last.at(StationsField.METHOD));
        point.model.activate(StationsField.METHOD);
        point.model.set(point.model.active(), method);
        double there = station.quantity("position").orElseThrow().si();
        double here = Math.max(0, there + 0.1 * random.nextGaussian());
        point.model.activate(BedLines.position(0));
        point.model.set(point.model.active(), Optional.of(Branch.write(Quantity.of(
                new BigDecimal(here).setScale(2, RoundingMode.HALF_UP), Unit.METRE))));
    }

    private Quantity changed(Quantity then, double change) {
        double now = then.value().doubleValue() * Math.exp(change * random.nextGaussian());
        int digits = now >= 100 ? 0 : now >= 10 ? 1 : 2;
        return Quantity.of(new BigDecimal(now).setScale(digits, RoundingMode.HALF_UP), then.unit());
    }

    @Test
    void slipsAreQuestionedAndRightNumbersAreNot() throws Exception {
        int slipped = 0;
        int right = 0;
        for (int i = 0; i < ENTRIES; i++) {
            Truth truth = truth();
            slipped += truth.point.isQuestioned(truth.where, truth.reading.unit(), slip(truth.reading.value(), i % 3))
                    ? 1 : 0;
            Truth other = truth();
            right += other.point.isQuestioned(other.where, other.reading.unit(),
                    other.reading.value().toPlainString()) ? 1 : 0;
        }
        assertTrue(slipped >= 0.95 * ENTRIES, slipped + " of " + ENTRIES + " slips were questioned");
        assertTrue(right < 0.02 * ENTRIES, right + " of " + ENTRIES + " right numbers were questioned");
    }

    /** Ten times too much, a tenth, or one sign typed twice: the decimal sign, else a digit of a whole number. */
    private String slip(BigDecimal number, int kind) {
        String plain = number.toPlainString();
        if (kind == 2) {
            int sign = plain.indexOf('.');
            int at = sign >= 0 ? sign : random.nextInt(plain.length());
            return plain.substring(0, at + 1) + plain.charAt(at) + plain.substring(at + 1);
        }
        return (kind == 0 ? number.scaleByPowerOfTen(1) : number.scaleByPowerOfTen(-1)).toPlainString();
    }
}
