package dev.leadline.density;

import static dev.leadline.density.Rule.finite;

/// The arcsine density, U-shaped between `from` and `to`: a sine at a random moment. It is the beta density of
/// parameters 1/2 and 1/2.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: JCGM 101:2008, 6.4.6.
public record Arcsine(double from, double to) implements Renamed {
    private static final Entry ENTRY = Entry.of(
                    v -> new Arcsine(v[0], v[1]), finite("from", "least value"), finite("to", "largest value"))
            .and(v -> Uniform.rising("from", v[0], "to", v[1]));

    static final Family FAMILY = new Described(
            "arcsine", "what swings between limits like a sine: temperature cycles, vibration, mains hum", ENTRY);

    public Arcsine {
        ENTRY.check(from, to);
    }

    @Override
    public Beta member() {
        return new Beta(0.5, 0.5, from, to);
    }
}
