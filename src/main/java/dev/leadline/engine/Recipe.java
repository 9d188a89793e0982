package dev.leadline.engine;

import dev.leadline.density.Density;
import dev.leadline.density.Inversion;
import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Extremes;
import dev.leadline.estimate.Landmark;
import dev.leadline.formula.Program;
import dev.leadline.model.Ask;
import dev.leadline.model.Components;
import dev.leadline.model.Input;
import dev.leadline.model.Input.Role;
import dev.leadline.model.Lane;
import dev.leadline.model.Question;
import dev.leadline.scheme.Control;
import dev.leadline.scheme.LaidOut;
import dev.leadline.scheme.Layout;
import dev.leadline.scheme.Proposal;
import dev.leadline.scheme.Repetitions;
import dev.leadline.scheme.Replicated;
import dev.leadline.scheme.Share;
import dev.leadline.scheme.Tuned;
import dev.leadline.stream.Address;
import dev.leadline.stream.Purpose;
import dev.leadline.stream.Stream;
import dev.leadline.stream.StreamKey;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;

/// Everything that the draws of a lane follow from, made ready: compiled formulas, inversion tables,
/// the layout of points. Immutable, safe for all threads; each worker takes a [Sampler] of its own.
public final class Recipe {
    /// Name of a coordinate: no input can be called so.
    private static final String SHARE = "/";

    /// Name in the address of the random numbers of splitting.
    private static final String SPLITTING = "^";

    private final Question question;
    private final Lane lane;
    private final List<Landmark> landmarks;
    private final Address address;
    private final Optional<Layout> layout;
    private final Ties ties;
    private final List<Inversion> inversions;
    private final Map<Integer, Inversion> proposed;
    private final List<Integer> weighing;
    private final double volume;

    private Recipe(Question question, Lane lane, List<Landmark> landmarks, long seed, Purpose purpose, int replicate) {
        this.question = question;
        this.lane = lane;
        this.landmarks = List.copyOf(landmarks);
        this.ties = new Ties(question, proposal().keySet());
        this.address = new Address(seed, purpose, lane.address(), replicate, "", 0);
        this.layout = layout(lane, address, coordinates());
        this.inversions =
                Inversion.of(question.inputs().stream().map(Input::drawn).toList());
        this.proposed = new TreeMap<>();
        lane.scheme()
                .drawFrom()
                .ifPresent(proposal ->
                        proposal.densities().forEach((input, density) -> proposed.put(input, Inversion.of(density))));
        var unbounded = new ArrayList<Integer>();
        double product = 1;
        for (int j = 0; j < question.inputs().size(); j++) {
            switch (question.inputs().get(j).role()) {
                case Role.Random() -> {}
                case Role.Range(double low, double high) -> product *= high - low;
                case Role.UnboundedRange _ -> unbounded.add(j);
            }
        }
        this.weighing = List.copyOf(unbounded);
        this.volume = product;
    }

    /// What another one has, for other draws.
    private Recipe(Recipe other, Address address, List<Landmark> landmarks) {
        this.question = other.question;
        this.lane = other.lane;
        this.landmarks = List.copyOf(landmarks);
        this.ties = other.ties;
        this.address = address;
        this.layout = layout(lane, address, coordinates());
        this.inversions = other.inversions;
        this.proposed = other.proposed;
        this.weighing = other.weighing;
        this.volume = other.volume;
    }

    private static Optional<Layout> layout(Lane lane, Address address, List<String> coordinates) {
        return lane.scheme().points() instanceof LaidOut points
                ? Optional.of(points.layout(address, coordinates))
                : Optional.empty();
    }

    /// Builds the inversion tables that are not in the cache yet, side by side, and finds the density to draw from
    /// where the lane
    /// wants
    /// one.
    public static Recipe of(Question question, Lane lane, long seed) {
        return of(question, lane, seed, Purpose.RUN);
    }

    /// The same for draws that must not be those of a run.
    public static Recipe of(Question question, Lane lane, long seed, Purpose purpose) {
        Lane found = Tuning.found(question, lane, seed);
        return new Recipe(question, found, Pilot.landmarks(question, found, seed), seed, purpose, 0);
    }

    /// The recipe of the draws that show where outcomes lie.
    static Recipe ofPilot(Question question, Lane lane, long seed) {
        return new Recipe(question, lane, nothingKnown(question), seed, Purpose.LANDMARK, 0);
    }

    private static List<Landmark> nothingKnown(Question question) {
        return Collections.nCopies(question.asks().size(), Landmark.NONE);
    }

    /// The recipe of the same set-up for other draws; what was found before the run stays.
    ///
    /// @param replicate tells one repetition from another
    public Recipe repeated(long seed, Purpose purpose, int replicate) {
        return new Recipe(this, new Address(seed, purpose, lane.address(), replicate, "", 0), landmarks);
    }

    /// The recipe of the draws that say how many others are to be made.
    Recipe firstStage() {
        return repeated(address.seed(), Purpose.FIRST_STAGE, address.replicate());
    }

    /// The recipe of a further pass over the same draws.
    Recipe narrowed(List<Landmark> others) {
        return new Recipe(this, address, others);
    }

    /// What pilot draws found of each thing asked.
    public List<Landmark> landmarks() {
        return landmarks;
    }

    /// Whether the outcome of a formula is the whole integrand, weight and all.
    boolean isWhole(int formula) {
        int before = 0;
        for (Ask ask : asks()) {
            before += ask.estimand().formulas();
            if (formula < before) {
                return ask.estimand() instanceof Estimand.Integral;
            }
        }
        return false;
    }

    /// Whether draws differ in what the outcome of a formula counts: by a weight beside it, or by how cells share the
    /// draws of a pass.
    boolean isWeighed(int formula) {
        return lane.scheme().isWeighted() && !isWhole(formula)
                || lane.scheme().allotted().isPresent();
    }

    /// The recipe of a stage of tuning.
    static Recipe ofStage(Question question, Lane lane, long seed, int stage) {
        return new Recipe(question, lane, nothingKnown(question), seed, Purpose.TUNING, stage);
    }

    public Sampler sampler() {
        return new Sampler(this);
    }

    /// What a worker computes the items with.
    ItemWork work() {
        return lane.scheme().points() instanceof Repetitions repetitions
                ? new Climber(this, repetitions)
                : new Sampler(this);
    }

    public Items items() {
        return Items.of(lane.scheme());
    }

    /// Names of the coordinates of the layout: those that the ties have and, last, one that says which draws of
    /// replicated points come from the inputs' own densities.
    private List<String> coordinates() {
        var coordinates = new ArrayList<>(ties.coordinates());
        if (isShareDrawn()) {
            coordinates.add(SHARE);
        }
        return coordinates;
    }

    /// Whether chance decides which draws come from the inputs' own densities; in growing points their index does.
    boolean isShareDrawn() {
        return lane.scheme().points() instanceof Replicated && (share().nominal() > 0 || tuned().isPresent());
    }

    Share share() {
        return lane.scheme().drawFrom().map(Proposal::nominal).orElse(Share.NONE);
    }

    Optional<Tuned> tuned() {
        return lane.scheme().tuned();
    }

    /// The components of an observation: what is asked, the control variates, and the weight where draws are weighted.
    int components() {
        return lane.scheme().points() instanceof Repetitions
                ? Repetitions.COMPONENTS
                : Components.asked(asks()) + controls().size() + (lane.scheme().isWeighted() ? 1 : 0);
    }

    /// Empty ones of the components whose tails say something: not of events that count 1, nor of control variates.
    Optional<Extremes> extremes() {
        if (lane.scheme().points() instanceof Repetitions) {
            return Optional.empty();
        }
        boolean isWeighted = lane.scheme().isWeighted();
        boolean[] watched = new boolean[components()];
        for (int k = 0; k < Components.asked(asks()); k++) {
            watched[k] = isWeighted || Components.hasTail(asks(), k);
        }
        watched[watched.length - 1] |= isWeighted;
        return anyOf(watched) ? Optional.of(new Extremes(watched, isWeighted)) : Optional.empty();
    }

    private static boolean anyOf(boolean[] flags) {
        for (boolean flag : flags) {
            if (flag) {
                return true;
            }
        }
        return false;
    }

    public Question question() {
        return question;
    }

    Layout layout() {
        return layout.orElseThrow();
    }

    /// The random numbers of a repetition of splitting.
    Stream numbers(long repetition) {
        return StreamKey.of(address.forInput(SPLITTING)).stream(repetition);
    }

    public Lane lane() {
        return lane;
    }

    Ties ties() {
        return ties;
    }

    Inversion inversion(int input) {
        return inversions.get(input);
    }

    /// Other densities that inputs are drawn from, by the index of the input.
    Map<Integer, Density> proposal() {
        return lane.scheme()
                .drawFrom()
                .<Map<Integer, Density>>map(Proposal::densities)
                .orElse(Map.of());
    }

    /// Of an input that is drawn from another density.
    Optional<Inversion> proposed(int input) {
        return Optional.ofNullable(proposed.get(input));
    }

    Density drawn(int input) {
        return question.inputs().get(input).drawn();
    }

    /// Inputs whose draws count `1 / pdf` within their range and nothing beyond it.
    List<Integer> weighing() {
        return weighing;
    }

    /// @param input one of those that weigh
    Role.UnboundedRange range(int input) {
        return (Role.UnboundedRange) question.inputs().get(input).role();
    }

    /// What every outcome is multiplied by: the volume of the bounded ranges of integration.
    double volume() {
        return volume;
    }

    Program program() {
        return lane.working().orElse(question.working()).program();
    }

    List<Control> controls() {
        return lane.scheme().controls();
    }

    List<Ask> asks() {
        return question.asks();
    }
}
