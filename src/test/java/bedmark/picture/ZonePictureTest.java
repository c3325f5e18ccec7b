package bedmark.picture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.picture.ZoneSketch.Boards;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class ZonePictureTest {
    private static final double PER_MM = 149 / 25.4;
    private static final Sheet SCREEN = new Sheet(770, 395, PER_MM);
    private static final List<Sheet> SHEETS = List.of(SCREEN, new Sheet(760, 320, PER_MM), new Sheet(900, 500, PER_MM),
            new Sheet(500, 700, PER_MM), new Sheet(500, 240, 72 / 25.4), new Sheet(1540, 790, 2 * PER_MM));
    /** Stands in for a font: every sign a little wider than the typeface has it. */
    private static final TextMeasure MEASURE =
            (text, face, size) -> new TextMeasure.Extent(0.62 * size * text.length(), 0.76 * size, 0.2 * size);

    private static ZonePicture picture(ZoneSketch sketch) {
        return ZonePicture.of(sketch, SCREEN, MEASURE);
    }

    static Stream<ZoneSketch> sketches() {
        Stream<ZoneSketch> random = IntStream.rangeClosed(1, 12).boxed()
                .flatMap(count -> IntStream.range(0, 12).mapToObj(seed -> Sketches.random(97L * seed + count, count)));
        return Stream.concat(random, Stream.of(Sketches.gravel(), Sketches.nothingKnown(), mirrored(),
                Sketches.of(List.of(Sketches.station(0, 0, true)), 0.6, 0.5, 0.25),
                Sketches.of(List.of(Sketches.station(1, 9.0, true)), 3, 0.35, 0.35),
                Sketches.of(List.of(), 3, 0.35, 0.34),
                Sketches.of(List.of(Sketches.station(2, 0.1, true)), 4000, 0.3, 0),
                Sketches.without(Sketches.gravel(), Sketches.gravel().boards(), Sketches.FLAT)));
    }

    private static ZoneSketch mirrored() {
        ZoneSketch sketch = Sketches.gravel();
        return new ZoneSketch(sketch.boards(), sketch.belt(), sketch.stations(), sketch.limit(), sketch.seals(),
                FeedEnd.RIGHT, sketch.captions());
    }

    private static List<Mark.Label> labels(ZonePicture picture) {
        return picture.drawing().each(Mark.Label.class).toList();
    }

    @ParameterizedTest
    @MethodSource("sketches")
    void textsNeverOverlap(ZoneSketch sketch) {
        for (Sheet sheet : SHEETS) {
            List<Mark.Label> labels = labels(ZonePicture.of(sketch, sheet, MEASURE));
            for (int i = 0; i < labels.size(); i++) {
                for (int other = 0; other < i; other++) {
                    Mark.Label a = labels.get(i);
                    Mark.Label b = labels.get(other);
                    assertFalse(a.box().overlaps(b.box()), () -> sheet + ": " + a + " and " + b);
                }
            }
        }
    }

    @ParameterizedTest
    @MethodSource("sketches")
    void platesCoverNoHandleAndNoBadge(ZoneSketch sketch) {
        for (Sheet sheet : SHEETS) {
            ZonePicture picture = ZonePicture.of(sketch, sheet, MEASURE);
            List<Mark.Disc> discs = picture.drawing().each(Mark.Disc.class).toList();
            for (Mark.Label label : labels(picture)) {
                for (Mark.Disc disc : discs) {
                    double dx = Math.max(0, Math.abs(disc.centre().x() - label.box().centre().x())
                            - label.box().width() / 2);
                    double dy = Math.max(0, Math.abs(disc.centre().y() - label.box().centre().y())
                            - label.box().height() / 2);
                    assertTrue(Math.hypot(dx, dy) >= disc.radius() - 1e-6, () -> sheet + ": " + label + " on " + disc);
                }
            }
        }
    }

    @ParameterizedTest
    @MethodSource("sketches")
    void textsStayOnTheSheet(ZoneSketch sketch) {
        for (Sheet sheet : SHEETS) {
            Box whole = new Box(0, 0, sheet.width(), sheet.height());
            labels(ZonePicture.of(sketch, sheet, MEASURE)).forEach(label ->
                    assertTrue(whole.holds(label.box()), () -> sheet + ": " + label));
        }
    }

    @ParameterizedTest
    @MethodSource("sketches")
    void textOverTheBedStandsOnAPlate(ZoneSketch sketch) {
        ZonePicture picture = picture(sketch);
        List<Mark.Area> beds = picture.drawing().each(Mark.Area.class).filter(area -> area.fill() == Ink.BED).toList();
        labels(picture).stream().filter(label -> label.plate().isEmpty()).forEach(label ->
                beds.forEach(bed -> Stream.concat(label.box().corners().stream(), Stream.of(label.box().centre()))
                        .forEach(point -> assertFalse(TextureTest.holds(bed.outline(), point), label::toString))));
    }

    @ParameterizedTest
    @MethodSource("sketches")
    void everyPlaceIsANumber(ZoneSketch sketch) {
        SHEETS.forEach(sheet -> assertFinite(ZonePicture.of(sketch, sheet, MEASURE)));
    }

    @Test
    void everyKnowledgeHasItsPicture() {
        ZoneSketch whole = Sketches.gravel();
        OptionalDouble none = OptionalDouble.empty();
        for (int bits = 0; bits < 1 << 8; bits++) {
            boolean[] known = new boolean[8];
            for (int i = 0; i < known.length; i++) {
                known[i] = (bits >> i & 1) == 1;
            }
            Boards boards = new Boards(known[0] ? whole.boards().length() : none,
                    known[1] ? whole.boards().height() : none, known[2] ? whole.boards().clearWidth() : none);
            ZoneSketch.Belt belt = new ZoneSketch.Belt(known[3] ? whole.belt().width() : none,
                    known[4] ? whole.belt().troughAngle() : none, known[5] ? whole.belt().centreRollLength() : none,
                    known[6] ? whole.belt().surchargeAngle() : none, none);
            ZoneSketch sketch = Sketches.without(known[7] ? whole : Sketches.nothingKnown(), boards, belt);
            ZonePicture picture = picture(sketch);
            assertFinite(picture);
            assertEquals(known[0], picture.placesStations());
        }
    }

    private static void assertFinite(ZonePicture picture) {
        picture.drawing().marks().forEach(mark -> assertFalse(
                mark.toString().contains("NaN") || mark.toString().contains("Infinity"), mark::toString));
    }

    @Test
    void sideViewIsToScaleAlongTheBelt() {
        List<Handle> handles = picture(Sketches.gravel()).handles();
        double perMetre = (handles.get(3).x() - handles.get(0).x()) / (5.6 - 0.8);
        assertEquals(handles.get(0).x() + perMetre * (2.2 - 0.8), handles.get(1).x(), 1e-9);
        Mark.Dimension length = picture(Sketches.gravel()).drawing().each(Mark.Dimension.class).findFirst()
                .orElseThrow();
        assertEquals(6.4 * perMetre, length.to().x() - length.from().x(), 1e-9);
    }

    @Test
    void heightsAreDrawnTallerAsTheCaptionSays() {
        ZonePicture picture = picture(Sketches.gravel());
        List<Handle> handles = picture.handles();
        double across = (handles.get(3).x() - handles.get(0).x()) / (5.6 - 0.8);
        double up = (handles.get(0).y() - handles.get(2).y()) / (0.262 - 0.128);
        String stated = String.format(Locale.ROOT, "heights × %.0f", up / across);
        assertTrue(labels(picture).stream().anyMatch(label -> label.text().equals(stated)), stated);
        assertEquals(Math.rint(up / across), up / across, 1e-9);
    }

    @Test
    void shortZoneIsTrueToScaleAndSaysNothing() {
        ZonePicture picture = picture(Sketches.of(List.of(Sketches.station(0.3, 0.1, true)), 0.6, 0.5, 0.25));
        assertEquals(1, picture.scale().exaggeration(), 1e-9);
        assertTrue(labels(picture).stream().noneMatch(label -> label.text().startsWith("heights")));
    }

    @Test
    void sectionIsToScaleBothWays() {
        ZonePicture picture = picture(Sketches.gravel());
        Mark.Dimension clear = picture.drawing().each(Mark.Dimension.class).skip(1).findFirst().orElseThrow();
        double perMetre = (clear.to().x() - clear.from().x()) / 0.78;
        List<Point> belt = picture.drawing().each(Mark.Line.class).filter(line -> line.points().size() == 4)
                .map(Mark.Line::points)
                .filter(points -> points.get(0).x() > 500 && points.get(1).y() == points.get(2).y())
                .findFirst().orElseThrow();
        assertEquals(0.45 * perMetre, belt.get(2).x() - belt.get(1).x(), 1e-9);
        assertEquals((1.2 - 0.45) / 2 * perMetre, belt.get(0).distance(belt.get(1)), 1e-9);
        assertEquals(Math.tan(Math.toRadians(35)), (belt.get(1).y() - belt.get(0).y())
                / (belt.get(1).x() - belt.get(0).x()), 1e-9);
    }

    @ParameterizedTest
    @MethodSource("sketches")
    void hatchingLiesOverTheLimitAndUnderTheBed(ZoneSketch sketch) {
        ZonePicture picture = picture(sketch);
        double length = picture.scale().length();
        BedCurve.through(sketch.stations(), length).ifPresent(curve -> sketch.limit().ifPresent(limit -> {
            List<Mark.Hatching> side = picture.drawing().each(Mark.Hatching.class)
                    .filter(mark -> mark.region().get(0).x() < picture.scale().plot().right() + 1).toList();
            assertEquals(curve.over(limit.depth()).size(), side.size());
            double line = picture.scale().y(limit.depth());
            side.forEach(mark -> mark.region().forEach(point -> assertTrue(point.y() <= line + 1e-6)));
        }));
    }

    @Test
    void twelveStationsInARowAllShowTheirDepth() {
        List<ZoneSketch.Station> stations = IntStream.range(0, 12).mapToObj(i ->
                Sketches.station(0.25 + 0.5 * i, 0.15 + 0.005 * i, i == 5)).toList();
        ZonePicture picture = picture(Sketches.of(stations, 6, 0.35, 0.15));
        List<String> texts = labels(picture).stream().map(Mark.Label::text).toList();
        stations.forEach(station -> {
            assertTrue(texts.contains(station.depthLabel()), station.depthLabel());
            assertTrue(texts.contains(station.positionLabel()), station.positionLabel());
        });
    }

    @Test
    void handleIsAsLargeAsAFinger() {
        for (Sheet sheet : SHEETS) {
            ZonePicture.of(Sketches.gravel(), sheet, MEASURE).handles().forEach(handle ->
                    assertTrue(2 * handle.radius() / sheet.unitPerMm() >= 15 - 1e-9));
        }
    }

    @Test
    void nearestHandleIsTaken() {
        ZonePicture picture = picture(Sketches.random(5, 12));
        for (Handle handle : picture.handles()) {
            assertEquals(handle, picture.handleAt(handle.x(), handle.y()).orElseThrow());
        }
        ZonePicture gravel = picture(Sketches.gravel());
        Handle first = gravel.handles().get(0);
        assertEquals(first, gravel.handleAt(first.x() - first.radius() + 1, first.y()).orElseThrow());
        assertTrue(gravel.handleAt(first.x(), first.y() + first.radius() + 1).isEmpty());
    }

    @Test
    void placesReadBackAsDepthsAndPositions() {
        for (ZoneSketch sketch : List.of(Sketches.gravel(), mirrored())) {
            SideScale scale = picture(sketch).scale();
            assertEquals(0.2, scale.depth(scale.y(0.2)), 1e-12);
            assertEquals(2.2, scale.position(scale.x(2.2)), 1e-12);
            assertEquals(0, scale.depth(scale.plot().bottom() + 50));
            assertEquals(scale.top(), scale.depth(scale.plot().y() - 50));
            assertEquals(sketch.feedEnd() == FeedEnd.LEFT ? 0 : 6.4, scale.position(-100), 1e-12);
        }
    }

    @Test
    void feedAtTheRightMirrorsTheZone() {
        ZonePicture left = picture(Sketches.gravel());
        ZonePicture right = picture(mirrored());
        double middle = left.scale().plot().centre().x();
        for (int i = 0; i < left.handles().size(); i++) {
            assertEquals(middle - left.handles().get(i).x(), right.handles().get(i).x() - middle, 1e-9);
        }
    }

    @Test
    void pullingKeepsTheScale() {
        ZonePicture before = picture(Sketches.gravel());
        List<ZoneSketch.Station> pulled = new ArrayList<>(Sketches.gravel().stations());
        pulled.set(2, Sketches.station(4.0, 0.39, true));
        ZonePicture after = before.pulledTo(Sketches.of(pulled, 6.4, 0.35, 0.15));
        assertEquals(before.scale(), after.scale());
        assertEquals(before.scale().y(0.39), after.handles().get(2).y(), 1e-12);
    }

    @Test
    void heapedBedCanBePulledOverTheBoard() {
        assertTrue(picture(Sketches.gravel()).scale().top() > 1.1 * 0.35);
    }

    @Test
    void sealIsThatOfItsStretch() {
        List<ZoneSketch.SealSpan> spans = List.of(new ZoneSketch.SealSpan(SealShape.VERTICAL, SealState.SOUND, 2),
                new ZoneSketch.SealSpan(SealShape.NONE, SealState.MISSING, 1));
        assertEquals(SealShape.VERTICAL, SectionView.at(spans, 1.9).orElseThrow().shape());
        assertEquals(SealShape.NONE, SectionView.at(spans, 2.0).orElseThrow().shape());
        assertEquals(SealShape.NONE, SectionView.at(spans, 3.5).orElseThrow().shape());
        assertTrue(SectionView.at(List.of(), 1).isEmpty());
    }

    @Test
    void everySealAndConditionLooksDifferent() {
        List<String> drawn = new ArrayList<>();
        for (SealShape shape : SealShape.values()) {
            for (SealState state : SealState.values()) {
                ZoneSketch sketch = Sketches.gravel();
                ZoneSketch.SealSpan span = new ZoneSketch.SealSpan(shape, state, 6.4);
                drawn.add(picture(new ZoneSketch(sketch.boards(), sketch.belt(), sketch.stations(), sketch.limit(),
                        new ZoneSketch.Seals(List.of(span), List.of(span)), sketch.feedEnd(), sketch.captions()))
                        .drawing().toString());
            }
        }
        assertEquals(drawn.size(), drawn.stream().distinct().count());
    }

    @Test
    void shownStationIsTheActiveOneElseTheDeepest() {
        assertEquals(2, ZoneSketch.shown(Sketches.gravel().stations()).orElseThrow());
        assertEquals(1, ZoneSketch.shown(List.of(Sketches.station(1, 0.1, false), Sketches.station(2, 0.3, false),
                Sketches.station(3, 0.3, false))).orElseThrow());
        assertTrue(ZoneSketch.shown(List.of()).isEmpty());
    }
}
