package bedmark.screen.settings;

import bedmark.quantity.Unit;
import bedmark.quantity.UnitSystem;
import bedmark.screen.Heads;
import bedmark.screen.Lighting;
import bedmark.screen.Preferences;
import bedmark.screen.SidedScreen;
import bedmark.screen.Workplace;
import bedmark.screen.part.ActionButton;
import bedmark.screen.part.ChoiceRow;
import bedmark.screen.part.FootBar;
import bedmark.screen.part.Labels;
import bedmark.screen.part.SectionHeader;
import bedmark.screen.part.Weight;
import bedmark.screen.theme.Icon;
import bedmark.screen.theme.TextSize;
import bedmark.screen.part.Pair;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.UnaryOperator;
import java.util.stream.Stream;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.TextField;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/** The settings, and beside them the limits by which the site judges. */
public final class SettingsView extends SidedScreen {
    private final Workplace workplace;
    private final SettingsModel model;
    private final Wording wording;
    private final VBox questions = new VBox();
    private final ScrollPane scroll = new ScrollPane(questions);
    private final TextField person = new TextField();
    private final TextField device = new TextField();

    /** @param back to where the person came from */
    public SettingsView(Workplace workplace, SettingsModel model, Runnable back) {
        super("summary");
        this.workplace = workplace;
        this.model = model;
        this.wording = workplace.wording();
        ActionButton done = ActionButton.with(Icon.CHECK, ContentDisplay.RIGHT, Weight.PRIMARY,
                wording.text("settings.done"), back);
        done.setId("settings-done");
        frame(Heads.head(workplace, listening, wording.text("settings.title"), wording.text("settings.subtitle")),
                new FootBar(Optional.empty(), Optional.of(Labels.wrapped("foot-note",
                        wording.text("settings.kept"))), Optional.of(done)));
        questions.getStyleClass().add("questions");
        side.getStyleClass().add("summary");
        scroll.setFitToWidth(true);
        scroll.setFocusTraversable(false);
        scroll.getStyleClass().add("form-scroll");
        body.getStyleClass().add("settings-body");
        body.setCenter(scroll);
        ask();
        limits();
    }

    private void ask() {
        Preferences now = model.preferences();
        questions.getChildren().addAll(
                new Pair(text("person", "settings.person", person, now.person()),
                        text("device-name", "settings.device", device, model.deviceName())),
                new Pair(row("settings.language", languages(now)), row("settings.light", lights(now))),
                new Pair(row("settings.hand", hands(now)), row("settings.text", texts(now))),
                density(now),
                new SectionHeader(wording.text("settings.units")), row("settings.units.system", systems(now)));
        List<SettingsModel.Measured> measured = model.measured();
        for (int i = 0; i < measured.size(); i += 2) {
            questions.getChildren().add(new Pair(units(measured.get(i), now), units(measured.get(i + 1), now)));
        }
        questions.getChildren().addAll(new SectionHeader(wording.text("settings.folders")),
                folder("watched", "settings.watched", now.watchedFolder(),
                        () -> model.chooseWatched(wording.text("settings.watched"))),
                folder("export", "settings.export", now.exportFolder(),
                        () -> model.chooseExport(wording.text("settings.export"))));
        listening.to(workplace.preferencesProperty(), changed -> {
            path("watched", changed.watchedFolder());
            path("export", changed.exportFolder());
        });
        Label trouble = Labels.wrapped("trouble-text", "");
        trouble.managedProperty().bind(trouble.textProperty().isNotEmpty());
        listening.to(model.troubleProperty(), defect -> trouble.setText(defect.map(wording::sentence).orElse("")));
        questions.getChildren().add(trouble);
    }

    private VBox text(String id, String question, TextField field, String value) {
        field.setId(id);
        field.setText(value);
        field.setAccessibleText(wording.text(question));
        field.getStyleClass().add("secondary-target");
        Label label = new Label(wording.text(question));
        label.setLabelFor(field);
        VBox box = new VBox(label, field);
        box.getStyleClass().add("question");
        listening.onChange(field.focusedProperty(), focused -> {
            if (!focused) {
                keepTexts();
            }
        });
        field.setOnAction(event -> keepTexts());
        return box;
    }

    private void keepTexts() {
        String name = person.getText().strip();
        if (!name.equals(model.preferences().person())) {
            model.prefer(now -> now.withPerson(name));
        }
        model.nameDevice(device.getText());
    }

    private ChoiceRow row(String question, List<ChoiceRow.Option> options) {
        return new ChoiceRow(wording.text(question), options);
    }

    private ChoiceRow.Option option(String id, String text, boolean holds, UnaryOperator<Preferences> change) {
        return new ChoiceRow.Option(id, text, holds, () -> {
            keepTexts();
            model.focusProperty().set(id);
            model.scrollProperty().set(scroll.getVvalue());
            model.prefer(change);
        });
    }

    private List<ChoiceRow.Option> languages(Preferences now) {
        return Words.LANGUAGES.stream().map(locale -> option("language-" + locale.getLanguage(),
                Words.nameOf(locale),
                now.locale().getLanguage().equals(locale.getLanguage()), likes -> likes.withLocale(locale))).toList();
    }

    private List<ChoiceRow.Option> lights(Preferences now) {
        return Stream.of(Lighting.values()).map(one -> option("light-" + one.code(),
                wording.text("settings.light." + one.code()), now.lighting() == one,
                likes -> likes.withLighting(one))).toList();
    }

    private List<ChoiceRow.Option> hands(Preferences now) {
        return List.of(option("hand-bare", wording.text("screen.start.hand.bare"), !now.gloves(),
                        likes -> likes.withGloves(false)),
                option("hand-gloved", wording.text("screen.start.hand.gloved"), now.gloves(),
                        likes -> likes.withGloves(true)));
    }

    private List<ChoiceRow.Option> texts(Preferences now) {
        return Stream.of(TextSize.values()).map(size -> option("text-" + size.code(),
                wording.text("settings.text." + size.code()), now.text() == size,
                likes -> likes.withText(size))).toList();
    }

    private List<ChoiceRow.Option> systems(Preferences now) {
        return Stream.of(UnitSystem.values()).map(system -> option("units-" + system.code(),
                wording.text("screen.start.units." + system.code()), now.units() == system,
                likes -> likes.withUnits(system))).toList();
    }

    private ChoiceRow units(SettingsModel.Measured measured, Preferences now) {
        Unit held = now.chosenUnits().getOrDefault(measured.usual(), measured.usual());
        return row("settings.measured." + measured.code(), measured.units().stream()
                .map(unit -> option("unit-" + measured.code() + "-" + unit.key(), wording.symbol(unit), unit == held,
                        likes -> likes.withChosenUnit(measured.usual(), unit))).toList());
    }

    /** The density is set by a ruler: the line below is as long as it says once the density is right. */
    private VBox density(Preferences now) {
        HBox row = new HBox(dpi(-10), dpi(-1), dpiValue(now), dpi(1), dpi(10));
        row.getStyleClass().add("row");
        row.setAlignment(Pos.CENTER);
        Region ruler = new Region();
        ruler.getStyleClass().add("ruler");
        Label words = Labels.wrapped("ruler-words", wording.text("settings.ruler"));
        HBox.setHgrow(words, Priority.ALWAYS);
        HBox measure = new HBox(ruler, words);
        measure.getStyleClass().add("measure");
        measure.setAlignment(Pos.CENTER_LEFT);
        VBox box = new VBox(new Label(wording.text("settings.density")), row, measure);
        box.getStyleClass().add("question");
        return box;
    }

    private Label dpiValue(Preferences now) {
        Label value = new Label(wording.text("settings.dpi", wording.format().computed(now.dpi(), 0)));
        value.setId("dpi");
        value.getStyleClass().add("stepped");
        value.setMaxWidth(Double.MAX_VALUE);
        HBox.setHgrow(value, Priority.ALWAYS);
        return value;
    }

    private ActionButton dpi(int by) {
        String id = "dpi" + (by < 0 ? "-down" : "-up") + Math.abs(by);
        ActionButton button = new ActionButton(Weight.PLAIN, (by < 0 ? "\u2212" : "+") + Math.abs(by), () -> {
            keepTexts();
            model.focusProperty().set(id);
            model.scrollProperty().set(scroll.getVvalue());
            model.changeDpi(by);
        });
        button.setId(id);
        button.setAccessibleText(wording.text("settings.density") + " " + button.getText());
        button.getStyleClass().add("secondary-target");
        return button;
    }

    private VBox folder(String id, String question, Optional<String> path, Runnable choose) {
        Label where = Labels.wrapped("path", "");
        where.setId(id + "-path");
        where.setMaxWidth(Double.MAX_VALUE);
        HBox.setHgrow(where, Priority.ALWAYS);
        ActionButton button = new ActionButton(Weight.PLAIN, wording.text("settings.choose"), choose);
        button.setId(id + "-choose");
        button.setAccessibleText(wording.text(question) + ": " + button.getText());
        button.getStyleClass().add("secondary-target");
        HBox row = new HBox(where, button);
        row.getStyleClass().add("row");
        row.setAlignment(Pos.CENTER_LEFT);
        VBox box = new VBox(new Label(wording.text(question)), row);
        box.getStyleClass().add("question");
        return box;
    }

    private void path(String id, Optional<String> path) {
        Optional.ofNullable(questions.lookup("#" + id + "-path")).ifPresent(label ->
                ((Label) label).setText(path.orElse(wording.text("settings.no-folder"))));
    }

    /** The limits: each rule with where it begins to warn and where it says overloaded, and who set it. */
    private void limits() {
        VBox list = new VBox();
        list.getStyleClass().add("rows");
        for (SettingsModel.RuleLimit limit : model.limits()) {
            Label name = Labels.wrapped("rule-name", wording.text("rule." + limit.rule().code()));
            Label values = Labels.wrapped("rule-limits", values(limit));
            VBox row = new VBox(name, values);
            row.getStyleClass().add("limit-row");
            list.getChildren().add(row);
        }
        ScrollPane limits = new ScrollPane(list);
        limits.setFitToWidth(true);
        limits.setFocusTraversable(true);
        limits.setId("limits");
        limits.setAccessibleText(wording.text("settings.limits"));
        limits.getStyleClass().addAll("form-scroll", "limits-scroll");
        VBox.setVgrow(limits, Priority.ALWAYS);
        side.getChildren().addAll(new SectionHeader(wording.text("settings.limits")),
                Labels.wrapped("limits-words", wording.text("settings.limits.words")), limits);
    }

    private String values(SettingsModel.RuleLimit limit) {
        if (!limit.limit().on()) {
            return wording.text("settings.limits.off");
        }
        List<String> parts = new ArrayList<>();
        number(limit.limit().near()).ifPresent(near -> parts.add(wording.text("settings.limits.near", near)));
        number(limit.limit().overloaded()).ifPresent(over -> parts.add(wording.text("settings.limits.over", over)));
        parts.add(limit.ofSite() ? wording.text("settings.limits.site")
                : wording.text("settings.limits.shipped", limit.limit().source()));
        return String.join(" \u00B7 ", parts);
    }

    private Optional<String> number(OptionalDouble number) {
        return number.isPresent() ? Optional.of(wording.format().exact(BigDecimal.valueOf(number.getAsDouble())))
                : Optional.empty();
    }

    @Override
    public void shown() {
        scroll.applyCss();
        scroll.layout();
        scroll.setVvalue(model.scrollProperty().get());
        Optional.of(model.focusProperty().get()).filter(id -> !id.isEmpty())
                .flatMap(id -> Optional.ofNullable(questions.lookup("#" + id)))
                .ifPresentOrElse(Node::requestFocus, body::requestFocus);
    }

    @Override
    public void left() {
        keepTexts();
        super.left();
    }
}
