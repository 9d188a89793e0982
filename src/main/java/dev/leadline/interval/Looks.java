package dev.leadline.interval;

import java.util.OptionalInt;
import java.util.function.DoubleFunction;

/// Looks at a few places only, each at a level of its own, so that all hold together with the level wanted:
/// how replicated points are looked at, whose means sharpen from one doubling to the next, and splitting,
/// after 10, 20, 40 … repetitions. With L looks planned each may miss with `α/L`, without a plan the j-th
/// with `α/(j (j + 1))`, which add up to α (Bonferroni).
///
/// @param level of all looks together
/// @param planned looks, empty for no plan
public record Looks(double level, OptionalInt planned) {
    /// Word of the project file and of the commands.
    public static final String KIND = "looks";

    public Looks {
        Level.check(level);
        if (planned.isPresent() && planned.getAsInt() < 1) {
            throw new IllegalArgumentException(planned.getAsInt() + " looks");
        }
    }

    public static Looks planned(int looks, double level) {
        return new Looks(level, OptionalInt.of(looks));
    }

    public static Looks unplanned(double level) {
        return new Looks(level, OptionalInt.empty());
    }

    /// Looks at `first`, twice that, four times that … that a budget allows.
    public static Looks atDoublings(long first, long budget, double level) {
        int looks = 0;
        for (long n = first; n <= budget; n *= 2) {
            looks++;
            if (n > Long.MAX_VALUE / 2) {
                break;
            }
        }
        return planned(Math.max(1, looks), level);
    }

    /// The level of one look.
    ///
    /// @param look from 1 up
    public double level(int look) {
        if (look < 1 || planned.isPresent() && look > planned.getAsInt()) {
            throw new IllegalArgumentException("look " + look + " of " + planned);
        }
        double share = planned.isPresent() ? 1.0 / planned.getAsInt() : 1.0 / look / (look + 1.0);
        return 1 - (1 - level) * share;
    }

    /// The interval of one look, which holds together with those of all others.
    ///
    /// @param look from 1 up
    /// @param atLevel the interval of what was found, at a level
    public Interval at(int look, DoubleFunction<Interval> atLevel) {
        var own = atLevel.apply(level(look));
        String together = planned.isPresent()
                ? " It holds together with those of all %d looks planned.".formatted(planned.getAsInt())
                : " It holds together with those of all other looks.";
        return new Interval(own.low(), own.high(), level, KIND, own.assumption() + together, own.note());
    }
}
