package dev.leadline.model;

import dev.leadline.density.Density;
import dev.leadline.density.Shifted;
import dev.leadline.density.Stretches;
import dev.leadline.density.Support;
import dev.leadline.density.Tilted;
import dev.leadline.model.LaneDraft.DrawFrom;
import dev.leadline.model.LaneDraft.Other;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import dev.leadline.scheme.Adaptation;
import dev.leadline.scheme.Proposal;
import dev.leadline.scheme.Share;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SequencedMap;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.function.Supplier;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/// Makes what a lane's inputs are drawn from of its draft.
final class Proposals {
    private static final double USUAL_SHARE = 0.1;

    private final List<Input> inputs;
    private final Optional<Dependence> dependence;
    private final Densities densities;
    private final Findings findings;

    Proposals(List<Input> inputs, Optional<Dependence> dependence, Densities densities, Findings findings) {
        this.inputs = inputs;
        this.dependence = dependence;
        this.densities = densities;
        this.findings = findings;
    }

    /// Empty where inputs are drawn from their own densities.
    ///
    /// @param path of the lane
    Optional<Proposal> of(LaneDraft lane, String path) {
        if (lane.drawFrom().equals(DrawFrom.NOTHING)) {
            alone(lane, path);
            return Optional.empty();
        }
        Share share = share(lane.nominalShare(), path);
        return switch (lane.drawFrom()) {
            case DrawFrom.Adapted _ -> Optional.empty();
            case DrawFrom.Inputs(var others) when isAdapted(others) -> Optional.empty();
            case DrawFrom.Inputs(var others) -> {
                var found = new TreeMap<Integer, Density>();
                var changes = new ArrayList<String>();
                others.forEach((name, other) -> {
                    String place = path + ".drawFrom." + name;
                    index(name, place).ifPresent(j -> {
                        changes.add(inputs.get(j).name() + " " + words(other));
                        density(j, other, place)
                                .filter(density -> isFit(j, density, share, place))
                                .ifPresent(density -> found.put(j, density));
                    });
                });
                checkTies(found, path);
                yield Optional.of(new Proposal(found, share, lane.selfNormalised(), changes));
            }
        };
    }

    /// The wish to find a density before the run; empty where the lane has none.
    Optional<Adaptation> adaptation(LaneDraft lane, String path) {
        return switch (lane.drawFrom()) {
            case DrawFrom.Adapted(String word) ->
                way(word, path)
                        .map(way -> adaptation(
                                way, IntStream.range(0, inputs.size()).boxed(), lane, path));
            case DrawFrom.Inputs(var others)
            when isAdapted(others) -> {
                var named = others.keySet().stream()
                        .flatMap(name -> index(name, path + ".drawFrom." + name).stream())
                        .toList();
                yield Optional.of(adaptation(Adaptation.Way.CROSS_ENTROPY, named.stream(), lane, path));
            }
            case DrawFrom.Inputs _ -> Optional.empty();
        };
    }

    private static boolean isAdapted(SequencedMap<String, Other> others) {
        return !others.isEmpty() && others.values().stream().allMatch(Other.Adapt.class::isInstance);
    }

    private Optional<Adaptation.Way> way(String word, String path) {
        var way = Arrays.stream(Adaptation.Way.values())
                .filter(w -> w.word().equals(word))
                .findFirst();
        if (way.isEmpty()) {
            findings.add(
                    path + ".drawFrom.adapt",
                    "adapt is \"%s\" but must be \"cross-entropy\" or \"grid\"".formatted(word),
                    "It is the way in which a density to draw from is found.");
        }
        return way;
    }

    private Adaptation adaptation(Adaptation.Way way, Stream<Integer> which, LaneDraft lane, String path) {
        if (lane.selfNormalised()) {
            findings.add(
                    path + ".selfNormalised",
                    "selfNormalised beside \"adapt\" is not available",
                    "The density that is found is known with its factor.",
                    "Leave it out.");
        }
        var chosen = which.collect(Collectors.toCollection(TreeSet::new));
        return new Adaptation(way, chosen, share(lane.nominalShare(), path));
    }

    private static String words(Other other) {
        return switch (other) {
            case Other.Another(var draft) -> "from " + DensityWords.of(draft);
            case Other.Shift(double by) -> "shifted by " + Shortest.text(by);
            case Other.Widen(double by) -> "widened " + Shortest.text(by) + " times about its median";
            case Other.Tilt(double by) -> "tilted by " + Shortest.text(by);
            case Other.Adapt _ -> "adapted";
        };
    }

    private void alone(LaneDraft lane, String path) {
        if (lane.nominalShare().isPresent()) {
            findings.add(
                    path + ".nominalShare",
                    "nominalShare has nothing to be a share of",
                    "It is the part of the draws that come from the inputs' own densities although \"drawFrom\" names others.",
                    "Leave it out, or add \"drawFrom\".");
        }
        if (lane.selfNormalised()) {
            findings.add(
                    path + ".selfNormalised",
                    "selfNormalised has no weights to divide by",
                    "Draws are weighted only where \"drawFrom\" names other densities.",
                    "Leave it out, or add \"drawFrom\".");
        }
    }

    private Share share(OptionalDouble given, String path) {
        try {
            return Share.of(given.orElse(USUAL_SHARE));
        } catch (IllegalArgumentException _) {
            findings.add(
                    path + ".nominalShare",
                    "nominalShare is %s but must be a whole number of hundredths below 1"
                            .formatted(Shortest.text(given.orElseThrow())),
                    "So many of every hundred draws come from the inputs' own densities, which keeps weights small.",
                    "Write 0.1 for one in ten.");
            return Share.NONE;
        }
    }

    private Optional<Integer> index(String name, String place) {
        String composed = Workings.composed(name);
        for (int j = 0; j < inputs.size(); j++) {
            if (inputs.get(j).name().equals(composed)) {
                return Optional.of(j);
            }
        }
        Problem problem = Problem.of("there is no input %s to draw".formatted(name))
                .because("drawFrom names inputs of the question.");
        findings.add(
                place,
                Nearest.to(name, inputs.stream().map(Input::name).toList())
                        .map(near -> problem.tryThis("Was %s meant?".formatted(near)))
                        .orElse(problem));
        return Optional.empty();
    }

    private Optional<Density> density(int j, Other other, String place) {
        Density own = inputs.get(j).drawn();
        return switch (other) {
            case Other.Another(var draft) -> densities.of(draft, inputs.get(j).name(), place);
            case Other.Shift(double by) -> made(place, () -> new Shifted(own, by, 1));
            case Other.Widen(double by) -> widened(j, by, place);
            case Other.Tilt(double by) -> made(place, () -> Tilted.of(own, by).density());
            case Other.Adapt _ -> {
                findings.add(
                        place,
                        "\"adapt\" beside densities that are stated is not available",
                        "What is found before the run is found for every input of drawFrom together.",
                        "Write \"adapt\" for each of them, or state them all.");
                yield Optional.empty();
            }
        };
    }

    private Optional<Density> made(String place, Supplier<Density> density) {
        return findings.made(within -> within.isEmpty() ? place : place + "." + within, density);
    }

    /// About the median, which the density keeps.
    private Optional<Density> widened(int j, double by, String place) {
        Density own = inputs.get(j).drawn();
        if (!(by > 0 && Double.isFinite(by))) {
            findings.add(
                    place + ".widen",
                    "widen is %s but must be greater than 0".formatted(Shortest.text(by)),
                    "Every distance from the median is multiplied by it.");
            return Optional.empty();
        }
        if (own.isDiscrete()) {
            findings.add(
                    place + ".widen",
                    "%s has separate values, which cannot be widened"
                            .formatted(inputs.get(j).name()),
                    "They would come to lie between those that it can have.",
                    "Tilt it, or write the density itself.");
            return Optional.empty();
        }
        return made(place, () -> new Shifted(own, own.quantile(0.5) * (1 - by), by));
    }

    /// Whether weights have a meaning: every value that the input can have must be drawn now and then.
    private boolean isFit(int j, Density density, Share share, String place) {
        String name = inputs.get(j).name();
        Density own = inputs.get(j).drawn();
        if (own.isDiscrete() != density.isDiscrete()) {
            findings.add(
                    place,
                    own.isDiscrete()
                            ? "%s has separate values, the density to draw it from has not".formatted(name)
                            : "%s has no separate values, the density to draw it from has".formatted(name),
                    "A draw counts the one's chance over the other's, which here have nothing in common.");
            return false;
        }
        if (Stretches.areApart(own, density)) {
            findings.add(
                    place,
                    "the density to draw %s from gives no value that %s can have".formatted(name, name),
                    "Every draw from it would count nothing.",
                    "Choose one that is positive where the input's own is.");
            return false;
        }
        var missed = share.nominal() > 0 ? Optional.<Support>empty() : Stretches.missed(own, density);
        missed.ifPresent(stretch -> findings.add(
                place,
                own.isDiscrete()
                        ? "the density to draw %s from never gives %s".formatted(name, Shortest.text(stretch.low()))
                        : "the density to draw %s from gives nothing from %s to %s"
                                .formatted(name, Shortest.text(stretch.low()), Shortest.text(stretch.high())),
                "%s has values there, and what is never drawn would be missing from the answer.".formatted(name),
                "Choose one that is positive wherever the input's own is, or a nominalShare above 0."));
        return missed.isEmpty();
    }

    /// A tied input keeps what the others are when it is given: known for normals behind, and of separate values
    /// where the others keep their own densities.
    private void checkTies(SortedMap<Integer, Density> found, String path) {
        if (dependence.isEmpty()) {
            return;
        }
        var tied = found.keySet().stream()
                .filter(dependence.get().inputs()::contains)
                .toList();
        var copula = dependence.get().copula();
        for (int j : tied) {
            String name = inputs.get(j).name();
            if (copula.mixing().isRandom()) {
                findings.add(
                        path + ".drawFrom." + name,
                        "%s is tied by a Student copula".formatted(name),
                        "The factor that all tied inputs share has another density when %s is given; it is not drawn here, so that draws have no weight."
                                .formatted(name),
                        "Draw an input from another density that is not tied, or tie by a Gaussian copula.");
            } else if (tied.size() > 1 && inputs.get(j).drawn().isDiscrete()) {
                findings.add(
                        path + ".drawFrom." + name,
                        "%s has separate values and is tied, as others that are drawn from another density"
                                .formatted(name),
                        "A separate value stands for a range of the normals behind, so that the draw has no weight that follows from its values.",
                        "Draw one of the tied inputs alone from another density.");
            }
        }
    }
}
