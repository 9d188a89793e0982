package dev.leadline.model;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/// A project as it was written, before anything was checked: what a file holds and what the window edits.
///
/// Every part stands where the project file has it, so that a problem found later can name its place there. Empty
/// optionals are fields that were not written; [Project#of] knows the defaults.
public record Draft(
        String title,
        String notes,
        boolean safety,
        List<ConstantDraft> constants,
        List<InputDraft> inputs,
        Optional<DependenceDraft> dependence,
        List<String> steps,
        List<AskDraft> asks,
        Optional<ReferenceDraft> reference,
        OptionalDouble confidence,
        Optional<ToleranceDraft> tolerance,
        Optional<StopDraft> stop,
        OptionalLong seed,
        boolean commonRandomNumbers,
        List<LaneDraft> lanes) {

    /// Most constants, inputs or steps of a project.
    public static final int MOST_ROWS = 1000;

    private static final Pattern STEP = Pattern.compile("\\$\\.steps\\[(\\d{1,9})]");
    private static final Pattern DENSITY =
            Pattern.compile("\\$\\.inputs\\[(\\d{1,9})]\\.(?:density|drawFrom)((?:\\.mixture\\[\\d{1,9}])*)\\.formula");
    private static final Pattern PART = Pattern.compile("\\[(\\d+)]");
    private static final Pattern ASK = Pattern.compile("\\$\\.ask(?:\\[(\\d{1,9})])?\\.\\w+");

    public Draft {
        constants = List.copyOf(constants);
        inputs = List.copyOf(inputs);
        steps = List.copyOf(steps);
        asks = List.copyOf(asks);
        lanes = List.copyOf(lanes);
    }

    public record ConstantDraft(String name, double value, String unit, String label, String source) {}

    /// @param from how its values come about
    public record InputDraft(String name, String unit, String label, String provenance, From from) {}

    public sealed interface From {
        /// A random variable with a density.
        record Density(DensityDraft density) implements From {}

        /// An integration variable; over an infinite range with a density to draw from.
        record Range(double low, double high, Optional<DensityDraft> drawFrom) implements From {}
    }

    /// @param copula `gaussian` or `student`
    /// @param dof degrees of freedom of the Student copula
    /// @param repair whether the nearest correlation matrix may take the place of one that is none
    public record DependenceDraft(String copula, OptionalDouble dof, boolean repair, List<PairDraft> pairs) {
        public DependenceDraft {
            pairs = List.copyOf(pairs);
        }
    }

    /// @param one name of an input
    /// @param other name of another
    /// @param measure `spearman`, `kendall` or `pearson`
    public record PairDraft(String one, String other, String measure, double value) {}

    /// @param estimand word of the file, as `probability`
    public record AskDraft(String estimand, String formula, String unit, String label) {}

    public record ReferenceDraft(double value, OptionalDouble error, String source) {}

    /// @param when `either` or `both` where absolute and relative are both given; empty means either
    public record ToleranceDraft(OptionalDouble absolute, OptionalDouble relative, Optional<String> when) {}

    public record StopDraft(String rule, OptionalLong draws, OptionalDouble seconds) {}

    /// The same with other lanes.
    Draft with(List<LaneDraft> others) {
        return new Draft(
                title,
                notes,
                safety,
                constants,
                inputs,
                dependence,
                steps,
                asks,
                reference,
                confidence,
                tolerance,
                stop,
                seed,
                commonRandomNumbers,
                others);
    }

    /// Names of the data files that inputs are drawn from, each once.
    public List<String> dataFiles() {
        var ofInputs = inputs.stream().flatMap(input -> switch (input.from()) {
            case From.Density(var density) -> density.dataFiles();
            case From.Range(var _, var _, var drawFrom) -> drawFrom.stream().flatMap(DensityDraft::dataFiles);
        });
        return Stream.concat(ofInputs, lanes.stream().flatMap(LaneDraft::dataFiles))
                .distinct()
                .toList();
    }

    /// The JSON path of the formula asked at `index`: one ask stands by itself in a file, several in a list.
    public String askPath(int index) {
        String place = asks.size() == 1 ? "$.ask" : "$.ask[" + index + "]";
        return place + "." + asks.get(index).estimand();
    }

    /// The text of the formula that stands at a JSON path, so that a place in it can be shown.
    public Optional<String> formulaAt(String path) {
        Matcher step = STEP.matcher(path);
        if (step.matches()) {
            int index = Integer.parseInt(step.group(1));
            return index < steps.size() ? Optional.of(steps.get(index)) : Optional.empty();
        }
        Matcher ask = ASK.matcher(path);
        if (ask.matches()) {
            int index = ask.group(1) == null ? 0 : Integer.parseInt(ask.group(1));
            return index < asks.size() ? Optional.of(asks.get(index).formula()) : Optional.empty();
        }
        return densityFormulaAt(path);
    }

    /// The formula of a typed density.
    private Optional<String> densityFormulaAt(String path) {
        Matcher input = DENSITY.matcher(path);
        if (!input.matches() || Integer.parseInt(input.group(1)) >= inputs.size()) {
            return Optional.empty();
        }
        Optional<DensityDraft> density =
                switch (inputs.get(Integer.parseInt(input.group(1))).from()) {
                    case From.Density(var own) -> Optional.of(own);
                    case From.Range(var _, var _, var drawFrom) -> drawFrom;
                };
        Matcher part = PART.matcher(input.group(2));
        while (density.isPresent() && part.find()) {
            int index = Integer.parseInt(part.group(1));
            density = density.get().of() instanceof DensityDraft.Mixture(var parts) && index < parts.size()
                    ? Optional.of(parts.get(index).density())
                    : Optional.empty();
        }
        return density.flatMap(
                d -> d.of() instanceof DensityDraft.Typed typed ? Optional.of(typed.formula()) : Optional.empty());
    }
}
