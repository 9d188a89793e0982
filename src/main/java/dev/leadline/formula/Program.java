package dev.leadline.formula;

/// Formulas compiled to kernels over blocks of draws. Immutable, safe for all threads.
public final class Program {
    /// Draws in a block at most.
    public static final int BLOCK = 1024;

    /// Scratch of one worker; confined to it.
    public static final class Workspace {
        private Workspace() {}
    }

    private Program() {}

    public int outputs() {
        throw new UnsupportedOperationException();
    }

    /// Whether any output depends on the input at `index`; a column that is not used may be `null`.
    public boolean uses(int index) {
        throw new UnsupportedOperationException();
    }

    public Workspace workspace() {
        throw new UnsupportedOperationException();
    }

    /// @param columns draws, one array for each input, at least `rows` long; not changed
    /// @param rows number of draws, at most [#BLOCK]
    /// @param results one array for each output, at least `rows` long; filled. May not be among the columns
    public void evaluate(double[][] columns, int rows, double[][] results, Workspace workspace) {
        throw new UnsupportedOperationException();
    }
}
