package dev.leadline.formula;

import dev.leadline.problem.Span;
import java.text.Normalizer;
import java.util.ArrayList;
import java.util.List;

/// Splits a text into words, numbers and marks. Never fails: what cannot be read becomes a token that says so.
///
/// One pass, linear in the length of the text.
final class Tokens {
    /// Longest first, so that `<=` is not read as `<` and `=`. The last rows are no marks of ours; they are read whole
    /// so that one answer covers them.
    private static final List<String> PAIRS = List.of("<=", ">=", "==", "!=", "&&", "||", "**", "<>", "=<", "=>");

    private static final String SINGLES = "+-*/^<>&|()[],=";

    private final String text;
    private final List<Token> found = new ArrayList<>();
    private int at;

    private Tokens(String text) {
        this.text = text;
    }

    static List<Token> of(String text) {
        return new Tokens(text).split();
    }

    /// The tokens that mean something, joined by one space.
    static String canonical(List<Token> tokens) {
        var out = new StringBuilder();
        for (Token token : tokens) {
            if (token.kind() == Token.Kind.COMMENT) continue;
            if (!out.isEmpty()) out.append(' ');
            out.append(token.text());
        }
        return out.toString();
    }

    private List<Token> split() {
        while (at < text.length()) {
            int c = text.codePointAt(at);
            if (Character.isWhitespace(c) || Character.isSpaceChar(c)) {
                at += Character.charCount(c);
            } else if (c == '#') {
                take(Token.Kind.COMMENT, endOfLine());
            } else if (startsName(c)) {
                name();
            } else if (isDigit(at) || (c == '.' && isDigit(at + 1))) {
                take(Token.Kind.NUMBER, endOfNumber());
            } else {
                mark(c);
            }
        }
        return found;
    }

    private void take(Token.Kind kind, int end) {
        found.add(new Token(kind, new Span(at, end), text.substring(at, end)));
        at = end;
    }

    private void name() {
        int end = at;
        while (end < text.length() && continuesName(text.codePointAt(end))) {
            end += Character.charCount(text.codePointAt(end));
        }
        String name = Normalizer.normalize(text.substring(at, end), Normalizer.Form.NFC);
        found.add(new Token(
                Functions.named(name).isPresent() ? Token.Kind.FUNCTION : Token.Kind.NAME, new Span(at, end), name));
        at = end;
    }

    private void mark(int c) {
        for (String pair : PAIRS) {
            if (text.startsWith(pair, at)) {
                take(Token.Kind.MARK, at + 2);
                return;
            }
        }
        take(SINGLES.indexOf(c) >= 0 ? Token.Kind.MARK : Token.Kind.UNREADABLE, at + Character.charCount(c));
    }

    private int endOfLine() {
        int end = at;
        while (end < text.length() && text.charAt(end) != '\n' && text.charAt(end) != '\r') end++;
        return end;
    }

    /// Takes every digit and point, so that `1.2.3` is one bad number; an exponent only where digits follow.
    private int endOfNumber() {
        int end = at;
        while (isDigit(end) || (end < text.length() && text.charAt(end) == '.')) end++;
        if (end < text.length() && (text.charAt(end) == 'e' || text.charAt(end) == 'E')) {
            int digits = end + 1;
            if (digits < text.length() && (text.charAt(digits) == '+' || text.charAt(digits) == '-')) digits++;
            if (isDigit(digits)) {
                end = digits;
                while (isDigit(end)) end++;
            }
        }
        return end;
    }

    private boolean isDigit(int index) {
        return index < text.length() && text.charAt(index) >= '0' && text.charAt(index) <= '9';
    }

    static boolean startsName(int c) {
        return Character.isLetter(c) || c == '_';
    }

    /// Combining marks belong to the name: composed with their letters they become letters.
    private static boolean continuesName(int c) {
        return Character.isLetterOrDigit(c)
                || c == '_'
                || Character.getType(c) == Character.NON_SPACING_MARK
                || Character.getType(c) == Character.COMBINING_SPACING_MARK;
    }
}
