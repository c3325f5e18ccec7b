package bedmark.screen.theme;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.screen.Glass;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import javafx.css.CssParser;
import javafx.geometry.Side;
import javafx.scene.Scene;
import javafx.scene.control.Button;
import javafx.scene.control.ContextMenu;
import javafx.scene.control.MenuItem;
import javafx.scene.layout.Region;
import javafx.scene.layout.StackPane;
import javafx.scene.paint.Color;
import javafx.scene.paint.Paint;
import javafx.scene.text.Font;
import javafx.scene.text.Text;
import org.junit.jupiter.api.Test;

class ThemeTest {
    private static final Pattern TYPE = Pattern.compile("-fx-font-size: (\\d+)px");

    private static String sheet(Density density) {
        return density.transcribe(String.join("", Theme.SHEETS.stream().map(Theme::read).toList()));
    }

    @Test
    void sheetIsReadWithoutComplaint() throws Exception {
        String sheet = sheet(Density.standard());
        List<CssParser.ParseError> errors = Glass.on(() -> {
            CssParser.errorsProperty().clear();
            new CssParser().parse(sheet);
            return List.copyOf(CssParser.errorsProperty());
        });
        assertEquals(List.of(), errors);
    }

    @Test
    void typeIsNeverUnderSixteenPixels() throws Exception {
        Matcher type = TYPE.matcher(sheet(Density.standard()));
        int found = 0;
        while (type.find()) {
            assertTrue(Integer.parseInt(type.group(1)) >= 16, type.group());
            found++;
        }
        assertTrue(found > 10);
    }

    @Test
    void figuresHaveOneWidthInEveryFace() throws Exception {
        Glass.on(() -> {
            for (Font face : Typeface.load()) {
                Set<Double> widths = new HashSet<>();
                for (char figure = '0'; figure <= '9'; figure++) {
                    Text text = new Text(String.valueOf(figure).repeat(10));
                    text.setFont(new Font(face.getName(), 40));
                    widths.add(text.getLayoutBounds().getWidth());
                }
                assertEquals(1, widths.size(), face.getName());
            }
            return "";
        });
    }

    @Test
    void facesAreTheShippedOnes() throws Exception {
        Glass.on(() -> {
            assertEquals(List.of("B612 Regular", "B612 Bold", "B612 Italic", "B612 Bold Italic"),
                    Typeface.load().stream().map(Font::getName).toList());
            Text narrow = new Text("iiiiiiiiii");
            narrow.setFont(Font.font(Typeface.FAMILY, 40));
            Text wide = new Text("mmmmmmmmmm");
            wide.setFont(Font.font(Typeface.FAMILY, 40));
            assertTrue(wide.getLayoutBounds().getWidth() > 2 * narrow.getLayoutBounds().getWidth());
            return "";
        });
    }

    @Test
    void sceneChangesItsLightAndItsHand() throws Exception {
        Glass.on(() -> {
            Button button = new Button("press");
            Scene scene = Glass.show(new StackPane(button), Light.DAY, Density.standard(), 400, 300);
            Paint day = ground(scene);
            assertEquals(88, button.getHeight());
            Theme.apply(scene, Light.NIGHT, new Density(149, Hand.GLOVED));
            scene.getRoot().applyCss();
            scene.getRoot().layout();
            assertNotEquals(day, ground(scene));
            assertEquals(Color.web("101416"), ground(scene));
            assertEquals(118, button.getHeight());
            Theme.apply(scene, Light.DAY, Density.standard());
            scene.getRoot().applyCss();
            assertEquals(day, ground(scene));
            scene.getWindow().hide();
            return "";
        });
    }

    @Test
    void popUpsFollowTheNight() throws Exception {
        Glass.on(() -> {
            Button button = new Button("press");
            Scene scene = Glass.show(new StackPane(button), Light.NIGHT, Density.standard(), 400, 300);
            ContextMenu menu = new ContextMenu(new MenuItem("history"));
            menu.show(button, Side.BOTTOM, 0, 0);
            menu.getScene().getRoot().applyCss();
            Region face = (Region) menu.getSkin().getNode();
            assertEquals(Color.web("191F22"), face.getBackground().getFills().get(1).getFill());
            menu.hide();
            scene.getWindow().hide();
            return "";
        });
    }

    private static Paint ground(Scene scene) {
        return ((Region) scene.getRoot()).getBackground().getFills().get(0).getFill();
    }

    @Test
    void everyLevelHasAShapeOfItsOwn() {
        Set<String> shapes = new HashSet<>();
        for (LevelShape level : LevelShape.values()) {
            shapes.add(level.figure().bed() + level.figure().limit() + level.figure().dashes());
        }
        assertEquals(LevelShape.values().length, shapes.size());
    }
}
