package dev.leadline.stream;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/// Smoke tests of uniformity and independence: they would notice streams that overlap, repeat or follow each other, not
/// subtle faults of the generator, for which its authors' own tests stand.
///
/// A correlation of N pairs times √N is close to standard normal; |z| ≥ 5.5 happens to a right program with probability
/// 4e-8, and the smallest correlation noticed nearly always (N = 100,000) is .025. About 450 such checks in all: 2e-5.
class IndependenceTest {
    private static final int N = 100_000;
    private static final double GATE = 5.5;

    private static double[] numbers(long seed, String lane, int replicate, String input, long item) {
        var u = new double[N];
        Stream.at(new Address(seed, Purpose.RUN, lane, replicate, input, item)).fill(u, 0, N);
        return u;
    }

    /// Kolmogorov's statistic D√n passes 2.9 with probability 1e-7.
    private static void uniform(double[] values, String what) {
        var u = values.clone();
        Arrays.sort(u);
        double largest = 0;
        for (int i = 0; i < u.length; i++) {
            largest = Math.max(largest, Math.max((i + 1.0) / u.length - u[i], u[i] - (double) i / u.length));
        }
        double statistic = largest * Math.sqrt(u.length);
        assertTrue(statistic < 2.9, () -> what + ": D√n = " + statistic);
    }

    /// Correlation of x[i] with y[i + lag], with 1/2 and 1/12 as the known mean and variance.
    private static void uncorrelated(double[] x, double[] y, int lag, String what) {
        double sum = 0;
        int n = x.length - lag;
        for (int i = 0; i < n; i++) {
            sum += (x[i] - .5) * (y[i + lag] - .5);
        }
        double z = 12 * sum / Math.sqrt(n);
        assertTrue(Math.abs(z) < GATE, () -> what + ", lag " + lag + ": z = " + z);
    }

    private static void independent(double[] x, double[] y, String what) {
        for (int lag = 0; lag <= 2; lag++) {
            uncorrelated(x, y, lag, what);
            uncorrelated(y, x, lag, what);
        }
        // Distances from the middle, which plain correlations do not see.
        uncorrelated(spread(x), spread(y), 0, what + ", distances from 1/2");
    }

    private static double[] spread(double[] u) {
        return Arrays.stream(u).map(v -> Math.abs(2 * v - 1)).toArray();
    }

    @ParameterizedTest(name = "seed {0}")
    @ValueSource(longs = {0, 1, 20261201, Long.MAX_VALUE})
    void neighbouringAddressesAreIndependent(long seed) {
        var here = numbers(seed, "A", 0, "x", 0);
        uniform(here, "seed " + seed);
        uncorrelated(here, here, 1, "seed " + seed);
        uncorrelated(here, here, 2, "seed " + seed);
        independent(here, numbers(seed, "A", 0, "x", 1), "next item, seed " + seed);
        independent(here, numbers(seed, "A", 0, "x", 1L << 40), "far item, seed " + seed);
        independent(here, numbers(seed, "A", 1, "x", 0), "next replicate, seed " + seed);
        independent(here, numbers(seed, "A", 0, "y", 0), "another input, seed " + seed);
        independent(here, numbers(seed, "B", 0, "x", 0), "another lane, seed " + seed);
        independent(here, numbers(seed, Address.SHARED, 0, "x", 0), "shared, seed " + seed);
        independent(here, numbers(seed ^ 1, "A", 0, "x", 0), "next seed, seed " + seed);
    }

    /// The first number of each of many items, as short items use them, is as good as a stream of its own.
    @Test
    void firstNumbersOfItemsAreIndependent() {
        var firsts = new double[3][N];
        var bits = new int[64];
        for (int i = 0; i < N; i++) {
            var stream = Stream.at(new Address(20261201, Purpose.RUN, "A", 0, "x", i));
            for (var column : firsts) {
                stream.fill(column, i, 1);
            }
            long next = stream.next();
            for (int bit = 0; bit < 64; bit++) {
                bits[bit] += (int) (next >>> bit & 1);
            }
        }
        for (int j = 0; j < 3; j++) {
            uniform(firsts[j], "number " + j + " of each item");
            uncorrelated(firsts[j], firsts[j], 1, "number " + j + " of each item");
            uncorrelated(firsts[j], firsts[(j + 1) % 3], 0, "numbers " + j + " and after of each item");
        }
        for (int bit = 0; bit < 64; bit++) {
            double z = (bits[bit] - N / 2.0) / Math.sqrt(N / 4.0);
            assertTrue(Math.abs(z) < GATE, "bit " + bit + ": z = " + z);
        }
    }
}
