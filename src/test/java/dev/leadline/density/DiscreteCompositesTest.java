package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Mixture.Part;
import java.util.List;
import java.util.TreeMap;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.Stream;
import org.apache.commons.statistics.distribution.BinomialDistribution;
import org.apache.commons.statistics.distribution.PoissonDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/// Draws of discrete densities that are truncated, mixed, shifted or scaled.
class DiscreteCompositesTest {
    private static final int STRATA = 1 << 20;

    /// @param probabilities of the library, by the value drawn
    private record Case(Density density, DoubleUnaryOperator probabilities) {
        @Override
        public String toString() {
            return density.toString();
        }
    }

    static Stream<Case> cases() {
        var poisson = PoissonDistribution.of(3.4);
        var many = PoissonDistribution.of(4000);
        var binomial = BinomialDistribution.of(12, 0.18);
        double kept = poisson.cumulativeProbability(9) - poisson.cumulativeProbability(1);
        double tail = many.survivalProbability(4300);
        return Stream.of(
                new Case(
                        Truncated.of(new Poisson(3.4), 2, 9),
                        x -> x < 2 || x > 9 || x != Math.rint(x) ? 0 : poisson.probability((int) x) / kept),
                new Case(
                        Truncated.of(new Poisson(3.4), 1.5, 9.5),
                        x -> x < 2 || x > 9 || x != Math.rint(x) ? 0 : poisson.probability((int) x) / kept),
                new Case(
                        Truncated.of(new Poisson(4000), 4301, Double.POSITIVE_INFINITY),
                        x -> x <= 4300 || x != Math.rint(x) ? 0 : many.probability((int) x) / tail),
                new Case(
                        new Mixture(List.of(new Part(0.25, new Poisson(3.4)), new Part(0.75, new Binomial(12, 0.18)))),
                        x -> x != Math.rint(x)
                                ? 0
                                : 0.25 * poisson.probability((int) x) + 0.75 * binomial.probability((int) x)),
                new Case(
                        new Mixture(List.of(
                                new Part(0.5, new Shifted(new Poisson(3.4), 0.5, 2)),
                                new Part(0.5, new Binomial(12, 0.18)))),
                        x -> x == Math.rint(x)
                                ? 0.5 * binomial.probability((int) x)
                                : (x - 0.5) % 2 != 0 ? 0 : 0.5 * poisson.probability((int) ((x - 0.5) / 2))),
                new Case(
                        new Shifted(new Poisson(3.4), 0, -2),
                        x -> x % 2 != 0 ? 0 : poisson.probability((int) (-x / 2))));
    }

    /// Strata of equal width: no value is drawn more often than its probability says, nor less often, by more than
    /// the strata at its two edges.
    @ParameterizedTest
    @MethodSource("cases")
    void drawsEachValueAsOftenAsItMust(Case c) {
        var u = new double[STRATA];
        for (int i = 0; i < STRATA; i++) {
            u[i] = (i + 0.5) / STRATA;
        }
        var inversion = Inversion.of(c.density);
        inversion.fill(u, u, STRATA);
        var counts = new TreeMap<Double, Integer>();
        for (double x : u) {
            counts.merge(x, 1, Integer::sum);
        }
        counts.forEach((x, count) ->
                assertEquals(c.probabilities.applyAsDouble(x) * STRATA, count, 1.001, () -> "value " + x));
        assertMoments(c);
        double seen = counts.keySet().stream()
                .mapToDouble(c.probabilities::applyAsDouble)
                .sum();
        assertEquals(1, seen, 1e-4);
        assertTrue(inversion.uError() <= 1e-12, () -> "u-error " + inversion.uError());
    }

    /// Sums over the probabilities of the library.
    private static void assertMoments(Case c) {
        double mean = 0;
        for (double x = -200; x <= 6000; x += 0.5) {
            mean += x * c.probabilities.applyAsDouble(x);
        }
        double variance = 0;
        double fourth = 0;
        for (double x = -200; x <= 6000; x += 0.5) {
            double d = x - mean;
            variance += d * d * c.probabilities.applyAsDouble(x);
            fourth += d * d * d * d * c.probabilities.applyAsDouble(x);
        }
        assertEquals(mean, c.density.mean(), 1e-9 * Math.abs(mean));
        assertEquals(variance, c.density.variance(), 1e-8 * variance);
        assertEquals(fourth / (variance * variance) - 3, c.density.excessKurtosis(), 1e-6);
    }

    /// Seven times a tenth is the double above .7, three times a tenth the one above .3, and what is typed is decimal.
    @Test
    void valuesThatEqualAnEndToRoundingAreKept() {
        var tenths = new Shifted(new DiscreteUniform(0, 10), 0, 0.1);
        var kept = Truncated.of(tenths, 0.3, 0.7);
        var mirrored = Truncated.of(new Shifted(new DiscreteUniform(0, 10), 0, -0.1), -0.7, -0.3);
        for (int k = 0; k <= 10; k++) {
            double expected = k >= 3 && k <= 7 ? 0.2 : 0;
            assertEquals(expected, kept.pdf(k * 0.1), 1e-15, "at " + k);
            assertEquals(expected, mirrored.pdf(k * -0.1), 1e-15, "at " + -k);
        }
        assertEquals(0.5, kept.mean(), 1e-15);
        var shifted = Truncated.of(new Shifted(new DiscreteUniform(0, 10), 1000, 0.1), 1000.3, 1000.7);
        assertEquals(5 / 11.0, shifted.keptMass(), 1e-15);
        var ofOne = Truncated.of(new Shifted(new DiscreteUniform(7, 10), 0, 0.1), 0, 0.7);
        assertEquals(0.25, ofOne.keptMass(), 1e-15);
        assertEquals(
                4 / 11.0,
                Truncated.of(tenths, Math.nextDown(0.3) - 1e-15, 0.7 - 1e-15).keptMass(),
                1e-15);
    }
}
