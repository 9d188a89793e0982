package dev.leadline.ground;

import dev.leadline.ground.Ground.Strength;

/// Whether the first answer agrees with the reference value. Beyond four standard errors chance is no explanation.
final class AgainstReference {
    private static final double LIMIT = 4;

    private AgainstReference() {}

    static Ground judge(Evidence evidence) {
        if (evidence.question().reference().isEmpty()) {
            return Ground.notDone(
                    "reference",
                    "There is no reference value to compare with",
                    "Add a value from a closed form, a finer method or an earlier study");
        }
        var reference = evidence.question().reference().get();
        var answer = evidence.answers().getFirst();
        double error = Math.hypot(answer.standardError(), reference.error());
        double z = (answer.estimate() - reference.value()) / error;
        if (Double.isNaN(z)) {
            return Ground.notDone(
                    "reference",
                    "The reference value cannot be compared yet: the estimate has no standard error",
                    "Make more draws");
        }
        String text = "%s standard errors %s the reference value"
                .formatted(Numbers.ratio(Math.abs(z)), z < 0 ? "below" : "above");
        return Math.abs(z) <= LIMIT
                ? Ground.shown("reference", text)
                : Ground.doubted(
                        "reference",
                        Strength.OBJECTION,
                        text,
                        "Check formula, densities and units, and where the reference value comes from");
    }
}
