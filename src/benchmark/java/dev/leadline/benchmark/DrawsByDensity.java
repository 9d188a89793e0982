package dev.leadline.benchmark;

import dev.leadline.density.Density;
import dev.leadline.density.Drawn;
import dev.leadline.density.Inversion;
import dev.leadline.density.Normal;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;

/// Nanoseconds per draw of each density, random numbers included, and how many times the normal's that is.
///
/// In every round each density is drawn from right after the normal; figures are medians over the rounds, in processor
/// time of one thread.
///
/// `DrawsByDensity FILE` writes its table to the file, as Markdown.
public final class DrawsByDensity {
    private static final ThreadMXBean CLOCK = ManagementFactory.getThreadMXBean();
    private static final int BLOCK = 1024;
    private static final int BLOCKS = 512;
    private static final int WARM_UP = 8;
    private static final int ROUNDS = 15;

    private final Stream stream = Stream.at(new Address(20261201, Purpose.RUN, "A", 0, "x", 0));
    private final double[] x = new double[BLOCK];

    /// What is drawn, and nanoseconds per draw and their ratio to the normal's by round.
    private record Timed(Density density, Inversion inversion, double[] seen, double[] ratio) {}

    private DrawsByDensity() {}

    public static void main(String[] args) throws IOException {
        var machine = Machine.described();
        var benchmark = new DrawsByDensity();
        var normal = Inversion.of(new Normal(0, 1));
        List<Timed> all = Drawn.all().stream()
                .map(density -> new Timed(density, Inversion.of(density), new double[ROUNDS], new double[ROUNDS]))
                .toList();
        for (int round = -WARM_UP; round < ROUNDS; round++) {
            for (var timed : all) {
                double before = benchmark.nanoseconds(normal);
                double own = benchmark.nanoseconds(timed.inversion);
                if (round >= 0) {
                    timed.seen[round] = own;
                    timed.ratio[round] = own / before;
                }
            }
        }
        Files.writeString(Path.of(args[0]), written(machine, all));
        System.out.println("written: " + args[0]);
    }

    /// Per draw.
    private double nanoseconds(Inversion inversion) {
        long start = CLOCK.getCurrentThreadCpuTime();
        for (int block = 0; block < BLOCKS; block++) {
            stream.fill(x, 0, BLOCK);
            inversion.fill(x, x, BLOCK);
        }
        return (double) (CLOCK.getCurrentThreadCpuTime() - start) / BLOCKS / BLOCK;
    }

    private static double median(double[] values) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        return sorted[sorted.length / 2];
    }

    private static String written(String machine, List<Timed> all) {
        var text = new StringBuilder("""
                # Draws by density

                Nanoseconds of processor time per draw on one thread, random numbers included, slowest first; the ratio is to the \
                normal density, drawn from right before in every round. Medians of %d rounds of %,d draws.
                Written by `DrawsByDensity`, which `mvn -B -Pbenchmark -DskipTests test` runs.

                %s

                What is slower by its nature: quantiles that span more decades than doubles hold (gamma and Weibull of very \
                small shape, beta of parameters below about 0.05) are powers of what is tabulated; where parts of a mixture lie \
                far apart, or a density has kinks, cells are graded, and a few draws are searched; discrete densities of more \
                values than are kept cost a search or a quantile each.

                | density | ns | times the normal |
                |---|---|---|
                """.formatted(ROUNDS, BLOCK * BLOCKS, machine));
        all.stream()
                .sorted(Comparator.comparingDouble((Timed timed) -> -median(timed.ratio)))
                .forEach(timed -> text.append(String.format(
                        Locale.ROOT,
                        "| `%s` | %.2f | %.2f |%n",
                        timed.density,
                        median(timed.seen),
                        median(timed.ratio))));
        return text.toString();
    }
}
