package bedmark.bench;

/** Wall-clock time of work that is too long for JMH's samples, or that is compared with other work of the same run. */
final class Timing {
    /** Some work; what it returns is kept from being optimized away. */
    interface Work {
        long run();
    }

    private static volatile long sink;

    private Timing() {
    }

    /** The least time (s) of one run, over many rounds of some runs each; the first third of the rounds warms up. */
    static double best(int rounds, Work work, int runs) {
        double best = Double.POSITIVE_INFINITY;
        for (int round = 0; round < rounds; round++) {
            double time = once(work, runs);
            best = round < rounds / 3 ? best : Math.min(best, time);
        }
        return best;
    }

    /** The mean time (s) of some runs. */
    static double once(Work work, int runs) {
        long start = System.nanoTime();
        for (int run = 0; run < runs; run++) {
            sink += work.run();
        }
        return (System.nanoTime() - start) / 1e9 / runs;
    }
}
