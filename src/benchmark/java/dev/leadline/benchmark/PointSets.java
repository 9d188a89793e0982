package dev.leadline.benchmark;

import dev.leadline.scheme.Measured;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import dev.leadline.stream.StreamKey;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;

/// Nanoseconds per coordinate and point of each kind of points, and how many times independent points' that
/// is.
///
/// In every round each kind is filled right after independent points; figures are medians over the rounds, in
/// processor time of one thread.
///
/// `PointSets FILE` writes its table to the file, as Markdown.
public final class PointSets {
    private static final ThreadMXBean CLOCK = ManagementFactory.getThreadMXBean();
    private static final int BLOCK = 1024;
    private static final int BLOCKS = 2048;
    private static final int WARM_UP = 10;
    private static final int ROUNDS = 31;
    private static final Address ADDRESS = new Address(20261201, Purpose.RUN, "A", 0, "x", 0);

    private final Stream stream = Stream.at(ADDRESS);
    private final StreamKey key = StreamKey.of(ADDRESS);
    private final double[] u = new double[BLOCK];
    private double seen;

    /// Nanoseconds by round: of a point, of an independent one just before, and of opening a replicate's
    /// coordinate.
    private record Timed(Measured kind, double[] point, double[] independent, double[] opening) {}

    private PointSets() {}

    public static void main(String[] args) throws IOException {
        var machine = Machine.described();
        var benchmark = new PointSets();
        List<Timed> all = Measured.all().stream()
                .map(kind -> new Timed(kind, new double[ROUNDS], new double[ROUNDS], new double[ROUNDS]))
                .toList();
        double[] dimension = new double[ROUNDS];
        for (int round = -WARM_UP; round < ROUNDS; round++) {
            int kept = Math.max(round, 0);
            for (var timed : all) {
                timed.independent[kept] = benchmark.independent();
                timed.point[kept] = benchmark.points(timed.kind);
                timed.opening[kept] = benchmark.opening(timed.kind);
            }
            dimension[kept] = benchmark.dimension();
        }
        Files.writeString(Path.of(args[0]), written(machine, all, median(dimension)));
        System.out.println("written: " + args[0] + " (" + benchmark.seen + ")");
    }

    private double independent() {
        long start = CLOCK.getCurrentThreadCpuTime();
        for (int block = 0; block < BLOCKS; block++) {
            stream.fill(u, 0, BLOCK);
            seen += u[block % BLOCK];
        }
        return (double) (CLOCK.getCurrentThreadCpuTime() - start) / BLOCKS / BLOCK;
    }

    private double points(Measured kind) {
        var coordinate = kind.opened().apply(stream);
        long start = CLOCK.getCurrentThreadCpuTime();
        for (int block = 0; block < BLOCKS; block++) {
            coordinate.points(u, (long) (block & 1023) * BLOCK, BLOCK);
            seen += u[block % BLOCK];
        }
        return (double) (CLOCK.getCurrentThreadCpuTime() - start) / BLOCKS / BLOCK;
    }

    private double opening(Measured kind) {
        int times = 20_000;
        long start = CLOCK.getCurrentThreadCpuTime();
        for (int item = 0; item < times; item++) {
            kind.opened().apply(key.stream(item)).points(u, 0, 1);
            seen += u[0];
        }
        return (double) (CLOCK.getCurrentThreadCpuTime() - start) / times;
    }

    private double dimension() {
        int times = 1000;
        long start = CLOCK.getCurrentThreadCpuTime();
        for (int i = 1; i <= times; i++) {
            seen += Measured.sobol(i).hashCode() & 1;
        }
        return (double) (CLOCK.getCurrentThreadCpuTime() - start) / times;
    }

    private static double median(double[] values) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        return sorted[sorted.length / 2];
    }

    private static String written(String machine, List<Timed> all, double dimension) {
        var text = new StringBuilder("""
                # Points

                Nanoseconds of processor time per coordinate and point on one thread, in blocks of %,d points; beside them those of \
                independent points, measured just before in every round, and the ratio. Opening: the random numbers of a replicate's \
                coordinate from their address, and its first point. Medians of %d rounds of %,d points.
                Written by `PointSets`, which `mvn -B -Pbenchmark -DskipTests test` runs.

                %s

                | points | ns | independent, ns | ratio | opening, ns |
                |---|---|---|---|---|
                """.formatted(BLOCK, ROUNDS, BLOCK * BLOCKS, machine));
        for (var timed : all) {
            double[] ratio = new double[ROUNDS];
            Arrays.setAll(ratio, round -> timed.point[round] / timed.independent[round]);
            text.append(String.format(
                    Locale.ROOT,
                    "| %s | %.2f | %.2f | %.2f | %.0f |%n",
                    timed.kind.name(),
                    median(timed.point),
                    median(timed.independent),
                    median(ratio),
                    median(timed.opening)));
        }
        return text.append(String.format(
                        Locale.ROOT,
                        "%nOnce for a lane, each input's dimension of Sobol's sequence takes %.1f microseconds.%n",
                        dimension / 1000))
                .toString();
    }
}
