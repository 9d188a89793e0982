package dev.leadline.cli;

import dev.leadline.engine.Achieved;
import dev.leadline.estimate.Chance;
import dev.leadline.estimate.Estimand;
import dev.leadline.ground.Ground;
import dev.leadline.model.Plan;
import dev.leadline.model.Project;
import dev.leadline.model.Sentence;
import dev.leadline.numeric.Significant;
import dev.leadline.study.AnswerText;
import dev.leadline.study.Comparison;
import dev.leadline.study.LaneState;
import dev.leadline.study.Need;
import dev.leadline.study.RatioText;
import dev.leadline.study.StudyState;
import dev.leadline.trace.Answer;
import dev.leadline.trace.FirstStage;
import dev.leadline.trace.Mark;
import dev.leadline.trace.Trace;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/// A finished run for people.
final class RunText {

    private static final String SAMPLING_ERROR_ONLY = "The interval covers sampling error only; it says nothing about"
            + " whether densities and formula are right.";

    private static final List<String> SAFETY = List.of(
            "Results support, and do not replace, the judgement of a licensed engineer or qualified professional.",
            "Applicable local codes and standards govern.",
            "A sampled probability rests on the stated densities.");

    private final Console console;
    private final Project project;
    private final Plan plan;
    private final StringBuilder text = new StringBuilder();

    RunText(Console console, Project project, Plan plan) {
        this.console = console;
        this.project = project;
        this.plan = plan;
    }

    /// @param achieved correlations of the inputs that are tied
    String of(StudyState state, List<Achieved> achieved) {
        if (!project.question().title().isEmpty()) {
            line(console.bold(project.question().title().strip()));
        }
        wrapped("", Sentence.of(project.draft()).text());
        TiedText.lines(project.question(), achieved).forEach(this::line);
        state.lanes().forEach(this::lane);
        state.comparisons().forEach(this::comparison);
        line("");
        wrapped("", SAMPLING_ERROR_ONLY);
        if (project.question().safety()) {
            wrapped("", String.join(" ", SAFETY));
        }
        return text.toString();
    }

    /// What stands against signing, and why the exit code is not 0.
    String doubts(StudyState state) {
        state.lanes().stream()
                .flatMap(lane -> lane.grounds().stream())
                .filter(ground -> ground.status() == Ground.Status.DOUBTED)
                .forEach(this::ground);
        return text.toString();
    }

    private void lane(LaneState lane) {
        line("");
        List<Answer> answers = lane.trace().last().map(Mark::answers).orElse(List.of());
        if (answers.isEmpty()) {
            line("  no answer yet");
        }
        for (int k = 0; k < answers.size(); k++) {
            answer(k, answers.get(k));
        }
        together(answers);
        line("  " + facts(lane, answers));
        lane.trace().audit().flatMap(Trace::last).ifPresent(this::audit);
        lane.trace().course().firstStage().ifPresent(stage -> wrapped("  ", firstStage(stage)));
        line("");
        lane.grounds().forEach(this::ground);
    }

    private void audit(Mark plain) {
        wrapped(
                "  ",
                String.format(
                        Locale.ROOT,
                        "audit: %,d draws from the inputs' own densities, which enter no interval above: %s",
                        plain.draws(),
                        String.join(
                                ", ",
                                plain.answers().stream().map(AnswerText::value).toList())));
    }

    /// What lanes are worth beside each other.
    private void comparison(Comparison comparison) {
        line("");
        wrapped("  ", comparison.sentence());
        comparison.notes().forEach(note -> wrapped("  ", note));
        comparison.needs().forEach(need -> wrapped("  ", need(need)));
    }

    private static String need(Need need) {
        return "%s meets the tolerance after %s draws%s: %s."
                .formatted(
                        need.lane(),
                        RatioText.of(need.draws()),
                        need.seconds()
                                .map(seconds -> ", %s s on one thread".formatted(RatioText.of(seconds)))
                                .orElse(""),
                        need.basis());
    }

    /// @param k which of the answers, from 0
    private void answer(int k, Answer answer) {
        String label = project.question().asks().size() == 1
                ? ""
                : (answer.label().isEmpty() ? "answer " + (k + 1) : answer.label()) + ": ";
        line("  " + label + console.bold(AnswerText.value(answer)) + chance(answer));
        AnswerText.coverage(answer).ifPresent(coverage -> line("  " + coverage));
        line("  " + AnswerText.interval(answer));
        answer.interval().note().ifPresent(note -> wrapped("  ", note));
        answer.band().ifPresent(band -> wrapped("  ", AnswerText.band(answer, band)));
        if (answer.provisional()) {
            line("  provisional: outcomes near it are counted, their exact places are found at the end");
        }
        if (answer.nonFinite() > 0) {
            line("  over finite evaluations only");
        }
    }

    /// Why the level beside an answer is not the one that was asked for.
    private void together(List<Answer> answers) {
        if (answers.size() > 1) {
            wrapped(
                    "  ",
                    "the %d intervals hold all at once with %s, each for itself with %s"
                            .formatted(
                                    answers.size(),
                                    Sentence.percent(project.question().confidence()),
                                    answers.getFirst().interval().percent()));
        }
    }

    private static String chance(Answer answer) {
        double beta = answer.estimand() instanceof Estimand.Probability ? Chance.beta(answer.estimate()) : Double.NaN;
        return AnswerText.oneIn(answer).map("   "::concat).orElse("")
                + (Double.isNaN(beta) ? "" : String.format(Locale.ROOT, "   β %.2f", beta));
    }

    private static String firstStage(FirstStage stage) {
        String kurtosis = stage.largestKurtosis().isPresent()
                ? ", kurtosis %s where at most %s is allowed for"
                        .formatted(
                                Significant.text(stage.kurtosis(), 3),
                                Significant.text(stage.largestKurtosis().getAsDouble(), 3))
                : "";
        return String.format(
                Locale.ROOT,
                "first stage of %,d draws, %s the answer: standard deviation %s%s",
                stage.draws(),
                stage.inAnswer() ? "which enter" : "which do not enter",
                Significant.text(stage.standardDeviation(), 3),
                kurtosis);
    }

    private String facts(LaneState lane, List<Answer> answers) {
        List<String> facts = new ArrayList<>();
        facts.add("lane %s: %s"
                .formatted(lane.trace().lane(), lane.trace().scheme().inWords()));
        lane.trace().last().ifPresent(mark -> {
            facts.add(String.format(Locale.ROOT, "%,d draw%s", mark.draws(), mark.draws() == 1 ? "" : "s"));
            if (answers.size() == 1 && answers.getFirst().hits().isPresent()) {
                facts.add(String.format(
                        Locale.ROOT, "%,d hits", answers.getFirst().hits().getAsLong()));
            }
            facts.add(String.format(Locale.ROOT, "%.1f s", mark.seconds()));
        });
        facts.add("seed %d".formatted(plan.seed()));
        lane.trace().stopReason().ifPresent(facts::add);
        return String.join(" · ", facts);
    }

    private void ground(Ground ground) {
        String head = "  %-9s "
                .formatted(ground.strength()
                        .map(Ground.Strength::word)
                        .orElse(ground.status().word().replace('-', ' ')));
        wrapped(head, sentence(ground.text()));
        if (ground.status() == Ground.Status.DOUBTED) {
            ground.remedy().ifPresent(remedy -> wrapped(" ".repeat(head.length()) + "→ ", sentence(remedy)));
        }
    }

    private static String sentence(String words) {
        String capital = words.substring(0, 1).toUpperCase(Locale.ROOT) + words.substring(1);
        return capital.endsWith(".") ? capital : capital + ".";
    }

    private void wrapped(String head, String words) {
        Wrapped.lines(head, words).forEach(this::line);
    }

    private void line(String line) {
        text.append(line.stripTrailing()).append('\n');
    }
}
