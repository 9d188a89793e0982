package dev.leadline.density;

import java.util.SequencedMap;

/// A member of a family that says just what is known, and why it is that one.
///
/// @param parameters as the project file has them
/// @param provenance a sentence to be kept with the input
public record Suggestion(String family, SequencedMap<String, Double> parameters, String provenance) {}
