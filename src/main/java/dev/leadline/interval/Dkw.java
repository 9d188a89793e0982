package dev.leadline.interval;

/// The band of Dvoretzky, Kiefer and Wolfowitz about a whole distribution function: it holds at all values
/// together.
///
/// Source: Massart (1990), Annals of Probability 18, 1269-1283.
public final class Dkw {
    /// Word of the commands.
    public static final String KIND = "dkw";

    /// What the band takes for granted.
    public static final String ASSUMPTION = "The draws are independent; nothing else is taken for granted.";

    private Dkw() {}

    /// How far the share of draws up to a value may lie from its probability, at any value; at most 1.
    ///
    /// @param n draws
    /// @param level of confidence, between 0 and 1
    public static double halfWidth(long n, double level) {
        Level.check(level);
        return n < 1 ? 1 : Math.min(1, Hoeffding.halfWidth(n, level));
    }
}
