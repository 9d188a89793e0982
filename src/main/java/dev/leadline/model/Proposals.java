package dev.leadline.model;

import dev.leadline.density.Density;
import dev.leadline.density.Support;
import dev.leadline.model.LaneDraft.DrawFrom;
import dev.leadline.model.LaneDraft.Other;
import dev.leadline.numeric.Shortest;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import dev.leadline.scheme.Adaptation;
import dev.leadline.scheme.Proposal;
import dev.leadline.scheme.Share;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

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
            case DrawFrom.Inputs(var others) -> {
                var found = new TreeMap<Integer, Density>();
                others.forEach((name, other) -> {
                    String place = path + ".drawFrom." + name;
                    index(name, place)
                            .ifPresent(j -> density(j, other, place)
                                    .filter(density -> isFit(j, density, share, place))
                                    .ifPresent(density -> found.put(j, density)));
                });
                yield Optional.of(new Proposal(found, share, lane.selfNormalised()));
            }
        };
    }

    /// The wish to find a density before the run; empty where the lane has none.
    Optional<Adaptation> adaptation(LaneDraft lane, String path) {
        if (!(lane.drawFrom() instanceof DrawFrom.Adapted(String word))) {
            return Optional.empty();
        }
        var way = Arrays.stream(Adaptation.Way.values())
                .filter(w -> w.word().equals(word))
                .findFirst();
        if (way.isEmpty()) {
            findings.add(
                    path + ".drawFrom.adapt",
                    "adapt is \"%s\" but must be \"cross-entropy\" or \"grid\"".formatted(word),
                    "It is the way in which a density to draw from is found.");
            return Optional.empty();
        }
        if (lane.selfNormalised()) {
            findings.add(
                    path + ".selfNormalised",
                    "selfNormalised beside \"adapt\" is not available",
                    "The density that is found is known with its factor.",
                    "Leave it out.");
        }
        var all = IntStream.range(0, inputs.size()).boxed().collect(Collectors.toCollection(TreeSet::new));
        return Optional.of(new Adaptation(way.get(), all, share(lane.nominalShare(), path)));
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
        return switch (other) {
            case Other.Another(var draft) -> densities.of(draft, inputs.get(j).name(), place);
            case Other.Shift _, Other.Widen _, Other.Tilt _, Other.Adapt _ -> {
                findings.add(
                        place,
                        "a change of the input's own density is not available",
                        "Densities to draw from are stated.",
                        "Write the density itself.");
                yield Optional.empty();
            }
        };
    }

    /// Whether weights have a meaning: every value that the input can have must be drawn now and then.
    private boolean isFit(int j, Density density, Share share, String place) {
        Input input = inputs.get(j);
        if (dependence.filter(ties -> ties.inputs().contains(j)).isPresent()) {
            findings.add(
                    place,
                    "%s is tied to other inputs".formatted(input.name()),
                    "Drawing a tied input from another density is not available.");
            return false;
        }
        Density own = input.drawn();
        if (own.isDiscrete() != density.isDiscrete()) {
            findings.add(
                    place,
                    own.isDiscrete()
                            ? "%s has separate values, the density to draw it from has not".formatted(input.name())
                            : "%s has no separate values, the density to draw it from has".formatted(input.name()),
                    "A draw counts the one's chance over the other's, which here have nothing in common.");
            return false;
        }
        Support needed = own.support();
        Support given = density.support();
        if (share.nominal() == 0 && !(given.low() <= needed.low() && given.high() >= needed.high())) {
            findings.add(
                    place,
                    "the density to draw %s from covers %s to %s, not its values from %s to %s"
                            .formatted(
                                    input.name(),
                                    Shortest.text(given.low()),
                                    Shortest.text(given.high()),
                                    Shortest.text(needed.low()),
                                    Shortest.text(needed.high())),
                    "What is never drawn would be missing from the answer.",
                    "Choose one that is positive wherever the input's own is, or a nominalShare above 0.");
            return false;
        }
        return true;
    }
}
