package dev.leadline.density;

import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.DoublePredicate;

/// What one parameter must be, checked so that `NaN` fails. Immutable.
///
/// @param words what it must be, as `greater than 0`
/// @param holds whether a finite value is allowed
/// @param why why it matters; may be empty
/// @param hint what to try; may be empty
/// @param otherwise the value where it is left out; empty where it must be given
record Rule(
        String name,
        String use,
        String words,
        DoublePredicate holds,
        String why,
        String hint,
        OptionalDouble otherwise) {

    /// Any finite number.
    static Rule finite(String name, String use) {
        return new Rule(name, use, "a finite number", _ -> true, "", "", OptionalDouble.empty());
    }

    /// @param why why it must be positive
    static Rule positive(String name, String use, String why) {
        return new Rule(name, use, "greater than 0", v -> v > 0, why, "", OptionalDouble.empty());
    }

    /// @param why why these limits
    static Rule between(double least, double most, String name, String use, String why) {
        String words = "at least " + Shortest.text(least) + " and at most " + Shortest.text(most);
        return new Rule(name, use, words, v -> v >= least && v <= most, why, "", OptionalDouble.empty());
    }

    /// A standard deviation over its mean.
    static Rule cv() {
        return positive("cv", "standard deviation over mean, as a fraction", "Values that do not vary are a constant.")
                .tryThis("10 % is 0.1.");
    }

    /// The mean that a cv is a share of.
    static Rule meanOfCv(String use) {
        return new Rule(
                "mean",
                use,
                "a finite number other than 0",
                v -> v != 0,
                "The cv is a share of the mean.",
                "Give sd instead of cv.",
                OptionalDouble.empty());
    }

    /// @param why why these limits
    static Rule whole(double least, double most, String name, String use, String why) {
        String words = "a whole number, at least " + Shortest.text(least) + " and at most " + Shortest.text(most);
        return new Rule(
                name, use, words, v -> v >= least && v <= most && v == Math.rint(v), why, "", OptionalDouble.empty());
    }

    Rule tryThis(String newHint) {
        return new Rule(name, use, words, holds, why, newHint, otherwise);
    }

    Rule or(double value) {
        return new Rule(name, use, words, holds, why, hint, OptionalDouble.of(value));
    }

    Parameter parameter() {
        String rule =
                otherwise.isPresent() ? words + "; " + Shortest.text(otherwise.getAsDouble()) + " if left out" : words;
        return new Parameter(name, rule, otherwise.isPresent(), use);
    }

    Optional<Problem> broken(double value) {
        if (Double.isFinite(value) && holds.test(value)) {
            return Optional.empty();
        }
        boolean onlyFinite = Double.isInfinite(value) && holds.test(value);
        return Optional.of(problem(name, value, onlyFinite ? "a finite number" : words, why, hint));
    }

    /// The sentence of every refused value.
    static Problem problem(String name, double value, String words, String why, String hint) {
        var said = Problem.of(name + " is " + Shortest.text(value) + " but must be " + words)
                .at(Place.of(name));
        var explained = why.isEmpty() ? said : said.because(why);
        return hint.isEmpty() ? explained : explained.tryThis(hint);
    }

    static String meanWithCv(double mean, double cv) {
        return "mean " + Shortest.text(mean) + " with cv " + Shortest.text(cv);
    }

    static String meanWithSd(double mean, double sd) {
        return "mean " + Shortest.text(mean) + " with sd " + Shortest.text(sd);
    }
}
