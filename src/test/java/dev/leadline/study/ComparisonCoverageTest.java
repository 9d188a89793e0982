package dev.leadline.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.engine.Questions;
import dev.leadline.estimate.Accumulator;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.scheme.Antithetic;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Scheme;
import dev.leadline.study.Comparison.Outcome;
import dev.leadline.trace.Answers;
import dev.leadline.trace.Mark;
import dev.leadline.trace.Trace;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.random.RandomGenerator;
import java.util.random.RandomGeneratorFactory;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/// How often the interval for the ratio of variances holds it. The expected figures are those of
/// `src/test/python/variance_ratios.py`, an independent experiment with 20,000 repetitions (standard error of a
/// coverage
/// .0016); gates are four joint standard errors.
class ComparisonCoverageTest {
    private static final int REPETITIONS = 2_000;
    private static final int GROUPS = 64;
    private static final Question QUESTION =
            new Questions().uniform("u", 0, 1).mean("exp(u)").build();

    /// Of `exp(U)` and of the mean of an antithetic pair (to 1 - U): closed forms.
    private static final double PLAIN = (Math.E * Math.E - 1) / 2 - (Math.E - 1) * (Math.E - 1);

    private static final double PAIR = PLAIN / 2 + (Math.E - (Math.E - 1) * (Math.E - 1)) / 2;

    private static RandomGenerator random(long seed) {
        return RandomGeneratorFactory.of("L64X128MixRandom").create(seed);
    }

    private static Lane lane(String name, Points points, boolean shares) {
        return new Lane(name, Scheme.of(points), shares, Optional.empty());
    }

    /// What a lane has shown that made these observations, in equal groups.
    private static Trace trace(Lane lane, double[] observations) {
        List<Accumulator> blocks = new ArrayList<>();
        var total = new Accumulator(1);
        for (int g = 0; g < GROUPS; g++) {
            var block = new Accumulator(1);
            block.add(
                    new double[][] {observations},
                    observations.length * g / GROUPS,
                    observations.length * (g + 1) / GROUPS);
            blocks.add(block);
            total.merge(block);
        }
        long draws = (long) observations.length * lane.scheme().drawsPerObservation();
        var mark = new Mark(draws, 0, Answers.of(QUESTION, lane.scheme(), total));
        return new Trace(lane.name(), lane.scheme(), List.of(mark), blocks, List.of(), Optional.empty());
    }

    private static void gate(double expected, int held, int repetitions) {
        double here = (double) held / repetitions;
        double error = Math.sqrt(expected * (1 - expected) / repetitions + .0016 * .0016);
        assertTrue(Math.abs(here - expected) <= 4 * error, () -> here + " where " + expected + " ± " + 4 * error);
    }

    @ParameterizedTest(name = "{0}: {1}, half-width {2}")
    @CsvSource({"normal, .9488, .1242", "exponential, .9466, .2467", "lognormal, .9471, .2414"})
    void pairsOfOneShape(String density, double coverage, double halfWidth) {
        var random = random(1);
        var a = lane("A", new Independent(), false);
        var b = lane("B", new Independent(), false);
        int held = 0;
        double halves = 0;
        for (int r = 0; r < REPETITIONS; r++) {
            double[][] x = new double[2][1000];
            for (int i = 0; i < 2000; i++) {
                double value = switch (density) {
                    case "normal" -> random.nextGaussian();
                    case "exponential" -> random.nextExponential();
                    default -> Math.exp(random.nextGaussian() / 2);
                };
                x[i % 2][i / 2] = i % 2 == 0 ? 2 * value : value;
            }
            var ratio = Comparison.of(QUESTION, a, trace(a, x[0]), b, trace(b, x[1]))
                    .orElseThrow()
                    .varianceRatio()
                    .orElseThrow();
            held += ratio.low() <= 4 && ratio.high() >= 4 ? 1 : 0;
            halves += Math.log(ratio.width()) / 2;
        }
        gate(coverage, held, REPETITIONS);
        assertEquals(halfWidth, halves / REPETITIONS, .02 * halfWidth);
    }

    /// The same numbers in both lanes: where that is counted the limits are two thirds as far apart as where it is not,
    /// and hold as often as they say.
    @ParameterizedTest(name = "counted: {0}, coverage {1}, half-width {2}")
    @CsvSource({"true, .9503, .0586", "false, .9976, .0907"})
    void lanesOfTheSameNumbers(boolean shares, double coverage, double halfWidth) {
        var random = random(2);
        var a = lane("A", new Independent(), shares);
        var b = lane("B", new Antithetic(), shares);
        int held = 0;
        double halves = 0;
        for (int r = 0; r < REPETITIONS; r++) {
            double[] u = random.doubles(1000).toArray();
            double[] plain = Arrays.stream(u).map(Math::exp).toArray();
            double[] pairs = Arrays.stream(u)
                    .map(x -> (Math.exp(x) + Math.exp(1 - x)) / 2)
                    .toArray();
            var comparison = Comparison.of(QUESTION, a, trace(a, plain), b, trace(b, pairs))
                    .orElseThrow();
            assertEquals(shares, comparison.paired());
            var ratio = comparison.varianceRatio().orElseThrow();
            // per draw: an observation of the pairs costs two
            double truth = PLAIN / (2 * PAIR);
            held += ratio.low() <= truth && ratio.high() >= truth ? 1 : 0;
            halves += Math.log(ratio.width()) / 2;
        }
        gate(coverage, held, REPETITIONS);
        assertEquals(halfWidth, halves / REPETITIONS, .02 * halfWidth);
    }

    private static StudyState run(Question question, boolean shares, Points ofB, long draws, long seed)
            throws InterruptedException {
        var plan = new Plan(
                new Stop(draws, OptionalDouble.empty()),
                seed,
                List.of(lane("A", new Independent(), shares), lane("B", ofB, shares)));
        try (var study = Study.start(question, plan, 1, _ -> {})) {
            return study.await();
        }
    }

    /// At 4,000 draws there are two dozen items of work to leave out, and half of the numbers of the one lane are in
    /// the
    /// other.
    @Test
    void commonRandomNumbersThroughTheEngine() throws InterruptedException {
        int repetitions = 300;
        int held = 0;
        double shared = 0;
        double separate = 0;
        for (int seed = 0; seed < repetitions; seed++) {
            var comparison = run(QUESTION, true, new Antithetic(), 4_000, seed)
                    .comparisons()
                    .getFirst();
            assertTrue(comparison.paired());
            var ratio = comparison.varianceRatio().orElseThrow();
            double truth = PLAIN / (2 * PAIR);
            held += ratio.low() <= truth && ratio.high() >= truth ? 1 : 0;
            shared += Math.log(ratio.width()) / 2;
            separate += Math.log(run(QUESTION, false, new Antithetic(), 4_000, seed)
                            .comparisons()
                            .getFirst()
                            .varianceRatio()
                            .orElseThrow()
                            .width())
                    / 2;
        }
        gate(.95, held, repetitions);
        double ofShared = shared / repetitions;
        double ofSeparate = separate / repetitions;
        assertTrue(ofShared < .9 * ofSeparate, () -> ofShared + " and " + ofSeparate);
    }

    @Test
    void theSameLaneTwiceOnTheSameNumbersDoesNotDiffer() throws InterruptedException {
        var state = run(QUESTION, true, new Independent(), 10_000, 1);
        assertEquals(
                state.lanes().get(0).trace().last().orElseThrow().answers(),
                state.lanes().get(1).trace().last().orElseThrow().answers());
        var comparison = state.comparisons().getFirst();
        assertEquals(Outcome.NO_DIFFERENCE, comparison.outcome());
        assertEquals(1, comparison.varianceRatio().orElseThrow().high());
    }

    /// Of 200 seeds, 181 at least with probability .9986 where 95 % is right.
    @Test
    void theSameSchemeOnSeparateNumbersShowsNoDifference() throws InterruptedException {
        int same = 0;
        for (int seed = 0; seed < 200; seed++) {
            var outcome = run(QUESTION, false, new Independent(), 20_000, seed)
                    .comparisons()
                    .getFirst()
                    .outcome();
            same += outcome == Outcome.NO_DIFFERENCE ? 1 : 0;
        }
        int seen = same;
        assertTrue(seen >= 181, () -> seen + " of 200");
        assertTrue(seen < 200, "an interval that always holds is too wide");
    }
}
