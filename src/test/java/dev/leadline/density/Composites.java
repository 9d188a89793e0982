package dev.leadline.density;

import dev.leadline.density.Mixture.Part;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.SequencedMap;
import java.util.SplittableRandom;
import java.util.stream.Stream;

/// Truncated, mixed, shifted and mirrored densities.
final class Composites {
    private static final double INFINITY = Double.POSITIVE_INFINITY;

    private Composites() {}

    /// By the names of the tables of `density_tables_composites.py`.
    static SequencedMap<String, Density> named() {
        var normal = new Normal(0, 1);
        var named = new LinkedHashMap<String, Density>();
        named.put("composite-upper-tail", Truncated.of(normal, 8, INFINITY));
        named.put("composite-lower-tail", Truncated.of(normal, -INFINITY, -30));
        named.put("composite-moderate", Truncated.of(normal, 0.5, 2));
        named.put("composite-narrow-middle", Truncated.of(new Normal(10, 2), 10, 10.0009765625));
        named.put("composite-narrow-tail", Truncated.of(normal, 20, 20.0009765625));
        named.put("composite-gamma", Truncated.of(new Gamma(2.5, 1.4), 0.125, 3));
        named.put("composite-two-humps", mixture(0.25, new Normal(-10, 1), 0.75, new Normal(10, 1)));
        named.put("composite-two-scales", mixture(0.875, normal, 0.125, new Normal(0, 1e6)));
        named.put("composite-gap", mixture(0.375, new Uniform(0, 1), 0.625, new Uniform(10, 12)));
        named.put("composite-faint", mixture(1 - 0x1p-20, normal, 0x1p-20, new Normal(40, 0.5)));
        named.put("composite-mirrored", new Shifted(new Gamma(2.5, 1.4), 3, -2));
        return named;
    }

    static Stream<Density> all() {
        return Stream.concat(
                named().values().stream(),
                Stream.of(
                        Truncated.of(new Weibull(1.7, 3, 0), 1, 2),
                        Truncated.of(new Student(1, 0, 1), -5, 50),
                        Truncated.of(Beta.of(0.5, 0.5), 0, 0.75),
                        Truncated.of(new Normal(50_000_623, 25), 50_000_600, 50_000_700),
                        Truncated.of(mixture(0.5, new Normal(-3, 1), 0.5, new Normal(3, 0.5)), -4, 3.25),
                        new Shifted(new Normal(3, 2), -1, 0.125),
                        new Shifted(new Triangular(0, 2, 7), 4, -3),
                        new Shifted(new Exponential(2), 0, -1),
                        mixture(0.5, new Triangular(0, 1, 4), 0.5, new Triangular(2, 3, 4)),
                        mixture(0.1, mixture(0.5, new Normal(0, 1), 0.5, new Exponential(3)), 0.9, new Gumbel(2, 1.5)),
                        mixture(0.3, new Student(3, 0, 1), 0.7, new Normal(0, 1))));
    }

    static Mixture mixture(double a, Density one, double b, Density other) {
        return new Mixture(List.of(new Part(a, one), new Part(b, other)));
    }

    /// Composed of members of the catalogue, two deep.
    static Density random(int seed) {
        return random(new SplittableRandom(seed), 2);
    }

    private static Density random(SplittableRandom random, int depth) {
        if (depth == 0) {
            return switch (random.nextInt(6)) {
                case 0 -> new Normal(random.nextDouble(-5, 5), random.nextDouble(0.1, 3));
                case 1 -> new Gamma(random.nextDouble(0.7, 9), random.nextDouble(0.1, 3));
                case 2 -> new Triangular(-1, random.nextDouble(-1, 2), 2);
                case 3 -> new Gumbel(random.nextDouble(-5, 5), random.nextDouble(0.1, 3));
                case 4 -> new Uniform(random.nextDouble(-5, 0), random.nextDouble(1, 3));
                default -> new Student(random.nextDouble(5, 20), 0, random.nextDouble(0.5, 2));
            };
        }
        var of = random(random, depth - 1);
        return switch (random.nextInt(3)) {
            case 0 -> {
                double weight = random.nextDouble(0.01, 0.99);
                yield mixture(weight, of, 1 - weight, random(random, depth - 1));
            }
            case 1 ->
                new Shifted(of, random.nextDouble(-9, 9), random.nextDouble(0.1, 3) * (random.nextBoolean() ? 1 : -1));
            default -> {
                double low = of.quantile(random.nextDouble(0, 0.6));
                yield Truncated.of(of, low, of.quantile(random.nextDouble(0.61, 1)));
            }
        };
    }
}
