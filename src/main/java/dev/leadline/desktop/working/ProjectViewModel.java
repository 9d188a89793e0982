package dev.leadline.desktop.working;

import dev.leadline.desktop.background.Background;
import dev.leadline.model.DataFiles;
import dev.leadline.model.Draft;
import dev.leadline.model.Project;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.project.DataFolder;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.function.BiFunction;
import java.util.function.UnaryOperator;
import javafx.beans.property.ReadOnlyBooleanProperty;
import javafx.beans.property.ReadOnlyBooleanWrapper;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.collections.FXCollections;
import javafx.collections.MapChangeListener;
import javafx.collections.ObservableMap;

/// The project being edited: its draft with undo and redo, the file it belongs to, and whether it can be run.
///
/// Every edit is checked in the background; the newest check wins.
public final class ProjectViewModel {
    /// What is known about the draft.
    public sealed interface Check {
        /// Not known yet.
        record Checking() implements Check {}

        record Sound(Project project) implements Check {}

        record Refused(List<Problem> problems) implements Check {}
    }

    private final Background background;
    private final ReadOnlyObjectWrapper<Draft> draft = new ReadOnlyObjectWrapper<>();
    private final ReadOnlyObjectWrapper<Check> check = new ReadOnlyObjectWrapper<>(new Check.Checking());
    private final ReadOnlyObjectWrapper<Optional<Path>> file = new ReadOnlyObjectWrapper<>(Optional.empty());
    private DataFiles files = DataFiles.NONE;
    private final ReadOnlyBooleanWrapper edited = new ReadOnlyBooleanWrapper();
    private final ReadOnlyBooleanWrapper canUndo = new ReadOnlyBooleanWrapper();
    private final ReadOnlyBooleanWrapper canRedo = new ReadOnlyBooleanWrapper();
    private final ReadOnlyObjectWrapper<List<Problem>> problems = new ReadOnlyObjectWrapper<>(List.of());
    private final ObservableMap<String, Unread> unread = FXCollections.observableHashMap();
    private final Set<String> suggested = new HashSet<>();
    private History<Draft> history;
    private Draft saved;
    private long newestCheck;

    /// A text in a number field that is no number.
    private record Unread(String text, Problem problem) {}

    public ProjectViewModel(Draft start, Background background) {
        this.background = background;
        unread.addListener((MapChangeListener<String, Unread>) _ -> collectProblems());
        check.addListener((_, _, _) -> collectProblems());
        replace(start, Optional.empty(), DataFiles.NONE);
    }

    public ReadOnlyObjectProperty<Draft> draft() {
        return draft.getReadOnlyProperty();
    }

    public ReadOnlyObjectProperty<Check> check() {
        return check.getReadOnlyProperty();
    }

    public ReadOnlyObjectProperty<Optional<Path>> file() {
        return file.getReadOnlyProperty();
    }

    /// Differs from what the file holds.
    public ReadOnlyBooleanProperty edited() {
        return edited.getReadOnlyProperty();
    }

    public ReadOnlyBooleanProperty canUndo() {
        return canUndo.getReadOnlyProperty();
    }

    public ReadOnlyBooleanProperty canRedo() {
        return canRedo.getReadOnlyProperty();
    }

    /// Everything that stands against a run, fields that hold no number first.
    public ReadOnlyObjectProperty<List<Problem>> problems() {
        return problems.getReadOnlyProperty();
    }

    /// Fields that hold no number; the draft has what they held before one began to type there.
    public List<Problem> unreadFields() {
        return unread.values().stream().map(Unread::problem).toList();
    }

    /// The newest draft that passed its check, for what may lag behind by a moment; none while a field says something
    /// else than the draft.
    public Optional<Project> sound() {
        return unread.isEmpty() && check.get() instanceof Check.Sound(Project project)
                ? Optional.of(project)
                : Optional.empty();
    }

    /// Where the data come from that the draft names.
    public DataFiles files() {
        return files;
    }

    /// Another project in place of this one; its history starts anew.
    ///
    /// @param data where its data come from
    public void replace(Draft start, Optional<Path> from, DataFiles data) {
        history = new History<>(start);
        files = data;
        saved = start;
        file.set(from);
        unread.clear();
        check.set(new Check.Checking());
        show();
    }

    /// The draft now stands in this file, and its data beside it.
    public void savedAs(Path path, Draft what) {
        saved = what;
        file.set(Optional.of(path));
        edited.set(!saved.equals(draft.get()));
        files = DataFolder.beside(path);
        checkAgain();
    }

    /// @param key what is being edited, as a JSON path; edits with the same key that follow each other are undone as
    /// one
    public void edit(String key, UnaryOperator<Draft> change) {
        history.edit(key, change.apply(draft.get()));
        show();
    }

    /// The next edit is undone on its own.
    public void settle() {
        history.settle();
    }

    /// Undoes what cannot be read, where something was typed that cannot, else the last edit.
    public void undo() {
        if (unread.isEmpty()) {
            history.undo();
        }
        unread.clear();
        show();
    }

    public void redo() {
        unread.clear();
        history.redo().ifPresent(_ -> show());
    }

    /// A sentence of where a density comes from was made, not typed: it holds for that density alone.
    public void suggested(String provenance) {
        suggested.add(provenance);
    }

    public boolean isSuggested(String provenance) {
        return suggested.contains(provenance);
    }

    /// A text typed in a number field. Where it is no number the draft goes back to the one that stood there before,
    /// and
    /// nothing can be run: of `5,5` typed over 7 the draft keeps 7, not the 5 on the way.
    ///
    /// @param path of the field
    /// @param what the field in words, as `scale of v`
    public void typeNumber(String path, String what, String text, BiFunction<Draft, Double, Draft> set) {
        var number = NumberText.read(text);
        if (number.isPresent()) {
            unread.remove(path);
            edit(path, d -> set.apply(d, number.getAsDouble()));
        } else {
            unread(path, path, text, NumberText.problem(what, text));
        }
    }

    /// The same where the field may be left empty.
    public void typeOptionalNumber(
            String path, String what, String text, BiFunction<Draft, OptionalDouble, Draft> set) {
        if (text.isBlank()) {
            unread.remove(path);
            edit(path, d -> set.apply(d, OptionalDouble.empty()));
        } else {
            typeNumber(path, what, text, (d, value) -> set.apply(d, OptionalDouble.of(value)));
        }
    }

    /// A text of any other field that cannot be read. The draft keeps what was read last, and nothing can be run.
    public void unread(String path, String text, Problem problem) {
        unread.put(path, new Unread(text, problem.in(path)));
        show();
    }

    /// The same; and the draft goes back to what it said before one began to type in the field.
    ///
    /// @param key of the edits that the field makes where it can be read
    public void unread(String key, String path, String text, Problem problem) {
        history.takeBack(key);
        unread(path, text, problem);
    }

    /// Whether a field of the place, or inside it, holds what cannot be read.
    public boolean isUnread(String path) {
        return unread.keySet().stream().anyMatch(p -> within(path, p));
    }

    /// What was typed where it could not be read.
    public Optional<String> unreadText(String path) {
        return Optional.ofNullable(unread.get(path)).map(Unread::text);
    }

    /// What a number field shows: what was typed where that is no number, else the number.
    public String fieldText(String path, OptionalDouble value) {
        var typed = unread.get(path);
        if (typed != null) {
            return typed.text;
        }
        return value.isPresent() ? NumberText.show(value.getAsDouble()) : "";
    }

    /// Problems of the place itself and of everything inside it.
    public List<Problem> problemsAt(String path) {
        return problems.get().stream()
                .filter(p -> within(path, p.place().path()))
                .toList();
    }

    private static boolean within(String outer, String inner) {
        return inner.startsWith(outer)
                && (inner.length() == outer.length() || ".[".indexOf(inner.charAt(outer.length())) >= 0);
    }

    /// Leaves out what was typed in fields that are gone.
    public void forget(String path) {
        unread.keySet().removeIf(p -> within(path, p));
        canUndo.set(history.canUndo() || !unread.isEmpty());
    }

    private void show() {
        draft.set(history.now());
        edited.set(!saved.equals(draft.get()));
        canUndo.set(history.canUndo() || !unread.isEmpty());
        canRedo.set(history.canRedo());
        checkAgain();
    }

    private void checkAgain() {
        Draft checked = draft.get();
        DataFiles from = files;
        long turn = ++newestCheck;
        background.<Check>run(
                () -> checkOf(checked, from),
                result -> {
                    if (turn == newestCheck) {
                        check.set(result);
                    }
                },
                failure -> {
                    if (turn == newestCheck) {
                        check.set(new Check.Refused(List.of(Problem.of("The check itself failed: " + failure)
                                .because("This is a fault of the program, not of the project."))));
                    }
                });
    }

    private static Check checkOf(Draft draft, DataFiles files) {
        try {
            return new Check.Sound(Project.of(draft, files));
        } catch (Refusal refusal) {
            return new Check.Refused(refusal.problems());
        }
    }

    private void collectProblems() {
        var all = new ArrayList<>(unreadFields());
        if (check.get() instanceof Check.Refused(List<Problem> refused)) {
            refused.stream().filter(p -> !unread.containsKey(p.place().path())).forEach(all::add);
        }
        problems.set(List.copyOf(all));
    }
}
