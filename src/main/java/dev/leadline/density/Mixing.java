package dev.leadline.density;

import static dev.leadline.density.Rule.between;

import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Refusal;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.concurrent.ConcurrentHashMap;

/// What the tied normals of a draw are all multiplied by: the kind of a copula. Immutable, safe for all threads.
public sealed interface Mixing {
    /// Words of the project file.
    String GAUSSIAN = "gaussian";
    String STUDENT = "student";

    /// By 1: the Gaussian copula. Extremes of several inputs hardly come together.
    Mixing NONE = new None();

    /// By the root of `dof / χ²`, so that they become values of Student's t: extremes come together, the more the
    /// fewer degrees of freedom.
    ///
    /// @throws Refusal for `dof` below 1 or above 10,000
    static Mixing student(double dof) {
        ChiSquared.DOF.broken(dof).ifPresent(problem -> {
            throw new Refusal(problem);
        });
        return ChiSquared.of(dof);
    }

    String word();

    /// As `Gaussian`, or `Student` with its degrees of freedom.
    String inWords();

    OptionalDouble degreesOfFreedom();

    /// Whether a draw takes one more probability.
    boolean isRandom();

    /// Replaces those probabilities by what is multiplied by.
    void factors(double[] u, int n);

    /// Replaces values, once multiplied, by their probabilities.
    void probabilities(double[] y, int n);

    /// How far a draw of two independent inputs lies from the middle once it is multiplied, where two normals as
    /// unlikely lie at `r`: both have the probability `exp(-r²/2)` to lie farther.
    double radius(double r);

    /// @see Mixing#NONE
    record None() implements Mixing {
        @Override
        public String word() {
            return GAUSSIAN;
        }

        @Override
        public String inWords() {
            return "Gaussian";
        }

        @Override
        public OptionalDouble degreesOfFreedom() {
            return OptionalDouble.empty();
        }

        @Override
        public boolean isRandom() {
            return false;
        }

        @Override
        public void factors(double[] u, int n) {
            throw new IllegalStateException("nothing is drawn");
        }

        @Override
        public void probabilities(double[] y, int n) {
            dev.leadline.numeric.Normal.cdf(y, y, n);
        }

        @Override
        public double radius(double r) {
            return r;
        }
    }

    /// @see Mixing#student
    record ChiSquared(double dof, Inversion chiSquare, StudentTail tail) implements Mixing {
        private static final Rule DOF = between(
                1,
                10_000,
                "dof",
                "degrees of freedom",
                "Below, a draw would be all extremes; above, the copula is the Gaussian one.");

        /// A few hundred kilobytes each.
        private static final int KEPT = 16;

        private static final Map<Double, Mixing> LAST_USED = new ConcurrentHashMap<>();

        private static Mixing of(double dof) {
            if (LAST_USED.size() > KEPT) {
                LAST_USED.clear();
            }
            return LAST_USED.computeIfAbsent(
                    dof, d -> new ChiSquared(d, Inversion.of(new Gamma(0.5 * d, 2)), StudentTail.of(d)));
        }

        @Override
        public String word() {
            return STUDENT;
        }

        @Override
        public String inWords() {
            return "Student (dof " + Shortest.text(dof) + ")";
        }

        @Override
        public OptionalDouble degreesOfFreedom() {
            return OptionalDouble.of(dof);
        }

        @Override
        public boolean isRandom() {
            return true;
        }

        @Override
        public void factors(double[] u, int n) {
            chiSquare.fill(u, u, n);
            for (int i = 0; i < n; i++) {
                u[i] = Math.sqrt(dof / u[i]);
            }
        }

        @Override
        public void probabilities(double[] y, int n) {
            tail.probabilities(y, n);
        }

        @Override
        public double radius(double r) {
            return Math.sqrt(dof * StrictMath.expm1(r * r / dof));
        }

        @Override
        public boolean equals(Object other) {
            return other instanceof ChiSquared student && dof == student.dof;
        }

        @Override
        public int hashCode() {
            return Double.hashCode(dof);
        }

        @Override
        public String toString() {
            return STUDENT + "(" + dof + ")";
        }
    }
}
