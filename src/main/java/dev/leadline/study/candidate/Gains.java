package dev.leadline.study.candidate;

import dev.leadline.estimate.Accumulator;
import dev.leadline.model.Input;
import dev.leadline.model.Input.Role;
import dev.leadline.model.LaneDraft;
import dev.leadline.model.LaneDraft.ControlDraft;
import dev.leadline.model.LaneDraft.DrawFrom;
import dev.leadline.model.LaneDraft.Mean;
import dev.leadline.model.LaneDraft.Other;
import dev.leadline.model.Project;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.SequencedMap;
import java.util.function.BiFunction;
import java.util.function.Function;

/// Where the outcome comes from: of each input mean and width of its values, counted by the size of the outcome. Where
/// plain
/// draws hardly meet it, draws from wider densities do, weighted. Found once, in draws that enter no result.
///
/// The components that tell are carried as control variates: the outcome's size, and its products with the inputs.
public final class Gains {
    /// Draws that would say as much, were they all equal, below which the means are no guess to refine.
    private static final double ENOUGH = 8;

    private static final double[] WIDER = {1.5, 2, 3};
    private static final int REFINEMENTS = 3;
    private static final int MOST_INPUTS = 30;

    private final Project project;
    private final BiFunction<LaneDraft, String, Optional<Accumulator>> run;
    private Optional<List<Gain>> found = Optional.empty();

    /// @param run makes draws of a lane for the purpose named, if the project takes it
    public Gains(Project project, BiFunction<LaneDraft, String, Optional<Accumulator>> run) {
        this.project = project;
        this.run = run;
    }

    /// Of the inputs that can be drawn from other densities; empty where nothing could be seen.
    List<Gain> all() {
        if (found.isEmpty()) {
            found = Optional.of(find());
        }
        return found.get();
    }

    /// A lane that draws some inputs from other densities.
    ///
    /// @param other of an input that is one of them
    static Optional<LaneDraft> lane(List<Gain> gains, Function<Gain, Optional<Other>> other) {
        var others = others(gains, other);
        return others.isEmpty() ? Optional.empty() : Optional.of(lane(others, List.of()));
    }

    private static SequencedMap<String, Other> others(List<Gain> gains, Function<Gain, Optional<Other>> other) {
        var others = new LinkedHashMap<String, Other>();
        gains.forEach(gain -> other.apply(gain).ifPresent(density -> others.put(gain.name(), density)));
        return others;
    }

    private static LaneDraft lane(SequencedMap<String, Other> others, List<ControlDraft> controls) {
        return LaneDraft.of("", "independent")
                .with(others.isEmpty() ? DrawFrom.NOTHING : new DrawFrom.Inputs(others))
                .with(controls);
    }

    private List<Input> inputs() {
        var question = project.question();
        if (question.inputs().stream().anyMatch(input -> input.role() instanceof Role.UnboundedRange)) {
            return List.of();
        }
        return question.inputs().stream()
                .filter(input -> input.role() instanceof Role.Random)
                .filter(input ->
                        question.working().program().uses(question.inputs().indexOf(input)))
                .limit(MOST_INPUTS)
                .toList();
    }

    private List<Gain> find() {
        List<Input> inputs = inputs();
        if (inputs.isEmpty()) {
            return List.of();
        }
        Optional<List<Gain>> seen = seen(inputs, new LinkedHashMap<>(), "plain");
        for (int i = 0; i < WIDER.length && seen.isEmpty(); i++) {
            double by = WIDER[i];
            var wider = new LinkedHashMap<String, Other>();
            inputs.stream().filter(Gains::hasTail).forEach(input -> wider.put(input.name(), new Other.Widen(by)));
            seen = wider.isEmpty() ? seen : seen(inputs, wider, "wider " + by);
        }
        for (int i = 0; i < REFINEMENTS && seen.isPresent(); i++) {
            var moved = others(seen.get().stream().filter(Gain::isAside).toList(), Gain::moved);
            var finer = moved.isEmpty() ? Optional.<List<Gain>>empty() : seen(inputs, moved, "moved " + i);
            if (finer.isEmpty()) {
                break;
            }
            seen = finer;
        }
        return seen.orElse(List.of());
    }

    private Optional<List<Gain>> seen(List<Input> inputs, SequencedMap<String, Other> others, String purpose) {
        String size = "abs(" + project.draft().asks().getFirst().formula() + ")";
        List<ControlDraft> controls = new ArrayList<>();
        controls.add(new ControlDraft(size, new Mean.Stated(0)));
        for (Input input : inputs) {
            String away = "(%s - (%s))".formatted(input.name(), Digits.plain(Gain.middle(input.drawn())));
            controls.add(new ControlDraft(size + "*" + away, new Mean.Stated(0)));
            controls.add(new ControlDraft(size + "*" + away + "^2", new Mean.Stated(0)));
        }
        int first = project.question().asks().size();
        return run.apply(lane(others, controls), purpose)
                .filter(sums -> sums.mean(first) > 0 && told(sums, first) >= ENOUGH)
                .map(sums -> {
                    List<Gain> gains = new ArrayList<>();
                    for (int j = 0; j < inputs.size(); j++) {
                        gains.add(new Gain(
                                inputs.get(j),
                                sums.mean(first + 1 + 2 * j) / sums.mean(first),
                                Math.sqrt(sums.mean(first + 2 + 2 * j) / sums.mean(first))));
                    }
                    return gains;
                });
    }

    /// How many equal draws would say as much: the square of the sum over the sum of squares.
    private static double told(Accumulator sums, int k) {
        double mean = sums.mean(k);
        return sums.count() * mean * mean / (mean * mean + sums.variance(k));
    }

    private static boolean hasTail(Input input) {
        var support = input.drawn().support();
        return !input.drawn().isDiscrete()
                && (support.low() == Double.NEGATIVE_INFINITY || support.high() == Double.POSITIVE_INFINITY);
    }
}
