package dev.leadline.model;

import dev.leadline.density.Copula;
import dev.leadline.density.Correlations;
import dev.leadline.density.Measure;
import dev.leadline.density.Mixing;
import dev.leadline.model.Dependence.Tie;
import dev.leadline.model.Draft.DependenceDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Draft.PairDraft;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/// Makes the dependence of inputs of its draft.
final class Dependences {
    private static final String PATH = "$.dependence";

    private final List<InputDraft> drafts;
    private final List<String> names;
    private final Findings findings;

    private Dependences(List<InputDraft> drafts, Findings findings) {
        this.drafts = drafts;
        this.names =
                drafts.stream().map(draft -> Workings.composed(draft.name())).toList();
        this.findings = findings;
    }

    /// Empty where there are problems.
    ///
    /// @param inputs those that have none
    static Optional<Dependence> of(
            DependenceDraft draft, List<InputDraft> drafts, List<Input> inputs, Findings findings) {
        return new Dependences(drafts, findings).dependence(draft, inputs);
    }

    /// @param first which of the project's inputs
    /// @param second another
    private record Pair(int first, int second, Measure measure, double target, String path) {}

    private Optional<Dependence> dependence(DependenceDraft draft, List<Input> inputs) {
        Optional<Mixing> mixing = mixing(draft);
        List<Pair> pairs = pairs(draft);
        boolean complete = pairs.size() == draft.pairs().size() && inputs.size() == drafts.size();
        return complete && !pairs.isEmpty() ? mixing.flatMap(kind -> tied(kind, pairs)) : Optional.empty();
    }

    private Optional<Mixing> mixing(DependenceDraft draft) {
        if (draft.copula().equals("gaussian")) {
            if (draft.dof().isPresent()) {
                findings.add(
                        PATH + ".dof",
                        "the Gaussian copula has no dof",
                        "Degrees of freedom belong to the Student copula.",
                        "Leave it out.");
            }
            return Optional.of(new Mixing.None());
        }
        Problem problem = Problem.of("the copula \"%s\" is not available".formatted(draft.copula()))
                .because("The copula here is gaussian.");
        findings.add(
                PATH + ".copula",
                Nearest.to(draft.copula(), Set.of("gaussian"))
                        .map(near -> problem.tryThis("Was \"%s\" meant?".formatted(near)))
                        .orElse(problem.tryThis("Write \"copula\": \"gaussian\".")));
        return Optional.empty();
    }

    /// Those that have no problem.
    private List<Pair> pairs(DependenceDraft draft) {
        if (draft.pairs().isEmpty()) {
            findings.add(
                    PATH + ".pairs",
                    "no inputs are tied",
                    "Dependence is a correlation for each pair of inputs that go together.",
                    "Add {\"of\": [\"a\", \"b\"], \"spearman\": 0.4}, or leave dependence out.");
        }
        List<Pair> pairs = new ArrayList<>();
        Map<Set<Integer>, Integer> seen = new HashMap<>();
        for (int i = 0; i < draft.pairs().size(); i++) {
            String path = PATH + ".pairs[" + i + "]";
            PairDraft pair = draft.pairs().get(i);
            int first = input(pair.one(), path);
            int second = input(pair.other(), path);
            boolean valid = target(pair, path) && first >= 0 && second >= 0;
            if (first >= 0 && first == second) {
                findings.add(
                        path + ".of",
                        "%s is tied to itself".formatted(names.get(first)),
                        "A correlation is between two inputs.",
                        "Name another input.");
                valid = false;
            } else if (first >= 0 && second >= 0) {
                Integer before = seen.putIfAbsent(Set.of(first, second), i);
                if (before != null) {
                    findings.add(
                            path + ".of",
                            "%s and %s are tied twice".formatted(names.get(first), names.get(second)),
                            "Their correlation stands at %s.pairs[%d] already.".formatted(PATH, before),
                            "Keep one of the two.");
                    valid = false;
                }
            }
            if (valid) {
                Measure measure = Measure.of(pair.measure()).orElseThrow();
                pairs.add(new Pair(first, second, measure, pair.value(), path + "." + pair.measure()));
            }
        }
        return pairs;
    }

    /// Its index; -1 where it is none that can be tied.
    private int input(String name, String path) {
        int index = names.indexOf(Workings.composed(name));
        if (index < 0) {
            Problem problem = Problem.of("there is no input \"%s\"".formatted(name))
                    .because("A pair names two inputs of the project.");
            findings.add(
                    path + ".of",
                    Nearest.to(name, names)
                            .map(near -> problem.tryThis("Was \"%s\" meant?".formatted(near)))
                            .orElse(problem));
            return -1;
        }
        if (drafts.get(index).from() instanceof From.Range) {
            findings.add(
                    path + ".of",
                    "%s is an integration variable and cannot be tied".formatted(names.get(index)),
                    "It has no density: its range counts evenly, whatever the other inputs are.",
                    "Leave the pair out, or give %s a density.".formatted(names.get(index)));
            return -1;
        }
        return index;
    }

    private boolean target(PairDraft pair, String path) {
        if (pair.measure().equals("pearson")) {
            findings.add(
                    path + ".pearson",
                    "pearson is not available",
                    "Inputs here are tied by ranks.",
                    "Give spearman or kendall.");
            return false;
        }
        if (pair.value() > -1 && pair.value() < 1) {
            return true;
        }
        Problem problem = Problem.of(
                "%s is %s but must be between -1 and 1".formatted(pair.measure(), Findings.number(pair.value())));
        findings.add(
                path + "." + pair.measure(),
                Math.abs(pair.value()) == 1
                        ? problem.because("Then one input would follow from the other.")
                                .tryThis("Write the one as a step in the other.")
                        : problem.because("That is how strongly two inputs can go together, or against each other."));
        return false;
    }

    private Optional<Dependence> tied(Mixing mixing, List<Pair> pairs) {
        List<Integer> tied = pairs.stream()
                .flatMap(pair -> List.of(pair.first(), pair.second()).stream())
                .distinct()
                .sorted()
                .toList();
        List<Tie> ties = new ArrayList<>();
        var correlations = Correlations.none(tied.size());
        for (Pair pair : pairs) {
            double latent = pair.measure().latent(pair.target());
            ties.add(new Tie(pair.first(), pair.second(), pair.measure(), pair.target(), latent));
            correlations = correlations.with(tied.indexOf(pair.first()), tied.indexOf(pair.second()), latent);
        }
        if (!correlations.arePossible()) {
            findings.add(
                    PATH + ".pairs",
                    "these correlations cannot hold together",
                    "Inputs that go with the same input cannot go against each other.",
                    "Change some of them.");
            return Optional.empty();
        }
        return Optional.of(new Dependence(new Copula(mixing, correlations), tied, ties));
    }
}
