package dev.leadline.estimate;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import java.util.SplittableRandom;
import org.apache.commons.math3.stat.correlation.KendallsCorrelation;
import org.apache.commons.math3.stat.correlation.PearsonsCorrelation;
import org.apache.commons.math3.stat.correlation.SpearmansCorrelation;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// Against commons-math.
class AssociationTest {
    @ParameterizedTest(name = "{0} rows, {1} values")
    @CsvSource({"2, 1e9", "50, 3", "500, 10", "1000, 1e9", "777, 50"})
    void agreesWithAnotherLibrary(int rows, double values) {
        var random = new SplittableRandom(5);
        double[] x = new double[rows];
        double[] y = new double[rows];
        for (int i = 0; i < rows; i++) {
            double z = random.nextGaussian();
            // one zero, not two: the other library tells them apart
            x[i] = Math.rint(values * z) + 0.0;
            y[i] = Math.rint(values * (random.nextGaussian() - .6 * z)) + 0.0;
        }
        x[0] = 10 * values;
        y[0] = 10 * values;
        assertEquals(new PearsonsCorrelation().correlation(x, y), Association.pearson(x, y), 1e-12);
        assertEquals(
                new SpearmansCorrelation().correlation(x, y),
                Association.pearson(Association.ranks(x), Association.ranks(y)),
                1e-12);
        assertEquals(new KendallsCorrelation().correlation(x, y), Association.kendall(x, y), 1e-12);
    }

    @Test
    void equalValuesShareTheirRank() {
        assertArrayEquals(new double[] {2.5, 0, 2.5, 1}, Association.ranks(new double[] {7, -1, 7, 3}));
    }

    @Test
    void hasNoValueWhereNothingVaries() {
        double[] equal = new double[9];
        double[] rising = new double[9];
        Arrays.setAll(rising, i -> i);
        assertTrue(Double.isNaN(Association.pearson(equal, rising)));
        assertTrue(Double.isNaN(Association.kendall(rising, equal)));
    }

    /// Rows of two normals with ρ = .999: Spearman's correlation is `6/π asin(ρ/2)` (Kruskal 1958). Of five rows that
    /// of
    /// the ranks would be .014 too small; the mean of 20,000 batches has a standard error of 1.2e-4.
    @Test
    void spearmanHasNoBias() {
        var random = new Random(7);
        double rho = .999;
        double sum = 0;
        int batches = 20_000;
        for (int batch = 0; batch < batches; batch++) {
            var x = new double[5];
            var y = new double[5];
            for (int i = 0; i < 5; i++) {
                x[i] = random.nextGaussian();
                y[i] = rho * x[i] + Math.sqrt(1 - rho * rho) * random.nextGaussian();
            }
            sum += Association.spearman(Association.ranks(x), Association.ranks(y));
        }
        assertEquals(6 / Math.PI * Math.asin(rho / 2), sum / batches, 5e-4);
    }

    /// Equal values leave the correlation of the ranks as it is.
    @Test
    void spearmanOfEqualValues() {
        double[] x = {0, 1, 1, 1, 4};
        double[] y = {3, 1, 2, 4, 0};
        assertEquals(Association.pearson(x, y), Association.spearman(x, y));
    }
}
