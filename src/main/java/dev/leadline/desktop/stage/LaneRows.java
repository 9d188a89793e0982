package dev.leadline.desktop.stage;

import dev.leadline.chart.LaneLook;
import dev.leadline.desktop.run.Progress;
import dev.leadline.desktop.run.RunViewModel.State;
import dev.leadline.desktop.style.Figures;
import dev.leadline.model.Tolerance;
import dev.leadline.model.UnitWords;
import dev.leadline.numeric.Rounding;
import dev.leadline.study.LaneState;
import dev.leadline.study.StudyState.Activity;
import dev.leadline.trace.Answer;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/// The rows of the lane table.
final class LaneRows {
    private LaneRows() {}

    /// @param look marker and dash of the lane in the picture
    /// @param of which answer; empty where there is only one
    /// @param left time left, or whether the numerical tolerance is met
    /// @param why the lane goes on, or stopped
    record Row(
            String lane,
            LaneLook look,
            String of,
            String value,
            String plusMinus,
            String draws,
            String left,
            String why) {}

    static List<Row> of(State.Shown shown) {
        var rows = new ArrayList<Row>();
        var lanes = shown.study().lanes();
        for (int i = 0; i < lanes.size(); i++) {
            var look = LaneLook.values()[i];
            var lane = lanes.get(i);
            var mark = lane.trace().last();
            if (mark.isEmpty()) {
                rows.add(new Row(lane.trace().lane(), look, "", "", "", "0", "", "starting"));
                continue;
            }
            var answers = mark.get().answers();
            for (int k = 0; k < answers.size(); k++) {
                rows.add(row(shown, lane, look, answers.get(k), k, answers.size()));
            }
        }
        return rows;
    }

    private static Row row(State.Shown shown, LaneState lane, LaneLook look, Answer a, int k, int answers) {
        boolean first = k == 0;
        double half = a.interval().halfWidth();
        boolean whole = Double.isFinite(a.estimate()) && half > 0 && Double.isFinite(half);
        var text = Rounding.of(a.estimate(), whole ? half : Double.NaN);
        String name = answers == 1 ? "" : a.label().isBlank() ? "answer " + (k + 1) : a.label();
        String unit = answers == 1 ? "" : UnitWords.after(a.unit()).strip();
        return new Row(
                first ? lane.trace().lane() : "",
                look,
                name,
                (whole ? text.value() : alone(a)) + (unit.isEmpty() ? "" : " " + unit),
                whole ? uncertainty(a, text) : "",
                first ? Figures.count(lane.trace().last().orElseThrow().draws()) : "",
                first ? left(shown, lane, a) : "",
                first ? why(shown, lane) : "");
    }

    /// The half-width; both limits where one lies much farther off than the other.
    private static String uncertainty(Answer a, Rounding text) {
        return a.interval().lopsided(a.estimate())
                ? text.down(a.interval().low()) + " to " + text.up(a.interval().high())
                : text.uncertainty().orElse("");
    }

    /// What the head of the column of values says.
    static String valueHead(State.Shown shown) {
        var asks = shown.project().question().asks();
        String unit = UnitWords.after(asks.getFirst().unit()).strip();
        return asks.size() > 1 || unit.isEmpty()
                ? "value"
                : unit.startsWith("per ") ? "value " + unit : "value, " + unit;
    }

    private static String alone(Answer a) {
        return Double.isFinite(a.estimate()) ? Figures.number(a.estimate()) : "none yet";
    }

    private static String left(State.Shown shown, LaneState lane, Answer a) {
        Optional<Tolerance> tolerance = shown.project().question().tolerance();
        boolean met = tolerance
                .filter(t -> t.met(a.estimate(), a.interval().reach(a.estimate())))
                .isPresent();
        if (met) {
            return "met";
        }
        if (lane.trace().finished()) {
            return tolerance.isPresent() ? "not met" : "none";
        }
        var progress = Progress.of(lane.trace().marks(), shown.project().plan().stop());
        return progress.secondsLeft().isPresent()
                ? Figures.duration(progress.secondsLeft().getAsDouble())
                : "";
    }

    private static String why(State.Shown shown, LaneState lane) {
        return lane.trace().stopReason().orElse(shown.study().activity() == Activity.PAUSED ? "paused" : "running");
    }
}
