package dev.leadline.study;

import dev.leadline.ground.Ground;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;

/// What one lane has shown, and what follows from it. Safe for all threads.
///
/// What follows is found when somebody looks: a run shows thousands of states, and most are never looked at.
public final class LaneState {
    private final Trace trace;
    private final Supplier<List<Ground>> judged;
    private final Supplier<Optional<Left>> foreseen;

    /// `null` until somebody looks; whoever looks first judges, and all find the same.
    private volatile List<Ground> grounds;

    /// Likewise.
    private volatile Optional<Left> left;

    /// @param judged the grounds that follow from the trace
    /// @param foreseen what is likely still to come
    LaneState(Trace trace, Supplier<List<Ground>> judged, Supplier<Optional<Left>> foreseen) {
        this.trace = trace;
        this.judged = judged;
        this.foreseen = foreseen;
    }

    public LaneState(Trace trace, List<Ground> grounds) {
        this(trace, () -> grounds, Optional::empty);
    }

    public Trace trace() {
        return trace;
    }

    /// What the trace says for or against signing: doubts first, strongest first.
    public List<Ground> grounds() {
        if (grounds == null) {
            grounds = List.copyOf(judged.get());
        }
        return grounds;
    }

    /// Draws that the lane is likely still to make; empty where that cannot be said.
    public Optional<Left> left() {
        if (left == null) {
            left = foreseen.get();
        }
        return left;
    }
}
