package dev.leadline.density;

import dev.leadline.numeric.Log;
import java.util.stream.IntStream;

/// The heights to one side of a centre, at distances that are powers of 2.
final class Side {
    /// Next to a mark that is not 0, octaves of its distance from 0 in which numbers are dense enough to be looked at:
    /// nearer, there are less than a thousand.
    private static final int DENSE = 42;

    /// Octaves in which `x` has digits enough for any formula to tell the height by, as `1 - x^2` next to 1.
    private static final int DIGITS = 28;

    /// Octaves to a centre where there are others as near.
    private static final int NEAREST = 50;

    /// Octaves looked at next to a mark at least.
    private static final int LEAST = 12;

    /// Heights below this power of 2 have too few digits to tell a slope.
    private static final int SUBNORMAL = -1000;

    /// Bends of a logarithm below this are rounding errors.
    private static final double ROUNDING = 1e-16;

    static final int FIRST = -1020;
    static final int LAST = 1022;

    final double centre;
    final int side;

    /// The distance of index 0, as a power of 2.
    final int first;

    /// Whether no other centre lies on this side.
    final boolean endless;

    /// The first index at which the height can be told by any formula.
    final int trusted;

    final double[] height;

    /// Logarithms of the heights, of base 2; `NaN` where a height is none of a density.
    final double[] level;

    /// @param side 1 above the centre, -1 below
    /// @param mark whether the centre is an end or a break
    /// @param reach the greatest distance looked at
    Side(Relief relief, double top, double centre, int side, boolean mark, double reach) {
        this.centre = centre;
        this.side = side;
        this.endless = reach == Double.POSITIVE_INFINITY;
        int last = endless ? LAST : Math.getExponent(reach);
        this.first = Math.min(octave(mark ? DENSE : NEAREST, last), last);
        this.trusted = Math.max(0, Math.min(octave(mark ? DIGITS : NEAREST, last), last) - first);
        double[] x = IntStream.rangeClosed(first, last).mapToDouble(j -> at(j)).toArray();
        this.height = relief.at(x);
        this.level = new double[x.length];
        for (int i = 0; i < x.length; i++) {
            level[i] = relief.isBad(height[i], top) ? Double.NaN : relief.level(height[i]);
            if (!relief.log() && level[i] < SUBNORMAL) {
                level[i] = Double.NEGATIVE_INFINITY;
            }
        }
    }

    private int octave(int octaves, int last) {
        if (centre == 0) {
            return FIRST;
        }
        int exponent = Math.getExponent(centre);
        return Math.max(exponent - NEAREST, Math.min(exponent - octaves, last - LEAST));
    }

    private double at(int j) {
        return centre + side * StrictMath.scalb(1.0, j);
    }

    double x(int i) {
        return at(first + i);
    }

    double distance(int i) {
        return StrictMath.scalb(1.0, first + i);
    }

    int size() {
        return level.length;
    }

    boolean isBad(int i) {
        return Double.isNaN(level[i]);
    }

    /// Whether the formula gives no number, as `0 * inf`.
    boolean isLost(int i) {
        return Double.isNaN(height[i]) || height[i] == Double.POSITIVE_INFINITY;
    }

    /// As a power of 2, about the mass at this distance; `-∞` or `NaN` where there is none.
    double mass(int i) {
        return level[i] + first + i;
    }

    /// Where the mass is greatest.
    int most() {
        int most = 0;
        for (int i = 1; i < level.length; i++) {
            if (mass(i) > mass(most) || Double.isNaN(mass(most))) {
                most = i;
            }
        }
        return most;
    }

    /// @param least mass that counts, as a power of 2
    boolean isNegligible(int i, double least) {
        return !(mass(i) >= least);
    }

    /// By how much the logarithm of the height grows from one octave to the next.
    double slope(int i) {
        return level[i + 1] - level[i];
    }

    /// Whether the slope is the same from octave i on as from the next.
    boolean isPower(int i) {
        return Math.abs(slope(i + 1) - slope(i)) <= 1e-14 * (1 + Math.abs(level[i]));
    }

    /// How far the mass next to the centre is from a power of the distance, from octave i on, as a power of 2.
    double miss(int i) {
        return Log.log(Math.max(bend(i), ROUNDING)) * Relief.PER_LN2 + mass(i);
    }

    /// By how much the slope changes from one octave to the next, at most, over three of them.
    double bend(int i) {
        double bend = 0;
        for (int k = i; k < i + 3; k++) {
            bend = Math.max(bend, Math.abs(slope(k + 1) - slope(k)));
        }
        return bend;
    }

    /// The slope at octave i, freed from its change in proportion to the distance where enough octaves are known.
    double freedSlope(int i) {
        if (i + 6 < level.length) {
            double near = (level[i + 3] - level[i]) / 3;
            double far = (level[i + 6] - level[i + 3]) / 3;
            double freed = near - (far - near) / 7;
            if (Double.isFinite(freed)) {
                return freed;
            }
        }
        return i + 1 < level.length ? slope(i) : 0;
    }
}
