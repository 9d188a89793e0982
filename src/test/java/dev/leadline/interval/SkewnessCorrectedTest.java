package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.ValueSource;

class SkewnessCorrectedTest {
    private static final String JOHNSON = "diag-johnson-t";

    /// Hall's cubic, of which the interval takes the inverse, straight from the paper: `T + g/(3√n) T² +
    /// g²/(27n) T³ + g/(6√n)`.
    @ParameterizedTest
    @ValueSource(doubles = {-40, -3, -1e-9, 0, 1e-9, .3, 6, 50})
    void invertsTheCubic(double g) {
        for (long n : new long[] {3, 100, 1_000_000}) {
            double root = Math.sqrt(n);
            for (double t = -12; t <= 12; t += .75) {
                double x = SkewnessCorrected.inverse(t, g, n);
                double back = x + g / (3 * root) * x * x + g * g / (27 * n) * x * x * x + g / (6 * root);
                assertEquals(t, back, 1e-11 * (1 + Math.abs(g / root)) * (1 + t * t));
            }
        }
    }

    /// Made by `fixed_draws.py` with 50 digits: the data of record diag-johnson-t, roots of the cubic.
    @ParameterizedTest
    @CsvFileSource(resources = "/interval/hall.csv", numLinesToSkip = 2)
    void agreesWithFiftyDigits(double level, double low, double high) {
        double[] data = ReferenceValues.numbers(ReferenceValues.record(JOHNSON).required("data"));
        var interval = SkewnessCorrected.of(Observed.sums(data), 0, level);
        assertEquals(low, interval.low(), 1e-14);
        assertEquals(high, interval.high(), 1e-14 * high);
    }

    @Test
    void isStudentsWithoutSkewness() {
        var sums = Observed.sums(new double[] {-3, -1, 0, 1, 3});
        var interval = SkewnessCorrected.of(sums, 0, .95);
        var student = Student.of(sums, 0, .95);
        assertEquals(student.low(), interval.low(), 1e-14);
        assertEquals(student.high(), interval.high(), 1e-14);
        assertEquals("skewness-corrected", interval.kind());
    }

    /// The data of record diag-johnson-t: both limits of a mean of values skewed to the right lie higher.
    @Test
    void movesWithTheSkewness() {
        double[] data = ReferenceValues.numbers(ReferenceValues.record(JOHNSON).required("data"));
        var interval = SkewnessCorrected.of(Observed.sums(data), 0, .95);
        assertTrue(interval.low() > ReferenceValues.expected(JOHNSON, "ordinary_low"));
        assertTrue(interval.high() > ReferenceValues.expected(JOHNSON, "interval_high"));
        for (int i = 0; i < data.length; i++) {
            data[i] = -data[i];
        }
        var mirrored = SkewnessCorrected.of(Observed.sums(data), 0, .95);
        assertEquals(-interval.high(), mirrored.low(), 1e-14);
        assertEquals(-interval.low(), mirrored.high(), 1e-14);
    }

    /// Record diag-johnson-t: the moments and Student's interval are the program's; Johnson's shift, which
    /// hardly helps and is no kind of its own, is made of those moments here.
    @Test
    void momentsGiveJohnsonsShift() {
        double[] data = ReferenceValues.numbers(ReferenceValues.record(JOHNSON).required("data"));
        var sums = Observed.sums(data);
        double n = data.length;
        double s = Math.sqrt(sums.variance(0));
        double m3 = sums.skewness(0) * (n - 1) * (n - 2) / (n * n) * s * s * s;
        double shift = m3 / (6 * s * s * n);
        double off = sums.mean(0) - 1;
        var student = Student.of(sums, 0, .95);
        agrees("mean", sums.mean(0));
        agrees("sd", s);
        agrees("G1", sums.skewness(0));
        agrees("m3", m3);
        agrees("t", off / sums.standardError(0));
        agrees("shift", shift);
        agrees("t1", (off + shift + m3 * off * off / (3 * s * s * s * s)) / sums.standardError(0));
        agrees("ordinary_low", student.low());
        agrees("ordinary_high", student.high());
        agrees("interval_low", student.low() + shift);
        agrees("interval_high", student.high() + shift);
    }

    private static void agrees(String name, double actual) {
        double expected = ReferenceValues.expected(JOHNSON, name);
        assertEquals(expected, actual, ReferenceValues.relativeTolerance(JOHNSON) * Math.abs(expected), name);
    }

    @Test
    void saysWhyThereIsNone() {
        assertEquals("a skewness needs at least 3 observations; so far there are 2", note(1, 2));
        assertEquals("an interval needs at least 2 observations; so far there is 1", note(1));
        assertTrue(note(4, 4, 4, 4).startsWith("every value seen so far is equal (4)"));
        assertTrue(note(1e120, 2e120, 4e120).contains("cubes leave the range"));
        assertTrue(note(1e-147, 2e-147, 4e-147).contains("cubes leave the range"));
    }

    private static String note(double... values) {
        var interval = SkewnessCorrected.of(Observed.sums(values), 0, .95);
        assertTrue(interval.isNone());
        assertEquals("skewness-corrected", interval.kind());
        return interval.note().orElseThrow();
    }
}
