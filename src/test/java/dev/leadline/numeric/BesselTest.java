package dev.leadline.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class BesselTest {
    private static final double RELATIVE = 2e-15;

    /// mpmath, 60 digits.
    @ParameterizedTest(name = "x = {0}")
    @CsvSource({
        "0, 1.0",
        "1e-9, 0.999999999000000001",
        "0.1, 0.907100925782301092",
        "1, 0.465759607593640437",
        "2.5, 0.27004644161220274",
        "7, 0.153737744672881248",
        "-7, 0.153737744672881248",
        "13, 0.111760833815854765",
        "19.9, 0.0900085888643895973",
        "20, 0.0897803118848260216",
        "20.1, 0.089553763620613444",
        "25, 0.0801967735474367084",
        "60, 0.0516115491736098409",
        "99, 0.0401461237711640457",
        "101, 0.0397456460654072088",
        "1e4, 3.98947267460473211e-3",
        "1e8, 3.98942280900110531e-5",
        "1e300, 3.98942280401432667e-151"
    })
    void agreesWithSixtyDigits(double x, double expected) {
        assertEquals(expected, Bessel.scaledI0(x), RELATIVE * expected);
    }

    @ParameterizedTest
    @CsvSource({"NaN, NaN", "Infinity, 0", "-Infinity, 0"})
    void specialValues(double x, double expected) {
        assertEquals(expected, Bessel.scaledI0(x), 0.0);
    }
}
