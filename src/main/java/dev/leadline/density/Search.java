package dev.leadline.density;

import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.SequencedMap;
import java.util.function.DoubleUnaryOperator;
import org.apache.commons.math3.analysis.MultivariateFunction;
import org.apache.commons.math3.exception.TooManyEvaluationsException;
import org.apache.commons.math3.optim.InitialGuess;
import org.apache.commons.math3.optim.MaxEval;
import org.apache.commons.math3.optim.nonlinear.scalar.GoalType;
import org.apache.commons.math3.optim.nonlinear.scalar.ObjectiveFunction;
import org.apache.commons.math3.optim.nonlinear.scalar.noderiv.NelderMeadSimplex;
import org.apache.commons.math3.optim.nonlinear.scalar.noderiv.SimplexOptimizer;

/// Looks for the parameters of the greatest likelihood by the method of Nelder and Mead, over transforms that are free
/// of bounds; begins again where it ended until nothing is gained.
///
/// Found: parameters to 2e-6, relative, or of 1 where they are smaller (`FitsTest`).
final class Search {
    private static final double PRECISION = 1e-14;
    private static final double STEP = 0.2;
    private static final int MOST_LOOKS = 4_000;
    private static final int MOST_BEGINNINGS = 20;

    /// A parameter that is looked for.
    ///
    /// @param of the value of the parameter, from any number; the start from 0
    record Free(String name, DoubleUnaryOperator of) {
        static Free line(String name, double start, double unit) {
            return new Free(name, t -> Math.fma(unit, t, start));
        }

        static Free positive(String name, double start) {
            return new Free(name, t -> start * StrictMath.exp(t));
        }

        /// Above a limit that the likelihood has no maximum below.
        static Free above(String name, double limit, double start) {
            return new Free(name, t -> limit + (start - limit) * StrictMath.exp(t));
        }
    }

    private Search() {}

    /// @param fixed parameters that stay
    static SequencedMap<String, Double> of(
            Family family, SequencedMap<String, Double> fixed, List<Free> free, double[] values) {
        MultivariateFunction loss = t -> {
            try {
                double log = Fit.logLikelihood(family.of(at(fixed, free, t)), values);
                return log > Double.NEGATIVE_INFINITY ? -log : Double.POSITIVE_INFINITY;
            } catch (Refusal outside) {
                return Double.POSITIVE_INFINITY;
            }
        };
        double[] best = new double[free.size()];
        double least = loss.value(best);
        if (least == Double.POSITIVE_INFINITY) {
            throw new Refusal(Problem.of("some values cannot occur at all")
                    .because("The family gives them no density, whatever the other parameters."));
        }
        for (int i = 0; i < MOST_BEGINNINGS; i++) {
            var found = minimum(loss, best);
            double gained = least - found.loss;
            best = found.at;
            least = found.loss;
            if (gained <= 1e-12 * (1 + Math.abs(least))) {
                return at(fixed, free, best);
            }
        }
        throw new Refusal(Problem.of("no greatest likelihood was found")
                .because("It still grew after %,d looks.".formatted(MOST_BEGINNINGS * MOST_LOOKS))
                .tryThis("Give one of the parameters."));
    }

    private record Found(double[] at, double loss) {}

    private static Found minimum(MultivariateFunction loss, double[] from) {
        double[] best = from.clone();
        double[] least = {loss.value(from)};
        MultivariateFunction remembering = t -> {
            double value = loss.value(t);
            if (value < least[0]) {
                least[0] = value;
                System.arraycopy(t, 0, best, 0, t.length);
            }
            return value;
        };
        try {
            new SimplexOptimizer(PRECISION, PRECISION)
                    .optimize(
                            new MaxEval(MOST_LOOKS),
                            new ObjectiveFunction(remembering),
                            GoalType.MINIMIZE,
                            new InitialGuess(from),
                            new NelderMeadSimplex(from.length, STEP));
        } catch (TooManyEvaluationsException e) {
            // the best so far is where the next search begins
        }
        return new Found(best, least[0]);
    }

    private static SequencedMap<String, Double> at(SequencedMap<String, Double> fixed, List<Free> free, double[] t) {
        var parameters = new LinkedHashMap<>(fixed);
        for (int i = 0; i < t.length; i++) {
            parameters.put(free.get(i).name(), free.get(i).of().applyAsDouble(t[i]));
        }
        return parameters;
    }
}
