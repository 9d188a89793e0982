package dev.leadline.formula;

import dev.leadline.formula.Token.Kind;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Span;
import java.util.ArrayDeque;
import java.util.Deque;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/// Finds the first place at which readable tokens are not in the order of a formula. One pass.
///
/// At most one sign stands before a value, and none directly after `+` or `-`: `2^-1`, `a*-b` and `-x` are read, `--x`
/// and `a - -b` are not, since a second sign is more often a slip than meant.
final class Grammar {
    static final int DEEPEST = 500;

    private static final String VALUE = "a number, a name, a function or an opening bracket was expected";

    private static final Set<String> COMPARISONS = Set.of("<", "<=", ">", ">=", "==", "!=");

    /// A bracket that is still open, and what was read inside since.
    private static final class Opened {
        final Token bracket;
        final Token function;
        int commas;

        /// The last comparison, if neither `&`, `|` nor a comma stands after it.
        Token comparison;

        /// Whether the content compares or joins conditions, whether it computes with numbers, and whether its last
        /// value can be a condition.
        boolean compares;

        boolean computes;
        boolean valueIsCondition;

        /// @param function `null` where none is called
        Opened(Token bracket, Token function) {
            this.bracket = bracket;
            this.function = function;
        }

        boolean holdsCondition() {
            return compares || !computes && valueIsCondition;
        }

        boolean givesCondition() {
            if (function != null)
                return function.text().equals("not") || function.text().equals("if");
            return bracket.is("[") || holdsCondition();
        }
    }

    private final List<Token> tokens;
    private final Names names;
    private final Deque<Opened> open = new ArrayDeque<>();

    /// Whether a value has just ended, so that an operator or a closing bracket follows.
    private boolean afterValue;

    private Grammar(List<Token> tokens, Names names) {
        this.tokens = tokens;
        this.names = names;
        this.open.push(new Opened(null, null));
    }

    /// @param tokens not empty; readable, without comments
    static Optional<Problem> firstFault(List<Token> tokens, Names names) {
        return new Grammar(tokens, names).firstFault();
    }

    private Optional<Problem> firstFault() {
        for (int i = 0; i < tokens.size(); i++) {
            Optional<Problem> fault = afterValue ? operatorAt(i) : valueAt(i);
            if (fault.isPresent()) return fault;
        }
        if (!afterValue) return Optional.of(valueMissing(tokens.size()));
        Token bracket = open.peek().bracket;
        if (bracket == null) return Optional.empty();
        return fault(bracket, "closing bracket of " + Reading.quoted(bracket) + " missing")
                .map(p -> p.tryThis("close it with " + closing(bracket)));
    }

    private Optional<Problem> valueAt(int i) {
        Token token = tokens.get(i);
        return switch (token.kind()) {
            case NUMBER -> {
                value(false);
                yield Optional.empty();
            }
            case NAME -> {
                boolean called = i + 1 < tokens.size() && tokens.get(i + 1).is("(");
                value(true);
                yield called ? notFunction(token) : Optional.empty();
            }
            case FUNCTION -> i + 1 < tokens.size() && tokens.get(i + 1).is("(") ? Optional.empty() : bracketsMissing(i);
            case MARK -> markBeforeValue(i);
            case COMMENT, UNREADABLE -> throw new IllegalArgumentException(token.text());
        };
    }

    private Optional<Problem> markBeforeValue(int i) {
        Token token = tokens.get(i);
        if (token.isOneOf("(", "[")) {
            Token before = i > 0 ? tokens.get(i - 1) : token;
            open.push(new Opened(token, before.kind() == Kind.FUNCTION ? before : null));
            return open.size() - 1 > DEEPEST
                    ? fault(token, "brackets stand more than " + DEEPEST + " deep")
                            .map(p -> p.tryThis("write parts of the formula as steps"))
                    : Optional.empty();
        }
        if (token.isOneOf("+", "-")) {
            open.peek().computes = true;
            return i > 0 && tokens.get(i - 1).isOneOf("+", "-")
                    ? fault(token, "two signs in a row")
                            .map(p -> p.because("one sign at most stands before a value")
                                    .tryThis("put the second one in brackets, as in a - (-b)"))
                    : Optional.empty();
        }
        if (token.isOneOf(")", "]") && i > 0 && tokens.get(i - 1).isOneOf("(", "[")) {
            Opened opened = open.peek();
            return opened.function != null && token.is(")")
                    ? wrongArity(opened.function, 0)
                    : fault(token, "nothing stands between the brackets");
        }
        return token.isOneOf(")", "]") && open.peek().bracket == null ? notOpen(token) : Optional.of(valueMissing(i));
    }

    private Optional<Problem> operatorAt(int i) {
        Token token = tokens.get(i);
        if (token.kind() != Kind.MARK || token.isOneOf("(", "[")) return operatorMissing(i);
        if (token.isOneOf(")", "]")) return close(i);
        if (token.is(",")) return comma(i);
        afterValue = false;
        Opened inside = open.peek();
        if (COMPARISONS.contains(token.text())) {
            if (inside.comparison != null) return chained(i, inside.comparison);
            inside.comparison = token;
            inside.compares = true;
        } else if (token.isOneOf("&", "|")) {
            inside.comparison = null;
            inside.compares = true;
        } else {
            inside.computes = true;
        }
        return Optional.empty();
    }

    private Optional<Problem> close(int i) {
        Token token = tokens.get(i);
        Opened opened = open.peek();
        if (opened.bracket == null) {
            return notOpen(token);
        }
        if (opened.bracket.is("[") != token.is("]")) {
            return fault(token, Reading.quoted(opened.bracket) + " is closed by " + Reading.quoted(token))
                    .map(p -> p.because("( ) group, [ ] hold a condition")
                            .tryThis("close it with " + closing(opened.bracket)));
        }
        open.pop();
        value(opened.givesCondition());
        if (token.is("]") && !opened.holdsCondition()) return noCondition(opened.bracket, token);
        if (opened.function != null && !takes(opened.function, opened.commas + 1)) {
            return wrongArity(opened.function, opened.commas + 1);
        }
        return Optional.empty();
    }

    private Optional<Problem> comma(int i) {
        Opened inside = open.peek();
        if (inside.function == null) {
            boolean decimal = i + 1 < tokens.size()
                    && tokens.get(i - 1).kind() == Kind.NUMBER
                    && tokens.get(i + 1).kind() == Kind.NUMBER;
            Optional<Problem> problem = fault(tokens.get(i), "\",\" stands outside the brackets of a function");
            return decimal
                    ? problem.map(p -> p.tryThis("write a point for decimals: " + Reading.shown(tokens.get(i - 1)) + "."
                            + Reading.shown(tokens.get(i + 1))))
                    : problem;
        }
        inside.commas++;
        inside.comparison = null;
        afterValue = false;
        return Optional.empty();
    }

    private void value(boolean canBeCondition) {
        open.peek().valueIsCondition = canBeCondition;
        afterValue = true;
    }

    private static boolean takes(Token function, int values) {
        Function called = Functions.named(function.text()).orElseThrow();
        return values >= called.least() && values <= called.most();
    }

    private static Optional<Problem> notOpen(Token token) {
        return fault(token, Reading.quoted(token) + " closes a bracket that is not open")
                .map(p -> p.tryThis("take it out, or open a bracket before it"));
    }

    private Problem valueMissing(int i) {
        if (i == 0) {
            Token token = tokens.getFirst();
            int at = token.span().from();
            Problem problem = Problem.of("value missing before " + Reading.quoted(token))
                    .because(VALUE)
                    .at(Place.of(new Span(at, at)));
            return token.is("|") ? problem.tryThis("write abs(x) for the size of x") : problem;
        }
        Token before = tokens.get(i - 1);
        int at = before.span().to();
        return Problem.of("value missing after " + Reading.quoted(before))
                .because(VALUE)
                .at(Place.of(new Span(at, at)));
    }

    private Optional<Problem> operatorMissing(int i) {
        Token left = tokens.get(i - 1);
        Token right = tokens.get(i);
        String product = "for a product write " + factor(left) + "*" + factor(right);
        boolean exponent = left.kind() == Kind.NUMBER
                && right.text().equalsIgnoreCase("e")
                && right.span().from() == left.span().to();
        return fault(right, "operator missing between " + Reading.quoted(left) + " and " + Reading.quoted(right))
                .map(p -> p.because(
                                exponent
                                        ? "an exponent has digits, as in 1.5e-3"
                                        : "two values stand side by side, and no product is understood")
                        .tryThis(product));
    }

    private static String factor(Token token) {
        return switch (token.kind()) {
            case FUNCTION -> token.text() + "(...)";
            case MARK -> token.isOneOf("[", "]") ? "[...]" : "(...)";
            case NAME, NUMBER, COMMENT, UNREADABLE -> Reading.shown(token);
        };
    }

    private Optional<Problem> notFunction(Token token) {
        String kind = names.meaning(token.text()).map(Names.Meaning::kind).orElse("not known");
        return fault(token, Reading.quoted(token) + " is " + kind + ", not a function")
                .map(p -> p.tryThis("for a product write " + Reading.shown(token) + "*(...)"));
    }

    private Optional<Problem> bracketsMissing(int i) {
        Function function = Functions.named(tokens.get(i).text()).orElseThrow();
        boolean oneValue = i + 1 < tokens.size() && tokens.get(i + 1).isOperand() && function.most() == 1;
        String call = oneValue ? function.name() + "(" + Reading.shown(tokens.get(i + 1)) + ")" : function.form();
        return fault(tokens.get(i), "function " + Reading.quoted(tokens.get(i)) + " stands without brackets")
                .map(p -> p.tryThis("write " + call));
    }

    private static Optional<Problem> wrongArity(Token token, int given) {
        Function function = Functions.named(token.text()).orElseThrow();
        String takes = function.least() == function.most()
                ? function.least() + (function.least() == 1 ? " value" : " values")
                : "at least " + function.least() + " values";
        return fault(token, "function " + Reading.quoted(token) + " takes " + takes + ", not " + given)
                .map(p -> p.tryThis("write " + function.form()));
    }

    private Optional<Problem> chained(int i, Token first) {
        Token second = tokens.get(i);
        Token middle = tokens.get(i - 1);
        boolean single = tokens.get(i - 2) == first && middle.isOperand();
        String x = single ? Reading.shown(middle) : "x";
        return fault(second, "comparisons cannot be chained")
                .map(p -> p.because("the first one gives 1 or 0, which the second would compare")
                        .tryThis("write a %s %s & %s %s b".formatted(first.text(), x, x, second.text())));
    }

    private static Optional<Problem> noCondition(Token opening, Token closing) {
        return Optional.of(Problem.of("[ ] holds no condition")
                .because("[c] is 1 where the condition c holds, 0 elsewhere")
                .tryThis("write ( ) to group, or compare, as in [x > 0]")
                .at(Place.of(new Span(opening.span().from(), closing.span().to()))));
    }

    private static String closing(Token bracket) {
        return bracket.is("[") ? "]" : ")";
    }

    private static Optional<Problem> fault(Token token, String primary) {
        return Optional.of(Problem.of(primary).at(Place.of(token.span())));
    }
}
