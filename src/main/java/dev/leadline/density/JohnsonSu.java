package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;

/// Johnson's unbounded density: `gamma + delta asinh((x - xi) / lambda)` is standard normal.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`). Gamma's own rounding counts up to 40 times in a far tail.
///
/// Source: Johnson (1949), Biometrika 36, 149-176.
public record JohnsonSu(double gamma, double delta, double xi, double lambda) implements Scaled {
    private static final Entry ENTRY = Entry.of(
            v -> new JohnsonSu(v[0], v[1], v[2], v[3]),
            between(
                    -100,
                    100,
                    "gamma",
                    "skew: 0 symmetric, below 0 a longer upper tail",
                    "Beyond these limits it is a shifted lognormal density."),
            between(
                    0.05,
                    1e6,
                    "delta",
                    "the smaller, the heavier both tails; large is nearly normal",
                    "Below, draws differ by hundreds of orders of magnitude; above, the density is the normal one."),
            finite("xi", "location; the median where gamma is 0"),
            positive("lambda", "spread; not the standard deviation", "Johnson's density divides by lambda."));

    static final Family FAMILY = new Described(
            "johnson-su", "a fit to mean, spread, skew and tails at once: returns, errors, measured curves", ENTRY);

    public JohnsonSu {
        ENTRY.check(gamma, delta, xi, lambda);
    }

    @Override
    public double location() {
        return xi;
    }

    @Override
    public double scale() {
        return lambda;
    }

    @Override
    public Density standard() {
        return new Standard(gamma, delta);
    }

    /// Johnson's density of location 0 and scale 1.
    record Standard(double gamma, double delta) implements Shape {
        private static final Normal.Standard NORMAL = new Normal.Standard();
        private static final double FAR = 1e8;
        private static final double LOG_2 = 0.6931471805599453;

        private double normal(double z) {
            return Math.fma(delta, areaSinh(z), gamma);
        }

        private static double areaSinh(double z) {
            double x = Math.abs(z);
            double area =
                    x > FAR ? Log.log(x) + LOG_2 : StrictMath.log1p(x + x * x / (1 + Math.sqrt(Math.fma(x, x, 1))));
            return Math.copySign(area, z);
        }

        @Override
        public double pdf(double z) {
            return Math.abs(z) > FAR
                    ? Exp.exp(logPdf(z))
                    : NORMAL.pdf(normal(z)) * delta / Math.sqrt(Math.fma(z, z, 1));
        }

        @Override
        public double logPdf(double z) {
            double x = Math.abs(z);
            if (x == Double.POSITIVE_INFINITY) {
                return Double.NEGATIVE_INFINITY;
            }
            double root = x > FAR ? Log.log(x) : 0.5 * StrictMath.log1p(x * x);
            return NORMAL.logPdf(normal(z)) + Log.log(delta) - root;
        }

        @Override
        public double cdf(double z) {
            return NORMAL.cdf(normal(z));
        }

        @Override
        public double survival(double z) {
            return NORMAL.survival(normal(z));
        }

        @Override
        public double inner(double p) {
            return StrictMath.sinh((NORMAL.quantile(p) - gamma) / delta);
        }

        @Override
        public double upperInner(double q) {
            return StrictMath.sinh((NORMAL.upperQuantile(q) - gamma) / delta);
        }

        private double ratio() {
            return gamma / delta;
        }

        /// `exp(1 / delta^2)`.
        private double omega() {
            return Exp.exp(1 / (delta * delta));
        }

        private double omegaLessOne() {
            return StrictMath.expm1(1 / (delta * delta));
        }

        @Override
        public double mean() {
            return -Math.sqrt(omega()) * StrictMath.sinh(ratio());
        }

        @Override
        public double variance() {
            return 0.5 * omegaLessOne() * Math.fma(omega(), StrictMath.cosh(2 * ratio()), 1);
        }

        @Override
        public double skewness() {
            if (!(variance() < Double.POSITIVE_INFINITY)) {
                return Double.NaN;
            }
            double w = omega();
            double cosh = StrictMath.cosh(2 * ratio());
            double spread = Math.fma(w, cosh, 1);
            double odd = Math.fma(w * (w + 2), 2 * cosh + 1, 3) / spread;
            return -Math.sqrt(0.5 * w * omegaLessOne()) * (StrictMath.sinh(ratio()) / Math.sqrt(spread)) * odd;
        }

        /// With the factor `omega - 1` taken out of the difference from 3.
        @Override
        public double excessKurtosis() {
            if (!(variance() < Double.POSITIVE_INFINITY)) {
                return Double.NaN;
            }
            double w = omega();
            double per = 1 / StrictMath.cosh(2 * ratio());
            double two = w * w * (((w + 3) * w + 6) * w + 6);
            double one = 2 * w * (w + 3);
            double none = -0.5 * (((((w + 3) * w + 6) * w + 6) * w + 3) * w - 3);
            return omegaLessOne() * ((none * per + one) * per + two) / ((w + per) * (w + per));
        }

        @Override
        public Support support() {
            return new Support(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
        }
    }
}
