package dev.leadline.interval;

import dev.leadline.estimate.Accumulator;
import dev.leadline.numeric.Significant;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalLong;

/// From where on a band that holds in the limit may be looked at: enough draws, enough observations for how
/// skewed they are, and values that differ. No guard sees what was not drawn.
///
/// The rule for skewness is Cochran's (Sampling Techniques, 1977), `n >= 25 G1²`; for zeros and ones, where
/// it would trust the skewness of a few hits, 25 of the rarer kind.
///
/// @param draws at least
/// @param observations at least
/// @param rarer so many of hits or of misses, whichever are rarer, at least
public record Guard(long draws, long observations, long rarer) {
    /// Where each draw is an observation.
    public static final Guard OF_DRAWS = new Guard(1000, 1000, Guard.RARER);

    /// Where an observation is a pass, a pair or a Latin hypercube.
    public static final Guard OF_OBSERVATIONS = new Guard(1000, 30, Guard.RARER);

    /// Of hits, or of misses where they are rarer, unless a project says another number.
    public static final long RARER = 25;

    private static final double COCHRAN = 25;

    /// Observations that skewness asks for.
    public static double observations(double skewness) {
        return COCHRAN * skewness * skewness;
    }

    /// Why it is too early; empty where it is not.
    ///
    /// @param drawn draws made
    /// @param k component of the sums
    public Optional<String> lack(long drawn, Accumulator sums, int k) {
        return lack(drawn, sums.count(), sums.constant(k), sums.skewness(k), sums.hits(k));
    }

    /// Why it is too early; empty where it is not.
    ///
    /// @param drawn draws made
    /// @param observed observations they make
    /// @param constant whether every observation so far is equal
    /// @param skewness of the observations; `NaN` where none can be said
    /// @param hits among the observations, where all are 0 or 1
    public Optional<String> lack(long drawn, long observed, boolean constant, double skewness, OptionalLong hits) {
        if (drawn < draws) {
            return Optional.of(text("%,d draws of at least %,d", drawn, draws));
        }
        if (observed < observations) {
            return Optional.of(text("%,d observations of at least %,d", observed, observations));
        }
        if (hits.isPresent()) {
            long hit = hits.getAsLong();
            long seen = Math.min(hit, observed - hit);
            String name = hit == seen ? "hits" : "misses";
            return seen >= rarer
                    ? Optional.empty()
                    : Optional.of(text("%,d " + name + " of at least %,d", seen, rarer));
        }
        if (constant) {
            return Optional.of("every value seen so far is equal");
        }
        if (!(observed >= observations(skewness))) {
            return Optional.of(
                    Double.isNaN(skewness)
                            ? "the skewness of the values cannot be said"
                            : text(
                                    "%,d observations of at least %,d, 25 times the square of their skewness %s",
                                    observed, (long) Math.ceil(observations(skewness)), Significant.text(skewness, 3)));
        }
        return Optional.empty();
    }

    private static String text(String format, Object... values) {
        return String.format(Locale.ROOT, format, values);
    }
}
