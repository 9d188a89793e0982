package dev.leadline.engine;

import static dev.leadline.ReferenceValues.caseOf;
import static dev.leadline.ReferenceValues.expected;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Beta;
import dev.leadline.density.Density;
import dev.leadline.density.Exponential;
import dev.leadline.density.Normal;
import dev.leadline.density.Poisson;
import dev.leadline.density.Shifted;
import dev.leadline.density.Student;
import dev.leadline.density.Uniform;
import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Extremes.Floor;
import dev.leadline.interval.Interval;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.scheme.Antithetic;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.LatinHypercube;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.ScrambledSobol;
import dev.leadline.scheme.Scrambling;
import dev.leadline.scheme.Share;
import java.util.Map;
import java.util.OptionalInt;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class WeightsTest {
    private static final String RECORD = "rare-is-normal-tail";
    private static final Share TENTH = new Share(1, 10);
    private static final long DRAWS = 400_000;

    private static Question tail(int c) {
        return new Questions().normal("z").probability("z > " + c).build();
    }

    private static Accumulator sums(Question question, Density other, Share share) {
        return Lanes.sums(question, Lanes.drawing(Map.of(0, other), share), 20261201, DRAWS);
    }

    /// The mean within four standard errors of the value, the variance of a draw within four of its own, from both
    /// sides; the kurtosis that these depend on is that of the observations.
    private static void assertMoments(double value, double variance, int draws, Accumulator sums) {
        assertEquals(value, sums.mean(0), 4 * Math.sqrt(variance / draws / sums.count()));
        double error = Math.sqrt((sums.excessKurtosis(0) + 2) / sums.count());
        assertTrue(error < .05, "standard error of the variance " + error);
        assertEquals(1, sums.variance(0) * draws / variance, 4 * error);
    }

    /// Owen and Zhou (2000) and elementary integrals, exact to 16 digits in the record.
    @ParameterizedTest
    @ValueSource(ints = {3, 4, 5})
    void drawsFromAShiftedNormal(int c) {
        var exact = caseOf(RECORD, "c=" + c);
        double p = expected(exact, "probability");
        assertMoments(
                p,
                expected(exact, "variance_shift_c"),
                1,
                sums(tail(c), new Shifted(new Normal(0, 1), c, 1), Share.NONE));
        double theta = expected(exact, "cross_entropy_shift");
        assertMoments(p, expected(exact, "variance_ce_shift"), 1, sums(tail(c), new Normal(theta, 1), Share.NONE));
    }

    /// With a tenth of the draws from the input's own density. The record has the variance of a draw whose density is
    /// chosen by chance; fixed shares spare what the means under the two differ by.
    @ParameterizedTest
    @ValueSource(ints = {3, 4, 5})
    void fixedSharesGainOverChance(int c) {
        var exact = caseOf(RECORD, "c=" + c);
        double p = expected(exact, "probability");
        double byChance = expected(exact, "variance_defensive_mixture_10pct");
        DoubleUnaryOperator weight = z -> 1 / (.1 + .9 * Math.exp(c * z - .5 * c * c));
        double own = integral(z -> normal(z) * weight.applyAsDouble(z), c, c + 12);
        double other = integral(z -> normal(z - c) * weight.applyAsDouble(z), c, c + 12);
        assertEquals(p, .1 * own + .9 * other, 1e-9 * p);
        double fixed = byChance - .1 * (own - p) * (own - p) - .9 * (other - p) * (other - p);
        assertTrue(fixed < .995 * byChance, fixed + " against " + byChance);
        assertMoments(p, fixed, 10, sums(tail(c), new Normal(c, 1), TENTH));
    }

    private static double normal(double z) {
        return Math.exp(-.5 * z * z) / Math.sqrt(2 * Math.PI);
    }

    /// Simpson's rule.
    private static double integral(DoubleUnaryOperator f, double low, double high) {
        int n = 20_000;
        double step = (high - low) / n;
        double sum = f.applyAsDouble(low) + f.applyAsDouble(high);
        for (int i = 1; i < n; i++) {
            sum += (i % 2 == 1 ? 4 : 2) * f.applyAsDouble(low + i * step);
        }
        return sum * step / 3;
    }

    /// Coverage of the 95 % interval where Exp(1) is drawn from Exp(rate a) and the mean of x is sought: found by a
    /// program of its own with 3,800 repetitions (standard error at most .0035 at .95, .0081 at .5). The tail index
    /// of the weights is (a - 1)/a, so that from 2 on their variance is infinite.
    @ParameterizedTest(name = "a = {0}")
    @CsvSource({"1.25, .941, .949, .951", "1.5, .906, .938, .947", "2.05, .791, .843, .874", "2.5, .690, .742, .784"})
    void intervalsHoldAsOftenAsTheyAreKnownTo(double a, double of1e3, double of1e4, double of1e5) {
        var question = new Questions().random("x", new Exponential(1)).mean("x").build();
        var lane = Lanes.drawing(Map.of(0, new Exponential(1 / a)), Share.NONE);
        assertCoverage(of1e3, question, lane, 1_000, 1_000);
        assertCoverage(of1e4, question, lane, 10_000, 300);
        assertCoverage(of1e5, question, lane, 100_000, 60);
    }

    private static void assertCoverage(double known, Question question, Lane lane, long draws, int repetitions) {
        int held = 0;
        for (int seed = 0; seed < repetitions; seed++) {
            Interval interval = dev.leadline.interval.Student.of(Lanes.sums(question, lane, seed, draws), 0, .95);
            held += interval.low() <= 1 && interval.high() >= 1 ? 1 : 0;
        }
        double variance = known * (1 - known);
        assertEquals(
                known,
                (double) held / repetitions,
                4 * Math.sqrt(variance / repetitions + variance / 3_800),
                draws + " draws");
    }

    static Stream<Points> layouts() {
        return Stream.of(
                new Independent(),
                new Antithetic(),
                new LatinHypercube(OptionalInt.of(50), 30),
                new ScrambledSobol(16, Scrambling.NESTED));
    }

    /// `E[x exp(z)]` with x of mean 2 is `2 exp(1/2)`, whichever points and shares; weights have the mean 1.
    @ParameterizedTest
    @MethodSource("layouts")
    void staysUnbiasedInEveryLayout(Points points) {
        var question = new Questions()
                .random("x", new Poisson(2))
                .normal("z")
                .mean("x*exp(z)")
                .build();
        Map<Integer, Density> others = Map.of(0, new Poisson(3), 1, new Normal(1, 1.25));
        for (Share share : new Share[] {Share.NONE, TENTH, new Share(1, 3)}) {
            var sums = Lanes.sums(question, Lanes.drawing(points, others, share), 5, 300_000);
            double exact = 2 * Math.exp(.5);
            assertEquals(exact, sums.mean(0), 4 * sums.standardError(0), points.word() + " " + share);
            assertTrue(sums.standardError(0) < .01 * exact);
            assertEquals(1, sums.mean(1), 4 * sums.standardError(1), points.word() + " " + share);
        }
    }

    @Test
    void noWeightIsAboveOneOverTheShare() {
        var question = tail(3);
        for (Share share : new Share[] {new Share(1, 100), TENTH, new Share(1, 2)}) {
            var sampler = Recipe.of(question, Lanes.drawing(Map.of(0, new Normal(30, .5)), share), 3)
                    .sampler();
            var extremes = sampler.compute(new GrowingItems(share.of()).at(90), Floor.OPEN, () -> false)
                    .orElseThrow()
                    .extremes()
                    .orElseThrow();
            double limit = 1 / share.value();
            extremes.look();
            assertEquals(limit, extremes.outermost().weights().greatest()[0], 1e-12 * limit);
        }
    }

    /// `exp(c²/2 - c x)`: up to 1e281 and down to 1e-297, and their product.
    @Test
    void weighsInLogarithms() {
        var question = new Questions().normal("x").normal("y").mean("x + y").build();
        Map<Integer, Density> others = Map.of(0, new Normal(36, 1), 1, new Normal(36, 1));
        var none = Recipe.of(question, Lanes.drawing(others, Share.NONE), 1);
        assertWeight(648, none, 0, 18);
        assertWeight(-684, none, 37, 18);
        assertWeight(648 - 684, none, 0, 37);
        assertWeight(648 - 648, none, 0, 36);
        var tenth = Recipe.of(question, Lanes.drawing(others, TENTH), 1);
        assertEquals(10, Weights.of(tenth, new double[] {0, 0}));
        assertEquals(StrictMath.exp(-684) / .9, Weights.of(tenth, new double[] {37, 18}), 1e-12 * StrictMath.exp(-684));
    }

    private static void assertWeight(double log, Recipe recipe, double x, double y) {
        assertEquals(1, Weights.of(recipe, new double[] {x, y}) / StrictMath.exp(log), 1e-12);
        assertEquals(log, Weights.logOf(recipe, new double[] {x, y}), 1e-12 * (1 + Math.abs(log)));
    }

    /// What the inputs cannot have counts nothing, though the formula has no value there.
    @Test
    void drawsBeyondTheInputsCountNothing() {
        var question = new Questions()
                .random("x", new Uniform(0, 1))
                .mean("sqrt(x*(1 - x))")
                .build();
        var sums = sums(question, new Normal(.5, .4), Share.NONE);
        assertEquals(0, sums.excluded());
        assertEquals(Math.PI / 8, sums.mean(0), 4 * sums.standardError(0));
        assertTrue(sums.standardError(0) < .002);
    }

    /// Ranges of integration, bounded and not, with the volume and the density that they are weighed by.
    @Test
    void integratesOverRangesDrawnFromOtherDensities() {
        var question = new Questions()
                .range("x", 0, 2)
                .line("y", 2)
                .integral("x^3*exp(-y^2/2)")
                .build();
        double exact = 4 * Math.sqrt(2 * Math.PI);
        Map<Integer, Density> others = Map.of(0, new Beta(3, 1, 0, 2), 1, new Student(5, 0, 1));
        for (Share share : new Share[] {Share.NONE, TENTH}) {
            var sums = Lanes.sums(question, Lanes.drawing(others, share), 8, DRAWS);
            assertEquals(exact, sums.mean(0), 4 * sums.standardError(0));
            assertTrue(sums.standardError(0) < .002 * exact);
        }
        // drawn far beyond what the density of the range reaches: 1/f is up to 1e300, f/g down to 1e-300
        var far = new Questions().line("y", 1).integral("exp(-abs(y - 36))").build();
        var sums = Lanes.sums(far, Lanes.drawing(Map.of(0, new Student(5, 36, 1)), Share.NONE), 8, DRAWS);
        assertEquals(2, sums.mean(0), 4 * sums.standardError(0));
        assertTrue(sums.standardError(0) < .01 && sums.excluded() == 0);
    }
}
