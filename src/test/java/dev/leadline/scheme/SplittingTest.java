package dev.leadline.scheme;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import dev.leadline.interval.SplittingSteps;
import dev.leadline.numeric.Normal;
import dev.leadline.scheme.SplittingOutcome.End;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import java.util.Arrays;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.function.DoubleUnaryOperator;
import java.util.function.IntToDoubleFunction;
import java.util.stream.IntStream;
import org.apache.commons.statistics.distribution.PoissonDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

class SplittingTest {
    private static final long SEED = 20261201;

    /// Level of an interval that reaches four standard errors of a normal estimate.
    private static final double FOUR_SIGMA = 1 - 6.3e-5;

    private static Stream stream(String name, long item) {
        return Stream.at(new Address(SEED, Purpose.RUN, "A", 0, name, item));
    }

    private static SplittingOutcome run(Splitting splitting, Score score, int dimensions, String name, long item) {
        return splitting.run(score, dimensions, stream(name, item), () -> false).orElseThrow();
    }

    private static SplittingSteps repeat(Splitting splitting, Events event, int repetitions) {
        return repeat(splitting, event, event.name(), 0, repetitions);
    }

    private static SplittingSteps repeat(Splitting splitting, Events event, String name, long first, int repetitions) {
        return steps(splitting.particles(), repetitions, r -> {
            var outcome = run(splitting, event.score(), event.dimensions(), name, first + r);
            assertTrue(outcome.arrived());
            return outcome.steps();
        });
    }

    private static SplittingSteps steps(int particles, int repetitions, IntToDoubleFunction each) {
        double[] j = IntStream.range(0, repetitions).mapToDouble(each).toArray();
        return new SplittingSteps(particles, repetitions, mean(j), Math.sqrt(variance(j) / repetitions));
    }

    private static double mean(double[] values) {
        return Arrays.stream(values).average().orElseThrow();
    }

    private static double variance(double[] values) {
        double mean = mean(values);
        return Arrays.stream(values).map(x -> (x - mean) * (x - mean)).sum() / (values.length - 1);
    }

    private static Score ofFirst(DoubleUnaryOperator score) {
        return (z, rows, s) -> {
            for (int i = 0; i < rows; i++) {
                s[i] = score.applyAsDouble(z[0][i]);
            }
        };
    }

    /// A walk whose moves a test makes; `z` is replaced, the score returned.
    private record Walking(Move how) implements Walk {
        interface Move {
            double move(double[] z, double score, double level);
        }

        @Override
        public double move(double[] z, double score, double level) {
            return how.move(z, score, level);
        }

        @Override
        public long proposals() {
            return 0;
        }

        @Override
        public long accepted() {
            return 0;
        }

        @Override
        public long failed() {
            return 0;
        }

        @Override
        public double step() {
            return 1;
        }
    }

    /// Record rare-splitting-ideal: one uniform u with score -ln u, less that of p, and copies that are drawn afresh
    /// above
    /// the level. Mean and variance of the replacements, and of the estimates, from both sides.
    @ParameterizedTest(name = "{1} particles, p = {0}")
    @CsvSource({"1e-3, 100, 2000, 'p=1e-3,N=100'", "1e-6, 100, 2000, 'p=1e-6,N=100'", "1e-9, 1000, 100, 'p=1e-9,N=1000'"
    })
    void idealCopiesMakePoissonReplacements(double p, int particles, int runs, String label) {
        Score score = ofFirst(z -> Math.log(p) - Math.log(Normal.cdf(-z)));
        double[] steps = new double[runs];
        double[] estimates = new double[runs];
        for (int r = 0; r < runs; r++) {
            var fresh = stream("fresh " + label, r);
            double[] u = new double[1];
            var walk = new Walking((z, _, level) -> {
                fresh.fill(u, 0, 1);
                double below = u[0] * p * Math.exp(-level);
                z[0] = Normal.upperQuantile(below);
                return Math.log(p) - Math.log(below);
            });
            var outcome = new Splitting(particles, 1)
                    .run(score, walk, 1, stream(label, r), () -> false)
                    .orElseThrow();
            assertTrue(outcome.arrived());
            assertEquals(0, outcome.tied());
            steps[r] = outcome.steps();
            estimates[r] = Math.exp(outcome.logShare());
        }
        double expected = ReferenceValues.expected("rare-splitting-ideal", "expected_iterations(" + label + ")");
        assertEquals(expected, mean(steps), 4 * Math.sqrt(expected / runs));
        assertEquals(expected, variance(steps), 4 * expected * Math.sqrt((2 + 1 / expected) / runs));

        double ofEstimates = ReferenceValues.expected("rare-splitting-ideal", "variance(" + label + ")");
        assertEquals(p, mean(estimates), 4 * Math.sqrt(ofEstimates / runs));
        assertEquals(
                ofEstimates,
                variance(estimates),
                4 * Math.sqrt((fourthMoment(particles, p) - ofEstimates * ofEstimates) / runs));
    }

    /// Of `(1 - 1/particles)^J` about p, J Poisson.
    private static double fourthMoment(int particles, double p) {
        double mean = -particles * Math.log(p);
        var law = PoissonDistribution.of(mean);
        double sum = 0;
        for (int j = (int) (mean / 2); j < 2 * mean; j++) {
            double off = Math.pow(1 - 1.0 / particles, j) - p;
            sum += law.probability(j) * off * off * off * off;
        }
        return sum;
    }

    /// The same probability in every dimension.
    @ParameterizedTest(name = "{0} dimensions, beta {1}")
    @CsvSource({"2, 2, 20", "2, 4, 20", "2, 6, 20", "10, 3, 20", "10, 5, 20", "100, 4, 20", "100, 6, 10", "1000, 4, 10"
    })
    void doesNotDriftWithDimension(int dimensions, int beta, int repetitions) {
        var event = Events.linear(dimensions, beta);
        var steps = repeat(Splitting.DEFAULT, event, repetitions);
        double x = -Math.log(event.p());
        assertEquals(x, steps.mean() / steps.particles(), 4 * Math.sqrt(x / (steps.particles() * repetitions)));
    }

    static java.util.stream.Stream<Events> events() {
        return java.util.stream.Stream.of(
                Events.fourBranch(), Events.fourBranchInWords(), Events.parabolic(), Events.parallelChain());
    }

    /// Several regions and corners; a method that finds only one of them is a factor of 2 to 4 off.
    @ParameterizedTest
    @MethodSource("events")
    void holdsWhatIsKnown(Events event) {
        var steps = repeat(Splitting.DEFAULT, event, 40);
        double x = -Math.log(event.p());
        assertEquals(x, steps.mean() / steps.particles(), 4 * Math.sqrt(x / (steps.particles() * 40)));
        var interval = steps.interval(FOUR_SIGMA);
        assertTrue(interval.low() <= event.p() && event.p() <= interval.high(), interval + " for " + event.p());
        assertTrue(steps.dispersion().chance() > 1e-3, steps.dispersion().toString());
    }

    static java.util.stream.Stream<Events> eventsToCover() {
        return java.util.stream.Stream.of(Events.fourBranch(), Events.linear(10, 5));
    }

    /// With real moves, the 95 % interval of 10 repetitions.
    @ParameterizedTest
    @MethodSource("eventsToCover")
    void intervalCovers(Events event) {
        int runs = 400;
        int covered = 0;
        for (int k = 0; k < runs; k++) {
            var interval = repeat(new Splitting(25, Splitting.DEFAULT.moves()), event, "cover " + event, 10 * k, 10)
                    .interval(.95);
            covered += interval.low() <= event.p() && event.p() <= interval.high() ? 1 : 0;
        }
        assertEquals(.95, (double) covered / runs, 4 * Math.sqrt(.95 * .05 / runs));
    }

    static java.util.stream.Stream<Events> eventsToMixIn() {
        return java.util.stream.Stream.of(Events.fourBranch(), Events.linear(10, 4), Events.parallelChain());
    }

    /// One move leaves most copies where they were.
    @ParameterizedTest
    @MethodSource("eventsToMixIn")
    void tooFewMovesAreNoticed(Events event) {
        assertTrue(repeat(new Splitting(100, 1), event, 20).dispersion().chance() < 1e-3);
        assertTrue(repeat(Splitting.DEFAULT, event, 20).dispersion().chance() > 1e-3);
    }

    /// As many moves as by default, each accepted nearly always and a hundredth as long.
    @ParameterizedTest
    @MethodSource("eventsToMixIn")
    void tooShortMovesAreNoticed(Events event) {
        var steps = steps(100, 20, r -> {
            var noise = stream("short", r);
            double[] xi = new double[event.dimensions()];
            double[][] next = new double[event.dimensions()][1];
            double[] found = new double[1];
            var walk = new Walking((z, score, level) -> {
                double at = score;
                for (int m = 0; m < Splitting.DEFAULT.moves(); m++) {
                    noise.fill(xi, 0, xi.length);
                    Normal.quantile(xi, xi, xi.length);
                    for (int j = 0; j < z.length; j++) {
                        next[j][0] = Math.sqrt(1 - 1e-4) * z[j] + .01 * xi[j];
                    }
                    event.score().at(next, 1, found);
                    if (found[0] > level) {
                        at = found[0];
                        for (int j = 0; j < z.length; j++) {
                            z[j] = next[j][0];
                        }
                    }
                }
                return at;
            });
            return new Splitting(100, 1)
                    .run(event.score(), walk, event.dimensions(), stream("short " + event, r), () -> false)
                    .orElseThrow()
                    .steps();
        });
        assertTrue(steps.dispersion().chance() < 1e-3, steps.dispersion().toString());
    }

    /// Whole numbers: several particles share each score, and the product of what is left has no bias.
    @Test
    void tiedParticlesLeaveNoBias() {
        int runs = 2_000;
        double[] estimates = new double[runs];
        for (int r = 0; r < runs; r++) {
            var outcome = run(new Splitting(50, 20), ofFirst(z -> Math.floor(4 * z) - 11.5), 1, "whole", r);
            assertTrue(outcome.arrived());
            assertTrue(outcome.tied() > 50, "tied " + outcome.tied());
            estimates[r] = Math.exp(outcome.logShare());
        }
        assertEquals(
                ReferenceValues.expected("rare-linear-limit-state", "P(beta=3)"),
                mean(estimates),
                4 * Math.sqrt(variance(estimates) / runs));
    }

    /// An event that is true or not: a repetition is 50 plain draws, given up where none of them is in the event.
    @Test
    void trueOrNotIsHitsAmongDraws() {
        int runs = 4_000;
        double p = Normal.cdf(-2);
        double[] estimates = new double[runs];
        int gaveUp = 0;
        for (int r = 0; r < runs; r++) {
            var outcome = run(new Splitting(50, 20), ofFirst(z -> z > 2 ? 1 : -1), 1, "true or not", r);
            assertTrue(outcome.arrived() || outcome.end() == End.ONE_LEVEL);
            gaveUp += outcome.arrived() ? 0 : 1;
            estimates[r] = outcome.arrived() ? Math.exp(outcome.logShare()) : 0;
        }
        assertEquals(p, mean(estimates), 4 * Math.sqrt(p * (1 - p) / 50 / runs));
        double none = Math.pow(1 - p, 50);
        assertEquals(none, (double) gaveUp / runs, 4 * Math.sqrt(none * (1 - none) / runs));
    }

    /// A part of the points has no value, independently of the event: the estimate is that of the rest.
    @Test
    void pointsWithoutAValueAreCountedAndLeftOut() {
        Score score = (z, rows, s) -> {
            for (int i = 0; i < rows; i++) {
                s[i] = z[1][i] > 1 ? Double.NaN : z[0][i] - 3;
            }
        };
        double x = -Math.log(ReferenceValues.expected("rare-linear-limit-state", "P(beta=3)"));
        long[] drawn = new long[2];
        var steps = steps(100, 40, r -> {
            var outcome = run(Splitting.DEFAULT, score, 2, "no value", r);
            drawn[0] += outcome.drawn();
            drawn[1] += outcome.drawnFailed();
            assertTrue(outcome.proposalsFailed() > 0);
            assertEquals(outcome.failed(), outcome.drawnFailed() + outcome.proposalsFailed());
            assertEquals(0, outcome.tied());
            return outcome.steps();
        });
        assertEquals(x, steps.mean() / 100, 4 * Math.sqrt(x / 4_000));
        double failing = ReferenceValues.expected("rare-linear-limit-state", "P(beta=1)");
        assertEquals(failing, (double) drawn[1] / drawn[0], 4 * Math.sqrt(failing * (1 - failing) / drawn[0]));
    }

    @Test
    void noValueAtAll() {
        var outcome = run(Splitting.DEFAULT, ofFirst(_ -> Double.NaN), 3, "none", 0);
        assertEquals(End.NO_VALUE, outcome.end());
        assertEquals(10_000, outcome.failed());
        assertEquals(10_000, outcome.evaluations());
    }

    @Test
    void aCertainEventTakesNoReplacement() {
        var outcome = run(Splitting.DEFAULT, ofFirst(_ -> 1), 3, "certain", 0);
        assertTrue(outcome.arrived());
        assertEquals(0, outcome.steps());
        assertEquals(0, outcome.logShare());
        assertEquals(outcome.particles(), outcome.evaluations());
        assertEquals(outcome.particles(), outcome.ancestors());
    }

    @Test
    void anImpossibleEventIsGivenUp() {
        assertEquals(
                End.ONE_LEVEL,
                run(Splitting.DEFAULT, ofFirst(_ -> -1), 3, "never", 0).end());
        var nearer = run(Splitting.DEFAULT, ofFirst(z -> -1 - z * z), 1, "never, but nearer", 0);
        assertFalse(nearer.arrived());
        var beyond = run(Splitting.DEFAULT, ofFirst(z -> z - 40), 1, "beyond", 0);
        assertEquals(End.TOO_RARE, beyond.end());
        assertTrue(beyond.logShare() < Math.log(1e-30));
    }

    /// Copies of the last particle are not several places at one level.
    @Test
    void copiesThatNeverMoveAreGivenUp() {
        var still = new Walking((_, score, _) -> score);
        var outcome = new Splitting(20, 1)
                .run(ofFirst(z -> z - 6), still, 1, stream("still", 0), () -> false)
                .orElseThrow();
        assertEquals(End.STUCK, outcome.end());
        assertEquals(0, outcome.tied());
        assertEquals(1, outcome.ancestors());
        assertTrue(outcome.unmoved() >= 19);
    }

    @Test
    void isAPureFunctionOfItsStream() {
        var event = Events.parallelChain();
        var first = run(Splitting.DEFAULT, event.score(), 5, "pure", 3);
        assertEquals(first, run(Splitting.DEFAULT, event.score(), 5, "pure", 3));
        assertFalse(first.equals(run(Splitting.DEFAULT, event.score(), 5, "pure", 4)));
    }

    @Test
    void stopsWhereCancelled() {
        var looks = new AtomicInteger();
        var event = Events.linear(2, 6);
        assertTrue(Splitting.DEFAULT
                .run(event.score(), 2, stream("cancelled", 0), () -> looks.incrementAndGet() > 5)
                .isEmpty());
        assertEquals(6, looks.get());
    }

    /// More particles than a block has rows are evaluated in several calls.
    @Test
    void anyNumberOfParticles() {
        var event = Events.linear(2, 2);
        double x = -Math.log(event.p());
        var outcome = run(new Splitting(3_000, 10), event.score(), 2, "many", 0);
        assertEquals(x, outcome.steps() / 3_000, 4 * Math.sqrt(x / 3_000));
        assertTrue(run(new Splitting(2, 10), event.score(), 2, "two", 0).arrived());
    }

    @Test
    void refusesTooFew() {
        assertThrows(IllegalArgumentException.class, () -> new Splitting(1, 10));
        assertThrows(IllegalArgumentException.class, () -> new Splitting(10, 0));
    }
}
