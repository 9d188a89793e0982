package dev.leadline.scheme;

/// How replicates of a digital point set are randomised.
///
/// Linear matrix scrambling is not among them: its errors have such heavy tails that intervals from few
/// replicates do not keep their level.
public enum Scrambling {
    /// Every digit by the digits before it: Owen (1995), Randomly permuted (t,m,s)-nets and (t,s)-sequences.
    NESTED("nested"),
    /// Every digit alike in all points.
    DIGITAL_SHIFT("digital-shift");

    private final String word;

    Scrambling(String word) {
        this.word = word;
    }

    /// Word of the project file.
    public String word() {
        return word;
    }
}
