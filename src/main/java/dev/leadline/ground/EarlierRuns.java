package dev.leadline.ground;

/// Whether runs of the same question with other seeds agree. None is known here.
final class EarlierRuns {
    private EarlierRuns() {}

    static Ground judge() {
        return Ground.notDone(
                "earlier-runs",
                "Whether earlier runs of this question with other seeds agree was not examined: none is known",
                "Run again with another seed",
                new Action.RunOtherSeed());
    }
}
