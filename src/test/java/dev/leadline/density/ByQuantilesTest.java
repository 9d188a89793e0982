package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import org.apache.commons.statistics.distribution.GammaDistribution;
import org.apache.commons.statistics.distribution.WeibullDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/// Members entered by two of their quantiles.
class ByQuantilesTest {
    private static final long SEED = 20261201;

    static List<Family> families() {
        return Catalogue.families().stream()
                .filter(f ->
                        f.entries().getLast().stream().anyMatch(p -> p.name().equals("q95")))
                .toList();
    }

    /// The quantiles of a member give the member back: what was asked for is achieved.
    @ParameterizedTest
    @MethodSource("families")
    void achievesWhatIsAskedFor(Family family) {
        var random = new SplittableRandom(SEED);
        int made = 0;
        for (int trial = 0; trial < 300; trial++) {
            double low = random.nextDouble(0.01, 10);
            double high = low * random.nextDouble(1.05, 8);
            var parameters = new LinkedHashMap<String, Double>();
            parameters.put("q95", high);
            parameters.put("q2.5", low);
            family.entries().getLast().stream()
                    .filter(p -> !p.optional() && !p.name().startsWith("q"))
                    .forEach(p -> parameters.put(p.name(), 4.0));
            Density density;
            try {
                density = family.of(parameters);
            } catch (Refusal refusal) {
                assertEquals(
                        "no member of the family has these two quantiles",
                        refusal.problems().getFirst().primary());
                continue;
            }
            made++;
            String what = density + ", seed " + SEED;
            assertEquals(low, density.quantile(0.025), 1e-9 * high, what);
            assertEquals(high, density.quantile(0.95), 1e-9 * high, what);
        }
        int seen = made;
        assertTrue(made > 100, () -> family.name() + ": only " + seen + " made");
    }

    /// The library's quantiles go in, the parameters come out.
    @Test
    void findsTheParametersOfALibrary() {
        var gamma = GammaDistribution.of(2.5, 1.4);
        var found = (Gamma) of(
                "gamma",
                "q10",
                gamma.inverseCumulativeProbability(0.1),
                "q99.5",
                gamma.inverseCumulativeProbability(0.995));
        assertEquals(2.5, found.shape(), 1e-7);
        assertEquals(1.4, found.scale(), 1e-7);
        var weibull = WeibullDistribution.of(1.7, 3);
        var life = (Weibull) of(
                "weibull",
                "q5",
                weibull.inverseCumulativeProbability(0.05),
                "q95",
                weibull.inverseCumulativeProbability(0.95));
        assertEquals(1.7, life.shape(), 1e-8);
        assertEquals(3, life.scale(), 1e-8);
    }

    /// 1.644853626951473: 95 % quantile of the standard normal density, NIST/SEMATECH e-Handbook, 1.3.6.7.1.
    @Test
    void settlesMeanAndSd() {
        var normal = (Normal) of("normal", "q5", 10 - 1.644853626951473, "q95", 10 + 1.644853626951473);
        assertEquals(10, normal.mean(), 1e-14);
        assertEquals(1, normal.sd(), 1e-14);
    }

    @Test
    void refusesWhatSettlesNothing() {
        assertRefused("q95 is 3 but must be greater than q5, which is 4", "normal", "q5", 4, "q95", 3);
        assertRefused("q5 stands alone", "normal", "q5", 4);
        assertRefused("q5 and q5.0 are the same quantile", "normal", "q5", 4, "q5.0", 5);
        assertRefused("there are 3 quantiles", "normal", "q5", 4, "q50", 5, "q95", 6);
        assertRefused("q5 is -1 but must be greater than 0", "lognormal", "q5", -1, "q95", 6);
        assertRefused("q5 is NaN but must be a finite number", "normal", "q5", Double.NaN, "q95", 3);
        assertRefused("dof is missing", "student", "q5", 1, "q95", 3);
        assertRefused("mean, q5 and q95 do not go together in one density", "normal", "mean", 1, "q5", 1, "q95", 3);
        assertRefused("triangular has no parameter q5", "triangular", "q5", 1, "q95", 3);
        assertRefused("normal has no parameter q100", "normal", "q100", 1, "q95", 3);
        assertRefused("q5 is 1 but must be greater than from, 3", "weibull", "q5", 1, "q95", 4, "from", 3);
        assertRefused("q5 is 0 but must be greater than 0", "weibull", "q5", 0, "q95", 4);
        assertRefused("from is NaN but must be a finite number", "weibull", "q5", 0, "q95", 4, "from", Double.NaN);
        assertRefused(
                "dof is 0 but must be at least 0.1 and at most 10000000000", "student", "dof", 0, "q5", 1, "q95", 3);
        assertRefused("the distance between q5 and q95 is too large", "normal", "q5", -1e308, "q95", 1e308);
        assertRefused("no member of the family has these two quantiles", "gamma", "q49", 1, "q51", 1.0000001);
    }

    private static void assertRefused(String primary, String family, Object... parameters) {
        var problems = assertThrows(Refusal.class, () -> of(family, parameters)).problems();
        assertTrue(problems.stream().map(Problem::primary).anyMatch(primary::equals), problems::toString);
    }

    private static Density of(String family, Object... parameters) {
        Map<String, Double> map = new LinkedHashMap<>();
        for (int i = 0; i < parameters.length; i += 2) {
            map.put((String) parameters[i], ((Number) parameters[i + 1]).doubleValue());
        }
        return Catalogue.family(family).orElseThrow().of(map);
    }
}
