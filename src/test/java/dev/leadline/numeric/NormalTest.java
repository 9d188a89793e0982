package dev.leadline.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import java.util.function.DoubleFunction;
import java.util.function.DoubleSupplier;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class NormalTest {
    /// Documented in [Normal]; seen: 4.2, next to 0.
    private static final double BOUND_OF_CDF = 5;

    /// Seen: 1.8.
    private static final double BOUND_OF_PDF = 2;

    /// Seen: 4.2, below 1e-20.
    private static final double BOUND_OF_QUANTILE = 5;

    private static final DoubleFunction<HighPrecision.Value> CDF = x -> HighPrecision.normalUpperTail(-x);

    @Test
    void cdfKeepsItsBound() {
        Kernels.within(BOUND_OF_CDF, Normal::cdf, CDF, Kernels.between(-1, 1, 1), 1_000);
        Kernels.within(BOUND_OF_CDF, Normal::cdf, CDF, Kernels.between(-8, 8, 2), 700);
        Kernels.within(BOUND_OF_CDF, Normal::cdf, CDF, Kernels.between(-20, -8, 3), 100);
    }

    @Test
    void cdfIsAccurateDownToItsUnderflow() {
        Kernels.within(BOUND_OF_CDF, Normal::cdf, CDF, Kernels.between(-37.5, -20, 4), 60);
        Kernels.within(BOUND_OF_CDF / 3, Normal::cdf, CDF, Kernels.between(-38.5, -37.5, 5), 40);
    }

    @Test
    void pdfKeepsItsBound() {
        Kernels.within(BOUND_OF_PDF, Normal::pdf, HighPrecision::normalDensity, Kernels.between(-8, 8, 6), 1_000);
        Kernels.within(BOUND_OF_PDF, Normal::pdf, HighPrecision::normalDensity, Kernels.between(-39, 39, 7), 1_000);
    }

    @ParameterizedTest(name = "{0} to {1}")
    @CsvSource({"0.25, 0.5, 1000", "0, 0.25, 1000"})
    void quantileKeepsItsBound(double low, double high, int n) {
        quantileWithin(Kernels.between(low, high, 8), n);
    }

    @Test
    void quantileKeepsItsBoundInTheTail() {
        SplittableRandom random = new SplittableRandom(9);
        quantileWithin(() -> Math.pow(10, -random.nextDouble(20)), 600);
        quantileWithin(() -> Math.pow(10, -random.nextDouble(20, 307)), 60);
        quantileWithin(() -> Double.MIN_NORMAL * random.nextDouble(), 20);
    }

    /// Abramowitz and Stegun (1964), table 26.5, and common tables of the normal distribution; from memory.
    @ParameterizedTest
    @CsvSource({
        "0.975, 1.959963984540054",
        "0.995, 2.5758293035489004",
        "0.9, 1.2815515655446004",
        "0.75, 0.6744897501960817"
    })
    void quantilesOfTheTables(double p, double z) {
        assertEquals(z, Normal.quantile(p), 2e-15);
        assertEquals(-z, Normal.upperQuantile(p), 2e-15);
    }

    @Test
    void tailsMirror() {
        DoubleSupplier x = Kernels.between(0, 1, 10);
        for (int i = 0; i < 1000; i++) {
            double p = Math.rint(x.getAsDouble() * 0x1p52) * 0x1p-52;
            assertEquals(Normal.quantile(p), 0 - Normal.quantile(1 - p));
            assertEquals(Normal.upperQuantile(p), Normal.quantile(1 - p));
        }
    }

    @ParameterizedTest
    @CsvSource({
        "0, 0.5, 0.3989422804014327",
        "-0.0, 0.5, 0.3989422804014327",
        "-Infinity, 0.0, 0.0",
        "Infinity, 1, 0.0",
        "NaN, NaN, NaN",
        "-38.6, 0.0, 2.5e-324"
    })
    void specialValues(double x, double cdf, double pdf) {
        assertEquals(cdf, Normal.cdf(x));
        assertEquals(pdf, Normal.pdf(x), Double.MIN_VALUE);
    }

    @ParameterizedTest
    @CsvSource({
        "0, -Infinity",
        "-0.0, -Infinity",
        "1, Infinity",
        "0.5, 0.0",
        "NaN, NaN",
        "-0.1, NaN",
        "1.1, NaN",
        "Infinity, NaN"
    })
    void specialQuantiles(double p, double z) {
        assertEquals(z, Normal.quantile(p));
        assertEquals(0 - z, Normal.upperQuantile(p));
    }

    @Test
    void blockGivesTheBitsOfTheScalar() {
        Kernels.sameBits(Normal::cdf, Normal::cdf, Kernels.between(-40, 10, 11));
        Kernels.sameBits(Normal::pdf, Normal::pdf, Kernels.between(-40, 10, 12));
        Kernels.sameBits(Normal::quantile, Normal::quantile, Kernels.between(0, 1, 13));
        Kernels.sameBits(Normal::upperQuantile, Normal::upperQuantile, Kernels.between(0, 1, 13));
        Kernels.sameBits(Normal::quantile, Normal::quantile, Kernels.anyExponent(1, 14));
    }

    /// Recorded after the bounds held. Checked by hand to be the same on JDK 25 with -Xint, -XX:TieredStopAtLevel=1,
    /// -XX:UseAVX=2 and -XX:UseAVX=0, and on JDK 17.
    @Test
    void bitsDoNotChange() {
        assertEquals("719bb43b501e39e2", Kernels.fingerprint(Normal::cdf, Kernels.between(-40, 10, 15)));
        assertEquals("bab0df7066bd8af0", Kernels.fingerprint(Normal::pdf, Kernels.between(-40, 10, 16)));
        assertEquals("858bb09ad22ac15a", Kernels.fingerprint(Normal::quantile, Kernels.anyExponent(1, 17)));
    }

    private static void quantileWithin(DoubleSupplier x, int n) {
        double worst = 0;
        for (int i = 0; i < n; i++) {
            double p = x.getAsDouble();
            double miss = HighPrecision.quantileUlps(p, Normal.quantile(p));
            assertTrue(miss <= BOUND_OF_QUANTILE, () -> miss + " ulp at " + p);
            worst = Math.max(worst, miss);
        }
        double seen = worst;
        assertTrue(seen >= BOUND_OF_QUANTILE / 5, () -> "only " + seen + " ulp seen");
    }
}
