package dev.leadline.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Catalogue;
import dev.leadline.engine.Questions;
import dev.leadline.estimate.Estimand;
import dev.leadline.interval.AnyTimeMean;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.model.StopRule;
import dev.leadline.model.Tolerance;
import dev.leadline.problem.Refusal;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.ScrambledSobol;
import dev.leadline.scheme.Scrambling;
import dev.leadline.study.RehearsalState.Activity;
import dev.leadline.trace.Rehearsal;
import dev.leadline.trace.Rehearsed;
import dev.leadline.trace.Repetition;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.atomic.AtomicReference;
import org.junit.jupiter.api.Test;

class RehearsingTest {
    private static final long SEED = 20261201;

    private static Question lognormal() {
        return new Questions()
                .input("x", Catalogue.family("lognormal").orElseThrow().of(Map.of("mu", 0.0, "sigma", 1.0)))
                .mean("x")
                .reference(StrictMath.exp(.5))
                .build();
    }

    private static Question growth() {
        return new Questions().uniform("u", 0, 1).mean("exp(u)").build();
    }

    private static RehearsalPlan plan(Lane lane, int repetitions, Long... draws) {
        return RehearsalPlan.of(
                new Plan(new Stop(1000, OptionalDouble.empty()), SEED, List.of(lane)), List.of(draws), repetitions);
    }

    private static List<Rehearsal> rehearsed(Question question, RehearsalPlan plan, int threads)
            throws InterruptedException {
        try (var rehearsing = Rehearsing.start(question, plan, threads, _ -> {})) {
            var state = rehearsing.await();
            assertEquals(Activity.FINISHED, state.activity());
            return state.rehearsals();
        }
    }

    private static Rehearsed first(Question question, Lane lane, int repetitions, long draws)
            throws InterruptedException {
        return rehearsed(question, plan(lane, repetitions, draws), 2)
                .getFirst()
                .answers()
                .getFirst();
    }

    private static Lane lane(Points points) {
        return Lane.of("A", Scheme.of(points));
    }

    /// Coverage of Student's interval from lognormal (σ = 1) draws, seen in an independent experiment with a
    /// standard error of at most .0016: .917 of 100 and .943 of 1,000. Too low an interval is what most
    /// misses are.
    @Test
    void theRateIsThatOfAnIndependentExperiment() throws InterruptedException {
        int repetitions = 3000;
        var all = rehearsed(lognormal(), plan(Questions.lane("A"), repetitions, 100L, 1000L), 2);
        double[] rates = {.917, .943};
        for (int i = 0; i < rates.length; i++) {
            var answer = all.get(i).answers().getFirst();
            assertEquals(repetitions, answer.bounded());
            double gate = 4 * Math.hypot(Rehearsed.mcse(rates[i], repetitions), .0016);
            assertEquals(rates[i], answer.rate(), gate);
            assertTrue(answer.missedLow() > 2 * answer.missedHigh(), answer::toString);
            assertEquals(0, answer.bias(), 4 * answer.biasMcse());
            // of the mean of n: sqrt((e - 1) e / n)
            double error = Math.sqrt((Math.E - 1) * Math.E / all.get(i).draws());
            // means of n have a kurtosis of 3 + 110.94 / n, and not 3
            double times = Math.sqrt(1 + 110.94 / all.get(i).draws() / 2);
            assertEquals(error, answer.empiricalError(), 4 * times * answer.empiricalMcse());
        }
        assertEquals(
                Rehearsed.Verdict.FALLS_SHORT,
                all.getFirst().answers().getFirst().verdict());
    }

    /// Of 1,000 draws with a chance of 1e-4 the limits of Clopper and Pearson hold it with at most one hit,
    /// which the binomial distribution gives .9953; with more they lie above it.
    @Test
    void exactIntervalsHoldMoreOftenThanStated() throws InterruptedException {
        var rare = new Questions()
                .uniform("u", 0, 1)
                .probability("u < 1e-4")
                .reference(1e-4)
                .build();
        int repetitions = 2000;
        var answer = first(rare, Questions.lane("A"), repetitions, 1000);
        assertEquals(.9953, answer.rate(), 4 * Rehearsed.mcse(.9953, repetitions));
        assertEquals(0, answer.missedLow());
        assertEquals(Rehearsed.Verdict.MORE_THAN_STATED, answer.verdict());
        assertTrue(Double.isNaN(answer.reportedError()), "most have no hit and state no error");
    }

    @Test
    void sameBitsOnAnyNumberOfThreads() throws InterruptedException {
        var plan = plan(Questions.lane("A"), 60, 100L, 700L);
        assertEquals(rehearsed(growth(), plan, 1), rehearsed(growth(), plan, 3));
    }

    /// Repetition r of 100 draws is what it is, whatever else is rehearsed.
    @Test
    void aRepetitionDependsOnItsNumberAlone() throws InterruptedException {
        var few = rehearsed(lognormal(), plan(Questions.lane("A"), 20, 100L), 2).getFirst();
        var many = rehearsed(lognormal(), plan(Questions.lane("A"), 50, 700L, 100L), 2)
                .getLast();
        assertEquals(repetitions(few), repetitions(many).subList(0, 20));
        assertEquals(
                50,
                repetitions(many).stream().map(Repetition::estimate).distinct().count());
    }

    private static List<Repetition> repetitions(Rehearsal rehearsal) {
        return rehearsal.answers().getFirst().repetitions();
    }

    /// Replicates of one repetition are none of another's: estimates stray as they say.
    @Test
    void replicatedPointsAreFreshInEachRepetition() throws InterruptedException {
        var answer = first(growth(), lane(new ScrambledSobol(10, Scrambling.NESTED)), 200, 320);
        assertEquals(
                200,
                answer.repetitions().stream()
                        .map(Repetition::estimate)
                        .distinct()
                        .count());
        assertEquals(1, answer.empiricalError() / answer.reportedError(), .2);
        assertEquals(.95, answer.rate(), 4 * Rehearsed.mcse(.95, 200));
    }

    /// The value comes from a run as long as all repetitions together: the mean of exp(u) is e - 1.
    @Test
    void withoutAReferenceALongerRunMakesTheValue() throws InterruptedException {
        var answer = first(growth(), Questions.lane("A"), 200, 500);
        var sought = answer.sought();
        assertEquals(200 * 500, sought.draws());
        assertEquals(Math.E - 1, sought.value(), 4 * sought.error());
        // the standard deviation of exp(u) is .492
        assertEquals(.492 / Math.sqrt(200 * 500), sought.error(), .05 * sought.error());
        assertEquals(.95, answer.rate(), 4 * Rehearsed.mcse(.95, 200));
        assertEquals(
                100 * 500,
                first(growth(), Questions.lane("A"), 10, 500).sought().draws(),
                "100 times at least");
    }

    /// Of several answers the reference is that of the first.
    @Test
    void eachAnswerIsJudged() throws InterruptedException {
        var question = new Questions()
                .uniform("u", 0, 1)
                .mean("exp(u)")
                .ask(new Estimand.Quantile(.5), "exp(u)")
                .ask(new Estimand.StandardDeviation(), "exp(u)")
                .reference(Math.E - 1)
                .build();
        var rehearsal =
                rehearsed(question, plan(Questions.lane("A"), 300, 400L), 2).getFirst();
        assertEquals(0, rehearsal.answers().getFirst().sought().draws());
        double[] exact = {Math.E - 1, StrictMath.exp(.5), Math.sqrt((4 * Math.E - Math.E * Math.E - 3) / 2)};
        for (int k = 0; k < exact.length; k++) {
            var answer = rehearsal.answers().get(k);
            assertEquals(exact[k], answer.sought().value(), 4 * answer.sought().error() + 1e-15);
            double level = 1 - .05 / 3;
            assertEquals(level, answer.level(), 1e-15);
            assertEquals(level, answer.rate(), 4 * Rehearsed.mcse(level, 300) + .005, "intervals that may be wider");
        }
        int together = rehearsal.heldTogether().orElseThrow();
        assertTrue(together >= 300 * (.95 - 4 * Rehearsed.mcse(.95, 300)), () -> "held together " + together);
    }

    /// Stopped at the tenth hit, the exact interval of its draw holds a chance of .01 in .950 of the runs and the
    /// estimate is without bias, by an independent experiment through items of work.
    @Test
    void theRuleOfTheProjectEndsEachRepetition() throws InterruptedException {
        var rare = new Questions()
                .uniform("u", 0, 1)
                .probability("u < .01")
                .reference(.01)
                .build();
        int repetitions = 2000;
        var stop = new Stop(new StopRule.Hits(10), 1_000_000, OptionalDouble.of(60));
        var plan = RehearsalPlan.of(new Plan(stop, SEED, List.of(Questions.lane("A"))), List.of(), repetitions);
        assertTrue(plan.note().isPresent(), "no time limit");
        var rehearsal = rehearsed(rare, plan, 2).getFirst();
        var answer = rehearsal.answers().getFirst();
        assertEquals(.95, answer.rate(), 4 * Rehearsed.mcse(.95, repetitions));
        assertEquals(0, answer.bias(), 4 * answer.biasMcse());
        // the wait for ten hits is 1,000 draws on average, with a standard deviation of 315
        assertEquals(1000, rehearsal.meanDraws(), 4 * 315 / Math.sqrt(repetitions));
    }

    /// The any-time band is what such a run is signed by: it holds at least as often as it says.
    @Test
    void aRunThatIsWatchedIsJudgedByItsBand() throws InterruptedException {
        var question = growth().to(new Tolerance(OptionalDouble.of(.03), OptionalDouble.empty(), false));
        int repetitions = 300;
        var stop = new Stop(
                new StopRule.AnyTime(OptionalLong.empty(), OptionalLong.empty()), 1_000_000, OptionalDouble.empty());
        var plan = RehearsalPlan.of(new Plan(stop, SEED, List.of(Questions.lane("A"))), List.of(), repetitions);
        var rehearsal = rehearsed(question, plan, 2).getFirst();
        var answer = rehearsal.answers().getFirst();
        assertEquals(AnyTimeMean.KIND, answer.kind());
        assertEquals(repetitions, rehearsal.met());
        assertTrue(answer.rate() >= .95 - 4 * Rehearsed.mcse(.95, repetitions), answer::toString);
        assertTrue(rehearsal.meanDraws() > 1000 && rehearsal.meanDraws() < 10_000, () -> "" + rehearsal.meanDraws());
        assertTrue(answer.meanHalfWidth() <= .03);
    }

    @Test
    void cancelKeepsWhatWasMade() throws InterruptedException {
        var begun = new CountDownLatch(1);
        var seen = new AtomicReference<RehearsalState>();
        int wanted = RehearsalPlan.MOST_REPETITIONS;
        var plan = plan(Questions.lane("A"), wanted, 1000L);
        try (var rehearsing = Rehearsing.start(lognormal(), plan, 2, state -> {
            seen.set(state);
            if (!state.rehearsals().isEmpty()) {
                begun.countDown();
            }
        })) {
            begun.await();
            rehearsing.cancel();
            var state = rehearsing.await();
            assertEquals(Activity.CANCELLED, state.activity());
            assertEquals(state, seen.get());
            var made = repetitions(state.rehearsals().getFirst());
            assertTrue(!made.isEmpty() && made.size() < wanted);
            int few = Math.min(5, made.size());
            var whole = rehearsed(lognormal(), plan(Questions.lane("A"), few, 1000L), 1)
                    .getFirst();
            assertEquals(repetitions(whole), made.subList(0, few));
        }
    }

    @Test
    void refusesWhatHasNoValueToJudgeBy() {
        var never = new Questions().uniform("u", 0, 1).probability("u < 1e-12").build();
        var refusal = assertThrows(Refusal.class, () -> rehearsed(never, plan(Questions.lane("A"), 10, 100L), 1));
        assertEquals(
                "there is no value to judge by: 10,000 draws made for it have no hit",
                refusal.problems().getFirst().primary());
    }

    @Test
    void refusesWhatTheClockEnds() {
        var byClock = new Plan(new Stop(Stop.MOST_DRAWS, OptionalDouble.of(1)), SEED, List.of(Questions.lane("A")));
        var refusal = assertThrows(Refusal.class, () -> RehearsalPlan.of(byClock, List.of(), 10));
        assertEquals(
                "a rehearsal needs a number of draws",
                refusal.problems().getFirst().primary());
        var bounded = new Plan(new Stop(500, OptionalDouble.of(1)), SEED, List.of(Questions.lane("A")));
        var plan = RehearsalPlan.of(bounded, List.of(), 10);
        assertEquals(List.of(new Stop(500, OptionalDouble.empty())), plan.stops());
        assertEquals(
                "Repetitions have no time limit, which the project has.",
                plan.note().orElseThrow());
    }

    @Test
    void suggestsRepetitions() {
        assertEquals(1900, RehearsalPlan.suggested(growth()));
        assertEquals(475, RehearsalPlan.suggested(growth(), .01));
    }
}
