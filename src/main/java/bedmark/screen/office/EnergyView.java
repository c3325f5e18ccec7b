package bedmark.screen.office;

import bedmark.office.PlantEnergy.Bar;
import bedmark.office.RankedZone;
import bedmark.office.Saving;
import bedmark.screen.Listening;
import bedmark.screen.part.Texts;
import bedmark.wording.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import javafx.collections.ListChangeListener;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.ToggleButton;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Pane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/** The plant in energy: a bar for each conveyor or area, the part that the best remedies save told apart. */
final class EnergyView extends VBox {
    private final EnergyModel model;
    private final Wording wording;
    private final VBox rows = new VBox();
    private final Label sum = Texts.wrapped("");

    EnergyView(OfficeDesk desk, EnergyModel model, Listening listening) {
        this.model = model;
        this.wording = desk.wording();
        getStyleClass().add("room");
        rows.getStyleClass().add("bars");
        ToggleButton conveyors = toggle("by-conveyor", false);
        ToggleButton areas = toggle("by-area", true);
        listening.to(model.byAreaProperty(), by -> {
            conveyors.setSelected(!by);
            areas.setSelected(by);
        });
        FlowPane choice = new FlowPane(conveyors, areas);
        choice.getStyleClass().add("filters");
        ScrollPane scroll = new ScrollPane(rows);
        scroll.setFitToWidth(true);
        VBox.setVgrow(scroll, Priority.ALWAYS);
        sum.getStyleClass().add("sum");
        Label legend = Texts.wrapped(wording.text("office.energy.legend"));
        legend.getStyleClass().add("soft");
        getChildren().addAll(choice, sum, legend, scroll);
        ListChangeListener<Bar> shown = change -> show();
        model.bars().addListener(shown);
        show();
    }

    private ToggleButton toggle(String code, boolean byArea) {
        ToggleButton button = new ToggleButton(wording.text("office.energy." + code));
        button.setId(code);
        button.setOnAction(event -> {
            model.byAreaProperty().set(byArea);
            button.setSelected(true);
        });
        return button;
    }

    private void show() {
        double most = model.bars().stream().mapToDouble(Bar::wh).max().orElse(0);
        rows.getChildren().setAll(model.bars().stream().map(bar -> row(bar, most)).toList());
        double all = model.bars().stream().mapToDouble(Bar::wh).sum();
        double saved = model.bars().stream().mapToDouble(Bar::savedWh).sum();
        sum.setText(wording.text("office.energy.sum", mwh(all), mwh(saved)));
    }

    private String mwh(double wh) {
        return wording.format().computed(wh / 1e6, 1);
    }

    private Node row(Bar bar, double most) {
        Label name = Texts.wrapped(bar.name());
        name.getStyleClass().add("zone-name");
        Label area = Texts.wrapped(bar.area().equals(bar.name()) ? bar.plant() : bar.area());
        area.getStyleClass().add("soft");
        VBox names = new VBox(name, area);
        names.getStyleClass().add("bar-names");
        VBox right = new VBox(new Stripe(bar, most), words(bar));
        right.setMinWidth(0);
        HBox.setHgrow(right, Priority.ALWAYS);
        HBox row = new HBox(names, right);
        row.getStyleClass().add("bar-row");
        return row;
    }

    private Label words(Bar bar) {
        List<String> words = new ArrayList<>();
        if (bar.known()) {
            words.add(wording.text(bar.shaft() ? "office.energy.shaft" : "office.energy.electrical", mwh(bar.wh())));
        }
        if (bar.cost().isPresent()) {
            words.add(wording.format().computed(bar.cost().getAsDouble(), 0) + "\u00A0" + bar.currency().orElse(""));
        }
        if (bar.co2().isPresent()) {
            words.add(wording.text("office.energy.co2", wording.format().computed(bar.co2().getAsDouble() / 1000, 1)));
        }
        bar.best().ifPresent(zone -> words.add(best(bar, zone)));
        if (bar.lacking() > 0) {
            words.add(wording.text("office.energy.lacking", bar.lacking()));
        }
        return Texts.wrapped(String.join(" · ", words));
    }

    /** What the remedies save together, and which one at which zone saves most of it. */
    private String best(Bar bar, RankedZone zone) {
        Saving saving = zone.saving().orElseThrow();
        return wording.text("office.energy.best", saved(bar.savedWh(), bar.savedCost(), bar.currency()),
                zone.names().tag(), wording.text("office.energy.remedy." + saving.remedy()),
                saved(saving.wh(), saving.cost(), zone.currency()));
    }

    private String saved(double wh, OptionalDouble cost, Optional<String> currency) {
        return cost.isPresent() && currency.isPresent() ? wording.text("office.energy.saved-money", mwh(wh),
                wording.format().computed(cost.getAsDouble(), 0), currency.get())
                : wording.text("office.energy.saved", mwh(wh));
    }

    /** The bar itself: as wide as its share of the greatest, the part that can be saved at its end. */
    private static final class Stripe extends Pane {
        private final Region kept = new Region();
        private final Region saved = new Region();
        private final double share;
        private final double part;

        Stripe(Bar bar, double most) {
            share = most > 0 ? bar.wh() / most : 0;
            part = bar.wh() > 0 ? Math.min(1, bar.savedWh() / bar.wh()) : 0;
            getStyleClass().add("stripe");
            kept.getStyleClass().add("kept");
            saved.getStyleClass().add("saved");
            kept.setManaged(false);
            saved.setManaged(false);
            getChildren().addAll(kept, saved);
        }

        @Override
        protected void layoutChildren() {
            double width = getWidth() * share;
            kept.resizeRelocate(0, 0, width * (1 - part), getHeight());
            saved.resizeRelocate(width * (1 - part), 0, width * part, getHeight());
        }
    }
}
