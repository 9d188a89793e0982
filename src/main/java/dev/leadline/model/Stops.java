package dev.leadline.model;

import dev.leadline.estimate.Estimand;
import dev.leadline.interval.HitsRule;
import dev.leadline.model.Draft.GuardDraft;
import dev.leadline.model.Draft.StopDraft;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import dev.leadline.scheme.Growing;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/// Makes the stop rule of its draft.
final class Stops {
    /// Beyond it a first stage is a run of its own.
    private static final long MOST_FIRST = 100_000_000;

    private static final List<String> WORDS = List.of(
            StopRule.Fixed.WORD,
            StopRule.AnyTime.WORD,
            StopRule.Hits.WORD,
            StopRule.TwoStage.WORD,
            StopRule.Stein.WORD,
            StopRule.AsymptoticWidth.WORD,
            StopRule.Jcgm101.WORD);

    private static final StopDraft NOTHING = new StopDraft("", OptionalLong.empty(), OptionalDouble.empty());

    private final Draft draft;
    private final StopDraft stop;
    private final Findings findings;
    private final String rule;

    private Stops(Draft draft, Findings findings) {
        this.draft = draft;
        this.stop = draft.stop().orElse(NOTHING);
        this.findings = findings;
        this.rule = word(draft);
    }

    /// Words of the rules, in the order in which they are offered.
    static List<String> words() {
        return WORDS;
    }

    /// The rule that a draft names; where it names none, `any-time` beside a tolerance and `fixed` without.
    static String word(Draft draft) {
        return draft.stop()
                .map(StopDraft::rule)
                .filter(word -> !word.isEmpty())
                .orElse(draft.tolerance().isPresent() ? StopRule.AnyTime.WORD : StopRule.Fixed.WORD);
    }

    /// What it says by itself; whether it fits the question is for [#check] to say.
    static Stop of(Draft draft, Findings findings) {
        return new Stops(draft, findings).make();
    }

    private Stop make() {
        if (!WORDS.contains(rule)) {
            Problem problem = Problem.of("the stop rule \"%s\" is not available".formatted(rule))
                    .because("It is one of %s.".formatted(String.join(", ", WORDS)));
            findings.add(
                    "$.stop.rule",
                    Nearest.to(rule, WORDS)
                            .map(near -> problem.tryThis("Was \"%s\" meant?".formatted(near)))
                            .orElse(problem.tryThis(
                                    "Write \"stop\": {\"rule\": \"any-time\", \"draws\": 100000000}.")));
        } else {
            foreign("hits", stop.hits().isPresent(), StopRule.Hits.WORD);
            foreign("guard", stop.guard().isPresent(), StopRule.AnyTime.WORD, StopRule.AsymptoticWidth.WORD);
            foreign("first", stop.first().isPresent(), StopRule.TwoStage.WORD, StopRule.Stein.WORD);
            foreign("inflation", stop.inflation().isPresent(), StopRule.TwoStage.WORD);
            foreign("digits", stop.digits().isPresent(), StopRule.Jcgm101.WORD);
        }
        count("draws", stop.draws(), 1, Stop.MOST_DRAWS, "It is the number of evaluations.");
        count("hits", stop.hits(), 2, Stop.MOST_DRAWS, "It is the number of hits to stop at.");
        count("digits", stop.digits(), 1, 2, "It is how many digits of the standard uncertainty count.");
        count(
                "first",
                stop.first(),
                rule.equals(StopRule.TwoStage.WORD) ? 4 : 2,
                MOST_FIRST,
                "It is the number of observations that the first stage makes.");
        stop.guard().ifPresent(guard -> {
            count("guard.draws", guard.draws(), 2, Stop.MOST_DRAWS, "The rule looks from so many draws on.");
            count("guard.hits", guard.hits(), 1, Stop.MOST_DRAWS, "The rule looks from so many hits on.");
        });
        stop.seconds().ifPresent(seconds -> {
            if (!(seconds > 0 && Double.isFinite(seconds))) {
                findings.add(
                        "$.stop.seconds",
                        "seconds is %s but must be greater than 0".formatted(Shortest.text(seconds)),
                        "It is the time a lane may compute.");
            }
        });
        stop.inflation().ifPresent(inflation -> {
            if (!(inflation > 1 && Double.isFinite(inflation))) {
                findings.add(
                        "$.stop.inflation",
                        "inflation is %s but must be greater than 1".formatted(Shortest.text(inflation)),
                        "The standard deviation of the first stage is multiplied by it, to bound the true one.");
            }
        });
        return new Stop(rule(), stop.draws().orElse(unsaid()), stop.seconds());
    }

    private long unsaid() {
        return stop.seconds().isPresent()
                ? Stop.MOST_DRAWS
                : rule.equals(StopRule.Fixed.WORD) ? Stop.USUAL_DRAWS : Stop.PATIENT_DRAWS;
    }

    private StopRule rule() {
        var guardDraws = stop.guard().map(GuardDraft::draws).orElse(OptionalLong.empty());
        var guardHits = stop.guard().map(GuardDraft::hits).orElse(OptionalLong.empty());
        return switch (rule) {
            case StopRule.AnyTime.WORD -> new StopRule.AnyTime(guardDraws, guardHits);
            case StopRule.AsymptoticWidth.WORD -> new StopRule.AsymptoticWidth(guardDraws, guardHits);
            case StopRule.Hits.WORD -> new StopRule.Hits(stop.hits().orElse(hitsOfTolerance()));
            case StopRule.TwoStage.WORD ->
                new StopRule.TwoStage(
                        stop.first().orElse(dev.leadline.interval.TwoStage.FIRST),
                        stop.inflation().orElse(dev.leadline.interval.TwoStage.INFLATION));
            case StopRule.Stein.WORD -> new StopRule.Stein(stop.first().orElse(StopRule.Stein.USUAL_FIRST));
            case StopRule.Jcgm101.WORD ->
                new StopRule.Jcgm101((int) stop.digits().orElse(2));
            default -> new StopRule.Fixed();
        };
    }

    /// As many as the relative tolerance asks for; [#check] refuses where that says nothing.
    private long hitsOfTolerance() {
        double confidence = draft.confidence().orElse(Project.USUAL_CONFIDENCE);
        int answers = Math.max(1, draft.asks().size());
        double level = answers == 1 ? confidence : 1 - (1 - confidence) / answers;
        return relative().isPresent() && relative().getAsDouble() > 0 && level > 0 && level < 1
                ? HitsRule.of(relative().getAsDouble(), level)
                        .map(HitsRule::hits)
                        .orElse(2L)
                : 2;
    }

    private OptionalDouble relative() {
        return draft.tolerance().map(Draft.ToleranceDraft::relative).orElse(OptionalDouble.empty());
    }

    private OptionalDouble absolute() {
        return draft.tolerance().map(Draft.ToleranceDraft::absolute).orElse(OptionalDouble.empty());
    }

    private void count(String name, OptionalLong given, long least, long most, String detail) {
        given.ifPresent(value -> {
            if (value < least || value > most) {
                findings.add(
                        "$.stop." + name,
                        "%s is %d but must be from %d to %d".formatted(name.replace("guard.", ""), value, least, most),
                        detail);
            }
        });
    }

    private void foreign(String field, boolean given, String... rules) {
        if (given && !List.of(rules).contains(rule)) {
            findings.add(
                    "$.stop." + field,
                    "the stop rule \"%s\" does not take %s".formatted(rule, field),
                    "It belongs to the rule \"%s\".".formatted(String.join("\" and to \"", rules)),
                    "Leave it out.");
        }
    }

    /// Finds what in the question a rule does not fit.
    static void check(Draft draft, List<Ask> asks, List<Lane> lanes, Findings findings) {
        var stops = new Stops(draft, findings);
        if (!asks.isEmpty() && asks.size() == draft.asks().size() && WORDS.contains(stops.rule)) {
            stops.check(asks.getFirst().estimand(), lanes);
        }
    }

    private void check(Estimand first, List<Lane> lanes) {
        switch (rule) {
            case StopRule.AnyTime.WORD -> needsTolerance();
            case StopRule.AsymptoticWidth.WORD -> {
                needsTolerance();
                lanes(
                        lanes,
                        lane -> lane.scheme().points() instanceof Growing,
                        "Its draws are observations that follow one another; replicates and repetitions are too few to look at"
                                + " again and again.",
                        "Take \"any-time\", which looks at doublings.");
            }
            case StopRule.Hits.WORD -> {
                estimand(first instanceof Estimand.Probability, first, "It counts hits of an event.");
                lanes(
                        lanes,
                        lane -> lane.scheme().isPlain(),
                        "It counts hits among independent draws that count 1 each.",
                        "Take \"any-time\", which counts hits in those lanes where it can.");
                needsHits();
            }
            case StopRule.TwoStage.WORD -> {
                estimand(isMean(first), first, "Its guarantee is for a mean.");
                needsAbsolute();
                growing(lanes);
            }
            case StopRule.Stein.WORD -> {
                estimand(
                        isMean(first) && !(first instanceof Estimand.Probability),
                        first,
                        "It is for the mean of normal outcomes.");
                needsAbsolute();
                growing(lanes);
            }
            case StopRule.Jcgm101.WORD -> {
                estimand(
                        first instanceof Estimand.Distribution,
                        first,
                        "It looks at mean, standard uncertainty and coverage interval of a distribution.");
                lanes(
                        lanes,
                        lane -> lane.scheme().isPlain(),
                        "Its blocks are of independent draws that count 1 each.",
                        "Take \"any-time\".");
            }
            default -> {}
        }
    }

    private static boolean isMean(Estimand estimand) {
        return switch (estimand) {
            case Estimand.Mean _, Estimand.Integral _, Estimand.Probability _, Estimand.Distribution _ -> true;
            case Estimand.Quantile _, Estimand.TailMean _, Estimand.Ratio _, Estimand.StandardDeviation _ -> false;
        };
    }

    private void needsTolerance() {
        if (draft.tolerance().isEmpty()) {
            findings.add(
                    "$.stop.rule",
                    "the stop rule \"%s\" has no tolerance to stop at".formatted(rule),
                    "It stops once the answer is within the numerical tolerance.",
                    "Add \"tolerance\": {\"relative\": 0.05}, or take \"fixed\".");
        }
    }

    private void needsAbsolute() {
        if (absolute().isEmpty() || relative().isPresent()) {
            findings.add(
                    "$.stop.rule",
                    "the stop rule \"%s\" needs an absolute tolerance".formatted(rule)
                            + (relative().isPresent() ? " and no relative one" : ""),
                    "How many draws it makes follows from the tolerance before the answer is known.",
                    "Write \"tolerance\": {\"absolute\": …} in the unit of the answer, or take \"any-time\".");
        }
    }

    private void needsHits() {
        if (stop.hits().isPresent()) {
            return;
        }
        if (relative().isEmpty() || absolute().isPresent()) {
            findings.add(
                    "$.stop.rule",
                    "the stop rule \"hits\" needs a relative tolerance alone, or a number of hits",
                    "How many hits are enough follows from the relative tolerance.",
                    "Write \"tolerance\": {\"relative\": 0.1}, or \"hits\": 400 beside the rule.");
        } else if (relative().getAsDouble() > 0
                && hitsOfTolerance() == 2
                && relative().getAsDouble() < 1) {
            findings.add(
                    "$.tolerance.relative",
                    "no number of hits that can be waited for gives a relative tolerance of %s"
                            .formatted(Shortest.text(relative().getAsDouble())),
                    "The relative error falls with the root of the hits.",
                    "Allow a larger tolerance.");
        }
    }

    private void growing(List<Lane> lanes) {
        lanes(
                lanes,
                lane -> lane.scheme().points() instanceof Growing
                        && lane.scheme().controls().isEmpty(),
                "It is for plain means of observations that follow one another: no replicates, repetitions or control"
                        + " variates.",
                "Take \"any-time\".");
    }

    private void estimand(boolean fits, Estimand first, String why) {
        if (!fits) {
            findings.add(
                    "$.stop.rule",
                    "the stop rule \"%s\" does not fit a %s".formatted(rule, Draft.AskDraft.words(first.word())),
                    why,
                    "Take \"any-time\", or \"fixed\".");
        }
    }

    private interface Fits {
        boolean fits(Lane lane);
    }

    private void lanes(List<Lane> lanes, Fits rule, String why, String hint) {
        var others = new ArrayList<String>();
        lanes.stream().filter(lane -> !rule.fits(lane)).map(Lane::name).forEach(others::add);
        if (!others.isEmpty()) {
            findings.add(
                    "$.stop.rule",
                    String.format(
                            Locale.ROOT,
                            "the stop rule \"%s\" does not fit lane%s %s",
                            this.rule,
                            others.size() == 1 ? "" : "s",
                            String.join(", ", others)),
                    why,
                    hint);
        }
    }
}
