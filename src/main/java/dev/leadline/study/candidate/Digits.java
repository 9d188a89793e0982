package dev.leadline.study.candidate;

import java.math.BigDecimal;
import java.math.MathContext;

/// Numbers that a person may come to read in a project.
final class Digits {
    private static final MathContext THREE = new MathContext(3);

    private Digits() {}

    /// As every formula reads it.
    static String plain(double number) {
        return new BigDecimal(Double.toString(number)).toPlainString();
    }

    static double three(double number) {
        return new BigDecimal(number).round(THREE).doubleValue();
    }
}
