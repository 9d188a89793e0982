package dev.leadline.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.desktop.Drafts;
import dev.leadline.desktop.working.Edits;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class SentenceTest {
    @Test
    void saysWhatIsAsked() {
        assertEquals(
                "The chance that x > 0.9 per year, with 1 input, to \u00b110 % at 95 %.",
                Sentence.of(Drafts.probability()).text());
        assertEquals(
                "The mean of twice in m, with 1 input, to \u00b10.01 m at 95 %.",
                Sentence.of(Drafts.mean()).text());
        assertEquals(
                "The integral of x*y over x and y in m\u00b3, at 95 %.",
                Sentence.of(Drafts.integral()).text());
    }

    @Test
    void anEmptyQuestionSaysWhatIsMissing() {
        assertEquals(
                "The mean of a formula still to be written, with no inputs yet, at 95 %.",
                Sentence.of(Edits.asking("mean")).text());
    }

    @Test
    void everyPartThatCanBeEditedIsADoor() {
        var doors = Sentence.of(Drafts.probability()).parts().stream()
                .filter(p -> p.door().isPresent())
                .map(Sentence.Part::text)
                .toList();
        assertEquals(List.of("x > 0.9", "per year", "1 input", "\u00b110 %", "95 %"), doors);
    }

    @Test
    void longFormulasAreShortened() {
        var draft = dev.leadline.project.ProjectFile.parse(
                "{\"leadline\": 1, \"inputs\": [], \"ask\": {\"mean\": \"" + "x + ".repeat(50) + "x\"}}");
        assertTrue(Sentence.of(draft).text().contains("\u2026"));
    }

    @Test
    void saysEverythingThatIsAsked() {
        var draft = dev.leadline.project.ProjectFile.parse("""
            {"leadline": 1, "inputs": [{"name": "x", "density": {"family": "uniform", "from": 0, "to": 1}}],
             "ask": [{"mean": "x", "unit": "m"}, {"probability": "x > 0.07", "unit": "1/a"}],
             "confidence": 0.999, "tolerance": {"absolute": 0.00002, "relative": 0.07, "when": "both"}}
            """);
        assertEquals(
                "The mean of x in m, and the chance that x > 0.07 per year, with 1 input,"
                        + " to \u00b12e-5 m and \u00b17 % at 99.9 %.",
                Sentence.of(draft).text());
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', textBlock = """
        "quantile": "x", "at": 0.99, "unit": "t" | The 99 % quantile of x in t
        "tailMean": "x", "at": 0.975             | The mean beyond the 97.5 % quantile of x
        "ratio": ["x", "1 + x"]                  | The ratio of x to 1 + x
        "standardDeviation": "x", "unit": "m2"   | The standard deviation of x in m\u00b2
        "distribution": "x", "unit": "mm"        | The distribution of x in mm and where 95 % of it lies
        "distribution": "x", "coverage": 0.9     | The distribution of x and where 90 % of it lies
        """)
    void everyKindIsReadAloud(String ask, String words) {
        var draft = dev.leadline.project.ProjectFile.parse("""
            {"leadline": 1, "inputs": [{"name": "x", "density": {"family": "uniform", "from": 0, "to": 1}}],
             "ask": {%s}}
            """.formatted(ask));
        assertEquals(words + ", with 1 input, at 95 %.", Sentence.of(draft).text());
    }
}
