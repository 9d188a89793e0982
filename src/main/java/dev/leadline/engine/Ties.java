package dev.leadline.engine;

import dev.leadline.model.Dependence;
import dev.leadline.model.Input;
import dev.leadline.model.Question;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/// Where the coordinates of a layout go: one for each input of the question, tied where they are tied. Immutable.
final class Ties {
    private final List<String> coordinates;
    private final Optional<Dependence> dependence;
    private final int[] tied;

    Ties(Question question) {
        this.coordinates = question.inputs().stream().map(Input::name).toList();
        this.dependence = question.dependence();
        this.tied = dependence
                .map(d -> d.inputs().stream().mapToInt(Integer::intValue).toArray())
                .orElse(new int[0]);
    }

    /// Names of those a layout has.
    List<String> coordinates() {
        return coordinates;
    }

    /// The coordinates that the wanted inputs are made of.
    boolean[] behind(boolean[] wanted) {
        boolean[] behind = Arrays.copyOf(wanted, coordinates.size());
        dependence.ifPresent(d -> {
            boolean[] needed = d.copula().behind(ofTied(wanted));
            for (int k = 0; k < tied.length; k++) {
                behind[tied[k]] |= needed[k];
            }
        });
        return behind;
    }

    /// Ties the wanted inputs, in place; coordinates that are behind them only become scratch.
    void tie(double[][] points, boolean[] wanted, int rows) {
        if (tied.length > 0) {
            double[][] u = Arrays.stream(tied).mapToObj(j -> points[j]).toArray(double[][]::new);
            dependence.orElseThrow().copula().tie(u, ofTied(wanted), rows);
        }
    }

    private boolean[] ofTied(boolean[] inputs) {
        boolean[] some = new boolean[tied.length];
        for (int k = 0; k < tied.length; k++) {
            some[k] = inputs[tied[k]];
        }
        return some;
    }
}
