package dev.leadline.study;

import dev.leadline.trace.Rehearsal;
import java.util.List;

/// What a rehearsal has shown so far. Immutable: each newer state replaces the last.
///
/// @param done part of the work that is done, from 0 to 1
/// @param rehearsals one for each number of draws, in order, as far as they are begun
public record RehearsalState(Activity activity, double done, List<Rehearsal> rehearsals) {
    public enum Activity {
        /// Inversion tables are being built, densities to draw from are found.
        PREPARING,
        /// A longer run makes the value that repetitions are judged by.
        SEEKING,
        REPEATING,
        FINISHED,
        /// Ended before all repetitions were made; those that were are there.
        CANCELLED,
        /// Ended by a refusal, or by a fault of ours; [Rehearsing#await] throws it.
        FAILED
    }

    public RehearsalState {
        rehearsals = List.copyOf(rehearsals);
    }

    public boolean ended() {
        return switch (activity) {
            case FINISHED, CANCELLED, FAILED -> true;
            case PREPARING, SEEKING, REPEATING -> false;
        };
    }
}
