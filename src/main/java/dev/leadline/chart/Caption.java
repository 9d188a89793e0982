package dev.leadline.chart;

import dev.leadline.interval.Interval;
import dev.leadline.model.Sentence;
import dev.leadline.model.Tolerance;
import dev.leadline.numeric.Rounding;
import dev.leadline.study.AnswerText;
import dev.leadline.study.RehearsalText;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/// What a picture says, in words: the caption under a figure, and the text for people who cannot see it.
public final class Caption {
    private Caption() {}

    public static String of(Settling settling) {
        var sentences = new ArrayList<String>();
        sentences.add("Running estimate of " + settling.quantity() + " against the number of draws.");
        settling.lanes().forEach(lane -> sentences.add(of(lane, settling)));
        if (settling.lanes().stream().anyMatch(Series::banded)) {
            sentences.add("Outer band, dotted: any-time band, which holds at every look.");
        }
        settling.reference().ifPresent(reference -> {
            String error = reference.error() > 0 ? " ± " + Typeset.number(reference.error(), 2) : "";
            String how = switch (reference.kind()) {
                case STATED -> "";
                case CLOSED_FORM -> " in closed form";
                case QUADRATURE -> " by quadrature, its error a bound";
            };
            sentences.add("Dash-dotted: reference value "
                    + Typeset.quantity(Typeset.number(reference.value(), 8) + error, settling.unit()) + how + ".");
        });
        settling.strip()
                .flatMap(_ -> settling.tolerance())
                .ifPresent(asked -> sentences.add(
                        "Strip: numerical tolerance " + of(asked, settling.unit()) + " about the latest estimate."));
        sentences.add("Seed " + settling.seed() + ".");
        sentences.add("The intervals cover sampling error only.");
        return String.join(" ", sentences);
    }

    public static String of(ErrorDecay decay) {
        var sentences = new ArrayList<String>();
        sentences.add("Half-width of the " + Interval.percent(decay.level()) + " interval of " + decay.quantity()
                + " against the number of draws, both axes logarithmic.");
        for (var lane : decay.lanes()) {
            String name = "Lane " + lane.series().lane() + " (" + lane.series().scheme() + "): ";
            sentences.add(lane.series()
                    .last()
                    .filter(point -> ErrorDecay.reach(point) > 0)
                    .map(point -> name + Typeset.quantity(Typeset.number(ErrorDecay.reach(point), 2), decay.unit())
                            + " after " + Typeset.count(point.draws()) + " draws"
                            + slope(lane).map(text -> ", " + text).orElse("") + ".")
                    .orElse(name + "no interval yet."));
        }
        if (decay.lanes().stream().anyMatch(lane -> lane.promised().isPresent())) {
            sentences.add("Thin lines have the slope that a scheme promises.");
        }
        decay.allowed()
                .ifPresent(width -> sentences.add("Strip: where the numerical tolerance "
                        + of(decay.tolerance().orElseThrow(), decay.unit()) + " is met, below "
                        + Typeset.quantity(Typeset.number(width, 3), decay.unit()) + "."));
        sentences.add("Seed " + decay.seed() + ".");
        sentences.add("The intervals cover sampling error only.");
        return String.join(" ", sentences);
    }

    public static String of(Outcomes outcomes) {
        var sentences = new ArrayList<String>();
        sentences.add("How the outcomes of %s lie.".formatted(outcomes.formula().strip()));
        for (var lane : outcomes.lanes()) {
            sentences.add("Lane %s (%s): %s."
                    .formatted(
                            lane.lane(),
                            lane.scheme(),
                            lane.answer().map(AnswerText::value).orElse("no draws yet")));
            lane.answer().flatMap(AnswerText::coverage).ifPresent(text -> sentences.add(text + "."));
        }
        if (Outcomes.isOnScale(outcomes.estimand())) {
            sentences.add("Upright lines: the answer of each lane, with its interval.");
        }
        if (outcomes.covered().isPresent()) {
            sentences.add(
                    "Brackets: where the outcomes lie, symmetric solid, shortest dashed; they are no intervals of the"
                            + " mean.");
        }
        sentences.add("Seed " + outcomes.seed() + ".");
        return String.join(" ", sentences);
    }

    public static String of(Weights weights) {
        var sentences = new ArrayList<String>();
        sentences.add("The largest weights of draws over the mean weight, by rank, both axes logarithmic.");
        weights.lanes()
                .forEach(lane ->
                        sentences.add("Lane %s (%s): %s.".formatted(lane.lane(), lane.scheme(), effective(lane))));
        sentences.add("Seed " + weights.seed() + ".");
        return String.join(" ", sentences);
    }

    public static String of(Repeated repeated) {
        var rehearsal = repeated.rehearsal();
        var answer = repeated.answer();
        var sentences = new ArrayList<String>();
        sentences.add("Intervals of %s repetitions of lane %s (%s), of %s each, for %s, ordered by their middles."
                .formatted(
                        Typeset.count(rehearsal.repetitions()),
                        rehearsal.lane(),
                        rehearsal.scheme(),
                        RehearsalText.draws(rehearsal),
                        answer.ask().name()));
        sentences.add(RehearsalText.counts(answer));
        sentences.add(RehearsalText.meaning(rehearsal, answer));
        sentences.add("Dash-dotted: " + RehearsalText.sought(answer));
        return String.join(" ", sentences);
    }

    /// As `3,000,000 draws worth 21,000 of equal weights`.
    static String effective(Weights.Weighed lane) {
        return lane.largest().isEmpty()
                ? "every draw counts 1"
                : Typeset.count(lane.draws()) + " draws worth " + Typeset.number(lane.effective(), 2)
                        + " of equal weights";
    }

    /// As `slope −0.51 (promised −½)`, or `slope −1.02 (none promised)`; empty where none can be fitted.
    static Optional<String> slope(ErrorDecay.Decay lane) {
        var slope = lane.slope();
        return slope.isEmpty()
                ? Optional.empty()
                : Optional.of("slope "
                        + String.format(Locale.ROOT, "%.2f", slope.getAsDouble())
                                .replace('-', '−')
                        + (lane.promised().isPresent() ? " (promised −½)" : " (none promised)"));
    }

    private static String of(Series lane, Settling settling) {
        String name = "Lane " + lane.lane() + " (" + lane.scheme() + "): ";
        if (lane.last().isEmpty()) {
            return name + "no draws yet.";
        }
        var point = lane.last().get();
        var text = new StringBuilder(name);
        double half = (point.high() - point.low()) / 2;
        if (Double.isFinite(point.estimate()) && Double.isFinite(half)) {
            var rounding = Rounding.of(point.estimate(), half);
            text.append(Typeset.quantity(Typeset.set(rounding.value()), settling.unit()))
                    .append(", ")
                    .append(Interval.percent(settling.level()))
                    .append(" interval ")
                    .append(Typeset.set(rounding.down(point.low())))
                    .append(" to ")
                    .append(Typeset.set(rounding.up(point.high())));
        } else if (Double.isFinite(point.estimate())) {
            text.append(Typeset.quantity(Typeset.number(point.estimate(), 6), settling.unit()))
                    .append(", no interval");
        } else {
            text.append("no estimate");
        }
        text.append(", after ").append(Typeset.count(point.draws())).append(" draws");
        if (lane.withoutHit()) {
            text.append(" without a hit");
        }
        if (lane.provisional()) {
            text.append(", provisional");
        }
        if (lane.nonFinite() > 0) {
            text.append(", over finite evaluations only (")
                    .append(Typeset.count(lane.nonFinite()))
                    .append(" left out)");
        }
        return text.append('.').toString();
    }

    /// `±10 %`, `±25 m³`, or both as they were asked for.
    static String of(Tolerance asked, String unit) {
        var parts = new ArrayList<String>();
        asked.absolute().ifPresent(width -> parts.add("±" + Typeset.quantity(Typeset.number(width, 6), unit)));
        asked.relative().ifPresent(share -> parts.add("±" + Sentence.percent(share)));
        return String.join(asked.both() ? " and " : " or ", List.copyOf(parts));
    }
}
