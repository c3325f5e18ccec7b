package bedmark.screen;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.screen.part.FieldBox;
import java.nio.file.Path;
import java.time.Clock;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javafx.scene.Node;
import javafx.scene.Parent;
import javafx.scene.input.KeyCode;
import javafx.scene.layout.Region;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A transfer point with the keyboard alone: Tab goes through the form in its order, and its ring is seen. */
class TabOrderTest {
    private static final int MOST = 60;

    @TempDir
    private Path temp;

    private TabletApp app;

    @Test
    void tabFollowsTheFormAndItsRingIsSeen() throws Exception {
        try (TabletApp opened = new TabletApp(temp.resolve("store"), Optional.of(Path.of("sample-surveys")), temp,
                Clock.systemUTC(), 1280, 800)) {
            app = opened;
            app.setOutOnDemo();
            app.click("stop-TP-19");
            app.until(() -> app.has("verdict"));
            app.click("slot-permit");
            assertEquals("text-entry", focused().getId(), "a text is typed at once");
            app.type("LOTO 1");

            List<String> form = boxes().stream().map(Node::getId).toList();
            List<String> walked = new ArrayList<>(List.of("slot-permit"));
            for (int i = 0; i < MOST && walked.size() < form.size(); i++) {
                app.press(KeyCode.TAB);
                String active = active().getId();
                if (!active.equals(walked.get(walked.size() - 1))) {
                    walked.add(active);
                }
                if (focused() instanceof FieldBox box) {
                    assertTrue(box.activeProperty().get(), "the focus and the pad are at one box");
                    Region region = box;
                    assertEquals(3, region.getBackground().getFills().get(1).getInsets().getTop(), "the ring is seen");
                }
            }
            assertEquals(form, walked);
            assertEquals("LOTO 1", boxes().get(0).valueProperty().get());
        }
    }

    private Node focused() {
        return app.shell().scene().getFocusOwner();
    }

    private FieldBox active() {
        return boxes().stream().filter(box -> box.activeProperty().get()).findFirst().orElseThrow();
    }

    private List<FieldBox> boxes() {
        List<FieldBox> boxes = new ArrayList<>();
        gather(app.shell().scene().getRoot(), boxes);
        return boxes;
    }

    private static void gather(Parent parent, List<FieldBox> boxes) {
        for (Node child : parent.getChildrenUnmodifiable()) {
            if (child instanceof FieldBox box) {
                boxes.add(box);
            } else if (child instanceof Parent inner) {
                gather(inner, boxes);
            }
        }
    }
}
