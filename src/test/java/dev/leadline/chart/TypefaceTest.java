package dev.leadline.chart;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledOnOs;
import org.junit.jupiter.api.condition.OS;
import org.junit.jupiter.api.io.TempDir;

class TypefaceTest {
    @TempDir
    private Path folder;

    @Test
    void digitsAreEquallyWide() {
        var font = Typeface.sans(12);
        for (char digit = '0'; digit <= '9'; digit++) {
            assertEquals(Typeface.width(font, "0"), Typeface.width(font, "" + digit), 1e-9);
        }
        assertEquals(-1, font.canDisplayUpTo("⁰¹²³⁴⁵⁶⁷⁸⁹⁻×−±∞…"));
    }

    @Test
    void cutsWhatIsTooWide() {
        var font = Typeface.sans(12);
        String text = "a name that somebody wrote at great length";
        String cut = Typeface.fitted(font, text, 100);
        assertTrue(cut.endsWith("…") && Typeface.width(font, cut) <= 100, cut);
        assertEquals(text, Typeface.fitted(font, text, 1000));
        assertEquals("…", Typeface.fitted(font, text, 0));
    }

    /// In a Java of its own that finds no font, as on a machine without any.
    @Test
    @EnabledOnOs(OS.LINUX)
    void saysInPlainWordsThatThereIsNoFont() throws IOException, InterruptedException {
        var none = Files.writeString(
                folder.resolve("fonts.conf"), "<?xml version=\"1.0\"?><fontconfig><dir>/nowhere</dir></fontconfig>");
        var builder = new ProcessBuilder(
                        Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                        "-Djava.awt.headless=true",
                        // Java keeps a list of the fonts it found in the home folder.
                        "-Duser.home=" + folder,
                        "-cp",
                        System.getProperty("java.class.path"),
                        WithoutFont.class.getName())
                .redirectErrorStream(true);
        builder.environment().put("FONTCONFIG_FILE", none.toString());
        var process = builder.start();
        String said = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        assertEquals(0, process.waitFor(), said);
        assertTrue(said.contains("this machine has no font to draw a picture with"), said);
    }

    static final class WithoutFont {
        private WithoutFont() {}

        public static void main(String[] arguments) {
            for (int attempt = 0; attempt < 2; attempt++) {
                try {
                    Picture.of(Invented.empty(), View.FOLLOWING, Theme.LIGHT, 400, 300)
                            .image(1);
                    System.exit(1);
                } catch (dev.leadline.problem.Refusal refusal) {
                    System.out.println(refusal.getMessage());
                }
            }
        }
    }
}
