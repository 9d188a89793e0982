package dev.leadline.formula;

import dev.leadline.formula.Token.Kind;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Span;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.SequencedSet;

/// Reads formulas: their words for an editor, and what is wrong with them before anything is computed.
public final class Reader {
    static final int LONGEST = 100_000;

    private Reader() {}

    /// The words, numbers, marks and comments of any text; for colours, never fails.
    public static List<Token> tokens(String text) {
        return List.copyOf(Tokens.of(text));
    }

    /// The names that a formula uses, in the order in which they first stand. Functions are not among them, even
    /// unknown ones, nor are the constants that every formula knows. Never fails.
    public static SequencedSet<String> names(String text) {
        var names = new LinkedHashSet<String>();
        List<Token> tokens = Tokens.of(text);
        for (int i = 0; i < tokens.size(); i++) {
            Token token = tokens.get(i);
            boolean called = i + 1 < tokens.size() && tokens.get(i + 1).is("(");
            if (token.kind() == Kind.NAME && !called && !Functions.constants().containsKey(token.text())) {
                names.add(token.text());
            }
        }
        return names;
    }

    /// What is wrong with a formula, from left to right; empty where it can be computed.
    ///
    /// Everything that cannot be read is named, and every unknown name once. Of faults in the order of the words
    /// only the first is, since what follows is often not meant as it stands.
    public static List<Problem> check(String text, Names names) {
        if (text.length() > LONGEST) return List.of(tooLong(text.length()));
        return check(meaningful(Tokens.of(text)), names, text.length());
    }

    /// @param tokens without comments
    /// @param end where the formula ends
    static List<Problem> check(List<Token> tokens, Names names, int end) {
        if (tokens.isEmpty()) {
            return List.of(Problem.of("formula is empty")
                    .tryThis("write one, as in a*b + c")
                    .at(Place.of(new Span(end, end))));
        }
        List<Problem> problems = new ArrayList<>(Reading.unreadable(tokens));
        boolean readable = problems.isEmpty();
        Reading.unknown(tokens, names).stream()
                .filter(problem -> problems.stream().noneMatch(other -> holds(other, problem)))
                .forEach(problems::add);
        if (readable) {
            Grammar.firstFault(tokens, names)
                    .filter(fault -> problems.stream().noneMatch(other -> explains(other, fault, tokens)))
                    .ifPresent(fault -> problems.addFirst(fault));
        }
        problems.sort(Comparator.comparingInt(
                problem -> problem.place().span().orElseThrow().from()));
        return List.copyOf(problems);
    }

    /// Whether a fault may go away with `other`: an unknown word at its place or right before it. Not so right behind a
    /// number: in `2x` the product is missing whatever x is.
    private static boolean explains(Problem other, Problem fault, List<Token> tokens) {
        int at = fault.place().span().orElseThrow().from();
        Optional<Token> before =
                tokens.stream().takeWhile(token -> token.span().from() < at).reduce((_, last) -> last);
        if (before.filter(token -> token.kind() == Kind.NUMBER).isPresent()) {
            return false;
        }
        return holds(other, fault)
                || before.filter(token ->
                                token.span().equals(other.place().span().orElseThrow()))
                        .isPresent();
    }

    /// Whether a problem is named already, by one that stands around it.
    private static boolean holds(Problem around, Problem inside) {
        Span outer = around.place().span().orElseThrow();
        Span inner = inside.place().span().orElseThrow();
        return outer.from() <= inner.from() && inner.to() <= outer.to();
    }

    static List<Token> meaningful(List<Token> tokens) {
        return tokens.stream().filter(token -> token.kind() != Kind.COMMENT).toList();
    }

    static Problem tooLong(int length) {
        return Problem.of("formula has %d characters, more than %d".formatted(length, LONGEST))
                .tryThis("write parts of it as steps")
                .at(Place.of(new Span(0, length)));
    }
}
