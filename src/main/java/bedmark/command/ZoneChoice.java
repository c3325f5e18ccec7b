package bedmark.command;

import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.index.office.ZoneNames;
import bedmark.office.OfficeStore;
import bedmark.survey.merge.ZoneId;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** Which loading zone a command is about, where several plants or points have the same name. */
final class ZoneChoice {
    @Spec(Spec.Target.MIXEE)
    private CommandSpec spec;

    @Option(names = "--plant", paramLabel = "ID", description = "The plant, where several have such a point.")
    private Optional<String> plant;

    /** Whether a plant is named. */
    boolean given() {
        return plant.isPresent();
    }

    Optional<String> plant() {
        return plant;
    }

    /** Refuses a plant that the office has no register of. */
    void requirePlant(OfficeStore store) {
        plant.ifPresent(id -> new KnownNames(spec, store).requirePlant(plant));
    }

    /**
     * The zone that a person named by its id or tag.
     *
     * @throws Refused {@code zone-unknown}, {@code zone-in-plants} and {@code zone-tag-several} naming what fits
     */
    ZoneId zone(OfficeStore store, String named) {
        requirePlant(store);
        List<ZoneNames> found = store.zonesNamed(named).stream()
                .filter(one -> plant.filter(id -> !id.equals(one.zone().plant())).isEmpty()).toList();
        if (found.isEmpty()) {
            throw new Refused(Defect.in(named, "zone-unknown"));
        }
        if (found.stream().map(one -> one.zone().plant()).distinct().count() > 1) {
            throw new Refused(Defect.in(named, "zone-in-plants", found.stream().map(one -> one.zone().plant() + " ("
                    + one.plant() + ")").distinct().sorted().collect(Collectors.joining(", "))));
        }
        if (found.size() > 1) {
            throw new Refused(Defect.in(named, "zone-tag-several", found.stream().map(one -> one.zone().transfer())
                    .sorted().collect(Collectors.joining(", "))));
        }
        return found.get(0).zone();
    }
}
