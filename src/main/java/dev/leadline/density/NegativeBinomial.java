package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.GammaFunction;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import java.util.List;

/// How many trials fail before the success that makes up the `size`: 0, 1, 2 … The successes are not counted. Also a
/// Poisson number whose mean is itself uncertain and follows a gamma density of that shape; the size need not be whole.
///
/// Mean 0 is allowed: then none fails.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Loader (2000), Fast and accurate computation of binomial probabilities. From memory.
public record NegativeBinomial(double size, double mean) implements WholeNumbers {
    private static final double HALF_LOG_2PI = 0.9189385332046728;
    private static final double SMALLEST_SIZE = 1e-3;
    private static final double LARGEST = 1e9;

    private static final Rule SIZE = between(
            SMALLEST_SIZE,
            LARGEST,
            "size",
            "number of successes waited for; the smaller, the more the number varies",
            "Beyond these limits it is 0 nearly always, or the same as a Poisson density.");

    private static final Rule MEAN = between(
            0,
            LARGEST,
            "mean",
            "mean number of failures",
            "A number of failures is not negative, and beyond 1e9 its tails would take too long.");

    private static final Entry ENTRY = Entry.of(v -> new NegativeBinomial(v[0], v[1]), SIZE, MEAN);

    private static final Entry BY_PROBABILITY = Entry.of(
                    v -> ofSizeAndProbability(v[0], v[1]),
                    SIZE,
                    between(1e-9, 1, "probability", "chance that one trial succeeds", "A success must be possible."))
            .and(v -> meanTooLarge(v[0], v[1]));

    private static final Entry BY_SD = Entry.of(
                    v -> ofMeanAndSd(v[0], v[1]),
                    between(
                            1e-9,
                            LARGEST,
                            "mean",
                            "mean number of failures",
                            "Where it is nearly 0, or beyond 1e9, mean and sd do not say which density it is."),
                    positive("sd", "standard deviation", "A number that varies has one."))
            .and(v -> sizeOutside(v[0], v[1]));

    static final Family FAMILY = new Described(
            "negative-binomial",
            "counts that vary more than a Poisson number: claims, defects in clusters, failures before a number of successes",
            ENTRY,
            BY_PROBABILITY,
            BY_SD);

    public NegativeBinomial {
        ENTRY.check(size, mean);
    }

    public static NegativeBinomial ofSizeAndProbability(double size, double probability) {
        BY_PROBABILITY.check(size, probability);
        return new NegativeBinomial(size, meanOf(size, probability));
    }

    public static NegativeBinomial ofMeanAndSd(double mean, double sd) {
        BY_SD.check(mean, sd);
        return new NegativeBinomial(sizeOf(mean, sd), mean);
    }

    private static double meanOf(double size, double probability) {
        return size * (1 - probability) / probability;
    }

    private static List<Problem> meanTooLarge(double size, double probability) {
        double mean = meanOf(size, probability);
        return mean <= LARGEST
                ? List.of()
                : List.of(Problem.of("size %s with probability %s is too extreme"
                                .formatted(Shortest.text(size), Shortest.text(probability)))
                        .because("They give the mean %s; it must be at most %s."
                                .formatted(Shortest.text(mean), Shortest.text(LARGEST))));
    }

    private static double sizeOf(double mean, double sd) {
        return mean * (mean / (sd * sd - mean));
    }

    private static List<Problem> sizeOutside(double mean, double sd) {
        if (!(sd * sd > mean)) {
            return List.of(Rule.problem(
                            "sd",
                            sd,
                            "greater than the square root of the mean, " + Shortest.text(Math.sqrt(mean)),
                            "This density varies more than a Poisson number of the same mean.",
                            "For one that varies as much, take poisson; for less, binomial.")
                    .at(Place.of("sd")));
        }
        double size = sizeOf(mean, sd);
        return size >= SMALLEST_SIZE && size <= LARGEST
                ? List.of()
                : List.of(Problem.of(
                                "mean %s with sd %s is too extreme".formatted(Shortest.text(mean), Shortest.text(sd)))
                        .because("They give the size %s; it must be at least %s and at most %s."
                                .formatted(Shortest.text(size), Shortest.text(SMALLEST_SIZE), Shortest.text(LARGEST))));
    }

    private double success() {
        return size / (size + mean);
    }

    private double failure() {
        return mean / (size + mean);
    }

    @Override
    public double logMass(double k) {
        if (k == 0) {
            return -size * StrictMath.log1p(mean / size);
        }
        double n = size + k;
        double excess = size * ((k - mean) / (size + mean));
        return 0.5 * (Log.log(size / n / k))
                - HALF_LOG_2PI
                + (GammaFunction.stirlingError(n) - GammaFunction.stirlingError(size) - GammaFunction.stirlingError(k))
                - (Deviance.of(size, n * success(), excess) + Deviance.of(k, n * failure(), -excess));
    }

    @Override
    public double upTo(double k) {
        return IncompleteBeta.isBelow(size, k + 1, success())
                ? prefix(k) * IncompleteBeta.fraction(size, k + 1, success(), failure(), excess(k))
                : 1 - beyond(k);
    }

    @Override
    public double beyond(double k) {
        return IncompleteBeta.isBelow(size, k + 1, success())
                ? size < 1 ? IncompleteBeta.upperOfSmall(size, k + 1, success()) : 1 - upTo(k)
                : prefix(k) * IncompleteBeta.fraction(k + 1, size, failure(), success(), -excess(k));
    }

    /// `p^r q^(k+1) / B(r, k + 1)`.
    private double prefix(double k) {
        return Exp.exp(logMass(k)) * failure() * (size + k);
    }

    /// `(k + 1) p - r q`.
    private double excess(double k) {
        return size * ((k + 1 - mean) / (size + mean));
    }

    /// From the quantile of the gamma density, which it is like where its mean is large.
    @Override
    public double near(double z) {
        var gamma = IncompleteGamma.of(size);
        double share = z < 0 ? gamma.inverse(NORMAL.cdf(z)) : gamma.upperInverse(NORMAL.survival(z));
        return mean / size * share;
    }

    @Override
    public double variance() {
        return mean * (1 + mean / size);
    }

    @Override
    public double skewness() {
        return mean == 0 ? Double.NaN : (2 - success()) / Math.sqrt(size * failure());
    }

    @Override
    public double excessKurtosis() {
        return mean == 0 ? Double.NaN : 6 / size + success() * success() / (size * failure());
    }

    @Override
    public Support support() {
        return new Support(0, mean == 0 ? 0 : Double.POSITIVE_INFINITY);
    }
}
