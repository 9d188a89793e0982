package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.finite;

import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Problem;
import java.util.ArrayList;
import java.util.List;

/// The trapezoidal density: rising in a straight line from `from` to `flatFrom`, the same from there to `flatTo`,
/// falling in a straight line to `to`. Each of the three parts may be missing.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: JCGM 101:2008, 6.4.4, there symmetric.
public record Trapezoidal(double from, double flatFrom, double flatTo, double to) implements StraightSided {
    private static final Entry ENTRY = Entry.of(
                    v -> new Trapezoidal(v[0], v[1], v[2], v[3]),
                    finite("from", "least value"),
                    finite("flatFrom", "where the top begins"),
                    finite("flatTo", "where the top ends"),
                    finite("to", "largest value"))
            .and(v -> ordered(v[0], v[1], v[2], v[3]));

    private static final Entry SYMMETRIC = Entry.of(
                    v -> ofTop(v[0], v[1], v[2]),
                    finite("from", "least value"),
                    finite("to", "largest value"),
                    between(
                            0,
                            1,
                            "top",
                            "length of the top over that of the base; 0 is a triangle, 1 is uniform",
                            "The top is not longer than the base."))
            .and(v -> Uniform.rising("from", v[0], "to", v[1]));

    static final Family FAMILY =
            new Described("trapezoidal", "limits that are not sharp; the sum of two uniform effects", ENTRY, SYMMETRIC);

    public Trapezoidal {
        ENTRY.check(from, flatFrom, flatTo, to);
    }

    /// The symmetric member.
    ///
    /// @param top length of the top over that of the base
    public static Trapezoidal ofTop(double from, double to, double top) {
        SYMMETRIC.check(from, to, top);
        double side = 0.5 * (1 - top) * (to - from);
        return new Trapezoidal(from, from + side, Math.max(to - side, from + side), to);
    }

    private static List<Problem> ordered(double from, double flatFrom, double flatTo, double to) {
        var problems = new ArrayList<>(Uniform.rising("from", from, "to", to));
        if (problems.isEmpty()) {
            inside("flatFrom", flatFrom, "from", from, to, problems);
            boolean flatFromIsRight = problems.isEmpty();
            inside(
                    "flatTo",
                    flatTo,
                    flatFromIsRight ? "flatFrom" : "from",
                    flatFromIsRight ? flatFrom : from,
                    to,
                    problems);
        }
        return problems;
    }

    private static void inside(String name, double value, String low, double least, double to, List<Problem> problems) {
        if (!(value >= least && value <= to)) {
            problems.add(Rule.problem(
                    name,
                    value,
                    "between " + low + ", " + Shortest.text(least) + ", and to, " + Shortest.text(to),
                    "The top lies within the range.",
                    ""));
        }
    }

    @Override
    public Standard standard() {
        return new Standard((flatFrom - from) / scale(), (flatTo - flatFrom) / scale(), (to - flatTo) / scale());
    }

    /// The trapezoidal density between 0 and 1.
    ///
    /// @param rise length of the rising part
    /// @param top length of the flat part
    /// @param fall length of the falling part
    record Standard(double rise, double top, double fall) implements StraightSided.Standard {

        @Override
        public Standard mirrored() {
            return new Standard(fall, top, rise);
        }

        /// The density of the top.
        private double most() {
            return 2 / (1 + top);
        }

        /// The mass of the rising part.
        private double risingMass() {
            return 0.5 * rise * most();
        }

        @Override
        public double height(double z, double y) {
            if (!(z >= 0 && y >= 0)) {
                return z < 0 || y < 0 ? 0 : z;
            }
            return most() * Math.min(z < rise ? z / rise : 1, y < fall ? y / fall : 1);
        }

        @Override
        public double below(double z, double y) {
            if (z <= 0) {
                return 0;
            }
            if (y <= 0) {
                return 1;
            }
            if (z < rise) {
                return 0.5 * most() * z * (z / rise);
            }
            double flat = rise + top;
            double beyond = y < fall ? 0.5 * (z - flat) * (1 + y / fall) : 0;
            double within = y < fall ? top : z - rise;
            return Math.min(risingMass() + most() * (within + beyond), 1);
        }

        @Override
        public double inner(double p) {
            double first = risingMass();
            double last = mirrored().risingMass();
            if (p <= first) {
                return Math.sqrt(2 * rise * (p / most()));
            }
            if (1 - p >= last) {
                return rise + (p - first) / most();
            }
            double beyond = p - first - most() * top;
            return rise + top + 2 * beyond / most() / (1 + Math.sqrt((1 - p) / last));
        }

        @Override
        public double upperInner(double q) {
            return 1 - mirrored().inner(q);
        }

        @Override
        public double mean() {
            return moment(1, 0);
        }

        @Override
        public double variance() {
            return moment(2, mean());
        }

        @Override
        public double skewness() {
            double variance = variance();
            return moment(3, mean()) / (variance * Math.sqrt(variance));
        }

        @Override
        public double excessKurtosis() {
            double variance = variance();
            return moment(4, mean()) / (variance * variance) - 3;
        }

        /// The moment about a point: a mixture of a right triangle, a uniform part and another right triangle.
        private double moment(int order, double about) {
            return risingMass() * part(order, 2 * rise / 3 - about, rise * rise / 18, -rise * rise * rise / 135, 2.4)
                    + most() * top * part(order, rise + 0.5 * top - about, top * top / 12, 0, 1.8)
                    + mirrored().risingMass()
                            * part(
                                    order,
                                    rise + top + fall / 3 - about,
                                    fall * fall / 18,
                                    fall * fall * fall / 135,
                                    2.4);
        }

        private static double part(int order, double distance, double variance, double third, double kurtosis) {
            double square = distance * distance;
            return switch (order) {
                case 1 -> distance;
                case 2 -> variance + square;
                case 3 -> third + distance * (3 * variance + square);
                default -> kurtosis * variance * variance + 4 * distance * third + square * (6 * variance + square);
            };
        }
    }
}
