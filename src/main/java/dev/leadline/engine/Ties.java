package dev.leadline.engine;

import dev.leadline.density.Copula;
import dev.leadline.density.Mixing;
import dev.leadline.model.Dependence;
import dev.leadline.model.Input;
import dev.leadline.model.Question;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/// Where the coordinates of a layout go: one for each input of the question, tied where they are tied. Immutable.
final class Ties {
    private final List<String> coordinates;
    private final Optional<Copula> copula;

    /// Coordinates of the layout that are those of the copula.
    private final int[] tied;

    Ties(Question question) {
        int inputs = question.inputs().size();
        this.copula = question.dependence().map(Dependence::copula);
        boolean isMixed = copula.map(Copula::mixing).filter(Mixing::isRandom).isPresent();
        this.coordinates = Stream.concat(
                        question.inputs().stream().map(Input::name),
                        isMixed ? Stream.of(Copula.COORDINATE) : Stream.empty())
                .toList();
        this.tied = IntStream.concat(
                        question.dependence().stream()
                                .flatMap(d -> d.inputs().stream())
                                .mapToInt(Integer::intValue),
                        isMixed ? IntStream.of(inputs) : IntStream.empty())
                .toArray();
    }

    /// Names of those a layout has: the inputs, and behind them what mixes, where that is random.
    List<String> coordinates() {
        return coordinates;
    }

    /// The coordinates that the wanted inputs are made of.
    boolean[] behind(boolean[] wanted) {
        boolean[] behind = Arrays.copyOf(wanted, coordinates.size());
        copula.ifPresent(c -> {
            boolean[] needed = c.behind(ofTied(behind));
            for (int k = 0; k < tied.length; k++) {
                behind[tied[k]] |= needed[k];
            }
        });
        return behind;
    }

    /// Ties the wanted inputs, in place; coordinates that are behind them only become scratch.
    void tie(double[][] points, boolean[] wanted, int rows) {
        copula.ifPresent(c -> {
            double[][] u = Arrays.stream(tied).mapToObj(j -> points[j]).toArray(double[][]::new);
            c.tie(u, ofTied(Arrays.copyOf(wanted, coordinates.size())), rows);
        });
    }

    private boolean[] ofTied(boolean[] wanted) {
        boolean[] some = new boolean[tied.length];
        for (int k = 0; k < tied.length; k++) {
            some[k] = wanted[tied[k]];
        }
        return some;
    }
}
