package dev.leadline.ground;

import dev.leadline.ground.Ground.Strength;
import dev.leadline.interval.Interval;
import dev.leadline.trace.Rehearsal;
import dev.leadline.trace.Rehearsed;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.IntStream;

/// Whether intervals of this very set-up hold the value as often as they say, by repeating the run with other
/// seeds. It is an objection where they surely lack a twentieth of their level, by an exact interval of the rate
/// that misses one time in 10,000, and the value is known well enough.
final class Rehearsals {
    private static final String CODE = "rehearsal";
    private static final double SURE = .9999;

    /// Parts of the repetitions that may be lacking.
    private static final double LITTLE = .01;

    private static final double MUCH = .05;

    private Rehearsals() {}

    static List<Ground> judge(Evidence evidence, Optional<Rehearsal> rehearsal) {
        if (rehearsal.isEmpty() || rehearsal.get().repetitions() == 0) {
            return List.of(Ground.notDone(
                    CODE,
                    "Whether this interval holds for this question was not rehearsed",
                    "Repeat the run with other seeds and compare the intervals",
                    new Action.Rehearse()));
        }
        return IntStream.range(0, evidence.answers().size())
                .mapToObj(k -> judge(
                        evidence.of(k),
                        rehearsal.get().draws(),
                        rehearsal.get().answers().get(k)))
                .toList();
    }

    private static Ground judge(String of, long draws, Rehearsed answer) {
        String text = of
                + String.format(
                        Locale.ROOT,
                        "of %,d repetitions of %,d draws %.1f %% of the intervals hold the value, where %s say so",
                        answer.bounded(),
                        draws,
                        100 * answer.rate(),
                        Interval.percent(answer.level()));
        double lacking = answer.level() - answer.rate();
        return switch (answer.verdict()) {
            case NOTHING ->
                Ground.notDone(
                        CODE,
                        of + "no repetition has an interval at %s draws".formatted(Numbers.count(draws)),
                        "Rehearse more draws",
                        Action.MoreDraws.some());
            case HOLDS, MORE_THAN_STATED -> Ground.shown(CODE, text);
            case FALLS_SHORT ->
                lacking <= LITTLE
                        ? Ground.shown(CODE, text)
                        : Ground.doubted(
                                CODE,
                                lacking > MUCH
                                                && !answer.isDoubtful()
                                                && answer.rateInterval(SURE).high() < answer.level()
                                        ? Strength.OBJECTION
                                        : Strength.CAUTION,
                                text,
                                "Make more draws, take another interval or another scheme, and rehearse that",
                                Action.MoreDraws.some());
        };
    }
}
