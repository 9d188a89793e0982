package dev.leadline.density;

import static dev.leadline.density.Rule.whole;

import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Problem;
import java.util.List;

/// The whole numbers from `from` to `to`, all with the same probability.
///
/// One single number is allowed: then its value is fixed.
public record DiscreteUniform(double from, double to) implements WholeNumbers, ClosedForm {
    private static final double LARGEST = 1e15;
    private static final String WHY = "Beyond that, neighbouring whole numbers are the same to a computer.";

    private static final Entry ENTRY = Entry.of(
                    v -> new DiscreteUniform(v[0], v[1]),
                    whole(-LARGEST, LARGEST, "from", "least value", WHY),
                    whole(-LARGEST, LARGEST, "to", "largest value", WHY))
            .and(v -> ordered(v[0], v[1]));

    static final Family FAMILY =
            new Described("discrete-uniform", "whole numbers that are all as likely: a die, a page, a day", ENTRY);

    public DiscreteUniform {
        ENTRY.check(from, to);
    }

    private static List<Problem> ordered(double from, double to) {
        return to >= from
                ? List.of()
                : List.of(Rule.problem(
                        "to", to, "at least from, " + Shortest.text(from), "The range would be empty.", ""));
    }

    private double count() {
        return to - from + 1;
    }

    @Override
    public double logMass(double k) {
        return -Log.log(count());
    }

    @Override
    public double pdf(double x) {
        return WholeNumbers.super.pdf(x) > 0 ? 1 / count() : WholeNumbers.super.pdf(x);
    }

    @Override
    public double upTo(double k) {
        return (k - from + 1) / count();
    }

    @Override
    public double beyond(double k) {
        return (to - k) / count();
    }

    @Override
    public double near(double z) {
        return z < 0 ? from + count() * NORMAL.cdf(z) : to - count() * NORMAL.survival(z);
    }

    @Override
    public void fill(double[] u, double[] x, int n) {
        double count = count();
        for (int i = 0; i < n; i++) {
            double low = from + Math.ceil(u[i] * count) - 1;
            double high = to - Math.floor((1 - u[i]) * count);
            x[i] = Math.min(Math.max(u[i] <= 0.5 ? low : high, from), to);
        }
    }

    @Override
    public double mean() {
        return 0.5 * from + 0.5 * to;
    }

    @Override
    public double variance() {
        return (count() - 1) * (count() + 1) / 12;
    }

    @Override
    public double skewness() {
        return from == to ? Double.NaN : 0;
    }

    @Override
    public double excessKurtosis() {
        double square = count() * count();
        return from == to ? Double.NaN : -1.2 * (square + 1) / (square - 1);
    }

    @Override
    public Support support() {
        return new Support(from, to);
    }

    /// Beginning at 0, so that ranges of one length share a curve.
    @Override
    public Standardised standardised() {
        return new Standardised(new DiscreteUniform(0, to - from), from, 1);
    }
}
