package dev.leadline.model;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SequencedMap;
import java.util.stream.Stream;

/// A density as it was written: what its values follow, then shifted and scaled, then truncated.
///
/// @param shift added to what `of` says, after scaling; empty means 0
/// @param scale what the values of `of` are multiplied by; empty means 1. The parameters `shift` and `scale` of a
///     family that has them are among the parameters of the member
/// @param truncate the interval that is kept
public record DensityDraft(Of of, OptionalDouble shift, OptionalDouble scale, Optional<Ends> truncate) {

    /// The family of a density that is still to be chosen.
    public static final String UNCHOSEN = "";

    /// What a density is made of.
    public sealed interface Of {}

    /// A member of a family; the names of the parameters are those of the file.
    public record Member(String family, SequencedMap<String, Double> parameters) implements Of {}

    /// Values with a probability each: the family `table` of the file.
    public record Values(List<Double> values, List<Double> probabilities) implements Of {
        public Values {
            values = List.copyOf(values);
            probabilities = List.copyOf(probabilities);
        }
    }

    /// Each part with its weight.
    public record Mixture(List<Part> parts) implements Of {
        public Mixture {
            parts = List.copyOf(parts);
        }
    }

    public record Part(double weight, DensityDraft density) {}

    /// A formula in the input's own name and the constants, up to a factor.
    ///
    /// @param breaks where it may jump, have a pole or a narrow peak
    /// @param log whether the formula is the logarithm of the density
    public record Typed(String formula, double from, double to, List<Double> breaks, boolean log) implements Of {
        public Typed {
            breaks = List.copyOf(breaks);
        }
    }

    /// A column of a file of data.
    ///
    /// @param file below the folder of the project
    /// @param kind `empirical` or `kernel`; empty means empirical
    /// @param bandwidth of the kernel, in the unit of the data; empty means by rule
    /// @param fitted parameters that were fitted to the column, and are drawn from in its place
    public record Data(
            String file, Column column, Optional<String> kind, OptionalDouble bandwidth, Optional<Member> fitted)
            implements Of {}

    /// Which column of a file.
    public sealed interface Column {
        /// The only one.
        record Only() implements Column {}

        /// The one under a header.
        record Named(String header) implements Column {}

        /// By its place, from 1.
        record At(long index) implements Column {}
    }

    /// An interval; its ends may be infinite.
    public record Ends(double low, double high) {}

    public static DensityDraft of(Of of) {
        return new DensityDraft(of, OptionalDouble.empty(), OptionalDouble.empty(), Optional.empty());
    }

    public static DensityDraft of(String family, SequencedMap<String, Double> parameters) {
        return of(new Member(family, parameters));
    }

    /// A density that is still to be chosen.
    public static DensityDraft unchosen() {
        return of(UNCHOSEN, new LinkedHashMap<>());
    }

    public boolean isUnchosen() {
        return of instanceof Member(String family, var _) && family.equals(UNCHOSEN);
    }

    /// The member of a family that this is, or was before it was shifted, scaled or truncated.
    public Optional<Member> member() {
        return of instanceof Member member ? Optional.of(member) : Optional.empty();
    }

    public DensityDraft with(Of newOf) {
        return new DensityDraft(newOf, shift, scale, truncate);
    }

    /// Names of the data files that it speaks of.
    public Stream<String> dataFiles() {
        return switch (of) {
            case Data data -> Stream.of(data.file());
            case Mixture(var parts) ->
                parts.stream().flatMap(part -> part.density().dataFiles());
            case Member _, Values _, Typed _ -> Stream.empty();
        };
    }

    /// The words that the file has for `of`.
    public String kind() {
        return switch (of) {
            case Member(String family, var _) -> family;
            case Values _ -> "table";
            case Mixture _ -> "mixture";
            case Typed _ -> "formula";
            case Data _ -> "data";
        };
    }
}
