package dev.leadline.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.SplittableRandom;
import java.util.function.DoubleSupplier;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class PowerTest {
    /// Documented in [Power]; seen: 0.73 in 900,000 pairs.
    private static final double BOUND = 0.8;

    /// Documented for the products; seen: 0.5.
    private static final double BOUND_OF_PRODUCTS = 0.51;

    private static final double[] EXPONENTS = {
        0, 1, 2, 3, 5, 7, 11, 15, 16, 17, -1, -2, -3, -16, -17, 0.5, -0.5, 1.5, 0.1, -7.25
    };

    @Test
    void keepsItsBound() {
        within(BOUND, Kernels.between(0, 10, 1), Kernels.between(-4, 4, 2), 3_000);
    }

    /// Large exponents of bases close to 1 multiply whatever the logarithm misses by a thousand.
    @Test
    void keepsItsBoundForLargeExponents() {
        within(BOUND, Kernels.between(0.5, 2, 3), Kernels.between(-1000, 1000, 4), 3_000);
        SplittableRandom random = new SplittableRandom(5);
        within(
                BOUND,
                () -> 1 + random.nextDouble(-0.5, 0.5) * Math.scalb(1.0, -random.nextInt(52)),
                () -> random.nextDouble(-1, 1) * Math.scalb(1.0, random.nextInt(53)),
                3_000);
    }

    @Test
    void keepsItsBoundForEveryBase() {
        within(BOUND, Kernels.anyExponent(Double.MAX_VALUE, 6), Kernels.between(-1.2, 1.2, 7), 3_000);
        within(BOUND, Kernels.anyExponent(Double.MIN_NORMAL, 8), Kernels.between(-1, 1.1, 9), 2_000);
    }

    @Test
    void underflowsGradually() {
        within(BOUND, Kernels.between(1e-9, 3e-9, 10), Kernels.between(36, 36.4, 11), 3_000);
    }

    @ParameterizedTest
    @ValueSource(ints = {-16, -15, -7, -3, -2, -1, 2, 3, 4, 5, 7, 11, 13, 15, 16})
    void productsAreNearlyAlwaysTheNearestDouble(int k) {
        within(BOUND_OF_PRODUCTS, Kernels.between(0, 10, k), () -> k, 500);
    }

    @ParameterizedTest
    @ValueSource(ints = {-16, -5, -2, 3, 16})
    void wholePowersOfEveryBase(int k) {
        within(BOUND, Kernels.anyExponent(Double.MAX_VALUE, k), () -> k, 500);
    }

    @Test
    void negativeBases() {
        DoubleSupplier x = Kernels.between(0, 10, 12);
        for (int i = 0; i < 100; i++) {
            double base = x.getAsDouble();
            for (int k = -40; k <= 40; k++) {
                assertEquals(k % 2 == 0 ? Power.pow(base, k) : -Power.pow(base, k), Power.pow(-base, k));
            }
            assertEquals(Double.NaN, Power.pow(-base, 0.5 + i));
        }
    }

    /// The special cases in the documentation of `Math.pow`, all of them, by comparison with `StrictMath`.
    @Test
    void specialValuesAreThoseOfTheLanguage() {
        double[] values = {
            0.0,
            -0.0,
            0.5,
            -0.5,
            1,
            -1,
            2,
            -2,
            3,
            -3,
            1.5,
            -1.5,
            17,
            -17,
            18,
            -18,
            0x1p52 + 1,
            0x1p53,
            0x1p60,
            -0x1p53 + 1,
            Double.MIN_VALUE,
            -Double.MIN_VALUE,
            Double.MAX_VALUE,
            -Double.MAX_VALUE,
            Double.POSITIVE_INFINITY,
            Double.NEGATIVE_INFINITY,
            Double.NaN
        };
        for (double x : values) {
            for (double y : values) {
                double expected = StrictMath.pow(x, y);
                double actual = Power.pow(x, y);
                assertEquals(
                        expected,
                        actual,
                        Math.abs(expected) < Double.POSITIVE_INFINITY ? Math.ulp(expected) : 0,
                        () -> x + "^" + y);
                if (Double.isNaN(expected)) continue;
                assertEquals(Math.copySign(1, expected), Math.copySign(1, actual), () -> "sign of " + x + "^" + y);
            }
        }
    }

    @Test
    void everyRouteGivesTheSameBits() {
        for (double exponent : EXPONENTS) {
            Kernels.sameBits(
                    x -> Power.pow(x, exponent), (x, y, n) -> Power.pow(x, exponent, y, n), Kernels.between(0, 9, 13));
            Kernels.sameBits(
                    x -> Power.pow(x, exponent),
                    (x, y, n) -> {
                        double[] exponents = new double[n];
                        Arrays.fill(exponents, exponent);
                        Power.pow(x, exponents, y, n);
                    },
                    Kernels.between(0, 9, 14));
        }
    }

    @Test
    void blockOfPairsGivesTheBitsOfTheScalar() {
        double[] x = Kernels.mixture(Kernels.between(0, 9, 15), 4000);
        double[] y = Kernels.mixture(Kernels.between(-5, 5, 16), 4000);
        for (int shift = 0; shift < 12; shift++) {
            double[] z = y.clone();
            for (int i = 0; i < z.length; i++)
                z[i] = i % 3 == 0 ? EXPONENTS[i / 3 % EXPONENTS.length] : y[(i + shift) % y.length];
            double[] exponents = z.clone();
            Power.pow(x, z, z, z.length);
            for (int i = 0; i < z.length; i++) {
                double base = x[i];
                double exponent = exponents[i];
                assertEquals(
                        Double.doubleToLongBits(Power.pow(base, exponent)),
                        Double.doubleToLongBits(z[i]),
                        () -> base + "^" + exponent);
            }
        }
    }

    /// Recorded after the bounds held. Checked by hand to be the same on JDK 25 with -Xint, -XX:TieredStopAtLevel=1,
    /// -XX:UseAVX=2 and -XX:UseAVX=0, and on JDK 17.
    @Test
    void bitsDoNotChange() {
        assertEquals(
                "869dac1fab2650c9",
                Kernels.fingerprint((x, z, n) -> Power.pow(x, 1.7, z, n), Kernels.between(0, 9, 17)));
        assertEquals(
                "7be2f7c6d43c297c",
                Kernels.fingerprint((x, z, n) -> Power.pow(x, -13, z, n), Kernels.between(-9, 9, 18)));
        assertEquals(
                "306242499be70771",
                Kernels.fingerprint((x, z, n) -> Power.pow(x, -523.7, z, n), Kernels.between(0.4, 2, 19)));
    }

    private static void within(double bound, DoubleSupplier x, DoubleSupplier y, int n) {
        double worst = 0;
        for (int i = 0; i < n; i++) {
            double base = x.getAsDouble();
            double exponent = y.getAsDouble();
            double miss = HighPrecision.pow(base, exponent).ulps(Power.pow(base, exponent));
            assertTrue(miss <= bound, () -> miss + " ulp at " + base + "^" + exponent);
            worst = Math.max(worst, miss);
        }
        double seen = worst;
        assertTrue(seen >= bound / 3, () -> "only " + seen + " ulp seen");
    }
}
