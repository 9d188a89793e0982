package dev.leadline.interval;

import dev.leadline.numeric.Rounding;
import java.util.Locale;
import java.util.Optional;

/// The limit of a chance of which weighted draws have shown no hit: where no weight is above `1 / share`, a chance
/// `p` gives a hit in a draw with at least `share p`, and n draws miss all with at most `(1 - share p)^n`.
public final class NoHit {
    /// Word of the commands.
    public static final String KIND = "no-hit";

    private static final String ASSUMPTION =
            "No draw weighs more than one over the share of draws from the inputs' own densities.";

    private NoHit() {}

    /// @param n draws that are independent of each other
    /// @param share of the draws that come from the inputs' own densities; 0 for none
    /// @param failed evaluations, each of which may be a hit
    public static Interval of(long n, double share, long failed, double level) {
        String draws = String.format(Locale.ROOT, "no hit in %,d independent draws", n);
        if (failed > 0) {
            return none(
                    level,
                    String.format(Locale.ROOT, "%s, but any of %,d failed evaluations may be one", draws, failed));
        }
        if (share == 0) {
            return none(
                    level,
                    draws + ", and a hit may weigh any amount: without draws from the inputs' own densities"
                            + " (nominalShare) nothing can be said");
        }
        double limit = Math.min(1, -StrictMath.expm1(StrictMath.log(1 - level) / n) / share);
        return new Interval(
                0,
                limit,
                level,
                KIND,
                ASSUMPTION,
                Optional.of("%s, none of which weighs more than %s: below %s with %s one-sided confidence"
                        .formatted(
                                draws, Rounding.atMost(1 / share), Rounding.atMost(limit), Interval.percent(level))));
    }

    private static Interval none(double level, String note) {
        return new Interval(Double.NaN, Double.NaN, level, KIND, ASSUMPTION, Optional.of(note));
    }
}
