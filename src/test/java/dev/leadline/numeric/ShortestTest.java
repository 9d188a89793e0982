package dev.leadline.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ShortestTest {

    /// RFC 8785, appendix B: every sample with a number (bits of the double, its text).
    @ParameterizedTest
    @CsvSource({
        "0000000000000000, 0",
        "8000000000000000, 0",
        "0000000000000001, 5e-324",
        "8000000000000001, -5e-324",
        "7fefffffffffffff, 1.7976931348623157e+308",
        "ffefffffffffffff, -1.7976931348623157e+308",
        "4340000000000000, 9007199254740992",
        "c340000000000000, -9007199254740992",
        "4430000000000000, 295147905179352830000",
        "44b52d02c7e14af5, 9.999999999999997e+22",
        "44b52d02c7e14af6, 1e+23",
        "44b52d02c7e14af7, 1.0000000000000001e+23",
        "444b1ae4d6e2ef4e, 999999999999999700000",
        "444b1ae4d6e2ef4f, 999999999999999900000",
        "444b1ae4d6e2ef50, 1e+21",
        "3eb0c6f7a0b5ed8c, 9.999999999999997e-7",
        "3eb0c6f7a0b5ed8d, 0.000001",
        "41b3de4355555553, 333333333.3333332",
        "41b3de4355555554, 333333333.33333325",
        "41b3de4355555555, 333333333.3333333",
        "41b3de4355555556, 333333333.3333334",
        "41b3de4355555557, 333333333.33333343",
        "becbf647612f3696, -0.0000033333333333333333",
        "43143ff3c1cb0959, 1424953923781206.2"
    })
    void canonicalNumbersOfTheStandard(String bits, String text) {
        assertEquals(text, Shortest.canonical(Double.longBitsToDouble(Long.parseUnsignedLong(bits, 16))));
    }

    @Test
    void canonicalTextIsOfFiniteNumbersOnly() {
        assertThrows(IllegalArgumentException.class, () -> Shortest.canonical(Double.NaN));
    }

    @ParameterizedTest
    @CsvSource({
        "1180, 1180",
        "0.0004, 0.0004",
        "1.05E-5, 1.05e-5",
        "2e8, 200000000",
        "-0.25, -0.25",
        "1e16, 1e16",
        "-0.0, -0",
        "2e23, 2e23",
        "123456.75, 123456.75",
        "1e-9, 1e-9",
        "1e15, 1e15",
        "999999999999999, 999999999999999",
        "-Infinity, -∞",
        "Infinity, ∞",
        "NaN, NaN"
    })
    void writesForPeople(double x, String text) {
        assertEquals(text, Shortest.text(x));
    }

    /// A bit that went missing in one of 50,000 random doubles would be seen.
    @Test
    void readsBackToTheBit() {
        var random = new SplittableRandom(20261201);
        for (int i = 0; i < 50_000; i++) {
            double x = Double.longBitsToDouble(random.nextLong());
            if (Double.isFinite(x)) {
                assertEquals(x, Double.parseDouble(Shortest.text(x)), () -> "double " + Double.toHexString(x));
                assertEquals(x, Double.parseDouble(Shortest.canonical(x)) + 0.0, () -> Double.toHexString(x));
            }
        }
    }
}
