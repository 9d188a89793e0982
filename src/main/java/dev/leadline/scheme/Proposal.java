package dev.leadline.scheme;

import dev.leadline.density.Density;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Collections;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;

/// Other densities that inputs are drawn from, and how the draws count.
///
/// @param densities by the index of the input; the others keep their own
/// @param nominal share of the draws that come from the inputs' own densities all the same
/// @param selfNormalised whether the weights are divided by their mean
/// @param changes what is drawn from what, as `v from gumbel(42, 4)`
public record Proposal(
        SortedMap<Integer, Density> densities, Share nominal, boolean selfNormalised, List<String> changes) {
    public Proposal {
        densities = Collections.unmodifiableSortedMap(new TreeMap<>(densities));
        changes = List.copyOf(changes);
    }

    /// As `v from gumbel(42, 4), 10 % from its own`.
    public String inWords() {
        String own = densities.size() == 1 ? " from its own" : " from their own";
        String share = nominal.nominal() == 0 ? "none" : percent() + " %";
        return String.join(", ", changes)
                + ", "
                + share
                + own
                + (selfNormalised ? ", weights divided by their mean" : "");
    }

    private String percent() {
        return BigDecimal.valueOf(100.0 * nominal.nominal() / nominal.of())
                .round(new MathContext(3))
                .stripTrailingZeros()
                .toPlainString();
    }
}
