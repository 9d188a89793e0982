package dev.leadline.desktop.background;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.concurrent.Callable;
import java.util.function.Consumer;

/// Holds work until the test says that it is done; everything happens on the test's thread.
public final class HeldBackground implements Background {
    private final Deque<Runnable> held = new ArrayDeque<>();

    @Override
    public <T> void run(Callable<T> work, Consumer<T> onResult, Consumer<Throwable> onFailure) {
        held.add(() -> {
            T result;
            try {
                result = work.call();
            } catch (Throwable failure) {
                onFailure.accept(failure);
                return;
            }
            onResult.accept(result);
        });
    }

    @Override
    public <T> Consumer<T> latest(Consumer<T> show) {
        return new Latest<>(show);
    }

    private final class Latest<T> implements Consumer<T> {
        private final Consumer<T> show;
        private T newest;

        Latest(Consumer<T> show) {
            this.show = show;
        }

        @Override
        public void accept(T value) {
            boolean waiting = newest != null;
            newest = value;
            if (!waiting) {
                held.add(() -> {
                    T shown = newest;
                    newest = null;
                    show.accept(shown);
                });
            }
        }
    }

    public int waiting() {
        return held.size();
    }

    public void finishNext() {
        held.remove().run();
    }

    /// Also what that work starts.
    public void finishAll() {
        while (!held.isEmpty()) {
            finishNext();
        }
    }
}
