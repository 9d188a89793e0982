package dev.leadline.scheme;

/// The points of a lane, item by item. Immutable, safe for all threads.
public interface Layout {
    /// The points of one item of work, a pure function of where it lies.
    Cursor open(Stretch stretch);
}
