package bedmark.sample;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;

/** The belt speed as it was read: by a tachometer, by timing turns of the belt, or from a pulley. */
final class SampleSpeed {
    private SampleSpeed() {
    }

    /**
     * The part of the readings that tells the speed.
     *
     * @param way {@code tachometer}, {@code 3 turns}, or {@code pulley 630 mm}
     */
    static Branch of(SampleState state, SampleHand hand, String way) {
        if (way.equals("tachometer")) {
            Quantity read = state.visit().said("speed").map(SampleQuantity::parse)
                    .orElseGet(() -> hand.speed(state.read(state.speed(), 0.003)));
            return Branch.EMPTY.with("beltSpeed", SampleReadings.running(read, state, 3));
        }
        return way.startsWith("pulley") ? pulley(state, SampleQuantity.parse(way.substring("pulley ".length())))
                : timed(state, Integer.parseInt(way.substring(0, way.indexOf(' '))));
    }

    private static Branch timed(SampleState state, int turns) {
        double elapsed = state.read(turns * state.zone().conveyor("beltLength") / state.speed(), 0.003);
        return Branch.EMPTY.with("beltTiming", Branch.EMPTY
                .with("beltLength", state.zone().beltLength())
                .with("revolutions", Node.number(turns))
                .with("elapsed", SampleReadings.running(SampleQuantity.decimal(elapsed, Unit.SECOND, 1), state, 3)));
    }

    private static Branch pulley(SampleState state, Quantity diameter) {
        double rotation = state.read(state.speed() / (Math.PI * diameter.si()), 0.003);
        return Branch.EMPTY.with("pulleySpeed", Branch.EMPTY.with("diameter", diameter).with("rotation",
                SampleReadings.running(SampleQuantity.decimal(rotation, Unit.PER_MINUTE, 2), state, 3)));
    }
}
