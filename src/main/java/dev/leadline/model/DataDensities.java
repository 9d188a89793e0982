package dev.leadline.model;

import dev.leadline.density.Density;
import dev.leadline.density.Empirical;
import dev.leadline.density.Smoothed;
import dev.leadline.model.DensityDraft.Data;
import dev.leadline.numeric.Significant;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import java.util.List;
import java.util.Optional;

/// Makes densities of columns of data: the values themselves, smoothed ones, or a member fitted to them.
final class DataDensities {

    private static final int DIGITS = 4;
    private static final String EMPIRICAL = "empirical";
    private static final String KERNEL = "kernel";

    private final DataFiles files;
    private final Densities densities;
    private final Findings findings;

    DataDensities(DataFiles files, Densities densities, Findings findings) {
        this.files = files;
        this.densities = densities;
        this.findings = findings;
    }

    /// @param path of the density in the project
    Optional<Density> of(Data data, String path) {
        Optional<DataColumn> column =
                findings.made(within -> path + "." + within, () -> files.column(data.file(), data.column()));
        column.ifPresent(read -> read.notes()
                .forEach(note -> findings.note(path + "." + note.place().path(), note)));
        boolean told = isTold(data, path);
        if (data.fitted().isPresent()) {
            // the data are read all the same: they are what the parameters were fitted to
            var member = densities.of(DensityDraft.of(data.fitted().get()), "", path + ".fitted");
            return column.isPresent() && told ? member : Optional.empty();
        }
        return column.filter(_ -> told).flatMap(read -> drawn(data, read, path));
    }

    private boolean isTold(Data data, String path) {
        String kind = data.kind().orElse(EMPIRICAL);
        if (data.fitted().isPresent()) {
            if (data.kind().isPresent() || data.bandwidth().isPresent()) {
                findings.add(
                        path + (data.kind().isPresent() ? ".kind" : ".bandwidth"),
                        "%s has no use beside fitted".formatted(data.kind().isPresent() ? "kind" : "bandwidth"),
                        "Draws come from the fitted density, not from the data.",
                        "Leave out one of them.");
                return false;
            }
            return true;
        }
        if (!kind.equals(EMPIRICAL) && !kind.equals(KERNEL)) {
            var problem = Problem.of("kind is \"%s\" but must be \"empirical\" or \"kernel\"".formatted(kind))
                    .because("Empirical draws the values themselves, kernel smooths them.");
            findings.add(
                    path + ".kind",
                    Nearest.to(kind, List.of(EMPIRICAL, KERNEL))
                            .map(near -> problem.tryThis("Was \"%s\" meant?".formatted(near)))
                            .orElse(problem));
            return false;
        }
        if (data.bandwidth().isPresent() && kind.equals(EMPIRICAL)) {
            findings.add(
                    path + ".bandwidth",
                    "bandwidth has no use without smoothing",
                    "The values are drawn as they stand.",
                    "Add \"kind\": \"kernel\", or leave it out.");
            return false;
        }
        return true;
    }

    private Optional<Density> drawn(Data data, DataColumn column, String path) {
        double[] values =
                column.values().stream().mapToDouble(Double::doubleValue).toArray();
        if (data.kind().orElse(EMPIRICAL).equals(EMPIRICAL)) {
            return Optional.of(Empirical.of(values));
        }
        Optional<Smoothed> smoothed = findings.made(
                within -> within.isEmpty() ? path + ".data" : path + "." + within,
                () -> data.bandwidth().isPresent()
                        ? Smoothed.of(data.bandwidth().getAsDouble(), values)
                        : Smoothed.byRule(values));
        if (data.bandwidth().isEmpty()) {
            smoothed.ifPresent(density -> findings.note(path + ".bandwidth", chosen(density)));
        }
        return smoothed.map(density -> density);
    }

    private static Problem chosen(Smoothed density) {
        double sd = Math.sqrt(density.variance());
        double h = density.bandwidth();
        return Problem.of("the bandwidth is %s, by %s".formatted(Significant.text(h, DIGITS), Smoothed.RULE))
                .because("It is the standard deviation of the kernel. Smoothing widens: the standard deviation is %s,"
                                .formatted(Significant.text(sd, DIGITS))
                        + " that of the data %s."
                                .formatted(
                                        Significant.text(Math.sqrt(Math.max(0, density.variance() - h * h)), DIGITS)));
    }
}
