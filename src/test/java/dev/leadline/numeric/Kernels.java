package dev.leadline.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.ByteBuffer;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.SplittableRandom;
import java.util.function.DoubleFunction;
import java.util.function.DoubleSupplier;
import java.util.function.DoubleUnaryOperator;

/// What every kernel is held to: an error bound against [HighPrecision], one set of bits by every route, and those
/// bits never changing.
final class Kernels {
    private static final double[] SPECIAL = {
        0.0,
        -0.0,
        Double.MIN_VALUE,
        -Double.MIN_VALUE,
        Double.MIN_NORMAL,
        -Double.MIN_NORMAL,
        Math.nextDown(Double.MIN_NORMAL),
        0x1p-54,
        -0x1p-54,
        0.25,
        0.5,
        1,
        -1,
        Math.nextUp(1.0),
        Math.nextDown(1.0),
        2,
        -2,
        708,
        -708,
        Math.nextUp(708.0),
        709.782712893384,
        709.7827128933841,
        -745.1332191019411,
        -745.1332191019412,
        0x1p28,
        Math.nextUp(0x1p28),
        -0x1p28,
        Double.MAX_VALUE,
        -Double.MAX_VALUE,
        Double.POSITIVE_INFINITY,
        Double.NEGATIVE_INFINITY,
        Double.NaN
    };

    private Kernels() {}

    /// A kernel in its block form.
    @FunctionalInterface
    interface Block {
        void apply(double[] x, double[] y, int n);
    }

    /// Asserts that no error exceeds `bound` ulp and that the largest one seen is at least a third of it: a bound far
    /// from what is observed would guard nothing.
    static void within(
            double bound,
            DoubleUnaryOperator kernel,
            DoubleFunction<HighPrecision.Value> exact,
            DoubleSupplier x,
            int n) {
        double worst = 0;
        for (int i = 0; i < n; i++) {
            double at = x.getAsDouble();
            double value = kernel.applyAsDouble(at);
            double miss = exact.apply(at).ulps(value);
            assertTrue(miss <= bound, () -> miss + " ulp at " + at + ": " + value);
            worst = Math.max(worst, miss);
        }
        double seen = worst;
        assertTrue(seen >= bound / 3, () -> "only " + seen + " ulp seen");
    }

    /// Asserts that the block form gives the bits of the scalar form (any NaN equals any other) on special values, on
    /// `typical` ones and on random bit patterns, for awkward lengths, in place and not, and touches nothing more.
    static void sameBits(DoubleUnaryOperator scalar, Block block, DoubleSupplier typical) {
        double[] x = mixture(typical, 3000);
        for (int n : new int[] {0, 1, 7, 511, 512, 513, 1500, 3000}) {
            double[] y = new double[n + 1];
            y[n] = 42;
            block.apply(x, y, n);
            assertEquals(42, y[n]);
            double[] inPlace = x.clone();
            block.apply(inPlace, inPlace, n);
            for (int i = 0; i < n; i++) {
                long expected = Double.doubleToLongBits(scalar.applyAsDouble(x[i]));
                double at = x[i];
                assertEquals(expected, Double.doubleToLongBits(y[i]), () -> "at " + at);
                assertEquals(expected, Double.doubleToLongBits(inPlace[i]), () -> "in place at " + at);
            }
        }
        // blocks without a rare value take the vectorised path only
        double[] tame = new double[2000];
        for (int i = 0; i < tame.length; i++) tame[i] = typical.getAsDouble();
        double[] y = new double[tame.length];
        block.apply(tame, y, tame.length);
        for (int i = 0; i < tame.length; i++) {
            double at = tame[i];
            assertEquals(
                    Double.doubleToLongBits(scalar.applyAsDouble(at)), Double.doubleToLongBits(y[i]), () -> "at " + at);
        }
    }

    /// The first 16 hexadecimal digits of the SHA-256 of the result bits on a fixed set of arguments.
    static String fingerprint(Block block, DoubleSupplier typical) {
        double[] x = mixture(typical, 10_000);
        double[] y = new double[x.length];
        block.apply(x, y, x.length);
        for (int i = 0; i < x.length; i++) x[i] = typical.getAsDouble();
        double[] z = new double[x.length];
        block.apply(x, z, x.length);
        ByteBuffer bytes = ByteBuffer.allocate(16 * x.length);
        for (double value : y) bytes.putLong(Double.doubleToLongBits(value));
        for (double value : z) bytes.putLong(Double.doubleToLongBits(value));
        try {
            byte[] digest = MessageDigest.getInstance("SHA-256").digest(bytes.array());
            return HexFormat.of().formatHex(digest, 0, 8);
        } catch (NoSuchAlgorithmException e) {
            throw new AssertionError(e);
        }
    }

    /// Special values, then typical ones and random bit patterns in turn.
    static double[] mixture(DoubleSupplier typical, int n) {
        SplittableRandom random = new SplittableRandom(20261201);
        double[] x = new double[n];
        for (int i = 0; i < n; i++) {
            if (i < SPECIAL.length) x[i] = SPECIAL[i];
            else if (i % 2 == 0) x[i] = typical.getAsDouble();
            else x[i] = Double.longBitsToDouble(random.nextLong());
        }
        return x;
    }

    /// Uniform numbers.
    static DoubleSupplier between(double low, double high, long seed) {
        SplittableRandom random = new SplittableRandom(seed);
        return () -> random.nextDouble(low, high);
    }

    /// Positive numbers of every exponent alike, up to `largest`.
    static DoubleSupplier anyExponent(double largest, long seed) {
        SplittableRandom random = new SplittableRandom(seed);
        long bits = Double.doubleToRawLongBits(largest);
        return () -> Double.longBitsToDouble(random.nextLong(1, bits));
    }
}
