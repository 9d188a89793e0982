package dev.leadline.formula;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SequencedMap;

/// The functions and the constants that every formula knows.
public final class Functions {
    private static final Map<String, Entry> TABLE = new LinkedHashMap<>();

    private static final SequencedMap<String, Double> CONSTANTS = new LinkedHashMap<>();

    /// @param operation what one call with one or two values becomes; empty where [Expression] writes it in others
    private record Entry(Function function, Optional<Operation> operation) {}

    static {
        one("exp", "e to the power x", Operation.EXP);
        one("log", "natural logarithm of x", Operation.LOG);
        one("log10", "logarithm of x to base 10", Operation.LOG10);
        one("log1p", "log(1 + x), accurate for small x", Operation.LOG1P);
        one("expm1", "exp(x) - 1, accurate for small x", Operation.EXPM1);
        one("sqrt", "square root of x", Operation.SQRT);
        one("cbrt", "cube root of x, also of negative x", Operation.CBRT);
        one("abs", "size of x without its sign", Operation.ABS);
        one("sign", "-1, 0 or 1, as x is negative, 0 or positive", Operation.SIGN);
        many("min", "smallest of two or more values", Operation.MIN);
        many("max", "largest of two or more values", Operation.MAX);
        one("floor", "largest integer that is not above x", Operation.FLOOR);
        one("ceil", "smallest integer that is not below x", Operation.CEIL);
        one("round", "nearest integer; halves go to the even one", Operation.ROUND);
        two("hypot", "x", "y", "square root of x^2 + y^2, without overflow on the way", Operation.HYPOT);
        one("sin", "sine of x in radians; sin(30*deg) is 0.5", Operation.SIN);
        one("cos", "cosine of x in radians", Operation.COS);
        one("tan", "tangent of x in radians", Operation.TAN);
        one("asin", "angle in radians, -pi/2 to pi/2, whose sine is x", Operation.ASIN);
        one("acos", "angle in radians, 0 to pi, whose cosine is x", Operation.ACOS);
        one("atan", "angle in radians, -pi/2 to pi/2, whose tangent is x", Operation.ATAN);
        two("atan2", "y", "x", "angle in radians, -pi to pi, of the point (x, y)", Operation.ATAN2);
        one("sinh", "hyperbolic sine of x", Operation.SINH);
        one("cosh", "hyperbolic cosine of x", Operation.COSH);
        one("tanh", "hyperbolic tangent of x", Operation.TANH);
        one("erf", "error function of x", Operation.ERF);
        one("erfc", "1 - erf(x), accurate for large x", Operation.ERFC);
        one("lgamma", "natural logarithm of the size of the gamma function at x", Operation.LGAMMA);
        one("gammaFn", "gamma function at x; gammaFn(n + 1) is n factorial", Operation.GAMMA_FN);
        one("normalCdf", "chance that a standard normal value is at most x", Operation.NORMAL_CDF);
        one("normalPdf", "standard normal density at x", Operation.NORMAL_PDF);
        one(
                "normalQuantile",
                "p",
                "the x below which a standard normal value lies with chance p",
                Operation.NORMAL_QUANTILE);
        add(new Function("not", 1, 1, "not(c)", "1 where c is 0, 0 elsewhere"), Optional.empty());
        add(
                new Function(
                        "if", 3, 3, "if(c, a, b)", "a where c is not 0, b elsewhere; the other one does not count"),
                Optional.of(Operation.IF));
        CONSTANTS.put("pi", Math.PI);
        CONSTANTS.put("e", Math.E);
        CONSTANTS.put("deg", Math.PI / 180);
    }

    private Functions() {}

    /// Every function, in the order in which a manual lists them.
    public static List<Function> all() {
        return TABLE.values().stream().map(Entry::function).toList();
    }

    public static Optional<Function> named(String name) {
        return Optional.ofNullable(TABLE.get(name)).map(Entry::function);
    }

    /// `pi`, `e` and `deg` (one degree in radians), which a name of a question may shadow.
    public static SequencedMap<String, Double> constants() {
        return Collections.unmodifiableSequencedMap(CONSTANTS);
    }

    static Optional<Operation> operation(String name) {
        return TABLE.get(name).operation();
    }

    private static void one(String name, String meaning, Operation operation) {
        one(name, "x", meaning, operation);
    }

    private static void one(String name, String argument, String meaning, Operation operation) {
        add(new Function(name, 1, 1, name + "(" + argument + ")", meaning), Optional.of(operation));
    }

    private static void two(String name, String first, String second, String meaning, Operation operation) {
        add(new Function(name, 2, 2, name + "(" + first + ", " + second + ")", meaning), Optional.of(operation));
    }

    private static void many(String name, String meaning, Operation operation) {
        add(new Function(name, 2, Integer.MAX_VALUE, name + "(a, b, ...)", meaning), Optional.of(operation));
    }

    private static void add(Function function, Optional<Operation> operation) {
        TABLE.put(function.name(), new Entry(function, operation));
    }
}
