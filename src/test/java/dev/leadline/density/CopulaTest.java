package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class CopulaTest {
    private static final Correlations THREE =
            Correlations.none(3).with(0, 1, .7).with(0, 2, -.3).with(1, 2, .2);

    private static boolean[] all(int size) {
        boolean[] all = new boolean[size];
        Arrays.fill(all, true);
        return all;
    }

    /// The middles of `cells` strata of each of two inputs, every combination.
    private static double[][] grid(int cells) {
        return new double[][] {
            IntStream.range(0, cells * cells)
                    .mapToDouble(i -> (i % cells + .5) / cells)
                    .toArray(),
            IntStream.range(0, cells * cells)
                    .mapToDouble(i -> (i / cells + .5) / cells)
                    .toArray()
        };
    }

    /// By the definition, with the normal distribution of another library.
    @Test
    void combinesNormalsByTheFactor() {
        double[][] u = {{.1, .5, .999}, {.7, .2, 1e-9}, {.3, .6, .4}};
        var normal = org.apache.commons.statistics.distribution.NormalDistribution.of(0, 1);
        double left = Math.sqrt(1 - .49);
        double last = (.2 + .7 * .3) / left;
        double[][] expected = new double[3][3];
        for (int row = 0; row < 3; row++) {
            double a = normal.inverseCumulativeProbability(u[0][row]);
            double b = normal.inverseCumulativeProbability(u[1][row]);
            double c = normal.inverseCumulativeProbability(u[2][row]);
            expected[0][row] = u[0][row];
            expected[1][row] = normal.cumulativeProbability(.7 * a + left * b);
            expected[2][row] = normal.cumulativeProbability(-.3 * a + last * b + Math.sqrt(1 - .09 - last * last) * c);
        }
        new Copula(Mixing.NONE, THREE).tie(u, all(3), 3);
        for (int i = 0; i < 3; i++) {
            assertArrayEquals(expected[i], u[i], 2e-12);
        }
    }

    /// By the definition, with the t and chi-square distributions of another library.
    @Test
    void multipliesNormalsByOneFactor() {
        double[][] u = {{.1, .5, .999}, {.7, .2, 1e-9}, {.3, 1e-6, .95}};
        double dof = 3.5;
        var normal = org.apache.commons.statistics.distribution.NormalDistribution.of(0, 1);
        var chiSquare = org.apache.commons.statistics.distribution.ChiSquaredDistribution.of(dof);
        var student = org.apache.commons.statistics.distribution.TDistribution.of(dof);
        double[][] expected = new double[2][3];
        for (int row = 0; row < 3; row++) {
            double a = normal.inverseCumulativeProbability(u[0][row]);
            double b = normal.inverseCumulativeProbability(u[1][row]);
            double factor = Math.sqrt(dof / chiSquare.inverseCumulativeProbability(u[2][row]));
            expected[0][row] = student.cumulativeProbability(factor * a);
            expected[1][row] = student.cumulativeProbability(factor * (-.6 * a + .8 * b));
        }
        new Copula(Mixing.student(dof), Correlations.none(2).with(0, 1, -.6)).tie(u, all(2), 3);
        assertArrayEquals(expected[0], u[0], 1e-11);
        assertArrayEquals(expected[1], u[1], 1e-11);
    }

    /// The same bits on every machine.
    @Test
    void bitsStayAsTheyAre() {
        assertEquals("ffffff094dec742f", hash(Mixing.NONE));
        assertEquals("19ef96f9760", hash(Mixing.student(4)));
    }

    private static String hash(Mixing mixing) {
        var copula = new Copula(mixing, THREE);
        double[][] u = new double[copula.coordinates()][1000];
        for (int i = 0; i < u.length; i++) {
            for (int row = 0; row < 1000; row++) {
                u[i][row] = (row * (.6180339887498949 + i * .1) + .05 * (i + 1)) % 1;
            }
        }
        copula.tie(u, all(3), 1000);
        return Long.toHexString(
                Arrays.hashCode(u[0]) * 31L * 31L + Arrays.hashCode(u[1]) * 31L + Arrays.hashCode(u[2]));
    }

    /// A grid of strata stays as even as its own resolution in each input that is tied.
    @Test
    void keepsTheDensityOfEachInput() {
        int cells = 500;
        double[][] u = grid(cells);
        new Copula(Mixing.NONE, Correlations.none(2).with(0, 1, .8)).tie(u, all(2), cells * cells);
        for (double[] column : u) {
            for (int power = 1; power <= 4; power++) {
                int k = power;
                double moment =
                        Arrays.stream(column).map(p -> Math.pow(p, k)).average().orElseThrow();
                assertEquals(1.0 / (k + 1), moment, 5e-5, "moment " + k);
            }
            double[] sorted = column.clone();
            Arrays.sort(sorted);
            for (int i = 0; i < sorted.length; i += 997) {
                assertEquals((i + .5) / sorted.length, sorted[i], 1e-3);
            }
        }
    }

    @Test
    void keepsTheDensityOfEachInputOfTheStudentCopula() {
        int cells = 64;
        double[][] u = new double[3][cells * cells * cells];
        for (int row = 0; row < u[0].length; row++) {
            u[0][row] = (row % cells + .5) / cells;
            u[1][row] = (row / cells % cells + .5) / cells;
            u[2][row] = (row / cells / cells + .5) / cells;
        }
        new Copula(Mixing.student(3), Correlations.none(2).with(0, 1, .8)).tie(u, all(2), u[0].length);
        for (int i = 0; i < 2; i++) {
            for (int power = 1; power <= 4; power++) {
                int k = power;
                double moment =
                        Arrays.stream(u[i]).map(p -> Math.pow(p, k)).average().orElseThrow();
                assertEquals(1.0 / (k + 1), moment, 1e-3, "moment " + k);
            }
        }
    }

    @Test
    void theFirstInputKeepsItsStrata() {
        double[][] u = grid(64);
        double[] first = u[0].clone();
        new Copula(Mixing.NONE, Correlations.none(2).with(0, 1, .9)).tie(u, all(2), first.length);
        assertArrayEquals(first, u[0], 1e-12);
    }

    @Test
    void drawsOnlyWhatAWantedInputIsMadeOf() {
        var copula = new Copula(Mixing.NONE, Correlations.none(4).with(0, 2, .5).with(1, 3, .5));
        boolean[] wanted = {false, false, true, false};
        assertArrayEquals(new boolean[] {true, false, true, false}, copula.behind(wanted));
        double[][] some = {{.2}, null, {.6}, null};
        double[][] every = {{.2}, {.9}, {.6}, {.1}};
        copula.tie(some, wanted, 1);
        copula.tie(every, all(4), 1);
        assertEquals(every[2][0], some[2][0]);
    }

    @Test
    void staysBetweenTheSmallestAndTheLargestProbabilityDrawn() {
        var copula = new Copula(Mixing.NONE, Correlations.none(2).with(0, 1, .9));
        double[][] u = {{0x1p-53, 1 - 0x1p-53}, {0x1p-53, 1 - 0x1p-53}};
        copula.tie(u, all(2), 2);
        for (double[] column : u) {
            assertTrue(column[0] >= 0x1p-53 && column[1] <= 1 - 0x1p-53);
        }
    }

    @Test
    void refusesWhatCannotBe() {
        var impossible = Correlations.none(3).with(0, 1, .9).with(1, 2, .9).with(0, 2, -.9);
        assertThrows(IllegalArgumentException.class, () -> new Copula(Mixing.NONE, impossible));
    }
}
