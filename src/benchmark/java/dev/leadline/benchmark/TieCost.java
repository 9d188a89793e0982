package dev.leadline.benchmark;

import dev.leadline.density.Copula;
import dev.leadline.density.Correlations;
import dev.leadline.density.Mixing;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Locale;

/// Nanoseconds of processor time that tying inputs costs per draw, on one thread; random numbers and the densities of
/// the inputs not included.
///
/// `TieCost FILE` writes its table to the file, as Markdown.
public final class TieCost {
    private static final int BLOCK = 1024;
    private static final int BLOCKS = 512;
    private static final int ROUNDS = 31;
    private static final int[] INPUTS = {2, 4, 10};

    private TieCost() {}

    public static void main(String[] args) throws IOException {
        var text = new StringBuilder("""
                # Tied inputs

                Nanoseconds of processor time per draw that a copula adds on one thread, all inputs tied to each other. Medians of %d \
                rounds of %,d draws. Written by `mvn -B -Pbenchmark -DskipTests test`.

                %s

                | inputs | Gaussian | Gaussian, per input | Student, dof 4 | Student, per input |
                |---|---|---|---|---|
                """.formatted(ROUNDS, BLOCK * BLOCKS, Machine.described()));
        for (int inputs : INPUTS) {
            double gaussian = nanoseconds(Mixing.NONE, inputs);
            double student = nanoseconds(Mixing.student(4), inputs);
            text.append(String.format(
                    Locale.ROOT,
                    "| %d | %.1f | %.1f | %.1f | %.1f |%n",
                    inputs,
                    gaussian,
                    gaussian / inputs,
                    student,
                    student / inputs));
        }
        Files.writeString(Path.of(args[0]), text);
        System.out.println("written: " + args[0]);
    }

    private static double nanoseconds(Mixing mixing, int inputs) {
        var correlations = Correlations.none(inputs);
        for (int i = 0; i < inputs; i++) {
            for (int j = i + 1; j < inputs; j++) {
                correlations = correlations.with(i, j, .5);
            }
        }
        var copula = new Copula(mixing, correlations);
        boolean[] all = new boolean[inputs];
        Arrays.fill(all, true);
        double[][] drawn = new double[copula.coordinates()][BLOCK];
        for (int i = 0; i < drawn.length; i++) {
            Stream.at(new Address(1, Purpose.RUN, "A", 0, "x" + i, 0)).fill(drawn[i], 0, BLOCK);
        }
        double[][] u = new double[drawn.length][BLOCK];
        var clock = ManagementFactory.getThreadMXBean();
        double[] rounds = new double[ROUNDS];
        double seen = 0;
        for (int round = -10; round < ROUNDS; round++) {
            long start = clock.getCurrentThreadCpuTime();
            for (int block = 0; block < BLOCKS; block++) {
                for (int i = 0; i < u.length; i++) {
                    System.arraycopy(drawn[i], 0, u[i], 0, BLOCK);
                }
                copula.tie(u, all, BLOCK);
                seen += u[inputs - 1][block % BLOCK];
            }
            if (round >= 0) {
                rounds[round] = (double) (clock.getCurrentThreadCpuTime() - start) / ((double) BLOCKS * BLOCK);
            }
        }
        if (!(seen > 0)) {
            throw new IllegalStateException("nothing was tied");
        }
        Arrays.sort(rounds);
        return rounds[ROUNDS / 2];
    }
}
