package dev.leadline.model;

import dev.leadline.scheme.Scheme;

/// One scheme being run under a name.
public record Lane(String name, Scheme scheme) {}
