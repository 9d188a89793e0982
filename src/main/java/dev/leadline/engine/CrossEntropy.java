package dev.leadline.engine;

import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.numeric.Normal;
import dev.leadline.scheme.Adaptation;
import dev.leadline.scheme.Tuned;
import dev.leadline.scheme.Warp;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;

/// A small mixture of normal densities, of the normal scores of the inputs, that follows the draws which matter: the
/// density of that form nearest to the best one by cross-entropy.
///
/// For an event each stage takes the tenth of the draws that are nearest to it, until a tenth reach it; then, as for a
/// mean at once, every draw counts what it adds to the answer, or a power of it while a few would count for all. An
/// input that those draws do not tell apart from its own density stays as it is.
///
/// Source: Rubinstein and Kroese (2004), The cross-entropy method; Kurtz and Song (2013), Structural Safety 42, 35-44,
/// for the mixture.
record CrossEntropy(Question question, Lane lane, Adaptation wish, long seed) {
    private static final int DRAWS = 4_096;
    private static final int LAST_DRAWS = 8_192;
    private static final int MOST_STAGES = 24;

    /// Stages once the draws that matter are no longer chosen by a level.
    private static final int LAST_STAGES = 2;

    private static final double NEAREST = 0.1;

    /// Part of the draws that must matter.
    private static final double SOME = 0.02;

    private static final double LEAST_POWER = 0.01;

    Tuned found() {
        var found = Tuned.untouched(wish);
        int last = 0;
        for (int stage = 1; stage <= MOST_STAGES && last < LAST_STAGES; stage++) {
            var draws = Stage.of(question, lane, found, seed, stage, last == 0 ? DRAWS : LAST_DRAWS);
            double level = level(draws);
            double[] counts = counts(draws, level);
            double power = power(counts);
            last += level == 0 && power == 1 ? 1 : 0;
            found = next(found, draws, level, tempered(counts, power));
        }
        return found;
    }

    /// The score that a tenth of the draws reach; 0 where so many reach the event, or none is asked for.
    private static double level(Stage stage) {
        if (stage.scores().isEmpty()) {
            return 0;
        }
        double[] scores = Arrays.stream(stage.scores().get())
                .filter(score -> !Double.isNaN(score))
                .sorted()
                .toArray();
        double level = scores.length == 0 ? 0 : scores[(int) ((1 - NEAREST) * scores.length)];
        return Math.min(level, 0);
    }

    /// The largest power, up to 1, of what draws count at which at least a part of them, by their weights, matters: a
    /// few great ones would lead astray.
    private static double power(double[] counts) {
        double power = 1;
        while (power > LEAST_POWER && NormalMixture.effective(tempered(counts, power)) < SOME * counts.length) {
            power *= 0.8;
        }
        return power;
    }

    private static double[] tempered(double[] counts, double power) {
        if (power == 1) {
            return counts;
        }
        return Arrays.stream(counts)
                .map(count -> count == 0 ? 0 : StrictMath.pow(count, power))
                .toArray();
    }

    private Tuned next(Tuned before, Stage stage, double level, double[] counts) {
        var stages = new ArrayList<>(before.stages());
        stages.add(seen(stage, level));
        int[] coordinates = wish.inputs().stream()
                .mapToInt(Integer::intValue)
                .filter(j -> stage.points()[j] != null)
                .toArray();
        double[][] z = Arrays.stream(coordinates)
                .mapToObj(j -> {
                    double[] scores = new double[stage.draws()];
                    Normal.quantile(stage.points()[j], scores, scores.length);
                    return scores;
                })
                .toArray(double[][]::new);
        return NormalMixture.fit(z, counts, seed + stages.size())
                .map(mixture -> new Tuned(wish, nominal(), parts(mixture, coordinates), stages))
                .orElse(new Tuned(wish, before.nominal(), before.parts(), stages));
    }

    private Tuned.Stage seen(Stage stage, double level) {
        var sums = stage.sums();
        return new Tuned.Stage(stage.draws(), level, sums.mean(0), sums.standardError(0), stage.hits());
    }

    /// What each draw counts in the fit.
    private static double[] counts(Stage stage, double level) {
        double[] counts = new double[stage.draws()];
        for (int i = 0; i < counts.length; i++) {
            double size = level < 0 ? stage.scores().orElseThrow()[i] >= level ? 1 : 0 : Math.abs(stage.outcomes()[i]);
            double count = size * stage.weights()[i];
            counts[i] = Double.isFinite(count) ? count : 0;
        }
        return counts;
    }

    private int nominal() {
        return wish.nominal().nominal() * wish.units() / wish.nominal().of();
    }

    private List<Tuned.Part> parts(NormalMixture mixture, int[] coordinates) {
        int left = wish.units() - nominal();
        var parts = new ArrayList<Tuned.Part>();
        int[] shares = mixture.shares(left);
        for (int p = 0; p < shares.length; p++) {
            SortedMap<Integer, Warp> warps = new TreeMap<>();
            for (int c = 0; c < coordinates.length; c++) {
                if (mixture.moves(c)) {
                    warps.put(coordinates[c], new Warp.OfScores(mixture.means()[p][c], mixture.sds()[p][c]));
                }
            }
            parts.add(new Tuned.Part(shares[p], warps));
        }
        return parts;
    }
}
