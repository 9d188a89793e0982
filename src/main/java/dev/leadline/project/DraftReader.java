package dev.leadline.project;

import dev.leadline.density.Mixing;
import dev.leadline.interval.Bounds;
import dev.leadline.model.DensityDraft;
import dev.leadline.model.Draft;
import dev.leadline.model.Draft.AskDraft;
import dev.leadline.model.Draft.ConstantDraft;
import dev.leadline.model.Draft.DependenceDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.GuardDraft;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Draft.IntervalDraft;
import dev.leadline.model.Draft.PairDraft;
import dev.leadline.model.Draft.ReferenceDraft;
import dev.leadline.model.Draft.StopDraft;
import dev.leadline.model.Draft.ToleranceDraft;
import dev.leadline.model.LaneDraft;
import dev.leadline.model.Stop;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/// Takes a project's JSON apart. Here stands which fields there are and what kind of value each has; what the values
/// may be is for [Project][dev.leadline.model.Project] to say.
final class DraftReader {

    static final long FORMAT = 1;

    static final int NAME = 200;
    static final int LINE = 10_000;
    static final int FORMULA = 100_000;

    private static final int MOST_ASKS = 100;
    private static final int MOST_PAIRS = 10_000;

    private static final String LEAVE_OUT = "Leave it out.";
    private static final String IN_A_LANE =
            "A lane says what its inputs are drawn from: {\"name\": \"B\", \"drawFrom\": {\"v\": …}}.";

    private static final Map<String, String> WHOLE_LATER =
            Map.of("logbook", "Leave it out: no run is written to a logbook.");
    private static final List<String> REFERENCES = List.of("value", "formula", "quadrature");
    private static final List<String> MEASURES = List.of("spearman", "kendall", "pearson");

    private final Problems problems;
    private boolean indicesHold = true;

    private DraftReader(Problems problems) {
        this.problems = problems;
    }

    static Draft read(Json json, Problems problems) {
        var whole = Fields.of(JsonPath.WHOLE, json, "a project {\"leadline\": 1, …}", problems);
        return new DraftReader(problems).draft(whole.orElseThrow(() -> new Refusal(problems.found())));
    }

    private Draft draft(Fields whole) {
        checkFormat(whole);
        Draft draft = new Draft(
                whole.text("title", LINE),
                whole.text("notes", JsonReader.MOST_TEXT),
                whole.flag("safety"),
                constants(whole),
                inputs(whole),
                whole.object("dependence", "a dependence {\"copula\": \"gaussian\", \"pairs\": […]}")
                        .map(this::dependence),
                steps(whole),
                asks(whole),
                whole.object("reference", "a reference {\"value\": …}").map(this::reference),
                whole.number("confidence"),
                whole.object("tolerance", "a tolerance {\"relative\": 0.05} or {\"absolute\": 2}")
                        .map(this::tolerance),
                interval(whole),
                whole.object("stop", "a stop rule {\"rule\": \"fixed\", \"draws\": …}")
                        .map(this::stop),
                whole.count("seed", 0, Long.MAX_VALUE),
                whole.flag("commonRandomNumbers"),
                lanes(whole));
        whole.close(WHOLE_LATER);
        if (!indicesHold) {
            throw new Refusal(problems.found());
        }
        return draft;
    }

    private void checkFormat(Fields whole) {
        if (!whole.has("leadline")) {
            problems.add(Problem.of("\"leadline\": 1 is missing")
                    .because("It says that the file is a project, and of which version of the format.")
                    .tryThis("Write it as the first field, or see whether the right file was given.")
                    .at(Place.of(whole.pathOf("leadline"))));
            return;
        }
        long format = whole.count("leadline", 0, Long.MAX_VALUE).orElse(FORMAT);
        if (format != FORMAT) {
            Problem problem = Problem.of("the project format is %d but must be %d".formatted(format, FORMAT))
                    .at(Place.of(whole.pathOf("leadline")));
            throw new Refusal(
                    format > FORMAT ? problem.tryThis("Open it with a newer Leadline; this one cannot.") : problem);
        }
    }

    private List<ConstantDraft> constants(Fields whole) {
        return each(whole, "constants", Draft.MOST_ROWS, "a constant {\"name\": …, \"value\": …}", fields -> {
            var constant = new ConstantDraft(
                    fields.requiredText("name", NAME),
                    fields.requiredNumber("value"),
                    fields.text("unit", NAME),
                    fields.text("label", LINE),
                    fields.text("source", LINE));
            fields.close(Map.of());
            return constant;
        });
    }

    private List<InputDraft> inputs(Fields whole) {
        return each(whole, "inputs", Draft.MOST_ROWS, "an input {\"name\": …, \"density\": …}", fields -> {
            var input = new InputDraft(
                    fields.requiredText("name", NAME),
                    fields.text("unit", NAME),
                    fields.text("label", LINE),
                    fields.text("provenance", LINE),
                    from(fields));
            fields.close(Map.of());
            return input;
        });
    }

    private From from(Fields input) {
        boolean range = input.has("range");
        if (range == input.has("density")) {
            problems.add(Problem.of(
                            range ? "the input has a density and a range" : "the input has neither density nor range")
                    .because("A random variable has a density, an integration variable has a range.")
                    .tryThis(range ? "Remove one of them." : "Give one of them.")
                    .at(Place.of(input.path())));
        }
        var density = density(input, "density");
        var drawFrom = density(input, "drawFrom");
        if (range) {
            return range(input, drawFrom);
        }
        if (drawFrom.isPresent()) {
            problems.add(Fields.unavailable("\"drawFrom\" beside a density", IN_A_LANE)
                    .at(Place.of(input.pathOf("drawFrom"))));
        }
        return new From.Density(density.orElse(DensityDraft.unchosen()));
    }

    private From range(Fields input, Optional<DensityDraft> drawFrom) {
        List<Json> ends = input.list("range", JsonReader.MOST_TEXT);
        if (ends.size() != 2) {
            if (input.take("range").orElseThrow() instanceof Json.Elements) {
                problems.add(Problem.of("range must have 2 ends but has %d".formatted(ends.size()))
                        .because("It is [low, high]; an end may be \"-inf\" or \"inf\".")
                        .at(Place.of(input.pathOf("range"))));
            }
            return new From.Range(Double.NaN, Double.NaN, drawFrom);
        }
        String path = input.pathOf("range");
        String what = "an end of the range";
        return new From.Range(
                end(ends.get(0), what, JsonPath.element(path, 0), problems),
                end(ends.get(1), what, JsonPath.element(path, 1), problems),
                drawFrom);
    }

    /// @param what stands at `path`, in words
    static double end(Json json, String what, String path, Problems problems) {
        return switch (json) {
            case Json.Number number -> number.value();
            case Json.Text(String text) when text.equals("-inf") -> Double.NEGATIVE_INFINITY;
            case Json.Text(String text) when text.equals("inf") -> Double.POSITIVE_INFINITY;
            case Json other -> {
                problems.add(Problem.of(
                                "%s is %s but must be a number, \"-inf\" or \"inf\"".formatted(what, Shown.what(other)))
                        .at(Place.of(path)));
                yield Double.NaN;
            }
        };
    }

    private Optional<DensityDraft> density(Fields input, String name) {
        return input.object(name, "a density {\"family\": …}").map(fields -> DensityReader.read(fields, problems));
    }

    private DependenceDraft dependence(Fields fields) {
        var dependence = new DependenceDraft(
                fields.has("copula") ? fields.requiredText("copula", NAME) : Mixing.GAUSSIAN,
                fields.number("dof"),
                fields.flag("repair"),
                each(fields, "pairs", MOST_PAIRS, "a pair {\"of\": [\"a\", \"b\"], \"spearman\": …}", this::pair));
        fields.close(Map.of());
        return dependence;
    }

    private PairDraft pair(Fields fields) {
        var of = fields.list("of", MOST_PAIRS).stream()
                .map(json -> json instanceof Json.Text(String name) ? name : "")
                .toList();
        if (of.size() != 2 || of.contains("")) {
            problems.add(Problem.of("\"of\" must be the names of two inputs, as [\"a\", \"b\"]")
                    .because("A correlation is between two inputs.")
                    .at(Place.of(fields.pathOf("of"))));
        }
        fields.has("of");
        var given = MEASURES.stream().filter(fields::has).toList();
        if (given.size() != 1) {
            problems.add(Problem.of(
                            given.isEmpty()
                                    ? "the pair has no correlation"
                                    : "the pair has %s".formatted(String.join(" and ", given)))
                    .because("A pair has one of %s.".formatted(String.join(", ", MEASURES)))
                    .at(Place.of(fields.path())));
        }
        String measure = given.isEmpty() ? MEASURES.getFirst() : given.getFirst();
        double value = given.isEmpty() ? Double.NaN : fields.requiredNumber(measure);
        fields.close(Map.of());
        return of.size() == 2
                ? new PairDraft(of.get(0), of.get(1), measure, value)
                : new PairDraft("", "", measure, value);
    }

    private List<String> steps(Fields whole) {
        List<String> steps = new ArrayList<>();
        for (Json json : whole.list("steps", Draft.MOST_ROWS)) {
            if (json instanceof Json.Text(String line) && line.length() <= FORMULA) {
                steps.add(line);
            } else {
                problems.add(Problem.of(String.format(
                                Locale.ROOT,
                                "a step is %s but must be a text of at most %,d characters",
                                Shown.what(json),
                                FORMULA))
                        .tryThis("Write it as \"name = formula   # unit\".")
                        .at(Place.of(JsonPath.element(whole.pathOf("steps"), steps.size()))));
                steps.add("");
            }
        }
        return steps;
    }

    private List<AskDraft> asks(Fields whole) {
        if (whole.take("ask").orElse(new Json.Null()) instanceof Json.Elements) {
            return each(whole, "ask", MOST_ASKS, "what is asked {\"mean\": …}", this::ask);
        }
        return whole.object("ask", "what is asked {\"mean\": …}").map(this::ask).stream()
                .toList();
    }

    private AskDraft ask(Fields fields) {
        List<String> words =
                fields.names().stream().filter(AskDraft.ESTIMANDS::contains).toList();
        if (words.size() != 1) {
            problems.add(Problem.of(
                            words.isEmpty()
                                    ? "nothing is asked here"
                                    : "%s are asked in one place".formatted(String.join(" and ", words)))
                    .because("Each answer names one of %s.".formatted(String.join(", ", AskDraft.ESTIMANDS)))
                    .tryThis("Several answers from the same draws are a list: [{\"mean\": …}, {\"probability\": …}].")
                    .at(Place.of(fields.path())));
        }
        AskDraft.ESTIMANDS.forEach(fields::has);
        String word = words.isEmpty() ? "" : words.getFirst();
        var ask = new AskDraft(
                word,
                words.isEmpty() ? List.of("") : formulas(fields, word),
                takesAt(word) ? fields.number("at") : OptionalDouble.empty(),
                word.equals("distribution") ? fields.number("coverage") : OptionalDouble.empty(),
                fields.text("unit", NAME),
                fields.text("label", LINE));
        fields.close(Map.of());
        return ask;
    }

    private static boolean takesAt(String word) {
        return word.equals("quantile") || word.equals("tailMean");
    }

    private List<String> formulas(Fields fields, String word) {
        return word.equals("ratio")
                ? fields.texts(word, 2, FORMULA, "a formula in double quotes, numerator first,")
                : List.of(fields.text(word, FORMULA));
    }

    private ReferenceDraft reference(Fields fields) {
        List<String> words =
                fields.names().stream().filter(REFERENCES::contains).toList();
        if (words.size() > 1) {
            problems.add(Problem.of("%s stand in one reference".formatted(String.join(" and ", words)))
                    .because("The answer is compared with one value.")
                    .tryThis("Keep one of them.")
                    .at(Place.of(fields.path())));
        }
        REFERENCES.forEach(fields::has);
        var reference = switch (words.isEmpty() ? "value" : words.getFirst()) {
            case "formula" -> new ReferenceDraft.Formula(fields.text("formula", FORMULA));
            case "quadrature" -> quadrature(fields);
            default ->
                new ReferenceDraft.Value(
                        fields.requiredNumber("value"), fields.number("error"), fields.text("source", LINE));
        };
        fields.close(Map.of());
        return reference;
    }

    private ReferenceDraft quadrature(Fields fields) {
        boolean isFalse = fields.take("quadrature")
                .filter(json -> json instanceof Json.Flag(boolean asked) && !asked)
                .isPresent();
        if (isFalse) {
            problems.add(Problem.of("quadrature is false but must be true")
                    .because("A reference is a value, a formula, or found by quadrature.")
                    .tryThis("Leave the reference out where there is none.")
                    .at(Place.of(fields.pathOf("quadrature"))));
        } else {
            fields.flag("quadrature");
        }
        return new ReferenceDraft.Quadrature();
    }

    private ToleranceDraft tolerance(Fields fields) {
        var when = fields.has("when") ? Optional.of(fields.text("when", NAME)) : Optional.<String>empty();
        var tolerance = new ToleranceDraft(fields.number("absolute"), fields.number("relative"), when);
        fields.close(Map.of());
        return tolerance;
    }

    private StopDraft stop(Fields fields) {
        var stop = new StopDraft(
                fields.has("rule") ? fields.requiredText("rule", NAME) : "",
                fields.count("draws", 1, Stop.MOST_DRAWS),
                fields.number("seconds"),
                fields.count("hits", 2, Stop.MOST_DRAWS),
                fields.object("guard", "a guard {\"draws\": …, \"hits\": …}").map(DraftReader::guard),
                fields.count("first", 2, Stop.MOST_DRAWS),
                fields.number("inflation"),
                fields.count("digits", 1, 2));
        fields.close(Map.of());
        return stop;
    }

    private static GuardDraft guard(Fields fields) {
        var guard = new GuardDraft(fields.count("draws", 2, Stop.MOST_DRAWS), fields.count("hits", 1, Stop.MOST_DRAWS));
        fields.close(Map.of());
        return guard;
    }

    private List<LaneDraft> lanes(Fields whole) {
        List<LaneDraft> lanes = each(
                whole,
                "lanes",
                Draft.MOST_ROWS,
                "a lane {\"name\": \"A\", \"points\": …}",
                fields -> LaneReader.read(fields, problems));
        if (lanes.isEmpty() && whole.take("lanes").orElse(new Json.Null()) instanceof Json.Elements) {
            problems.add(Problem.of("there is no lane in lanes")
                    .tryThis("Leave the field out for one lane A of independent points.")
                    .at(Place.of(whole.pathOf("lanes"))));
        }
        return lanes;
    }

    private Optional<IntervalDraft> interval(Fields whole) {
        Optional<String> kind = whole.has("interval") ? Optional.of(whole.text("interval", NAME)) : Optional.empty();
        Optional<Bounds> bounds = whole.has("bounds")
                ? Optional.of(whole.numbers("bounds", 2)).map(ends -> new Bounds(ends.getFirst(), ends.getLast()))
                : Optional.empty();
        return kind.isEmpty() && bounds.isEmpty() ? Optional.empty() : Optional.of(new IntervalDraft(kind, bounds));
    }

    private interface Part<T> {
        T of(Fields fields);
    }

    private <T> List<T> each(Fields whole, String name, int most, String expected, Part<T> part) {
        List<T> parts = new ArrayList<>();
        List<Json> list = whole.list(name, most);
        for (int i = 0; i < list.size(); i++) {
            Fields.of(JsonPath.element(whole.pathOf(name), i), list.get(i), expected, problems)
                    .ifPresentOrElse(fields -> parts.add(part.of(fields)), () -> indicesHold = false);
        }
        return parts;
    }
}
