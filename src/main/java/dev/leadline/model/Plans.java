package dev.leadline.model;

import dev.leadline.model.Draft.LaneDraft;
import dev.leadline.model.Draft.StopDraft;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Problem;
import dev.leadline.scheme.Points;
import dev.leadline.scheme.Scheme;
import java.security.SecureRandom;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.regex.Pattern;

/// Makes the plan of a run of its draft.
final class Plans {

    private static final String FIXED = "fixed";
    private static final Map<String, Points> POINTS = Map.of("independent", new Points.Independent());
    private static final Pattern LANE = Pattern.compile("[\\p{L}\\p{Nd}_][\\p{L}\\p{Nd}_.-]{0,19}");

    private Plans() {}

    static Plan of(Draft draft, Findings findings) {
        Stop stop = draft.stop()
                .map(given -> stop(given, findings))
                .orElse(new Stop(Stop.USUAL_DRAWS, OptionalDouble.empty()));
        return new Plan(stop, seed(draft, findings), lanes(draft.lanes(), findings));
    }

    private static Stop stop(StopDraft draft, Findings findings) {
        if (!draft.rule().equals(FIXED)) {
            Problem problem = Problem.of("the stop rule \"%s\" is not available".formatted(draft.rule()))
                    .because(
                            "The rule here is \"fixed\": a number of draws, or of seconds. A tolerance is judged at the end.");
            findings.add(
                    "$.stop.rule",
                    Nearest.to(draft.rule(), Set.of(FIXED))
                            .map(near -> problem.tryThis("Was \"%s\" meant?".formatted(near)))
                            .orElse(problem.tryThis("Write \"stop\": {\"rule\": \"fixed\", \"draws\": 1000000}.")));
        }
        draft.draws().ifPresent(draws -> {
            if (draws < 1 || draws > Stop.MOST_DRAWS) {
                findings.add(
                        "$.stop.draws",
                        "draws is %d but must be from 1 to %d".formatted(draws, Stop.MOST_DRAWS),
                        "It is the number of evaluations.");
            }
        });
        draft.seconds().ifPresent(seconds -> {
            if (!(seconds > 0 && Double.isFinite(seconds))) {
                findings.add(
                        "$.stop.seconds",
                        "seconds is %s but must be greater than 0".formatted(Findings.number(seconds)),
                        "It is the time a lane may compute.");
            }
        });
        long unsaid = draft.seconds().isPresent() ? Stop.MOST_DRAWS : Stop.USUAL_DRAWS;
        return new Stop(draft.draws().orElse(unsaid), draft.seconds());
    }

    /// Drawn where the draft names none, below 2^53 so that every reader of JSON keeps its digits.
    private static long seed(Draft draft, Findings findings) {
        long seed = draft.seed().orElseGet(() -> new SecureRandom().nextLong(1L << 53));
        if (seed < 0) {
            findings.add("$.seed", "seed is %d but must be 0 or more".formatted(seed), "It picks the random numbers.");
        }
        return seed;
    }

    private static List<Lane> lanes(List<LaneDraft> drafts, Findings findings) {
        if (drafts.isEmpty()) {
            return List.of(new Lane("A", new Scheme(new Points.Independent())));
        }
        if (drafts.size() > Lane.MOST) {
            findings.add(
                    "$.lanes",
                    "there are %d lanes".formatted(drafts.size()),
                    "At most %d are read together.".formatted(Lane.MOST));
        }
        Set<String> names = new HashSet<>();
        List<Lane> lanes = new ArrayList<>();
        for (int i = 0; i < drafts.size(); i++) {
            String path = "$.lanes[" + i + "]";
            String name = drafts.get(i).name();
            if (!LANE.matcher(name).matches()) {
                findings.add(
                        path + ".name",
                        "the lane cannot be called \"%s\"".formatted(name),
                        "A lane's name has 1 to 20 letters, digits, _ . or -, as A.");
            } else if (!names.add(name)) {
                findings.add(
                        path + ".name",
                        "two lanes are called %s".formatted(name),
                        "A lane is known by its name, and draws its own random numbers by it.",
                        "Give one of them another name, as B.");
            }
            Points points = POINTS.get(drafts.get(i).points());
            if (points == null) {
                findings.add(path + ".points", noPoints(drafts.get(i).points()));
            } else {
                lanes.add(new Lane(name, new Scheme(points)));
            }
        }
        return lanes;
    }

    private static Problem noPoints(String word) {
        Problem problem = Problem.of("the points \"%s\" are not available".formatted(word))
                .because("Points here are independent.");
        return Nearest.to(word, POINTS.keySet())
                .map(near -> problem.tryThis("Was \"%s\" meant?".formatted(near)))
                .orElse(problem.tryThis("Write \"points\": \"independent\"."));
    }
}
