package dev.leadline.density;

import java.util.List;

/// A density as typed: a formula in its own variable, up to a factor.
///
/// @param from may be `-∞`
/// @param to may be `∞`
/// @param breaks points inside the range at which it may be infinite, jump or bend; rising
/// @param log whether the formula is the logarithm of the density
public record TypedText(String formula, double from, double to, List<Double> breaks, boolean log) {
    public TypedText {
        breaks = List.copyOf(breaks);
    }
}
