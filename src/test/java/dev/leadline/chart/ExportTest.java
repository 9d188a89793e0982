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
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import javax.imageio.ImageIO;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;

class ExportTest {
    @Test
    void sameBytesEveryTime() {
        assertArrayEquals(
                Export.SVG.bytes(Invented.rareEvent(200_000), View.FOLLOWING, 720, 420, 300),
                Export.SVG.bytes(Invented.rareEvent(200_000), View.FOLLOWING, 720, 420, 300));
        assertArrayEquals(
                Export.PNG.bytes(Invented.gaps(), View.FOLLOWING, 300, 200, 300),
                Export.PNG.bytes(Invented.gaps(), View.FOLLOWING, 300, 200, 300));
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
        var svg = new String(Export.SVG.bytes(settling, View.FOLLOWING, 720, 420, 300), StandardCharsets.UTF_8);
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
        byte[] bytes = Export.PNG.bytes(Invented.smoothMean(), View.FOLLOWING, 480, 320, 300);
        var image = ImageIO.read(new ByteArrayInputStream(bytes));
        assertEquals(1500, image.getWidth());
        assertEquals(1000, image.getHeight());
        // PNG specification, third edition, 11.3.4.3: pixels per unit of both axes, then 1 for the metre.
        int at = indexOf(bytes, "pHYs");
        var chunk = ByteBuffer.wrap(bytes, at + 4, 9);
        assertEquals(11_811, chunk.getInt());
        assertEquals(11_811, chunk.getInt());
        assertEquals(1, chunk.get());
        assertTrue(indexOf(bytes, Caption.of(Invented.smoothMean())) > 0);
    }

    @Test
    void theEndingDecides() {
        assertEquals(Export.PNG, Export.of(Path.of("a.svg/b.PNG")));
        assertEquals(Export.SVG, Export.of(Path.of("picture.svg")));
        for (String name : List.of("picture.pdf", "picture", "png", "/")) {
            var refused = assertThrows(Refusal.class, () -> Export.of(Path.of(name)));
            assertTrue(refused.problems().getFirst().primary().endsWith("is neither .png nor .svg"), name);
        }
    }

    private static int indexOf(byte[] bytes, String text) {
        var wanted = new String(text.getBytes(StandardCharsets.UTF_8), StandardCharsets.ISO_8859_1);
        return new String(bytes, StandardCharsets.ISO_8859_1).indexOf(wanted);
    }
}
