package dev.leadline.density;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.DoubleUnaryOperator;

/// A density known by its heights alone, integrated numerically. Immutable, safe for all threads where its heights are.
///
/// The line is cut into pieces, narrower towards ends, breaks and peaks, in each of which the density is a polynomial
/// of degree 15 to rounding error; masses are added from both ends, so that both tails keep their digits down to
/// `1e-300` of all, as far as the heights do. Next to an end or a break, and far out where the density is a power, the
/// mass is a power of the distance.
///
/// Error: `1e-12` of the mass, and relative `1e-10` in tails, where the heights have 16 digits (`TypedTest`). Far from
/// 0, where `x` itself has few digits, quantiles and draws are exact to the spacing of numbers
/// (`TypedFarFromZeroTest`).
public final class Integrated implements Shape {
    /// With a median farther from 0 than this, in distances of the quartiles, numbers are sparse enough there to be
    /// felt.
    private static final double FAR = 1000;

    /// A gap that is narrower than the distance of the quartiles by this factor is none that a person meant.
    private static final double NARROW = 1e-9;

    private final Object name;
    private final Relief relief;
    private final Support support;
    private final TailOrders orders;
    private final double top;
    private final double logArea;

    /// Where distances are taken from.
    private final double origin;

    /// In the distance from the origin.
    private final Pieces pieces;

    private final Moments.Four moments;
    private final List<Support> gaps;

    /// A density that is finite everywhere, and not much narrower than its distance from 0 and the ends of the range.
    ///
    /// @param name what tells it from all others, with `equals`, `hashCode` and `toString`
    /// @param pdf up to a factor; bit-stable, safe for all threads
    /// @throws Refusal where it is no density on the range
    public static Integrated of(Object name, DoubleUnaryOperator pdf, Support range) {
        Heights heights = (x, y, n) -> {
            for (int i = 0; i < n; i++) {
                y[i] = pdf.applyAsDouble(x[i]);
            }
        };
        return of(name, "x", heights, false, range, new double[0], new double[0]);
    }

    /// @param name what tells it from all others, with `equals`, `hashCode` and `toString`
    /// @param variable its name in messages
    /// @param log whether the heights are logarithms
    /// @param breaks points inside the range at which it may be infinite, jump or bend; rising
    /// @param probes points near which it may have a narrow peak
    /// @throws Refusal where it is no density on the range
    public static Integrated of(
            Object name,
            String variable,
            Heights heights,
            boolean log,
            Support range,
            double[] breaks,
            double[] probes) {
        var relief = new Relief(heights, variable, log);
        var landscape = Landscape.of(relief, range, breaks, probes);
        return new Integrated(name, relief, range, landscape, Refinement.of(relief, landscape));
    }

    private Integrated(Object name, Relief relief, Support range, Landscape landscape, List<Refinement.Cell> cells) {
        this.name = name;
        this.relief = relief;
        this.support = range;
        this.orders = landscape.orders();
        this.top = landscape.top();
        double total = 0;
        for (var cell : cells) {
            total += cell.mass;
        }
        if (!(total > 0 && total < Double.POSITIVE_INFINITY)) {
            throw new Refusal(relief.zero());
        }
        this.logArea = (relief.log() ? top : Log.log(top)) + Log.log(total);
        double area = total;
        var fromZero = pieces(cells, area, 0);
        double median = fromZero.quantile(0.5);
        double width = fromZero.quantile(0.75) - fromZero.quantile(0.25);
        this.origin = Math.abs(median) > FAR * width ? median : 0;
        this.pieces = origin == 0 ? fromZero : pieces(cells, area, origin);
        this.gaps = gaps(cells, NARROW * width);
        this.moments = PieceMoments.of(cells, area, orders, median, width);
    }

    private static Pieces pieces(List<Refinement.Cell> cells, double area, double origin) {
        return new Pieces(cells.stream()
                .filter(c -> c.mass > 0)
                .map(c -> c.piece(area, origin))
                .toArray(Piece[]::new));
    }

    /// @param least width
    private static List<Support> gaps(List<Refinement.Cell> cells, double least) {
        var gaps = new ArrayList<Support>();
        double end = Double.NaN;
        for (var cell : cells) {
            if (cell.isEmpty()) {
                continue;
            }
            if (cell.low - end >= least) {
                gaps.add(new Support(end, cell.low));
            }
            end = cell.high;
        }
        return List.copyOf(gaps);
    }

    /// The integral of the density as given; may be 0 or infinite where its logarithm is not.
    public double area() {
        return Exp.exp(logArea);
    }

    public double logArea() {
        return logArea;
    }

    /// Stretches without mass, between others that have some.
    public List<Support> gaps() {
        return gaps;
    }

    @Override
    public double pdf(double x) {
        return Exp.exp(logPdf(x));
    }

    @Override
    public double logPdf(double x) {
        if (Double.isNaN(x)) {
            return x;
        }
        return isOutside(x) ? Double.NEGATIVE_INFINITY : log(relief.at(x));
    }

    @Override
    public void logPdf(double[] x, double[] out, int n) {
        double[] heights = relief.at(Arrays.copyOf(x, n));
        for (int i = 0; i < n; i++) {
            out[i] = Double.isNaN(x[i]) ? x[i] : isOutside(x[i]) ? Double.NEGATIVE_INFINITY : log(heights[i]);
        }
    }

    private boolean isOutside(double x) {
        return !support.contains(x) || Double.isInfinite(x);
    }

    private double log(double height) {
        return (relief.log() ? height : Log.log(Math.max(height, 0))) - logArea;
    }

    @Override
    public double cdf(double x) {
        return Double.isNaN(x) ? x : pieces.cdf(x - origin);
    }

    @Override
    public double survival(double x) {
        return Double.isNaN(x) ? x : pieces.survival(x - origin);
    }

    @Override
    public double inner(double p) {
        return Math.clamp(origin + pieces.quantile(p), support.low(), support.high());
    }

    @Override
    public double upperInner(double q) {
        return Math.clamp(origin + pieces.upperQuantile(q), support.low(), support.high());
    }

    @Override
    public double mean() {
        return moments.mean();
    }

    @Override
    public double variance() {
        return moments.variance();
    }

    @Override
    public double skewness() {
        return moments.skewness();
    }

    @Override
    public double excessKurtosis() {
        return moments.excessKurtosis();
    }

    @Override
    public TailOrders tailOrders() {
        return orders;
    }

    @Override
    public Support support() {
        return support;
    }

    /// Far from 0, the density of the distance from the origin: its draws are rounded once, when they are numbers.
    @Override
    public Standardised standardised() {
        return origin == 0 ? Shape.super.standardised() : new Standardised(new Distance(this), origin, 1);
    }

    private record Distance(Integrated of) implements Shape {
        @Override
        public double pdf(double x) {
            return of.pdf(of.origin + x);
        }

        @Override
        public double logPdf(double x) {
            return of.logPdf(of.origin + x);
        }

        @Override
        public double cdf(double x) {
            return Double.isNaN(x) ? x : of.pieces.cdf(x);
        }

        @Override
        public double survival(double x) {
            return Double.isNaN(x) ? x : of.pieces.survival(x);
        }

        @Override
        public double inner(double p) {
            return Math.clamp(of.pieces.quantile(p), support().low(), support().high());
        }

        @Override
        public double upperInner(double q) {
            return Math.clamp(
                    of.pieces.upperQuantile(q), support().low(), support().high());
        }

        @Override
        public double mean() {
            return of.mean() - of.origin;
        }

        @Override
        public double variance() {
            return of.variance();
        }

        @Override
        public double skewness() {
            return of.skewness();
        }

        @Override
        public double excessKurtosis() {
            return of.excessKurtosis();
        }

        @Override
        public TailOrders tailOrders() {
            return of.orders;
        }

        /// Rounded inwards, so that no draw falls beyond the ends that were given.
        @Override
        public Support support() {
            double low = of.support.low() - of.origin;
            double high = of.support.high() - of.origin;
            while (of.origin + low < of.support.low()) {
                low = Math.nextUp(low);
            }
            while (of.origin + high > of.support.high()) {
                high = Math.nextDown(high);
            }
            return new Support(low, high);
        }
    }

    int pieceCount() {
        return pieces.count();
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Integrated that && name.equals(that.name);
    }

    @Override
    public int hashCode() {
        return name.hashCode();
    }

    @Override
    public String toString() {
        return name.toString();
    }
}
