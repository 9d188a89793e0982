package dev.leadline.planted.problem;

/// Named after nothing.
final class TextUtil {}
