package dev.leadline.density;

import dev.leadline.problem.Refusal;
import java.util.List;
import java.util.function.BooleanSupplier;

/// The mean of a function of independent variables, by a deterministic rule.
///
/// Each variable runs over `s`, with `e^-|s| / 2` the probability beyond it in its tail, to 4.5e-36 in
/// infinite tails; discrete ones are summed. Over s, panels of Gauss and Kronrod's rules are halved until
/// the two agree; over two continuous variables, one inside the other. Three or four are integrated over
/// their normal scores by [Genz and Malik's rules][Cubature]. The probability of an event is integrated over
/// all variables but one, along which it is [known][Crossings]: it has no jump left.
///
/// The error is how far two rules differ in all panels or boxes, ten times or twice, with the errors of inner
/// integrals and what the rest of the tails may hold as they fall; at least the tolerance that was aimed
/// at, since two rules may agree by accident. It is a bound wherever the function is looked at: on 110
/// integrands and events with a known mean, with kinks, jumps and heavy tails, and on 798 jumps and kinks in all
/// places, it never was too small (`ExpectationTest`). A part narrower than the distance of all points
/// stays unseen, as with any rule: with one variable about 1/50 of a standard deviation near the middle,
/// 1/10 with two, 1/5 with more.
///
/// @param error bound of the error of the mean
/// @param deviation about the standard deviation of the function; infinite where it seems to have none
/// @param size about the mean size of the function
/// @param tails what of the error lies in ends of variables that were not looked at
/// @param evaluations of the function
public record Expectation(double mean, double error, double deviation, double size, double tails, long evaluations) {
    /// Continuous variables at most.
    public static final int MOST_LINES = 4;

    /// A function of several variables, for a block of points.
    @FunctionalInterface
    public interface Integrand {
        /// Rows in a block at most.
        int BLOCK = 1024;

        /// @param x one array for each variable
        /// @param z filled with `n` values
        void fill(double[][] x, double[] z, int n);
    }

    /// How long to look.
    ///
    /// @param evaluations of the function after which it ends, or soon after
    /// @param undefined share of the evaluations that may have no finite value, as at a pole
    /// @param cancelled asked now and then, on the thread that computes
    public record Limit(long evaluations, double undefined, BooleanSupplier cancelled) {
        public static Limit of(long evaluations) {
            return new Limit(evaluations, 0, () -> false);
        }
    }

    /// @throws Refusal where a value that can be drawn is not finite, or there are too many values
    /// @throws java.util.concurrent.CancellationException where cancelled
    public static Expectation of(List<Density> densities, Integrand function, Limit limit) {
        return new Integration(densities, function, false, limit).whole();
    }

    /// The probability of an event.
    ///
    /// @param score above 0 where it is true, below 0 where it is not
    /// @throws Refusal where the score of values that can be drawn is no number, or the event is true at no point
    ///     that was looked at, or there are too many values
    /// @throws java.util.concurrent.CancellationException where cancelled
    public static Expectation ofEvent(List<Density> densities, Integrand score, Limit limit) {
        return new Integration(densities, score, true, limit).whole();
    }
}
