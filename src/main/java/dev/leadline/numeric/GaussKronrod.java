package dev.leadline.numeric;

/// Kronrod's rule of 15 points on `[-1, 1]`, and Gauss's of 7 on every second of them. How far the two
/// differ bounds the error of the former wherever the function is smooth, generously.
///
/// Source: Kronrod (1965), Nodes and Weights of Quadrature Formulas; digits after Piessens and others
/// (1983), QUADPACK.
public final class GaussKronrod {
    private static final double[] HALF_NODES = {
        0.991455371120812639206854697526329,
        0.949107912342758524526189684047851,
        0.864864423359769072789712788640926,
        0.741531185599394439863864773280788,
        0.586087235467691130294144258891,
        0.405845151377397166906606412076961,
        0.207784955007898467600689403773245,
        0
    };

    private static final double[] HALF_KRONROD = {
        0.022935322010529224963732008058970,
        0.063092092629978553290700663189204,
        0.104790010322250183839876322541518,
        0.140653259715525918745189590510238,
        0.169004726639267902826583426598550,
        0.190350578064785409913256402421014,
        0.204432940075298892414161999234649,
        0.209482141084727828012999174891714
    };

    private static final double[] HALF_GAUSS = {
        0,
        0.129484966168869693270611432679082,
        0,
        0.279705391489276667901467771423780,
        0,
        0.381830050505118944950369775488975,
        0,
        0.417959183673469387755102040816327
    };

    public static final int POINTS = 15;

    private static final double[] TO_END = toEnd();

    private GaussKronrod() {}

    /// Lagrange's coefficients of the nodes for the value at -1.
    private static double[] toEnd() {
        double[] coefficients = new double[POINTS];
        for (int i = 0; i < POINTS; i++) {
            double product = 1;
            for (int j = 0; j < POINTS; j++) {
                if (j != i) {
                    product *= (-1 - node(j)) / (node(i) - node(j));
                }
            }
            coefficients[i] = product;
        }
        return coefficients;
    }

    /// How much the `i`-th node counts in the value that the polynomial through all has at -1; at 1 its
    /// mirror image does.
    public static double toEnd(int i) {
        return TO_END[i];
    }

    /// Between an end and the node next to it.
    public static double gap() {
        return 1 - HALF_NODES[0];
    }

    /// The `i`-th node, rising.
    public static double node(int i) {
        return i < 8 ? -HALF_NODES[i] : HALF_NODES[POINTS - 1 - i];
    }

    /// Kronrod's weight of the `i`-th node.
    public static double kronrod(int i) {
        return HALF_KRONROD[Math.min(i, POINTS - 1 - i)];
    }

    /// Gauss's weight of the `i`-th node; 0 where it has none.
    public static double gauss(int i) {
        return HALF_GAUSS[Math.min(i, POINTS - 1 - i)];
    }
}
