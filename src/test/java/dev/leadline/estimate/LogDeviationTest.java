package dev.leadline.estimate;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Arrays;
import java.util.random.RandomGenerator;
import java.util.random.RandomGeneratorFactory;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class LogDeviationTest {
    private static RandomGenerator random() {
        return RandomGeneratorFactory.of("L64X128MixRandom").create(20261201);
    }

    private static Accumulator sums(double[]... components) {
        var sums = new Accumulator(components.length);
        sums.add(components, 0, components[0].length);
        return sums;
    }

    private static Accumulator about(double[] h, double c) {
        return sums(
                Arrays.stream(h).map(x -> x - c).toArray(),
                Arrays.stream(h).map(x -> (x - c) * (x - c)).toArray());
    }

    /// Of single draws the value is that of the sample standard deviation, wherever c lies, and the error
    /// that of the jackknife that leaves out one after the other.
    @ParameterizedTest
    @ValueSource(doubles = {1, .9, 0, -20})
    void isTheJackknifesOfSingleDraws(double c) {
        var random = random();
        int n = 2_000;
        double[] h = random.doubles(n).toArray();
        Arrays.setAll(h, _ -> random.nextExponential());
        var log = LogDeviation.of(about(h, c), 0, 1);
        assertEquals(Math.log(sums(h).variance(0)) / 2, log.value(), 1e-12);
        var plain = Jackknife.ofVariance(sums(h), 0).times(.5);
        assertEquals(plain.value(), log.value(), 1e-12);
        assertEquals(1, log.variance() / plain.variance(), 10.0 / n);
        assertEquals(n - 1, log.degrees());
        double[] without = new double[n];
        for (int i = 0; i < n; i++) {
            int left = i;
            double mean = (Arrays.stream(h).sum() - h[i]) / (n - 1);
            double squares = 0;
            for (int j = 0; j < n; j++) {
                squares += j == left ? 0 : (h[j] - mean) * (h[j] - mean);
            }
            without[i] = Math.log(squares / (n - 2)) / 2;
        }
        double mean = Arrays.stream(without).average().orElseThrow();
        double variance =
                Arrays.stream(without).map(x -> (x - mean) * (x - mean)).sum() * (n - 1) / n;
        assertEquals(1, log.variance() / variance, .04);
    }

    /// Of as many ones as noughts no linear part is left; the variance of the sample variance is then
    /// `2σ⁴/(n(n - 1))` (Cramér 1946, Mathematical Methods of Statistics, 27.4.2).
    @ParameterizedTest
    @ValueSource(ints = {2, 100, 1_000})
    void hasAnErrorWhereOutcomesLieEquallyFarFromTheirMean(int n) {
        double[] h = new double[n];
        Arrays.fill(h, 0, n / 2, 1);
        double[] ones = new double[n];
        Arrays.fill(ones, 1);
        for (double c : new double[] {.5, .47, 3}) {
            double exact = 2.0 / n / (n - 1) / 4;
            var about = about(h, c);
            assertEquals(exact, LogDeviation.of(about, 0, 1).variance(), 1e-9 * exact);
            double[] off = Arrays.stream(h).map(x -> x - c).toArray();
            double[] squares = Arrays.stream(off).map(x -> x * x).toArray();
            assertEquals(
                    exact, LogDeviation.of(sums(off, squares, ones), 0, 1, 2).variance(), 1e-9 * exact);
        }
    }

    /// The same for every draw of an observation; equal weights change nothing.
    @Test
    void equalWeightsChangeNothing() {
        var random = random();
        double[] first = random.doubles(500).toArray();
        double[] second = Arrays.stream(first).map(x -> x * x).toArray();
        double[] equal = new double[500];
        Arrays.fill(equal, 3);
        double[] weightedFirst = Arrays.stream(first).map(x -> 3 * x).toArray();
        double[] weightedSecond = Arrays.stream(second).map(x -> 3 * x).toArray();
        var plain = LogDeviation.of(sums(first, second), 0, 1);
        var weighted = LogDeviation.of(sums(weightedFirst, weightedSecond, equal), 0, 1, 2);
        assertEquals(plain.value(), weighted.value(), 1e-13);
        assertEquals(plain.variance(), weighted.variance(), 1e-13 * plain.variance());
    }

    /// Of weighted draws, too, it does not matter where c lies.
    @Test
    void weightedOnesDoNotDependOnTheirCentre() {
        var random = random();
        double[] h = random.doubles(300).toArray();
        double[] w = random.doubles(300).toArray();
        Logarithm[] logs = new Logarithm[2];
        for (int k = 0; k < 2; k++) {
            double c = k == 0 ? .5 : -3;
            double[] first = new double[300];
            double[] second = new double[300];
            Arrays.setAll(first, i -> w[i] * (h[i] - c));
            Arrays.setAll(second, i -> w[i] * (h[i] - c) * (h[i] - c));
            logs[k] = LogDeviation.of(sums(first, second, w), 0, 1, 2);
        }
        assertEquals(logs[0].value(), logs[1].value(), 1e-12);
        assertEquals(1, logs[1].variance() / logs[0].variance(), 1e-10);
    }

    /// Antithetic pairs of a uniform outcome, folded to their means: its standard deviation is `1/√12`. And
    /// exponential draws weighted to an exponential density of mean .8, whose standard deviation is .8.
    /// Values lie about them as their variances say.
    @Test
    void servesPairsAndWeights() {
        var random = random();
        int repetitions = 2_000;
        int n = 400;
        double[][] pairs = new double[2][n];
        double[][] weighted = new double[3][n];
        var ofPairs = new Spread();
        var ofWeights = new Spread();
        for (int r = 0; r < repetitions; r++) {
            for (int i = 0; i < n; i++) {
                double u = random.nextDouble();
                double one = Math.exp(u) - 1.7;
                double other = Math.exp(1 - u) - 1.7;
                pairs[0][i] = (one + other) / 2;
                pairs[1][i] = (one * one + other * other) / 2;
                double x = random.nextExponential();
                double w = Math.exp(x - x / .8) / .8;
                weighted[0][i] = w * (x - .8);
                weighted[1][i] = w * (x - .8) * (x - .8);
                weighted[2][i] = w;
            }
            ofPairs.add(
                    LogDeviation.of(sums(pairs), 0, 1),
                    Math.log((Math.E * Math.E - 1) / 2 - Math.pow(Math.E - 1, 2)) / 2);
            ofWeights.add(LogDeviation.of(sums(weighted), 0, 1, 2), Math.log(.8));
        }
        ofPairs.check(repetitions);
        ofWeights.check(repetitions);
    }

    private static final class Spread {
        private double sum;
        private double squares;
        private double variance;

        void add(Logarithm log, double expected) {
            double off = log.value() - expected;
            sum += off;
            squares += off * off;
            variance += log.variance();
        }

        void check(int repetitions) {
            double mean = sum / repetitions;
            double ofValues = squares / repetitions - mean * mean;
            assertEquals(1, variance / repetitions / ofValues, 4 * Math.sqrt(2.0 / repetitions) + .05);
            // beside chance a bias of half the variance
            assertEquals(0, mean, 4 * Math.sqrt(ofValues / repetitions) + ofValues);
        }
    }
}
