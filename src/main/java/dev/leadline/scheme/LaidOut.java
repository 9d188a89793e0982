package dev.leadline.scheme;

import dev.leadline.stream.Address;
import java.util.List;

/// Points that stand somewhere before any of them is evaluated.
public sealed interface LaidOut extends Points permits Growing, Replicated {
    /// The points of a lane; the address of each coordinate is `lane` with its name.
    ///
    /// @param lane its replicate, input and item do not matter
    Layout layout(Address lane, List<String> coordinates);
}
