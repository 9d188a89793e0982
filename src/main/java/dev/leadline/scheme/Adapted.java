package dev.leadline.scheme;

/// Another density for the points of a lane than the uniform one: still to be found, or found.
public sealed interface Adapted permits Adaptation, Tuned {
    /// As `adapted by cross-entropy`.
    String inWords();
}
