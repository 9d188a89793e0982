package dev.leadline.model;

import dev.leadline.estimate.Estimand;
import dev.leadline.formula.Working;
import dev.leadline.model.Draft.AskDraft;
import dev.leadline.model.Draft.From;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/// Makes what is asked, and the formulas behind it, of their drafts.
final class Asks {

    private static final Map<String, Estimand> ESTIMANDS = Map.of(
            "mean",
            new Estimand.Mean(),
            "integral",
            new Estimand.Integral(),
            "probability",
            new Estimand.Probability());

    private Asks() {}

    /// Those that have no problem.
    static List<Ask> of(Draft draft, Findings findings) {
        if (draft.asks().isEmpty()) {
            findings.add(
                    "$.ask",
                    "nothing is asked",
                    "A question asks for a mean, an integral or a probability.",
                    "Add \"ask\": {\"mean\": \"formula\"}.");
        }
        boolean overRanges = draft.inputs().stream().anyMatch(input -> input.from() instanceof From.Range);
        List<Ask> asks = new ArrayList<>();
        for (int k = 0; k < draft.asks().size(); k++) {
            AskDraft ask = draft.asks().get(k);
            String path = draft.askPath(k);
            Estimand estimand = ESTIMANDS.get(ask.estimand());
            if (estimand == null) {
                findings.add(
                        path,
                        "\"%s\" is not available".formatted(ask.estimand()),
                        "A question asks for a mean, an integral or a probability.");
                continue;
            }
            checkRanges(estimand, overRanges, path, findings);
            asks.add(new Ask(estimand, ask.formula(), ask.unit(), ask.label()));
        }
        return asks;
    }

    private static void checkRanges(Estimand estimand, boolean overRanges, String path, Findings findings) {
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
                    "a %s is asked of a question with integration variables".formatted(estimand.word()),
                    "An input with a range has no density, so that nothing is its mean or its chance.",
                    "Ask for the integral, or give each input a density.");
        }
    }

    static void checkEvents(Draft draft, Working working, Findings findings) {
        for (int k = 0; k < draft.asks().size(); k++) {
            if (draft.asks().get(k).estimand().equals("probability") && !working.isEvent(k)) {
                findings.add(
                        draft.askPath(k),
                        "a probability is asked of a formula that is no event",
                        "An event is a comparison or made of comparisons: it is true or not.",
                        "Compare with a limit, as in \"load > 480\"; a part of a formula counts as 1 or 0 in [brackets].");
            }
        }
    }
}
