package bedmark.screen.office;

import bedmark.screen.ClockedLight;
import bedmark.screen.Listening;
import bedmark.screen.LookButtons;
import bedmark.screen.ToolkitLanguage;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.Texts;
import bedmark.screen.part.TopBar;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Hand;
import bedmark.screen.theme.Theme;
import bedmark.survey.merge.ZoneId;
import bedmark.wording.Wording;
import java.util.Optional;
import javafx.application.Platform;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.Scene;
import javafx.scene.control.Label;
import javafx.scene.control.ProgressBar;
import javafx.scene.control.TextField;
import javafx.scene.control.ToggleButton;
import javafx.scene.control.ToggleGroup;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/** The one window of the office: its rooms in a row at the top, below them the one that is open. */
public final class OfficeShell {

    /** The rooms. */
    public enum Room {
        WORST("worst"), RECEIVE("receive"), ENERGY("energy"), REGISTER("register"), REPORT("report");

        private final String code;

        Room(String code) {
            this.code = code;
        }
    }

    private static final int FOUND_SHOWN = 4;

    private final OfficeDesk desk;
    private final BorderPane root = new BorderPane();
    private final Scene scene;
    private final ClockedLight light;
    private final ReceiveModel receive;
    private final OfficeNameModel name;
    private final WorstModel worst;
    private RegisterModel register;
    private Room room = Room.WORST;
    private Optional<ZoneStoryModel> story = Optional.empty();
    private Listening shown = new Listening();

    /** A window of that size; the worst zones are shown first. */
    public OfficeShell(OfficeDesk desk, double width, double height) {
        this.desk = desk;
        this.receive = new ReceiveModel(desk);
        receive.lookBack();
        receive.lookAtRefused();
        this.name = new OfficeNameModel(desk);
        this.worst = new WorstModel(desk);
        this.scene = new Scene(root, width, height);
        this.light = new ClockedLight(desk.clock(), () -> desk.preferences().lighting(), now ->
                Theme.applyOffice(scene, now, new Density(desk.preferences().dpi(), Hand.BARE)));
        root.getStyleClass().add("office");
        dress();
        desk.preferencesProperty().addListener((property, before, now) -> {
            if (!before.withPerson("").equals(now.withPerson(""))) {
                dress();
                again();
            }
        });
        open(Room.WORST);
    }

    public Scene scene() {
        return scene;
    }

    private void dress() {
        ToolkitLanguage.set(desk.preferences().locale());
        light.dress();
    }

    /** Looks whether the clock brought another light, as it does by itself every few seconds. */
    void followClock() {
        light.follow();
    }

    /** Opens a room. */
    public void open(Room next) {
        room = next;
        story = Optional.empty();
        show(switch (next) {
            case WORST -> new WorstView(desk, worst, begin(), this::zone);
            case RECEIVE -> new ReceiveView(desk, receive, name, begin());
            case ENERGY -> energy(begin());
            case REGISTER -> new RegisterView(desk, register(), begin());
            case REPORT -> new ReportView(desk, new ReportModel(desk), begin());
        });
    }

    /** What is typed into the register waits there while other rooms are looked at. */
    private RegisterModel register() {
        if (register == null) {
            register = new RegisterModel(desk);
        }
        return register;
    }

    private EnergyView energy(Listening now) {
        return new EnergyView(desk, new EnergyModel(desk, now), now);
    }

    /** Opens one zone. */
    public void zone(ZoneId zone) {
        room = Room.WORST;
        story = Optional.of(new ZoneStoryModel(desk, zone));
        show(story.get());
    }

    private void show(ZoneStoryModel model) {
        show(new ZoneStoryView(desk, model, begin(), () -> open(Room.WORST)));
    }

    /** The same in other words or another light; what is typed for a zone stays with it. */
    private void again() {
        story.ifPresentOrElse(this::show, () -> open(room));
    }

    private Listening begin() {
        shown.end();
        shown = new Listening();
        return shown;
    }

    private void show(Node content) {
        root.setTop(head());
        root.setCenter(content);
        // The name at the top would take the first keys.
        Platform.runLater(content::requestFocus);
    }

    private Node head() {
        Wording wording = desk.wording();
        TextField person = new TextField(desk.person());
        person.setId("person");
        person.setPromptText(wording.text("office.person"));
        person.setAccessibleText(wording.text("office.person"));
        person.textProperty().addListener((property, before, now) ->
                desk.preferencesProperty().set(desk.preferences().withPerson(now.strip())));
        HBox more = new HBox(person, LookButtons.language(desk.preferencesProperty()),
                LookButtons.light(desk.preferencesProperty()));
        more.getStyleClass().add("more");
        TopBar bar = new TopBar(more);
        bar.titleProperty().set(wording.text("screen.name"));
        bar.subtitleProperty().set(wording.text("office.title"));
        return new VBox(bar, rooms(wording), progress(wording), found(wording), trouble(wording));
    }

    private Node rooms(Wording wording) {
        HBox tabs = new HBox();
        tabs.getStyleClass().add("rooms");
        ToggleGroup group = new ToggleGroup();
        for (Room one : Room.values()) {
            ToggleButton tab = new ToggleButton(wording.text("office.room." + one.code));
            tab.setId("room-" + one.code);
            tab.setToggleGroup(group);
            tab.setSelected(one == room);
            tab.setMaxWidth(Double.MAX_VALUE);
            tab.setPrefWidth(100);
            tab.setOnAction(event -> open(one));
            HBox.setHgrow(tab, Priority.ALWAYS);
            tabs.getChildren().add(tab);
            if (one == Room.RECEIVE) {
                shown.to(receive.refusedProperty(), refused -> count(tab, refused.size(), wording));
            }
        }
        return tabs;
    }

    /** Whoever comes in the morning looks at the worst zones first. */
    private static void count(ToggleButton tab, int refused, Wording wording) {
        String name = wording.text("office.room.receive");
        tab.setText(refused == 0 ? name : name + " (" + refused + ")");
        tab.setAccessibleText(wording.text("office.room.receive-refused", refused));
    }

    private Node progress(Wording wording) {
        ProgressBar bar = new ProgressBar();
        bar.setMaxWidth(Double.MAX_VALUE);
        HBox.setHgrow(bar, Priority.ALWAYS);
        ActionButton cancel = new ActionButton(Weight.PLAIN, wording.text("office.cancel"), desk::cancel);
        cancel.setId("cancel");
        HBox box = new HBox(bar, cancel);
        box.getStyleClass().add("work");
        box.managedProperty().bind(box.visibleProperty());
        shown.to(desk.progressProperty(), share -> {
            // Work that is done at once would only flicker.
            box.setVisible(share.doubleValue() > 0);
            bar.setProgress(share.doubleValue());
        });
        return box;
    }

    private Node found(Wording wording) {
        VBox sentences = new VBox();
        sentences.setMinWidth(0);
        HBox.setHgrow(sentences, Priority.ALWAYS);
        ActionButton seen = new ActionButton(Weight.PLAIN, wording.text("office.seen"), desk::seen);
        seen.setId("found-seen");
        seen.setMinWidth(Region.USE_PREF_SIZE);
        HBox box = new HBox(sentences, seen);
        box.getStyleClass().add("trouble");
        box.setAlignment(Pos.CENTER_LEFT);
        box.managedProperty().bind(box.visibleProperty());
        shown.to(desk.foundProperty(), defects -> {
            box.setVisible(!defects.isEmpty());
            sentences.getChildren().setAll(defects.stream().limit(FOUND_SHOWN)
                    .map(defect -> Texts.trouble(wording.sentence(defect))).toList());
        });
        return box;
    }

    private Node trouble(Wording wording) {
        Label words = Texts.trouble("");
        words.setMaxWidth(Double.MAX_VALUE);
        HBox box = new HBox(words);
        HBox.setHgrow(words, Priority.ALWAYS);
        box.getStyleClass().add("trouble");
        box.setMinHeight(Region.USE_PREF_SIZE);
        box.managedProperty().bind(box.visibleProperty());
        shown.to(desk.troubleProperty(), defect -> {
            box.setVisible(defect.isPresent());
            words.setText(defect.map(wording::sentence).orElse(""));
        });
        return box;
    }

    /** Lets go of the screen and closes the store. */
    public void close() {
        shown.end();
        light.stop();
        receive.close();
        desk.close();
    }
}
