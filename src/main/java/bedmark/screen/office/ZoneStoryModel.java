package bedmark.screen.office;

import bedmark.document.Branch;
import bedmark.engine.verdict.Rule;
import bedmark.office.Actions;
import bedmark.office.Conflict;
import bedmark.office.Findings;
import bedmark.office.JudgedZone;
import bedmark.office.RankedZone;
import bedmark.office.trend.ZoneTrend;
import bedmark.survey.OfficeDeed;
import bedmark.survey.merge.ZoneId;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleStringProperty;
import javafx.beans.property.StringProperty;

/** One loading zone: how it stands, how it came there, and what the office does about it. */
public final class ZoneStoryModel {
    private final OfficeDesk desk;
    private final ZoneId zone;
    private final ReadOnlyObjectWrapper<Optional<Story>> story = new ReadOnlyObjectWrapper<>(Optional.empty());

    private final Draft draft = new Draft();

    /** What is typed and not yet sent; it stays while the screen is made anew in other words or another light. */
    static final class Draft {
        final StringProperty reason = new SimpleStringProperty("");
        final StringProperty until = new SimpleStringProperty("");
        final StringProperty action = new SimpleStringProperty("");
        final StringProperty owner = new SimpleStringProperty("");
        final StringProperty due = new SimpleStringProperty("");
        final StringProperty order = new SimpleStringProperty("");
        final StringProperty clashReason = new SimpleStringProperty("");
    }

    /**
     * Everything that the screen shows.
     *
     * @param own   the latest result by the register that it was made with
     * @param today the same by today's
     * @param forms of its plant, by which readings are named
     */
    public record Story(RankedZone ranked, ZoneTrend trend, Optional<JudgedZone> own, Optional<JudgedZone> today,
                        List<Conflict> conflicts, List<Branch> forms, List<OfficeDeed.ActionSet> actions) {
    }

    ZoneStoryModel(OfficeDesk desk, ZoneId zone) {
        this.desk = desk;
        this.zone = zone;
        desk.ask(progress -> read(), story::set);
    }

    private Optional<Story> read() {
        return desk.store().ranked(zone).map(ranked -> new Story(ranked, desk.store().trend(zone),
                desk.store().judged(zone), desk.store().judgedToday(zone), desk.store().merged(zone).clashes().stream()
                .map(clash -> Conflict.of(desk.store(), ranked.names(), clash)).toList(),
                desk.store().head(zone.plant()).map(head -> head.branches("forms")).orElse(List.of()),
                new Actions(desk.store()).open(zone)));
    }

    private void change(Runnable change) {
        change(change, () -> { });
    }

    /** @param then what is done on the screen once it is kept */
    private void change(Runnable change, Runnable then) {
        desk.change(progress -> {
            change.run();
            return read();
        }, read -> {
            then.run();
            story.set(read);
        });
    }

    public ReadOnlyObjectProperty<Optional<Story>> storyProperty() {
        return story.getReadOnlyProperty();
    }

    Draft draft() {
        return draft;
    }

    /** Accepts or shelves a finding. */
    public void answer(Rule rule, OfficeDeed.Answer answer, String reason, Optional<LocalDate> until) {
        change(() -> new Findings(desk.store()).answer(zone, rule, answer, reason, desk.person(), until,
                LocalDate.now(desk.clock())));
    }

    /** Takes an answer back. */
    public void reopen(Rule rule, String reason) {
        change(() -> new Findings(desk.store()).reopen(zone, rule, reason, desk.person()));
    }

    /** Decides conflicts for one side. */
    public void settle(String digest, String reason) {
        change(() -> new Findings(desk.store()).settle(zone, digest, reason, desk.person()));
    }

    /**
     * Writes an action down.
     *
     * @param then what is done on the screen once it is kept
     */
    public void act(String text, String owner, Optional<LocalDate> due, String workOrder, Runnable then) {
        change(() -> new Actions(desk.store()).add(zone, "", text, owner, due, workOrder, desk.person()), then);
    }

    /** An action was done. */
    public void done(OfficeDeed.ActionSet action) {
        change(() -> new Actions(desk.store()).set(new OfficeDeed.ActionSet(action.action(), action.zone(),
                action.finding(), action.text(), action.owner(), action.due(), action.workOrder(), true),
                desk.person()));
    }
}
