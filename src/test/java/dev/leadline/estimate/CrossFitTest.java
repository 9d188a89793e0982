package dev.leadline.estimate;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.interval.Student;
import java.util.ArrayList;
import java.util.List;
import java.util.random.RandomGenerator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// exp(Z) with controls Z and Z² - 1: far from linear, so that the fit's own noise shows.
class CrossFitTest {
    private static final double[] NO_ERROR = {0, 0};
    private static final double MEAN = Math.sqrt(Math.E);

    private static List<Accumulator> folds(RandomGenerator random, int n, int folds) {
        var made = new ArrayList<Accumulator>();
        for (int f = 0; f < folds; f++) {
            double[][] rows = new double[3][n / folds];
            for (int i = 0; i < n / folds; i++) {
                double z = random.nextGaussian();
                rows[0][i] = StrictMath.exp(z);
                rows[1][i] = z;
                rows[2][i] = z * z - 1;
            }
            made.add(RegressionTest.sums(rows));
        }
        return made;
    }

    /// 1.13 and 1.03 were found by an independent simulation; so were 1.120 ± .02 and 1.032 ± .006 with
    /// numpy's least squares on ten folds. Without bias within four standard errors, where the fit to all
    /// 200 observations has one of -.0036, more than four. The outcomes are skewed, so that neither
    /// interval holds as often as it says: 87 and 85 % with 200 observations, 92 and 91 % with 1,000.
    @ParameterizedTest
    @CsvSource({"200, 10000, 1.13, .05", "1000, 3000, 1.03, .02"})
    void hasNoBiasForALittleMoreSpread(int n, int runs, double ratio, double gate) {
        var random = RegressionTest.random(n);
        var cross = new double[1][runs];
        var plain = new double[1][runs];
        int held = 0;
        int heldPlainly = 0;
        for (int run = 0; run < runs; run++) {
            var folds = folds(random, n, 8);
            var all = new Accumulator(3);
            folds.forEach(all::merge);
            var estimate = new CrossFit(folds, 0, 1, 2).estimate(NO_ERROR);
            var onAll = new Regression(all, 0, 1, 2).estimate(NO_ERROR);
            cross[0][run] = estimate.value();
            plain[0][run] = onAll.value();
            held += holds(estimate, MEAN);
            heldPlainly += holds(onAll, MEAN);
        }
        var crossed = RegressionTest.sums(cross);
        var plainly = RegressionTest.sums(plain);
        assertEquals(MEAN, crossed.mean(0), 4 * crossed.standardError(0));
        assertEquals(ratio, Math.sqrt(crossed.variance(0) / plainly.variance(0)), gate);
        assertTrue(held > heldPlainly, held + " and " + heldPlainly + " of " + runs);
        assertTrue(n > 200 || plainly.mean(0) < MEAN - 4 * plainly.standardError(0));
    }

    private static int holds(Estimate estimate, double value) {
        var interval = Student.of(estimate, .95);
        return interval.low() <= value && value <= interval.high() ? 1 : 0;
    }

    /// 95 % of normal outcomes, within four standard errors of 20,000 runs.
    @Test
    void holdsForNormalOutcomes() {
        var random = RegressionTest.random(7);
        int runs = 20_000;
        int held = 0;
        for (int run = 0; run < runs; run++) {
            var folds = new ArrayList<Accumulator>();
            for (int f = 0; f < 8; f++) {
                double[][] rows = new double[3][10];
                for (int i = 0; i < 10; i++) {
                    rows[1][i] = random.nextGaussian();
                    rows[2][i] = random.nextGaussian();
                    rows[0][i] = 2 * rows[1][i] - rows[2][i] + random.nextGaussian();
                }
                folds.add(RegressionTest.sums(rows));
            }
            held += holds(new CrossFit(folds, 0, 1, 2).estimate(NO_ERROR), 0);
        }
        assertEquals(.95, (double) held / runs, 4 * Math.sqrt(.05 * .95 / runs));
    }

    /// Of folds that are written out: two of two observations each, corrected with each other's slope.
    @Test
    void correctsEachFoldWithTheSlopeOfTheOthers() {
        var one = RegressionTest.sums(new double[] {1, 4}, new double[] {0, 1});
        var other = RegressionTest.sums(new double[] {2, 3}, new double[] {-1, 1});
        // Slopes 3 and .5: (1 - 0 + 4 - .5 + 2 + 3 + 3 - 3) / 4; squares about it.
        double mean = 9.5 / 4;
        double squares = 0;
        for (double corrected : new double[] {1, 3.5, 5, 0}) {
            squares += (corrected - mean) * (corrected - mean);
        }
        var estimate = new CrossFit(List.of(one, other), 0, 1, 1).estimate(new double[] {.1});
        assertEquals(mean, estimate.value(), 1e-15);
        assertEquals(2, estimate.degrees());
        assertEquals(Math.sqrt(squares / 2 / 4), estimate.standardError(), 1e-15);
        assertEquals(.1 * 1.75, estimate.bias(), 1e-15);
    }

    /// No fold has more than a block beyond its eighth.
    @Test
    void dealsBlocksIntoEightFoldsOfLikeSize() {
        var random = RegressionTest.random(5);
        var blocks = new ArrayList<Accumulator>();
        for (int b = 0; b < 40; b++) {
            blocks.addAll(folds(random, b % 2 == 0 ? 64 : 128, 1));
        }
        assertTrue(new CrossFit(blocks, 0, 1, 2).fewest() >= 40 * 96 * 7 / 8 - 64);
    }
}
