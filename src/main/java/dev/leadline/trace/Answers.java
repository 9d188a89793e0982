package dev.leadline.trace;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Estimate;
import dev.leadline.estimate.Regression;
import dev.leadline.estimate.SelfNormalised;
import dev.leadline.interval.ClopperPearson;
import dev.leadline.interval.Interval;
import dev.leadline.interval.Student;
import dev.leadline.model.Ask;
import dev.leadline.model.Question;
import dev.leadline.scheme.Proposal;
import dev.leadline.scheme.Scheme;
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

    public static List<Answer> of(Question question, Scheme scheme, Accumulator sums) {
        double level = level(question);
        var answers = new ArrayList<Answer>();
        for (int k = 0; k < question.asks().size(); k++) {
            answers.add(answer(question, scheme, sums, k, level));
        }
        return answers;
    }

    private static Answer answer(Question question, Scheme scheme, Accumulator sums, int k, double level) {
        Ask ask = question.asks().get(k);
        if (ask.estimand() instanceof Estimand.Probability && scheme.isPlain()) {
            long hits = sums.hits(k).orElseThrow();
            var interval = ClopperPearson.of(hits, sums.count(), sums.excluded(), level);
            return answer(ask, sums, Estimate.mean(sums, k), interval, OptionalLong.of(hits));
        }
        Estimate estimate = estimate(scheme, sums, k, question.asks().size());
        var interval = Student.of(estimate, level);
        return answer(ask, sums, estimate, bounded(ask, interval), OptionalLong.empty());
    }

    /// The estimate alone, before its interval.
    ///
    /// @param asks components before those of the control variates
    public static Estimate estimate(Scheme scheme, Accumulator sums, int k, int asks) {
        if (scheme.drawFrom().filter(Proposal::selfNormalised).isPresent()) {
            return SelfNormalised.of(sums, k, sums.components() - 1);
        }
        return scheme.controls().isEmpty()
                ? Estimate.mean(sums, k)
                : Regression.of(sums, k, asks, scheme.controls().size());
    }

    /// A chance is neither below 0 nor above 1.
    private static Interval bounded(Ask ask, Interval interval) {
        return ask.estimand() instanceof Estimand.Probability ? interval.within(0, 1) : interval;
    }

    private static Answer answer(Ask ask, Accumulator sums, Estimate estimate, Interval interval, OptionalLong hits) {
        return new Answer(
                ask.estimand(),
                ask.unit(),
                ask.label(),
                estimate.value(),
                estimate.standardError() == 0 ? Double.NaN : estimate.standardError(),
                interval,
                hits,
                sums.count(),
                sums.excluded());
    }
}
