package dev.leadline.formula;

import dev.leadline.formula.Token.Kind;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Span;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/// What is wrong with the single words, numbers and marks of a formula, whatever their order.
final class Reading {
    /// More would not be read by anyone.
    private static final int MOST = 20;

    private static final String LARGEST = "the largest number is about 1.8e308";
    private static final String SMALLEST = "the smallest number above 0 is about 4.9e-324";

    private Reading() {}

    /// Numbers, marks and characters that cannot be read.
    static List<Problem> unreadable(List<Token> tokens) {
        var problems = new ArrayList<Problem>();
        for (int i = 0; i < tokens.size() && problems.size() < MOST; i++) {
            Token token = tokens.get(i);
            switch (token.kind()) {
                case UNREADABLE -> problems.add(mark(token));
                case MARK -> {
                    if (token.is("=")) problems.add(equalsSign(token));
                    else if (Hints.forMark(token.text()).isPresent()) problems.add(mark(token));
                }
                case NUMBER -> number(tokens, i).ifPresent(problems::add);
                case NAME, FUNCTION, COMMENT -> {}
            }
        }
        return problems;
    }

    /// Names and functions that nobody declared, each where it first stands.
    static List<Problem> unknown(List<Token> tokens, Names names) {
        var problems = new ArrayList<Problem>();
        Set<String> seen = new HashSet<>();
        for (int i = 0; i < tokens.size() && problems.size() < MOST; i++) {
            Token token = tokens.get(i);
            if (token.kind() != Kind.NAME || names.meaning(token.text()).isPresent() || !seen.add(token.text())) {
                continue;
            }
            problems.add(takesValue(tokens, i) ? unknownFunction(token, names) : unknownName(token, names));
        }
        return problems;
    }

    /// Whether the name at `i` is used as a function: before a bracket, or, if it is one that is known elsewhere,
    /// before a value.
    private static boolean takesValue(List<Token> tokens, int i) {
        if (i + 1 == tokens.size()) return false;
        Token next = tokens.get(i + 1);
        boolean meant = Hints.forWord(tokens.get(i).text()).isEmpty()
                && Hints.forFunction(tokens.get(i).text()).isPresent();
        return next.is("(") || meant && (next.isOperand() || next.kind() == Kind.FUNCTION);
    }

    private static Problem mark(Token token) {
        Problem problem =
                Problem.of(quoted(token) + " cannot be read in a formula").at(Place.of(token.span()));
        return Hints.forMark(token.text()).map(problem::tryThis).orElse(problem);
    }

    private static Problem equalsSign(Token token) {
        return Problem.of("\"=\" does not compare")
                .because("one = stands after the name of a step, and nowhere else")
                .tryThis("write == to compare, and name a value in a step")
                .at(Place.of(token.span()));
    }

    private static Optional<Problem> number(List<Token> tokens, int i) {
        Token token = tokens.get(i);
        String text = token.text();
        if (text.indexOf('.') != text.lastIndexOf('.')) {
            return Optional.of(Problem.of("number " + shown(token) + " has more than one point")
                    .because("a number has digits, at most one point and an exponent, as in 1.5e-3")
                    .at(Place.of(token.span())));
        }
        if (i + 1 < tokens.size()
                && tokens.get(i + 1).span().from() == token.span().to()) {
            Token next = tokens.get(i + 1);
            Span both = new Span(token.span().from(), next.span().to());
            if (next.kind() == Kind.NAME && text.equals("0") && next.text().matches("[xXbBoO][0-9a-fA-F]*")) {
                return Optional.of(Problem.of("number " + text + next.text() + " is not decimal")
                        .tryThis("write it with decimal digits")
                        .at(Place.of(both)));
            }
            if (next.kind() == Kind.NAME && next.text().matches("_[0-9_]+")) {
                return Optional.of(Problem.of("number " + text + next.text() + " has _ between its digits")
                        .tryThis("write the digits without gaps")
                        .at(Place.of(both)));
            }
        }
        double value = Double.parseDouble(text);
        if (Double.isInfinite(value)) {
            return Optional.of(Problem.of("number " + shown(token) + " is too large")
                    .because(LARGEST)
                    .at(Place.of(token.span())));
        }
        if (value == 0 && text.chars().takeWhile(c -> c != 'e' && c != 'E').anyMatch(c -> c >= '1' && c <= '9')) {
            return Optional.of(Problem.of("number " + shown(token) + " is too small")
                    .because(SMALLEST)
                    .at(Place.of(token.span())));
        }
        return Optional.empty();
    }

    private static Problem unknownName(Token token, Names names) {
        var known = Stream.concat(names.meanings().keySet().stream(), Functions.constants().keySet().stream())
                .toList();
        return Problem.of("unknown name " + quoted(token))
                .because("a name is that of an input, a constant or a step")
                .tryThis(Hints.forWord(token.text())
                        .or(() -> product(token.text(), known))
                        .or(() -> nearest(token.text(), known).map(Reading::meant))
                        .orElse("declare it, or correct its spelling"))
                .at(Place.of(token.span()));
    }

    private static Problem unknownFunction(Token token, Names names) {
        var known = Functions.all().stream().map(Function::name).toList();
        return Problem.of("unknown function " + quoted(token))
                .because("a name before a bracket is a function; a product is written with *")
                .tryThis(Hints.forFunction(token.text())
                        .or(() -> nearest(token.text(), known).map(Reading::meant))
                        .or(() -> nearest(
                                        token.text(),
                                        List.copyOf(names.meanings().keySet()))
                                .map(name -> "did you mean " + name + "*(...)?"))
                        .orElse("choose one of " + String.join(", ", known)))
                .at(Place.of(token.span()));
    }

    /// A word made of two known names, or of one and digits.
    private static Optional<String> product(String word, List<String> known) {
        for (int i = 1; i < Math.min(word.length(), 40); i++) {
            String left = word.substring(0, i);
            String right = word.substring(i);
            if (known.contains(left) && (known.contains(right) || right.matches("[0-9]+"))) {
                return Optional.of("for a product write " + left + "*" + right);
            }
        }
        return Optional.empty();
    }

    /// Of one or two letters only the case is a guess worth making.
    private static Optional<String> nearest(String word, List<String> known) {
        return Nearest.to(word, known).filter(name -> word.length() > 2 || name.equalsIgnoreCase(word));
    }

    private static String meant(String name) {
        return "did you mean " + name + "?";
    }

    static String quoted(Token token) {
        return "\"" + shown(token) + "\"";
    }

    /// As written, but short enough for a line.
    static String shown(Token token) {
        String text = token.text();
        return text.length() <= 40 ? text : text.substring(0, text.offsetByCodePoints(0, 20)) + "…";
    }
}
