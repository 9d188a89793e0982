package dev.leadline.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// Against `StrictMath.pow`, whose error is 1 ulp.
class Exp2Test {
    private static double exp2(double x) {
        double[] y = {x};
        Exp2.exp2(y, new double[1], 1);
        return y[0];
    }

    @ParameterizedTest(name = "from {0} to {1}")
    @CsvSource({"-1022, 1023.9", "-40, 40", "-1, 1", "-1e-6, 1e-6", "-33, -31"})
    void keepsItsBound(double low, double high) {
        var random = new SplittableRandom(20261201);
        for (int i = 0; i < 100_000; i++) {
            double x = random.nextDouble(low, high);
            double expected = StrictMath.pow(2, x);
            assertEquals(expected, exp2(x), 5e-14 * expected, () -> "2^" + x);
        }
    }

    @Test
    void underflowsGradually() {
        var random = new SplittableRandom(20261201);
        for (int i = 0; i < 100_000; i++) {
            double x = random.nextDouble(-1080, -1022);
            double expected = StrictMath.pow(2, x);
            assertEquals(expected, exp2(x), Double.MIN_VALUE + 5e-14 * expected, () -> "2^" + x);
        }
    }

    /// Multiples of 64 are exact.
    @ParameterizedTest
    @CsvSource({
        "0, 1",
        "-0.0, 1",
        "-64, 5.421010862427522e-20",
        "NaN, NaN",
        "1025, Infinity",
        "65000, Infinity",
        "-1090, 0",
        "-65000, 0"
    })
    void specialValues(double x, String expected) {
        assertEquals(Double.parseDouble(expected), exp2(x));
    }

    /// Neighbours, where the exponent changes and at random.
    @Test
    void neverFallsBack() {
        var random = new SplittableRandom(20261201);
        for (int trial = 0; trial < 2_000; trial++) {
            double x = trial % 2 == 0
                    ? 32 * (2 * random.nextInt(-15, 16) + 1)
                    : random.nextDouble(-900, 900) * StrictMath.scalb(1.0, -random.nextInt(20));
            var y = new double[200];
            for (int i = -100; i < 100; i++) {
                y[i + 100] = x + i * Math.ulp(x);
            }
            Exp2.exp2(y, new double[200], 200);
            for (int i = 1; i < 200; i++) {
                assertTrue(y[i] >= y[i - 1], "near 2^" + x);
            }
        }
    }

    @Test
    void blockGivesTheBitsOfOne() {
        var random = new SplittableRandom(20261201);
        var x = random.doubles(1000, -1100, 1100).toArray();
        var y = x.clone();
        Exp2.exp2(y, new double[1000], 1000);
        for (int i = 0; i < 1000; i++) {
            assertEquals(exp2(x[i]), y[i]);
        }
    }
}
