package dev.leadline.model;

import dev.leadline.interval.Bounds;
import java.util.ArrayList;
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
        Optional<IntervalDraft> interval,
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
    private static final Pattern ASK = Pattern.compile("\\$\\.ask(?:\\[(\\d{1,9})])?\\.\\w+(?:\\[(\\d)])?");

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
    /// @param formulas one, two of a ratio
    /// @param at probability that a quantile or a tail mean belongs to
    /// @param coverage of a distribution: part of the outcomes that its coverage intervals hold
    public record AskDraft(
            String estimand,
            List<String> formulas,
            OptionalDouble at,
            OptionalDouble coverage,
            String unit,
            String label) {
        /// Words of the file for what can be asked.
        public static final List<String> ESTIMANDS = List.of(
                "mean",
                "integral",
                "probability",
                "quantile",
                "tailMean",
                "ratio",
                "standardDeviation",
                "distribution");

        public AskDraft {
            formulas = List.copyOf(formulas);
        }

        /// Of one formula and nothing else.
        public AskDraft(String estimand, String formula, String unit, String label) {
            this(estimand, List.of(formula), OptionalDouble.empty(), OptionalDouble.empty(), unit, label);
        }

        /// The first formula.
        public String formula() {
            return formulas.getFirst();
        }

        /// What is asked as people say it, as `tail mean`.
        public String words() {
            return words(estimand);
        }

        public static String words(String estimand) {
            return switch (estimand) {
                case "tailMean" -> "tail mean";
                case "standardDeviation" -> "standard deviation";
                default -> estimand;
            };
        }

        /// Another kind of answer of the same formula; what the kind needs takes a usual value.
        public AskDraft asking(String other) {
            List<String> needed = other.equals("ratio") ? List.of(formula(), "") : List.of(formula());
            boolean takesAt = other.equals("quantile") || other.equals("tailMean");
            return new AskDraft(
                    other,
                    other.equals(estimand) ? formulas : needed,
                    takesAt ? OptionalDouble.of(at.orElse(.95)) : OptionalDouble.empty(),
                    other.equals("distribution") ? coverage : OptionalDouble.empty(),
                    unit,
                    label);
        }

        public AskDraft withAt(OptionalDouble other) {
            return new AskDraft(estimand, formulas, other, coverage, unit, label);
        }

        public AskDraft withCoverage(OptionalDouble other) {
            return new AskDraft(estimand, formulas, at, other, unit, label);
        }

        public AskDraft withFormula(int index, String text) {
            var others = new ArrayList<>(formulas);
            others.set(index, text);
            return new AskDraft(estimand, others, at, coverage, unit, label);
        }

        public AskDraft withUnit(String other) {
            return new AskDraft(estimand, formulas, at, coverage, other, label);
        }

        public AskDraft withLabel(String other) {
            return new AskDraft(estimand, formulas, at, coverage, unit, other);
        }
    }

    /// What the first answer is compared with.
    public sealed interface ReferenceDraft {
        record Value(double value, OptionalDouble error, String source) implements ReferenceDraft {}

        /// A closed form over constants.
        record Formula(String formula) implements ReferenceDraft {}

        record Quadrature() implements ReferenceDraft {}
    }

    /// @param when `either` or `both` where absolute and relative are both given; empty means either
    public record ToleranceDraft(OptionalDouble absolute, OptionalDouble relative, Optional<String> when) {}

    /// Which interval is wanted.
    ///
    /// @param kind its word, as `student`; empty where none is named
    /// @param bounds least and greatest outcome there can be
    public record IntervalDraft(Optional<String> kind, Optional<Bounds> bounds) {}

    /// When to stop.
    ///
    /// @param rule its word, as `any-time`; empty where none is named
    /// @param hits to stop at, of the hits rule
    /// @param first observations of the first stage, of the rules that have one
    /// @param inflation of the standard deviation that the first stage of `two-stage` finds
    /// @param digits of the standard uncertainty that count, of `jcgm-101`
    public record StopDraft(
            String rule,
            OptionalLong draws,
            OptionalDouble seconds,
            OptionalLong hits,
            Optional<GuardDraft> guard,
            OptionalLong first,
            OptionalDouble inflation,
            OptionalLong digits) {
        /// With a budget and nothing else.
        public StopDraft(String rule, OptionalLong draws, OptionalDouble seconds) {
            this(
                    rule,
                    draws,
                    seconds,
                    OptionalLong.empty(),
                    Optional.empty(),
                    OptionalLong.empty(),
                    OptionalDouble.empty(),
                    OptionalLong.empty());
        }

        /// Another rule with the same budget; what belongs to the rule it takes the place of is left out.
        public StopDraft withRule(String other) {
            return other.equals(rule) ? this : new StopDraft(other, draws, seconds);
        }

        public StopDraft withDraws(OptionalLong other) {
            return new StopDraft(rule, other, seconds, hits, guard, first, inflation, digits);
        }

        public StopDraft withSeconds(OptionalDouble other) {
            return new StopDraft(rule, draws, other, hits, guard, first, inflation, digits);
        }

        public StopDraft withHits(OptionalLong other) {
            return new StopDraft(rule, draws, seconds, other, guard, first, inflation, digits);
        }

        public StopDraft withGuard(Optional<GuardDraft> other) {
            return new StopDraft(rule, draws, seconds, hits, other, first, inflation, digits);
        }

        public StopDraft withFirst(OptionalLong other) {
            return new StopDraft(rule, draws, seconds, hits, guard, other, inflation, digits);
        }

        public StopDraft withInflation(OptionalDouble other) {
            return new StopDraft(rule, draws, seconds, hits, guard, first, other, digits);
        }

        public StopDraft withDigits(OptionalLong other) {
            return new StopDraft(rule, draws, seconds, hits, guard, first, inflation, other);
        }
    }

    /// From where on a rule may look.
    ///
    /// @param draws at least
    /// @param hits at least, or misses where those are rarer
    public record GuardDraft(OptionalLong draws, OptionalLong hits) {}

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
                interval,
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

    /// The JSON paths of the formulas asked, in order.
    public List<String> formulaPaths() {
        var paths = new ArrayList<String>();
        for (int k = 0; k < asks.size(); k++) {
            int formulas = asks.get(k).formulas().size();
            for (int i = 0; i < formulas; i++) {
                paths.add(askPath(k) + (formulas == 1 ? "" : "[" + i + "]"));
            }
        }
        return paths;
    }

    /// The formulas asked, in order.
    public List<String> formulas() {
        return asks.stream().flatMap(ask -> ask.formulas().stream()).toList();
    }

    /// The text of the formula that stands at a JSON path, so that a place in it can be shown.
    public Optional<String> formulaAt(String path) {
        Matcher step = STEP.matcher(path);
        if (step.matches()) {
            int index = Integer.parseInt(step.group(1));
            return index < steps.size() ? Optional.of(steps.get(index)) : Optional.empty();
        }
        if (path.equals("$.reference.formula")) {
            return reference.flatMap(
                    r -> r instanceof ReferenceDraft.Formula(var formula) ? Optional.of(formula) : Optional.empty());
        }
        Matcher ask = ASK.matcher(path);
        if (ask.matches()) {
            int index = ask.group(1) == null ? 0 : Integer.parseInt(ask.group(1));
            int formula = ask.group(2) == null ? 0 : Integer.parseInt(ask.group(2));
            return index < asks.size() && formula < asks.get(index).formulas().size()
                    ? Optional.of(asks.get(index).formulas().get(formula))
                    : Optional.empty();
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
