package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.screen.theme.Density;
import bedmark.screen.theme.Light;
import bedmark.screen.theme.Theme;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.ExecutionException;
import java.util.function.Supplier;
import javafx.application.Platform;
import javafx.geometry.Bounds;
import javafx.geometry.Rectangle2D;
import javafx.scene.Node;
import javafx.scene.Parent;
import javafx.scene.Scene;
import javafx.scene.SnapshotParameters;
import javafx.scene.control.Labeled;
import javafx.scene.control.ScrollPane;
import javafx.scene.image.PixelFormat;
import javafx.scene.image.WritableImage;
import javafx.scene.paint.Color;
import javafx.scene.transform.Transform;
import javafx.stage.Stage;
import javax.imageio.ImageIO;
import org.testfx.api.FxToolkit;

/** Shows parts on a headless glass, for tests that look at them. */
public final class Glass {
    private static final Path PICTURES = Path.of("target", "pictures");

    private Glass() {
    }

    /** Runs on the screen's thread, and hands back what came out or went wrong there. */
    public static <T> T on(Callable<T> work) throws Exception {
        if (Platform.isFxApplicationThread()) {
            return work.call();
        }
        FxToolkit.registerPrimaryStage();
        CompletableFuture<T> result = new CompletableFuture<>();
        Platform.runLater(() -> {
            try {
                result.complete(work.call());
            } catch (Throwable e) {
                result.completeExceptionally(e);
            }
        });
        try {
            return result.get();
        } catch (ExecutionException e) {
            if (e.getCause() instanceof Error error) {
                throw error;
            }
            throw (Exception) e.getCause();
        }
    }

    /** Moves the panes that a node is in so far that it is in sight; on the screen's thread. */
    public static void reveal(Node node) {
        for (Parent parent = node.getParent(); parent != null; parent = parent.getParent()) {
            if (parent instanceof ScrollPane scroll) {
                double room = scroll.getViewportBounds().getHeight();
                double all = scroll.getContent().getBoundsInLocal().getHeight();
                Bounds bounds = scroll.getContent().sceneToLocal(node.localToScene(node.getBoundsInLocal()));
                if (all > room) {
                    scroll.setVvalue(Math.max(0, Math.min(1, (bounds.getCenterY() - room / 2) / (all - room))));
                }
            }
        }
    }

    /** Everything that is written at or below a node and seen; on the screen's thread. */
    public static String words(Node node) {
        StringBuilder words = new StringBuilder();
        collect(node, words);
        return words.toString();
    }

    private static void collect(Node node, StringBuilder words) {
        if (node instanceof Labeled labeled && node.isVisible()) {
            words.append(labeled.getText()).append('\n');
        }
        if (node instanceof Parent parent) {
            parent.getChildrenUnmodifiable().forEach(child -> collect(child, words));
        }
    }

    /** Shows a scene at the corner of the glass: elsewhere part of it may lie where no click reaches it. */
    public static void show(Stage stage, Scene scene) {
        stage.setScene(scene);
        stage.sizeToScene();
        stage.setX(0);
        stage.setY(0);
        stage.show();
        // A popup that an earlier window closed under may still have the platform's keys.
        stage.requestFocus();
    }

    /** A dressed and laid out scene on a stage. */
    public static Scene show(Parent root, Light light, Density density, double width, double height) {
        Stage stage = new Stage();
        Scene scene = new Scene(root, width, height);
        Theme.apply(scene, light, density);
        stage.setScene(scene);
        stage.show();
        root.applyCss();
        root.layout();
        return scene;
    }

    /**
     * Writes a scene into {@code target/pictures}, with so many pixels for each logical one. Fails where the scene
     * leaves part of the glass bare, or shows next to nothing.
     */
    public static void picture(String name, Supplier<Parent> root, Light light, Density density, double width,
                               double height, double scale) throws Exception {
        on(() -> {
            Scene scene = show(root.get(), light, density, width, height);
            write(PICTURES.resolve(name + ".png"), scene, scale);
            scene.getWindow().hide();
            return name;
        });
    }

    /** Writes what a scene shows into a file. */
    public static void write(Path file, Scene scene) throws IOException {
        write(file, scene, 1);
    }

    private static void write(Path file, Scene scene, double scale) throws IOException {
        scene.getRoot().applyCss();
        scene.getRoot().layout();
        SnapshotParameters parameters = new SnapshotParameters();
        parameters.setTransform(Transform.scale(scale, scale));
        parameters.setViewport(new Rectangle2D(0, 0, scene.getWidth() * scale, scene.getHeight() * scale));
        parameters.setFill(Color.MAGENTA);
        write(file, scene.getRoot().snapshot(parameters, null));
    }

    private static void write(Path file, WritableImage image) throws IOException {
        int width = (int) image.getWidth();
        int height = (int) image.getHeight();
        int[] pixels = new int[width * height];
        image.getPixelReader().getPixels(0, 0, width, height, PixelFormat.getIntArgbInstance(), pixels, 0, width);
        Palette palette = Palette.of(pixels);
        assertFalse(palette.holds(0xFF00FF), "part of the glass is bare");
        assertTrue(palette.colours() > 50, "next to nothing is shown");
        Files.createDirectories(file.toAbsolutePath().getParent());
        ImageIO.write(palette.paint(pixels, width, height), "png", file.toFile());
    }
}
