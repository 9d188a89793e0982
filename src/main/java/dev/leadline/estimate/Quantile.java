package dev.leadline.estimate;

import java.math.BigDecimal;
import java.math.RoundingMode;

/// The definition of a quantile of n values: the value of rank `⌈n q⌉` in increasing order, the least that
/// at least a share q of them do not exceed. It is the first of Hyndman and Fan's nine, the one that order
/// statistics have exact limits for.
///
/// q is taken for the shortest decimal that is this double, in exact arithmetic: of 1,000 values .95 is the
/// 950th.
///
/// Source: Hyndman and Fan (1996), The American Statistician 50, 361-365.
public final class Quantile {
    private Quantile() {}

    /// From 1 to n.
    ///
    /// @param n values, at least 1
    /// @param q between 0 and 1
    public static long rank(long n, double q) {
        if (n < 1 || !(q > 0 && q < 1)) {
            throw new IllegalArgumentException("quantile " + q + " of " + n + " values");
        }
        return BigDecimal.valueOf(q)
                .multiply(BigDecimal.valueOf(n))
                .setScale(0, RoundingMode.CEILING)
                .longValueExact();
    }

    /// The share above: `1 - q`, of the decimal.
    public static double above(double q) {
        return BigDecimal.ONE.subtract(BigDecimal.valueOf(q)).doubleValue();
    }
}
