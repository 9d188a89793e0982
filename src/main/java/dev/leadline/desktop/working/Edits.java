package dev.leadline.desktop.working;

import dev.leadline.model.Draft;
import dev.leadline.model.Draft.AskDraft;
import dev.leadline.model.Draft.ConstantDraft;
import dev.leadline.model.Draft.DependenceDraft;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Draft.IntervalDraft;
import dev.leadline.model.Draft.ReferenceDraft;
import dev.leadline.model.Draft.StopDraft;
import dev.leadline.model.Draft.ToleranceDraft;
import dev.leadline.model.LaneDraft;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.function.UnaryOperator;

/// Drafts with one part changed.
public final class Edits {
    private Edits() {}

    /// A draft with nothing in it but the kind of what is asked.
    public static Draft asking(String kind) {
        return new Draft(
                "",
                "",
                false,
                List.of(),
                List.of(),
                Optional.empty(),
                List.of(),
                List.of(new AskDraft(kind, "", "", "")),
                Optional.empty(),
                OptionalDouble.empty(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                OptionalLong.empty(),
                false,
                List.of());
    }

    public static Draft title(Draft d, String title) {
        return about(d, title, d.notes(), d.safety());
    }

    public static Draft notes(Draft d, String notes) {
        return about(d, d.title(), notes, d.safety());
    }

    public static Draft safety(Draft d, boolean safety) {
        return about(d, d.title(), d.notes(), safety);
    }

    /// The parts that say what it is about.
    private static Draft about(Draft d, String title, String notes, boolean safety) {
        return new Draft(
                title,
                notes,
                safety,
                d.constants(),
                d.inputs(),
                d.dependence(),
                d.steps(),
                d.asks(),
                d.reference(),
                d.confidence(),
                d.tolerance(),
                d.interval(),
                d.stop(),
                d.seed(),
                d.commonRandomNumbers(),
                d.lanes());
    }

    /// The parts that say what is asked.
    static Draft question(
            Draft d, List<ConstantDraft> constants, List<InputDraft> inputs, List<String> steps, List<AskDraft> asks) {
        return new Draft(
                d.title(),
                d.notes(),
                d.safety(),
                constants,
                inputs,
                d.dependence(),
                steps,
                asks,
                d.reference(),
                d.confidence(),
                d.tolerance(),
                d.interval(),
                d.stop(),
                d.seed(),
                d.commonRandomNumbers(),
                d.lanes());
    }

    /// The parts that say how well it is to be answered.
    static Draft demands(
            Draft d,
            Optional<ReferenceDraft> reference,
            OptionalDouble confidence,
            Optional<ToleranceDraft> tolerance,
            Optional<IntervalDraft> interval,
            Optional<StopDraft> stop,
            OptionalLong seed) {
        return new Draft(
                d.title(),
                d.notes(),
                d.safety(),
                d.constants(),
                d.inputs(),
                d.dependence(),
                d.steps(),
                d.asks(),
                reference,
                confidence,
                tolerance,
                interval,
                stop,
                seed,
                d.commonRandomNumbers(),
                d.lanes());
    }

    static Draft dependence(Draft d, Optional<DependenceDraft> dependence) {
        return new Draft(
                d.title(),
                d.notes(),
                d.safety(),
                d.constants(),
                d.inputs(),
                dependence,
                d.steps(),
                d.asks(),
                d.reference(),
                d.confidence(),
                d.tolerance(),
                d.interval(),
                d.stop(),
                d.seed(),
                d.commonRandomNumbers(),
                d.lanes());
    }

    public static Draft lanes(Draft d, List<LaneDraft> lanes) {
        return schemes(d, d.commonRandomNumbers(), lanes);
    }

    public static Draft commonRandomNumbers(Draft d, boolean common) {
        return schemes(d, common, d.lanes());
    }

    /// The parts that say how it is sampled.
    private static Draft schemes(Draft d, boolean commonRandomNumbers, List<LaneDraft> lanes) {
        return new Draft(
                d.title(),
                d.notes(),
                d.safety(),
                d.constants(),
                d.inputs(),
                d.dependence(),
                d.steps(),
                d.asks(),
                d.reference(),
                d.confidence(),
                d.tolerance(),
                d.interval(),
                d.stop(),
                d.seed(),
                commonRandomNumbers,
                lanes);
    }

    static Draft constants(Draft d, List<ConstantDraft> constants) {
        return question(d, constants, d.inputs(), d.steps(), d.asks());
    }

    public static Draft inputs(Draft d, List<InputDraft> inputs) {
        return question(d, d.constants(), inputs, d.steps(), d.asks());
    }

    static Draft steps(Draft d, List<String> steps) {
        return question(d, d.constants(), d.inputs(), steps, d.asks());
    }

    static Draft asks(Draft d, List<AskDraft> asks) {
        return question(d, d.constants(), d.inputs(), d.steps(), asks);
    }

    static Draft reference(Draft d, Optional<ReferenceDraft> reference) {
        return demands(d, reference, d.confidence(), d.tolerance(), d.interval(), d.stop(), d.seed());
    }

    static Draft confidence(Draft d, OptionalDouble confidence) {
        return demands(d, d.reference(), confidence, d.tolerance(), d.interval(), d.stop(), d.seed());
    }

    static Draft tolerance(Draft d, Optional<ToleranceDraft> tolerance) {
        return demands(d, d.reference(), d.confidence(), tolerance, d.interval(), d.stop(), d.seed());
    }

    static Draft interval(Draft d, Optional<IntervalDraft> interval) {
        return demands(d, d.reference(), d.confidence(), d.tolerance(), interval, d.stop(), d.seed());
    }

    public static Draft stop(Draft d, Optional<StopDraft> stop) {
        return demands(d, d.reference(), d.confidence(), d.tolerance(), d.interval(), stop, d.seed());
    }

    public static Draft seed(Draft d, OptionalLong seed) {
        return demands(d, d.reference(), d.confidence(), d.tolerance(), d.interval(), d.stop(), seed);
    }

    public static <T> List<T> changed(List<T> list, int index, UnaryOperator<T> change) {
        var copy = new ArrayList<>(list);
        copy.set(index, change.apply(copy.get(index)));
        return copy;
    }

    public static <T> List<T> without(List<T> list, int index) {
        var copy = new ArrayList<>(list);
        copy.remove(index);
        return copy;
    }

    public static <T> List<T> with(List<T> list, T last) {
        var copy = new ArrayList<>(list);
        copy.add(last);
        return copy;
    }
}
