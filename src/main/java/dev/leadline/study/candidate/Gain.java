package dev.leadline.study.candidate;

import dev.leadline.density.Density;
import dev.leadline.density.Tilted;
import dev.leadline.model.Input;
import dev.leadline.model.LaneDraft.Other;
import dev.leadline.problem.Refusal;
import java.util.Optional;

/// Where the outcome comes from, along one input: the values of its draws, counted by the size of the outcome.
///
/// @param away how far their mean is from the middle of the input's own density
/// @param width root of their mean square distance from that middle
record Gain(Input input, double away, double width) {
    /// Of the way to where the outcome comes from, how much a tilt may miss.
    private static final double NEAR = .1;

    private static final int STEPS = 20;

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

    /// The input's own density moved to where the outcome comes from: shifted where no gap opens behind it, else
    /// tilted; empty where neither can be.
    Optional<Other> moved() {
        var support = own().support();
        boolean open =
                away > 0 ? support.low() == Double.NEGATIVE_INFINITY : support.high() == Double.POSITIVE_INFINITY;
        return open && !own().isDiscrete() ? Optional.of(new Other.Shift(Digits.three(away))) : tilted();
    }

    /// Tilted until its mean is where the outcome comes from.
    Optional<Other> tilted() {
        double near = 0;
        double far = Double.NaN;
        double tilt = away / (spread() * spread());
        for (int step = 0; step < STEPS; step++) {
            double left = missing(tilt);
            if (Math.abs(left) <= NEAR * Math.abs(away)) {
                return Optional.of(new Other.Tilt(Digits.three(tilt)));
            }
            if (left * away > 0) {
                near = tilt;
            } else {
                far = tilt;
            }
            tilt = Double.isNaN(far) ? 2 * tilt : (near + far) / 2;
        }
        return Optional.empty();
    }

    /// How far the tilted mean is short of where it should be; past it, without end, where there is no such density.
    private double missing(double tilt) {
        try {
            return middle(own()) + away - Tilted.of(own(), tilt).density().mean();
        } catch (Refusal _) {
            return -Math.copySign(Double.MAX_VALUE, away);
        }
    }
}
