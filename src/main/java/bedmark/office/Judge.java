package bedmark.office;

import bedmark.document.Refused;
import bedmark.engine.Assessment;
import bedmark.engine.Result;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.verdict.Level;
import bedmark.engine.verdict.Remedy;
import bedmark.index.office.Verdict;
import bedmark.survey.Assessor;
import bedmark.survey.Register;
import bedmark.survey.Survey;
import bedmark.survey.merge.Copy;
import java.util.Collection;
import java.util.Comparator;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;

/** Judges surveys by a register, beside what loaded the same drive on the same round. */
final class Judge {
    private static final int KEPT = 16;

    private final Function<String, Register> registers;
    private final Map<String, Assessor> assessors = new LinkedHashMap<>(16, 0.75f, true);

    /** @param registers the version of a register that has a digest */
    Judge(Function<String, Register> registers) {
        this.registers = registers;
    }

    private record Known(Assessor assessor, Register register) {
    }

    private final Map<String, Register> held = new HashMap<>();

    private Known known(String digest) {
        Assessor assessor = assessors.get(digest);
        if (assessor == null) {
            Register register = registers.apply(digest);
            assessor = new Assessor(register);
            held.put(digest, register);
            assessors.put(digest, assessor);
            if (assessors.size() > KEPT) {
                String oldest = assessors.keySet().iterator().next();
                assessors.remove(oldest);
                held.remove(oldest);
            }
        }
        return new Known(assessor, held.get(digest));
    }

    /** The version of a register that has a digest. */
    Register register(String digest) {
        return known(digest).register();
    }

    /**
     * Judges one survey.
     *
     * @param register  digest of the register to judge by
     * @param others    results that loaded the same drive on the same round
     * @param documents the surveys of all of them, by digest
     * @return nothing where the survey can't be judged by that register
     */
    Optional<JudgedZone> judge(Copy copy, String register, Collection<Copy> others, Map<String, Survey> documents) {
        Survey survey = documents.get(copy.digest());
        try {
            Known known = known(register);
            List<Survey> companions = nearest(copy, others).stream()
                    .map(other -> documents.get(other.digest())).toList();
            Assessment assessment = known.assessor().assess(survey, companions);
            return Optional.of(new JudgedZone(copy.zone(), copy, survey, known.register(), assessment));
        } catch (Refused e) {
            return Optional.empty();
        }
    }

    /** Of each other zone the result that lies nearest in time: a round's name may be used again next year. */
    private static Collection<Copy> nearest(Copy copy, Collection<Copy> others) {
        Map<String, Copy> nearest = new LinkedHashMap<>();
        others.stream().filter(other -> !other.zone().equals(copy.zone())).sorted(Copy.IN_TIME)
                .forEach(other -> nearest.merge(other.zone().key(), other, (one, two) ->
                        Math.abs(two.moment() - copy.moment()) < Math.abs(one.moment() - copy.moment()) ? two : one));
        return nearest.values();
    }

    /** The worst first: by level, then share of the drive; the digest decides where both are the same. */
    static final Comparator<JudgedZone> WORST_FIRST = Comparator.<JudgedZone, Level>comparing(zone ->
                    zone.assessment().worstLevel()).reversed()
            .thenComparing(Comparator.<JudgedZone>comparingDouble(zone ->
                    value(zone.assessment(), Result.DRIVE_SHARE).orElse(-1)).reversed())
            .thenComparing(zone -> zone.copy().digest());

    static OptionalDouble value(Assessment assessment, Result result) {
        return assessment.get(result).map(Estimate::value).map(OptionalDouble::of).orElse(OptionalDouble.empty());
    }

    /** The remedy that saves most and breaks no rule. */
    static Optional<Remedy> best(Assessment assessment) {
        return assessment.remedies().stream().filter(remedy -> remedy.ranked() && remedy.refusedBecause().isEmpty()
                && remedy.savedWh().isPresent()).max(Comparator.comparingDouble(one -> one.savedWh().getAsDouble()));
    }

    /** An assessment in the numbers that lists rank by. */
    static Verdict verdict(Assessment assessment) {
        Optional<Remedy> best = best(assessment);
        return new Verdict(assessment.worstLevel().ordinal(), !assessment.missingRequired().isEmpty(),
                value(assessment, Result.DRIVE_SHARE), value(assessment, Result.SKIRT_POWER),
                best.map(Remedy::savedWh).orElse(OptionalDouble.empty()),
                best.map(Remedy::savedCost).orElse(OptionalDouble.empty()),
                best.map(Remedy::savedCo2).orElse(OptionalDouble.empty()), best.map(Remedy::code),
                value(assessment, Result.ENERGY), value(assessment, Result.COST), value(assessment, Result.CO2),
                assessment.energyKind().map(Assessment.EnergyKind::code), assessment.currency(),
                FindingLine.write(FindingLine.of(assessment)));
    }
}
