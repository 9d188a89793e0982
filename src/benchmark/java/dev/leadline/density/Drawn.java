package dev.leadline.density;

import java.util.List;
import java.util.stream.Stream;

/// The densities whose draws are measured: all the examples and composites of the tests.
public final class Drawn {
    private Drawn() {}

    public static List<Density> all() {
        return Stream.concat(Examples.all(), Composites.all()).toList();
    }
}
