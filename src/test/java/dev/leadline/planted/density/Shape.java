package dev.leadline.planted.density;

/// Breaks no rule: what the offender in `numeric` reaches for.
public interface Shape {}
