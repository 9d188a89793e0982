package dev.leadline.density;

import java.util.stream.Stream;

/// Members that a test of every density should see: ordinary ones, and those near the limits of their rules.
final class Examples {
    private Examples() {}

    static Stream<Density> all() {
        return Stream.of(
                new Uniform(-2, 3),
                new Uniform(1e6, 1e6 + 1e-3),
                new Normal(0, 1),
                new Normal(50_000_623, 25),
                new Lognormal(0.3, 0.8),
                new Lognormal(0, 5),
                new Lognormal(-3, 60),
                Lognormal.ofMeanAndSd(100, 1e-6),
                new Triangular(0, 2, 7),
                new Triangular(0, 0, 1),
                new Triangular(-1, 4, 4),
                new Exponential(2),
                new Gamma(2.5, 1.4),
                new Gamma(0.05, 1),
                new Gamma(0.001, 1),
                new Gamma(0.3, 1e-5),
                new Gamma(30, 2),
                new Gamma(1e6, 1),
                Beta.of(2.3, 4.1),
                Beta.of(0.5, 0.5),
                Beta.of(0.02, 0.05),
                Beta.of(0.01, 0.01),
                Beta.of(1, 1.5),
                new Beta(0.3, 20, 2, 5),
                new Beta(200, 0.7, -1, 1),
                Beta.of(5, 1e5),
                Beta.of(1e6, 1e6),
                new Weibull(1.7, 3, 0),
                new Weibull(0.3, 2, 1),
                new Weibull(0.02, 1, 0),
                new Weibull(1e5, 1, 0),
                new Gumbel(2, 1.5),
                new Student(3, 0, 1),
                new Student(0.1, 0, 1),
                new Student(0.5, 0, 1),
                new Student(1, -3, 0.01),
                new Student(18, 50_000_623, 25),
                new Student(1e10, 0, 1));
    }
}
