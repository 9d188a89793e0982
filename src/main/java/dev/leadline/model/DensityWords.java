package dev.leadline.model;

import dev.leadline.model.DensityDraft.Column;
import dev.leadline.model.DensityDraft.Data;
import dev.leadline.model.DensityDraft.Ends;
import dev.leadline.model.DensityDraft.Member;
import dev.leadline.model.DensityDraft.Mixture;
import dev.leadline.model.DensityDraft.Typed;
import dev.leadline.model.DensityDraft.Values;
import dev.leadline.numeric.Shortest;
import dev.leadline.numeric.Significant;
import java.util.stream.Collectors;

/// A density as written, in one line: `gumbel(24.5, 2.6)`, `2 normal(0, 1) + 5 cut to 4 to ∞`, `data of waits.csv`.
public final class DensityWords {
    /// Numbers that take more characters are rounded.
    private static final int LONGEST = 9;

    private static final int DIGITS = 6;

    private DensityWords() {}

    public static String of(DensityDraft density) {
        String words = what(density.of());
        if (density.scale().isPresent()) {
            words = number(density.scale().getAsDouble()) + " " + words;
        }
        if (density.shift().isPresent()) {
            double shift = density.shift().getAsDouble();
            words += (shift < 0 ? " - " : " + ") + number(Math.abs(shift));
        }
        return words + density.truncate().map(DensityWords::cut).orElse("");
    }

    private static String what(DensityDraft.Of of) {
        return switch (of) {
            case Member member -> member(member);
            case Values(var values, var _) -> "table of " + counted(values.size(), "value");
            case Mixture(var parts) -> "mixture of " + counted(parts.size(), "part");
            case Typed(String formula, var _, var _, var _, boolean log) ->
                (log ? "formula exp(" + formula : "formula (" + formula) + ")";
            case Data data ->
                data.fitted().map(fit -> member(fit) + " fitted to ").orElse("data of ")
                        + data.file()
                        + column(data.column());
        };
    }

    private static String member(Member member) {
        return member.family()
                + member.parameters().values().stream()
                        .map(DensityWords::number)
                        .collect(Collectors.joining(", ", "(", ")"));
    }

    private static String column(Column column) {
        return switch (column) {
            case Column.Only _ -> "";
            case Column.Named(String header) -> ", " + header;
            case Column.At(long index) -> ", column " + index;
        };
    }

    private static String cut(Ends ends) {
        return " cut to " + number(ends.low()) + " to " + number(ends.high());
    }

    private static String counted(int n, String what) {
        return n + " " + what + (n == 1 ? "" : "s");
    }

    private static String number(double value) {
        String text = Shortest.text(value);
        return text.length() <= LONGEST ? text : Significant.text(value, DIGITS);
    }
}
