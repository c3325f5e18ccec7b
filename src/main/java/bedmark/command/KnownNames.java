package bedmark.command;

import bedmark.office.OfficeStore;
import bedmark.office.RankQuery;
import bedmark.survey.Register;
import java.util.Collection;
import java.util.Map;
import java.util.Optional;
import java.util.TreeSet;
import java.util.function.Function;
import java.util.stream.Stream;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;

/** What the office's registers name: a list of what nobody has would tell that nothing is wrong there. */
final class KnownNames {
    private final CommandSpec spec;
    private final Map<String, Register> registers;

    KnownNames(CommandSpec spec, OfficeStore store) {
        this.spec = spec;
        this.registers = store.registers();
    }

    /**
     * Refuses a query for a plant, an area or a material that no register holds.
     *
     * @throws ParameterException naming those that it knows
     */
    static void require(CommandSpec spec, OfficeStore store, RankQuery query) {
        if (query.plant().isEmpty() && query.area().isEmpty() && query.material().isEmpty()) {
            return;
        }
        KnownNames known = new KnownNames(spec, store);
        known.requirePlant(query.plant());
        known.require("--area", query.area(), query.plant(), register -> register.areaNames().values().stream());
        known.require("--material", query.material(), query.plant(), register -> register.materials().values().stream()
                .map(Register.Material::name));
    }

    /** Refuses a plant that the office has no register of. */
    void requirePlant(Optional<String> plant) {
        require("--plant", plant, new TreeSet<>(registers.keySet()));
    }

    private void require(String option, Optional<String> name, Optional<String> plant,
                         Function<Register, Stream<String>> names) {
        Collection<String> known = new TreeSet<>();
        registers.forEach((id, register) -> {
            if (plant.filter(one -> !one.equals(id)).isEmpty()) {
                names.apply(register).forEach(known::add);
            }
        });
        require(option, name, known);
    }

    private void require(String option, Optional<String> name, Collection<String> known) {
        name.filter(one -> !known.contains(one)).ifPresent(one -> {
            throw new ParameterException(spec.commandLine(), option + " knows no '" + one + "'; "
                    + (known.isEmpty() ? "this office has none yet" : "known: " + String.join(", ", known)));
        });
    }
}
