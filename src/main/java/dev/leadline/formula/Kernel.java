package dev.leadline.formula;

/// One operation over a block of draws. Pure; allocates nothing.
@FunctionalInterface
interface Kernel {
    /// @param a first operand, one value for each draw; `b` and `c` the second and third, `null` where there is none
    /// @param k the operand that is one number for the whole block, where this kernel takes one
    /// @param z results; may be an operand where [Operation#inPlace()] says so
    /// @param n number of draws
    void fill(double[] a, double[] b, double[] c, double k, double[] z, int n);
}
