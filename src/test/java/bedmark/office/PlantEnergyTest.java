package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.office.PlantEnergy.Bar;
import bedmark.survey.Bundle;
import java.nio.file.Path;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class PlantEnergyTest {
    @TempDir
    Path folder;

    private Path pack(String name, String currency) {
        Branch sample = Offices.sample(name).document();
        Branch plant = sample.branch("plant").orElseThrow();
        Branch tariff = plant.branch("tariff").orElseThrow().with("currency", currency);
        return Offices.pack(new Bundle(sample.with("plant", plant.with("tariff", tariff))), folder.resolve("tablet"),
                folder.resolve(name + ".zip"));
    }

    @Test
    void moneyOfTwoCurrenciesIsNotAdded() {
        try (OfficeStore store = Offices.trusting(folder.resolve("office"), folder.resolve("tablet"))) {
            store.receive(pack("round-2026-03", "EUR"), "Ida Marsh");
            Bar alike = bar(store, "Clinker load-out");
            assertEquals(Optional.of("EUR"), alike.currency());
            assertTrue(alike.cost().isPresent());
            store.receive(pack("round-under-way", "USD"), "Ida Marsh");
            // Of the load-out two zones were surveyed once more, the others were not.
            Bar mixed = bar(store, "Clinker load-out");
            assertTrue(mixed.wh() > 0);
            assertEquals(Optional.empty(), mixed.currency());
            assertEquals(OptionalDouble.empty(), mixed.cost());
            assertEquals(OptionalDouble.empty(), mixed.savedCost());
        }
    }

    private static Bar bar(OfficeStore store, String area) {
        return PlantEnergy.byArea(store.rank()).stream().filter(one -> one.name().equals(area)).findFirst()
                .orElseThrow();
    }
}
