package dev.leadline.trace;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Estimate;
import dev.leadline.estimate.Outcomes;
import dev.leadline.model.Question;
import dev.leadline.scheme.Scheme;
import java.util.ArrayList;
import java.util.List;

/// What the observations say about each thing asked.
public final class Answers {
    private Answers() {}

    /// Of each interval, so that K answers hold together: `1 - (1 - confidence) / K` (Bonferroni).
    public static double level(Question question) {
        return question.level();
    }

    /// Of a question of means and chances, which sums alone answer.
    ///
    /// @param sums of every observation
    public static List<Answer> of(Question question, Scheme scheme, Accumulator sums) {
        return of(question, scheme, sums, List.of(sums), List.of());
    }

    /// @param sums of every observation
    /// @param blocks the same, in parts that are independent of each other
    /// @param outcomes of each thing asked; none for splitting
    public static List<Answer> of(
            Question question, Scheme scheme, Accumulator sums, List<Accumulator> blocks, List<Outcomes> outcomes) {
        double level = level(question);
        var answers = new ArrayList<Answer>();
        for (int index = 0; index < question.asks().size(); index++) {
            answers.add(of(new Shown(question, scheme, sums, blocks, outcomes, index, level)));
        }
        return answers;
    }

    static Answer of(Shown shown) {
        return switch (shown.ask().estimand()) {
            case Estimand.Mean _, Estimand.Integral _, Estimand.Probability _ -> MeanAnswers.of(shown);
            case Estimand.Ratio _ -> MomentAnswers.ratio(shown);
            case Estimand.StandardDeviation _ -> MomentAnswers.standardDeviation(shown);
            case Estimand.Quantile(double at) -> OrderAnswers.quantile(shown, at);
            case Estimand.TailMean(double at) -> OrderAnswers.tailMean(shown, at);
            case Estimand.Distribution(double coverage) -> OrderAnswers.distribution(shown, coverage);
        };
    }

    /// An answer as far as sums alone say it, so that schemes can be compared: of a quantile the share beyond the level
    /// near it, with the standard error as it would be at the quantile.
    ///
    /// @param index of the thing asked
    public static Estimate estimate(Question question, Scheme scheme, Accumulator sums, int index) {
        var shown = new Shown(question, scheme, sums, List.of(sums), List.of(), index, level(question));
        return switch (shown.ask().estimand()) {
            case Estimand.Mean _, Estimand.Integral _, Estimand.Probability _ -> MeanAnswers.estimate(shown);
            case Estimand.Ratio _ -> MomentAnswers.ratioOfMeans(shown).estimate();
            case Estimand.StandardDeviation _ -> MomentAnswers.deviation(shown);
            case Estimand.Quantile(double at) -> OrderAnswers.share(shown, at);
            case Estimand.TailMean(double at) -> OrderAnswers.beyond(shown, at);
            case Estimand.Distribution _ -> MeanAnswers.estimate(shown);
        };
    }
}
