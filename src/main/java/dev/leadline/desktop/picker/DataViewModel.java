package dev.leadline.desktop.picker;

import dev.leadline.density.Fit;
import dev.leadline.density.Fits;
import dev.leadline.desktop.background.Background;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.DensityDraft.Column;
import dev.leadline.model.DensityDraft.Data;
import dev.leadline.model.DensityDraft.Member;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.UnaryOperator;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;

/// A density that comes from a column of data: the data themselves, smoothed, or a family fitted to them.
final class DataViewModel {
    static final List<String> KINDS = List.of("empirical", "kernel");

    private static final Data EMPTY =
            new Data("", new Column.Only(), Optional.empty(), OptionalDouble.empty(), Optional.empty());

    private final DensityAt at;
    private final Background background;
    private final ReadOnlyObjectWrapper<State> fits = new ReadOnlyObjectWrapper<>(new State.Unasked());
    private long newest;

    DataViewModel(DensityAt at, Background background) {
        this.at = at;
        this.background = background;
    }

    ProjectViewModel project() {
        return at.project();
    }

    boolean isData() {
        return at.now().of() instanceof Data;
    }

    Data data() {
        return at.now().of() instanceof Data data ? data : EMPTY;
    }

    /// A file that was chosen; it must lie below the folder of the project.
    void choose(Path file) {
        var folder =
                project().file().get().map(f -> f.toAbsolutePath().normalize().getParent());
        var absolute = file.toAbsolutePath().normalize();
        if (folder.isEmpty() || !absolute.startsWith(folder.get())) {
            project()
                    .unread(
                            at.path() + ".data",
                            file.toString(),
                            Problem.of(
                                            folder.isEmpty()
                                                    ? "the project has no folder yet"
                                                    : "\u201c%s\u201d lies outside the folder of the project"
                                                            .formatted(file.getFileName()))
                                    .because("Data are read only below the folder of the project, so that both travel"
                                            + " together.")
                                    .tryThis(
                                            folder.isEmpty()
                                                    ? "Save the project beside its data first."
                                                    : "Copy the file there, then choose the copy."));
            return;
        }
        file(folder.get().relativize(absolute).toString().replace('\\', '/'));
    }

    void file(String text) {
        project().forget(at.path() + ".data");
        edit(".data", d -> moved(d, text.strip(), d.column()));
    }

    String fileText() {
        return project().unreadText(at.path() + ".data").orElseGet(() -> data().file());
    }

    /// A header, or a number for the place of a column.
    void column(String text) {
        String t = text.strip();
        Column column = t.isEmpty()
                ? new Column.Only()
                : t.matches("[1-9]\\d{0,8}") ? new Column.At(Long.parseLong(t)) : new Column.Named(t);
        edit(".column", d -> moved(d, d.file(), column));
    }

    String columnText() {
        return switch (data().column()) {
            case Column.Only _ -> "";
            case Column.Named(String header) -> header;
            case Column.At(long index) -> Long.toString(index);
        };
    }

    void kind(String kind) {
        project().settle();
        project().forget(at.path() + ".bandwidth");
        edit(
                ".kind",
                d -> new Data(
                        d.file(),
                        d.column(),
                        kind.equals(KINDS.getFirst()) ? Optional.empty() : Optional.of(kind),
                        kind.equals(KINDS.getFirst()) ? OptionalDouble.empty() : d.bandwidth(),
                        Optional.empty()));
    }

    String kind() {
        return data().kind().orElse(KINDS.getFirst());
    }

    void bandwidth(String text) {
        project()
                .typeOptionalNumber(
                        at.path() + ".bandwidth",
                        "bandwidth of " + at.of(),
                        text,
                        (d, value) -> at.changed(d, old -> {
                            var data = old.of() instanceof Data now ? now : EMPTY;
                            return DensityAt.become(
                                    old, new Data(data.file(), data.column(), data.kind(), value, data.fitted()));
                        }));
    }

    String bandwidthText() {
        return project().fieldText(at.path() + ".bandwidth", data().bandwidth());
    }

    boolean isFaulty(String field) {
        return !project().problemsAt(at.path() + "." + field).isEmpty();
    }

    // ---- fits

    /// How the fits to the data stand.
    sealed interface State {
        record Unasked() implements State {}

        record Fitting() implements State {}

        record Fitted(Fits fits) implements State {}

        record Refused(List<Problem> problems) implements State {}
    }

    ReadOnlyObjectProperty<State> fits() {
        return fits.getReadOnlyProperty();
    }

    /// Fits every family that can be; takes up to seconds.
    void fit() {
        long turn = ++newest;
        var data = data();
        var files = project().files();
        fits.set(new State.Fitting());
        background.<State>run(
                () -> new State.Fitted(Fits.of(
                        files.column(data.file(), data.column()).values().stream()
                                .mapToDouble(Double::doubleValue)
                                .toArray(),
                        List.of())),
                state -> set(turn, state),
                failure -> set(
                        turn,
                        new State.Refused(
                                failure instanceof Refusal refusal
                                        ? refusal.problems()
                                        : List.of(Problem.of("The fit itself failed: " + failure)
                                                .because("This is a fault of the program, not of the data.")))));
    }

    private void set(long turn, State state) {
        if (turn == newest) {
            fits.set(state);
        }
    }

    /// Draws from a fitted member in place of the data.
    void use(Fit fit) {
        project().settle();
        var data = data();
        var fitted = new Data(
                data.file(),
                data.column(),
                Optional.empty(),
                OptionalDouble.empty(),
                Optional.of(new Member(fit.family(), fit.parameters())));
        at.edit(
                ".fitted",
                fitted,
                "%s fitted to %d values of %s by maximum likelihood".formatted(fit.family(), fit.used(), data.file()));
        project().settle();
    }

    /// Draws from the data again.
    void unfit() {
        project().settle();
        edit(".fitted", d -> new Data(d.file(), d.column(), d.kind(), d.bandwidth(), Optional.empty()));
        project().settle();
    }

    /// What was fitted to another column says nothing of this one.
    private Data moved(Data d, String file, Column column) {
        newest++;
        fits.set(new State.Unasked());
        return new Data(file, column, d.kind(), d.bandwidth(), Optional.empty());
    }

    private void edit(String field, UnaryOperator<Data> change) {
        at.edit(field, old -> DensityAt.become(old, change.apply(old.of() instanceof Data data ? data : EMPTY)));
    }
}
