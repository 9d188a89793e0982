package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.SplittableRandom;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.Stream;
import org.apache.commons.statistics.distribution.ContinuousDistribution;
import org.apache.commons.statistics.distribution.GammaDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/// Typed densities whose ends, breaks and peaks stand far from 0, where numbers are sparse, against closed forms and
/// distributions of a library in the distance from there. What the neighbours of a number explain is not counted.
class TypedFarFromZeroTest {
    private static final long SEED = 20261201;
    private static final int DRAWS = 20_000;
    private static final double INF = Double.POSITIVE_INFINITY;

    /// Error in probability that is promised.
    private static final double PROMISED = 1e-10;

    /// @param anchor where distances are taken from; the differences are exact
    /// @param below the mass below a distance
    /// @param above the mass above it
    /// @param neighbours of a draw, on either side, that explain a miss
    private record Case(
            String formula,
            double from,
            double to,
            List<Double> breaks,
            double anchor,
            DoubleUnaryOperator below,
            DoubleUnaryOperator above,
            int neighbours) {
        Case(
                String formula,
                double from,
                double to,
                List<Double> breaks,
                double anchor,
                DoubleUnaryOperator below,
                DoubleUnaryOperator above) {
            this(formula, from, to, breaks, anchor, below, above, 1);
        }

        Integrated density() {
            var text = new TypedText(formula, from, to, breaks, false);
            return Typed.of(text, "s", new LinkedHashMap<>()).density();
        }

        /// How far u is from the masses below the neighbours of x.
        double miss(double u, double x, int count) {
            double least = Math.max(x, from);
            double most = Math.min(x, to);
            for (int i = 0; i < count; i++) {
                least = Math.nextDown(least);
                most = Math.nextUp(most);
            }
            return u <= 0.5
                    ? outside(u, below.applyAsDouble(least - anchor), below.applyAsDouble(most - anchor))
                    : outside(1 - u, above.applyAsDouble(most - anchor), above.applyAsDouble(least - anchor));
        }

        @Override
        public String toString() {
            return formula;
        }
    }

    static Stream<Case> cases() {
        var gamma = GammaDistribution.of(1.5, 1);
        return Stream.of(
                exponential("exp(-(s-1e5))", 1e5),
                exponential("exp(-(s+1e5))", -1e5),
                exponential("exp(-(s-1e9))", 1e9),
                new Case("exp(s-1e5)", -INF, 1e5, List.of(), 1e5, StrictMath::exp, d -> -StrictMath.expm1(d)),
                new Case("exp(s+1e9)", -INF, -1e9, List.of(), -1e9, StrictMath::exp, d -> -StrictMath.expm1(d)),
                new Case("(s-1e3)^(-1/2)", 1e3, 1001, List.of(), 1e3, root(), d -> 1 - Math.sqrt(Math.clamp(d, 0, 1))),
                new Case(
                        "(1e5-s)^(-1/2)",
                        1e5 - 1,
                        1e5,
                        List.of(),
                        1e5,
                        d -> 1 - root().applyAsDouble(-d),
                        d -> root().applyAsDouble(-d)),
                new Case(
                        "(s-1e5)^(1/2)*exp(-(s-1e5))",
                        1e5,
                        INF,
                        List.of(),
                        1e5,
                        gamma::cumulativeProbability,
                        gamma::survivalProbability),
                new Case(
                        "-log(s-1e3)",
                        1e3,
                        1001,
                        List.of(),
                        1e3,
                        TypedFarFromZeroTest::logarithmic,
                        d -> 1 - logarithmic(d)),
                new Case(
                        "if(s<1e6,1,3)*exp(-abs(s-1e6))",
                        -INF,
                        INF,
                        List.of(1e6),
                        1e6,
                        d -> d < 0 ? StrictMath.exp(d) / 4 : 1 - StrictMath.exp(-d) * 3 / 4,
                        d -> d < 0 ? 1 - StrictMath.exp(d) / 4 : StrictMath.exp(-d) * 3 / 4),
                new Case(
                        "abs(s-1e4)^(-1/3)",
                        9999,
                        10001,
                        List.of(1e4),
                        1e4,
                        TypedFarFromZeroTest::twoThirds,
                        d -> twoThirds(-d)),
                new Case(
                        "1/sqrt(1e6-s^2)",
                        -1000,
                        1000,
                        List.of(),
                        0,
                        d -> StrictMath.acos(Math.clamp(-d / 1000, -1, 1)) / Math.PI,
                        d -> StrictMath.acos(Math.clamp(d / 1000, -1, 1)) / Math.PI,
                        2),
                exponential("exp(-(s-1e12))", 1e12),
                new Case(
                        "if(s<1e5+1e-6,0,1)*exp(-(s-1e5))",
                        1e5,
                        INF,
                        List.of(),
                        1e5 + 1e-6,
                        d -> -StrictMath.expm1(-Math.max(d, 0)),
                        d -> StrictMath.exp(-Math.max(d, 0))),
                humps("exp(-(s-1e7+3)^2/2)+exp(-(s-1e7-3)^2/2)/2", 1e7, 1),
                humps("exp(-(s+1e9+3)^2/2)+exp(-(s+1e9-3)^2/2)/2", -1e9, 1),
                humps("exp(-((s-1e7)/1e-2+3)^2/2)+exp(-((s-1e7)/1e-2-3)^2/2)/2", 1e7, 1e-2));
    }

    private static Case exponential(String formula, double end) {
        return new Case(
                formula, end, INF, List.of(), end, d -> -StrictMath.expm1(-Math.max(d, 0)), d -> StrictMath.exp(-d));
    }

    private static Case humps(String formula, double centre, double sd) {
        var left = NormalDistribution.of(-3 * sd, sd);
        var right = NormalDistribution.of(3 * sd, sd);
        return new Case(
                formula,
                -INF,
                INF,
                List.of(),
                centre,
                d -> mixed(left, right, ContinuousDistribution::cumulativeProbability, d),
                d -> mixed(left, right, ContinuousDistribution::survivalProbability, d));
    }

    private interface Mass {
        double of(ContinuousDistribution d, double x);
    }

    private static double mixed(ContinuousDistribution left, ContinuousDistribution right, Mass mass, double x) {
        return (mass.of(left, x) + mass.of(right, x) / 2) / 1.5;
    }

    private static DoubleUnaryOperator root() {
        return d -> Math.sqrt(Math.clamp(d, 0, 1));
    }

    private static double logarithmic(double d) {
        double inside = Math.clamp(d, 0, 1);
        return inside == 0 ? 0 : inside - inside * StrictMath.log(inside);
    }

    private static double twoThirds(double d) {
        double inside = Math.clamp(d, -1, 1);
        return 0.5 + 0.5 * Math.copySign(StrictMath.pow(Math.abs(inside), 2 / 3.0), inside);
    }

    private static double outside(double u, double least, double most) {
        return Math.max(Math.max(least - u, u - most), 0);
    }

    @ParameterizedTest
    @MethodSource("cases")
    void quantilesHitTheProbability(Case c) {
        var density = c.density();
        var random = new SplittableRandom(SEED);
        for (int i = 0; i < 2000; i++) {
            double p = probability(random, i);
            double x = density.quantile(p);
            assertEquals(0, c.miss(p, x, 1), PROMISED, () -> "quantile of " + p);
        }
    }

    @ParameterizedTest
    @MethodSource("cases")
    void drawsHitTheProbability(Case c) {
        var inversion = Inversion.of(c.density());
        assertTrue(inversion.uError() <= PROMISED, () -> "stated " + inversion.uError());
        var random = new SplittableRandom(SEED);
        var u = new double[DRAWS];
        var x = new double[DRAWS];
        for (int i = 0; i < DRAWS; i++) {
            u[i] = probability(random, i);
        }
        inversion.fill(u, x, DRAWS);
        double worst = 0;
        for (int i = 0; i < DRAWS; i++) {
            worst = Math.max(worst, c.miss(u[i], x[i], c.neighbours));
        }
        assertEquals(0, worst, PROMISED);
    }

    /// Where numbers stand dense enough for the heights to be told, the masses are right without any excuse.
    static Stream<Case> dense() {
        return cases().filter(c -> Math.ulp(c.anchor) < 1e-6);
    }

    /// At a thousand quantiles.
    @ParameterizedTest
    @MethodSource("dense")
    void massesAreThoseOfTheDistance(Case c) {
        var density = c.density();
        for (int i = 1; i < 1000; i++) {
            double x = density.quantile(i / 1000.0);
            assertEquals(c.below.applyAsDouble(x - c.anchor), density.cdf(x), PROMISED, () -> "cdf at " + x);
            assertEquals(c.above.applyAsDouble(x - c.anchor), density.survival(x), PROMISED, () -> "survival at " + x);
        }
    }

    private static double probability(SplittableRandom random, int i) {
        double p = StrictMath.scalb(1 + random.nextDouble(), -2 - random.nextInt(52));
        return i % 2 == 0 ? random.nextDouble(0x1p-53, 1 - 0x1p-53) : random.nextBoolean() ? p : 1 - p;
    }
}
