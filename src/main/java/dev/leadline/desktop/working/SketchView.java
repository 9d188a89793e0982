package dev.leadline.desktop.working;

import dev.leadline.chart.DensitySketch;
import dev.leadline.chart.Theme;
import dev.leadline.density.Catalogue;
import dev.leadline.density.Portrait;
import dev.leadline.desktop.background.Background;
import dev.leadline.desktop.style.Pixels;
import dev.leadline.model.DensityDraft;
import dev.leadline.model.Draft.From;
import java.awt.image.BufferedImage;
import java.util.Optional;
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
    private Optional<DensityDraft> shown = Optional.empty();
    private long newest;

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

    void show(From from) {
        var density = switch (from) {
            case From.Range(double low, double high, Optional<DensityDraft> drawFrom) ->
                drawFrom.or(() -> Optional.of(DensityDraft.of("uniform", uniform(low, high))));
            case From.Density(DensityDraft d) -> Optional.of(d);
        };
        if (!density.equals(shown)) {
            shown = density;
            draw();
        }
    }

    private static java.util.LinkedHashMap<String, Double> uniform(double low, double high) {
        var parameters = new java.util.LinkedHashMap<String, Double>();
        parameters.put("from", low);
        parameters.put("to", high);
        return parameters;
    }

    private void draw() {
        if (shown.isEmpty()) {
            return;
        }
        long turn = ++newest;
        var wanted = shown.get();
        var theme = dark.getValue() ? Theme.DARK : Theme.LIGHT;
        background.run(
                () -> sketch(wanted, theme),
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

    private static BufferedImage sketch(DensityDraft d, Theme theme) {
        var density = Catalogue.family(d.kind())
                .orElseThrow()
                .of(d.member().orElseThrow().parameters());
        return DensitySketch.image(Portrait.of(density), "", WIDTH, HEIGHT, SCALE, theme);
    }
}
