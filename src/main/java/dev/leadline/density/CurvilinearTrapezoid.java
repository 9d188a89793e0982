package dev.leadline.density;

import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Problem;
import java.util.List;

/// The curvilinear trapezoid: uniform between limits that are known to `± inexact` only, and move so that their middle
/// stays. The least possible value is `from - inexact`, the largest `to + inexact`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: JCGM 101:2008, 6.4.3.
public record CurvilinearTrapezoid(double from, double to, double inexact) implements Scaled {
    private static final Entry ENTRY = Entry.of(
                    v -> new CurvilinearTrapezoid(v[0], v[1], v[2]),
                    finite("from", "lower limit as stated"),
                    finite("to", "upper limit as stated"),
                    positive(
                            "inexact",
                            "by how much the limits may be off",
                            "With limits that are exact the density is uniform."))
            .and(v -> problems(v[0], v[1], v[2]));

    static final Family FAMILY = new Described(
            "curvilinear-trapezoid",
            "limits of a data sheet or certificate that are themselves stated to a few digits",
            ENTRY);

    public CurvilinearTrapezoid {
        ENTRY.check(from, to, inexact);
    }

    private static List<Problem> problems(double from, double to, double inexact) {
        var problems = Uniform.rising("from", from, "to", to);
        double half = 0.5 * (to - from);
        return !problems.isEmpty() || inexact < half
                ? problems
                : List.of(Rule.problem(
                        "inexact",
                        inexact,
                        "less than half of the distance between from and to, " + Shortest.text(half),
                        "Otherwise the limits could change places.",
                        ""));
    }

    private double low() {
        return from - inexact;
    }

    private double high() {
        return to + inexact;
    }

    @Override
    public double location() {
        return low();
    }

    @Override
    public double scale() {
        return 0.5 * (to - from) + inexact;
    }

    @Override
    public Standard standard() {
        return new Standard((0.5 * (to - from) - inexact) / scale(), 2 * inexact / scale());
    }

    @Override
    public double pdf(double x) {
        return standard().height(Math.min(fromLow(x), fromHigh(x))) / scale();
    }

    @Override
    public double logPdf(double x) {
        return Log.log(pdf(x));
    }

    @Override
    public void logPdf(double[] x, double[] out, int n) {
        for (int i = 0; i < n; i++) {
            out[i] = logPdf(x[i]);
        }
    }

    @Override
    public double cdf(double x) {
        return x >= high() ? 1 : standard().below(fromLow(x));
    }

    @Override
    public double survival(double x) {
        return x <= low() ? 1 : standard().below(fromHigh(x));
    }

    @Override
    public double quantile(double p) {
        return p > 0.5 && p <= 1
                ? Math.fma(-scale(), standard().distance(1 - p), high())
                : Math.fma(scale(), standard().distance(p), low());
    }

    @Override
    public double upperQuantile(double q) {
        return q > 0.5 && q <= 1
                ? Math.fma(scale(), standard().distance(1 - q), low())
                : Math.fma(-scale(), standard().distance(q), high());
    }

    @Override
    public double mean() {
        return 0.5 * from + 0.5 * to;
    }

    @Override
    public Support support() {
        return new Support(low(), high());
    }

    private double fromLow(double x) {
        return (x - low()) / scale();
    }

    private double fromHigh(double x) {
        return (high() - x) / scale();
    }

    /// The density between 0 and 2: a uniform value from 1 - s to 1 + s, where s itself is uniform between `sure` and
    /// 1.
    ///
    /// @param sure the least possible limit
    /// @param inexact its distance from 1
    record Standard(double sure, double inexact) implements Shape {
        private static final int TRIALS = 60;

        /// The density at distance y from the nearer end.
        private double height(double y) {
            return y <= 0 ? 0 : -StrictMath.log1p(-Math.min(y, inexact)) / (2 * inexact);
        }

        /// The mass of the curved part up to distance y from its end.
        private double curved(double y) {
            return Deviance.of(y < inexact ? 1 - y : sure, 1, Math.min(y, inexact)) / (2 * inexact);
        }

        /// The mass up to distance y from one end, of 2 in all.
        private double below(double y) {
            if (!(y > 0)) {
                return y <= 0 ? 0 : y;
            }
            return y > 1 ? 1 - below(2 - y) : curved(y) + Math.max(y - inexact, 0) * height(inexact);
        }

        /// The distance from an end up to which the mass is `p <= 1/2`; in the curved part, where the mass is
        /// convex, by Newton's method from the right.
        private double distance(double p) {
            if (!(p > 0 && p <= 0.5)) {
                return p == 0 ? 0 : Double.NaN;
            }
            double corner = curved(inexact);
            if (p >= corner) {
                return Math.min(inexact + (p - corner) / height(inexact), 1);
            }
            double y = Math.min(2 * Math.sqrt(inexact * p), inexact);
            for (int trial = 0; trial < TRIALS; trial++) {
                double step = (curved(y) - p) / height(y);
                y -= step;
                if (Math.abs(step) <= 1e-15 * y) {
                    break;
                }
            }
            return y;
        }

        @Override
        public double pdf(double z) {
            return height(Math.min(z, 2 - z));
        }

        @Override
        public double logPdf(double z) {
            return Log.log(pdf(z));
        }

        @Override
        public double cdf(double z) {
            return below(z);
        }

        @Override
        public double survival(double z) {
            return below(2 - z);
        }

        @Override
        public double inner(double p) {
            return p <= 0.5 ? distance(p) : 2 - distance(1 - p);
        }

        @Override
        public double upperInner(double q) {
            return q <= 0.5 ? 2 - distance(q) : distance(1 - q);
        }

        @Override
        public double mean() {
            return 1;
        }

        /// A third of the mean of `s^2`.
        @Override
        public double variance() {
            return (1 + sure + sure * sure) / 9;
        }

        @Override
        public double skewness() {
            return 0;
        }

        /// The fourth moment is `(1 + r + r^2 + r^3 + r^4) / 25`, r being `sure`.
        @Override
        public double excessKurtosis() {
            double r = sure;
            double square = 1 + r + r * r;
            return 3 * Math.fma(Math.fma(Math.fma(Math.fma(2, r, -23), r, -48), r, -23), r, 2) / (25 * square * square);
        }

        @Override
        public Support support() {
            return new Support(0, 2);
        }
    }
}
