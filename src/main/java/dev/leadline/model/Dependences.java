package dev.leadline.model;

import dev.leadline.density.Copula;
import dev.leadline.density.Correlations;
import dev.leadline.density.Density;
import dev.leadline.density.Measure;
import dev.leadline.density.Mixing;
import dev.leadline.model.Dependence.Repair;
import dev.leadline.model.Dependence.Tie;
import dev.leadline.model.Draft.DependenceDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Draft.PairDraft;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/// Makes the dependence of inputs of its draft.
final class Dependences {
    private static final String PATH = "$.dependence";

    /// Changed correlations that are named.
    private static final int MOST_NAMED = 3;

    /// Decimal places of a correlation.
    private static final int PLACES = 4;

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
        return complete && !pairs.isEmpty()
                ? mixing.flatMap(kind -> tied(kind, draft.repair(), pairs, inputs))
                : Optional.empty();
    }

    private Optional<Mixing> mixing(DependenceDraft draft) {
        return switch (draft.copula()) {
            case Mixing.GAUSSIAN -> {
                if (draft.dof().isPresent()) {
                    findings.add(
                            PATH + ".dof",
                            "the Gaussian copula has no dof",
                            "Degrees of freedom belong to the Student copula: the fewer, the more extremes come together.",
                            "Leave it out, or write \"copula\": \"student\".");
                }
                yield Optional.of(Mixing.NONE);
            }
            case Mixing.STUDENT -> student(draft.dof());
            default -> {
                Problem problem = Problem.of("the copula \"%s\" is not available".formatted(draft.copula()))
                        .because("Copulas are gaussian, and student with degrees of freedom.");
                findings.add(
                        PATH + ".copula",
                        Nearest.to(draft.copula(), Set.of(Mixing.GAUSSIAN, Mixing.STUDENT))
                                .map(near -> problem.tryThis("Was \"%s\" meant?".formatted(near)))
                                .orElse(problem.tryThis("Write \"copula\": \"gaussian\".")));
                yield Optional.empty();
            }
        };
    }

    private Optional<Mixing> student(OptionalDouble dof) {
        if (dof.isEmpty()) {
            findings.add(
                    PATH + ".dof",
                    "the Student copula has no dof",
                    "Degrees of freedom say how extremes come together: with 3 often, with 30 hardly.",
                    "Add \"dof\": 4.");
            return Optional.empty();
        }
        return findings.made(within -> PATH + "." + within, () -> Mixing.student(dof.getAsDouble()));
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
        if (pair.value() > -1 && pair.value() < 1) {
            return true;
        }
        Problem problem = Problem.of("%s is %s but must be between -1 and 1, both excluded"
                .formatted(pair.measure(), Shortest.text(pair.value())));
        findings.add(
                path + "." + pair.measure(),
                Math.abs(pair.value()) == 1
                        ? problem.because("Then one input would follow from the other.")
                                .tryThis("Write the one as a step in the other.")
                        : problem.because("That is how strongly two inputs can go together, or against each other."));
        return false;
    }

    private Optional<Dependence> tied(Mixing mixing, boolean repair, List<Pair> pairs, List<Input> inputs) {
        List<Integer> tied = pairs.stream()
                .flatMap(pair -> Stream.of(pair.first(), pair.second()))
                .distinct()
                .sorted()
                .toList();
        var stated = Correlations.none(tied.size());
        boolean attained = true;
        for (Pair pair : pairs) {
            double latent = latent(mixing, pair, inputs);
            attained &= !Double.isNaN(latent);
            stated = stated.with(tied.indexOf(pair.first()), tied.indexOf(pair.second()), latent);
        }
        if (!attained) {
            return Optional.empty();
        }
        boolean possible = stated.arePossible();
        var drawn = possible ? stated : stated.nearest();
        List<Tie> ties = pairs.stream()
                .map(pair -> new Tie(
                        pair.first(),
                        pair.second(),
                        pair.measure(),
                        pair.target(),
                        drawn.at(tied.indexOf(pair.first()), tied.indexOf(pair.second()))))
                .toList();
        List<Repair> repairs = possible ? List.of() : repairs(mixing, tied, drawn, ties, inputs);
        if (!possible && !repair) {
            findings.add(
                    PATH + ".pairs",
                    "these correlations cannot hold together",
                    "Inputs that go with the same input go with each other. The nearest that can hold change %s."
                            .formatted(changes(repairs, names)),
                    "Change them, or write \"repair\": true to draw with the nearest.");
            return Optional.empty();
        }
        return Optional.of(new Dependence(new Copula(mixing, drawn), tied, ties, repairs));
    }

    /// `NaN` where there is none, noted.
    private double latent(Mixing mixing, Pair pair, List<Input> inputs) {
        Density one = inputs.get(pair.first()).drawn();
        Density other = inputs.get(pair.second()).drawn();
        if (pair.measure() == Measure.PEARSON) {
            for (int input : List.of(pair.first(), pair.second())) {
                if (!Double.isFinite(inputs.get(input).drawn().variance())) {
                    findings.add(
                            pair.path(),
                            "%s has no finite variance, and so no pearson correlation".formatted(names.get(input)),
                            "It is the covariance over both standard deviations.",
                            "Give spearman or kendall, which compare ranks.");
                    return Double.NaN;
                }
            }
        }
        double latent = pair.measure().latent(mixing, one, other, pair.target());
        if (Double.isNaN(latent)) {
            double least = pair.measure().value(mixing, one, other, -1);
            double most = pair.measure().value(mixing, one, other, 1);
            findings.add(
                    pair.path(),
                    "%s is %s but must be between %s and %s"
                            .formatted(
                                    pair.measure().word(),
                                    Shortest.text(pair.target()),
                                    rounded(least, RoundingMode.CEILING),
                                    rounded(most, RoundingMode.FLOOR)),
                    "With densities of such shapes the values cannot be correlated more strongly.",
                    "Choose a value between, or give spearman, which has no such limits.");
        }
        return latent;
    }

    private List<Repair> repairs(
            Mixing mixing, List<Integer> tied, Correlations drawn, List<Tie> ties, List<Input> inputs) {
        Map<Set<Integer>, Tie> stated = new HashMap<>();
        ties.forEach(tie -> stated.put(Set.of(tie.one(), tie.other()), tie));
        List<Repair> repairs = new ArrayList<>();
        for (int i = 0; i < tied.size(); i++) {
            for (int j = i + 1; j < tied.size(); j++) {
                int one = tied.get(i);
                int other = tied.get(j);
                Optional<Tie> tie = Optional.ofNullable(stated.get(Set.of(one, other)));
                Measure measure = tie.map(Tie::measure).orElse(Measure.SPEARMAN);
                double from = tie.map(Tie::target).orElse(0.0);
                double to = measure.value(
                        mixing, inputs.get(one).drawn(), inputs.get(other).drawn(), drawn.at(i, j));
                repairs.add(new Repair(one, other, measure, from, to));
            }
        }
        repairs.sort(Comparator.comparingDouble(repair -> -Math.abs(repair.to() - repair.from())));
        return repairs;
    }

    /// As `spearman of a and b from 0.9 to 0.7612, …`; the largest few.
    private static String changes(List<Repair> repairs, List<String> names) {
        String largest = repairs.stream()
                .limit(MOST_NAMED)
                .map(repair -> "%s of %s and %s from %s to %s"
                        .formatted(
                                repair.measure().word(),
                                names.get(repair.one()),
                                names.get(repair.other()),
                                Shortest.text(repair.from()),
                                rounded(repair.to(), RoundingMode.HALF_EVEN)))
                .collect(Collectors.joining(", "));
        return repairs.size() <= MOST_NAMED ? largest : largest + ", others less";
    }

    private static String rounded(double correlation, RoundingMode mode) {
        return Double.isNaN(correlation)
                ? "not a number"
                : Shortest.text(
                        new BigDecimal(correlation).setScale(PLACES, mode).doubleValue());
    }

    /// What is no fault but may surprise.
    static List<Problem> notes(Dependence dependence, List<Input> inputs) {
        List<Problem> notes = new ArrayList<>();
        if (!dependence.repairs().isEmpty()) {
            notes.add(Problem.of("the nearest correlations that can hold together take the place of those stated")
                    .because("They change %s."
                            .formatted(changes(
                                    dependence.repairs(),
                                    inputs.stream().map(Input::name).toList())))
                    .at(Place.of(PATH + ".repair")));
        }
        for (int i = 0; i < dependence.ties().size(); i++) {
            Tie tie = dependence.ties().get(i);
            List<String> wild = Dependence.wild(tie, inputs);
            if (!wild.isEmpty() && tie.measure() == Measure.PEARSON) {
                notes.add(Problem.of("pearson is hardly seen in draws of %s".formatted(String.join(" and ", wild)))
                        .because("Rare, large values decide it; what is achieved in some draws scatters too much for an"
                                + " interval.")
                        .tryThis("Give spearman, which every draw speaks of.")
                        .at(Place.of("%s.pairs[%d].%s"
                                .formatted(PATH, i, tie.measure().word()))));
            }
            List<String> discrete = IntStream.of(tie.one(), tie.other())
                    .mapToObj(inputs::get)
                    .filter(input -> input.drawn().isDiscrete())
                    .map(Input::name)
                    .toList();
            if (!discrete.isEmpty() && tie.measure() != Measure.PEARSON) {
                String path = "%s.pairs[%d].%s".formatted(PATH, i, tie.measure().word());
                notes.add(Problem.of("%s speaks of the copula behind %s"
                                .formatted(tie.measure().word(), String.join(" and ", discrete)))
                        .because("Equal values share a rank, so that the values themselves are correlated otherwise.")
                        .tryThis("Look at what is achieved, or give pearson, which speaks of the values.")
                        .at(Place.of(path)));
            }
        }
        return notes;
    }
}
