package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.HashSet;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class TicksTest {
    private static List<String> labels(Ticks ticks) {
        return ticks.all().stream()
                .map(Ticks.Tick::label)
                .filter(l -> !l.isEmpty())
                .toList();
    }

    @Test
    void evenSteps() {
        assertEquals(List.of("0", "20", "40", "60", "80", "100"), labels(Ticks.even(new Range(0, 100), 5)));
        assertEquals(List.of("18,400", "18,420", "18,440", "18,460"), labels(Ticks.even(new Range(18_400, 18_475), 4)));
        assertEquals(List.of("−0.2", "0", "0.2"), labels(Ticks.even(new Range(-.31, .31), 4)));
        assertEquals(List.of("−0.10", "−0.05", "0", "0.05"), labels(Ticks.even(new Range(-.1, .05), 4)));
    }

    @Test
    void takesAPowerOfTenOut() {
        var small = Ticks.even(new Range(1.15e-5, 1.4e-5), 5);
        assertEquals(-5, small.factor());
        assertEquals(List.of("1.15", "1.20", "1.25", "1.30", "1.35", "1.40"), labels(small));
        var large = Ticks.even(new Range(0, 3_100_000), 4);
        assertEquals(6, large.factor());
        assertEquals(List.of("0", "1", "2", "3"), labels(large));
        assertEquals(0, Ticks.even(new Range(.011, .019), 4).factor());
    }

    @Test
    void powersOfTen() {
        assertEquals(List.of("10²", "10³", "10⁴", "10⁵"), labels(Ticks.powers(new Range(64, 250_000), 8)));
        assertEquals(List.of("1", "10⁴", "10⁸", "10¹²"), labels(Ticks.powers(new Range(1, 1e12), 4)));
        assertEquals(List.of("20,000", "50,000", "100,000"), labels(Ticks.powers(new Range(12_000, 120_000), 8)));
        assertEquals(List.of("1,200", "1,250", "1,300"), labels(Ticks.powers(new Range(1190, 1310), 4)));
        assertEquals(List.of("5×10⁶", "10⁷", "2×10⁷"), labels(Ticks.powers(new Range(3e6, 3e7), 8)));
    }

    /// Over many ranges: in range, ascending, not more than asked for, labels distinct and true to their values.
    @Test
    void labelsSayTheirValues() {
        var random = new SplittableRandom(20261201);
        for (int k = 0; k < 500; k++) {
            double middle = (random.nextDouble() - .5) * Math.pow(10, random.nextInt(-298, 299));
            double half = Math.abs(middle) * Math.pow(10, random.nextInt(-10, 3)) * random.nextDouble(.1, 1);
            var range = new Range(middle - half, middle + half);
            int most = random.nextInt(2, 12);
            var ticks = Ticks.even(range, most);
            String where = "range " + k + " " + range + " " + most + ": " + ticks;
            assertTrue(ticks.all().size() >= 2 && ticks.all().size() <= Math.max(5, most + 1), where);
            assertEquals(ticks.all().size(), new HashSet<>(labels(ticks)).size(), where);
            double before = Double.NEGATIVE_INFINITY;
            for (var tick : ticks.all()) {
                assertTrue(tick.value() > before && range.contains(tick.value()), where);
                before = tick.value();
                double read = new java.math.BigDecimal(
                                tick.label().replace("−", "-").replace(",", ""))
                        .movePointRight(ticks.factor())
                        .doubleValue();
                assertEquals(tick.value(), read, where);
            }
        }
    }
}
