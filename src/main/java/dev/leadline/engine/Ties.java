package dev.leadline.engine;

import dev.leadline.density.Copula;
import dev.leadline.density.Mixing;
import dev.leadline.model.Dependence;
import dev.leadline.model.Input;
import dev.leadline.model.Question;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/// Where the coordinates of a layout go: one for each input of the question, tied where they are tied. Immutable.
///
/// Tied inputs that are drawn from another density come first in the copula: the others are what they are when those
/// are given.
final class Ties {
    private final List<String> coordinates;
    private final Optional<Copula> copula;

    /// Coordinates of the layout that are those of the copula.
    private final int[] tied;

    private final int[] proposed;

    /// @param others inputs that are drawn from other densities
    Ties(Question question, Set<Integer> others) {
        int inputs = question.inputs().size();
        List<Integer> among = question.dependence().map(Dependence::inputs).orElse(List.of());
        List<Integer> order = Stream.concat(
                        among.stream().filter(others::contains), among.stream().filter(j -> !others.contains(j)))
                .toList();
        this.proposed = order.stream()
                .filter(others::contains)
                .mapToInt(Integer::intValue)
                .toArray();
        this.copula = question.dependence()
                .map(Dependence::copula)
                .map(c -> proposed.length == 0 ? c : reordered(c, among, order));
        boolean isMixed = copula.map(Copula::mixing).filter(Mixing::isRandom).isPresent();
        this.coordinates = Stream.concat(
                        question.inputs().stream().map(Input::name),
                        isMixed ? Stream.of(Copula.COORDINATE) : Stream.empty())
                .toList();
        this.tied = IntStream.concat(
                        order.stream().mapToInt(Integer::intValue), isMixed ? IntStream.of(inputs) : IntStream.empty())
                .toArray();
    }

    private static Copula reordered(Copula copula, List<Integer> from, List<Integer> to) {
        int[] places = to.stream().mapToInt(from::indexOf).toArray();
        return new Copula(copula.mixing(), copula.correlations().of(places));
    }

    /// Tied inputs that are drawn from another density, in the order of the copula.
    int[] proposed() {
        return proposed.clone();
    }

    /// The copula of those alone.
    Copula first() {
        Copula all = copula.orElseThrow();
        return new Copula(
                all.mixing(),
                all.correlations().of(IntStream.range(0, proposed.length).toArray()));
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
    ///
    /// @param points those of the inputs that are [#proposed] hold the independent normals behind their values
    void tie(double[][] points, boolean[] wanted, int rows) {
        copula.ifPresent(c -> {
            double[][] u = Arrays.stream(tied).mapToObj(j -> points[j]).toArray(double[][]::new);
            boolean[] others = ofTied(Arrays.copyOf(wanted, coordinates.size()));
            Arrays.fill(others, 0, proposed.length, false);
            c.tie(u, others, rows, proposed.length);
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
