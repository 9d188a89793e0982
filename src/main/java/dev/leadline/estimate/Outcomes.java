package dev.leadline.estimate;

import dev.leadline.estimate.Landmark.Window;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.LongUnaryOperator;
import java.util.stream.IntStream;

/// The outcomes of one thing asked, of all items merged so far: what a quantile, a tail mean or a distribution is read
/// from. Confined to the thread that merges items.
///
/// Its memory does not grow beyond a cap: see [InOrder].
public final class Outcomes {
    /// Outcomes kept one by one, of each window: 32 MB.
    public static final long MOST_KEPT = 4_000_000;

    private static final int PLACES = 9;
    private static final double OFTEN = 2;

    private final Landmark landmark;
    private final boolean weighted;
    /// Of each window; then those of further passes over the same draws.
    private final List<InOrder> ranks;

    private final Histogram histogram;
    private final List<Place> open = new ArrayList<>();
    private final Map<Double, CoverageIntervals> coverage = new HashMap<>();
    private long draws;
    private double weight;
    private long looked;
    private Optional<Jump> jump = Optional.empty();
    private boolean settled;

    /// @param weighted whether draws have weights of their own
    /// @param most outcomes to keep of each window
    public Outcomes(Landmark landmark, boolean weighted, long most) {
        this.landmark = landmark;
        this.weighted = weighted;
        this.ranks = new ArrayList<>(landmark.windows().stream()
                .map(window -> new InOrder(window, weighted, most))
                .toList());
        this.histogram = new Histogram(landmark.sight().low(), landmark.sight().high());
    }

    public void merge(Catch item) {
        settled = false;
        for (int i = 0; i < ranks.size(); i++) {
            ranks.get(i).merge(item.caught().get(i));
        }
        histogram.merge(item.histogram());
        draws += item.draws();
        weight += item.weight();
    }

    public Landmark landmark() {
        return landmark;
    }

    public boolean isWeighted() {
        return weighted;
    }

    /// Whether no more outcomes are to come, so that what takes long may be made of them.
    public boolean isSettled() {
        return settled;
    }

    /// Finite outcomes.
    public long draws() {
        return draws;
    }

    /// What they weigh.
    public double weight() {
        return weight;
    }

    /// A copy.
    public Histogram histogram() {
        return histogram.copy();
    }

    /// What is known of an outcome by its rank or by what lies beyond it.
    ///
    /// @param low not above it
    /// @param high not below it; equal to `low` where it is known
    public record Place(double low, double high) {
        static final Place ANYWHERE = new Place(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);

        public boolean isFound() {
            return low == high;
        }

        /// Somewhere in between, to be shown until it is known.
        public double value() {
            return low == high
                    ? low
                    : Double.isInfinite(low) ? high : Double.isInfinite(high) ? low : low + (high - low) / 2;
        }

        private Place and(Place other) {
            return new Place(Math.max(low, other.low), Math.min(high, other.high));
        }
    }

    /// The outcome of rank `rank` among all that count 1 each, from 1.
    public Place ranked(long rank) {
        return noted(place(rank));
    }

    private Place place(long rank) {
        Place place = Place.ANYWHERE;
        for (InOrder within : ranks) {
            place = place.and(within.at(rank));
        }
        return place;
    }

    private Place noted(Place place) {
        if (!place.isFound()) {
            open.add(place);
        }
        return place;
    }

    /// The smallest outcome that is not exceeded with probability `at`: of draws that count 1 each by its rank, of
    /// others by the weights on the light side of it.
    ///
    /// @param total what all draws weigh: their number, or the sum of weights that are known up to a factor
    public Place quantile(double at, double total) {
        if (draws == 0) {
            return new Place(Double.NaN, Double.NaN);
        }
        return weighted ? noted(place(at, total)) : ranked(Quantile.rank(draws, at));
    }

    private Place place(double at, double total) {
        Place place = Place.ANYWHERE;
        for (InOrder within : ranks) {
            place = place.and(at >= 0.5 ? within.withAbove(Quantile.above(at) * total) : within.withUpTo(at * total));
        }
        return place;
    }

    /// Few values near a quantile, of which each is many outcomes: its level lies at a jump of the distribution
    /// function, as far as two standard errors tell.
    public record Jump(double low, double high) {}

    /// Of draws that count 1 each. Looked for where there are twice the draws of the last time, and at the
    /// end.
    public Optional<Jump> jump(double at) {
        if (!weighted && draws > 0 && draws >= OFTEN * looked) {
            looked = draws;
            jump = findJump(at);
        }
        return jump;
    }

    /// A value that holds a third of the ranks about the quantile, but not all of them.
    private Optional<Jump> findJump(double at) {
        long rank = Quantile.rank(draws, at);
        double reach = 2 * Math.sqrt(draws * at * (1 - at));
        if (reach < PLACES || rank - reach < 1 || rank + reach > draws) {
            return Optional.empty();
        }
        double[] places = new double[PLACES];
        Arrays.setAll(places, i -> known(Math.round(rank + reach * (2.0 * i / (PLACES - 1) - 1))));
        boolean isHeld = IntStream.range(2, PLACES).anyMatch(i -> places[i] == places[i - 2]);
        return isHeld && places[0] < places[PLACES - 1]
                ? Optional.of(new Jump(places[0], places[PLACES - 1]))
                : Optional.empty();
    }

    private double known(long rank) {
        Place place = place(rank);
        return place.isFound() ? place.value() : Double.NaN;
    }

    /// By how much outcomes exceed `x`, summed by their weights; `NaN` where `x` is not near the quantile.
    public double excessOver(double x) {
        return ranks.reversed().stream()
                .mapToDouble(within -> within.excessOver(x))
                .filter(over -> !Double.isNaN(over))
                .findFirst()
                .orElse(Double.NaN);
    }

    /// Outcomes in the lowest and in the highest window, each in order, where all are kept and count 1 each.
    public Optional<List<double[]>> ends() {
        var sorted = ranks.stream().map(InOrder::sorted).toList();
        return sorted.stream().allMatch(Optional::isPresent)
                ? Optional.of(sorted.stream().map(Optional::orElseThrow).toList())
                : Optional.empty();
    }

    /// Takes in what a further pass over the same draws, with other windows, has found.
    public void refine(Outcomes pass) {
        ranks.addAll(pass.ranks);
        settle();
    }

    /// The landmark for a further pass over the same draws, which finds the places that were asked for and are not
    /// known; itself where there are none.
    public Landmark narrowed() {
        var windows = new ArrayList<Window>();
        open.stream()
                .filter(place -> place.low() < place.high())
                .distinct()
                .forEach(place -> windows.add(new Window(
                        place.low(),
                        place.high(),
                        Math.max(place.low(), Math.min(landmark.from(), place.high())),
                        Math.min(place.high(), Math.max(landmark.to(), place.low())))));
        return landmark.with(windows);
    }

    /// Whether a further pass has something to find.
    public boolean isOpen() {
        return open.stream().anyMatch(place -> place.low() < place.high());
    }

    /// Forgets which places were asked for, and what may be out of date.
    public void settle() {
        settled = true;
        open.clear();
        looked = 0;
        coverage.forEach((_, intervals) -> intervals.forget());
    }

    /// The distribution's coverage intervals: its ends are places as others are.
    ///
    /// @param standardUncertainty goes with them
    ///
    /// @param part of the outcomes that the intervals hold
    /// @param reach ranks from one end of them to the other, of so many outcomes
    public Coverage coverage(double part, LongUnaryOperator reach, double standardUncertainty) {
        var found = coverage.computeIfAbsent(part, _ -> new CoverageIntervals(this, part, reach))
                .find();
        return new Coverage(
                part,
                standardUncertainty,
                found.low().value(),
                found.high().value(),
                found.shortestLow(),
                found.shortestHigh());
    }

    /// Ends of the bins of the lowest window.
    List<Step> lowSteps() {
        return ranks.getFirst().steps();
    }

    /// An outcome and its rank.
    record Step(long rank, double value) {}

    /// About the outcome of this rank; nobody will look for it again.
    double near(long rank) {
        return place(rank).value();
    }

    /// About the quantile; nobody will look for it again.
    double nearShare(double at, double total) {
        return place(at, total).value();
    }
}
