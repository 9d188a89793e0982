package dev.leadline.cli;

import static dev.leadline.cli.CommandLines.leadline;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.project.ProjectFile;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

class SampleProjectsTest {

    private static final Path SAMPLES = Path.of("sample-projects");

    static List<Path> samples() throws IOException {
        try (Stream<Path> files = Files.list(SAMPLES)) {
            return files.filter(file -> file.toString().endsWith(ProjectFile.EXTENSION))
                    .sorted()
                    .toList();
        }
    }

    @Test
    void areFour() throws IOException {
        assertEquals(
                List.of("dredging-volume", "mooring-line", "quay-lighting", "tide-gauge"),
                samples().stream()
                        .map(file -> file.getFileName().toString().replace(ProjectFile.EXTENSION, ""))
                        .toList());
    }

    /// As a save would write it, so that the first save of a person changes only what the person changed.
    @ParameterizedTest
    @MethodSource("samples")
    void isWrittenAsASaveWritesIt(Path sample) throws IOException {
        assertEquals(Files.readString(sample), ProjectFile.format(ProjectFile.read(sample)));
    }

    @ParameterizedTest
    @MethodSource("samples")
    void hasItsBackgroundAndNamesItsSources(Path sample) {
        var draft = ProjectFile.read(sample);
        assertEquals(
                0,
                leadline("check", sample).exitCode(),
                leadline("check", sample).err());
        assertTrue(draft.notes().length() > 300, draft.notes());
        assertTrue(draft.notes().contains("invented"), draft.notes());
        draft.constants().forEach(constant -> assertTrue(!constant.source().isEmpty(), constant.name()));
        assertTrue(!draft.reference().orElseThrow().source().isEmpty());
    }

    /// Values and standard deviations of one draw, found apart from this program: for the mooring line by 5e8
    /// draws of six inputs with the gust in closed form (standard error 4e-9), for the dredging volume by a grid of
    /// 8000 by 4000 points with a polar Gauss rule (error .01), for the tide gauge in closed form, for the
    /// lighting by Gauss rules and closed-form means; the deviation of the lighting is known to three digits.
    @ParameterizedTest(name = "{0}")
    @CsvSource({
        "mooring-line, 1.2568e-5, 3.5451e-3, 4e6",
        "dredging-volume, 19179.98, 28660, 1e6",
        "tide-gauge, 3.2060226, 1.970317, 1e6",
        "quay-lighting, 20.088532, 8.598, 1e6"
    })
    void answersWithinFourStandardErrors(String name, double value, double deviation, double draws) {
        Path sample = SAMPLES.resolve(name + ProjectFile.EXTENSION);
        var lane = leadline("run", sample, "--json", "--draws", draws)
                .json()
                .required("lanes")
                .get(0);
        var answer = lane.required("answers").get(0);
        double known = deviation / Math.sqrt(draws);
        assertEquals(draws, lane.required("draws").asDouble());
        assertEquals(value, answer.required("estimate").asDouble(), 4 * known);
        double kurtosis = name.equals("mooring-line") ? 1 / value : 10;
        assertEquals(
                known,
                answer.required("standardError").asDouble(),
                known * 4 * Math.sqrt(kurtosis / (4 * draws)) + .001 * known);
        assertEquals(value, leadlineReference(sample));
    }

    private static double leadlineReference(Path sample) {
        return ProjectFile.read(sample).reference().orElseThrow().value();
    }
}
