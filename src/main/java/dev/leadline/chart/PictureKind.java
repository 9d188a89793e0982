package dev.leadline.chart;

import dev.leadline.model.Plan;
import dev.leadline.model.Question;
import dev.leadline.trace.Trace;
import java.util.List;

/// The pictures that there are of a run.
public enum PictureKind {
    SETTLING("Settling", "settling", "running estimate and interval against the number of draws") {
        @Override
        public Subject of(Question question, Plan plan, List<Trace> traces) {
            return Settling.of(question, plan, traces);
        }
    },
    ERROR_DECAY(
            "Error decay", "error-decay", "half-width of the interval against the number of draws, both logarithmic") {
        @Override
        public Subject of(Question question, Plan plan, List<Trace> traces) {
            return ErrorDecay.of(question, plan, traces);
        }
    },
    OUTCOMES("Outcomes", "outcomes", "how the outcomes lie, and where the answer and its intervals lie among them") {
        @Override
        public Subject of(Question question, Plan plan, List<Trace> traces) {
            return Outcomes.of(question, plan, traces);
        }
    },
    WEIGHTS("Weights", "weights", "the largest weights of draws from other densities") {
        @Override
        public Subject of(Question question, Plan plan, List<Trace> traces) {
            return Weights.of(question, plan, traces);
        }

        @Override
        public boolean isSeen(List<Trace> traces) {
            return Weights.isSeen(traces);
        }
    };

    private final String title;
    private final String word;
    private final String shows;

    PictureKind(String title, String word, String shows) {
        this.title = title;
        this.word = word;
        this.shows = shows;
    }

    public String title() {
        return title;
    }

    /// As commands and file names have it.
    public String word() {
        return word;
    }

    /// What is drawn, as a clause.
    public String shows() {
        return shows;
    }

    /// Whether there is something to see of these lanes.
    public boolean isSeen(List<Trace> traces) {
        return true;
    }

    /// @param traces those of the plan's lanes, in order; fewer before a run
    public abstract Subject of(Question question, Plan plan, List<Trace> traces);
}
