package dev.leadline.ground;

import java.util.List;
import java.util.Locale;
import java.util.Optional;

/// A reason for or against signing.
///
/// @param code stable word for programs, as `few-hits`
/// @param strength of a doubt; empty otherwise
/// @param text one sentence of evidence with its number, no full stop
/// @param remedy what could be done about it
/// @param actions the same as far as the program can help with it, the best first
public record Ground(
        String code,
        Status status,
        Optional<Strength> strength,
        String text,
        Optional<String> remedy,
        List<Action> actions) {
    public Ground {
        actions = List.copyOf(actions);
    }

    public enum Status {
        SHOWN("shown"),
        DOUBTED("doubted"),
        NOT_DONE("not-done");

        private final String word;

        Status(String word) {
            this.word = word;
        }

        public String word() {
            return word;
        }
    }

    /// Of a doubt; the strongest last.
    public enum Strength {
        NOTE("note"),
        CAUTION("caution"),
        OBJECTION("objection");

        private final String word;

        Strength(String word) {
            this.word = word;
        }

        public String word() {
            return word;
        }
    }

    static Ground shown(String code, String text) {
        return new Ground(code, Status.SHOWN, Optional.empty(), sentence(text), Optional.empty(), List.of());
    }

    static Ground doubted(String code, Strength strength, String text, String remedy, Action... actions) {
        return new Ground(
                code, Status.DOUBTED, Optional.of(strength), sentence(text), Optional.of(remedy), List.of(actions));
    }

    static Ground notDone(String code, String text, String remedy, Action... actions) {
        return new Ground(
                code, Status.NOT_DONE, Optional.empty(), sentence(text), Optional.of(remedy), List.of(actions));
    }

    private static String sentence(String text) {
        return text.substring(0, 1).toUpperCase(Locale.ROOT) + text.substring(1);
    }

    public boolean objects() {
        return strength.filter(Strength.OBJECTION::equals).isPresent();
    }
}
