package bedmark.screen.notes;

import bedmark.document.Refused;
import bedmark.photo.Orientation;
import bedmark.photo.PhotoFacts;
import java.io.IOException;
import java.io.InputStream;
import java.util.Optional;
import javafx.scene.image.Image;
import javafx.scene.image.ImageView;

/**
 * A small picture of a photo, decoded no larger than it is shown, with how it is to be turned.
 *
 * @param orientation as the camera was held
 */
record Thumbnail(Image image, Orientation orientation) {

    /** Where a photo is read from, as often as asked: a camera's file, or the store, which may keep it sealed. */
    @FunctionalInterface
    interface Source {
        InputStream open() throws IOException;
    }

    /** The picture as it was seen, no larger than a box (px). */
    ImageView upright(double width, double height) {
        boolean lying = orientation.degrees() % 180 != 0;
        ImageView view = new ImageView(image);
        view.setPreserveRatio(true);
        view.setSmooth(true);
        view.setFitWidth(lying ? height : width);
        view.setFitHeight(lying ? width : height);
        view.setRotate(orientation.degrees());
        view.setScaleX(orientation.mirrored() ? -1 : 1);
        return view;
    }

    /**
     * Decodes a photo; takes time and is done beside the screen. Nothing where it is damaged, or so large that
     * decoding it would take the memory that the survey needs.
     *
     * @param side the longer side of the small picture (px)
     */
    static Optional<Thumbnail> of(Source photo, double side) {
        try {
            try (InputStream in = photo.open()) {
                if (PhotoFacts.doubt("", in).isPresent()) {
                    return Optional.empty();
                }
            }
            PhotoFacts facts;
            try (InputStream in = photo.open()) {
                facts = PhotoFacts.of(in);
            }
            try (InputStream in = photo.open()) {
                Image image = new Image(in, side, side, true, true);
                return image.isError() || image.getWidth() < 1 ? Optional.empty()
                        : Optional.of(new Thumbnail(image, facts.orientation()));
            }
        } catch (IOException | Refused e) {
            // Its tile keeps the camera sign; checking the store names a photo that is damaged or missing.
            return Optional.empty();
        }
    }
}
