package dev.leadline.estimate;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;

/// What pilot draws found of an outcome before a run, and the run then takes as given: where its middle lies, near what
/// the quantile is, and between what values outcomes are to be kept one by one. Being the same for every observation it
/// leaves them independent, and no answer is biased by it.
///
/// @param draws pilot draws behind it
/// @param from,to least and greatest outcome of the pilot draws; `NaN` where none was finite
/// @param centre the mean of the pilot draws
/// @param level near the quantile that is asked for; `NaN` where none is
/// @param windows where outcomes are kept, from low to high; none where only moments count
/// @param sight where a picture shows outcomes: most of them, and well beyond a quantile that is asked for
public record Landmark(
        int draws, double from, double to, double centre, double level, List<Window> windows, Sight sight) {
    /// Standard errors of the pilot's shares, on either side of what is sought, that a window reaches.
    private static final double REACH = 8;

    /// Of a thing asked of which nothing need be known beforehand.
    public static final Landmark NONE =
            new Landmark(0, Double.NaN, Double.NaN, 0, Double.NaN, List.of(), new Sight(Double.NaN, Double.NaN));

    public Landmark {
        windows = List.copyOf(windows);
    }

    /// A stretch of outcomes.
    ///
    /// @param low `NaN` where there are none
    public record Sight(double low, double high) {
        /// Share of the outcomes on either side that may lie outside.
        private static final double RARE = .002;

        /// Of the length of the rest: a side no longer than this is shown to its end.
        private static final double SHORT = .75;

        /// Of the part beyond a quantile that is asked for, what may lie outside.
        private static final double BEYOND = .1;

        private static Sight of(Weighed sorted, Estimand estimand) {
            double rare = switch (estimand) {
                case Estimand.Quantile(double at) -> Math.min(RARE, BEYOND * Math.min(at, 1 - at));
                case Estimand.TailMean(double at) -> Math.min(RARE, BEYOND * (1 - at));
                case Estimand.Distribution(double coverage) -> Math.min(RARE, BEYOND * (1 - coverage));
                case Estimand.Mean _,
                        Estimand.Integral _,
                        Estimand.Probability _,
                        Estimand.Ratio _,
                        Estimand.StandardDeviation _ -> RARE;
            };
            double from = sorted.value(0);
            double to = sorted.value(sorted.size() - 1);
            double low = sorted.reach(rare, 0);
            double high = sorted.reach(1 - rare, 0);
            double near = high > low ? SHORT * (high - low) : Double.POSITIVE_INFINITY;
            return new Sight(from >= low - near ? from : low, to <= high + near ? to : high);
        }
    }

    /// Outcomes that are kept: `low <= x <= high`.
    ///
    /// @param binsFrom,binsTo finite numbers between which kept values are sorted into bins of one width
    public record Window(double low, double high, double binsFrom, double binsTo) {}

    /// The same for outcomes that are all kept.
    public Landmark keepingAll() {
        double low = Double.isNaN(from) ? 0 : from;
        double high = Double.isNaN(to) ? 0 : to;
        return with(List.of(new Window(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, low, high)));
    }

    /// The same with other windows.
    Landmark with(List<Window> others) {
        return new Landmark(draws, from, to, centre, level, others, sight);
    }

    /// So many pilot draws show what the estimand needs: 200 beyond a quantile, as far as a million draws have
    /// them, and so many that few outcomes lie near it.
    public static int pilotDraws(Estimand estimand) {
        return switch (estimand) {
            case Estimand.Quantile(double at) -> beyond(at);
            case Estimand.TailMean(double at) -> beyond(at);
            case Estimand.Distribution _ -> MANY;
            case Estimand.Mean _,
                    Estimand.Integral _,
                    Estimand.Probability _,
                    Estimand.Ratio _,
                    Estimand.StandardDeviation _ -> FEWEST;
        };
    }

    private static final int FEWEST = 4096;
    private static final int LARGEST = 1 << 20;

    /// Windows about a quantile are the narrower the more there are.
    private static final int MANY = 1 << 15;

    private static final double BEYOND = 200;

    /// With fewer pilot draws beyond it, the end of a window is no number.
    private static final double BEYOND_END = 10;

    private static int beyond(double at) {
        return (int) Math.clamp(Math.ceil(BEYOND / Math.min(at, 1 - at)), MANY, LARGEST);
    }

    /// @param outcomes of pilot draws; those that are not finite count nothing
    /// @param weights of the same draws
    public static Landmark of(Estimand estimand, double[] outcomes, double[] weights) {
        var sorted = Weighed.of(outcomes, weights);
        if (sorted.size() == 0) {
            return new Landmark(
                    outcomes.length,
                    Double.NaN,
                    Double.NaN,
                    0,
                    0,
                    everything(estimand, 0, 0),
                    new Sight(Double.NaN, Double.NaN));
        }
        double from = sorted.value(0);
        double to = sorted.value(sorted.size() - 1);
        double centre = sorted.mean();
        var sight = Sight.of(sorted, estimand);
        return switch (estimand) {
            case Estimand.Quantile(double at) -> near(outcomes.length, sorted, from, to, centre, at, sight);
            case Estimand.TailMean(double at) -> near(outcomes.length, sorted, from, to, centre, at, sight);
            case Estimand.Distribution(double coverage) -> {
                double low = sorted.reach(1 - coverage, REACH);
                double high = sorted.reach(coverage, -REACH);
                yield new Landmark(
                        outcomes.length,
                        from,
                        to,
                        centre,
                        Double.NaN,
                        low >= high
                                ? everything(estimand, from, to)
                                : List.of(
                                        new Window(Double.NEGATIVE_INFINITY, low, from, low),
                                        new Window(high, Double.POSITIVE_INFINITY, high, to)),
                        sight);
            }
            case Estimand.Mean _,
                    Estimand.Integral _,
                    Estimand.Probability _,
                    Estimand.Ratio _,
                    Estimand.StandardDeviation _ ->
                new Landmark(outcomes.length, from, to, centre, Double.NaN, List.of(), sight);
        };
    }

    private static List<Window> everything(Estimand estimand, double from, double to) {
        return switch (estimand) {
            case Estimand.Quantile _, Estimand.TailMean _, Estimand.Distribution _ ->
                List.of(new Window(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, from, to));
            case Estimand.Mean _,
                    Estimand.Integral _,
                    Estimand.Probability _,
                    Estimand.Ratio _,
                    Estimand.StandardDeviation _ -> List.of();
        };
    }

    private static Landmark near(
            int draws, Weighed sorted, double from, double to, double centre, double at, Sight sight) {
        double low = sorted.reach(at, -REACH);
        double high = sorted.reach(at, REACH);
        return new Landmark(
                draws,
                from,
                to,
                centre,
                sorted.reach(at, 0),
                List.of(new Window(low, high, Math.max(low, from), Math.min(high, to))),
                sight);
    }

    /// Pilot outcomes in rising order with their weights.
    private record Weighed(double[] values, double[] weights, double[] above, int draws) {
        static Weighed of(double[] outcomes, double[] weights) {
            return Arrays.stream(weights).allMatch(w -> w == 1) ? ofEqual(outcomes) : ofWeighted(outcomes, weights);
        }

        private static Weighed ofEqual(double[] outcomes) {
            double[] values =
                    Arrays.stream(outcomes).filter(Double::isFinite).sorted().toArray();
            double[] sizes = new double[values.length];
            Arrays.fill(sizes, 1);
            return of(values, sizes, outcomes.length);
        }

        private static Weighed ofWeighted(double[] outcomes, double[] weights) {
            int[] order = IntStream.range(0, outcomes.length)
                    .filter(i -> Double.isFinite(outcomes[i]) && weights[i] > 0)
                    .boxed()
                    .sorted(Comparator.comparingDouble(i -> outcomes[i]))
                    .mapToInt(Integer::intValue)
                    .toArray();
            return of(
                    Arrays.stream(order).mapToDouble(i -> outcomes[i]).toArray(),
                    Arrays.stream(order).mapToDouble(i -> weights[i]).toArray(),
                    outcomes.length);
        }

        /// @param values in rising order
        private static Weighed of(double[] values, double[] sizes, int draws) {
            double[] above = new double[values.length];
            double sum = 0;
            for (int i = values.length - 1; i >= 0; i--) {
                above[i] = sum;
                sum += sizes[i];
            }
            for (int i = 0; i < above.length; i++) {
                above[i] /= sum;
                sizes[i] /= sum;
            }
            return new Weighed(values, sizes, above, draws);
        }

        int size() {
            return values.length;
        }

        double value(int i) {
            return values[i];
        }

        double mean() {
            double mean = 0;
            for (int i = 0; i < values.length; i++) {
                mean = Math.fma(weights[i], values[i], mean);
            }
            return mean;
        }

        /// Where the share of the outcomes below is `at`, moved by so many of its standard errors; infinite where
        /// the pilot draws do not reach so far.
        double reach(double at, double errors) {
            double squares = 0;
            boolean upper = at >= 0.5;
            for (int i = 0; i < values.length; i++) {
                boolean beyond = upper ? above[i] + weights[i] <= 1 - at : 1 - above[i] <= at;
                squares += beyond ? weights[i] * weights[i] : 0;
            }
            double tail = Math.min(at, 1 - at);
            double error = Math.sqrt(Math.max(squares, tail * (1 - tail) / draws));
            double wanted = at + errors * error;
            if (errors != 0 && Math.min(wanted, 1 - wanted) * draws < BEYOND_END) {
                return wanted < 0.5 ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY;
            }
            int i = 0;
            while (i < values.length - 1 && 1 - above[i] < wanted) {
                i++;
            }
            return values[i];
        }
    }
}
