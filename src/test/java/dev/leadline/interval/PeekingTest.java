package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import dev.leadline.numeric.Normal;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// Looking again and again at normal data, at equally spaced numbers of draws: how often an interval for one
/// number is wrong at least once, and how often the any-time band is.
class PeekingTest {
    private static final long SEED = 20261201;
    private static final double DRAWS = 1e5;

    /// Chances that the plain interval misses are exact (record int-peeking; for 1,000 looks the same
    /// recursion); those of the band come from an experiment apart from this code, of 20,000 runs or more.
    @ParameterizedTest(name = "{0} looks")
    @CsvSource({
        "1, .0500, .0012, 20000",
        "10, .1934, .0096, 20000",
        "100, .3736, .0230, 10000",
        "1000, .5317, .0329, 4000"
    })
    void plainIntervalsMissSomewhereAndTheBandSeldom(int looks, double plain, double band, int runs) {
        var fixed = new FixedWidth(.95);
        var anyTime = AnyTimeMean.tunedTo(AnyTimeMean.DRAWS, .95);
        double[] fixedUnit = new double[looks];
        double[] bandUnit = new double[looks];
        for (int j = 0; j < looks; j++) {
            double n = DRAWS * (j + 1) / looks;
            fixedUnit[j] = fixed.unit(n);
            bandUnit[j] = anyTime.unit(n);
        }
        double step = DRAWS / looks;
        double[] z = new double[looks];
        int fixedMissed = 0;
        int bandMissed = 0;
        for (int r = 0; r < runs; r++) {
            Stream.at(new Address(SEED, Purpose.RUN, "A", 0, "peeking " + looks, r))
                    .fill(z, 0, looks);
            Normal.quantile(z, z, looks);
            double sum = 0;
            boolean fixedMisses = false;
            boolean bandMisses = false;
            for (int j = 0; j < looks; j++) {
                sum += z[j] * Math.sqrt(step);
                double off = Math.abs(sum / (step * (j + 1)));
                fixedMisses |= off > fixedUnit[j];
                bandMisses |= off > bandUnit[j];
            }
            fixedMissed += fixedMisses ? 1 : 0;
            bandMissed += bandMisses ? 1 : 0;
        }
        if (looks <= 100) {
            double exact = ReferenceValues.expected("int-peeking", "K=" + looks);
            assertEquals(exact, plain, 5e-5);
        }
        gate(plain, fixedMissed, runs, 0);
        gate(band, bandMissed, runs, 20_000);
        assertTrue(bandMissed < .05 * runs);
    }

    private static void gate(double expected, int missed, int runs, int otherRuns) {
        double variance = expected * (1 - expected);
        double error = Math.sqrt(variance / runs + (otherRuns > 0 ? variance / otherRuns : 0));
        assertEquals(expected, (double) missed / runs, 4 * error, "seed " + SEED);
    }
}
