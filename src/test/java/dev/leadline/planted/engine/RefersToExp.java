package dev.leadline.planted.engine;

import java.util.function.DoubleUnaryOperator;

/// Reaches such a function by a method reference.
final class RefersToExp {
    static final DoubleUnaryOperator GROWTH = Math::exp;

    private RefersToExp() {}
}
