package bedmark.screen.zone;

import bedmark.picture.FeedEnd;
import bedmark.picture.SealShape;
import bedmark.picture.SealState;
import bedmark.picture.Sketches;
import bedmark.picture.Snap;
import bedmark.picture.ZoneSketch;
import bedmark.screen.Glass;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Light;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.StackPane;
import org.junit.jupiter.api.Test;

/** Draws the zone picture of many zones for looking at. */
class ZonePicturesTest {
    private static final PullListener NOBODY = new PullListener() {
        @Override
        public void touched(int station) {
        }

        @Override
        public void pulled(Grip grip, Snap.Stepped depth, Phase phase) {
        }

        @Override
        public void moved(int station, Snap.Stepped position, Phase phase) {
        }

        @Override
        public void sped(double forward) {
        }
    };

    private static Map<String, ZoneSketch> zones() {
        Map<String, ZoneSketch> zones = new TreeMap<>();
        zones.put("a-gravel", Sketches.gravel());
        zones.put("b-nothing", Sketches.nothingKnown());
        zones.put("c-one", Sketches.of(List.of(Sketches.station(1.2, 0.09, true)), 2.4, 0.3, 0.15));
        zones.put("d-twelve", Sketches.random(7, 12));
        zones.put("e-over-board", Sketches.of(List.of(Sketches.station(0.5, 0.1, false),
                Sketches.station(2, 0.42, true)), 3, 0.35, 0.2));
        ZoneSketch gravel = Sketches.gravel();
        zones.put("f-flat-right", new ZoneSketch(gravel.boards(), Sketches.FLAT, gravel.stations(), gravel.limit(),
                gravel.seals(), FeedEnd.RIGHT, gravel.captions()));
        zones.put("g-dry", Sketches.of(List.of(Sketches.station(0, 0, true)), 0.6, 0.5, 0.25));
        zones.put("h-length-unknown", Sketches.without(gravel,
                new ZoneSketch.Boards(OptionalDouble.empty(), gravel.boards().height(), gravel.boards().clearWidth()),
                gravel.belt()));
        zones.put("i-no-depth", new ZoneSketch(gravel.boards(), gravel.belt(), List.of(), Optional.empty(),
                ZoneSketch.Seals.NONE_READ, FeedEnd.LEFT, gravel.captions()));
        return zones;
    }

    private static ZoneSketch sealed(SealShape shape, SealState state) {
        ZoneSketch gravel = Sketches.gravel();
        return new ZoneSketch(gravel.boards(), gravel.belt(), gravel.stations(), gravel.limit(), new ZoneSketch.Seals(
                List.of(new ZoneSketch.SealSpan(shape, SealState.SOUND, 6.4)),
                List.of(new ZoneSketch.SealSpan(shape, state, 6.4))), FeedEnd.LEFT, gravel.captions());
    }

    @Test
    void picturesOfTheSeals() throws Exception {
        Glass.picture("seals-day", () -> {
            GridPane grid = new GridPane();
            for (int i = 0; i < SealShape.values().length; i++) {
                ZonePictureView view = new ZonePictureView(
                        sealed(SealShape.values()[i], SealState.values()[i]), Density.standard(), NOBODY);
                view.setPrefSize(770, 395);
                grid.add(view, i % 2, i / 2);
            }
            return grid;
        }, Light.DAY, Density.standard(), 1540, 1190, 1);
    }

    @Test
    void picturesOfManyZones() throws Exception {
        for (Light light : Light.values()) {
            Glass.picture("zones-" + light.name().toLowerCase(Locale.ROOT), () -> {
                GridPane grid = new GridPane();
                grid.setHgap(20);
                grid.setVgap(20);
                int i = 0;
                for (ZoneSketch sketch : zones().values()) {
                    ZonePictureView view = new ZonePictureView(sketch, Density.standard(), NOBODY);
                    view.setPrefSize(770, 395);
                    StackPane frame = new StackPane(view);
                    frame.setStyle("-fx-border-color: -bm-line; -fx-border-width: 1px;");
                    grid.add(frame, i % 2, i / 2);
                    i++;
                }
                return grid;
            }, light, Density.standard(), 1570, 2100, 1);
        }
    }
}
