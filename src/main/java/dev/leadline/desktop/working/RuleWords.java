package dev.leadline.desktop.working;

import dev.leadline.model.Stop;
import dev.leadline.model.StopRule;
import java.util.List;
import javafx.util.StringConverter;

/// Stop rules as people say them.
final class RuleWords extends StringConverter<String> {
    /// Where no rule is named.
    static final String USUAL = "";

    static final List<String> ALL = List.of(
            USUAL,
            Stop.FIXED,
            StopRule.AnyTime.WORD,
            StopRule.Hits.WORD,
            StopRule.TwoStage.WORD,
            StopRule.Stein.WORD,
            StopRule.AsymptoticWidth.WORD,
            StopRule.Jcgm101.WORD);

    @Override
    public String toString(String rule) {
        return rule == null ? "" : words(rule);
    }

    static String words(String rule) {
        return switch (rule) {
            case USUAL -> "as usual";
            case Stop.FIXED -> "after all draws";
            case StopRule.AnyTime.WORD -> "once the any-time band is narrow";
            case StopRule.Hits.WORD -> "after enough hits";
            case StopRule.TwoStage.WORD -> "as a first stage says";
            case StopRule.Stein.WORD -> "as Stein's first stage says";
            case StopRule.AsymptoticWidth.WORD -> "once the interval is narrow";
            case StopRule.Jcgm101.WORD -> "once settled after JCGM 101";
            default -> rule;
        };
    }

    /// What a rule promises.
    static String promise(String rule) {
        return switch (rule) {
            case USUAL -> "With a tolerance once the any-time band is narrow enough, without one after all draws.";
            case Stop.FIXED -> "Makes all draws of the budget, whatever they show.";
            case StopRule.AnyTime.WORD ->
                "The band holds however often one looks; of a chance with a relative tolerance, hits are counted.";
            case StopRule.Hits.WORD ->
                "Exact for a chance by independent draws: its relative error falls with the hits.";
            case StopRule.TwoStage.WORD ->
                "A guarantee for means whose kurtosis is bounded: fresh draws, as many as a first stage says.";
            case StopRule.Stein.WORD -> "Exact for normal outcomes: as many draws as the first of them say.";
            case StopRule.AsymptoticWidth.WORD ->
                "Holds in the limit of small tolerances only: it tends to stop too soon.";
            case StopRule.Jcgm101.WORD ->
                "Mean, uncertainty and coverage interval have settled; no promise goes with it.";
            default -> "";
        };
    }

    @Override
    public String fromString(String text) {
        throw new UnsupportedOperationException("rules are chosen, not typed");
    }
}
