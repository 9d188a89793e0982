package dev.leadline.ground;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Pareto;
import dev.leadline.engine.Questions;
import dev.leadline.engine.Recipe;
import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.ground.Ground.Status;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.interval.Bounds;
import dev.leadline.interval.Interval;
import dev.leadline.interval.IntervalKind;
import dev.leadline.model.IntervalWish;
import dev.leadline.model.Question;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.ScrambledSobol;
import dev.leadline.scheme.Scrambling;
import dev.leadline.trace.Answers;
import dev.leadline.trace.Mark;
import dev.leadline.trace.Rehearsal;
import dev.leadline.trace.Rehearsed;
import dev.leadline.trace.Repetition;
import dev.leadline.trace.Sought;
import dev.leadline.trace.Trace;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Random;
import org.junit.jupiter.api.Test;

/// Each ground on a question where it must speak, and on its nearest twin where it must not.
class OtherGroundsTest {
    private static final Optional<Strength> CAUTION = Optional.of(Strength.CAUTION);
    private static final Optional<Strength> OBJECTION = Optional.of(Strength.OBJECTION);
    private static final ScrambledSobol SOBOL = new ScrambledSobol(16, Scrambling.NESTED);

    private static Question normal(String formula) {
        return new Questions().normal("z").mean(formula).build();
    }

    private static Question normal(Estimand estimand, String... formulas) {
        return new Questions().normal("z").ask(estimand, formulas).build();
    }

    private static Ground shown(String code, List<Ground> grounds) {
        var ground = Judged.only(code, grounds);
        assertEquals(Status.SHOWN, ground.status(), ground.text());
        return ground;
    }

    private static Ground cautions(String code, List<Ground> grounds) {
        var ground = Judged.only(code, grounds);
        assertEquals(CAUTION, ground.strength(), ground.text());
        return ground;
    }

    /// A lognormal density of σ = 3 has the excess kurtosis 4e15, one of σ = .5 has 5.9.
    @Test
    void varianceOfVariance() {
        cautions("variance-of-variance", Judged.grounds(normal("exp(3*z)"), 1_000, 1));
        shown("variance-of-variance", Judged.grounds(normal("exp(z/2)"), 1_000, 1));
        var event = new Questions().normal("z").probability("z > 2.5").build();
        assertTrue(Judged.maybe("variance-of-variance", Judged.grounds(event, 1_000, 1))
                .isEmpty());
    }

    /// Of normal values the relative variance of the variance is 2 / (n - 1).
    @Test
    void varianceOfVarianceOfNormalValues() {
        String text = shown("variance-of-variance", Judged.grounds(normal("z"), 1_000_000, 1))
                .text();
        assertEquals(2e-6, Double.parseDouble(text.replaceAll(".* ", "")), 1e-7, text);
    }

    /// 2,000 draws have some 12 beyond 2.5 standard deviations; half of them are above 0.
    @Test
    void effectiveSize() {
        var few = cautions("effective-size", Judged.grounds(normal("max(0, z - 2.5)"), 2_000, 1));
        assertTrue(few.text().matches("2,000 draws do the work of \\d+\\.\\d equal ones"), few.text());
        assertTrue(few.actions().getFirst() instanceof Action.MoreDraws more
                && more.inAll().orElseThrow() > 20_000);
        var twin = Judged.grounds(normal("max(0, z)"), 2_000, 1);
        assertTrue(Judged.maybe("effective-size", twin).isEmpty());
    }

    /// A large effective size is told, but not as a ground of its own.
    @Test
    void effectiveSizeAloneShowsNothing() {
        for (long draws : new long[] {1_000, 1_000_000}) {
            var grounds = Judged.grounds(normal("2 + z"), draws, 1);
            assertTrue(Judged.maybe("effective-size", grounds).isEmpty());
            assertTrue(
                    shown("largest-share", grounds).text().matches(".*all do the work of about 8[0-9,]+ equal ones"),
                    shown("largest-share", grounds).text());
        }
    }

    @Test
    void largestShareOfPlainDraws() {
        cautions("largest-share", Judged.grounds(normal("exp(5*z)"), 5_000, 1));
        shown("largest-share", Judged.grounds(normal("exp(z)"), 5_000, 1));
    }

    /// Where the mean is infinite the error hardly falls, n^(1/α - 1) for a Pareto density of shape α.
    @Test
    void errorDecay() {
        var heavy = new Questions().input("x", new Pareto(1, 1.05)).mean("x").build();
        int doubted = 0;
        for (int seed = 0; seed < 20; seed++) {
            doubted += Judged.strength("error-decay", Judged.grounds(heavy, 200_000, seed))
                            .equals(CAUTION)
                    ? 1
                    : 0;
        }
        assertTrue(doubted >= 12, doubted + " of 20");
        var text = shown("error-decay", Judged.grounds(normal("z"), 200_000, 1)).text();
        assertTrue(
                text.matches("Over a factor of \\d+ in draws the error falls like n to the power -0\\.(49|50|51); .*"),
                text);
    }

    /// Smooth outcomes, kinks and jumps by scrambled points: explained, never doubted.
    @Test
    void errorDecayOfReplicatedPoints() {
        var square = new Questions().uniform("x", 0, 1).uniform("y", 0, 1);
        var smooth =
                shown("error-decay", Judged.grounds(square.mean("exp(x + y)").build(), SOBOL, 1 << 18, 1));
        assertTrue(smooth.text().contains("as these points have it for smooth outcomes"), smooth.text());
        var disc = new Questions().uniform("x", 0, 1).uniform("y", 0, 1);
        var jump = shown(
                "error-decay",
                Judged.grounds(disc.mean("if(x^2 + y^2 < 1, 1, 0)").build(), SOBOL, 1 << 18, 1));
        assertTrue(jump.text().contains("as kinks and jumps make it"), jump.text());
    }

    /// 16 replicates whose means moved by a hundred standard errors in the last round, and by none.
    @Test
    void settledOfReplicates() {
        assertEquals(OBJECTION, Judged.only("settled", rounds(1)).strength());
        shown("settled", rounds(0));
        shown("settled", Judged.grounds(normal("exp(z)"), SOBOL, 1 << 14, 1));
    }

    private static List<Ground> rounds(double moved) {
        var question = normal("z");
        var scheme = Scheme.of(SOBOL);
        var random = new Random(1);
        var marks = new ArrayList<Mark>();
        var total = new Accumulator(1);
        for (int round = 0; round < 2; round++) {
            double at = round * moved;
            double[] means = random.doubles(16).map(u -> at + .01 * u).toArray();
            total = new Accumulator(1);
            total.add(new double[][] {means}, 0, 16);
            marks.add(new Mark(16_384L << round, 0, Answers.of(question, scheme, total)));
        }
        return Grounds.of(question, new Trace("A", scheme, marks, List.of(total), List.of(), Optional.empty()));
    }

    /// Numbers near 1e9 are 1.2e-7 apart.
    @Test
    void resolution() {
        var fine = new Questions().uniform("x", 0, 1).mean("1e9 + 1e-6*x").build();
        cautions("resolution", Judged.grounds(fine, 10_000, 1));
        var twin = new Questions().uniform("x", 0, 1).mean("1e9 + x").build();
        assertTrue(Judged.maybe("resolution", Judged.grounds(twin, 10_000, 1)).isEmpty());
    }

    /// An upper limit of the .99 quantile exists from 368 draws on, for .99^n must be .025 at most.
    @Test
    void noInterval() {
        var quantile = normal(new Estimand.Quantile(.99), "z");
        var few = cautions("no-interval", Judged.grounds(quantile, 360, 1));
        assertTrue(few.text().contains("368"), few.text());
        assertTrue(Judged.maybe("no-interval", Judged.grounds(quantile, 400, 1)).isEmpty());
    }

    /// Of whole numbers from 0 to 9 the level .5 lies at the jump from 4 to 5, and .55 does not.
    @Test
    void atomAtQuantile() {
        for (long draws : new long[] {2_000, 100_000}) {
            assertEquals(Optional.of(Strength.NOTE), atom(new Estimand.Quantile(.5), "floor(x)", draws));
            assertEquals(CAUTION, atom(new Estimand.TailMean(.5), "floor(x)", draws));
            assertEquals(Optional.empty(), atom(new Estimand.Quantile(.55), "floor(x)", draws));
            assertEquals(Optional.empty(), atom(new Estimand.TailMean(.55), "floor(x)", draws));
            assertEquals(Optional.empty(), atom(new Estimand.Quantile(.5), "x", draws));
            assertEquals(Optional.empty(), atom(new Estimand.Quantile(.5), "floor(1000*x)", draws));
            assertEquals(CAUTION, atom(new Estimand.TailMean(.8), "max(0, x - 8)", draws));
            assertEquals(Optional.empty(), atom(new Estimand.TailMean(.7), "max(0, x - 8)", draws));
        }
    }

    private static Optional<Strength> atom(Estimand estimand, String formula, long draws) {
        var question =
                new Questions().uniform("x", 0, 10).ask(estimand, formula).build();
        return Judged.strength("atom-at-quantile", Judged.grounds(question, draws, 1));
    }

    @Test
    void hiddenRegion() {
        var open = Judged.only("hidden-region", Judged.grounds(normal("z"), 10_000, 1));
        assertEquals(Status.NOT_DONE, open.status());
        assertTrue(open.text().contains("a part of probability below 0.00030 may be unseen"), open.text());
        var q = normal("if(z > 0, 1, 0)");
        var wish = new IntervalWish(IntervalKind.AUTO, Optional.of(new Bounds(0, 1)));
        var bounded = new Question(
                q.title(),
                q.notes(),
                q.safety(),
                q.constants(),
                q.inputs(),
                q.dependence(),
                q.working(),
                q.asks(),
                q.reference(),
                q.confidence(),
                q.tolerance(),
                wish);
        for (var grounds : List.of(
                Judged.grounds(bounded, 10_000, 1),
                Judged.grounds(new Questions().normal("z").probability("z > 0").build(), 10_000, 1))) {
            assertTrue(Judged.maybe("hidden-region", grounds).isEmpty());
        }
    }

    /// Of 2,000 repetitions: 1,880 are a rate of .94, whose 99 % interval reaches .953; 1,850 and 1,240 surely fall
    /// short
    /// of .95. Of 20 even 17 may be chance.
    @Test
    void rehearsal() {
        assertEquals(Status.NOT_DONE, rehearsed(0, 0, 0).status());
        assertEquals(List.of(new Action.Rehearse()), rehearsed(0, 0, 0).actions());
        assertEquals(Status.SHOWN, rehearsed(2_000, 1_880, 0).status());
        assertEquals(CAUTION, rehearsed(2_000, 1_850, 0).strength());
        var bad = rehearsed(2_000, 1_240, 0);
        assertEquals(OBJECTION, bad.strength());
        assertEquals(
                "Of 2,000 repetitions of 1,000 draws 62.0 % of the intervals hold the value, where 95 % say so",
                bad.text());
        assertEquals(CAUTION, rehearsed(2_000, 1_240, 1).strength());
        assertEquals(Status.SHOWN, rehearsed(20, 17, 0).status());
    }

    /// Intervals of the half-width 1 about 0, and as many about 5 as miss the value 0.
    private static Ground rehearsed(int repetitions, int held, double error) {
        var question = normal("z");
        var some = new ArrayList<Repetition>();
        for (int r = 0; r < repetitions; r++) {
            double at = r < held ? 0 : 5;
            some.add(new Repetition(at, .5, new Interval(at - 1, at + 1, .95, "student", "", Optional.empty())));
        }
        var answer = new Rehearsed(question.asks().getFirst(), .95, new Sought(0, error, "test", 0), some);
        var rehearsal =
                new Rehearsal("A", "independent", 1_000, 1_000, repetitions, Optional.empty(), 0, List.of(answer));
        var trace = Judged.trace(question, Scheme.of(new Independent()), 1_000, 1);
        return Judged.only("rehearsal", Grounds.of(question, trace, Optional.of(rehearsal)));
    }

    @Test
    void earlierRunsAreNotKnown() {
        var ground = Judged.only("earlier-runs", Judged.grounds(normal("z"), 1_000, 1));
        assertEquals(Status.NOT_DONE, ground.status());
        assertEquals(List.of(new Action.RunOtherSeed()), ground.actions());
    }

    /// The standard error of the .9 quantile of 10,000 normal values is .017: `sqrt(.09 / n) / φ(1.2816)`.
    @Test
    void referenceOfAQuantile() {
        var questions = new Questions().normal("z").ask(new Estimand.Quantile(.9), "z");
        var right = questions.reference(1.2815515655446004).build();
        var recipe = Recipe.of(right, Questions.lane("A"), 1);
        for (int seed = 0; seed < 200; seed++) {
            shown("reference", Grounds.of(right, Judged.again(recipe, 10_000, seed)));
        }
        for (double off : new double[] {-.15, .15}) {
            var wrong = questions.reference(1.2815515655446004 + off).build();
            assertEquals(
                    OBJECTION,
                    Judged.only("reference", Judged.grounds(wrong, 10_000, 1)).strength());
        }
    }

    /// Squares decide how well a standard deviation is known: of a lognormal density (σ = 1) its interval at
    /// 1,000 draws holds in 87 % of the runs, of a normal one in 95 %.
    @Test
    void skewnessOfOtherEstimands() {
        var sd = new Estimand.StandardDeviation();
        cautions("skewness", Judged.grounds(normal(sd, "exp(z)"), 1_000, 1));
        shown("skewness", Judged.grounds(normal(sd, "z"), 1_000, 1));
        var ratio = new Estimand.Ratio();
        cautions("skewness", Judged.grounds(normal(ratio, "2 + z/4", "exp(z)"), 200, 1));
        shown("skewness", Judged.grounds(normal(ratio, "2 + z/4", "exp(z/4)"), 200, 1));
    }

    @Test
    void failedEvaluationsOfAChance() {
        var question =
                new Questions().uniform("x", -.01, 1).probability("log(x) < -1").build();
        var ground = Judged.only("failed-evaluations", Judged.grounds(question, 10_000, 1));
        assertEquals(OBJECTION, ground.strength());
        assertTrue(ground.text().endsWith("the interval counts them as hits and as misses"), ground.text());
        assertTrue(
                ground.actions().getFirst() instanceof Action.LookAtDraw,
                ground.actions().toString());
    }

    /// Of one sentence each, with a remedy where there is a doubt.
    @Test
    void everyGroundIsOneSentence() {
        var grounds = Judged.grounds(
                new Questions()
                        .input("x", new Pareto(1, 1.2))
                        .mean("x")
                        .reference(1)
                        .build(),
                20_000,
                1);
        assertTrue(grounds.stream().map(Ground::code).distinct().count() >= 10);
        for (var ground : grounds) {
            assertFalse(ground.text().endsWith("."), ground.text());
            assertFalse(ground.text().contains(". "), ground.text());
            assertEquals(ground.status() == Status.SHOWN, ground.remedy().isEmpty(), ground.text());
            ground.actions().forEach(action -> assertFalse(action.words().isBlank()));
        }
        assertEquals("Make 12,000 draws", new Action.MoreDraws(OptionalLong.of(12_000)).words());
        assertTrue(Arrays.stream(Action.class.getPermittedSubclasses()).allMatch(Class::isRecord));
    }

    /// Of 1,000 draws 10 lie beyond the .99 quantile, of 3,000 there are 30.
    @Test
    void tailMeansNeedDrawsBeyondTheQuantile() {
        var question = normal(new Estimand.TailMean(.99), "z");
        assertEquals(
                "Only 10 draws lie beyond the quantile",
                cautions("tail-draws", Judged.grounds(question, 1_000, 1)).text());
        assertEquals(
                "30 draws lie beyond the quantile",
                shown("tail-draws", Judged.grounds(question, 3_000, 1)).text());
    }
}
