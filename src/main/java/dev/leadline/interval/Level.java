package dev.leadline.interval;

/// The level of confidence of an interval.
final class Level {
    private Level() {}

    static void check(double level) {
        if (!(level > 0 && level < 1)) {
            throw new IllegalArgumentException("level " + level + " is not between 0 and 1");
        }
    }
}
