package dev.leadline;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.File;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/// The program as a process of its own.
class MainTest {

    private record Ended(int exitCode, String out, String err) {}

    /// Where numbers are written with other digits and the default charset is ASCII, the program writes them as
    /// everywhere, in UTF-8; and it hands on its exit code.
    @Test
    void speaksTheSameInEveryCountry(@TempDir Path folder) throws Exception {
        Path project = Files.writeString(folder.resolve("a.leadline"), """
                {"leadline": 1, "inputs": [{"name": "x", "density": {"family": "uniform", "from": 0, "to": 1}}],
                 "ask": {"mean": "x", "unit": "m3"}, "seed": 1}
                """);
        Ended run = main(folder, "run", project.toString(), "--draws", "2000");
        assertEquals(0, run.exitCode, run.err);
        assertTrue(run.out.contains("2,000 draws") && run.out.contains("± 0.01") && run.out.contains("m³"), run.out);
        assertEquals(2, main(folder, "run", project.toString(), "--draws", "0").exitCode);
    }

    private static Ended main(Path folder, String... arguments) throws IOException, InterruptedException {
        List<String> command = new ArrayList<>(List.of(
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-Duser.language=ar",
                "-Duser.country=EG",
                "-Duser.extensions=u-nu-arab",
                "-Dstdout.encoding=US-ASCII",
                "-cp",
                System.getProperty("surefire.test.class.path", System.getProperty("java.class.path")),
                "dev.leadline.Main"));
        command.addAll(List.of(arguments));
        File out = folder.resolve("out").toFile();
        File err = folder.resolve("err").toFile();
        Process process = new ProcessBuilder(command)
                .redirectOutput(out)
                .redirectError(err)
                .start();
        int exitCode = process.waitFor();
        return new Ended(
                exitCode, Files.readString(out.toPath(), StandardCharsets.UTF_8), Files.readString(err.toPath()));
    }
}
