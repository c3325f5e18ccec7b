package bedmark.screen;

import bedmark.screen.finish.FinishModel;
import bedmark.screen.finish.FinishView;
import bedmark.screen.notes.NotesModel;
import bedmark.screen.notes.NotesView;
import bedmark.screen.queue.QueueModel;
import bedmark.screen.queue.QueueView;
import bedmark.screen.round.RoundModel;
import bedmark.screen.round.RoundRow;
import bedmark.screen.round.RoundView;
import bedmark.screen.settings.SettingsModel;
import bedmark.screen.settings.SettingsView;
import bedmark.screen.start.NewPlantModel;
import bedmark.screen.start.NewPlantView;
import bedmark.screen.start.StartModel;
import bedmark.screen.start.StartView;
import bedmark.screen.store.StoreModel;
import bedmark.screen.store.StoreView;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Hand;
import bedmark.screen.theme.Theme;
import bedmark.screen.zone.ZoneModel;
import bedmark.screen.zone.ZoneSetting;
import bedmark.screen.zone.ZoneView;
import bedmark.survey.SurveyHistory;
import java.util.Optional;
import java.util.function.Supplier;
import javafx.application.Platform;
import javafx.scene.Scene;
import javafx.scene.layout.BorderPane;

/** The one window: holds the screen that is shown, dresses it, and leads from one to the next. */
public final class Shell implements Navigator {
    private final Workplace workplace;
    private final BorderPane root;
    private final Scene scene;
    private final ClockedLight light;
    private Supplier<Screen> current;
    private Screen screen;
    private double scale = 1;
    private Optional<RoundModel> walked = Optional.empty();
    private boolean failing;
    private boolean closed;

    /** A window of that size; the round that is being walked is shown first, else the start of a walk. */
    public Shell(Workplace workplace, double width, double height) {
        this(workplace, FirstScene.plain(width, height), goingOn(workplace));
    }

    /** As above, in a scene that is there already, with what {@link #goingOn} found. */
    Shell(Workplace workplace, FirstScene first, Optional<RoundModel> goingOn) {
        this.workplace = workplace;
        this.scene = first.scene();
        this.root = first.root();
        this.light = new ClockedLight(workplace.clock(), () -> workplace.preferences().lighting(), now ->
                Theme.apply(scene, now, density(workplace.preferences(), scale)));
        dress();
        workplace.preferencesProperty().addListener((property, before, now) -> preferencesChanged(before, now));
        scene.widthProperty().addListener((property, before, now) -> turn());
        scene.heightProperty().addListener((property, before, now) -> turn());
        scene.windowProperty().addListener((property, before, now) -> {
            if (now != null) {
                now.outputScaleXProperty().addListener((scaling, old, fresh) -> scaled(fresh.doubleValue()));
                scaled(now.getOutputScaleX());
            }
        });
        begin(goingOn);
    }

    private void begin(Optional<RoundModel> goingOn) {
        try {
            goingOn.ifPresentOrElse(this::showRound, this::toStart);
        } catch (RuntimeException e) {
            letGo();
            workplace.report(e);
            toStart();
        }
    }

    /**
     * The round that a program which ended in the midst of a walk goes on with. Touches no screen, so that it can be
     * read before there is one.
     */
    static Optional<RoundModel> goingOn(Workplace workplace) {
        try {
            return workplace.siteProperty().get()
                    .flatMap(site -> workplace.walkMemory().goingOn(site, workplace.preferences().person()))
                    .map(round -> new RoundModel(workplace, round));
        } catch (RuntimeException e) {
            workplace.report(e);
            return Optional.empty();
        }
    }

    public Scene scene() {
        return scene;
    }

    /** The screen that is shown. */
    public Screen screen() {
        return screen;
    }

    /** What the person prefers may change on any screen: the same model is then shown anew. */
    private void preferencesChanged(Preferences before, Preferences now) {
        boolean words = !before.locale().equals(now.locale()) || before.units() != now.units()
                || !before.chosenUnits().equals(now.chosenUnits());
        boolean looks = before.lighting() != now.lighting() || before.gloves() != now.gloves()
                || before.dpi() != now.dpi() || before.text() != now.text();
        if (words || looks) {
            dress();
            show(current);
        }
    }

    /** The window came onto a screen whose dots are gathered into larger logical ones. */
    private void scaled(double outputScale) {
        if (outputScale > 0 && outputScale != scale) {
            scale = outputScale;
            dress();
            show(current);
        }
    }

    private void dress() {
        ToolkitLanguage.set(workplace.preferences().locale());
        light.dress();
    }

    static Density density(Preferences preferences) {
        return density(preferences, 1);
    }

    /** @param scale dots of the glass to a logical pixel */
    static Density density(Preferences preferences, double scale) {
        return Density.of(preferences.dpi(), scale, preferences.gloves() ? Hand.GLOVED : Hand.BARE)
                .withText(preferences.text());
    }

    private void turn() {
        if (screen != null) {
            screen.turned(portrait());
        }
    }

    private boolean portrait() {
        return scene.getHeight() > scene.getWidth();
    }

    private void show(Supplier<Screen> next) {
        if (screen != null && next == current) {
            screen.replaced();
        } else if (screen != null) {
            screen.left();
        }
        current = next;
        screen = next.get();
        screen.turned(portrait());
        root.setTop(screen.head());
        root.setCenter(screen.body());
        root.setBottom(screen.foot());
        afterLayout(screen);
    }

    /** The focus of the screen before is given up with the next pulse; only then does the new one keep its own. */
    private void afterLayout(Screen shown) {
        Runnable once = new Runnable() {
            @Override
            public void run() {
                scene.removePostLayoutPulseListener(this);
                if (screen == shown) {
                    shown.shown();
                    failing = false;
                }
            }
        };
        scene.addPostLayoutPulseListener(once);
        Platform.requestNextPulse();
    }

    /** Loads the demo plant where the store has none. */
    public void loadDemo() {
        StartModel model = new StartModel(workplace);
        if (model.canLoadDemo()) {
            show(() -> new StartView(workplace, model, this));
            model.loadDemo();
        }
    }

    /**
     * Something failed on the screen: what was typed is saved, and the person is told and led back to the round, or to
     * the start where the way to the round fails too. What fails once the window is closed leads nowhere: the start
     * would end the walk that the next program goes on with.
     */
    public void failed(Throwable failure) {
        if (closed) {
            return;
        }
        boolean again = failing;
        failing = true;
        letGo();
        workplace.report(failure);
        try {
            walked.filter(round -> !again).ifPresentOrElse(this::toRound, this::toStart);
        } catch (RuntimeException e) {
            letGo();
            toStart();
        }
    }

    /** A screen that failed may fail once more when it is to let go; the next one is shown all the same. */
    private void letGo() {
        Optional<Screen> leaving = Optional.ofNullable(screen);
        screen = null;
        try {
            leaving.ifPresent(Screen::left);
        } catch (RuntimeException e) {
            workplace.report(e);
        }
    }

    /** Saves what is typed and lets go of the screen. */
    public void close() {
        closed = true;
        light.stop();
        screen.left();
    }

    @Override
    public void toStart() {
        walked = Optional.empty();
        workplace.walkMemory().end();
        StartModel model = new StartModel(workplace);
        show(() -> new StartView(workplace, model, this));
    }

    @Override
    public void toNewPlant() {
        NewPlantModel.of(workplace).ifPresent(model -> show(() -> new NewPlantView(workplace, model, this::toStart)));
    }

    @Override
    public void toRound(RoundModel round) {
        round.reload();
        showRound(round);
        // What was completed a moment ago may still be on its way to the store.
        workplace.scribe().afterwards(round::reload);
    }

    private void showRound(RoundModel round) {
        walked = Optional.of(round);
        show(() -> new RoundView(workplace, round, this, screen == null ? RoundView.First.IN_SIGHT
                : RoundView.First.ALL));
    }

    @Override
    public void toZone(RoundModel round, RoundRow row) {
        round.survey(row, id -> {
            SurveyHistory history = workplace.store().history(id).orElseThrow();
            Site site = workplace.site();
            ZoneModel model = new ZoneModel(new ZoneSetting(
                    site.form(history.survey().document().branch("form").flatMap(form -> form.text("id"))), history,
                    site.register(), site.assessor(), round.companions(row.transfer()),
                    round.last(row.transfer(), id), workplace.scribe(), workplace.preferences().person(),
                    workplace.clock()), workplace.preferences().units(), workplace.preferences().locale());
            show(() -> new ZoneView(workplace, model, round, this, density(workplace.preferences(), scale)));
        });
    }

    @Override
    public void toNotes(RoundModel round, RoundRow row) {
        round.survey(row, id -> {
            // Leaving the screen saves what is typed there; the notes start from what the journal then says.
            screen.left();
            workplace.scribe().afterwards(() -> {
                NotesModel model = new NotesModel(workplace, workplace.store().history(id).orElseThrow(),
                        round.last(row.transfer(), id));
                show(() -> new NotesView(workplace, model, round, row, this));
            });
        });
    }

    @Override
    public void toFinish(RoundModel round) {
        workplace.scribe().afterwards(() -> {
            round.reload();
            FinishModel model = new FinishModel(workplace, round);
            show(() -> new FinishView(workplace, model, this));
        });
    }

    @Override
    public void toStore(Runnable back) {
        StoreModel model = new StoreModel(workplace);
        show(() -> new StoreView(workplace, model, back));
    }

    @Override
    public void toQueue(RoundModel round) {
        QueueModel model = new QueueModel(workplace);
        show(() -> new QueueView(workplace, model, round, this));
        workplace.scribe().afterwards(model::reload);
    }

    @Override
    public void toSettings() {
        Supplier<Screen> before = current;
        SettingsModel model = new SettingsModel(workplace);
        show(() -> new SettingsView(workplace, model, () -> show(before)));
    }
}
