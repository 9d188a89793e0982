package dev.leadline.density;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Normal;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.PriorityQueue;
import java.util.function.BooleanSupplier;

/// A mean over several continuous variables at once: a box of their normal scores is cut, where the errors are, into
/// boxes on which rules of degree 7 and 5 agree.
///
/// Source: Genz and Malik (1980), Journal of Computational and Applied Mathematics 6, 295-302. Digits from memory;
/// their degree is tested (`CubatureTest`).
final class Cubature {
    /// Boxes at most: about 40 MB.
    private static final int MOST_BOXES = 200_000;

    /// How many times their difference the rules may be off beside a jump or a kink.
    private static final double SAFETY = 2;

    /// Normal score at which the middle of a density is cut from its tails, at first.
    private static final double MIDDLE = 1.2;

    /// Logarithms of the ends of the two last slabs of a tail and of the one before, as in [Axis.Line].
    private static final double[] ENDS = {16, 26, 36};

    /// Which slabs are the last of a tail (1), and the ones before them (2), below the middle with a minus.
    private static final int[] SLABS = {-1, -2, 0, 0, 0, 0, 2, 1};

    /// Where the points of the rule stand, from the middle of a box to its side, and the sides.
    private static final double[] PLACES = {
        0,
        Math.sqrt(9 / 70.0),
        -Math.sqrt(9 / 70.0),
        Math.sqrt(.9),
        -Math.sqrt(.9),
        Math.sqrt(9 / 19.0),
        -Math.sqrt(9 / 19.0),
        1,
        -1
    };

    private static final int NEAR = 1;
    private static final int FAR = 3;
    private static final int CORNER = 5;
    private static final int SIDE = 7;

    /// Of half the width of a box, how near to its side the function is looked at.
    private static final double BESIDE = 0x1p-40;

    /// What the heights in the middle and at the points near and far on an axis lead to expect at the side.
    private static final double[] TO_SIDE = toSide();

    /// Of a box, what lies between the far points and a side.
    private static final double GAP = 0.5 * (1 - PLACES[FAR]);

    /// Fourth differences take so much of the outer second difference from the inner one.
    private static final double RATIO = 1 / 7.0;

    /// A function of points of all variables.
    @FunctionalInterface
    interface Function {
        /// @param x one array for each variable
        /// @param within whether a point may be drawn
        void fill(double[][] x, boolean[] within, double[] tolerances, Part.Several parts);
    }

    private final List<Density> densities;
    private final Function function;
    private final BooleanSupplier mayGoOn;
    private final int n;

    /// Of each point of the rule, the index of its place along each axis.
    private final int[][] points;

    private final double[] seventh;
    private final double[] fifth;
    private final List<Map<Side, Nodes>> nodes = new ArrayList<>();

    /// @param densities two or more
    /// @param mayGoOn whether more points may be looked at
    Cubature(List<Density> densities, Function function, BooleanSupplier mayGoOn) {
        this.densities = densities;
        this.function = function;
        this.mayGoOn = mayGoOn;
        this.n = densities.size();
        this.points = points(n);
        this.seventh = new double[points.length];
        this.fifth = new double[points.length];
        densities.forEach(_ -> nodes.add(new HashMap<>()));
        double corners = 1 << n;
        for (int p = 0; p < points.length; p++) {
            int off = 0;
            int farthest = 0;
            for (int place : points[p]) {
                off += place == 0 ? 0 : 1;
                farthest = Math.max(farthest, place);
            }
            if (farthest >= SIDE) {
                continue;
            }
            boolean isCorner = farthest >= CORNER;
            boolean isFar = farthest >= FAR;
            seventh[p] = isCorner
                    ? 6859 / 19683.0 / corners
                    : off == 2
                            ? 200 / 19683.0
                            : isFar
                                    ? (1820 - 400 * n) / 19683.0
                                    : off == 1 ? 980 / 6561.0 : (12824 - 9120 * n + 400 * n * n) / 19683.0;
            fifth[p] = isCorner
                    ? 0
                    : off == 2
                            ? 25 / 729.0
                            : isFar
                                    ? (265 - 100 * n) / 1458.0
                                    : off == 1 ? 245 / 486.0 : (729 - 950 * n + 50 * n * n) / 729.0;
        }
    }

    /// The middle, two points near it and two far from it on each axis, those far from it on two axes, the
    /// corners, and the middles of the sides.
    private static int[][] points(int n) {
        var points = new ArrayList<int[]>();
        points.add(new int[n]);
        for (int near = NEAR; near < CORNER; near++) {
            for (int i = 0; i < n; i++) {
                points.add(point(n, i, near, i, near));
            }
        }
        for (int one = FAR; one < CORNER; one++) {
            for (int other = FAR; other < CORNER; other++) {
                for (int i = 0; i < n; i++) {
                    for (int j = i + 1; j < n; j++) {
                        points.add(point(n, i, one, j, other));
                    }
                }
            }
        }
        for (int corner = 0; corner < 1 << n; corner++) {
            int[] point = new int[n];
            for (int i = 0; i < n; i++) {
                point[i] = CORNER + (corner >> i & 1);
            }
            points.add(point);
        }
        for (int side = SIDE; side < PLACES.length; side++) {
            for (int i = 0; i < n; i++) {
                points.add(point(n, i, side, i, side));
            }
        }
        return points.toArray(int[][]::new);
    }

    private static int[] point(int n, int i, int one, int j, int other) {
        int[] point = new int[n];
        point[i] = one;
        point[j] = other;
        return point;
    }

    /// Lagrange's coefficients of the first five places for the value at 1.
    private static double[] toSide() {
        double[] coefficients = new double[CORNER];
        for (int i = 0; i < CORNER; i++) {
            double product = 1;
            for (int j = 0; j < CORNER; j++) {
                if (j != i) {
                    product *= (1 - PLACES[j]) / (PLACES[i] - PLACES[j]);
                }
            }
            coefficients[i] = product;
        }
        return coefficients;
    }

    private record Side(double from, double to) {}

    /// Of a side of a box: values, heights of the normal density, and whether values may be drawn.
    private record Nodes(double[] x, double[] height, boolean[] inside) {}

    /// Confined to one integral.
    private static final class Box {
        final double[] low;
        final double[] high;

        /// Of each axis, in which of [#SLABS] it lies.
        final int[] slab;

        Part part;
        double own;
        int axis;

        Box(double[] low, double[] high, int[] slab) {
            this.low = low;
            this.high = high;
            this.slab = slab;
        }

        double own() {
            return own;
        }

        Box half(boolean upper) {
            double[] from = low.clone();
            double[] to = high.clone();
            double middle = 0.5 * (low[axis] + high[axis]);
            if (upper) {
                from[axis] = middle;
            } else {
                to[axis] = middle;
            }
            return new Box(from, to, slab);
        }
    }

    Part integral(double tolerance) {
        var boxes = new PriorityQueue<Box>(Comparator.comparingDouble(Box::own).reversed());
        int together = Math.max(1, 1024 / points.length / 2);
        var first = first();
        evaluate(first, tolerance);
        boxes.addAll(first);
        double error = first.stream().mapToDouble(Box::own).sum();
        while (error > tolerance && boxes.size() < MOST_BOXES && mayGoOn.getAsBoolean()) {
            var worst = new ArrayList<Box>();
            var halves = new ArrayList<Box>();
            for (int i = 0; i < together && !boxes.isEmpty() && boxes.peek().own > tolerance / MOST_BOXES; i++) {
                var box = boxes.poll();
                worst.add(box);
                halves.add(box.half(false));
                halves.add(box.half(true));
            }
            if (worst.isEmpty()) {
                break;
            }
            evaluate(halves, tolerance);
            for (int i = 0; i < worst.size(); i++) {
                var lower = halves.get(2 * i);
                var upper = halves.get(2 * i + 1);
                var whole = worst.get(i);
                double least = 0.5 * Math.abs(whole.part.mean() - lower.part.mean() - upper.part.mean());
                lower.own = Math.max(lower.own, least);
                upper.own = Math.max(upper.own, least);
                error += lower.own + upper.own - whole.own;
            }
            boxes.addAll(halves);
        }
        return added(boxes);
    }

    private List<Box> first() {
        double[] edges = new double[SLABS.length + 1];
        int zero = SLABS.length / 2;
        edges[zero + 1] = MIDDLE;
        edges[zero - 1] = -MIDDLE;
        for (int i = 0; i < ENDS.length; i++) {
            double end = Normal.upperQuantile(0.5 * Exp.exp(-ENDS[i]));
            edges[zero + 2 + i] = end;
            edges[zero - 2 - i] = -end;
        }
        var boxes = new ArrayList<Box>();
        long all = 1;
        for (int j = 0; j < n; j++) {
            all *= SLABS.length;
        }
        for (int b = 0; b < all; b++) {
            double[] low = new double[n];
            double[] high = new double[n];
            int[] slab = new int[n];
            int rest = b;
            for (int j = 0; j < n; j++) {
                int k = rest % SLABS.length;
                rest /= SLABS.length;
                low[j] = edges[k];
                high[j] = edges[k + 1];
                slab[j] = SLABS[k];
            }
            boxes.add(new Box(low, high, slab));
        }
        return boxes;
    }

    private void evaluate(List<Box> boxes, double tolerance) {
        int rows = boxes.size() * points.length;
        double[][] x = new double[n][rows];
        double[] weight = new double[rows];
        boolean[] within = new boolean[rows];
        double[] tolerances = new double[rows];
        for (int b = 0; b < boxes.size(); b++) {
            place(boxes.get(b), b * points.length, x, weight, within);
        }
        Arrays.fill(tolerances, tolerance);
        var parts = new Part.Several(rows);
        function.fill(x, within, tolerances, parts);
        for (int b = 0; b < boxes.size(); b++) {
            take(boxes.get(b), b * points.length, weight, parts);
        }
    }

    private void place(Box box, int from, double[][] x, double[] weight, boolean[] within) {
        double volume = 1;
        for (int j = 0; j < n; j++) {
            volume *= box.high[j] - box.low[j];
        }
        for (int p = 0; p < points.length; p++) {
            weight[from + p] = volume;
            within[from + p] = true;
        }
        for (int j = 0; j < n; j++) {
            var side = nodes(j, box.low[j], box.high[j]);
            for (int p = 0; p < points.length; p++) {
                int place = points[p][j];
                x[j][from + p] = side.x[place];
                weight[from + p] *= side.height[place];
                within[from + p] &= side.inside[place];
            }
        }
    }

    private Nodes nodes(int axis, double from, double to) {
        return nodes.get(axis).computeIfAbsent(new Side(from, to), _ -> made(densities.get(axis), from, to));
    }

    private static Nodes made(Density density, double from, double to) {
        var made = new Nodes(new double[PLACES.length], new double[PLACES.length], new boolean[PLACES.length]);
        var support = density.support();
        for (int i = 0; i < PLACES.length; i++) {
            double score = 0.5 * (from + to) + 0.5 * (to - from) * PLACES[i] * (i < SIDE ? 1 : 1 - BESIDE);
            double p = Normal.cdf(-Math.abs(score));
            made.x[i] = score < 0 ? density.quantile(p) : density.upperQuantile(p);
            made.height[i] = Normal.pdf(score);
            made.inside[i] = made.x[i] > support.low() && made.x[i] < support.high();
        }
        return made;
    }

    private void take(Box box, int from, double[] weight, Part.Several parts) {
        double mean = 0;
        double other = 0;
        double error = 0;
        double size = 0;
        double square = 0;
        for (int p = 0; p < points.length; p++) {
            double height = weight[from + p] * parts.mean()[from + p];
            mean += seventh[p] * height;
            other += fifth[p] * height;
            error += Math.abs(seventh[p]) * weight[from + p] * parts.error()[from + p];
            size += seventh[p] * Math.abs(height);
            square += seventh[p] * weight[from + p] * parts.square()[from + p];
        }
        box.part = new Part(mean, error, Math.max(size, Math.abs(mean)), Math.max(square, 0), 0, 0);
        box.own = SAFETY * Math.abs(mean - other) + sides(from, weight, parts);
        box.axis = roughest(box, from, weight, parts);
    }

    /// A jump between a side and the points next to it, which no rule sees: how far the height at the side is from
    /// what the others lead to expect.
    private double sides(int from, double[] weight, Part.Several parts) {
        double sum = 0;
        for (int j = 0; j < n; j++) {
            for (int side = 0; side < 2; side++) {
                int at = from + points.length - (2 - side) * n + j;
                double miss = weight[at] * parts.mean()[at] - TO_SIDE[0] * weight[from] * parts.mean()[from];
                for (int place = NEAR; place < CORNER; place++) {
                    int mirrored = side == 0 ? place : (place - 1 ^ 1) + 1;
                    int point = from + 1 + (place - 1) * n + j;
                    miss -= TO_SIDE[mirrored] * weight[point] * parts.mean()[point];
                }
                sum += GAP * Math.abs(miss);
            }
        }
        return sum;
    }

    /// The axis with the greatest fourth difference, of equal ones the widest.
    private int roughest(Box box, int from, double[] weight, Part.Several parts) {
        double middle = 2 * weight[from] * parts.mean()[from];
        int roughest = 0;
        double greatest = -1;
        double widest = 0;
        for (int j = 0; j < n; j++) {
            double[] second = new double[2];
            for (int k = 0; k < 2; k++) {
                int one = from + 1 + 2 * k * n + j;
                int opposite = one + n;
                second[k] = weight[one] * parts.mean()[one] + weight[opposite] * parts.mean()[opposite] - middle;
            }
            double fourth = Math.abs(second[0] - RATIO * second[1]);
            double width = box.high[j] - box.low[j];
            if (fourth > greatest * (1 + 1e-9) || fourth >= greatest * (1 - 1e-9) && width > widest) {
                roughest = j;
                greatest = fourth;
                widest = width;
            }
        }
        return roughest;
    }

    private Part added(Iterable<Box> boxes) {
        var mean = new Sum(0);
        double error = 0;
        double size = 0;
        double square = 0;
        double[][][] sizes = new double[n][2][3];
        double[][][] squares = new double[n][2][3];
        for (var box : boxes) {
            mean.add(box.part.mean());
            error += box.own + box.part.error();
            size += box.part.size();
            square += box.part.square();
            for (int j = 0; j < n; j++) {
                int side = box.slab[j] < 0 ? 0 : 1;
                sizes[j][side][Math.abs(box.slab[j])] += box.part.size();
                squares[j][side][Math.abs(box.slab[j])] += box.part.square();
            }
        }
        double tails = 0;
        double rest = 0;
        for (int j = 0; j < n; j++) {
            for (int side = 0; side < 2; side++) {
                tails += Integration.rest(sizes[j][side]);
                rest += Integration.rest(squares[j][side]);
            }
        }
        return new Part(mean.value(), error + tails, size, square, rest, tails);
    }
}
