package dev.leadline.chart;

import dev.leadline.density.Portrait.Bar;
import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Histogram;
import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.reference.ReferenceValue.Known;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Answers;
import dev.leadline.trace.Mark;
import dev.leadline.trace.Spread;
import dev.leadline.trace.Trace;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/// What the *Outcomes* picture shows: how the outcomes of what is asked lie in each lane, by their weights, and where
/// the answer lies among them. Plain data, immutable.
///
/// @param title of the question
/// @param formula whose outcomes they are
/// @param unit of the outcomes; empty for none
/// @param level of confidence of the intervals
/// @param seed of the draws
/// @param estimand what is asked of them
/// @param reference of the answer
/// @param lanes at most four, in the order of the question
public record Outcomes(
        String title,
        String formula,
        String unit,
        double level,
        long seed,
        Estimand estimand,
        Optional<Known> reference,
        List<Lying> lanes)
        implements Subject {
    /// With fewer draws nothing is said of whether outcomes are discrete.
    private static final int FEW = 50;

    /// Widths of bars, in bins.
    private static final int[] WIDTHS = {1, 2, 4, 5, 8, 10, 20};

    public Outcomes {
        lanes = List.copyOf(lanes);
        if (lanes.size() > LaneLook.values().length) {
            throw new IllegalArgumentException(lanes.size() + " lanes in a picture for four");
        }
    }

    /// A lane.
    ///
    /// @param bars stretches with the share of the outcomes in each; of no length where outcomes are discrete
    /// @param below share of the outcomes below all bars
    /// @param above share above them
    /// @param tailFrom where the part begins of which a tail mean is the mean, about; `NaN` where nothing is known
    /// @param answer the latest
    public record Lying(
            String lane,
            String scheme,
            List<Bar> bars,
            boolean discrete,
            double below,
            double above,
            double tailFrom,
            Optional<Answer> answer) {
        public Lying {
            bars = List.copyOf(bars);
        }

        /// Share of the outcomes below the end of a bar.
        double upTo(int bar) {
            return below
                    + bars.subList(0, bar + 1).stream().mapToDouble(Bar::chance).sum();
        }
    }

    /// Of the first thing asked.
    public static Outcomes of(Question question, Plan plan, List<Trace> traces) {
        var ask = question.asks().getFirst();
        boolean onScale = isOnScale(ask.estimand());
        return new Outcomes(
                question.title(),
                ask.formulas().getFirst(),
                onScale || ask.estimand() instanceof Estimand.StandardDeviation ? ask.unit() : "",
                Answers.level(question),
                plan.seed(),
                ask.estimand(),
                onScale ? Settling.reference(question, traces) : Optional.empty(),
                traces.stream().map(trace -> of(trace, ask.estimand())).toList());
    }

    /// Whether an answer is a value among the outcomes; a ratio and a deviation are not, and a chance is their share.
    static boolean isOnScale(Estimand estimand) {
        return switch (estimand) {
            case Estimand.Mean _,
                    Estimand.Integral _,
                    Estimand.Quantile _,
                    Estimand.TailMean _,
                    Estimand.Distribution _ -> true;
            case Estimand.Probability _, Estimand.Ratio _, Estimand.StandardDeviation _ -> false;
        };
    }

    private static Lying of(Trace trace, Estimand estimand) {
        var answer = trace.last().map(Mark::answers).map(List::getFirst);
        var chance = answer.filter(a -> a.estimand() instanceof Estimand.Probability)
                .map(Answer::estimate)
                .filter(Double::isFinite);
        if (chance.isPresent()) {
            double p = Math.clamp(chance.get(), 0, 1);
            return lying(trace, List.of(new Bar(0, 0, 1 - p), new Bar(1, 1, p)), true, 0, 0, Double.NaN, answer);
        }
        var seen = trace.outcomes().stream()
                .findFirst()
                .filter(spread -> spread.histogram().total() > 0);
        if (seen.isEmpty()) {
            return lying(trace, List.of(), false, 0, 0, Double.NaN, answer);
        }
        Spread spread = seen.get();
        var histogram = spread.histogram();
        double total = histogram.total();
        boolean discrete = isDiscrete(histogram);
        double from = estimand instanceof Estimand.TailMean ? spread.landmark().level() : Double.NaN;
        return lying(
                trace,
                discrete ? values(histogram) : stretches(histogram),
                discrete,
                histogram.below() / total,
                histogram.above() / total,
                from,
                answer);
    }

    private static Lying lying(
            Trace trace,
            List<Bar> bars,
            boolean discrete,
            double below,
            double above,
            double tailFrom,
            Optional<Answer> answer) {
        return new Lying(trace.lane(), trace.scheme().inWords(), bars, discrete, below, above, tailFrom, answer);
    }

    /// Whether no two bins side by side have outcomes: of whole numbers over less than a hundred of them, or of a few
    /// values.
    private static boolean isDiscrete(Histogram histogram) {
        for (int i = 1; i < Histogram.BINS; i++) {
            if (histogram.weight(i) > 0 && histogram.weight(i - 1) > 0) {
                return false;
            }
        }
        return histogram.draws() >= FEW;
    }

    /// A bar for each value; a bin with one value in it is taken to have the whole number in it, where there is one.
    private static List<Bar> values(Histogram histogram) {
        var bars = new ArrayList<Bar>();
        double width = (histogram.to() - histogram.from()) / Histogram.BINS;
        for (int i = 0; i < Histogram.BINS; i++) {
            if (histogram.weight(i) > 0) {
                double low = histogram.from() + i * width;
                double whole = Math.ceil(low - 1e-9 * width);
                double value = i == Histogram.BINS - 1 ? histogram.to() : whole <= low + width ? whole : low;
                bars.add(new Bar(value, value, histogram.weight(i) / histogram.total()));
            }
        }
        return bars;
    }

    /// As many as so many draws fill: about twice the cube root of their number, by Rice's rule.
    private static List<Bar> stretches(Histogram histogram) {
        double wanted = 2 * Math.cbrt(histogram.draws());
        int width = Arrays.stream(WIDTHS)
                .filter(w -> Histogram.BINS / w <= wanted)
                .findFirst()
                .orElse(WIDTHS[WIDTHS.length - 1]);
        double bin = (histogram.to() - histogram.from()) / Histogram.BINS;
        var bars = new ArrayList<Bar>();
        for (int i = 0; i < Histogram.BINS; i += width) {
            double weight = 0;
            for (int k = i; k < i + width; k++) {
                weight += histogram.weight(k);
            }
            bars.add(new Bar(
                    histogram.from() + i * bin, histogram.from() + (i + width) * bin, weight / histogram.total()));
        }
        return bars;
    }

    /// Whether every lane that has outcomes has discrete ones.
    boolean isDiscrete() {
        return lanes.stream().filter(lane -> !lane.bars().isEmpty()).allMatch(Lying::discrete);
    }

    /// The lane whose coverage intervals are drawn: the first that has some.
    Optional<Lying> covered() {
        return lanes.stream()
                .filter(lane -> lane.answer().flatMap(Answer::coverage).isPresent())
                .findFirst();
    }

    @Override
    public String caption() {
        return Caption.of(this);
    }
}
