package dev.leadline.study.candidate;

import dev.leadline.density.Density;
import dev.leadline.model.Input;
import dev.leadline.model.LaneDraft.Other;
import java.util.Optional;

/// Where the outcome comes from, along one input: the values of its draws, counted by the size of the outcome.
///
/// @param away how far their mean is from the middle of the input's own density
/// @param width root of their mean square distance from that middle
record Gain(Input input, double away, double width) {
    static double middle(Density density) {
        return Double.isFinite(density.mean()) ? density.mean() : density.quantile(.5);
    }

    String name() {
        return input.name();
    }

    private Density own() {
        return input.drawn();
    }

    double spread() {
        double sd = Math.sqrt(own().variance());
        return sd > 0 && Double.isFinite(sd) ? sd : (own().quantile(.84) - own().quantile(.16)) / 2;
    }

    /// Whether the outcome comes from one side of most draws.
    boolean isAside() {
        return Math.abs(away) > .5 * spread();
    }

    /// Whether it comes from beyond most draws.
    boolean isBeyond() {
        return width > 1.3 * spread() && !own().isDiscrete();
    }

    /// The input's own density shifted to where the outcome comes from; empty where a gap would open behind it.
    Optional<Other> moved() {
        var support = own().support();
        boolean open =
                away > 0 ? support.low() == Double.NEGATIVE_INFINITY : support.high() == Double.POSITIVE_INFINITY;
        return open && !own().isDiscrete() ? Optional.of(new Other.Shift(Digits.three(away))) : Optional.empty();
    }
}
