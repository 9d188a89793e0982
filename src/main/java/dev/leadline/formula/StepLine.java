package dev.leadline.formula;

import dev.leadline.formula.Token.Kind;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.problem.Span;
import java.util.List;

/// A line `name = formula   # comment`, split but not yet checked.
///
/// @param path where the line stands
/// @param tokens those of the formula; their places are those in the line
record StepLine(String line, String path, Token name, List<Token> tokens, String comment) {

    /// @throws Refusal where the line is no step
    static StepLine of(String line, String path) {
        if (line.length() > Reader.LONGEST) throw new Refusal(Reader.tooLong(line.length()));
        List<Token> all = Tokens.of(line);
        List<Token> tokens = Reader.meaningful(all);
        if (tokens.isEmpty()) throw refusal("step is empty", new Span(0, line.length()));
        Token name = tokens.getFirst();
        if (tokens.size() < 2 || !tokens.get(1).is("=")) {
            boolean named = name.kind() == Kind.NAME || name.kind() == Kind.FUNCTION;
            throw refusal(
                    "step has no name",
                    named && tokens.size() > 1 ? tokens.get(1).span() : name.span());
        }
        Names.fault(name.text()).ifPresent(fault -> {
            throw new Refusal(fault.at(Place.of(name.span())));
        });
        String comment = all.stream()
                .filter(token -> token.kind() == Kind.COMMENT)
                .map(token -> token.text().substring(1).strip())
                .findFirst()
                .orElse("");
        return new StepLine(line, path, name, tokens.subList(2, tokens.size()), comment);
    }

    private static Refusal refusal(String primary, Span span) {
        return new Refusal(Problem.of(primary)
                .because("a step is written name = formula")
                .tryThis("write a name and = before it, as in q = 0.5*v^2")
                .at(Place.of(span)));
    }

    List<Problem> check(Names names) {
        int end = tokens.isEmpty() ? line.length() : tokens.getLast().span().to();
        return Reader.check(tokens, names, end);
    }

    Step step() {
        Span first = tokens.getFirst().span();
        String text = line.substring(first.from(), tokens.getLast().span().to());
        return new Step(name.text(), new Formula(text, Tokens.canonical(tokens)), comment);
    }
}
