package dev.leadline.engine;

/// An item of work: draws that one worker makes and accumulates in one go.
///
/// @param index from 0; with question, scheme, seed and purpose it decides every bit of the result
/// @param firstDraw index in the lane of its first draw
/// @param draws how many it has
public record Item(long index, long firstDraw, int draws) {
    /// Its first `count` draws, where a run ends inside it.
    Item first(long count) {
        return count < draws ? new Item(index, firstDraw, (int) count) : this;
    }
}
