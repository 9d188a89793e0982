package dev.leadline.density;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.function.ToDoubleFunction;
import java.util.stream.DoubleStream;

/// A density that is one of several, each with the chance that is its weight.
///
/// Both tails are sums of those of the parts, so they are as accurate as these. Quantiles are searched, to the
/// mass that doubles can tell.
public record Mixture(List<Part> parts) implements Shape {
    /// How far the weights may be from adding up to 1.
    private static final double ROUNDING = 1e-9;

    /// @param weight the chance of this part
    public record Part(double weight, Density density) {}

    public Mixture {
        var problems = problems(parts);
        if (!problems.isEmpty()) {
            throw new Refusal(problems);
        }
        double sum = parts.stream().mapToDouble(Part::weight).sum();
        parts = Math.abs(sum - 1) <= parts.size() * 0x1p-53
                ? List.copyOf(parts)
                : parts.stream()
                        .map(part -> new Part(part.weight / sum, part.density))
                        .toList();
    }

    private static List<Problem> problems(List<Part> parts) {
        if (parts.isEmpty()) {
            return List.of(
                    Problem.of("a mixture has no parts").tryThis("Give at least two densities, each with its weight."));
        }
        var problems = new ArrayList<Problem>();
        for (int i = 0; i < parts.size(); i++) {
            double weight = parts.get(i).weight;
            var place = Place.of("[" + i + "].weight");
            Rule.positive(
                            "the weight of part " + (i + 1),
                            "",
                            "A weight is the chance that a value comes from this part.")
                    .tryThis(weight == 0 ? "Leave the part out." : "")
                    .broken(weight)
                    .ifPresent(problem -> problems.add(problem.at(place)));
        }
        double sum = parts.stream().mapToDouble(Part::weight).sum();
        if (problems.isEmpty() && Math.abs(sum - 1) > ROUNDING) {
            problems.add(Problem.of("the weights add up to " + Shortest.text(sum) + " but must add up to 1")
                    .because("A weight is the chance that a value comes from its part.")
                    .tryThis("Divide each weight by " + Shortest.text(sum) + "."));
        }
        if (parts.stream().map(part -> part.density.isDiscrete()).distinct().count() > 1) {
            problems.add(Problem.of("a mixture has both discrete and continuous parts")
                    .because("Such a density has neither a pdf nor probabilities of separate values alone.")
                    .tryThis("Multiply in the formula by an input that is 0 or 1 (bernoulli)."));
        }
        return problems;
    }

    private double sum(ToDoubleFunction<Density> of) {
        double sum = 0;
        for (var part : parts) {
            sum = Math.fma(part.weight, of.applyAsDouble(part.density), sum);
        }
        return sum;
    }

    @Override
    public double pdf(double x) {
        return sum(density -> density.pdf(x));
    }

    @Override
    public double logPdf(double x) {
        double[] logs = parts.stream()
                .mapToDouble(part -> Log.log(part.weight) + part.density.logPdf(x))
                .toArray();
        double largest = DoubleStream.of(logs).max().orElseThrow();
        if (Double.isNaN(largest) || Double.isInfinite(largest)) {
            return largest;
        }
        double sum = 0;
        for (double log : logs) {
            sum += Exp.exp(log - largest);
        }
        return largest + Log.log(sum);
    }

    @Override
    public double cdf(double x) {
        return Math.min(sum(density -> density.cdf(x)), 1);
    }

    @Override
    public double survival(double x) {
        return Math.min(sum(density -> density.survival(x)), 1);
    }

    @Override
    public double inner(double p) {
        return p <= 0.5 || isDiscrete() ? fromBelow(p) : fromAbove(1 - p);
    }

    @Override
    public double upperInner(double q) {
        return q <= 0.5 || isDiscrete() ? fromAbove(q) : fromBelow(1 - q);
    }

    private double fromBelow(double p) {
        var ends = ends(density -> density.quantile(p));
        if (ends.low() == ends.high()) {
            return ends.low();
        }
        double x = Root.between(ends.low(), ends.high()).rising(this::cdf, this::slope, p);
        return isDiscrete() ? value(x) : x;
    }

    /// The least value that leaves at most q above it; where values are continuous, searched from above.
    private double fromAbove(double q) {
        var ends = ends(density -> density.upperQuantile(q));
        if (ends.low() == ends.high()) {
            return ends.low();
        }
        var root = Root.between(ends.low(), ends.high());
        return isDiscrete()
                ? value(root.rising(x -> survival(x) <= q ? 1 : 0, _ -> 0, 1))
                : root.falling(this::survival, x -> -pdf(x), q);
    }

    /// The value of a part at `x`, or just below.
    private double value(double x) {
        return -least(density -> -Atoms.upTo(density, x));
    }

    private double slope(double x) {
        return isDiscrete() ? 0 : pdf(x);
    }

    private Support ends(ToDoubleFunction<Density> of) {
        var all = parts.stream()
                .mapToDouble(part -> of.applyAsDouble(part.density))
                .summaryStatistics();
        return new Support(all.getMin(), all.getMax());
    }

    @Override
    public double mean() {
        return sum(Density::mean);
    }

    @Override
    public double variance() {
        double mean = mean();
        return Double.isFinite(mean)
                ? sum(density -> {
                    double d = density.mean() - mean;
                    return density.variance() + d * d;
                })
                : Math.abs(mean);
    }

    @Override
    public double skewness() {
        double mean = mean();
        double sd = Math.sqrt(variance());
        return Double.isFinite(sd) && tailOrders().least() > 3
                ? sum(density -> {
                    double s = Math.sqrt(density.variance()) / sd;
                    double d = (density.mean() - mean) / sd;
                    return s * s * (s * density.skewness() + 3 * d) + d * d * d;
                })
                : Shape.super.skewness();
    }

    @Override
    public double excessKurtosis() {
        double mean = mean();
        double sd = Math.sqrt(variance());
        if (!Double.isFinite(sd)) {
            return Double.NaN;
        }
        if (!(tailOrders().least() > 4)) {
            return Double.POSITIVE_INFINITY;
        }
        return sum(density -> {
                    double s = Math.sqrt(density.variance()) / sd;
                    double d = (density.mean() - mean) / sd;
                    double fourth = s * s * (density.excessKurtosis() + 3) + 4 * s * density.skewness() * d + 6 * d * d;
                    return s * s * fourth + d * d * d * d;
                })
                - 3;
    }

    /// Those of the heaviest parts.
    @Override
    public TailOrders tailOrders() {
        return new TailOrders(
                least(density -> density.tailOrders().lower()),
                least(density -> density.tailOrders().upper()));
    }

    private double least(ToDoubleFunction<Density> of) {
        return parts.stream()
                .mapToDouble(part -> of.applyAsDouble(part.density))
                .min()
                .orElseThrow();
    }

    @Override
    public boolean isDiscrete() {
        return parts.getFirst().density.isDiscrete();
    }

    @Override
    public Support support() {
        return new Support(
                least(density -> density.support().low()),
                -least(density -> -density.support().high()));
    }

    /// In units of the part of the largest weight, so that mixtures that differ by a shift and a scale share a table.
    @Override
    public Standardised standardised() {
        var unit = parts.stream()
                .max(Comparator.comparingDouble(Part::weight))
                .orElseThrow()
                .density
                .standardised();
        double scale = Math.abs(unit.scale());
        if (isDiscrete()) {
            return new Standardised(this, 0, 1);
        }
        var shape = new Mixture(parts.stream()
                .map(part -> new Part(part.weight, in(part.density.standardised(), unit.location(), scale)))
                .toList());
        return new Standardised(shape, unit.location(), scale);
    }

    private static Density in(Standardised part, double location, double scale) {
        double shift = (part.location() - location) / scale;
        double relative = part.scale() / scale;
        return shift == 0 && relative == 1 ? part.shape() : new Shifted(part.shape(), shift, relative);
    }
}
