package dev.leadline.density;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;
import java.util.function.Function;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/// Entry of a member by two of its quantiles, named by their percentages (`q5` and `q95`), which settle two of its
/// parameters. Immutable.
///
/// @param given rules of the parameters that are given beside them
/// @param solver solves for the member
record ByQuantiles(List<Rule> given, Solver solver) {
    /// How the two are named where no other percentages are given.
    private static final List<String> USUAL = List.of("q5", "q95");

    private static final Pattern NAME = Pattern.compile("q(\\d{1,2}(?:\\.\\d{1,15})?)");
    private static final String VALUE = "a finite number";

    /// A value and the probability of a smaller one.
    record Quantile(String name, double p, double x) {}

    interface Solver {
        /// @param given values in the order of the rules
        /// @param low the one of the smaller probability and value
        Density solve(double[] given, Quantile low, Quantile high);
    }

    /// @param maker from the given parameters, location and scale
    static ByQuantiles ofLocationAndScale(Function<double[], Density> maker, Rule... given) {
        return new ByQuantiles(List.of(given), (values, low, high) -> {
            Density standard = maker.apply(and(values, 0, 1));
            double scale = (high.x - low.x) / (standard.quantile(high.p) - standard.quantile(low.p));
            return maker.apply(and(values, low.x - scale * standard.quantile(low.p), scale));
        });
    }

    /// @param maker from shape and scale
    static ByQuantiles ofPositiveShapeAndScale(double least, double most, Function<double[], Density> maker) {
        return new ByQuantiles(List.of(), (_, low, high) -> ofShape(least, most, maker, 0, low, high));
    }

    /// @param maker from shape, scale and least value
    static ByQuantiles ofShapeAndScale(double least, double most, Function<double[], Density> maker) {
        return new ByQuantiles(
                List.of(Rule.finite("from", "least value").or(0)),
                (given, low, high) -> ofShape(least, most, maker, given[0], low, high));
    }

    /// Solved by bisection of the ratio of the two quantiles, which falls or rises with the shape.
    ///
    /// @param least smallest shape
    /// @param most largest shape
    /// @param maker from shape, scale and least value
    private static Density ofShape(
            double least, double most, Function<double[], Density> maker, double from, Quantile low, Quantile high) {
        if (!(low.x > from)) {
            throw new Refusal(Rule.problem(
                    low.name,
                    low.x,
                    "greater than " + (from == 0 ? "0" : "from, " + Shortest.text(from)),
                    "All values lie above that.",
                    ""));
        }
        double wanted = Log.log((high.x - from) / (low.x - from));
        DoubleUnaryOperator excess = s -> {
            Density unit = maker.apply(new double[] {s, 1, 0});
            return Log.log(unit.quantile(high.p)) - Log.log(unit.quantile(low.p)) - wanted;
        };
        double shape = shape(least, most, excess, low, high);
        double unit = maker.apply(new double[] {shape, 1, 0}).quantile(high.p);
        return maker.apply(new double[] {shape, (high.x - from) / unit, from});
    }

    private static double shape(double least, double most, DoubleUnaryOperator excess, Quantile low, Quantile high) {
        double a = Log.log(least);
        double b = Log.log(most);
        boolean falls = excess.applyAsDouble(least) > 0;
        if (falls == excess.applyAsDouble(most) > 0) {
            throw new Refusal(Problem.of("no member of the family has these two quantiles")
                    .because("%s = %s and %s = %s are too close together or too far apart for it."
                            .formatted(low.name, Shortest.text(low.x), high.name, Shortest.text(high.x)))
                    .tryThis("Take a family with another spread, or check the two values.")
                    .at(Place.of(high.name)));
        }
        for (int trial = 0; trial < 80; trial++) {
            double middle = 0.5 * (a + b);
            if (excess.applyAsDouble(Exp.exp(middle)) > 0 == falls) {
                a = middle;
            } else {
                b = middle;
            }
        }
        return Exp.exp(0.5 * (a + b));
    }

    private static double[] and(double[] given, double location, double scale) {
        double[] all = new double[given.length + 2];
        System.arraycopy(given, 0, all, 0, given.length);
        all[given.length] = location;
        all[given.length + 1] = scale;
        return all;
    }

    /// Whether a parameter is named like a quantile.
    static boolean isName(String parameter) {
        return probability(parameter).isPresent();
    }

    private static OptionalDouble probability(String parameter) {
        var name = NAME.matcher(parameter);
        if (!name.matches()) {
            return OptionalDouble.empty();
        }
        double p = new BigDecimal(name.group(1)).movePointLeft(2).doubleValue();
        return p > 0 && p < 1 ? OptionalDouble.of(p) : OptionalDouble.empty();
    }

    List<Parameter> parameters() {
        var quantiles = USUAL.stream()
                .map(name -> new Parameter(
                        name, VALUE, false, name.substring(1) + " % of the values are below; q1, q50, q99.9 likewise"));
        return Stream.concat(given.stream().map(Rule::parameter), quantiles).toList();
    }

    /// The member with the quantiles among the parameters.
    Density of(Map<String, Double> parameters) {
        var quantiles = parameters.entrySet().stream()
                .filter(entry -> isName(entry.getKey()))
                .map(entry ->
                        new Quantile(entry.getKey(), probability(entry.getKey()).orElseThrow(), entry.getValue()))
                .sorted(Comparator.comparingDouble(Quantile::p))
                .toList();
        var problems = new ArrayList<Problem>();
        quantiles.stream()
                .filter(quantile -> !Double.isFinite(quantile.x))
                .forEach(quantile -> problems.add(Rule.problem(quantile.name, quantile.x, VALUE, "", "")));
        if (quantiles.size() != 2) {
            problems.add(Problem.of(
                            quantiles.size() == 1
                                    ? quantiles.getFirst().name + " stands alone"
                                    : "there are %d quantiles".formatted(quantiles.size()))
                    .because("Two quantiles settle two parameters.")
                    .tryThis("Give two, as q5 and q95.")
                    .at(Place.of(quantiles.getLast().name)));
        } else if (quantiles.get(0).p == quantiles.get(1).p) {
            problems.add(Problem.of(
                            "%s and %s are the same quantile".formatted(quantiles.get(0).name, quantiles.get(1).name))
                    .because("Two quantiles settle two parameters.")
                    .at(Place.of(quantiles.get(1).name)));
        } else if (problems.isEmpty() && !(quantiles.get(0).x < quantiles.get(1).x)) {
            problems.add(Rule.problem(
                    quantiles.get(1).name,
                    quantiles.get(1).x,
                    "greater than %s, which is %s".formatted(quantiles.get(0).name, Shortest.text(quantiles.get(0).x)),
                    "A larger share of the values is below the larger quantile.",
                    ""));
        } else if (problems.isEmpty()) {
            problems.addAll(Uniform.rising(
                    quantiles.get(0).name, quantiles.get(0).x, quantiles.get(1).name, quantiles.get(1).x));
        }
        double[] values = new double[given.size()];
        for (int i = 0; i < values.length; i++) {
            Rule rule = given.get(i);
            Optional<Double> value = Optional.ofNullable(parameters.get(rule.name()));
            if (value.isEmpty() && rule.otherwise().isEmpty()) {
                problems.add(Problem.of(rule.name() + " is missing")
                        .because("It is given beside the two quantiles.")
                        .at(Place.of(rule.name())));
            } else {
                values[i] = value.orElseGet(() -> rule.otherwise().orElseThrow());
                rule.broken(values[i]).ifPresent(problems::add);
            }
        }
        if (!problems.isEmpty()) {
            throw new Refusal(problems);
        }
        return solver.solve(values, quantiles.get(0), quantiles.get(1));
    }
}
