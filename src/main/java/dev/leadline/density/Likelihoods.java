package dev.leadline.density;

import static dev.leadline.density.Search.Free.line;
import static dev.leadline.density.Search.Free.positive;

import dev.leadline.density.Search.Free;
import dev.leadline.numeric.Exp;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Shortest;
import dev.leadline.numeric.Significant;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SequencedMap;
import java.util.function.BiFunction;
import java.util.function.Function;

/// How each family is fitted to values by maximum likelihood: in closed form where there is one and no parameter is
/// given, else by a search.
///
/// Closed forms: Johnson, Kotz and Balakrishnan (1994, 1995), Continuous Univariate Distributions. From memory; checked
/// against other programs in `FitsTest`.
final class Likelihoods {

    private static final double EULER = 0.5772156649015329;

    /// Below this shape the likelihood of extreme value and Pareto densities has no regular maximum.
    ///
    /// Source: Smith (1985), Biometrika 72, 67-90.
    private static final double LEAST_SHAPE = -0.5;

    /// What values a family takes.
    private enum Takes {
        ANY,
        POSITIVE,
        COUNTS
    }

    /// @param usual parameters that are not fitted, where nothing else is given
    /// @param closed the fitted parameters
    /// @param search where to begin; gets the values and the parameters that are given
    private record Way(
            Takes takes,
            Map<String, Double> usual,
            Optional<Function<Sample, SequencedMap<String, Double>>> closed,
            BiFunction<Sample, Map<String, Double>, List<Free>> search) {

        static Way closed(Takes takes, Function<Sample, SequencedMap<String, Double>> closed) {
            return new Way(takes, Map.of(), Optional.of(closed), (_, _) -> List.of());
        }

        static Way searched(Takes takes, Function<Sample, List<Free>> search) {
            return new Way(takes, Map.of(), Optional.empty(), (sample, _) -> search.apply(sample));
        }

        /// Above a lower end, 0 unless it is given.
        static Way fromEnd(Function<Sample, List<Free>> search) {
            return new Way(
                    Takes.ANY,
                    Map.of("from", 0.0),
                    Optional.empty(),
                    (sample, fixed) -> search.apply(above(sample, fixed.get("from"))));
        }

        private static Sample above(Sample sample, double from) {
            if (!(sample.least() > from)) {
                throw outside(sample.least(), "greater than " + Shortest.text(from));
            }
            return sample.mapped(x -> x - from);
        }
    }

    private static final Map<String, Way> WAYS = new LinkedHashMap<>();

    static {
        WAYS.put("uniform", Way.closed(Takes.ANY, s -> of("from", s.least(), "to", s.most())));
        WAYS.put("normal", Way.closed(Takes.ANY, s -> of("mean", s.mean(), "sd", s.sd())));
        WAYS.put(
                "lognormal",
                Way.closed(
                        Takes.POSITIVE,
                        s -> of("mu", s.logs().mean(), "sigma", s.logs().sd())));
        WAYS.put(
                "exponential",
                new Way(
                        Takes.ANY,
                        Map.of("from", 0.0),
                        Optional.empty(),
                        (s, fixed) -> List.of(exactly("mean", mean(s, fixed.get("from"))))));
        WAYS.put(
                "laplace",
                Way.closed(Takes.ANY, s -> of("location", s.median(), "scale", s.mean(x -> Math.abs(x - s.median())))));
        WAYS.put(
                "pareto",
                Way.closed(
                        Takes.POSITIVE, s -> of("from", s.least(), "shape", 1 / s.mean(x -> Log.log(x / s.least())))));
        WAYS.put("half-normal", Way.closed(Takes.POSITIVE, s -> of("sigma", Math.sqrt(s.mean(x -> x * x)))));
        WAYS.put("rayleigh", Way.closed(Takes.POSITIVE, s -> of("sigma", Math.sqrt(0.5 * s.mean(x -> x * x)))));
        WAYS.put(
                "inverse-gaussian",
                Way.closed(Takes.POSITIVE, s -> of("mean", s.mean(), "shape", 1 / s.mean(x -> 1 / x - 1 / s.mean()))));
        WAYS.put("gamma", Way.searched(Takes.POSITIVE, Likelihoods::gamma));
        WAYS.put("inverse-gamma", Way.searched(Takes.POSITIVE, s -> {
            var inverse = gamma(s.mapped(x -> 1 / x));
            return List.of(
                    inverse.get(0), positive("scale", 1 / inverse.get(1).of().applyAsDouble(0)));
        }));
        WAYS.put("chi-square", Way.searched(Takes.POSITIVE, s -> List.of(positive("dof", s.mean()))));
        WAYS.put("weibull", Way.fromEnd(s -> smallest(s.logs())));
        WAYS.put("frechet", Way.fromEnd(s -> largest(s.logs())));
        WAYS.put("log-logistic", Way.searched(Takes.POSITIVE, s -> {
            var logs = s.logs();
            return List.of(
                    positive("scale", Exp.exp(logs.median())), positive("shape", Math.PI / Math.sqrt(3) / logs.sd()));
        }));
        WAYS.put("gumbel", Way.searched(Takes.ANY, s -> gumbel(s, 1)));
        WAYS.put("gumbel-min", Way.searched(Takes.ANY, s -> gumbel(s, -1)));
        WAYS.put(
                "logistic",
                Way.searched(
                        Takes.ANY,
                        s -> List.of(
                                line("location", s.mean(), s.sd()),
                                positive("scale", Math.sqrt(3) / Math.PI * s.sd()))));
        WAYS.put(
                "cauchy",
                Way.searched(
                        Takes.ANY,
                        s -> List.of(line("location", s.median(), spread(s)), positive("scale", spread(s)))));
        WAYS.put(
                "student",
                Way.searched(
                        Takes.ANY,
                        s -> List.of(
                                positive("dof", 5),
                                line("location", s.median(), spread(s)),
                                positive("scale", Math.sqrt(.6) * s.sd()))));
        WAYS.put("generalized-extreme-value", Way.searched(Takes.ANY, s -> {
            var start = gumbel(s, 1);
            return List.of(start.get(0), start.get(1), Free.above("shape", LEAST_SHAPE, 0));
        }));
        WAYS.put(
                "generalized-pareto",
                new Way(
                        Takes.ANY,
                        Map.of(),
                        Optional.empty(),
                        (s, fixed) -> List.of(
                                positive("scale", s.mean() - fixed.get("location")),
                                Free.above("shape", LEAST_SHAPE, 0))));
        WAYS.put("beta", new Way(Takes.ANY, Map.of("from", 0.0, "to", 1.0), Optional.empty(), Likelihoods::beta));
        WAYS.put("poisson", Way.closed(Takes.COUNTS, s -> of("mean", s.mean())));
        WAYS.put("geometric", Way.closed(Takes.COUNTS, s -> of("probability", 1 / (1 + s.mean()))));
        WAYS.put(
                "negative-binomial",
                Way.searched(
                        Takes.COUNTS,
                        s -> List.of(
                                positive(
                                        "size",
                                        s.mean() * s.mean() / (Math.max(s.sd() * s.sd() - s.mean(), s.mean() / 100))),
                                exactly("mean", s.mean()))));
    }

    private Likelihoods() {}

    static boolean has(String family) {
        return WAYS.containsKey(family);
    }

    /// @throws Refusal where the family cannot be fitted to these values
    static Fit fit(Fits.Wanted wanted, double[] sorted) {
        Family family = Catalogue.family(wanted.family()).orElseThrow();
        Way way = WAYS.get(wanted.family());
        SequencedMap<String, Double> fixed = new LinkedHashMap<>(way.usual);
        fixed.putAll(wanted.given());
        double[] used = wanted.family().equals("generalized-pareto") ? above(fixed, sorted) : sorted;
        var sample = Sample.of(used);
        refuseOutside(way.takes, sample);
        refuseUnknown(wanted, family);
        if (wanted.given().isEmpty() && way.closed.isPresent()) {
            var parameters = way.closed.get().apply(sample);
            return Fit.of(family.name(), parameters, family.of(parameters), parameters.size(), used);
        }
        List<Free> free = way.search.apply(sample, fixed).stream()
                .filter(one -> !wanted.given().containsKey(one.name()))
                .toList();
        refuseGiven(wanted, free, family);
        var parameters = Search.of(family, fixed, free, used);
        if (parameters.getOrDefault("shape", 1.0) < LEAST_SHAPE + 1e-3) {
            throw new Refusal(Problem.of("the likelihood has no regular maximum")
                    .because(
                            "It grows as the shape falls below -1/2, where the upper end runs into the greatest value.")
                    .tryThis("A density with a known upper end, as beta, may suit."));
        }
        return Fit.of(family.name(), ordered(family, parameters), family.of(parameters), free.size(), used);
    }

    /// The values above the threshold, which must be given.
    private static double[] above(Map<String, Double> given, double[] sorted) {
        Double threshold = given.get("location");
        if (threshold == null) {
            throw new Refusal(Problem.of("its location, the threshold, is not given")
                    .because("It is fitted to what exceeds a threshold; the likelihood cannot choose one.")
                    .tryThis("Write generalized-pareto location=… with a value that few exceed."));
        }
        double[] above = Arrays.stream(sorted).filter(x -> x > threshold).toArray();
        if (Arrays.stream(above).distinct().limit(3).count() < 3) {
            throw new Refusal(Problem.of("too few values exceed %s".formatted(Shortest.text(threshold)))
                    .because("Its scale and shape need at least three different values.")
                    .tryThis("Give a lower location."));
        }
        return above;
    }

    private static void refuseUnknown(Fits.Wanted wanted, Family family) {
        List<String> known =
                family.entries().getFirst().stream().map(Parameter::name).toList();
        for (String name : wanted.given().keySet()) {
            if (!known.contains(name)) {
                throw new Refusal(Problem.of("%s has no parameter %s".formatted(family.name(), name))
                        .because("It is fitted by %s.".formatted(String.join(", ", known))));
            }
        }
    }

    private static void refuseGiven(Fits.Wanted wanted, List<Free> free, Family family) {
        if (free.isEmpty()) {
            throw new Refusal(Problem.of("nothing is left to fit")
                    .because("%s is fitted with no parameter given.".formatted(family.name()))
                    .tryThis("Leave the parameters out."));
        }
    }

    private static void refuseOutside(Takes takes, Sample sample) {
        boolean inside = switch (takes) {
            case ANY -> true;
            case POSITIVE -> sample.least() > 0;
            case COUNTS -> sample.least() >= 0 && sample.isWhole();
        };
        if (!inside) {
            if (takes == Takes.POSITIVE) {
                throw outside(sample.least(), "greater than 0");
            }
            throw new Refusal(Problem.of("the values are not all counts").because("It takes 0, 1, 2 … only."));
        }
    }

    private static Refusal outside(double least, String words) {
        return new Refusal(
                Problem.of("the least value is %s but must be %s".formatted(Significant.text(least, 6), words))
                        .because("The family gives it no density."));
    }

    /// In the order of the family.
    private static SequencedMap<String, Double> ordered(Family family, Map<String, Double> parameters) {
        var ordered = new LinkedHashMap<String, Double>();
        family.entries().getFirst().forEach(known -> {
            if (parameters.containsKey(known.name())) {
                ordered.put(known.name(), parameters.get(known.name()));
            }
        });
        return ordered;
    }

    private static SequencedMap<String, Double> of(Object... namesAndValues) {
        var parameters = new LinkedHashMap<String, Double>();
        for (int i = 0; i < namesAndValues.length; i += 2) {
            parameters.put((String) namesAndValues[i], (Double) namesAndValues[i + 1]);
        }
        return parameters;
    }

    /// A parameter whose best value is known beforehand, whatever the others.
    private static Free exactly(String name, double value) {
        return new Free(name, _ -> value);
    }

    private static double mean(Sample sample, double from) {
        if (!(sample.least() >= from)) {
            throw outside(sample.least(), "at least " + Shortest.text(from));
        }
        return sample.mean() - from;
    }

    private static double spread(Sample sample) {
        return sample.halfWidth() > 0 ? sample.halfWidth() : sample.sd();
    }

    /// Source of the start: Minka (2002), Estimating a gamma distribution. From memory.
    private static List<Free> gamma(Sample s) {
        double d = Log.log(s.mean()) - s.mean(Log::log);
        double shape = (3 - d + Math.sqrt((d - 3) * (d - 3) + 24 * d)) / (12 * d);
        return List.of(positive("shape", shape), positive("scale", s.mean() / shape));
    }

    /// By the moments of the logarithm, which is a smallest value.
    private static List<Free> smallest(Sample logs) {
        double scale = logs.sd() * Math.sqrt(6) / Math.PI;
        return List.of(positive("shape", 1 / scale), positive("scale", Exp.exp(logs.mean() + EULER * scale)));
    }

    private static List<Free> largest(Sample logs) {
        double scale = logs.sd() * Math.sqrt(6) / Math.PI;
        return List.of(positive("shape", 1 / scale), positive("scale", Exp.exp(logs.mean() - EULER * scale)));
    }

    /// @param side 1 for largest values, -1 for smallest
    private static List<Free> gumbel(Sample s, int side) {
        double scale = s.sd() * Math.sqrt(6) / Math.PI;
        return List.of(line("location", s.mean() - side * EULER * scale, scale), positive("scale", scale));
    }

    private static List<Free> beta(Sample s, Map<String, Double> fixed) {
        double from = fixed.get("from");
        double to = fixed.get("to");
        if (!(s.least() > from && s.most() < to)) {
            throw new Refusal(Problem.of("the values reach from %s to %s but must lie between %s and %s"
                            .formatted(
                                    Significant.text(s.least(), 6),
                                    Significant.text(s.most(), 6),
                                    Shortest.text(from),
                                    Shortest.text(to)))
                    .because("The range of a beta density is given, not fitted.")
                    .tryThis("Write beta from=… to=…"));
        }
        var z = s.mapped(x -> (x - from) / (to - from));
        double sum = Math.max(z.mean() * (1 - z.mean()) / (z.sd() * z.sd()) - 1, 0.1);
        return List.of(positive("alpha", z.mean() * sum), positive("beta", (1 - z.mean()) * sum));
    }
}
