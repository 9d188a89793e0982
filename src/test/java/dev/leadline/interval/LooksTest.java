package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Accumulator;
import dev.leadline.numeric.Normal;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import org.apache.commons.statistics.distribution.TDistribution;
import org.junit.jupiter.api.Test;

class LooksTest {
    private static final long SEED = 20261201;

    @Test
    void sharesWhatMayBeMissed() {
        var nine = Looks.planned(9, .95);
        for (int j = 1; j <= 9; j++) {
            assertEquals(.05 / 9, 1 - nine.level(j), 1e-15);
        }
        var open = Looks.unplanned(.95);
        double sum = 0;
        for (int j = 1; j <= 10_000; j++) {
            assertEquals(.05 / j / (j + 1), 1 - open.level(j), 1e-15);
            sum += 1 - open.level(j);
        }
        // Σ 1/(j (j+1)) up to J is 1 - 1/(J+1).
        assertEquals(.05 * (1 - 1 / 10_001.0), sum, 1e-11);
    }

    /// 2^7 to 2^15 are nine; of repetitions 10, 20, … 160 fit in 300.
    @Test
    void countsTheLooksOfABudget() {
        assertEquals(9, Looks.atDoublings(128, 32_768, .95).planned().orElseThrow());
        assertEquals(8, Looks.atDoublings(128, 32_767, .95).planned().orElseThrow());
        assertEquals(5, Looks.atDoublings(10, 300, .95).planned().orElseThrow());
        assertEquals(1, Looks.atDoublings(128, 100, .95).planned().orElseThrow());
        assertEquals(
                55, Looks.atDoublings(1L << 8, Long.MAX_VALUE, .95).planned().orElseThrow());
    }

    /// Student's t at 1 - α/9, by Commons Statistics.
    @Test
    void makesTheIntervalOfALook() {
        var interval = Looks.planned(9, .95).at(3, level -> Student.of(5, .1, 16, level));
        double t = TDistribution.of(15).inverseSurvivalProbability(.025 / 9);
        assertEquals(5 - .1 * t, interval.low(), 1e-9);
        assertEquals(5 + .1 * t, interval.high(), 1e-9);
        assertEquals(.95, interval.level());
        assertEquals("looks", interval.kind());
        assertTrue(interval.assumption().endsWith("It holds together with those of all 9 looks planned."));
    }

    /// Nine looks at means of 16 replicates, independent of each other as those of successive doublings
    /// nearly are: plain intervals miss at any of them with 1 - .95⁹ = .3698, these with 1 - (1 - .05/9)⁹ =
    /// .0489.
    @Test
    void seldomMissesAtAnyLook() {
        var looks = Looks.planned(9, .95);
        int runs = 1_500;
        int plain = 0;
        int together = 0;
        var values = new double[1][9 * 16];
        for (int r = 0; r < runs; r++) {
            Stream.at(new Address(SEED, Purpose.RUN, "A", 0, "looks", r)).fill(values[0], 0, 9 * 16);
            Normal.quantile(values[0], values[0], 9 * 16);
            boolean plainMissed = false;
            boolean missed = false;
            for (int j = 1; j <= 9; j++) {
                var sums = new Accumulator(1);
                sums.add(values, 16 * (j - 1), 16 * j);
                plainMissed |= misses(Student.of(sums, 0, .95));
                missed |= misses(looks.at(j, level -> Student.of(sums, 0, level)));
            }
            plain += plainMissed ? 1 : 0;
            together += missed ? 1 : 0;
        }
        gate(1 - Math.pow(.95, 9), plain, runs);
        gate(1 - Math.pow(1 - .05 / 9, 9), together, runs);
    }

    private static boolean misses(Interval interval) {
        return interval.low() > 0 || interval.high() < 0;
    }

    private static void gate(double expected, int missed, int runs) {
        double error = Math.sqrt(expected * (1 - expected) / runs);
        assertEquals(expected, (double) missed / runs, 4 * error, "seed " + SEED);
    }

    @Test
    void refusesALookThatWasNotPlanned() {
        assertThrows(IllegalArgumentException.class, () -> Looks.planned(9, .95).level(10));
        assertThrows(IllegalArgumentException.class, () -> Looks.planned(9, .95).level(0));
        assertThrows(IllegalArgumentException.class, () -> Looks.planned(0, .95));
    }
}
