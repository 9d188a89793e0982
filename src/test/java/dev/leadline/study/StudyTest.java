package dev.leadline.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.engine.Look;
import dev.leadline.engine.Questions;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.study.StudyState.Activity;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Mark;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.OptionalDouble;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.atomic.AtomicReference;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class StudyTest {
    private static final Question QUESTION = new Questions()
            .uniform("x", 0, 1)
            .normal("z")
            .mean("x*exp(z)")
            .probability("x + z > 2")
            .build();

    private static List<List<Answer>> answers(StudyState state) {
        return state.lanes().getFirst().trace().marks().stream()
                .map(Mark::answers)
                .toList();
    }

    private static StudyState run(Question question, Plan plan, int threads) throws InterruptedException {
        try (var study = Study.start(question, plan, threads, _ -> {})) {
            return study.await();
        }
    }

    @ParameterizedTest(name = "{0} threads")
    @ValueSource(ints = {1, 2, 3, 8})
    void sameBitsOnAnyNumberOfThreads(int threads) throws InterruptedException {
        var plan = Questions.plan(700_001, 5);
        var one = run(QUESTION, plan, 1);
        assertEquals(answers(one), answers(run(QUESTION, plan, threads)));
        assertEquals(
                700_001, one.lanes().getFirst().trace().last().orElseThrow().draws());
    }

    @Test
    void sameBitsAfterPauseAndResume() throws InterruptedException {
        var plan = Questions.plan(3_000_000, 5);
        var whole = run(QUESTION, plan, 2);
        var study = new AtomicReference<Study>();
        var started = new CountDownLatch(1);
        var paused = new CountDownLatch(1);
        var seen = Collections.synchronizedList(new ArrayList<StudyState>());
        study.set(Study.start(QUESTION, plan, 2, state -> {
            seen.add(state);
            try {
                started.await();
            } catch (InterruptedException e) {
                throw new IllegalStateException(e);
            }
            if (state.activity() == Activity.RUNNING && paused.getCount() == 1) {
                study.get().pause();
            }
            if (state.activity() == Activity.PAUSED) {
                paused.countDown();
            }
        }));
        started.countDown();
        paused.await();
        int before = seen.size();
        assertEquals(Activity.PAUSED, study.get().state().activity());
        study.get().resume();
        assertEquals(answers(whole), answers(study.get().await()));
        assertTrue(seen.size() > before);
        study.get().close();
    }

    @Test
    void aLongerRunGoesOnWhereAShorterOneStopped() throws InterruptedException {
        var shorter = answers(run(QUESTION, Questions.plan(100_000, 5), 2));
        var longer = answers(run(QUESTION, Questions.plan(200_000, 5), 2));
        assertEquals(shorter.subList(0, shorter.size() - 1), longer.subList(0, shorter.size() - 1));
    }

    @Test
    void stoppedByHandEndsOnAMarkOfWholeItems() throws InterruptedException {
        var study = new AtomicReference<Study>();
        var started = new CountDownLatch(1);
        study.set(Study.start(QUESTION, Questions.plan(1_000_000_000_000L, 5), 2, state -> {
            try {
                started.await();
            } catch (InterruptedException e) {
                throw new IllegalStateException(e);
            }
            if (state.lanes().stream().anyMatch(lane -> lane.trace().marks().size() > 50)) {
                study.get().stop();
            }
        }));
        started.countDown();
        var state = study.get().await();
        var trace = state.lanes().getFirst().trace();
        assertEquals("stopped by hand", trace.stopReason().orElseThrow());
        long draws = trace.last().orElseThrow().draws();
        var again = run(QUESTION, Questions.plan(draws, 5), 1);
        assertEquals(answers(state).getLast(), answers(again).getLast());
    }

    @Test
    void aTimeLimitEndsTheRun() throws InterruptedException {
        var plan = new Plan(new Stop(1_000_000_000_000L, OptionalDouble.of(.05)), 5, List.of(Questions.lane("A")));
        var trace = run(QUESTION, plan, 2).lanes().getFirst().trace();
        assertEquals("time used up", trace.stopReason().orElseThrow());
        assertTrue(trace.last().orElseThrow().draws() >= 64);
    }

    @Test
    void lanesTakeTurnsOnTheirOwnNumbers() throws InterruptedException {
        var both = new Plan(
                new Stop(100_000, OptionalDouble.empty()), 5, List.of(Questions.lane("A"), Questions.lane("B")));
        var state = run(QUESTION, both, 2);
        var alone = run(QUESTION, Questions.plan(100_000, 5), 2);
        assertEquals(answers(alone), answers(state));
        var a = state.lanes().get(0).trace().last().orElseThrow().answers();
        var b = state.lanes().get(1).trace().last().orElseThrow().answers();
        assertTrue(a.getFirst().estimate() != b.getFirst().estimate());
    }

    @Test
    void severalAnswersShareTheLevel() throws InterruptedException {
        var state = run(QUESTION, Questions.plan(1_000, 5), 1);
        for (var answer : answers(state).getLast()) {
            assertEquals(.975, answer.interval().level(), 1e-15);
        }
    }

    @Test
    void aFaultInTheListenerEndsTheRun() throws InterruptedException {
        try (var study = Study.start(QUESTION, Questions.plan(1_000_000, 5), 2, state -> {
            if (!state.lanes().isEmpty() && state.activity() == Activity.RUNNING) {
                throw new IllegalArgumentException("planted");
            }
        })) {
            var fault = assertThrows(IllegalStateException.class, study::await);
            assertEquals("planted", fault.getCause().getMessage());
            assertEquals(Activity.FAILED, study.state().activity());
        }
    }

    @Test
    void failuresHaveTheInputsThatNoFormulaReads() throws InterruptedException {
        var question = new Questions()
                .uniform("unread", 5, 6)
                .uniform("x", -1, 1)
                .mean("log(x)")
                .build();
        try (var study = Study.start(question, Questions.plan(1_000, 7), 1, _ -> {})) {
            var failures = study.await().lanes().getFirst().trace().failures();
            assertEquals(20, failures.size());
            for (var failure : failures) {
                var look = Look.at(question, Questions.lane("A"), 7, failure.draw());
                assertEquals(look.inputs(), failure.inputs());
            }
        }
    }
}
