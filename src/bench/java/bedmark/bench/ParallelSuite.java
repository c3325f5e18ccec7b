package bedmark.bench;

import bedmark.json.BundleReader;
import bedmark.survey.Assessor;
import bedmark.survey.Bundle;
import bedmark.survey.Survey;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.stream.IntStream;

/** How much a hundred thousand surveys gain from all processors, against arithmetic that shares nothing. */
final class ParallelSuite implements Suite {
    private static final int SURVEYS = 100_000;
    private static final int ROUNDS = 5;

    @Override
    public String name() {
        return "parallel";
    }

    @Override
    public List<Row> run() {
        Bundle bundle = BundleReader.read(BenchPlant.bundle(500).getBytes(StandardCharsets.UTF_8));
        Assessor assessor = new Assessor(bundle.register());
        List<Survey> surveys = bundle.surveys();
        Timing.Work alone = () -> assess(assessor, surveys, IntStream.range(0, SURVEYS));
        Timing.Work together = () -> assess(assessor, surveys, IntStream.range(0, SURVEYS).parallel());
        double[] least = new double[4];
        java.util.Arrays.fill(least, Double.POSITIVE_INFINITY);
        for (int round = 0; round < ROUNDS; round++) {
            Timing.Work[] works = {alone, together, () -> count(IntStream.range(0, SURVEYS)),
                () -> count(IntStream.range(0, SURVEYS).parallel())};
            for (int i = 0; i < works.length; i++) {
                least[i] = Math.min(least[i], Timing.once(works[i], 1));
            }
        }
        double surveysGain = least[0] / least[1];
        double arithmeticGain = least[2] / least[3];
        return List.of(
                new Row("100,000 surveys in parallel, time", least[1], "s", 60, true),
                new Row("speed-up of 100,000 surveys over that of arithmetic (" + round(arithmeticGain) + ")",
                        surveysGain / arithmeticGain, "", 0.9, false));
    }

    private static String round(double gain) {
        return String.format(java.util.Locale.ROOT, "%.2f", gain);
    }

    private static long assess(Assessor assessor, List<Survey> surveys, IntStream turns) {
        return turns.mapToLong(turn -> assessor.assess(surveys.get(turn % surveys.size()), List.of())
                .findings().size()).sum();
    }

    private static long count(IntStream turns) {
        return (long) turns.mapToDouble(ParallelSuite::arithmetic).sum();
    }

    private static double arithmetic(int seed) {
        double x = 1 + seed * 1e-6;
        for (int i = 0; i < 4_000; i++) {
            x += 1 / x;
        }
        return x;
    }
}
