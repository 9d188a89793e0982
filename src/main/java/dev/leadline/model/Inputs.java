package dev.leadline.model;

import dev.leadline.density.Density;
import dev.leadline.density.Support;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Input.Role;
import dev.leadline.numeric.Shortest;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/// Makes inputs of their drafts.
final class Inputs {

    private static final String UNIFORM = "uniform";

    private final Findings findings;
    private final Densities densities;

    private Inputs(Densities densities, Findings findings) {
        this.densities = densities;
        this.findings = findings;
    }

    /// Those that have no problem.
    static List<Input> of(Draft draft, DataFiles files, Findings findings) {
        List<InputDraft> drafts = draft.inputs();
        if (drafts.isEmpty()) {
            findings.add(
                    "$.inputs",
                    "there is no input",
                    "A question draws the values of its inputs at random.",
                    "Add a row with a name and a density.");
        }
        var inputs = new Inputs(new Densities(files, Workings.constants(draft), findings), findings);
        List<Input> made = new ArrayList<>();
        for (int i = 0; i < drafts.size(); i++) {
            inputs.input(drafts.get(i), "$.inputs[" + i + "]").ifPresent(made::add);
        }
        return made;
    }

    static Optional<Input> of(Draft draft, int index, DataFiles files, Findings findings) {
        return new Inputs(new Densities(files, Workings.constants(draft), findings), findings)
                .input(draft.inputs().get(index), "$.inputs[" + index + "]");
    }

    private Optional<Input> input(InputDraft draft, String path) {
        return switch (draft.from()) {
            case From.Density(var density) ->
                densities
                        .of(density, Workings.composed(draft.name()), path + ".density")
                        .map(drawn -> input(draft, drawn, new Role.Random()));
            case From.Range(double low, double high, var drawFrom) -> range(draft, low, high, drawFrom, path);
        };
    }

    private Optional<Input> range(
            InputDraft draft, double low, double high, Optional<DensityDraft> drawFrom, String path) {
        if (!(low < high)) {
            findings.add(
                    path + ".range",
                    "range goes from %s to %s but must go upwards".formatted(number(low), number(high)),
                    "An integral sums over the points between the two ends.");
            return Optional.empty();
        }
        if (Double.isInfinite(low) || Double.isInfinite(high)) {
            return unbounded(draft, low, high, drawFrom, path);
        }
        if (drawFrom.isPresent()) {
            findings.add(
                    path + ".drawFrom",
                    "drawFrom on a bounded range is not available",
                    "Bounded ranges are drawn uniformly.",
                    "Leave it out.");
            return Optional.empty();
        }
        if (Double.isInfinite(high - low)) {
            findings.add(
                    path + ".range",
                    "range is longer than any number",
                    "A draw counts the length of the range, which must be finite.");
            return Optional.empty();
        }
        var ends = new LinkedHashMap<>(Map.of("from", low, "to", high));
        return densities
                .of(DensityDraft.of(UNIFORM, ends), "", path + ".range")
                .map(drawn -> input(draft, drawn, new Role.Range(low, high)));
    }

    private Optional<Input> unbounded(
            InputDraft draft, double low, double high, Optional<DensityDraft> drawFrom, String path) {
        if (drawFrom.isEmpty()) {
            findings.add(
                    path + ".drawFrom",
                    "an unbounded range has nothing to draw from",
                    "Points are drawn from a density that covers the range, and weighed by its inverse.",
                    "Add \"drawFrom\", for the whole line say {\"family\": \"student\", \"dof\": 4, \"location\": 0, \"scale\": 1}.");
            return Optional.empty();
        }
        var drawn = densities.of(drawFrom.get(), Workings.composed(draft.name()), path + ".drawFrom");
        if (drawn.isPresent()) {
            Support support = drawn.get().support();
            if (!(support.low() <= low && support.high() >= high)) {
                findings.add(
                        path + ".drawFrom",
                        "drawFrom covers %s to %s, not the range %s to %s"
                                .formatted(number(support.low()), number(support.high()), number(low), number(high)),
                        "What is never drawn would be missing from the integral.",
                        "Choose a density that is positive on the whole range.");
                return Optional.empty();
            }
        }
        return drawn.map(density -> input(draft, density, new Role.UnboundedRange(low, high)));
    }

    private static Input input(InputDraft draft, Density drawn, Role role) {
        return new Input(Workings.composed(draft.name()), draft.unit(), draft.label(), draft.provenance(), drawn, role);
    }

    private static String number(double end) {
        return Double.isInfinite(end) ? (end < 0 ? "-inf" : "inf") : Shortest.text(end);
    }
}
