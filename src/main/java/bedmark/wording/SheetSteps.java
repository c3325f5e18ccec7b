package bedmark.wording;

import bedmark.engine.Assessment;
import bedmark.engine.Result;
import bedmark.engine.uncertainty.Estimate;
import bedmark.engine.verdict.Rule;
import bedmark.engine.working.Step;
import bedmark.engine.working.Working;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;

/** Every formula of a calculation sheet with its name, source, numbers and result. */
final class SheetSteps {
    private static final String NO_NUMBERS = "integral-of-depth";

    private final Wording wording;
    private final SheetNumbers numbers;

    SheetSteps(Wording wording, SheetNumbers numbers) {
        this.wording = wording;
        this.numbers = numbers;
    }

    List<SheetPart> parts(Working working, Assessment assessment) {
        Set<String> rules = new HashSet<>();
        Stream.of(Rule.values()).forEach(rule -> rules.add(rule.code()));
        List<Step> steps = working.steps().stream().filter(step -> !rules.contains(step.result())).toList();
        List<SheetPart> parts = new ArrayList<>();
        for (int i = 0; i < steps.size();) {
            int next = i + 1;
            while (next < steps.size() && isSame(steps.get(i), steps.get(next))) {
                next++;
            }
            parts.add(new SheetPart.Row("", name(steps.get(i)), next - i == 1 ? line(steps.get(i), assessment)
                    : together(steps.subList(i, next), assessment)));
            i = next;
        }
        return parts;
    }

    /** Whether two steps are one formula, applied to two rows of a table. */
    private static boolean isSame(Step one, Step other) {
        return one.formula().code().equals(other.formula().code())
                && general(one).equals(general(other)) && !one.formula().equals(other.formula());
    }

    private static String general(Step step) {
        return step.formula().sign().replaceAll("\\d+$", "") + step.formula().expression()
                .replaceAll("(?<=[hDfkℓ′])\\d+", "");
    }

    private String name(Step step) {
        return wording.text("working.formula." + step.formula().code()) + " [" + step.formula().source() + "]";
    }

    private String line(Step step, Assessment assessment) {
        String formula = numbers.formula(step.formula());
        boolean general = step.formula().code().equals(NO_NUMBERS);
        String put = general ? "" : numbers.substituted(step);
        return step.formula().sign() + " = " + formula + (general ? "" : " = " + put) + result(step, put, assessment);
    }

    /** The result, unless what was put in is that number already. */
    private String result(Step step, String put, Assessment assessment) {
        boolean intermediate = Result.ofKey(step.result()).isEmpty() && !step.result().startsWith("methods.");
        double spread = Result.ofKey(step.result()).flatMap(assessment::counted)
                .map(Estimate::standardUncertainty).orElse(step.standardUncertainty().orElse(0));
        String value = intermediate ? numbers.si(step.value(), step.unit())
                : numbers.both(step.value(), spread, step.unit());
        return put.equals(numbers.number(step.value())) ? value.substring(put.length()) : " = " + value;
    }

    private String together(List<Step> steps, Assessment assessment) {
        String text = general(steps.get(0));
        String sign = steps.get(0).formula().sign().replaceAll("\\d+$", "");
        List<String> parts = new ArrayList<>();
        parts.add(sign + " = " + text.substring(sign.length()).replace(" · ", "·").replace(" − ", "−"));
        steps.forEach(step -> parts.add(step.formula().sign() + " = " + numbers.substituted(step)
                + result(step, numbers.substituted(step), assessment)));
        return String.join("; ", parts);
    }
}
