package bedmark.command;

import bedmark.journal.Progress;
import bedmark.office.Csv;
import bedmark.office.OfficeStore;
import bedmark.office.PlantEnergy;
import bedmark.office.RankQuery;
import bedmark.office.RankedZone;
import bedmark.wording.Wording;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.concurrent.Callable;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** The plant in energy. */
@Command(name = "energy", mixinStandardHelpOptions = true,
        description = "Lists what the skirts take in a year by conveyor or area, with what the best remedies save.",
        footer = {"", "Exit codes: 0 listed; 2 bad use; 3 unreadable store.",
            "What no survey tells is a dash in the list and an empty cell in CSV."})
final class OfficeEnergyCommand implements Callable<Integer> {
    private static final int WIDTH = 30;

    private final Surroundings surroundings;

    @Spec
    private CommandSpec spec;

    @Mixin
    private OfficeDesk desk;

    @Option(names = "--plant", paramLabel = "ID", description = "Only this plant.")
    private Optional<String> plant;

    @Option(names = "--by-area", description = "By area instead of by conveyor.")
    private boolean byArea;

    @Option(names = "--csv", description = "Print CSV (RFC 4180), SI.")
    private boolean csv;

    OfficeEnergyCommand(Surroundings surroundings) {
        this.surroundings = surroundings;
    }

    @Override
    public Integer call() {
        List<RankedZone> zones;
        try (ProgressLine progress = new ProgressLine(surroundings); OfficeStore store = desk.open(surroundings,
                progress)) {
            RankQuery query = RankQuery.ALL.ofPlant(plant);
            KnownNames.require(spec, store, query);
            zones = store.rank(query, (Progress) progress::at);
        }
        List<PlantEnergy.Bar> bars = byArea ? PlantEnergy.byArea(zones) : PlantEnergy.byConveyor(zones);
        if (csv) {
            surroundings.out().print(Csv.row(List.of("plant", "area", "name", "energyWhPerYear", "energyIs",
                    "costPerYear", "currency", "co2KgPerYear", "savedWhPerYear", "savedCostPerYear", "bestZone",
                    "bestRemedy", "zones", "zonesWithoutFigure")));
            bars.forEach(bar -> surroundings.out().print(Csv.row(cells(bar))));
        } else {
            double most = bars.isEmpty() ? 0 : bars.get(0).wh();
            boolean plants = bars.stream().map(PlantEnergy.Bar::plant).distinct().count() > 1;
            bars.forEach(bar -> print(bar, most, plants));
        }
        surroundings.out().flush();
        return ExitCode.FINE;
    }

    private void print(PlantEnergy.Bar bar, double most, boolean plants) {
        Wording wording = surroundings.wording();
        int length = most > 0 ? (int) Math.round(WIDTH * bar.wh() / most) : 0;
        surroundings.out().println(Wording.plain(wording.text("office.energy.line",
                "#".repeat(length) + " ".repeat(WIDTH - length), bar.name(), where(bar, plants),
                bar.known() ? wording.format().computed(bar.wh() / 1e6, 1) : "-",
                bar.known() ? wording.format().computed(bar.savedWh() / 1e6, 1) : "-",
                bar.cost().isPresent() ? wording.format().computed(bar.cost().getAsDouble(), 0) + " "
                        + bar.currency().orElse("") : "-",
                bar.co2().isPresent() ? wording.format().computed(bar.co2().getAsDouble() / 1000, 1) : "-"))
                .stripTrailing());
    }

    /** The area of a conveyor, and the plant where there are several. */
    private String where(PlantEnergy.Bar bar, boolean plants) {
        return Stream.of(byArea ? "" : bar.area(), plants ? bar.plant() : "").filter(part -> !part.isBlank())
                .collect(Collectors.joining(", "));
    }

    private static List<String> cells(PlantEnergy.Bar bar) {
        boolean known = bar.known();
        return List.of(bar.plant(), bar.area(), bar.name(), known ? plain(bar.wh()) : "",
                !known ? "" : bar.shaft() ? "shaft" : "electrical",
                number(bar.cost()), bar.currency().orElse(""), number(bar.co2()), known ? plain(bar.savedWh()) : "",
                number(bar.savedCost()), bar.best().map(zone -> zone.names().tag()).orElse(""),
                bar.best().flatMap(RankedZone::saving).map(saving -> saving.remedy()).orElse(""),
                Integer.toString(bar.zones()), Integer.toString(bar.lacking()));
    }

    private static String number(OptionalDouble value) {
        return value.isPresent() ? plain(value.getAsDouble()) : "";
    }

    private static String plain(double value) {
        return BigDecimal.valueOf(value).toPlainString();
    }
}
