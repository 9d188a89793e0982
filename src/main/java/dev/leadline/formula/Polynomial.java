package dev.leadline.formula;

import dev.leadline.formula.Node.Apply;
import dev.leadline.formula.Node.Column;
import dev.leadline.formula.Node.Number;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.function.IntFunction;

/// A formula as a sum of products of powers of its inputs, each input measured from a place of its own in
/// a unit of its own: `x = location + scale z`. Around the inputs' means, terms that would cancel do so
/// before anything is rounded.
///
/// @param terms coefficients by the powers of the inputs, which are known by their index
public record Polynomial(Map<SortedMap<Integer, Integer>, Double> terms) {
    /// Terms written down in all: a tenth of a second.
    private static final int MOST_WORK = 200_000;

    private static final int HIGHEST_POWER = 100;

    /// How an input is measured.
    public record Measured(double location, double scale) {}

    public Polynomial {
        terms = Map.copyOf(terms);
    }

    /// @throws Refusal where the formula is none, saying what it does instead
    static Polynomial of(Expression expression, int node, IntFunction<Measured> measures) {
        return new Writer(expression.nodes(), measures).written(node);
    }

    private static Polynomial number(double value) {
        return new Polynomial(value == 0 ? Map.of() : Map.of(new TreeMap<>(), value));
    }

    private boolean isNumber() {
        return terms.keySet().stream().allMatch(Map::isEmpty);
    }

    private double value() {
        return terms.getOrDefault(new TreeMap<>(), 0.0);
    }

    private Polynomial plus(Polynomial other, double times) {
        var sum = new HashMap<>(terms);
        other.terms.forEach((powers, coefficient) -> add(sum, powers, times * coefficient));
        return new Polynomial(sum);
    }

    private Polynomial times(Polynomial other) {
        var product = new HashMap<SortedMap<Integer, Integer>, Double>();
        terms.forEach((left, a) -> other.terms.forEach((right, b) -> {
            var powers = new TreeMap<>(left);
            right.forEach((input, power) -> powers.merge(input, power, Integer::sum));
            add(product, powers, a * b);
        }));
        return new Polynomial(product);
    }

    private static void add(
            Map<SortedMap<Integer, Integer>, Double> sum, SortedMap<Integer, Integer> powers, double by) {
        if (sum.merge(powers, by, Double::sum) == 0) {
            sum.remove(powers);
        }
    }

    private static Refusal refusal(String reason) {
        return new Refusal(Problem.of(reason));
    }

    /// Goes through the nodes in their order, so that formulas may be deep.
    private static final class Writer {
        private final List<Node> nodes;
        private final IntFunction<Measured> measures;
        private final Polynomial[] written;
        private long work;

        Writer(List<Node> nodes, IntFunction<Measured> measures) {
            this.nodes = nodes;
            this.measures = measures;
            this.written = new Polynomial[nodes.size()];
        }

        Polynomial written(int node) {
            boolean[] needed = new boolean[node + 1];
            needed[node] = true;
            for (int i = node; i >= 0; i--) {
                if (needed[i] && nodes.get(i) instanceof Apply(var _, int a, int b, int c)) {
                    needed[a] = true;
                    needed[b < 0 ? a : b] = true;
                    needed[c < 0 ? a : c] = true;
                }
            }
            for (int i = 0; i <= node; i++) {
                if (needed[i]) {
                    written[i] = of(nodes.get(i));
                    work += written[i].terms.size();
                    if (work > MOST_WORK) {
                        throw refusal("multiplied out it has too many terms");
                    }
                }
            }
            return written[node];
        }

        private Polynomial of(Node node) {
            return switch (node) {
                case Number(double value) -> number(value);
                case Column(int index) -> input(index);
                case Apply(var operation, int a, int b, int _) ->
                    switch (operation) {
                        case NEGATE -> number(0).plus(written[a], -1);
                        case ADD -> written[a].plus(written[b], 1);
                        case SUBTRACT -> written[a].plus(written[b], -1);
                        case MULTIPLY -> product(written[a], written[b]);
                        case DIVIDE -> quotient(written[a], written[b]);
                        case POWER -> power(written[a], written[b]);
                        case LESS, LESS_OR_EQUAL, EQUAL, UNEQUAL, TRUTH, IF -> throw refusal("it compares or chooses");
                        case GAMMA_FN, NORMAL_CDF, NORMAL_PDF, NORMAL_QUANTILE ->
                            throw refusal("it takes a special function of an input");
                        default ->
                            throw refusal("it takes %s of an input"
                                    .formatted(operation.name().toLowerCase(Locale.ROOT)));
                    };
            };
        }

        private Polynomial input(int index) {
            var measured = measures.apply(index);
            var input = new Polynomial(Map.of(new TreeMap<>(Map.of(index, 1)), 1.0));
            return number(measured.location).plus(input, measured.scale);
        }

        private Polynomial product(Polynomial a, Polynomial b) {
            work += (long) a.terms.size() * b.terms.size();
            if (work > MOST_WORK) {
                throw refusal("multiplied out it has too many terms");
            }
            return a.times(b);
        }

        private static Polynomial quotient(Polynomial a, Polynomial b) {
            if (!b.isNumber()) {
                throw refusal("it divides by an input");
            }
            return number(0).plus(a, 1 / b.value());
        }

        private Polynomial power(Polynomial a, Polynomial exponent) {
            double p = exponent.isNumber() ? exponent.value() : Double.NaN;
            if (!(p >= 0 && p <= HIGHEST_POWER && p == Math.rint(p))) {
                throw refusal("it has a power that is no small whole number");
            }
            Polynomial product = number(1);
            for (int i = 0; i < p; i++) {
                product = product(product, a);
            }
            return product;
        }
    }
}
