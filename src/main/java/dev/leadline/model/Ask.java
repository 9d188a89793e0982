package dev.leadline.model;

import dev.leadline.estimate.Estimand;

/// One thing asked of a question.
///
/// @param formula its text, as written
/// @param label what to call it; empty when not named
public record Ask(Estimand estimand, String formula, String unit, String label) {}
