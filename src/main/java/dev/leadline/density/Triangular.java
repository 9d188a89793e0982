package dev.leadline.density;

import static dev.leadline.density.Rule.finite;

import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Problem;
import java.util.ArrayList;
import java.util.List;

/// The triangular density: rising in a straight line from `from` to `mode`, falling in one from there to `to`. The mode
/// may be at an end.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
public record Triangular(double from, double mode, double to) implements StraightSided {
    private static final Entry ENTRY = Entry.of(
                    v -> new Triangular(v[0], v[1], v[2]),
                    finite("from", "least value"),
                    finite("mode", "most likely value"),
                    finite("to", "largest value"))
            .and(v -> ordered(v[0], v[1], v[2]));

    static final Family FAMILY = new Described(
            "triangular", "least, most likely and largest value are known; the sum of two uniform effects", ENTRY);

    public Triangular {
        ENTRY.check(from, mode, to);
    }

    /// What is wrong with limits and a most likely value between them.
    static List<Problem> ordered(double from, double mode, double to) {
        var problems = new ArrayList<>(Uniform.rising("from", from, "to", to));
        if (problems.isEmpty() && !(mode >= from && mode <= to)) {
            problems.add(Rule.problem(
                    "mode",
                    mode,
                    "between from, " + Shortest.text(from) + ", and to, " + Shortest.text(to),
                    "The most likely value lies within the range.",
                    ""));
        }
        return problems;
    }

    @Override
    public Standard standard() {
        return new Standard((mode - from) / scale(), (to - mode) / scale());
    }

    @Override
    public double mean() {
        return from / 3 + mode / 3 + to / 3;
    }

    /// The triangular density between 0 and 1.
    ///
    /// @param mode distance of the mode from 0
    /// @param rest distance of the mode from 1
    record Standard(double mode, double rest) implements StraightSided.Standard, ClosedForm {
        private static final double SQRT_2 = 1.4142135623730951;

        @Override
        public Standard mirrored() {
            return new Standard(rest, mode);
        }

        /// The rising side, continued; infinite from the mode on where there is no rising side.
        private double rising(double z) {
            return z < 0 ? 0 : mode == 0 ? Double.isNaN(z) ? z : Double.POSITIVE_INFINITY : 2 * (z / mode);
        }

        @Override
        public double height(double z, double y) {
            return Math.min(rising(z), mirrored().rising(y));
        }

        @Override
        public double below(double z, double y) {
            if (z <= 0) {
                return 0;
            }
            if (y <= 0 || z >= mode && rest == 0) {
                return 1;
            }
            return z < mode ? z * (z / mode) : Math.min(mode + (z - mode) * (1 + y / rest), 1);
        }

        @Override
        public double inner(double p) {
            return p <= mode ? Math.sqrt(mode * p) : mode + (p - mode) / (1 + Math.sqrt((1 - p) / rest));
        }

        @Override
        public double upperInner(double q) {
            return q <= rest ? 1 - Math.sqrt(rest * q) : Math.sqrt(mode * (1 - q));
        }

        /// The rising side up to the mode, plus what the falling side adds beyond it, which is exactly 0 below.
        @Override
        public void fill(double[] u, double[] x, int n) {
            double turn = mode;
            double perRest = rest > 0 ? 1 / rest : 0;
            double ofRest = rest;
            for (int i = 0; i < n; i++) {
                double v = u[i];
                double beyond = Math.max(v - turn, 0) / (1 + Math.sqrt(Math.min(1 - v, ofRest) * perRest));
                x[i] = Math.sqrt(turn * Math.min(v, turn)) + beyond;
            }
        }

        @Override
        public double mean() {
            return (1 + mode) / 3;
        }

        @Override
        public double variance() {
            return (1 - mode * rest) / 18;
        }

        @Override
        public double skewness() {
            double square = 1 - mode * rest;
            return SQRT_2 / 5 * (rest - mode) * (1 + mode) * (1 + rest) / (square * Math.sqrt(square));
        }

        @Override
        public double excessKurtosis() {
            return -0.6;
        }
    }
}
