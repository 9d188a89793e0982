package dev.leadline.desktop.lanes;

import dev.leadline.desktop.working.NumberText;
import dev.leadline.model.DensityWords;
import dev.leadline.model.LaneDraft;
import dev.leadline.model.LaneDraft.DrawFrom;
import dev.leadline.model.LaneDraft.Other;
import java.util.Locale;
import java.util.StringJoiner;

/// How a lane samples, as written, in one line.
final class SchemeWords {
    private SchemeWords() {}

    /// As `scrambled-sobol, 16 replicates` or `independent, v from gumbel(42, 4), 1 control variate`.
    static String of(LaneDraft lane) {
        var words = new StringJoiner(", ").add(lane.points());
        var s = lane.settings();
        s.replicates().ifPresent(n -> words.add(n + " replicates"));
        s.cube().ifPresent(n -> words.add(n + " to a cube"));
        if (!s.cells().isEmpty()) {
            words.add("cells in " + String.join(", ", s.cells().keySet()));
        }
        s.allocation().ifPresent(word -> words.add(word + " allocation"));
        s.particles().ifPresent(n -> words.add(n + " particles"));
        s.repetitions().ifPresent(n -> words.add(n + " repetitions"));
        switch (lane.drawFrom()) {
            case DrawFrom.Adapted(String way) -> words.add("drawn as " + way + " finds");
            case DrawFrom.Inputs(var others) -> others.forEach((input, other) -> words.add(input + " " + of(other)));
        }
        int controls = lane.controls().size();
        if (controls > 0) {
            words.add(controls + (controls == 1 ? " control variate" : " control variates"));
        }
        lane.audit().ifPresent(draws -> words.add(String.format(Locale.ROOT, "audit of %,d draws", draws)));
        return words.toString();
    }

    private static String of(Other other) {
        return switch (other) {
            case Other.Another(var density) ->
                density.isUnchosen() ? "from a density to choose" : "from " + DensityWords.of(density);
            case Other.Shift(double by) -> "shifted by " + NumberText.show(by);
            case Other.Widen(double by) -> "widened " + NumberText.show(by) + " times";
            case Other.Tilt(double by) -> "tilted by " + NumberText.show(by);
            case Other.Adapt _ -> "as is found before the run";
        };
    }
}
