package dev.leadline.engine;

import dev.leadline.numeric.Exp;
import java.util.Arrays;
import java.util.Optional;
import java.util.SplittableRandom;

/// Normal densities without correlations, mixed, as weighted draws suggest them (expectation and maximisation).
///
/// @param weights of the parts, adding up to 1
/// @param means of each part in each coordinate
/// @param sds likewise
record NormalMixture(double[] weights, double[][] means, double[][] sds) {
    private static final int[] PARTS = {1, 2, 4};
    private static final int STARTS = 2;
    private static final int MOST_STEPS = 30;

    /// Gain in cross-entropy by a step below which the next ones are not worth their time.
    private static final double STILL = 1e-3;

    private static final double NARROWEST = 0.1;

    /// A mean within so many standard errors of 0 is 0, a spread within so many of 1 is 1.
    private static final double SURE = 4;

    /// Gain in cross-entropy, on draws that the fit has not seen, that one more part must bring.
    private static final double WORTH = 0.05;

    /// Draws that matter, by their weights, below which nothing is fitted.
    private static final double FEWEST = 20;

    /// @param z scores, one array for each coordinate
    /// @param counts what each draw counts
    /// @return empty where too few draws matter
    static Optional<NormalMixture> fit(double[][] z, double[] counts, long seed) {
        if (z.length == 0 || effective(counts) < FEWEST) {
            return Optional.empty();
        }
        double[] even = half(counts, 0);
        double[] odd = half(counts, 1);
        boolean splits = effective(even) >= FEWEST && effective(odd) >= FEWEST;
        int best = 1;
        double reached = Double.NEGATIVE_INFINITY;
        for (int parts : PARTS) {
            if (parts > 1 && (!splits || effective(counts) < 10.0 * parts * 2)) {
                break;
            }
            double seen = splits ? likeliest(z, even, parts, seed).entropy(z, odd) : 0;
            if (seen > reached + WORTH) {
                best = parts;
                reached = seen;
            }
        }
        return Optional.of(likeliest(z, counts, best, seed).calm(z, counts));
    }

    /// Draws of equal weight that would say as much.
    static double effective(double[] counts) {
        double sum = Arrays.stream(counts).sum();
        double squares = Arrays.stream(counts).map(c -> c * c).sum();
        return squares > 0 ? sum * sum / squares : 0;
    }

    private static double[] half(double[] counts, int remainder) {
        double[] half = counts.clone();
        for (int i = 0; i < half.length; i++) {
            half[i] = i % 2 == remainder ? half[i] : 0;
        }
        return half;
    }

    private static NormalMixture likeliest(double[][] z, double[] counts, int parts, long seed) {
        NormalMixture best = null;
        double reached = Double.NEGATIVE_INFINITY;
        for (int start = 0; start < (parts == 1 ? 1 : STARTS); start++) {
            var mixture = start(z, counts, parts, new SplittableRandom(seed + 7919L * start));
            mixture = mixture.step(z, counts);
            double entropy = mixture.entropy(z, counts);
            double before = Double.NEGATIVE_INFINITY;
            for (int step = 1; parts > 1 && step < MOST_STEPS && entropy > before + STILL; step++) {
                mixture = mixture.step(z, counts);
                before = entropy;
                entropy = mixture.entropy(z, counts);
            }
            if (entropy > reached) {
                best = mixture;
                reached = entropy;
            }
        }
        return best == null ? start(z, counts, 1, new SplittableRandom(seed)).step(z, counts) : best;
    }

    /// Parts at draws that matter, far from each other (Arthur and Vassilvitskii 2007, k-means++).
    private static NormalMixture start(double[][] z, double[] counts, int parts, SplittableRandom random) {
        int n = counts.length;
        double[] weights = new double[parts];
        Arrays.fill(weights, 1.0 / parts);
        double[][] means = new double[parts][z.length];
        double[][] sds = new double[parts][z.length];
        double[] chance = counts.clone();
        double[] distance = new double[n];
        Arrays.fill(distance, Double.POSITIVE_INFINITY);
        for (int p = 0; p < parts; p++) {
            int chosen = pick(chance, random);
            Arrays.fill(sds[p], 1);
            for (int c = 0; c < z.length; c++) {
                means[p][c] = z[c][chosen];
            }
            for (int i = 0; i < n; i++) {
                double squares = 0;
                for (int c = 0; c < z.length; c++) {
                    double off = z[c][i] - means[p][c];
                    squares += off * off;
                }
                distance[i] = Math.min(distance[i], squares);
                chance[i] = counts[i] * distance[i];
            }
        }
        return new NormalMixture(weights, means, sds);
    }

    private static int pick(double[] chance, SplittableRandom random) {
        double left = random.nextDouble() * Arrays.stream(chance).sum();
        for (int i = 0; i < chance.length; i++) {
            left -= chance[i];
            if (left < 0) {
                return i;
            }
        }
        return 0;
    }

    private NormalMixture step(double[][] z, double[] counts) {
        int parts = weights.length;
        double[] mass = new double[parts];
        double[][] sums = new double[parts][z.length];
        double[][] squares = new double[parts][z.length];
        double[] logs = new double[parts];
        double[] constants = constants();
        for (int i = 0; i < counts.length; i++) {
            if (counts[i] > 0) {
                double most = logs(z, i, constants, logs);
                double all = 0;
                for (int p = 0; p < parts; p++) {
                    logs[p] = Exp.exp(logs[p] - most);
                    all += logs[p];
                }
                for (int p = 0; p < parts; p++) {
                    double share = counts[i] * logs[p] / all;
                    mass[p] += share;
                    for (int c = 0; c < z.length; c++) {
                        sums[p][c] += share * z[c][i];
                        squares[p][c] += share * z[c][i] * z[c][i];
                    }
                }
            }
        }
        double whole = Arrays.stream(mass).sum();
        double effective = effective(counts);
        double[][] newMeans = new double[parts][z.length];
        double[][] newSds = new double[parts][z.length];
        double[] newWeights = new double[parts];
        for (int p = 0; p < parts; p++) {
            newWeights[p] = mass[p] / whole;
            // As if two more draws had been seen that vary as the input does.
            double held = 2 / Math.max(1, effective * newWeights[p]);
            for (int c = 0; c < z.length; c++) {
                double mean = mass[p] > 0 ? sums[p][c] / mass[p] : means[p][c];
                double variance = mass[p] > 0 ? squares[p][c] / mass[p] - mean * mean : 1;
                newMeans[p][c] = mean;
                newSds[p][c] = Math.max(NARROWEST, Math.sqrt((variance + held) / (1 + held)));
            }
        }
        return new NormalMixture(newWeights, newMeans, newSds);
    }

    /// Of each part the logarithm of its weight over its standard deviations.
    private double[] constants() {
        double[] constants = new double[weights.length];
        for (int p = 0; p < weights.length; p++) {
            constants[p] = StrictMath.log(weights[p]);
            for (double sd : sds[p]) {
                constants[p] -= StrictMath.log(sd);
            }
        }
        return constants;
    }

    /// The logarithm of each part's weight and density at a draw, less a constant.
    ///
    /// @return the largest
    private double logs(double[][] z, int i, double[] constants, double[] logs) {
        double most = Double.NEGATIVE_INFINITY;
        for (int p = 0; p < weights.length; p++) {
            double squares = 0;
            for (int c = 0; c < z.length; c++) {
                double own = (z[c][i] - means[p][c]) / sds[p][c];
                squares += own * own;
            }
            logs[p] = constants[p] - 0.5 * squares;
            most = Math.max(most, logs[p]);
        }
        return most;
    }

    /// Mean logarithm of the density over the draws that matter.
    private double entropy(double[][] z, double[] counts) {
        double[] logs = new double[weights.length];
        double[] constants = constants();
        double sum = 0;
        double mass = 0;
        for (int i = 0; i < counts.length; i++) {
            if (counts[i] > 0) {
                double most = logs(z, i, constants, logs);
                double all = Arrays.stream(logs)
                        .map(log -> StrictMath.exp(log - most))
                        .sum();
                sum += counts[i] * (most + StrictMath.log(all));
                mass += counts[i];
            }
        }
        return sum / mass;
    }

    /// Without the coordinates that the draws do not tell apart from their own density.
    private NormalMixture calm(double[][] z, double[] counts) {
        double effective = effective(counts);
        double[][] calmMeans = new double[weights.length][];
        double[][] calmSds = new double[weights.length][];
        for (int p = 0; p < weights.length; p++) {
            calmMeans[p] = means[p].clone();
            calmSds[p] = sds[p].clone();
        }
        for (int c = 0; c < z.length; c++) {
            boolean isMoved = false;
            boolean isStretched = false;
            for (int p = 0; p < weights.length; p++) {
                double error = 1 / Math.sqrt(Math.max(1, effective * weights[p]));
                isMoved |= Math.abs(means[p][c]) > SURE * error;
                isStretched |= Math.abs(sds[p][c] - 1) > SURE * error / Math.sqrt(2);
            }
            for (int p = 0; p < weights.length; p++) {
                calmMeans[p][c] = isMoved ? means[p][c] : 0;
                calmSds[p][c] = isStretched ? sds[p][c] : 1;
            }
        }
        return new NormalMixture(weights, calmMeans, calmSds);
    }

    boolean moves(int coordinate) {
        for (int p = 0; p < weights.length; p++) {
            if (means[p][coordinate] != 0 || sds[p][coordinate] != 1) {
                return true;
            }
        }
        return false;
    }

    /// The weights as whole shares, each at least 1, that add up to `all`.
    int[] shares(int all) {
        int[] shares = new int[weights.length];
        int left = all - weights.length;
        int given = 0;
        double sum = 0;
        for (int p = 0; p < weights.length; p++) {
            sum += weights[p];
            int until = (int) Math.rint(sum * left);
            shares[p] = 1 + until - given;
            given = until;
        }
        shares[weights.length - 1] += left - given;
        return shares;
    }
}
