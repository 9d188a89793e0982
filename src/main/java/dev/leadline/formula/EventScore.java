package dev.leadline.formula;

import dev.leadline.formula.Node.Apply;
import dev.leadline.formula.Node.Number;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.HashMap;
import java.util.Map;
import java.util.NavigableSet;
import java.util.TreeSet;

/// Writes the score of an event: how far a draw is from making it true.
///
/// The score is above 0 exactly where the event is true, below 0 where it is false, `NaN` where it is `NaN`, and never
/// 0: a tie counts as the smallest number, `a >= b` as true and `a > b` as false. So strict and other comparisons may
/// be mixed, and `not` is a change of sign.
///
/// | event | score |
/// |---|---|
/// | `a > b`, `a >= b` | `a - b`; where `a == b` less, or more, than 0 by the smallest number |
/// | `a & b`, `min(a, b)` | the smaller score |
/// | `a \| b`, `max(a, b)` | the larger score |
/// | `not(a)` | the score of `a`, its sign changed |
/// | `a == b`, `a != b` of two events | that of `a & b \| not(a) & not(b)`, or of its opposite |
/// | `if(c, a, b)` | that of `c & a \| not(c) & b` |
/// | 1, 0 | `∞`, `-∞` |
///
/// Equality of two numbers has no score, nor has a number that stands for a condition.
final class EventScore {
    private final Expression expression;
    private final Map<Integer, Integer> scores = new HashMap<>();

    private EventScore(Expression expression) {
        this.expression = expression;
    }

    /// @param expression gets the nodes that the score takes
    /// @param event a node that is an event
    /// @return node of the score
    /// @throws Refusal where the event does not say how far it is from happening
    static int write(Expression expression, int event) {
        var writer = new EventScore(expression);
        for (int part : writer.parts(event)) writer.scores.put(part, writer.score(part));
        return writer.scores.get(event);
    }

    /// The events that `event` is made of, each after those that it is made of itself.
    private NavigableSet<Integer> parts(int event) {
        var parts = new TreeSet<Integer>();
        parts.add(event);
        for (Integer part = event; part != null; part = parts.lower(part)) {
            if (!(expression.nodes().get(part) instanceof Apply(var operation, int a, int b, int c))) continue;
            switch (operation) {
                case LESS, LESS_OR_EQUAL -> {}
                case EQUAL, UNEQUAL -> {
                    if (!expression.isEvent(a) || !expression.isEvent(b)) throw equality(operation);
                    parts.add(a);
                    parts.add(b);
                }
                case TRUTH -> throw number();
                case SUBTRACT -> parts.add(b);
                case MULTIPLY, MIN, MAX -> {
                    parts.add(a);
                    parts.add(b);
                }
                case IF -> {
                    parts.add(a);
                    parts.add(b);
                    parts.add(c);
                }
                default -> throw new IllegalArgumentException(operation + " makes no event");
            }
        }
        return parts;
    }

    private int score(int event) {
        return switch (expression.nodes().get(event)) {
            case Number(double value) ->
                expression.number(value == 0 ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY);
            case Apply(var operation, int a, int b, int c) ->
                switch (operation) {
                    case LESS -> difference(a, b, -Double.MIN_VALUE);
                    case LESS_OR_EQUAL -> difference(a, b, Double.MIN_VALUE);
                    case EQUAL -> same(scores.get(a), scores.get(b));
                    case UNEQUAL -> expression.negate(same(scores.get(a), scores.get(b)));
                    case SUBTRACT -> expression.negate(scores.get(b));
                    case MULTIPLY, MIN -> smaller(scores.get(a), scores.get(b));
                    case MAX -> larger(scores.get(a), scores.get(b));
                    case IF -> chosen(a, b, c);
                    default -> throw new IllegalArgumentException(operation + " makes no event");
                };
            case Node.Column _ -> throw new IllegalArgumentException("an input is no event");
        };
    }

    /// `b - a`, and `tie` where they are equal, also where both are infinite. Other differences are not 0: the smallest
    /// of them are subnormal.
    private int difference(int a, int b, double tie) {
        return expression.choose(expression.equal(a, b), expression.number(tie), expression.subtract(b, a));
    }

    private int same(int a, int b) {
        return larger(smaller(a, b), smaller(expression.negate(a), expression.negate(b)));
    }

    /// The branch not taken counts as far as it is a number: how near it is to being taken, and true, is worth knowing.
    private int chosen(int condition, int a, int b) {
        int c = scores.get(condition);
        if (isNumber(a, 1) && isNumber(b, 0)) return c;
        if (isNumber(a, 0) && isNumber(b, 1)) return expression.negate(c);
        int ifTrue = smaller(c, expression.function(Operation.NAN_IS_NEVER, scores.get(a)));
        int ifFalse = smaller(expression.negate(c), expression.function(Operation.NAN_IS_NEVER, scores.get(b)));
        int taken = expression.choose(condition, scores.get(a), scores.get(b));
        int better = larger(ifTrue, ifFalse);
        return expression.choose(expression.equal(taken, taken), better, better);
    }

    private int smaller(int a, int b) {
        return expression.function(Operation.MIN, a, b);
    }

    private int larger(int a, int b) {
        return expression.function(Operation.MAX, a, b);
    }

    private boolean isNumber(int node, double value) {
        return expression.nodes().get(node) instanceof Number(double number) && number == value;
    }

    private static Refusal equality(Operation operation) {
        return operation == Operation.EQUAL
                ? refusal(
                        "a == b is true or not: no draw is nearer to it than another",
                        "say how near is meant, as in abs(a - b) <= 0.01; of whole numbers a >= b & a <= b is the same")
                : refusal(
                        "a != b is true or not: no draw is nearer to it than another",
                        "say which side is meant, as in a > b, or how far, as in abs(a - b) > 0.01");
    }

    private static Refusal number() {
        return refusal(
                "a number that stands for a condition holds where it is not 0: no draw is nearer to it than another",
                "compare it, as in x > 0");
    }

    private static Refusal refusal(String why, String hint) {
        return new Refusal(Problem.of("the event does not say how far it is from happening, which splitting needs")
                .because(why)
                .tryThis(hint));
    }
}
