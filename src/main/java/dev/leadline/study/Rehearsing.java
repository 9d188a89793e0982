package dev.leadline.study;

import dev.leadline.engine.LaneRun;
import dev.leadline.engine.Recipe;
import dev.leadline.engine.Workers;
import dev.leadline.estimate.Estimand;
import dev.leadline.interval.Student;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.model.Stop;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.reference.Quadrature;
import dev.leadline.reference.ReferenceValue;
import dev.leadline.reference.ReferenceValue.Known;
import dev.leadline.scheme.Repetitions;
import dev.leadline.stream.Purpose;
import dev.leadline.study.RehearsalState.Activity;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Answers;
import dev.leadline.trace.Mark;
import dev.leadline.trace.Rehearsal;
import dev.leadline.trace.Rehearsed;
import dev.leadline.trace.Repetition;
import dev.leadline.trace.Sought;
import dev.leadline.trace.Trace;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.concurrent.CancellationException;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.concurrent.atomic.AtomicReferenceArray;
import java.util.function.Consumer;
import java.util.stream.IntStream;

/// A set-up repeated in the background: question, lane and stop rule as they are, the random numbers of each
/// repetition fresh ones. What is found before a run, as a density to draw from, is found once and kept. Safe
/// for all threads.
///
/// A repetition is made by one thread, so that results do not depend on how many there are. Repetition r of
/// one number of draws starts with the draws of repetition r of another, and does not depend on how many
/// repetitions there are.
///
/// The value they are judged by is the reference value, with its error. Of answers that have none it comes
/// from a run for this purpose, of as many draws as all repetitions together and at least [#LONGER] times
/// those of one: its error then moves a rate less than chance does.
public final class Rehearsing implements AutoCloseable {
    static final int LONGER = 100;

    private static final int MILLISECONDS = 100;

    /// Part of the work that a run for the value sought is taken to be.
    private static final double SEEKING = .5;

    /// Degrees of freedom from which on the t quantile is the normal one.
    private static final double MANY = 1e12;

    private final Question question;
    private final RehearsalPlan plan;
    private final int threads;
    private final Consumer<RehearsalState> listener;
    private final CountDownLatch ended = new CountDownLatch(1);

    private volatile boolean cancelled;
    private volatile RehearsalState state = new RehearsalState(Activity.PREPARING, 0, List.of());
    private volatile Throwable fault;

    /// What one repetition came to.
    private record Made(long draws, boolean met, List<Repetition> answers) {}

    private record SetUp(Stop stop, Recipe recipe) {}

    private Rehearsing(Question question, RehearsalPlan plan, int threads, Consumer<RehearsalState> listener) {
        this.question = question;
        this.plan = plan;
        this.threads = threads;
        this.listener = listener;
    }

    /// Starts at once.
    ///
    /// @param threads workers; the results do not depend on it
    /// @param listener gets newer and newer states from some other thread, some ten a second, the last one
    ///     last; must return soon
    public static Rehearsing start(
            Question question, RehearsalPlan plan, int threads, Consumer<RehearsalState> listener) {
        var rehearsing = new Rehearsing(question, plan, threads, listener);
        Thread.ofPlatform().daemon().name("leadline-rehearsal").start(rehearsing::conduct);
        return rehearsing;
    }

    /// Ends it with the repetitions that have been made.
    public void cancel() {
        cancelled = true;
    }

    public RehearsalState state() {
        return state;
    }

    /// Waits for the last state.
    ///
    /// @throws Refusal where there is no value to judge by, or the lane cannot be run
    /// @throws IllegalStateException where a fault of ours ended it; its cause is the fault
    public RehearsalState await() throws InterruptedException {
        ended.await();
        if (fault instanceof Refusal refusal) {
            throw refusal;
        }
        if (fault != null) {
            throw new IllegalStateException("the rehearsal ended by a fault", fault);
        }
        return state;
    }

    /// Cancels, and waits for the end.
    @Override
    public void close() {
        cancel();
        boolean interrupted = false;
        while (ended.getCount() > 0) {
            try {
                ended.await();
            } catch (InterruptedException _) {
                interrupted = true;
            }
        }
        if (interrupted) {
            Thread.currentThread().interrupt();
        }
    }

    private void conduct() {
        try (var pool = Executors.newFixedThreadPool(
                threads,
                Thread.ofPlatform().daemon().name("leadline-rehearsal-", 1).factory())) {
            publish(Activity.PREPARING, 0, List.of());
            List<SetUp> setUps = plan.stops().stream()
                    .map(stop -> new SetUp(stop, recipe(plan.lane(), stop.draws())))
                    .toList();
            long longest = 0;
            for (SetUp setUp : setUps) {
                longest =
                        Math.max(longest, repetition(setUp, 1).map(Made::draws).orElse(0L));
            }
            publish(cancelled ? Activity.CANCELLED : end(setUps, longest, pool), state.done(), state.rehearsals());
        } catch (ExecutionException e) {
            fail(e.getCause());
        } catch (Throwable e) {
            fail(e);
        } finally {
            ended.countDown();
        }
    }

    private Activity end(List<SetUp> setUps, long longest, ExecutorService pool)
            throws InterruptedException, ExecutionException {
        Optional<List<Sought>> sought = sought(longest);
        if (sought.isEmpty()) {
            return Activity.CANCELLED;
        }
        List<Rehearsal> all = new ArrayList<>();
        double seeking = state.done();
        double draws =
                setUps.stream().mapToDouble(setUp -> setUp.stop().draws()).sum();
        double repeated = 0;
        for (SetUp setUp : setUps) {
            repeat(
                    setUp,
                    sought.get(),
                    all,
                    seeking + (1 - seeking) * repeated / draws,
                    (1 - seeking) * setUp.stop().draws() / draws,
                    pool);
            repeated += setUp.stop().draws();
        }
        return cancelled ? Activity.CANCELLED : Activity.FINISHED;
    }

    private Recipe recipe(Lane lane, long draws) {
        return Recipe.of(question, lane.within(draws), plan.seed(), Purpose.REHEARSAL);
    }

    /// @param r from 1
    private Optional<Made> repetition(SetUp setUp, int r) {
        var repeated = setUp.recipe().repeated(plan.seed(), Purpose.REHEARSAL, r);
        return LaneRun.alone(repeated, setUp.stop(), () -> cancelled)
                .filter(trace -> trace.last().isPresent())
                .map(this::made);
    }

    private Made made(Trace trace) {
        Mark mark = trace.last().orElseThrow();
        boolean met = question.tolerance()
                .filter(tolerance ->
                        trace.course().isMet(tolerance, mark.answers().getFirst()))
                .isPresent();
        return new Made(
                mark.draws(),
                met,
                mark.answers().stream()
                        .map(answer -> Repetition.of(answer, trace.course().judged()))
                        .toList());
    }

    /// @param all rehearsals so far, to which this one is added
    /// @param before part of all repetitions that is done
    /// @param share part of all repetitions that these are
    private void repeat(
            SetUp setUp, List<Sought> sought, List<Rehearsal> all, double before, double share, ExecutorService pool)
            throws InterruptedException, ExecutionException {
        int wanted = plan.repetitions();
        var made = new AtomicReferenceArray<Made>(wanted);
        var next = new AtomicInteger();
        List<Future<?>> workers = new ArrayList<>();
        for (int t = 0; t < threads; t++) {
            workers.add(pool.submit(() -> {
                try {
                    for (int r = next.getAndIncrement(); r < wanted && !cancelled; r = next.getAndIncrement()) {
                        made.set(r, repetition(setUp, r + 1).orElse(null));
                    }
                } catch (Throwable e) {
                    cancelled = true; // what the others do is in vain
                    throw e;
                }
            }));
        }
        for (Future<?> worker : workers) {
            while (!isDone(worker)) {
                double part = Math.min(1, (double) next.get() / wanted);
                publish(Activity.REPEATING, before + share * part, and(all, setUp, sought, made));
            }
        }
        all.addAll(and(List.of(), setUp, sought, made));
        publish(Activity.REPEATING, before + share, all);
    }

    private static boolean isDone(Future<?> worker) throws InterruptedException, ExecutionException {
        try {
            worker.get(MILLISECONDS, TimeUnit.MILLISECONDS);
            return true;
        } catch (TimeoutException _) {
            return false;
        }
    }

    /// With the repetitions that have no gap before them.
    private List<Rehearsal> and(
            List<Rehearsal> all, SetUp setUp, List<Sought> sought, AtomicReferenceArray<Made> slots) {
        List<Made> made = new ArrayList<>();
        for (int r = 0; r < slots.length() && slots.get(r) != null; r++) {
            made.add(slots.get(r));
        }
        if (made.isEmpty()) {
            return all;
        }
        var answers = IntStream.range(0, sought.size())
                .mapToObj(k -> new Rehearsed(
                        question.asks().get(k),
                        Answers.level(question),
                        sought.get(k),
                        made.stream().map(one -> one.answers().get(k)).toList()))
                .toList();
        List<Rehearsal> with = new ArrayList<>(all);
        with.add(new Rehearsal(
                plan.lane().name(),
                setUp.recipe().lane().scheme().inWords(),
                setUp.stop().draws(),
                made.stream().mapToLong(Made::draws).average().orElseThrow(),
                plan.repetitions(),
                question.tolerance(),
                (int) made.stream().filter(Made::met).count(),
                answers));
        return with;
    }

    /// The values that repetitions are judged by; empty where cancelled.
    ///
    /// @param longest draws of a repetition
    private Optional<List<Sought>> sought(long longest) throws InterruptedException, ExecutionException {
        Optional<Sought> stated =
                known().map(reference -> new Sought(reference.value(), reference.error(), reference.source(), 0));
        if (stated.isPresent() && question.asks().size() == 1) {
            return Optional.of(List.of(stated.get()));
        }
        publish(Activity.SEEKING, 0, List.of());
        int times = Math.max(LONGER, plan.repetitions());
        long draws = Math.min(Math.multiplyExact((long) times, longest), Stop.MOST_DRAWS);
        Optional<Mark> mark = precise(longer(plan.lane(), times), draws);
        return mark.map(found -> IntStream.range(0, question.asks().size())
                .mapToObj(k -> k == 0 && stated.isPresent()
                        ? stated.get()
                        : sought(found.answers().get(k), found.draws()))
                .toList());
    }

    private Optional<Known> known() {
        try {
            return Quadrature.found(question, () -> cancelled).flatMap(ReferenceValue::known);
        } catch (CancellationException _) {
            return Optional.empty();
        }
    }

    private Optional<Mark> precise(Lane lane, long draws) throws InterruptedException, ExecutionException {
        try (var workers = new Workers(threads)) {
            var run = new LaneRun(recipe(lane, draws), RehearsalPlan.fixed(draws), workers);
            while (!run.finished() && !cancelled) {
                if (run.advance(0)) {
                    publish(Activity.SEEKING, SEEKING * Math.min(1, (double) run.draws() / draws), List.of());
                }
            }
            workers.cancel();
            return cancelled ? Optional.empty() : run.trace().last();
        }
    }

    /// Of splitting the number of repetitions, not of draws, makes it longer.
    private static Lane longer(Lane lane, int times) {
        var scheme = lane.scheme();
        if (!(scheme.points() instanceof Repetitions points) || points.most().isEmpty()) {
            return lane;
        }
        var more = new Repetitions(points.splitting(), OptionalInt.of((int)
                Math.min((long) points.most().getAsInt() * times, Integer.MAX_VALUE)));
        return new Lane(lane.name(), scheme.with(more), lane.shares(), lane.working());
    }

    private Sought sought(Answer answer, long draws) {
        boolean isNoHit = answer.estimand() instanceof Estimand.Probability && answer.estimate() == 0;
        double z = Student.quantile(MANY, answer.interval().level());
        double error =
                Double.isNaN(answer.standardError()) ? answer.interval().halfWidth() / z : answer.standardError();
        if (isNoHit || !Double.isFinite(answer.estimate()) || !Double.isFinite(error)) {
            throw new Refusal(Problem.of(String.format(
                            Locale.ROOT,
                            "there is no value to judge by: %,d draws made for it have %s",
                            draws,
                            isNoHit ? "no hit" : "no answer with an interval"))
                    .because("A rehearsal counts how often the interval holds the value sought.")
                    .tryThis("State a reference value, or make more draws in each repetition."));
        }
        return new Sought(
                answer.estimate(),
                error,
                String.format(Locale.ROOT, "a run of %,d draws made for it, seed %d", draws, plan.seed()),
                draws);
    }

    private void fail(Throwable cause) {
        fault = cause;
        publish(Activity.FAILED, state.done(), state.rehearsals());
    }

    private void publish(Activity activity, double done, List<Rehearsal> rehearsals) {
        state = new RehearsalState(activity, done, rehearsals);
        listener.accept(state);
    }
}
