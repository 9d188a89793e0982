package dev.leadline.study;

import dev.leadline.estimate.Accumulator;
import dev.leadline.estimate.Estimand;
import dev.leadline.estimate.Logarithm;
import dev.leadline.interval.Ratio;
import dev.leadline.model.LaneDraft;
import dev.leadline.model.Project;
import dev.leadline.scheme.Replicated;
import dev.leadline.study.Pilots.Pilot;
import dev.leadline.study.candidate.Candidate;
import dev.leadline.study.candidate.Candidates;
import dev.leadline.study.candidate.Gains;
import dev.leadline.study.candidate.Offer;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.function.Consumer;
import java.util.stream.Collectors;

/// Which scheme a question is worth, found by short pilots of those that apply, each timed beside plain draws.
///
/// A scheme is recommended only where the lower limit of what it is worth exceeds 1, at a level at which all limits
/// hold together; else plain draws are.
///
/// @param rows the most that is certain first
/// @param recommended one of the rows
/// @param draws of each pilot
public record Suggestion(List<Row> rows, Row recommended, long draws) {
    public static final long USUAL_DRAWS = 65_536;

    /// An estimate that differs from that of plain draws by more standard errors is not of the same number.
    private static final double DISAGREES = 4;

    /// Hits of plain draws from which on their own variance is judged.
    private static final long ENOUGH_HITS = 20;

    public Suggestion {
        rows = List.copyOf(rows);
    }

    /// A scheme beside plain draws; ratios are of plain draws over it, above 1 where it is better.
    ///
    /// @param lane as a project has it
    /// @param scheme in words
    /// @param reason a sentence
    public record Row(
            LaneDraft lane,
            String scheme,
            Optional<Ratio> varianceRatio,
            Optional<Ratio> timeRatio,
            Optional<Ratio> efficiencyRatio,
            String reason) {
        private double certain() {
            return efficiencyRatio.map(Ratio::low).orElse(0.0);
        }
    }

    /// @param draws of each pilot
    /// @param listener gets the name of each scheme before it is tried
    public static Suggestion of(Project project, long seed, long draws, int threads, Consumer<String> listener)
            throws InterruptedException {
        return of(project, seed, draws, threads, listener, Candidates.ALL, Pilots.Clock.OF_PROCESSOR);
    }

    static Suggestion of(
            Project project,
            long seed,
            long draws,
            int threads,
            Consumer<String> listener,
            List<Candidate> candidates,
            Pilots.Clock clock)
            throws InterruptedException {
        try (var pilots = new Pilots(project, seed, draws, threads, clock)) {
            return new Suggesting(project, pilots, freeName(project), listener).suggestion(draws, candidates);
        }
    }

    private static String freeName(Project project) {
        Set<String> taken =
                project.draft().lanes().stream().map(LaneDraft::name).collect(Collectors.toSet());
        char name = 'A';
        while (taken.contains(String.valueOf(name))) {
            name++;
        }
        return String.valueOf(name);
    }

    private record Tried(String reason, Pilot pilot, Contender contender) {}

    /// One suggestion being made.
    private record Suggesting(Project project, Pilots pilots, String name, Consumer<String> listener) {
        Suggestion suggestion(long draws, List<Candidate> candidates) throws InterruptedException {
            var ofPlain = LaneDraft.of(name, "independent");
            listener.accept("independent");
            Pilot plain = pilots.run(ofPlain, "independent").orElseThrow();
            List<Offer> offers = offers(candidates);
            double level = 1 - (1 - project.question().confidence()) / Math.max(1, offers.size());
            List<Tried> tried = new ArrayList<>();
            for (int i = 0; i < offers.size(); i++) {
                LaneDraft offered = offers.get(i).lane();
                var lane = offered.name().isEmpty() ? offered.named(name) : offered;
                listener.accept(lane.points());
                Optional<Pilot> pilot = pilots.run(lane, "candidate " + i);
                if (pilot.isPresent()) {
                    tried.add(new Tried(offers.get(i).reason(), pilot.get(), contender(pilot.get())));
                }
            }
            List<Row> rows = new ArrayList<>();
            for (Tried one : tried) {
                rows.add(row(plain, one, tried, level));
            }
            rows.add(new Row(
                    ofPlain,
                    plain.lane().scheme().inWords(),
                    Optional.of(Ratio.ONE),
                    Optional.of(Ratio.ONE),
                    Optional.of(Ratio.ONE),
                    "What the others are measured by."));
            rows.sort(Comparator.comparingDouble(Row::certain).reversed());
            return new Suggestion(rows, rows.getFirst(), draws);
        }

        private List<Offer> offers(List<Candidate> candidates) {
            var gains = new Gains(project, this::sums);
            List<Offer> offers = new ArrayList<>();
            for (Candidate candidate : candidates) {
                offers.addAll(candidate.offers(project, gains));
            }
            return offers;
        }

        private Optional<Accumulator> sums(LaneDraft lane, String purpose) {
            try {
                return pilots.run(lane.named(name), "tuning " + purpose)
                        .map(pilot -> pilot.trace().total());
            } catch (InterruptedException e) {
                Thread.currentThread().interrupt();
                return Optional.empty();
            }
        }

        private Contender contender(Pilot pilot) {
            return new Contender(project.question(), pilot.lane(), pilot.trace());
        }

        private Row row(Pilot plain, Tried tried, List<Tried> all, double level) {
            var one = contender(plain);
            var other = tried.contender();
            var variance = variance(one, other).filter(log -> log.standardError() <= Comparison.MOST_ERROR);
            var time = pilots.time(plain, tried.pilot()).ratio();
            var efficiency = variance.map(time::plus).map(log -> Ratio.of(log, level));
            boolean wrong =
                    differ(one, other) || all.stream().anyMatch(another -> missesWhat(other, another.contender()));
            return new Row(
                    tried.pilot().draft(),
                    tried.pilot().lane().scheme().inWords(),
                    variance.map(log -> Ratio.of(log, level)),
                    Optional.of(Ratio.of(time, level)),
                    wrong ? Optional.empty() : efficiency,
                    wrong
                            ? "It misses something: its estimate disagrees with another."
                            : efficiency
                                    .map(ratio -> said(ratio, tried.reason(), other))
                                    .orElse("What it is worth cannot be judged in so few draws."));
        }

        private static String said(Ratio efficiency, String reason, Contender lane) {
            if (efficiency.high() < 1) {
                return "Loses here.";
            }
            if (efficiency.low() <= 1) {
                return "No gain that so few draws can tell.";
            }
            String at = lane.scheme().points() instanceof Replicated
                    ? String.format(Locale.ROOT, "; at %,.0f draws", lane.draws())
                    : "";
            return reason.substring(0, 1).toUpperCase(Locale.ROOT) + reason.substring(1) + at + ".";
        }

        /// The variance of plain draws over that of the scheme. Where plain draws hardly see the event, what the scheme
        /// says of its probability p tells their variance too: p (1 - p).
        private Optional<Logarithm> variance(Contender plain, Contender other) {
            boolean rare = project.question().asks().getFirst().estimand() instanceof Estimand.Probability
                    && plain.hits() < ENOUGH_HITS
                    && other.spreads();
            return rare
                    ? other.jackknife(sums -> {
                        double p = other.estimate(sums).value();
                        return StrictMath.log(p * (1 - p)) - other.logOfVariance(sums);
                    })
                    : plain.variance().flatMap(one -> other.variance().map(one::minus));
        }

        /// Of two weighted estimates that disagree, the smaller one misses what its draws hardly reach.
        private static boolean missesWhat(Contender lane, Contender another) {
            return lane.scheme().isWeighted()
                    && Math.abs(lane.estimate().value())
                            < Math.abs(another.estimate().value())
                    && differ(lane, another);
        }

        private static boolean differ(Contender one, Contender other) {
            if (!one.spreads() || !other.spreads()) {
                return false;
            }
            double error = StrictMath.hypot(
                    one.estimate().standardError(), other.estimate().standardError());
            return Math.abs(one.estimate().value() - other.estimate().value()) > DISAGREES * error;
        }
    }
}
