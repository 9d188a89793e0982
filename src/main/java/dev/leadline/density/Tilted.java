package dev.leadline.density;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.DoubleStream;

/// A density times `exp(by x)`, over the mean of that factor: exponential tilting.
///
/// In closed form where the family has one, by the parts of mixtures and of what is shifted, scaled or truncated;
/// value by value where there are finitely many; numerically otherwise ([Integrated]).
///
/// Source: Asmussen and Glynn (2007), Stochastic Simulation, chapter II. Closed forms by hand, checked against
/// quadrature (`TiltedTest`).
///
/// @param logFactor logarithm of the mean of `exp(by x)` under the density that was tilted
public record Tilted(Density density, double logFactor) {
    /// Where a tail is looked at for how fast it falls: so many doublings of the spread away.
    private static final int FAR = 200;

    /// An exponent that falls by less than this share of the tilt's own does not count as falling.
    private static final double LEAST_FALL = 1e-9;

    /// Masses of quantiles that a numerically tilted density may have its peak near.
    private static final double[] PROBES = {1e-200, 1e-50, 1e-12, 1e-6, 1e-3, .05, .25, .5};

    /// @throws Refusal at `tilt`, where the factor has no finite mean
    public static Tilted of(Density density, double by) {
        if (!Double.isFinite(by)) {
            throw new Refusal(Rule.problem("tilt", by, "a finite number", "The density is times exp(tilt x).", ""));
        }
        return by == 0 ? new Tilted(density, 0) : tilted(density, by);
    }

    private static Tilted tilted(Density density, double by) {
        return switch (density) {
            case Normal(double mean, double sd) ->
                new Tilted(new Normal(Math.fma(by * sd, sd, mean), sd), by * mean + 0.5 * (by * sd) * (by * sd));
            case Exponential(double mean, double from) -> {
                double left = left(by, 1 / mean);
                yield new Tilted(new Exponential(mean / left, from), by * from - Log.log(left));
            }
            case Gamma(double shape, double scale) -> {
                double left = left(by, 1 / scale);
                yield new Tilted(new Gamma(shape, scale / left), -shape * Log.log(left));
            }
            case InverseGaussian(double mean, double shape) -> {
                double left = Math.sqrt(left(by, shape / mean / mean / 2));
                yield new Tilted(new InverseGaussian(mean / left, shape), shape / mean * (1 - left));
            }
            case Laplace laplace -> laplace(laplace, by);
            case Poisson(double mean) -> new Tilted(new Poisson(mean * Exp.exp(by)), mean * StrictMath.expm1(by));
            case Bernoulli(double p) -> new Tilted(new Bernoulli(odds(p, by)), event(p, by));
            case Binomial(double trials, double p) ->
                new Tilted(new Binomial(trials, odds(p, by)), trials * event(p, by));
            case Geometric(double p) -> {
                double left = successes(p, by);
                yield new Tilted(new Geometric(left), Log.log(p) - Log.log(left));
            }
            case NegativeBinomial(double size, double mean) -> {
                double p = size / (size + mean);
                double left = successes(p, by);
                yield new Tilted(
                        new NegativeBinomial(size, size * (1 - left) / left), size * (Log.log(p) - Log.log(left)));
            }
            case Shifted(Density of, double shift, double scale) -> {
                var inner = of(of, by * scale);
                yield new Tilted(new Shifted(inner.density, shift, scale), Math.fma(by, shift, inner.logFactor));
            }
            case Mixture mixture -> mixture(mixture, by);
            case Renamed renamed -> tilted(renamed.member(), by);
            case Truncated truncated
            when !isBounded(truncated, by) -> {
                var inner = tilted(truncated.of(), by);
                var kept = Truncated.of(inner.density, truncated.low(), truncated.high());
                yield new Tilted(kept, inner.logFactor + Log.log(kept.keptMass()) - Log.log(truncated.keptMass()));
            }
            default -> density.isDiscrete() ? byValue(density, by) : numerically(density, by);
        };
    }

    /// What a tilt leaves of the rate at which a tail falls, as a share of it.
    ///
    /// @param rate the tilt must be below it
    private static double left(double by, double rate) {
        if (!(by < rate)) {
            throw tooStrong(by, "It is finite for tilts below %s.".formatted(Shortest.text(rate)));
        }
        return 1 - by / rate;
    }

    private static Tilted laplace(Laplace laplace, double by) {
        double b = laplace.scale();
        double m = laplace.location();
        double up = left(by, 1 / b);
        if (!(by > -1 / b)) {
            throw tooStrong(by, "It is finite for tilts above %s.".formatted(Shortest.text(-1 / b)));
        }
        double down = 1 + by * b;
        var sides = new Mixture(List.of(
                new Mixture.Part(down / 2, new Shifted(new Exponential(b / up), m, 1)),
                new Mixture.Part(up / 2, new Shifted(new Exponential(b / down), m, -1))));
        return new Tilted(sides, by * m - Log.log(up) - Log.log(down));
    }

    /// The chance of an event of chance p, tilted.
    private static double odds(double p, double by) {
        return by > 0 ? p / (p + (1 - p) * Exp.exp(-by)) : p * Exp.exp(by) / ((1 - p) + p * Exp.exp(by));
    }

    private static double event(double p, double by) {
        return by > 0
                ? by + StrictMath.log1p((1 - p) * StrictMath.expm1(-by))
                : StrictMath.log1p(p * StrictMath.expm1(by));
    }

    /// The chance of success of trials, tilted by the number that fail.
    private static double successes(double p, double by) {
        double limit = -StrictMath.log1p(-p);
        if (!(by < limit)) {
            throw tooStrong(by, "It is finite for tilts below %s.".formatted(Shortest.text(limit)));
        }
        return -StrictMath.expm1(by - limit);
    }

    private static Tilted mixture(Mixture mixture, double by) {
        var parts = mixture.parts();
        var tilted = parts.stream().map(part -> of(part.density(), by)).toList();
        double[] logs = new double[parts.size()];
        Arrays.setAll(logs, i -> Log.log(parts.get(i).weight()) + tilted.get(i).logFactor);
        double factor = logOfSum(logs);
        var made = new ArrayList<Mixture.Part>();
        for (int i = 0; i < logs.length; i++) {
            double weight = Exp.exp(logs[i] - factor);
            if (weight > 0) {
                made.add(new Mixture.Part(weight, tilted.get(i).density));
            }
        }
        return new Tilted(new Mixture(made), factor);
    }

    private static double logOfSum(double[] logs) {
        double largest = DoubleStream.of(logs).max().orElseThrow();
        return largest
                + Log.log(DoubleStream.of(logs).map(x -> Exp.exp(x - largest)).sum());
    }

    private static boolean isBounded(Density density, double by) {
        return Double.isFinite(
                by > 0 ? density.support().high() : density.support().low());
    }

    private static Tilted byValue(Density density, double by) {
        double[] values = Stretches.values(density);
        double[] logs = new double[values.length];
        Arrays.setAll(logs, i -> Math.fma(by, values[i], density.logPdf(values[i])));
        double factor = logOfSum(logs);
        double[] masses = DoubleStream.of(logs).map(x -> Exp.exp(x - factor)).toArray();
        double sum = DoubleStream.of(masses).sum();
        return new Tilted(
                ValueTable.of(values, DoubleStream.of(masses).map(x -> x / sum).toArray()), factor);
    }

    private static Tilted numerically(Density density, double by) {
        if (!isBounded(density, by)) {
            refuseHeavy(density, by);
        }
        double[] probes = DoubleStream.of(PROBES)
                .flatMap(p -> DoubleStream.of(density.quantile(p), density.upperQuantile(p)))
                .filter(Double::isFinite)
                .distinct()
                .toArray();
        Heights heights = (x, y, n) -> {
            density.logPdf(x, y, n);
            for (int i = 0; i < n; i++) {
                y[i] = Math.fma(by, x[i], y[i]);
            }
        };
        double[] breaks = Stretches.of(density).stream()
                .flatMapToDouble(part -> DoubleStream.of(part.low(), part.high()))
                .filter(x ->
                        x > density.support().low() && x < density.support().high())
                .toArray();
        var integrated = Integrated.of(new Name(density, by), "x", heights, true, density.support(), breaks, probes);
        return new Tilted(integrated, integrated.logArea());
    }

    /// What tells a tilted density from others.
    private record Name(Density of, double by) {}

    /// The tail that the tilt raises must fall faster than the tilt rises, as far out as it has a logarithm.
    private static void refuseHeavy(Density density, double by) {
        double order =
                by > 0 ? density.tailOrders().upper() : density.tailOrders().lower();
        double middle = density.quantile(0.5);
        double spread = Math.signum(by) * (density.quantile(0.75) - density.quantile(0.25));
        double fall = Double.NEGATIVE_INFINITY;
        double before = density.logPdf(middle);
        for (int k = 0; k <= FAR; k++) {
            double distance = Math.scalb(spread, k);
            double here = density.logPdf(middle + distance);
            if (here == Double.NEGATIVE_INFINITY) {
                break;
            }
            fall = (here - before) / (by * distance * (k == 0 ? 1 : 0.5));
            before = here;
        }
        if (order < Double.POSITIVE_INFINITY || !(fall < -1 - LEAST_FALL)) {
            throw tooStrong(
                    by,
                    "Its %s tail falls too slowly for that; shift or widen it, or name another density."
                            .formatted(by > 0 ? "upper" : "lower"));
        }
    }

    private static Refusal tooStrong(double by, String why) {
        return new Refusal(Problem.of("exp(%s x) has no finite mean".formatted(Shortest.text(by)))
                .because("A tilted density is divided by it. " + why)
                .tryThis("Choose a tilt nearer to 0.")
                .at(Place.of("tilt")));
    }
}
