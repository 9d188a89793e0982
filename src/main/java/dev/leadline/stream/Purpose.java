package dev.leadline.stream;

/// What random numbers are drawn for; numbers of different purposes are independent.
public enum Purpose {
    /// Draws that enter a result.
    RUN(1),
    /// Draws that show what correlation tied inputs have.
    DEPENDENCE(2),
    /// Draws that take as long as others, for the clock.
    TIMING(5),
    /// Draws that say which scheme to recommend.
    PILOT(6),
    /// Draws that the densities to draw from are found by.
    TUNING(10),
    /// Draws that show how the draws of a pass are best shared among its cells.
    ALLOCATION(11),
    /// Draws from the inputs' own densities that an answer by others is compared with.
    AUDIT(12),
    /// Draws from the observations themselves, of which an interval is made.
    BOOTSTRAP(16),
    /// Draws that show where outcomes lie, before a run.
    LANDMARK(17),
    /// Draws of repetitions, which show whether intervals hold.
    REHEARSAL(20),
    /// Draws that say how many draws a run is to have.
    FIRST_STAGE(21);

    private final int number;

    Purpose(int number) {
        this.number = number;
    }

    /// Stands for the purpose in the address: a recorded run keeps its digits only as long as this never changes.
    int number() {
        return number;
    }
}
