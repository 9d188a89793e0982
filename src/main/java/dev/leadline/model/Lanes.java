package dev.leadline.model;

import dev.leadline.formula.Working;
import dev.leadline.scheme.Adapted;
import dev.leadline.scheme.Control;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Scheme;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Pattern;

/// Makes lanes of their drafts.
final class Lanes {
    private static final Pattern LANE = Pattern.compile("[\\p{L}\\p{Nd}_][\\p{L}\\p{Nd}_.-]{0,19}");

    private final Draft draft;
    private final boolean sound;
    private final List<String> names;
    private final Proposals proposals;
    private final Controls controls;
    private final Findings findings;

    private Lanes(Draft draft, boolean sound, Proposals proposals, Controls controls, Findings findings) {
        this.draft = draft;
        this.sound = sound;
        this.names = draft.inputs().stream()
                .map(input -> Workings.composed(input.name()))
                .toList();
        this.proposals = proposals;
        this.controls = controls;
        this.findings = findings;
    }

    /// Those that have no problem.
    ///
    /// @param sound whether all inputs and formulas are: only then can lanes speak of them
    static List<Lane> of(
            Draft draft,
            List<Input> inputs,
            boolean sound,
            Optional<Dependence> dependence,
            DataFiles files,
            Findings findings) {
        if (draft.lanes().isEmpty()) {
            return List.of(Lane.of("A", Scheme.of(new Independent())));
        }
        var densities = new Densities(files, Workings.constants(draft), findings);
        return new Lanes(
                        draft,
                        sound,
                        new Proposals(inputs, dependence, densities, findings),
                        new Controls(draft, inputs, findings),
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
        if (!sound) {
            return Optional.empty();
        }
        var drawFrom = proposals.of(lane, path);
        Optional<Adapted> adapted = proposals.adaptation(lane, path).map(Adapted.class::cast);
        List<Control> controlled = controls.of(lane, path);
        Optional<Working> working = controlled.isEmpty() ? Optional.empty() : controls.working(lane, path);
        if (lane.selfNormalised() && !controlled.isEmpty()) {
            findings.add(
                    path + ".controlVariates",
                    "control variates beside selfNormalised are not available",
                    "Weights divided by their mean have no means that are known.",
                    "Leave one of them out.");
        }
        return points.map(p -> new Lane(
                lane.name(), new Scheme(p, drawFrom, controlled, adapted), draft.commonRandomNumbers(), working));
    }
}
