package dev.leadline.study;

import dev.leadline.ground.Ground;
import dev.leadline.trace.Trace;
import java.util.List;

/// What one lane has shown, and what that says for or against signing.
///
/// @param grounds doubts first, strongest first
public record LaneState(Trace trace, List<Ground> grounds) {
    public LaneState {
        grounds = List.copyOf(grounds);
    }
}
