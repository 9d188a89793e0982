package dev.leadline.model;

import dev.leadline.model.Draft.AskDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Draft.ToleranceDraft;
import dev.leadline.numeric.Shortest;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/// The question in words; some of its parts are doors to where they are edited. Said of a draft, since it is also read
/// while the question is written.
///
/// @param parts in the order in which they are read
public record Sentence(List<Part> parts) {

    private static final int LONGEST_FORMULA = 80;

    /// @param door where the part is edited; empty for words in between
    public record Part(String text, Optional<Door> door) {}

    /// What a part says.
    public enum Door {
        FORMULA,
        /// The probability that it is about.
        LEVEL,
        UNIT,
        INPUTS,
        DEMANDS,
        LANE
    }

    public Sentence {
        parts = List.copyOf(parts);
    }

    /// As `The chance that tension > strength per year, with 7 inputs, to ±10 % at 95 %.`
    public static Sentence of(Draft draft) {
        var parts = new ArrayList<Part>();
        for (int k = 0; k < draft.asks().size(); k++) {
            parts.add(words(k == 0 ? "The " : ", and the "));
            ask(draft, draft.asks().get(k), parts);
        }
        boolean integral = draft.asks().stream().anyMatch(Sentence::isIntegral);
        long random = draft.inputs().size() - (integral ? ranges(draft).size() : 0);
        if (random > 0 || !integral) {
            parts.add(words(", with "));
            String inputs = random == 0 ? "no inputs yet" : random == 1 ? "1 input" : random + " inputs";
            parts.add(door(inputs, Door.INPUTS));
        }
        tolerance(draft).ifPresent(tolerance -> {
            parts.add(words(", to "));
            parts.add(door(tolerance, Door.DEMANDS));
        });
        parts.add(words(draft.tolerance().isPresent() ? " at " : ", at "));
        parts.add(door(confidence(draft), Door.DEMANDS));
        parts.add(words("."));
        return new Sentence(parts);
    }

    /// The same, answered by one lane of several.
    public Sentence by(String lane) {
        var by = new ArrayList<>(parts.subList(0, parts.size() - 1));
        by.add(words(", by "));
        by.add(door("lane " + lane, Door.LANE));
        by.add(words("."));
        return new Sentence(by);
    }

    /// The whole, as it is read aloud.
    public String text() {
        return String.join("", parts.stream().map(Part::text).toList());
    }

    /// As `±10 %` or `±25 m³`.
    public static Optional<String> tolerance(Draft draft) {
        return draft.tolerance().map(tolerance -> {
            List<String> ends = new ArrayList<>();
            String unit = draft.asks().isEmpty()
                    ? ""
                    : UnitWords.after(draft.asks().getFirst().unit());
            tolerance.absolute().ifPresent(width -> ends.add("±" + Shortest.text(width) + unit));
            tolerance.relative().ifPresent(part -> ends.add("±" + percent(part)));
            return String.join(isBoth(tolerance) ? " and " : " or ", ends);
        });
    }

    /// As `95 %`.
    public static String confidence(Draft draft) {
        return percent(draft.confidence().orElse(Project.USUAL_CONFIDENCE));
    }

    /// A part of one, as `95 %`.
    public static String percent(double part) {
        return (Double.isFinite(part)
                        ? BigDecimal.valueOf(part)
                                .movePointRight(2)
                                .stripTrailingZeros()
                                .toPlainString()
                        : String.valueOf(part))
                + " %";
    }

    private static void ask(Draft draft, AskDraft ask, List<Part> parts) {
        switch (ask.estimand()) {
            case "probability" -> parts.add(words("chance that "));
            case "quantile" -> {
                parts.add(door(part(ask.at()), Door.LEVEL));
                parts.add(words(" quantile of "));
            }
            case "tailMean" -> {
                parts.add(words("mean beyond the "));
                parts.add(door(part(ask.at()), Door.LEVEL));
                parts.add(words(" quantile of "));
            }
            default -> parts.add(words(ask.words() + " of "));
        }
        for (int i = 0; i < ask.formulas().size(); i++) {
            if (i > 0) {
                parts.add(words(" to "));
            }
            parts.add(door(shortened(ask.formulas().get(i)), Door.FORMULA));
        }
        if (isIntegral(ask) && !ranges(draft).isEmpty()) {
            parts.add(words(" over "));
            parts.add(door(and(ranges(draft)), Door.INPUTS));
        }
        String unit = UnitWords.after(ask.unit()).strip();
        if (!unit.isEmpty()) {
            parts.add(words(unit.startsWith("per ") ? " " : " in "));
            parts.add(door(unit, Door.UNIT));
        }
        if (ask.estimand().equals("distribution")) {
            parts.add(words(" and where "));
            parts.add(door(percent(ask.coverage().orElse(Asks.USUAL_COVERAGE)), Door.LEVEL));
            parts.add(words(" of it lies"));
        }
    }

    private static String part(OptionalDouble at) {
        return at.isPresent() ? percent(at.getAsDouble()) : "? %";
    }

    private static boolean isIntegral(AskDraft ask) {
        return ask.estimand().equals("integral");
    }

    private static boolean isBoth(ToleranceDraft tolerance) {
        return tolerance.when().filter("both"::equals).isPresent();
    }

    private static List<String> ranges(Draft draft) {
        return draft.inputs().stream()
                .filter(input -> input.from() instanceof From.Range)
                .map(InputDraft::name)
                .toList();
    }

    private static String and(List<String> names) {
        int last = names.size() - 1;
        return last == 0 ? names.getFirst() : String.join(", ", names.subList(0, last)) + " and " + names.get(last);
    }

    private static String shortened(String formula) {
        String line = formula.strip().replaceAll("\\s+", " ");
        if (line.isEmpty()) {
            return "a formula still to be written";
        }
        return line.length() <= LONGEST_FORMULA ? line : line.substring(0, LONGEST_FORMULA - 1) + "…";
    }

    private static Part door(String text, Door to) {
        return new Part(text, Optional.of(to));
    }

    private static Part words(String text) {
        return new Part(text, Optional.empty());
    }
}
