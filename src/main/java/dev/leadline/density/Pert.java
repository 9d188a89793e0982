package dev.leadline.density;

import static dev.leadline.density.Rule.between;
import static dev.leadline.density.Rule.finite;

/// The PERT density: a beta density between `from` and `to` whose mean is
/// `(from + emphasis mode + to) / (emphasis + 2)`.
///
/// Error: relative 1e-12 in both tails (`DensityTablesTest`).
///
/// Source: Malcolm, Roseboom, Clark and Fazar (1959), Oper. Res. 7, 646-669, for the mean with weight 4; the parameters
/// follow from mode and mean. Its standard deviation is not `(to - from) / 6`, which is a rule of thumb.
public record Pert(double from, double mode, double to, double emphasis) implements Renamed {
    private static final Entry ENTRY = Entry.of(
                    v -> new Pert(v[0], v[1], v[2], v[3]),
                    finite("from", "least value"),
                    finite("mode", "most likely value"),
                    finite("to", "largest value"),
                    between(
                                    0.01,
                                    1e5,
                                    "emphasis",
                                    "how often the most likely value counts against each limit",
                                    "Below, the density is uniform; above, a single point.")
                            .or(4))
            .and(v -> Triangular.ordered(v[0], v[1], v[2]));

    static final Family FAMILY = new Described(
            "pert", "least, most likely and largest value by judgement: durations, costs, quantities", ENTRY);

    public Pert {
        ENTRY.check(from, mode, to, emphasis);
    }

    @Override
    public Beta member() {
        double width = to - from;
        return new Beta(1 + emphasis * ((mode - from) / width), 1 + emphasis * ((to - mode) / width), from, to);
    }
}
