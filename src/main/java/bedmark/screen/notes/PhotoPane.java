package bedmark.screen.notes;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.screen.Listening;
import bedmark.screen.Workplace;
import bedmark.screen.pad.NumericPad;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Labels;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.wording.Wording;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Consumer;
import javafx.geometry.VPos;
import javafx.scene.Node;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.ScrollPane;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/** The photos of a survey as tiles, and the newest of the camera that are not on it yet. */
final class PhotoPane extends VBox {
    private static final double RATIO = 0.75;

    private final Workplace workplace;
    private final NotesModel model;
    private final CameraModel camera;
    private final Wording wording;
    private final Consumer<Node> edit;
    private final Runnable close;
    private final VBox content = new VBox();
    private final ScrollPane scroll = new ScrollPane(content);
    private final Map<Object, Optional<Thumbnail>> thumbnails = new HashMap<>();
    private double tile = 100;
    private boolean portrait;

    /**
     * @param edit  puts an editor where there is room for it
     * @param close takes it away again
     */
    PhotoPane(Workplace workplace, NotesModel model, Listening listening, Consumer<Node> edit, Runnable close) {
        this.workplace = workplace;
        this.model = model;
        this.wording = workplace.wording();
        this.edit = edit;
        this.close = close;
        this.camera = model.camera();
        content.getStyleClass().add("photos");
        scroll.setFitToWidth(true);
        scroll.setFocusTraversable(false);
        scroll.getStyleClass().add("form-scroll");
        scroll.setMinHeight(0);
        VBox.setVgrow(scroll, Priority.ALWAYS);
        getStyleClass().add("photo-pane");
        getChildren().add(scroll);
        listening.onChange(model.historyProperty(), history -> layOut());
        listening.onChange(model.troubleProperty(), trouble -> layOut());
        listening.onChange(camera.shotsProperty(), shots -> layOut());
        listening.onChange(camera.troubleProperty(), trouble -> layOut());
    }

    void watch() {
        if (model.open()) {
            camera.watch();
        }
    }

    void leave() {
        camera.leave();
    }

    /** Told when the tablet is turned: two tiles beside each other, or four. */
    void turned(boolean upright) {
        portrait = upright;
        double mm = workplace.preferences().dpi() / 25.4;
        tile = Math.floor((portrait ? 28 : 29) * mm);
        layOut();
    }

    /** Shows the keys of a pad below the photos, or takes them away. */
    void showKeys(Optional<NumericPad> keys) {
        getChildren().setAll(scroll);
        keys.ifPresent(pad -> {
            pad.turned(portrait);
            pad.getStyleClass().add("seal-keys");
            getChildren().add(pad);
        });
    }

    void takeKeysAway() {
        showKeys(Optional.empty());
    }

    private void layOut() {
        content.getChildren().clear();
        SectionHeader header = new SectionHeader(wording.text("notes.photos"));
        List<Branch> photos = model.photos();
        header.asideProperty().set(wording.format().computed(photos.size(), 0));
        content.getChildren().add(header);
        if (photos.isEmpty()) {
            content.getChildren().add(Labels.wrapped("words", wording.text("notes.no-photo")));
        } else {
            FlowPane tiles = tiles();
            photos.forEach(photo -> tiles.getChildren().add(attached(photo)));
            content.getChildren().add(tiles);
        }
        model.troubleProperty().get().ifPresent(this::say);
        if (model.open()) {
            offer();
        }
    }

    private static FlowPane tiles() {
        FlowPane tiles = new FlowPane();
        tiles.getStyleClass().add("tiles");
        tiles.setRowValignment(VPos.TOP);
        return tiles;
    }

    private void say(Defect defect) {
        content.getChildren().add(Labels.wrapped("trouble-text", wording.sentence(defect)));
    }

    private void offer() {
        List<Path> shots = camera.shotsProperty().get();
        if (workplace.preferences().watchedFolder().isPresent()) {
            content.getChildren().add(new SectionHeader(wording.text("notes.newest")));
            camera.troubleProperty().get().ifPresent(this::say);
            if (shots.isEmpty()) {
                content.getChildren().add(Labels.wrapped("words", wording.text("notes.no-newest")));
            }
            FlowPane tiles = tiles();
            for (int i = 0; i < shots.size(); i++) {
                Path shot = shots.get(i);
                PhotoTile one = new PhotoTile("shot-" + i, wording.text("notes.attach"),
                        wording.text("notes.attach") + ": " + shot.getFileName(), tile, tile * RATIO,
                        () -> model.attach(shot));
                show(one, shot, () -> Files.newInputStream(shot));
                tiles.getChildren().add(one);
            }
            content.getChildren().add(tiles);
        } else {
            content.getChildren().add(Labels.wrapped("words", wording.text("notes.no-folder")));
        }
        ActionButton file = ActionButton.with(Icon.CAMERA, ContentDisplay.LEFT, Weight.PLAIN,
                wording.text("notes.from-file"), () -> workplace.folderChoice()
                        .choosePhoto(wording.text("notes.from-file"), workplace.preferences().watchedFolder()
                                .map(Path::of)).ifPresent(model::attach));
        file.setId("photo-file");
        file.setMaxWidth(Double.MAX_VALUE);
        content.getChildren().add(file);
    }

    private PhotoTile attached(Branch photo) {
        String id = photo.text("id").orElse("");
        String caption = photo.text("caption").orElse("");
        String line = caption.isEmpty() ? wording.text("notes.no-caption") : caption;
        PhotoTile one = new PhotoTile("photo-" + model.photos().indexOf(photo), line, wording.text("notes.photo", line),
                tile, tile * RATIO, () -> open(photo, id, caption));
        workplace.store().photo(photo).ifPresent(kept -> show(one, photo.text("file").orElse(""), kept::open));
        return one;
    }

    private void open(Branch photo, String id, String caption) {
        String taken = photo.time("takenAt").map(wording::moment).orElse("");
        PhotoEditor editor = new PhotoEditor(wording, caption, taken, model.open(), new PhotoEditor.Outcome() {
            @Override
            public void captioned(String text) {
                if (!text.strip().equals(caption)) {
                    model.caption(id, text);
                }
                close.run();
            }

            @Override
            public void detached() {
                model.detach(id);
                close.run();
            }
        });
        edit.accept(editor);
        workplace.store().photo(photo).ifPresent(kept -> workplace.longWork().execute(() -> {
            Optional<Thumbnail> large = Thumbnail.of(kept::open, PhotoEditor.SIDE);
            workplace.screen().execute(() -> editor.show(large));
        }));
        editor.begin();
    }

    /** Decoded once beside the screen, shown as soon as it is there. */
    private void show(PhotoTile one, Object known, Thumbnail.Source photo) {
        if (thumbnails.containsKey(known)) {
            one.show(thumbnails.get(known));
            return;
        }
        workplace.longWork().execute(() -> {
            Optional<Thumbnail> found = Thumbnail.of(photo, tile * 2);
            workplace.screen().execute(() -> {
                thumbnails.put(known, found);
                one.show(found);
            });
        });
    }
}
