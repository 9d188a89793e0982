package dev.leadline.study;

import dev.leadline.ground.Ground;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.Optional;

/// What one lane has shown, and what that says for or against signing.
///
/// @param grounds doubts first, strongest first
/// @param left draws that it is likely still to make; empty where that cannot be said
public record LaneState(Trace trace, List<Ground> grounds, Optional<Left> left) {
    public LaneState {
        grounds = List.copyOf(grounds);
    }

    public LaneState(Trace trace, List<Ground> grounds) {
        this(trace, grounds, Optional.empty());
    }
}
