package dev.leadline.density;

import dev.leadline.numeric.Significant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/// What a portrait says in words and digits, the same in the window and in the commands.
public final class PortraitText {
    private static final int DIGITS = 6;
    private static final int DIGITS_OF_SPREAD = 4;
    private static final int MOST_DIGITS = 15;

    /// Less than this part of the spread is rounding.
    private static final double NOTHING = 1e-13;

    private PortraitText() {}

    /// @param remark what the value means; often empty
    public record Row(String name, String value, String remark) {}

    public static List<Row> moments(Portrait portrait) {
        return List.of(
                new Row(
                        "mean",
                        Double.isFinite(portrait.mean()) ? value(portrait, portrait.mean()) : moment(portrait.mean()),
                        ""),
                new Row("sd", moment(portrait.sd()), "standard deviation"),
                new Row("variance", moment(portrait.variance()), ""),
                new Row("skewness", moment(rounded(portrait.skewness(), 1)), "0 for a symmetric density"),
                new Row("excess kurtosis", moment(portrait.excessKurtosis()), "0 for the normal density"));
    }

    /// Chances below and the values that have them.
    public static List<Row> quantiles(Portrait portrait) {
        return portrait.quantiles().stream()
                .map(q -> new Row(
                        below(q),
                        value(portrait, q.value()),
                        q.above() < .01 ? "exceeded " + oneIn(q.above()) : q.below() == .5 ? "median" : ""))
                .toList();
    }

    private static String value(Portrait portrait, double x) {
        double shown = portrait.support().low() < 0 ? rounded(x, portrait.spread()) : x;
        return Significant.text(shown, digits(portrait, shown));
    }

    /// 0 for what is 0 but for rounding.
    private static double rounded(double x, double size) {
        return Math.abs(x) < NOTHING * size ? 0 : x;
    }

    /// Six, and more where values far from 0 differ only in later ones.
    private static int digits(Portrait portrait, double x) {
        double apart = StrictMath.log10(Math.abs(x) / portrait.spread());
        return Double.isFinite(apart)
                ? Math.clamp((int) Math.ceil(apart) + DIGITS_OF_SPREAD, DIGITS, MOST_DIGITS)
                : DIGITS;
    }

    private static String below(Portrait.Quantile q) {
        return q.above() < .0005 ? "1 − " + Significant.text(q.above(), 3) : Significant.text(q.below(), 4);
    }

    /// Tails, then warnings, as sentences.
    public static List<String> sentences(Portrait portrait) {
        var all = new ArrayList<String>();
        portrait.tails().forEach(tail -> all.add(sentence(tail)));
        portrait.warnings().forEach(warning -> all.add(sentence(warning)));
        return all;
    }

    public static String sentence(String words) {
        return words.substring(0, 1).toUpperCase(Locale.ROOT) + words.substring(1) + ".";
    }

    /// What stands at one value, as `31.2 m/s: 92.7 % below, 7.3 % above (1 in 13.7)`.
    ///
    /// @param unit with a space before it, or empty
    public static String reading(Portrait portrait, double x, String unit) {
        var at = portrait.at(x);
        String own = portrait.isDiscrete() ? " has " + chance(at.pdf(), 1 - at.pdf()) + ";" : ":";
        String below = chance(at.below(), at.above()) + (portrait.isDiscrete() ? " up to it, " : " below, ");
        String oneIn = at.above() > 0 && at.above() < .5 ? " (" + oneIn(at.above()) + ")" : "";
        return Significant.text(x, digits(portrait, x) - 1) + unit + own + " " + below + chance(at.above(), at.below())
                + " above" + oneIn;
    }

    /// As `7.3 %`, `3.2e-7`, `1 − 3.2e-7`.
    private static String chance(double p, double rest) {
        if (rest > 0 && rest < .001) {
            return "1 − " + Significant.text(rest, 2);
        }
        return p > 0 && p < .001 ? Significant.text(p, 2) : Significant.text(100 * p, 3) + " %";
    }

    /// As `1 in 13.7`, `1 in 1,000,000`.
    static String oneIn(double p) {
        double n = 1 / p;
        String rounded = Significant.text(n, 3);
        return "1 in "
                + (n >= 1000 && n < 1e12 ? String.format(Locale.ROOT, "%,.0f", Double.parseDouble(rounded)) : rounded);
    }

    private static String moment(double value) {
        return Double.isNaN(value) ? "none" : Significant.text(value, DIGITS);
    }
}
