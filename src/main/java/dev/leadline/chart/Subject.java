package dev.leadline.chart;

/// What a picture shows of a run: plain data, immutable.
public sealed interface Subject permits Settling, ErrorDecay, Outcomes, Weights, Repeated {
    /// Of the question.
    String title();

    /// The picture in words.
    String caption();
}
