package dev.leadline.scheme;

import java.util.List;
import java.util.Optional;

/// How a lane samples: a layout of points, optionally other densities to draw from and control variates.
///
/// @param crossFitted whether the coefficients of the control variates come from other observations than those they
///     correct
/// @param adapted a density of the points that is, or was, found before the run; never beside `drawFrom`
public record Scheme(
        Points points,
        Optional<Proposal> drawFrom,
        List<Control> controls,
        boolean crossFitted,
        Optional<Adapted> adapted) {
    public Scheme {
        controls = List.copyOf(controls);
    }

    public Scheme(Points points, Optional<Proposal> drawFrom, List<Control> controls) {
        this(points, drawFrom, controls, false, Optional.empty());
    }

    public static Scheme of(Points points) {
        return new Scheme(points, Optional.empty(), List.of());
    }

    /// Whether every draw is an observation of its own and counts 1.
    public boolean isPlain() {
        return points instanceof Independent && !isWeighted() && controls.isEmpty();
    }

    /// Of growing points: draws whose mean is one independent observation.
    public int drawsPerObservation() {
        return ((Growing) points).drawsPerObservation() * turns();
    }

    /// The least share of a draw's density that the inputs' own have; 0 for none.
    public double nominalShare() {
        return drawFrom.map(proposal -> proposal.nominal().value())
                .or(() -> adapted.map(density -> switch (density) {
                    case Adaptation wish -> wish.nominal().value();
                    case Tuned tuned -> (double) tuned.nominal() / tuned.of();
                }))
                .orElse(0.0);
    }

    /// Observations of the layout alone that take turns in the densities they are drawn from.
    public int turns() {
        int adapting = adapted.map(density -> switch (density) {
                    case Adaptation wish -> wish.units();
                    case Tuned tuned -> tuned.of();
                })
                .orElse(1);
        return adapting * drawFrom.map(proposal -> proposal.nominal().of()).orElse(1);
    }

    /// Draws of the least that has a mean: one observation, or the first point of each replicate.
    public long fewestDraws() {
        return switch (points) {
            case LatinHypercube cubes -> (long) cubes.fewestDraws() * turns();
            case Growing growing -> (long) growing.drawsPerObservation() * turns();
            case Replicated replicated -> replicated.replicates();
            case Repetitions _ -> 1;
        };
    }

    public boolean isWeighted() {
        return drawFrom.isPresent() || adapted.isPresent();
    }

    /// How the draws of a pass were shared before the run.
    public Optional<Allocation.Found> allotted() {
        return points instanceof Stratified cells ? cells.found() : Optional.empty();
    }

    /// What was found before the run.
    public Optional<Tuned> tuned() {
        return adapted.flatMap(density -> density instanceof Tuned tuned ? Optional.of(tuned) : Optional.empty());
    }

    /// This scheme with what was found.
    public Scheme with(Tuned tuned) {
        return new Scheme(points, drawFrom, controls, crossFitted, Optional.of(tuned));
    }

    /// This scheme with other points.
    public Scheme with(Points others) {
        return new Scheme(others, drawFrom, controls, crossFitted, adapted);
    }

    /// This scheme as a lane of so many draws has it.
    public Scheme within(long draws) {
        return with(points.within(draws / turns()));
    }

    /// As `independent, v from gumbel(42, 4), 10 % from its own, 2 control variates`.
    public String inWords() {
        String weighted = drawFrom.map(Proposal::inWords)
                .or(() -> adapted.map(Adapted::inWords))
                .map(words -> ", " + words)
                .orElse("");
        String controlled = controls.isEmpty()
                ? ""
                : controls.size() == 1 ? ", 1 control variate" : ", " + controls.size() + " control variates";
        return points.inWords() + weighted + controlled + (crossFitted ? ", cross-fitted" : "");
    }
}
