package dev.leadline.cli;

import dev.leadline.model.Stop;
import dev.leadline.study.AnswerText;
import dev.leadline.study.LaneState;
import dev.leadline.study.Left;
import dev.leadline.study.StudyState;
import dev.leadline.trace.Mark;
import dev.leadline.trace.Trace;
import java.util.Locale;
import java.util.function.Consumer;

/// A line on a terminal that says how far a run is: draws, value and half-width, time left. Safe for one thread that
/// feeds it and one that closes it.
final class Progress implements Consumer<StudyState>, AutoCloseable {

    private static final long PAUSE = 200_000_000;

    private final Console console;
    private final Stop stop;
    private final boolean shown;
    private final long start = System.nanoTime();
    private long last = start;
    private int written;

    Progress(Console console, Stop stop, boolean quiet) {
        this.console = console;
        this.stop = stop;
        this.shown = console.live() && !quiet;
    }

    @Override
    public synchronized void accept(StudyState state) {
        long now = System.nanoTime();
        if (!shown || state.ended() || now - last < PAUSE) {
            return;
        }
        last = now;
        write(line(state, (now - start) / 1e9, stop));
    }

    @Override
    public synchronized void close() {
        if (written > 0) {
            write("");
            console.err().print("\r");
            console.err().flush();
        }
    }

    private void write(String line) {
        console.err().print("\r" + line + " ".repeat(Math.max(0, written - line.length())));
        console.err().flush();
        written = line.length();
    }

    /// @param elapsed seconds since the start
    static String line(StudyState state, double elapsed, Stop stop) {
        if (state.lanes().isEmpty()) {
            return "  building tables";
        }
        double done = state.lanes().stream()
                .mapToDouble(lane -> done(lane, stop))
                .average()
                .orElse(0);
        long draws = state.lanes().stream()
                .flatMap(lane -> lane.trace().last().stream())
                .mapToLong(Mark::draws)
                .sum();
        String value = state.lanes()
                .getFirst()
                .trace()
                .last()
                .map(mark -> AnswerText.value(mark.answers().getFirst()))
                .orElse("");
        String left =
                Left.seconds(state.lanes(), stop, elapsed).map(Progress::words).orElse("");
        return String.format(Locale.ROOT, "  %3.0f %%   %,d draws   %s   %s", 100 * done, draws, value, left);
    }

    /// As `40 s left` or `40 s left (25 to 70)`.
    private static String words(Left left) {
        String about = String.format(Locale.ROOT, "%.0f s left", left.value());
        return Math.rint(left.low()) == Math.rint(left.high()) || Double.isInfinite(left.high())
                ? about
                : String.format(Locale.ROOT, "%s (%.0f to %.0f)", about, left.low(), left.high());
    }

    private static double done(LaneState lane, Stop stop) {
        Trace trace = lane.trace();
        if (trace.finished()) {
            return 1;
        }
        double made = trace.last().map(Mark::draws).orElse(0L);
        double draws =
                made == 0 ? 0 : made / (made + lane.left().map(Left::value).orElse(Math.max(0, stop.draws() - made)));
        double seconds = trace.last()
                .map(mark -> stop.seconds().isPresent()
                        ? mark.seconds() / stop.seconds().getAsDouble()
                        : 0)
                .orElse(0.0);
        return Math.min(1, Math.max(draws, seconds));
    }
}
