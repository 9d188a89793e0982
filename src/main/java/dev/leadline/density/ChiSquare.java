package dev.leadline.density;

import static dev.leadline.density.Rule.between;

/// The chi-square density: the sum of the squares of `dof` standard normal values. It is the gamma density of shape
/// `dof / 2` and scale 2.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Johnson, Kotz and Balakrishnan, Continuous Univariate Distributions, chapter 18. From memory.
public record ChiSquare(double dof) implements Renamed {
    private static final Entry ENTRY = Entry.of(
            v -> new ChiSquare(v[0]),
            between(
                    0.2,
                    1e6,
                    "dof",
                    "degrees of freedom; the mean",
                    "Beyond these limits its values are too far apart or too close for numbers of 16 digits."));

    static final Family FAMILY =
            new Described("chi-square", "sums of squares; a variance seen in few readings; misfit of a model", ENTRY);

    public ChiSquare {
        ENTRY.check(dof);
    }

    @Override
    public Gamma member() {
        return new Gamma(0.5 * dof, 2);
    }
}
