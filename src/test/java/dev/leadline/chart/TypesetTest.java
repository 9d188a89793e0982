package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class TypesetTest {
    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "m3 | m³",
                "m^2 | m²",
                "kg/m3 | kg/m³",
                "kg m2 s-2 | kg m² s⁻²",
                "1/a | 1/a",
                "kg CO2 | kg CO2",
                "1e3 crowns | 1e3 crowns",
                "lx^2 | lx²",
                "kN m | kN m",
                "1 | ''",
                "H2O/m3 | H2O/m³"
            })
    void raisesExponentsOfUnits(String written, String shown) {
        assertEquals(shown, Typeset.unit(written));
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "1.2568e-5 | 8 | 1.2568×10⁻⁵",
                "18432.7 | 8 | 18,432.7",
                "-0.25 | 6 | −0.25",
                "123456789 | 4 | 1.235×10⁸",
                "0 | 6 | 0",
                "2e4 | 6 | 20,000",
                "0.00123 | 6 | 0.00123",
                "NaN | 6 | none",
                "-Infinity | 6 | −∞"
            })
    void setsNumbers(double value, int digits, String shown) {
        assertEquals(shown, Typeset.number(value, digits));
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "18432.7 | 18,432.7",
                "-1.257e-5 | −1.257×10⁻⁵",
                "0.500 | 0.500",
                "1.20e12 | 1.20×10¹²",
                "0.00 | 0",
                "0.0e-5 | 0"
            })
    void setsWhatWasRoundedElsewhere(String written, String shown) {
        assertEquals(shown, Typeset.set(written));
    }

    @Test
    void doesNotDependOnTheLocale() {
        var before = Locale.getDefault();
        try {
            Locale.setDefault(Locale.GERMANY);
            assertEquals("18,432.7", Typeset.number(18432.7, 8));
            assertEquals("1,048,576", Typeset.count(1 << 20));
        } finally {
            Locale.setDefault(before);
        }
    }
}
