package dev.leadline.estimate;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.leadline.ReferenceValues;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class QuantileTest {
    /// Record quant-hyndman-fan: the first of the nine definitions.
    @Test
    void isTheFirstDefinitionOfHyndmanAndFan() {
        var id = "quant-hyndman-fan";
        double[] data = ReferenceValues.numbers(ReferenceValues.record(id).required("data"));
        int checked = 0;
        for (var entry : ReferenceValues.record(id).required("cases")) {
            var parts = entry.required("label").asString().substring(2).split("/");
            double q = Double.parseDouble(parts[0]) / Double.parseDouble(parts[1]);
            long rank = Quantile.rank(data.length, q);
            assertEquals(ReferenceValues.expected(entry, "type1"), data[(int) rank - 1]);
            checked++;
        }
        assertEquals(5, checked);
    }

    /// By hand. In doubles .07 · 100 is more than 7, and .29 · 100 less than 29.
    @ParameterizedTest
    @CsvSource({
        "1000, .95, 950",
        "100, .07, 7",
        "100, .29, 29",
        "1000, .999, 999",
        "10000000000000, .95, 9500000000000",
        "10000000000000, .9999999, 9999999000000",
        "9007199254740993, .5, 4503599627370497",
        "20, .951, 20",
        "1, .001, 1",
        "1, .999, 1",
        "10, 1e-300, 1"
    })
    void takesTheDecimal(long n, double q, long rank) {
        assertEquals(rank, Quantile.rank(n, q));
    }

    @Test
    void theShareAboveIsThatOfTheDecimal() {
        assertEquals(.05, Quantile.above(.95));
        assertEquals(1e-9, Quantile.above(.999999999));
    }

    @Test
    void refusesWhatIsNoQuantile() {
        assertThrows(IllegalArgumentException.class, () -> Quantile.rank(0, .5));
        assertThrows(IllegalArgumentException.class, () -> Quantile.rank(10, 0));
        assertThrows(IllegalArgumentException.class, () -> Quantile.rank(10, 1));
        assertThrows(IllegalArgumentException.class, () -> Quantile.rank(10, Double.NaN));
    }
}
