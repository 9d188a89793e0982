package dev.leadline.formula;

import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/// What to write for marks and words that mean something elsewhere.
final class Hints {
    private static final Map<String, String> MARKS = Map.ofEntries(
            Map.entry("&&", "write & for and"),
            Map.entry("||", "write | for or"),
            Map.entry("**", "write ^ for a power"),
            Map.entry("<>", "write != for not equal"),
            Map.entry("=<", "write <="),
            Map.entry("=>", "write >="),
            Map.entry("!", "write not(c), != for not equal, gammaFn(n + 1) for a factorial"),
            Map.entry("~", "write not(c)"),
            Map.entry("%", "write 0.01* for a percentage"),
            Map.entry("{", "write ( ) to group"),
            Map.entry("}", "write ( ) to group"),
            Map.entry(";", "write , between values"),
            Map.entry(".", "a point stands inside a number, as in 0.5"),
            Map.entry("×", "write *"),
            Map.entry("·", "write *"),
            Map.entry("⋅", "write *"),
            Map.entry("∗", "write *"),
            Map.entry("÷", "write /"),
            Map.entry("∕", "write /"),
            Map.entry("−", "write -"),
            Map.entry("‐", "write -"),
            Map.entry("‑", "write -"),
            Map.entry("–", "write -"),
            Map.entry("—", "write -"),
            Map.entry("≤", "write <="),
            Map.entry("≥", "write >="),
            Map.entry("≠", "write !="),
            Map.entry("∧", "write & for and"),
            Map.entry("∨", "write | for or"),
            Map.entry("¬", "write not(c)"),
            Map.entry("√", "write sqrt(x)"),
            Map.entry("²", "write ^2"),
            Map.entry("³", "write ^3"),
            Map.entry("°", "write *deg"),
            Map.entry("∞", "every number of a formula is finite"));

    /// Where a value stands or a function; in small letters.
    private static final Map<String, String> WORDS = Map.ofEntries(
            Map.entry("and", "write & for and"),
            Map.entry("or", "write | for or"),
            Map.entry("xor", "write != for one of two but not both"),
            Map.entry("mod", "write x - n*floor(x/n)"),
            Map.entry("true", "write 1"),
            Map.entry("false", "write 0"),
            Map.entry("π", "write pi"),
            Map.entry("inf", "every number of a formula is finite"),
            Map.entry("infinity", "every number of a formula is finite"),
            Map.entry("nan", "every number of a formula is finite"),
            Map.entry("rand", "declare an input with a density"),
            Map.entry("random", "declare an input with a density"));

    /// Where a function stands; as names of inputs some of these are common. In small letters.
    private static final Map<String, String> FUNCTIONS = Map.ofEntries(
            Map.entry("ln", "write log(x): it is the natural logarithm"),
            Map.entry("lg", "write log10(x)"),
            Map.entry("log2", "write log(x)/log(2)"),
            Map.entry("exp10", "write 10^x"),
            Map.entry("pow", "write x^y"),
            Map.entry("power", "write x^y"),
            Map.entry("arcsin", "write asin(x)"),
            Map.entry("arccos", "write acos(x)"),
            Map.entry("arctan", "write atan(x)"),
            Map.entry("sgn", "write sign(x)"),
            Map.entry("signum", "write sign(x)"),
            Map.entry("fabs", "write abs(x)"),
            Map.entry("trunc", "write sign(x)*floor(abs(x))"),
            Map.entry("cot", "write 1/tan(x)"),
            Map.entry("gamma", "write gammaFn(x), or lgamma(x) for its logarithm"),
            Map.entry("factorial", "write gammaFn(n + 1)"),
            Map.entry("phi", "write normalCdf(x), or normalPdf(x) for the density"));

    private Hints() {}

    static Optional<String> forMark(String mark) {
        return Optional.ofNullable(MARKS.get(mark));
    }

    static Optional<String> forWord(String word) {
        return Optional.ofNullable(WORDS.get(word.toLowerCase(Locale.ROOT)));
    }

    static Optional<String> forFunction(String word) {
        return forWord(word).or(() -> Optional.ofNullable(FUNCTIONS.get(word.toLowerCase(Locale.ROOT))));
    }
}
