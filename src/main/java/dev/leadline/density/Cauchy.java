package dev.leadline.density;

import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

/// The Cauchy density. It has neither mean nor variance; it is Student's density of 1 degree of freedom.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Johnson, Kotz and Balakrishnan, Continuous Univariate Distributions, chapter 16. From memory.
public record Cauchy(double location, double scale) implements Renamed {
    private static final Entry ENTRY = Entry.of(
            v -> new Cauchy(v[0], v[1]),
            finite("location", "middle value; there is no mean"),
            positive("scale", "half of the width at half the height", "The Cauchy density divides by its scale.")
                    .tryThis("For a fixed value use a constant."));

    static final Family FAMILY = new Described(
                    "cauchy", "resonance lines; the ratio of two normal values with mean 0; the heaviest tails", ENTRY)
            .enteredBy(ByQuantiles.ofLocationAndScale(v -> new Cauchy(v[0], v[1])));

    public Cauchy {
        ENTRY.check(location, scale);
    }

    @Override
    public Student member() {
        return new Student(1, location, scale);
    }
}
