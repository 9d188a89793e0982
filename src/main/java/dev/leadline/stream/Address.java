package dev.leadline.stream;

/// Where random numbers stand: equal addresses give equal numbers, on any machine, in any order.
///
/// @param seed of the run, 0 or more
/// @param lane name of the lane, or [#SHARED] where lanes use common random numbers
/// @param replicate 0 where points are not replicated
/// @param input name of the input the numbers are for
/// @param item index of the item of work
public record Address(long seed, Purpose purpose, String lane, int replicate, String input, long item) {
    /// Stands for every lane; no lane can be called so.
    public static final String SHARED = "*";
}
