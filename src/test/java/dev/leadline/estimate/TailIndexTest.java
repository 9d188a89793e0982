package dev.leadline.estimate;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import java.util.Arrays;
import java.util.function.IntToDoubleFunction;
import java.util.stream.DoubleStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class TailIndexTest {
    private static final String FITS = "diag-gpd-fit-vectors";
    private static final String WEIGHTS = "diag-psis-vectors";

    /// Quantiles at `(i - .5) / n` of the generalized Pareto density of scale 2, so that the shape is
    /// nearly the true one; expected values of the record, made by another program.
    @ParameterizedTest(name = "{0}, n={1}")
    @CsvSource({".2,50", ".5,100", ".7,100", ".9,200", "1.2,100", "-.2,100", "0,100"})
    void fitsWhatTheRecordSays(double shape, int n) {
        double[] rising = new double[n];
        Arrays.setAll(rising, i -> {
            double log = Math.log1p(-(i + .5) / n);
            return shape == 0 ? -2 * log : 2 * Math.expm1(-shape * log) / shape;
        });
        var found = TailIndex.fit(rising);
        var expected = ReferenceValues.caseOf(FITS, "true k=%s, sigma=2, n=%d".formatted(shape, n));
        double bound = ReferenceValues.relativeTolerance(FITS);
        within(bound, ReferenceValues.expected(expected, "k_raw_grid30"), found.raw());
        within(bound, ReferenceValues.expected(expected, "k_regularised_grid30"), found.shape());
        within(bound, ReferenceValues.expected(expected, "sigma_grid30"), found.scale());
    }

    private static void within(double relative, double expected, double found) {
        assertEquals(expected, found, relative * Math.abs(expected));
    }

    /// Weights that are exact quantiles: their tail, the share of the largest, and how many equal ones they
    /// are worth.
    @ParameterizedTest
    @CsvSource({".3", ".6", ".8"})
    void tailsOfWeights(double shape) {
        double[] falling = new double[1000];
        Arrays.setAll(falling, i -> Math.exp(-shape * Math.log1p(-(1000 - i - .5) / 1000)));
        var expected = ReferenceValues.caseOf(WEIGHTS, "k=%s, S=1000, M=95".formatted(shape));
        double bound = ReferenceValues.relativeTolerance(WEIGHTS);
        var found = TailIndex.of(falling, 1000);
        assertEquals(95, found.values());
        within(bound, ReferenceValues.expected(expected, "khat_raw"), found.raw());
        within(bound, ReferenceValues.expected(expected, "khat"), found.shape());
        within(
                bound,
                ReferenceValues.expected(expected, "sigma_of_tail_fit_after_dividing_by_max"),
                found.scale() / falling[0]);
        var extremes = new Extremes(1);
        extremes.add(new double[][] {falling}, 1000);
        var seen = extremes.outermost().weights();
        within(bound, ReferenceValues.expected(expected, "largest_raw_weight"), seen.largestShare());
        within(bound, ReferenceValues.expected(expected, "ess_raw"), seen.effective());
    }

    @Test
    void lengthsOfTheTail() {
        assertEquals(ReferenceValues.expected(WEIGHTS, "tail_len_S100"), TailIndex.length(100));
        assertEquals(ReferenceValues.expected(WEIGHTS, "tail_len_S1000_ceil"), TailIndex.length(1000));
        assertEquals(ReferenceValues.expected(WEIGHTS, "tail_len_S10000"), TailIndex.length(10_000));
    }

    /// Kish's identities.
    @Test
    void whatEqualValuesWouldDoAsWell() {
        String kish = "diag-kish-ess";
        effective(ReferenceValues.expected(kish, "weights 1,1,1,1"), DoubleStream.of(1, 1, 1, 1));
        effective(ReferenceValues.expected(kish, "weights 1,0,0,0"), DoubleStream.of(1, 0, 0, 0));
        effective(ReferenceValues.expected(kish, "weights 1..10: 3n(n+1)/(2(2n+1))"), upTo(10));
        effective(ReferenceValues.expected(kish, "weights 1..100: 3n(n+1)/(2(2n+1))"), upTo(100));
        effective(
                ReferenceValues.expected(kish, "weights 2^-i, i=0..19"), upTo(20).map(i -> Math.scalb(1, 1 - (int) i)));
        effective(
                ReferenceValues.expected(kish, "n/(1+cv^2) with population cv of weights 1..10"),
                upTo(10).map(x -> 7 * x));
    }

    private static DoubleStream upTo(int n) {
        return DoubleStream.iterate(1, i -> i <= n, i -> i + 1);
    }

    private static void effective(double expected, DoubleStream weights) {
        double[] w = weights.toArray();
        var extremes = new Extremes(1);
        extremes.add(new double[][] {w}, w.length);
        assertEquals(expected, extremes.outermost().weights().effective(), 1e-13 * expected);
    }

    @Test
    void whatIsEqualOrFewHasNoTail() {
        assertFalse(falling(1000, _ -> 3).exists());
        assertFalse(falling(1000, i -> i < 90 ? 720 : 1).exists());
        assertFalse(falling(1000, i -> i < 20 ? 50 : i < 60 ? 10 : 0).exists());
        assertFalse(falling(20, i -> 20 - i).exists());
        assertFalse(falling(1000, i -> 1 + 1e-14 * (1000 - i)).exists());
    }

    /// Doublings with probabilities halved have no mean: few different values, and yet a tail.
    @Test
    void doublingsHaveOne() {
        var found = falling(16_384, i -> Math.scalb(1, 14 - log2(i + 1)));
        assertTrue(found.shape() > .5, found.toString());
    }

    private static int log2(int i) {
        return 31 - Integer.numberOfLeadingZeros(i);
    }

    /// Also of values beyond the range in which factors can be multiplied freely.
    @Test
    void neitherOverflowsNorUnderflows() {
        for (double unit : new double[] {1e-290, 1, 1e290}) {
            var found = falling(1000, i -> unit * Math.pow((i + .5) / 1000, -.6));
            assertEquals(.6, found.shape(), .03, found.toString());
        }
        assertTrue(falling(1000, i -> Math.pow((i + .5) / 1000, -60)).shape() > 10);
    }

    private static TailIndex falling(int n, IntToDoubleFunction value) {
        double[] falling = new double[Math.min(n, Extremes.KEPT)];
        Arrays.setAll(falling, value);
        return TailIndex.of(falling, n);
    }
}
