package dev.leadline.trace;

import dev.leadline.estimate.Estimate;
import dev.leadline.estimate.LogDeviation;
import dev.leadline.estimate.Logarithm;
import dev.leadline.estimate.RatioOfMeans;
import dev.leadline.interval.Fieller;
import dev.leadline.interval.LogScale;

/// Answers that are a smooth function of several means: ratios and standard deviations.
final class MomentAnswers {
    private MomentAnswers() {}

    static Answer ratio(Shown shown) {
        var ratio = ratioOfMeans(shown);
        return Answer.of(shown.ask(), ratio.estimate(), Fieller.orDelta(ratio, shown.level()), shown.sums());
    }

    /// Weights known up to a factor leave it as it is.
    static RatioOfMeans ratioOfMeans(Shown shown) {
        return RatioOfMeans.of(shown.sums(), shown.first(), shown.first() + 1);
    }

    static Answer standardDeviation(Shown shown) {
        return Answer.of(shown.ask(), deviation(shown), LogScale.of(logarithm(shown), shown.level()), shown.sums());
    }

    static Estimate deviation(Shown shown) {
        var logarithm = logarithm(shown);
        double deviation = StrictMath.exp(logarithm.value());
        return new Estimate(
                deviation, deviation * logarithm.standardError(), shown.sums().count() - 1);
    }

    static Logarithm logarithm(Shown shown) {
        int first = shown.first();
        return shown.isSelfNormalised()
                ? LogDeviation.of(shown.sums(), first, first + 1, shown.weight())
                : LogDeviation.of(shown.sums(), first, first + 1);
    }
}
