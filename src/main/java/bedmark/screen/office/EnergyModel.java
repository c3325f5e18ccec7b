package bedmark.screen.office;

import bedmark.office.PlantEnergy;
import bedmark.office.RankQuery;
import bedmark.office.RankedZone;
import bedmark.screen.Listening;
import java.util.List;
import javafx.beans.property.BooleanProperty;
import javafx.beans.property.SimpleBooleanProperty;
import javafx.collections.FXCollections;
import javafx.collections.ObservableList;

/** What the skirts take in a year, by conveyor or by area. */
public final class EnergyModel {
    private final ObservableList<PlantEnergy.Bar> bars = FXCollections.observableArrayList();
    private final BooleanProperty byArea = new SimpleBooleanProperty();
    private List<RankedZone> zones = List.of();

    /** @param listening asks the store anew whenever something was received or decided */
    EnergyModel(OfficeDesk desk, Listening listening) {
        byArea.addListener((property, before, now) -> show());
        listening.to(desk.changesProperty(), changes -> look(desk));
    }

    private void look(OfficeDesk desk) {
        desk.ask(progress -> List.copyOf(desk.store().rank(RankQuery.ALL, progress)), ranked -> {
            zones = ranked;
            show();
        });
    }

    private void show() {
        List<PlantEnergy.Bar> now = byArea.get() ? PlantEnergy.byArea(zones) : PlantEnergy.byConveyor(zones);
        if (!bars.equals(now)) {
            bars.setAll(now);
        }
    }

    public ObservableList<PlantEnergy.Bar> bars() {
        return bars;
    }

    public BooleanProperty byAreaProperty() {
        return byArea;
    }
}
