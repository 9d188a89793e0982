package dev.leadline.desktop.lanes;

import dev.leadline.chart.LaneLook;
import dev.leadline.desktop.run.Progress;
import dev.leadline.desktop.run.RunViewModel.State;
import dev.leadline.desktop.style.Figures;
import dev.leadline.model.LaneDraft;
import dev.leadline.model.Tolerance;
import dev.leadline.model.UnitWords;
import dev.leadline.study.AnswerText;
import dev.leadline.study.LaneState;
import dev.leadline.study.Left;
import dev.leadline.study.StudyState.Activity;
import dev.leadline.trace.Answer;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/// The rows of the lane table: the lanes of the project as they are written now, with what the run shows of each.
final class LaneRows {
    /// Limits of what is left are told where one is so many times the other.
    private static final double FAR_APART = 1.4;

    private LaneRows() {}

    /// @param lane its index in the project
    /// @param name empty in rows of further answers
    /// @param look marker and dash of the lane in the picture
    /// @param scheme in words
    /// @param of which answer; empty where there is only one
    /// @param left time left, or whether the numerical tolerance is met
    /// @param why the lane goes on, or stopped
    record Row(
            int lane,
            String name,
            LaneLook look,
            String scheme,
            String of,
            String value,
            String plusMinus,
            String draws,
            String left,
            String why) {}

    static List<Row> of(List<LaneDraft> drafts, Optional<State.Shown> run) {
        var rows = new ArrayList<Row>();
        var looks = looks(drafts, run);
        for (int i = 0; i < drafts.size(); i++) {
            var draft = drafts.get(i);
            var look = looks.get(i);
            var state = run.flatMap(shown -> state(shown, draft.name()));
            if (state.isEmpty() || state.get().trace().last().isEmpty()) {
                String why = state.isPresent() ? "starting" : run.isPresent() ? "not in this run" : "not run yet";
                rows.add(new Row(i, draft.name(), look, SchemeWords.of(draft), "", "", "", "", "", why));
                continue;
            }
            var answers = state.get().trace().last().orElseThrow().answers();
            for (int k = 0; k < answers.size(); k++) {
                rows.add(row(i, draft, look, run.orElseThrow(), state.get(), answers.get(k), k, answers.size()));
            }
        }
        return rows;
    }

    /// A lane that was run looks as in the picture; the others take looks that are left.
    private static List<LaneLook> looks(List<LaneDraft> drafts, Optional<State.Shown> run) {
        var names = run.stream()
                .flatMap(shown -> shown.study().lanes().stream())
                .map(lane -> lane.trace().lane())
                .toList();
        var left = new ArrayList<>(Stream.of(LaneLook.values()).toList());
        drafts.forEach(draft -> {
            int at = names.indexOf(draft.name());
            if (at >= 0) {
                left.remove(LaneLook.values()[at]);
            }
        });
        var looks = new ArrayList<LaneLook>();
        for (var draft : drafts) {
            int at = names.indexOf(draft.name());
            looks.add(
                    at >= 0
                            ? LaneLook.values()[at]
                            : left.isEmpty() ? LaneLook.values()[LaneLook.values().length - 1] : left.removeFirst());
        }
        return looks;
    }

    private static Optional<LaneState> state(State.Shown shown, String name) {
        return shown.study().lanes().stream()
                .filter(lane -> lane.trace().lane().equals(name))
                .findFirst();
    }

    private static Row row(
            int i, LaneDraft draft, LaneLook look, State.Shown shown, LaneState lane, Answer a, int k, int answers) {
        boolean first = k == 0;
        String name = answers == 1 ? "" : a.label().isBlank() ? "answer " + (k + 1) : a.label();
        String unit = answers == 1 ? "" : UnitWords.after(a.unit()).strip();
        var cells = AnswerText.cells(a);
        return new Row(
                i,
                first ? draft.name() : "",
                look,
                first ? SchemeWords.of(draft) : "",
                name,
                cells.value() + (unit.isEmpty() ? "" : " " + unit),
                cells.plusMinus() + (a.provisional() ? ", provisional" : ""),
                first ? Figures.count(lane.trace().last().orElseThrow().draws()) : "",
                first ? left(shown, lane, a) : "",
                first ? why(draft, shown, lane) : "");
    }

    /// What the head of the column of values says.
    static String valueHead(Optional<State.Shown> run) {
        return run.map(LaneRows::valueHead).orElse("value");
    }

    private static String valueHead(State.Shown shown) {
        var asks = shown.project().question().asks();
        String unit = UnitWords.after(asks.getFirst().unit()).strip();
        return asks.size() > 1 || unit.isEmpty()
                ? "value"
                : unit.startsWith("per ") ? "value " + unit : "value, " + unit;
    }

    private static String left(State.Shown shown, LaneState lane, Answer a) {
        Optional<Tolerance> tolerance = shown.project().question().tolerance();
        boolean met = tolerance.filter(t -> lane.trace().course().isMet(t, a)).isPresent();
        if (lane.trace().finished()) {
            return met ? "met" : tolerance.isPresent() ? "not met" : "none";
        }
        var progress = Progress.of(lane.trace().marks(), shown.project().plan().stop());
        var left = lane.left();
        return left.filter(_ -> progress.drawsPerSecond().isPresent())
                .map(draws -> between(draws, progress.drawsPerSecond().getAsDouble()))
                .orElseGet(() -> progress.secondsLeft().isPresent()
                        ? Figures.duration(progress.secondsLeft().getAsDouble())
                        : "");
    }

    /// As `40 s`; with both limits where they are far apart, as `30 s to 2 min`.
    private static String between(Left draws, double rate) {
        double low = draws.low() / rate;
        double high = draws.high() / rate;
        if (!(high < Double.POSITIVE_INFINITY)) {
            return "over " + Figures.duration(low);
        }
        return high > FAR_APART * low && high > 2
                ? Figures.duration(low) + " to " + Figures.duration(high)
                : Figures.duration(draws.value() / rate);
    }

    private static String why(LaneDraft draft, State.Shown shown, LaneState lane) {
        boolean edited = shown.project().draft().lanes().stream().noneMatch(draft::equals)
                && !shown.project().draft().lanes().isEmpty();
        String why =
                lane.trace().stopReason().orElse(shown.study().activity() == Activity.PAUSED ? "paused" : "running");
        return edited ? "edited since; " + why : why;
    }
}
