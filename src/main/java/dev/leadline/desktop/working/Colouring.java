package dev.leadline.desktop.working;

import dev.leadline.formula.Functions;
import dev.leadline.formula.Reader;
import dev.leadline.formula.Token;
import dev.leadline.model.Draft;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.SequencedSet;

/// What each word of a formula is, so that it can be coloured.
public final class Colouring {
    public enum Word {
        NUMBER,
        INPUT,
        CONSTANT,
        STEP,
        FUNCTION,
        MARK,
        COMMENT,
        UNKNOWN
    }

    /// A stretch of the text, `from` inclusive, `to` exclusive.
    public record Stretch(int from, int to, Word word) {}

    /// Longer texts stay plain: colouring must not slow down typing.
    static final int LONGEST = 20_000;

    private final Map<String, Word> names = new HashMap<>();

    private Colouring() {}

    /// For the names of this draft.
    public static Colouring of(Draft d) {
        var colouring = new Colouring();
        Functions.constants().keySet().forEach(n -> colouring.names.put(n, Word.CONSTANT));
        d.steps().forEach(s -> FormulasViewModel.stepName(s).ifPresent(n -> colouring.names.put(n, Word.STEP)));
        d.constants().forEach(c -> colouring.names.put(c.name(), Word.CONSTANT));
        d.inputs().forEach(in -> colouring.names.put(in.name(), Word.INPUT));
        return colouring;
    }

    /// In the order of the text, without overlaps; what lies between is blank.
    public List<Stretch> of(String text) {
        if (text.length() > LONGEST) {
            return List.of();
        }
        var stretches = new ArrayList<Stretch>();
        for (Token token : Reader.tokens(text)) {
            stretches.add(new Stretch(token.span().from(), token.span().to(), wordOf(token)));
        }
        return stretches;
    }

    private Word wordOf(Token token) {
        return switch (token.kind()) {
            case NAME -> names.getOrDefault(token.text(), Word.UNKNOWN);
            case FUNCTION -> Word.FUNCTION;
            case NUMBER -> Word.NUMBER;
            case MARK -> Word.MARK;
            case COMMENT -> Word.COMMENT;
            case UNREADABLE -> Word.UNKNOWN;
        };
    }

    /// The names in a text that are neither functions nor known to every formula.
    public static SequencedSet<String> names(String text) {
        var names = new LinkedHashSet<String>();
        if (text.length() <= LONGEST) {
            for (Token token : Reader.tokens(text)) {
                if (token.kind() == Token.Kind.NAME && !Functions.constants().containsKey(token.text())) {
                    names.add(token.text());
                }
            }
        }
        return names;
    }
}
