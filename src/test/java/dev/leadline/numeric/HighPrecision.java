package dev.leadline.numeric;

import java.math.BigDecimal;
import java.math.BigInteger;

/// Elementary functions to more than 80 digits, by series in whole numbers: slow, simple, and sharing nothing with
/// the kernels it judges. `HighPrecisionTest` compares it with a table made by another program.
///
/// A fixed-point number is an integer to be divided by `2^bits`.
final class HighPrecision {
    /// Bits kept for a result; the largest cancellation in a result is paid for on top.
    private static final int BITS = 320;

    /// Enough to reduce the largest double by a multiple of pi, and for the normal tail at 40.
    private static final int WIDE = 1024 + 6 * BITS;

    private static final BigInteger PI = pi(WIDE);
    private static final BigInteger LN2 = artanh(BigInteger.ONE.shiftLeft(WIDE).divide(BigInteger.valueOf(3)), WIDE)
            .shiftLeft(1);

    private HighPrecision() {}

    /// The number `digits * 2^exponent`.
    record Value(BigInteger digits, int exponent) {
        /// By how many units in the last place `computed` misses this number. The unit is the spacing of doubles just
        /// inside this number, at least the smallest subnormal.
        double ulps(double computed) {
            if (digits.signum() == 0) return computed == 0 ? 0 : Double.POSITIVE_INFINITY;
            int size = digits.bitLength() - 1 + exponent;
            if (!Double.isFinite(computed)) {
                boolean overflow = size >= 1024 && computed == digits.signum() * Double.POSITIVE_INFINITY;
                return overflow ? 0 : Double.POSITIVE_INFINITY;
            }
            int unit = Math.max(size - 52, -1074);
            Value c = of(computed);
            int low = Math.min(c.exponent, exponent);
            BigInteger difference = c.digits.shiftLeft(c.exponent - low).subtract(digits.shiftLeft(exponent - low));
            int shift = unit - low - 60; // keep 60 bits below one unit
            BigInteger scaled = shift >= 0 ? difference.shiftRight(shift) : difference.shiftLeft(-shift);
            return Math.abs(scaled.doubleValue() * 0x1p-60);
        }

        double nearest() {
            return decimal().doubleValue();
        }

        BigDecimal decimal() {
            if (exponent >= 0) return new BigDecimal(digits.shiftLeft(exponent));
            return new BigDecimal(digits.multiply(BigInteger.valueOf(5).pow(-exponent)), -exponent);
        }

        Value negate() {
            return new Value(digits.negate(), exponent);
        }

        Value divide(Value other) {
            return new Value(digits.shiftLeft(2 * BITS).divide(other.digits), exponent - other.exponent - 2 * BITS);
        }
    }

    /// A finite double, exactly.
    static Value of(double x) {
        long bits = Double.doubleToRawLongBits(x);
        int e = (int) (bits >>> 52) & 0x7ff;
        long m = bits & 0x000f_ffff_ffff_ffffL;
        if (e != 0) m |= 0x0010_0000_0000_0000L;
        return new Value(BigInteger.valueOf(bits < 0 ? -m : m), Math.max(e, 1) - 1075);
    }

    static Value exp(double x) {
        return exp(of(x));
    }

    /// `e^x`.
    static Value exp(Value x) {
        int size = x.digits.bitLength() + x.exponent;
        if (size > 20) return new Value(BigInteger.ONE, x.digits.signum() * 1_000_000);
        int bits = BITS + Math.max(0, size);
        return exp(fixed(x, bits), bits);
    }

    private static Value exp(BigInteger x, int bits) {
        BigInteger ln2 = LN2.shiftRight(WIDE - bits);
        BigInteger k = x.add(ln2.shiftRight(1)).divide(ln2);
        if (x.signum() < 0) k = x.subtract(ln2.shiftRight(1)).divide(ln2);
        int halvings = 12;
        int wide = bits + 2 * halvings;
        // r / 2^halvings, with a few more bits for the squarings
        BigInteger r = x.subtract(k.multiply(ln2)).shiftLeft(halvings);
        BigInteger sum = BigInteger.ONE.shiftLeft(wide);
        BigInteger term = sum;
        for (int n = 1; term.signum() != 0; n++) {
            term = term.multiply(r).shiftRight(wide).divide(BigInteger.valueOf(n));
            sum = sum.add(term);
        }
        for (int i = 0; i < halvings; i++) sum = sum.multiply(sum).shiftRight(wide);
        return new Value(sum, k.intValueExact() - wide);
    }

    /// Natural logarithm of a positive number.
    static Value log(double x) {
        return log(of(x));
    }

    static Value log(Value x) {
        int bits = 2 * BITS;
        BigInteger m = x.digits;
        int size = m.bitLength();
        int k = x.exponent + size;
        m = bits >= size ? m.shiftLeft(bits - size) : m.shiftRight(size - bits); // in [1/2, 1)
        if (m.multiply(m).bitLength() < 2 * bits) { // below sqrt(1/2)
            m = m.shiftLeft(1);
            k--;
        }
        BigInteger one = BigInteger.ONE.shiftLeft(bits);
        BigInteger s = m.subtract(one).shiftLeft(bits).divide(m.add(one));
        BigInteger log = artanh(s, bits).shiftLeft(1);
        return new Value(log.add(LN2.shiftRight(WIDE - bits).multiply(BigInteger.valueOf(k))), -bits);
    }

    /// `x^y` for positive `x`.
    static Value pow(double x, double y) {
        Value log = log(x);
        Value exact = of(y);
        return exp(new Value(log.digits.multiply(exact.digits), log.exponent + exact.exponent));
    }

    static Value sin(double x) {
        return circular(x, 0);
    }

    static Value cos(double x) {
        return circular(x, 1);
    }

    /// `sin(x + quarter π/2)`.
    private static Value circular(double x, int quarter) {
        if (quarter == 0 && Math.abs(x) < 0x1p-200) return of(x);
        BigInteger wide = fixed(of(x), WIDE);
        BigInteger half = PI.shiftRight(1);
        BigInteger n = wide.add(half.shiftRight(1)).divide(half);
        if (wide.signum() < 0) n = wide.subtract(half.shiftRight(1)).divide(half);
        int bits = 2 * BITS;
        BigInteger r = wide.subtract(n.multiply(half)).shiftRight(WIDE - bits);
        int q = n.add(BigInteger.valueOf(quarter)).and(BigInteger.valueOf(3)).intValue();
        BigInteger z = r.multiply(r).shiftRight(bits);
        BigInteger term = q % 2 == 0 ? r : BigInteger.ONE.shiftLeft(bits);
        BigInteger sum = term;
        for (int k = q % 2 == 0 ? 2 : 1; term.abs().bitLength() > 1; k += 2) {
            term = term.multiply(z)
                    .shiftRight(bits)
                    .divide(BigInteger.valueOf((long) k * (k + 1)))
                    .negate();
            sum = sum.add(term);
        }
        return new Value(q < 2 ? sum : sum.negate(), -bits);
    }

    /// `1 / (sqrt(2π)) * integral of exp(-t^2/2) from x to infinity`, for `-45 < x < 45`.
    static Value normalUpperTail(double x) {
        int bits = BITS + (int) (1.5 * x * x) + 64;
        return new Value(BigInteger.ONE.shiftLeft(bits - 1).subtract(normalCentre(of(x), bits)), -bits);
    }

    /// Integral of the standard normal density from 0 to `x`: `φ(x) (x + x^3/3 + x^5/(3·5) + …)`.
    private static BigInteger normalCentre(Value x, int bits) {
        BigInteger fixed = fixed(x, bits);
        BigInteger square = fixed.multiply(fixed).shiftRight(bits);
        BigInteger term = fixed;
        BigInteger sum = term;
        for (int k = 3; term.abs().bitLength() > 1; k += 2) {
            term = term.multiply(square).shiftRight(bits).divide(BigInteger.valueOf(k));
            sum = sum.add(term);
        }
        Value density = normalDensity(x, bits);
        int shift = density.exponent;
        BigInteger product = sum.multiply(density.digits);
        return shift >= 0 ? product.shiftLeft(shift) : product.shiftRight(-shift);
    }

    /// By how many ulps `z` misses the normal quantile of `p`, by one step of Newton's method from `z`: what
    /// that leaves is quadratically smaller. `p < 1/2`.
    static double quantileUlps(double p, double z) {
        Value upper = normalUpperTail(-z);
        Value exact = of(p);
        int low = Math.min(upper.exponent, exact.exponent);
        BigInteger miss =
                upper.digits.shiftLeft(upper.exponent - low).subtract(exact.digits.shiftLeft(exact.exponent - low));
        Value step = new Value(miss, low).divide(normalDensity(z));
        return Math.abs(step.nearest()) / Math.ulp(z);
    }

    /// The standard normal density with a relative error of about `2^-bits`.
    private static Value normalDensity(Value x, int bits) {
        BigInteger root = PI.shiftLeft(1).shiftLeft(WIDE).sqrt(); // sqrt(2π)
        BigInteger square = x.digits.multiply(x.digits).negate();
        Value e = exp(fixed(new Value(square, 2 * x.exponent - 1), bits), bits);
        return new Value(e.digits.shiftLeft(WIDE).divide(root), e.exponent);
    }

    static Value normalDensity(double x) {
        return normalDensity(of(x), 2 * BITS);
    }

    /// Twice the normal integral at `x √2`, by the same series: `2/√π e^(-x²) (x + 2 x^3/3 + 4 x^5/(3·5) + …)`.
    static Value erf(double x) {
        return errorFunction(of(x), 4 * BITS + 4 * Math.max(0, -Math.getExponent(x)));
    }

    /// `1 - erf(x)`, for `x < 32`.
    static Value erfc(double x) {
        int bits = BITS + (int) (3 * x * x) + 64;
        Value erf = errorFunction(of(x), bits);
        return new Value(BigInteger.ONE.shiftLeft(bits).subtract(erf.digits), -bits);
    }

    private static Value errorFunction(Value x, int bits) {
        BigInteger fixed = fixed(x, bits);
        BigInteger square = fixed.multiply(fixed).shiftRight(bits);
        BigInteger term = fixed;
        BigInteger sum = term;
        for (int k = 3; term.abs().bitLength() > 1; k += 2) {
            term = term.multiply(square).shiftRight(bits - 1).divide(BigInteger.valueOf(k));
            sum = sum.add(term);
        }
        Value e = exp(square.negate(), bits);
        BigInteger rootPi = PI.shiftLeft(WIDE).sqrt();
        BigInteger product = sum.multiply(e.digits).shiftLeft(1 + WIDE).divide(rootPi);
        return new Value(e.exponent >= 0 ? product.shiftLeft(e.exponent) : product.shiftRight(-e.exponent), -bits);
    }

    private static BigInteger fixed(Value x, int bits) {
        int shift = x.exponent + bits;
        return shift >= 0 ? x.digits.shiftLeft(shift) : x.digits.shiftRight(-shift);
    }

    private static BigInteger artanh(BigInteger s, int bits) {
        BigInteger z = s.multiply(s).shiftRight(bits);
        BigInteger power = s;
        BigInteger sum = s;
        for (int k = 3; power.abs().bitLength() > 1; k += 2) {
            power = power.multiply(z).shiftRight(bits);
            sum = sum.add(power.divide(BigInteger.valueOf(k)));
        }
        return sum;
    }

    /// Machin: `π = 16 arctan(1/5) - 4 arctan(1/239)`.
    private static BigInteger pi(int bits) {
        int wide = bits + 32;
        return arctanOfInverse(5, wide)
                .shiftLeft(4)
                .subtract(arctanOfInverse(239, wide).shiftLeft(2))
                .shiftRight(32);
    }

    private static BigInteger arctanOfInverse(int n, int bits) {
        BigInteger power = BigInteger.ONE.shiftLeft(bits).divide(BigInteger.valueOf(n));
        BigInteger sum = power;
        for (int k = 3; power.bitLength() > 1; k += 2) {
            power = power.divide(BigInteger.valueOf((long) -n * n));
            sum = sum.add(power.divide(BigInteger.valueOf(k)));
        }
        return sum;
    }
}
