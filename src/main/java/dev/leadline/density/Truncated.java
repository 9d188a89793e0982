package dev.leadline.density;

import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.numeric.Significant;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;

/// A density of which only the values in an interval are kept, its ends included, and of a discrete one the values that
/// equal an end to rounding.
///
/// What is kept is measured from the nearer tail of the density, and where the two masses that differ are
/// nearly the same, by quadrature of the density between them: so intervals far out in a tail, and narrow ones
/// anywhere, keep their digits. Moments are those of the quantiles. Quantiles go no further out than the
/// density's own at the mass 1e-300.
///
/// Error: relative 1e-12 in both tails (`CompositesTest`).
public final class Truncated implements Shape {
    /// With less, the rarest draw would lie where the masses of the density itself have lost digits.
    private static final double LEAST_MASS = 1e-280;

    private final Density of;
    private final double low;
    private final double high;
    private final Kept fromLow;
    private final Kept fromHigh;
    private final double mass;
    private final double median;
    private Moments.Four moments;

    private Truncated(Density of, double low, double high) {
        this.of = of;
        this.low = Math.max(low, of.support().low());
        this.high = Math.min(high, of.support().high());
        this.fromLow = new Kept(of, this.low, this.high);
        this.fromHigh = new Kept(new Shifted(of, 0, -1), -this.high, -this.low);
        this.mass = fromLow.mass(this.high);
        this.median = mass >= LEAST_MASS ? quantileFromBelow(0.5) : Double.NaN;
    }

    /// @param low may be `-∞`
    /// @param high may be `∞`
    /// @throws Refusal where nothing is kept
    public static Truncated of(Density density, double low, double high) {
        var problems = problems(density, low, high);
        if (!problems.isEmpty()) {
            throw new Refusal(problems);
        }
        if (density instanceof Truncated t) {
            return of(t.of, Math.max(low, t.low), Math.min(high, t.high));
        }
        var truncated = density.isDiscrete()
                ? new Truncated(
                        density,
                        Atoms.from(density, low - rounding(density, low)),
                        Atoms.upTo(density, high + rounding(density, high)))
                : new Truncated(density, low, high);
        if (!(truncated.mass >= LEAST_MASS)) {
            throw new Refusal(Problem.of("the interval from %s to %s keeps nothing"
                            .formatted(Shortest.text(low), Shortest.text(high)))
                    .because(
                            truncated.mass > 0
                                    ? "The chance of a value in it is %s; it must be at least %s, or draws lose digits."
                                            .formatted(Significant.text(truncated.mass, 3), Shortest.text(LEAST_MASS))
                                    : "The chance of a value in it is 0.")
                    .tryThis("Check the unit of the ends, or take a wider interval."));
        }
        return truncated;
    }

    /// How far from an end, as typed, a value of a discrete density may be that equals it: the third of `.1, .2, .3` is
    /// `.30000000000000004` where it is three times `.1`.
    private static double rounding(Density density, double end) {
        return Double.isInfinite(end)
                ? 0
                : 4
                        * Math.ulp(Math.max(
                                Math.abs(end), Math.abs(density.standardised().location())));
    }

    private static List<Problem> problems(Density density, double low, double high) {
        var problems = new ArrayList<Problem>();
        if (Double.isNaN(low) || low == Double.POSITIVE_INFINITY) {
            problems.add(Rule.problem("the lower end", low, "a number or -∞", "Values below it are left out.", ""));
        }
        if (Double.isNaN(high) || high == Double.NEGATIVE_INFINITY) {
            problems.add(Rule.problem("the upper end", high, "a number or ∞", "Values above it are left out.", ""));
        }
        if (!problems.isEmpty()) {
            return problems;
        }
        if (low >= high) {
            return List.of(Rule.problem(
                    "the upper end",
                    high,
                    "greater than the lower one, " + Shortest.text(low),
                    low == high ? "The interval would be a single point." : "The interval would be empty.",
                    low == high ? "For a fixed value use a constant." : "Swap the two ends."));
        }
        var support = density.support();
        boolean isMissed = density.isDiscrete()
                ? high + rounding(density, high) < support.low() || low - rounding(density, low) > support.high()
                : high <= support.low() || low >= support.high();
        return isMissed
                ? List.of(Problem.of("the interval from %s to %s misses all values of the density"
                                .formatted(Shortest.text(low), Shortest.text(high)))
                        .because("They lie between %s and %s."
                                .formatted(Shortest.text(support.low()), Shortest.text(support.high())))
                        .tryThis("Check the unit of the ends."))
                : List.of();
    }

    /// What is truncated.
    public Density of() {
        return of;
    }

    public double low() {
        return low;
    }

    public double high() {
        return high;
    }

    /// The chance that a value of the whole density lies in the interval.
    public double keptMass() {
        return mass;
    }

    private boolean isIn(double x) {
        return x >= low && x <= high;
    }

    @Override
    public double pdf(double x) {
        return isIn(x) ? of.pdf(x) / mass : Double.isNaN(x) ? x : 0;
    }

    @Override
    public double logPdf(double x) {
        return isIn(x) ? of.logPdf(x) - Log.log(mass) : Double.isNaN(x) ? x : Double.NEGATIVE_INFINITY;
    }

    @Override
    public double cdf(double x) {
        if (!(x >= low && x < high)) {
            return x < low ? 0 : x >= high ? 1 : x;
        }
        return x <= median ? fromLow(x) : 1 - fromHigh(x);
    }

    @Override
    public double survival(double x) {
        if (!(x >= low && x < high)) {
            return x < low ? 1 : x >= high ? 0 : x;
        }
        return x <= median ? 1 - fromLow(x) : fromHigh(x);
    }

    private double fromLow(double x) {
        return Math.min(fromLow.mass(x) / mass, 1);
    }

    private double fromHigh(double x) {
        return Math.min(fromHigh.mass(-(isDiscrete() ? Math.nextUp(x) : x)) / mass, 1);
    }

    @Override
    public double inner(double p) {
        if (isDiscrete()) {
            return discrete(fromLow.below() + p * mass, fromLow.above() - p * mass);
        }
        return p <= 0.5 ? quantileFromBelow(p) : -fromHigh.at((1 - p) * mass);
    }

    @Override
    public double upperInner(double q) {
        if (isDiscrete()) {
            return discrete(fromHigh.above() - q * mass, fromHigh.below() + q * mass);
        }
        return q <= 0.5 ? -fromHigh.at(q * mass) : quantileFromBelow(1 - q);
    }

    private double quantileFromBelow(double p) {
        return isDiscrete() ? inner(p) : fromLow.at(p * mass);
    }

    /// The least value up to which the whole density has the mass `p`, and above which it has `q`.
    private double discrete(double p, double q) {
        return Math.clamp(p <= 0.5 ? of.quantile(p) : of.upperQuantile(q), low, high);
    }

    private Moments.Four moments() {
        if (moments == null) {
            var unit = standardised();
            if (of instanceof Mixture mixture) {
                moments = Moments.Four.of(truncated(mixture));
            } else if (unit.shape() instanceof Truncated shape && !equals(shape)) {
                moments = Moments.Four.of(new Shifted(shape, unit.location(), unit.scale()));
            } else {
                moments = Moments.four(this);
            }
        }
        return moments;
    }

    /// The same density: a mixture of truncated parts.
    private Mixture truncated(Mixture mixture) {
        var parts = new ArrayList<Mixture.Part>();
        for (var part : mixture.parts()) {
            try {
                var kept = of(part.density(), low, high);
                if (part.weight() * kept.mass / mass > 0) {
                    parts.add(new Mixture.Part(part.weight() * kept.mass / mass, kept));
                }
            } catch (Refusal _) {
                // nothing of this part is kept
            }
        }
        return new Mixture(parts);
    }

    @Override
    public double mean() {
        return moments().mean();
    }

    @Override
    public double variance() {
        return moments().variance();
    }

    @Override
    public double skewness() {
        return moments().skewness();
    }

    @Override
    public double excessKurtosis() {
        return moments().excessKurtosis();
    }

    @Override
    public TailOrders tailOrders() {
        var orders = of.tailOrders();
        return new TailOrders(
                Double.isInfinite(low) ? orders.lower() : Double.POSITIVE_INFINITY,
                Double.isInfinite(high) ? orders.upper() : Double.POSITIVE_INFINITY);
    }

    @Override
    public boolean isDiscrete() {
        return of.isDiscrete();
    }

    @Override
    public Support support() {
        return new Support(low, high);
    }

    /// In units of the whole density, so that its members share tables; the ends are rounded inwards, so that no draw
    /// falls beyond those that were given.
    @Override
    public Standardised standardised() {
        var unit = of.standardised();
        double location = unit.location();
        double scale = unit.scale();
        if (isDiscrete() || of.equals(unit.shape())) {
            return new Standardised(this, 0, 1);
        }
        double a = ((scale > 0 ? low : high) - location) / scale;
        double b = ((scale > 0 ? high : low) - location) / scale;
        while (!isIn(Math.fma(scale, a, location))) {
            a = Math.nextUp(a);
        }
        while (!isIn(Math.fma(scale, b, location))) {
            b = Math.nextDown(b);
        }
        return a < b
                ? new Standardised(new Truncated(unit.shape(), a, b), location, scale)
                : new Standardised(this, 0, 1);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Truncated t && of.equals(t.of) && low == t.low && high == t.high;
    }

    @Override
    public int hashCode() {
        return Objects.hash(of, low, high);
    }

    @Override
    public String toString() {
        return "Truncated[of=" + of + ", low=" + low + ", high=" + high + "]";
    }
}
