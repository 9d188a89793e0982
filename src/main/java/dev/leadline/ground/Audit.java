package dev.leadline.ground;

import dev.leadline.density.Density;
import dev.leadline.density.Student;
import dev.leadline.estimate.Estimand;
import dev.leadline.ground.Ground.Strength;
import dev.leadline.interval.ClopperPearson;
import dev.leadline.interval.NoHit;
import dev.leadline.numeric.Rounding;
import dev.leadline.scheme.Repetitions;
import dev.leadline.trace.Answer;
import dev.leadline.trace.Trace;
import java.util.List;
import java.util.stream.IntStream;

/// Whether independent draws from the inputs' own densities agree with answers by other densities, which may
/// miss a part of the outcome without a sign of it. The draws of an audit enter no answer.
///
/// A chance is judged by the exact interval of the audit's hits. Other answers by their distance in standard
/// errors: that of the audit is the greater of its own and the one that the lane's draws foretell, so that an
/// audit which saw nothing of what is rare is not taken for a sure one.
final class Audit {
    /// `2 Φ(-4)`.
    private static final double RARE = 6.334248366623985e-5;

    /// Hits that an audit is to have.
    private static final double ENOUGH = 25;

    private static final String REMEDY = "Draw from densities that reach every part of the outcome, or more from the"
            + " inputs' own; sign the audit's estimate rather than this one";

    private Audit() {}

    static List<Ground> judge(Evidence evidence) {
        var scheme = evidence.trace().scheme();
        if (!scheme.isWeighted() && !(scheme.points() instanceof Repetitions)) {
            return List.of();
        }
        if (evidence.trace().audit().isEmpty()) {
            return List.of(Ground.notDone(
                    "audit",
                    "No independent draws from the inputs' own densities check what this lane may miss",
                    "Write \"audit\": 100000 in the lane"));
        }
        var audit = evidence.trace().audit().get();
        if (audit.last().isEmpty()) {
            return List.of(Ground.notDone("audit", "The audit has made no draws yet", "Make more draws"));
        }
        return IntStream.range(0, evidence.answers().size())
                .mapToObj(k -> judge(evidence, audit, k))
                .toList();
    }

    private static Ground judge(Evidence evidence, Trace audit, int k) {
        var lane = evidence.answers().get(k);
        var plain = audit.last().orElseThrow().answers().get(k);
        if (Double.isNaN(lane.estimate()) || Double.isNaN(plain.estimate())) {
            return notYet(evidence, k);
        }
        return plain.estimand() instanceof Estimand.Probability
                        && plain.interval().kind().equals(ClopperPearson.KIND)
                ? chance(evidence, lane, plain, k)
                : distance(evidence, audit, lane, plain, k);
    }

    private static Ground chance(Evidence evidence, Answer lane, Answer plain, int k) {
        long hits = plain.hits().orElseThrow();
        long n = plain.observations();
        var left = ClopperPearson.of(hits, n, plain.nonFinite(), 1 - RARE);
        boolean unseen = Double.isNaN(lane.standardError());
        if (Double.isNaN(left.halfWidth()) || unseen && !lane.interval().kind().equals(NoHit.KIND)) {
            return notYet(evidence, k);
        }
        double reach = unseen ? 0 : student(evidence.total().count() - 1).quantile(1 - RARE / 2) * lane.standardError();
        double most = unseen ? lane.interval().high() : lane.estimate() + reach;
        boolean below = most < left.low();
        boolean above = lane.estimate() - reach > left.high();
        var rounding = Rounding.of(plain.estimate(), left.halfWidth());
        String text = evidence.of(k)
                + "%s in %s audit draws from the inputs' own densities leave %s to %s possible at %s, and %s is %s"
                        .formatted(
                                hits == 0 ? "no hits" : Numbers.count(hits) + (hits == 1 ? " hit" : " hits"),
                                Numbers.count(n),
                                left.low() == 0 ? "0" : rounding.down(left.low()),
                                left.high() == 1 ? "1" : rounding.up(left.high()),
                                left.percent(),
                                Numbers.value(lane.estimate()),
                                above ? "above that" : below ? "below that" : "within that");
        if (above || below) {
            return Ground.doubted("audit", Strength.OBJECTION, text, REMEDY);
        }
        if (unseen && hits > 0) {
            return Ground.doubted("audit", Strength.CAUTION, text + "; the lane saw none", REMEDY);
        }
        if (hits == 0) {
            return Ground.notDone(
                    "audit",
                    text + ": so few can hardly tell",
                    unseen
                            ? "Audit by more draws"
                            : "Audit by about %s draws, of which some %.0f would hit"
                                    .formatted(Numbers.about(ENOUGH / lane.estimate()), ENOUGH));
        }
        return Ground.shown("audit", text);
    }

    private static Ground distance(Evidence evidence, Trace audit, Answer lane, Answer plain, int k) {
        double ofLane = lane.standardError();
        double own = plain.standardError();
        double n = plain.observations();
        double ofAudit = Math.max(Double.isNaN(own) ? 0 : own, foretold(evidence, lane, k) / Math.sqrt(n));
        double error = StrictMath.hypot(ofLane, ofAudit);
        double z = (lane.estimate() - plain.estimate()) / error;
        if (Double.isNaN(z) || Double.isInfinite(error)) {
            return notYet(evidence, k);
        }
        double chance = 2
                * student(degrees(ofLane, evidence.total().count(), ofAudit, n)).survival(Math.abs(z));
        String text = evidence.of(k)
                + "%s standard errors %s the mean of %s audit draws from the inputs' own densities, %s; chance of more %s"
                        .formatted(
                                Numbers.ratio(Math.abs(z)),
                                z < 0 ? "below" : "above",
                                Numbers.count(audit.last().orElseThrow().draws()),
                                Numbers.value(plain.estimate()),
                                Rounding.atMost(chance));
        return chance < RARE ? Ground.doubted("audit", Strength.OBJECTION, text, REMEDY) : Ground.shown("audit", text);
    }

    /// The standard deviation of plain draws, as far as the lane's draws tell it; 0 where they do not.
    private static double foretold(Evidence evidence, Answer lane, int k) {
        boolean isMean = lane.estimand() instanceof Estimand.Mean || lane.estimand() instanceof Estimand.Integral;
        return evidence.trace()
                .outermost()
                .filter(_ -> isMean)
                .map(draws -> Math.sqrt(
                        Math.max(0, draws.ownSquare(evidence.component(k)) - lane.estimate() * lane.estimate())))
                .orElse(0.0);
    }

    private static Density student(double degrees) {
        return new Student(degrees, 0, 1);
    }

    /// Of a difference: Welch (1947), Biometrika 34, 28-35.
    private static double degrees(double one, double observations, double other, double draws) {
        double a = one * one;
        double b = other * other;
        return (a + b) * (a + b) / (a * a / (observations - 1) + b * b / (draws - 1));
    }

    private static Ground notYet(Evidence evidence, int k) {
        return Ground.notDone(
                "audit",
                evidence.of(k) + "the audit cannot be compared yet: there is no standard error",
                "Make more draws");
    }
}
