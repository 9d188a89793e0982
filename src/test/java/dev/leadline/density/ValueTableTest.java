package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.problem.Refusal;
import java.math.BigDecimal;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/// What a table of values with probabilities promises beyond what `DiscreteCatalogueTest` asks of all.
class ValueTableTest {
    @Test
    void sortsMergesAndLeavesOutWhatCannotHappen() {
        var table =
                ValueTable.of(new double[] {3, -1, 3, 9, 0.0, -0.0}, new double[] {0.25, 0.25, 0.25, 0, 0.125, 0.125});
        assertEquals(List.of(-1.0, 0.0, 3.0), table.values());
        assertEquals(List.of(0.25, 0.25, 0.5), table.probabilities());
        assertEquals(new Support(-1, 3), table.support());
        assertEquals(0.25, table.pdf(-0.0));
        assertEquals(0.5, table.cdf(-0.0));
        assertEquals(0.5, table.survival(2.9));
        assertEquals(0, table.quantile(0.5));
        assertEquals(3, table.quantile(Math.nextUp(0.5) + 1e-12));
        assertEquals(0, table.upperQuantile(0.5));
    }

    /// By hand: mean 1.5, central moments from deviations -2.5, -.5 and 1.5 of {-1: 1/4, 1: 1/4, 3: 1/2}.
    @Test
    void momentsByHand() {
        var table = ValueTable.of(new double[] {3, 1, -1}, new double[] {0.5, 0.25, 0.25});
        assertEquals(1.5, table.mean());
        assertEquals(2.75, table.variance());
        assertEquals((0.25 * -15.625 + 0.25 * -0.125 + 0.5 * 3.375) / Math.pow(2.75, 1.5), table.skewness(), 1e-15);
        assertEquals(
                (0.25 * 39.0625 + 0.25 * 0.0625 + 0.5 * 5.0625) / (2.75 * 2.75) - 3, table.excessKurtosis(), 1e-15);
    }

    @Test
    void dividesByASumThatIsNearlyOne() {
        var table = ValueTable.of(new double[] {1, 2, 3}, new double[] {0.3333333333, 0.3333333333, 0.3333333333});
        assertEquals(1 / 3.0, table.pdf(2), 1e-16);
        assertEquals(1, table.cdf(3));
    }

    /// A hundred thousand values whose probabilities span ten decades: sums against exact decimal arithmetic.
    @Test
    void bothTailsOfALongTable() {
        int n = 100_000;
        var random = new SplittableRandom(20261201);
        var values = new double[n];
        var weights = new double[n];
        for (int i = 0; i < n; i++) {
            values[i] = random.nextDouble(-1000, 1000);
            weights[i] = StrictMath.exp(random.nextDouble(-23, 0));
        }
        double sum = Arrays.stream(weights).sum();
        var probabilities = Arrays.stream(weights).map(w -> w / sum).toArray();
        var table = ValueTable.of(values, probabilities);
        var total = Arrays.stream(probabilities).mapToObj(BigDecimal::new).reduce(BigDecimal.ZERO, BigDecimal::add);
        for (double x : new double[] {-999.99, -900, 0, 999, 999.99}) {
            var below = BigDecimal.ZERO;
            for (int i = 0; i < n; i++) {
                below = values[i] <= x ? below.add(new BigDecimal(probabilities[i])) : below;
            }
            double lower = below.doubleValue() / total.doubleValue();
            double upper = total.subtract(below).doubleValue() / total.doubleValue();
            assertEquals(lower, table.cdf(x), 1e-15 * lower);
            assertEquals(upper, table.survival(x), 1e-15 * upper);
        }
        assertTrue(Inversion.of(table).uError() <= 1e-12);
    }

    @Test
    void equalTablesShareACurve() {
        var one = ValueTable.of(new double[] {1, 2}, new double[] {0.5, 0.5});
        var other = ValueTable.of(new double[] {2, 1}, new double[] {0.5, 0.5});
        assertEquals(one, other);
        assertEquals(one.hashCode(), other.hashCode());
        assertTrue(Curves.of(one) == Curves.of(other));
        assertNotEquals(one, ValueTable.of(new double[] {1, 3}, new double[] {0.5, 0.5}));
        assertNotEquals(
                Inversion.of(one).hash(),
                Inversion.of(ValueTable.of(new double[] {1, 3}, new double[] {0.5, 0.5}))
                        .hash());
    }

    @Test
    void saysWhatIsWrongAndWhere() {
        refused("values[1] is NaN but must be a finite number at values[1]", new double[] {1, Double.NaN}, 0.5, 0.5);
        refused(
                "values[0] is ∞ but must be a finite number at values[0]",
                new double[] {Double.POSITIVE_INFINITY, 1},
                0.5,
                0.5);
        refused(
                "probabilities[1] is 1.5 but must be at least 0 and at most 1 at probabilities[1]",
                new double[] {1, 2},
                0,
                1.5);
        refused(
                "probabilities[1] is NaN but must be at least 0 and at most 1 at probabilities[1]",
                new double[] {1, 2},
                0.5,
                Double.NaN);
        refused(
                "probabilities[0] is -0.5 but must be at least 0 and at most 1 at probabilities[0]",
                new double[] {1, 2},
                -0.5,
                1);
        refused("the probabilities add up to 0.9 but must add up to 1 at probabilities", new double[] {1, 2}, 0.5, 0.4);
        refused(
                "the number of probabilities is 1 but must be 2, that of the values at probabilities",
                new double[] {1, 2},
                1);
        refused("a table needs at least one value at values", new double[0]);
        refused("a table of 100001 values is too long at values", new double[100_001], evenly(100_001));
        refused(
                "the probabilities add up to 1.0000000020000002 but must add up to 1 at probabilities",
                new double[] {1, 2},
                0.5,
                0.500000002);
    }

    private static double[] evenly(int n) {
        var probabilities = new double[n];
        Arrays.fill(probabilities, 1.0 / n);
        return probabilities;
    }

    private static void refused(String expected, double[] values, double... probabilities) {
        var refusal = assertThrows(Refusal.class, () -> ValueTable.of(values, probabilities));
        var problem = refusal.problems().getFirst();
        assertEquals(expected, problem.primary() + " at " + problem.place().path());
        assertEquals(1, refusal.problems().size(), refusal::getMessage);
    }
}
