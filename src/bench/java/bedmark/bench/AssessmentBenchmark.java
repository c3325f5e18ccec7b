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

/** A full assessment: four stations, both sides sealed, with remedies, without Monte Carlo. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.SampleTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
public class AssessmentBenchmark {
    private final LoadingZone zone = BenchZones.of(4);
    private final Settings settings = Settings.standard();

    @Benchmark
    public Assessment assess() {
        return Engine.assess(zone, settings);
    }
}
