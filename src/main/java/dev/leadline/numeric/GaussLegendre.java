package dev.leadline.numeric;

/// The rule of Gauss and Legendre on `[-1, 1]`: exact for polynomials of degree `2 n - 1`.
///
/// @param nodes rising
public record GaussLegendre(double[] nodes, double[] weights) {
    /// Nodes by Newton's method on the Legendre polynomial of degree `n`, from `cos(π (k + 3/4) / (n + 1/2))`: Davis
    /// and Rabinowitz, Methods of Numerical Integration.
    public static GaussLegendre of(int n) {
        double[] nodes = new double[n];
        double[] weights = new double[n];
        for (int k = 0; k < n; k++) {
            double x = -StrictMath.cos(Math.PI * (k + 0.75) / (n + 0.5));
            double slope = 1;
            for (int trial = 0; trial < 6; trial++) {
                double before = 1;
                double p = x;
                for (int degree = 2; degree <= n; degree++) {
                    double next = ((2 * degree - 1) * x * p - (degree - 1) * before) / degree;
                    before = p;
                    p = next;
                }
                slope = n * (before - x * p) / (1 - x * x);
                x -= p / slope;
            }
            nodes[k] = x;
            weights[k] = 2 / ((1 - x * x) * slope * slope);
        }
        return new GaussLegendre(nodes, weights);
    }
}
