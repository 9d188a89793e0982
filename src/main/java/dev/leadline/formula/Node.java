package dev.leadline.formula;

/// A part of an expression. Operands are indices of nodes that stand earlier in the same [Expression].
sealed interface Node {
    record Number(double value) implements Node {}

    /// The column of the input at `index`.
    record Column(int index) implements Node {}

    /// Operands that the operation does not have are -1.
    record Apply(Operation operation, int a, int b, int c) implements Node {}
}
