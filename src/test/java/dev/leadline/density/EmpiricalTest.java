package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class EmpiricalTest {

    private static final Empirical FIVE = Empirical.of(2, 7, 2, -1, 3);

    @Test
    void countsValues() {
        assertEquals(.4, FIVE.pdf(2));
        assertEquals(.2, FIVE.pdf(7));
        assertEquals(0, FIVE.pdf(2.5));
        assertEquals(Math.log(.4), FIVE.logPdf(2), 1e-15);
        assertEquals(Double.NEGATIVE_INFINITY, FIVE.logPdf(0));
        assertEquals(.6, FIVE.cdf(2));
        assertEquals(.4, FIVE.survival(2));
        assertEquals(0, FIVE.cdf(Math.nextDown(-1.0)));
        assertEquals(1, FIVE.survival(Double.NEGATIVE_INFINITY));
        assertEquals(Double.NaN, FIVE.cdf(Double.NaN));
        assertEquals(Double.NaN, FIVE.pdf(Double.NaN));
        assertEquals(new Support(-1, 7), FIVE.support());
        assertEquals(1, Empirical.of(0.0, -0.0).pdf(0));
    }

    /// By hand: the values less 2.6 are -.6, 4.4, -.6, -3.6 and .4; skewness and kurtosis are those numbers' powers.
    @Test
    void hasTheMomentsOfTheDistribution() {
        double[] d = {-.6, 4.4, -.6, -3.6, .4};
        double m2 = Arrays.stream(d).map(x -> x * x).sum() / 5;
        assertEquals(2.6, FIVE.mean());
        assertEquals(6.64, FIVE.variance(), 1e-15);
        assertEquals(Arrays.stream(d).map(x -> x * x * x).sum() / 5 / Math.pow(m2, 1.5), FIVE.skewness(), 1e-15);
        assertEquals(Arrays.stream(d).map(x -> x * x * x * x).sum() / 5 / m2 / m2 - 3, FIVE.excessKurtosis(), 1e-15);
    }

    @Test
    void keepsDigitsOfMomentsFarFromZeroAndNearTheLargestNumbers() {
        var far = Empirical.of(1e9 + 1, 1e9 + 2, 1e9 + 3);
        assertEquals(2.0 / 3, far.variance(), 1e-15);
        var huge = Empirical.of(1e200, 1.5e200, 2e200);
        assertEquals(1.5e200, huge.mean(), 1e185);
        assertEquals(-1.5, huge.excessKurtosis(), 1e-14);
        assertEquals(0, Empirical.of(1e308, -1e308).mean());
    }

    @Test
    void quantilesAreTheSmallestValuesThatReachAProbability() {
        double[] sorted = {-1, 2, 2, 3, 7};
        for (int k = 1; k <= 5; k++) {
            assertEquals(sorted[k - 1], FIVE.quantile(k / 5.0), "k = " + k);
            assertEquals(sorted[5 - k], FIVE.upperQuantile(Math.nextDown(k / 5.0 * (1 - 1e-12))), "k = " + k);
        }
        assertEquals(2, FIVE.quantile(.2 + 1e-9));
        assertEquals(-1, FIVE.upperQuantile(.8));
        assertEquals(2, FIVE.upperQuantile(.8 - 1e-9));
        assertEquals(-1, FIVE.quantile(0));
        assertEquals(7, FIVE.quantile(1));
        assertEquals(7, FIVE.upperQuantile(1e-300));
        assertEquals(Double.NaN, FIVE.quantile(1.1));
    }

    /// One u within each of n equal strata: each value is drawn exactly as often as it stands in the sample.
    @ParameterizedTest(name = "{0} values")
    @ValueSource(ints = {1, 2, 3, 10, 997, 65_536, 1_000_000})
    void stratifiedDrawsHitEveryValueExactly(int n) {
        var random = new SplittableRandom(n);
        double[] values =
                random.ints(n, 0, Math.max(1, n / 3)).mapToDouble(k -> k / 7.0).toArray();
        double[] u = new double[n];
        for (int i = 0; i < n; i++) {
            u[i] = (i + random.nextDouble(1e-6, 1 - 1e-6)) / n;
        }
        Inversion.of(Empirical.of(values)).fill(u, u, n);
        assertEquals(counts(values), counts(u));
    }

    private static Map<Double, Integer> counts(double[] values) {
        var counts = new HashMap<Double, Integer>();
        for (double value : values) {
            counts.merge(value, 1, Integer::sum);
        }
        return counts;
    }

    @Test
    void drawsAreWithinTheSampleAtTheEndsOfU() {
        double[] u = {0x1p-53, 0, 1 - 0x1p-53, 1};
        Inversion.of(FIVE).fill(u, u, 4);
        assertEquals("[-1.0, -1.0, 7.0, 7.0]", Arrays.toString(u));
    }

    @Test
    void isToldByItsValues() {
        assertEquals(FIVE, Empirical.of(-1, 2, 2, 3, 7));
        assertEquals(FIVE.hashCode(), Empirical.of(-1, 2, 2, 3, 7).hashCode());
        assertNotEquals(FIVE, Empirical.of(-1, 2, 3, 7));
        assertNotEquals(
                Inversion.of(FIVE).hash(),
                Inversion.of(Empirical.of(-1, 2, 2, 3, 8)).hash());
    }

    @Test
    void takesFiniteValuesOnly() {
        assertThrows(IllegalArgumentException.class, Empirical::of);
        assertThrows(IllegalArgumentException.class, () -> Empirical.of(1, Double.NaN));
        assertThrows(IllegalArgumentException.class, () -> Empirical.of(Double.POSITIVE_INFINITY));
    }
}
