package dev.leadline.stream;

import java.util.Objects;

/// Where random numbers stand: equal addresses give equal numbers, on any machine, in any order.
///
/// @param seed of the run, 0 or more
/// @param lane name of the lane, or [#SHARED] where lanes use common random numbers
/// @param replicate of the points; of repetitions one tells it from another; 0 where there is only one
/// @param input name of the input the numbers are for
/// @param item index of the item of work
public record Address(long seed, Purpose purpose, String lane, int replicate, String input, long item) {
    /// Stands for every lane; no lane can be called so.
    public static final String SHARED = "*";

    public Address {
        Objects.requireNonNull(purpose);
        Objects.requireNonNull(lane);
        Objects.requireNonNull(input);
        if (seed < 0 || replicate < 0 || item < 0) {
            throw new IllegalArgumentException(
                    "seed " + seed + ", replicate " + replicate + ", item " + item + ": none may be negative");
        }
    }

    /// The same place, for another input.
    public Address forInput(String name) {
        return new Address(seed, purpose, lane, replicate, name, item);
    }
}
