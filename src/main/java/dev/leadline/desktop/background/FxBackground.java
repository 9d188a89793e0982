package dev.leadline.desktop.background;

import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.ScheduledExecutorService;
import java.util.concurrent.ThreadFactory;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicReference;
import java.util.function.Consumer;
import javafx.application.Platform;

/// The only door to the FX thread. Safe for all threads.
public final class FxBackground implements Background {
    private static final long TURN_NANOS = TimeUnit.SECONDS.toNanos(1) / 30;

    private final ExecutorService workers = Executors.newCachedThreadPool(daemons());
    private final ScheduledExecutorService turns = Executors.newSingleThreadScheduledExecutor(daemons());

    @Override
    public <T> void run(Callable<T> work, Consumer<T> onResult, Consumer<Throwable> onFailure) {
        workers.execute(() -> {
            try {
                T result = work.call();
                Platform.runLater(() -> onResult.accept(result));
            } catch (Throwable failure) {
                Platform.runLater(() -> onFailure.accept(failure));
            }
        });
    }

    @Override
    public <T> Consumer<T> latest(Consumer<T> show) {
        var newest = new AtomicReference<T>();
        var lastTurn = new long[] {System.nanoTime() - TURN_NANOS}; // written and read between two turns only
        return value -> {
            if (newest.getAndSet(value) != null) {
                return; // a turn is already on its way and will see this value
            }
            long wait = Math.max(0, lastTurn[0] + TURN_NANOS - System.nanoTime());
            turns.schedule(
                    () -> Platform.runLater(() -> {
                        lastTurn[0] = System.nanoTime();
                        show.accept(newest.getAndSet(null));
                    }),
                    wait,
                    TimeUnit.NANOSECONDS);
        };
    }

    private static ThreadFactory daemons() {
        return work -> {
            var thread = new Thread(work, "window background");
            thread.setDaemon(true);
            return thread;
        };
    }
}
