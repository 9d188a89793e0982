package dev.leadline.planted.numeric;

/// Calls a function whose bits may differ between machines; `StrictMath` and `Math.sqrt` beside it are allowed.
final class CallsSin {
    private CallsSin() {}

    static double wave(double x) {
        return Math.sin(x) + StrictMath.sin(x) + Math.sqrt(x) + Math.fma(x, x, x);
    }
}
