package dev.leadline.desktop.shell;

import atlantafx.base.theme.PrimerDark;
import atlantafx.base.theme.PrimerLight;
import dev.leadline.desktop.background.FxBackground;
import dev.leadline.desktop.run.Studies;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import javafx.application.Application;
import javafx.application.ColorScheme;
import javafx.application.Platform;
import javafx.beans.binding.Bindings;
import javafx.scene.Scene;
import javafx.scene.image.Image;
import javafx.stage.Screen;
import javafx.stage.Stage;

/// The JavaFX application: one window.
public final class Program extends Application {
    private static final double WIDTH = 1280;
    private static final double HEIGHT = 800;

    @Override
    public void start(Stage stage) {
        var background = new FxBackground();
        var model = new WorkbenchViewModel(Studies.engine(), new StageDialogs(stage), background);
        model.dark().set(Platform.getPreferences().getColorScheme() == ColorScheme.DARK);
        show(stage, model, background);
        getParameters().getUnnamed().stream().findFirst().map(Path::of).ifPresent(model::open);
        warmUp(background);
    }

    /// Once the window stands: of the first run of a million draws this takes some tenths of a second away.
    private static void warmUp(FxBackground background) {
        background.run(
                () -> {
                    dev.leadline.formula.Program.warmUp();
                    return Optional.empty();
                },
                _ -> {},
                failure -> System.getLogger(Program.class.getName())
                        .log(System.Logger.Level.WARNING, "kernels are not compiled ahead", failure));
    }

    /// Fills a stage with the window and shows it.
    public static Workbench show(Stage stage, WorkbenchViewModel model, FxBackground background) {
        var workbench = new Workbench(model, background, () -> model.leaving(stage::hide));
        var screen = Screen.getPrimary().getVisualBounds();
        var scene = new Scene(workbench, Math.min(WIDTH, screen.getWidth()), Math.min(HEIGHT, screen.getHeight()));
        scene.getStylesheets().add(resource("leadline.css"));
        model.dark().addListener((_, _, dark) -> theme(dark));
        theme(model.dark().get());
        stage.setScene(scene);
        stage.titleProperty()
                .bind(Bindings.createStringBinding(
                        () -> !model.started().get()
                                ? "Leadline"
                                : model.title().get()
                                        + (model.project().edited().get() ? " \u00b7 edited" : "") + " \u2013 Leadline",
                        model.started(),
                        model.title(),
                        model.project().edited()));
        stage.getIcons().addAll(icons());
        stage.setMinWidth(960);
        stage.setMinHeight(600);
        stage.setOnCloseRequest(e -> {
            e.consume();
            model.leaving(stage::hide);
        });
        stage.setOnHidden(_ -> model.run().leave());
        stage.show();
        return workbench;
    }

    private static void theme(boolean dark) {
        setUserAgentStylesheet((dark ? new PrimerDark() : new PrimerLight()).getUserAgentStylesheet());
    }

    private static List<Image> icons() {
        return List.of(16, 32, 48, 128).stream()
                .map(size -> Program.class.getResourceAsStream("/dev/leadline/icons/leadline-" + size + ".png"))
                .filter(Objects::nonNull)
                .map(Image::new)
                .toList();
    }

    private static String resource(String name) {
        return Objects.requireNonNull(Program.class.getResource("/desktop/" + name), name)
                .toExternalForm();
    }
}
