package dev.leadline.density;

import dev.leadline.density.Axis.Line;
import dev.leadline.density.Axis.Steps;
import dev.leadline.density.Expectation.Integrand;
import dev.leadline.density.Expectation.Limit;
import dev.leadline.numeric.GaussKronrod;
import dev.leadline.numeric.Power;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.concurrent.CancellationException;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/// One computation of an [Expectation]. Confined to its thread.
///
/// The axes stand in an order of their own: those of discrete variables first, since each of their values has an
/// integral of its own; last the one along which an event is measured.
final class Integration {
    /// Tolerances by the number of continuous variables that are integrated over, in standard deviations; of an
    /// event, in probabilities.
    private static final double[] TOLERANCE = {1e-10, 1e-10, 1e-7, 1e-6, 1e-5};

    /// Variables that are integrated one inside the other, at most, beside the one that an event is measured along:
    /// beyond, cubature reaches smaller errors.
    private static final int MOST_NESTED = 2;

    /// Of one integral: more are needed only where rounding hides the function.
    private static final int MOST_PANELS = 1000;

    /// How many times their difference two rules may be off beside a jump or a kink.
    private static final double SAFETY = 10;

    /// Tolerance of the probability of an event of which nothing is known yet.
    private static final double ROUGH = 1e-12;

    /// Width of a panel, by that of numbers, on which places cannot be told apart well enough.
    private static final double NARROW = 0x1p-50;

    private static final int ROUNDS = 60;
    private static final double ROUNDING = 1e-15;
    private static final double QUANTILES = 1e-12;

    /// Fall over the last panel beyond which a tail is not taken to end.
    private static final double FALLS = 0.9;

    private static final double LARGEST_REST = 100;
    private static final double SHARE_OF_REST = 0.1;

    /// Probability that the values of a discrete density leave out.
    private static final double LEFT_OUT = 0x1p-52;

    private final List<Density> densities;
    private final List<Axis> axes;
    private final boolean isProbability;

    /// Whether it is measured along the last axis.
    private final boolean isEvent;

    /// Axes that are summed or integrated over.
    private final int outer;

    private final Integrand function;
    private final Limit limit;
    private final double[][] columns;

    /// The columns in the order of the densities that were given.
    private final double[][] asGiven;

    private final double[] z = new double[Integrand.BLOCK];
    private final double[] at;
    private final boolean[] inside;
    private double shift;
    private long work;
    private long undefined;
    private String undefinedAt = "";

    Integration(List<Density> given, Integrand function, boolean isProbability, Limit limit) {
        int[] order = IntStream.range(0, given.size())
                .boxed()
                .sorted(Comparator.comparing(i -> !given.get(i).isDiscrete()))
                .mapToInt(Integer::intValue)
                .toArray();
        this.densities = Arrays.stream(order).mapToObj(given::get).toList();
        int lines =
                (int) given.stream().filter(density -> !density.isDiscrete()).count();
        if (given.isEmpty() || lines > Expectation.MOST_LINES) {
            throw new IllegalArgumentException(given.size() + " variables");
        }
        this.axes = densities.stream().map(density -> Axis.of(density, lines)).toList();
        this.isProbability = isProbability;
        this.isEvent = isProbability && lines > 0;
        this.outer = this.isEvent ? given.size() - 1 : given.size();
        this.limit = limit;
        this.columns = new double[given.size()][Integrand.BLOCK];
        this.asGiven = new double[given.size()][];
        for (int j = 0; j < order.length; j++) {
            asGiven[order[j]] = columns[j];
        }
        this.function = (_, values, n) -> {
            function.fill(asGiven, values, n);
            if (isProbability && lines == 0) {
                for (int i = 0; i < n; i++) {
                    values[i] = values[i] > 0 ? 1 : values[i] <= 0 ? 0 : Double.NaN;
                }
            }
        };
        this.at = new double[given.size()];
        this.inside = new boolean[given.size()];
    }

    Expectation whole() {
        double points = axes.stream().mapToDouble(Axis::points).reduce(1, (a, b) -> a * b);
        if (integrated() <= mostNested() && points > limit.evaluations()) {
            throw new Refusal(Problem.of("its inputs have too many values together"));
        }
        double scale = scale();
        if (scale == 0) {
            var rough = over(0, isEvent ? ROUGH : Double.POSITIVE_INFINITY);
            scale = isEvent ? rough.mean() : Math.sqrt(rough.square());
        }
        if (isEvent && scale == 0) {
            throw new Refusal(Problem.of("the event is true at none of the points that were looked at"));
        }
        boolean isSum = axes.stream().allMatch(Steps.class::isInstance);
        double tolerance = isSum ? 0 : scale * TOLERANCE[integrated()];
        var whole = over(0, tolerance);
        if (undefined > limit.undefined() * work) {
            refuseUndefined();
        }
        boolean isFinite = whole.rest() <= SHARE_OF_REST * whole.square();
        double mean = shift + whole.mean();
        double variance = Math.max(0, whole.square() - whole.mean() * whole.mean());
        return new Expectation(
                mean,
                Math.max(whole.error(), tolerance) + QUANTILES * whole.size() + ROUNDING * Math.abs(mean),
                isFinite ? Math.sqrt(variance) : Double.POSITIVE_INFINITY,
                Math.abs(shift) + whole.size(),
                whole.tails(),
                work);
    }

    private int mostNested() {
        return isEvent ? MOST_NESTED - 1 : MOST_NESTED;
    }

    /// Continuous variables that are integrated over.
    private int integrated() {
        return (int)
                axes.subList(0, outer).stream().filter(Line.class::isInstance).count();
    }

    /// Mean and standard deviation over a block of points that fill the cube evenly, the fractional parts of multiples
    /// of powers of the root of `g^(d+1) = g + 1`, after Kronecker and Weyl; of an event its probability.
    private double scale() {
        double root = 1;
        for (int i = 0; i < 40; i++) {
            root = Power.pow(1 + root, 1.0 / (axes.size() + 1));
        }
        double step = 1;
        for (int j = 0; j < axes.size(); j++) {
            step /= root;
            for (int i = 0; i < Integrand.BLOCK; i++) {
                double u = 0.5 + i * step;
                columns[j][i] = densities.get(j).quantile(Math.max(u - Math.floor(u), ROUNDING));
            }
        }
        fill(Integrand.BLOCK);
        if (isEvent) {
            return Arrays.stream(z).filter(score -> score > 0).count() / (double) z.length;
        }
        shift = Arrays.stream(z).filter(Double::isFinite).average().orElse(0);
        return Math.sqrt(Arrays.stream(z)
                .filter(Double::isFinite)
                .map(value -> (value - shift) * (value - shift))
                .average()
                .orElse(0));
    }

    private void fill(int n) {
        if (limit.cancelled().getAsBoolean()) {
            throw new CancellationException("quadrature");
        }
        function.fill(columns, z, n);
        work += n;
    }

    /// The mean over this and the later variables, the earlier being fixed.
    private Part over(int axis, double tolerance) {
        if (axis == outer) {
            var one = new Part.Several(1);
            measure(axis, new double[0][], new boolean[] {true}, new double[] {tolerance}, one);
            return one.get(0);
        }
        return switch (axes.get(axis)) {
            case Steps steps -> sum(axis, steps, tolerance);
            case Line line -> outer - axis > mostNested() ? cubature(axis, tolerance) : integral(axis, line, tolerance);
        };
    }

    private Part cubature(int axis, double tolerance) {
        long before = work;
        long combinations =
                axes.subList(0, axis).stream().mapToLong(Axis::points).reduce(1, (a, b) -> a * b);
        long share = limit.evaluations() / combinations;
        return new Cubature(
                        densities.subList(axis, outer),
                        (x, within, tolerances, parts) -> points(axis, x, within, tolerances, parts),
                        () -> work - before < share)
                .integral(tolerance);
    }

    private Part sum(int axis, Steps steps, double tolerance) {
        double[] x = steps.values();
        double[] chance = Arrays.stream(x).map(steps.density()::pdf).toArray();
        boolean[] all = new boolean[x.length];
        Arrays.fill(all, true);
        double[] tolerances = new double[x.length];
        Arrays.fill(tolerances, tolerance);
        var parts = parts(axis, x, all, tolerances);
        double square = dot(chance, parts.square());
        double rest = dot(chance, parts.rest());
        double error = dot(chance, parts.error()) + ROUNDING * dot(chance, parts.size());
        if (!steps.isWhole()) {
            int last = x.length - 1;
            var support = steps.density().support();
            double ends = (x[0] > support.low() ? chance[0] * parts.square()[0] : 0)
                    + (x[last] < support.high() ? chance[last] * parts.square()[last] : 0);
            error += isProbability ? LEFT_OUT : Math.sqrt(LEFT_OUT * square);
            rest += LARGEST_REST * ends;
        }
        return new Part(
                dot(chance, parts.mean()), error, dot(chance, parts.size()), square, rest, dot(chance, parts.tails()));
    }

    private static double dot(double[] weight, double[] x) {
        var sum = new Sum(0);
        for (int i = 0; i < x.length; i++) {
            sum.add(weight[i] * x[i]);
        }
        return sum.value();
    }

    /// A panel with what it holds.
    ///
    /// @param own what its rules may be off: the larger of how far the two differ, and how far the
    ///     panel that it is a half of was off
    private record Held(Line.Nodes nodes, Part part, double own) {
        Held atLeast(double least) {
            return new Held(nodes, part, Math.max(own, least));
        }
    }

    private Part integral(int axis, Line line, double tolerance) {
        List<Held> panels = held(axis, line.first(), tolerance);
        for (int round = 0; round < ROUNDS && work < limit.evaluations(); round++) {
            double own = panels.stream().mapToDouble(Held::own).sum();
            if (own <= tolerance || panels.size() > MOST_PANELS) {
                break;
            }
            double fair = tolerance / panels.size();
            var kept = new ArrayList<Held>();
            var split = new ArrayList<Held>();
            var halves = new ArrayList<Line.Nodes>();
            for (Held panel : panels) {
                double from = panel.nodes.from();
                double to = panel.nodes.to();
                double middle = 0.5 * (from + to);
                if (panel.own <= Math.max(fair, ROUNDING * panel.part.size()) || middle <= from || middle >= to) {
                    kept.add(panel);
                } else {
                    split.add(panel);
                    halves.add(line.nodes(from, middle));
                    halves.add(line.nodes(middle, to));
                }
            }
            if (halves.isEmpty()) {
                break;
            }
            var found = held(axis, halves, tolerance);
            for (int i = 0; i < split.size(); i++) {
                var lower = found.get(2 * i);
                var upper = found.get(2 * i + 1);
                double least = 0.5 * Math.abs(split.get(i).part.mean() - lower.part.mean() - upper.part.mean());
                kept.add(lower.atLeast(least));
                kept.add(upper.atLeast(least));
            }
            panels = kept;
        }
        return added(line, panels);
    }

    private List<Held> held(int axis, List<Line.Nodes> panels, double tolerance) {
        int n = Line.POINTS;
        double[] x = new double[n * panels.size()];
        boolean[] within = new boolean[x.length];
        double[] tolerances = new double[x.length];
        for (int p = 0; p < panels.size(); p++) {
            var nodes = panels.get(p);
            System.arraycopy(nodes.x(), 0, x, n * p, n);
            System.arraycopy(nodes.inside(), 0, within, n * p, n);
            for (int i = 0; i < n; i++) {
                tolerances[n * p + i] = tolerance * Math.max(1, 0.01 / nodes.chance()[i]);
            }
        }
        var parts = parts(axis, x, within, tolerances);
        var held = new ArrayList<Held>();
        for (int p = 0; p < panels.size(); p++) {
            held.add(held(panels.get(p), parts, n * p));
        }
        return held;
    }

    private static Held held(Line.Nodes nodes, Part.Several parts, int from) {
        double mean = 0;
        double gauss = 0;
        double error = 0;
        double size = 0;
        double square = 0;
        double rest = 0;
        double tails = 0;
        for (int i = 0; i < Line.POINTS; i++) {
            double weight = nodes.kronrod()[i];
            mean += weight * parts.mean()[from + i];
            gauss += nodes.gauss()[i] * parts.mean()[from + i];
            error += weight * parts.error()[from + i];
            size += weight * parts.size()[from + i];
            square += weight * parts.square()[from + i];
            rest += weight * parts.rest()[from + i];
            tails += weight * parts.tails()[from + i];
        }
        double own = SAFETY * Math.abs(mean - gauss) + ends(nodes, parts, from);
        if (nodes.to() - nodes.from() <= NARROW * Math.max(1, Math.abs(nodes.from()))) {
            own = Math.max(own, size);
        }
        return new Held(nodes, new Part(mean, error, size, square, rest, tails), own);
    }

    /// A jump between an end and the node next to it, which no rule sees: how far the value at the end is from
    /// what the nodes lead to expect.
    private static double ends(Line.Nodes nodes, Part.Several parts, int from) {
        int last = GaussKronrod.POINTS - 1;
        double low = nodes.chance()[last + 1] * parts.mean()[from + last + 1];
        double high = nodes.chance()[last + 2] * parts.mean()[from + last + 2];
        for (int i = 0; i <= last; i++) {
            double height = nodes.chance()[i] * parts.mean()[from + i];
            low -= GaussKronrod.toEnd(i) * height;
            high -= GaussKronrod.toEnd(last - i) * height;
        }
        double width = 0.5 * (nodes.to() - nodes.from());
        return width * GaussKronrod.gap() * (Math.abs(low) + Math.abs(high));
    }

    private static Part added(Line line, List<Held> panels) {
        var mean = new Sum(0);
        double error = 0;
        double size = 0;
        double square = 0;
        double rest = 0;
        double tails = 0;
        double[][] sizes = new double[2][3];
        double[][] squares = new double[2][3];
        for (Held panel : panels) {
            var part = panel.part;
            mean.add(part.mean());
            error += panel.own + part.error() + ROUNDING * part.size();
            size += part.size();
            square += part.square();
            rest += part.rest();
            tails += part.tails();
            int side = panel.nodes.from() < 0 ? 0 : 1;
            int last = panel.nodes.last(line);
            sizes[side][last] += part.size();
            squares[side][last] += part.square();
        }
        for (int side = 0; side < 2; side++) {
            double beyond = rest(sizes[side]);
            error += beyond;
            tails += beyond;
            rest += rest(squares[side]);
        }
        return new Part(mean.value(), error, size, square, rest, tails);
    }

    /// What is left behind the last panel, where it falls on as it fell from the last but one.
    ///
    /// @param held by the last panel (1), and by the one before it (2)
    static double rest(double[] held) {
        double falls = held[1] / held[2];
        return held[1] == 0 ? 0 : held[1] * (falls < FALLS ? falls / (1 - falls) : LARGEST_REST);
    }

    /// The means over the later variables at points of this one.
    private Part.Several parts(int axis, double[] x, boolean[] within, double[] tolerances) {
        var parts = new Part.Several(x.length);
        if (axis == outer - 1) {
            points(axis, new double[][] {x}, within, tolerances, parts);
            return parts;
        }
        for (int i = 0; i < x.length; i++) {
            at[axis] = x[i];
            inside[axis] = within[i];
            parts.set(i, over(axis + 1, tolerances[i]));
        }
        return parts;
    }

    /// The function at points of all axes that are integrated over, from `axis` on.
    ///
    /// @param x one array for each of them
    private void points(int axis, double[][] x, boolean[] within, double[] tolerances, Part.Several parts) {
        if (isEvent) {
            measure(axis, x, within, tolerances, parts);
            return;
        }
        fix(axis);
        for (int from = 0; from < within.length; from += Integrand.BLOCK) {
            int n = Math.min(Integrand.BLOCK, within.length - from);
            for (int j = 0; j < x.length; j++) {
                System.arraycopy(x[j], from, columns[axis + j], 0, n);
            }
            fill(n);
            for (int i = 0; i < n; i++) {
                parts.set(from + i, value(i, isInside(axis) && within[from + i], shift) - shift);
            }
        }
    }

    private void fix(int axis) {
        for (int j = 0; j < axis; j++) {
            Arrays.fill(columns[j], at[j]);
        }
    }

    private boolean isInside(int axis) {
        for (int j = 0; j < axis; j++) {
            if (!inside[j]) {
                return false;
            }
        }
        return true;
    }

    /// What cannot be drawn need not have a value.
    private double value(int row, boolean drawn, double otherwise) {
        if (Double.isFinite(z[row])) {
            return z[row];
        }
        if (!drawn) {
            return otherwise;
        }
        undefined++;
        if (undefinedAt.isEmpty()) {
            undefinedAt = Arrays.stream(asGiven)
                    .map(column -> String.valueOf(column[row]))
                    .collect(Collectors.joining(", "));
        }
        if (limit.undefined() == 0) {
            refuseUndefined();
        }
        return otherwise;
    }

    private void refuseUndefined() {
        throw new Refusal(Problem.of("it has no finite value where its inputs are " + undefinedAt));
    }

    /// The probability of the event along the last axis, at points of the others from `axis` on.
    private void measure(int axis, double[][] x, boolean[] within, double[] tolerances, Part.Several parts) {
        fix(axis);
        boolean isInside = isInside(axis);
        var along = (Line) axes.getLast();
        Crossings.fill(
                along,
                (rows, places, values, scores) -> {
                    for (int from = 0; from < rows.length; from += Integrand.BLOCK) {
                        int n = Math.min(Integrand.BLOCK, rows.length - from);
                        for (int i = 0; i < n; i++) {
                            for (int j = 0; j < x.length; j++) {
                                columns[axis + j][i] = x[j][rows[from + i]];
                            }
                        }
                        System.arraycopy(values, from, columns[outer], 0, n);
                        fill(n);
                        for (int i = 0; i < n; i++) {
                            boolean drawn = isInside
                                    && within[rows[from + i]]
                                    && along.isInside(places[from + i], values[from + i]);
                            scores[from + i] = Double.isInfinite(z[i]) ? z[i] : value(i, drawn, -1);
                        }
                    }
                },
                tolerances,
                parts);
    }
}
