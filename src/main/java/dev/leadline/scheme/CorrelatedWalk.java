package dev.leadline.scheme;

import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Normal;
import dev.leadline.stream.Stream;

/// Moves of a particle in the standard normal space: `z' = sqrt(1 - s²) z + s ξ` with ξ a fresh normal point, made
/// where its score is above the level. The normal density never changes under such moves, in any dimension.
///
/// The step size s starts at 1, where proposals are independent of the particle, and follows the share of moves that
/// are made, from one copy to the next: it looks only at copies moved before.
///
/// Source: Neal (1999), Regression and classification using Gaussian process priors, Bayesian Statistics 6, 475-501;
/// Papaioannou, Betz, Zwirglmaier and Straub (2015), MCMC algorithms for subset simulation, Probabilistic Engineering
/// Mechanics 41, 89-103. From memory.
final class CorrelatedWalk implements Walk {
    /// Share of moves to be made. At .3 and .5 replacements vary as little, at .2 and less they vary by a fifth more.
    private static final double ACCEPTED = 0.4;

    /// How much of what the share is off goes into the logarithm of the step size, with each copy.
    private static final double HASTE = 0.1;

    private final Score distance;
    private final Stream randomness;
    private final int moves;

    /// Normal numbers of all moves of a copy, one move after the other.
    private final double[] noise;

    /// The point proposed, as a block of one row.
    private final double[][] proposed;

    private final double[] score = new double[1];

    private double step = 1;
    private long proposals;
    private long accepted;
    private long failed;

    CorrelatedWalk(Score distance, int dimensions, Stream randomness, int moves) {
        this.distance = distance;
        this.randomness = randomness;
        this.moves = moves;
        this.noise = new double[moves * dimensions];
        this.proposed = new double[dimensions][1];
    }

    @Override
    public double move(double[] z, double from, double level) {
        randomness.fill(noise, 0, noise.length);
        Normal.quantile(noise, noise, noise.length);
        double keep = Math.sqrt(1 - step * step);
        double at = from;
        int made = 0;
        for (int m = 0; m < moves; m++) {
            propose(z, keep, m * z.length);
            distance.at(proposed, 1, score);
            if (score[0] > level) {
                for (int j = 0; j < z.length; j++) {
                    z[j] = proposed[j][0];
                }
                at = score[0];
                made++;
            } else if (Double.isNaN(score[0])) {
                failed++;
            }
        }
        count(made);
        return at;
    }

    private void propose(double[] z, double keep, int from) {
        for (int j = 0; j < z.length; j++) {
            proposed[j][0] = Math.fma(step, noise[from + j], keep * z[j]);
        }
    }

    private void count(int made) {
        proposals += moves;
        accepted += made;
        step = Math.min(1, step * Exp.exp(HASTE * ((double) made / moves - ACCEPTED)));
    }

    @Override
    public long proposals() {
        return proposals;
    }

    @Override
    public long accepted() {
        return accepted;
    }

    @Override
    public long failed() {
        return failed;
    }

    @Override
    public double step() {
        return step;
    }
}
