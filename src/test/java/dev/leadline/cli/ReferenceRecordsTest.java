package dev.leadline.cli;

import static dev.leadline.ReferenceValues.caseOf;
import static dev.leadline.ReferenceValues.expected;
import static dev.leadline.ReferenceValues.record;
import static dev.leadline.cli.CommandLines.leadline;
import static java.util.stream.Collectors.joining;
import static java.util.stream.IntStream.rangeClosed;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.ReferenceValues;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import tools.jackson.databind.JsonNode;

/// Every record of `reference-values.json` on integrals, expectations and probabilities that independent points and
/// finite variance can answer, as a project through the command line.
///
/// Gate of each record: the estimate within `4 sqrt(variance / n)` of the value (fixed seed; chance of a false
/// alarm 6.3e-5 for each). Beside it the reported standard error against the record's variance: an estimated
/// standard deviation has a relative error of `sqrt((k - 1) / 4n)` with kurtosis k, of which four are allowed.
/// Values and variances are read from the record, whose `provenance` names the source (quoted at each group
/// here). Formulas are the record's, with `ln` written `log`, `or` `|`, `and` `&`, and the parameters of a case
/// filled in.
///
/// Left out, and why:
/// - `exp-lognormal-mean` sigma = 2 and 3: the record asks for sigma up to 1 (skewness 414 and 7e5).
/// - `exp-pareto-moments`: moments p with alpha up to 2p, whose variance is infinite, and alpha = 0.8.
/// - `int-singular` (b), (c), (e): infinite variance or no value.
/// - Figures of other schemes (antithetic pairs, control variates, strata), sensitivity indices and quantities that
///   are no estimate of a run (correlations, tail indices, sample sizes): those schemes are not there yet.
class ReferenceRecordsTest {

    private static final long DRAWS = 100_000;
    private static final long SEED = 20261201;
    private static final double USUAL_KURTOSIS = 40;

    /// @param kurtosis of the outcome, at most; infinite where the standard error cannot be gated
    record Check(String id, String part, String project, double value, double variance, long draws, double kurtosis) {
        Check draws(long more) {
            return new Check(id, part, project, value, variance, more, kurtosis);
        }

        Check kurtosis(double other) {
            return new Check(id, part, project, value, variance, draws, other);
        }

        @Override
        public String toString() {
            return id + ", " + part;
        }
    }

    @TempDir
    Path folder;

    @ParameterizedTest(name = "{0}")
    @MethodSource("checks")
    void answersWithinFourStandardErrors(Check check) throws IOException {
        Path file = Files.writeString(folder.resolve("record.leadline"), check.project);
        var outcome = leadline("run", file, "--json", "--quiet", "--seed", SEED, "--draws", check.draws);
        assertTrue(outcome.exitCode() <= 1, outcome.err());
        JsonNode lane = outcome.json().required("lanes").get(0);
        JsonNode answer = lane.required("answers").get(0);
        double estimate = answer.required("estimate").asDouble();
        double error = answer.required("standardError").asDouble();
        double known = Math.sqrt(check.variance / check.draws);
        assertEquals(check.draws, lane.required("observations").asLong());
        assertEquals(check.value, estimate, 4 * known, () -> (estimate - check.value) / known + " standard errors");
        assertEquals(1, error / known, 4 * Math.sqrt((check.kurtosis - 1) / (4 * check.draws)), "standard error");
    }

    @Test
    void leavesOutNoRecord() {
        Set<String> areas = Set.of("integral", "expectation", "probability");
        var records = new TreeSet<>(ReferenceValues.ids(areas));
        assertEquals(26, records.size());
        assertEquals(records, new TreeSet<>(checks().map(Check::id).toList()));
    }

    static Stream<Check> checks() {
        return Stream.of(
                        genz(),
                        otherIntegrals(),
                        keister(),
                        balls(),
                        unitMeans(),
                        exponentials(),
                        options(),
                        maxima(),
                        lognormals(),
                        paretos(),
                        orthants(),
                        owensT(),
                        resistance(),
                        sums(),
                        needles())
                .flatMap(List::stream);
    }

    /// Genz (1984): six families over the unit cube; closed forms at 50 digits.
    private static List<Check> genz() {
        List<Check> checks = new ArrayList<>();
        for (String family :
                List.of("oscillatory", "product-peak", "corner-peak", "gaussian", "continuous", "discontinuous")) {
            String id = "int-genz-" + family;
            for (JsonNode one : record(id).required("cases")) {
                String label = one.required("label").asString();
                int d = Integer.parseInt(label.replaceAll("d=(\\d+).*", "$1"));
                String formula = ours(one.required("integrand").asString());
                checks.add(check(
                        id,
                        label,
                        integral(unitCube(d), formula),
                        expected(one, "integral"),
                        expected(one, "variance_h")));
            }
        }
        return checks;
    }

    /// Sobol' g-function and Ishigami function: exact; x^(-1/3) and -ln(x): elementary.
    private static List<Check> otherIntegrals() {
        String g = "int-sobol-g";
        String i = "int-ishigami";
        String s = "int-singular";
        String cube = rangeClosed(1, 3)
                .mapToObj(k -> random("x" + k, "\"uniform\", \"from\": -3.141592653589793, \"to\": 3.141592653589793"))
                .collect(joining(",\n"));
        return List.of(
                check(
                        g,
                        "integral",
                        integral(unitCube(8), integrand(g)),
                        expected(g, "integral"),
                        expected(g, "variance_h")),
                check(i, "mean", mean(cube, integrand(i)), expected(i, "mean"), expected(i, "variance_h")),
                // the square of the square is x^(-4/3): its mean is infinite
                check(
                                s,
                                "a",
                                integral(unitCube(1).replace("x1", "x"), "x^(-1/3)"),
                                expected(s, "a_integral"),
                                expected(s, "a_variance"))
                        .kurtosis(Double.POSITIVE_INFINITY),
                check(
                        s,
                        "d",
                        integral(unitCube(1).replace("x1", "x"), "-log(x)"),
                        expected(s, "d_integral"),
                        expected(s, "d_variance")));
    }

    /// Keister (1996): over the whole space, drawn from normal densities of variance 1/2; closed form by Bessel series.
    private static List<Check> keister() {
        String id = "int-keister";
        List<Check> checks = new ArrayList<>();
        for (JsonNode one : record(id).required("cases")) {
            String label = one.required("label").asString();
            int d = Integer.parseInt(label.substring(2));
            String space = rangeClosed(1, d).mapToObj("""
                            {"name": "x%d", "range": ["-inf", "inf"],
                             "drawFrom": {"family": "normal", "mean": 0, "sd": 0.7071067811865476}}"""::formatted).collect(joining(",\n"));
            String square = terms(d, "x%d^2", "+");
            checks.add(check(
                    id,
                    label,
                    integral(space, "cos(sqrt(%s))*exp(-(%s))".formatted(square, square)),
                    expected(one, "integral"),
                    expected(one, "variance_h_under_normal_half")));
        }
        return checks;
    }

    /// Volume of the unit ball: exact. Once as the integral of an indicator, once as a probability.
    private static List<Check> balls() {
        String id = "int-ball-volume";
        List<Check> checks = new ArrayList<>();
        for (int d : new int[] {2, 3, 5, 10}) {
            String inside = terms(d, "x%d^2", "+") + " <= 1";
            String ranges = rangeClosed(1, d)
                    .mapToObj("{\"name\": \"x%d\", \"range\": [-1, 1]}"::formatted)
                    .collect(joining(",\n"));
            String inputs = rangeClosed(1, d)
                    .mapToObj(k -> random("x" + k, "\"uniform\", \"from\": -1, \"to\": 1"))
                    .collect(joining(",\n"));
            double p = expected(id, "fraction_d" + d);
            double variance = expected(id, "variance_h_d" + d);
            double cube = Math.pow(2, d);
            checks.add(check(
                            id,
                            "volume d=" + d,
                            integral(ranges, "[" + inside + "]"),
                            expected(id, "volume_d" + d),
                            cube * cube * variance)
                    .kurtosis(kurtosisOfEvent(p)));
            checks.add(event(id, "fraction d=" + d, inputs, inside, p));
        }
        return checks;
    }

    /// Four products and means over the unit cube, each with integral 1: exact. The kurtosis of the product of
    /// `abs(4x-2)` is about `3.2^d / variance^2`.
    private static List<Check> unitMeans() {
        String id = "int-unit-mean-products";
        List<Check> checks = new ArrayList<>();
        for (int d : new int[] {2, 5, 10, 20}) {
            double product = expected(id, "product_abs_d%d_variance_h".formatted(d));
            checks.add(check(id, "A d=" + d, integral(unitCube(d), terms(d, "abs(4*x%d-2)", "*")), 1, product)
                    .draws(d == 20 ? 4_000_000 : DRAWS)
                    .kurtosis(Math.max(USUAL_KURTOSIS, 1.5 * Math.pow(3.2, d) / (product * product))));
            checks.add(check(
                    id,
                    "B d=" + d,
                    integral(unitCube(d), "(%s)/%d".formatted(terms(d, "abs(4*x%d-2)", "+"), d)),
                    1,
                    expected(id, "mean_abs_d%d_variance_h".formatted(d))));
            double sines = expected(id, "product_sin_d%d_variance_h".formatted(d));
            // fourth moment of pi/2 sin(pi x): pi^4/16 * 3/8 = 2.283
            checks.add(check(id, "C d=" + d, integral(unitCube(d), terms(d, "(pi/2)*sin(pi*x%d)", "*")), 1, sines)
                    .kurtosis(Math.max(USUAL_KURTOSIS, 1.5 * Math.pow(2.283, d) / (sines * sines))));
            checks.add(check(
                    id,
                    "D d=" + d,
                    integral(unitCube(d), "(1+1/%d)^%d*%s".formatted(d, d, terms(d, "x%d^(1/" + d + ")", "*"))),
                    1,
                    expected(id, "morokoff_caflisch_d%d_variance_h".formatted(d))));
        }
        return checks;
    }

    /// exp(U): elementary. The records of other schemes are of the same mean, which independent points answer too.
    private static List<Check> exponentials() {
        String crude = "exp-expU-crude";
        String project = mean(random("u", "\"uniform\", \"from\": 0, \"to\": 1"), "exp(u)");
        return Stream.of(crude, "exp-expU-antithetic", "exp-expU-control", "exp-expU-stratified")
                .map(id -> check(id, "mean", project, expected(crude, "mean"), expected(crude, "variance_h")))
                .toList();
    }

    /// Call prices: closed form (Black and Scholes 1973) and backward recursion on a grid.
    private static List<Check> options() {
        String call = "exp-black-scholes-call";
        String asian = "exp-asian-call-4";
        return List.of(
                check(
                        call,
                        "price",
                        mean(normals("z"), integrand(call)),
                        expected(call, "price"),
                        expected(call, "variance_h")),
                event(
                        call,
                        "in the money",
                        normals("z"),
                        "100*exp(0.03+0.2*z) > 100",
                        expected(call, "probability_in_the_money")),
                check(
                        asian,
                        "arithmetic",
                        mean(normals("z1", "z2", "z3", "z4"), integrand(asian)),
                        expected(asian, "arithmetic_price"),
                        expected(asian, "arithmetic_variance_h")),
                check(
                        asian,
                        "geometric",
                        mean(
                                normals("z1", "z2", "z3", "z4"),
                                "exp(-0.05)*max(100*exp((0.075+0.1*(4*z1+3*z2+2*z3+z4))/4)-100,0)"),
                        expected(asian, "geometric_price"),
                        expected(asian, "geometric_variance_h")));
    }

    /// Expected maxima: Clark (1961), order statistics.
    private static List<Check> maxima() {
        String id = "exp-maxima";
        return List.of(
                check(
                        id,
                        "a",
                        mean(normals("x", "y"), "max(x, y)"),
                        expected(id, "a_mean"),
                        expected(id, "a_variance")),
                check(
                        id,
                        "b",
                        tied(mean(normals("x1", "x2"), "max(1 + 2*x1, x2)"), 2, (i, j) -> .3),
                        expected(id, "b_mean"),
                        expected(id, "b_variance")),
                check(
                        id,
                        "c",
                        mean(normals("z1", "z2", "z3", "z4", "z5"), "max(z1, z2, z3, z4, z5)"),
                        expected(id, "c_mean"),
                        expected(id, "c_variance")),
                check(
                        id,
                        "d",
                        mean(uniforms(10), "max(" + terms(10, "x%d", ", ") + ")"),
                        expected(id, "d_mean"),
                        expected(id, "d_variance")));
    }

    /// Moments of the lognormal: elementary. Its kurtosis for sigma = 1 is 113.9.
    private static List<Check> lognormals() {
        String id = "exp-lognormal-mean";
        return Stream.of("0.5", "1")
                .map(sigma -> {
                    JsonNode one = caseOf(id, "sigma=" + sigma);
                    return check(
                                    id,
                                    "sigma=" + sigma,
                                    mean(normals("z"), "exp(%s*z)".formatted(sigma)),
                                    expected(one, "mean"),
                                    expected(one, "variance_h"))
                            .kurtosis(114);
                })
                .toList();
    }

    /// Moments of the Pareto: elementary. The variance of x^p is the moment of 2p less the square of that of p.
    private static List<Check> paretos() {
        return List.of(
                pareto("1.5", "0.5", "1").kurtosis(Double.POSITIVE_INFINITY),
                pareto("2.5", "0.5", "1"),
                pareto("2.5", "1", "2").kurtosis(Double.POSITIVE_INFINITY),
                pareto("5", "0.5", "1"),
                pareto("5", "1", "2").kurtosis(74));
    }

    private static Check pareto(String alpha, String p, String twice) {
        String id = "exp-pareto-moments";
        JsonNode one = caseOf(id, "alpha=" + alpha);
        double moment = expected(one, "moment_" + p);
        String project = mean(random("u", "\"uniform\", \"from\": 0, \"to\": 1"), "(u^(-1/%s))^%s".formatted(alpha, p));
        return check(
                id,
                "alpha=%s p=%s".formatted(alpha, p),
                project,
                moment,
                expected(one, "moment_" + twice) - moment * moment);
    }

    /// Orthants and rectangles of the multivariate normal: Sheppard (1899) and later.
    private static List<Check> orthants() {
        String id = "prob-mvn-orthant";
        List<Check> checks = new ArrayList<>();
        for (String rho : List.of("0", "0.25", "0.5", "0.9", "-0.7")) {
            String name = "P(X1>0,X2>0; rho=%s)".formatted(rho);
            checks.add(tied(id, name, 2, (i, j) -> Double.parseDouble(rho), "x1 > 0 & x2 > 0"));
        }
        checks.add(tied(
                id,
                "P(all 3 >0; r12=.5,r13=.3,r23=-.2)",
                3,
                (i, j) -> i == 1 ? (j == 2 ? .5 : .3) : -.2,
                "x1 > 0 & x2 > 0 & x3 > 0"));
        for (int d : new int[] {4, 5, 10}) {
            String name = "P(all %d >0; all rho=1/2)".formatted(d);
            checks.add(tied(id, name, d, (i, j) -> .5, terms(d, "x%d > 0", " & ")));
        }
        checks.add(tied(id, "P(all 5 <=1; all rho=0.3)", 5, (i, j) -> .3, terms(5, "x%d <= 1", " & ")));
        checks.add(tied(id, "P(X<=1,Y<=0.5; rho=0.6)", 2, (i, j) -> .6, "x1 <= 1 & x2 <= 0.5"));
        return checks;
    }

    /// An event of standard normal inputs `x1` to `xd`.
    private static Check tied(String id, String name, int d, DoubleBinary correlation, String event) {
        String inputs = normals(rangeClosed(1, d).mapToObj(k -> "x" + k).toArray(String[]::new));
        double p = expected(id, name);
        String project = tied(project(inputs, "probability", event), d, correlation);
        return check(id, name, project, p, p * (1 - p)).kurtosis(kurtosisOfEvent(p));
    }

    /// With the inputs `x1` to `xd` tied by the correlations of the normals behind them.
    private static String tied(String project, int d, DoubleBinary correlation) {
        String pairs = rangeClosed(1, d)
                .boxed()
                .flatMap(i -> rangeClosed(i + 1, d)
                        .mapToObj(j ->
                                "{\"of\": [\"x%d\", \"x%d\"], \"pearson\": %s}".formatted(i, j, correlation.of(i, j))))
                .collect(joining(", "));
        return project.replace(
                "\"ask\"", "\"dependence\": {\"copula\": \"gaussian\", \"pairs\": [%s]}, \"ask\"".formatted(pairs));
    }

    private interface DoubleBinary {
        double of(int i, int j);
    }

    /// Owen (1956); Patefield and Tandy (2000) for T(0.0625, 0.25).
    private static List<Check> owensT() {
        String id = "prob-owens-t";
        return Stream.of("0.5,0.8", "1,1", "2,0.5", "0.0625,0.25", "4,3", "0,2")
                .map(arguments -> {
                    String[] ha = arguments.split(",");
                    String name = "T(%s)".formatted(arguments);
                    String formula = "x>%s & y>0 & y<%s*x".formatted(ha[0], ha[1]);
                    return event(id, name, normals("x", "y"), formula, expected(id, name))
                            .draws(arguments.equals("4,3") ? 4_000_000 : DRAWS);
                })
                .toList();
    }

    /// Resistance and load, normal and lognormal: closed form.
    private static List<Check> resistance() {
        String id = "prob-resistance-load";
        String a = random("R", "\"normal\", \"mean\": 200, \"sd\": 20") + ",\n"
                + random("S", "\"normal\", \"mean\": 150, \"sd\": 15");
        String b = random("R", "\"lognormal\", \"mean\": 200, \"sd\": 20") + ",\n"
                + random("S", "\"lognormal\", \"mean\": 120, \"sd\": 24");
        return List.of(
                event(id, "a_probability", a, "R < S", expected(id, "a_probability")),
                event(id, "b_probability", b, "R < S", expected(id, "b_probability")));
    }

    /// Sums and counting events: gamma tail, Irwin-Hall, enumeration.
    private static List<Check> sums() {
        String id = "prob-sums-and-counting";
        String lives = rangeClosed(1, 10)
                .mapToObj(k -> random("x" + k, "\"exponential\", \"mean\": 1"))
                .collect(joining(",\n"));
        String days = rangeClosed(1, 23)
                .boxed()
                .flatMap(i -> rangeClosed(i + 1, 23).mapToObj(j -> "floor(365*x%d) == floor(365*x%d)".formatted(i, j)))
                .collect(joining(" | "));
        return List.of(
                event(id, lives, terms(10, "x%d", "+") + " > 30", "P(sum of 10 Exp(1) > 30)")
                        .draws(4_000_000),
                event(id, lives, terms(10, "x%d", "+") + " < 2", "P(sum of 10 Exp(1) < 2)")
                        .draws(4_000_000),
                event(id, uniforms(12), terms(12, "x%d", "+") + " > 9", "P(sum of 12 U(0,1) > 9)")
                        .draws(1_000_000),
                event(id, uniforms(10), terms(10, "floor(6*x%d)", "+") + " + 10 >= 45", "P(sum of 10 dice >= 45)"),
                event(id, uniforms(23), days, "P(shared birthday among 23)"),
                event(id, uniforms(2), "abs(x1 - x2) < 0.1", "P(|U1-U2|<0.1), U uniform"),
                event(
                        id,
                        uniforms(2),
                        "max(min(x1, x2), abs(x1 - x2), 1 - max(x1, x2)) < 0.5",
                        "P(three random broken-stick pieces form a triangle)"));
    }

    /// Buffon's needle; product and ratio of normals: product-normal density, 50-digit quadrature.
    private static List<Check> needles() {
        String id = "prob-buffon-normal-product";
        String needle = random("y", "\"uniform\", \"from\": 0, \"to\": 1") + ",\n"
                + random("theta", "\"uniform\", \"from\": 0, \"to\": 3.141592653589793");
        return List.of(
                event(id, needle, "y < 0.5*sin(theta)", "a"),
                event(id, normals("z1", "z2"), "z1*z2 > 1", "b"),
                event(id, normals("z1", "z2"), "z1/z2 > 3", "c"),
                event(id, normals("z1", "z2"), "z1^2+z2^2 > 9", "d"));
    }

    private static Check check(String id, String part, String project, double value, double variance) {
        return new Check(id, part, project, value, variance, DRAWS, USUAL_KURTOSIS);
    }

    private static Check event(String id, String inputs, String formula, String name) {
        return event(id, name, inputs, formula, expected(id, name));
    }

    private static Check event(String id, String part, String inputs, String formula, double p) {
        String project = project(inputs, "probability", formula);
        return check(id, part, project, p, p * (1 - p)).kurtosis(kurtosisOfEvent(p));
    }

    private static double kurtosisOfEvent(double p) {
        return 1 / (p * (1 - p)) - 3;
    }

    private static String integrand(String id) {
        return ours(record(id).required("integrand").asString());
    }

    private static String ours(String formula) {
        return formula.replaceAll("\\bln\\(", "log(")
                .replaceAll("\\bor\\b", "|")
                .replaceAll("\\band\\b", "&");
    }

    private static String terms(int d, String term, String between) {
        return rangeClosed(1, d).mapToObj(k -> term.replace("%d", "" + k)).collect(joining(between));
    }

    private static String unitCube(int d) {
        return rangeClosed(1, d)
                .mapToObj("{\"name\": \"x%d\", \"range\": [0, 1]}"::formatted)
                .collect(joining(",\n"));
    }

    private static String uniforms(int d) {
        return rangeClosed(1, d)
                .mapToObj(k -> random("x" + k, "\"uniform\", \"from\": 0, \"to\": 1"))
                .collect(joining(",\n"));
    }

    private static String normals(String... names) {
        return Stream.of(names)
                .map(name -> random(name, "\"normal\", \"mean\": 0, \"sd\": 1"))
                .collect(joining(",\n"));
    }

    private static String random(String name, String density) {
        return "{\"name\": \"%s\", \"density\": {\"family\": %s}}".formatted(name, density);
    }

    private static String mean(String inputs, String formula) {
        return project(inputs, "mean", formula);
    }

    private static String integral(String inputs, String formula) {
        return project(inputs, "integral", formula);
    }

    private static String project(String inputs, String estimand, String formula) {
        return """
                {"leadline": 1, "inputs": [
                %s], "ask": {"%s": "%s"}}
                """.formatted(inputs, estimand, formula);
    }
}
