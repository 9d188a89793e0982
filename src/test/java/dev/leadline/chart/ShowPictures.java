package dev.leadline.chart;

import dev.leadline.density.Borrowed;
import dev.leadline.density.Portrait;
import dev.leadline.project.ProjectFile;
import dev.leadline.study.LaneState;
import dev.leadline.study.Study;
import java.awt.color.ColorSpace;
import java.awt.image.BufferedImage;
import java.awt.image.ColorConvertOp;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import javax.imageio.ImageIO;
import org.apache.commons.statistics.distribution.BetaDistribution;
import org.apache.commons.statistics.distribution.ExponentialDistribution;
import org.apache.commons.statistics.distribution.GammaDistribution;
import org.apache.commons.statistics.distribution.GumbelDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.apache.commons.statistics.distribution.TDistribution;
import org.apache.commons.statistics.distribution.TriangularDistribution;
import org.apache.commons.statistics.distribution.UniformContinuousDistribution;

/// Draws pictures of invented runs and of the sample projects for looking at, into the folder given, and says
/// how much processor time drawing took.
final class ShowPictures {
    private ShowPictures() {}

    public static void main(String[] arguments) throws IOException, InterruptedException {
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
        for (var sample : List.of("mooring-line", "dredging-volume", "tide-gauge", "quay-lighting")) {
            all.put(sample, run(Path.of("sample-projects", sample + ".leadline")));
        }
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
        sketches(folder);
        for (String name : List.of("rare.svg", "rare-300.png")) {
            var file = folder.resolve(name);
            Files.write(file, Export.of(file).bytes(all.get("rare"), View.FOLLOWING, 720, 420, 300));
        }
        measure("one lane of " + all.get("mean").lanes().getFirst().points().size(), all.get("mean"));
        measure("two lanes of " + all.get("rare").lanes().getFirst().points().size(), all.get("rare"));
        var tenBillion = Invented.settling(
                "volume",
                "m3",
                Optional.empty(),
                Invented.absolute(1),
                List.of(Invented.mean("A", "independent", 18_430, 5200, 10_000_000_000L, 11)));
        measure("one lane of " + tenBillion.lanes().getFirst().points().size(), tenBillion);
    }

    private static Settling run(Path file) throws InterruptedException {
        var project = ProjectFile.examine(file).project();
        try (var study = Study.start(project.question(), project.plan(), 2, _ -> {})) {
            var traces = study.await().lanes().stream().map(LaneState::trace).toList();
            return Settling.of(project.question(), project.plan(), traces);
        }
    }

    private static void sketches(Path folder) throws IOException {
        var densities = List.of(
                NormalDistribution.of(0, 1),
                GumbelDistribution.of(24.5, 2.6),
                BetaDistribution.of(4, 10),
                ExponentialDistribution.of(6),
                UniformContinuousDistribution.of(0, 420),
                TriangularDistribution.of(20, 35, 70),
                GammaDistribution.of(.5, 2),
                TDistribution.of(1));
        for (var theme : Map.of("light", Theme.LIGHT, "dark", Theme.DARK).entrySet()) {
            var sheet = new BufferedImage(1000, 560, BufferedImage.TYPE_INT_RGB);
            var g = sheet.createGraphics();
            g.setColor(theme.getValue().ground());
            g.fillRect(0, 0, 1000, 560);
            for (int i = 0; i < densities.size(); i++) {
                var density = Portrait.of(Borrowed.of(densities.get(i)));
                int x = 20 + i % 4 * 240;
                int y = 20 + i / 4 * 270;
                g.drawImage(DensitySketch.image(density, 72, 20, 1, theme.getValue()), x, y, null);
                g.drawImage(
                        DensityPicture.of(
                                        density,
                                        Observed.NONE,
                                        DensityPicture.View.PDF,
                                        "gust, m/s",
                                        theme.getValue(),
                                        230,
                                        190)
                                .image(1),
                        x,
                        y + 40,
                        null);
            }
            write(sheet, folder, "sketches-" + theme.getKey());
        }
    }

    private static void measure(String what, Settling settling) {
        var threads = ManagementFactory.getThreadMXBean();
        var times = new long[60];
        for (int i = 0; i < times.length; i++) {
            long start = threads.getCurrentThreadCpuTime();
            Picture.of(settling, View.FOLLOWING, Theme.LIGHT, 1200, 700).image(1);
            times[i] = threads.getCurrentThreadCpuTime() - start;
        }
        Arrays.sort(times, 20, 60);
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
