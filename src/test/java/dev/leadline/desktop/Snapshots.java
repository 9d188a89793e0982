package dev.leadline.desktop;

import dev.leadline.desktop.background.FxBackground;
import dev.leadline.desktop.run.RunViewModel;
import dev.leadline.desktop.run.RunViewModel.State;
import dev.leadline.desktop.run.Studies;
import dev.leadline.desktop.shell.Program;
import dev.leadline.desktop.shell.WorkbenchViewModel;
import java.awt.image.BufferedImage;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import javafx.animation.PauseTransition;
import javafx.application.Platform;
import javafx.scene.Scene;
import javafx.scene.image.PixelFormat;
import javafx.scene.image.WritableImage;
import javafx.stage.Stage;
import javafx.util.Duration;
import javax.imageio.ImageIO;

/// Makes the README's pictures of the window, light and dark, from a sample project that it runs. Needs no display:
/// `-Dglass.platform=Headless -Dprism.order=sw`.
public final class Snapshots {
    private static final int WIDTH = 1280;
    private static final int HEIGHT = 800;

    private Snapshots() {}

    /// @param args folder for the pictures, and the name of a sample project
    public static void main(String[] args) throws InterruptedException {
        Path folder = Path.of(args[0]);
        String sample = args.length > 1 ? args[1] : "mooring-line";
        var done = new CountDownLatch(1);
        Platform.startup(() -> open(folder, sample, done));
        if (!done.await(10, TimeUnit.MINUTES)) {
            System.err.println("no picture after ten minutes");
            System.exit(1);
        }
        Platform.exit();
    }

    private static void open(Path folder, String sample, CountDownLatch done) {
        var background = new FxBackground();
        var model = new WorkbenchViewModel(Studies.engine(), new NoDialogs(), background);
        var stage = new Stage();
        Program.show(stage, model, background);
        stage.setWidth(WIDTH);
        stage.setHeight(HEIGHT);
        model.openSample(sample);
        model.canRun().addListener((_, _, can) -> {
            if (can && model.run().state().get() instanceof State.Ready) {
                model.startRun();
            }
        });
        model.run().state().addListener((_, _, state) -> {
            if (state instanceof State.Failed(var problem)) {
                System.err.println(problem.primary());
                System.exit(1);
            }
            if (RunViewModel.shown(state).filter(s -> s.study().ended()).isPresent()) {
                model.dark().set(false);
                settled(() -> {
                    write(stage.getScene(), folder.resolve("window-light.png"));
                    model.dark().set(true);
                    settled(() -> {
                        write(stage.getScene(), folder.resolve("window-dark.png"));
                        picker(stage, model, folder, done);
                    });
                });
            }
        });
    }

    /// The density of the first input, dark, then light.
    private static void picker(Stage stage, WorkbenchViewModel model, Path folder, CountDownLatch done) {
        model.inputs().open(0);
        settled(() -> settled(() -> {
            write(stage.getScene(), folder.resolve("picker-dark.png"));
            model.dark().set(false);
            settled(() -> {
                write(stage.getScene(), folder.resolve("picker-light.png"));
                done.countDown();
            });
        }));
    }

    /// Leaves time for the picture to be drawn and shown.
    private static void settled(Runnable then) {
        var pause = new PauseTransition(Duration.seconds(1.5));
        pause.setOnFinished(_ -> then.run());
        pause.play();
    }

    private static void write(Scene scene, Path file) {
        WritableImage seen = scene.snapshot(null);
        int width = (int) seen.getWidth();
        int height = (int) seen.getHeight();
        int[] pixels = new int[width * height];
        seen.getPixelReader().getPixels(0, 0, width, height, PixelFormat.getIntArgbInstance(), pixels, 0, width);
        var image = new BufferedImage(width, height, BufferedImage.TYPE_INT_RGB);
        image.setRGB(0, 0, width, height, pixels, 0, width);
        try {
            Files.createDirectories(file.toAbsolutePath().getParent());
            ImageIO.write(image, "png", file.toFile());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
