package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;

/// Student's t density.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
public record Student(double dof, double location, double scale) implements Scaled {
    private static final Entry ENTRY = Entry.of(
            v -> new Student(v[0], v[1], v[2]),
            between(
                    0.1,
                    1e10,
                    "dof",
                    "degrees of freedom; the fewer, the heavier the tails",
                    "Below, draws differ by hundreds of orders of magnitude; above, the density is the normal one."),
            finite("location", "middle value").or(0),
            positive("scale", "spread; not the standard deviation", "Student's density divides by its scale.")
                    .or(1));

    static final Family FAMILY = new Described(
                    "student",
                    "a mean known from few readings; a certificate with degrees of freedom; heavy tails",
                    ENTRY)
            .enteredBy(ByQuantiles.ofLocationAndScale(
                    v -> new Student(v[0], v[1], v[2]), ENTRY.rules().getFirst()));

    public Student {
        ENTRY.check(dof, location, scale);
    }

    @Override
    public Density standard() {
        return new Standard(dof, IncompleteBeta.of(0.5 * dof, 0.5));
    }

    /// Student's t density of location 0 and scale 1.
    ///
    /// @param tails of `dof / (dof + t^2)`
    record Standard(double dof, IncompleteBeta tails) implements Shape {
        /// From here on the tail is a power.
        private static final double FAR = 1e10;

        private static final int TRIALS = 200;
        private static final double LOG_2 = 0.6931471805599453;
        private static final Normal.Standard NORMAL = new Normal.Standard();

        @Override
        public double pdf(double z) {
            return Exp.exp(logPdf(z));
        }

        @Override
        public double logPdf(double z) {
            double s = Math.abs(z) / Math.sqrt(dof);
            double log = s > FAR ? 2 * Log.log(s) : StrictMath.log1p(s * s);
            return -0.5 * (dof + 1) * log - logBeta();
        }

        /// `log(sqrt(dof) B(dof / 2, 1 / 2))`.
        private double logBeta() {
            return tails.logScale() + LOG_2 - 0.5 * Log.log(dof);
        }

        /// The mass beyond `t >= 0`.
        private double tail(double t) {
            double s = t / Math.sqrt(dof);
            if (s > FAR) {
                return Exp.exp(logTail(t));
            }
            double square = s * s;
            return 0.5 * tails.lower(1 / (1 + square), square / (1 + square));
        }

        private double logTail(double t) {
            double s = t / Math.sqrt(dof);
            if (s > FAR) {
                return -dof * Log.log(s) - tails.logScale() - LOG_2;
            }
            double square = s * s;
            return tails.logLower(1 / (1 + square), square / (1 + square)) - LOG_2;
        }

        /// The mass between 0 and `t >= 0`.
        private double middle(double t) {
            double square = t * t / dof;
            return 0.5 * tails.mirrored().lower(square / (1 + square), 1 / (1 + square));
        }

        @Override
        public double cdf(double z) {
            return z > 0 ? 1 - tail(z) : tail(-z);
        }

        @Override
        public double survival(double z) {
            return cdf(-z);
        }

        @Override
        public double inner(double p) {
            return p <= 0.5 ? -inverse(p) : inverse(1 - p);
        }

        @Override
        public double upperInner(double q) {
            return -inner(q);
        }

        /// The t with the mass `p <= 1/2` beyond it, by Newton's method: near the middle on the mass between 0 and t,
        /// which is concave; in the tail on the logarithm of the mass, which is concave in `log t`.
        private double inverse(double p) {
            double z = -NORMAL.quantile(p);
            if (p > 0.3) {
                double t = (0.5 - p) / pdf(0);
                for (int trial = 0; trial < 8; trial++) {
                    t -= (middle(t) - (0.5 - p)) / pdf(t);
                }
                return t;
            }
            double logP = Log.log(p);
            double far = (-tails.logScale() - LOG_2 - logP) / dof + 0.5 * Log.log(dof);
            double w = dof < 5 ? far : Log.log(z) + Math.min((z * z + 1) / (4 * dof), 2);
            for (int trial = 0; trial < TRIALS; trial++) {
                double t = Exp.exp(w);
                double log = logTail(t);
                double step = (logP - log) / Exp.exp(logPdf(t) + w - log);
                w -= step;
                if (Math.abs(step) < 1e-7) {
                    break;
                }
            }
            double t = Exp.exp(w);
            return t < Double.POSITIVE_INFINITY ? Math.fma(t, (tail(t) - p) / Exp.exp(logPdf(t) + w), t) : t;
        }

        @Override
        public double mean() {
            return dof > 1 ? 0 : Double.NaN;
        }

        /// Infinite for `dof <= 2`, undefined for `dof <= 1`, where there is no mean.
        @Override
        public double variance() {
            return dof > 2 ? dof / (dof - 2) : dof > 1 ? Double.POSITIVE_INFINITY : Double.NaN;
        }

        /// Undefined for `dof <= 3`, where the third moments of both tails are infinite.
        @Override
        public double skewness() {
            return dof > 3 ? 0 : Double.NaN;
        }

        /// Infinite for `dof <= 4`, undefined for `dof <= 2`, where there is no variance.
        @Override
        public double excessKurtosis() {
            return dof > 4 ? 6 / (dof - 4) : dof > 2 ? Double.POSITIVE_INFINITY : Double.NaN;
        }

        @Override
        public TailOrders tailOrders() {
            return new TailOrders(dof, dof);
        }

        @Override
        public Support support() {
            return new Support(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
        }
    }
}
