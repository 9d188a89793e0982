package dev.leadline.density;

import dev.leadline.numeric.GaussLegendre;
import dev.leadline.numeric.Normal;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/// Of an input with steps, a discrete one, and any other: given what lies behind the other, the mean of the discrete
/// one is a sum over its steps, and that times the other's value is integrated over the normal behind the other. The
/// panels of the integral end at the steps of both and are narrow where a step is steep.
///
/// Error: 1e-9 (`TiedPairTest`).
final class SteppedPair implements TiedPair {
    /// Values, and values times panels, above which an integral costs more than a tenth of a second.
    private static final int MOST_VALUES = 1000;

    private static final int MOST_WORK = 300_000;

    private static final int NODES = 16;
    private static final double[] AT = GaussLegendre.of(NODES).nodes();
    private static final double[] WEIGHTS = GaussLegendre.of(NODES).weights();

    /// Panels between the farthest normals that are drawn.
    private static final int PANELS = 48;

    private static final double FARTHEST = 8.3;

    private static final double SMALLEST = 0x1p-53;
    private static final double LARGEST = 1 - 0x1p-53;

    /// A step narrower than this is a jump.
    private static final double JUMP = 1e-13;

    /// Behind so many widths a normal step is over.
    private static final int WIDTHS = 8;

    /// Parts of a width to which panels are told apart.
    private static final double APART = 0.25;

    private final Optional<Student> behind;
    private final double dof;
    private final Optional<StudentTail> conditional;
    private final double[] rises;
    private final double[] thresholds;
    private final double first;
    private final double mean;
    private final double deviation;
    private final Inversion other;
    private final List<Edge> fixed = new ArrayList<>();
    private final double otherMean;
    private final double otherDeviation;
    private final double[] chances;

    /// Where a panel ends.
    ///
    /// @param at the normal behind the other input
    /// @param apart no other edge is needed so near below
    private record Edge(double at, double apart) {}

    /// Empty where neither is discrete, or a discrete one has too many values.
    static Optional<SteppedPair> of(Mixing mixing, Density one, Density other) {
        if (!one.isDiscrete()) {
            return other.isDiscrete() ? of(mixing, other, one) : Optional.empty();
        }
        var values = Atoms.all(one, MOST_VALUES);
        var others = other.isDiscrete() ? Atoms.all(other, MOST_VALUES) : Optional.of(new double[0]);
        return values.isPresent()
                        && others.isPresent()
                        && values.get().length * (PANELS + others.get().length) <= MOST_WORK
                ? Optional.of(new SteppedPair(mixing, one, values.get(), other, others.get()))
                : Optional.empty();
    }

    private SteppedPair(Mixing mixing, Density one, double[] values, Density other, double[] others) {
        dof = mixing.degreesOfFreedom().orElse(Double.POSITIVE_INFINITY);
        behind = Double.isInfinite(dof) ? Optional.empty() : Optional.of(new Student(dof, 0, 1));
        conditional = behind.map(_ -> StudentTail.of(dof + 1));
        int steps = values.length - 1;
        rises = new double[steps];
        thresholds = new double[steps];
        chances = new double[steps];
        first = values[0];
        double sum = first;
        for (int i = 0; i < steps; i++) {
            rises[i] = values[i + 1] - values[i];
            thresholds[i] = behind(one.cdf(values[i]), one.survival(values[i]));
            sum += rises[i] * one.survival(values[i]);
        }
        mean = sum;
        double squares = 0;
        for (int i = 0; i < values.length; i++) {
            double above = i == steps ? 0 : one.survival(values[i]);
            double from = i == 0 ? 1 : one.survival(values[i - 1]);
            squares = Math.fma((values[i] - mean) * (values[i] - mean), from - above, squares);
        }
        deviation = Math.sqrt(squares);
        this.other = Inversion.of(other);
        for (int panel = 0; panel <= PANELS; panel++) {
            fixed.add(new Edge(FARTHEST * (2.0 * panel / PANELS - 1), 0));
        }
        for (int j = 0; j + 1 < others.length; j++) {
            double p = other.cdf(others[j]);
            add(fixed, p <= 0.5 ? Normal.quantile(p) : Normal.upperQuantile(other.survival(others[j])), 0);
        }
        var middle = new double[] {0, 0};
        over(fixed, (_, weight, y) -> {
            middle[0] += weight;
            middle[1] = Math.fma(weight, y, middle[1]);
        });
        otherMean = middle[1] / middle[0];
        var spread = new double[1];
        over(fixed, (_, weight, y) -> spread[0] = Math.fma(weight, (y - otherMean) * (y - otherMean), spread[0]));
        otherDeviation = Math.sqrt(spread[0] / middle[0]);
    }

    /// What lies behind an input that has the probability `p` to be smaller, `q` to be greater.
    private double behind(double p, double q) {
        return p <= 0.5
                ? behind.map(t -> t.quantile(p)).orElseGet(() -> Normal.quantile(p))
                : behind.map(t -> t.upperQuantile(q)).orElseGet(() -> Normal.upperQuantile(q));
    }

    /// The normal as unlikely as what lies behind an input.
    private double normal(double z) {
        if (behind.isEmpty()) {
            return z;
        }
        var t = behind.get();
        return z < 0 ? Normal.quantile(t.cdf(z)) : Normal.upperQuantile(t.survival(z));
    }

    @Override
    public double correlation(double alpha) {
        double rho = StrictMath.sin(alpha);
        double own = Math.max(StrictMath.cos(alpha), JUMP * JUMP);
        var edges = new ArrayList<>(fixed);
        for (double threshold : thresholds) {
            double z = threshold / rho;
            if (Math.abs(z) < 1e12) {
                step(edges, z, own / Math.abs(rho) * widening(z));
            }
        }
        var sum = new double[1];
        over(
                edges,
                (z, weight, y) ->
                        sum[0] = Math.fma(weight * (y - otherMean), mean(rho * z, own * widening(z)) - mean, sum[0]));
        return sum[0] / (deviation * otherDeviation);
    }

    /// What lies behind the discrete input is the more uncertain the farther out the other is, where one factor
    /// multiplies both.
    private double widening(double z) {
        return behind.isEmpty() ? 1 : Math.sqrt((dof + z * z) / (dof + 1));
    }

    /// The mean of the discrete input where what lies behind it has this middle and this spread.
    private double mean(double middle, double spread) {
        int n = rises.length;
        for (int i = 0; i < n; i++) {
            chances[i] = Math.clamp((middle - thresholds[i]) / spread, -1e300, 1e300);
        }
        if (conditional.isPresent()) {
            conditional.get().probabilities(chances, n);
        } else {
            Normal.cdf(chances, chances, n);
        }
        double sum = 0;
        for (int i = 0; i < n; i++) {
            sum = Math.fma(rises[i], chances[i], sum);
        }
        return sum + first;
    }

    private void step(List<Edge> edges, double z, double width) {
        add(edges, normal(z), 0);
        for (double far = width; width > JUMP && far < 2 * FARTHEST; far *= 2) {
            if (behind.isEmpty() && far > WIDTHS * width) {
                break;
            }
            double apart = APART * (normal(z + width) - normal(z));
            add(edges, normal(z - far), apart);
            add(edges, normal(z + far), apart);
        }
    }

    private static void add(List<Edge> edges, double at, double apart) {
        if (at > -FARTHEST && at < FARTHEST) {
            edges.add(new Edge(at, apart));
        }
    }

    private interface Term {
        /// @param z what lies behind the other input
        /// @param weight of the integral over the normals
        /// @param y the other input's value
        void add(double z, double weight, double y);
    }

    private void over(List<Edge> edges, Term term) {
        edges.sort(Comparator.comparingDouble(Edge::at));
        var w = new double[NODES];
        var y = new double[NODES];
        double from = edges.getFirst().at;
        for (var edge : edges) {
            if (!(edge.at - from > edge.apart)) {
                continue;
            }
            double half = (edge.at - from) / 2;
            for (int k = 0; k < NODES; k++) {
                w[k] = from + half * (1 + AT[k]);
                y[k] = Math.clamp(Normal.cdf(w[k]), SMALLEST, LARGEST);
            }
            other.fill(y, y, NODES);
            for (int k = 0; k < NODES; k++) {
                double z = behind.isEmpty() ? w[k] : behind(Normal.cdf(w[k]), Normal.cdf(-w[k]));
                term.add(z, half * WEIGHTS[k] * Normal.pdf(w[k]), y[k]);
            }
            from = edge.at;
        }
    }
}
