package bedmark.sample;

import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import bedmark.survey.Register;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;

/**
 * The physical state of one zone while it was visited: one feed, one belt speed, one bed that carries the feed at its
 * pace. All readings of the visit come from it.
 */
final class SampleState {
    private static final long SEED = 20_250_916;

    private final SampleVisit visit;
    private final SampleZone zone;
    private final Random chance;
    private final SampleBed bed;
    private final double speed;
    private final double flow;

    SampleState(SampleVisit visit, Register register) {
        this.visit = visit;
        zone = new SampleZone(register, visit.transfer(), visit.said("material").orElseGet(() ->
                register.transfer(visit.transfer()).flatMap(Register.Transfer::material).orElseThrow()));
        chance = new Random(SEED ^ (visit.round() + visit.transfer()).hashCode());
        speed = zone.conveyor("designSpeed") * (1 + 0.003 * chance.nextGaussian());
        flow = zone.transfer("designThroughput") * visit.row().number("feed");
        double density = visit.said("running-density").map(text -> SampleQuantity.parse(text).si())
                .orElse(zone.density() * (1 + 0.01 * chance.nextGaussian()));
        bed = SampleBed.of(zone.trough(), zone.transfer("designZoneLength"),
                positions().stream().map(Quantity::si).toList(),
                flow / (density * speed * visit.row().number("pace")), visit.row().text("bed"),
                visit.isolated() ? 0.0015 : 0.002, chance);
    }

    SampleVisit visit() {
        return visit;
    }

    SampleZone zone() {
        return zone;
    }

    SampleBed bed() {
        return bed;
    }

    /** Speed of the belt (m/s). */
    double speed() {
        return speed;
    }

    /** Mass flow (kg/s). */
    double flow() {
        return flow;
    }

    /** A number that an instrument reads with a relative error. */
    double read(double number, double error) {
        return number * (1 + error * chance.nextGaussian());
    }

    /** Electrical power of the drive (W), every zone of the conveyor taken to be like this one. */
    double power(int zones) {
        double length = zone.transfer("designZoneLength");
        double skirt = zones * SampleDrive.skirt(zone, length, bed.integralOfSquare(zone.trough(), length));
        return SampleDrive.shaft(zone, speed, flow, skirt) / zone.share("motorEfficiency");
    }

    /** Where the depths are read, as they are written. */
    List<Quantity> positions() {
        Unit unit = zone.written("designZoneLength").unit();
        return Stream.of(visit.habit().text("stations").split(",")).map(text -> SampleQuantity.of(text.strip(), unit))
                .toList();
    }
}
