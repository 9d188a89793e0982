package dev.leadline.interval;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.leadline.ReferenceValues;
import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimate;
import dev.leadline.estimate.Regression;
import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/// Records diag-skewness-rule and diag-estimator-arithmetic.
class DiagnosticRecordsTest {
    private static final String SKEWNESS = "diag-skewness-rule";
    private static final String ARITHMETIC = "diag-estimator-arithmetic";
    private static final double RELATIVE = ReferenceValues.relativeTolerance(ARITHMETIC);

    private static Accumulator of(double[]... components) {
        var sums = new Accumulator(components.length);
        sums.add(components, 0, components[0].length);
        return sums;
    }

    private static double[] data(String name) {
        return ReferenceValues.numbers(
                ReferenceValues.record(ARITHMETIC).required("data").required(name));
    }

    private static void same(String name, double value) {
        double expected = ReferenceValues.expected(ARITHMETIC, name);
        assertEquals(expected, value, RELATIVE * Math.abs(expected), name);
    }

    /// Cochran (1977), Sampling Techniques, 2.15 (from memory): more than 25 times the squared skewness.
    @ParameterizedTest
    @ValueSource(
            strings = {
                "exponential",
                "gamma shape 4",
                "lognormal sigma=0.5",
                "lognormal sigma=1",
                "bernoulli p=0.01",
                "bernoulli p=1e-4"
            })
    void asksForTheObservationsOfCochransRule(String density) {
        double skewness = ReferenceValues.expected(SKEWNESS, density + ": skewness");
        double smallest = ReferenceValues.expected(SKEWNESS, density + ": smallest n > 25*skew^2");
        double asked = Guard.observations(skewness);
        assertEquals(smallest, Math.floor(asked) + 1, "observations asked for: " + asked);
    }

    @Test
    void pairsAreTheObservationsOfAntitheticDraws() {
        double[] one = data("y");
        double[] other = data("y_antithetic");
        double[] pairs = new double[one.length];
        Arrays.setAll(pairs, i -> (one[i] + other[i]) / 2);
        var estimate = Estimate.mean(of(pairs), 0);
        same("a_mean", estimate.value());
        same("a_se", estimate.standardError());
    }

    @Test
    void regressionCountsThatItsCoefficientWasFitted() {
        double[] control = Arrays.stream(data("control")).map(c -> c - .5).toArray();
        var fit = new Regression(of(data("y"), control), 0, 1, 1);
        same("b_slope", fit.coefficients()[0]);
        same("b_estimate", fit.estimate(new double[1]).value());
        same("b_se", fit.estimate(new double[1]).standardError());
    }

    @Test
    void replicatesGiveStudentsInterval() {
        var sums = of(data("replicates"));
        same("d_mean", sums.mean(0));
        same("d_se", sums.standardError(0));
        same("d_half_95", Student.of(sums, 0, .95).halfWidth());
    }
}
