package bedmark.survey;

import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.engine.Assessment;
import bedmark.engine.Assumption;
import bedmark.engine.Engine;
import bedmark.engine.LoadingZone;
import bedmark.engine.Settings;
import bedmark.engine.uncertainty.ImpossibleReading;
import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.UUID;

/**
 * Judges surveys by a register. The loading zones of one conveyor that were surveyed on the same round load one
 * drive together and are judged together.
 */
public final class Assessor {
    private final Register register;
    private final Settings settings;
    private final SiteFactors factors;

    /** A survey with what the engine found. */
    public record Assessed(Survey survey, Assessment assessment) {
    }

    /**
     * Judges by the register's materials, geometry, limits, seal rates and instruments.
     *
     * @throws Refused where the site's own settings cannot be; the place is a pointer within the plant
     */
    public Assessor(Register register) {
        this(register, Settings.standard());
    }

    /**
     * The same with a site's own reference in the place of the defaults; what the plant itself decides wins.
     *
     * @throws Refused where the site's own settings cannot be; the place is a pointer within the plant
     */
    public Assessor(Register register, Settings reference) {
        this.register = register;
        this.settings = SiteSettings.of(register.document(), reference);
        this.factors = SiteSettings.sound(() -> SiteFactors.of(register, settings.instruments()));
    }

    /** The factors that the site fitted from its own drives, or why it could not. */
    public SiteFactors siteFactors() {
        return factors;
    }

    public Settings settings() {
        return settings;
    }

    /**
     * What the engine sees of a survey.
     *
     * @throws Refused where a reading cannot be; the place is a pointer within the survey
     */
    public LoadingZone zone(Survey survey) {
        try {
            LoadingZone zone = ZoneMapping.map(survey, register, settings.instruments(), factors);
            Engine.check(zone);
            return zone;
        } catch (ImpossibleReading e) {
            throw refused(e);
        }
    }

    /** The material that a survey is judged by. */
    public Optional<Register.Material> material(Survey survey) {
        return register.transfer(survey.transfer())
                .flatMap(transfer -> ZoneMapping.material(survey, transfer, register));
    }

    /**
     * Judges all surveys of a bundle.
     *
     * @return one assessment for each survey, in the same order
     * @throws Refused where a number cannot be; the place is a pointer within the bundle
     */
    public List<Assessed> assess(List<Survey> surveys) {
        Set<UUID> superseded = Survey.superseded(surveys);
        Map<Pointer, List<Survey>> drives = new LinkedHashMap<>();
        for (Survey survey : surveys) {
            if (!superseded.contains(survey.id())) {
                drives.computeIfAbsent(drive(survey), key -> new ArrayList<>()).add(survey);
            }
        }
        List<Assessed> assessed = new ArrayList<>();
        for (int i = 0; i < surveys.size(); i++) {
            Survey survey = surveys.get(i);
            List<Survey> companions = drives.getOrDefault(drive(survey), List.of());
            try {
                assessed.add(new Assessed(survey, assess(survey, companions)));
            } catch (Refused e) {
                throw new Refused(inBundle(e.defect(), survey, Pointer.of("surveys").child(i)), e);
            }
        }
        return assessed;
    }

    /**
     * Judges one survey.
     *
     * @param companions surveys of the same round at the same conveyor; the survey itself and others of its own
     *                   transfer point among them do not count, nor does one that cannot be
     * @throws Refused where a reading cannot be; the place is a pointer within the survey
     */
    public Assessment assess(Survey survey, Collection<Survey> companions) {
        List<LoadingZone> zones = new ArrayList<>();
        zones.add(zone(survey));
        Map<String, LoadingZone> others = new LinkedHashMap<>();
        for (Survey companion : companions) {
            if (!companion.transfer().equals(survey.transfer())) {
                sound(companion).ifPresent(zone -> others.put(companion.transfer(), zone));
            }
        }
        zones.addAll(others.values());
        int all = register.transfer(survey.transfer()).map(transfer -> register.zonesOf(transfer.conveyor()).size())
                .orElse(zones.size());
        try {
            Assessment assessment = Engine.assessConveyor(zones, all - zones.size(), settings).get(0);
            for (Assumption assumption : beforehand(survey)) {
                assessment = assessment.with(assumption);
            }
            return assessment;
        } catch (ImpossibleReading e) {
            throw refused(e);
        }
    }

    /** What was taken for granted before the engine saw the zone. */
    private List<Assumption> beforehand(Survey survey) {
        List<Assumption> assumptions = new ArrayList<>();
        if (ZoneMapping.takesDepthsAtBoard(survey)) {
            assumptions.add(Assumption.of("depth-method-at-board"));
        }
        factors.of(survey, register).ifPresent(row -> {
            row.unfit().ifPresent(unfit -> assumptions.add(Assumption.of("site-factor-unfit", unfit.code())));
            String day = row.fittedAt().toLocalDate().toString();
            row.factor().ifPresent(factor -> assumptions.add(row.pairs() == 0
                    ? Assumption.of("site-factor-entered", day)
                    : Assumption.of("site-factor-fitted", day, Integer.toString(row.pairs()))));
        });
        return assumptions;
    }

    /** A companion that cannot be is judged in its own place; here it is as good as not surveyed. */
    private Optional<LoadingZone> sound(Survey companion) {
        try {
            return Optional.of(zone(companion));
        } catch (Refused e) {
            return Optional.empty();
        }
    }

    private Pointer drive(Survey survey) {
        return Pointer.of(survey.round().orElse(""),
                register.transfer(survey.transfer()).map(Register.Transfer::conveyor).orElse(""));
    }

    /** What is registered stands with the plant, not with the survey. */
    private Defect inBundle(Defect defect, Survey survey, Pointer place) {
        List<String> tokens = Pointer.parse(defect.where()).tokens();
        Optional<Pointer> registered = tokens.size() < 2 ? Optional.empty() : switch (tokens.get(0)) {
            case "transfer" -> register.place("transfers", survey.transfer());
            case "conveyor" -> register.transfer(survey.transfer())
                    .flatMap(transfer -> register.place("conveyors", transfer.conveyor()));
            case "material" -> material(survey).flatMap(material -> register.place("materials", material.id()));
            default -> Optional.empty();
        };
        return registered.map(base -> Defect.in(Pointer.of("plant") + base.toString()
                        + new Pointer(tokens.subList(1, tokens.size())), defect.code(),
                        defect.details().toArray(String[]::new)))
                .orElseGet(() -> defect.below(place));
    }

    private static Refused refused(ImpossibleReading e) {
        return new Refused(Defect.in(e.readingName(), e.code(), ImpossibleNumber.details(e)), e);
    }
}
