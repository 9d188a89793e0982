package dev.leadline.density;

import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Bessel;
import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Problem;
import java.util.List;
import java.util.OptionalDouble;

/// The Rice density: the length of a plane vector whose two components are normal with standard deviation `scale`,
/// about a point at `distance` from the origin. Distance 0 is the Rayleigh density.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`). Mean and variance are integrals of the density, as
/// accurate; skewness and kurtosis too, to an absolute 1e-13.
///
/// Source: Rice (1945), Bell System Technical Journal 24, 46-156. The upper tail is Marcum's function `Q1`.
public record Rice(double distance, double scale) implements Scaled {
    private static final double MOST_RATIO = 1e4;

    private static final Entry ENTRY = Entry.of(
                    v -> new Rice(v[0], v[1]),
                    new Rule(
                            "distance",
                            "distance of the centre from the origin: the amplitude without noise",
                            "at least 0",
                            v -> v >= 0,
                            "It is a length.",
                            "",
                            OptionalDouble.empty()),
                    positive(
                            "scale",
                            "standard deviation of each of the two components",
                            "The Rice density divides by its scale."))
            .and(v -> problems(v[0], v[1]));

    static final Family FAMILY = new Described(
            "rice", "amplitude of a signal in noise, magnitude of an image, miss distance off a biased aim", ENTRY);

    public Rice {
        ENTRY.check(distance, scale);
    }

    private static List<Problem> problems(double distance, double scale) {
        return distance <= MOST_RATIO * scale
                ? List.of()
                : List.of(Rule.problem(
                        "distance",
                        distance,
                        "at most 10000 times the scale, " + Shortest.text(scale),
                        "Beyond, it is the normal density to less than 1e-4 of its spread.",
                        "Check the units of both, or use normal."));
    }

    @Override
    public Density standard() {
        return new Standard(distance / scale);
    }

    /// The Rice density of scale 1. Its masses are integrals of the density as far as the tail reaches.
    record Standard(double distance) implements Shape {
        private static final int PANELS = 3;
        private static final Normal.Standard NORMAL = new Normal.Standard();

        /// Half the mass is near here.
        private double middle() {
            return Math.sqrt(Math.fma(distance, distance, 1.4));
        }

        @Override
        public double pdf(double z) {
            double d = z - distance;
            return z <= 0 || z == Double.POSITIVE_INFINITY
                    ? 0
                    : z * Exp.exp(-0.5 * d * d) * Bessel.scaledI0(distance * z);
        }

        @Override
        public double logPdf(double z) {
            double d = z - distance;
            return z <= 0 || z == Double.POSITIVE_INFINITY
                    ? Double.NEGATIVE_INFINITY
                    : Log.log(z) - 0.5 * d * d + Log.log(Bessel.scaledI0(distance * z));
        }

        @Override
        public double cdf(double z) {
            return z <= middle() ? lower(z) : 1 - upper(z);
        }

        @Override
        public double survival(double z) {
            return z <= middle() ? 1 - lower(z) : upper(z);
        }

        private double lower(double z) {
            double from = Math.max(0, z - Quadrature.normalReach(distance - z));
            return z <= 0 ? 0 : Quadrature.of(this::pdf, from, z, PANELS);
        }

        private double upper(double z) {
            return z < Double.POSITIVE_INFINITY
                    ? Quadrature.of(this::pdf, z, z + Quadrature.normalReach(z - distance), PANELS)
                    : Double.isNaN(z) ? z : 0;
        }

        @Override
        public double inner(double p) {
            double z = Exp.exp(logInner(p));
            return z - (cdf(z) - p) / pdf(z);
        }

        @Override
        public double upperInner(double q) {
            double z = Exp.exp(logUpperInner(q));
            return z + (survival(z) - q) / pdf(z);
        }

        private double logInner(double p) {
            double small = 0.5 * Log.log(2 * p) + 0.25 * distance * distance;
            double normal = middle() + NORMAL.quantile(p);
            boolean isSmall = small < -0.5 && small + Log.log(distance) < 0 || normal < 0.2;
            return Root.between(Math.min(-1, small - 10) - 400, Log.log(middle() + 40))
                    .from(isSmall ? Math.min(small, 0) : Log.log(normal))
                    .roughly()
                    .rising(w -> cdf(Exp.exp(w)), this::slope, p);
        }

        private double logUpperInner(double q) {
            double normal = Math.max(0.5, middle() + NORMAL.upperQuantile(q));
            return Root.between(-400, Log.log(middle() + 40))
                    .from(Log.log(normal))
                    .roughly()
                    .falling(w -> survival(Exp.exp(w)), w -> -slope(w), q);
        }

        /// Of the mass below `exp(w)`.
        private double slope(double w) {
            double z = Exp.exp(w);
            return pdf(z) * z;
        }

        private double moment(double about, int order) {
            return Quadrature.of(
                    z -> {
                        double d = z - about;
                        double power = order == 1 ? z : order == 2 ? d * d : order == 3 ? d * d * d : d * d * d * d;
                        return power * pdf(z);
                    },
                    Math.max(0, distance - 12),
                    distance + 12,
                    12);
        }

        @Override
        public double mean() {
            return moment(0, 1);
        }

        @Override
        public double variance() {
            return moment(mean(), 2);
        }

        @Override
        public double skewness() {
            double variance = variance();
            return moment(mean(), 3) / (variance * Math.sqrt(variance));
        }

        @Override
        public double excessKurtosis() {
            double variance = variance();
            return moment(mean(), 4) / (variance * variance) - 3;
        }

        @Override
        public Support support() {
            return new Support(0, Double.POSITIVE_INFINITY);
        }
    }
}
