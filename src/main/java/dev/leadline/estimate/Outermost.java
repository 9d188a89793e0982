package dev.leadline.estimate;

import java.util.List;

/// What the outermost draws of a run say of each component of an observation, draw by draw. Immutable:
/// nobody changes the arrays in it.
///
/// @param draws seen
/// @param components of an observation; those that are not looked at are [#UNSEEN]
public record Outermost(long draws, List<Component> components) {
    /// Of a component that is not looked at.
    public static final Component UNSEEN =
            new Component(0, 0, 0, 0, Double.NaN, new double[0], TailIndex.NONE, TailIndex.NONE);

    public Outermost {
        components = List.copyOf(components);
    }

    /// @param nonzero draws whose value is neither 0 nor not finite
    /// @param size sum of the sizes of the values
    /// @param squares sum of their squares
    /// @param ownSquares sum of the squares of outcomes, each by its weight alone; 0 where draws have none
    /// @param largest size among them
    /// @param greatest values of the last component, that of weights, the greatest first
    /// @param above tail of the values
    /// @param below tail of the values with the other sign
    public record Component(
            long nonzero,
            double size,
            double squares,
            double ownSquares,
            double largest,
            double[] greatest,
            TailIndex above,
            TailIndex below) {
        /// Whether there is a draw that was looked at, other than 0.
        public boolean isSeen() {
            return nonzero > 0;
        }

        /// The share of the sum of all sizes that the largest has; `NaN` where all are 0.
        public double largestShare() {
            return largest / size;
        }

        /// How many equal values would estimate their mean as well: the square of the sum of sizes over that of
        /// squares.
        public double effective() {
            return size * (size / squares);
        }

        /// The heavier of both tails.
        public TailIndex tail() {
            return !below.exists() || above.shape() >= below.shape() ? above : below;
        }
    }

    public Component of(int component) {
        return components.get(component);
    }

    /// The mean square that an outcome has where nothing is weighted, as far as weighted draws tell.
    public double ownSquare(int component) {
        return of(component).ownSquares() / weights().size();
    }

    /// That of the weights.
    public Component weights() {
        return components.getLast();
    }
}
