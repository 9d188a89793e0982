package dev.leadline.study;

import dev.leadline.engine.LaneRun;
import dev.leadline.engine.Recipe;
import dev.leadline.engine.Workers;
import dev.leadline.ground.Grounds;
import dev.leadline.model.Lane;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.stream.Purpose;
import dev.leadline.study.StudyState.Activity;
import dev.leadline.trace.Trace;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.ExecutionException;
import java.util.function.Consumer;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/// A whole run of all lanes in the background, with live grounds. Safe for all threads.
///
/// One conducting thread hands out items and merges them; lanes take turns, the one with the fewest draws first. A
/// reference that is found by quadrature is sought meanwhile, and waited for at the end.
public final class Study implements AutoCloseable {
    /// Nanoseconds at least from one look at a running study to the next: nobody reads faster, and grounds take time.
    /// Marks stand where they stand, looked at or not.
    private static final long BETWEEN_LOOKS = 30_000_000;

    private final Question question;
    private final Plan plan;
    private final Workers workers;
    private final Consumer<StudyState> listener;
    private final CountDownLatch ended = new CountDownLatch(1);
    private long looked;
    private final StopWatch watch = new StopWatch();
    private final Seeking reference;

    private final Object gate = new Object();
    private boolean paused;
    private boolean stopping;

    /// Of each lane, draws that its answers are compared with; they take turns with those of the lanes.
    private List<Optional<LaneRun>> audits = List.of();

    private volatile StudyState state = new StudyState(Activity.PREPARING, List.of(), List.of());
    private volatile Throwable fault;

    private Study(Question question, Plan plan, int threads, Consumer<StudyState> listener) {
        this.question = question;
        this.plan = plan;
        this.workers = new Workers(threads);
        this.listener = listener;
        this.reference = new Seeking(question);
    }

    /// Starts at once.
    ///
    /// @param threads workers; the results do not depend on it
    /// @param listener gets newer and newer states from some other thread, the finished one last; must return soon
    public static Study start(Question question, Plan plan, int threads, Consumer<StudyState> listener) {
        var study = new Study(question, plan, threads, listener);
        Thread.ofPlatform().daemon().name("leadline-study").start(study::conduct);
        return study;
    }

    /// Keeps what was computed; [#resume] goes on to the same bits as if nothing had happened.
    public void pause() {
        synchronized (gate) {
            paused = true;
        }
    }

    public void resume() {
        synchronized (gate) {
            paused = false;
            gate.notifyAll();
        }
    }

    /// Ends the run with what has been merged.
    public void stop() {
        synchronized (gate) {
            stopping = true;
            gate.notifyAll();
        }
        reference.cancel();
        workers.cancel();
    }

    /// Waits for the finished state.
    ///
    /// @throws IllegalStateException where a fault of ours ended the run; its cause is the fault
    public StudyState await() throws InterruptedException {
        ended.await();
        if (fault != null) {
            throw new IllegalStateException("the run ended by a fault", fault);
        }
        return state;
    }

    public StudyState state() {
        return state;
    }

    /// Stops, and waits for the workers to end.
    @Override
    public void close() {
        stop();
        workers.close();
    }

    private void conduct() {
        try (workers) {
            publish(state);
            reference.start();
            var recipes = plan.settled().stream()
                    .map(lane -> Recipe.of(question, lane, plan.seed()))
                    .toList();
            var runs = recipes.stream()
                    .map(recipe -> new LaneRun(recipe, plan.stop(), workers))
                    .toList();
            audits = plan.settled().stream().map(this::audit).toList();
            watch.start();
            run(runs);
            reference.await();
            publish(look(Activity.FINISHED, runs));
        } catch (ExecutionException e) {
            fail(e.getCause());
        } catch (Throwable e) {
            fail(e);
        } finally {
            ended.countDown();
        }
    }

    private Optional<LaneRun> audit(Lane lane) {
        if (lane.audit().isEmpty()) {
            return Optional.empty();
        }
        var recipe = Recipe.of(question, lane.plain(), plan.seed(), Purpose.AUDIT);
        return Optional.of(new LaneRun(recipe, new Stop(lane.audit().getAsLong(), OptionalDouble.empty()), workers));
    }

    private void run(List<LaneRun> runs) throws InterruptedException, ExecutionException {
        publish(look(Activity.RUNNING, runs));
        List<LaneRun> all = Stream.concat(runs.stream(), audits.stream().flatMap(Optional::stream))
                .toList();
        while (true) {
            var next = all.stream().filter(run -> !run.finished()).min(Comparator.comparingLong(LaneRun::draws));
            if (next.isEmpty()) {
                return;
            }
            if (!mayGoOn(runs)) {
                all.forEach(run -> run.stop(watch.seconds()));
                return;
            }
            if (next.get().advance(watch.seconds()) && System.nanoTime() - looked >= BETWEEN_LOOKS) {
                publish(look(Activity.RUNNING, runs));
            }
        }
    }

    /// Waits while paused.
    private boolean mayGoOn(List<LaneRun> runs) throws InterruptedException {
        if (pausing()) {
            watch.pause();
            publish(look(Activity.PAUSED, runs));
            synchronized (gate) {
                while (paused && !stopping) {
                    gate.wait();
                }
            }
            watch.start();
            publish(look(Activity.RUNNING, runs));
        }
        synchronized (gate) {
            return !stopping;
        }
    }

    private boolean pausing() {
        synchronized (gate) {
            return paused && !stopping;
        }
    }

    private StudyState look(Activity activity, List<LaneRun> runs) {
        List<Trace> traces = IntStream.range(0, runs.size())
                .mapToObj(i -> audits.get(i)
                        .map(audit -> runs.get(i).trace().beside(audit.trace()))
                        .orElseGet(() -> runs.get(i).trace())
                        .with(reference.value()))
                .toList();
        return new StudyState(
                activity,
                traces.stream()
                        .map(trace -> new LaneState(
                                trace,
                                () -> Grounds.of(question, trace),
                                () -> Left.draws(question, plan.stop(), trace)))
                        .toList(),
                Comparison.ofFirst(question, plan.settled(), traces));
    }

    private void fail(Throwable cause) {
        fault = cause;
        publish(new StudyState(Activity.FAILED, state.lanes(), state.comparisons()));
    }

    private void publish(StudyState newer) {
        looked = System.nanoTime();
        state = newer;
        listener.accept(newer);
    }
}
