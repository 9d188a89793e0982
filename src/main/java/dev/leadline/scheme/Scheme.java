package dev.leadline.scheme;

import java.util.List;
import java.util.Optional;

/// How a lane samples: a layout of points, optionally other densities to draw from and control variates.
public record Scheme(Points points, Optional<Proposal> drawFrom, List<Control> controls) {
    public Scheme {
        controls = List.copyOf(controls);
    }

    public static Scheme of(Points points) {
        return new Scheme(points, Optional.empty(), List.of());
    }

    /// Whether every draw is an observation of its own and counts 1.
    public boolean isPlain() {
        return points instanceof Independent && drawFrom.isEmpty() && controls.isEmpty();
    }

    /// Of growing points: draws whose mean is one independent observation.
    public int drawsPerObservation() {
        return ((Growing) points).drawsPerObservation()
                * drawFrom.map(proposal -> proposal.nominal().of()).orElse(1);
    }

    public boolean isWeighted() {
        return drawFrom.isPresent();
    }

    /// This scheme as a lane of so many draws has it.
    public Scheme within(long draws) {
        return new Scheme(points.within(draws), drawFrom, controls);
    }

    /// As `independent, drawn from other densities, 2 control variates`.
    public String inWords() {
        String weighted = isWeighted() ? ", drawn from other densities" : "";
        String controlled = controls.isEmpty()
                ? ""
                : controls.size() == 1 ? ", 1 control variate" : ", " + controls.size() + " control variates";
        return points.inWords() + weighted + controlled;
    }
}
