package dev.leadline.model;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.SequencedMap;
import java.util.stream.Stream;

/// A lane as it was written.
///
/// @param points word of the layout
/// @param nominalShare share of the draws from the inputs' own densities; empty means a tenth
/// @param crossFitted whether coefficients of control variates come from other observations than they
///     correct
/// @param audit draws from the inputs' own densities that the lane is compared with
public record LaneDraft(
        String name,
        String points,
        Settings settings,
        DrawFrom drawFrom,
        OptionalDouble nominalShare,
        boolean selfNormalised,
        List<ControlDraft> controls,
        boolean crossFitted,
        OptionalLong audit) {
    public LaneDraft {
        controls = List.copyOf(controls);
    }

    public static LaneDraft of(String name, String points) {
        return new LaneDraft(
                name,
                points,
                Settings.NONE,
                DrawFrom.NOTHING,
                OptionalDouble.empty(),
                false,
                List.of(),
                false,
                OptionalLong.empty());
    }

    /// The same under another name.
    public LaneDraft named(String other) {
        return new LaneDraft(
                other, points, settings, drawFrom, nominalShare, selfNormalised, controls, crossFitted, audit);
    }

    /// The same with other settings of its points.
    public LaneDraft with(Settings others) {
        return new LaneDraft(
                name, points, others, drawFrom, nominalShare, selfNormalised, controls, crossFitted, audit);
    }

    /// The same drawn from other densities.
    public LaneDraft with(DrawFrom others) {
        return new LaneDraft(
                name, points, settings, others, nominalShare, selfNormalised, controls, crossFitted, audit);
    }

    /// The same with other control variates.
    public LaneDraft with(List<ControlDraft> others) {
        return new LaneDraft(
                name, points, settings, drawFrom, nominalShare, selfNormalised, others, crossFitted, audit);
    }

    /// The same compared with so many draws from the inputs' own densities.
    public LaneDraft audited(OptionalLong draws) {
        return new LaneDraft(
                name, points, settings, drawFrom, nominalShare, selfNormalised, controls, crossFitted, draws);
    }

    /// What a layout may be told; each layout takes some of it.
    ///
    /// @param replicates independent repetitions of the points
    /// @param cube points of a Latin hypercube
    /// @param cells parts of the range of an input, by its name
    /// @param scrambling word of the randomisation
    /// @param particles of splitting
    /// @param repetitions of splitting
    /// @param allocation word of how cells share the draws of a pass
    public record Settings(
            OptionalLong replicates,
            OptionalLong cube,
            SequencedMap<String, Long> cells,
            Optional<String> scrambling,
            OptionalLong particles,
            OptionalLong repetitions,
            Optional<String> allocation) {
        public static final Settings NONE = new Settings(
                OptionalLong.empty(),
                OptionalLong.empty(),
                new LinkedHashMap<>(),
                Optional.empty(),
                OptionalLong.empty(),
                OptionalLong.empty(),
                Optional.empty());

        /// The same with draws of a pass shared so.
        public Settings sharedAs(String word) {
            return new Settings(replicates, cube, cells, scrambling, particles, repetitions, Optional.of(word));
        }
    }

    /// What inputs are drawn from instead of their own densities.
    public sealed interface DrawFrom {
        DrawFrom NOTHING = new Inputs(new LinkedHashMap<>());

        /// Some inputs from densities of their own, by their names.
        record Inputs(SequencedMap<String, Other> others) implements DrawFrom {}

        /// All inputs from densities that are found before the run.
        ///
        /// @param way `cross-entropy` or `grid`
        record Adapted(String way) implements DrawFrom {}
    }

    /// What one input is drawn from.
    public sealed interface Other {
        record Another(DensityDraft density) implements Other {}

        /// Its own density, moved.
        record Shift(double by) implements Other {}

        /// Its own density, stretched about its middle.
        record Widen(double by) implements Other {}

        /// Its own density times `exp(by x)`.
        record Tilt(double by) implements Other {}

        /// A member of its own family that is found before the run.
        record Adapt() implements Other {}
    }

    /// A control variate.
    public record ControlDraft(String formula, Mean mean) {}

    /// How the mean of a control variate is known.
    public sealed interface Mean {
        record Stated(double value) implements Mean {}

        /// In closed form, from the inputs.
        record Exact() implements Mean {}

        /// By a deterministic rule, with an error.
        record Quadrature() implements Mean {}
    }

    Stream<String> dataFiles() {
        return switch (drawFrom) {
            case DrawFrom.Inputs(var others) ->
                others.values().stream()
                        .flatMap(other ->
                                other instanceof Other.Another(var density) ? density.dataFiles() : Stream.empty());
            case DrawFrom.Adapted _ -> Stream.empty();
        };
    }
}
