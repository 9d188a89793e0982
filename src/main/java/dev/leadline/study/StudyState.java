package dev.leadline.study;

import java.util.List;

/// What a study has shown so far, a row for each lane. Immutable: each newer state replaces the last.
///
/// @param lanes in the order of the plan
public record StudyState(Activity activity, List<LaneState> lanes) {
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
    }

    public boolean ended() {
        return switch (activity) {
            case FINISHED, FAILED -> true;
            case PREPARING, RUNNING, PAUSED -> false;
        };
    }
}
