package dev.leadline.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import java.math.BigDecimal;
import java.util.Locale;
import java.util.Optional;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class RoundingTest {
    /// By hand.
    @ParameterizedTest(name = "{0} ± {1}")
    @CsvSource({
        "3.206, 0.0014, 3.2060, 0.0014",
        "1.25681e-5, 4e-8, 1.2568e-5, 0.0040e-5",
        "-1.25681e-5, 1e-6, -1.26e-5, 0.10e-5",
        "0, 1e-9, 0.0e-9, 1.0e-9",
        "1e-9, 3, 0.0, 3.0",
        "-1e-9, 3, 0.0, 3.0",
        "9.99996e-5, 1e-8, 0.000100000, 0.000000010",
        "12345678, 1234, 1.23457e7, 0.00012e7",
        "123456789.1234, 0.0021, 123456789.1234, 0.0021",
        "9999999, 120, 1.000000e7, 0.000012e7",
        "17, 1, 17.0, 1.0",
        "1e300, 1e297, 1.0000e300, 0.0010e300",
        "1e-310, 2e-312, 1.000e-310, 0.020e-310",
        "28.05, 12.5, 28, 12"
    })
    void twoDigitsOfTheUncertainty(double value, double uncertainty, String expectedValue, String expectedUncertainty) {
        Rounding rounding = Rounding.of(value, uncertainty);
        assertEquals(expectedValue, rounding.value());
        assertEquals(Optional.of(expectedUncertainty), rounding.uncertainty());
    }

    @ParameterizedTest(name = "[{2}, {3}] of {0} ± {1}")
    @CsvSource({
        "1.23456, 0.0987, 1.13586, 1.33326, 1.135, 1.334",
        "1.25681e-5, 4e-8, 1.252e-5, 1.26089e-5, 1.2520e-5, 1.2609e-5",
        "-0.5, 0.1, -0.70001, -0.29999, -0.71, -0.29",
        "0.001, 0.5, -0.0001, 0.0001, -0.01, 0.01",
        "0.3, 0.1, 0.3, 0.3, 0.30, 0.30",
        "1e-4, 2e-5, 8e-5, 1.200001e-4, 0.000080, 0.000121",
        "12345678, 1234, -Infinity, Infinity, -∞, ∞",
        "12345678, 1234, 12343210, 12348146, 1.23432e7, 1.23482e7"
    })
    void limitsOutwards(double value, double uncertainty, double low, double high, String down, String up) {
        Rounding rounding = Rounding.of(value, uncertainty);
        assertEquals(down, rounding.down(low));
        assertEquals(up, rounding.up(high));
    }

    @Test
    void aLimitOfZeroHasNoPowerOfTen() {
        assertEquals("0", Rounding.of(1.2e-5, 3e-6).down(0));
        assertEquals("0.000", Rounding.of(.12, .013).down(0));
    }

    /// Record prop-rounding-report: JCGM 100:2008, 7.2.2 and 7.2.6, from memory; by hand.
    @Test
    void agreesWithCommonPractice() {
        int checked = 0;
        for (var expected : ReferenceValues.record("prop-rounding-report").get("expected")) {
            String[] pair =
                    expected.get("name").asString().replaceAll("[()]", "").split(", ");
            Rounding rounding = Rounding.of(Double.parseDouble(pair[0]), Double.parseDouble(pair[1]));
            String shown = rounding.value()
                    + rounding.uncertainty().map(half -> " +/- " + half).orElse(" exact");
            String text = expected.get("text").asString();
            assertEquals(shown, text.substring(0, Math.min(text.length(), shown.length())));
            checked++;
        }
        assertEquals(7, checked);
    }

    /// Record prop-jcgm101-tolerance, whose statement names the uncertainties and their digits.
    @ParameterizedTest
    @CsvSource({"1, 0.00035, 2", "2, 2, 1", "3, 0.0754, 2", "4, 0.0754, 1", "5, 35.8, 2", "6, 0.0996, 2"})
    void numericalToleranceFollowsTheSupplement(int which, double uncertainty, int digits) {
        double expected = ReferenceValues.expected("prop-jcgm101-tolerance", "delta_" + which);
        assertEquals(expected, Rounding.tolerance(uncertainty, digits));
    }

    /// Nothing is rounded, and `± 0` is never printed.
    @ParameterizedTest
    @CsvSource({
        "5, 5.0",
        "0, 0.0",
        "0.1, 0.1",
        "-0.00025, -0.00025",
        "1.25e-7, 1.25e-7",
        "1e20, 1.0e20",
        "12345678.5, 12345678.5",
        "NaN, NaN"
    })
    void withoutUncertaintyTheShortestDecimal(double value, String expected) {
        for (double none : new double[] {0, Double.NaN}) {
            Rounding rounding = Rounding.of(value, none);
            assertEquals(expected, rounding.value());
            assertEquals(Optional.empty(), rounding.uncertainty());
            assertEquals(expected, rounding.down(value));
        }
    }

    @Test
    void boundlessUncertainty() {
        assertEquals(Optional.of("∞"), Rounding.of(2, Double.POSITIVE_INFINITY).uncertainty());
        assertEquals("2.0", Rounding.of(2, Double.POSITIVE_INFINITY).value());
    }

    @Test
    void valuesThatAreNotFinite() {
        assertEquals("NaN", Rounding.of(Double.NaN, 0.1).value());
        assertEquals("-∞", Rounding.of(Double.NEGATIVE_INFINITY, 0.1).value());
        assertEquals(Optional.of("0.10"), Rounding.of(Double.NaN, 0.1).uncertainty());
    }

    @Test
    void refusesToleranceWithoutUncertainty() {
        assertThrows(IllegalArgumentException.class, () -> Rounding.tolerance(0, 2));
        assertThrows(IllegalArgumentException.class, () -> Rounding.tolerance(Double.POSITIVE_INFINITY, 2));
        assertThrows(IllegalArgumentException.class, () -> Rounding.tolerance(Double.NaN, 2));
    }

    @Test
    void refusesNegativeUncertainty() {
        var refusal = assertThrows(IllegalArgumentException.class, () -> Rounding.of(1, -0.1));
        assertEquals("Uncertainty is -0.1 but must be at least 0", refusal.getMessage());
    }

    /// For 5,000 random estimates of every size: what is printed is off by at most half a unit of the last place,
    /// limits by less than one and outwards, and the uncertainty shows two digits.
    @Test
    void printedNumbersAreWhatWasComputed() {
        SplittableRandom random = new SplittableRandom(1);
        for (int i = 0; i < 5_000; i++) {
            double value = random.nextDouble(-1, 1) * Math.pow(10, random.nextInt(-30, 30));
            double uncertainty = Math.abs(value) * Math.pow(10, random.nextDouble(-8, 4));
            String at = value + " ± " + uncertainty;
            Rounding rounding = Rounding.of(value, uncertainty);
            BigDecimal unit = BigDecimal.ONE.scaleByPowerOfTen(rounding.place().orElseThrow());
            BigDecimal exact = new BigDecimal(Double.toString(value));
            BigDecimal shown = new BigDecimal(rounding.value());
            assertTrue(shown.subtract(exact).abs().multiply(BigDecimal.TWO).compareTo(unit) <= 0, at);
            BigDecimal down = new BigDecimal(rounding.down(value));
            BigDecimal up = new BigDecimal(rounding.up(value));
            assertTrue(down.compareTo(exact) <= 0 && exact.subtract(down).compareTo(unit) < 0, at);
            assertTrue(up.compareTo(exact) >= 0 && up.subtract(exact).compareTo(unit) < 0, at);
            BigDecimal half = new BigDecimal(rounding.uncertainty().orElseThrow());
            int digits = half.divide(unit).intValueExact();
            assertTrue(digits >= 10 && digits <= 99, at + ": " + digits);
        }
    }

    @Test
    void pointInEveryLocale() {
        Locale before = Locale.getDefault();
        try {
            Locale.setDefault(Locale.GERMANY);
            assertEquals("1.2568e-5", Rounding.of(1.25681e-5, 4e-8).value());
            assertEquals("3.2060", Rounding.of(3.206, 0.0014).value());
        } finally {
            Locale.setDefault(before);
        }
    }

    @Test
    void neverRoundsALimitDown() {
        assertEquals("5.8e-5", Rounding.atMost(5.7111e-5));
        assertEquals("5.7e-5", Rounding.atMost(5.7e-5));
        assertEquals("0.0031", Rounding.atMost(0.00300001));
        assertEquals("1.0", Rounding.atMost(1));
    }
}
