package dev.leadline.formula;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import net.objecthunter.exp4j.Expression;
import net.objecthunter.exp4j.ExpressionBuilder;
import net.objecthunter.exp4j.function.Function;
import net.objecthunter.exp4j.operator.Operator;
import org.junit.jupiter.api.Test;

/// Random formulas against two evaluators that share no code with blocks: exp4j's own, which reads the formula's text
/// with its own tokenizer, and the tree from which the text was written. Both use the functions of one draw, so all
/// three must agree to the bit; only the sign of a `NaN` is free.
class OracleTest {
    private static final int FORMULAS = 6_000;
    private static final int ROWS = 13;

    /// Every input takes each of these, and random values.
    private static final double[] SPECIAL = {
        0, -0.0, 1, -1, Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY, 2, .5, Double.MIN_VALUE, 1e300
    };

    @Test
    void blocksAgreeWithExp4jToTheBit() {
        int conditions = 0;
        int withSteps = 0;
        for (long seed = 0; seed < FORMULAS; seed++) {
            var made = new RandomFormula(seed);
            List<String> steps = made.steps();
            String text = "seed " + seed + ": " + made.formula() + " with " + steps;
            double[][] columns = columns(seed);
            var working = Working.of(RandomFormula.INPUTS, new LinkedHashMap<>(), steps, List.of(made.formula()));
            double[][] results = new double[1][ROWS];
            working.program().evaluate(columns, ROWS, results, working.program().workspace());
            Expression oracle = exp4j(made.forExp4j());
            for (int row = 0; row < ROWS; row++) {
                double[] inputs = new double[columns.length];
                for (int i = 0; i < inputs.length; i++) {
                    inputs[i] = columns[i][row];
                    oracle.setVariable(RandomFormula.INPUTS.get(i), inputs[i]);
                }
                String where = text + " at " + java.util.Arrays.toString(inputs);
                double expected = made.value(inputs);
                assertSameBits(expected, results[0][row], where);
                assertSameBits(expected, oracle.evaluate(), "exp4j, " + where);
                if (working.isEvent(0)) assertTrue(expected == 0 || expected == 1 || Double.isNaN(expected), where);
            }
            if (working.isEvent(0)) conditions++;
            if (!steps.isEmpty()) withSteps++;
        }
        assertTrue(conditions > FORMULAS / 10 && withSteps > FORMULAS / 4, conditions + " events, " + withSteps);
    }

    private static void assertSameBits(double expected, double actual, String where) {
        assertEquals(
                Double.doubleToLongBits(expected),
                Double.doubleToLongBits(actual),
                () -> where + ": expected " + expected + ", was " + actual);
    }

    private static double[][] columns(long seed) {
        var random = new SplittableRandom(seed + 1_000_000);
        double[][] columns = new double[RandomFormula.INPUTS.size()][ROWS];
        for (double[] column : columns) {
            for (int row = 0; row < ROWS; row++) {
                column[row] = random.nextInt(3) == 0
                        ? SPECIAL[random.nextInt(SPECIAL.length)]
                        : random.nextInt(-3, 4) + (random.nextBoolean() ? random.nextDouble() : 0);
            }
        }
        return columns;
    }

    /// Division is registered again because exp4j's throws at 0, powers because exp4j's are `Math.pow`.
    private static Expression exp4j(String text) {
        var builder = new ExpressionBuilder(text).variables(RandomFormula.INPUTS.toArray(String[]::new));
        Map<String, Integer> comparisons =
                Map.of("|", 100, "&", 200, "<", 300, "<=", 300, ">", 300, ">=", 300, "==", 300, "!=", 300);
        comparisons.forEach((symbol, precedence) -> builder.operator(operator(symbol, true, precedence)));
        builder.operator(operator("/", true, Operator.PRECEDENCE_DIVISION));
        builder.operator(operator("^", false, Operator.PRECEDENCE_POWER));
        Map<String, Integer> functions = new LinkedHashMap<>(Map.of("max", 2, "min", 2, "not", 1, "if", 3));
        for (String simple : List.of("exp", "log", "sqrt", "abs", "sign", "sin", "floor", "tanh", "cbrt")) {
            functions.put(simple, 1);
        }
        List<Function> registered = new ArrayList<>();
        functions.forEach((name, values) -> registered.add(new Function(name, values) {
            @Override
            public double apply(double... arguments) {
                return OurWords.apply(name, arguments);
            }
        }));
        return builder.functions(registered).build();
    }

    private static Operator operator(String symbol, boolean leftAssociative, int precedence) {
        return new Operator(symbol, 2, leftAssociative, precedence) {
            @Override
            public double apply(double... values) {
                return OurWords.apply(symbol, values);
            }
        };
    }
}
