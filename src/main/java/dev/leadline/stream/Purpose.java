package dev.leadline.stream;

/// What random numbers are drawn for; numbers of different purposes are independent.
public enum Purpose {
    /// Draws that enter a result.
    RUN
}
