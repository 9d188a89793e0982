package dev.leadline.density;

import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.DoubleStream;
import java.util.stream.Stream;

/// Where a density is positive: its support without the gaps inside, and the separate values of a discrete one.
public final class Stretches {
    /// Values of a discrete density that are looked at, at most.
    private static final int MOST_VALUES = 100_000;

    /// Ends nearer to each other than this many spacings of numbers are the same.
    private static final int ROUNDING = 8;

    private Stretches() {}

    /// Rising, none touching the next. Gaps are known of typed densities and of what is made of parts.
    static List<Support> of(Density density) {
        return switch (density) {
            case Integrated integrated -> without(integrated.support(), integrated.gaps());
            case Shifted shifted ->
                joined(of(shifted.of()).stream().map(part -> moved(part, shifted.shift(), shifted.scale())));
            case Truncated truncated ->
                joined(of(truncated.of()).stream()
                        .map(part -> new Support(
                                Math.max(part.low(), truncated.low()), Math.min(part.high(), truncated.high())))
                        .filter(part -> part.low() < part.high()));
            case Mixture mixture -> joined(mixture.parts().stream().flatMap(part -> of(part.density()).stream()));
            case Renamed renamed -> of(renamed.member());
            default -> List.of(density.support());
        };
    }

    private static Support moved(Support part, double shift, double scale) {
        double one = Math.fma(scale, part.low(), shift);
        double other = Math.fma(scale, part.high(), shift);
        return new Support(Math.min(one, other), Math.max(one, other));
    }

    private static List<Support> without(Support all, List<Support> gaps) {
        var parts = new ArrayList<Support>();
        double from = all.low();
        for (Support gap : gaps) {
            parts.add(new Support(from, gap.low()));
            from = gap.high();
        }
        parts.add(new Support(from, all.high()));
        return parts;
    }

    private static List<Support> joined(Stream<Support> parts) {
        var joined = new ArrayList<Support>();
        parts.sorted(Comparator.comparingDouble(Support::low)).forEach(part -> {
            if (!joined.isEmpty() && part.low() <= joined.getLast().high() + rounding(part.low())) {
                var last = joined.removeLast();
                joined.add(new Support(last.low(), Math.max(last.high(), part.high())));
            } else {
                joined.add(part);
            }
        });
        return joined;
    }

    private static double rounding(double x) {
        return Double.isInfinite(x) ? 0 : ROUNDING * Math.ulp(x);
    }

    /// A stretch of the one in which the other is 0, the lowest; of discrete densities a value, at both ends.
    public static Optional<Support> missed(Density one, Density other) {
        return one.isDiscrete() ? missedValue(one, other) : missedPart(of(one), of(other));
    }

    private static Optional<Support> missedPart(List<Support> needed, List<Support> given) {
        for (Support need : needed) {
            double from = need.low();
            for (Support part : given) {
                if (part.low() <= from + rounding(from) && part.high() > from) {
                    from = part.high();
                }
            }
            if (from < need.high() - rounding(need.high())) {
                double at = from;
                double until = given.stream()
                        .mapToDouble(Support::low)
                        .filter(low -> low > at && low < need.high())
                        .min()
                        .orElse(need.high());
                return Optional.of(new Support(from, until));
            }
        }
        return Optional.empty();
    }

    private static Optional<Support> missedValue(Density one, Density other) {
        if (one.support().high() > other.support().high()) {
            double beyond = Atoms.after(one, other.support().high());
            if (Double.isFinite(beyond)) {
                return Optional.of(new Support(beyond, beyond));
            }
        }
        return values(one, MOST_VALUES)
                .filter(x -> other.logPdf(x) == Double.NEGATIVE_INFINITY)
                .mapToObj(x -> new Support(x, x))
                .findFirst();
    }

    /// Whether no value of the one has a density in the other.
    public static boolean areApart(Density one, Density other) {
        return one.isDiscrete()
                ? values(one, MOST_VALUES).allMatch(x -> other.logPdf(x) == Double.NEGATIVE_INFINITY)
                : of(one).stream()
                        .noneMatch(a -> of(other).stream().anyMatch(b -> a.low() < b.high() && b.low() < a.high()));
    }

    private static DoubleStream values(Density density, int most) {
        double low = density.support().low();
        double first = Double.isFinite(low) ? low : density.quantile(0x1p-60);
        return DoubleStream.iterate(first, Double::isFinite, x -> Atoms.after(density, x))
                .limit(most);
    }

    /// All values of a discrete density, rising.
    static double[] values(Density density) {
        double[] values = values(density, MOST_VALUES + 1).toArray();
        if (values.length > MOST_VALUES) {
            throw new Refusal(Problem.of("there are more than 100,000 values")
                    .because("Each would be weighed for itself.")
                    .tryThis("Name another density."));
        }
        return values;
    }
}
