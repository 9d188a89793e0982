package dev.leadline.model;

import dev.leadline.formula.Working;
import dev.leadline.model.Draft.AskDraft;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.LaneDraft.ControlDraft;
import dev.leadline.model.LaneDraft.Mean;
import dev.leadline.scheme.Control;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/// Makes control variates, and the formulas of a lane that has some, of their drafts.
final class Controls {
    private static final Pattern ASKED = Pattern.compile("asked\\[(\\d+)]");

    private final Draft draft;
    private final List<Input> inputs;
    private final Findings findings;

    Controls(Draft draft, List<Input> inputs, Findings findings) {
        this.draft = draft;
        this.inputs = inputs;
        this.findings = findings;
    }

    /// Those whose mean is known.
    List<Control> of(LaneDraft lane, String path) {
        var controls = new ArrayList<Control>();
        for (int c = 0; c < lane.controls().size(); c++) {
            ControlDraft control = lane.controls().get(c);
            mean(control, path + ".controlVariates[" + c + "].mean")
                    .ifPresent(mean -> controls.add(new Control(control.formula(), mean, 0)));
        }
        return controls;
    }

    private OptionalDouble mean(ControlDraft control, String path) {
        return switch (control.mean()) {
            case Mean.Stated(double value) -> stated(value, path);
            case Mean.Exact _ -> exact(control.formula(), path);
            case Mean.Quadrature _ -> {
                findings.add(
                        path,
                        "a mean by quadrature is not available",
                        "The mean of a control variate is stated, or that of an input.");
                yield OptionalDouble.empty();
            }
        };
    }

    private OptionalDouble stated(double value, String path) {
        if (!Double.isFinite(value)) {
            findings.add(path, "mean is %s but must be finite".formatted(value), "It corrects the estimate.");
            return OptionalDouble.empty();
        }
        return OptionalDouble.of(value);
    }

    private OptionalDouble exact(String formula, String path) {
        var input = inputs.stream()
                .filter(i -> i.name().equals(Workings.composed(formula.strip())))
                .findFirst();
        double mean = input.map(i -> i.drawn().mean()).orElse(Double.NaN);
        if (!Double.isFinite(mean)) {
            findings.add(
                    path,
                    input.isPresent()
                            ? "%s has no finite mean".formatted(formula)
                            : "the mean of %s is not known in closed form".formatted(formula),
                    "\"exact\" is the mean of an input.",
                    input.isPresent() ? "Choose another control variate." : "State the mean as a number.");
            return OptionalDouble.empty();
        }
        return OptionalDouble.of(mean);
    }

    /// The formulas of the question, then those of the control variates; empty where one of the latter is not sound.
    Optional<Working> working(LaneDraft lane, String path) {
        int asks = draft.asks().size();
        List<String> formulas = Stream.concat(
                        draft.asks().stream().map(AskDraft::formula),
                        lane.controls().stream().map(ControlDraft::formula))
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
