package dev.leadline.model;

import dev.leadline.interval.SplittingSteps;
import dev.leadline.model.LaneDraft.Settings;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import dev.leadline.scheme.Allocation;
import dev.leadline.scheme.Antithetic;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.LatinHypercube;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.ScrambledSobol;
import dev.leadline.scheme.Scrambling;
import dev.leadline.scheme.ShiftedLattice;
import dev.leadline.scheme.Splitting;
import dev.leadline.scheme.Stratified;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.function.Function;

/// Layouts of points as projects write them: their words, what each may be told, and a lane's layout made of its draft.
public final class Layouts {
    /// Below it, an error bar from replicates is too uncertain itself.
    private static final int FEWEST_REPLICATES = 10;

    private static final int MOST_REPLICATES = 10_000;
    private static final int USUAL_CUBES = 30;
    private static final int FEWEST_PARTICLES = 10;
    private static final int MOST_PARTICLES = 10_000;
    private static final int USUAL_REPLICATES = 16;

    private static final String EQUAL = "equal";
    private static final String NEYMAN = "neyman";

    /// @param takes names of the settings that it takes
    private record Kind(List<String> takes, Function<Layouts, Optional<Points>> made) {}

    private static final Map<String, Kind> KINDS = kinds();

    private final Settings settings;
    private final List<String> inputs;
    private final String path;
    private final Findings findings;

    private Layouts(Settings settings, List<String> inputs, String path, Findings findings) {
        this.settings = settings;
        this.inputs = inputs;
        this.path = path;
        this.findings = findings;
    }

    /// Words of how cells share the draws of a pass; the first is the usual one.
    public static List<String> allocations() {
        return List.of(EQUAL, NEYMAN);
    }

    /// Words of the file, in the order in which they are offered.
    public static List<String> words() {
        return List.copyOf(KINDS.keySet());
    }

    /// Names of the settings that a layout takes; none of one that is not known.
    public static List<String> takes(String word) {
        var kind = KINDS.get(word);
        return kind == null ? List.of() : kind.takes();
    }

    private static Map<String, Kind> kinds() {
        var kinds = new LinkedHashMap<String, Kind>();
        kinds.put("independent", new Kind(List.of(), _ -> Optional.of(new Independent())));
        kinds.put("antithetic", new Kind(List.of(), _ -> Optional.of(new Antithetic())));
        kinds.put(Stratified.WORD, new Kind(List.of("cells", "allocation"), Layouts::stratified));
        kinds.put(LatinHypercube.WORD, new Kind(List.of("replicates", "cube"), Layouts::latinHypercube));
        kinds.put(ScrambledSobol.WORD, new Kind(List.of("replicates", "scrambling"), Layouts::scrambledSobol));
        kinds.put(ShiftedLattice.WORD, new Kind(List.of("replicates"), Layouts::shiftedLattice));
        kinds.put(Repetitions.WORD, new Kind(List.of("particles", "repetitions"), Layouts::splitting));
        return kinds;
    }

    /// @param inputs names, in order
    /// @param path of the lane
    static Optional<Points> of(LaneDraft lane, List<String> inputs, String path, Findings findings) {
        var kind = KINDS.get(lane.points());
        if (kind == null) {
            findings.add(path + ".points", noPoints(lane.points()));
            return Optional.empty();
        }
        var given = given(lane.settings());
        given.removeAll(kind.takes());
        given.forEach(name -> findings.add(
                path + "." + name,
                "%s points take no \"%s\"".formatted(lane.points(), name),
                kind.takes().isEmpty()
                        ? "They take no settings."
                        : "They take %s.".formatted(String.join(", ", kind.takes())),
                "Leave it out."));
        return given.isEmpty()
                ? kind.made().apply(new Layouts(lane.settings(), inputs, path, findings))
                : Optional.empty();
    }

    private static List<String> given(Settings settings) {
        var given = new ArrayList<String>();
        settings.replicates().ifPresent(_ -> given.add("replicates"));
        settings.cube().ifPresent(_ -> given.add("cube"));
        if (!settings.cells().isEmpty()) {
            given.add("cells");
        }
        settings.scrambling().ifPresent(_ -> given.add("scrambling"));
        settings.particles().ifPresent(_ -> given.add("particles"));
        settings.repetitions().ifPresent(_ -> given.add("repetitions"));
        settings.allocation().ifPresent(_ -> given.add("allocation"));
        return given;
    }

    private Optional<Points> stratified() {
        var allocation = allocation();
        if (allocation.isEmpty()) {
            return Optional.empty();
        }
        if (settings.cells().isEmpty()) {
            var points = Stratified.evenly(inputs, allocation.get());
            if (points.cells().isEmpty()) {
                findings.add(
                        path + ".cells",
                        "which of the %d inputs are to be stratified is not said".formatted(inputs.size()),
                        "Two cells of each would be too many in all.",
                        "Name the few that matter most, as \"cells\": {\"%s\": 64}.".formatted(inputs.getFirst()));
                return Optional.empty();
            }
            return Optional.of(points);
        }
        var cells = new LinkedHashMap<String, Integer>();
        double all = 1;
        for (var entry : settings.cells().entrySet()) {
            String name = Workings.composed(entry.getKey());
            if (!inputs.contains(name)) {
                findings.add(
                        path + ".cells." + entry.getKey(),
                        "there is no input %s to stratify".formatted(name),
                        "cells names inputs of the question.");
                return Optional.empty();
            }
            all *= entry.getValue();
            cells.put(name, (int) Math.min(entry.getValue(), Integer.MAX_VALUE));
        }
        return isFit(allocation.get(), all) ? Optional.of(new Stratified(cells, allocation.get())) : Optional.empty();
    }

    private Optional<Allocation> allocation() {
        String word = settings.allocation().orElse(EQUAL);
        return switch (word) {
            case EQUAL -> Optional.of(new Allocation.Equal());
            case NEYMAN -> Optional.of(new Allocation.Neyman());
            default -> {
                findings.add(
                        path + ".allocation",
                        "allocation is \"%s\" but must be \"equal\" or \"neyman\"".formatted(word),
                        "It is how the draws of a pass are shared among the cells.");
                yield Optional.empty();
            }
        };
    }

    /// @param cells of the grid
    private boolean isFit(Allocation allocation, double cells) {
        boolean shared = allocation instanceof Allocation.Neyman;
        if (shared && cells == 1) {
            findings.add(
                    path + ".allocation",
                    "the draws of a pass have one cell to go to",
                    "\"neyman\" shares them among cells by how much outcomes vary there.",
                    "Cut an input into several, as \"cells\": {\"%s\": 64}.".formatted(inputs.getFirst()));
            return false;
        }
        int least = shared ? Stratified.LEAST_SHARED : 1;
        int most = Stratified.MOST_DRAWS / least;
        if (cells > most) {
            findings.add(
                    path + ".cells",
                    String.format(Locale.ROOT, "the grid has %,.0f cells", cells),
                    shared
                            ? String.format(
                                    Locale.ROOT,
                                    "To be shared, the draws of a pass are %d for each on average; with at most %,d cells"
                                            + " they fit into an item of work.",
                                    least,
                                    most)
                            : String.format(
                                    Locale.ROOT,
                                    "Every pass makes a draw in each; at most %,d fit into an item of work.",
                                    most),
                    "Stratify fewer inputs, or coarser.");
            return false;
        }
        return true;
    }

    private Optional<Points> latinHypercube() {
        var replicates = count("replicates", settings.replicates(), USUAL_CUBES, FEWEST_REPLICATES, MOST_REPLICATES);
        var cube = settings.cube().isEmpty()
                ? OptionalInt.empty()
                : count("cube", settings.cube(), 2, 2, LatinHypercube.MOST_POINTS);
        if (settings.cube().isPresent() && settings.replicates().isPresent()) {
            findings.add(
                    path + ".cube",
                    "a Latin hypercube has \"cube\" and \"replicates\"",
                    "The points of a cube are either stated, or the draws of the lane over the replicates.",
                    "Leave one of them out.");
            return Optional.empty();
        }
        return replicates.isPresent() && (cube.isPresent() || settings.cube().isEmpty())
                ? Optional.of(new LatinHypercube(cube, replicates.getAsInt()))
                : Optional.empty();
    }

    private Optional<Points> splitting() {
        var particles = count(
                "particles", settings.particles(), Splitting.DEFAULT.particles(), FEWEST_PARTICLES, MOST_PARTICLES);
        var repetitions = settings.repetitions().isEmpty()
                ? OptionalInt.empty()
                : count("repetitions", settings.repetitions(), 0, SplittingSteps.LEAST, MOST_REPLICATES);
        return particles.isPresent()
                        && (repetitions.isPresent() || settings.repetitions().isEmpty())
                ? Optional.of(
                        new Repetitions(new Splitting(particles.getAsInt(), Splitting.DEFAULT.moves()), repetitions))
                : Optional.empty();
    }

    private OptionalInt replicates() {
        return count("replicates", settings.replicates(), USUAL_REPLICATES, FEWEST_REPLICATES, MOST_REPLICATES);
    }

    private Optional<Points> shiftedLattice() {
        var replicates = replicates();
        return replicates.isPresent() ? Optional.of(new ShiftedLattice(replicates.getAsInt())) : Optional.empty();
    }

    private Optional<Points> scrambledSobol() {
        var replicates = replicates();
        String word = settings.scrambling().orElse(Scrambling.NESTED.word());
        var scrambling = Arrays.stream(Scrambling.values())
                .filter(s -> s.word().equals(word))
                .findFirst();
        if (scrambling.isEmpty()) {
            findings.add(
                    path + ".scrambling",
                    "scrambling is \"%s\" but must be \"nested\" or \"digital-shift\"".formatted(word),
                    "It is how replicates of the points are made random.");
        }
        return replicates.isPresent() && scrambling.isPresent()
                ? Optional.of(new ScrambledSobol(replicates.getAsInt(), scrambling.get()))
                : Optional.empty();
    }

    private OptionalInt count(String name, OptionalLong given, int usual, int least, int most) {
        long count = given.orElse(usual);
        if (count < least || count > most) {
            findings.add(
                    path + "." + name,
                    "%s is %d but must be from %d to %d".formatted(name, count, least, most),
                    name.equals("replicates")
                            ? "The error is judged by how far independent replicates differ, which takes at least %d."
                                    .formatted(FEWEST_REPLICATES)
                            : "Larger ones do not fit into an item of work.");
            return OptionalInt.empty();
        }
        return OptionalInt.of((int) count);
    }

    private static Problem noPoints(String word) {
        Problem problem = Problem.of("the points \"%s\" are not available".formatted(word))
                .because("Points here are %s.".formatted(String.join(", ", words())));
        return Nearest.to(word, KINDS.keySet())
                .map(near -> problem.tryThis("Was \"%s\" meant?".formatted(near)))
                .orElse(problem.tryThis("Write \"points\": \"independent\"."));
    }
}
