package dev.leadline.ground;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Normal;
import dev.leadline.engine.Questions;
import dev.leadline.ground.Ground.Status;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Proposal;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.Share;
import dev.leadline.scheme.Splitting;
import dev.leadline.study.LaneState;
import dev.leadline.study.Study;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/// Draws from the inputs' own densities beside a lane of others: what the lane misses is objected to, what it
/// does not miss is not.
class AuditTest {
    private static Scheme drawnFrom(Normal other, Share share) {
        var proposal = new Proposal(new TreeMap<>(Map.of(0, other)), share, false, List.of());
        return new Scheme(new Independent(), Optional.of(proposal), List.of());
    }

    private static LaneState run(Question question, Scheme scheme, long audit, long seed, int threads)
            throws InterruptedException {
        var draws = audit == 0 ? OptionalLong.empty() : OptionalLong.of(audit);
        var lane = new Lane("A", scheme, false, Optional.empty(), draws);
        var plan = new Plan(new Stop(20_000, OptionalDouble.empty()), seed, List.of(lane));
        try (var study = Study.start(question, plan, threads, _ -> {})) {
            return study.await().lanes().getFirst();
        }
    }

    private static Ground audit(Question question, Scheme scheme, long draws, long seed) throws InterruptedException {
        return ground(run(question, scheme, draws, seed, 1)).orElseThrow();
    }

    private static Optional<Ground> ground(LaneState lane) {
        return lane.grounds().stream().filter(g -> g.code().equals("audit")).findFirst();
    }

    private static Question question(String asked) {
        var questions = new Questions().normal("z");
        return asked.equals("event")
                ? questions.probability("abs(z) > 2").build()
                : questions.mean("max(abs(z) - 1.5, 0)").build();
    }

    /// Both halves of the line count alike. Drawn from about 2.8 without a share of the input's own density, the
    /// lower half is reached by one draw in 10^9: half of the value is missing.
    @ParameterizedTest
    @ValueSource(strings = {"event", "mean"})
    void aModeThatIsMissedIsObjectedTo(String asked) throws InterruptedException {
        for (int seed = 0; seed < 10; seed++) {
            var ground = audit(question(asked), drawnFrom(new Normal(2.8, .72), Share.NONE), 20_000, seed);
            assertEquals(Optional.of(Strength.OBJECTION), ground.strength(), ground.text());
            assertTrue(ground.text().contains("below"), ground.text());
        }
    }

    /// Of 100 seeds the chance of one objection is .006.
    @ParameterizedTest
    @ValueSource(strings = {"event", "mean"})
    void soundDensitiesAreNotObjectedTo(String asked) throws InterruptedException {
        for (int seed = 0; seed < 100; seed++) {
            var ground = audit(question(asked), drawnFrom(new Normal(0, 2), new Share(1, 10)), 20_000, seed);
            assertEquals(Status.SHOWN, ground.status(), ground.text());
        }
    }

    /// Half of the mean of `exp(3 z)` comes from beyond z = 3, which 1,000 draws reach once or twice: their
    /// own standard error is far too small. The lane's draws foretell it.
    @Test
    void fewDrawsOfARareOutcomeAreNotTakenForSure() throws InterruptedException {
        var question = new Questions().normal("z").mean("exp(3*z)").build();
        for (int seed = 0; seed < 100; seed++) {
            var ground = audit(question, drawnFrom(new Normal(3, 1.2), new Share(1, 10)), 1_000, seed);
            assertEquals(Status.SHOWN, ground.status(), ground.text());
        }
    }

    /// The limit of no hit in n draws is `1 - (α/2)^(1/n)`, with α = 2 Φ(-4): 0.010307 of 1,000.
    @Test
    void noHitsAllowWhatTheyAllow() throws InterruptedException {
        var question = new Questions().normal("z").probability("z > 6").build();
        var ground = audit(question, drawnFrom(new Normal(6, 1), new Share(1, 10)), 1_000, 3);
        assertEquals(Status.NOT_DONE, ground.status(), ground.text());
        assertTrue(
                ground.text()
                        .matches(
                                "No hits in 1,000 audit draws from the inputs' own densities leave 0 to 0\\.0104? possible"
                                        + " at 99\\.99\\d* %, and 9\\.\\d+e-10 is within that: so few can hardly tell"),
                ground.text());
        assertTrue(
                ground.remedy()
                        .orElseThrow()
                        .matches("Audit by about 2[567],000,000,000 draws, of which some 25 would hit"),
                ground.remedy().orElseThrow());
    }

    /// A chance of .16 that 1,000 draws must see, and that the lane draws from nowhere.
    @Test
    void aLaneWithoutAHitIsDoubtedByThoseOfItsAudit() throws InterruptedException {
        var question = new Questions().normal("z").probability("z > 1").build();
        var ground = audit(question, drawnFrom(new Normal(-9, .5), Share.NONE), 1_000, 3);
        assertEquals(Optional.of(Strength.CAUTION), ground.strength(), ground.text());
        assertTrue(ground.text().endsWith("; the lane saw none"), ground.text());
    }

    @Test
    void whoAsksForNoneIsToldSo() throws InterruptedException {
        var ground = audit(question("event"), drawnFrom(new Normal(0, 2), new Share(1, 10)), 0, 1);
        assertEquals(Status.NOT_DONE, ground.status());
        assertEquals("Write \"audit\": 100000 in the lane", ground.remedy().orElseThrow());
        assertTrue(ground(run(question("event"), Scheme.of(new Independent()), 0, 1, 1))
                .isEmpty());
    }

    @Test
    void splittingIsAudited() throws InterruptedException {
        var question = new Questions().normal("z").probability("z > 2").build();
        var ground = audit(question, Scheme.of(new Repetitions(Splitting.DEFAULT, OptionalInt.empty())), 20_000, 1);
        assertEquals(Status.SHOWN, ground.status(), ground.text());
    }

    /// The audit's numbers are its own: the lane has the same bits with and without it, and both on any
    /// threads.
    @Test
    void entersNoAnswer() throws InterruptedException {
        var scheme = drawnFrom(new Normal(0, 2), new Share(1, 10));
        var without = run(question("mean"), scheme, 0, 7, 1).trace();
        var one = run(question("mean"), scheme, 50_000, 7, 1).trace();
        assertEquals(
                without.last().orElseThrow().answers(), one.last().orElseThrow().answers());
        var audit = one.audit().orElseThrow().last().orElseThrow();
        assertEquals(50_000, audit.draws());
        for (int threads : new int[] {2, 8}) {
            var other = run(question("mean"), scheme, 50_000, 7, threads).trace();
            assertEquals(
                    one.last().orElseThrow().answers(),
                    other.last().orElseThrow().answers());
            assertEquals(
                    audit.answers(),
                    other.audit().orElseThrow().last().orElseThrow().answers());
        }
        var plain = run(question("mean"), Scheme.of(new Independent()), 0, 7, 1).trace();
        assertNotEquals(
                plain.last().orElseThrow().answers().getFirst().estimate(),
                run(question("mean"), scheme, 20_000, 7, 1)
                        .trace()
                        .audit()
                        .orElseThrow()
                        .last()
                        .orElseThrow()
                        .answers()
                        .getFirst()
                        .estimate());
    }
}
