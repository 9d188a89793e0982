package dev.leadline.formula;

import dev.leadline.formula.Node.Apply;
import dev.leadline.formula.Node.Column;
import dev.leadline.formula.Node.Number;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;

/// Formulas as a list of nodes, each after its operands; what is written twice stands here once.
///
/// Numbers are computed with as far as they go, and a few forms are exchanged for others, but only where every draw
/// keeps its bits (the sign of a `NaN` aside): `a - 3` becomes `a + -3`, `x / 4` becomes `x * 0.25`. `0 * x` stays,
/// since `x` may be infinite. Grows while formulas are added; confined to the thread that adds them.
final class Expression {
    private final List<Node> nodes = new ArrayList<>();
    private final Map<Node, Integer> known = new HashMap<>();

    /// For each node, whether its value can only be 0, 1 or `NaN`.
    private final List<Boolean> events = new ArrayList<>();

    /// The same nodes, at the same indices; grows on its own.
    Expression copy() {
        var copy = new Expression();
        copy.nodes.addAll(nodes);
        copy.known.putAll(known);
        copy.events.addAll(events);
        return copy;
    }

    List<Node> nodes() {
        return nodes;
    }

    List<Double> numbers() {
        return nodes.stream()
                .flatMap(node -> node instanceof Number(double value) ? Stream.of(value) : Stream.empty())
                .toList();
    }

    boolean isEvent(int node) {
        return events.get(node);
    }

    int number(double value) {
        return node(new Number(value), value == 0 || value == 1);
    }

    int column(int index) {
        return node(new Column(index), false);
    }

    int negate(int a) {
        if (isNumber(a)) return number(-value(a));
        if (nodes.get(a) instanceof Apply(var operation, int x, int y, int _)) {
            if (operation == Operation.NEGATE) return x;
            if (operation == Operation.MULTIPLY && isNumber(y)) return multiply(x, number(-value(y)));
            if (operation == Operation.DIVIDE && isNumber(y)) return divide(x, number(-value(y)));
        }
        return apply(Operation.NEGATE, a, -1, -1);
    }

    int add(int a, int b) {
        if (isNegated(b)) return subtract(a, operand(b));
        if (isNegated(a)) return subtract(b, operand(a));
        return applyEitherWay(Operation.ADD, a, b);
    }

    int subtract(int a, int b) {
        if (isNumber(b)) return add(a, number(-value(b)));
        if (isNegated(b)) return add(a, operand(b));
        return apply(Operation.SUBTRACT, a, b, -1);
    }

    int multiply(int a, int b) {
        if (isNegated(a) && isNegated(b)) return multiply(operand(a), operand(b));
        if (isNegated(a) && isNumber(b)) return multiply(operand(a), number(-value(b)));
        if (isNegated(b) && isNumber(a)) return multiply(operand(b), number(-value(a)));
        if (isNumber(b) && value(b) == 1) return a;
        if (isNumber(a) && value(a) == 1) return b;
        return applyEitherWay(Operation.MULTIPLY, a, b);
    }

    int divide(int a, int b) {
        if (isNegated(a) && isNegated(b)) return divide(operand(a), operand(b));
        if (isNegated(a) && isNumber(b)) return divide(operand(a), number(-value(b)));
        if (isNumber(b) && value(b) == 1) return a;
        if (isNumber(b) && isPowerOfTwo(value(b))) return multiply(a, number(1 / value(b)));
        return apply(Operation.DIVIDE, a, b, -1);
    }

    int power(int a, int exponent) {
        if (isNumber(exponent) && value(exponent) == 1) return a;
        if (isNumber(exponent) && value(exponent) == 2) return multiply(a, a);
        return apply(Operation.POWER, a, exponent, -1);
    }

    int less(int a, int b) {
        return apply(Operation.LESS, a, b, -1);
    }

    int lessOrEqual(int a, int b) {
        return apply(Operation.LESS_OR_EQUAL, a, b, -1);
    }

    int equal(int a, int b) {
        return applyEitherWay(Operation.EQUAL, a, b);
    }

    int unequal(int a, int b) {
        return applyEitherWay(Operation.UNEQUAL, a, b);
    }

    /// 1 where the value is not 0.
    int truth(int a) {
        return isEvent(a) ? a : apply(Operation.TRUTH, a, -1, -1);
    }

    int not(int a) {
        return subtract(number(1), truth(a));
    }

    /// `NaN` where any of the two is, even beside a 0.
    int and(int a, int b) {
        return multiply(truth(a), truth(b));
    }

    /// `NaN` where any of the two is, even beside a 1.
    int or(int a, int b) {
        return applyEitherWay(Operation.MAX, truth(a), truth(b));
    }

    int choose(int condition, int a, int b) {
        return apply(Operation.IF, truth(condition), a, b);
    }

    int function(Operation operation, int a) {
        return apply(operation, a, -1, -1);
    }

    int function(Operation operation, int a, int b) {
        boolean eitherWay = operation == Operation.MIN || operation == Operation.MAX;
        return eitherWay ? applyEitherWay(operation, a, b) : apply(operation, a, b, -1);
    }

    /// Numbers to the right and earlier nodes to the left, so that `a + b` and `b + a` are one node.
    private int applyEitherWay(Operation operation, int a, int b) {
        boolean swap = isNumber(a) != isNumber(b) ? isNumber(a) : a > b;
        return swap ? apply(operation, b, a, -1) : apply(operation, a, b, -1);
    }

    private int apply(Operation operation, int a, int b, int c) {
        if (isNumber(a) && (b < 0 || isNumber(b)) && (c < 0 || isNumber(c))) {
            return number(operation.of(value(a), b < 0 ? 0 : value(b), c < 0 ? 0 : value(c)));
        }
        return node(new Apply(operation, a, b, c), isEvent(operation, a, b, c));
    }

    private boolean isEvent(Operation operation, int a, int b, int c) {
        return switch (operation) {
            case LESS, LESS_OR_EQUAL, EQUAL, UNEQUAL, TRUTH -> true;
            case MULTIPLY, MIN, MAX -> isEvent(a) && isEvent(b);
            case SUBTRACT -> isNumber(a) && value(a) == 1 && isEvent(b);
            case IF -> isEvent(b) && isEvent(c);
            default -> false;
        };
    }

    private int node(Node node, boolean event) {
        Integer same = known.putIfAbsent(node, nodes.size());
        if (same != null) return same;
        nodes.add(node);
        events.add(event);
        return nodes.size() - 1;
    }

    private boolean isNumber(int node) {
        return nodes.get(node) instanceof Number;
    }

    private double value(int node) {
        return ((Number) nodes.get(node)).value();
    }

    private boolean isNegated(int node) {
        return nodes.get(node) instanceof Apply apply && apply.operation() == Operation.NEGATE;
    }

    private int operand(int node) {
        return ((Apply) nodes.get(node)).a();
    }

    /// Whether dividing by `x` and multiplying by `1 / x` are the same to the bit.
    private static boolean isPowerOfTwo(double x) {
        double inverse = 1 / x;
        return (Double.doubleToRawLongBits(x) & 0x000f_ffff_ffff_ffffL) == 0
                && Math.abs(x) >= Double.MIN_NORMAL
                && Math.abs(inverse) >= Double.MIN_NORMAL
                && Double.isFinite(inverse);
    }
}
