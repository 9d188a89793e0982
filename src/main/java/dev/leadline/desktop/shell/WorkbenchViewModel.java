package dev.leadline.desktop.shell;

import dev.leadline.chart.Export;
import dev.leadline.desktop.background.Background;
import dev.leadline.desktop.lanes.LanesViewModel;
import dev.leadline.desktop.lanes.SuggestionViewModel;
import dev.leadline.desktop.picker.PickerViewModel;
import dev.leadline.desktop.run.Progress;
import dev.leadline.desktop.run.RunViewModel;
import dev.leadline.desktop.run.Studies;
import dev.leadline.desktop.stage.StageViewModel;
import dev.leadline.desktop.working.AchievedViewModel;
import dev.leadline.desktop.working.Edits;
import dev.leadline.desktop.working.InputsViewModel;
import dev.leadline.desktop.working.LookViewModel;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.desktop.working.ReferenceViewModel;
import dev.leadline.ground.Ground;
import dev.leadline.model.DataFiles;
import dev.leadline.model.Draft;
import dev.leadline.model.Draft.StopDraft;
import dev.leadline.model.Project;
import dev.leadline.model.Sentence;
import dev.leadline.model.Stop;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.project.DataFolder;
import dev.leadline.project.ProjectFile;
import dev.leadline.project.WholeFile;
import dev.leadline.study.AnswerText;
import dev.leadline.study.LaneState;
import dev.leadline.trace.Mark;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.concurrent.ThreadLocalRandom;
import javafx.beans.binding.Bindings;
import javafx.beans.binding.BooleanBinding;
import javafx.beans.binding.ObjectBinding;
import javafx.beans.binding.StringBinding;
import javafx.beans.property.BooleanProperty;
import javafx.beans.property.ReadOnlyBooleanProperty;
import javafx.beans.property.ReadOnlyBooleanWrapper;
import javafx.beans.property.ReadOnlyStringProperty;
import javafx.beans.property.ReadOnlyStringWrapper;
import javafx.beans.property.SimpleBooleanProperty;
import javafx.beans.value.ObservableValue;

/// The whole window: the project, its run, and what can be done with them now.
public final class WorkbenchViewModel {
    /// At 96 to the inch: 200 mm by 120 mm.
    private static final int FIGURE_WIDTH = 756;

    private static final int FIGURE_HEIGHT = 454;
    private static final int FIGURE_DPI = 300;

    private final Background background;
    private final Dialogs dialogs;
    private final BooleanProperty dark = new SimpleBooleanProperty();
    private final ProjectViewModel project;
    private final RunViewModel run;
    private final StageViewModel stage;
    private final LookViewModel look;
    private final InputsViewModel inputs;
    private final AchievedViewModel achieved;
    private final ReferenceViewModel reference;
    private final PickerViewModel picker;
    private final LanesViewModel lanes;
    private final SuggestionViewModel suggestion;
    private final ReadOnlyBooleanWrapper started = new ReadOnlyBooleanWrapper();
    private final ReadOnlyStringWrapper notice = new ReadOnlyStringWrapper("");

    private final StringBinding title;
    private final ObjectBinding<Sentence> sentence;
    private final BooleanBinding canRun;
    private final StringBinding whyNotRun;
    private final StringBinding answer;
    private final StringBinding progress;
    private final ObjectBinding<List<Ground>> grounds;
    private final StringBinding groundsOf;
    private final BooleanBinding editedSinceRun;

    public WorkbenchViewModel(Studies studies, Dialogs dialogs, Background background) {
        this.background = background;
        this.dialogs = dialogs;
        project = new ProjectViewModel(Edits.asking("mean"), background);
        run = new RunViewModel(studies, background);
        stage = new StageViewModel(project, run, dark, background);
        look = new LookViewModel(project, this::ranAsItStands, background);
        inputs = new InputsViewModel(project);
        achieved = new AchievedViewModel(project, background);
        reference = new ReferenceViewModel(project, background);
        picker = new PickerViewModel(project, inputs, dark, background);
        lanes = new LanesViewModel(project, run);
        suggestion = new SuggestionViewModel(project, lanes, SuggestionViewModel.Suggestions.engine(), background);
        title = Bindings.createStringBinding(
                () -> titleOf(project.draft().get(), project.file().get()), project.draft(), project.file());
        sentence = Bindings.createObjectBinding(this::sentenceNow, project.draft(), lanes.selected());
        canRun = Bindings.createBooleanBinding(
                () -> RunViewModel.canStart(run.state().get())
                        && project.problems().get().isEmpty()
                        && project.sound().isPresent(),
                run.state(),
                project.problems(),
                project.check());
        whyNotRun = Bindings.createStringBinding(this::reasonNotToRun, run.state(), project.problems());
        answer = Bindings.createStringBinding(
                () -> answerOf(run.state().get(), lanes.selectedName()),
                run.state(),
                project.draft(),
                lanes.selected());
        progress = Bindings.createStringBinding(
                () -> progressOf(run.state().get(), lanes.selectedName()),
                run.state(),
                project.draft(),
                lanes.selected());
        grounds = Bindings.createObjectBinding(
                () -> groundsOf(run.state().get(), lanes.selectedName()),
                run.state(),
                project.draft(),
                lanes.selected());
        groundsOf = Bindings.createStringBinding(
                () -> lanes.lanes().size() > 1 ? "lane " + lanes.selectedName() : "",
                project.draft(),
                lanes.selected());
        editedSinceRun = Bindings.createBooleanBinding(
                () -> RunViewModel.isEditedSince(
                        run.state().get(), project.draft().get()),
                run.state(),
                project.draft());
    }

    public ProjectViewModel project() {
        return project;
    }

    public RunViewModel run() {
        return run;
    }

    public StageViewModel stage() {
        return stage;
    }

    public LookViewModel look() {
        return look;
    }

    public InputsViewModel inputs() {
        return inputs;
    }

    public ReferenceViewModel reference() {
        return reference;
    }

    public AchievedViewModel achieved() {
        return achieved;
    }

    /// The density that is being chosen, while an input's row is open.
    public PickerViewModel picker() {
        return picker;
    }

    /// The lanes of the project, and which of them is spoken of.
    public LanesViewModel lanes() {
        return lanes;
    }

    public SuggestionViewModel suggestion() {
        return suggestion;
    }

    ObjectBinding<List<Ground>> grounds() {
        return grounds;
    }

    /// Which lane the grounds are of, as `lane B`; empty where there is only one.
    StringBinding groundsOf() {
        return groundsOf;
    }

    private Sentence sentenceNow() {
        var sentence = Sentence.of(project.draft().get());
        return lanes.lanes().size() > 1 ? sentence.by(lanes.selectedName()) : sentence;
    }

    /// A file of data below the project's folder.
    Optional<Path> chooseData() {
        return dialogs.chooseData(project.file().get().map(Path::toAbsolutePath).map(Path::getParent));
    }

    public BooleanProperty dark() {
        return dark;
    }

    /// Whether a project is open; the start page shows otherwise.
    public ReadOnlyBooleanProperty started() {
        return started.getReadOnlyProperty();
    }

    /// What was just done, as `Saved in berth-4.leadline`.
    public ReadOnlyStringProperty notice() {
        return notice.getReadOnlyProperty();
    }

    StringBinding title() {
        return title;
    }

    ObjectBinding<Sentence> sentence() {
        return sentence;
    }

    public BooleanBinding canRun() {
        return canRun;
    }

    /// Why Run is disabled; else what it does.
    StringBinding whyNotRun() {
        return whyNotRun;
    }

    /// What stands against a run, in a line; empty where nothing does.
    ObservableValue<String> toMend() {
        return project.problems().map(WorkbenchViewModel::toMend);
    }

    private static String toMend(List<Problem> problems) {
        return switch (problems.size()) {
            case 0 -> "";
            case 1 -> "Cannot run yet: " + problems.getFirst().primary();
            default ->
                "Cannot run yet: " + problems.getFirst().primary() + " \u00b7 and " + (problems.size() - 1) + " more";
        };
    }

    /// Exactly as it is pasted; empty before the first mark.
    public StringBinding answer() {
        return answer;
    }

    StringBinding progress() {
        return progress;
    }

    BooleanBinding editedSinceRun() {
        return editedSinceRun;
    }

    // ---- runs

    public void startRun() {
        if (canRun.get()) {
            notice.set("");
            picker.close();
            run.start(project.draft().get(), project.files());
        }
    }

    private String reasonNotToRun() {
        if (!RunViewModel.canStart(run.state().get())) {
            return "A run is under way; stop it to start another";
        }
        String toMend = toMend(project.problems().get());
        return toMend.isEmpty() ? "Draws as the stop rule says" : toMend;
    }

    /// What the run shows of a lane; nothing where it was not run.
    private static Optional<LaneState> laneOf(RunViewModel.State state, String lane) {
        return RunViewModel.shown(state)
                .flatMap(s -> s.study().lanes().stream()
                        .filter(l -> l.trace().lane().equals(lane))
                        .findFirst());
    }

    static String answerOf(RunViewModel.State state, String name) {
        return laneOf(state, name)
                .flatMap(lane -> lane.trace()
                        .last()
                        .map(mark -> AnswerText.of(
                                mark.answers().getFirst(), lane.trace().lane())))
                .orElse("");
    }

    static String progressOf(RunViewModel.State state, String name) {
        return switch (state) {
            case RunViewModel.State.Ready _ -> "";
            case RunViewModel.State.Starting _ -> "building the tables of the densities";
            case RunViewModel.State.Failed(Problem problem) -> problem.primary();
            case RunViewModel.State.Shown shown -> {
                var lane = laneOf(state, name);
                if (lane.isEmpty()) {
                    yield "building the tables of the densities";
                }
                var done = Progress.of(
                                lane.get().trace().marks(),
                                shown.project().plan().stop())
                        .foreseeing(lane.get().left());
                yield switch (shown.study().activity()) {
                    case PREPARING -> "building the tables of the densities";
                    case RUNNING -> done.text();
                    case PAUSED -> "paused after " + done.text();
                    case FINISHED, FAILED -> "";
                };
            }
        };
    }

    /// How far the run has come, from 0 to 1; negative where that cannot be said yet, `NaN` where nothing runs.
    static double partOf(RunViewModel.State state, String name) {
        return switch (state) {
            case RunViewModel.State.Ready _, RunViewModel.State.Failed _ -> Double.NaN;
            case RunViewModel.State.Starting _ -> -1;
            case RunViewModel.State.Shown shown -> {
                if (shown.study().ended()) {
                    yield Double.NaN;
                }
                yield laneOf(state, name)
                        .map(lane -> Progress.of(
                                        lane.trace().marks(),
                                        shown.project().plan().stop())
                                .foreseeing(lane.left())
                                .part())
                        .orElse(-1.0);
            }
        };
    }

    static List<Ground> groundsOf(RunViewModel.State state, String name) {
        return laneOf(state, name).map(LaneState::grounds).orElse(List.of());
    }

    /// As `2 objections`; empty before anything was shown.
    static String objectionsOf(RunViewModel.State state, String name) {
        if (laneOf(state, name).flatMap(lane -> lane.trace().last()).isEmpty()) {
            return "";
        }
        long n = groundsOf(state, name).stream()
                .filter(g ->
                        g.strength().filter(Ground.Strength.OBJECTION::equals).isPresent())
                .count();
        return n == 0 ? "no objection" : n + (n == 1 ? " objection" : " objections");
    }

    private Optional<Project> ranAsItStands() {
        var state = run.state().get();
        var now = project.draft().get();
        return RunViewModel.shown(state)
                .map(RunViewModel.State.Shown::project)
                .filter(p -> !RunViewModel.isEditedSince(state, now)
                        && p.draft().seed().equals(now.seed()));
    }

    /// The seed of the run that is shown, which repeats it; empty before a run.
    static String seedOf(RunViewModel.State state) {
        return RunViewModel.shown(state)
                .map(s -> "seed " + s.project().plan().seed())
                .orElse("");
    }

    void copied() {
        notice.set("Copied");
    }

    // ---- files

    /// @param kind of what is asked, as `mean`
    public void newProject(String kind) {
        leaving(() -> show(Edits.asking(kind), Optional.empty(), DataFiles.NONE));
    }

    public void openSample(String name) {
        leaving(() -> background.run(
                () -> Samples.read(name),
                draft -> show(draft, Optional.empty(), Samples.DATA),
                failure -> tell("The sample project cannot be opened", failure)));
    }

    public void open() {
        leaving(() -> dialogs.chooseProject().ifPresent(this::read));
    }

    public void open(Path file) {
        leaving(() -> read(file));
    }

    private void read(Path file) {
        background.run(
                () -> ProjectFile.read(file),
                draft -> show(draft, Optional.of(file), DataFolder.beside(file)),
                failure -> tell(file.getFileName() + " cannot be opened", failure));
    }

    private void show(Draft draft, Optional<Path> file, DataFiles files) {
        run.leave();
        stage.reset();
        picker.close();
        suggestion.leave();
        project.replace(draft, file, files);
        lanes.reset();
        started.set(true);
        notice.set("");
    }

    /// Back to the start page.
    public void closeProject() {
        leaving(() -> {
            run.leave();
            picker.close();
            suggestion.leave();
            project.replace(Edits.asking("mean"), Optional.empty(), DataFiles.NONE);
            started.set(false);
        });
    }

    public void save() {
        save(() -> {});
    }

    private void save(Runnable then) {
        if (!isReadyToSave()) {
            return;
        }
        project.file().get().ifPresentOrElse(file -> write(file, then), () -> saveAs(then));
    }

    public void saveAs() {
        if (isReadyToSave()) {
            saveAs(() -> {});
        }
    }

    /// Asks where the file would have another number than its field shows.
    private boolean isReadyToSave() {
        var unread = project.unreadFields();
        return unread.isEmpty()
                || dialogs.agree("Save the last numbers of these fields?", "Save the last numbers", unread);
    }

    private void saveAs(Runnable then) {
        dialogs.chooseWhereToSave(fileName(project.draft().get(), project.file().get()))
                .ifPresent(file -> write(withExtension(file, ProjectFile.EXTENSION), then));
    }

    private void write(Path file, Runnable then) {
        Draft what = project.draft().get();
        DataFiles data = project.files();
        background.run(
                () -> {
                    ProjectFile.write(file, what);
                    return DataFolder.bring(file, what, data);
                },
                brought -> {
                    project.savedAs(file, what);
                    notice.set("Saved in " + file.getFileName()
                            + (brought.isEmpty() ? "" : ", with " + String.join(", ", brought)));
                    then.run();
                },
                failure -> tell(file.getFileName() + " could not be saved; the project is still here", failure));
    }

    /// Does it once nothing would be lost: asks where edits are not saved yet.
    public void leaving(Runnable action) {
        if (!project.edited().get() && project.unreadFields().isEmpty()) {
            action.run();
            return;
        }
        switch (dialogs.askAboutUnsaved(title.get())) {
            case SAVE -> save(action);
            case DISCARD -> action.run();
            case CANCEL -> {}
        }
    }

    private void tell(String heading, Throwable failure) {
        List<Problem> problems = failure instanceof Refusal refusal
                ? refusal.problems()
                : List.of(Problem.of(String.valueOf(failure.getMessage())));
        dialogs.tell(heading, problems);
    }

    static String titleOf(Draft draft, Optional<Path> file) {
        if (!draft.title().isBlank()) {
            return draft.title();
        }
        return file.map(f -> f.getFileName().toString()).orElse("Untitled");
    }

    private static String fileName(Draft draft, Optional<Path> file) {
        return file.map(f -> f.getFileName().toString())
                .orElseGet(() -> stem(titleOf(draft, file)) + ProjectFile.EXTENSION);
    }

    /// A title as a file's name: `Breast line at berth 4` becomes `breast-line-at-berth-4`.
    static String stem(String title) {
        String stem = title.toLowerCase(Locale.ROOT)
                .replaceAll("[^\\p{L}\\p{N}]+", "-")
                .replaceAll("^-|-$", "");
        String shorter = stem.length() <= 40 ? stem : stem.substring(0, 40).replaceAll("-[^-]*$", "");
        return shorter.isEmpty() ? "project" : shorter;
    }

    private static Path withExtension(Path file, String extension) {
        String name = file.getFileName().toString();
        return name.contains(".") ? file : file.resolveSibling(name + extension);
    }

    /// The picture as it is looked at now, in print colours.
    ///
    /// @param kind `png` or `svg`
    public void exportFigure(String kind) {
        var subject = stage.subject();
        if (subject.isEmpty()) {
            dialogs.tell(
                    "There is no picture yet",
                    List.of(Problem.of("The question is not complete").tryThis("Complete it and press Run.")));
            return;
        }
        var view = stage.view().get();
        dialogs.chooseFigure(stem(title.get()) + "-" + stage.kind().get().word() + "." + kind, kind)
                .map(file -> withExtension(file, "." + kind))
                .ifPresent(file -> background.run(
                        () -> {
                            WholeFile.write(
                                    file,
                                    Export.of(file)
                                            .bytes(subject.get(), view, FIGURE_WIDTH, FIGURE_HEIGHT, FIGURE_DPI));
                            return file;
                        },
                        _ -> notice.set("Picture written to " + file.getFileName()),
                        failure -> tell("The picture could not be written", failure)));
    }

    // ---- what can be done about doubts

    /// More draws of the same question: the budget grows, and the run starts anew from the same seed.
    void runLonger(OptionalLong inAll) {
        long made = RunViewModel.shown(run.state().get())
                .flatMap(s -> s.study().lanes().stream()
                        .flatMap(lane -> lane.trace().last().stream())
                        .map(Mark::draws)
                        .max(Long::compare))
                .orElse(Stop.USUAL_DRAWS);
        long wanted = Math.clamp(inAll.orElse(4 * made), made + 1, Stop.MOST_DRAWS);
        project.settle();
        project.edit(
                "$.stop.draws",
                d -> Edits.stop(
                        d,
                        Optional.of(d.stop()
                                .orElse(new StopDraft("", OptionalLong.empty(), OptionalDouble.empty()))
                                .withDraws(OptionalLong.of(wanted))
                                .withSeconds(OptionalDouble.empty()))));
        project.settle();
        startRun();
    }

    /// The same question by fresh draws.
    void runWithOtherSeed() {
        project.settle();
        project.edit(
                "$.seed",
                d -> Edits.seed(d, OptionalLong.of(ThreadLocalRandom.current().nextLong(Long.MAX_VALUE))));
        project.settle();
        startRun();
    }

    // ---- the run menu

    public void askSeed() {
        var seed = project.draft().get().seed();
        dialogs.askText(
                        "Seed",
                        "A whole number from 0. The same seed gives the same digits again; another one gives fresh"
                                + " draws. Empty: a new one is drawn for each run and recorded.",
                        seed.isPresent() ? Long.toString(seed.getAsLong()) : "")
                .ifPresent(this::setSeed);
    }

    private void setSeed(String text) {
        String t = text.strip();
        if (t.isEmpty()) {
            project.edit("$.seed", d -> Edits.seed(d, OptionalLong.empty()));
        } else if (t.matches("\\d{1,19}") && new java.math.BigInteger(t).bitLength() < 64) {
            project.edit("$.seed", d -> Edits.seed(d, OptionalLong.of(Long.parseLong(t))));
        } else {
            dialogs.tell(
                    "The seed stays as it was",
                    List.of(Problem.of("Seed is \u201c" + t
                            + "\u201d but must be a whole number from 0 to 2\u2076\u00b3 \u2212 1")));
        }
    }

    public void about() {
        dialogs.about();
    }
}
