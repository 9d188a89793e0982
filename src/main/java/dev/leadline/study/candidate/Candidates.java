package dev.leadline.study.candidate;

import dev.leadline.model.LaneDraft;
import java.util.List;

/// All of them.
public final class Candidates {
    public static final List<Candidate> ALL = List.of(
            new OwnLanes(),
            new LaidOut("antithetic", "opposite draws cancel what rises or falls with an input"),
            new LaidOut("stratified", "draws are spread over cells, which takes out the differences between them"),
            new LaidOut(
                    shared(),
                    "draws are spread over cells, more where a pilot saw the outcome vary more, which takes out the"
                            + " differences between them"),
            new LaidOut(
                    "latin-hypercube",
                    "every part of the range of every input is drawn equally often, which takes out what adds up"
                            + " input by input"),
            new LaidOut("scrambled-sobol", "points fill the space evenly, which pays where the outcome is smooth"),
            new LaidOut("shifted-lattice", "points fill the space evenly, which pays where the outcome is smooth"),
            new LaidOut("splitting", "particles climb towards the event step by step"),
            new InputControls(),
            new ShiftedDensities(),
            new TiltedDensities(),
            new WidenedDensities(),
            new AdaptedDensities("cross-entropy", "rare outcomes are drawn more often, as draws before the run taught"),
            new AdaptedDensities(
                    "grid", "parts of inputs that count more are drawn more often, as draws before the run taught"));

    private Candidates() {}

    private static LaneDraft shared() {
        var lane = LaneDraft.of("", "stratified");
        return lane.with(lane.settings().sharedAs("neyman"));
    }
}
