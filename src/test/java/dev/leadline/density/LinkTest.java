package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// Roots and their powers against `StrictMath.exp`, whose error is 1 ulp.
class LinkTest {
    private static double inverted(Link link, double tabulated) {
        double[] x = {tabulated};
        link.invert(x, 1, 0, 1);
        return x[0];
    }

    private static double there(Link link, double linked) {
        return inverted(link, link.tabulated(linked));
    }

    @ParameterizedTest(name = "from {0} to {1}")
    @CsvSource({"-708, 709", "-40, 40", "-1, 1", "-1e-6, 1e-6"})
    void powersUndoRoots(double low, double high) {
        var random = new SplittableRandom(20261201);
        for (int i = 0; i < 100_000; i++) {
            double log = random.nextDouble(low, high);
            double expected = StrictMath.exp(log);
            assertEquals(expected, there(Link.ROOT, log), 3e-13 * expected, () -> "e^" + log);
        }
    }

    @Test
    void powersUnderflowGradually() {
        var random = new SplittableRandom(20261201);
        for (int i = 0; i < 100_000; i++) {
            double log = random.nextDouble(-747, -708);
            double expected = StrictMath.exp(log);
            assertEquals(expected, there(Link.ROOT, log), Double.MIN_VALUE + 3e-13 * expected, () -> "e^" + log);
        }
    }

    @ParameterizedTest
    @CsvSource({"0, 1", "710, Infinity", "1e6, Infinity", "-746, 0", "-746.2, 0", "-1e6, 0", "NaN, NaN"})
    void farPowers(double log, double expected) {
        assertEquals(expected, there(Link.ROOT, log));
    }

    @Test
    void powersNeverFallBack() {
        var random = new SplittableRandom(20261201);
        for (int trial = 0; trial < 2_000; trial++) {
            double root = Link.ROOT.tabulated(random.nextDouble(-800, 715));
            var y = new double[200];
            for (int i = 0; i < 200; i++) {
                y[i] = root + (i - 100) * Math.ulp(root);
            }
            Link.ROOT.invert(y, 200, 0, 1);
            for (int i = 1; i < 200; i++) {
                assertTrue(y[i] >= y[i - 1], () -> "near the power of " + root);
            }
        }
    }

    /// Told from `log(x / (1 - x))`, from either end.
    @Test
    void endsKeepTheirDigits() {
        var random = new SplittableRandom(20261201);
        for (int i = 0; i < 100_000; i++) {
            double logit = random.nextDouble(-700, 700) * StrictMath.scalb(1.0, -random.nextInt(12));
            double smaller = 1 / (1 + StrictMath.exp(Math.abs(logit)));
            double expected = logit < 0 ? smaller : 1 - smaller;
            for (var link : new Link[] {Link.ENDS, Link.ROOT_OF_ENDS}) {
                assertEquals(expected, there(link, logit), 3e-13 * expected, () -> link + " of " + logit);
            }
        }
    }

    @ParameterizedTest
    @CsvSource({"-2, -0.5, 7", "3, 2, 1"})
    void valuesAreShiftedAndScaled(double log, double location, double scale) {
        double[] x = {Link.ROOT.tabulated(log)};
        Link.ROOT.invert(x, 1, location, scale);
        assertEquals(location + scale * StrictMath.exp(log), x[0], 1e-11);
    }
}
