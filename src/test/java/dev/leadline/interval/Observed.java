package dev.leadline.interval;

import dev.leadline.estimate.Accumulator;
import java.util.random.RandomGenerator;
import java.util.random.RandomGeneratorFactory;

/// Densities to draw observations from, with random numbers of the Java platform: nothing of ours is in
/// them.
enum Observed {
    NORMAL(0, 1) {
        @Override
        double draw(RandomGenerator random) {
            return random.nextGaussian();
        }
    },
    EXPONENTIAL(1, 1) {
        @Override
        double draw(RandomGenerator random) {
            return random.nextExponential();
        }
    },
    LOGNORMAL_1(Math.exp(.5), Math.sqrt(Math.expm1(1) * Math.E)) {
        @Override
        double draw(RandomGenerator random) {
            return Math.exp(random.nextGaussian());
        }
    },
    LOGNORMAL_2(Math.exp(2), Math.sqrt(Math.expm1(4) * Math.exp(4))) {
        @Override
        double draw(RandomGenerator random) {
            return Math.exp(2 * random.nextGaussian());
        }
    },
    /// Survival `x^-2.5` from 1 on.
    PARETO_2_5(2.5 / 1.5, Math.sqrt(2.5 / .5 - Math.pow(2.5 / 1.5, 2))) {
        @Override
        double draw(RandomGenerator random) {
            return Math.exp(random.nextExponential() / 2.5);
        }
    },
    /// Of infinite variance.
    PARETO_1_5(3, Double.POSITIVE_INFINITY) {
        @Override
        double draw(RandomGenerator random) {
            return Math.exp(random.nextExponential() / 1.5);
        }
    },
    /// 1 in 100 is 1, the others 0.
    BERNOULLI_01(.01, Math.sqrt(.0099)) {
        @Override
        double draw(RandomGenerator random) {
            return random.nextDouble() < .01 ? 1 : 0;
        }
    };

    final double mean;
    final double sd;

    Observed(double mean, double sd) {
        this.mean = mean;
        this.sd = sd;
    }

    abstract double draw(RandomGenerator random);

    double[] draws(RandomGenerator random, int n) {
        var values = new double[n];
        for (int i = 0; i < n; i++) {
            values[i] = draw(random);
        }
        return values;
    }

    static RandomGenerator random(long seed) {
        return RandomGeneratorFactory.of("L64X128MixRandom").create(seed);
    }

    static Accumulator sums(double[]... components) {
        var sums = new Accumulator(components.length);
        sums.add(components, 0, components[0].length);
        return sums;
    }
}
