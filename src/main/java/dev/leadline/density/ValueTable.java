package dev.leadline.density;

import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;

/// Values, each with a probability of its own: a table from records or from judgement. Immutable.
///
/// Values may be given in any order; equal ones are one, with the sum of their probabilities, and those of probability
/// 0 are left out. Probabilities that add up to 1 within 1e-9 are divided by their sum, so that they do to rounding.
///
/// Sums are compensated and begin at their own end, so that both tails are accurate to a few units of the last digit.
public final class ValueTable implements Discrete {
    private static final int MOST = 100_000;
    private static final double NEAR_ONE = 1e-9;

    private final double[] values;
    private final double[] masses;
    private final double[] below;
    private final double[] above;

    private ValueTable(double[] values, double[] masses) {
        this.values = values;
        this.masses = masses;
        this.below = new double[values.length];
        this.above = new double[values.length];
        var sum = new Sum(0);
        for (int i = 0; i < values.length; i++) {
            sum.add(masses[i]);
            below[i] = sum.value();
        }
        below[values.length - 1] = 1;
        sum = new Sum(0);
        for (int i = values.length - 1; i >= 0; i--) {
            above[i] = sum.value();
            sum.add(masses[i]);
        }
    }

    /// @throws Refusal with every problem found, each at `values[i]`, `probabilities[i]`, `values` or `probabilities`
    public static ValueTable of(double[] values, double[] probabilities) {
        double sum = check(values, probabilities);
        int[] order = IntStream.range(0, values.length)
                .filter(i -> probabilities[i] > 0)
                .boxed()
                .sorted((i, j) -> Double.compare(values[i] + 0.0, values[j] + 0.0))
                .mapToInt(i -> i)
                .toArray();
        var distinct = new double[order.length];
        var masses = new double[order.length];
        int n = 0;
        for (int i : order) {
            if (n == 0 || values[i] != distinct[n - 1]) {
                distinct[n++] = values[i] + 0.0;
            }
            masses[n - 1] += probabilities[i] / sum;
        }
        return new ValueTable(Arrays.copyOf(distinct, n), Arrays.copyOf(masses, n));
    }

    private static double check(double[] values, double[] probabilities) {
        var problems = new ArrayList<Problem>();
        if (values.length == 0) {
            problems.add(Problem.of("a table needs at least one value").at(Place.of("values")));
        }
        if (values.length > MOST) {
            problems.add(Problem.of("a table of %d values is too long".formatted(values.length))
                    .because("It may have at most %d values.".formatted(MOST))
                    .tryThis("Give the records themselves as data, or combine neighbouring values.")
                    .at(Place.of("values")));
        }
        if (values.length != probabilities.length) {
            problems.add(Problem.of("the number of probabilities is %d but must be %d, that of the values"
                            .formatted(probabilities.length, values.length))
                    .because("Every value has one probability.")
                    .tryThis("See which is missing or left over.")
                    .at(Place.of("probabilities")));
        }
        for (int i = 0; i < values.length; i++) {
            if (!Double.isFinite(values[i])) {
                problems.add(broken("values[%d]".formatted(i), values[i], "a finite number", ""));
            }
        }
        var sum = new Sum(0);
        for (int i = 0; i < probabilities.length; i++) {
            if (!(probabilities[i] >= 0 && probabilities[i] <= 1 + NEAR_ONE)) {
                problems.add(broken(
                        "probabilities[%d]".formatted(i),
                        probabilities[i],
                        "at least 0 and at most 1",
                        "A probability is a share of all cases."));
            }
            sum.add(probabilities[i]);
        }
        if (problems.isEmpty() && !(Math.abs(sum.value() - 1) <= NEAR_ONE)) {
            problems.add(Problem.of(
                            "the probabilities add up to %s but must add up to 1".formatted(Shortest.text(sum.value())))
                    .because("The table must say what happens in all cases.")
                    .tryThis("Divide each by their sum, or add the value that is missing.")
                    .at(Place.of("probabilities")));
        }
        if (!problems.isEmpty()) {
            throw new Refusal(problems);
        }
        return sum.value();
    }

    private static Problem broken(String name, double value, String words, String why) {
        return Rule.problem(name, value, words, why, "");
    }

    /// The values, rising; as many as have a probability.
    public List<Double> values() {
        return Arrays.stream(values).boxed().toList();
    }

    /// The probabilities in the order of the values.
    public List<Double> probabilities() {
        return Arrays.stream(masses).boxed().toList();
    }

    /// Where the last value is that is not above x; -1 where there is none.
    private int at(double x) {
        int found = Arrays.binarySearch(values, x + 0.0);
        return found >= 0 ? found : -found - 2;
    }

    @Override
    public double next(double x) {
        return values[at(x) + 1];
    }

    @Override
    public double pdf(double x) {
        int i = Double.isNaN(x) ? -1 : at(x);
        return i >= 0 && values[i] == x ? masses[i] : Double.isNaN(x) ? x : 0;
    }

    @Override
    public double logPdf(double x) {
        return Log.log(pdf(x));
    }

    @Override
    public double cdf(double x) {
        return Double.isNaN(x) ? x : at(x) < 0 ? 0 : below[at(x)];
    }

    @Override
    public double survival(double x) {
        return Double.isNaN(x) ? x : at(x) < 0 ? 1 : above[at(x)];
    }

    @Override
    public double inner(double p) {
        return p <= 0.5 ? values[first(i -> below[i] >= p * (1 - ROUNDING))] : upperInner(1 - p);
    }

    @Override
    public double upperInner(double q) {
        return q <= 0.5 ? values[first(i -> above[i] <= q * (1 + ROUNDING))] : inner(1 - q);
    }

    /// The first place where something holds that holds for all later ones, and for the last.
    private int first(IntPredicate holds) {
        int no = -1;
        int yes = values.length - 1;
        while (yes - no > 1) {
            int middle = (no + yes) >>> 1;
            if (holds.test(middle)) {
                yes = middle;
            } else {
                no = middle;
            }
        }
        return yes;
    }

    @Override
    public double mean() {
        double shift = values[0];
        return shift + moment(x -> x - shift);
    }

    @Override
    public double variance() {
        double mean = mean();
        return moment(x -> (x - mean) * (x - mean));
    }

    @Override
    public double skewness() {
        double mean = mean();
        double sd = Math.sqrt(variance());
        return moment(x -> (x - mean) / sd * ((x - mean) / sd) * ((x - mean) / sd));
    }

    @Override
    public double excessKurtosis() {
        double mean = mean();
        double variance = variance();
        return moment(x -> (x - mean) * (x - mean) / variance * ((x - mean) * (x - mean) / variance)) - 3;
    }

    private double moment(DoubleUnaryOperator f) {
        var sum = new Sum(0);
        for (int i = 0; i < values.length; i++) {
            sum.add(masses[i] * f.applyAsDouble(values[i]));
        }
        return sum.value();
    }

    @Override
    public Support support() {
        return new Support(values[0], values[values.length - 1]);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof ValueTable table
                && Arrays.equals(values, table.values)
                && Arrays.equals(masses, table.masses);
    }

    @Override
    public int hashCode() {
        return 31 * Arrays.hashCode(values) + Arrays.hashCode(masses);
    }

    @Override
    public String toString() {
        return "ValueTable[%d values from %s to %s]"
                .formatted(values.length, Shortest.text(values[0]), Shortest.text(values[values.length - 1]));
    }
}
