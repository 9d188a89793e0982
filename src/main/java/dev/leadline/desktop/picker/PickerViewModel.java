package dev.leadline.desktop.picker;

import dev.leadline.chart.DensityPicture;
import dev.leadline.chart.DensityPicture.View;
import dev.leadline.chart.Observed;
import dev.leadline.chart.Theme;
import dev.leadline.density.Integrated;
import dev.leadline.density.Knowledge;
import dev.leadline.density.Portrait;
import dev.leadline.density.PortraitText;
import dev.leadline.desktop.background.Background;
import dev.leadline.desktop.working.Edits;
import dev.leadline.desktop.working.InputsViewModel;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.DataFiles;
import dev.leadline.model.DensityDraft.Data;
import dev.leadline.model.Draft;
import dev.leadline.model.Draft.ConstantDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Project;
import dev.leadline.model.UnitWords;
import dev.leadline.numeric.Significant;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.awt.image.BufferedImage;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import javafx.beans.property.BooleanProperty;
import javafx.beans.property.ObjectProperty;
import javafx.beans.property.ReadOnlyBooleanProperty;
import javafx.beans.property.ReadOnlyBooleanWrapper;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleObjectProperty;

/// The density of one input, looked at and chosen.
///
/// The drawing follows what is typed: it is made in the background, wishes for the next collapse into the newest, and
/// the last density that was one stays while what is typed is none.
public final class PickerViewModel {
    /// A density, drawn.
    ///
    /// @param image its pixels; `scale` of them to one of the picture
    /// @param remarks what its making showed
    record Drawn(DensityPicture picture, List<String> remarks, BufferedImage image, double scale) {}

    /// What decides the drawing.
    private record Wish(
            InputDraft input,
            List<ConstantDraft> constants,
            DataFiles files,
            View view,
            Theme theme,
            int width,
            int height,
            double scale) {}

    private static final int DIGITS = 8;

    private final ProjectViewModel project;
    private final InputsViewModel inputs;
    private final BooleanProperty dark;
    private final Background background;
    private final ReadOnlyObjectWrapper<Optional<DensityAt>> at = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ReadOnlyObjectWrapper<Optional<Way>> way = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ObjectProperty<View> view = new SimpleObjectProperty<>(View.PDF);
    private final ReadOnlyObjectWrapper<Optional<Drawn>> drawn = new ReadOnlyObjectWrapper<>(Optional.empty());
    private final ReadOnlyBooleanWrapper opened = new ReadOnlyBooleanWrapper();
    private final ReadOnlyBooleanWrapper outdated = new ReadOnlyBooleanWrapper();
    private int width;
    private int height;
    private double scale = 1;
    private boolean drawing;
    private boolean failed;
    private Optional<Wish> shown = Optional.empty();
    private Optional<DensityAt> elsewhere = Optional.empty();
    private String lane = "";
    private Optional<KnownViewModel> known = Optional.empty();

    public PickerViewModel(
            ProjectViewModel project, InputsViewModel inputs, BooleanProperty dark, Background background) {
        this.project = project;
        this.inputs = inputs;
        this.dark = dark;
        this.background = background;
        inputs.opened().addListener((_, _, input) -> open(input));
        project.draft().addListener((_, _, _) -> follow());
        project.problems().addListener((_, _, _) -> age());
        dark.addListener((_, _, _) -> draw());
        view.addListener((_, _, _) -> draw());
    }

    private void open(OptionalInt input) {
        elsewhere = Optional.empty();
        show(input);
    }

    /// The density that a lane draws an input from.
    public void openFor(int lane, String input) {
        int index = inputs.inputs().stream().map(InputDraft::name).toList().indexOf(input);
        if (index >= 0) {
            inputs.close();
            elsewhere = Optional.of(DensityAt.lane(project, lane, index));
            this.lane = project.draft().get().lanes().get(lane).name();
            show(OptionalInt.of(index));
        }
    }

    private void show(OptionalInt input) {
        project.settle();
        shown = Optional.empty();
        failed = false;
        drawn.set(Optional.empty());
        place(input);
        age();
        draw();
    }

    private void place(OptionalInt input) {
        opened.set(input.isPresent());
        at.set(
                elsewhere.isPresent()
                        ? elsewhere
                        : input.isPresent() && isChosen(input.getAsInt())
                                ? Optional.of(DensityAt.input(project, input.getAsInt()))
                                : Optional.empty());
        way.set(at.get().flatMap(this::wayOf));
    }

    /// The one that was left with something in it that cannot be read, else the one by which the density is written.
    private Optional<Way> wayOf(DensityAt place) {
        return known.filter(k -> k.isUnread(place))
                .<Way>map(k -> new Way.Known(k.knowledge()))
                .or(() -> Way.of(place.now()));
    }

    /// What is told at this place; it stays while something in it cannot be read.
    KnownViewModel known(Knowledge knowledge, DensityAt place) {
        known = known.filter(k -> k.isUnread(place) && k.knowledge() == knowledge)
                .or(() -> Optional.of(new KnownViewModel(knowledge, place)));
        return known.get();
    }

    /// The drawing is outdated where the density is none, or its fields say something else than the draft.
    private void age() {
        outdated.set(drawn.get().isPresent()
                && (failed
                        || at.get()
                                .filter(place -> project.isUnread(place.path()))
                                .isPresent()));
    }

    /// A range may have got an end, or lost it; a lane may draw its input from elsewhere.
    private void follow() {
        if (elsewhere
                .filter(place -> place.get().apply(project.draft().get()).isEmpty())
                .isPresent()) {
            close();
            return;
        }
        if (elsewhere.isPresent()) {
            draw();
            return;
        }
        if (inputDraft().isPresent() && at.get().isPresent() != isChosen(input().getAsInt())) {
            place(input());
        }
        draw();
    }

    /// A bounded range is drawn uniformly: there is nothing to choose.
    private boolean isChosen(int input) {
        var from = inputs.inputs().get(input).from();
        return from instanceof From.Density
                || InputsViewModel.isUnbounded(from)
                || InputsViewModel.densityOf(from).isPresent();
    }

    Background background() {
        return background;
    }

    ProjectViewModel project() {
        return project;
    }

    private OptionalInt input() {
        return elsewhere
                .map(place -> OptionalInt.of(place.input()))
                .orElse(inputs.opened().get());
    }

    /// Whether a density is being chosen.
    public ReadOnlyBooleanProperty opened() {
        return opened.getReadOnlyProperty();
    }

    /// As `v in lane B: largest gust`.
    String title() {
        return inputDraft()
                .map(in -> in.name()
                        + (elsewhere.isPresent() ? ", drawn from in lane " + lane : "")
                        + (in.label().isBlank() ? "" : ": " + in.label()))
                .orElse("");
    }

    Optional<InputDraft> inputDraft() {
        return input().isPresent() && input().getAsInt() < inputs.inputs().size()
                ? Optional.of(drawnFrom(inputs.inputs().get(input().getAsInt())))
                : Optional.empty();
    }

    /// The input as it would be with the density that a lane draws it from.
    private InputDraft drawnFrom(InputDraft in) {
        return elsewhere
                .map(place -> new InputDraft(in.name(), in.unit(), in.label(), "", new From.Density(place.now())))
                .orElse(in);
    }

    public void close() {
        if (elsewhere.isPresent()) {
            open(OptionalInt.empty());
        }
        inputs.close();
    }

    /// The density that is being chosen; empty where there is nothing to choose.
    ReadOnlyObjectProperty<Optional<DensityAt>> at() {
        return at.getReadOnlyProperty();
    }

    /// How it is being said what the density is; empty while that is still to be chosen.
    ReadOnlyObjectProperty<Optional<Way>> way() {
        return way.getReadOnlyProperty();
    }

    public void choose(Way chosen) {
        project.settle();
        way.set(Optional.of(chosen));
    }

    /// Back to the question of what is known; fields that cannot be read go, and the density is what it was before.
    void ask() {
        at.get().ifPresent(place -> project.forget(place.path()));
        way.set(Optional.empty());
    }

    /// Whether the form is that of the density there is; another was chosen but says nothing yet.
    boolean isAsShown() {
        return way.get().isEmpty()
                || way.get().get() instanceof Way.Known
                || way.get().equals(at.get().flatMap(place -> Way.of(place.now())));
    }

    ObjectProperty<View> view() {
        return view;
    }

    ReadOnlyObjectProperty<Optional<Drawn>> drawn() {
        return drawn.getReadOnlyProperty();
    }

    /// Whether there is a density to draw, sound or not.
    boolean isTold() {
        return at.get().map(place -> !place.now().isUnchosen()).orElse(true);
    }

    /// Whether the drawing shows the last density that was one, not what is typed now.
    ReadOnlyBooleanProperty outdated() {
        return outdated.getReadOnlyProperty();
    }

    /// Problems of the density; none while it is still to be chosen.
    List<Problem> problems() {
        return at.get()
                .filter(place -> !place.now().isUnchosen())
                .map(place -> project.problemsAt(place.path()))
                .orElse(List.of());
    }

    /// What the density's making showed and may surprise, as sentences.
    List<String> remarks() {
        return drawn.get().map(Drawn::remarks).orElse(List.of());
    }

    /// What stands at a pixel of the drawing, in one line.
    Optional<String> reading(double x, double y) {
        return drawn.get().flatMap(d -> {
            var value = d.picture.valueAt(x, y);
            return value.isPresent()
                    ? Optional.of(PortraitText.reading(d.picture.portrait(), value.getAsDouble(), unit()))
                    : Optional.empty();
        });
    }

    String unit() {
        return inputDraft().map(in -> UnitWords.after(in.unit())).orElse("");
    }

    /// The size to draw for, and how many pixels of the screen there are to one of the window.
    void size(int newWidth, int newHeight, double newScale) {
        width = newWidth;
        height = newHeight;
        scale = newScale;
        draw();
    }

    private void draw() {
        var input = inputDraft();
        if (drawing || input.isEmpty() || width < 40 || height < 40) {
            return;
        }
        int index = input().getAsInt();
        Draft d = project.draft().get();
        Draft asDrawn = Edits.inputs(d, Edits.changed(d.inputs(), index, _ -> input.get()));
        var wish = new Wish(
                input.get(),
                d.constants(),
                project.files(),
                view.get(),
                dark.get() ? Theme.DARK : Theme.LIGHT,
                width,
                height,
                scale);
        if (Optional.of(wish).equals(shown)) {
            return;
        }
        shown = Optional.of(wish);
        drawing = true;
        background.run(
                () -> draw(wish, asDrawn, index),
                result -> {
                    drawing = false;
                    if (input().equals(OptionalInt.of(index))) {
                        failed = false;
                        drawn.set(Optional.of(result));
                        age();
                    }
                    draw();
                },
                failure -> {
                    drawing = false;
                    failed = true;
                    age();
                    if (!(failure instanceof Refusal)) {
                        System.getLogger(PickerViewModel.class.getName())
                                .log(System.Logger.Level.WARNING, "the density could not be drawn", failure);
                    }
                    draw();
                });
    }

    /// The data that a density was fitted to, or smooths; what draws the data themselves shows them anyway.
    private static Observed observed(Wish w) {
        return InputsViewModel.densityOf(w.input.from())
                .filter(density -> density.of() instanceof Data data
                        && (data.kind().isPresent() || data.fitted().isPresent()))
                .map(density -> (Data) density.of())
                .map(data ->
                        new Observed(w.files.column(data.file(), data.column()).values()))
                .orElse(Observed.NONE);
    }

    private static List<String> remarks(Project.Single single) {
        var remarks = new ArrayList<String>();
        if (single.density() instanceof Integrated typed) {
            remarks.add("The integral of what is typed is " + Significant.text(typed.area(), DIGITS) + ".");
        }
        single.notes()
                .forEach(note -> remarks.add(PortraitText.sentence(note.primary())
                        + note.detail().map(detail -> " " + detail).orElse("")));
        return remarks;
    }

    private static Drawn draw(Wish w, Draft d, int index) {
        var single = Project.input(d, index, w.files);
        var portrait = Portrait.of(single.density());
        String unit = UnitWords.after(w.input.unit());
        String name = w.input.name() + (unit.isEmpty() ? "" : "," + unit);
        var picture = DensityPicture.of(portrait, observed(w), w.view, name, w.theme, w.width, w.height);
        return new Drawn(picture, remarks(single), picture.image(w.scale), w.scale);
    }
}
