package dev.leadline.engine;

import dev.leadline.scheme.Stretch;

/// An item of work: draws that one worker makes and accumulates in one go.
///
/// @param stretch where its points lie; with question, scheme, seed and purpose it decides every bit of the result
/// @param firstDraw index in the lane of its first draw
/// @param draws how many it has
public record Item(Stretch stretch, long firstDraw, int draws) {
    /// Its first `count` draws, where a run ends inside it.
    Item first(long count) {
        return count < draws ? new Item(stretch, firstDraw, (int) count) : this;
    }
}
