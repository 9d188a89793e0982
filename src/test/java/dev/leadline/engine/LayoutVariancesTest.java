package dev.leadline.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.leadline.ReferenceValues;
import dev.leadline.estimate.Accumulator;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.scheme.Antithetic;
import dev.leadline.scheme.LatinHypercube;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.Stratified;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// Variances of observations against their exact values, from both sides; the gate is four standard errors of a sample
/// variance, from the sample's kurtosis.
class LayoutVariancesTest {
    private static Accumulator run(Question question, Points points, int observations) {
        var lane = Lane.of("A", Scheme.of(points));
        var recipe = Recipe.of(question, lane, 17);
        var sampler = recipe.sampler();
        var sums = new Accumulator(1);
        for (long item = 0; sums.count() < observations; item++) {
            sums.merge(sampler.compute(recipe.items().at(item), () -> false)
                    .orElseThrow()
                    .sums());
        }
        return sums;
    }

    private static void check(double mean, double variance, Accumulator sums) {
        double n = sums.count();
        assertEquals(mean, sums.mean(0), 4 * Math.sqrt(variance / n), "mean");
        double error = variance * Math.sqrt((sums.excessKurtosis(0) + 2) / n);
        assertEquals(variance, sums.variance(0), 4 * error, "variance");
    }

    private static Question expU() {
        return new Questions().uniform("u", 0, 1).mean("exp(u)").build();
    }

    @Test
    void antitheticPairs() {
        String id = "exp-expU-antithetic";
        check(
                ReferenceValues.expected(id, "mean"),
                ReferenceValues.expected(id, "variance_of_pair_average"),
                run(expU(), new Antithetic(), 100_000));
    }

    @ParameterizedTest
    @CsvSource({"2, 100000", "4, 100000", "10, 50000", "100, 10000"})
    void strata(int cells, int passes) {
        check(
                StrictMath.E - 1,
                ReferenceValues.expected("exp-expU-stratified", "W_k" + cells) / cells,
                run(expU(), new Stratified(new LinkedHashMap<>(Map.of("u", cells))), passes));
    }

    @ParameterizedTest
    @CsvSource({"10, 50000", "100, 10000", "1000, 4000"})
    void latinHypercubesOfASum(int n, int cubes) {
        var question = new Questions();
        for (int j = 1; j <= 5; j++) {
            question.uniform("x" + j, 0, 1);
        }
        check(
                2.5,
                ReferenceValues.expected("qmc-lhs-exact", "var sum of 5 uniforms n=" + n),
                run(question.mean("x1 + x2 + x3 + x4 + x5").build(), new LatinHypercube(OptionalInt.of(n), 30), cubes));
    }

    /// A little worse than independent points.
    @ParameterizedTest
    @CsvSource({"10, 50000", "100, 20000", "1000, 10000"})
    void latinHypercubesOfAnInteraction(int n, int cubes) {
        check(
                0,
                ReferenceValues.expected("qmc-lhs-exact", "var (x-1/2)(y-1/2) n=" + n),
                run(
                        new Questions()
                                .uniform("x", 0, 1)
                                .uniform("y", 0, 1)
                                .mean("(x - 1/2)*(y - 1/2)")
                                .build(),
                        new LatinHypercube(OptionalInt.of(n), 30),
                        cubes));
    }
}
