package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.problem.Refusal;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import javax.imageio.ImageIO;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ExportTest {
    @TempDir
    private Path folder;

    @Test
    void sameBytesEveryTime() throws IOException {
        var one = folder.resolve("one.svg");
        var other = folder.resolve("other.svg");
        Export.svg(Invented.rareEvent(200_000), View.FOLLOWING, 720, 420, one);
        Export.svg(Invented.rareEvent(200_000), View.FOLLOWING, 720, 420, other);
        assertArrayEquals(Files.readAllBytes(one), Files.readAllBytes(other));
        assertArrayEquals(
                Export.png(Invented.gaps(), View.FOLLOWING, 300, 200, 300),
                Export.png(Invented.gaps(), View.FOLLOWING, 300, 200, 300));
    }

    @Test
    void vectorFileIsWellFormedAndSpeaks() throws Exception {
        var settling = new Settling(
                "Line 4 & <others>",
                "chance per year",
                "1/a",
                .95,
                7,
                Optional.empty(),
                Optional.empty(),
                Invented.noHit().lanes());
        String svg = Export.svg(settling, View.FOLLOWING, 720, 420);
        var document = DocumentBuilderFactory.newInstance()
                .newDocumentBuilder()
                .parse(new ByteArrayInputStream(svg.getBytes(StandardCharsets.UTF_8)));
        var root = document.getDocumentElement();
        assertEquals("svg", root.getTagName());
        assertEquals("img", root.getAttribute("role"));
        assertEquals("0 0 720 420", root.getAttribute("viewBox"));
        assertEquals(
                "Line 4 & <others>", root.getElementsByTagName("title").item(0).getTextContent());
        assertEquals(
                Caption.of(settling), root.getElementsByTagName("desc").item(0).getTextContent());
        var texts = root.getElementsByTagName("text");
        var words = new StringBuilder();
        for (int i = 0; i < texts.getLength(); i++) {
            words.append(texts.item(i).getTextContent()).append('\n');
        }
        assertTrue(words.toString().contains("estimate of chance per year, in 10⁻⁴ 1/a"), words::toString);
        assertTrue(words.toString().contains("no hit in 64,536 draws"), words::toString);
        assertTrue(svg.contains("rgb(255,255,255)"));
    }

    @Test
    void imageFileDeclaresItsDotsAndSpeaks() throws IOException {
        var file = folder.resolve("figure.png");
        Export.png(Invented.smoothMean(), View.FOLLOWING, 480, 320, 300, file);
        var image = ImageIO.read(file.toFile());
        assertEquals(1500, image.getWidth());
        assertEquals(1000, image.getHeight());
        byte[] bytes = Files.readAllBytes(file);
        // PNG specification, third edition, 11.3.4.3: pixels per unit of both axes, then 1 for the metre.
        int at = indexOf(bytes, "pHYs");
        var chunk = ByteBuffer.wrap(bytes, at + 4, 9);
        assertEquals(11_811, chunk.getInt());
        assertEquals(11_811, chunk.getInt());
        assertEquals(1, chunk.get());
        assertTrue(indexOf(bytes, Caption.of(Invented.smoothMean())) > 0);
    }

    @Test
    void replacesAFileAndLeavesNothingBeside() throws IOException {
        var file = Files.writeString(folder.resolve("figure.svg"), "old");
        Export.svg(Invented.empty(), View.FOLLOWING, 400, 300, file);
        assertTrue(Files.readString(file).startsWith("<svg"));
        try (var files = Files.list(folder)) {
            assertEquals(1, files.count());
        }
    }

    @Test
    void saysWhyAFileCannotBeWritten() throws IOException {
        var nowhere = folder.resolve("no/such/figure.svg");
        var refused =
                assertThrows(Refusal.class, () -> Export.svg(Invented.empty(), View.FOLLOWING, 400, 300, nowhere));
        assertEquals(
                "figure \"" + nowhere + "\" could not be written: its folder does not exist",
                refused.problems().getFirst().primary());
        var taken = Files.createDirectories(folder.resolve("taken.png/inside")).getParent();
        assertThrows(Refusal.class, () -> Export.png(Invented.empty(), View.FOLLOWING, 400, 300, 96, taken));
        try (var files = Files.list(folder)) {
            assertEquals(1, files.count());
        }
    }

    private static int indexOf(byte[] bytes, String text) {
        var wanted = new String(text.getBytes(StandardCharsets.UTF_8), StandardCharsets.ISO_8859_1);
        return new String(bytes, StandardCharsets.ISO_8859_1).indexOf(wanted);
    }
}
