package dev.leadline.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.engine.LaneRun;
import dev.leadline.engine.Questions;
import dev.leadline.engine.Recipe;
import dev.leadline.engine.Workers;
import dev.leadline.estimate.Estimand;
import dev.leadline.interval.Ratio;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.model.StopRule;
import dev.leadline.model.Tolerance;
import dev.leadline.problem.Refusal;
import dev.leadline.scheme.Antithetic;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.ScrambledSobol;
import dev.leadline.scheme.Scrambling;
import dev.leadline.stream.Purpose;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.concurrent.ExecutionException;
import java.util.function.Function;
import org.junit.jupiter.api.Test;

class PlanningTest {
    /// Of a standard normal variable between -z and z: .95 (Abramowitz and Stegun 1964, table 26.6).
    private static final double Z = 1.959963984540054;

    /// Of exp(u), u uniform: `(e² - 1)/2 - (e - 1)²`.
    private static final double VARIANCE = (Math.E * Math.E - 1) / 2 - (Math.E - 1) * (Math.E - 1);

    private static final int SEEDS = 200;

    /// Successes of so many that a chance of .95 reaches with probability .9995 (binomial distribution, SciPy
    /// 1.11).
    private static final int ENOUGH = 179;

    private static Question growth(Tolerance tolerance) {
        return new Questions().uniform("u", 0, 1).mean("exp(u)").build().to(tolerance);
    }

    private static Tolerance absolute(double width) {
        return new Tolerance(OptionalDouble.of(width), OptionalDouble.empty(), false);
    }

    private static Tolerance relative(double part) {
        return new Tolerance(OptionalDouble.empty(), OptionalDouble.of(part), false);
    }

    private static LanePlan planned(Question question, Points points, long draws, long seed) {
        var lane = Lane.of("A", Scheme.of(points)).within(draws);
        return LanePlan.of(question, lane, run(question, points, draws, seed), Optional.empty(), new StopRule.Fixed());
    }

    private static Trace run(Question question, Points points, long draws, long seed) {
        var lane = Lane.of("A", Scheme.of(points)).within(draws);
        var recipe = Recipe.of(question, lane, seed, Purpose.PILOT);
        try (var workers = new Workers(1)) {
            var run = new LaneRun(recipe, new Stop(draws, OptionalDouble.empty()), workers);
            while (!run.finished()) {
                run.advance(0);
            }
            return run.trace();
        } catch (InterruptedException | ExecutionException e) {
            throw new IllegalStateException(e);
        }
    }

    private static LanePlan planned(Question question, long draws, long seed) {
        return planned(question, Questions.lane("A").scheme().points(), draws, seed);
    }

    /// How many of 200 pilots have limits between which the number lies.
    private static int holding(double number, Function<Integer, Ratio> pilot) {
        int held = 0;
        for (int seed = 0; seed < SEEDS; seed++) {
            Ratio draws = pilot.apply(seed);
            held += draws.low() <= number && number <= draws.high() ? 1 : 0;
        }
        return held;
    }

    /// `(z s / h)²` for an absolute tolerance; for a relative one h is `r m / (1 + r)`.
    @Test
    void limitsHoldTheExactNumberOfDraws() {
        var exactly = growth(absolute(.01));
        double draws = Z * Z * VARIANCE / 1e-4;
        int held = holding(
                draws,
                seed -> planned(exactly, 1000, seed).fixed().orElseThrow().draws());
        assertTrue(held >= ENOUGH, () -> held + " of " + SEEDS);
        double width = .01 * (Math.E - 1) / 1.01;
        var inParts = growth(relative(.01));
        int likewise = holding(
                Z * Z * VARIANCE / (width * width),
                seed -> planned(inParts, 1000, seed).fixed().orElseThrow().draws());
        assertTrue(likewise >= ENOUGH, () -> likewise + " of " + SEEDS);
    }

    /// At 1e6 draws the band that is tightest at 1e4 is 1.820 times as wide as the interval (Waudby-Smith and
    /// others 2024, in its authors' code): a tolerance of that width takes 1e6 draws.
    @Test
    void theBandTakesMoreDraws() {
        double width = 1.820 * Z * Math.sqrt(VARIANCE / 1e6);
        var question = growth(absolute(width));
        var plan = planned(question, 262_144, 1);
        double of = Math.sqrt(VARIANCE); // the pilot's own error is taken out
        double fixed = plan.fixed().orElseThrow().draws().value();
        double seen = Math.sqrt(fixed) * width / Z / of;
        assertEquals(1, seen, .01);
        double anyTime = plan.anyTime().orElseThrow().draws().value();
        assertEquals(1e6, anyTime, 1e6 * (2.2 * Math.abs(seen - 1) + .002));
        assertEquals(1.820 * 1.820, anyTime / fixed, .01);
        int held = holding(
                1e6,
                seed -> planned(question, 1000, seed).anyTime().orElseThrow().draws());
        assertTrue(held >= ENOUGH, () -> held + " of " + SEEDS);
    }

    /// The mean of a pair, (exp(u) + exp(1 - u)) / 2, has the variance (e² - 1)/4 + e/2 - (e - 1)².
    @Test
    void observationsOfSeveralDraws() {
        double ofPair = (Math.E * Math.E - 1) / 4 + Math.E / 2 - (Math.E - 1) * (Math.E - 1);
        assertEquals(.0039125, ofPair, 5e-8);
        var question = growth(absolute(.0005));
        var plan = planned(question, new Antithetic(), 65_536, 1);
        double exact = 2 * Z * Z * ofPair / 25e-8;
        assertEquals(exact, plan.fixed().orElseThrow().draws().value(), .05 * exact);
        assertTrue(plan.anyTime().orElseThrow().draws().low() > exact);
    }

    /// 385 hits for 10 % with 95 %, hence 38,500 draws of a chance of .01.
    @Test
    void rareEventsNeedHits() {
        var question = new Questions()
                .uniform("u", 0, 1)
                .probability("u < .01")
                .build()
                .to(relative(.1));
        var plan = planned(question, 4096, 1);
        assertEquals(OptionalLong.of(385), plan.hits());
        int held = holding(
                38_500,
                seed -> planned(question, 4096, seed).anyTime().orElseThrow().draws());
        assertTrue(held >= ENOUGH, () -> held + " of " + SEEDS);
        assertEquals(
                OptionalLong.empty(),
                planned(question, new Antithetic(), 4096, 1).hits());
        var longer = holding(
                38_500,
                seed -> planned(question, 65_536, seed).anyTime().orElseThrow().draws());
        assertTrue(longer >= ENOUGH, "a pilot with hits enough for the rule: " + longer + " of " + SEEDS);
    }

    /// Of u between 10 and 11 the mean beyond the .9-quantile is 10.95, from the mean of the excess over
    /// 10.9, .005, and that of its square, .001/3; the mean of the distribution is 10.5, with the variance
    /// 1/12 (by hand). The level near the quantile comes from 4,096 draws: of the share beyond it, .1, a
    /// standard error is 5 %, and of the variance, which goes with its cube, nearly 15.
    @Test
    void partsAreOfTheWholeValue() {
        double ofTail = (.001 / 3 - .005 * .005) / .01;
        partsOf(new Estimand.TailMean(.9), ofTail, 10.95);
        partsOf(new Estimand.Distribution(.95), 1.0 / 12, 10.5);
    }

    private static void partsOf(Estimand estimand, double variance, double value) {
        var question =
                new Questions().uniform("u", 10, 11).ask(estimand, "u").build().to(relative(.001));
        double width = .001 * value / 1.001;
        double exact = Z * Z * variance / (width * width);
        double needed =
                planned(question, 65_536, 1).fixed().orElseThrow().draws().value();
        assertEquals(exact, needed, .4 * exact, estimand.toString());
    }

    /// The median of u: n draws have it to `z / (2 √n)`. Limits of the .95-quantile need 72 draws, since
    /// `.95^71 = .026` and `.95^72 = .0249` (by hand).
    @Test
    void quantiles() {
        var median = new Questions()
                .uniform("u", 0, 1)
                .ask(new Estimand.Quantile(.5), "u")
                .build()
                .to(absolute(.01));
        int held = holding(
                Z * Z / 4 / 1e-4,
                seed -> planned(median, 4096, seed).fixed().orElseThrow().draws());
        assertTrue(held >= ENOUGH, () -> held + " of " + SEEDS);
        var upper = new Questions()
                .uniform("u", 0, 1)
                .ask(new Estimand.Quantile(.95), "u")
                .build()
                .to(absolute(.01));
        var few = planned(upper, 64, 1);
        assertEquals(OptionalLong.of(72), few.limits());
        assertTrue(few.fixed().isEmpty() && few.lack().isPresent(), "no upper limit yet");
    }

    /// Of two stages with 10,000 draws first, inflated by 1.2: 122,217 more for a standard deviation of 100 tolerances
    /// at 95 % (Hickernell and others 2013).
    @Test
    void theRuleInForceIsPlanned() {
        double sd = Math.sqrt(VARIANCE);
        var question = growth(absolute(sd / 100));
        var pilot = run(question, Questions.lane("A").scheme().points(), 65_536, 1);
        var staged = plan(question, pilot, new StopRule.TwoStage(10_000, 1.2));
        assertEquals("two-stage", staged.rule());
        assertEquals(132_217, staged.inForce().orElseThrow().draws().value(), .02 * 132_217);
        var watched = plan(question, pilot, new StopRule.AnyTime(OptionalLong.empty(), OptionalLong.empty()));
        assertEquals(watched.anyTime(), watched.inForce());
        assertEquals(
                Optional.empty(), plan(question, pilot, new StopRule.Jcgm101(2)).inForce());
        var fixed = plan(question, pilot, new StopRule.Fixed());
        assertEquals(fixed.fixed(), fixed.inForce());
    }

    private static LanePlan plan(Question question, Trace trace, StopRule rule) {
        return LanePlan.of(question, Questions.lane("A"), trace, Optional.empty(), rule);
    }

    @Test
    void replicatedPointsGoByPowersOfTwo() {
        var plan = planned(growth(absolute(1e-7)), new ScrambledSobol(16, Scrambling.NESTED), 16 * 1024, 1);
        Ratio draws = plan.fixed().orElseThrow().draws();
        for (double count : new double[] {draws.low(), draws.value(), draws.high()}) {
            assertEquals(1, Long.bitCount((long) count / 16), () -> "16 times a power of two: " + draws);
        }
        // Nested scrambling of one input has the variance of strata, the mean of f'² over 12 n³: for f = exp(u) and 16
        // replicates a tolerance of 1e-7 takes n = 19,600.
        assertEquals(16 * 32_768, draws.value());
        assertTrue(plan.anyTime().isEmpty(), "no band that may be looked at draw by draw");
    }

    @Test
    void whatIsSeldomSeenCannotBeTold() {
        var rare = new Questions()
                .uniform("u", 0, 1)
                .probability("u < 1e-9")
                .build()
                .to(relative(.1));
        var none = planned(rare, 1000, 1);
        assertEquals(
                Optional.of("no hit in 1,000 draws; a longer pilot would tell, or a lane that draws it more often"),
                none.lack());
        assertTrue(none.fixed().isEmpty() && none.anyTime().isEmpty());
        var seldom = new Questions()
                .uniform("u", 0, 1)
                .probability("u < .002")
                .build()
                .to(absolute(1e-4));
        var plan = planned(seldom, 500, 4);
        assertTrue(plan.fixed().isEmpty(), plan::toString);
        assertFalse(plan.lack().orElseThrow().isBlank());
    }

    /// The pilot's draws are not those of the run, nor is a pilot needed where a run has been made.
    @Test
    void pilotsEnterNoResult() throws InterruptedException {
        var question = growth(absolute(.01));
        var plan = new Plan(new Stop(4096, OptionalDouble.empty()), 1, List.of(Questions.lane("A")));
        var planning = Planning.of(question, plan, 4096, 2, _ -> {});
        assertEquals(planned(question, 4096, 1).fixed().orElseThrow().draws(), ofFirst(planning));
        try (var study = Study.start(question, plan, 2, _ -> {})) {
            var trace = study.await().lanes().getFirst().trace();
            var run = LanePlan.of(question, plan.settled().getFirst(), trace, Optional.empty(), new StopRule.Fixed());
            assertTrue(!run.fixed().orElseThrow().draws().equals(ofFirst(planning)), "other draws");
            assertEquals(
                    1,
                    run.fixed().orElseThrow().draws().value()
                            / ofFirst(planning).value(),
                    .2);
        }
        var passed = planning.lanes().getFirst().fixed().orElseThrow().seconds().orElseThrow();
        assertTrue(passed.low() > 0 && passed.low() <= passed.value() && passed.value() <= passed.high());
    }

    private static Ratio ofFirst(Planning planning) {
        return planning.lanes().getFirst().fixed().orElseThrow().draws();
    }

    @Test
    void withoutAToleranceThereIsNothingToPlan() {
        var question = new Questions().uniform("u", 0, 1).mean("exp(u)").build();
        var plan = new Plan(new Stop(1000, OptionalDouble.empty()), 1, List.of(Questions.lane("A")));
        var refusal = assertThrows(Refusal.class, () -> Planning.of(question, plan, 1000, 1, _ -> {}));
        assertEquals(
                "there is no tolerance to plan for",
                refusal.problems().getFirst().primary());
    }
}
