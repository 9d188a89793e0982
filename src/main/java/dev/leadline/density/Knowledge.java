package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.finite;
import static dev.leadline.density.Rule.positive;

import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.SequencedMap;
import java.util.function.Function;

/// A way in which something is known about a quantity, and the density that says that and no more.
///
/// Which density follows from which knowledge: JCGM 101:2008, 6.4, table 1, where it has an entry; the others are
/// common practice and say so in their sentence.
///
/// Immutable.
public final class Knowledge {
    private static final String GUIDE = "JCGM 101:2008, ";
    private static final Rule LOW = finite("low", "smallest possible value");
    private static final Rule HIGH = finite("high", "largest possible value");
    private static final Rule MODE = finite("likely", "most likely value");
    private static final Rule MEAN = finite("mean", "best estimate");
    private static final Rule SD =
            positive("sd", "standard deviation, or standard uncertainty", "Without spread it is a constant.");

    private static final List<Knowledge> ALL = List.of(
            new Knowledge(
                    "limits",
                    "nothing but its limits",
                    List.of(LOW, HIGH),
                    v -> suggestion(
                            "uniform",
                            parameters("from", v[0], "to", v[1]),
                            "between %s and %s, nothing more is known: uniform (%s6.4.2)",
                            Shortest.text(v[0]),
                            Shortest.text(v[1]),
                            GUIDE)),
            new Knowledge(
                    "rough-limits",
                    "limits that are themselves not exactly known",
                    List.of(
                            LOW,
                            HIGH,
                            positive("inexact", "how far each limit may be off", "Exact limits are another row.")),
                    v -> suggestion(
                            "curvilinear-trapezoid",
                            parameters("from", v[0], "to", v[1], "inexact", v[2]),
                            "between about %s and %s, each limit known to ±%s: curvilinear trapezoid (%s6.4.3)",
                            Shortest.text(v[0]),
                            Shortest.text(v[1]),
                            Shortest.text(v[2]),
                            GUIDE)),
            new Knowledge(
                    "likely",
                    "limits and the most likely value",
                    List.of(LOW, MODE, HIGH),
                    v -> suggestion(
                            "triangular",
                            parameters("from", v[0], "mode", v[1], "to", v[2]),
                            "between %s and %s, most likely %s: triangular (common practice)",
                            Shortest.text(v[0]),
                            Shortest.text(v[2]),
                            Shortest.text(v[1]))),
            new Knowledge(
                    "judged",
                    "three judged points, the middle one well founded",
                    List.of(LOW, MODE, HIGH),
                    v -> suggestion(
                            "pert",
                            parameters("from", v[0], "mode", v[1], "to", v[2]),
                            "judged least %s, most likely %s, greatest %s: beta by three points (common practice)",
                            Shortest.text(v[0]),
                            Shortest.text(v[1]),
                            Shortest.text(v[2]))),
            new Knowledge(
                    "swing",
                    "it swings to and fro between limits like a sine",
                    List.of(LOW, HIGH),
                    v -> suggestion(
                            "arcsine",
                            parameters("from", v[0], "to", v[1]),
                            "swings like a sine between %s and %s, phase unknown: arcsine (%s6.4.6)",
                            Shortest.text(v[0]),
                            Shortest.text(v[1]),
                            GUIDE)),
            new Knowledge(
                    "mean-and-sd",
                    "its mean and standard deviation",
                    List.of(MEAN, SD),
                    v -> suggestion(
                            "normal",
                            parameters("mean", v[0], "sd", v[1]),
                            "best estimate %s with standard uncertainty %s: normal (%s6.4.7)",
                            Shortest.text(v[0]),
                            Shortest.text(v[1]),
                            GUIDE)),
            new Knowledge(
                    "positive-mean-and-sd",
                    "mean and standard deviation of a positive quantity",
                    List.of(positive("mean", "mean of the quantity itself", "The quantity is positive."), SD),
                    v -> suggestion(
                            "lognormal",
                            parameters("mean", v[0], "sd", v[1]),
                            "positive, mean %s, standard deviation %s: lognormal (common practice)",
                            Shortest.text(v[0]),
                            Shortest.text(v[1]))),
            new Knowledge(
                    "positive-mean",
                    "nothing but the mean of a positive quantity",
                    List.of(positive("mean", "best estimate", "The quantity is positive.")),
                    v -> suggestion(
                            "exponential",
                            parameters("mean", v[0]),
                            "positive, best estimate %s, nothing more is known: exponential (%s6.4.10)",
                            Shortest.text(v[0]),
                            GUIDE)),
            new Knowledge(
                    "two-quantiles",
                    "two values, each with the chance of a smaller one",
                    twoQuantiles(finite("low", "the smaller value"), finite("high", "the larger value")),
                    v -> suggestion(
                            "normal",
                            parameters(percent(v[1]), v[0], percent(v[3]), v[2]),
                            "%s %% of the values below %s, %s %% below %s: normal (common practice)",
                            Shortest.text(v[1]),
                            Shortest.text(v[0]),
                            Shortest.text(v[3]),
                            Shortest.text(v[2]))),
            new Knowledge(
                    "positive-quantiles",
                    "two values of a positive quantity, each with the chance of a smaller one",
                    twoQuantiles(
                            positive("low", "the smaller value", "The quantity is positive."),
                            positive("high", "the larger value", "The quantity is positive.")),
                    v -> suggestion(
                            "lognormal",
                            parameters(percent(v[1]), v[0], percent(v[3]), v[2]),
                            "positive, %s %% of the values below %s, %s %% below %s: lognormal (common practice)",
                            Shortest.text(v[1]),
                            Shortest.text(v[0]),
                            Shortest.text(v[3]),
                            Shortest.text(v[2]))),
            new Knowledge(
                    "readings",
                    "repeated readings: their number, mean and standard deviation",
                    List.of(
                            whole("n", 2, "number of readings"),
                            finite("mean", "mean of the readings"),
                            positive(
                                    "s",
                                    "standard deviation of one reading",
                                    "Equal readings say nothing of their spread.")),
                    v -> suggestion(
                            "student",
                            parameters("dof", v[0] - 1, "location", v[1], "scale", v[2] / Math.sqrt(v[0])),
                            "mean of %s readings %s, standard deviation of one %s: Student's t with %s degrees of freedom (%s6.4.9.2)",
                            Shortest.text(v[0]),
                            Shortest.text(v[1]),
                            Shortest.text(v[2]),
                            Shortest.text(v[0] - 1),
                            GUIDE)),
            new Knowledge(
                    "certificate",
                    "a certificate: value, expanded uncertainty and coverage factor",
                    List.of(
                            finite("value", "certified value"),
                            positive("U", "expanded uncertainty", "Without spread it is a constant."),
                            positive("k", "coverage factor", "The expanded uncertainty is k standard ones.")),
                    v -> suggestion(
                            "normal",
                            parameters("mean", v[0], "sd", v[1] / v[2]),
                            "certificate: %s, U = %s, k = %s: normal (%s6.4.7)",
                            Shortest.text(v[0]),
                            Shortest.text(v[1]),
                            Shortest.text(v[2]),
                            GUIDE)),
            new Knowledge(
                    "certificate-dof",
                    "a certificate that also states degrees of freedom",
                    List.of(
                            finite("value", "certified value"),
                            positive("U", "expanded uncertainty", "Without spread it is a constant."),
                            positive("k", "coverage factor", "The expanded uncertainty is k standard ones."),
                            positive("dof", "effective degrees of freedom", "The fewer, the heavier the tails.")),
                    v -> suggestion(
                            "student",
                            parameters("dof", v[3], "location", v[0], "scale", v[1] / v[2]),
                            "certificate: %s, U = %s, k = %s, %s degrees of freedom: Student's t (%s6.4.9.7)",
                            Shortest.text(v[0]),
                            Shortest.text(v[1]),
                            Shortest.text(v[2]),
                            Shortest.text(v[3]),
                            GUIDE)),
            new Knowledge(
                    "count",
                    "a number of events counted over a time or length, for their rate",
                    List.of(
                            whole("events", 0, "number of events counted"),
                            positive(
                                    "over",
                                    "time or length over which they were counted",
                                    "A rate is per time or length.")),
                    v -> suggestion(
                            "gamma",
                            parameters("shape", v[0] + 1, "scale", 1 / v[1]),
                            "%s events counted over %s: gamma for their rate (%s6.4.11)",
                            Shortest.text(v[0]),
                            Shortest.text(v[1]),
                            GUIDE)),
            new Knowledge(
                    "chance",
                    "it happens or not, with a known chance",
                    List.of(between(0, 1, "probability", "chance that it happens", "A chance lies between 0 and 1.")),
                    v -> suggestion(
                            "bernoulli",
                            parameters("probability", v[0]),
                            "happens with probability %s: 1 if it does, else 0",
                            Shortest.text(v[0]))));

    private final String word;
    private final String title;
    private final List<Rule> rules;
    private final Function<double[], Suggestion> suggests;

    private Knowledge(String word, String title, List<Rule> rules, Function<double[], Suggestion> suggests) {
        this.word = word;
        this.title = title;
        this.rules = rules;
        this.suggests = suggests;
    }

    /// Every way there is, the usual ones first.
    public static List<Knowledge> all() {
        return ALL;
    }

    /// @throws Refusal where there is none of this word
    public static Knowledge named(String word) {
        var words = ALL.stream().map(Knowledge::word).toList();
        return ALL.stream()
                .filter(knowledge -> knowledge.word.equals(word))
                .findFirst()
                .orElseThrow(() -> {
                    var problem = Problem.of("there is no way of knowing called \"%s\"".formatted(word))
                            .because("There are %s.".formatted(String.join(", ", words)));
                    return new Refusal(Nearest.to(word, words)
                            .map(near -> problem.tryThis("Was \"%s\" meant?".formatted(near)))
                            .orElse(problem));
                });
    }

    /// One word for it, as a command takes it.
    public String word() {
        return word;
    }

    /// As a person would say it.
    public String title() {
        return title;
    }

    /// What is to be told.
    public List<Parameter> parameters() {
        return rules.stream().map(Rule::parameter).toList();
    }

    /// @throws Refusal with every problem found, each at the path of what is told
    public Suggestion suggestion(Map<String, Double> told) {
        var problems = new ArrayList<Problem>();
        double[] values = new double[rules.size()];
        for (int i = 0; i < values.length; i++) {
            String name = rules.get(i).name();
            if (told.containsKey(name)) {
                values[i] = told.get(name);
                rules.get(i).broken(values[i]).ifPresent(problems::add);
            } else {
                problems.add(Problem.of(name + " is missing")
                        .because("It is the " + rules.get(i).use() + ".")
                        .at(Place.of(name)));
            }
        }
        var names = rules.stream().map(Rule::name).toList();
        told.keySet().stream()
                .filter(name -> !names.contains(name))
                .forEach(name -> problems.add(Problem.of("there is nothing called " + name + " here")
                        .because("What is told is %s.".formatted(String.join(", ", names)))
                        .at(Place.of(name))));
        if (!problems.isEmpty()) {
            throw new Refusal(problems);
        }
        return suggests.apply(values);
    }

    private static List<Rule> twoQuantiles(Rule low, Rule high) {
        return List.of(
                low,
                percentage("below-low", "per cent of the values below it"),
                high,
                percentage("below-high", "per cent of the values below that"));
    }

    private static Rule percentage(String name, String use) {
        return between(0.001, 99.999, name, use, "A quantile has values on both sides.");
    }

    private static Rule whole(String name, int least, String use) {
        return new Rule(
                name,
                use,
                "a whole number, at least " + least,
                v -> v >= least && v == Math.rint(v),
                "",
                "",
                OptionalDouble.empty());
    }

    private static String percent(double percentage) {
        return "q" + Shortest.text(percentage);
    }

    private static SequencedMap<String, Double> parameters(Object... namesAndValues) {
        var parameters = new LinkedHashMap<String, Double>();
        for (int i = 0; i < namesAndValues.length; i += 2) {
            parameters.put((String) namesAndValues[i], (Double) namesAndValues[i + 1]);
        }
        return parameters;
    }

    private static Suggestion suggestion(
            String family, SequencedMap<String, Double> parameters, String sentence, Object... words) {
        return new Suggestion(family, parameters, sentence.formatted(words));
    }
}
