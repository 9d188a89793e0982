package dev.leadline.study;

import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import java.util.function.Consumer;

/// A whole run of all lanes in the background, with live grounds. Safe for all threads.
public final class Study implements AutoCloseable {
    private Study() {}

    /// Starts at once.
    ///
    /// @param threads workers; the results do not depend on it
    /// @param listener gets newer and newer states from some worker thread, the finished one last; must return soon
    public static Study start(Question question, Plan plan, int threads, Consumer<StudyState> listener) {
        throw new UnsupportedOperationException();
    }

    /// Keeps what was computed; [#resume] goes on to the same bits as if nothing had happened.
    public void pause() {
        throw new UnsupportedOperationException();
    }

    public void resume() {
        throw new UnsupportedOperationException();
    }

    /// Ends the run with what has been merged.
    public void stop() {
        throw new UnsupportedOperationException();
    }

    /// Waits for the finished state; throws what a worker threw.
    public StudyState await() throws InterruptedException {
        throw new UnsupportedOperationException();
    }

    public StudyState state() {
        throw new UnsupportedOperationException();
    }

    /// Stops, and waits for the workers to end.
    @Override
    public void close() {
        throw new UnsupportedOperationException();
    }
}
