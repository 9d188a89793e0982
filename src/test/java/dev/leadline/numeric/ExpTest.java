package dev.leadline.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ExpTest {
    /// Documented in [Exp]; seen: 0.63 in 200,000 values.
    private static final double BOUND = 0.7;

    /// Seen: 0.78 of the smallest subnormal.
    private static final double BOUND_IN_UNDERFLOW = 0.8;

    @ParameterizedTest(name = "from {0} to {1}")
    @CsvSource({"-708, 709.78", "-20, 20", "-1, 1", "-0.3466, -0.33"})
    void keepsItsBound(double low, double high) {
        Kernels.within(BOUND, Exp::exp, HighPrecision::exp, Kernels.between(low, high, 1), 5_000);
    }

    @Test
    void keepsItsBoundForTinyArguments() {
        SplittableRandom random = new SplittableRandom(2);
        Kernels.within(
                BOUND,
                Exp::exp,
                HighPrecision::exp,
                () -> random.nextDouble(-1, 1) * Math.scalb(1.0, -random.nextInt(60)),
                2_000);
    }

    @Test
    void underflowsGradually() {
        Kernels.within(BOUND_IN_UNDERFLOW, Exp::exp, HighPrecision::exp, Kernels.between(-745.2, -708, 3), 5_000);
    }

    @Test
    void roundsTheEdgesRight() {
        assertEquals(0, HighPrecision.exp(709.782712893384).ulps(Exp.exp(709.782712893384)), BOUND);
        assertEquals(Double.POSITIVE_INFINITY, Exp.exp(709.7827128933841));
        assertEquals(Double.MIN_VALUE, Exp.exp(-745.1332191019411));
        assertEquals(0, Exp.exp(-745.1332191019412));
    }

    @ParameterizedTest
    @CsvSource({
        "NaN, NaN",
        "Infinity, Infinity",
        "-Infinity, 0",
        "0, 1",
        "-0.0, 1",
        "4.9e-324, 1",
        "1e308, Infinity",
        "-1e308, 0"
    })
    void specialValues(double x, double expected) {
        assertEquals(expected, Exp.exp(x));
    }

    @Test
    void blockGivesTheBitsOfTheScalar() {
        Kernels.sameBits(Exp::exp, Exp::exp, Kernels.between(-30, 30, 4));
        Kernels.sameBits(Exp::exp, Exp::exp, Kernels.between(-750, 715, 5));
    }

    /// Recorded after the bounds held. Checked by hand to be the same on JDK 25 with -Xint, -XX:TieredStopAtLevel=1,
    /// -XX:UseAVX=2 and -XX:UseAVX=0, and on JDK 17.
    @Test
    void bitsDoNotChange() {
        assertEquals("2359dc6ad25bfce5", Kernels.fingerprint(Exp::exp, Kernels.between(-750, 715, 6)));
    }
}
