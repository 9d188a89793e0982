package dev.leadline.density;

import dev.leadline.formula.Program;
import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.Arrays;

/// Heights on any number of points, and what is wrong with them in words. Immutable.
///
/// @param variable its name in messages
/// @param log whether the heights are logarithms
record Relief(Heights heights, String variable, boolean log) {
    /// Heights below 0 by less than this share of the greatest are rounding errors and count as 0.
    private static final double ROUNDING = 1e-13;

    static final double PER_LN2 = 1.4426950408889634;

    /// Heights as given.
    double[] at(double[] x) {
        if (x.length <= Program.BLOCK) {
            var y = new double[x.length];
            heights.fill(x, y, x.length);
            return y;
        }
        var all = new double[x.length];
        var y = new double[Program.BLOCK];
        for (int from = 0; from < x.length; from += Program.BLOCK) {
            int n = Math.min(Program.BLOCK, x.length - from);
            heights.fill(Arrays.copyOfRange(x, from, from + n), y, n);
            System.arraycopy(y, 0, all, from, n);
        }
        return all;
    }

    double at(double x) {
        return at(new double[] {x})[0];
    }

    /// Heights relative to a height as given, none of them bad.
    ///
    /// @throws Refusal at the first that is
    double[] relative(double[] x, double top) {
        double[] y = at(x);
        for (int i = 0; i < y.length; i++) {
            if (isBad(y[i], top)) {
                throw new Refusal(bad(x[i], y[i]));
            }
        }
        if (log) {
            for (int i = 0; i < y.length; i++) {
                y[i] -= top;
            }
            Exp.exp(y, y, y.length);
        } else {
            for (int i = 0; i < y.length; i++) {
                y[i] = Math.max(y[i] / top, 0);
            }
        }
        return y;
    }

    /// Whether a height is none of a density.
    boolean isBad(double height, double top) {
        return log
                ? Double.isNaN(height) || height == Double.POSITIVE_INFINITY
                : !(height >= -ROUNDING * top && height < Double.POSITIVE_INFINITY);
    }

    /// The logarithm of base 2; `-∞` where the density is 0.
    double level(double height) {
        return log ? height * PER_LN2 : height > 0 ? Log.log(height) * PER_LN2 : Double.NEGATIVE_INFINITY;
    }

    Problem bad(double x, double height) {
        if (Double.isNaN(height)) {
            return about("density is not a number at " + at(variable, x))
                    .because("The formula has no value there, as the logarithm and the root of a negative number, or"
                            + " 0/0.")
                    .tryThis("Narrow the range to where it has one, or choose with if(...); where it is missing in this"
                            + " one point only, add a break there.");
        }
        if (height > 0) {
            return about("density is infinite at " + at(variable, x))
                    .because("It may grow without bound only towards an end of the range or a break.")
                    .tryThis("Add a break there; where only its numbers get too large, give its logarithm (log).");
        }
        return about("density is " + Shortest.text(height) + " at " + at(variable, x) + " but must not be below 0")
                .because("A probability cannot be negative.")
                .tryThis("Narrow the range to where it is positive, or write max(0, ...).");
    }

    Problem pole(double x) {
        return about("density grows without bound at " + at(variable, x))
                .because("It may do so only towards an end of the range or a break, where its mass is found by itself.")
                .tryThis("Add a break there.");
    }

    /// @param exponent of the distance in the mass near the mark
    Problem noMassNear(double mark, double exponent) {
        return about("density has no finite integral: near %s it grows like 1/distance^%.2f"
                        .formatted(at(variable, mark), 1 - exponent))
                .because("The exponent must be less than 1, by .02 at least.")
                .tryThis("Move the end of the range away from there, or check the exponent.");
    }

    /// @param exponent of the distance in the mass beyond it
    Problem noMassTowards(int side, double exponent) {
        String end = side < 0 ? "-∞" : "∞";
        double order = 1 - exponent;
        String how = order > 0.005
                ? "falls only like 1/%s^%.2f".formatted(variable, order)
                : order < -0.005 ? "grows" : "does not fall";
        return about("density has no finite integral: towards %s it %s".formatted(end, how))
                .because("It must fall faster than 1/%s, with an exponent of 1.02 at least.".formatted(variable))
                .tryThis("Give a finite end of the range, or check the sign in the exponent.");
    }

    Problem zero() {
        return about("density is 0 wherever it was looked at")
                .because("No draw can be made of it. A peak may be too narrow to be seen, or all values too small for a"
                        + " number.")
                .tryThis("Add a break at the peak, or give the logarithm of the density (log).");
    }

    Problem rough(double x) {
        return about("density changes too fast to be integrated, near " + at(variable, x))
                .because("It was cut into more than " + Refinement.MOST + " pieces.")
                .tryThis("Narrow the range, or add breaks where the density jumps or grows without bound.");
    }

    private static String at(String variable, double x) {
        return variable + " = " + Shortest.text(x);
    }

    private static Problem about(String primary) {
        return Problem.of(primary).at(Place.of("formula"));
    }
}
