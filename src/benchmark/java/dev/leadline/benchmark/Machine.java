package dev.leadline.benchmark;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.stream.Stream;

/// What a result was measured on, in one paragraph.
final class Machine {
    private Machine() {}

    static String described() throws IOException {
        var cpu = Files.readAllLines(Path.of("/proc/cpuinfo"));
        var flags = List.of(fact(cpu, "flags").split(" "));
        var vectors = Stream.of("avx512f", "avx2", "sse2")
                .filter(flags::contains)
                .findFirst()
                .orElse("no vectors");
        return "%s. %s (%s), %d processors, load %s at the start. JDK %s. %s."
                .formatted(
                        LocalDate.now(),
                        fact(cpu, "model name"),
                        vectors,
                        Runtime.getRuntime().availableProcessors(),
                        Files.readString(Path.of("/proc/loadavg")).split(" ")[0],
                        System.getProperty("java.runtime.version"),
                        gcc());
    }

    private static String fact(List<String> cpu, String name) {
        return cpu.stream()
                .filter(line -> line.startsWith(name))
                .map(line -> line.substring(line.indexOf(':') + 1).strip())
                .findFirst()
                .orElse("unknown");
    }

    private static String gcc() throws IOException {
        try (var lines = new ProcessBuilder("gcc", "--version").start().inputReader()) {
            return lines.readLine();
        }
    }
}
