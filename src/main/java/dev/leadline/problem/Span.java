package dev.leadline.problem;

/// A stretch of a text, in UTF-16 units: `from` inclusive, `to` exclusive; empty where something is missing.
public record Span(int from, int to) {
    public Span {
        if (from < 0 || to < from) {
            throw new IllegalArgumentException("span " + from + ".." + to);
        }
    }
}
