package dev.leadline.model;

import dev.leadline.density.Expectation;
import dev.leadline.estimate.Estimand;
import dev.leadline.formula.Working;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Draft.ReferenceDraft;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Refusal;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/// Makes the reference of its draft.
final class References {
    private static final String FORMULA = "$.reference.formula";
    private static final String QUADRATURE = "$.reference.quadrature";

    private final Draft draft;
    private final Findings findings;

    References(Draft draft, Findings findings) {
        this.draft = draft;
        this.findings = findings;
    }

    /// Empty where none is asked for, or it has problems.
    Optional<Reference> of() {
        return draft.reference().flatMap(given -> switch (given) {
            case ReferenceDraft.Value value -> Optional.of(stated(value));
            case ReferenceDraft.Formula(var formula) -> closedForm(formula);
            case ReferenceDraft.Quadrature _ -> Optional.of(new Reference.Quadrature());
        });
    }

    private Reference stated(ReferenceDraft.Value given) {
        double error = given.error().orElse(0);
        if (!Double.isFinite(given.value())) {
            findings.add(
                    "$.reference.value",
                    "value is %s but must be finite".formatted(given.value()),
                    "The answer is compared with it.");
        }
        if (!(error >= 0 && Double.isFinite(error))) {
            findings.add(
                    "$.reference.error",
                    "error is %s but must be 0 or more".formatted(Shortest.text(error)),
                    "It is the standard uncertainty of the reference value.");
        }
        return new Reference.Stated(given.value(), error, given.source());
    }

    private Optional<Reference> closedForm(String formula) {
        return working(formula).flatMap(working -> {
            var program = working.program();
            var read = IntStream.range(0, draft.inputs().size())
                    .filter(program::uses)
                    .mapToObj(i -> draft.inputs().get(i).name())
                    .toList();
            if (!read.isEmpty()) {
                findings.add(
                        FORMULA,
                        "the reference reads %s, which is drawn at random".formatted(String.join(", ", read)),
                        "A closed form is one number, made of constants, and of steps of constants alone.",
                        "Write \"reference\": {\"quadrature\": true} to have the answer integrated.");
                return Optional.empty();
            }
            double[] value = new double[1];
            program.evaluate(new double[draft.inputs().size()][], 1, new double[][] {value}, program.workspace());
            if (!Double.isFinite(value[0])) {
                findings.add(
                        FORMULA,
                        "the reference is %s but must be finite".formatted(value[0]),
                        "The answer is compared with it.");
                return Optional.empty();
            }
            return Optional.of(new Reference.ClosedForm(formula, value[0]));
        });
    }

    /// What is wrong elsewhere in the formulas is found where they are checked.
    private Optional<Working> working(String formula) {
        try {
            return Optional.of(Working.of(
                    draft.inputs().stream().map(InputDraft::name).toList(),
                    Workings.constants(draft),
                    draft.steps(),
                    List.of(formula)));
        } catch (Refusal refusal) {
            refusal.problems().stream()
                    .filter(problem -> problem.place().path().startsWith("asked"))
                    .forEach(problem -> findings.add(problem.in(FORMULA)));
            return Optional.empty();
        }
    }

    /// Whether quadrature, where it is asked for, knows the first answer.
    void check(Working working, List<Input> inputs, Optional<Dependence> dependence, List<Ask> asks) {
        if (draft.reference()
                        .filter(ReferenceDraft.Quadrature.class::isInstance)
                        .isPresent()
                && !asks.isEmpty()) {
            checkQuadrature(working, inputs, dependence, asks.getFirst());
        }
    }

    private void checkQuadrature(Working working, List<Input> inputs, Optional<Dependence> dependence, Ask ask) {
        boolean isKnown = ask.estimand() instanceof Estimand.Mean
                || ask.estimand() instanceof Estimand.Integral
                || ask.estimand() instanceof Estimand.Probability;
        if (!isKnown) {
            findings.add(
                    QUADRATURE,
                    "quadrature for a %s is not available"
                            .formatted(ask.estimand().word()),
                    "It integrates: a mean, an integral or a probability.",
                    "Give the value itself: {\"value\": 0.12, \"error\": 1e-4, \"source\": \"…\"}.");
            return;
        }
        var formula = FormulaOfInputs.of(working.program(0), inputs);
        var continuous = formula.read().stream()
                .filter(input -> !input.drawn().isDiscrete())
                .map(Input::name)
                .toList();
        if (continuous.size() > Expectation.MOST_LINES) {
            findings.add(
                    QUADRATURE,
                    "quadrature goes over %d continuous inputs at most, and %d are read: %s"
                            .formatted(Expectation.MOST_LINES, continuous.size(), String.join(", ", continuous)),
                    "Its cost grows with a power of their number.",
                    "Give a value known from elsewhere, or ask for less.");
        }
        String tied = formula.tied(inputs, dependence);
        if (!tied.isEmpty()) {
            findings.add(
                    QUADRATURE,
                    "quadrature goes over independent inputs, and these are tied: %s".formatted(tied),
                    "The error of its densities is known for each input by itself.",
                    "Give a value known from elsewhere.");
        }
    }
}
