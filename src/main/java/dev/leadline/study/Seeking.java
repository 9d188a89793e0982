package dev.leadline.study;

import dev.leadline.model.Question;
import dev.leadline.reference.Quadrature;
import dev.leadline.reference.ReferenceValue;
import java.util.Optional;
import java.util.concurrent.CancellationException;
import java.util.concurrent.CountDownLatch;

/// The reference of a question, sought on a thread of its own where it takes quadrature. Safe for all threads.
final class Seeking {
    private final Question question;
    private final CountDownLatch ended = new CountDownLatch(1);
    private volatile Optional<ReferenceValue> value;
    private volatile boolean cancelled;
    private volatile Throwable fault;

    Seeking(Question question) {
        this.question = question;
        this.value = ReferenceValue.of(question);
    }

    void start() {
        if (value.filter(ReferenceValue.Sought.class::isInstance).isPresent()) {
            Thread.ofPlatform().daemon().name("leadline-reference").start(this::seek);
        } else {
            ended.countDown();
        }
    }

    private void seek() {
        try {
            value = Optional.of(Quadrature.of(question, () -> cancelled));
        } catch (CancellationException _) {
            value = Optional.of(new ReferenceValue.Unknown("it was stopped before its end"));
        } catch (Throwable thrown) {
            fault = thrown;
        } finally {
            ended.countDown();
        }
    }

    /// As far as it is known.
    Optional<ReferenceValue> value() {
        return value;
    }

    /// Waits for the value, or for the end of a search that was cancelled.
    ///
    /// @throws IllegalStateException where it ended by a fault of ours
    void await() throws InterruptedException {
        ended.await();
        if (fault != null) {
            throw new IllegalStateException("quadrature ended by a fault", fault);
        }
    }

    void cancel() {
        cancelled = true;
    }
}
