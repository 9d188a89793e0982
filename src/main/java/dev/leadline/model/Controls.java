package dev.leadline.model;

import dev.leadline.formula.Working;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.LaneDraft.ControlDraft;
import dev.leadline.model.LaneDraft.Mean;
import dev.leadline.problem.Refusal;
import dev.leadline.scheme.Control;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/// Makes control variates, and the formulas of a lane that has some, of their drafts.
final class Controls {
    private static final Pattern ASKED = Pattern.compile("asked\\[(\\d+)]");

    private final Draft draft;
    private final ExactMean exact;
    private final QuadratureMean quadrature;
    private final Findings findings;

    Controls(Draft draft, List<Input> inputs, Optional<Dependence> dependence, Findings findings) {
        this.draft = draft;
        this.exact = new ExactMean(inputs, dependence);
        this.quadrature = new QuadratureMean(inputs, dependence);
        this.findings = findings;
    }

    /// Those whose mean is known.
    ///
    /// @param working the formulas of the question, then those of the control variates
    List<Control> of(LaneDraft lane, Working working, String path) {
        var controls = new ArrayList<Control>();
        for (int c = 0; c < lane.controls().size(); c++) {
            ControlDraft control = lane.controls().get(c);
            known(control, working, draft.formulas().size() + c, path + ".controlVariates[" + c + "].mean")
                    .ifPresent(controls::add);
        }
        return controls;
    }

    private Optional<Control> known(ControlDraft control, Working working, int index, String path) {
        String formula = control.formula();
        return switch (control.mean()) {
            case Mean.Stated(double value) -> stated(formula, value, path);
            case Mean.Exact _ -> {
                try {
                    yield Optional.of(new Control(formula, exact.of(working, index), 0));
                } catch (Refusal refusal) {
                    boolean canBe = isFound(control, working, index);
                    findings.add(
                            path,
                            unknown(formula, "in closed form", refusal),
                            "\"exact\" knows sums of products of independent inputs, to the fourth power.",
                            canBe ? "Write \"mean\": \"quadrature\"." : "State the mean as a number.");
                    yield Optional.empty();
                }
            }
            case Mean.Quadrature _ -> {
                try {
                    var found = quadrature.of(working, index, text(control));
                    yield Optional.of(new Control(formula, found.mean(), found.error()));
                } catch (Refusal refusal) {
                    findings.add(
                            path,
                            unknown(formula, "by quadrature", refusal),
                            "\"quadrature\" integrates over up to 3 independent inputs, and its error must be small.",
                            isExact(working, index)
                                    ? "Write \"mean\": \"exact\"."
                                    : "State the mean as a number, or choose another control variate.");
                    yield Optional.empty();
                }
            }
        };
    }

    private static String unknown(String formula, String how, Refusal refusal) {
        return "the mean of %s is not known %s: %s"
                .formatted(formula, how, refusal.problems().getFirst().primary());
    }

    private boolean isFound(ControlDraft control, Working working, int index) {
        try {
            quadrature.of(working, index, text(control));
            return true;
        } catch (Refusal _) {
            return false;
        }
    }

    private boolean isExact(Working working, int index) {
        try {
            exact.of(working, index);
            return true;
        } catch (Refusal _) {
            return false;
        }
    }

    /// The formula with everything that it is made of.
    private String text(ControlDraft control) {
        return "%s\n%s\n%s".formatted(control.formula(), draft.steps(), Workings.constants(draft));
    }

    private Optional<Control> stated(String formula, double value, String path) {
        if (!Double.isFinite(value)) {
            findings.add(path, "mean is %s but must be finite".formatted(value), "It corrects the estimate.");
            return Optional.empty();
        }
        return Optional.of(new Control(formula, value, 0));
    }

    /// The formulas of the question, then those of the control variates; empty where one of the latter is not sound.
    Optional<Working> working(LaneDraft lane, String path) {
        int asks = draft.formulas().size();
        List<String> formulas = Stream.concat(
                        draft.formulas().stream(), lane.controls().stream().map(ControlDraft::formula))
                .toList();
        return findings.made(
                place -> place(place, asks, path),
                () -> Working.of(
                        draft.inputs().stream().map(InputDraft::name).toList(),
                        Workings.constants(draft),
                        draft.steps(),
                        formulas));
    }

    private String place(String place, int asks, String path) {
        Matcher asked = ASKED.matcher(place);
        return asked.matches() && Integer.parseInt(asked.group(1)) >= asks
                ? path + ".controlVariates[" + (Integer.parseInt(asked.group(1)) - asks) + "].formula"
                : "$." + place;
    }
}
