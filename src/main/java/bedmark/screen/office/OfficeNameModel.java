package bedmark.screen.office;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.office.OfficeName;
import java.util.Optional;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleStringProperty;
import javafx.beans.property.StringProperty;

/** The office's name: what is typed for it, and the one before it for whoever wants that back. */
final class OfficeNameModel {
    private final OfficeDesk desk;
    private final StringProperty typed = new SimpleStringProperty();
    private final ReadOnlyObjectWrapper<State> state = new ReadOnlyObjectWrapper<>();

    /**
     * How the office is called.
     *
     * @param name    empty where nobody named it
     * @param before  the name that it had until it was named here
     * @param refused why what was typed is no name
     */
    record State(String name, Optional<String> before, Optional<Defect> refused) {
    }

    OfficeNameModel(OfficeDesk desk) {
        this.desk = desk;
        String name = desk.store().device().name();
        typed.set(name);
        state.set(new State(name, Optional.empty(), Optional.empty()));
        typed.addListener((property, was, now) -> {
            if (!differs()) {
                nothingRefused();
            }
        });
    }

    /** What stands in the field; it stays there while other rooms are looked at. */
    StringProperty typedProperty() {
        return typed;
    }

    ReadOnlyObjectProperty<State> stateProperty() {
        return state.getReadOnlyProperty();
    }

    /** Whether something else than the name is typed. */
    boolean differs() {
        return !typed.get().strip().equals(state.get().name());
    }

    /** Names the office as it is typed. */
    void name() {
        if (differs()) {
            name(typed.get());
        }
    }

    /** Leaves the name as it is. */
    void leave() {
        typed.set(state.get().name());
    }

    /** What is typed is the name as it is, and nothing is wrong with that. */
    private void nothingRefused() {
        state.set(new State(state.get().name(), state.get().before(), Optional.empty()));
    }

    /** Gives the office the name back that it had before. */
    void back() {
        state.get().before().ifPresent(this::name);
    }

    private void name(String text) {
        try {
            String name = OfficeName.proved(text);
            desk.ask(progress -> {
                desk.store().rename(name);
                return name;
            }, named -> named(named, text));
        } catch (Refused e) {
            state.set(new State(state.get().name(), state.get().before(), Optional.of(e.defect())));
        }
    }

    /** Whoever types on meanwhile keeps that. */
    private void named(String name, String text) {
        boolean typedOn = differs() && !typed.get().equals(text);
        Optional<String> before = Optional.of(state.get().name()).filter(old -> !old.isBlank() && !old.equals(name));
        state.set(new State(name, before, Optional.empty()));
        if (!typedOn) {
            typed.set(name);
        }
    }
}
