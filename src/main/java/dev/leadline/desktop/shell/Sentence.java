package dev.leadline.desktop.shell;

import dev.leadline.desktop.working.DemandsViewModel;
import dev.leadline.model.Draft;
import dev.leadline.model.Draft.AskDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.UnitWords;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/// A question in words; some of its parts are doors to where they are edited.
///
/// @param parts in the order in which they are read
record Sentence(List<Part> parts) {
    /// @param door where the part is edited; empty for words in between
    record Part(String text, Optional<Door> door) {}

    enum Door {
        FORMULA,
        UNIT,
        INPUTS,
        DEMANDS,
        STOP
    }

    Sentence {
        parts = List.copyOf(parts);
    }

    static Sentence of(Draft d) {
        var sentence = new ArrayList<Part>();
        var ask =
                d.asks().isEmpty() ? new AskDraft("mean", "", "", "") : d.asks().getFirst();
        boolean integral = ask.estimand().equals("integral");
        sentence.add(words(
                switch (ask.estimand()) {
                    case "probability" -> "The chance that ";
                    case "integral" -> "The integral of ";
                    case "mean" -> "The mean of ";
                    default -> "The " + ask.estimand() + " of ";
                }));
        sentence.add(door(shortened(ask.formula()), Door.FORMULA));
        if (integral) {
            ranges(d).ifPresent(over -> {
                sentence.add(words(" over "));
                sentence.add(door(over, Door.INPUTS));
            });
        }
        String unit = UnitWords.after(ask.unit()).strip();
        if (!unit.isEmpty()) {
            sentence.add(words(unit.startsWith("per ") ? " " : " in "));
            sentence.add(door(unit, Door.UNIT));
        }
        if (d.asks().size() > 1) {
            sentence.add(words(", and "));
            sentence.add(door(counted(d.asks().size() - 1, "more answer"), Door.FORMULA));
        }
        long random = d.inputs().stream()
                .filter(in -> !(integral && in.from() instanceof From.Range))
                .count();
        if (random > 0 || !integral) {
            sentence.add(words(", with "));
            sentence.add(door(random == 0 ? "no inputs yet" : counted(random, "input"), Door.INPUTS));
        }
        DemandsViewModel.toleranceWords(d)
                .ifPresentOrElse(
                        tolerance -> {
                            sentence.add(words(", to "));
                            sentence.add(door(tolerance, Door.DEMANDS));
                        },
                        () -> {
                            sentence.add(words(", in "));
                            sentence.add(door(DemandsViewModel.stopWords(d), Door.STOP));
                        });
        sentence.add(words(" at "));
        sentence.add(door(DemandsViewModel.confidenceWords(d), Door.DEMANDS));
        return new Sentence(sentence);
    }

    /// The whole, as it is read aloud.
    String text() {
        return String.join("", parts.stream().map(Part::text).toList()) + ".";
    }

    private static Optional<String> ranges(Draft d) {
        var names = d.inputs().stream()
                .filter(in -> in.from() instanceof From.Range)
                .map(InputDraft::name)
                .toList();
        return switch (names.size()) {
            case 0 -> Optional.empty();
            case 1 -> Optional.of(names.getFirst());
            default -> Optional.of(String.join(", ", names.subList(0, names.size() - 1)) + " and " + names.getLast());
        };
    }

    private static String shortened(String formula) {
        String f = formula.replaceAll("\\s+", " ").strip();
        return f.isEmpty() ? "a formula still to be written" : f.length() <= 60 ? f : f.substring(0, 59) + "\u2026";
    }

    private static String counted(long n, String noun) {
        return n + " " + noun + (n == 1 ? "" : "s");
    }

    private static Part words(String text) {
        return new Part(text, Optional.empty());
    }

    private static Part door(String text, Door door) {
        return new Part(text, Optional.of(door));
    }
}
