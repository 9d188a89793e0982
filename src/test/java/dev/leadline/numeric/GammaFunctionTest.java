package dev.leadline.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigInteger;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.CsvSource;

/// Against values of 60 digits (`numeric/gamma.py`).
class GammaFunctionTest {
    private static final int GAMMA_ULPS = 6;
    private static final int LOG_ULPS = 4;
    private static final double LOG_OF_NEGATIVE = 5e-16;

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
}
