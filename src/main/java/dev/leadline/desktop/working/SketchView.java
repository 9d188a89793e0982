package dev.leadline.desktop.working;

import dev.leadline.chart.DensitySketch;
import dev.leadline.chart.Theme;
import dev.leadline.density.Portrait;
import dev.leadline.desktop.background.Background;
import dev.leadline.desktop.style.Pixels;
import dev.leadline.model.DataFiles;
import dev.leadline.model.Draft;
import dev.leadline.model.Draft.ConstantDraft;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Project;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import javafx.beans.value.ObservableValue;
import javafx.scene.image.ImageView;
import javafx.scene.layout.Region;

/// A small drawing of a density; empty while there is none.
public final class SketchView extends Region {
    private static final int WIDTH = 60;
    private static final int HEIGHT = 22;
    private static final double SCALE = 2;

    private final ObservableValue<Boolean> dark;
    private final Background background;
    private final ImageView image = new ImageView();
    private Optional<Shown> shown = Optional.empty();
    private Supplier<Portrait> sketched = () -> {
        throw new IllegalStateException("nothing to sketch");
    };
    private long newest;

    /// What decides the drawing.
    private record Shown(InputDraft input, List<ConstantDraft> constants, DataFiles files) {}

    public SketchView(ObservableValue<Boolean> dark, Background background) {
        this.dark = dark;
        this.background = background;
        setMinSize(WIDTH, HEIGHT);
        setPrefSize(WIDTH, HEIGHT);
        setMaxSize(WIDTH, HEIGHT);
        image.setFitWidth(WIDTH);
        image.setFitHeight(HEIGHT);
        image.setSmooth(true);
        getChildren().add(image);
        dark.addListener((_, _, _) -> draw());
    }

    /// Of an input of the draft.
    void show(Draft draft, int index, DataFiles files) {
        var wanted = new Shown(draft.inputs().get(index), draft.constants(), files);
        if (!Optional.of(wanted).equals(shown)) {
            shown = Optional.of(wanted);
            sketched = () -> Portrait.of(Project.input(draft, index, files).density());
            draw();
        }
    }

    private void draw() {
        if (shown.isEmpty()) {
            return;
        }
        long turn = ++newest;
        var wanted = sketched;
        var theme = dark.getValue() ? Theme.DARK : Theme.LIGHT;
        background.run(
                () -> DensitySketch.image(wanted.get(), WIDTH, HEIGHT, SCALE, theme),
                drawn -> {
                    if (turn == newest) {
                        image.setImage(Pixels.shared(drawn));
                        image.setVisible(true);
                    }
                },
                _ -> { // refused parameters are told beside their fields
                    if (turn == newest) {
                        image.setVisible(false);
                    }
                });
    }
}
