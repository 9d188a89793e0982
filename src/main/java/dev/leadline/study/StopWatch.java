package dev.leadline.study;

/// Seconds that pass while it is not paused. Confined to one thread.
final class StopWatch {
    private static final double NANOSECOND = 1e-9;

    private long passed;
    private long since;
    private boolean running;

    void start() {
        since = System.nanoTime();
        running = true;
    }

    void pause() {
        passed += System.nanoTime() - since;
        running = false;
    }

    double seconds() {
        return NANOSECOND * (passed + (running ? System.nanoTime() - since : 0));
    }
}
