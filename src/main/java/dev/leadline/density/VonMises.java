package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.finite;

import dev.leadline.numeric.Bessel;
import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Trigonometry;

/// The von Mises density of an angle in radians, from `mean - pi` to `mean + pi`: `exp(concentration cos(x - mean))`
/// over its integral. Concentration 0 is uniform.
///
/// Mean, variance, skewness and kurtosis are those of the number x on that range, not of a direction.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`). The variance is an integral of the density, as accurate;
/// the kurtosis too, to an absolute 1e-13.
///
/// Source: von Mises (1918), Physikalische Zeitschrift 19, 490-500; Mardia and Jupp (2000), Directional Statistics.
public record VonMises(double mean, double concentration) implements Ended {
    private static final Entry ENTRY = Entry.of(
            v -> new VonMises(v[0], v[1]),
            finite("mean", "middle direction, in radians"),
            between(
                    0,
                    1e8,
                    "concentration",
                    "0 is any direction alike; where large, the standard deviation is 1 over its square root",
                    "Below, the mean would be the rarest direction; above, the density is the normal one."));

    static final Family FAMILY =
            new Described("von-mises", "directions and phases in radians: wind, misalignment, time of day", ENTRY);

    public VonMises {
        ENTRY.check(mean, concentration);
    }

    @Override
    public double location() {
        return mean;
    }

    @Override
    public double scale() {
        return 1;
    }

    @Override
    public Density standard() {
        return new Standard(concentration, 2 * Math.PI * Bessel.scaledI0(concentration));
    }

    /// The von Mises density of mean 0. Its masses are integrals of the density as far as the tail reaches.
    ///
    /// @param integral of `exp(concentration (cos z - 1))`
    record Standard(double concentration, double integral) implements Shape {
        private static final int PANELS = 3;
        private static final Normal.Standard NORMAL = new Normal.Standard();

        private double exponent(double z) {
            double sine = Trigonometry.sin(0.5 * z);
            return -2 * concentration * sine * sine;
        }

        @Override
        public double pdf(double z) {
            return Math.abs(z) > Math.PI ? 0 : Exp.exp(exponent(z)) / integral;
        }

        @Override
        public double logPdf(double z) {
            return Math.abs(z) > Math.PI ? Double.NEGATIVE_INFINITY : exponent(z) - Log.log(integral);
        }

        @Override
        public double cdf(double z) {
            return z <= 0 ? lower(z) : 1 - lower(-z);
        }

        @Override
        public double survival(double z) {
            return cdf(-z);
        }

        /// For `z <= 0`.
        private double lower(double z) {
            if (z <= -Math.PI) {
                return 0;
            }
            double sine = Trigonometry.sin(0.5 * z);
            double far = sine * sine + 0.5 * Quadrature.END / concentration;
            double from = far < 1 ? -2 * StrictMath.asin(Math.sqrt(far)) : -Math.PI;
            return Quadrature.of(this::pdf, from, z, PANELS);
        }

        @Override
        public double inner(double p) {
            return p <= 0.5 ? inverse(p) : -inverse(1 - p);
        }

        @Override
        public double upperInner(double q) {
            return -inner(q);
        }

        /// The z with the mass `p <= 1/2` below it, by the logarithm of its distance from the lower end.
        private double inverse(double p) {
            double most = Math.min(Math.PI, p / pdf(Math.PI));
            double sine = NORMAL.quantile(p) / (2 * Math.sqrt(concentration));
            double like = sine > -1 ? Math.PI + 2 * StrictMath.asin(sine) : most;
            double w = Root.between(Log.log(p * integral) - 1e-9, Log.log(most) + 1e-9)
                    .from(Log.log(Math.min(like, most)))
                    .roughly()
                    .rising(w1 -> cdf(Exp.exp(w1) - Math.PI), w1 -> Exp.exp(w1) * pdf(Exp.exp(w1) - Math.PI), p);
            double z = Math.min(Exp.exp(w) - Math.PI, 0);
            return Math.max(z - (cdf(z) - p) / pdf(z), -Math.PI);
        }

        @Override
        public double mean() {
            return 0;
        }

        private double moment(int order) {
            double far = 60 / concentration;
            double reach = far < 1 ? 2 * StrictMath.asin(Math.sqrt(far)) : Math.PI;
            return 2 * Quadrature.of(z -> (order == 2 ? z * z : z * z * z * z) * pdf(z), 0, reach, 6);
        }

        @Override
        public double variance() {
            return moment(2);
        }

        @Override
        public double skewness() {
            return 0;
        }

        @Override
        public double excessKurtosis() {
            double variance = variance();
            return moment(4) / (variance * variance) - 3;
        }

        @Override
        public Support support() {
            return new Support(-Math.PI, Math.PI);
        }
    }
}
