package dev.leadline.formula;

import dev.leadline.problem.Problem;
import java.text.Normalizer;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.SequencedMap;

/// The names that a formula may use, and what each stands for.
///
/// @param meanings by name, in the order in which they were declared; without [Functions#constants()]
public record Names(SequencedMap<String, Meaning> meanings) {

    /// What a name stands for.
    public sealed interface Meaning {
        /// A column of draws.
        record Input() implements Meaning {}

        /// A fixed number.
        record Constant(double value) implements Meaning {}

        /// An intermediate formula.
        record Step() implements Meaning {}

        /// In words, with its article.
        default String kind() {
            return switch (this) {
                case Input _ -> "an input";
                case Constant _ -> "a constant";
                case Step _ -> "a step";
            };
        }
    }

    public Names {
        var composed = new LinkedHashMap<String, Meaning>();
        meanings.forEach((name, meaning) -> composed.put(composed(name), meaning));
        meanings = Collections.unmodifiableSequencedMap(composed);
    }

    public static Names of(Map<String, Meaning> meanings) {
        return new Names(new LinkedHashMap<>(meanings));
    }

    /// What `name` stands for, [Functions#constants()] included where no other meaning shadows them.
    public Optional<Meaning> meaning(String name) {
        Meaning meaning = meanings.get(name);
        if (meaning != null) return Optional.of(meaning);
        return Optional.ofNullable(Functions.constants().get(name)).map(Meaning.Constant::new);
    }

    /// Why `name` cannot name an input, a constant or a step; empty where it can.
    public static Optional<Problem> fault(String name) {
        String composed = composed(name);
        if (!isName(composed)) {
            return Optional.of(Problem.of("\"" + name + "\" is not a name")
                    .because("a name is a letter or _, then letters, digits and _"));
        }
        return Functions.named(composed)
                .map(function -> Problem.of("name \"" + name + "\" is taken by the function " + function.form())
                        .tryThis("choose another name"));
    }

    /// Unicode's composed form, in which names are compared.
    static String composed(String name) {
        return Normalizer.normalize(name, Normalizer.Form.NFC);
    }

    private static boolean isName(String text) {
        return !text.isEmpty()
                && Tokens.startsName(text.codePointAt(0))
                && text.codePoints().allMatch(c -> Character.isLetterOrDigit(c) || c == '_');
    }
}
