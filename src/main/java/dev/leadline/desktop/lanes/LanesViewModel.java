package dev.leadline.desktop.lanes;

import dev.leadline.desktop.run.RunViewModel;
import dev.leadline.desktop.working.Edits;
import dev.leadline.desktop.working.NumberText;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.DensityDraft;
import dev.leadline.model.Draft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Lane;
import dev.leadline.model.LaneDraft;
import dev.leadline.model.LaneDraft.ControlDraft;
import dev.leadline.model.LaneDraft.DrawFrom;
import dev.leadline.model.LaneDraft.Mean;
import dev.leadline.model.LaneDraft.Other;
import dev.leadline.model.Layouts;
import dev.leadline.problem.Problem;
import dev.leadline.study.Comparison;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.function.BiFunction;
import java.util.function.UnaryOperator;
import javafx.beans.property.BooleanProperty;
import javafx.beans.property.ReadOnlyIntegerProperty;
import javafx.beans.property.ReadOnlyIntegerWrapper;
import javafx.beans.property.SimpleBooleanProperty;

/// The lanes of the project: which one is spoken of, and how each one samples.
public final class LanesViewModel {
    /// What an input can be drawn from, as it is chosen.
    enum Source {
        OWN("its own density"),
        ANOTHER("another density"),
        SHIFT("its own, shifted by"),
        WIDEN("its own, widened times"),
        TILT("its own, tilted by"),
        ADAPT("one found before the run");

        private final String title;

        Source(String title) {
            this.title = title;
        }

        @Override
        public String toString() {
            return title;
        }

        static Source of(Optional<Other> other) {
            return other.map(o -> switch (o) {
                        case Other.Another _ -> ANOTHER;
                        case Other.Shift _ -> SHIFT;
                        case Other.Widen _ -> WIDEN;
                        case Other.Tilt _ -> TILT;
                        case Other.Adapt _ -> ADAPT;
                    })
                    .orElse(OWN);
        }
    }

    /// What all inputs are drawn from, as it is chosen.
    enum Sources {
        STATED("their own densities, or others stated here", ""),
        CROSS_ENTROPY("densities found by cross-entropy before the run", "cross-entropy"),
        GRID("densities found in steps before the run", "grid");

        private final String title;
        private final String way;

        Sources(String title, String way) {
            this.title = title;
            this.way = way;
        }

        @Override
        public String toString() {
            return title;
        }
    }

    /// How the mean of a control variate is known, as it is chosen.
    enum Known {
        EXACT("exact"),
        STATED("stated"),
        QUADRATURE("by quadrature");

        private final String title;

        Known(String title) {
            this.title = title;
        }

        @Override
        public String toString() {
            return title;
        }

        static Known of(Mean mean) {
            return switch (mean) {
                case Mean.Stated _ -> STATED;
                case Mean.Exact _ -> EXACT;
                case Mean.Quadrature _ -> QUADRATURE;
            };
        }
    }

    private static final LaneDraft PLAIN = LaneDraft.of("A", "independent");
    private static final double NO_SHIFT = 0;
    private static final double WIDER = 1.5;

    private final ProjectViewModel project;
    private final RunViewModel run;
    private final ReadOnlyIntegerWrapper selected = new ReadOnlyIntegerWrapper();
    private final BooleanProperty open = new SimpleBooleanProperty();

    public LanesViewModel(ProjectViewModel project, RunViewModel run) {
        this.project = project;
        this.run = run;
        project.draft().addListener((_, _, d) -> selected.set(Math.min(selected.get(), of(d).size() - 1)));
    }

    public ProjectViewModel project() {
        return project;
    }

    RunViewModel run() {
        return run;
    }

    /// A project without lanes has one of plain draws.
    static List<LaneDraft> of(Draft d) {
        return d.lanes().isEmpty() ? List.of(PLAIN) : d.lanes();
    }

    public List<LaneDraft> lanes() {
        return of(project.draft().get());
    }

    LaneDraft lane(int i) {
        return lanes().get(i);
    }

    static String path(int i) {
        return "$.lanes[" + i + "]";
    }

    /// The lane that sentence, answer and grounds speak of.
    public ReadOnlyIntegerProperty selected() {
        return selected.getReadOnlyProperty();
    }

    public String selectedName() {
        return lane(selected.get()).name();
    }

    public void select(int i) {
        selected.set(i);
    }

    /// Whether the settings of the selected lane are seen.
    public BooleanProperty open() {
        return open;
    }

    /// Another project's lanes: the first one, its settings folded away.
    public void reset() {
        selected.set(0);
        open.set(false);
    }

    // ---- lanes as a whole

    boolean canAdd() {
        return lanes().size() < Lane.MOST;
    }

    /// @return the name of the next lane that is added
    String nextName() {
        var taken = lanes().stream().map(LaneDraft::name).toList();
        char name = 'A';
        while (taken.contains(String.valueOf(name))) {
            name++;
        }
        return String.valueOf(name);
    }

    void add() {
        add(PLAIN);
    }

    void duplicate(int i) {
        add(lane(i));
    }

    /// Under the next name; it is then the one that is spoken of.
    void add(LaneDraft lane) {
        if (canAdd()) {
            project.settle();
            var added = lane.named(nextName());
            project.edit("$.lanes", d -> Edits.lanes(d, Edits.with(of(d), added)));
            selected.set(lanes().size() - 1);
        }
    }

    void remove(int i) {
        if (lanes().size() > 1) {
            project.settle();
            project.forget("$.lanes");
            project.edit("$.lanes", d -> Edits.lanes(d, Edits.without(of(d), i)));
        }
    }

    void name(int i, String name) {
        edit(i, ".name", lane -> lane.named(name.strip()));
    }

    void shares(boolean common) {
        project.settle();
        project.edit("$.commonRandomNumbers", d -> Edits.commonRandomNumbers(d, common));
    }

    boolean isShared() {
        return project.draft().get().commonRandomNumbers();
    }

    // ---- points

    void points(int i, String word) {
        project.settle();
        List.of("replicates", "cube", "cells", "scrambling", "particles", "repetitions", "allocation")
                .forEach(field -> project.forget(path(i) + "." + field));
        edit(i, ".points", lane -> kept(LaneEdits.points(lane, word)));
    }

    /// @param word of a setting that is a count, as `replicates`
    void count(int i, String word, String text) {
        typeCount(
                path(i) + "." + word,
                word + " of lane " + lane(i).name(),
                text,
                (d, count) -> changed(d, i, lane -> LaneEdits.count(lane, word, count)));
    }

    String countText(int i, String word) {
        return text(path(i) + "." + word, LaneEdits.count(lane(i), word));
    }

    void cells(int i, String input, String text) {
        typeCount(
                path(i) + ".cells." + input,
                "cells of " + input,
                text,
                (d, count) -> changed(d, i, lane -> LaneEdits.cells(lane, input, count)));
    }

    String cellsText(int i, String input) {
        var cells = lane(i).settings().cells().get(input);
        return text(path(i) + ".cells." + input, cells == null ? OptionalLong.empty() : OptionalLong.of(cells));
    }

    private String text(String path, OptionalLong count) {
        return project.fieldText(
                path, count.isPresent() ? OptionalDouble.of(count.getAsLong()) : OptionalDouble.empty());
    }

    /// A whole number, or nothing.
    private void typeCount(String path, String what, String text, BiFunction<Draft, OptionalLong, Draft> set) {
        var number = NumberText.read(text);
        if (number.isPresent() && number.getAsDouble() != Math.rint(number.getAsDouble())) {
            project.unread(path, path, text, Problem.of("%s is %s but must be a whole number".formatted(what, text)));
            return;
        }
        project.typeOptionalNumber(
                path,
                what,
                text,
                (d, value) -> set.apply(
                        d, value.isPresent() ? OptionalLong.of((long) value.getAsDouble()) : OptionalLong.empty()));
    }

    void scrambling(int i, String word) {
        project.settle();
        edit(i, ".scrambling", lane -> LaneEdits.scrambling(lane, Optional.of(word)));
    }

    String scramblingWord(int i) {
        return lane(i).settings().scrambling().orElse("nested");
    }

    /// The usual one is not written.
    void allocation(int i, String word) {
        project.settle();
        boolean usual = word.equals(Layouts.allocations().getFirst());
        edit(i, ".allocation", lane -> LaneEdits.allocation(lane, usual ? Optional.empty() : Optional.of(word)));
    }

    String allocationWord(int i) {
        return lane(i).settings().allocation().orElse(Layouts.allocations().getFirst());
    }

    // ---- what inputs are drawn from

    List<String> inputs() {
        return project.draft().get().inputs().stream().map(InputDraft::name).toList();
    }

    void sources(int i, Sources sources) {
        project.settle();
        project.forget(path(i) + ".drawFrom");
        edit(
                i,
                ".drawFrom",
                lane -> kept(LaneEdits.drawFrom(
                        lane, sources == Sources.STATED ? DrawFrom.NOTHING : new DrawFrom.Adapted(sources.way))));
    }

    Sources sources(int i) {
        return switch (lane(i).drawFrom()) {
            case DrawFrom.Inputs _ -> Sources.STATED;
            case DrawFrom.Adapted(String way) -> way.equals(Sources.GRID.way) ? Sources.GRID : Sources.CROSS_ENTROPY;
        };
    }

    boolean isWeighted(int i) {
        return !lane(i).drawFrom().equals(DrawFrom.NOTHING);
    }

    /// Inputs that the lane draws from elsewhere.
    List<String> drawnElsewhere(int i) {
        return List.copyOf(LaneEdits.others(lane(i)).keySet());
    }

    Optional<Other> other(int i, String input) {
        return Optional.ofNullable(LaneEdits.others(lane(i)).get(input));
    }

    /// Another density starts as the input's own.
    void source(int i, String input, Source source) {
        project.settle();
        project.forget(otherPath(i, input));
        Optional<Other> other = switch (source) {
            case OWN -> Optional.empty();
            case ANOTHER -> Optional.of(new Other.Another(own(input)));
            case SHIFT -> Optional.of(new Other.Shift(NO_SHIFT));
            case WIDEN -> Optional.of(new Other.Widen(WIDER));
            case TILT -> Optional.of(new Other.Tilt(NO_SHIFT));
            case ADAPT -> Optional.of(new Other.Adapt());
        };
        edit(i, ".drawFrom." + input, lane -> kept(LaneEdits.other(lane, input, other)));
    }

    private DensityDraft own(String input) {
        return project.draft().get().inputs().stream()
                .filter(in -> in.name().equals(input))
                .map(InputDraft::from)
                .flatMap(from -> switch (from) {
                    case From.Density(var density) -> Optional.of(density).stream();
                    case From.Range(var _, var _, var drawFrom) -> drawFrom.stream();
                })
                .findFirst()
                .orElse(DensityDraft.unchosen());
    }

    static String otherPath(int i, String input) {
        return path(i) + ".drawFrom." + input;
    }

    /// By how much a density is shifted, widened or tilted.
    void amount(int i, String input, String text) {
        project.typeNumber(
                otherPath(i, input),
                "what " + input + " is drawn from",
                text,
                (d, by) -> changed(
                        d,
                        i,
                        lane -> LaneEdits.other(
                                lane,
                                input,
                                Optional.ofNullable(LaneEdits.others(lane).get(input))
                                        .map(o -> moved(o, by)))));
    }

    private static Other moved(Other other, double by) {
        return switch (other) {
            case Other.Shift _ -> new Other.Shift(by);
            case Other.Widen _ -> new Other.Widen(by);
            case Other.Tilt _ -> new Other.Tilt(by);
            case Other.Another _, Other.Adapt _ -> other;
        };
    }

    String amountText(int i, String input) {
        var by = other(i, input).map(o -> switch (o) {
            case Other.Shift(double d) -> OptionalDouble.of(d);
            case Other.Widen(double d) -> OptionalDouble.of(d);
            case Other.Tilt(double d) -> OptionalDouble.of(d);
            case Other.Another _, Other.Adapt _ -> OptionalDouble.empty();
        });
        return project.fieldText(otherPath(i, input), by.orElse(OptionalDouble.empty()));
    }

    void nominalShare(int i, String text) {
        project.typeOptionalNumber(
                path(i) + ".nominalShare",
                "nominal share",
                text,
                (d, share) -> changed(d, i, lane -> LaneEdits.nominalShare(lane, share)));
    }

    String nominalShareText(int i) {
        return project.fieldText(path(i) + ".nominalShare", lane(i).nominalShare());
    }

    /// Whether draws from the inputs' own densities may show what the lane misses.
    boolean isAuditable(int i) {
        return LaneEdits.isAuditable(lane(i));
    }

    void audit(int i, String text) {
        typeCount(
                path(i) + ".audit",
                "audit of lane " + lane(i).name(),
                text,
                (d, draws) -> changed(d, i, lane -> LaneEdits.audit(lane, draws)));
    }

    String auditText(int i) {
        return text(path(i) + ".audit", lane(i).audit());
    }

    void selfNormalised(int i, boolean self) {
        project.settle();
        edit(i, ".selfNormalised", lane -> LaneEdits.selfNormalised(lane, self));
    }

    // ---- control variates

    void addControl(int i) {
        project.settle();
        String formula = inputs().isEmpty() ? "" : inputs().getFirst();
        edit(
                i,
                ".controlVariates",
                lane -> LaneEdits.controls(
                        lane, Edits.with(lane.controls(), new ControlDraft(formula, new Mean.Exact()))));
    }

    void removeControl(int i, int c) {
        project.settle();
        project.forget(path(i) + ".controlVariates");
        edit(i, ".controlVariates", lane -> LaneEdits.controls(lane, Edits.without(lane.controls(), c)));
    }

    static String controlPath(int i, int c) {
        return path(i) + ".controlVariates[" + c + "]";
    }

    void controlFormula(int i, int c, String formula) {
        control(i, c, ".formula", control -> new ControlDraft(formula, control.mean()));
    }

    void controlMean(int i, int c, Known known) {
        project.settle();
        project.forget(controlPath(i, c) + ".mean");
        Mean mean = switch (known) {
            case EXACT -> new Mean.Exact();
            case STATED -> new Mean.Stated(0);
            case QUADRATURE -> new Mean.Quadrature();
        };
        control(i, c, ".mean", control -> new ControlDraft(control.formula(), mean));
    }

    void controlValue(int i, int c, String text) {
        project.typeNumber(
                controlPath(i, c) + ".mean",
                "mean of the control variate",
                text,
                (d, value) -> changed(
                        d,
                        i,
                        lane -> LaneEdits.controls(
                                lane,
                                Edits.changed(
                                        lane.controls(),
                                        c,
                                        k -> new ControlDraft(k.formula(), new Mean.Stated(value))))));
    }

    String controlValueText(int i, int c) {
        return project.fieldText(
                controlPath(i, c) + ".mean",
                lane(i).controls().get(c).mean() instanceof Mean.Stated(double value)
                        ? OptionalDouble.of(value)
                        : OptionalDouble.empty());
    }

    private void control(int i, int c, String field, UnaryOperator<ControlDraft> change) {
        edit(
                i,
                ".controlVariates[" + c + "]" + field,
                lane -> LaneEdits.controls(lane, Edits.changed(lane.controls(), c, change)));
    }

    /// The audit goes with the last thing to audit.
    private static LaneDraft kept(LaneDraft lane) {
        return LaneEdits.audit(lane, lane.audit());
    }

    private void edit(int i, String field, UnaryOperator<LaneDraft> change) {
        project.edit(path(i) + field, d -> changed(d, i, change));
    }

    private static Draft changed(Draft d, int i, UnaryOperator<LaneDraft> change) {
        return Edits.lanes(d, Edits.changed(of(d), i, change));
    }

    // ---- what a run shows

    /// How each other lane compares with the first one, in sentences.
    List<Comparison> comparisons() {
        return RunViewModel.shown(run.state().get())
                .map(s -> s.study().comparisons())
                .orElse(List.of());
    }

    List<Problem> problems(int i) {
        var found = new ArrayList<>(project.problemsAt(path(i)));
        if (i == 0) {
            project.problems().get().stream()
                    .filter(p -> p.place().path().equals("$.lanes"))
                    .forEach(found::add);
        }
        return found;
    }
}
