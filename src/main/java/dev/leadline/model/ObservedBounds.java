package dev.leadline.model;

import dev.leadline.estimate.Estimand;
import dev.leadline.interval.Bounds;
import dev.leadline.model.Input.Role;
import java.util.List;
import java.util.Optional;

/// Between what the observations of a mean lie, where its outcomes lie between stated bounds.
public final class ObservedBounds {
    private ObservedBounds() {}

    /// The bounds themselves, of an integral times the volume of its ranges; empty where no bounds follow: of other
    /// answers, and of integrals over unbounded ranges, whose draws count one over a density.
    ///
    /// @param stated of the outcomes
    public static Optional<Bounds> of(Bounds stated, Estimand estimand, List<Input> inputs) {
        return switch (estimand) {
            case Estimand.Mean _ -> Optional.of(stated);
            case Estimand.Integral _ ->
                volume(inputs).map(volume -> new Bounds(volume * stated.low(), volume * stated.high()));
            case Estimand.Probability _,
                    Estimand.Quantile _,
                    Estimand.TailMean _,
                    Estimand.Ratio _,
                    Estimand.StandardDeviation _,
                    Estimand.Distribution _ -> Optional.empty();
        };
    }

    /// What the integrand is multiplied by, where that is one number.
    private static Optional<Double> volume(List<Input> inputs) {
        double volume = 1;
        for (Input input : inputs) {
            switch (input.role()) {
                case Role.Random() -> {}
                case Role.Range(double low, double high) -> volume *= high - low;
                case Role.UnboundedRange _ -> {
                    return Optional.empty();
                }
            }
        }
        return Optional.of(volume);
    }
}
