package dev.leadline.scheme;

import dev.leadline.density.Density;
import java.util.Collections;
import java.util.SortedMap;
import java.util.TreeMap;

/// Other densities that inputs are drawn from, and how the draws count.
///
/// @param densities by the index of the input; the others keep their own
/// @param nominal share of the draws that come from the inputs' own densities all the same
/// @param selfNormalised whether the weights are divided by their mean
public record Proposal(SortedMap<Integer, Density> densities, Share nominal, boolean selfNormalised) {
    public Proposal {
        densities = Collections.unmodifiableSortedMap(new TreeMap<>(densities));
    }
}
