package dev.leadline.density;

/// Ties inputs to each other without touching the density of any: independent probabilities in, tied ones out.
/// Immutable, safe for all threads.
///
/// The probabilities become independent normal values, these are combined by the triangular factor of the
/// correlations, multiplied by what the mixing draws, and become probabilities again. So the tie of an input depends
/// on those before it only, and any layout of points will do.
public final class Copula {
    /// Name of the coordinate that the mixing is drawn by: no input can be called so.
    public static final String COORDINATE = "*";

    private static final double SMALLEST = 0x1p-53;
    private static final double LARGEST = 1 - 0x1p-53;

    private final Mixing mixing;
    private final Correlations correlations;
    private final double[][] factor;
    private final Inversion normal = Inversion.of(new Normal(0, 1));

    /// @throws IllegalArgumentException where the correlations are not possible
    public Copula(Mixing mixing, Correlations correlations) {
        this.mixing = mixing;
        this.correlations = correlations;
        this.factor = correlations.factor().orElseThrow(() -> new IllegalArgumentException("no " + correlations));
    }

    public Mixing mixing() {
        return mixing;
    }

    public Correlations correlations() {
        return correlations;
    }

    /// How many probabilities a draw takes: one for each input and, last, one for the mixing where that is random.
    public int coordinates() {
        return factor.length + (mixing.isRandom() ? 1 : 0);
    }

    /// The coordinates that the wanted inputs are made of.
    public boolean[] behind(boolean[] wanted) {
        boolean[] behind = new boolean[coordinates()];
        for (int i = 0; i < factor.length; i++) {
            for (int j = 0; j <= i; j++) {
                behind[j] |= wanted[i] && factor[i][j] != 0;
            }
            behind[behind.length - 1] |= wanted[i] && mixing.isRandom();
        }
        return behind;
    }

    /// Replaces independent probabilities of the wanted inputs by tied ones, from `2^-53` to `1 - 2^-53`; all else in
    /// `u` is scratch.
    ///
    /// @param u one array for each coordinate, at least `rows` long; `null` for one that is not [behind][#behind]
    public void tie(double[][] u, boolean[] wanted, int rows) {
        tie(u, wanted, rows, 0);
    }

    /// The same, where some inputs have their values already.
    ///
    /// @param given so many of the first arrays hold what [#untie] made of normals of theirs, not probabilities
    public void tie(double[][] u, boolean[] wanted, int rows, int given) {
        for (int i = given; i < factor.length; i++) {
            if (u[i] != null) {
                normal.fill(u[i], u[i], rows);
            }
        }
        double[] factors = mixing.isRandom() ? u[factor.length] : null;
        if (factors != null) {
            mixing.factors(factors, rows);
        }
        // From the last: those before it are still as they were.
        for (int i = factor.length - 1; i >= 0; i--) {
            if (wanted[i]) {
                combine(u, i, rows);
                if (factors != null) {
                    multiply(u[i], factors, rows);
                }
                mixing.probabilities(u[i], rows);
                clamp(u[i], rows);
            }
        }
    }

    /// Replaces tied normals of the first inputs by the independent ones that they are combined of.
    ///
    /// @param z one array for each of them
    public void untie(double[][] z, int rows) {
        for (int i = 0; i < z.length; i++) {
            for (int j = 0; j < i; j++) {
                add(-factor[i][j], z[j], z[i], rows);
            }
            for (int row = 0; row < rows; row++) {
                z[i][row] /= factor[i][i];
            }
        }
    }

    private void combine(double[][] z, int i, int rows) {
        double[] y = z[i];
        double own = factor[i][i];
        for (int row = 0; row < rows; row++) {
            y[row] *= own;
        }
        for (int j = 0; j < i; j++) {
            double share = factor[i][j];
            if (share != 0) {
                add(share, z[j], y, rows);
            }
        }
    }

    private static void add(double share, double[] z, double[] y, int rows) {
        for (int row = 0; row < rows; row++) {
            y[row] = Math.fma(share, z[row], y[row]);
        }
    }

    private static void multiply(double[] y, double[] factors, int rows) {
        for (int row = 0; row < rows; row++) {
            y[row] *= factors[row];
        }
    }

    private static void clamp(double[] u, int rows) {
        for (int row = 0; row < rows; row++) {
            u[row] = Math.min(Math.max(u[row], SMALLEST), LARGEST);
        }
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Copula copula
                && mixing.equals(copula.mixing)
                && correlations.equals(copula.correlations);
    }

    @Override
    public int hashCode() {
        return 31 * mixing.hashCode() + correlations.hashCode();
    }

    @Override
    public String toString() {
        return mixing.word() + correlations;
    }
}
