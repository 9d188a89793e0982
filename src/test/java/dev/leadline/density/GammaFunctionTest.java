package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.apache.commons.numbers.gamma.Gamma;
import org.apache.commons.numbers.gamma.LogGamma;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// Against another library, and values of Abramowitz and Stegun, tables 6.1 and 6.11 (from memory).
class GammaFunctionTest {
    @ParameterizedTest
    @CsvSource({
        "0.5, 1.772453850905516",
        "1, 1",
        "1.5, 0.886226925452758",
        "5, 24",
        "11, 3628800",
        "21, 2432902008176640000"
    })
    void tabulated(double x, double expected) {
        assertEquals(expected, GammaFunction.gamma(x), 1e-14 * expected);
        assertEquals(
                StrictMath.log(expected), GammaFunction.logGamma(x), 1e-14 * Math.max(1, StrictMath.log(expected)));
    }

    @Test
    void agreesWithALibrary() {
        for (double x = 1e-3; x < 170; x *= 1.03) {
            double at = x;
            double gamma = Gamma.value(x);
            assertEquals(gamma, GammaFunction.gamma(x), 3e-14 * gamma, () -> "gamma at " + at);
            double log = LogGamma.value(x);
            assertEquals(log, GammaFunction.logGamma(x), 1e-14 * Math.max(1, Math.abs(log)), () -> "log at " + at);
        }
    }

    /// `log Γ(1 + 2x) - 2 log Γ(1 + x)` is `(pi^2 / 6) x^2 - 2 ζ(3) x^3 + …`.
    @Test
    void differenceThatCancels() {
        double x = 1e-7;
        double expected = Math.PI * Math.PI / 6 * x * x - 2 * 1.2020569031595942 * x * x * x;
        assertEquals(expected, GammaFunction.logGammaExcess(x), 1e-12 * expected);
        assertEquals(LogGamma.value(1.5) - 2 * LogGamma.value(1.25), GammaFunction.logGammaExcess(0.25), 1e-15);
    }
}
