package dev.leadline.chart;

import java.awt.color.ColorSpace;
import java.awt.image.BufferedImage;
import java.awt.image.ColorConvertOp;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import javax.imageio.ImageIO;

/// Draws pictures of invented runs for looking at, into the folder given, and says how long drawing took.
final class ShowPictures {
    private ShowPictures() {}

    public static void main(String[] arguments) throws IOException {
        var folder = Files.createDirectories(Path.of(arguments[0]));
        var all = new LinkedHashMap<String, Settling>();
        all.put("rare", Invented.rareEvent(3_000_000));
        all.put("none", Invented.noHit());
        all.put("mean", Invented.smoothMean());
        all.put("wild", Invented.wild());
        all.put("jumps", Invented.jumps());
        all.put("gaps", Invented.gaps());
        all.put("four", Invented.fourLanes());
        all.put("empty", Invented.empty());
        for (var it : all.entrySet()) {
            var s = it.getValue();
            write(Picture.of(s, View.FOLLOWING, Theme.LIGHT, 900, 520).image(1), folder, it.getKey() + "-light");
            write(Picture.of(s, View.FOLLOWING, Theme.DARK, 900, 520).image(1), folder, it.getKey() + "-dark");
            write(grey(Picture.of(s, View.FOLLOWING, Theme.LIGHT, 900, 520).image(1)), folder, it.getKey() + "-grey");
            write(Picture.of(s, View.FOLLOWING, Theme.LIGHT, 420, 260).image(1), folder, it.getKey() + "-small");
            write(
                    Picture.of(s, View.FOLLOWING.withLogDraws(false), Theme.LIGHT, 900, 520)
                            .image(1),
                    folder,
                    it.getKey() + "-linear");
        }
        write(
                Picture.of(all.get("rare"), View.FOLLOWING, Theme.LIGHT, 1200, 700)
                        .image(2),
                folder,
                "rare-large");
        measure("one lane of " + all.get("mean").lanes().getFirst().points().size(), all.get("mean"));
        measure("two lanes of " + all.get("rare").lanes().getFirst().points().size(), all.get("rare"));
        var long_ = Invented.settling(
                "volume",
                "m3",
                java.util.Optional.empty(),
                Invented.absolute(1),
                java.util.List.of(Invented.mean("A", "independent", 18_430, 5200, 10_000_000_000L, 11)));
        measure("one lane of " + long_.lanes().getFirst().points().size(), long_);
    }

    private static void measure(String what, Settling settling) {
        var times = new long[60];
        for (int i = 0; i < times.length; i++) {
            long start = System.nanoTime();
            Picture.of(settling, View.FOLLOWING, Theme.LIGHT, 1200, 700).image(1);
            times[i] = System.nanoTime() - start;
        }
        java.util.Arrays.sort(times, 20, 60);
        System.out.printf("%s: median %.1f ms, slowest of 40 %.1f ms%n", what, times[40] / 1e6, times[59] / 1e6);
    }

    private static BufferedImage grey(BufferedImage image) {
        return new ColorConvertOp(ColorSpace.getInstance(ColorSpace.CS_GRAY), null)
                .filter(image, new BufferedImage(image.getWidth(), image.getHeight(), BufferedImage.TYPE_BYTE_GRAY));
    }

    private static void write(BufferedImage image, Path folder, String name) throws IOException {
        ImageIO.write(image, "png", folder.resolve(name + ".png").toFile());
    }
}
