package dev.leadline.desktop.picker;

import dev.leadline.chart.DensityPicture.View;
import dev.leadline.desktop.style.Styles;
import dev.leadline.desktop.working.Messages;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Supplier;
import javafx.beans.binding.Bindings;
import javafx.geometry.Pos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.ToggleButton;
import javafx.scene.control.ToggleGroup;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.BorderPane;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.Region;
import javafx.scene.layout.StackPane;
import javafx.scene.layout.VBox;

/// The density of an input, in place of the picture: what is known about it, and what it looks like.
public final class PickerPane extends BorderPane {
    private static final double FORM_WIDTH = 316;

    private final PickerViewModel model;
    private final Supplier<Optional<Path>> chooseData;
    private final Label title = new Label();
    private final Label reading = new Label();
    private final VBox form = new VBox(10);
    private final ScrollPane forms = new ScrollPane(form);
    private final Messages messages = new Messages();
    private final NumbersView numbers = new NumbersView();
    private final VBox remarks = new VBox(4);
    private ToggleButton density;
    private ToggleButton against;
    private final List<Form> shown = new ArrayList<>();

    /// @param chooseData asks for a file of data
    public PickerPane(PickerViewModel model, Supplier<Optional<Path>> chooseData) {
        this.model = model;
        this.chooseData = chooseData;
        setId("picker");
        getStyleClass().addAll(Styles.PANE, Styles.STAGE, "picker");
        setTop(head());
        form.getStyleClass().add("content");
        forms.setFitToWidth(true);
        forms.setHbarPolicy(ScrollPane.ScrollBarPolicy.NEVER);
        forms.setMinWidth(FORM_WIDTH);
        forms.setPrefWidth(FORM_WIDTH);
        forms.setMaxWidth(FORM_WIDTH);
        setLeft(forms);
        var drawing = new DrawingView(model, reading::setText);
        reading.getStyleClass().add(Styles.READING);
        reading.setId("density-reading");
        reading.setMinHeight(Region.USE_PREF_SIZE);
        reading.setMinWidth(0);
        VBox.setVgrow(drawing, Priority.ALWAYS);
        var scroll = new ScrollPane(numbers);
        scroll.setFitToWidth(true);
        scroll.setHbarPolicy(ScrollPane.ScrollBarPolicy.NEVER);
        scroll.setMinHeight(120);
        scroll.setPrefHeight(252);
        var picture = new VBox(2, views(), drawing, reading, scroll);
        picture.getStyleClass().add("density-side");
        setCenter(new StackPane(picture, empty()));
        model.at().addListener((_, _, _) -> build());
        model.way().addListener((_, _, _) -> build());
        model.project().draft().addListener((_, _, _) -> update());
        model.project().problems().addListener((_, _, _) -> update());
        model.drawn().addListener((_, _, drawn) -> show(drawn));
        model.outdated().addListener((_, _, _) -> showRemarks());
        build();
    }

    private void show(Optional<PickerViewModel.Drawn> drawn) {
        showRemarks();
        numbers.show(drawn.map(d -> d.picture().portrait()), model.unit().strip());
        remarks.getChildren()
                .setAll(model.remarks().stream().map(Labels::wrapped).toList());
        boolean data = drawn.filter(d -> d.picture().hasData()).isPresent();
        Labels.see(against, data);
        if (drawn.isPresent() && !data && against.isSelected()) {
            density.setSelected(true);
        }
    }

    /// Remarks speak of the density as it is, not of one that is begun.
    private void showRemarks() {
        Labels.see(remarks, !model.outdated().get() && model.isAsShown());
    }

    private Node empty() {
        var empty = new Label();
        empty.getStyleClass().add(Styles.QUIET);
        empty.setMouseTransparent(true);
        empty.visibleProperty().bind(model.drawn().map(Optional::isEmpty));
        empty.textProperty()
                .bind(Bindings.createStringBinding(
                        () -> model.isTold() && model.problems().isEmpty()
                                ? "drawing\u2026"
                                : "The drawing appears once the density is told.",
                        model.drawn(),
                        model.at(),
                        model.project().problems(),
                        model.project().draft()));
        return empty;
    }

    private Node head() {
        title.getStyleClass().add(Styles.PANE_TITLE);
        title.setMinWidth(0);
        var back = new Button("back to the picture");
        back.setId("close-picker");
        back.getStyleClass().add("small");
        back.setMinWidth(USE_PREF_SIZE);
        back.setTooltip(new Tooltip("Esc"));
        back.setOnAction(_ -> model.close());
        var gap = new Region();
        HBox.setHgrow(gap, Priority.ALWAYS);
        var head = new HBox(10, title, gap, back);
        head.setAlignment(Pos.CENTER_LEFT);
        head.getStyleClass().add(Styles.STAGE_HEAD);
        return head;
    }

    private Node views() {
        var group = new ToggleGroup();
        density = view("density", "How likely values are, side by side", View.PDF, group);
        against = view(
                "data against it",
                "Each of the data against the value that the density has in its place; on the line where they agree",
                View.DATA_AGAINST_DENSITY,
                group);
        Labels.see(against, false);
        var pair = new HBox(
                density,
                view("chance up to", "The chance of a value up to each", View.CDF, group),
                view("tails", "The chances of the extremes, on a logarithmic axis", View.TAILS, group),
                against);
        pair.getStyleClass().add("pair");
        group.selectedToggleProperty().addListener((_, old, chosen) -> {
            if (chosen == null) {
                group.selectToggle(old);
            } else {
                model.view().set((View) chosen.getUserData());
            }
        });
        var line = new HBox(pair);
        line.getStyleClass().add("views");
        return line;
    }

    private ToggleButton view(String text, String tip, View view, ToggleGroup group) {
        var button = new ToggleButton(text);
        button.setId("view-" + view.name().toLowerCase(Locale.ROOT));
        button.getStyleClass().add("small");
        button.setUserData(view);
        button.setToggleGroup(group);
        button.setTooltip(new Tooltip(tip));
        button.setMinWidth(USE_PREF_SIZE);
        button.setSelected(model.view().get() == view);
        return button;
    }

    /// The form for the way that is chosen, or the question which one.
    private void build() {
        form.getChildren().clear();
        shown.clear();
        forms.setVvalue(0);
        var at = model.at().get();
        if (at.isEmpty()) {
            form.getChildren()
                    .add(Labels.wrapped("An integration variable over a bounded range is drawn uniformly: there is"
                            + " nothing to choose."));
        } else if (model.way().get().isEmpty()) {
            form.getChildren().add(new WaysView(this::choose));
        } else {
            var way = model.way().get().get();
            var name = new Label(way.title());
            name.setWrapText(true);
            name.setMinHeight(USE_PREF_SIZE);
            name.getStyleClass().add(Styles.PANE_TITLE);
            var other = Labels.link("\u2039 what else is known?", "All ways to say what the density is", model::ask);
            other.setId("other-ways");
            shown.add(formOf(way, at.get()));
            shown.add(new ChangesForm(new ChangesViewModel(at.get())));
            form.getChildren()
                    .addAll(
                            other,
                            name,
                            shown.get(0).node(),
                            messages,
                            remarks,
                            shown.get(1).node());
        }
        showRemarks();
        update();
    }

    private void choose(Way way) {
        model.choose(way);
        shown.getFirst().focus();
    }

    private Form formOf(Way way, DensityAt at) {
        return switch (way) {
            case Way.Known(var knowledge) -> new KnownForm(model.known(knowledge, at), model.project()::settle);
            case Way.Given.DATA -> new DataForm(new DataViewModel(at, model.background()), chooseData);
            case Way.Given.VALUES -> new ValuesForm(new ValuesViewModel(at));
            case Way.Given.FAMILY -> new FamilyForm(new MemberViewModel(at));
            case Way.Given.MIXTURE -> new MixtureForm(new MixtureViewModel(at));
            case Way.Given.FORMULA -> new TypedForm(new TypedViewModel(at));
        };
    }

    private void update() {
        model.inputDraft().ifPresent(_ -> {
            title.setText(model.title());
            shown.forEach(Form::update);
            messages.show(model.problems().stream()
                    .filter(p -> !p.place().path().endsWith(".formula")) // stands under the formula
                    .toList());
        });
    }
}
