package dev.leadline.study;

import dev.leadline.model.Project;
import dev.leadline.project.ProjectFile;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.SequencedMap;
import java.util.stream.Stream;

/// A lane put together of one choice of each kind, with the question that it answers: words of a project file.
///
/// Two inputs, x uniform on (0, 1), of integrals the variable, and y standard normal.
public record Combination(String points, String drawFrom, String controls, String estimand) {
    private static final SequencedMap<String, String> POINTS = words(
            "independent", "",
            "antithetic", "",
            "stratified", ", \"cells\": {\"x\": 8}",
            "stratified, shared", ", \"cells\": {\"x\": 8}, \"allocation\": \"neyman\"",
            "latin-hypercube", "",
            "scrambled-sobol", "",
            "shifted-lattice", "",
            "splitting", ", \"particles\": 10");

    private static final String OTHERS = """
            , "drawFrom": {"x": {"family": "beta", "alpha": 1.3, "beta": 1, "from": 0, "to": 1},
                           "y": {"family": "normal", "mean": 0.5, "sd": 1.2}}""";

    private static final SequencedMap<String, String> DRAW_FROM = words(
            "own", "",
            "stated", OTHERS,
            "self-normalised", OTHERS + ", \"selfNormalised\": true",
            "cross-entropy", ", \"drawFrom\": {\"adapt\": \"cross-entropy\"}",
            "grid", ", \"drawFrom\": {\"adapt\": \"grid\"}");

    private static final SequencedMap<String, String> CONTROLS = words(
            "no",
            "",
            "one",
            ", \"controlVariates\": [{\"formula\": \"x\", \"mean\": \"exact\"}]",
            "two",
            ", \"controlVariates\": [{\"formula\": \"x\", \"mean\": \"exact\"}, {\"formula\": \"y\", \"mean\": 0}]");

    /// What is asked, and the exact value: e - 1 of the first two; of the chance the integral of Φ(x - 1) over
    /// (0, 1), which is φ(0) + Φ(-1) - φ(1); quantile and tail mean by mpmath from the integral of Φ(t - x).
    private record Asked(String ask, double value) {}

    private static final SequencedMap<String, Asked> ESTIMANDS = estimands();

    private static SequencedMap<String, Asked> estimands() {
        var asked = new LinkedHashMap<String, Asked>();
        asked.put("mean", new Asked("{\"mean\": \"exp(x)*(1 + y/4)\"}", Math.E - 1));
        asked.put("integral", new Asked("{\"integral\": \"exp(x)*(1 + y/4)\"}", Math.E - 1));
        asked.put("probability", new Asked("{\"probability\": \"x + y > 1\"}", .3156268094));
        asked.put("standardDeviation", new Asked("{\"standardDeviation\": \"x + y\"}", Math.sqrt(13 / 12.)));
        asked.put("distribution", new Asked("{\"distribution\": \"x + y\"}", .5));
        asked.put("quantile", new Asked("{\"quantile\": \"x + y\", \"at\": 0.9}", 1.8344230807478381));
        asked.put("tailMean", new Asked("{\"tailMean\": \"x + y\", \"at\": 0.9}", 2.3262628977783059));
        asked.put("ratio", new Asked("{\"ratio\": [\"exp(x)*(1 + y/4)\", \"1 + y/4\"]}", Math.E - 1));
        return asked;
    }

    private static SequencedMap<String, String> words(String... pairs) {
        var words = new LinkedHashMap<String, String>();
        for (int i = 0; i < pairs.length; i += 2) {
            words.put(pairs[i], pairs[i + 1]);
        }
        return words;
    }

    public static Stream<Combination> all() {
        var all = new ArrayList<Combination>();
        for (String points : POINTS.keySet()) {
            for (String drawFrom : DRAW_FROM.keySet()) {
                for (String controls : CONTROLS.keySet()) {
                    for (String estimand : ESTIMANDS.keySet()) {
                        all.add(new Combination(points, drawFrom, controls, estimand));
                    }
                }
            }
        }
        return all.stream();
    }

    /// The words of all layouts.
    static List<String> layouts() {
        return POINTS.keySet().stream().map(Combination::layout).distinct().toList();
    }

    /// The word of the layout, without what it is told.
    private static String layout(String points) {
        return points.replaceFirst(",.*", "");
    }

    double value() {
        return ESTIMANDS.get(estimand).value();
    }

    /// @throws dev.leadline.problem.Refusal where there is no such lane, or no such question
    public Project project(long draws) {
        String x = estimand.equals("integral")
                ? "\"range\": [0, 1]"
                : "\"density\": {\"family\": \"uniform\", \"from\": 0, \"to\": 1}";
        return Project.of(ProjectFile.parse("""
                {"leadline": 1, "seed": 20261201, "stop": {"rule": "fixed", "draws": %d},
                 "inputs": [{"name": "x", %s}, {"name": "y", "density": {"family": "normal", "mean": 0, "sd": 1}}],
                 "ask": %s,
                 "lanes": [{"name": "B", "points": "%s"%s}]}
                """.formatted(
                        draws,
                        x,
                        ESTIMANDS.get(estimand).ask(),
                        layout(points),
                        choice(POINTS, points) + choice(DRAW_FROM, drawFrom) + choice(CONTROLS, controls))));
    }

    private static String choice(Map<String, String> words, String word) {
        return words.get(word);
    }

    @Override
    public String toString() {
        return String.join(" · ", points, drawFrom, controls + " control", estimand);
    }
}
