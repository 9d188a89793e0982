package dev.leadline.ground;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.engine.Questions;
import dev.leadline.estimate.Accumulator;
import dev.leadline.ground.Ground.Status;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.reference.ReferenceValue;
import dev.leadline.reference.ReferenceValue.Kind;
import dev.leadline.reference.ReferenceValue.Known;
import dev.leadline.scheme.Antithetic;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.ScrambledSobol;
import dev.leadline.scheme.Scrambling;
import dev.leadline.study.Study;
import dev.leadline.trace.Answers;
import dev.leadline.trace.Blocks;
import dev.leadline.trace.Mark;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.random.RandomGenerator;
import java.util.random.RandomGeneratorFactory;
import org.junit.jupiter.api.Test;

/// Each ground on a question where it must speak, and on its nearest twin where it must not.
class GroundsTest {
    private static List<Ground> run(Question question, long draws) throws InterruptedException {
        try (var study = Study.start(question, Questions.plan(draws, 11), 1, _ -> {})) {
            return study.await().lanes().getFirst().grounds();
        }
    }

    private static Ground ground(String code, List<Ground> grounds) {
        return grounds.stream().filter(g -> g.code().equals(code)).findFirst().orElseThrow();
    }

    private static void objects(Ground ground) {
        assertEquals(Optional.of(Strength.OBJECTION), ground.strength(), ground.text());
    }

    private static void cautions(Ground ground) {
        assertEquals(Optional.of(Strength.CAUTION), ground.strength(), ground.text());
    }

    private static void shows(Ground ground) {
        assertEquals(Status.SHOWN, ground.status(), ground.text());
    }

    @Test
    void fewHits() throws InterruptedException {
        var none = ground(
                "hits",
                run(new Questions().uniform("x", 0, 1).probability("x < 1e-9").build(), 1_000));
        cautions(none);
        assertEquals("No hit in 1,000 draws: a part of probability below 0.00300 may be unseen", none.text());
        cautions(ground(
                "hits",
                run(new Questions().uniform("x", 0, 1).probability("x < 0.01").build(), 1_000)));
        cautions(ground(
                "hits",
                run(new Questions().uniform("x", 0, 1).probability("x > 0.01").build(), 1_000)));
        shows(ground(
                "hits",
                run(new Questions().uniform("x", 0, 1).probability("x < 0.1").build(), 1_000)));
    }

    @Test
    void noSpread() throws InterruptedException {
        objects(ground(
                "spread",
                run(new Questions().uniform("x", 0, 1).mean("floor(x)").build(), 1_000)));
        var twin = run(new Questions().uniform("x", 0, 1.01).mean("floor(x)").build(), 1_000);
        assertTrue(twin.stream().noneMatch(g -> g.code().equals("spread")));
    }

    /// Squares from 1e308 on, and below 1e-300, are no numbers to build an interval of.
    @Test
    void outcomesWhoseSquaresAreNoNumbers() throws InterruptedException {
        for (String unit : List.of("1e300", "1e-300")) {
            var grounds = run(
                    new Questions()
                            .uniform("x", 0, 1)
                            .mean("x*" + unit)
                            .reference(1)
                            .build(),
                    10_000);
            objects(ground("spread", grounds));
            assertTrue(grounds.stream().noneMatch(g -> g.code().equals("settled")), unit);
            assertEquals(Status.NOT_DONE, ground("reference", grounds).status());
        }
    }

    @Test
    void failedEvaluations() throws InterruptedException {
        var failed = run(new Questions().uniform("x", -.01, 1).mean("log(x)").build(), 1_000);
        objects(ground("failed-evaluations", failed));
        assertTrue(ground("failed-evaluations", failed).text().contains("over finite evaluations only"));
        shows(ground(
                "failed-evaluations",
                run(new Questions().uniform("x", 0, 1).mean("log(x)").build(), 1_000)));
    }

    @Test
    void skewness() throws InterruptedException {
        cautions(ground(
                "skewness", run(new Questions().normal("z").mean("exp(2*z)").build(), 1_000)));
        shows(ground(
                "skewness", run(new Questions().normal("z").mean("exp(z/2)").build(), 1_000)));
        var large = run(new Questions().uniform("x", 0, 1).mean("x*1e110").build(), 1_000);
        assertEquals(Status.NOT_DONE, ground("skewness", large).status());
    }

    private static List<Ground> run(Question question, Points points, long draws) throws InterruptedException {
        var lane = Lane.of("B", Scheme.of(points));
        var plan = new Plan(new Stop(draws, OptionalDouble.empty()), 11, List.of(lane));
        try (var study = Study.start(question, plan, 1, _ -> {})) {
            return study.await().lanes().getFirst().grounds();
        }
    }

    /// Hits are counted in draws, also where observations are means of several.
    @Test
    void hitsOfObservationsOfSeveralDraws() throws InterruptedException {
        var rare = new Questions().uniform("x", 0, 1).probability("x < 0.01").build();
        var pairs = ground("hits", run(rare, new Antithetic(), 1_000));
        cautions(pairs);
        assertTrue(pairs.text().endsWith("hits in 1,000 draws"), pairs.text());
        // 1,024 points in each of 16 replicates: 10 or 11 of each below .01
        var sobol = ground("hits", run(rare, new ScrambledSobol(16, Scrambling.NESTED), 16_384));
        shows(sobol);
        assertTrue(sobol.text().matches("16\\d hits in 16,384 draws"), sobol.text());
    }

    @Test
    void skewnessOfReplicates() throws InterruptedException {
        var steep = new Questions().normal("z").mean("exp(2*z)").build();
        var ground = ground("skewness", run(steep, new ScrambledSobol(16, Scrambling.NESTED), 1 << 12));
        cautions(ground);
        assertTrue(ground.text().matches("Skewness .* observations of 260 draws each; there are 16"), ground.text());
        assertTrue(ground.remedy().orElseThrow().contains("more replicates"));
        shows(ground(
                "skewness",
                run(
                        new Questions().normal("z").mean("z").build(),
                        new ScrambledSobol(16, Scrambling.NESTED),
                        1 << 12)));
    }

    @Test
    void reference() throws InterruptedException {
        var question = new Questions().uniform("x", 0, 1).mean("x");
        shows(ground("reference", run(question.reference(.5).build(), 10_000)));
        // The standard error is 0.0029.
        objects(ground("reference", run(question.reference(.53).build(), 10_000)));
        var without = run(new Questions().uniform("x", 0, 1).mean("x").build(), 10_000);
        assertEquals(Status.NOT_DONE, ground("reference", without).status());
    }

    /// Without a hit no standard error is known, and yet a chance of 1/2 is out of the question; 3 hits where 10 are
    /// expected are not: P(K ≤ 3) = .0103 by the Poisson distribution.
    @Test
    void referenceOfAChance() throws InterruptedException {
        var none = new Questions().uniform("x", 0, 1).probability("x < 1e-9");
        // The limit is 1 - (3.167e-5)^(1/1000) = .010307, rounded outwards.
        var far = ground("reference", run(none.reference(.5).build(), 1_000));
        objects(far);
        assertEquals(
                "0 hits in 1,000 draws leave 0 to 0.0104 possible at 99.99366 %, and the reference value 0.500 is above that",
                far.text());
        shows(ground("reference", run(none.reference(1e-9).build(), 1_000)));
        shows(ground("reference", run(none.reference(0).build(), 1_000)));
        shows(ground("reference", chance(3, 1_000, .01)));
        objects(ground("reference", chance(30, 1_000, .006)));
        objects(ground("reference", chance(1_000, 1_000, .98)));
        shows(ground("reference", chance(1_000, 1_000, .999)));
    }

    private static List<Ground> chance(int hits, int draws, double reference) {
        var question = new Questions()
                .uniform("x", 0, 1)
                .probability("x < 0.5")
                .reference(reference)
                .build();
        var values = new double[draws];
        java.util.Arrays.fill(values, 0, hits, 1);
        return judged(question, values);
    }

    private static List<Ground> judged(Question question, double... values) {
        return Grounds.of(question, trace(question, values));
    }

    private static Trace trace(Question question, double... values) {
        var total = new Accumulator(1);
        total.add(new double[][] {values}, 0, values.length);
        var mark = new Mark(values.length, 0, Answers.of(question, Scheme.of(new Independent()), total));
        return new Trace("A", Scheme.of(new Independent()), List.of(mark), List.of(total), List.of(), Optional.empty());
    }

    /// Mean 2.5, standard error .6455: a bound is taken off the distance, and told where it matters.
    @Test
    void referenceByQuadrature() {
        var question = new Questions().uniform("x", 0, 1).mean("x").reference(1).build();
        assertEquals(
                "2.3 standard errors above the reference value by quadrature",
                ground("reference", compared(question, new Known(1, .001, Kind.QUADRATURE, "", OptionalLong.of(9))))
                        .text());
        assertEquals(
                "0.0 standard errors below the reference value by quadrature, beyond its own error of 0.600 at most",
                ground("reference", compared(question, new Known(3, .6, Kind.QUADRATURE, "", OptionalLong.of(9))))
                        .text());
        assertEquals(
                "2.3 standard errors above the reference value in closed form",
                ground(
                                "reference",
                                compared(question, new Known(1, 1e-15, Kind.CLOSED_FORM, "1", OptionalLong.empty())))
                        .text());
        objects(ground("reference", compared(question, new Known(1e4, 1, Kind.QUADRATURE, "", OptionalLong.of(9)))));
        var unknown = ground("reference", compared(question, new ReferenceValue.Unknown("the rule broke down")));
        assertEquals(Status.NOT_DONE, unknown.status());
        assertEquals("Quadrature found no reference value: the rule broke down", unknown.text());
        assertEquals(
                "The reference value is being computed by quadrature",
                ground("reference", compared(question, new ReferenceValue.Sought()))
                        .text());
    }

    private static List<Ground> compared(Question question, ReferenceValue reference) {
        var trace = trace(question, 1, 2, 3, 4);
        return Grounds.of(question, trace.with(Optional.of(reference)));
    }

    /// Few draws of lopsided outcomes lie 4 standard errors off far more often than one time in 10,000: 30 of a
    /// lognormal density in 2 % of the runs.
    @Test
    void referenceAgainstFewDraws() {
        var question = new Questions().uniform("x", 0, 1).mean("x");
        // mean 2.5, standard error 0.645; Student's t with 3 degrees of freedom is beyond 32.5 with chance 6.3e-5,
        // beyond 130 with chance 1e-6
        double[] values = {1, 2, 3, 4};
        shows(ground("reference", judged(question.reference(2.5 + 32 * .6455).build(), values)));
        cautions(ground("reference", judged(question.reference(2.5 + 35 * .6455).build(), values)));
        objects(ground("reference", judged(question.reference(2.5 + 135 * .6455).build(), values)));
    }

    @Test
    void numericalTolerance() throws InterruptedException {
        var question = new Questions().uniform("x", 0, 1).mean("x");
        // The half-width is 0.00566 at 10,000 draws.
        shows(ground("tolerance", run(question.absoluteTolerance(.0058).build(), 10_000)));
        var missed = ground("tolerance", run(question.absoluteTolerance(.0055).build(), 10_000));
        cautions(missed);
        assertTrue(missed.remedy().orElseThrow().matches("Make about 1[01],000 draws in all"));
    }

    /// Without a hit in 2,000 draws, which a chance of .00101 has in 13 % of the runs, the limit is 1 - .025^(1/2000):
    /// the half-width of .00092 does not say that 0 is within .001 of the chance.
    @Test
    void numericalToleranceOfFewHits() throws InterruptedException {
        var question = new Questions().uniform("x", 0, 1).probability("x < 1e-9");
        var missed = ground("tolerance", run(question.absoluteTolerance(.001).build(), 2_000));
        cautions(missed);
        assertTrue(missed.text().startsWith("Distance of the farther limit 0.00184"), missed.text());
        shows(ground("tolerance", run(question.absoluteTolerance(.0019).build(), 2_000)));
    }

    @Test
    void halvesThatDiffer() {
        var question = new Questions().uniform("x", 0, 1).mean("x").build();
        objects(ground("settled", Grounds.of(question, halves(question, .2))));
        shows(ground("settled", Grounds.of(question, halves(question, 0))));
    }

    /// 2,000 uniform values, the second half shifted; the standard error of the difference is 0.013.
    private static Trace halves(Question question, double shift) {
        RandomGenerator random = RandomGeneratorFactory.of("L64X128MixRandom").create(1);
        var blocks = new Blocks();
        var total = new Accumulator(1);
        for (int i = 0; i < 40; i++) {
            double by = i < 20 ? 0 : shift;
            double[] values = random.doubles(50).map(u -> u + by).toArray();
            var block = new Accumulator(1);
            block.add(new double[][] {values}, 0, values.length);
            blocks.add(block, 50);
            total.merge(block);
        }
        var mark = new Mark(2_000, 0, Answers.of(question, Scheme.of(new Independent()), total));
        return new Trace(
                "A", Scheme.of(new Independent()), List.of(mark), blocks.snapshot(), List.of(), Optional.empty());
    }

    @Test
    void doubtsStandFirstTheStrongestOnTop() throws InterruptedException {
        var grounds =
                run(new Questions().uniform("x", -.01, 1).mean("exp(-8*log(x))").build(), 1_000);
        objects(grounds.getFirst());
        var statuses = grounds.stream().map(Ground::status).toList();
        assertEquals(
                statuses.stream()
                        .sorted(java.util.Comparator.comparingInt(
                                s -> List.of(Status.DOUBTED, Status.SHOWN, Status.NOT_DONE)
                                        .indexOf(s)))
                        .toList(),
                statuses);
    }

    @Test
    void severalAnswersAreToldApart() throws InterruptedException {
        var grounds = run(
                new Questions()
                        .uniform("x", 0, 1)
                        .probability("x < 1e-9")
                        .probability("x < 0.5")
                        .build(),
                1_000);
        assertEquals(
                List.of("Answer 1: no hit in 1,000 draws: a part of probability below 0.00300 may be unseen"),
                grounds.stream()
                        .filter(g -> g.code().equals("hits") && g.status() == Status.DOUBTED)
                        .map(Ground::text)
                        .toList());
    }

    @Test
    void nothingIsJudgedBeforeTheFirstMark() {
        var question = new Questions().uniform("x", 0, 1).mean("x").build();
        var empty = new Trace("A", Scheme.of(new Independent()), List.of(), List.of(), List.of(), Optional.empty());
        assertEquals(List.of(), Grounds.of(question, empty));
    }
}
