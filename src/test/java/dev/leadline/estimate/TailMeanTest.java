package dev.leadline.estimate;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import java.util.Arrays;
import java.util.function.DoubleUnaryOperator;
import java.util.random.RandomGeneratorFactory;
import org.apache.commons.statistics.distribution.LogNormalDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.apache.commons.statistics.distribution.TDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class TailMeanTest {
    private static final String VARIANCE = "tail-mean-estimator-variance";

    /// Record tail-mean-empirical-fraction.
    @Test
    void countsAFractionOfAValue() {
        var id = "tail-mean-empirical-fraction";
        double[] sorted = ReferenceValues.numbers(ReferenceValues.record(id).required("data"));
        Arrays.sort(sorted);
        agrees(id, "level_085", TailMean.of(sorted, .85).value());
        agrees(id, "level_090", TailMean.of(sorted, .9).value());
        agrees(id, "level_075", TailMean.of(sorted, .75).value());
        // losses 1, 2, 3, 4 with weights .4, .3, .2, .1; the quantile is 3, where what lies above weighs .1
        var sums = new Accumulator(1);
        sums.add(new double[][] {{.4 * 4 * 0, .3 * 4 * 0, .2 * 4 * 0, .1 * 4 * (4 - 3)}}, 0, 4);
        agrees(id, "weighted_080", TailMean.of(3, .8, sums, 0).value());
    }

    /// Record tail-mean-atom: 100 draws in the shares of the loss.
    @Test
    void splitsAnAtomAtTheQuantile() {
        var id = "tail-mean-atom";
        var sorted = new double[100];
        Arrays.fill(sorted, 93, 97, 10);
        Arrays.fill(sorted, 97, 100, 50);
        assertEquals(ReferenceValues.expected(id, "quantile_095"), sorted[(int) Quantile.rank(100, .95) - 1]);
        agrees(id, "tail_mean_095", TailMean.of(sorted, .95).value());
        agrees(id, "tail_mean_090", TailMean.of(sorted, .90).value());
    }

    private static void agrees(String id, String name, double actual) {
        double expected = ReferenceValues.expected(id, name);
        assertEquals(expected, actual, ReferenceValues.relativeTolerance(id) * expected, name);
    }

    /// Record tail-mean-estimator-variance: of 10,000 values at the middles of equal shares of the
    /// probability the standard error is that of the limit, not the naive one, which is too small by 1.48
    /// for the normal density.
    @Test
    void theStandardErrorCountsTheQuantilesToo() {
        int n = 10_000;
        double normal = TailMean.of(middles(n, NormalDistribution.of(0, 1)::inverseCumulativeProbability), .95)
                .standardError();
        assertEquals(1, n * normal * normal / ReferenceValues.expected(VARIANCE, "normal 0.95 n*Var limit"), .01);
        double exponential = TailMean.of(middles(n, u -> -Math.log1p(-u)), .95).standardError();
        assertEquals(
                1,
                n * exponential * exponential / ReferenceValues.expected(VARIANCE, "exponential(1) 0.95 n*Var limit"),
                .02);
    }

    private static double[] middles(int n, DoubleUnaryOperator quantile) {
        var values = new double[n];
        Arrays.setAll(values, i -> quantile.applyAsDouble((i + .5) / n));
        return values;
    }

    /// Records tail-mean-closed-forms and tail-mean-estimator-variance, by seeded draws: estimates lie
    /// about the closed form as the standard error says. The bias, of the order of 1/n, is beneath the
    /// error of 400 repetitions.
    @Test
    void agreesWithClosedForms() {
        var random = RandomGeneratorFactory.of("L64X128MixRandom").create(20261201);
        double normal = ReferenceValues.expected("tail-mean-closed-forms", "normal(0.95) tail mean");
        double exponential = ReferenceValues.expected("tail-mean-closed-forms", "exponential(1)(0.95) tail mean");
        int repetitions = 400;
        int covered = 0;
        double sum = 0;
        double squares = 0;
        for (int r = 0; r < repetitions; r++) {
            double[] values = random.doubles(4_000).toArray();
            Arrays.setAll(values, _ -> random.nextGaussian());
            Arrays.sort(values);
            double off = (TailMean.of(values, .95).value() - normal)
                    / TailMean.of(values, .95).standardError();
            sum += off;
            squares += off * off;
            Arrays.setAll(values, _ -> random.nextExponential());
            Arrays.sort(values);
            var estimate = TailMean.of(values, .95);
            covered += Math.abs(estimate.value() - exponential) <= 1.96 * estimate.standardError() ? 1 : 0;
        }
        double mean = sum / repetitions;
        double sd = Math.sqrt(squares / repetitions - mean * mean);
        assertTrue(Math.abs(mean) < 4 / Math.sqrt(repetitions) + .05, "mean " + mean);
        assertEquals(1, sd, 4 / Math.sqrt(2.0 * repetitions));
        assertEquals(.95, (double) covered / repetitions, 4 * Math.sqrt(.95 * .05 / repetitions));
    }

    /// Record tail-mean-closed-forms: every density whose tail has a finite variance, by 200,000 seeded
    /// draws, within four standard errors. Only draws near the tail and in it are made; the others count as
    /// one low value.
    @ParameterizedTest(name = "{0}({1})")
    @CsvSource({
        "normal, .9",
        "normal, .95",
        "normal, .99",
        "normal, .999",
        "t5, .99",
        "t3, .99",
        "exponential(1), .95",
        "'pareto(1,2.5)', .95",
        "'lognormal(0,1)', .95",
        "'uniform(0,1)', .95",
        "'logistic(0,1)', .95",
        "'gpd(xi=0.3,sigma=1)', .99"
    })
    void agreesWithAllClosedForms(String density, double q) {
        double expected = ReferenceValues.expected("tail-mean-closed-forms", density + "(" + q + ") tail mean");
        DoubleUnaryOperator beyond = beyond(density);
        var random = RandomGeneratorFactory.of("L64X128MixRandom").create(20261201);
        double[] sorted = random.doubles(200_000).sorted().toArray();
        double least = beyond.applyAsDouble(1.5 * (1 - q));
        for (int i = 0; i < sorted.length; i++) {
            sorted[i] = sorted[i] > 1 - 1.5 * (1 - q) ? beyond.applyAsDouble(1 - sorted[i]) : least;
        }
        var estimate = TailMean.of(sorted, q);
        assertEquals(expected, estimate.value(), 4 * estimate.standardError());
        assertTrue(estimate.standardError() < .1 * expected);
    }

    /// The value that is exceeded with a probability.
    private static DoubleUnaryOperator beyond(String density) {
        return switch (density) {
            case "normal" -> NormalDistribution.of(0, 1)::inverseSurvivalProbability;
            case "t5" -> TDistribution.of(5)::inverseSurvivalProbability;
            case "t3" -> TDistribution.of(3)::inverseSurvivalProbability;
            case "exponential(1)" -> p -> -Math.log(p);
            case "pareto(1,2.5)" -> p -> Math.pow(p, -1 / 2.5);
            case "lognormal(0,1)" -> LogNormalDistribution.of(0, 1)::inverseSurvivalProbability;
            case "uniform(0,1)" -> p -> 1 - p;
            case "logistic(0,1)" -> p -> Math.log1p(-p) - Math.log(p);
            case "gpd(xi=0.3,sigma=1)" -> p -> Math.expm1(-.3 * Math.log(p)) / .3;
            default -> throw new IllegalArgumentException(density);
        };
    }
}
