package bedmark.screen.zone;

import bedmark.picture.Ink;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import javafx.css.CssMetaData;
import javafx.css.SimpleStyleableObjectProperty;
import javafx.css.Styleable;
import javafx.css.StyleableProperty;
import javafx.css.StyleConverter;
import javafx.scene.paint.Color;

/**
 * The colour of each ink, given by the style sheet as {@code -bm-ink-<name>}, so that a canvas follows the light as
 * every other part does.
 */
final class InkColours {
    private static final Map<Ink, InkMetaData> META_DATA = new EnumMap<>(Ink.class);

    static {
        for (Ink ink : Ink.values()) {
            META_DATA.put(ink, new InkMetaData(ink));
        }
    }

    private final Map<Ink, SimpleStyleableObjectProperty<Color>> colours = new EnumMap<>(Ink.class);

    InkColours(Object bean, Runnable changed) {
        META_DATA.forEach((ink, meta) -> {
            SimpleStyleableObjectProperty<Color> colour =
                    new SimpleStyleableObjectProperty<>(meta, bean, ink.name(), Color.TRANSPARENT);
            colour.addListener((property, before, after) -> changed.run());
            colours.put(ink, colour);
        });
    }

    Color of(Ink ink) {
        return colours.get(ink).get();
    }

    /** A region's own style properties and those of the inks. */
    static List<CssMetaData<? extends Styleable, ?>> with(List<CssMetaData<? extends Styleable, ?>> region) {
        List<CssMetaData<? extends Styleable, ?>> all = new ArrayList<>(region);
        all.addAll(META_DATA.values());
        return List.copyOf(all);
    }

    private static final class InkMetaData extends CssMetaData<ZonePictureView, Color> {
        private final Ink ink;

        private InkMetaData(Ink ink) {
            super("-bm-ink-" + ink.name().toLowerCase(Locale.ROOT), StyleConverter.getColorConverter(),
                    Color.TRANSPARENT);
            this.ink = ink;
        }

        @Override
        public boolean isSettable(ZonePictureView view) {
            return !view.inks().colours.get(ink).isBound();
        }

        @Override
        public StyleableProperty<Color> getStyleableProperty(ZonePictureView view) {
            return view.inks().colours.get(ink);
        }
    }
}
