package dev.leadline.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.estimate.Estimand;
import dev.leadline.interval.Interval;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.model.StopRule;
import dev.leadline.model.Tolerance;
import dev.leadline.scheme.Adaptation;
import dev.leadline.scheme.Adaptation.Way;
import dev.leadline.scheme.Antithetic;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.ScrambledSobol;
import dev.leadline.scheme.Scrambling;
import dev.leadline.scheme.Share;
import dev.leadline.stream.Purpose;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.TreeSet;
import java.util.concurrent.ExecutionException;
import org.junit.jupiter.api.Test;

class RepetitionsTest {
    private static final long SEED = 20261201;

    private static Question question() {
        return new Questions()
                .normal("x")
                .mean("exp(x)")
                .ask(new Estimand.Quantile(.9), "exp(x)")
                .build();
    }

    private static Trace byWorkers(Recipe recipe, Stop stop) throws InterruptedException, ExecutionException {
        try (var workers = new Workers(3)) {
            var run = new LaneRun(recipe, stop, workers);
            while (!run.finished()) {
                run.advance(0);
            }
            return run.trace();
        }
    }

    private record Said(double estimate, double standardError, Interval interval) {}

    /// All but the band, which keeps what was said at earlier looks.
    private static List<Said> said(Trace trace) {
        return trace.last().orElseThrow().answers().stream()
                .map(answer -> new Said(answer.estimate(), answer.standardError(), answer.interval()))
                .toList();
    }

    /// What one thread makes by itself is what workers make, to the last bit.
    @Test
    void aRepetitionIsARun() throws InterruptedException, ExecutionException {
        for (Points points : List.of(new Independent(), new Antithetic(), new ScrambledSobol(16, Scrambling.NESTED))) {
            var recipe = Recipe.of(question(), Lane.of("A", Scheme.of(points)), SEED, Purpose.REHEARSAL)
                    .repeated(SEED, Purpose.REHEARSAL, 7);
            var stop = new Stop(3000, OptionalDouble.empty());
            var alone = LaneRun.alone(recipe, stop, () -> false).orElseThrow();
            var workers = byWorkers(recipe, stop);
            assertEquals(1, alone.marks().size());
            assertEquals(said(workers), said(alone));
            assertEquals(
                    workers.last().orElseThrow().draws(),
                    alone.last().orElseThrow().draws());
            assertEquals(workers.stopReason(), alone.stopReason());
            var other = recipe.repeated(SEED, Purpose.REHEARSAL, 8);
            assertNotEquals(
                    alone.last().orElseThrow().answers().getFirst().estimate(),
                    LaneRun.alone(other, stop, () -> false)
                            .flatMap(Trace::last)
                            .orElseThrow()
                            .answers()
                            .getFirst()
                            .estimate());
        }
    }

    /// A rule that looks on the way is let look.
    @Test
    void aRuleThatLooksSeesEveryMark() throws InterruptedException, ExecutionException {
        var question = question().to(new Tolerance(OptionalDouble.of(.2), OptionalDouble.empty(), false));
        var recipe = Recipe.of(question, Questions.lane("A"), SEED, Purpose.REHEARSAL);
        var stop = new Stop(
                new StopRule.AnyTime(OptionalLong.empty(), OptionalLong.empty()), 100_000, OptionalDouble.empty());
        var alone = LaneRun.alone(recipe, stop, () -> false).orElseThrow();
        assertEquals(byWorkers(recipe, stop).marks(), alone.marks());
        assertTrue(alone.last().orElseThrow().draws() < 100_000, alone::toString);
    }

    /// What is found before a run is found as in the run of that seed, and kept.
    @Test
    void whatIsFoundBeforeARunStays() {
        var wish = new Adaptation(Way.CROSS_ENTROPY, new TreeSet<>(List.of(0)), Share.of(.1));
        var lane = Lane.of("A", new Scheme(new Independent(), Optional.empty(), List.of(), false, Optional.of(wish)));
        var rare = new Questions().normal("x").probability("x > 4").build();
        var run = Recipe.of(rare, lane, SEED);
        var repeated = Recipe.of(rare, lane, SEED, Purpose.REHEARSAL).repeated(SEED, Purpose.REHEARSAL, 3);
        assertTrue(run.tuned().isPresent());
        assertEquals(run.tuned(), repeated.tuned());
        assertEquals(run.landmarks(), repeated.landmarks());
    }

    @Test
    void isCancelledBetweenBlocks() {
        var recipe = Recipe.of(question(), Questions.lane("A"), SEED, Purpose.REHEARSAL);
        var stop = new Stop(1_000_000_000L, OptionalDouble.empty());
        int[] looks = {0};
        assertEquals(Optional.empty(), LaneRun.alone(recipe, stop, () -> ++looks[0] > 50));
    }
}
