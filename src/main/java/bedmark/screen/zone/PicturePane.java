package bedmark.screen.zone;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.engine.Assessment;
import bedmark.engine.LoadingZone;
import bedmark.engine.Result;
import bedmark.picture.Snap;
import bedmark.picture.ZoneSketch;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.screen.theme.Density;
import bedmark.wording.Wording;
import bedmark.wording.ZoneSketcher;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;
import javafx.geometry.Pos;
import javafx.scene.layout.StackPane;

/** The zone picture as an input, with its buttons: what a finger does on it and what they do is the same act. */
final class PicturePane extends StackPane {
    private final ZoneModel model;
    private final Wording wording;
    private final ZoneSketcher sketcher;
    private final ZonePictureView view;
    private final PictureTools tools;
    private Optional<Branch> pulled = Optional.empty();
    private Optional<AskedSpeed> asked = Optional.empty();
    private Optional<Drawn> drawn = Optional.empty();

    /** What the picture was drawn of; a key that changes none of it draws nothing. */
    private record Drawn(Branch document, Outcome outcome, Optional<Integer> line, double speed) {
        private boolean is(Drawn other) {
            return document == other.document && outcome == other.outcome && line.equals(other.line)
                    && Double.compare(speed, other.speed) == 0;
        }
    }

    PicturePane(ZoneModel model, Wording wording, Density density) {
        this.model = model;
        this.wording = wording;
        this.sketcher = new ZoneSketcher(model.setting().assessor(), wording);
        this.view = new ZonePictureView(sketch(), density, new Finger());
        this.tools = new PictureTools(wording, new Buttons());
        view.setId("zone-picture");
        tools.setMaxSize(USE_PREF_SIZE, USE_PREF_SIZE);
        StackPane.setAlignment(tools, Pos.TOP_RIGHT);
        setMinSize(0, 0);
        getChildren().addAll(view, tools);
        tools.heightProperty().subscribe(height -> view.keepCorner(height.doubleValue()));
    }

    /** The words for who cannot see it. */
    void describe(String words) {
        view.setAccessibleText(words);
    }

    private Optional<Assessment> found() {
        return model.outcomeProperty().get().assessment();
    }

    private ZoneSketch sketch() {
        Branch document = model.surveyProperty().get();
        Optional<Integer> line = BedLines.lineOf(model.active());
        LoadingZone zone = model.outcomeProperty().get().zone().orElseGet(() -> sketcher.registered(document));
        ZoneSketch sketch = sketcher.sketch(document, zone, found(), line);
        return asked.map(speed -> speed.over(sketch, document)).orElse(sketch);
    }

    /** Shows the survey as it stands, unless a finger holds the bed. */
    void refresh() {
        Drawn now = new Drawn(model.surveyProperty().get(), model.outcomeProperty().get(),
                BedLines.lineOf(model.active()), asked.map(AskedSpeed::speed).orElse(0.0));
        if (pulled.isEmpty() && drawn.filter(now::is).isEmpty()) {
            view.show(sketch(), snap());
            drawn = Optional.of(now);
        }
        tools.offer(model.open(), heldLine().isPresent(), found().filter(known ->
                known.get(Result.BELT_SPEED).isPresent() && !known.profile().isEmpty()).isPresent());
    }

    private Optional<Integer> heldLine() {
        return BedLines.lineOf(model.active()).filter(line -> line < BedLines.of(model.keptProperty().get()).size());
    }

    private Snap snap() {
        return inches() ? Snap.INCH : Snap.METRIC;
    }

    /** A depth is pulled in the unit that the person reads it in. */
    private boolean inches() {
        return wording.smallLength() == Unit.INCH;
    }

    private void ask(boolean speed) {
        asked = speed ? found().flatMap(known -> known.get(Result.BELT_SPEED))
                .map(now -> new AskedSpeed(model.setting(), wording, now.value())) : Optional.empty();
        view.pullsSpeed(asked.isPresent());
        tools.show(asked.isPresent());
        refresh();
    }

    private final class Buttons implements PictureTools.Work {
        @Override
        public void addStation() {
            model.tables().addLine(BedLines.TABLE);
        }

        @Override
        public void takeStation() {
            heldLine().ifPresent(line -> model.tables().removeLine(BedLines.TABLE.child(line)));
        }

        @Override
        public void askSpeed(boolean speed) {
            ask(speed);
        }

        @Override
        public void step(int direction) {
            asked.ifPresent(speed -> speed.step(direction));
            refresh();
        }
    }

    /** A finger on the bed: the picture follows it, and what it comes to is entered when it lets go. */
    private final class Finger implements PullListener {
        @Override
        public void touched(int station) {
            line(station).ifPresent(line -> model.activate(BedLines.depth(line)));
        }

        @Override
        public void pulled(Grip grip, Snap.Stepped depth, Phase phase) {
            if (!model.open()) {
                return;
            }
            int line = grip instanceof Grip.OfStation station ? line(station.index()).orElseThrow()
                    : BedLines.of(model.keptProperty().get()).size();
            Quantity position = grip instanceof Grip.AtPlace place ? quantity(place.position())
                    : Quantity.of(BigDecimal.ZERO, Unit.METRE);
            if (phase == Phase.RELEASED) {
                pulled = Optional.empty();
                model.tables().pull(line, position, quantity(depth));
            } else {
                follow(model.tables().previewPull(line, position, quantity(depth)), line);
            }
        }

        @Override
        public void moved(int station, Snap.Stepped position, Phase phase) {
            Optional<Integer> line = line(station).filter(known -> model.open());
            Quantity place = quantity(position);
            boolean free = line.isPresent() && isFree(line.get(), place);
            if (phase == Phase.RELEASED) {
                pulled = Optional.empty();
                if (free) {
                    model.tables().move(line.get(), place);
                }
                refresh();
            } else if (free) {
                follow(model.tables().previewMove(line.get(), place), line.get());
            }
        }

        @Override
        public void sped(double forward) {
            asked.ifPresent(speed -> speed.pull(forward));
            refresh();
        }

        private void follow(Branch seen, int line) {
            pulled = Optional.of(seen);
            drawn = Optional.empty();
            view.show(sketcher.sketch(seen, found(), Optional.of(line)), snap());
        }

        /** Whether no other station stands at a place: two of them cannot. */
        private boolean isFree(int line, Quantity place) {
            List<Node> rows = BedLines.of(model.keptProperty().get());
            for (int i = 0; i < rows.size(); i++) {
                if (i != line && rows.get(i) instanceof Branch row && row.get("position").flatMap(SlotWords::quantity)
                        .filter(other -> Quantity.BY_SIZE.compare(other, place) == 0).isPresent()) {
                    return false;
                }
            }
            return true;
        }

        private Optional<Integer> line(int station) {
            List<Integer> lines = ZoneSketcher.lines(model.surveyProperty().get());
            return station < lines.size() ? Optional.of(lines.get(station)) : Optional.empty();
        }

        /** Whole steps as an exact decimal of the person's own unit. */
        private Quantity quantity(Snap.Stepped stepped) {
            boolean inches = inches();
            BigDecimal step = inches ? new BigDecimal(stepped.step() > 0.01 ? "2" : "0.25")
                    : new BigDecimal(stepped.step() > 0.01 ? "50" : "5");
            return Quantity.of(step.multiply(BigDecimal.valueOf(stepped.steps())), inches ? Unit.INCH : Unit.MILLIMETRE);
        }
    }
}
