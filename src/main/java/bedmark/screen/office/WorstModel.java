package bedmark.screen.office;

import bedmark.engine.verdict.Rule;
import bedmark.office.RankQuery;
import bedmark.office.RankedZone;
import java.time.Duration;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleObjectProperty;
import javafx.collections.FXCollections;
import javafx.collections.ObservableList;

/** The worst-first list and what it is narrowed to. */
public final class WorstModel {
    private static final int HEAD = 200;

    private final OfficeDesk desk;
    private final ObservableList<RankedZone> zones = FXCollections.observableArrayList();
    private final ReadOnlyObjectWrapper<List<RankedZone>> all = new ReadOnlyObjectWrapper<>(List.of());
    private final ObjectProperty<Optional<String>> area = new SimpleObjectProperty<>(Optional.empty());
    private final ObjectProperty<Optional<String>> material = new SimpleObjectProperty<>(Optional.empty());
    private final ObjectProperty<Optional<Rule>> finding = new SimpleObjectProperty<>(Optional.empty());
    private final ObjectProperty<Optional<Integer>> days = new SimpleObjectProperty<>(Optional.empty());

    WorstModel(OfficeDesk desk) {
        this.desk = desk;
        desk.changesProperty().addListener((property, before, now) -> look());
        for (ObjectProperty<?> filter : List.of(area, material, finding, days)) {
            filter.addListener((property, before, now) -> look());
        }
        look();
    }

    /** Asks the store anew. */
    public void look() {
        RankQuery query = RankQuery.ALL.ofArea(area.get()).ofMaterial(material.get()).with(finding.get())
                .olderThan(days.get().map(Duration::ofDays));
        // What a person sees first does not wait for the rest of a long list.
        desk.ask(progress -> desk.store().worst(query, HEAD, progress), this::show);
        desk.ask(progress -> {
            // Put together here, and not by the screen's thread each time that it looks at all of them.
            List<RankedZone> every = List.copyOf(desk.store().rank(RankQuery.ALL, progress));
            return List.of(every, query.equals(RankQuery.ALL) ? every
                    : List.copyOf(desk.store().rank(query, progress)));
        }, lists -> {
            all.set(lists.get(0));
            show(lists.get(1));
        });
    }

    private void show(List<RankedZone> list) {
        if (!zones.equals(list)) {
            zones.setAll(list);
        }
    }

    public ObservableList<RankedZone> zones() {
        return zones;
    }

    public ReadOnlyObjectProperty<List<RankedZone>> allProperty() {
        return all.getReadOnlyProperty();
    }

    /** What there is to choose from, sorted. */
    public <T extends Comparable<T>> List<T> choices(Function<RankedZone, List<T>> of) {
        return all.get().stream().flatMap(zone -> of.apply(zone).stream()).distinct().sorted().toList();
    }

    public ObjectProperty<Optional<String>> areaProperty() {
        return area;
    }

    public ObjectProperty<Optional<String>> materialProperty() {
        return material;
    }

    public ObjectProperty<Optional<Rule>> findingProperty() {
        return finding;
    }

    /** Only zones surveyed longer ago than so many days, or never. */
    public ObjectProperty<Optional<Integer>> daysProperty() {
        return days;
    }
}
