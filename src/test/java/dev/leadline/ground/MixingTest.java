package dev.leadline.ground;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.engine.Questions;
import dev.leadline.ground.Ground.Status;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.scheme.Adaptation;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.Share;
import dev.leadline.scheme.Splitting;
import dev.leadline.scheme.Tuned;
import dev.leadline.scheme.Warp;
import dev.leadline.study.Study;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.TreeMap;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;

/// The grounds of splitting and of adapted densities, each where it must speak and on its nearest twin.
class MixingTest {
    private static Ground ground(String code, Question question, Scheme scheme) throws InterruptedException {
        var plan = new Plan(new Stop(2_000_000, OptionalDouble.empty()), 11, List.of(Lane.of("A", scheme)));
        try (var study = Study.start(question, plan, 1, _ -> {})) {
            return study.await().lanes().getFirst().grounds().stream()
                    .filter(ground -> ground.code().equals(code))
                    .findFirst()
                    .orElseThrow();
        }
    }

    private static Scheme splitting(int moves, int repetitions) {
        Points points = new Repetitions(new Splitting(100, moves), OptionalInt.of(repetitions));
        return Scheme.of(points);
    }

    private static Question twoPoints() {
        return new Questions()
                .normal("x1")
                .normal("x2")
                .probability("5 - x2 - 0.5*(x1 - 0.1)^2 <= 0")
                .build();
    }

    @Test
    void particlesThatHardlyMoveAreToldFromThoseThatDo() throws InterruptedException {
        var moved = ground("mixing", twoPoints(), splitting(30, 20));
        assertEquals(Status.SHOWN, moved.status());
        var stuck = ground("mixing", twoPoints(), splitting(1, 40));
        assertEquals(Strength.OBJECTION, stuck.strength().orElseThrow(), stuck.text());
        assertTrue(stuck.text().contains("times as Poisson numbers do in 40 repetitions"), stuck.text());
    }

    @Test
    void separateValuesAreNoted() throws InterruptedException {
        var question = new Questions()
                .normal("x1")
                .normal("x2")
                .probability("floor(4*x1) + floor(4*x2) >= 14")
                .build();
        assertEquals(
                Strength.NOTE,
                ground("mixing", question, splitting(30, 12)).strength().orElseThrow());
    }

    @Test
    void anImpossibleEventIsAnObjection() throws InterruptedException {
        var question = new Questions().uniform("u", 0, 1).probability("u > 2").build();
        var ground = ground("mixing", question, splitting(30, 10));
        assertEquals(Strength.OBJECTION, ground.strength().orElseThrow());
        assertTrue(ground.text().startsWith("A repetition gave up: "), ground.text());
    }

    private static Scheme tuned(double seen) {
        var wish = new Adaptation(Adaptation.Way.CROSS_ENTROPY, new TreeSet<>(List.of(0)), Share.of(.1));
        var part = new Tuned.Part(18, new TreeMap<>(Map.of(0, new Warp.OfScores(3, 1))));
        var stage = new Tuned.Stage(4096, 0, seen, 1e-5, 1000);
        return Scheme.of(new Independent()).with(new Tuned(wish, 2, List.of(part), List.of(stage)));
    }

    @Test
    void stagesThatSawSomethingElseAreToldFromThoseThatAgree() throws InterruptedException {
        var question = new Questions().normal("x").probability("x > 3").build();
        // P(Z > 3) = .00134990.
        assertEquals(Status.SHOWN, ground("stages", question, tuned(.00135)).status());
        assertEquals(
                Strength.CAUTION,
                ground("stages", question, tuned(.00150)).strength().orElseThrow());
    }
}
