package dev.leadline.benchmark;

/// One way to estimate the mean of an integrand on one thread.
interface Contestant {
    Found run(int integrand, int draws);

    /// What a run came to, so that a fast wrong answer is noticed.
    record Found(double mean, double standardError) {
        /// Whether it agrees with another value, itself known to a standard error; false for `NaN`.
        boolean agrees(double value, double error) {
            return Math.abs(mean - value) <= 5 * Math.sqrt(standardError * standardError + error * error);
        }
    }
}
