package dev.leadline.model;

import dev.leadline.estimate.Estimand;
import java.util.List;

/// Where the parts of an observation stand that each thing asked is made of: first what is asked, in order, then the
/// control variates, last the weight where draws are weighted. Formulas stand in the same order, but not one for one.
///
/// Of an outcome h an observation has
///
/// - for a mean, an integral or a probability: h;
/// - for a ratio: the one outcome and the other;
/// - for a standard deviation or a distribution: `h - c` and its square, with c near the middle of the outcomes;
/// - for a quantile: whether h is beyond a level near the quantile, 1 or 0;
/// - for a tail mean: how far h is beyond such a level, 0 where it is not, and whether it is.
///
/// What is near comes from pilot draws ([Landmark][dev.leadline.estimate.Landmark]) and is the same for a whole run, so
/// that
/// observations stay independent.
public final class Components {
    private Components() {}

    public static int of(Estimand estimand) {
        return switch (estimand) {
            case Estimand.Mean _, Estimand.Integral _, Estimand.Probability _, Estimand.Quantile _ -> 1;
            case Estimand.Ratio _, Estimand.StandardDeviation _, Estimand.Distribution _, Estimand.TailMean _ -> 2;
        };
    }

    /// Whether a component may take other values than 0 and 1 and the error of the answer follows from its spread. Of a
    /// standard deviation that is the square.
    public static boolean hasTail(List<Ask> asks, int component) {
        int first = 0;
        for (Ask ask : asks) {
            int within = component - first;
            if (within < of(ask.estimand())) {
                return switch (ask.estimand()) {
                    case Estimand.Mean _, Estimand.Integral _, Estimand.Ratio _ -> true;
                    case Estimand.Probability _, Estimand.Quantile _ -> false;
                    case Estimand.TailMean _, Estimand.Distribution _ -> within == 0;
                    case Estimand.StandardDeviation _ -> within == 1;
                };
            }
            first += of(ask.estimand());
        }
        return false;
    }

    /// The first component of the thing asked at `index`.
    public static int first(List<Ask> asks, int index) {
        return asks.stream()
                .limit(index)
                .map(Ask::estimand)
                .mapToInt(Components::of)
                .sum();
    }

    /// Components of all that is asked, before those of control variates.
    public static int asked(List<Ask> asks) {
        return first(asks, asks.size());
    }

    /// Index of the first formula of the thing asked at `index`.
    public static int firstFormula(List<Ask> asks, int index) {
        return asks.stream()
                .limit(index)
                .map(Ask::estimand)
                .mapToInt(Estimand::formulas)
                .sum();
    }

    /// Formulas of all that is asked, before those of control variates.
    public static int formulas(List<Ask> asks) {
        return firstFormula(asks, asks.size());
    }
}
