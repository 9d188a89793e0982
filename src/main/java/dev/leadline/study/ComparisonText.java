package dev.leadline.study;

import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Logarithm;
import dev.leadline.interval.Ratio;
import dev.leadline.model.Question;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.Replicated;
import dev.leadline.study.Comparison.Outcome;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/// A comparison in sentences.
final class ComparisonText {
    private static final int ENOUGH_REPLICATES = 30;

    private final Question question;
    private final Contender one;
    private final Contender other;
    private final String a;
    private final String b;

    ComparisonText(Question question, Contender one, Contender other) {
        this.question = question;
        this.one = one;
        this.other = other;
        this.a = one.lane().name();
        this.b = other.lane().name();
    }

    /// What the draws of the two are worth.
    String sentence(Outcome outcome, Optional<Logarithm> variance, Optional<Ratio> ratio) {
        return switch (outcome) {
            case B_BETTER ->
                "%s needs %s times fewer draws than %s%s.".formatted(b, RatioText.of(ratio.orElseThrow()), a, at());
            case A_BETTER ->
                "%s: %s needs %s times as many draws%s."
                        .formatted(lost(), b, RatioText.of(ratio.orElseThrow().inverse()), at());
            case NO_DIFFERENCE ->
                "No difference seen: a draw of %s is worth %s of %s%s."
                        .formatted(b, RatioText.of(ratio.orElseThrow()), a, at());
            case CANNOT_TELL -> "Cannot tell yet: %s.".formatted(lack(variance, ratio));
        };
    }

    private String lost() {
        boolean ofPoints = one.scheme().points() instanceof Independent
                && !(other.scheme().points() instanceof Independent)
                && one.scheme().drawFrom().equals(other.scheme().drawFrom())
                && one.scheme().controls().equals(other.scheme().controls());
        return ofPoints
                ? "%s points lose here"
                        .formatted(capital(other.scheme().points().word()))
                : a + " is better";
    }

    private static String capital(String word) {
        return word.substring(0, 1).toUpperCase(Locale.ROOT) + word.substring(1);
    }

    /// Where a ratio depends on the number of draws, that number.
    private String at() {
        return Stream.of(one, other)
                .filter(lane -> lane.scheme().points() instanceof Replicated)
                .map(lane -> String.format(
                        Locale.ROOT,
                        " at %,.0f draws of %s",
                        lane.draws(),
                        lane.lane().name()))
                .collect(Collectors.joining(" and"));
    }

    private String lack(Optional<Logarithm> variance, Optional<Ratio> ratio) {
        if (variance.isPresent()) {
            double error = variance.get().standardError();
            double half = StrictMath.log(ratio.orElseThrow().width()) / 2;
            double sought = error > Comparison.MOST_ERROR
                    ? half * Comparison.MOST_ERROR / error
                    : Math.max(Math.abs(variance.get().value()), StrictMath.log(Comparison.NEARLY_ONE));
            double times = half / sought * (half / sought);
            double more = Math.max(one.draws(), other.draws()) * Math.max(times - 1, 1.0 / 16);
            return "the ratio of variances lies between %s and %s; about %s more draws of each would"
                    .formatted(limit(ratio.get().low()), limit(ratio.get().high()), RatioText.about(more));
        }
        Optional<Contender> flat =
                Stream.of(one, other).filter(lane -> !lane.spreads()).findFirst();
        if (flat.isEmpty()) {
            return "there are too few observations to judge a spread; about %s more draws of each would"
                    .formatted(RatioText.about(15 * Math.max(one.draws(), other.draws())));
        }
        var same = flat.get();
        if (same.estimate().value() == 0 && question.asks().getFirst().estimand() instanceof Estimand.Probability) {
            return "%s has not seen the event%s"
                    .formatted(
                            same.lane().name(),
                            drawsForHits(same == one ? other : one).stream()
                                    .mapToObj(draws -> "; about %s draws would".formatted(RatioText.about(draws)))
                                    .collect(Collectors.joining()));
        }
        return "every observation of %s is equal so far, so that its error cannot be judged"
                .formatted(same.lane().name());
    }

    /// Until plain draws have ten hits, by what the lane knows that has seen some.
    private static OptionalDouble drawsForHits(Contender knowing) {
        double chance = knowing.estimate().value();
        return knowing.spreads() && chance > 0 ? OptionalDouble.of(10 / chance) : OptionalDouble.empty();
    }

    private static String limit(double ratio) {
        return String.format(Locale.ROOT, ratio < 10 ? "%.2g" : "%.0f", ratio);
    }

    /// What time says beside it; nothing where draws were not timed.
    String time(Outcome outcome, Optional<Ratio> time, Optional<Ratio> efficiency) {
        if (time.isEmpty()) {
            return "";
        }
        String draw = time.get().holdsOne()
                ? " Draws of both take the same time, as far as it can be told"
                : " A draw of %s takes %s times as long"
                        .formatted(b, RatioText.of(time.get().inverse()));
        if (efficiency.isEmpty() || outcome == Outcome.CANNOT_TELL) {
            return draw + ".";
        }
        Ratio ratio = efficiency.get();
        return draw
                + (ratio.low() > 1
                        ? "; for the same error %s needs %s times less time.".formatted(b, RatioText.of(ratio))
                        : ratio.high() < 1
                                ? "; for the same error %s needs %s times as much time."
                                        .formatted(b, RatioText.of(ratio.inverse()))
                                : "; which of them needs less time for the same error cannot be told.");
    }

    List<String> notes(boolean paired) {
        var notes = new ArrayList<String>();
        if (paired) {
            notes.add("Both lanes draw the same random numbers; the limits count that.");
        } else if (one.lane().shares() && other.lane().shares()) {
            notes.add("Both lanes draw the same random numbers, but not in the same groups;"
                    + " the limits treat them as independent.");
        }
        for (var lane : List.of(one, other)) {
            if (lane.scheme().points() instanceof Replicated points) {
                notes.add(String.format(
                        Locale.ROOT,
                        "%s has %d replicates; what its draws are worth changes with their number and is said for %,.0f.%s",
                        lane.lane().name(),
                        points.replicates(),
                        lane.draws(),
                        points.replicates() < ENOUGH_REPLICATES
                                ? " A comparison wants %d replicates.".formatted(ENOUGH_REPLICATES)
                                : ""));
            }
        }
        return notes;
    }
}
