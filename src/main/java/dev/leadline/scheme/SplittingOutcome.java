package dev.leadline.scheme;

/// What one repetition of splitting found.
///
/// @param particles that climbed
/// @param end whether they arrived, or why the repetition gave up
/// @param steps replacements: Poisson with mean `-particles ln p` where none were tied and copies moved well. Particles
///     replaced together count for as many as leave the same share, so that [#logShare()] holds in any case.
/// @param tied particles that stood at one level with another, copies that never left their model aside
/// @param drawn points drawn for the start
/// @param drawnFailed those among them that could not be evaluated
/// @param proposals moves tried
/// @param accepted moves made
/// @param proposalsFailed proposals that could not be evaluated
/// @param unmoved copies that never left their model
/// @param ancestors particles of the start that have descendants at the end
/// @param step size of the last moves, above 0, at most 1
public record SplittingOutcome(
        int particles,
        End end,
        double steps,
        long tied,
        long drawn,
        long drawnFailed,
        long proposals,
        long accepted,
        long proposalsFailed,
        long unmoved,
        int ancestors,
        double step) {

    /// Logarithm of 1e-30: below that share of the points a repetition gives up.
    static final double LOG_SMALLEST = -69.07755278982137;

    /// How a repetition ended.
    public enum End {
        ARRIVED("every particle reached the event"),
        NO_VALUE("hardly any point can be evaluated: fewer than 1 in 100"),
        ONE_LEVEL("all particles are equally far from the event and none is nearer: it may be impossible, or does not"
                + " say how far it is from happening"),
        STUCK("no copy of the last particle moved: the event leaves too little room for the moves"),
        TOO_RARE("at a share of 1e-30 of all points the event was not reached: it may be impossible");

        private final String words;

        End(String words) {
            this.words = words;
        }

        /// For a person, without a full stop.
        public String words() {
            return words;
        }
    }

    public boolean arrived() {
        return end == End.ARRIVED;
    }

    /// Natural logarithm of the share of points above the last level; where arrived, of the estimated probability.
    public double logShare() {
        return 0 - steps * -StrictMath.log1p(-1.0 / particles);
    }

    /// Points evaluated, the failed ones among them.
    public long evaluations() {
        return drawn + proposals;
    }

    public long failed() {
        return drawnFailed + proposalsFailed;
    }
}
