package dev.leadline.engine;

import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import java.util.List;

/// One draw looked at again.
///
/// @param inputs values in the order of the question's inputs
/// @param steps values in the order of the steps
/// @param weight what the outcome is multiplied by; 1 where nothing weighs
/// @param outcomes one for each thing asked, before the weight
public record Look(List<Double> inputs, List<Double> steps, double weight, List<Double> outcomes) {
    /// The draw with index `draw` (from 0) of a lane, made again from its address.
    public static Look at(Question question, Lane lane, long seed, long draw) {
        throw new UnsupportedOperationException();
    }

    /// Every input at its median.
    public static Look nominal(Question question) {
        throw new UnsupportedOperationException();
    }
}
