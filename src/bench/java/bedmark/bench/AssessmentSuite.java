package bedmark.bench;

import java.util.List;
import org.openjdk.jmh.profile.GCProfiler;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.runner.Runner;
import org.openjdk.jmh.runner.RunnerException;
import org.openjdk.jmh.runner.options.OptionsBuilder;
import org.openjdk.jmh.runner.options.TimeValue;

/** Time and memory of one assessment. */
final class AssessmentSuite implements Suite {
    /** A frame of the screen (µs), within which a key must be answered. */
    private static final double FRAME = 16_000;

    @Override
    public String name() {
        return "assessment";
    }

    @Override
    public List<Row> run() throws RunnerException {
        RunResult result = run("assess");
        RunResult drawn = run("assessByDrawing");
        return List.of(
                new Row("full assessment, median", result.getPrimaryResult().getStatistics().getPercentile(50), "µs",
                        100, true),
                new Row("full assessment, p99", result.getPrimaryResult().getStatistics().getPercentile(99), "µs",
                        100, true),
                new Row("full assessment, allocated",
                        result.getSecondaryResults().get("gc.alloc.rate.norm").getScore() / 1024, "kB", 64, true),
                new Row("assessment that draws its depths, p99",
                        drawn.getPrimaryResult().getStatistics().getPercentile(99), "µs", FRAME, true));
    }

    private static RunResult run(String benchmark) throws RunnerException {
        return new Runner(new OptionsBuilder().include(AssessmentBenchmark.class.getName() + "." + benchmark + "$")
                .forks(1).warmupIterations(5).warmupTime(TimeValue.seconds(2))
                .measurementIterations(10).measurementTime(TimeValue.seconds(2))
                .addProfiler(GCProfiler.class).build()).runSingle();
    }
}
