package dev.leadline.trace;

import java.util.List;

/// A draw whose evaluation was not finite.
///
/// @param draw its index in the lane, from 0
/// @param inputs its values, in the order of the question's inputs
public record Failure(long draw, List<Double> inputs) {
    public Failure {
        inputs = List.copyOf(inputs);
    }
}
