package bedmark.engine;

import bedmark.engine.drag.DragMethod;
import bedmark.engine.verdict.Rule;
import bedmark.engine.working.Formula;
import java.util.Map;

/** What joins the formulas to a zone, as it is printed: sums, ratios and powers. */
final class ZoneFormulas {
    static final Formula MEAN_DEPTH = Formula.of("mean-depth", "hm", "J1/L", "D");
    static final Formula MEAN_SQUARE = Formula.of("mean-square-depth", "M2", "J2/L", "D");
    static final Formula SQUARE_OF_MEAN = Formula.of("square-of-mean-share", "κ", "hm²/M2", "D");
    static final Formula IMPLIED_FLOW = Formula.of("implied-flow", "Qi", "ρ · v · A", "D");
    static final Formula FLOW_OF_BED = Formula.of("flow-of-bed", "Q", "Qi", "A");
    static final Formula BED_SPEED_RATIO = Formula.of("bed-speed-ratio", "β", "Q/Qi", "D");
    static final Formula SKIRT_DRAG = Formula.of("skirt-drag", "F", "Fm + Fs", "D");
    static final Formula SKIRT_POWER = Formula.of("skirt-power", "P", "F · v", "D");
    static final Formula DRIVE_POWER = Formula.of("drive-power", "Pd", "P/ηd", "D");
    static final Formula DRIVE_SHARE = Formula.of("drive-share", "σ", "Pd/Pr", "D");
    static final Formula RUNNING_SHARE = Formula.of("running-share", "σr", "Pd/(Pe · ηm)", "D");
    static final Formula ENERGY_AT_SHAFT = Formula.of("energy-shaft", "E", "Pd · T", "D");
    static final Formula ENERGY_AT_MOTOR = Formula.of("energy-electrical", "E", "Pd/ηm · T", "D");
    static final Formula FILL = Formula.of("fill", "ψ", "Q/(ρ · S · v)", "D");
    static final Formula DESIGN_DEPTH = Formula.of("design-depth", "hd",
            "max(0, (Qd/(ρ · vd) − A0r)/br)", "D");
    static final Formula REFERENCE_REGISTERED = Formula.of("reference-depth", "hr", "hg", "D");
    static final Formula REFERENCE_DEPTH = Formula.of("reference-depth", "hr", "max(hd, 0.1 · B)", "R");

    /** The signs of the section by the register in place of those by the readings. */
    static final Map<String, String> REGISTERED = Map.of("s", "sr", "b1", "br", "A0", "A0r");

    private ZoneFormulas() {
    }

    /** The material drag in use. */
    static Formula materialDrag(DragMethod method) {
        return Formula.of("material-drag", "Fm", switch (method) {
            case TABULATED -> "Ft";
            case RANKINE -> "Fr";
            case ISO_5048 -> "Fi";
            case SITE -> "Fc";
        }, "D");
    }

    /** What a rule observes; for a rule without a formula of its own it is the number alone. */
    static Formula observed(Rule rule) {
        String expression = switch (rule) {
            case BED_OVER_BOARD -> "hmax/H";
            case BED_OVER_DESIGN -> "√M2/hr";
            case FLOW_OVER_CAPACITY -> "ψ";
            case DRIVE_NEAR_RATING -> "Pe · ηm/Pr";
            case SKIRTS_OVER_BUDGET -> "σ";
            case BED_BEHIND_BELT, READINGS_DISAGREE -> "β";
            case ZONE_TOO_SHORT -> "L/Ls";
            case BOARDS_TOO_WIDE -> "b1/bw";
            case EDGE_TOO_SMALL -> "e/em";
            case BOARD_TOO_LOW_FOR_LUMPS -> "min(H, b1)/a";
            case BELT_TOO_FAST -> "v";
            case BED_NOT_SETTLED -> "Δh/hm";
            case SEAL_DEFECT -> "nd";
        };
        return Formula.of(rule.code(), "y", expression, rule.limit().source());
    }
}
