package bedmark.engine.fit;

import bedmark.engine.uncertainty.ImpossibleReading;
import bedmark.engine.uncertainty.Reading;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * Two readings of one drive's power shortly after one another, at the same belt speed and the same flow, between which
 * only the depth at the boards or the seals were changed, so that everything else on the belt cancels. What the second
 * state does not name is as in the first.
 *
 * @param length          skirted length of the zone, one side (m), positive
 * @param beltSpeed       v (m/s), positive
 * @param driveEfficiency from the motor shaft to the belt (0–1)
 * @param motorEfficiency of the motor (0–1)
 */
public record DrivePair(Reading length, Reading beltSpeed, Reading driveEfficiency, Reading motorEfficiency,
        DriveState first, DriveState second) {

    /** @throws ImpossibleReading {@code reading-negative}, {@code reading-zero}, {@code reading-out-of-range} */
    public DrivePair {
        for (Reading reading : List.of(length, beltSpeed, driveEfficiency, motorEfficiency)) {
            check(reading, 1e-9);
        }
        if (driveEfficiency.value() > 1 || motorEfficiency.value() > 1) {
            Reading over = driveEfficiency.value() > 1 ? driveEfficiency : motorEfficiency;
            throw new ImpossibleReading("reading-out-of-range", over.name(), Double.toString(over.value()), "0", "1");
        }
        Stream.of(first, second).flatMap(state -> Stream.of(Optional.of(state.power()), state.depth(),
                state.sealLength(), state.throughput())).flatMap(Optional::stream).forEach(reading -> check(reading, 0));
    }

    private static void check(Reading reading, double least) {
        if (reading.value() < 0) {
            throw new ImpossibleReading("reading-negative", reading.name(), Double.toString(reading.value()));
        }
        if (reading.value() < least) {
            throw new ImpossibleReading("reading-zero", reading.name());
        }
        if (reading.value() > 1e9) {
            throw new ImpossibleReading("reading-out-of-range", reading.name(), Double.toString(reading.value()),
                    Double.toString(least), "1.0E9");
        }
    }

    /** What of the power reaches the belt. */
    double efficiency() {
        return driveEfficiency.value() * motorEfficiency.value();
    }

    /** Relative standard uncertainty of the efficiency, the same in every pair of the drive. */
    double efficiencySpread() {
        return Math.hypot(driveEfficiency.standardUncertainty() / driveEfficiency.value(),
                motorEfficiency.standardUncertainty() / motorEfficiency.value());
    }

    /** Force at the belt by which the first state exceeds the second (N). */
    double force() {
        return (first.power().value() - second.power().value()) * efficiency() / beltSpeed.value();
    }

    /** Standard uncertainty of that force, the efficiency taken as exact (N). */
    double forceSpread() {
        double powers = Math.hypot(first.power().standardUncertainty(), second.power().standardUncertainty());
        return Math.hypot(powers * efficiency() / beltSpeed.value(),
                force() * beltSpeed.standardUncertainty() / beltSpeed.value());
    }

    /** By how much the integral of h² falls from the first state to the second (m³). */
    double squares() {
        return second.depth().isEmpty() ? 0 : length.value() * (square(first) - square(second));
    }

    /** Standard uncertainty of that fall (m³). */
    double squaresSpread() {
        return second.depth().isEmpty() ? 0 : Math.hypot(length.value() * Math.hypot(squareSpread(first),
                squareSpread(second)), length.standardUncertainty() * (square(first) - square(second)));
    }

    /** By how much the length of touching seal falls (m). */
    double seals() {
        return second.sealLength().map(then -> first.sealLength().map(Reading::value).orElse(0.0) - then.value())
                .orElse(0.0);
    }

    private static double square(DriveState state) {
        double depth = state.depth().map(Reading::value).orElse(0.0);
        return depth * depth;
    }

    private static double squareSpread(DriveState state) {
        return state.depth().map(depth -> 2 * depth.value() * depth.standardUncertainty()).orElse(0.0);
    }
}
