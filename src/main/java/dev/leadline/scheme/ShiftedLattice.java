package dev.leadline.scheme;

import dev.leadline.stream.Address;
import java.util.List;
import java.util.stream.IntStream;

/// The points of a lattice of rank 1, in independent random shifts.
///
/// Source: Cranley and Patterson (1976), SIAM Journal on Numerical Analysis 13, 904-914; the vector is our own, see
/// [Lattice].
public record ShiftedLattice(int replicates) implements Replicated {
    public static final String WORD = "shifted-lattice";

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public long mostPoints() {
        return Lattice.POINTS;
    }

    @Override
    public Layout layout(Address lane, List<String> coordinates) {
        List<Lattice> dimensions = IntStream.rangeClosed(1, coordinates.size())
                .mapToObj(Lattice::dimension)
                .toList();
        return Randomised.layout(
                lane, coordinates, replicates, (j, numbers) -> dimensions.get(j).shifted(numbers));
    }
}
