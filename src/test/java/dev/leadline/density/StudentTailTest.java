package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import org.apache.commons.statistics.distribution.TDistribution;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/// Against commons-statistics.
class StudentTailTest {
    @ParameterizedTest(name = "dof {0}")
    @ValueSource(doubles = {1, 1.5, 2, 3, 4.7, 10, 30, 200, 3000, 10_000})
    void agreesInBothTails(double dof) {
        var other = TDistribution.of(dof);
        double[] t = new double[20_001];
        for (int i = 0; i < t.length; i++) {
            double z = (i - 10_000) / 10_000.0;
            // dense in the middle, out to 1e15
            t[i] = Math.copySign(Math.expm1(34 * Math.pow(Math.abs(z), 1.7)), z);
        }
        double[] u = t.clone();
        StudentTail.of(dof).probabilities(u, u.length);
        double worst = 0;
        for (int i = 0; i < t.length; i++) {
            double p = other.cumulativeProbability(t[i]);
            if (p > 0x1p-53) {
                worst = Math.max(worst, Math.abs(u[i] - p) / p);
            } else {
                assertTrue(u[i] <= 0x1p-53, "at " + t[i]);
            }
        }
        assertTrue(worst < 1e-10, "relative error " + worst);
    }

    @ParameterizedTest(name = "dof {0}")
    @ValueSource(doubles = {1, 3, 30})
    void isSymmetricAndRises(double dof) {
        double[] t = {0, -0.0, 1e-300, 1.25, -1.25, 7, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY};
        StudentTail.of(dof).probabilities(t, t.length);
        assertEquals(.5, t[0]);
        assertEquals(.5, t[1]);
        assertEquals(1 - t[3], t[4], 1e-16);
        assertTrue(t[6] <= 1 && t[6] > 1 - 1e-15 && t[7] >= 0 && t[7] < 1e-15);
        double[] rising = new double[100_000];
        Arrays.setAll(rising, i -> (i - 50_000) * 1e-4);
        StudentTail.of(dof).probabilities(rising, rising.length);
        for (int i = 1; i < rising.length; i++) {
            assertTrue(rising[i] > rising[i - 1]);
        }
    }
}
