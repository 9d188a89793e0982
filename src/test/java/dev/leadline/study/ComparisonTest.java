package dev.leadline.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.engine.Questions;
import dev.leadline.engine.Timing;
import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Logarithm;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.scheme.Antithetic;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.LatinHypercube;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.ScrambledSobol;
import dev.leadline.scheme.Scrambling;
import dev.leadline.study.Comparison.Outcome;
import dev.leadline.trace.Answers;
import dev.leadline.trace.Mark;
import dev.leadline.trace.Trace;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.random.RandomGeneratorFactory;
import org.junit.jupiter.api.Test;

class ComparisonTest {
    private static Lane lane(String name, Points points) {
        return Lane.of(name, Scheme.of(points));
    }

    private static StudyState run(Question question, long draws, Lane... lanes) throws InterruptedException {
        var plan = new Plan(new Stop(draws, OptionalDouble.empty()), 7, List.of(lanes));
        try (var study = Study.start(question, plan, 2, _ -> {})) {
            return study.await();
        }
    }

    private static Comparison compared(Question question, long draws, Points points) throws InterruptedException {
        return run(question, draws, lane("A", new Independent()), lane("B", points))
                .comparisons()
                .getFirst();
    }

    /// exp(U): variances .2420356 of a draw, .0039125 of the mean of a pair, so 30.93 per draw (closed forms).
    @Test
    void antitheticPointsGainWhereAnOutcomeRises() throws InterruptedException {
        var question = new Questions().uniform("u", 0, 1).mean("exp(u)").build();
        var comparison = compared(question, 100_000, new Antithetic());
        assertEquals(Outcome.B_BETTER, comparison.outcome());
        var ratio = comparison.varianceRatio().orElseThrow();
        assertTrue(ratio.low() < 30.93 && 30.93 < ratio.high(), ratio::toString);
        assertTrue(ratio.width() < 1.06, ratio::toString);
        assertTrue(
                comparison.sentence().matches("B needs 3\\d\\.?\\d* \\(.* to .*\\) times fewer draws than A\\."),
                comparison::sentence);
        assertEquals(Optional.empty(), comparison.timeRatio());
        assertEquals(Optional.empty(), comparison.efficiencyRatio());
    }

    /// A pair of an even outcome is one draw counted twice.
    @Test
    void antitheticPointsLoseWhereAnOutcomeIsEven() throws InterruptedException {
        var question = new Questions().normal("z").mean("z^2").build();
        var comparison = compared(question, 100_000, new Antithetic());
        assertEquals(Outcome.A_BETTER, comparison.outcome());
        assertTrue(comparison.sentence().startsWith("Antithetic points lose here: B needs "), comparison::sentence);
        var ratio = comparison.varianceRatio().orElseThrow().inverse();
        assertTrue(ratio.low() < 2 && 2 < ratio.high(), ratio::toString);
    }

    @Test
    void eachOtherLaneIsComparedWithTheFirst() throws InterruptedException {
        var question = new Questions().uniform("u", 0, 1).mean("exp(u)").build();
        var state = run(
                question,
                20_000,
                lane("A", new Independent()),
                lane("B", new Antithetic()),
                lane("C", new LatinHypercube(OptionalInt.empty(), 30)));
        assertEquals(
                List.of("B", "C"),
                state.comparisons().stream().map(Comparison::b).toList());
        assertTrue(state.comparisons().getLast().varianceRatio().orElseThrow().low() > 1000);
    }

    @Test
    void whatWasNotSeenIsNotCompared() throws InterruptedException {
        var question =
                new Questions().uniform("u", 0, 1).probability("u > 1 - 1e-9").build();
        var comparison = compared(question, 1_000, new Antithetic());
        assertEquals(Outcome.CANNOT_TELL, comparison.outcome());
        assertEquals("Cannot tell yet: A has not seen the event.", comparison.sentence());
        assertEquals(Optional.empty(), comparison.varianceRatio());
    }

    /// Observations of a linear outcome are equal but for rounding: there is no error to compare.
    @Test
    void roundingIsNoSpread() throws InterruptedException {
        var question = new Questions().uniform("u", 0, 1).mean("3*u + 0.1").build();
        var comparison = compared(question, 10_000, new Antithetic());
        assertEquals(Outcome.CANNOT_TELL, comparison.outcome());
        assertTrue(comparison.sentence().contains("every observation of B is equal"), comparison::sentence);
    }

    /// Two hits say hardly anything about a variance.
    @Test
    void fewHitsCannotTellAndSayHowManyDrawsWould() throws InterruptedException {
        var question =
                new Questions().uniform("u", 0, 1).probability("u > 0.996").build();
        var comparison = compared(question, 1_000, new Antithetic());
        assertEquals(Outcome.CANNOT_TELL, comparison.outcome());
        assertTrue(comparison.sentence().contains("more draws of each would"), comparison::sentence);
    }

    /// The draws of `(z s / h)²`: exp(U) has s = .4919662, so 929,765 for ± .001 (scipy's normal quantile).
    @Test
    void drawsToTheTolerance() throws InterruptedException {
        var question = new Questions()
                .uniform("u", 0, 1)
                .mean("exp(u)")
                .absoluteTolerance(.001)
                .build();
        var needs = compared(question, 100_000, new Antithetic()).needs();
        assertEquals(List.of("A", "B"), needs.stream().map(Need::lane).toList());
        var a = needs.getFirst().draws();
        assertTrue(a.low() < 929_765 && 929_765 < a.high(), a::toString);
        assertTrue(a.width() < 1.04, a::toString);
        var b = needs.getLast().draws();
        assertTrue(b.low() < 30_059 && 30_059 < b.high(), b::toString);
        assertEquals(Optional.empty(), needs.getFirst().seconds());
    }

    private static final Question OF_ROUNDS = new Questions()
            .uniform("u", 0, 1)
            .mean("exp(u)")
            .absoluteTolerance(1e-6)
            .build();

    /// Replicates whose standard error is `n^-1.5` exactly, at 2^4 to 2^rounds points of each.
    private static Trace rounds(Lane lane, int replicates, int rounds) {
        var random = RandomGeneratorFactory.of("L64X128MixRandom").create(3);
        double[] deviations = random.doubles(replicates, -1, 1).toArray();
        var shape = new Accumulator(1);
        shape.add(new double[][] {deviations}, 0, replicates);
        List<Mark> marks = new ArrayList<>();
        List<Accumulator> blocks = List.of();
        for (int m = 4; m <= rounds; m++) {
            double size = StrictMath.pow(replicates * Math.scalb(1, m), -1.5) / shape.standardError(0);
            blocks = new ArrayList<>();
            var total = new Accumulator(1);
            for (double deviation : deviations) {
                var mean = new Accumulator(1);
                mean.add(new double[][] {{1 + size * (deviation - shape.mean(0))}}, 0, 1);
                blocks.add(mean);
                total.merge(mean);
            }
            marks.add(new Mark((long) replicates << m, 0, Answers.of(OF_ROUNDS, lane.scheme(), total)));
        }
        return new Trace(lane.name(), lane.scheme(), marks, blocks, List.of(), Optional.empty());
    }

    @Test
    void replicatedPointsAreQuotedAtTheirDraws() throws InterruptedException {
        var a = lane("A", new Independent());
        var b = lane("B", new ScrambledSobol(16, Scrambling.NESTED));
        var plain = run(OF_ROUNDS, 20_000, a).lanes().getFirst().trace();
        var comparison =
                Comparison.of(OF_ROUNDS, a, plain, b, rounds(b, 16, 10)).orElseThrow();
        assertEquals(Outcome.B_BETTER, comparison.outcome());
        assertTrue(
                comparison.sentence().endsWith(" times fewer draws than A at 16,384 draws of B."),
                comparison::sentence);
        // .2420356 over 16,384^(1 - 3)
        var ratio = comparison.varianceRatio().orElseThrow();
        assertEquals(.2420356 * 16_384.0 * 16_384, ratio.value(), .04 * ratio.value());
        assertTrue(comparison.notes().getFirst().contains("A comparison wants 30 replicates"));
        var more = Comparison.of(
                OF_ROUNDS, a, plain, lane("B", new ScrambledSobol(32, Scrambling.NESTED)), rounds(b, 32, 10));
        assertFalse(more.orElseThrow().notes().getFirst().contains("wants"));
    }

    /// t(15) = 2.1314495 (printed tables: 2.131) standard errors of `n^-1.5` are 1e-6 at n = 16,563, so the round of
    /// 32,768 draws meets it.
    @Test
    void roundsToTheToleranceFollowTheFittedDecay() throws InterruptedException {
        var a = lane("A", new Independent());
        var b = lane("B", new ScrambledSobol(16, Scrambling.NESTED));
        var plain = run(OF_ROUNDS, 20_000, a).lanes().getFirst().trace();
        var need = Comparison.of(OF_ROUNDS, a, plain, b, rounds(b, 16, 8))
                .orElseThrow()
                .needs()
                .getLast();
        assertEquals(32_768, need.draws().value());
        assertTrue(need.draws().low() <= 16_563 && need.draws().high() >= 16_563);
        assertEquals("error falls with the power 1.50 of the draws, as fitted to the latest 5 rounds", need.basis());
    }

    @Test
    void timeAndVarianceMakeEfficiency() throws InterruptedException {
        var question = new Questions().uniform("u", 0, 1).mean("exp(u)").build();
        var a = lane("A", new Independent());
        var b = lane("B", new Antithetic());
        var lanes = run(question, 100_000, a, b).lanes();
        var second = new Logarithm(Math.log(2e-8), 1e-4, 15);
        var ratio = new Logarithm(Math.log(.5), 1e-6, 15);
        var timing = new Timing(second.moved(Math.log(.5)), second, ratio);
        var comparison = Comparison.timed(
                        question,
                        a,
                        lanes.getFirst().trace(),
                        b,
                        lanes.getLast().trace(),
                        timing)
                .orElseThrow();
        assertEquals(.5, comparison.timeRatio().orElseThrow().value(), 1e-12);
        assertEquals(
                comparison.varianceRatio().orElseThrow().value() / 2,
                comparison.efficiencyRatio().orElseThrow().value(),
                1e-9);
        assertTrue(comparison.sentence().contains("A draw of B takes 2.0"), comparison::sentence);
        assertTrue(comparison.sentence().contains("for the same error B needs 15"), comparison::sentence);
    }

    /// A pair of lanes of the same work, loosely: the machine may be busy.
    @Test
    void drawsAreTimed() {
        var question = new Questions().uniform("u", 0, 1).mean("exp(u)").build();
        var plan = new Plan(
                new Stop(100_000, OptionalDouble.empty()),
                7,
                List.of(lane("A", new Independent()), lane("B", new Independent())));
        var timing = Comparing.of(question, plan, Comparing.Equal.DRAWS).timing();
        assertEquals(0, timing.ratio().value(), Math.log(2));
        assertEquals(15, timing.ratio().degrees());
        assertTrue(timing.first().value() < Math.log(1e-5) && timing.first().value() > Math.log(1e-10));
    }
}
