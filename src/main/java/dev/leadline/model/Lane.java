package dev.leadline.model;

import dev.leadline.scheme.Scheme;

/// One scheme being run under a name.
public record Lane(String name, Scheme scheme) {

    /// Lanes of one project at most: their rows are read together.
    public static final int MOST = 4;
}
