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
    private static final double HIGHER_DIFFERENCES = 1e-13;
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

    /// mpmath, 60 digits. Below 1/2 over the order from a series, above from logarithms.
    @ParameterizedTest
    @CsvSource({
        "2, 1e-9, 1.6449340644441128e-18",
        "2, 1e-4, 1.6446936933426873e-8",
        "2, 0.02, 6.3932755864528083e-4",
        "2, 0.1, 0.0143707925163636",
        "2, 0.12, 0.02018945283662293",
        "2, 0.25, 0.075761435208381101",
        "2, 1.3, 1.004544398657155",
        "2, 7, 8.1408984606078529",
        "2, -1e-9, 1.6449340692523405e-18",
        "2, -1e-4, 1.6451745161163943e-8",
        "2, -0.1, 0.019307198930351649",
        "2, -0.12, 0.028821317294171538",
        "2, -0.2, 0.094114501269559735",
        "2, -0.24, 0.14896277194399746",
        "3, 1e-9, -2.4041137965782799e-27",
        "3, 1e-4, -2.4031400263956406e-12",
        "3, 0.02, -1.7768365517152073e-5",
        "3, 0.1, -1.6698632774320945e-3",
        "3, 0.12, -2.7048590156956313e-3",
        "3, 0.25, -0.016869917380189373",
        "3, 1.3, -0.44764466047301614",
        "3, 7, -4.6180405665428936",
        "3, -1e-9, 2.4041138160600982e-27",
        "3, -1e-4, 2.4050882083994424e-12",
        "3, -0.1, 3.8169305363826624e-3",
        "3, -0.12, 7.361774699727994e-3",
        "3, -0.2, 0.058155278693591849",
        "3, -0.24, 0.14386915010044417",
        "4, 1e-9, 6.4939393524942988e-36",
        "4, 1e-4, 6.4889647929245964e-16",
        "4, 0.02, 8.9525928323471126e-7",
        "4, 0.1, 3.3154887853438348e-4",
        "4, 0.12, 6.1208693952909597e-4",
        "4, 0.25, 5.9984039577235356e-3",
        "4, 1.3, 0.27885321794790645",
        "4, 7, 3.4158691954443347",
        "4, -1e-9, 6.4939394520393633e-36",
        "4, -1e-4, 6.4989193017940115e-16",
        "4, -0.1, 1.6179834026224904e-3",
        "4, -0.12, 4.2304039683993341e-3",
        "4, -0.2, 0.11851698643970856",
        "4, -0.24, 0.95763069772718357"
    })
    void differencesThatCancel(int order, double x, double expected) {
        double relative = order == 2 ? SMALL_FORMS : HIGHER_DIFFERENCES;
        assertEquals(expected, GammaFunction.logDifference(order, x), relative * Math.abs(expected));
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
