package dev.leadline.scheme;

import dev.leadline.stream.Address;
import java.util.List;

/// placeholder until the coordinates are there
public record ScrambledSobol(int replicates) implements Replicated {
    @Override
    public String word() {
        return "scrambled-sobol";
    }

    @Override
    public Layout layout(Address lane, List<String> coordinates) {
        throw new UnsupportedOperationException();
    }
}
