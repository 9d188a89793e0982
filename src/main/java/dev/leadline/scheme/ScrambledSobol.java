package dev.leadline.scheme;

import dev.leadline.stream.Address;
import java.util.List;
import java.util.stream.IntStream;

/// Sobol's points, one dimension for each coordinate, in independent randomisations.
///
/// Source: Joe and Kuo (2008), SIAM Journal on Scientific Computing 30, 2635-2654; Owen (1995).
public record ScrambledSobol(int replicates, Scrambling scrambling) implements Replicated {
    public static final String WORD = "scrambled-sobol";

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public String inWords() {
        return switch (scrambling) {
            case NESTED -> Replicated.super.inWords();
            case DIGITAL_SHIFT -> Replicated.super.inWords() + " by digital shift";
        };
    }

    @Override
    public long mostPoints() {
        return Sobol.POINTS;
    }

    @Override
    public Layout layout(Address lane, List<String> coordinates) {
        List<Sobol> dimensions = IntStream.rangeClosed(1, coordinates.size())
                .mapToObj(Sobol::dimension)
                .toList();
        return Randomised.layout(
                lane, coordinates, replicates, (j, numbers) -> dimensions.get(j).randomised(scrambling, numbers));
    }
}
