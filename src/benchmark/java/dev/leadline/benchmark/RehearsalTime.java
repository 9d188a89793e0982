package dev.leadline.benchmark;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/// Seconds from start to end of the command `rehearse` with 2,000 repetitions of 1,000 draws on two threads,
/// in a Java of its own, start and compiling included. It should take less than 5 on two processors that do
/// nothing else.
///
/// `RehearsalTime FILE` writes its table to the file, as Markdown.
public final class RehearsalTime {
    private static final int RUNS = 5;
    private static final double NANOSECOND = 1e-9;

    private static final String INPUT =
            "{\"name\": \"x\", \"density\": {\"family\": \"lognormal\", \"mu\": 0, \"sigma\": 1}}";

    private RehearsalTime() {}

    private record Taken(double wall, double processor) {}

    private static Map<String, String> questions() {
        var questions = new LinkedHashMap<String, String>();
        questions.put("mean, reference stated", "\"ask\": {\"mean\": \"x\"}, \"reference\": {\"value\": 1.6487212707}");
        questions.put("mean, value from a run of its own", "\"ask\": {\"mean\": \"x\"}");
        questions.put(
                "probability, reference stated",
                "\"ask\": {\"probability\": \"x > 3\"}, \"reference\": {\"value\": 0.13596857}");
        questions.put("quantile, value from a run of its own", "\"ask\": {\"quantile\": \"x\", \"at\": 0.9}");
        questions.put(
                "mean by scrambled Sobol points, reference stated",
                "\"ask\": {\"mean\": \"x\"}, \"reference\": {\"value\": 1.6487212707},"
                        + " \"lanes\": [{\"name\": \"A\", \"points\": \"scrambled-sobol\"}]");
        return questions;
    }

    private static Taken taken(Path project) throws IOException, InterruptedException {
        var command = List.of(
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-cp",
                System.getProperty("java.class.path"),
                "dev.leadline.Main",
                "rehearse",
                project.toString(),
                "--repetitions",
                "2000",
                "--draws",
                "1000",
                "--threads",
                "2",
                "--json");
        long start = System.nanoTime();
        var process = new ProcessBuilder(command)
                .redirectOutput(ProcessBuilder.Redirect.DISCARD)
                .redirectError(ProcessBuilder.Redirect.INHERIT)
                .start();
        double processor = 0;
        while (!process.waitFor(Duration.ofMillis(20))) {
            processor = process.info()
                    .totalCpuDuration()
                    .map(passed -> NANOSECOND * passed.toNanos())
                    .orElse(Double.NaN);
        }
        if (process.exitValue() > 1) {
            throw new IllegalStateException("exit " + process.exitValue());
        }
        return new Taken(NANOSECOND * (System.nanoTime() - start), processor);
    }

    private static String row(String name, Path project) throws IOException, InterruptedException {
        double[] wall = new double[RUNS];
        double[] processor = new double[RUNS];
        for (int i = 0; i < RUNS; i++) {
            var taken = taken(project);
            wall[i] = taken.wall();
            processor[i] = taken.processor();
        }
        Arrays.sort(wall);
        Arrays.sort(processor);
        return String.format(
                Locale.ROOT, "| %s | %.1f | %.1f | %.1f |%n", name, wall[RUNS / 2], wall[0], processor[RUNS / 2]);
    }

    public static void main(String[] arguments) throws IOException, InterruptedException {
        var text = new StringBuilder("""
            # Seconds of a rehearsal

            `rehearse` of 2,000 repetitions of 1,000 draws on two threads, from the start of Java to its end; %d runs each. Written by
            `RehearsalTime`.

            %s

            | answer | median | fastest | median of processor time |
            |---|---|---|---|
            """.formatted(RUNS, Machine.described()));
        for (var question : questions().entrySet()) {
            Path project = Files.createTempFile("rehearsal", ".leadline");
            Files.writeString(
                    project,
                    "{\"leadline\": 1, \"inputs\": [%s], \"seed\": 1, %s}".formatted(INPUT, question.getValue()));
            text.append(row(question.getKey(), project));
            Files.delete(project);
        }
        Files.writeString(Path.of(arguments[0]), text);
    }
}
