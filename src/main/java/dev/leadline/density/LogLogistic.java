package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Power;
import dev.leadline.numeric.Trigonometry;
import java.util.function.IntToDoubleFunction;

/// The log-logistic density: the logarithm is logistic; `cdf(x) = 1 / (1 + (x / scale)^-shape)`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Johnson, Kotz and Balakrishnan, Continuous Univariate Distributions, chapter 23. From memory.
public record LogLogistic(double shape, double scale) implements Scaled {
    private static final Entry ENTRY = Entry.of(
            v -> new LogLogistic(v[0], v[1]),
            between(
                    0.05,
                    1e6,
                    "shape",
                    "the smaller, the heavier the upper tail; only moments below it exist",
                    "Beyond these limits its values are too far apart or too close for numbers of 16 digits."),
            positive("scale", "half of the values are below it", "The log-logistic density divides by its scale."));

    static final Family FAMILY = new Described(
                    "log-logistic",
                    "times to failure or recovery whose rate rises, then falls; stream flow, wealth",
                    ENTRY)
            .enteredBy(ByQuantiles.ofPositiveShapeAndScale(0.05, 1e6, v -> new LogLogistic(v[0], v[1])));

    public LogLogistic {
        ENTRY.check(shape, scale);
    }

    @Override
    public Density standard() {
        return new Standard(shape);
    }

    /// The log-logistic density of scale 1.
    record Standard(double shape) implements Shape, Linked {
        private static final Logistic.Standard LOGISTIC = new Logistic.Standard();

        /// `z^shape` or its inverse, whichever is at most 1.
        private double power(double z) {
            return Power.pow(z, z < 1 ? shape : -shape);
        }

        @Override
        public double pdf(double z) {
            if (z <= 0) {
                return z < 0 || shape > 1 ? 0 : shape < 1 ? Double.POSITIVE_INFINITY : 1;
            }
            double power = power(z);
            return shape * (power / z) / ((1 + power) * (1 + power));
        }

        @Override
        public double logPdf(double z) {
            return z <= 0 || z == Double.POSITIVE_INFINITY
                    ? Log.log(pdf(z))
                    : Log.log(shape) - Log.log(z) + LOGISTIC.logPdf(shape * Log.log(z));
        }

        @Override
        public double cdf(double z) {
            return z <= 0 ? 0 : (z < 1 ? power(z) : 1) / (1 + power(z));
        }

        @Override
        public double survival(double z) {
            return z <= 0 ? 1 : (z < 1 ? 1 : power(z)) / (1 + power(z));
        }

        @Override
        public double inner(double p) {
            return Exp.exp(linked(p));
        }

        @Override
        public double upperInner(double q) {
            return Exp.exp(upperLinked(q));
        }

        @Override
        public Link link() {
            return Link.ROOT;
        }

        @Override
        public double linked(double p) {
            return LOGISTIC.quantile(p) / shape;
        }

        @Override
        public double upperLinked(double q) {
            return -linked(q);
        }

        /// The moment of order n is `n b / sin(n b)`, `b = pi / shape`.
        @Override
        public double mean() {
            return shape > 1 ? angle() / sine(1) : Double.POSITIVE_INFINITY;
        }

        /// `b (sin b - b cos b) / (sin^2 b cos b)`.
        @Override
        public double variance() {
            return shape > 2
                    ? angle() * series(3, n -> n - 1) / (sine(1) * sine(1) * cosine(1))
                    : Double.POSITIVE_INFINITY;
        }

        /// The third central moment is `(3/4 b (cos b - cos 3b) - 3 b^2 sin 3b + 2 b^3 (cos 3b + 2 cos b)) /
        /// (sin^2 b cos b sin 3b)`.
        @Override
        public double skewness() {
            if (!(shape > 3)) {
                return Shape.super.skewness();
            }
            double numerator = series(7, n -> {
                double nine = StrictMath.pow(3, n - 1);
                return -n * (0.75 * (1 - nine) + (n - 1) * (nine - 2 * (nine / 9 + 2) * (n - 2)));
            });
            double variance = variance();
            return numerator / (sine(1) * sine(1) * cosine(1) * sine(3)) / (variance * Math.sqrt(variance));
        }

        /// The fourth central moment is `(b (2 sin 3b - sin 5b - sin b) / 4 - 3/2 b^2 (cos 3b - cos 5b) +
        /// 3 b^3 (sin 5b + sin b) - 3/2 b^4 (cos 5b + 2 cos 3b + 3 cos b)) / (sin^3 b cos b cos 2b sin 3b)`.
        @Override
        public double excessKurtosis() {
            if (!(shape > 4)) {
                return Shape.super.excessKurtosis();
            }
            double numerator = series(8, n -> {
                int j = n - 1;
                double three = StrictMath.pow(3, j - 3);
                double five = StrictMath.pow(5, j - 3);
                return -n
                        * (13.5 * three
                                - 31.25 * five
                                - 0.25
                                - j * (13.5 * three - 37.5 * five)
                                - 3.0 * j * (j - 1) * (5 * five + 1 - (j - 2) * (0.5 * five + three + 1.5)));
            });
            double sine = sine(1);
            double variance = variance();
            double denominator = sine * sine * sine * cosine(1) * cosine(2) * sine(3);
            return numerator / denominator / (variance * variance) - 3;
        }

        private double angle() {
            return Math.PI / shape;
        }

        /// `sin(n b)`, accurate where `n b` is nearly pi.
        private double sine(int n) {
            return Trigonometry.sin(Math.PI * (Math.min(n, shape - n) / shape));
        }

        /// `cos(n b)`, accurate where `n b` is nearly pi/2.
        private double cosine(int n) {
            return Trigonometry.sin(Math.PI * ((shape - 2 * n) / (2 * shape)));
        }

        /// The series in the angle b of a sum of sines and cosines whose first terms cancel, from `b^first` on, every
        /// second term.
        ///
        /// @param factor of `b^n / n!`, but for the sign, which alternates
        private double series(int first, IntToDoubleFunction factor) {
            double b = angle();
            double term = 1;
            for (int n = 1; n <= first; n++) {
                term *= b / n;
            }
            double sum = 0;
            for (int n = first; n < first + 48; n += 2) {
                sum += factor.applyAsDouble(n) * term;
                term *= -b * b / ((n + 1.0) * (n + 2.0));
            }
            return sum;
        }

        @Override
        public TailOrders tailOrders() {
            return new TailOrders(Double.POSITIVE_INFINITY, shape);
        }

        @Override
        public Support support() {
            return new Support(0, Double.POSITIVE_INFINITY);
        }
    }
}
