package dev.leadline.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigInteger;
import org.apache.commons.numbers.gamma.Gamma;
import org.apache.commons.numbers.gamma.LogGamma;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.CsvSource;

/// Against values of 60 digits (`numeric/gamma.py`) and another library.
class GammaFunctionTest {
    private static final int GAMMA_ULPS = 6;
    private static final int LOG_ULPS = 4;
    private static final double LOG_OF_NEGATIVE = 5e-16;
    private static final double SMALL_FORMS = 2e-15;
    private static final double STIRLING_BELOW_TEN = 4e-15;

    @ParameterizedTest(name = "x = {0}")
    @CsvFileSource(resources = "/numeric/gamma.csv", numLinesToSkip = 2)
    void agreesWithSixtyDigits(double x, double gamma, double log) {
        within(GAMMA_ULPS * Math.ulp(gamma), gamma, GammaFunction.gamma(x));
        within(
                x > 0 ? LOG_ULPS * Math.ulp(log) : LOG_OF_NEGATIVE * Math.max(1, Math.abs(log)),
                log,
                GammaFunction.log(x));
    }

    private static void within(double bound, double expected, double actual) {
        if (expected == actual) return;
        assertTrue(
                Math.abs(expected - actual) <= bound,
                () -> "expected %s, was %s: %.2f of the bound"
                        .formatted(expected, actual, Math.abs(expected - actual) / bound));
    }

    @Test
    void factorialsAreExact() {
        BigInteger factorial = BigInteger.ONE;
        for (int n = 1; n <= 170; n++) {
            factorial = factorial.multiply(BigInteger.valueOf(n));
            assertEquals(factorial.doubleValue(), GammaFunction.gamma(n + 1), 0.0, "n = " + n);
        }
    }

    @ParameterizedTest(name = "gamma({0}) = {1}, log {2}")
    @CsvSource({
        "0, Infinity, Infinity", "-0.0, -Infinity, Infinity", "-1, NaN, Infinity", "-1e300, NaN, Infinity",
        "Infinity, Infinity, Infinity", "-Infinity, NaN, Infinity", "NaN, NaN, NaN", "172, Infinity, 711.71472580229",
        "1, 1, 0", "2, 1, 0"
    })
    void specialValues(double x, double gamma, double log) {
        assertEquals(gamma, GammaFunction.gamma(x), 0.0);
        assertEquals(log, GammaFunction.log(x), 1e-10);
    }

    @Test
    void agreesWithALibrary() {
        for (double x = 1e-3; x < 170; x *= 1.03) {
            double at = x;
            double gamma = Gamma.value(x);
            assertEquals(gamma, GammaFunction.gamma(x), 3e-14 * gamma, () -> "gamma at " + at);
            double log = LogGamma.value(x);
            assertEquals(log, GammaFunction.log(x), 1e-14 * Math.max(1, Math.abs(log)), () -> "log at " + at);
        }
    }

    /// mpmath 1.3.0, 60 digits.
    @ParameterizedTest
    @CsvSource({
        "-0.5, 0.57236494292470009",
        "-1e-9, 5.7721566572399993e-10",
        "1e-9, -5.7721566407906586e-10",
        "0.25, -0.098271836421813161",
        "0.5, -0.12078223763524522"
    })
    void logarithmNearOne(double x, double expected) {
        assertEquals(expected, GammaFunction.logOnePlus(x), SMALL_FORMS * Math.abs(expected));
    }

    /// mpmath 1.3.0, 60 digits.
    @ParameterizedTest
    @CsvSource({
        "1e-9, 1.6449340644441128e-18",
        "1e-4, 1.6446936933426873e-8",
        "0.1, 0.0143707925163636",
        "0.25, 0.075761435208381101"
    })
    void differenceThatCancels(double x, double expected) {
        assertEquals(expected, GammaFunction.logExcess(x), SMALL_FORMS * expected);
    }

    /// mpmath 1.3.0, 60 digits.
    @ParameterizedTest
    @CsvSource({
        "0.001, 2.5422704679670945",
        "0.5, 0.15342640972002735",
        "2.5, 0.033162873519936287",
        "9.75, 0.0085440205058485877",
        "10, 0.0083305634333628713",
        "1e3, 8.3333330555556349e-5",
        "1e8, 8.3333333333333333e-10"
    })
    void errorOfStirlingsFormula(double x, double expected) {
        double bound = x < 10 ? STIRLING_BELOW_TEN : SMALL_FORMS * expected;
        assertEquals(expected, GammaFunction.stirlingError(x), bound);
    }
}
