package dev.leadline.model;

import dev.leadline.estimate.Estimand;
import dev.leadline.formula.Working;
import dev.leadline.model.Draft.AskDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.numeric.Shortest;
import dev.leadline.numeric.Significant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/// Makes what is asked, and the formulas behind it, of their drafts.
final class Asks {
    static final double USUAL_COVERAGE = .95;

    private final Draft draft;
    private final Findings findings;

    private Asks(Draft draft, Findings findings) {
        this.draft = draft;
        this.findings = findings;
    }

    /// Those that have no problem.
    static List<Ask> of(Draft draft, Findings findings) {
        return new Asks(draft, findings).all();
    }

    private List<Ask> all() {
        if (draft.asks().isEmpty()) {
            findings.add(
                    "$.ask",
                    "nothing is asked",
                    "A question asks for a mean, an integral, a probability or another number.",
                    "Add \"ask\": {\"mean\": \"formula\"}.");
        }
        List<Ask> asks = new ArrayList<>();
        for (int k = 0; k < draft.asks().size(); k++) {
            AskDraft ask = draft.asks().get(k);
            String path = draft.askPath(k);
            estimand(ask, path).ifPresent(estimand -> {
                checkRanges(estimand, path);
                asks.add(new Ask(estimand, ask.formulas(), ask.unit(), ask.label()));
            });
        }
        return asks;
    }

    private Optional<Estimand> estimand(AskDraft ask, String path) {
        return switch (ask.estimand()) {
            case "mean" -> Optional.of(new Estimand.Mean());
            case "integral" -> Optional.of(new Estimand.Integral());
            case "probability" -> Optional.of(new Estimand.Probability());
            case "ratio" -> Optional.of(new Estimand.Ratio());
            case "standardDeviation" -> Optional.of(new Estimand.StandardDeviation());
            case "quantile" -> at(ask, path).map(Estimand.Quantile::new);
            case "tailMean" -> at(ask, path).map(Estimand.TailMean::new);
            case "distribution" ->
                part("coverage", OptionalDouble.of(ask.coverage().orElse(USUAL_COVERAGE)), path)
                        .map(Estimand.Distribution::new);
            default -> {
                findings.add(
                        path,
                        "\"%s\" is not available".formatted(ask.estimand()),
                        "A question asks for one of %s.".formatted(String.join(", ", AskDraft.ESTIMANDS)));
                yield Optional.empty();
            }
        };
    }

    private Optional<Double> at(AskDraft ask, String path) {
        if (ask.at().isEmpty()) {
            findings.add(
                    path,
                    "the %s does not say at which probability".formatted(ask.words()),
                    "It belongs to a probability, as .99: what 99 outcomes in 100 do not exceed.",
                    "Add \"at\": 0.99.");
            return Optional.empty();
        }
        return part("at", ask.at(), path);
    }

    private Optional<Double> part(String name, OptionalDouble given, String path) {
        double part = given.orElseThrow();
        if (part > 0 && part < 1) {
            return Optional.of(part);
        }
        findings.add(
                path.substring(0, path.lastIndexOf('.') + 1) + name,
                "%s is %s but must be between 0 and 1".formatted(name, Shortest.text(part)),
                "It is a probability.",
                part > 1 && part < 100
                        ? "Write %s for %s %%.".formatted(Significant.text(part / 100, 6), Significant.text(part, 6))
                        : "Write 0.99 for 99 %.");
        return Optional.empty();
    }

    private void checkRanges(Estimand estimand, String path) {
        boolean overRanges = draft.inputs().stream().anyMatch(input -> input.from() instanceof From.Range);
        boolean integral = estimand instanceof Estimand.Integral;
        if (integral && !overRanges) {
            findings.add(
                    path,
                    "the integral has no variable to integrate over",
                    "At least one input of an integral has a \"range\" instead of a density.",
                    "Ask for the mean, or give an input a range.");
        }
        if (!integral && overRanges) {
            findings.add(
                    path,
                    "a %s is asked of a question with integration variables".formatted(AskDraft.words(estimand.word())),
                    "An input with a range has no density, so that nothing is its mean or its chance.",
                    "Ask for the integral, or give each input a density.");
        }
    }

    static void checkEvents(Draft draft, Working working, Findings findings) {
        int formula = 0;
        for (int k = 0; k < draft.asks().size(); k++) {
            if (draft.asks().get(k).estimand().equals("probability") && !working.isEvent(formula)) {
                findings.add(
                        draft.askPath(k),
                        "a probability is asked of a formula that is no event",
                        "An event is a comparison or made of comparisons: it is true or not.",
                        "Compare with a limit, as in \"load > 480\"; a part of a formula counts as 1 or 0 in"
                                + " [brackets].");
            }
            formula += draft.asks().get(k).formulas().size();
        }
    }
}
