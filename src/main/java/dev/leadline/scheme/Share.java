package dev.leadline.scheme;

/// Of how many observations how many are drawn from the inputs' own densities.
///
/// @param nominal 0 for none
/// @param of at least 1
public record Share(int nominal, int of) {
    /// Most observations that a share may speak of: it is a whole number of hundredths at finest.
    public static final int FINEST = 100;

    public static final Share NONE = new Share(0, 1);

    /// The share as the simplest fraction of at most [#FINEST] parts.
    ///
    /// @throws IllegalArgumentException where it is none
    public static Share of(double value) {
        for (int of = 1; of <= FINEST; of++) {
            int nominal = (int) Math.rint(value * of);
            if (nominal >= 0 && nominal < of && Math.abs(value * of - nominal) < 1e-9) {
                return new Share(nominal, of);
            }
        }
        throw new IllegalArgumentException("share " + value);
    }

    public double value() {
        return (double) nominal / of;
    }
}
