package dev.leadline.scheme;

import dev.leadline.stream.Stream;
import java.util.List;
import java.util.function.Function;

/// A kind of points whose speed is measured, in one dimension.
///
/// @param opened the replicate that these numbers make
public record Measured(String name, Function<Stream, Fill> opened) {
    /// Fills the first rows of u with points from the first on.
    public interface Fill {
        void points(double[] u, long firstPoint, int rows);
    }

    public static List<Measured> all() {
        var sobol = Sobol.dimension(100);
        var lattice = Lattice.dimension(100);
        return List.of(
                new Measured("Sobol, nested scrambling", numbers -> sobol.randomised(Scrambling.NESTED, numbers)::fill),
                new Measured(
                        "Sobol, digital shift", numbers -> sobol.randomised(Scrambling.DIGITAL_SHIFT, numbers)::fill),
                new Measured("lattice, shifted", numbers -> lattice.shifted(numbers)::fill));
    }

    /// A dimension before it is randomised, which a lane has once.
    public static Object sobol(int dimension) {
        return Sobol.dimension(dimension);
    }
}
