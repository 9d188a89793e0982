package dev.leadline.desktop.working;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.OptionalDouble;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class NumberTextTest {
    @ParameterizedTest
    @CsvSource({
        "1180, 1180",
        "0.07, 0.07",
        "1.2568e-5, 1.2568e-5",
        "2e8, 200000000",
        "inf, inf",
        "-inf, -inf",
        "-0.5, -0.5",
        ".25, 0.25",
        "5e-4, 0.0005",
        "1e300, 1e300"
    })
    void showsWhatItReads(String typed, String shown) {
        assertEquals(shown, NumberText.show(NumberText.read(typed).orElseThrow()));
    }

    @Test
    void everyNumberComesBack() {
        var random = new Random(11);
        for (int i = 0; i < 10_000; i++) {
            double x = Double.longBitsToDouble(random.nextLong());
            if (Double.isFinite(x)) {
                assertEquals(OptionalDouble.of(x), NumberText.read(NumberText.show(x)), () -> "number " + x);
            }
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "x", "2,6", "1e", "--1", "1e999", "0x10", "1 2", "NaN"})
    void refusesWhatIsNoNumber(String text) {
        assertTrue(NumberText.read(text).isEmpty());
    }

    @Test
    void saysHowToWriteADecimalComma() {
        var problem = NumberText.problem("scale of v", "2,6");
        assertEquals("Scale of v is \u201c2,6\u201d but must be a number", problem.primary());
        assertEquals("Write the decimal sign as a point: 2.6", problem.hint().orElseThrow());
    }
}
