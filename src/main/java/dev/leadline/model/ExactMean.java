package dev.leadline.model;

import dev.leadline.formula.Polynomial.Measured;
import dev.leadline.formula.Working;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/// The mean of a formula in closed form: of sums of products of powers of inputs, from the moments of the inputs.
///
/// Inputs are measured from their means in standard deviations, so that `(x - 1e6)^4` keeps its digits.
final class ExactMean {
    private static final int HIGHEST = 4;

    private final List<Input> inputs;
    private final Optional<Dependence> dependence;

    ExactMean(List<Input> inputs, Optional<Dependence> dependence) {
        this.inputs = inputs;
        this.dependence = dependence;
    }

    /// @param formula index among those asked
    /// @throws Refusal saying what stands in the way
    double of(Working working, int formula) {
        return working.polynomial(formula, this::measured).terms().entrySet().stream()
                .mapToDouble(term -> term.getValue() * product(term.getKey()))
                .sum();
    }

    private Measured measured(int input) {
        var density = inputs.get(input).drawn();
        double deviation = Math.sqrt(density.variance());
        if (!Double.isFinite(density.mean()) || !Double.isFinite(deviation)) {
            throw refusal(
                    "%s has no finite variance".formatted(inputs.get(input).name()));
        }
        return new Measured(density.mean(), deviation);
    }

    /// The mean of a product of powers.
    private double product(Map<Integer, Integer> powers) {
        var tied = powers.keySet().stream()
                .filter(input ->
                        dependence.filter(ties -> ties.inputs().contains(input)).isPresent())
                .map(input -> inputs.get(input).name())
                .toList();
        if (tied.size() > 1) {
            throw refusal("%s are tied and stand in one product".formatted(String.join(" and ", tied)));
        }
        return powers.entrySet().stream()
                .mapToDouble(power -> moment(power.getKey(), power.getValue()))
                .reduce(1, (a, b) -> a * b);
    }

    private double moment(int input, int power) {
        var density = inputs.get(input).drawn();
        String name = inputs.get(input).name();
        if (power > HIGHEST) {
            throw refusal("it has %s to the power of %d, and moments are known to the fourth".formatted(name, power));
        }
        if (density.variance() == 0) {
            return 0;
        }
        if (!(density.tailOrders().least() > 2 * power)) {
            throw refusal("%s^%d has no finite variance".formatted(name, power));
        }
        return switch (power) {
            case 1 -> 0;
            case 2 -> 1;
            case 3 -> density.skewness();
            default -> density.excessKurtosis() + 3;
        };
    }

    private static Refusal refusal(String reason) {
        return new Refusal(Problem.of(reason));
    }
}
