package dev.leadline.desktop.run;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.leadline.model.Stop;
import dev.leadline.study.Left;
import dev.leadline.trace.Mark;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class ProgressTest {
    private static Mark mark(long draws, double seconds) {
        return new Mark(draws, seconds, List.of());
    }

    @Test
    void knowsNothingBeforeTheFirstMark() {
        assertEquals(
                "0 draws",
                Progress.of(List.of(), new Stop(100, OptionalDouble.empty())).text());
    }

    @Test
    void goesByTheRateOfTheLaterHalf() {
        var marks = List.of(mark(100, 1), mark(200, 2), mark(2_200, 4));
        var progress = Progress.of(marks, new Stop(10_200, OptionalDouble.empty()));
        assertEquals(OptionalDouble.of(1_000), progress.drawsPerSecond());
        assertEquals(OptionalDouble.of(8), progress.secondsLeft());
        assertEquals("2,200 draws \u00b7 1,000 a second \u00b7 8.0 s left", progress.text());
    }

    /// 2,200 draws made, 2,000 more foreseen at 1,000 a second; the budget alone would take 8 s.
    @Test
    void theStopRuleMayComeBeforeTheBudget() {
        var marks = List.of(mark(100, 1), mark(200, 2), mark(2_200, 4));
        var progress = Progress.of(marks, new Stop(10_200, OptionalDouble.empty()))
                .foreseeing(Optional.of(new Left(1_000, 2_000, 4_000)));
        assertEquals(OptionalDouble.of(2), progress.secondsLeft());
        assertEquals(2_200 / 4_200.0, progress.part());
        var unknown = Progress.of(marks, new Stop(10_200, OptionalDouble.empty()))
                .foreseeing(Optional.of(new Left(1_000, Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY)));
        assertEquals(OptionalDouble.of(8), unknown.secondsLeft());
    }

    @Test
    void theEarlierLimitDecides() {
        var marks = List.of(mark(1_000_000, 5), mark(2_000_000, 10));
        var progress = Progress.of(marks, new Stop(200_000_000, OptionalDouble.of(120)));
        assertEquals(OptionalDouble.of(110), progress.secondsLeft());
        assertEquals(10 / 120.0, progress.part());
        assertEquals("2.00 million draws \u00b7 200,000 a second \u00b7 1 min 50 s left", progress.text());
    }
}
