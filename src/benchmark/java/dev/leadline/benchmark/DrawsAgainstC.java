package dev.leadline.benchmark;

import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.stream.IntStream;

/// Nanoseconds per draw, random numbers and sums included, on one thread: is the engine as fast as C?
///
/// Everything runs in this process, in turn, in every round, each round starting with another contestant, so that
/// whatever else the machine does hits all alike. Figures are medians over the rounds, in processor time.
///
/// `DrawsAgainstC FILE` writes its tables to the file, as Markdown.
public final class DrawsAgainstC {
    /// Processor time of this thread: what else runs on the machine does not count, as far as the caches let it.
    private static final ThreadMXBean CLOCK = ManagementFactory.getThreadMXBean();

    private static final int DRAWS = 1 << 22;
    private static final int WARM_UP = 4;
    private static final int ROUNDS = 15;
    private static final Path SOURCE = Path.of("src/benchmark/c/peer.c");
    private static final String ENGINE = "engine";
    private static final String PLAIN = "-O3 -march=native -fno-math-errno";
    private static final String FAST = "-O3 -march=native -ffast-math";

    private final List<Integrand> integrands = Integrand.all();
    private final Map<String, Contestant> contestants = new LinkedHashMap<>();

    /// Nanoseconds per draw by contestant, integrand and round.
    private final Map<String, double[][]> seen = new LinkedHashMap<>();

    private DrawsAgainstC() throws IOException, InterruptedException {
        contestants.put(ENGINE, new Engine(integrands));
        var folder = Files.createDirectories(Path.of("target/benchmark"));
        for (String options : List.of(PLAIN, FAST)) {
            var library = folder.resolve("peer" + contestants.size() + ".so").toAbsolutePath();
            var peer = Peer.built(SOURCE, library, options.split(" "));
            for (int variant = 0; variant < Peer.variants().size(); variant++) {
                contestants.put(name(options, variant), peer.variant(variant));
            }
        }
        contestants.keySet().forEach(name -> seen.put(name, new double[integrands.size()][ROUNDS]));
    }

    public static void main(String[] args) throws IOException, InterruptedException {
        var machine = Machine.described();
        var benchmark = new DrawsAgainstC();
        for (int round = -WARM_UP; round < ROUNDS; round++) {
            benchmark.round(round);
            System.err.printf("round %d of %d%n", round + 1, ROUNDS);
        }
        Files.writeString(Path.of(args[0]), benchmark.written(machine));
        System.out.println("written: " + args[0]);
    }

    private void round(int round) {
        var names = new ArrayList<>(contestants.keySet());
        for (int f = 0; f < integrands.size(); f++) {
            Collections.rotate(names, 1);
            var means = new ArrayList<Contestant.Found>();
            for (String name : names) {
                long start = CLOCK.getCurrentThreadCpuTime();
                var found = contestants.get(name).run(f, DRAWS);
                double nanoseconds = (double) (CLOCK.getCurrentThreadCpuTime() - start) / DRAWS;
                check(name, integrands.get(f), found, means);
                if (round >= 0) {
                    seen.get(name)[f][round] = nanoseconds;
                }
            }
        }
    }

    /// Against the closed form where there is one, and against every other contestant.
    private static void check(String name, Integrand integrand, Contestant.Found found, List<Contestant.Found> others) {
        boolean right = Double.isNaN(integrand.expected()) || found.agrees(integrand.expected(), 0);
        for (var other : others) {
            right &= found.agrees(other.mean(), other.standardError());
        }
        if (!right) {
            throw new IllegalStateException(
                    name + " is wrong on " + integrand.name() + ": " + found + ", others " + others);
        }
        others.add(found);
    }

    private static String name(String options, int variant) {
        return "`" + options + "`, " + Peer.variants().get(variant);
    }

    private static double median(double[] values) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        return sorted[sorted.length / 2];
    }

    private String fastest(String options, int f, int from, int to) {
        return IntStream.range(from, to)
                .mapToObj(variant -> name(options, variant))
                .min(Comparator.comparingDouble(name -> median(seen.get(name)[f])))
                .orElseThrow();
    }

    private String written(String machine) {
        var text = new StringBuilder("""
                # Draws against C

                Nanoseconds of processor time per draw on one thread, random numbers and sums included: the engine (items of work from addressed streams, \
                inversion tables, compiled formula, moments to the fourth) and the C of `src/benchmark/c/peer.c` (same generator and \
                uniforms, inversion, plain libm, sums to the second), in one process, in turn. Medians of %d rounds of %,d draws.
                Written by `mvn -B -Pbenchmark -DskipTests test`.

                %s

                `-fno-math-errno` lets gcc inline what libm does without it. `-ffast-math` also lets it call libmvec's vector functions \
                (up to 4 ulp), reorder sums and ignore NaN: what the engine's promise of equal bits rules out.

                | | | engine | C, one generator | C over engine | C, eight generators | C, fast-math, one generator | C, fast-math, eight |
                |---|---|---|---|---|---|---|---|
                """.formatted(ROUNDS, DRAWS, machine));
        int one = Peer.ONE_GENERATOR;
        int all = Peer.variants().size();
        for (int f = 0; f < integrands.size(); f++) {
            double engine = median(seen.get(ENGINE)[f]);
            double peer = median(seen.get(fastest(PLAIN, f, 0, one))[f]);
            text.append(String.format(
                    Locale.ROOT,
                    "| %s | `%s` | **%.2f** | %.2f | %.2f | %.2f | %.2f | %.2f |%n",
                    integrands.get(f).name(),
                    integrands.get(f).text(),
                    engine,
                    peer,
                    peer / engine,
                    median(seen.get(fastest(PLAIN, f, one, all))[f]),
                    median(seen.get(fastest(FAST, f, 0, one))[f]),
                    median(seen.get(fastest(FAST, f, one, all))[f])));
        }
        text.append(
                "\n## Every variant\n\nMedian, and the smallest and largest of the rounds. A column of C is its fastest variant.\n\n| |");
        integrands.forEach(
                integrand -> text.append(" ").append(integrand.name()).append(" |"));
        text.append("\n|---|").append("---|".repeat(integrands.size())).append("\n");
        seen.forEach((name, rounds) -> {
            text.append("| ").append(name).append(" |");
            for (double[] values : rounds) {
                var spread = Arrays.stream(values).summaryStatistics();
                text.append(String.format(
                        Locale.ROOT, " %.2f (%.2f to %.2f) |", median(values), spread.getMin(), spread.getMax()));
            }
            text.append("\n");
        });
        return text.toString();
    }
}
