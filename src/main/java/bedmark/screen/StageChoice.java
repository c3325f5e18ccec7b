package bedmark.screen;

import java.io.File;
import java.nio.file.Path;
import java.util.Optional;
import javafx.stage.DirectoryChooser;
import javafx.stage.FileChooser;
import javafx.stage.Stage;

/** Asks by the dialogs of the machine, over one window; nothing is asked before that is there. */
public final class StageChoice implements FolderChoice {
    private Stage stage;

    /** Asks over a window that is there. */
    public StageChoice(Stage stage) {
        this.stage = stage;
    }

    /** Asks over the window that is still to come. */
    StageChoice() {
    }

    /** From now on asks over that window. Called by the screen. */
    void over(Stage window) {
        stage = window;
    }

    @Override
    public Optional<Path> choose(String title, Optional<Path> start) {
        DirectoryChooser chooser = new DirectoryChooser();
        chooser.setTitle(title);
        start.map(Path::toFile).filter(File::isDirectory).ifPresent(chooser::setInitialDirectory);
        return Optional.ofNullable(chooser.showDialog(stage)).map(File::toPath);
    }

    @Override
    public Optional<Path> choosePhoto(String title, Optional<Path> start) {
        FileChooser chooser = new FileChooser();
        chooser.setTitle(title);
        chooser.getExtensionFilters().add(new FileChooser.ExtensionFilter("JPEG, PNG", "*.jpg", "*.jpeg", "*.png",
                "*.JPG", "*.JPEG", "*.PNG"));
        start.map(Path::toFile).filter(File::isDirectory).ifPresent(chooser::setInitialDirectory);
        return Optional.ofNullable(chooser.showOpenDialog(stage)).map(File::toPath);
    }
}
