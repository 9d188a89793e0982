package dev.leadline.numeric;

/// Quantiles of the standard normal distribution, the work behind [Normal#quantile(double)].
///
/// For `|p - 1/2| <= 1/4` an odd polynomial in `p - 1/2`; outside, with `r = sqrt(-log min(p, 1-p))`, a rational
/// function of `r` below 4.4 and another one above. Relative errors of the three forms before rounding: 1e-17, 3e-17,
/// 6e-17.
///
/// Source: division of the range after Wichura (1988), Algorithm AS 241, Applied Statistics 37, 477-484; coefficients
/// are our own fit.
final class NormalQuantile {
    private static final long SIGN = Long.MIN_VALUE;

    /// Largest `|p - 1/2|` of the middle part.
    private static final double MIDDLE = 0.25;

    private static final long MIDDLE_BITS = Double.doubleToRawLongBits(MIDDLE);

    /// Smallest `r` of the far part.
    private static final double FAR = 4.4;

    private static final long FAR_BITS = Double.doubleToRawLongBits(FAR);

    private NormalQuantile() {}

    static double quantile(double p) {
        if (!(p > 0 && p < 1)) return p == 0 || p == 1 ? (p - 0.5) * Double.POSITIVE_INFINITY : Double.NaN;
        double q = p - 0.5;
        if (Math.abs(q) <= MIDDLE) return middle(q);
        double r = Math.sqrt(-Log.log(Math.min(p, 1 - p)));
        return Math.copySign(r < FAR ? near(r) : far(r), q);
    }

    static void quantile(double[] p, double[] z, int n) {
        Scratch scratch = Scratch.ofThread();
        double[] a = scratch.a;
        for (int from = 0; from < n; from += Scratch.TILE) {
            int m = Math.min(Scratch.TILE, n - from);
            System.arraycopy(p, from, a, 0, m);
            if (anyRare(a, m)) {
                for (int i = 0; i < m; i++) a[i] = quantile(a[i]);
            } else {
                tile(scratch, m);
            }
            System.arraycopy(a, 0, z, from, m);
        }
    }

    /// Replaces `a` of the scratch; all else is overwritten.
    private static void tile(Scratch scratch, int m) {
        double[] a = scratch.a;
        double[] b = scratch.b;
        double[] c = scratch.c;
        double[] d = scratch.d;
        double[] e = scratch.e;
        for (int i = 0; i < m; i++) b[i] = Math.min(a[i], 1 - a[i]);
        Log.tile(b, c, m);
        for (int i = 0; i < m; i++) b[i] = Math.sqrt(-b[i]);
        for (int i = 0; i < m; i++) d[i] = near(b[i]);
        for (int i = 0; i < m; i++) e[i] = far(b[i]);
        for (int i = 0; i < m; i++) {
            long isNear = -((Double.doubleToRawLongBits(b[i]) - FAR_BITS) >>> 63);
            d[i] = Double.longBitsToDouble(
                    (Double.doubleToRawLongBits(d[i]) & isNear) | (Double.doubleToRawLongBits(e[i]) & ~isNear));
        }
        for (int i = 0; i < m; i++) {
            double q = a[i] - 0.5;
            a[i] = q;
            c[i] = middle(q);
        }
        for (int i = 0; i < m; i++) {
            long q = Double.doubleToRawLongBits(a[i]);
            long isOutside = -((MIDDLE_BITS - (q & ~SIGN)) >>> 63);
            long outside = Double.doubleToRawLongBits(d[i]) | (q & SIGN);
            a[i] = Double.longBitsToDouble((outside & isOutside) | (Double.doubleToRawLongBits(c[i]) & ~isOutside));
        }
    }

    /// Whether some value is not a normal number between 0 and 1.
    private static boolean anyRare(double[] p, int m) {
        long smallest = Double.doubleToRawLongBits(Double.MIN_NORMAL);
        long largest = Double.doubleToRawLongBits(Math.nextDown(1.0));
        long signs = 0;
        for (int i = 0; i < m; i++) {
            long bits = Double.doubleToRawLongBits(p[i]);
            signs |= bits | (bits - smallest) | (largest - bits);
        }
        return signs < 0;
    }

    private static double middle(double q) {
        double y = q * q;
        double p = Math.fma(21736504.82502628, y, -3714782.671062475);
        p = Math.fma(p, y, 890002.1869818062);
        p = Math.fma(p, y, 23120.09097778133);
        p = Math.fma(p, y, 23553.769749445062);
        p = Math.fma(p, y, 5767.404356479567);
        p = Math.fma(p, y, 1692.689003774016);
        p = Math.fma(p, y, 496.22181188445916);
        p = Math.fma(p, y, 149.83043850465012);
        p = Math.fma(p, y, 47.03578234720831);
        p = Math.fma(p, y, 15.667608987833649);
        p = Math.fma(p, y, 5.772533538550562);
        p = Math.fma(p, y, 2.6249349909537965);
        return q * Math.fma(p, y, 2.5066282746310007);
    }

    private static double near(double r) {
        double x = r - 1.2;
        double n = Math.fma(0.00039932178972424873, x, 0.013076333805827678);
        n = Math.fma(n, x, 0.14543139227272053);
        n = Math.fma(n, x, 0.8120203787621588);
        n = Math.fma(n, x, 2.6815726298788416);
        n = Math.fma(n, x, 5.423864417595698);
        n = Math.fma(n, x, 6.326773863703927);
        n = Math.fma(n, x, 3.6607977344354485);
        n = Math.fma(n, x, 0.7162199969390696);
        double d = Math.fma(0.0002823442123895539, x, 0.00891010326893736);
        d = Math.fma(d, x, 0.09292359737146794);
        d = Math.fma(d, x, 0.4800274673690611);
        d = Math.fma(d, x, 1.4546377920892866);
        d = Math.fma(d, x, 2.6206097090907696);
        d = Math.fma(d, x, 2.5393349102383644);
        return n / Math.fma(d, x, 1);
    }

    private static double far(double r) {
        double x = r - 4.4;
        double n = Math.fma(2.8839090819538765e-07, x, 3.789387738602004e-05);
        n = Math.fma(n, x, 0.001659811456217251);
        n = Math.fma(n, x, 0.033301586860052135);
        n = Math.fma(n, x, 0.3448179260069445);
        n = Math.fma(n, x, 1.899901611278694);
        n = Math.fma(n, x, 5.271885029553675);
        n = Math.fma(n, x, 5.772338702540571);
        double d = Math.fma(2.8332069612353143e-15, x, 2.0392184286478427e-07);
        d = Math.fma(d, x, 2.58982589829282e-05);
        d = Math.fma(d, x, 0.0010604149666712348);
        d = Math.fma(d, x, 0.01895003830945274);
        d = Math.fma(d, x, 0.1626055088907488);
        d = Math.fma(d, x, 0.6564968589072755);
        return n / Math.fma(d, x, 1);
    }
}
