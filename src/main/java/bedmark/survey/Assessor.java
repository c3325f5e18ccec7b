package bedmark.survey;

import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.engine.Assessment;
import bedmark.engine.Assumption;
import bedmark.engine.ConveyorAssessment;
import bedmark.engine.Engine;
import bedmark.engine.LoadingZone;
import bedmark.engine.Settings;
import bedmark.engine.uncertainty.ImpossibleReading;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
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
    /** The ids of each conveyor's transfer points, in the register's order. */
    private final Map<String, List<String>> transfers = new HashMap<>();

    /** A survey with what the engine sees of it. */
    public record Seen(Survey survey, LoadingZone zone) {
    }

    /** A survey with what the engine found. */
    public record Assessed(Survey survey, Assessment assessment) {
    }

    /**
     * A conveyor on one round.
     *
     * @param round    its id; empty where the surveys name none
     * @param conveyor its id
     * @param surveys  those that count, in the order of the zones of the assessment
     */
    public record AssessedConveyor(String round, String conveyor, List<Survey> surveys,
            ConveyorAssessment assessment) {
    }

    /**
     * What was found of a bundle.
     *
     * @param surveys   one for each survey, in their order
     * @param conveyors each conveyor of each round once, in the order of their first surveys
     */
    public record Judged(List<Assessed> surveys, List<AssessedConveyor> conveyors) {
        public Judged {
            surveys = List.copyOf(surveys);
            conveyors = List.copyOf(conveyors);
        }
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
        register.transfers().values().forEach(transfer ->
                transfers.computeIfAbsent(transfer.conveyor(), key -> new ArrayList<>()).add(transfer.id()));
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
        return judge(surveys).surveys();
    }

    /**
     * Judges all surveys of a bundle, and the conveyors that they belong to.
     *
     * @throws Refused where a number cannot be; the place is a pointer within the bundle
     */
    public Judged judge(List<Survey> surveys) {
        Map<Pointer, Drive> drives = drives(surveys);
        Map<Pointer, AssessedConveyor> conveyors = new LinkedHashMap<>();
        List<Assessed> assessed = new ArrayList<>();
        for (int i = 0; i < surveys.size(); i++) {
            Survey survey = surveys.get(i);
            try {
                assessed.add(judge(survey, drives.get(drive(survey)), conveyors));
            } catch (Refused e) {
                throw new Refused(inBundle(e.defect(), survey, Pointer.of("surveys").child(i)), e);
            }
        }
        return new Judged(assessed, List.copyOf(conveyors.values()));
    }

    private Assessed judge(Survey survey, Drive drive, Map<Pointer, AssessedConveyor> conveyors) {
        if (drive == null || !drive.holds(survey)) {
            return new Assessed(survey, assess(survey, drive == null ? List.of() : drive.surveys()));
        }
        AssessedConveyor whole = conveyors.computeIfAbsent(drive(survey), key -> whole(drive));
        Assessment one = whole.assessment().zones().get(drive.transfers().indexOf(survey.transfer()));
        return new Assessed(survey, complete(one, survey));
    }

    /**
     * Judges one survey.
     *
     * @param companions surveys of the same round at the same conveyor; the survey itself and others of its own
     *                   transfer point among them do not count, nor does one that cannot be
     * @throws Refused where a reading cannot be; the place is a pointer within the survey
     */
    public Assessment assess(Survey survey, Collection<Survey> companions) {
        return assess(new Seen(survey, zone(survey)), seen(companions));
    }

    /** As {@link #assess(Survey, Collection)}, with what the engine sees of them. */
    public Assessment assess(Seen survey, Collection<Seen> companions) {
        String transfer = survey.survey().transfer();
        Drive drive = driveOf(survey.survey());
        for (Seen companion : companions) {
            if (!companion.survey().transfer().equals(transfer)) {
                drive.put(companion.survey(), companion.zone());
            }
        }
        drive.put(survey.survey(), survey.zone());
        return complete(assess(drive).zones().get(drive.transfers().indexOf(transfer)), survey.survey());
    }

    /** What the engine sees of surveys; one that cannot be is left out. */
    public List<Seen> seen(Collection<Survey> surveys) {
        return surveys.stream().flatMap(survey -> sound(survey).map(zone -> new Seen(survey, zone)).stream()).toList();
    }

    /** The surveys of each drive that count: of each transfer point the last one that is sound and not superseded. */
    private Map<Pointer, Drive> drives(List<Survey> surveys) {
        Set<UUID> superseded = Survey.superseded(surveys);
        Map<Pointer, Drive> drives = new LinkedHashMap<>();
        for (Survey survey : surveys) {
            if (!superseded.contains(survey.id())) {
                sound(survey).ifPresent(zone -> drives.computeIfAbsent(drive(survey), key -> driveOf(survey))
                        .put(survey, zone));
            }
        }
        return drives;
    }

    private AssessedConveyor whole(Drive drive) {
        return new AssessedConveyor(drive.round(), drive.conveyor(), drive.surveys(), assess(drive));
    }

    private ConveyorAssessment assess(Drive drive) {
        try {
            return Engine.assessConveyor(drive.zones(), drive.unsurveyed(), settings);
        } catch (ImpossibleReading e) {
            throw refused(e);
        }
    }

    private Assessment complete(Assessment assessment, Survey survey) {
        Assessment complete = assessment;
        for (Assumption assumption : beforehand(survey)) {
            complete = complete.with(assumption);
        }
        return complete;
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
        return Pointer.of(survey.round().orElse(""), conveyor(survey));
    }

    private Drive driveOf(Survey survey) {
        String conveyor = conveyor(survey);
        return new Drive(survey.round().orElse(""), conveyor, transfers.getOrDefault(conveyor, List.of()));
    }

    private String conveyor(Survey survey) {
        return register.transfer(survey.transfer()).map(Register.Transfer::conveyor).orElse("");
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
