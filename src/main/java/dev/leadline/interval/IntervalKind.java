package dev.leadline.interval;

import java.util.Arrays;
import java.util.Optional;

/// Which interval a question wants for its answers.
public enum IntervalKind {
    /// The one that suits each answer: exact for chances of independent draws, Student's otherwise.
    AUTO("auto"),
    STUDENT("student"),
    SKEWNESS_CORRECTED("skewness-corrected"),
    CLOPPER_PEARSON("clopper-pearson"),
    WILSON("wilson"),
    HOEFFDING("hoeffding"),
    EMPIRICAL_BERNSTEIN("empirical-bernstein"),
    BOOTSTRAP_T("bootstrap-t");

    private final String word;

    IntervalKind(String word) {
        this.word = word;
    }

    /// Word of the project file and of the commands.
    public String word() {
        return word;
    }

    public static Optional<IntervalKind> of(String word) {
        return Arrays.stream(values()).filter(kind -> kind.word.equals(word)).findFirst();
    }
}
