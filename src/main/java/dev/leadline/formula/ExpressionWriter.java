package dev.leadline.formula;

import dev.leadline.formula.Names.Meaning;
import dev.leadline.formula.Ordering.Item;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/// Writes checked formulas into one [Expression]. Confined to one check.
final class ExpressionWriter {
    private final Expression expression = new Expression();
    private final Names names;
    private final Map<String, Integer> columns = new HashMap<>();
    private final Map<String, Integer> steps = new HashMap<>();

    ExpressionWriter(List<String> inputs, Names names) {
        this.names = names;
        for (int i = 0; i < inputs.size(); i++) columns.put(Names.composed(inputs.get(i)), i);
    }

    Expression expression() {
        return expression;
    }

    /// Writes a step, after those that it uses.
    void step(String name, List<Token> tokens) {
        steps.put(name, write(tokens));
    }

    int stepNode(String name) {
        return steps.get(name);
    }

    /// @return node of the formula
    int write(List<Token> tokens) {
        var values = new Values();
        for (Item item : Ordering.of(tokens)) {
            values.push(
                    switch (item) {
                        case Item.Operand(Token token) -> operand(token);
                        case Item.Negation _ -> expression.negate(values.pop());
                        case Item.Binary(String symbol) -> {
                            int b = values.pop();
                            yield binary(symbol, values.pop(), b);
                        }
                        case Item.Call(String function, int arguments) -> call(function, values.pop(arguments));
                    });
        }
        return values.pop();
    }

    private int operand(Token token) {
        if (token.kind() == Token.Kind.NUMBER) return expression.number(Double.parseDouble(token.text()));
        return switch (names.meaning(token.text()).orElseThrow()) {
            case Meaning.Input _ -> expression.column(columns.get(token.text()));
            case Meaning.Constant(double value) -> expression.number(value);
            case Meaning.Step _ -> steps.get(token.text());
        };
    }

    private int binary(String symbol, int a, int b) {
        return switch (symbol) {
            case "+" -> expression.add(a, b);
            case "-" -> expression.subtract(a, b);
            case "*" -> expression.multiply(a, b);
            case "/" -> expression.divide(a, b);
            case "^" -> expression.power(a, b);
            case "<" -> expression.less(a, b);
            case ">" -> expression.less(b, a);
            case "<=" -> expression.lessOrEqual(a, b);
            case ">=" -> expression.lessOrEqual(b, a);
            case "==" -> expression.equal(a, b);
            case "!=" -> expression.unequal(a, b);
            case "&" -> expression.and(a, b);
            case "|" -> expression.or(a, b);
            default -> throw new IllegalStateException(symbol);
        };
    }

    private int call(String function, int[] values) {
        if (function.equals("[")) return expression.truth(values[0]);
        if (function.equals("not")) return expression.not(values[0]);
        if (function.equals("if")) return expression.choose(values[0], values[1], values[2]);
        Operation operation = Functions.operation(function).orElseThrow();
        if (values.length == 1) return expression.function(operation, values[0]);
        return Arrays.stream(values)
                .reduce((a, b) -> expression.function(operation, a, b))
                .orElseThrow();
    }

    /// The nodes whose readers are still to come.
    private static final class Values {
        private final ArrayList<Integer> nodes = new ArrayList<>();

        void push(int node) {
            nodes.add(node);
        }

        int pop() {
            return nodes.removeLast();
        }

        /// The last `count`, in the order in which they were pushed.
        int[] pop(int count) {
            int[] last = new int[count];
            for (int i = count - 1; i >= 0; i--) last[i] = pop();
            return last;
        }
    }
}
