package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class LogOddsTest {
    /// Beta(1, b) has `P(X > x) = (1-x)^b`, Beta(a, 1) has `1 - x^a`: parameters to 1e11, tails to 1e-16.
    @Test
    void agreesWithClosedForms() {
        var random = new SplittableRandom(20261201);
        for (int i = 0; i < 500; i++) {
            double n = Math.exp(random.nextDouble() * 25);
            double tail = .5 * Math.exp(-random.nextDouble() * 36);
            var what = "n = " + n + ", tail = " + tail;
            double light = Math.log(n * Math.expm1(-Math.log(tail) / n));
            assertEquals(light, LogOdds.upper(1, n, tail), 1e-14 * Math.max(1, Math.abs(light)), what);
            double heavy = -Math.log(n * Math.expm1(-Math.log1p(-tail) / n));
            assertEquals(heavy, LogOdds.upper(n, 1, tail), 1e-14 * Math.max(1, Math.abs(heavy)), what);
        }
    }

    /// Symmetric densities have their median in the middle, however narrow.
    @Test
    void findsTheMiddle() {
        for (double a : new double[] {.5, 1, 3, 1e3, 1e6, 1e12}) {
            assertEquals(0, LogOdds.upper(a, a, .5), 2e-14 * Math.sqrt(2 / a) + 0x1p-53, "a = " + a);
        }
    }

    @Test
    void refusesWhatHasNoQuantile() {
        assertThrows(IllegalArgumentException.class, () -> LogOdds.upper(0, 1, .1));
        assertThrows(IllegalArgumentException.class, () -> LogOdds.upper(1, Double.NaN, .1));
        assertThrows(IllegalArgumentException.class, () -> LogOdds.upper(1, 1, .6));
        assertThrows(IllegalArgumentException.class, () -> LogOdds.upper(1, 1, 0));
    }
}
