package dev.leadline.model;

import dev.leadline.density.Density;
import dev.leadline.density.Expectation;
import dev.leadline.formula.Program;
import dev.leadline.formula.Working;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ConcurrentHashMap;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/// The mean of a formula by quadrature over the inputs that it reads.
final class QuadratureMean {
    /// Error of the mean, in standard deviations of the formula, above which it is not used: of a million
    /// draws it would be a hundredth of the standard error.
    private static final double LARGEST_ERROR = 1e-5;

    private static final int KEPT = 1000;

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
        var program = working.program(formula);
        var read = read(program);
        String names = read.stream().map(input -> inputs.get(input).name()).collect(Collectors.joining(", "));
        if (read.isEmpty()) {
            throw refusal("it reads no input");
        }
        if (read.size() > Expectation.MOST_INPUTS) {
            throw refusal("it reads %d inputs, and quadrature goes over %d at most"
                    .formatted(read.size(), Expectation.MOST_INPUTS));
        }
        if (read.stream().filter(this::isTied).count() > 1) {
            throw refusal("inputs that it reads are tied (%s)".formatted(names));
        }
        var densities = read.stream().map(input -> inputs.get(input).drawn()).toList();
        if (FOUND.size() > KEPT) {
            FOUND.clear();
        }
        var found = FOUND.computeIfAbsent(
                new Sought(text, names, densities), _ -> Expectation.of(densities, integrand(program, read)));
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

    private List<Integer> read(Program program) {
        return IntStream.range(0, inputs.size()).filter(program::uses).boxed().toList();
    }

    private boolean isTied(int input) {
        return dependence.filter(ties -> ties.inputs().contains(input)).isPresent();
    }

    private Expectation.Integrand integrand(Program program, List<Integer> read) {
        double[][] columns = new double[inputs.size()][];
        double[][] results = new double[1][];
        var workspace = program.workspace();
        return (x, z, n) -> {
            for (int j = 0; j < x.length; j++) {
                columns[read.get(j)] = x[j];
            }
            results[0] = z;
            program.evaluate(columns, n, results, workspace);
        };
    }

    private static Refusal refusal(String reason) {
        return new Refusal(Problem.of(reason));
    }
}
