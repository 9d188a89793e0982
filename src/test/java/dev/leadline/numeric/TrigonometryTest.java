package dev.leadline.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import java.util.function.DoubleFunction;
import java.util.function.DoubleSupplier;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class TrigonometryTest {
    /// Documented in [Trigonometry]; seen: 0.80 in 200,000 values.
    private static final double BOUND = 0.85;

    /// Seen: 1.8 in 100,000 values.
    private static final double BOUND_OF_TANGENT = 2;

    private static final DoubleFunction<HighPrecision.Value> TAN =
            x -> HighPrecision.sin(x).divide(HighPrecision.cos(x));

    @ParameterizedTest(name = "to {0}")
    @ValueSource(doubles = {1.6, 20, 1e4, 0x1p28})
    void keepsItsBound(double range) {
        DoubleSupplier x = Kernels.between(-range, range, 1);
        Kernels.within(BOUND, Trigonometry::sin, HighPrecision::sin, x, 4_000);
        Kernels.within(BOUND, Trigonometry::cos, HighPrecision::cos, x, 4_000);
        Kernels.within(BOUND_OF_TANGENT, Trigonometry::tan, TAN, x, 3_000);
    }

    @Test
    void keepsItsBoundForEveryExponent() {
        DoubleSupplier x = Kernels.anyExponent(0x1p28, 2);
        Kernels.within(BOUND, Trigonometry::sin, HighPrecision::sin, x, 3_000);
        Kernels.within(BOUND, Trigonometry::cos, HighPrecision::cos, x, 3_000);
        Kernels.within(BOUND_OF_TANGENT, Trigonometry::tan, TAN, x, 3_000);
    }

    /// The doubles nearest to multiples of `π/2`, where the reduction cancels most.
    @Test
    void keepsItsBoundNextToTheZeros() {
        SplittableRandom random = new SplittableRandom(3);
        DoubleSupplier x = () -> Math.PI / 2 * random.nextInt(1, 1 << random.nextInt(1, 28));
        Kernels.within(BOUND, Trigonometry::sin, HighPrecision::sin, x, 3_000);
        Kernels.within(BOUND, Trigonometry::cos, HighPrecision::cos, x, 3_000);
        Kernels.within(BOUND_OF_TANGENT, Trigonometry::tan, TAN, x, 3_000);
    }

    /// The doubles up to 2^28 closest to a multiple of `π/2`, by a search of all multiples; the first misses by 6e-19.
    @ParameterizedTest
    @ValueSource(
            doubles = {45.553093477052, 91.106186954104, 1.446117667027838E7, 2.892235334055676E7, 2.3137882672445408E8
            })
    void keepsItsBoundWhereTheReductionCancelsMost(double x) {
        assertTrue(HighPrecision.sin(x).ulps(Trigonometry.sin(x)) <= BOUND);
        assertTrue(HighPrecision.cos(x).ulps(Trigonometry.cos(x)) <= BOUND);
        assertTrue(TAN.apply(x).ulps(Trigonometry.tan(x)) <= BOUND_OF_TANGENT);
    }

    @Test
    void beyondTheReductionIsWithinOneUlp() {
        DoubleSupplier x = Kernels.between(0x1p28, 1e300, 4);
        Kernels.within(1, Trigonometry::sin, HighPrecision::sin, x, 500);
        Kernels.within(1, Trigonometry::cos, HighPrecision::cos, x, 500);
    }

    @ParameterizedTest
    @CsvSource({
        "0, 0.0, 1, 0.0",
        "-0.0, -0.0, 1, -0.0",
        "NaN, NaN, NaN, NaN",
        "Infinity, NaN, NaN, NaN",
        "-Infinity, NaN, NaN, NaN",
        "4.9e-324, 4.9e-324, 1, 4.9e-324"
    })
    void specialValues(double x, double sin, double cos, double tan) {
        assertEquals(sin, Trigonometry.sin(x));
        assertEquals(cos, Trigonometry.cos(x));
        assertEquals(tan, Trigonometry.tan(x));
    }

    @Test
    void blockGivesTheBitsOfTheScalar() {
        for (double range : new double[] {10, 1e6}) {
            Kernels.sameBits(Trigonometry::sin, Trigonometry::sin, Kernels.between(-range, range, 5));
            Kernels.sameBits(Trigonometry::cos, Trigonometry::cos, Kernels.between(-range, range, 6));
            Kernels.sameBits(Trigonometry::tan, Trigonometry::tan, Kernels.between(-range, range, 7));
        }
    }

    /// Recorded after the bounds held. Checked by hand to be the same on JDK 25 with -Xint, -XX:TieredStopAtLevel=1,
    /// -XX:UseAVX=2 and -XX:UseAVX=0, and on JDK 17.
    @Test
    void bitsDoNotChange() {
        assertEquals("2e6ee1bbfed89465", Kernels.fingerprint(Trigonometry::sin, Kernels.between(-100, 100, 8)));
        assertEquals("1016cbf48fac30be", Kernels.fingerprint(Trigonometry::cos, Kernels.between(-100, 100, 8)));
        assertEquals("5ec1a24b384f72b8", Kernels.fingerprint(Trigonometry::tan, Kernels.between(-100, 100, 8)));
    }
}
