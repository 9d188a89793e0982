package dev.leadline.study;

import java.util.List;

/// What a study has shown so far, a row for each lane. Immutable: each newer state replaces the last.
public record StudyState(Activity activity, List<LaneState> lanes) {
    public enum Activity {
        RUNNING,
        PAUSED,
        FINISHED
    }

    public StudyState {
        lanes = List.copyOf(lanes);
    }
}
