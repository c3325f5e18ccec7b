package bedmark.screen.office;

import bedmark.office.FindingLine;
import bedmark.office.Place;
import bedmark.office.RankedZone;
import bedmark.quantity.Dimension;
import bedmark.screen.part.Plate;
import bedmark.screen.theme.LevelGlyph;
import bedmark.screen.theme.LevelShape;
import bedmark.survey.InspectionStatus;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.function.BooleanSupplier;
import java.util.stream.Collectors;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.control.ListCell;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/** One loading zone in the list. */
final class ZoneCell extends ListCell<RankedZone> {
    private final Wording wording;
    private final BooleanSupplier narrow;

    /** @param narrow whether there is room for one column of numbers only, and none for the area beside the name */
    ZoneCell(Wording wording, BooleanSupplier narrow) {
        this.wording = wording;
        this.narrow = narrow;
        getStyleClass().add("zone-cell");
        setPrefWidth(0);
    }

    @Override
    protected void updateItem(RankedZone zone, boolean empty) {
        super.updateItem(zone, empty);
        setText(null);
        setGraphic(empty || zone == null ? null : row(zone));
        if (!empty && zone != null) {
            setAccessibleText(wording.text("office.place." + zone.place().code()) + ", " + zone.names().tag());
        }
    }

    static LevelShape shape(Place place) {
        return switch (place) {
            case OVERLOADED -> LevelShape.OVERLOADED;
            case UNDECIDED -> LevelShape.UNDECIDED;
            case INCOMPLETE -> LevelShape.INCOMPLETE;
            case NOT_INSPECTED, STALE -> LevelShape.NOT_INSPECTED;
            case NEAR -> LevelShape.NEAR;
            case WITHIN -> LevelShape.WITHIN;
        };
    }

    private Node row(RankedZone zone) {
        LevelGlyph glyph = new LevelGlyph(shape(zone.place()));
        Label name = label("zone-name", zone.names().tag() + "  ›  " + zone.names().conveyorTag());
        Label where = label("soft", String.join(", ", List.of(zone.names().area(), zone.names().plant())));
        name.setMinWidth(Region.USE_PREF_SIZE);
        VBox words = new VBox();
        if (narrow.getAsBoolean()) {
            where.setWrapText(true);
            where.setMinHeight(Region.USE_PREF_SIZE);
            words.getChildren().addAll(name, where);
        } else {
            HBox first = new HBox(name, where);
            first.getStyleClass().add("line");
            first.setAlignment(Pos.BASELINE_LEFT);
            words.getChildren().add(first);
        }
        Label findings = label("findings", wording.text("office.place." + zone.place().code()) + (zone.open().isEmpty()
                ? "" : ": " + zone.open().stream().map(this::finding).collect(Collectors.joining(", "))));
        findings.setWrapText(true);
        findings.setMinHeight(Region.USE_PREF_SIZE);
        words.getChildren().add(findings);
        words.setMinWidth(0);
        HBox.setHgrow(words, Priority.ALWAYS);
        HBox row = new HBox(glyph, words, plates(zone), numbers(zone));
        row.getStyleClass().add("zone-row");
        row.setAlignment(Pos.CENTER_LEFT);
        return row;
    }

    private String finding(FindingLine line) {
        return wording.text("rule." + line.rule().code());
    }

    private Node plates(RankedZone zone) {
        List<Node> plates = new ArrayList<>();
        if (zone.clashes() > 0) {
            plates.add(new Plate(Plate.Tone.OVER, wording.text("office.plate.clash")));
        }
        if (zone.clockWrong()) {
            plates.add(new Plate(Plate.Tone.FAINT, wording.text("office.plate.clock")));
        }
        if (!zone.answers().isEmpty()) {
            plates.add(new Plate(Plate.Tone.PLAIN, wording.text("office.plate.answered", zone.answers().size())));
        }
        if (!zone.names().registered()) {
            plates.add(new Plate(Plate.Tone.FAINT, wording.text("office.plate.unregistered")));
        }
        VBox box = new VBox(plates.toArray(Node[]::new));
        box.getStyleClass().add("plates");
        box.setAlignment(Pos.CENTER_RIGHT);
        box.setMinWidth(Region.USE_PREF_SIZE);
        return box;
    }

    private Node numbers(RankedZone zone) {
        Label share = label("share", zone.driveShare().isPresent()
                ? wording.text("office.worst.drive", wording.percent(zone.driveShare().getAsDouble())) : "–");
        Label power = label("soft", zone.skirtPower().isPresent() ? wording.computed(zone.skirtPower().getAsDouble(),
                wording.units().unit(Dimension.POWER)) : "");
        Label saving = label("saving", zone.saving().map(one -> wording.text("office.worst.saving",
                wording.format().computed(one.wh() / 1e6, 1))).orElse(""));
        Label age = label("soft", age(zone));
        if (narrow.getAsBoolean()) {
            VBox one = new VBox(share, saving, age);
            one.getStyleClass().addAll("numbers", "wide");
            one.setMinWidth(Region.USE_PREF_SIZE);
            return one;
        }
        VBox left = new VBox(share, power);
        VBox right = new VBox(saving, age);
        left.getStyleClass().add("numbers");
        right.getStyleClass().addAll("numbers", "wide");
        HBox box = new HBox(left, right);
        box.setAlignment(Pos.CENTER_RIGHT);
        box.setMinWidth(Region.USE_PREF_SIZE);
        return box;
    }

    private String age(RankedZone zone) {
        if (zone.visitStatus().filter(status -> status != InspectionStatus.INSPECTED).isPresent()) {
            return wording.text("office.worst.visit." + zone.visitStatus().get().code());
        }
        return zone.age().map(age -> wording.text("office.worst.days", age.toDays()))
                .orElse(wording.text(zone.surveyed().isPresent() ? "office.worst.ahead" : "office.worst.never"));
    }

    private static Label label(String styleClass, String text) {
        Label label = new Label(text);
        label.getStyleClass().add(styleClass);
        return label;
    }
}
