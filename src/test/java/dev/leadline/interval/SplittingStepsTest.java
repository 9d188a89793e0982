package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Accumulator;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import java.util.Arrays;
import org.apache.commons.statistics.distribution.ChiSquaredDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.apache.commons.statistics.distribution.PoissonDistribution;
import org.apache.commons.statistics.distribution.TDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class SplittingStepsTest {
    private static final long SEED = 20261201;

    /// The coverages to be met are known to this much, from independent experiments.
    private static final double OTHER_ERROR = 0.0016;

    private static SplittingSteps of(int particles, double... steps) {
        var sums = new Accumulator(1);
        sums.add(new double[][] {steps}, 0, steps.length);
        return SplittingSteps.of(sums, 0, particles);
    }

    /// Replacements as they are where every copy is independent of its model.
    private static double[] poisson(double mean, int repetitions, String name, long item) {
        var law = PoissonDistribution.of(mean);
        double[] u = new double[repetitions];
        Stream.at(new Address(SEED, Purpose.RUN, "A", 0, name, item)).fill(u, 0, repetitions);
        return Arrays.stream(u).map(law::inverseCumulativeProbability).toArray();
    }

    private static boolean holds(Interval interval, double p) {
        return interval.low() <= p && p <= interval.high();
    }

    private static void gate(double expected, int covered, int runs) {
        double error = Math.sqrt(expected * (1 - expected) / runs + OTHER_ERROR * OTHER_ERROR);
        assertEquals(expected, (double) covered / runs, 4 * error, "seed " + SEED);
    }

    /// Worked with the distributions of commons-statistics.
    @Test
    void worksOutAnExample() {
        double[] j = {1402, 1377, 1350, 1433, 1391, 1368, 1340, 1399, 1412, 1385};
        double mean = Arrays.stream(j).sum() / 10;
        double squares = Arrays.stream(j).map(x -> (x - mean) * (x - mean)).sum();
        var steps = of(100, j);
        assertEquals(Math.pow(1 - 1.0 / 1000, 10 * mean), steps.estimate(), 1e-12 * steps.estimate());

        double half = TDistribution.of(9).inverseSurvivalProbability(.025) * Math.sqrt(squares / 9 / 10) / 100;
        var interval = steps.interval(.95);
        assertEquals(Math.exp(-mean / 100 - half), interval.low(), 1e-12 * interval.low());
        assertEquals(Math.exp(-mean / 100 + half), interval.high(), 1e-12 * interval.high());
        assertEquals(SplittingSteps.KIND, interval.kind());

        double z = NormalDistribution.of(0, 1).inverseSurvivalProbability(.025);
        double middle = mean / 100 + z * z / 2000;
        double reach = z / Math.sqrt(1000) * Math.sqrt(mean / 100 + z * z / 4000);
        var ideal = steps.ideal(.95);
        assertEquals(Math.exp(-middle - reach), ideal.low(), 1e-11 * ideal.low());
        assertEquals(Math.exp(-middle + reach), ideal.high(), 1e-11 * ideal.high());
        assertEquals(SplittingSteps.IDEAL, ideal.kind());

        var dispersion = steps.dispersion();
        assertEquals(squares / mean, dispersion.statistic(), 1e-12 * squares / mean);
        assertEquals(9, dispersion.degrees());
        assertEquals(ChiSquaredDistribution.of(9).survivalProbability(squares / mean), dispersion.chance(), 1e-11);
        assertEquals(steps.estimate() * Math.sqrt(squares / 90) / 100, steps.error(), 1e-12 * steps.error());
    }

    /// Exactly, over all Poisson numbers: .949 to .951.
    @ParameterizedTest(name = "{0} particles in all, p = {1}")
    @CsvSource({"200, 1e-3", "200, 1e-6", "1000, 1e-3", "1000, 1e-6", "1000, 1e-9", "2000, 1e-4"})
    void idealCoversAsItShould(int particles, double p) {
        double mean = -particles * Math.log(p);
        var law = PoissonDistribution.of(mean);
        double covered = 0;
        int from = (int) (mean - 10 * Math.sqrt(mean));
        for (int j = from; j <= mean + 10 * Math.sqrt(mean); j++) {
            if (holds(new SplittingSteps(particles, 1, j, Double.NaN).ideal(.95), p)) {
                covered += law.probability(j);
            }
        }
        assertEquals(.95, covered, .0015);
    }

    @Test
    void coversAsItShould() {
        int runs = 6_000;
        double p = 1e-6;
        int covered = 0;
        int ofEstimates = 0;
        double t = TDistribution.of(9).inverseSurvivalProbability(.025);
        for (int r = 0; r < runs; r++) {
            double[] j = poisson(-20 * Math.log(p), 10, "cover", r);
            covered += holds(of(20, j).interval(.95), p) ? 1 : 0;

            double[] estimates =
                    Arrays.stream(j).map(x -> Math.pow(1 - 1.0 / 20, x)).toArray();
            double mean = Arrays.stream(estimates).average().orElseThrow();
            double squares =
                    Arrays.stream(estimates).map(x -> (x - mean) * (x - mean)).sum();
            ofEstimates += Math.abs(mean - p) <= t * Math.sqrt(squares / 90) ? 1 : 0;
        }
        gate(.950, covered, runs);
        gate(.874, ofEstimates, runs);
    }

    /// The estimate has no bias: its mean over Poisson numbers is p.
    @Test
    void estimateHasNoBias() {
        var law = PoissonDistribution.of(-40 * Math.log(1e-3));
        double mean = 0;
        for (int j = 0; j < 1_000; j++) {
            mean += law.probability(j) * new SplittingSteps(20, 2, j / 2.0, Double.NaN).estimate();
        }
        assertEquals(1e-3, mean, 1e-13);
    }

    /// Speaks in as many runs as its chance says where the law holds; where the variance is four times as large, in as
    /// many as the chi-square law gives four times the statistic.
    @Test
    void dispersionSpeaksWhereItShould() {
        int runs = 4_000;
        int spoke = 0;
        int spokeOfMore = 0;
        for (int r = 0; r < runs; r++) {
            double[] j = poisson(300, 10, "dispersion", r);
            spoke += of(20, j).dispersion().chance() < .01 ? 1 : 0;
            double[] more = Arrays.stream(j).map(x -> 300 + 2 * (x - 300)).toArray();
            spokeOfMore += of(20, more).dispersion().chance() < .01 ? 1 : 0;
        }
        assertEquals(.01, (double) spoke / runs, 4 * Math.sqrt(.01 * .99 / runs));
        var law = ChiSquaredDistribution.of(9);
        double power = law.survivalProbability(law.inverseSurvivalProbability(.01) / 4);
        assertEquals(power, (double) spokeOfMore / runs, 4 * Math.sqrt(power * (1 - power) / runs));
    }

    @Test
    void needsTenRepetitions() {
        assertEquals(
                "an interval needs at least 10 repetitions; so far there are 3",
                of(100, 5, 7, 9).interval(.95).note().orElseThrow());
        assertEquals(
                "an interval needs at least 10 repetitions; so far there is 1",
                of(100, 5).interval(.95).note().orElseThrow());
    }

    @Test
    void equalRepetitionsHaveNoSpread() {
        double[] equal = new double[10];
        Arrays.fill(equal, 7);
        var interval = of(100, equal).interval(.95);
        assertTrue(Double.isNaN(interval.low()) && Double.isNaN(interval.high()));
        assertTrue(interval.note().orElseThrow().contains("no spread"));
    }

    /// 1,000 independent draws, every one in the event: the lower limit is `.025^(1/1000)`.
    @Test
    void nothingReplacedIsAllHits() {
        var steps = of(100, new double[10]);
        assertEquals(1, steps.estimate());
        var interval = steps.interval(.95);
        assertEquals(Math.pow(.025, 1e-3), interval.low(), 1e-12);
        assertEquals(1, interval.high());
        assertEquals(ClopperPearson.KIND, interval.kind());
        assertTrue(Double.isNaN(steps.dispersion().chance()));
    }

    @Test
    void noLimitIsAboveOne() {
        var interval = of(100, 0, 0, 0, 0, 1, 0, 0, 0, 0, 0).interval(.95);
        assertEquals(1, interval.high());
        assertTrue(interval.low() > .99);
    }

    @ParameterizedTest
    @ValueSource(doubles = {0, 1, -1, 95, Double.NaN})
    void refusesWhatIsNoLevel(double level) {
        var steps = of(100, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10);
        assertThrows(IllegalArgumentException.class, () -> steps.ideal(level));
        assertThrows(IllegalArgumentException.class, () -> steps.interval(level));
    }
}
