package bedmark.screen;

import bedmark.screen.queue.QueueModel;
import bedmark.screen.queue.QueueView;
import bedmark.screen.round.RoundModel;
import bedmark.screen.round.RoundRow;
import bedmark.screen.round.RoundView;
import bedmark.screen.start.StartModel;
import bedmark.screen.start.StartView;
import bedmark.screen.store.StoreModel;
import bedmark.screen.store.StoreView;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Hand;
import bedmark.screen.theme.Light;
import bedmark.screen.theme.Theme;
import bedmark.screen.zone.ZoneModel;
import bedmark.screen.zone.ZoneSetting;
import bedmark.screen.zone.ZoneView;
import bedmark.survey.SurveyHistory;
import java.util.function.Supplier;
import javafx.application.Platform;
import javafx.scene.Scene;
import javafx.scene.layout.BorderPane;

/** The one window: holds the screen that is shown, dresses it, and leads from one to the next. */
public final class Shell implements Navigator {
    private final Workplace workplace;
    private final BorderPane root = new BorderPane();
    private final Scene scene;
    private Supplier<Screen> current;
    private Screen screen;

    /** A window of that size; the start of a walk is shown first. */
    public Shell(Workplace workplace, double width, double height) {
        this.workplace = workplace;
        this.scene = new Scene(root, width, height);
        dress();
        workplace.preferencesProperty().addListener((property, before, now) -> preferencesChanged(before, now));
        scene.widthProperty().addListener((property, before, now) -> turn());
        scene.heightProperty().addListener((property, before, now) -> turn());
        toStart();
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
        boolean words = !before.locale().equals(now.locale()) || before.units() != now.units();
        boolean looks = before.night() != now.night() || before.gloves() != now.gloves() || before.dpi() != now.dpi();
        if (looks) {
            dress();
        }
        if (words || looks) {
            show(current);
        }
    }

    private void dress() {
        Preferences preferences = workplace.preferences();
        Theme.apply(scene, preferences.night() ? Light.NIGHT : Light.DAY, density(preferences));
    }

    static Density density(Preferences preferences) {
        return new Density(preferences.dpi(), preferences.gloves() ? Hand.GLOVED : Hand.BARE);
    }

    private void turn() {
        screen.turned(portrait());
    }

    private boolean portrait() {
        return scene.getHeight() > scene.getWidth();
    }

    private void show(Supplier<Screen> next) {
        if (screen != null) {
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

    /** Something failed on the screen: what was typed is saved, and the person is told where they stand. */
    public void failed(Throwable failure) {
        screen.left();
        workplace.report(failure);
        toStart();
    }

    /** Saves what is typed and lets go of the screen. */
    public void close() {
        screen.left();
    }

    @Override
    public void toStart() {
        StartModel model = new StartModel(workplace);
        show(() -> new StartView(workplace, model, this));
    }

    @Override
    public void toRound(RoundModel round) {
        round.reload();
        show(() -> new RoundView(workplace, round, this));
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
            show(() -> new ZoneView(workplace, model, round, this, density(workplace.preferences())));
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
    }
}
