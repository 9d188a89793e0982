package dev.leadline.engine;

import dev.leadline.estimate.Logarithm;
import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.util.Arrays;

/// How long a draw takes in one lane and in another, on one thread, weights and sums included.
///
/// Both do pieces of work of about equal length in pairs, one after the other, so that whatever slows the machine slows
/// both; which goes first alternates. The ratio is that of the geometric means, its error from the spread of the pairs.
///
/// @param first seconds of a draw on a processor
/// @param second likewise, of the other lane
/// @param ratio the first over the second; more certain than either
public record Timing(Logarithm first, Logarithm second, Logarithm ratio) {
    private static final int PAIRS = 16;
    private static final int WARM_UP = 12;
    private static final double NANOSECOND = 1e-9;

    private static final ThreadMXBean CLOCK = ManagementFactory.getThreadMXBean();

    /// Of the processor where it is told, so that what else the machine is busy with does not count.
    private static long now() {
        return CLOCK.isCurrentThreadCpuTimeSupported() ? CLOCK.getCurrentThreadCpuTime() : System.nanoTime();
    }

    /// A lane at work on the items at the end of so many draws, over and over. Confined to one thread.
    private static final class Work {
        private static final long TURNS = 8;

        private final ItemWork work;
        private final Items items;
        private final long last;
        private long turn;

        Work(Recipe recipe, long draws) {
            work = recipe.work();
            items = recipe.items();
            last = items.last(draws);
        }

        /// Works for so long at least.
        ///
        /// @return seconds of a draw
        double seconds(double least) {
            long draws = 0;
            double passed;
            long start = now();
            do {
                Item item = items.at(Math.max(0, last - turn++ % TURNS));
                draws += work.compute(item, () -> false).orElseThrow().item().draws();
                passed = NANOSECOND * (now() - start);
            } while (passed < least);
            return passed / draws;
        }
    }

    /// @param draws of each lane: later items may take longer than earlier ones
    /// @param piece seconds of a piece of work at least
    public static Timing of(Recipe first, long firstDraws, Recipe second, long secondDraws, double piece) {
        var one = new Work(first, firstDraws);
        var other = new Work(second, secondDraws);
        for (int i = 0; i < WARM_UP; i++) {
            one.seconds(piece);
            other.seconds(piece);
        }
        double[] here = new double[PAIRS];
        double[] there = new double[PAIRS];
        double[] ratios = new double[PAIRS];
        for (int i = 0; i < PAIRS; i++) {
            boolean even = i % 2 == 0;
            double early = StrictMath.log((even ? one : other).seconds(piece));
            double late = StrictMath.log((even ? other : one).seconds(piece));
            here[i] = even ? early : late;
            there[i] = even ? late : early;
            ratios[i] = here[i] - there[i];
        }
        return new Timing(mean(here), mean(there), mean(ratios));
    }

    private static Logarithm mean(double[] logs) {
        double mean = Arrays.stream(logs).average().orElseThrow();
        double squares =
                Arrays.stream(logs).map(log -> (log - mean) * (log - mean)).sum();
        return new Logarithm(mean, squares / (logs.length - 1) / logs.length, logs.length - 1);
    }
}
