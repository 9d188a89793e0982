package dev.leadline.desktop.working;

import dev.leadline.desktop.style.Styles;
import dev.leadline.desktop.working.DemandsViewModel.RuleField;
import dev.leadline.interval.IntervalKind;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.Locale;
import java.util.Map;
import java.util.function.Consumer;
import java.util.function.Supplier;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.CheckBox;
import javafx.scene.control.ComboBox;
import javafx.scene.control.Label;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.FlowPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Region;
import javafx.scene.layout.VBox;

/// How well the question is to be answered, folded away until used.
final class DemandsView {
    private final DemandsViewModel model;
    private final Field relative;
    private final Field absolute;
    private final CheckBox both = new CheckBox("both must be met");
    private final Field confidence;
    private final ComboBox<IntervalKind> interval = new ComboBox<>();
    private final Field least;
    private final Field most;
    private final ComboBox<String> rule = new ComboBox<>();
    private final Map<RuleField, Field> ruleFields = new EnumMap<>(RuleField.class);
    private final Map<RuleField, HBox> rulePairs = new EnumMap<>(RuleField.class);
    private final FlowPane ruleLine = flow();
    private final Field draws;
    private final Field seconds;
    private final Messages toleranceMessages = new Messages();
    private final Messages intervalMessages = new Messages();
    private final Messages stopMessages = new Messages();
    private final Fold toleranceFold;
    private final Fold stopFold;
    private final VBox folds;
    private boolean showing;

    DemandsView(DemandsViewModel model) {
        this.model = model;
        relative = field("relative", "relative tolerance", "Half-width over estimate, in per cent", 5, model::relative);
        absolute = field("absolute", "absolute tolerance", "Half-width, in the unit of the answer", 7, model::absolute);
        confidence = field("confidence", "confidence", "Level of the interval, in per cent", 5, model::confidence)
                .prompt("95");
        least = field("least", "least outcome", "The least outcome there can be", 6, _ -> bounds());
        most = field("most", "greatest outcome", "The greatest outcome there can be", 6, _ -> bounds());
        interval.getItems().setAll(IntervalKind.values());
        interval.setConverter(new IntervalWords());
        interval.setId("interval");
        interval.setAccessibleText("kind of interval");
        var use = new Tooltip();
        use.setWrapText(true);
        use.setMaxWidth(320);
        interval.setTooltip(use);
        interval.setOnAction(_ -> {
            if (!showing && interval.getValue() != null) {
                model.interval(interval.getValue());
            }
        });
        interval.valueProperty().addListener((_, _, kind) -> use.setText(kind == null ? "" : IntervalWords.use(kind)));
        draws = field("draws", "draws at most", "Evaluations at most, as 1e6", 9, model::draws)
                .prompt("1000000");
        rule.getItems().setAll(RuleWords.ALL);
        rule.setConverter(new RuleWords());
        rule.setId("stop-rule");
        rule.setAccessibleText("stop rule");
        var promise = new Tooltip();
        promise.setWrapText(true);
        promise.setMaxWidth(320);
        rule.setTooltip(promise);
        rule.valueProperty().addListener((_, _, word) -> promise.setText(word == null ? "" : RuleWords.promise(word)));
        rule.setOnAction(_ -> {
            if (!showing && rule.getValue() != null) {
                model.rule(rule.getValue());
            }
        });
        ruleField(RuleField.HITS, "at", "hits", "Hits to stop at; empty: as the relative tolerance asks", 7);
        ruleField(
                RuleField.GUARD_DRAWS, "not before", "draws", "Least draws before the rule looks; empty: the usual", 7);
        ruleField(
                RuleField.GUARD_HITS,
                "and",
                "hits",
                "Least hits, or misses where those are rarer; empty: the usual",
                5);
        ruleField(
                RuleField.FIRST, "first stage", "observations", "Observations of the first stage; empty: the usual", 7);
        ruleField(
                RuleField.INFLATION, "times", "deviation", "What the deviation of the first stage is multiplied by", 4);
        ruleField(RuleField.DIGITS, "to", "digits", "Digits of the standard uncertainty that count: 1 or 2", 3);
        seconds = field("seconds", "seconds at most", "Seconds of computing at most", 5, model::seconds)
                .prompt("no limit");
        both.setOnAction(_ -> model.both(both.isSelected()));
        both.setTooltip(new Tooltip("Otherwise either will do"));

        toleranceFold = new Fold(
                "fold-tolerance",
                "numerical tolerance",
                "How short the interval is to be, and its level of confidence",
                new VBox(
                        6,
                        flow(pair("\u00b1", relative, "%"), pair("\u00b1", absolute, "absolute"), both),
                        flow(pair("at", confidence, "% confidence")),
                        flow(pair("by", interval, "")),
                        flow(pair("outcomes between", least, ""), pair("and", most, "")),
                        intervalMessages,
                        toleranceMessages));
        stopFold = new Fold(
                "fold-stop",
                "stop",
                "When a run ends",
                new VBox(
                        6,
                        flow(pair("stop", rule, "")),
                        ruleLine,
                        flow(pair("at most", draws, "draws"), pair("or", seconds, "s")),
                        stopMessages));
        folds = new VBox(toleranceFold, stopFold);
    }

    private void bounds() {
        model.bounds(least.getText(), most.getText());
    }

    Node folds() {
        return folds;
    }

    private void ruleField(RuleField which, String before, String after, String tip, int columns) {
        var field = field(
                "stop-" + which.name().toLowerCase(Locale.ROOT).replace('_', '-'),
                which.what(),
                tip,
                columns,
                text -> model.ruleField(which, text));
        field.prompt("usual");
        ruleFields.put(which, field);
        rulePairs.put(which, pair(before, field, after));
        ruleLine.getChildren().add(rulePairs.get(which));
    }

    void openTolerance() {
        toleranceFold.open();
        relative.requestFocus();
    }

    void update() {
        show(relative, model::relativeText, "$.tolerance.relative");
        show(absolute, model::absoluteText, "$.tolerance.absolute");
        show(confidence, model::confidenceText, "$.confidence");
        showing = true;
        interval.setValue(model.interval());
        rule.setValue(model.rule());
        showing = false;
        ruleFields.forEach((which, field) -> {
            boolean taken = which.belongsTo(model.rule());
            rulePairs.get(which).setVisible(taken);
            rulePairs.get(which).setManaged(taken);
            show(field, () -> model.ruleFieldText(which), which.path());
        });
        boolean any = rulePairs.values().stream().anyMatch(Node::isVisible);
        ruleLine.setVisible(any);
        ruleLine.setManaged(any);
        least.show(model.leastText());
        most.show(model.mostText());
        show(draws, model::drawsText, "$.stop.draws");
        show(seconds, model::secondsText, "$.stop.seconds");
        both.setSelected(model.isBoth());
        both.setVisible(model.hasTwoTolerances());
        both.setManaged(model.hasTwoTolerances());
        var project = model.project();
        var tolerance = new ArrayList<>(project.problemsAt("$.tolerance"));
        tolerance.addAll(project.problemsAt("$.confidence"));
        toleranceMessages.show(tolerance);
        var wished = new ArrayList<>(project.problemsAt("$.interval"));
        wished.addAll(project.problemsAt("$.bounds"));
        intervalMessages.show(wished);
        boolean unbounded = !project.problemsAt("$.bounds").isEmpty();
        least.showFault(unbounded);
        most.showFault(unbounded);
        stopMessages.show(project.problemsAt("$.stop"));
        toleranceFold.summary(model.toleranceSummary());
        stopFold.summary(DemandsViewModel.stopSummary(project.draft().get()));
        openWhereFaulty(toleranceFold, !tolerance.isEmpty() || !wished.isEmpty());
        openWhereFaulty(stopFold, !project.problemsAt("$.stop").isEmpty());
    }

    /// A fault is never folded away.
    private static void openWhereFaulty(Fold fold, boolean faulty) {
        if (faulty) {
            fold.open();
        }
    }

    private void show(Field field, Supplier<String> text, String path) {
        field.show(text.get());
        field.showFault(!model.project().problemsAt(path).isEmpty());
    }

    private Field field(String id, String name, String tip, int columns, Consumer<String> typed) {
        var field = new Field(name, tip, columns, typed, model.project()::settle);
        field.setId(id);
        return field;
    }

    static FlowPane flow(Node... nodes) {
        var flow = new FlowPane(12, 6, nodes);
        flow.setPrefWrapLength(280);
        return flow;
    }

    static HBox pair(String before, Node field, String after) {
        var box = new HBox(5, label(before), field, label(after));
        box.setAlignment(Pos.CENTER_LEFT);
        return box;
    }

    private static Label label(String text) {
        var label = new Label(text);
        label.getStyleClass().add(Styles.FIELD_LABEL);
        label.setMinWidth(Region.USE_PREF_SIZE);
        label.setManaged(!text.isEmpty());
        return label;
    }
}
