package bedmark.screen.settings;

import bedmark.document.Defect;
import bedmark.engine.verdict.Limit;
import bedmark.engine.verdict.Limits;
import bedmark.engine.verdict.Rule;
import bedmark.journal.NotSaved;
import bedmark.quantity.Dimension;
import bedmark.quantity.Unit;
import bedmark.screen.Preferences;
import bedmark.screen.Workplace;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.function.UnaryOperator;
import java.util.stream.Stream;
import javafx.beans.property.DoubleProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleDoubleProperty;
import javafx.beans.property.SimpleStringProperty;
import javafx.beans.property.StringProperty;

/** The settings: each holds at once and is kept with the store. */
public final class SettingsModel {
    private static final double LEAST_DPI = 90;
    private static final double MOST_DPI = 400;

    private final Workplace workplace;
    private final DoubleProperty scroll = new SimpleDoubleProperty();
    private final StringProperty focus = new SimpleStringProperty("");
    private final ReadOnlyObjectWrapper<Optional<Defect>> trouble = new ReadOnlyObjectWrapper<>(Optional.empty());

    public SettingsModel(Workplace workplace) {
        this.workplace = workplace;
    }

    public Preferences preferences() {
        return workplace.preferences();
    }

    /** Changes what the person likes; many a change shows the screen anew. */
    public void prefer(UnaryOperator<Preferences> change) {
        workplace.preferencesProperty().set(change.apply(preferences()));
    }

    /** How far the settings are scrolled, so that a screen that is shown anew stands where it stood. */
    public DoubleProperty scrollProperty() {
        return scroll;
    }

    /** The id of what was pressed last. */
    public StringProperty focusProperty() {
        return focus;
    }

    /** Why the last setting could not be kept. */
    public ReadOnlyObjectProperty<Optional<Defect>> troubleProperty() {
        return trouble.getReadOnlyProperty();
    }

    public String deviceName() {
        return workplace.store().device().name();
    }

    /** Gives the tablet another name; a blank one changes nothing. */
    public void nameDevice(String name) {
        String wanted = name.strip();
        if (wanted.isEmpty() || wanted.equals(deviceName())) {
            return;
        }
        workplace.longWork().execute(() -> {
            Optional<Defect> failed = Optional.empty();
            try {
                workplace.store().nameDevice(wanted);
            } catch (NotSaved e) {
                failed = Optional.of(e.defect());
            }
            Optional<Defect> outcome = failed;
            workplace.screen().execute(() -> trouble.set(outcome));
        });
    }

    /** Sets the density of the glass a little higher or lower. */
    public void changeDpi(double by) {
        prefer(now -> now.withDpi(Math.max(LEAST_DPI, Math.min(MOST_DPI, now.dpi() + by))));
    }

    /** Asks for a folder that photos are taken from. */
    public void chooseWatched(String title) {
        workplace.folderChoice().choose(title, preferences().watchedFolder().map(Path::of))
                .ifPresent(folder -> prefer(now -> now.withWatchedFolder(Optional.of(folder.toString()))));
    }

    /** Asks for the folder that packs go to first. */
    public void chooseExport(String title) {
        workplace.folderChoice().choose(title, preferences().exportFolder().map(Path::of))
                .ifPresent(folder -> prefer(now -> now.withExportFolder(folder.toString())));
    }

    /**
     * One thing that is measured, with the units it can be asked and shown in.
     *
     * @param code  names it in words
     * @param usual the unit of the person's system
     */
    public record Measured(String code, Unit usual, List<Unit> units) {
    }

    /** What can be given a unit of its own. */
    public List<Measured> measured() {
        return List.of(
                new Measured("depth", preferences().units().smallLength(),
                        List.of(Unit.MILLIMETRE, Unit.CENTIMETRE, Unit.METRE, Unit.INCH)),
                measured("length", Dimension.LENGTH, List.of(Unit.METRE, Unit.MILLIMETRE, Unit.FOOT, Unit.INCH)),
                measured("speed", Dimension.SPEED, Unit.of(Dimension.SPEED)),
                measured("flow", Dimension.MASS_FLOW, Unit.of(Dimension.MASS_FLOW)),
                measured("power", Dimension.POWER, Unit.of(Dimension.POWER)),
                measured("force", Dimension.FORCE, Unit.of(Dimension.FORCE)));
    }

    private Measured measured(String code, Dimension dimension, List<Unit> units) {
        return new Measured(code, preferences().units().unit(dimension), units);
    }

    /** The limit of one rule, and whether the site set it. */
    public record RuleLimit(Rule rule, Limit limit, boolean ofSite) {
    }

    /** By which limits is judged here. */
    public List<RuleLimit> limits() {
        Limits limits = workplace.siteProperty().get().map(site -> site.assessor().settings().limits())
                .orElse(Limits.standard());
        return Stream.of(Rule.values()).map(rule -> new RuleLimit(rule, limits.of(rule),
                limits.changed().containsKey(rule))).toList();
    }

    /** How many limits the site set. */
    public long changedLimits() {
        return limits().stream().filter(RuleLimit::ofSite).count();
    }
}
