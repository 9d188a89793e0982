package dev.leadline.model;

import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Regression;
import dev.leadline.formula.Working;
import dev.leadline.scheme.Adapted;
import dev.leadline.scheme.Control;
import dev.leadline.scheme.Growing;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.LatinHypercube;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.Replicated;
import dev.leadline.scheme.Scheme;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.regex.Pattern;

/// Makes lanes of their drafts.
final class Lanes {
    private static final Pattern LANE = Pattern.compile("[\\p{L}\\p{Nd}_][\\p{L}\\p{Nd}_.-]{0,19}");

    private static final Set<String> MEANS = Set.of("mean", "integral", "probability");

    private final Draft draft;
    private final Optional<Working> working;
    private final List<String> names;
    private final Proposals proposals;
    private final Controls controls;
    private final Findings findings;

    private Lanes(Draft draft, Optional<Working> working, Proposals proposals, Controls controls, Findings findings) {
        this.draft = draft;
        this.working = working;
        this.names = draft.inputs().stream()
                .map(input -> Workings.composed(input.name()))
                .toList();
        this.proposals = proposals;
        this.controls = controls;
        this.findings = findings;
    }

    /// Those that have no problem.
    ///
    /// @param working the formulas, where these and all inputs are sound: only then can lanes speak of them
    static List<Lane> of(
            Draft draft,
            List<Input> inputs,
            Optional<Working> working,
            Optional<Dependence> dependence,
            DataFiles files,
            Findings findings) {
        if (draft.lanes().isEmpty()) {
            return List.of(Lane.of("A", Scheme.of(new Independent())));
        }
        var densities = new Densities(files, Workings.constants(draft), findings);
        return new Lanes(
                        draft,
                        working,
                        new Proposals(inputs, dependence, densities, findings),
                        new Controls(draft, inputs, dependence, findings),
                        findings)
                .all();
    }

    private List<Lane> all() {
        List<LaneDraft> drafts = draft.lanes();
        if (drafts.size() > Lane.MOST) {
            findings.add(
                    "$.lanes",
                    "there are %d lanes".formatted(drafts.size()),
                    "At most %d are read together.".formatted(Lane.MOST));
        }
        Set<String> names = new HashSet<>();
        List<Lane> lanes = new ArrayList<>();
        for (int i = 0; i < drafts.size(); i++) {
            String path = "$.lanes[" + i + "]";
            checkName(drafts.get(i).name(), path, names);
            lane(drafts.get(i), path).ifPresent(lanes::add);
        }
        return lanes;
    }

    /// Splitting climbs to one event, from the inputs' own densities.
    private void checkSplitting(LaneDraft lane, String path) {
        if (!lane.drawFrom().equals(LaneDraft.DrawFrom.NOTHING)) {
            findings.add(
                    path + ".drawFrom",
                    "splitting draws from no other densities",
                    "Its particles move from the inputs' own densities towards the event.",
                    "Leave drawFrom out, or take independent points.");
        }
        if (!lane.controls().isEmpty()) {
            findings.add(
                    path + ".controlVariates",
                    "splitting takes no control variates",
                    "Its observations are numbers of replacements, whose means nobody knows.",
                    "Leave them out.");
        }
        boolean isOneEvent = draft.asks().size() == 1
                && draft.asks().getFirst().estimand().equals(new Estimand.Probability().word());
        if (!isOneEvent) {
            findings.add(
                    path + ".points",
                    "splitting answers one probability",
                    "Its particles climb towards one event.",
                    "Ask for one probability, or take other points.");
        } else {
            findings.made(_ -> path + ".points", () -> working.orElseThrow().score(0));
        }
    }

    private void checkName(String name, String path, Set<String> names) {
        if (!LANE.matcher(name).matches()) {
            findings.add(
                    path + ".name",
                    "the lane cannot be called \"%s\"".formatted(name),
                    "A lane's name has 1 to 20 letters, digits, _ . or -, as A.");
        } else if (!names.add(name)) {
            findings.add(
                    path + ".name",
                    "two lanes are called %s".formatted(name),
                    "A lane is known by its name, and draws its own random numbers by it.",
                    "Give one of them another name, as B.");
        }
    }

    private Optional<Lane> lane(LaneDraft lane, String path) {
        var points = Layouts.of(lane, names, path, findings);
        if (working.isEmpty()) {
            return Optional.empty();
        }
        var drawFrom = proposals.of(lane, path);
        Optional<Adapted> adapted = proposals.adaptation(lane, path).map(Adapted.class::cast);
        Optional<Working> formulas = lane.controls().isEmpty() ? Optional.empty() : controls.working(lane, path);
        List<Control> controlled =
                formulas.map(all -> controls.of(lane, all, path)).orElse(List.of());
        checkMeans(lane, path);
        if (lane.crossFitted() && lane.controls().isEmpty()) {
            findings.add(
                    path + ".crossFitted",
                    "crossFitted has no control variates to fit",
                    "It says where the coefficients of control variates come from.",
                    "Leave it out, or add \"controlVariates\".");
        }
        if (lane.selfNormalised() && !controlled.isEmpty()) {
            findings.add(
                    path + ".controlVariates",
                    "control variates beside selfNormalised are not available",
                    "Weights divided by their mean have no means that are known.",
                    "Leave one of them out.");
        }
        if (points.filter(Repetitions.class::isInstance).isPresent()) {
            checkSplitting(lane, path);
        }
        points.ifPresent(p -> checkReplicates(p, controlled.size(), path));
        return points.map(p -> new Lane(
                lane.name(),
                new Scheme(p, drawFrom, controlled, lane.crossFitted(), adapted),
                draft.commonRandomNumbers(),
                formulas,
                audit(lane, p, path)));
    }

    /// An audit looks for what other densities, or particles, miss; plain draws are audited by nothing better.
    private OptionalLong audit(LaneDraft lane, Points points, String path) {
        if (lane.audit().isEmpty()) {
            return lane.audit();
        }
        long draws = lane.audit().getAsLong();
        if (lane.drawFrom().equals(LaneDraft.DrawFrom.NOTHING) && !(points instanceof Repetitions)) {
            findings.add(
                    path + ".audit",
                    "audit has nothing to check: the lane draws from the inputs' own densities",
                    "It compares an answer by other densities with independent draws from the inputs' own.",
                    "Leave it out, or add \"drawFrom\".");
        } else if (draws < Lane.FEWEST_AUDITED || draws > Stop.MOST_DRAWS) {
            findings.add(
                    path + ".audit",
                    "audit is %d but must be from %d to %d".formatted(draws, Lane.FEWEST_AUDITED, Stop.MOST_DRAWS),
                    "It is the number of draws from the inputs' own densities that the lane is compared with.");
        }
        return lane.audit();
    }

    /// Control variates correct means; what is found before a run makes the variance of a mean small.
    private void checkMeans(LaneDraft lane, String path) {
        for (int k = 0; k < draft.asks().size(); k++) {
            var ask = draft.asks().get(k);
            boolean isMean = MEANS.contains(ask.estimand());
            if (!isMean && !lane.controls().isEmpty()) {
                findings.add(
                        path + ".controlVariates",
                        "control variates for a %s are not available".formatted(ask.words()),
                        "They correct a mean by others that are known.",
                        "Leave them out, or ask for a mean, an integral or a probability alone.");
                return;
            }
            if (!isMean && k == 0 && isAdapted(lane)) {
                findings.add(
                        path + ".drawFrom",
                        "a density that is found for a %s is not available".formatted(ask.words()),
                        "What is found makes the first answer certain with few draws, where that is a mean, an"
                                + " integral or a probability.",
                        "Name a density to draw from, or ask for the probability of what lies beyond.");
            }
        }
    }

    private static boolean isAdapted(LaneDraft lane) {
        return switch (lane.drawFrom()) {
            case LaneDraft.DrawFrom.Adapted _ -> true;
            case LaneDraft.DrawFrom.Inputs(var others) ->
                others.values().stream().anyMatch(LaneDraft.Other.Adapt.class::isInstance);
        };
    }

    private void checkReplicates(Points points, int controls, String path) {
        int replicates = switch (points) {
            case Replicated replicated -> replicated.replicates();
            case LatinHypercube cubes when cubes.points().isEmpty() -> cubes.replicates();
            case Growing _, Repetitions _ -> Integer.MAX_VALUE;
        };
        if (controls > 0 && replicates < Regression.fewest(controls)) {
            findings.add(
                    path + ".controlVariates",
                    "%d control variates are too many for %d replicates".formatted(controls, replicates),
                    "Their coefficients are fitted to the means of the replicates, which takes %d."
                            .formatted(Regression.fewest(controls)),
                    "Write \"replicates\": %d, or leave some out.".formatted(Regression.fewest(controls)));
        }
    }
}
