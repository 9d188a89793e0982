package dev.leadline.desktop.working;

import dev.leadline.interval.IntervalKind;
import javafx.util.StringConverter;

/// Kinds of intervals as people say them.
final class IntervalWords extends StringConverter<IntervalKind> {
    @Override
    public String toString(IntervalKind kind) {
        return kind == null
                ? ""
                : switch (kind) {
                    case AUTO -> "the usual interval";
                    case STUDENT -> "Student's";
                    case SKEWNESS_CORRECTED -> "Hall's, for skewness";
                    case CLOPPER_PEARSON -> "Clopper and Pearson's";
                    case WILSON -> "Wilson's";
                    case HOEFFDING -> "Hoeffding's";
                    case EMPIRICAL_BERNSTEIN -> "empirical Bernstein";
                    case BOOTSTRAP_T -> "percentile-t bootstrap";
                };
    }

    /// What an interval takes for granted.
    static String use(IntervalKind kind) {
        return switch (kind) {
            case AUTO ->
                "Suits each answer: exact for chances and quantiles of independent draws, Student's for means.";
            case STUDENT -> "Of a mean whose estimate is nearly normal: many draws, no heavy tail.";
            case SKEWNESS_CORRECTED -> "Of a mean of skewed outcomes: corrected for their third moment.";
            case CLOPPER_PEARSON -> "Of a chance by independent draws: exact, never too short.";
            case WILSON -> "Of a chance by independent draws: shorter than exact, right on average.";
            case HOEFFDING -> "Of a mean between two bounds: assumes nothing else, and is long.";
            case EMPIRICAL_BERNSTEIN ->
                "Of a mean between two bounds: assumes nothing else, and is short where the outcomes vary little.";
            case BOOTSTRAP_T -> "Of a mean by few, skewed observations: found by drawing from them again.";
        };
    }

    @Override
    public IntervalKind fromString(String text) {
        throw new UnsupportedOperationException("kinds are chosen, not typed");
    }
}
