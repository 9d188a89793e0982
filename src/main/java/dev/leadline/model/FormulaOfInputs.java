package dev.leadline.model;

import dev.leadline.density.Density;
import dev.leadline.density.Expectation.Integrand;
import dev.leadline.formula.Program;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/// A formula as a function of those inputs that it reads: what quadrature goes over. Confined to its thread.
///
/// @param read the inputs, in the order of the question
/// @param integrand its variables are the inputs
public record FormulaOfInputs(List<Input> read, Integrand integrand) {
    public FormulaOfInputs {
        read = List.copyOf(read);
    }

    /// @param program of one result
    /// @param inputs of the question
    public static FormulaOfInputs of(Program program, List<Input> inputs) {
        int[] read = IntStream.range(0, inputs.size()).filter(program::uses).toArray();
        double[][] columns = new double[inputs.size()][];
        double[][] results = new double[1][];
        var workspace = program.workspace();
        return new FormulaOfInputs(IntStream.of(read).mapToObj(inputs::get).toList(), (x, z, n) -> {
            for (int j = 0; j < read.length; j++) {
                columns[read[j]] = x[j];
            }
            results[0] = z;
            program.evaluate(columns, n, results, workspace);
        });
    }

    public List<Density> densities() {
        return read.stream().map(Input::drawn).toList();
    }

    public String names() {
        return names(read);
    }

    /// Of those inputs that it reads, the names of the ones that are tied to each other; empty where at most one is
    /// tied.
    public String tied(List<Input> inputs, Optional<Dependence> dependence) {
        var tied = read.stream()
                .filter(input -> dependence
                        .filter(ties -> ties.inputs().contains(inputs.indexOf(input)))
                        .isPresent())
                .toList();
        return tied.size() > 1 ? names(tied) : "";
    }

    private static String names(List<Input> inputs) {
        return inputs.stream().map(Input::name).collect(Collectors.joining(", "));
    }
}
