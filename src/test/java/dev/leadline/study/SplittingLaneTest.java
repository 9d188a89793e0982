package dev.leadline.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import dev.leadline.engine.Questions;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.Splitting;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;

/// Splitting as a lane: repetitions are items of work, and the answer comes from their replacements.
class SplittingLaneTest {
    private static Trace run(Question question, int repetitions, long draws, long seed, int threads)
            throws InterruptedException {
        var points = new Repetitions(new Splitting(100, 30), OptionalInt.of(repetitions));
        var plan = new Plan(new Stop(draws, OptionalDouble.empty()), seed, List.of(Lane.of("A", Scheme.of(points))));
        try (var study = Study.start(question, plan, threads, _ -> {})) {
            return study.await().lanes().getFirst().trace();
        }
    }

    private static Question fourBranches() {
        return new Questions()
                .normal("x1")
                .normal("x2")
                .probability("min(3 + 0.1*(x1-x2)^2 - (x1+x2)/sqrt(2), 3 + 0.1*(x1-x2)^2 + (x1+x2)/sqrt(2),"
                        + " (x1-x2) + 7/sqrt(2), (x2-x1) + 7/sqrt(2)) <= 0")
                .build();
    }

    private static Answer answer(Trace trace) {
        return trace.last().orElseThrow().answers().getFirst();
    }

    @Test
    void fourBranchesLieWithinTheInterval() throws InterruptedException {
        double exact = ReferenceValues.expected("rare-four-branch", "probability_k7");
        int held = 0;
        for (int seed = 1; seed <= 8; seed++) {
            var answer = answer(run(fourBranches(), 10, 10_000_000, seed, 2));
            held += answer.interval().low() <= exact
                            && exact <= answer.interval().high()
                    ? 1
                    : 0;
            assertEquals(exact, answer.estimate(), 5 * answer.standardError());
        }
        // Binomial: fewer have a chance below 3e-4.
        assertTrue(held >= 5, held + " of 8 intervals hold");
    }

    @Test
    void twoDesignPointsLieWithinTheInterval() throws InterruptedException {
        var question = new Questions()
                .normal("x1")
                .normal("x2")
                .probability("5 - x2 - 0.5*(x1 - 0.1)^2 <= 0")
                .build();
        var answer = answer(run(question, 20, 10_000_000, 3, 2));
        double exact = ReferenceValues.expected("rare-parabolic", "probability");
        assertTrue(
                answer.interval().low() <= exact && exact <= answer.interval().high());
        assertEquals("splitting-student", answer.interval().kind());
        assertEquals(20, answer.observations());
    }

    @Test
    void theBitsDoNotDependOnThreads() throws InterruptedException {
        var one = run(fourBranches(), 12, 10_000_000, 5, 1);
        var three = run(fourBranches(), 12, 10_000_000, 5, 3);
        assertEquals(answer(one), answer(three));
        assertEquals("all repetitions made", one.stopReason().orElseThrow());
        assertEquals(
                one.last().orElseThrow().draws(), three.last().orElseThrow().draws());
    }

    @Test
    void theRepetitionThatPassesTheDrawsIsFinished() throws InterruptedException {
        var trace = run(fourBranches(), 1000, 40_000, 5, 2);
        assertEquals("all draws made", trace.stopReason().orElseThrow());
        long draws = trace.last().orElseThrow().draws();
        assertTrue(draws >= 40_000 && draws < 80_000, draws + " draws");
        assertTrue(answer(trace).interval().note().orElseThrow().contains("at least 10 repetitions"));
    }

    @Test
    void anEventThatCannotHappenHasNoAnswer() throws InterruptedException {
        var question = new Questions().uniform("u", 0, 1).probability("u > 2").build();
        var answer = answer(run(question, 10, 10_000_000, 5, 2));
        assertTrue(Double.isNaN(answer.estimate()));
        assertTrue(answer.interval().note().orElseThrow().contains("may be impossible"));
    }
}
