package dev.leadline.scheme;

import dev.leadline.stream.Address;
import java.util.List;

/// How the points of a lane are laid out in the unit cube. Immutable, safe for all threads.
public sealed interface Points permits Growing, Replicated {
    /// Word of the project file.
    String word();

    /// In words, with what was chosen, as `scrambled-sobol, 16 replicates`.
    default String inWords() {
        return word();
    }

    /// The points of a lane; the address of each coordinate is `lane` with its name.
    ///
    /// @param lane its replicate, input and item do not matter
    Layout layout(Address lane, List<String> coordinates);

    /// These points as a lane of so many draws has them, where their layout depends on that.
    default Points within(long draws) {
        return this;
    }
}
