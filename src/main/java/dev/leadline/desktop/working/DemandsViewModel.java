package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Figures;
import dev.leadline.interval.Bounds;
import dev.leadline.interval.IntervalKind;
import dev.leadline.model.Draft;
import dev.leadline.model.Draft.GuardDraft;
import dev.leadline.model.Draft.IntervalDraft;
import dev.leadline.model.Draft.StopDraft;
import dev.leadline.model.Draft.ToleranceDraft;
import dev.leadline.model.Sentence;
import dev.leadline.model.Stop;
import dev.leadline.model.StopRule;
import dev.leadline.problem.Problem;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/// How well the question is to be answered: numerical tolerance, confidence, stop rule.
public final class DemandsViewModel {
    private static final ToleranceDraft NO_TOLERANCE =
            new ToleranceDraft(OptionalDouble.empty(), OptionalDouble.empty(), Optional.empty());
    private static final StopDraft NOTHING = new StopDraft("", OptionalLong.empty(), OptionalDouble.empty());

    private static final String BOUNDS = "$.bounds";

    /// Between the texts of two fields; in neither.
    private static final String APART = "\t";

    private final ProjectViewModel project;

    public DemandsViewModel(ProjectViewModel project) {
        this.project = project;
    }

    ProjectViewModel project() {
        return project;
    }

    private Draft draft() {
        return project.draft().get();
    }

    void absolute(String text) {
        project.typeOptionalNumber("$.tolerance.absolute", "absolute tolerance", text, (d, value) -> {
            var t = d.tolerance().orElse(NO_TOLERANCE);
            return Edits.tolerance(d, kept(new ToleranceDraft(value, t.relative(), t.when())));
        });
    }

    String absoluteText() {
        return project.fieldText(
                "$.tolerance.absolute",
                draft().tolerance().map(ToleranceDraft::absolute).orElse(OptionalDouble.empty()));
    }

    /// In per cent.
    void relative(String text) {
        project.typeOptionalNumber("$.tolerance.relative", "relative tolerance", text, (d, value) -> {
            var t = d.tolerance().orElse(NO_TOLERANCE);
            return Edits.tolerance(d, kept(new ToleranceDraft(t.absolute(), ofPercent(value), t.when())));
        });
    }

    String relativeText() {
        return project.fieldText(
                "$.tolerance.relative",
                inPercent(draft().tolerance().map(ToleranceDraft::relative).orElse(OptionalDouble.empty())));
    }

    /// Whether both tolerances must be met; says nothing unless both are given.
    void both(boolean both) {
        project.edit(
                "$.tolerance.when",
                d -> Edits.tolerance(
                        d,
                        d.tolerance()
                                .map(t -> new ToleranceDraft(
                                        t.absolute(), t.relative(), both ? Optional.of("both") : Optional.empty()))));
    }

    boolean isBoth() {
        return draft().tolerance()
                .flatMap(ToleranceDraft::when)
                .filter("both"::equals)
                .isPresent();
    }

    boolean hasTwoTolerances() {
        return draft().tolerance()
                .filter(t -> t.absolute().isPresent() && t.relative().isPresent())
                .isPresent();
    }

    /// A tolerance without numbers is none.
    private static Optional<ToleranceDraft> kept(ToleranceDraft t) {
        if (t.absolute().isEmpty() && t.relative().isEmpty()) {
            return Optional.empty();
        }
        boolean two = t.absolute().isPresent() && t.relative().isPresent();
        return Optional.of(two ? t : new ToleranceDraft(t.absolute(), t.relative(), Optional.empty()));
    }

    /// In per cent.
    void confidence(String text) {
        project.typeOptionalNumber(
                "$.confidence", "confidence", text, (d, value) -> Edits.confidence(d, ofPercent(value)));
    }

    String confidenceText() {
        return project.fieldText("$.confidence", inPercent(draft().confidence()));
    }

    /// Which interval is wanted; the usual one need not be named.
    void interval(IntervalKind kind) {
        project.edit("$.interval", d -> {
            var bounds = d.interval().flatMap(IntervalDraft::bounds);
            var word = kind == IntervalKind.AUTO ? Optional.<String>empty() : Optional.of(kind.word());
            return Edits.interval(d, kept(new IntervalDraft(word, bounds)));
        });
    }

    IntervalKind interval() {
        return draft().interval()
                .flatMap(IntervalDraft::kind)
                .flatMap(IntervalKind::of)
                .orElse(IntervalKind.AUTO);
    }

    /// The least and the greatest outcome there can be: both or none.
    void bounds(String low, String high) {
        project.forget(BOUNDS);
        var least = NumberText.read(low);
        var most = NumberText.read(high);
        boolean both = least.isPresent() && most.isPresent();
        if (both || low.isBlank() && high.isBlank()) {
            var bounds =
                    both ? Optional.of(new Bounds(least.getAsDouble(), most.getAsDouble())) : Optional.<Bounds>empty();
            project.edit(BOUNDS, d -> {
                var kind = d.interval().flatMap(IntervalDraft::kind);
                return Edits.interval(d, kept(new IntervalDraft(kind, bounds)));
            });
        } else {
            String faulty = !low.isBlank() && least.isEmpty() ? low : high;
            var problem = faulty.isBlank() || low.isBlank() && most.isPresent()
                    ? Problem.of("one of the two bounds is missing")
                            .because("Every outcome lies between the least and the greatest.")
                            .tryThis("Write both, or neither.")
                    : NumberText.problem("bound", faulty);
            project.unread(BOUNDS, BOUNDS, low + APART + high, problem);
        }
    }

    String leastText() {
        return boundTexts()[0];
    }

    String mostText() {
        return boundTexts()[1];
    }

    private String[] boundTexts() {
        return project.unreadText(BOUNDS)
                .map(text -> text.split(APART, -1))
                .orElseGet(() -> draft().interval()
                        .flatMap(IntervalDraft::bounds)
                        .map(b -> new String[] {NumberText.show(b.low()), NumberText.show(b.high())})
                        .orElse(new String[] {"", ""}));
    }

    private static Optional<IntervalDraft> kept(IntervalDraft i) {
        return i.kind().isEmpty() && i.bounds().isEmpty() ? Optional.empty() : Optional.of(i);
    }

    void draws(String text) {
        project.typeOptionalNumber("$.stop.draws", "number of draws", text, (d, value) -> {
            var s = d.stop().orElse(NOTHING);
            var draws = value.isPresent() ? OptionalLong.of(Math.round(value.getAsDouble())) : OptionalLong.empty();
            return Edits.stop(d, kept(s.withDraws(draws)));
        });
    }

    String drawsText() {
        var draws = draft().stop().map(StopDraft::draws).orElse(OptionalLong.empty());
        return project.fieldText(
                "$.stop.draws", draws.isPresent() ? OptionalDouble.of(draws.getAsLong()) : OptionalDouble.empty());
    }

    void seconds(String text) {
        project.typeOptionalNumber("$.stop.seconds", "seconds of computing", text, (d, value) -> {
            var s = d.stop().orElse(NOTHING);
            return Edits.stop(d, kept(s.withSeconds(value)));
        });
    }

    String secondsText() {
        return project.fieldText(
                "$.stop.seconds", draft().stop().map(StopDraft::seconds).orElse(OptionalDouble.empty()));
    }

    /// Empty for the usual one.
    void rule(String rule) {
        project.settle();
        for (String path : List.of("hits", "guard", "first", "inflation", "digits")) {
            project.forget("$.stop." + path);
        }
        project.edit(
                "$.stop.rule", d -> Edits.stop(d, kept(d.stop().orElse(NOTHING).withRule(rule))));
    }

    String rule() {
        return stop().rule();
    }

    /// Fields that a rule takes besides its budget.
    enum RuleField {
        HITS("hits", "number of hits", StopRule.Hits.WORD),
        GUARD_DRAWS("guard.draws", "least number of draws", StopRule.AnyTime.WORD, StopRule.AsymptoticWidth.WORD),
        GUARD_HITS("guard.hits", "least number of hits", StopRule.AnyTime.WORD, StopRule.AsymptoticWidth.WORD),
        FIRST("first", "observations of the first stage", StopRule.TwoStage.WORD, StopRule.Stein.WORD),
        INFLATION("inflation", "inflation of the standard deviation", StopRule.TwoStage.WORD),
        DIGITS("digits", "digits that count", StopRule.Jcgm101.WORD);

        private final String path;
        private final String what;
        private final List<String> rules;

        RuleField(String path, String what, String... rules) {
            this.path = "$.stop." + path;
            this.what = what;
            this.rules = List.of(rules);
        }

        String path() {
            return path;
        }

        String what() {
            return what;
        }

        boolean belongsTo(String rule) {
            return rules.contains(rule);
        }
    }

    void ruleField(RuleField field, String text) {
        project.typeOptionalNumber(field.path, field.what, text, (d, value) -> {
            var s = d.stop().orElse(NOTHING);
            var whole = value.isPresent() ? OptionalLong.of(Math.round(value.getAsDouble())) : OptionalLong.empty();
            var guard = s.guard().orElse(new GuardDraft(OptionalLong.empty(), OptionalLong.empty()));
            return Edits.stop(
                    d,
                    kept(
                            switch (field) {
                                case HITS -> s.withHits(whole);
                                case GUARD_DRAWS -> s.withGuard(kept(new GuardDraft(whole, guard.hits())));
                                case GUARD_HITS -> s.withGuard(kept(new GuardDraft(guard.draws(), whole)));
                                case FIRST -> s.withFirst(whole);
                                case INFLATION -> s.withInflation(value);
                                case DIGITS -> s.withDigits(whole);
                            }));
        });
    }

    String ruleFieldText(RuleField field) {
        var s = stop();
        var whole = switch (field) {
            case HITS -> s.hits();
            case GUARD_DRAWS -> s.guard().map(GuardDraft::draws).orElse(OptionalLong.empty());
            case GUARD_HITS -> s.guard().map(GuardDraft::hits).orElse(OptionalLong.empty());
            case FIRST -> s.first();
            case DIGITS -> s.digits();
            case INFLATION -> OptionalLong.empty();
        };
        return project.fieldText(
                field.path,
                field == RuleField.INFLATION
                        ? s.inflation()
                        : whole.isPresent() ? OptionalDouble.of(whole.getAsLong()) : OptionalDouble.empty());
    }

    private StopDraft stop() {
        return draft().stop().orElse(NOTHING);
    }

    private static Optional<GuardDraft> kept(GuardDraft guard) {
        return guard.draws().isEmpty() && guard.hits().isEmpty() ? Optional.empty() : Optional.of(guard);
    }

    private static Optional<StopDraft> kept(StopDraft s) {
        boolean fixed = s.equals(new StopDraft(Stop.FIXED, OptionalLong.empty(), OptionalDouble.empty()));
        return s.equals(NOTHING) || fixed ? Optional.empty() : Optional.of(s);
    }

    /// As `±10 % at 95 %`.
    String toleranceSummary() {
        return Sentence.tolerance(draft()).orElse("none") + " at " + Sentence.confidence(draft());
    }

    /// As `200 million draws or 2 min`.
    static String stopWords(Draft d) {
        var parts = new ArrayList<String>();
        d.stop().ifPresent(s -> {
            s.draws().ifPresent(n -> parts.add(Figures.count(n) + " draws"));
            s.seconds().ifPresent(t -> parts.add(Figures.duration(t)));
        });
        long unsaid = isFixed(d) ? Stop.USUAL_DRAWS : Stop.PATIENT_DRAWS;
        return parts.isEmpty() ? Figures.count(unsaid) + " draws" : String.join(" or ", parts);
    }

    /// As `once the any-time band is narrow, at most 200 million draws`.
    static String stopSummary(Draft d) {
        String named = d.stop().map(StopDraft::rule).orElse(RuleWords.USUAL);
        if (isFixed(d)) {
            return "after " + stopWords(d);
        }
        return RuleWords.words(named.isEmpty() ? StopRule.AnyTime.WORD : named) + ", at most " + stopWords(d);
    }

    private static boolean isFixed(Draft d) {
        String named = d.stop().map(StopDraft::rule).orElse(RuleWords.USUAL);
        return named.equals(Stop.FIXED) || named.isEmpty() && d.tolerance().isEmpty();
    }

    static OptionalDouble inPercent(OptionalDouble part) {
        return part.isPresent() && Double.isFinite(part.getAsDouble())
                ? OptionalDouble.of(
                        BigDecimal.valueOf(part.getAsDouble()).movePointRight(2).doubleValue())
                : part;
    }

    static OptionalDouble ofPercent(OptionalDouble percent) {
        return percent.isPresent() && Double.isFinite(percent.getAsDouble())
                ? OptionalDouble.of(BigDecimal.valueOf(percent.getAsDouble())
                        .movePointLeft(2)
                        .doubleValue())
                : percent;
    }
}
