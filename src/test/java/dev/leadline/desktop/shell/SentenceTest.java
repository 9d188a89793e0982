package dev.leadline.desktop.shell;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.desktop.Drafts;
import dev.leadline.desktop.working.Edits;
import java.util.List;
import org.junit.jupiter.api.Test;

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
                "The integral of x*y over x and y in m\u00b3, in 1,000 draws at 95 %.",
                Sentence.of(Drafts.integral()).text());
    }

    @Test
    void anEmptyQuestionSaysWhatIsMissing() {
        assertEquals(
                "The mean of a formula still to be written, with no inputs yet, in 1.00 million draws at 95 %.",
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
    void readsAsTheCommandsPrintIt() {
        for (var draft : List.of(Drafts.mean(), Drafts.probability())) {
            assertEquals(
                    dev.leadline.model.Sentence.of(
                            dev.leadline.model.Project.of(draft).question()),
                    Sentence.of(draft).text());
        }
    }
}
