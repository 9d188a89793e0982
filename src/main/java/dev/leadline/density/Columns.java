package dev.leadline.density;

/// Working columns of one thread, so that drawing allocates nothing.
///
/// @param a as long as was asked for, or longer; so is b
record Columns(double[] a, double[] b) {
    private static final ThreadLocal<Columns> OF_THREAD = ThreadLocal.withInitial(() -> Columns.ofLength(1024));

    private static Columns ofLength(int n) {
        return new Columns(new double[n], new double[n]);
    }

    static Columns ofThread(int n) {
        var columns = OF_THREAD.get();
        if (columns.a.length < n) {
            columns = ofLength(n);
            OF_THREAD.set(columns);
        }
        return columns;
    }
}
