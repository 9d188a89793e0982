package dev.leadline.model;

import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.Optional;

/// Where the columns of data come from that a project names: files below its folder.
public interface DataFiles {
    /// Before a project has a folder there is nothing to read from.
    DataFiles NONE = (file, column) -> {
        throw new Refusal(Problem.of("the data file \"%s\" has no folder to be found in".formatted(file))
                .because("Data are read only below the folder of the project.")
                .tryThis("Save the project beside its data first.")
                .at(Place.of("data")));
    };

    /// @throws Refusal where there is no such file or column, or it holds what is no number; at the paths `data` and
    ///     `column`
    DataColumn column(String file, DensityDraft.Column column);

    /// The whole file, so that it can go where a copy of the project goes; empty where it cannot be had.
    default Optional<byte[]> whole(String file) {
        return Optional.empty();
    }
}
