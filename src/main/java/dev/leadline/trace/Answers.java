package dev.leadline.trace;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.interval.ClopperPearson;
import dev.leadline.interval.Interval;
import dev.leadline.interval.Student;
import dev.leadline.model.Ask;
import dev.leadline.model.Question;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalLong;

/// What the sums of the observations say about each thing asked.
public final class Answers {
    private Answers() {}

    /// Of each interval, so that K answers hold together: `1 - (1 - confidence) / K` (Bonferroni).
    public static double level(Question question) {
        int answers = question.asks().size();
        return answers == 1 ? question.confidence() : 1 - (1 - question.confidence()) / answers;
    }

    public static List<Answer> of(Question question, Accumulator sums) {
        double level = level(question);
        var answers = new ArrayList<Answer>();
        for (int k = 0; k < question.asks().size(); k++) {
            answers.add(answer(question.asks().get(k), sums, k, level));
        }
        return answers;
    }

    private static Answer answer(Ask ask, Accumulator sums, int k, double level) {
        return switch (ask.estimand()) {
            case Estimand.Mean _, Estimand.Integral _ ->
                answer(ask, sums, k, Student.of(sums, k, level), OptionalLong.empty());
            case Estimand.Probability _ -> {
                long hits = sums.hits(k).orElseThrow();
                yield answer(
                        ask,
                        sums,
                        k,
                        ClopperPearson.of(hits, sums.count(), sums.excluded(), level),
                        OptionalLong.of(hits));
            }
        };
    }

    private static Answer answer(Ask ask, Accumulator sums, int k, Interval interval, OptionalLong hits) {
        return new Answer(
                ask.estimand(),
                ask.unit(),
                ask.label(),
                sums.mean(k),
                sums.constant(k) ? Double.NaN : sums.standardError(k),
                interval,
                hits,
                sums.count(),
                sums.excluded());
    }
}
