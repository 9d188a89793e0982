package dev.leadline.study;

import dev.leadline.model.UnitWords;
import dev.leadline.numeric.Rounding;
import dev.leadline.reference.ReferenceValue;
import dev.leadline.reference.ReferenceValue.Known;
import java.util.ArrayList;
import java.util.Locale;

/// A reference value in words.
public final class ReferenceText {
    private ReferenceText() {}

    /// As `0.0227501319482 ± 2.3e-12, by quadrature: the error is a bound, from 235,031 evaluations`.
    ///
    /// @param unit empty for none
    public static String of(ReferenceValue reference, String unit) {
        return switch (reference) {
            case Known known -> of(known, unit);
            case ReferenceValue.Sought _ -> "to be found by quadrature";
            case ReferenceValue.Unknown(var reason) -> "quadrature found none: " + reason;
        };
    }

    private static String of(Known known, String unit) {
        var parts = new ArrayList<String>();
        parts.add(number(known) + UnitWords.after(unit));
        switch (known.kind()) {
            case STATED -> {
                if (!known.source().isEmpty()) {
                    parts.add(known.source());
                }
            }
            case CLOSED_FORM -> parts.add("in closed form");
            case QUADRATURE -> parts.add("by quadrature");
        }
        String text = String.join(", ", parts);
        return known.evaluations().isEmpty()
                ? text
                : String.format(
                        Locale.ROOT,
                        "%s: the error is a bound, from %,d evaluation%s",
                        text,
                        known.evaluations().getAsLong(),
                        known.evaluations().getAsLong() == 1 ? "" : "s");
    }

    /// As `1.500 ± 0.012`.
    static String number(Known known) {
        var rounding = Rounding.of(known.value(), known.error());
        return rounding.uncertainty()
                .map(error -> rounding.value() + " ± " + error)
                .orElse(rounding.value());
    }
}
