package dev.leadline.ground;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import dev.leadline.density.Exponential;
import dev.leadline.density.Normal;
import dev.leadline.density.Pareto;
import dev.leadline.engine.Questions;
import dev.leadline.engine.Recipe;
import dev.leadline.estimate.Estimand;
import dev.leadline.ground.Ground.Status;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.scheme.Antithetic;
import dev.leadline.scheme.ScrambledSobol;
import dev.leadline.scheme.Scrambling;
import dev.leadline.scheme.Share;
import dev.leadline.study.Study;
import dev.leadline.trace.Trace;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/// Where the tail must be doubted, and the nearest twin where it must not.
class TailTest {
    private static final Optional<Strength> OBJECTION = Optional.of(Strength.OBJECTION);
    private static final Optional<Strength> NONE = Optional.empty();

    private static Optional<Strength> tail(List<Ground> grounds) {
        var ground = Judged.only("tail", grounds);
        assertTrue(ground.strength().isPresent() || ground.status() == Status.SHOWN, ground.text());
        return ground.strength();
    }

    private static Optional<Strength> tail(Question question, long draws) {
        return tail(Judged.grounds(question, draws, 1));
    }

    private static Questions pareto(double shape) {
        return new Questions().input("x", new Pareto(1, shape));
    }

    /// A Pareto density of shape 1.5 has the tail index 2/3, one of shape 5 has 1/5.
    @Test
    void ofMeans() {
        var heavy = Judged.only("tail", Judged.grounds(pareto(1.5).mean("x").build(), 100_000, 1));
        assertEquals(OBJECTION, heavy.strength());
        assertTrue(
                heavy.text()
                        .matches(
                                "The 949 largest outcomes have the tail index 0\\.\\d\\d: they behave as if their variance were"
                                        + " infinite up to these 100,000 draws"),
                heavy.text());
        assertTrue(heavy.remedy().orElseThrow().contains("another question, not a repair"));
        assertEquals(
                List.of(new Action.DrawWider(), new Action.AskAnother("the mean of outcomes up to a limit")),
                heavy.actions());
        assertEquals(NONE, tail(pareto(5).mean("x").build(), 100_000));
        assertEquals(NONE, tail(pareto(1.5).mean("min(x, 20)").build(), 100_000));
    }

    /// The heavier tail counts, whatever its sign and wherever the values lie.
    @Test
    void ofEitherSide() {
        assertEquals(OBJECTION, tail(pareto(1.5).mean("-1000 + x").build(), 100_000));
        var low =
                Judged.only("tail", Judged.grounds(pareto(1.5).mean("1000 - x").build(), 100_000, 1));
        assertEquals(OBJECTION, low.strength());
        assertTrue(low.text().startsWith("The 949 lowest outcomes"), low.text());
        assertEquals(NONE, tail(pareto(5).mean("-1000 + x").build(), 100_000));
    }

    @Test
    void withoutAMean() {
        var text = Judged.only("tail", Judged.grounds(pareto(.8).mean("x").build(), 100_000, 1))
                .text();
        assertTrue(text.contains("they behave as if they had no mean up to these 100,000 draws"), text);
    }

    /// Few draws hardly tell: a caution.
    @Test
    void ofFewDraws() {
        assertEquals(Optional.of(Strength.CAUTION), tail(pareto(1.1).mean("x").build(), 9_999));
        assertEquals(OBJECTION, tail(pareto(1.1).mean("x").build(), 10_000));
        assertEquals(
                Status.NOT_DONE,
                Judged.only("tail", Judged.grounds(pareto(1.1).mean("x").build(), 24, 1))
                        .status());
    }

    /// Not of 0 and 1, whoever asks: a chance, a quantile, the mean of an event.
    @Test
    void notOfEvents() {
        for (var grounds : List.of(
                Judged.grounds(pareto(1.5).probability("x > 50").build(), 20_000, 1),
                Judged.grounds(pareto(1.5).ask(new Estimand.Quantile(.99), "x").build(), 20_000, 1))) {
            assertTrue(Judged.maybe("tail", grounds).isEmpty(), grounds.toString());
        }
        assertEquals(NONE, tail(pareto(1.5).mean("if(x > 50, 1, 0)").build(), 20_000));
    }

    /// The variance of a standard deviation comes from fourth powers, which shape 3 has not and shape 20
    /// has; that of a tail mean from what is beyond; that of a ratio from both.
    @Test
    void ofOtherEstimands() {
        for (var estimand :
                List.of(new Estimand.StandardDeviation(), new Estimand.Distribution(.95), new Estimand.TailMean(.9))) {
            double heavy = estimand instanceof Estimand.StandardDeviation ? 2.5 : 1.5;
            assertEquals(OBJECTION, tail(pareto(heavy).ask(estimand, "x").build(), 100_000), estimand.word());
            assertEquals(NONE, tail(pareto(20).ask(estimand, "x").build(), 100_000), estimand.word());
        }
        var ratio = new Estimand.Ratio();
        assertEquals(OBJECTION, tail(pareto(1.5).ask(ratio, "1/x", "x").build(), 100_000));
        assertEquals(NONE, tail(pareto(5).ask(ratio, "1/x", "x").build(), 100_000));
    }

    /// Single draws are looked at, whatever an observation is made of.
    @Test
    void inEveryLayout() {
        for (var points : List.of(new Antithetic(), new ScrambledSobol(16, Scrambling.NESTED))) {
            assertEquals(OBJECTION, tail(Judged.grounds(pareto(1.5).mean("x").build(), points, 1 << 17, 1)));
            assertEquals(NONE, tail(Judged.grounds(pareto(5).mean("x").build(), points, 1 << 17, 1)));
        }
    }

    /// `(1/π³) ∫∫∫ 1 / (1 - cos x cos y cos z)` over `[0, π]³` is `Γ(1/4)⁴ / (4 π³)`, and its tail index
    /// 2/3 at a corner.
    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5})
    void ofACornerThatLooksHarmless(long seed) {
        var corner =
                new Questions().range("x", 0, Math.PI).range("y", 0, Math.PI).range("z", 0, Math.PI);
        assertEquals(
                OBJECTION,
                tail(Judged.grounds(
                        corner.integral("1/(1 - cos(x)*cos(y)*cos(z))").build(), 100_000, seed)));
        var twin = new Questions().range("x", 0, Math.PI).range("y", 0, Math.PI).range("z", 0, Math.PI);
        assertEquals(
                NONE,
                tail(Judged.grounds(
                        twin.integral("1/(1.5 - cos(x)*cos(y)*cos(z))").build(), 100_000, seed)));
    }

    /// Record diag-is-narrow-proposal: weights of a normal density drawn from one of variance .4, and their
    /// twin of variance .75, have the tail index 1 less the variance.
    @Test
    void ofANarrowDensityDrawnFrom() {
        for (double variance : new double[] {.4, .75}) {
            var record = ReferenceValues.caseOf("diag-is-narrow-proposal", "sigma^2=" + variance);
            double index = ReferenceValues.expected(record, "tail_index_k_of_weights");
            var question = new Questions().normal("x").mean("1 + 0*x").build();
            var scheme = Judged.from(new Normal(0, Math.sqrt(variance)), Share.NONE);
            var trace = Judged.trace(question, scheme, 1_000_000, 1);
            var found = trace.outermost().orElseThrow().weights().above();
            assertEquals(3000, found.values());
            // The approach to the limit is slow: the density of the logarithm of a weight is not quite exponential.
            assertEquals(index, found.shape(), .12);
            assertEquals(index >= .5 ? OBJECTION : NONE, tail(Grounds.of(question, trace)));
        }
    }

    /// Weights of Exp(1) drawn from Exp(a) have the tail index (a - 1) / a exactly.
    @Test
    void meanIndexOfWeights() {
        for (double a : new double[] {1.25, 1.5, 1.75, 2.05, 2.5, 3}) {
            var question =
                    new Questions().input("x", new Exponential(1)).mean("x").build();
            var lane = Lane.of("A", Judged.from(new Exponential(1 / a), Share.NONE));
            var recipe = Recipe.of(question, lane, 1);
            double sum = 0;
            for (int seed = 0; seed < 40; seed++) {
                sum += Judged.again(recipe, 100_000, seed)
                        .outermost()
                        .orElseThrow()
                        .weights()
                        .above()
                        .shape();
            }
            assertEquals((a - 1) / a, sum / 40, .03, "a = " + a);
        }
    }

    /// A density about the event makes the weights of what is no hit as large as it likes: a caution, since
    /// no answer is made of them; the weights of hits are at most exp(-8).
    @Test
    void ofWeightsThatNoHitHas() {
        var question = new Questions().normal("x").probability("x > 4").build();
        var grounds = Judged.grounds(question, Judged.from(new Normal(4, 1), Share.NONE), 100_000, 1);
        var tails = grounds.stream().filter(g -> g.code().equals("tail")).toList();
        assertEquals(2, tails.size());
        assertEquals(Optional.of(Strength.CAUTION), tails.getFirst().strength());
        assertTrue(
                tails.getFirst().text().contains("largest weights have"),
                tails.getFirst().text());
        assertEquals(Status.SHOWN, tails.getLast().status());
        var shared = Judged.grounds(question, Judged.from(new Normal(4, 1), new Share(1, 10)), 100_000, 1);
        assertEquals(1, shared.stream().filter(g -> g.code().equals("tail")).count());
    }

    private static Trace run(Question question, Lane lane, int threads) throws InterruptedException {
        var plan = new Plan(new Stop(1_000_000, OptionalDouble.empty()), 3, List.of(lane));
        try (var study = Study.start(question, plan, threads, _ -> {})) {
            return study.await().lanes().getFirst().trace();
        }
    }

    /// Items are told which values cannot be outermost, and that depends on how far others have come; what
    /// comes of it does not.
    @Test
    void sameBitsOnAnyNumberOfThreads() throws InterruptedException {
        var question = new Questions().normal("x").mean("exp(x) - 1").build();
        for (var lane : List.of(Questions.lane("A"), Lane.of("B", Judged.from(new Normal(.5, 1.2), Share.NONE)))) {
            var first = bits(run(question, lane, 1));
            assertEquals(first, bits(run(question, lane, 2)));
            assertEquals(first, bits(run(question, lane, 8)));
        }
    }

    private static List<Object> bits(Trace trace) {
        var seen = trace.outermost().orElseThrow();
        var bits = new ArrayList<Object>();
        for (var c : seen.components()) {
            bits.addAll(List.of(c.nonzero(), c.size(), c.squares(), c.largest(), c.above(), c.below()));
            for (double x : c.greatest()) {
                bits.add(x);
            }
        }
        assertFalse(bits.isEmpty());
        return bits;
    }
}
