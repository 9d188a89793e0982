package dev.leadline.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class LogTest {
    /// Documented in [Log]; seen: 0.79 in 100,000 values.
    private static final double BOUND = 0.85;

    @ParameterizedTest(name = "from {0} to {1}")
    @CsvSource({"0, 10", "0.7, 1.5", "1.39, 1.42", "0.7, 0.71"})
    void keepsItsBound(double low, double high) {
        Kernels.within(BOUND, Log::log, HighPrecision::log, Kernels.between(low, high, 1), 4_000);
    }

    @Test
    void keepsItsBoundCloseToOne() {
        SplittableRandom random = new SplittableRandom(2);
        Kernels.within(
                BOUND,
                Log::log,
                HighPrecision::log,
                () -> 1 + random.nextDouble(-1, 1) * Math.scalb(1.0, -random.nextInt(1, 53)),
                4_000);
    }

    @Test
    void keepsItsBoundFromTheSmallestToTheLargest() {
        Kernels.within(BOUND, Log::log, HighPrecision::log, Kernels.anyExponent(Double.MAX_VALUE, 3), 2_000);
        Kernels.within(BOUND, Log::log, HighPrecision::log, Kernels.anyExponent(Double.MIN_NORMAL, 4), 1_000);
    }

    @ParameterizedTest
    @CsvSource({
        "NaN, NaN",
        "-1, NaN",
        "-4.9e-324, NaN",
        "-Infinity, NaN",
        "Infinity, Infinity",
        "0, -Infinity",
        "-0.0, -Infinity",
        "1, 0.0"
    })
    void specialValues(double x, double expected) {
        assertEquals(expected, Log.log(x));
    }

    @Test
    void blockGivesTheBitsOfTheScalar() {
        Kernels.sameBits(Log::log, Log::log, Kernels.between(0, 3, 5));
        Kernels.sameBits(Log::log, Log::log, Kernels.anyExponent(Double.MAX_VALUE, 6));
    }

    /// Recorded after the bounds held. Checked by hand to be the same on JDK 25 with -Xint, -XX:TieredStopAtLevel=1,
    /// -XX:UseAVX=2 and -XX:UseAVX=0, and on JDK 17.
    @Test
    void bitsDoNotChange() {
        assertEquals("ba6d9762ed90b1ea", Kernels.fingerprint(Log::log, Kernels.between(0, 3, 7)));
    }
}
