package dev.leadline.formula;

import java.util.ArrayDeque;
import java.util.Arrays;
import java.util.Deque;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import net.objecthunter.exp4j.function.Function;
import net.objecthunter.exp4j.operator.Operator;
import net.objecthunter.exp4j.shuntingyard.ShuntingYard;
import net.objecthunter.exp4j.tokenizer.FunctionToken;
import net.objecthunter.exp4j.tokenizer.OperatorToken;
import net.objecthunter.exp4j.tokenizer.VariableToken;

/// Brings the tokens of a checked formula into postfix order.
///
/// The order is exp4j's. It gets no text of a person's: every operand is renamed `v0`, `v1` …, every call `f0`, `f1` …,
/// and all stand apart by one space. So its tokenizer, whose time grows with the square of a run of letters or signs,
/// takes a constant time for each token, and finds neither numbers, nor functions of its own, nor implicit products. A
/// sum of 50,000 terms takes .1 s (`LimitsTest`).
final class Ordering {

    /// A part of a formula in postfix order.
    sealed interface Item {
        /// A number or a name.
        record Operand(Token token) implements Item {}

        record Negation() implements Item {}

        record Binary(String symbol) implements Item {}

        /// @param function its name, or `[` for Iverson's bracket
        record Call(String function, int arguments) implements Item {}
    }

    /// The operators that exp4j does not have. Its own stand from 500 (sums) to 10,000 (powers).
    private static final Map<String, Operator> OPERATORS =
            operators(Map.of("|", 100, "&", 200, "<", 300, "<=", 300, ">", 300, ">=", 300, "==", 300, "!=", 300));

    private final Map<String, String> nameOfOperand = new HashMap<>();
    private final Map<String, Token> operands = new HashMap<>();
    private final Map<Item.Call, String> nameOfCall = new HashMap<>();
    private final Map<String, Function> calls = new HashMap<>();
    private final StringBuilder renamed = new StringBuilder();

    private Ordering() {}

    /// @param tokens a formula against which [Grammar] has nothing
    static List<Item> of(List<Token> tokens) {
        var ordering = new Ordering();
        ordering.rename(tokens);
        return ordering.items();
    }

    private void rename(List<Token> tokens) {
        int[] arguments = argumentsOf(tokens);
        for (int i = 0; i < tokens.size(); i++) {
            Token token = tokens.get(i);
            switch (token.kind()) {
                case NAME, NUMBER -> write(nameOf(token));
                case FUNCTION -> write(nameOf(new Item.Call(token.text(), arguments[i + 1])));
                case MARK -> {
                    if (token.is("+") && isSign(tokens, i)) continue;
                    if (token.is("[")) write(nameOf(new Item.Call("[", 1)));
                    write(token.is("[") ? "(" : token.is("]") ? ")" : token.text());
                }
                case COMMENT, UNREADABLE -> throw new IllegalArgumentException(token.text());
            }
        }
    }

    private void write(String word) {
        renamed.append(word).append(' ');
    }

    private String nameOf(Token operand) {
        return nameOfOperand.computeIfAbsent(operand.text(), _ -> {
            String name = "v" + operands.size();
            operands.put(name, operand);
            return name;
        });
    }

    private String nameOf(Item.Call call) {
        return nameOfCall.computeIfAbsent(call, _ -> {
            String name = "f" + calls.size();
            calls.put(name, new Called(name, call));
            return name;
        });
    }

    private List<Item> items() {
        return Arrays.stream(ShuntingYard.convertToRPN(renamed.toString(), calls, OPERATORS, operands.keySet(), false))
                .map(token -> (Item)
                        switch (token) {
                            case VariableToken operand -> new Item.Operand(operands.get(operand.getName()));
                            case FunctionToken function -> ((Called) function.getFunction()).call;
                            case OperatorToken operator
                            when operator.getOperator().getNumOperands() == 1 -> new Item.Negation();
                            case OperatorToken operator ->
                                new Item.Binary(operator.getOperator().getSymbol());
                            default -> throw new IllegalStateException("token of type " + token.getType());
                        })
                .toList();
    }

    /// Whether the + or - at `index` belongs to the one value after it.
    static boolean isSign(List<Token> tokens, int index) {
        if (index == 0) return true;
        Token before = tokens.get(index - 1);
        return before.kind() == Token.Kind.MARK && !before.isOneOf(")", "]");
    }

    /// For each opening bracket, by its index, one more than the commas that it holds itself.
    private static int[] argumentsOf(List<Token> tokens) {
        int[] arguments = new int[tokens.size()];
        Deque<Integer> open = new ArrayDeque<>();
        for (int i = 0; i < arguments.length; i++) {
            Token token = tokens.get(i);
            if (token.isOneOf("(", "[")) {
                open.push(i);
                arguments[i] = 1;
            } else if (token.isOneOf(")", "]")) {
                open.pop();
            } else if (token.is(",")) {
                arguments[open.peek()]++;
            }
        }
        return arguments;
    }

    private static Map<String, Operator> operators(Map<String, Integer> precedence) {
        Map<String, Operator> operators = new HashMap<>();
        precedence.forEach((symbol, level) -> operators.put(symbol, new Operator(symbol, 2, true, level) {
            @Override
            public double apply(double... values) {
                throw new UnsupportedOperationException("stands for an order, not for a value");
            }
        }));
        return Map.copyOf(operators);
    }

    /// Carries a call through exp4j's order.
    private static final class Called extends Function {
        private final Item.Call call;

        Called(String name, Item.Call call) {
            super(name, call.arguments());
            this.call = call;
        }

        @Override
        public double apply(double... values) {
            throw new UnsupportedOperationException("stands for an order, not for a value");
        }
    }
}
