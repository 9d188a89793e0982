package dev.leadline.study;

import dev.leadline.engine.Timing;
import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Logarithm;
import dev.leadline.interval.HitsRule;
import dev.leadline.interval.Ranks;
import dev.leadline.interval.TwoStage;
import dev.leadline.model.Ask;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.model.StopRule;
import dev.leadline.scheme.LatinHypercube;
import dev.leadline.scheme.Replicated;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Answers;
import dev.leadline.trace.Trace;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalLong;

/// How many draws of one lane the tolerance takes, from what a pilot or a finished run has shown.
///
/// @param scheme in words
/// @param seen draws that it is judged by
/// @param rule word of the stop rule in force
/// @param inForce under that rule; empty where it cannot be told
/// @param fixed where their number is chosen beforehand; empty where it cannot be told yet
/// @param anyTime where one looks until the any-time band is within the tolerance; of a probability with a
///     relative tolerance among independent draws, until there are hits enough
/// @param hits that rule waits for, where it does
/// @param limits draws from which on every quantile that is asked for has both its limits; empty where there
///     is none
/// @param lack why it cannot be told yet, and what would do
/// @param notes what must be known to read it
public record LanePlan(
        String lane,
        String scheme,
        long seen,
        String rule,
        Optional<Need> inForce,
        Optional<Need> fixed,
        Optional<Need> anyTime,
        OptionalLong hits,
        OptionalLong limits,
        Optional<String> lack,
        List<String> notes) {
    private static final StopRule ANY_TIME = new StopRule.AnyTime(OptionalLong.empty(), OptionalLong.empty());

    public LanePlan {
        notes = List.copyOf(notes);
    }

    /// @param lane as it was run
    /// @param trace one with a mark
    /// @param timing of its draws, the first of the two that were timed
    /// @param stop rule of the plan
    public static LanePlan of(Question question, Lane lane, Trace trace, Optional<Timing> timing, StopRule stop) {
        var contender = new Contender(question, lane, trace);
        var perDraw = timing.map(Timing::first);
        Optional<Logarithm> uncertain =
                Need.logarithm(question, contender).filter(log -> log.standardError() > Comparison.MOST_ERROR);
        Optional<Need> fixed = uncertain.isPresent() ? Optional.empty() : Need.of(question, contender, perDraw);
        Optional<HitsRule> rule = hitsRule(question, contender, ANY_TIME);
        Optional<Need> anyTime = fixed.isEmpty() ? Optional.empty() : Need.anyTime(question, contender, rule, perDraw);
        return new LanePlan(
                lane.name(),
                trace.scheme().inWords(),
                trace.last().orElseThrow().draws(),
                stop.within(question, contender.scheme()).word(),
                inForce(question, contender, stop, fixed, anyTime, perDraw),
                fixed,
                anyTime,
                rule.map(HitsRule::hits).map(OptionalLong::of).orElse(OptionalLong.empty()),
                limits(question, contender),
                fixed.isPresent() ? Optional.empty() : Optional.of(lack(contender, uncertain)),
                notes(contender));
    }

    /// The rule that waits for hits, where the rule comes to that.
    private static Optional<HitsRule> hitsRule(Question question, Contender lane, StopRule rule) {
        return rule.within(question, lane.scheme()) instanceof StopRule.Hits(long hits)
                ? Optional.of(new HitsRule(hits, question.level()))
                : Optional.empty();
    }

    private static Optional<Need> inForce(
            Question question,
            Contender lane,
            StopRule stop,
            Optional<Need> fixed,
            Optional<Need> anyTime,
            Optional<Logarithm> perDraw) {
        return fixed.flatMap(_ -> switch (stop.within(question, lane.scheme())) {
            case StopRule.Fixed _, StopRule.AsymptoticWidth _, StopRule.Stein _ -> fixed;
            case StopRule.AnyTime _ -> anyTime;
            case StopRule.Hits _ -> Need.anyTime(question, lane, hitsRule(question, lane, stop), perDraw);
            case StopRule.TwoStage(long first, double inflation) ->
                Need.twoStage(question, lane, new TwoStage(question.level(), first, inflation), perDraw);
            case StopRule.Jcgm101 _ -> Optional.empty();
        });
    }

    /// Of independent draws, which count by their ranks.
    private static OptionalLong limits(Question question, Contender lane) {
        double alone = (1 + Answers.level(question)) / 2;
        return lane.scheme().isPlain()
                ? question.asks().stream()
                        .map(Ask::estimand)
                        .filter(Estimand.Quantile.class::isInstance)
                        .mapToDouble(asked -> ((Estimand.Quantile) asked).at())
                        .mapToLong(q -> Math.max(Ranks.drawsForLower(q, alone, 1), Ranks.drawsForUpper(q, alone, 1)))
                        .max()
                : OptionalLong.empty();
    }

    private static String lack(Contender lane, Optional<Logarithm> uncertain) {
        Answer first = lane.trace().last().orElseThrow().answers().getFirst();
        if (uncertain.isPresent()) {
            double times = uncertain.get().standardError() / Comparison.MOST_ERROR;
            return String.format(
                    Locale.ROOT,
                    "what it would take is known to a factor of %.2g only; about %s draws in place of %,.0f would do",
                    StrictMath.exp(2 * uncertain.get().standardError()),
                    RatioText.about(lane.draws() * times * times),
                    lane.draws());
        }
        if (first.hits().orElse(1) == 0) {
            return String.format(
                    Locale.ROOT,
                    "no hit in %,.0f draws; a longer pilot would tell, or a lane that draws it more often",
                    lane.draws());
        }
        if (first.interval().note().isPresent()) {
            return first.interval().note().get();
        }
        return lane.scheme().points() instanceof Replicated
                ? "its error has to be seen to fall over at least three rounds"
                : String.format(Locale.ROOT, "%,.0f draws say too little of the spread", lane.draws());
    }

    private static List<String> notes(Contender lane) {
        List<String> notes = new ArrayList<>();
        if (lane.scheme().points() instanceof LatinHypercube cubes
                && lane.lane().scheme().drawsPerObservation() > 1) {
            notes.add(String.format(
                    Locale.ROOT,
                    "For cubes of %,d points; a run of more draws may have larger ones and need fewer.",
                    cubes.drawsPerObservation()));
        }
        return notes;
    }
}
