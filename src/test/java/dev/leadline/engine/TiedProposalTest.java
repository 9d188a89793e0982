package dev.leadline.engine;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Bernoulli;
import dev.leadline.density.Copula;
import dev.leadline.density.Correlations;
import dev.leadline.density.Density;
import dev.leadline.density.Exponential;
import dev.leadline.density.Mixing;
import dev.leadline.density.Normal;
import dev.leadline.density.Poisson;
import dev.leadline.density.Shifted;
import dev.leadline.model.Dependence;
import dev.leadline.model.Question;
import dev.leadline.scheme.Share;
import java.util.List;
import java.util.Map;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.apache.commons.statistics.distribution.PoissonDistribution;
import org.junit.jupiter.api.Test;

/// Expected values in closed form for normals: of S with standard deviation s and Z with covariance c to it,
/// `E[Z; S > a] = c/s φ(a/s)`. Quantiles of the normal density from commons-statistics.
class TiedProposalTest {
    private static final NormalDistribution NORMAL = NormalDistribution.of(0, 1);
    private static final long DRAWS = 200_000;

    private static Dependence tied(Correlations correlations, Integer... inputs) {
        return new Dependence(new Copula(Mixing.NONE, correlations), List.of(inputs), List.of(), List.of());
    }

    private static final Dependence TWO = tied(Correlations.none(2).with(0, 1, .7), 0, 1);

    private static void assertMean(double exact, Question question, Map<Integer, Density> others) {
        for (Share share : new Share[] {Share.NONE, new Share(1, 10)}) {
            var sums = Lanes.sums(question, Lanes.drawing(others, share), 11, DRAWS);
            double error = sums.standardError(0);
            assertEquals(exact, sums.mean(0), 4 * error, share.toString());
            assertTrue(error < .05 * Math.abs(exact), "error " + error + " of " + exact);
            if (share.nominal() > 0) {
                // without a share, the largest weights are too rare to be seen
                assertEquals(1, sums.mean(1), 4 * sums.standardError(1));
            }
        }
    }

    /// Plain draws would need a million for one hit.
    @Test
    void theOthersAreAsTheyAreGivenIt() {
        double s = Math.sqrt(3.4);
        double p = NORMAL.survivalProbability(9 / s);
        var question = new Questions()
                .normal("x")
                .normal("y")
                .probability("x + y > 9")
                .tied(TWO)
                .build();
        assertMean(p, question, Map.of(0, new Normal(4.5, 1)));
        // the second of the copula, which comes to be the first
        assertMean(p, question, Map.of(1, new Normal(4.5, 1)));
    }

    /// By the ratio of the densities of the copula at the values' normals under either.
    @Test
    void severalAreTiedToEachOtherAsStated() {
        double s = Math.sqrt(3.4);
        var question = new Questions()
                .normal("x")
                .normal("y")
                .probability("x + y > 9")
                .tied(TWO)
                .build();
        assertMean(
                NORMAL.survivalProbability(9 / s), question, Map.of(0, new Normal(4.5, 1), 1, new Normal(4.5, 1.25)));
        // weights of the one that is shifted the other way have a finite variance too
        var three = tied(Correlations.none(3).with(0, 1, .5).with(0, 2, .3).with(1, 2, -.4), 0, 1, 2);
        var third = new Questions()
                .normal("x")
                .normal("z")
                .normal("y")
                .mean("if(x + y > 5, z, 0)")
                .tied(three)
                .build();
        double spread = Math.sqrt(2 + 2 * .3);
        double covariance = .5 - .4;
        assertMean(
                covariance / spread * NORMAL.density(5 / spread),
                third,
                Map.of(0, new Normal(2.5, 1), 2, new Shifted(new Normal(0, 1), 2.5, 1)));
    }

    /// Far in either tail of an exponential density, where 1 less its probability has few digits, and where it has
    /// none.
    @Test
    void probabilitiesComeFromTheNearerTail() {
        for (double far : new double[] {20, 60}) {
            double z = NORMAL.inverseSurvivalProbability(Math.exp(-far));
            double exact = .7 * NORMAL.density(z);
            var upper = new Questions()
                    .random("x", new Exponential(1))
                    .normal("y")
                    .mean("if(x > " + far + ", y, 0)")
                    .tied(TWO)
                    .build();
            assertMean(exact, upper, Map.of(0, new Exponential(far)));
            var lower = new Questions()
                    .random("x", new Shifted(new Exponential(1), 0, -1))
                    .normal("y")
                    .mean("if(x < " + -far + ", y, 0)")
                    .tied(TWO)
                    .build();
            assertMean(-exact, lower, Map.of(0, new Shifted(new Exponential(far), 0, -1)));
        }
    }

    /// A separate value stands for the range of normals between its quantiles.
    @Test
    void separateValuesKeepTheirRange() {
        var event = new Questions()
                .normal("y")
                .random("b", new Bernoulli(1e-4))
                .mean("b*y")
                .tied(TWO)
                .build();
        double z = NORMAL.inverseSurvivalProbability(1e-4);
        assertMean(.7 * NORMAL.density(z), event, Map.of(1, new Bernoulli(.5)));
        var count = new Questions()
                .random("n", new Poisson(4))
                .normal("y")
                .mean("if(n == 15, y, 0)")
                .tied(TWO)
                .build();
        var poisson = PoissonDistribution.of(4);
        double low = NORMAL.inverseSurvivalProbability(poisson.survivalProbability(14));
        double high = NORMAL.inverseSurvivalProbability(poisson.survivalProbability(15));
        assertMean(.7 * (NORMAL.density(low) - NORMAL.density(high)), count, Map.of(0, new Poisson(15)));
    }
}
