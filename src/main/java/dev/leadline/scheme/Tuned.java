package dev.leadline.scheme;

import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.SortedMap;
import java.util.TreeMap;

/// A density on the unit cube that was found before the run and is kept: a mixture of parts of fixed shares, in each of
/// which every coordinate is moved for itself. Immutable.
///
/// @param nominal share of the uniform density, in the same units as those of the parts; 0 for none
/// @param stages how it was found
public record Tuned(Adaptation wish, int nominal, List<Part> parts, List<Stage> stages) implements Adapted {
    public Tuned {
        parts = List.copyOf(parts);
        stages = List.copyOf(stages);
    }

    /// @param share above 0
    /// @param warps by the index of the coordinate; the others stay as they are
    public record Part(int share, SortedMap<Integer, Warp> warps) {
        public Part {
            warps = Collections.unmodifiableSortedMap(new TreeMap<>(warps));
        }
    }

    /// What a stage saw, of the first answer.
    ///
    /// @param level the score that mattered, below 0 on the way to an event; 0 where outcomes count
    /// @param estimate from the draws of this stage alone
    /// @param standardError `NaN` where it cannot be said
    /// @param hits outcomes that are not 0
    public record Stage(long draws, double level, double estimate, double standardError, long hits) {}

    /// Before anything is known.
    public static Tuned untouched(Adaptation wish) {
        return new Tuned(wish, 1, List.of(), List.of());
    }

    /// The sum of the shares: so many observations have exactly their shares.
    public int of() {
        return nominal + parts.stream().mapToInt(Part::share).sum();
    }

    @Override
    public String inWords() {
        long draws = stages.stream().mapToLong(Stage::draws).sum();
        return wish.inWords() + " in " + stages.size() + " stages, " + String.format(Locale.ROOT, "%,d draws", draws);
    }
}
