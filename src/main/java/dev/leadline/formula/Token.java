package dev.leadline.formula;

import dev.leadline.problem.Span;

/// A word, number or mark of a formula, and where it stands.
///
/// @param text as written; names in Unicode's composed form (NFC)
public record Token(Kind kind, Span span, String text) {

    /// What a token is, as far as that can be seen without knowing the names of the question.
    public enum Kind {
        /// A name of an input, a constant or a step.
        NAME,
        /// The name of a known function.
        FUNCTION,
        NUMBER,
        /// An operator, a bracket or a comma.
        MARK,
        /// From `#` to the end of the line.
        COMMENT,
        /// Something that no formula holds.
        UNREADABLE
    }

    boolean is(String mark) {
        return kind == Kind.MARK && text.equals(mark);
    }

    boolean isOneOf(String... marks) {
        for (String mark : marks) {
            if (is(mark)) return true;
        }
        return false;
    }

    /// Whether a value starts and ends here.
    boolean isOperand() {
        return kind == Kind.NAME || kind == Kind.NUMBER;
    }
}
