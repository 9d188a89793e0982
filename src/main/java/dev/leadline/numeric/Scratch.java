package dev.leadline.numeric;

/// Working columns of one thread, so that a block kernel allocates nothing.
///
/// A block is worked off in tiles that stay in the first-level cache. The columns are separate arrays, all addressed
/// with the same index: that is the form in which the compiler can prove that nothing overlaps, and so vectorises.
final class Scratch {
    /// Values in one tile.
    static final int TILE = 512;

    private static final ThreadLocal<Scratch> OF_THREAD = ThreadLocal.withInitial(Scratch::new);

    final double[] a = new double[TILE];
    final double[] b = new double[TILE];
    final double[] c = new double[TILE];
    final double[] d = new double[TILE];
    final double[] e = new double[TILE];

    private Scratch() {}

    static Scratch ofThread() {
        return OF_THREAD.get();
    }
}
