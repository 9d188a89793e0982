package dev.leadline.ground;

import dev.leadline.ground.Ground.Strength;
import dev.leadline.interval.Interval;
import java.util.Locale;
import java.util.Optional;

/// Whether intervals of this very set-up hold the value as often as they say, by repeating the run with
/// other seeds.
final class Rehearsal {
    private static final String CODE = "rehearsal";

    /// Standard errors, and parts of the repetitions, that may be lacking.
    private static final double ERRORS = 4;

    private static final double LITTLE = .01;
    private static final double MUCH = .05;

    private Rehearsal() {}

    static Ground judge(Optional<Rehearsed> rehearsed) {
        return rehearsed
                .map(Rehearsal::judged)
                .orElse(Ground.notDone(
                        CODE,
                        "Whether this interval holds for this question was not rehearsed",
                        "Repeat the run with other seeds and compare the intervals",
                        new Action.Rehearse()));
    }

    private static Ground judged(Rehearsed rehearsed) {
        String text = String.format(
                Locale.ROOT,
                "of %,d repetitions of %,d draws %.1f %% of the intervals hold the value, where %s say so",
                rehearsed.repetitions(),
                rehearsed.draws(),
                100 * rehearsed.rate(),
                Interval.percent(rehearsed.level()));
        double lacking = rehearsed.level() - rehearsed.rate();
        double chance = ERRORS * rehearsed.error();
        if (lacking <= Math.max(LITTLE, chance)) {
            return Ground.shown(CODE, text);
        }
        return Ground.doubted(
                CODE,
                lacking > Math.max(MUCH, chance) ? Strength.OBJECTION : Strength.CAUTION,
                text,
                "Make more draws, take another interval or another scheme, and rehearse that",
                Action.MoreDraws.some());
    }
}
