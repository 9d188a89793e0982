package dev.leadline.model;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Density;
import dev.leadline.density.Family;
import dev.leadline.density.Support;
import dev.leadline.model.Draft.DensityDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Input.Role;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/// Makes inputs of their drafts.
final class Inputs {

    private static final String UNIFORM = "uniform";

    /// Families by other names that are in use.
    private static final Map<String, String> ALSO_CALLED = Map.ofEntries(
            Map.entry("gaussian", "normal"),
            Map.entry("gauss", "normal"),
            Map.entry("rectangular", UNIFORM),
            Map.entry("triangle", "triangular"),
            Map.entry("log-normal", "lognormal"),
            Map.entry("galton", "lognormal"),
            Map.entry("t", "student"),
            Map.entry("student-t", "student"),
            Map.entry("extreme-value", "gumbel"),
            Map.entry("gev1", "gumbel"));

    private final Findings findings;

    private Inputs(Findings findings) {
        this.findings = findings;
    }

    /// Those that have no problem.
    static List<Input> of(List<InputDraft> drafts, Findings findings) {
        if (drafts.isEmpty()) {
            findings.add(
                    "$.inputs",
                    "there is no input",
                    "A question draws the values of its inputs at random.",
                    "Add a row with a name and a density.");
        }
        var inputs = new Inputs(findings);
        List<Input> made = new ArrayList<>();
        for (int i = 0; i < drafts.size(); i++) {
            inputs.input(drafts.get(i), "$.inputs[" + i + "]").ifPresent(made::add);
        }
        return made;
    }

    private Optional<Input> input(InputDraft draft, String path) {
        return switch (draft.from()) {
            case From.Density(var density) ->
                density(density, path + ".density")
                        .map(drawn -> input(draft, density.family(), drawn, new Role.Random()));
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
        var uniform = density(UNIFORM, Map.of("from", low, "to", high), path + ".range");
        return uniform.map(drawn -> input(draft, UNIFORM, drawn, new Role.Range(low, high)));
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
        String family = drawFrom.get().family();
        var drawn = density(drawFrom.get(), path + ".drawFrom");
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
        return drawn.map(density -> input(draft, family, density, new Role.UnboundedRange(low, high)));
    }

    private Optional<Density> density(DensityDraft draft, String path) {
        return density(draft.family(), draft.parameters(), path);
    }

    private Optional<Density> density(String name, Map<String, Double> parameters, String path) {
        var family = Catalogue.family(name);
        if (family.isEmpty()) {
            findings.add(path + ".family", noFamily(name));
            return Optional.empty();
        }
        return findings.made(
                parameter -> parameter.isEmpty() ? path : path + "." + parameter,
                () -> family.get().of(parameters));
    }

    private static Problem noFamily(String name) {
        List<String> names = Catalogue.families().stream().map(Family::name).toList();
        Problem problem = Problem.of(
                        name.isEmpty() ? "no family is chosen" : "the family \"%s\" is not available".formatted(name))
                .because("Families are %s.".formatted(String.join(", ", names)));
        return Optional.ofNullable(ALSO_CALLED.get(name.toLowerCase(Locale.ROOT)))
                .or(() -> Nearest.to(name, names))
                .map(near -> problem.tryThis("Was \"%s\" meant?".formatted(near)))
                .orElse(
                        name.isEmpty()
                                ? problem
                                : problem.tryThis("Choose one of these; leadline families says what for."));
    }

    private static Input input(InputDraft draft, String family, Density drawn, Role role) {
        return new Input(
                Workings.composed(draft.name()), draft.unit(), draft.label(), draft.provenance(), family, drawn, role);
    }

    private static String number(double end) {
        return Double.isInfinite(end) ? (end < 0 ? "-inf" : "inf") : Findings.number(end);
    }
}
