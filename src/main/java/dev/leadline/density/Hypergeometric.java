package dev.leadline.density;

import static dev.leadline.density.Rule.whole;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.GammaFunction;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Problem;
import java.util.List;
import java.util.stream.Stream;

/// How many marked ones are among those drawn from a population, none drawn twice.
///
/// Nothing drawn, none marked, all drawn and all marked are allowed: then its value is fixed.
///
/// A probability is that of a table of four fields, each the deviance from what would be expected there: exact in its
/// differences, which are whole numbers over the population. Tails are sums from the value outwards.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
public record Hypergeometric(double population, double marked, double drawn) implements WholeNumbers {
    private static final double HALF_LOG_2PI = 0.9189385332046728;

    private static final String TOO_MANY = "Beyond that its tails would take too long; take a binomial density.";

    private static final Entry ENTRY = Entry.of(
                    v -> new Hypergeometric(v[0], v[1], v[2]),
                    whole(1, 1e9, "population", "how many there are", TOO_MANY),
                    whole(0, 1e9, "marked", "how many of them are of the kind that is counted", TOO_MANY),
                    whole(0, 1e9, "drawn", "how many are drawn", TOO_MANY))
            .and(v -> Stream.of(noMore("marked", v[1], v[0]), noMore("drawn", v[2], v[0]))
                    .flatMap(List::stream)
                    .toList());

    static final Family FAMILY = new Described(
            "hypergeometric", "how many faulty ones are in a sample drawn from a lot without putting back", ENTRY);

    public Hypergeometric {
        ENTRY.check(population, marked, drawn);
    }

    private static List<Problem> noMore(String name, double value, double population) {
        return value <= population
                ? List.of()
                : List.of(Rule.problem(
                        name,
                        value,
                        "at most the population, " + Shortest.text(population),
                        "There are no more than that.",
                        ""));
    }

    private double unmarked() {
        return population - marked;
    }

    private double left() {
        return population - drawn;
    }

    @Override
    public double logMass(double k) {
        double excess = ((long) marked * (long) drawn - (long) k * (long) population) / population;
        return margin(marked)
                + margin(unmarked())
                + margin(drawn)
                + margin(left())
                - margin(population)
                - field(k, marked * drawn, excess)
                - field(marked - k, marked * left(), -excess)
                - field(drawn - k, unmarked() * drawn, -excess)
                - field(unmarked() - drawn + k, unmarked() * left(), excess);
    }

    /// What Stirling's formula leaves of `log n!`, less `n log n - n`.
    private static double margin(double n) {
        return n == 0 ? 0 : 0.5 * Log.log(n) + HALF_LOG_2PI + GammaFunction.stirlingError(n);
    }

    /// The same, and how far the field is from what is expected.
    private double field(double n, double margins, double excess) {
        double expected = margins / population;
        return n == 0 ? expected : margin(n) + Deviance.of(n, expected, excess);
    }

    @Override
    public double upTo(double k) {
        return k <= mean() ? Exp.exp(logMass(k)) * sumDown(k) : 1 - beyond(k);
    }

    @Override
    public double beyond(double k) {
        return k + 1 >= mean() ? Exp.exp(logMass(k + 1)) * sumUp(k + 1) : 1 - upTo(k);
    }

    /// `P(X <= k) / P(X = k)`.
    private double sumDown(double k) {
        double sum = 1;
        double term = 1;
        for (double j = k; term > 1e-17 * sum; j--) {
            term *= j * (unmarked() - drawn + j) / ((marked - j + 1) * (drawn - j + 1));
            sum += term;
        }
        return sum;
    }

    /// `P(X >= k) / P(X = k)`.
    private double sumUp(double k) {
        double sum = 1;
        double term = 1;
        for (double j = k; term > 1e-17 * sum; j++) {
            term *= (marked - j) * (drawn - j) / ((j + 1) * (unmarked() - drawn + j + 1));
            sum += term;
        }
        return sum;
    }

    @Override
    public double mean() {
        return marked * drawn / population;
    }

    @Override
    public double variance() {
        return support().low() == support().high()
                ? 0
                : mean() * (unmarked() / population) * (left() / (population - 1));
    }

    @Override
    public double skewness() {
        if (variance() == 0) {
            return Double.NaN;
        }
        if (population <= 3) {
            return twoValues().skewness();
        }
        double sides = (unmarked() - marked) / population * ((left() - drawn) / (population - 2));
        return sides / Math.sqrt(variance());
    }

    @Override
    public double excessKurtosis() {
        if (variance() == 0) {
            return Double.NaN;
        }
        if (population <= 3) {
            return twoValues().excessKurtosis();
        }
        double n = population;
        double m = marked / n * (unmarked() / n);
        double d = drawn / n * (left() / n);
        double sum = (1 - 1 / n) * (1 + 1 / n - 6 * m - 6 * d) + 6 * m * d * (5 - 6 / n);
        return sum / (m * d) * (n / (n - 2)) / (n - 3);
    }

    /// What a population of two or three comes to.
    private Bernoulli twoValues() {
        return new Bernoulli(mean() - support().low());
    }

    @Override
    public Support support() {
        return new Support(Math.max(0, drawn - unmarked()), Math.min(marked, drawn));
    }
}
