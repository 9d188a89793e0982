package dev.leadline.project;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.project.RefusedProjects.Case;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class RefusedProjectsTest {

    @ParameterizedTest(name = "{0}")
    @MethodSource("dev.leadline.project.RefusedProjects#all")
    void saysEveryProblemAtOnce(Case refused) {
        var problems = problems(refused.text().getBytes(StandardCharsets.UTF_8));
        List<String> found = problems.stream()
                .map(problem -> problem.place().path() + " | " + problem.primary())
                .toList();
        assertEquals(
                String.join("\n", refused.expected()),
                String.join(
                        "\n",
                        IntStream.range(0, found.size())
                                .mapToObj(i -> i < refused.expected().size()
                                                && refused.expected().get(i).endsWith("| ~")
                                        ? found.get(i).replaceAll("\\| .*", "| ~")
                                        : found.get(i))
                                .toList()));
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("dev.leadline.project.RefusedProjects#all")
    void wordsProblemsForPeople(Case refused) {
        for (Problem problem : problems(refused.text().getBytes(StandardCharsets.UTF_8))) {
            assertFalse(problem.primary().endsWith("."), problem.primary());
            assertTrue(problem.primary().lines().count() == 1, problem.primary());
            boolean pointsAtAPlace = problem.place().span().isPresent();
            assertTrue(
                    pointsAtAPlace
                            || problem.detail().isPresent()
                            || problem.hint().isPresent()
                            || problem.primary().contains("must be")
                            || problem.primary().contains("expected"),
                    "nothing to go on: " + problem.primary());
        }
    }

    @Test
    void refusesWhatIsNotUtf8() {
        byte[] bytes = "{\n\"title\": \"?\"}".getBytes(StandardCharsets.ISO_8859_1);
        bytes[12] = (byte) 0xe9;
        assertEquals(
                "the file is not UTF-8 text (byte 12, line 2)",
                problems(bytes).getFirst().primary());
    }

    @Test
    void refusesWhatIsTooLarge() {
        assertEquals(
                "the project has 10,485,761 bytes",
                problems(new byte[ProjectFile.MOST_BYTES + 1]).getFirst().primary());
        String inputs = "{\"leadline\": 1, \"inputs\": [" + "{},".repeat(1000) + "{}]}";
        assertEquals(
                "inputs has 1,001 elements",
                problems(inputs.getBytes(StandardCharsets.UTF_8)).getFirst().primary());
        String title = "{\"leadline\": 1, \"title\": \"" + "x".repeat(10_001) + "\"}";
        assertEquals(
                "title has 10,001 characters",
                problems(title.getBytes(StandardCharsets.UTF_8)).getFirst().primary());
        String notes = "{\"leadline\": 1, \"notes\": \"" + "x".repeat(1_000_001) + "\"}";
        assertTrue(problems(notes.getBytes(StandardCharsets.UTF_8))
                .getFirst()
                .primary()
                .startsWith("the JSON is larger"));
        String number = "{\"leadline\": 1, \"seed\": " + "1".repeat(1_001) + "}";
        assertTrue(problems(number.getBytes(StandardCharsets.UTF_8))
                .getFirst()
                .primary()
                .startsWith("the JSON is larger"));
    }

    @Test
    void stopsAtAHundredProblems() {
        String fields = IntStream.range(0, 5000)
                .mapToObj(i -> ", \"field%d\": 0".formatted(i))
                .reduce("{\"leadline\": 1", String::concat);
        var problems = problems((fields + "}").getBytes(StandardCharsets.UTF_8));
        assertEquals(101, problems.size());
        assertEquals(
                "there are more problems than the 100 listed",
                problems.getLast().primary());
    }

    @Test
    void cannotSteerATerminal() {
        String text = "{\"leadline\": 1, \"a\\u001b[31m\": 0, \"title\": [\"\\u001b\"]}";
        problems(text.getBytes(StandardCharsets.UTF_8))
                .forEach(problem -> assertFalse(problem.toString().contains("\u001b"), problem.toString()));
    }

    private static List<Problem> problems(byte[] bytes) {
        return assertThrows(Refusal.class, () -> ProjectFile.examine(bytes).project())
                .problems();
    }
}
