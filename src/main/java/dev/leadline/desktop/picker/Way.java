package dev.leadline.desktop.picker;

import dev.leadline.density.Knowledge;
import dev.leadline.model.DensityDraft;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/// A way to say what density a quantity has.
sealed interface Way {
    /// As a person would say it.
    String title();

    /// Few numbers, from which a density follows.
    record Known(Knowledge knowledge) implements Way {
        @Override
        public String title() {
            return knowledge.title();
        }
    }

    /// The others, each with a form of its own.
    enum Given implements Way {
        DATA("data in a file"),
        VALUES("single values, each with its probability"),
        FAMILY("a family of the catalogue"),
        MIXTURE("several parts, each with a weight"),
        FORMULA("a formula for the density");

        private final String title;

        Given(String title) {
            this.title = title;
        }

        @Override
        public String title() {
            return title;
        }
    }

    static List<Way> all() {
        return Stream.concat(Knowledge.all().stream().map(Known::new), Stream.of(Given.values()))
                .toList();
    }

    /// The one by which a density is written; none while it is to be chosen.
    static Optional<Way> of(DensityDraft density) {
        return switch (density.of()) {
            case DensityDraft.Member _ -> density.isUnchosen() ? Optional.empty() : Optional.of(Given.FAMILY);
            case DensityDraft.Values _ -> Optional.of(Given.VALUES);
            case DensityDraft.Mixture _ -> Optional.of(Given.MIXTURE);
            case DensityDraft.Typed _ -> Optional.of(Given.FORMULA);
            case DensityDraft.Data _ -> Optional.of(Given.DATA);
        };
    }
}
