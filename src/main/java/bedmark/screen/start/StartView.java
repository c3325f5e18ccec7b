package bedmark.screen.start;

import bedmark.quantity.UnitSystem;
import bedmark.screen.Heads;
import bedmark.screen.Lighting;
import bedmark.screen.Navigator;
import bedmark.screen.Preferences;
import bedmark.screen.SidedScreen;
import bedmark.screen.Workplace;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.ChoiceRow;
import bedmark.screen.part.FootBar;
import bedmark.screen.part.Labels;
import bedmark.screen.part.Pair;
import bedmark.screen.part.RoundTicks;
import bedmark.screen.part.Weight;
import bedmark.screen.round.RoundModel;
import bedmark.screen.round.Ticks;
import bedmark.screen.settings.SettingsModel;
import bedmark.screen.theme.Icon;
import bedmark.survey.Round;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.TextField;
import javafx.scene.control.ToggleButton;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/** The start of a walk: who, which round, how the screen is to be; beside it the safety card. */
public final class StartView extends SidedScreen {
    private static final int CAUTIONS = 6;

    private final Workplace workplace;
    private final StartModel model;
    private final Navigator navigator;
    private final Wording wording;
    private final VBox questions = new VBox();
    private final ScrollPane scroll = new ScrollPane(questions);
    private final TextField person = new TextField();
    private final RoundTakingPane office;

    public StartView(Workplace workplace, StartModel model, Navigator navigator) {
        super("safety-card");
        this.workplace = workplace;
        this.model = model;
        this.navigator = navigator;
        this.wording = workplace.wording();
        ActionButton settings = ActionButton.with(Icon.SETTINGS, ContentDisplay.LEFT, Weight.PLAIN,
                wording.text("settings.title"), navigator::toSettings);
        settings.setId("to-settings");
        settings.getStyleClass().add("secondary-target");
        frame(Heads.head(workplace, listening, wording.text("screen.name"), wording.text("screen.start.title"),
                settings), footBar());
        office = new RoundTakingPane(workplace, model.taking(), listening);
        questions.getStyleClass().add("questions");
        side.getStyleClass().add("safety-card");
        scroll.setFitToWidth(true);
        scroll.getStyleClass().add("form-scroll");
        body.getStyleClass().add("start-body");
        body.setCenter(scroll);
        safetyCard();
        listening.to(workplace.siteProperty(), site -> ask());
        listening.onChange(model.loadingProperty(), share -> ask());
        listening.onChange(model.troubleProperty(), trouble -> ask());
    }

    private void ask() {
        model.chooseRound();
        questions.getChildren().clear();
        if (!model.hasPlant() || model.loadingProperty().get() >= 0) {
            questions.getChildren().addAll(new FirstStart(workplace, model, navigator, office),
                    choice("screen.start.language", languages()));
            return;
        }
        person.setId("person");
        person.setAccessibleText(wording.text("screen.start.person"));
        person.setPromptText(wording.text("screen.start.person-prompt"));
        if (!person.textProperty().isBound()) {
            person.setText(model.personProperty().get());
            model.personProperty().bind(person.textProperty());
        }
        Label name = new Label(wording.text("screen.start.person"));
        name.setLabelFor(person);
        questions.getChildren().addAll(name, person);
        if (model.rounds().isEmpty()) {
            questions.getChildren().add(wrapped(wording.text("first.no-round")));
        } else {
            questions.getChildren().addAll(choice("screen.start.round", rounds()), progress());
        }
        questions.getChildren().addAll(limits(),
                new Pair(choice("screen.start.units", units()), choice("screen.start.language", languages())),
                new Pair(choice("screen.start.light", lights()), choice("screen.start.hand", hands())), office);
    }

    /** How far the chosen round is: in words, and as its strip of ticks. */
    private HBox progress() {
        RoundModel round = new RoundModel(workplace, model.roundProperty().get());
        RoundTicks ticks = new RoundTicks();
        Ticks.show(ticks, round.rowsProperty().get(), "", wording);
        HBox.setHgrow(ticks, Priority.ALWAYS);
        Label words = new Label(wording.text("screen.round.progress", round.done(), round.rowsProperty().get().size()));
        words.setMinWidth(Region.USE_PREF_SIZE);
        HBox progress = new HBox(words, ticks);
        progress.getStyleClass().add("progress");
        return progress;
    }

    /** By which limits is judged: how many the site set, and where all of them are seen. */
    private Label limits() {
        SettingsModel settings = new SettingsModel(workplace);
        return Labels.wrapped("limits", wording.text("settings.limits.short", settings.changedLimits(),
                settings.limits().size()));
    }

    private ChoiceRow choice(String key, List<ChoiceRow.Option> options) {
        return new ChoiceRow(wording.text(key), options);
    }

    private List<ChoiceRow.Option> rounds() {
        return model.rounds().stream().map(round -> new ChoiceRow.Option("round-" + round.id(), round.name(),
                round.equals(model.roundProperty().get()), () -> {
                    model.roundProperty().set(round);
                    ask();
                })).toList();
    }

    private List<ChoiceRow.Option> units() {
        return List.of(UnitSystem.values()).stream().map(system -> new ChoiceRow.Option("units-" + system.code(),
                wording.text("screen.start.units." + system.code()), workplace.preferences().units() == system,
                () -> prefer(workplace.preferences().withUnits(system)))).toList();
    }

    private List<ChoiceRow.Option> languages() {
        return Words.LANGUAGES.stream().map(locale -> new ChoiceRow.Option("language-" + locale.getLanguage(),
                Words.nameOf(locale),
                workplace.preferences().locale().getLanguage().equals(locale.getLanguage()),
                () -> prefer(workplace.preferences().withLocale(locale)))).toList();
    }

    private List<ChoiceRow.Option> lights() {
        return Stream.of(Lighting.values()).map(one -> new ChoiceRow.Option("light-" + one.code(),
                wording.text("settings.light." + one.code()), workplace.preferences().lighting() == one,
                () -> prefer(workplace.preferences().withLighting(one)))).toList();
    }

    private List<ChoiceRow.Option> hands() {
        boolean gloves = workplace.preferences().gloves();
        return List.of(new ChoiceRow.Option("hand-bare", wording.text("screen.start.hand.bare"), !gloves,
                        () -> prefer(workplace.preferences().withGloves(false))),
                new ChoiceRow.Option("hand-gloved", wording.text("screen.start.hand.gloved"), gloves,
                        () -> prefer(workplace.preferences().withGloves(true))));
    }

    private void prefer(Preferences changed) {
        workplace.preferencesProperty().set(changed);
        ask();
    }

    private void safetyCard() {
        Label title = wrapped(wording.text("screen.safety.title"));
        title.getStyleClass().add("card-title");
        side.getChildren().add(title);
        for (int i = 1; i <= CAUTIONS; i++) {
            side.getChildren().add(wrapped(wording.text("screen.safety." + i)));
        }
        ToggleButton read = new ToggleButton(wording.text("screen.safety.read"));
        read.setId("caution-read");
        read.setWrapText(true);
        read.setMaxWidth(Double.MAX_VALUE);
        read.setSelected(model.cautionReadProperty().get());
        // What is read is read: pressing again takes nothing back.
        read.setOnAction(event -> {
            read.setSelected(true);
            model.cautionReadProperty().set(true);
        });
        side.getChildren().add(read);
    }

    private static Label wrapped(String text) {
        Label label = new Label(text);
        label.setWrapText(true);
        label.setMinHeight(Region.USE_PREF_SIZE);
        return label;
    }

    private FootBar footBar() {
        ActionButton start = ActionButton.with(Icon.NEXT, ContentDisplay.RIGHT, Weight.PRIMARY,
                wording.text("screen.start.start"), this::start);
        start.setId("start-walk");
        start.disableProperty().bind(model.ready().not());
        Label version = new Label(wording.text("screen.notice-short"));
        version.setWrapText(true);
        ActionButton store = new ActionButton(Weight.QUIET, wording.text("store.title"),
                () -> navigator.toStore(navigator::toStart));
        store.setId("to-store");
        return new FootBar(Optional.of(store), Optional.of(version), Optional.of(start));
    }

    private void start() {
        Round round = model.roundProperty().get();
        model.start(() -> navigator.toRound(new RoundModel(workplace, round)));
    }

    @Override
    public void shown() {
        if (model.hasPlant() && model.personProperty().get().isEmpty()) {
            person.requestFocus();
        } else {
            body.requestFocus();
        }
    }

    @Override
    public void left() {
        model.personProperty().unbind();
        super.left();
    }
}
