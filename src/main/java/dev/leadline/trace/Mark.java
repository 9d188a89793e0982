package dev.leadline.trace;

import java.util.List;

/// What a lane had shown after so many draws.
///
/// @param draws evaluations attempted
/// @param seconds of computing so far; the only number here that a clock decides
/// @param answers one for each thing asked, in order
public record Mark(long draws, double seconds, List<Answer> answers) {
    public Mark {
        answers = List.copyOf(answers);
    }
}
