package dev.leadline.desktop.stage;

import dev.leadline.chart.Picture;
import dev.leadline.chart.PictureKind;
import dev.leadline.chart.Reading;
import dev.leadline.chart.Subject;
import dev.leadline.chart.Theme;
import dev.leadline.chart.View;
import dev.leadline.desktop.background.Background;
import dev.leadline.desktop.run.RunViewModel;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.study.LaneState;
import java.awt.image.BufferedImage;
import java.util.List;
import java.util.Optional;
import javafx.beans.property.BooleanProperty;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleBooleanProperty;
import javafx.beans.property.SimpleObjectProperty;

/// The picture of the stage: what it shows, which part of it is looked at, and what stands at the mouse.
///
/// A picture is laid out and drawn in the background; while one is being drawn the wishes for the next collapse into
/// the newest.
public final class StageViewModel {
    /// A picture, drawn.
    ///
    /// @param image its pixels; `scale` of them to one of the picture
    public record Drawn(Picture picture, BufferedImage image, double scale) {}

    private record Wish(Subject subject, View view, Theme theme, int width, int height, double scale) {}

    private final ProjectViewModel project;
    private final RunViewModel run;
    private final Background background;
    private final BooleanProperty dark;
    private final BooleanProperty logDraws = new SimpleBooleanProperty(true);
    private final ReadOnlyObjectWrapper<Optional<Drawn>> drawn = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ReadOnlyObjectWrapper<View> view = new ReadOnlyObjectWrapper<>(View.FOLLOWING);
    private final ObjectProperty<PictureKind> kind = new SimpleObjectProperty<>(PictureKind.SETTLING);
    private int width;
    private int height;
    private double scale = 1;
    private boolean drawing;
    private Optional<Wish> shown = Optional.empty();

    public StageViewModel(ProjectViewModel project, RunViewModel run, BooleanProperty dark, Background background) {
        this.project = project;
        this.run = run;
        this.dark = dark;
        this.background = background;
        run.state().addListener((_, was, is) -> {
            if (!(was instanceof RunViewModel.State.Shown) && is instanceof RunViewModel.State.Starting) {
                reset();
            }
            if (is instanceof RunViewModel.State.Shown now
                    && !now.study().lanes().isEmpty()
                    && !isSeen(kind.get())) {
                kind.set(PictureKind.SETTLING);
            }
            draw();
        });
        project.check().addListener((_, _, _) -> draw());
        dark.addListener((_, _, _) -> draw());
        view.addListener((_, _, _) -> draw());
        kind.addListener((_, _, _) -> {
            reset();
            draw();
        });
        logDraws.addListener((_, _, log) -> view.set(view.get().withLogDraws(log)));
    }

    public ReadOnlyObjectProperty<Optional<Drawn>> drawn() {
        return drawn.getReadOnlyProperty();
    }

    public ReadOnlyObjectProperty<View> view() {
        return view.getReadOnlyProperty();
    }

    /// Which picture; another one starts following the run.
    public ObjectProperty<PictureKind> kind() {
        return kind;
    }

    /// Whether a picture has something to show of the run.
    boolean isSeen(PictureKind one) {
        return one.isSeen(RunViewModel.shown(run.state().get()).stream()
                .flatMap(s -> s.study().lanes().stream())
                .map(LaneState::trace)
                .toList());
    }

    ReadOnlyObjectProperty<RunViewModel.State> run() {
        return run.state();
    }

    /// Whether the draws stand on a logarithmic axis.
    public BooleanProperty logDraws() {
        return logDraws;
    }

    /// The size to draw for, and how many pixels of the screen there are to one of the window.
    public void size(int newWidth, int newHeight, double newScale) {
        width = newWidth;
        height = newHeight;
        scale = newScale;
        draw();
    }

    public void zoom(double x, double y, double factor) {
        drawn.get().ifPresent(d -> view.set(d.picture.zoomed(x, y, factor)));
    }

    /// From the picture that was shown when the drag began.
    public void pan(Picture start, double dx, double dy) {
        view.set(start.panned(dx, dy));
    }

    /// Both axes follow the run again.
    public void reset() {
        view.set(view.get().reset());
    }

    public Optional<Reading> at(double x, double y) {
        return drawn.get().flatMap(d -> d.picture.at(x, y));
    }

    /// What is shown: the run, else the question with no draws yet.
    public Optional<Subject> subject() {
        var shownRun = RunViewModel.shown(run.state().get());
        if (shownRun.isPresent()) {
            var s = shownRun.get();
            return Optional.of(kind.get()
                    .of(
                            s.project().question(),
                            s.project().plan(),
                            s.study().lanes().stream().map(LaneState::trace).toList()));
        }
        return project.sound().map(p -> kind.get().of(p.question(), p.plan(), List.of()));
    }

    private void draw() {
        if (drawing || width <= 0 || height <= 0) {
            return;
        }
        var wish = subject()
                .map(s -> new Wish(s, view.get(), dark.get() ? Theme.DARK : Theme.LIGHT, width, height, scale));
        if (wish.equals(shown)) {
            return;
        }
        shown = wish;
        if (wish.isEmpty()) {
            drawn.set(Optional.empty());
            return;
        }
        drawing = true;
        background.run(
                () -> {
                    Wish w = wish.get();
                    var picture = Picture.of(w.subject, w.view, w.theme, w.width, w.height);
                    return new Drawn(picture, picture.image(w.scale), w.scale);
                },
                result -> {
                    drawing = false;
                    drawn.set(Optional.of(result));
                    draw();
                },
                failure -> {
                    drawing = false;
                    System.getLogger(StageViewModel.class.getName())
                            .log(System.Logger.Level.WARNING, "the picture could not be drawn", failure);
                });
    }
}
