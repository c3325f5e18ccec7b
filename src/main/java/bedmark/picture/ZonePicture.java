package bedmark.picture;

import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * The picture of a loading zone: the side view to scale along the belt with heights drawn taller where that helps (and
 * then saying so), beside it the cross-section at the shown station, to scale in both directions. It works with nothing
 * known: what is missing is drawn lightly, with the caption that names it.
 */
public final class ZonePicture {
    private static final double SECTION_SHARE = 0.3;
    private static final double BETWEEN_MM = 4;
    private static final double STACK_UNDER = 0.95;
    private static final double STACKED_WIDTH = 0.7;

    private final Sheet sheet;
    private final TextMeasure measure;
    private final SideLayout layout;
    private final Drawing drawing;
    private final List<Handle> handles;

    private ZonePicture(ZoneSketch sketch, Sheet sheet, TextMeasure measure, boolean still,
                        Optional<SideLayout> held) {
        this.sheet = sheet;
        this.measure = measure;
        Draft draft = new Draft(sheet, measure, still);
        boolean stacked = sheet.width() < STACK_UNDER * sheet.height();
        double between = draft.mm(BETWEEN_MM);
        Box sideRoom = stacked ? new Box(0, 0, sheet.width(), sheet.height() * 0.56)
                : new Box(0, 0, sheet.width() * (1 - SECTION_SHARE) - between / 2, sheet.height());
        double left = sideRoom.right() + between;
        int besideRows = stacked ? 0 : SectionView.rows(sketch, sheet.width() - left, draft);
        layout = held.orElseGet(() -> SideLayout.of(sketch, sideRoom, besideRows, draft));
        new SideView(sketch, layout, draft).draw();
        if (stacked) {
            int rows = SectionView.rows(sketch, sheet.width() * STACKED_WIDTH, draft);
            double dimension = sheet.height() - draft.mm((rows - 0.5) * Draft.ROW + 0.4);
            double ground = dimension - draft.mm(SideLayout.UNDER - SideLayout.BELT / 2 + Draft.ROW / 2);
            Box room = new Box(sheet.width() * (1 - STACKED_WIDTH) / 2, sideRoom.bottom() + between,
                    sheet.width() * STACKED_WIDTH, ground - sideRoom.bottom() - between);
            new SectionView(sketch, room, ground, draft).draw(dimension);
        } else {
            double ground = layout.scale().plot().bottom() + draft.mm(SideLayout.BELT / 2);
            Box room = new Box(left, sheet.corner(), sheet.width() - left, ground - sheet.corner());
            new SectionView(sketch, room, ground, draft).draw(layout.rowMiddle(0, draft));
        }
        drawing = draft.finish();
        handles = new StationMarks(sketch.stations(), layout, draft).handles();
    }

    /** Lays a sketch out on a sheet. */
    public static ZonePicture of(ZoneSketch sketch, Sheet sheet, TextMeasure measure) {
        return new ZonePicture(sketch, sheet, measure, false, Optional.empty());
    }

    /** The same for a surface that nobody pulls on: stations are dots. */
    public static ZonePicture still(ZoneSketch sketch, Sheet sheet, TextMeasure measure) {
        return new ZonePicture(sketch, sheet, measure, true, Optional.empty());
    }

    /** The picture of a changed sketch in the same layout: what a person sees while pulling. */
    public ZonePicture pulledTo(ZoneSketch sketch) {
        return new ZonePicture(sketch, sheet, measure, false, Optional.of(layout));
    }

    public Drawing drawing() {
        return drawing;
    }

    /** The scale of the side view. */
    public SideScale scale() {
        return layout.scale();
    }

    /** Whether positions can be read off the picture: only where the zone's length is known. */
    public boolean placesStations() {
        return layout.toScale();
    }

    /** Where each station that lies in the zone can be taken hold of. */
    public List<Handle> handles() {
        return handles;
    }

    /** The handle under a place: the nearest of those whose hit area holds it. */
    public Optional<Handle> handleAt(double x, double y) {
        Point place = new Point(x, y);
        return handles.stream().filter(handle -> handle.centre().distance(place) <= handle.radius())
                .min(Comparator.comparingDouble(handle -> handle.centre().distance(place)));
    }

    /** Whether a place lies in the side view's plot, where a new station can be made. */
    public boolean isPlot(double x, double y) {
        return layout.scale().plot().holds(new Point(x, y));
    }
}
