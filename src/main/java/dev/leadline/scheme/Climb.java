package dev.leadline.scheme;

import dev.leadline.stream.Stream;
import java.util.Arrays;
import java.util.Optional;
import java.util.function.BooleanSupplier;

/// The particles of one repetition of splitting, on their way up. Used once.
final class Climb {
    private final Walk walk;
    private final Stream randomness;
    private final double[][] z;
    private final double[] score;
    private final int particles;

    /// Which of the particles at the start each descends from.
    private final int[] ancestor;

    /// The same for a particle and a copy that never left it.
    private final long[] place;

    /// Those at the level, then the others.
    private final int[] order;

    /// Natural logarithm of `1 - 1/particles`.
    private final double logStep;

    private long places;
    private double steps;
    private long tied;
    private long unmoved;

    /// @param start complete
    Climb(StartingPoints start, Walk walk, Stream randomness) {
        this.z = start.z();
        this.score = start.score();
        this.walk = walk;
        this.randomness = randomness;
        this.particles = score.length;
        this.ancestor = new int[particles];
        this.place = new long[particles];
        this.order = new int[particles];
        for (int i = 0; i < particles; i++) {
            ancestor[i] = i;
            place[i] = places++;
        }
        this.logStep = StrictMath.log1p(-1.0 / particles);
    }

    /// @return empty where cancelled
    Optional<SplittingOutcome.End> run(BooleanSupplier cancelled) {
        while (true) {
            double level = lowest();
            if (level > 0) {
                return Optional.of(SplittingOutcome.End.ARRIVED);
            }
            if (cancelled.getAsBoolean()) {
                return Optional.empty();
            }
            int count = partition(level);
            long distinct = distinctPlaces(count);
            if (count == particles) {
                return Optional.of(distinct == 1 ? SplittingOutcome.End.STUCK : SplittingOutcome.End.ONE_LEVEL);
            }
            tied += distinct - 1;
            steps += count == 1 ? 1 : StrictMath.log1p(-(double) count / particles) / logStep;
            if (steps * logStep < SplittingOutcome.LOG_SMALLEST) {
                return Optional.of(SplittingOutcome.End.TOO_RARE);
            }
            for (int i = 0; i < count; i++) {
                replace(order[i], order[count + random(particles - count)], level);
            }
        }
    }

    private double lowest() {
        double lowest = Double.POSITIVE_INFINITY;
        for (double s : score) {
            lowest = Math.min(lowest, s);
        }
        return lowest;
    }

    /// @return how many are at the level
    private int partition(double level) {
        int low = 0;
        int high = particles;
        for (int i = 0; i < particles; i++) {
            if (score[i] == level) {
                order[low++] = i;
            } else {
                order[--high] = i;
            }
        }
        return low;
    }

    private long distinctPlaces(int count) {
        return count == 1
                ? 1
                : Arrays.stream(order, 0, count)
                        .mapToLong(i -> place[i])
                        .distinct()
                        .count();
    }

    private int random(int n) {
        return (int) Math.unsignedMultiplyHigh(randomness.next(), n);
    }

    private void replace(int particle, int model, double level) {
        System.arraycopy(z[model], 0, z[particle], 0, z[particle].length);
        score[particle] = walk.move(z[particle], score[model], level);
        ancestor[particle] = ancestor[model];
        boolean moved = !Arrays.equals(z[particle], z[model]);
        place[particle] = moved ? places++ : place[model];
        unmoved += moved ? 0 : 1;
    }

    double steps() {
        return steps;
    }

    long tied() {
        return tied;
    }

    long unmoved() {
        return unmoved;
    }

    int ancestors() {
        return (int) Arrays.stream(ancestor).distinct().count();
    }
}
