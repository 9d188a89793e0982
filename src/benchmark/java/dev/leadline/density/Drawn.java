package dev.leadline.density;

import java.util.List;
import java.util.stream.Stream;

/// The densities whose draws are measured: all the examples, composites and typed densities of the tests, data as they
/// are and smoothed, and one that is truncated, then shifted.
public final class Drawn {
    private Drawn() {}

    public static List<Density> all() {
        return Stream.of(Examples.all(), Composites.all(), TypedTest.densities(), data())
                .flatMap(densities -> densities)
                .toList();
    }

    private static Stream<Density> data() {
        return Stream.of(
                Empirical.of(-1, 2, 2, 3, 8),
                Smoothed.of(1, 0, 3),
                new Shifted(Truncated.of(new Gamma(2.5, 1.4), 0.5, 6), 3, 2));
    }
}
