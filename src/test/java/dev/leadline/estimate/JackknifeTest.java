package dev.leadline.estimate;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.random.RandomGenerator;
import java.util.random.RandomGeneratorFactory;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class JackknifeTest {
    private static double[] values(String density, int n) {
        RandomGenerator random = RandomGeneratorFactory.of("L64X128MixRandom").create(20261201);
        return IntStream.range(0, n)
                .mapToDouble(_ -> switch (density) {
                    case "normal" -> random.nextGaussian();
                    case "exponential" -> random.nextExponential();
                    case "lognormal" -> Math.exp(random.nextGaussian() / 2);
                    case "event" -> random.nextDouble() < .02 ? 1 : 0;
                    default -> throw new IllegalArgumentException(density);
                })
                .toArray();
    }

    private static Accumulator sums(double... values) {
        var sums = new Accumulator(1);
        sums.add(new double[][] {values}, 0, values.length);
        return sums;
    }

    /// Straight from the definition.
    private static double deleteOne(double[] x) {
        int n = x.length;
        double[] logs = new double[n];
        for (int i = 0; i < n; i++) {
            int left = i;
            double mean = IntStream.range(0, n)
                            .filter(j -> j != left)
                            .mapToDouble(j -> x[j])
                            .sum()
                    / (n - 1);
            double squares = IntStream.range(0, n)
                    .filter(j -> j != left)
                    .mapToDouble(j -> (x[j] - mean) * (x[j] - mean))
                    .sum();
            logs[i] = Math.log(squares / (n - 2));
        }
        double mean = Arrays.stream(logs).average().orElseThrow();
        return Arrays.stream(logs).map(log -> (log - mean) * (log - mean)).sum() * (n - 1) / n;
    }

    /// The two differ by terms of the order of 1/n of what the largest value weighs.
    @ParameterizedTest(name = "{0}, n = {1}")
    @CsvSource({"normal, 1000, .02", "exponential, 1000, .04", "lognormal, 2000, .04", "event, 2000, .05"})
    void theVarianceOfALogarithmIsThatOfLeavingOutOneByOne(String density, int n, double within) {
        double[] x = values(density, n);
        assertEquals(1, Jackknife.ofVariance(sums(x), 0).variance() / deleteOne(x), within);
    }

    @Test
    void groupsOfOneAreTheOrdinaryJackknife() {
        double[] x = values("exponential", 200);
        List<Accumulator> groups =
                Arrays.stream(x).mapToObj(JackknifeTest::sums).toList();
        double[] sizes = new double[x.length];
        Arrays.fill(sizes, 1);
        double[] without = Jackknife.without(groups).stream()
                .mapToDouble(sums -> Math.log(sums.variance(0)))
                .toArray();
        var log = Jackknife.of(sizes, Math.log(sums(x).variance(0)), without);
        assertEquals(1, log.variance() / deleteOne(x), 1e-9);
        assertEquals(199, log.degrees(), 1e-9);
    }

    /// Of the mean of n standard normal values the variance is 1/n, however they are divided.
    @Test
    void groupsOfAnySizesGiveTheVarianceOfAMean() {
        int[] cuts = {0, 10, 25, 40, 80, 100, 140, 220, 300, 420, 500, 660, 800, 1000};
        int repetitions = 400;
        double sum = 0;
        double squares = 0;
        double[] all = values("normal", 1000 * repetitions);
        for (int r = 0; r < repetitions; r++) {
            double[] x = Arrays.copyOfRange(all, 1000 * r, 1000 * (r + 1));
            List<Accumulator> groups = IntStream.range(1, cuts.length)
                    .mapToObj(j -> sums(Arrays.copyOfRange(x, cuts[j - 1], cuts[j])))
                    .toList();
            double[] sizes = groups.stream().mapToDouble(Accumulator::count).toArray();
            double[] without = Jackknife.without(groups).stream()
                    .mapToDouble(s -> s.mean(0))
                    .toArray();
            double variance =
                    1000 * Jackknife.of(sizes, sums(x).mean(0), without).variance();
            sum += variance;
            squares += variance * variance;
        }
        double mean = sum / repetitions;
        double error = Math.sqrt((squares / repetitions - mean * mean) / repetitions);
        assertTrue(Math.abs(mean - 1) < 4 * error, () -> mean + " ± " + error);
        assertTrue(error < .03, () -> "error " + error);
    }

    @Test
    void leavesOutEachGroupInTurn() {
        var without = Jackknife.without(List.of(sums(1, 2), sums(3), sums(4, 5, 6)));
        assertEquals(18.0 / 4, without.get(0).mean(0), 1e-14);
        assertEquals(18.0 / 5, without.get(1).mean(0), 1e-14);
        assertEquals(2, without.get(2).mean(0), 1e-14);
    }

    /// Equal variances with 11 degrees each have 22 together, and one that is exact costs none.
    @Test
    void degreesOfFreedomAreWelchs() {
        var one = new Logarithm(1, .25, 11);
        assertEquals(22, one.minus(new Logarithm(3, .25, 11)).degrees(), 1e-12);
        assertEquals(-2, one.minus(new Logarithm(3, .25, 11)).value(), 1e-12);
        assertEquals(11, one.plus(new Logarithm(3, 0, 5)).degrees(), 1e-12);
        assertEquals(1, one.times(2).variance(), 1e-12);
    }
}
