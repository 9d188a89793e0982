package dev.leadline.estimate;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.leadline.ReferenceValues;
import java.util.Arrays;
import java.util.random.RandomGeneratorFactory;
import org.junit.jupiter.api.Test;

class RatioOfMeansTest {
    private static RatioOfMeans of(double[] up, double[] down) {
        var sums = new Accumulator(2);
        sums.add(new double[][] {up, down}, 0, up.length);
        return RatioOfMeans.of(sums, 0, 1);
    }

    /// By hand: means 3 and 2, variances 2 and 2/3 and covariance 1 of four observations.
    @Test
    void isLinearInBothMeans() {
        var ratio = of(new double[] {1, 3, 4, 4}, new double[] {1, 2, 3, 2});
        assertEquals(1.5, ratio.value());
        // (2 - 2 · 1.5 · 1 + 1.5² · 2/3) / 2² / 4
        assertEquals(Math.sqrt((2 - 3 + 1.5) / 16), ratio.standardError(), 1e-15);
        // (1.5 · 2/3 - 1) / 4 / 2²
        assertEquals(0, ratio.bias(), 1e-16);
        assertEquals(Math.sqrt(2 / 3.0 / 4) / 2, ratio.errorOfDenominator(), 1e-15);
        assertEquals(3, ratio.estimate().degrees());
    }

    @Test
    void hasNoErrorWhereComponentsAreProportional() {
        double[] down = {.1, .7, .3, 1.9, .2};
        double[] up = Arrays.stream(down).map(x -> 3 * x).toArray();
        assertEquals(0, of(up, down).standardError());
        // left of .1 … .2001 less 1.00003125 times what is below: -.31, -2.19, -.94, -5.94 and 9.38, all by 1e-5
        double[] other = {.1, .7, .3, 1.9, .2001};
        assertEquals(3.97e-5, of(other, down).standardError(), .01e-5);
    }

    /// Of 20,000 ratios of 50 pairs, exponential over an independent `1 + exponential`: the mean lies above
    /// the true ratio by the bias, and their spread is the standard error.
    @Test
    void biasIsThatOfTheFirstOrder() {
        var random = RandomGeneratorFactory.of("L64X128MixRandom").create(20261201);
        int repetitions = 20_000;
        int n = 50;
        double off = 0;
        double squares = 0;
        double bias = 0;
        double variance = 0;
        for (int r = 0; r < repetitions; r++) {
            double[] up = new double[n];
            double[] down = new double[n];
            Arrays.setAll(up, _ -> random.nextExponential());
            Arrays.setAll(down, _ -> 1 + random.nextExponential());
            var ratio = of(up, down);
            off += ratio.value() - .5;
            squares += (ratio.value() - .5) * (ratio.value() - .5);
            bias += ratio.bias();
            variance += ratio.standardError() * ratio.standardError();
        }
        // .5 · (1/50) / 4
        assertEquals(.0025, bias / repetitions, .0001);
        double error = Math.sqrt(squares / repetitions / repetitions);
        assertEquals(.0025, off / repetitions, 4 * error + .0001);
        assertEquals(1, variance / squares, .05);
    }

    /// Record prop-gum-h2: three quantities from five simultaneous readings of voltage, current and phase.
    /// The ratio of the first two is a ratio of means; the others have their linear part from the same
    /// covariances here.
    @Test
    void agreesWithTheImpedance() {
        var id = "prop-gum-h2";
        var data = ReferenceValues.record(id).required("data");
        double[] volt = ReferenceValues.numbers(data.required("V"));
        double[] ampere = Arrays.stream(ReferenceValues.numbers(data.required("I_mA")))
                .map(x -> x / 1000)
                .toArray();
        double[] phase = ReferenceValues.numbers(data.required("phi"));
        var sums = new Accumulator(3);
        sums.add(new double[][] {volt, ampere, phase}, 0, 5);
        agrees(id, "V_mean", sums.mean(0));
        agrees(id, "I_mean", sums.mean(1));
        agrees(id, "phi_mean", sums.mean(2));
        agrees(id, "r_VI", correlation(sums, 0, 1));
        agrees(id, "r_Vphi", correlation(sums, 0, 2));
        agrees(id, "r_Iphi", correlation(sums, 1, 2));
        var ratio = RatioOfMeans.of(sums, 0, 1);
        agrees(id, "Z", ratio.value());
        agrees(id, "u_Z", ratio.standardError());
        double z = ratio.value();
        double cos = Math.cos(sums.mean(2));
        double sin = Math.sin(sums.mean(2));
        double[] ofR = {cos / sums.mean(1), -z * cos / sums.mean(1), -z * sin};
        double[] ofX = {sin / sums.mean(1), -z * sin / sums.mean(1), z * cos};
        double[] ofZ = {1 / sums.mean(1), -z / sums.mean(1), 0};
        agrees(id, "u_R", Math.sqrt(linear(sums, ofR, ofR)));
        agrees(id, "u_X", Math.sqrt(linear(sums, ofX, ofX)));
        agrees(id, "r_RX", linear(sums, ofR, ofX) / Math.sqrt(linear(sums, ofR, ofR) * linear(sums, ofX, ofX)));
        agrees(id, "r_XZ", linear(sums, ofX, ofZ) / Math.sqrt(linear(sums, ofX, ofX) * linear(sums, ofZ, ofZ)));
    }

    private static double correlation(Accumulator sums, int j, int k) {
        return sums.covariance(j, k) / Math.sqrt(sums.variance(j) * sums.variance(k));
    }

    private static double linear(Accumulator sums, double[] slopes, double[] others) {
        double sum = 0;
        for (int j = 0; j < 3; j++) {
            for (int k = 0; k < 3; k++) {
                sum += slopes[j] * others[k] * sums.covariance(j, k) / sums.count();
            }
        }
        return sum;
    }

    /// Record acc-weighted-logspace: its standard error has the divisor n where this one has n - 1.
    @Test
    void agreesWithAWeightedMean() {
        var id = "acc-weighted-logspace";
        double[] weights = {.5, 1, 2, 4.5};
        double[] weighted = {.5 * 3, -1, 2 * 2, 4.5 * .5};
        var ratio = of(weighted, weights);
        agrees(id, "weighted_mean", ratio.value());
        agrees(id, "self_normalised_se", ratio.standardError() * Math.sqrt(3 / 4.0));
    }

    private static void agrees(String id, String name, double actual) {
        double expected = ReferenceValues.expected(id, name);
        assertEquals(expected, actual, ReferenceValues.relativeTolerance(id) * Math.abs(expected), name);
    }
}
