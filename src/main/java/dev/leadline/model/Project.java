package dev.leadline.model;

import dev.leadline.density.Density;
import dev.leadline.formula.Working;
import dev.leadline.model.Draft.ToleranceDraft;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SortedMap;
import java.util.TreeMap;

/// A project after every check: the question and how it is to be run, beside the draft they came from.
///
/// @param notes what is no fault but may surprise, at its JSON path: names that hide a number which every formula
///     knows, rows of data that were left out, correlations that do not mean quite what they seem to
/// @param data SHA-256 of each file of data that was read, by its name in the project
public record Project(Draft draft, Question question, Plan plan, List<Problem> notes, SortedMap<String, String> data) {
    public Project {
        notes = List.copyOf(notes);
        data = Collections.unmodifiableSortedMap(new TreeMap<>(data));
    }

    /// Where a project says nothing.
    static final double USUAL_CONFIDENCE = .95;

    /// A project that names no data files, or has no folder yet.
    ///
    /// @throws Refusal with every problem found, each at its JSON path in the draft
    public static Project of(Draft draft) {
        return of(draft, DataFiles.NONE);
    }

    /// @throws Refusal with every problem found, each at its JSON path in the draft
    public static Project of(Draft draft, DataFiles files) {
        var findings = new Findings();
        checkSizes(draft, findings);
        SortedMap<String, String> read = new TreeMap<>();
        List<Input> inputs = Inputs.of(draft, noting(files, read), findings);
        List<Ask> asks = Asks.of(draft, findings);
        Optional<Working> working = Workings.of(draft, findings);
        working.ifPresent(formulas -> Asks.checkEvents(draft, formulas, findings));
        var references = new References(draft, findings);
        Optional<Reference> reference = references.of();
        double confidence = confidence(draft, findings);
        Optional<Tolerance> tolerance = draft.tolerance().map(given -> tolerance(given, findings));
        IntervalWish interval =
                draft.interval().map(given -> Intervals.of(given, findings)).orElse(IntervalWish.AUTO);
        Stop stop = Stops.of(draft, findings);
        long seed = Plans.seed(draft, findings);
        Optional<Dependence> dependence =
                draft.dependence().flatMap(given -> Dependences.of(given, draft.inputs(), inputs, findings));
        Optional<Working> sound =
                working.filter(_ -> inputs.size() == draft.inputs().size());
        sound.ifPresent(formulas -> references.check(formulas, inputs, dependence, asks));
        List<Lane> lanes = Lanes.of(draft, inputs, sound, dependence, noting(files, read), findings);
        Stops.check(draft, asks, lanes, findings);
        Intervals.check(interval, asks, inputs, lanes, findings);
        findings.made(
                _ -> draft.stop()
                        .flatMap(given -> given.draws().isPresent() ? Optional.of("$.stop.draws") : Optional.empty())
                        .orElse("$.lanes"),
                () -> new Plan(stop, seed, lanes).checked());
        findings.refuseIfAny();
        Question question = new Question(
                draft.title(),
                draft.notes(),
                draft.safety(),
                constants(draft),
                inputs,
                dependence,
                working.orElseThrow(),
                asks,
                reference,
                confidence,
                tolerance,
                interval);
        List<Problem> notes = new ArrayList<>(Workings.notes(draft, question.working()));
        notes.addAll(findings.notes());
        dependence.ifPresent(tied -> notes.addAll(Dependences.notes(tied, inputs)));
        return new Project(draft, question, new Plan(stop, seed, lanes), notes, read);
    }

    /// A lane of this question, as if the project had it; it cannot draw from data.
    ///
    /// @throws Refusal with every problem found
    public Lane lane(LaneDraft lane) {
        var findings = new Findings();
        List<Lane> made = Lanes.of(
                draft.with(List.of(lane)),
                question.inputs(),
                Optional.of(question.working()),
                question.dependence(),
                DataFiles.NONE,
                findings);
        findings.refuseIfAny();
        return made.getFirst();
    }

    /// Words of the stop rules, in the order in which they are offered.
    public static List<String> stopRules() {
        return Stops.words();
    }

    /// The stop rule that a draft names, or the usual one.
    public static String stopRule(Draft draft) {
        return Stops.word(draft);
    }

    /// Words of the layouts of points, in the order in which they are offered.
    public static List<String> layouts() {
        return Layouts.words();
    }

    /// One input by itself, whatever else is wrong in the draft.
    ///
    /// @throws Refusal with every problem found in it, each at its JSON path in the draft
    public static Single input(Draft draft, int index, DataFiles files) {
        var findings = new Findings();
        var input = Inputs.of(draft, index, files, findings);
        findings.refuseIfAny();
        return new Single(input.orElseThrow(), findings.notes());
    }

    /// @param notes what is no fault but may surprise
    public record Single(Input input, List<Problem> notes) {
        public Single {
            notes = List.copyOf(notes);
        }

        public Density density() {
            return input.drawn();
        }
    }

    private static DataFiles noting(DataFiles files, Map<String, String> read) {
        return (file, column) -> {
            DataColumn found = files.column(file, column);
            read.put(file, found.hash());
            return found;
        };
    }

    private static void checkSizes(Draft draft, Findings findings) {
        Map.of(
                        "constants",
                        draft.constants().size(),
                        "inputs",
                        draft.inputs().size(),
                        "steps",
                        draft.steps().size())
                .forEach((rows, size) -> {
                    if (size > Draft.MOST_ROWS) {
                        findings.add(
                                "$." + rows,
                                String.format(Locale.ROOT, "there are %,d %s", size, rows),
                                String.format(Locale.ROOT, "A project has at most %,d.", Draft.MOST_ROWS));
                    }
                });
        findings.refuseIfAny();
    }

    private static List<Constant> constants(Draft draft) {
        return draft.constants().stream()
                .map(c -> new Constant(Workings.composed(c.name()), c.value(), c.unit(), c.label(), c.source()))
                .toList();
    }

    private static double confidence(Draft draft, Findings findings) {
        double confidence = draft.confidence().orElse(USUAL_CONFIDENCE);
        if (!(confidence > 0 && confidence < 1)) {
            findings.add(
                    "$.confidence",
                    "confidence is %s but must be between 0 and 1".formatted(Shortest.text(confidence)),
                    "It is the chance that the interval holds the value sought.",
                    "Write 0.95 for 95 %.");
        }
        return confidence;
    }

    private static Tolerance tolerance(ToleranceDraft draft, Findings findings) {
        if (draft.absolute().isEmpty() && draft.relative().isEmpty()) {
            findings.add(
                    "$.tolerance",
                    "the tolerance says nothing",
                    "It is \"absolute\", in the unit of the answer, or \"relative\", or both.",
                    "Write {\"relative\": 0.05} for 5 % of the value.");
        }
        checkPositive("absolute", draft.absolute(), findings);
        checkPositive("relative", draft.relative(), findings);
        draft.when().ifPresent(when -> {
            if (!when.equals("either") && !when.equals("both")) {
                findings.add(
                        "$.tolerance.when",
                        "when is \"%s\" but must be \"either\" or \"both\"".formatted(when),
                        "It says which of absolute and relative must be met.");
            } else if (draft.absolute().isEmpty() || draft.relative().isEmpty()) {
                findings.add(
                        "$.tolerance.when",
                        "when has nothing to choose from",
                        "It says which of absolute and relative must be met.",
                        "Give both, or leave it out.");
            }
        });
        return new Tolerance(
                draft.absolute(),
                draft.relative(),
                draft.when().filter("both"::equals).isPresent());
    }

    private static void checkPositive(String name, OptionalDouble given, Findings findings) {
        given.ifPresent(value -> {
            if (!(value > 0 && Double.isFinite(value))) {
                findings.add(
                        "$.tolerance." + name,
                        "%s is %s but must be greater than 0".formatted(name, Shortest.text(value)),
                        "The half-width of the interval is compared with it.");
            }
        });
    }
}
