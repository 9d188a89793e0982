package dev.leadline.density;

import dev.leadline.numeric.Significant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.DoubleStream;

/// What there is to draw and to say about a density. Immutable.
///
/// @param shown the stretch that a drawing shows: between the .1 % and the 99.9 % quantile, cut where a tail is so long
///     that the middle would shrink to a needle (six times the distance between the quartiles from the median), drawn
///     to the end of the support where that is near, and a margin; empty where the quantiles are no numbers to go by
/// @param quantiles from the lower end upwards
/// @param tails a sentence for each end
/// @param warnings a sentence for each thing that may surprise
public record Portrait(
        Density density,
        Optional<Support> shown,
        double mean,
        double variance,
        double skewness,
        double excessKurtosis,
        List<Quantile> quantiles,
        List<String> tails,
        List<String> warnings) {

    /// @param below chance of a value up to this one
    /// @param above chance of a greater one
    public record Quantile(double below, double above, double value) {}

    /// The density at one value.
    ///
    /// @param pdf for a discrete density the probability of the value
    /// @param below `P(X <= x)`
    /// @param above `P(X > x)`
    public record Point(double x, double pdf, double below, double above) {}

    /// A stretch with its chance; of a discrete density often a single value, `from` and `to` alike.
    public record Bar(double from, double to, double chance) {
        public double middle() {
            return 0.5 * from + 0.5 * to;
        }
    }

    /// A discrete density with more values within the drawing is drawn in stretches of several.
    public static final int MOST_BARS = 120;

    private static final int MOST_VALUES = 8 * MOST_BARS;

    /// Of irregular values, such as data.
    private static final int STRETCHES = 40;

    private static final double TAIL = .001;
    private static final double FAR_TAIL = 1e-6;
    private static final double CUT = 6;
    private static final double FAR_CUT = 40;
    private static final double MARGIN = .04;
    private static final double WIDEST = .3;
    private static final double[] MASSES = {FAR_TAIL, .001, .01, .05, .25};
    /// Beyond a chance by more than its rounding, by less than the probability of any value.
    private static final double STEP = 1e-12;

    private static final int DIGITS = 6;

    public Portrait {
        quantiles = List.copyOf(quantiles);
        tails = List.copyOf(tails);
        warnings = List.copyOf(warnings);
    }

    /// Takes less than 20 ms (`PortraitTest`).
    public static Portrait of(Density density) {
        return new Portrait(
                density,
                stretch(density, TAIL, CUT),
                density.mean(),
                density.variance(),
                density.skewness(),
                density.excessKurtosis(),
                quantiles(density),
                tails(density),
                warnings(density));
    }

    public double sd() {
        return Math.sqrt(variance);
    }

    /// Distance of the quartiles.
    public double spread() {
        return density.quantile(.75) - density.quantile(.25);
    }

    public Support support() {
        return density.support();
    }

    public boolean isDiscrete() {
        return density.isDiscrete();
    }

    public Point at(double x) {
        return new Point(x, density.pdf(x), density.cdf(x), density.survival(x));
    }

    /// The value of a discrete density that is nearest.
    public double nearest(double x) {
        double below = density.cdf(x) > 0
                ? density.quantile(density.cdf(x))
                : density.support().low();
        double next = after(density, below);
        return Math.abs(next - x) < Math.abs(below - x) ? next : below;
    }

    /// The stretch for a drawing of the tails: to the values exceeded once in a million, cut as [#shown()] is but
    /// farther out.
    public Optional<Support> tailsShown() {
        return stretch(density, FAR_TAIL, FAR_CUT);
    }

    /// So many stretches of equal length with their chances, from which the height of a curve is read: a peak without
    /// bound is as high as what it holds.
    public List<Bar> curve(Support over, int count) {
        var edges = new double[count + 1];
        for (int i = 0; i <= count; i++) {
            edges[i] = edge(over, i, count);
        }
        return between(edges);
    }

    /// The values of a discrete density within the drawing with their probabilities; in stretches where they are many.
    public List<Bar> bars() {
        if (shown.isEmpty()) {
            return List.of();
        }
        var values = values(shown.get().low(), shown.get().high(), MOST_VALUES);
        double last = density.upperQuantile(density.survival(shown.get().high()));
        boolean whole = values.size() > 0 && (values.getLast() >= last || values.size() == MOST_VALUES);
        if (!whole) {
            return curve(shown.get(), STRETCHES);
        }
        if (values.size() <= MOST_BARS) {
            return values.stream().map(x -> new Bar(x, x, density.pdf(x))).toList();
        }
        double step = step(values);
        double first = values.getFirst();
        double end = shown.get().high();
        if (step > 0) {
            int together = (int) Math.ceil((end - first) / step / MOST_BARS);
            int count = Math.max(1, (int) Math.ceil((end - first) / (step * together)));
            var edges = new double[count + 1];
            for (int i = 0; i <= count; i++) {
                edges[i] = first + (i * (double) together - .5) * step;
            }
            return between(edges);
        }
        return curve(shown.get(), STRETCHES);
    }

    /// The first of its values from `low` to `high`.
    private List<Double> values(double low, double high, int most) {
        var values = new ArrayList<Double>();
        double x = density.quantile(Math.max(density.cdf(low), Double.MIN_NORMAL));
        while (x <= high && values.size() < most) {
            if (x >= low) {
                values.add(x);
            }
            double next = after(density, x);
            if (!(next > x)) {
                break;
            }
            x = next;
        }
        return values;
    }

    /// The next value above this one; its like where there is none.
    private static double after(Density density, double x) {
        double below = density.cdf(x);
        double above = density.survival(x);
        if (!(above > 0)) {
            return x;
        }
        return below < .5 ? density.quantile(below * (1 + STEP)) : density.upperQuantile(above * (1 - STEP));
    }

    /// The distance between any two neighbours; 0 where it is not always the same.
    private static double step(List<Double> values) {
        double step = values.get(1) - values.get(0);
        for (int i = 2; i < values.size(); i++) {
            if (!(Math.abs(values.get(i) - values.get(i - 1) - step) <= 1e-9 * step)) {
                return 0;
            }
        }
        return step;
    }

    private List<Bar> between(double[] edges) {
        var bars = new ArrayList<Bar>();
        double below = density.cdf(edges[0]);
        double above = density.survival(edges[0]);
        for (int i = 1; i < edges.length; i++) {
            double nowBelow = density.cdf(edges[i]);
            double nowAbove = density.survival(edges[i]);
            double chance = below < .5 ? nowBelow - below : above - nowAbove;
            bars.add(new Bar(edges[i - 1], edges[i], Math.max(0, chance)));
            below = nowBelow;
            above = nowAbove;
        }
        return bars;
    }

    /// So many values at equal distances, both ends among them.
    public List<Point> points(Support over, int count) {
        return DoubleStream.iterate(0, i -> i + 1)
                .limit(count)
                .mapToObj(i -> at(edge(over, i, count - 1)))
                .toList();
    }

    private static double edge(Support over, double i, int count) {
        return over.low() * (1 - i / count) + over.high() * (i / count);
    }

    private static Optional<Support> stretch(Density density, double tail, double cut) {
        double median = density.quantile(.5);
        double spread = density.quantile(.75) - density.quantile(.25);
        double quantile = density.quantile(tail);
        double upper = density.upperQuantile(tail);
        if (density.isDiscrete()) {
            boolean light = Double.isInfinite(density.tailOrders().least()) || !(spread > 0);
            double reach = light ? Double.POSITIVE_INFINITY : cut * spread;
            double to = upper > quantile ? upper : Math.min(density.support().high(), after(density, upper));
            double from = Math.max(quantile, median - reach);
            return around(from, Math.min(to, median + reach), .5 * (after(density, from) - from));
        }
        double low = end(quantile, median - cut * spread, density.support().low(), -spread);
        double high = end(upper, median + cut * spread, density.support().high(), spread);
        return low < high ? around(low, high, 0) : Optional.empty();
    }

    /// With a margin, which is wide where there are but few values.
    ///
    /// @param half half the distance of two values; 0 where they lie close
    private static Optional<Support> around(double low, double high, double half) {
        double margin = high > low
                ? Math.max(MARGIN * (high - low), Math.min(half, WIDEST * (high - low)))
                : Math.max(.5, MARGIN * Math.abs(low));
        return Double.isFinite(high - low) ? Optional.of(new Support(low - margin, high + margin)) : Optional.empty();
    }

    /// @param spread distance of the quartiles, negative for the lower end
    private static double end(double quantile, double cut, double support, double spread) {
        boolean beyond = spread < 0 ? !(quantile >= cut) : !(quantile <= cut);
        double end = beyond ? cut : quantile;
        return Math.abs(support - end) <= Math.abs(spread) ? support : end;
    }

    private static List<Quantile> quantiles(Density density) {
        var quantiles = new ArrayList<Quantile>();
        for (double p : MASSES) {
            quantiles.add(new Quantile(p, 1 - p, density.quantile(p)));
        }
        quantiles.add(new Quantile(.5, .5, density.quantile(.5)));
        for (int i = MASSES.length - 1; i >= 0; i--) {
            quantiles.add(new Quantile(1 - MASSES[i], MASSES[i], density.upperQuantile(MASSES[i])));
        }
        return quantiles;
    }

    private static List<String> tails(Density density) {
        var orders = density.tailOrders();
        double low = density.support().low();
        double high = density.support().high();
        return Double.isInfinite(low) && Double.isInfinite(high) && orders.lower() == orders.upper()
                ? List.of("both tails fall " + fall(orders.lower()))
                : List.of(tail("lower", orders.lower(), low), tail("upper", orders.upper(), high));
    }

    private static String tail(String which, double order, double end) {
        if (Double.isFinite(end)) {
            return "%s end at %s".formatted(which, Significant.text(end, DIGITS));
        }
        return which + " tail falls " + fall(order);
    }

    private static String fall(double order) {
        return Double.isFinite(order)
                ? "like a power: moments exist below order " + Significant.text(order, 3)
                : "faster than any power: every moment exists";
    }

    private static List<String> warnings(Density density) {
        var warnings = new ArrayList<String>();
        if (!density.isDiscrete()) {
            for (double end :
                    new double[] {density.support().low(), density.support().high()}) {
                if (density.pdf(end) == Double.POSITIVE_INFINITY) {
                    warnings.add("it is unbounded at %s: the curve has no highest point there"
                            .formatted(Significant.text(end, DIGITS)));
                }
            }
        }
        if (Double.isNaN(density.mean())) {
            warnings.add("it has no mean: an average of its draws never settles");
        } else if (Double.isInfinite(density.mean())) {
            warnings.add("its mean is infinite: an average of its draws grows without end");
        } else if (!Double.isFinite(density.variance())) {
            warnings.add("it has no variance: the error of a mean shrinks slower than 1/√n");
        } else if (density.tailOrders().least() <= 4) {
            warnings.add("its fourth moment is infinite: an estimate of its spread settles slowly");
        }
        return warnings;
    }
}
