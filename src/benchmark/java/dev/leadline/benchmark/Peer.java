package dev.leadline.benchmark;

import java.io.IOException;
import java.lang.foreign.Arena;
import java.lang.foreign.FunctionDescriptor;
import java.lang.foreign.Linker;
import java.lang.foreign.MemorySegment;
import java.lang.foreign.SymbolLookup;
import java.lang.foreign.ValueLayout;
import java.lang.invoke.MethodHandle;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/// The C of `src/benchmark/c/peer.c`, built by the machine's compiler and called in this process.
final class Peer {
    /// Variants that draw from one generator, in the order of its numbers.
    static final int ONE_GENERATOR = 5;

    private static final List<String> VARIANTS = List.of(
            "draw by draw, Wichura",
            "draw by draw, octave table",
            "blocks, Wichura",
            "blocks, octave table",
            "blocks, octave table, words first",
            "blocks, octave table, eight generators");
    private static final int GENERATOR_WORDS = 8 * 4;

    private final MethodHandle run;
    private final MemorySegment states = Arena.global().allocate(ValueLayout.JAVA_LONG, GENERATOR_WORDS);
    private final MemorySegment sums = Arena.global().allocate(ValueLayout.JAVA_DOUBLE, 2);

    private Peer(MethodHandle run) {
        this.run = run;
        var random = new SplittableRandom(1);
        for (int i = 0; i < GENERATOR_WORDS; i++) {
            states.setAtIndex(ValueLayout.JAVA_LONG, i, random.nextLong());
        }
    }

    @SuppressWarnings("restricted") // native code is what this class is for
    static Peer built(Path source, Path library, String... options) throws IOException, InterruptedException {
        var command = new ArrayList<>(List.of("gcc", "-std=gnu17", "-Wall", "-Wextra", "-Werror", "-shared", "-fPIC"));
        command.addAll(List.of(options));
        command.addAll(List.of("-o", library.toString(), source.toString(), "-lm"));
        if (new ProcessBuilder(command).inheritIO().start().waitFor() != 0) {
            throw new IOException("gcc did not build " + source + ": " + String.join(" ", command));
        }
        var linker = Linker.nativeLinker();
        var symbols = SymbolLookup.libraryLookup(library, Arena.global());
        try {
            linker.downcallHandle(symbols.findOrThrow("peer_prepare"), FunctionDescriptor.ofVoid())
                    .invokeExact();
        } catch (Throwable e) {
            throw new IllegalStateException("the tables of the peer were not built", e);
        }
        return new Peer(linker.downcallHandle(
                symbols.findOrThrow("peer_run"),
                FunctionDescriptor.ofVoid(
                        ValueLayout.JAVA_INT,
                        ValueLayout.JAVA_INT,
                        ValueLayout.JAVA_LONG,
                        ValueLayout.ADDRESS,
                        ValueLayout.ADDRESS)));
    }

    static List<String> variants() {
        return VARIANTS;
    }

    Contestant variant(int variant) {
        return (integrand, draws) -> {
            try {
                run.invokeExact(integrand, variant, (long) draws, states, sums);
            } catch (Throwable e) {
                throw new IllegalStateException("the peer did not run", e);
            }
            double mean = sums.getAtIndex(ValueLayout.JAVA_DOUBLE, 0) / draws;
            double variance = sums.getAtIndex(ValueLayout.JAVA_DOUBLE, 1) / draws - mean * mean;
            return new Contestant.Found(mean, Math.sqrt(variance / draws));
        };
    }
}
