package dev.leadline.model;

import dev.leadline.density.Density;
import dev.leadline.density.Expectation;
import dev.leadline.formula.Working;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ConcurrentHashMap;

/// The mean of a formula by quadrature over the inputs that it reads.
final class QuadratureMean {
    /// Error of the mean, in standard deviations of the formula, above which it is not used: of a million
    /// draws it would be a hundredth of the standard error.
    private static final double LARGEST_ERROR = 1e-5;

    private static final int KEPT = 1000;

    /// Beyond, what is asked for would seldom be reached.
    private static final int MOST_INPUTS = 3;

    /// Evaluations: about two seconds.
    private static final Expectation.Limit LIMIT = Expectation.Limit.of(8_000_000);

    /// What was found last: a project is checked again at every edit.
    private static final Map<Sought, Expectation> FOUND = new ConcurrentHashMap<>();

    /// @param formula with everything that it is made of
    private record Sought(String formula, String inputs, List<Density> densities) {}

    private final List<Input> inputs;
    private final Optional<Dependence> dependence;

    QuadratureMean(List<Input> inputs, Optional<Dependence> dependence) {
        this.inputs = inputs;
        this.dependence = dependence;
    }

    /// @param formula index among those asked
    /// @param text the formula with all steps and constants
    /// @throws Refusal saying what stands in the way
    Expectation of(Working working, int formula, String text) {
        var read = FormulaOfInputs.of(working.program(formula), inputs);
        int variables = read.read().size();
        if (variables == 0) {
            throw refusal("it reads no input");
        }
        if (variables > MOST_INPUTS) {
            throw refusal("it reads %d inputs, and quadrature goes over %d at most".formatted(variables, MOST_INPUTS));
        }
        if (!read.tied(inputs, dependence).isEmpty()) {
            throw refusal("inputs that it reads are tied (%s)".formatted(read.names()));
        }
        if (FOUND.size() > KEPT) {
            FOUND.clear();
        }
        var found = FOUND.computeIfAbsent(
                new Sought(text, read.names(), read.densities()),
                _ -> Expectation.of(read.densities(), read.integrand(), LIMIT));
        if (!Double.isFinite(found.deviation())) {
            throw refusal("it seems to have no finite variance");
        }
        if (found.deviation() == 0) {
            throw refusal("it does not vary");
        }
        if (!(found.error() <= LARGEST_ERROR * found.deviation())) {
            throw refusal(String.format(
                    Locale.ROOT,
                    "quadrature finds it to %.1g only, beside a standard deviation of %.1g",
                    found.error(),
                    found.deviation()));
        }
        return found;
    }

    private static Refusal refusal(String reason) {
        return new Refusal(Problem.of(reason));
    }
}
