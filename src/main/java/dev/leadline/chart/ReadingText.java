package dev.leadline.chart;

import dev.leadline.interval.Interval;
import dev.leadline.model.UnitWords;
import dev.leadline.numeric.Rounding;
import dev.leadline.numeric.Significant;

/// What the mouse reads at a mark.
final class ReadingText {
    private static final int DIGITS = 6;

    private ReadingText() {}

    /// As `1.3e-5 ± .7e-5 per year after 1,120,000 draws`.
    static String of(Point p, String unit) {
        String after = after(p);
        String in = UnitWords.after(unit);
        double half = (p.high() - p.low()) / 2;
        if (!Double.isFinite(p.estimate())) {
            return "no estimate yet" + after;
        }
        if (!(half > 0)) {
            return Significant.text(p.estimate(), DIGITS) + in + after;
        }
        var text = Rounding.of(p.estimate(), half);
        String band = Double.isFinite(p.bandHigh() - p.bandLow())
                ? ", any-time band " + text.down(p.bandLow()) + " to " + text.up(p.bandHigh())
                : "";
        if (Interval.lopsided(p.estimate(), p.low(), p.high())) {
            return text.value() + in + ", between " + text.down(p.low()) + " and " + text.up(p.high()) + band + after;
        }
        return text.value() + " ± " + text.uncertainty().orElse("") + in + band + after;
    }

    /// As `± .7e-5 per year after 1,120,000 draws`.
    static String ofReach(Point p, String unit) {
        double reach = ErrorDecay.reach(p);
        return reach > 0
                ? "± " + Significant.text(reach, 3) + UnitWords.after(unit) + after(p)
                : "no interval yet" + after(p);
    }

    /// As `weight 10 is 5.31 times the mean; the largest 10 have 0.02 % of all weight`.
    static String ofWeight(Weights.Weighed lane, int rank) {
        String mean = Significant.text(lane.largest().get(rank - 1).estimate(), 3);
        String share = Significant.text(100 * lane.share(rank), 2);
        return rank == 1
                ? "the largest weight is %s times the mean, %s %% of all weight".formatted(mean, share)
                : "weight %d is %s times the mean; the largest %d have %s %% of all weight"
                        .formatted(rank, mean, rank, share);
    }

    /// As `repetition 12 of 2,000 in this order: 1.21 ± 0.35, misses`.
    static String ofRepetition(Repeated.Placed one, String unit) {
        var p = one.point();
        double half = (p.high() - p.low()) / 2;
        var text = Rounding.of(p.estimate(), half);
        return "%s%s, interval %s to %s, %s"
                .formatted(
                        text.value(),
                        UnitWords.after(unit),
                        text.down(p.low()),
                        text.up(p.high()),
                        one.missed() ? "misses the value" : "holds the value");
    }

    /// As `2.3 % of the outcomes from 3.1 to 3.2 mm, 45 % up to there`.
    static String ofOutcomes(Outcomes.Lying lane, int at, String unit) {
        var bar = lane.bars().get(at);
        String place = lane.discrete()
                ? "are " + Significant.text(bar.from(), DIGITS)
                : "from " + Significant.text(bar.from(), 4) + " to " + Significant.text(bar.to(), 4);
        return "%s %% of the outcomes %s%s, %s %% up to there"
                .formatted(
                        Significant.text(100 * bar.chance(), 3),
                        place,
                        UnitWords.after(unit),
                        Significant.text(100 * lane.upTo(at), 4));
    }

    private static String after(Point p) {
        return " after " + Typeset.count(p.draws()) + " draws";
    }
}
