package bedmark.bench;

import bedmark.engine.Assessment;
import bedmark.engine.Engine;
import bedmark.engine.LoadingZone;
import bedmark.engine.Settings;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.State;

/** A full assessment: four stations, both sides sealed, with remedies, without Monte Carlo and with it. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.SampleTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
public class AssessmentBenchmark {
    private final LoadingZone zone = BenchZones.of(4);
    private final LoadingZone coarse = BenchZones.coarse(4);
    private final Settings settings = Settings.standard();
    private final Settings firstOrder = settings.with(settings.conventions().withTrials(0));

    @Benchmark
    public Assessment assess() {
        return Engine.assess(zone, firstOrder);
    }

    /** The same zone with depths so coarse that its rules are drawn. */
    @Benchmark
    public Assessment assessByDrawing() {
        return Engine.assess(coarse, settings);
    }
}
