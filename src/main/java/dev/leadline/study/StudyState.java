package dev.leadline.study;

import java.util.List;

/// What a study has shown so far, a row for each lane. Immutable: each newer state replaces the last.
///
/// @param lanes in the order of the plan
/// @param comparisons of the first lane with each other one, where both have shown something
public record StudyState(Activity activity, List<LaneState> lanes, List<Comparison> comparisons) {
    public enum Activity {
        /// Inversion tables are being built.
        PREPARING,
        RUNNING,
        PAUSED,
        FINISHED,
        /// Ended by a fault of ours; [Study#await] throws it.
        FAILED
    }

    public StudyState {
        lanes = List.copyOf(lanes);
        comparisons = List.copyOf(comparisons);
    }

    public boolean ended() {
        return switch (activity) {
            case FINISHED, FAILED -> true;
            case PREPARING, RUNNING, PAUSED -> false;
        };
    }
}
