package dev.leadline.benchmark;

import dev.leadline.engine.Items;
import dev.leadline.engine.Questions;
import dev.leadline.engine.Recipe;
import dev.leadline.engine.Sampler;
import dev.leadline.estimate.Accumulator;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.scheme.Adaptation;
import dev.leadline.scheme.Adaptation.Way;
import dev.leadline.scheme.Allocation;
import dev.leadline.scheme.Antithetic;
import dev.leadline.scheme.Independent;
import dev.leadline.scheme.LatinHypercube;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Scheme;
import dev.leadline.scheme.ScrambledSobol;
import dev.leadline.scheme.Scrambling;
import dev.leadline.scheme.Share;
import dev.leadline.scheme.ShiftedLattice;
import dev.leadline.scheme.Stratified;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.TreeSet;

/// Nanoseconds of processor time per draw of each scheme on one thread, sums included, and how many times those of
/// independent points that is, which are measured just before in every round.
///
/// `SchemeCost FILE` writes its table to the file, as Markdown.
public final class SchemeCost {
    private static final ThreadMXBean CLOCK = ManagementFactory.getThreadMXBean();
    private static final int DRAWS = 1 << 19;
    private static final int WARM_UP = 6;
    private static final int ROUNDS = 21;

    /// A lane at work. Confined to one thread.
    private static final class Work {
        private final String name;
        private final Items items;
        private final Sampler sampler;
        private final double[] time = new double[ROUNDS];
        private final double[] before = new double[ROUNDS];

        Work(String name, Scheme scheme) {
            Question question = new Questions()
                    .uniform("x", 0, 1)
                    .mean("x*sin(3*x) + log(1+x)")
                    .build();
            var recipe = Recipe.of(question, Lane.of("A", scheme), 20261201);
            this.name = name;
            this.items = recipe.items();
            this.sampler = recipe.sampler();
        }

        double nanoseconds() {
            long start = CLOCK.getCurrentThreadCpuTime();
            long done = 0;
            var total = new Accumulator(2);
            for (long k = 80; done < DRAWS; k++) {
                var item = items.at(k);
                var sums = sampler.compute(item, () -> false).orElseThrow();
                if (sums.sums().components() == 2) {
                    total.merge(sums.sums());
                }
                done += item.draws();
            }
            return (double) (CLOCK.getCurrentThreadCpuTime() - start) / done;
        }
    }

    private SchemeCost() {}

    public static void main(String[] args) throws IOException {
        var machine = Machine.described();
        var independent = new Work("independent", Scheme.of(new Independent()));
        List<Work> all = List.of(
                of("antithetic", new Antithetic()),
                of("stratified, 1,024 cells", new Stratified(new LinkedHashMap<>(Map.of("x", 1024)))),
                of("stratified, 5 cells", new Stratified(new LinkedHashMap<>(Map.of("x", 5)))),
                of(
                        "stratified, 64 cells, shared",
                        new Stratified(new LinkedHashMap<>(Map.of("x", 64)), new Allocation.Neyman())),
                of("latin-hypercube, 100 points", new LatinHypercube(OptionalInt.of(100), 30)),
                of("latin-hypercube, 10,000 points", new LatinHypercube(OptionalInt.of(10_000), 30)),
                of("scrambled-sobol", new ScrambledSobol(16, Scrambling.NESTED)),
                of("scrambled-sobol, digital shift", new ScrambledSobol(16, Scrambling.DIGITAL_SHIFT)),
                of("shifted-lattice", new ShiftedLattice(16)),
                adapted(Way.CROSS_ENTROPY),
                adapted(Way.GRID));
        for (int round = -WARM_UP; round < ROUNDS; round++) {
            int kept = Math.max(round, 0);
            for (Work work : all) {
                work.before[kept] = independent.nanoseconds();
                work.time[kept] = work.nanoseconds();
            }
        }
        Files.writeString(Path.of(args[0]), written(machine, all));
        System.out.println("written: " + args[0]);
    }

    private static Work of(String name, Points points) {
        return new Work(name, Scheme.of(points));
    }

    private static Work adapted(Way way) {
        var wish = new Adaptation(way, new TreeSet<>(List.of(0)), Share.of(.1));
        return new Work(
                "independent, " + way.word(),
                new Scheme(new Independent(), Optional.empty(), List.of(), false, Optional.of(wish)));
    }

    private static double median(double[] values) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        return sorted[sorted.length / 2];
    }

    private static String written(String machine, List<Work> all) {
        var text = new StringBuilder("""
                # Schemes

                Nanoseconds of processor time per draw of `x*sin(3*x) + log(1+x)` on one thread, points, formula and sums included; \
                beside them those of independent points, measured just before in every round, and the ratio. Medians of %d rounds of \
                %,d draws. Written by `SchemeCost`, which `mvn -B -Pbenchmark -DskipTests test` runs.

                %s

                | scheme | ns | independent, ns | ratio |
                |---|---|---|---|
                """.formatted(ROUNDS, DRAWS, machine));
        for (Work work : all) {
            double[] ratio = new double[ROUNDS];
            Arrays.setAll(ratio, round -> work.time[round] / work.before[round]);
            text.append(String.format(
                    Locale.ROOT,
                    "| %s | %.2f | %.2f | %.2f |%n",
                    work.name,
                    median(work.time),
                    median(work.before),
                    median(ratio)));
        }
        return text.toString();
    }
}
