package bedmark.screen.office;

import static org.junit.jupiter.api.Assertions.assertTrue;

import com.sun.javafx.scene.input.DragboardHelper;
import com.sun.javafx.tk.TKClipboard;
import java.io.File;
import java.lang.reflect.Proxy;
import java.nio.file.Path;
import java.util.List;
import java.util.Set;
import javafx.event.EventType;
import javafx.scene.Node;
import javafx.scene.input.DataFormat;
import javafx.scene.input.DragEvent;
import javafx.scene.input.Dragboard;
import javafx.scene.input.PickResult;
import javafx.scene.input.TransferMode;

/** Files that a person drags from elsewhere: a headless glass has no elsewhere, but takes the events of one. */
final class DroppedFiles {
    private DroppedFiles() {
    }

    /** Drags files over a place, which has to accept them, and drops them there. */
    static void onto(Node place, List<Path> files) {
        List<File> dragged = files.stream().map(Path::toFile).toList();
        TKClipboard content = (TKClipboard) Proxy.newProxyInstance(TKClipboard.class.getClassLoader(),
                new Class<?>[] {TKClipboard.class}, (proxy, method, arguments) -> switch (method.getName()) {
                    case "hasContent" -> DataFormat.FILES.equals(arguments[0]);
                    case "getContent" -> DataFormat.FILES.equals(arguments[0]) ? dragged : null;
                    case "getContentTypes" -> Set.of(DataFormat.FILES);
                    case "getTransferModes" -> Set.of(TransferMode.COPY);
                    default -> null;
                });
        Dragboard board = DragboardHelper.createDragboard(content);
        DragEvent over = event(place, DragEvent.DRAG_OVER, board);
        place.getOnDragOver().handle(over);
        assertTrue(over.isAccepted(), "files are accepted");
        DragEvent dropped = event(place, DragEvent.DRAG_DROPPED, board);
        place.getOnDragDropped().handle(dropped);
        assertTrue(dropped.isDropCompleted(), "files were taken");
    }

    private static DragEvent event(Node place, EventType<DragEvent> type, Dragboard board) {
        return new DragEvent(place, place, type, board, 5, 5, 5, 5, TransferMode.COPY, null, place,
                new PickResult(place, 5, 5));
    }
}
