package dev.leadline.density;

/// A working column of one thread, so that drawing allocates nothing.
final class Column {
    private static final ThreadLocal<double[]> OF_THREAD = ThreadLocal.withInitial(() -> new double[1024]);

    private Column() {}

    /// @return `n` values or more
    static double[] ofThread(int n) {
        double[] column = OF_THREAD.get();
        if (column.length < n) {
            column = new double[n];
            OF_THREAD.set(column);
        }
        return column;
    }
}
