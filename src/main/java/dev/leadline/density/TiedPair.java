package dev.leadline.density;

/// The correlation of the values of two inputs as a function of that of the normals behind them.
interface TiedPair {
    double RIGHT = Math.PI / 2;
    double CLOSE = 1e-10;
    int TRIALS = 60;

    static TiedPair of(Mixing mixing, Density one, Density other) {
        return SteppedPair.of(mixing, one, other)
                .<TiedPair>map(stepped -> stepped)
                .orElseGet(() -> new PolarPair(mixing, one, other));
    }

    /// At the correlation `sin α` of the normals; rises with it.
    double correlation(double alpha);

    /// Of inputs that fall together as far as they can.
    default double least() {
        return correlation(-RIGHT);
    }

    /// Of inputs that rise together as far as they can.
    default double most() {
        return correlation(RIGHT);
    }

    /// The correlation of the normals for one of the values; `NaN` where it does not lie between the least and the
    /// most. By the rule of false position, halving the weight of an end that stays (Dowell and Jarratt 1971, BIT
    /// 11, 168-174).
    default double latent(double target) {
        double low = -RIGHT;
        double high = RIGHT;
        double below = least() - target;
        double above = most() - target;
        if (!(below <= 0 && above >= 0)) {
            return Double.NaN;
        }
        double alpha = 0;
        int stayed = 0;
        for (int trial = 0; trial < TRIALS && high - low > CLOSE; trial++) {
            alpha = low - below * (high - low) / (above - below);
            double miss = correlation(alpha) - target;
            if (Math.abs(miss) < CLOSE) {
                break;
            }
            if (miss < 0) {
                low = alpha;
                below = miss;
                above *= stayed < 0 ? 0.5 : 1;
                stayed = -1;
            } else {
                high = alpha;
                above = miss;
                below *= stayed > 0 ? 0.5 : 1;
                stayed = 1;
            }
        }
        return StrictMath.sin(alpha);
    }
}
