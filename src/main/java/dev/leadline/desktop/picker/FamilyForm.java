package dev.leadline.desktop.picker;

import dev.leadline.density.Catalogue;
import dev.leadline.density.Family;
import dev.leadline.density.FamilyGroup;
import dev.leadline.desktop.style.Styles;
import java.util.Arrays;
import java.util.Locale;
import javafx.scene.Node;
import javafx.scene.control.Label;
import javafx.scene.control.TextField;
import javafx.scene.control.ToggleButton;
import javafx.scene.control.Tooltip;
import javafx.scene.input.KeyCode;
import javafx.scene.input.KeyEvent;
import javafx.scene.layout.HBox;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/// A family out of the catalogue, found by what it is used for, and its parameters.
final class FamilyForm implements Form {
    /// Of the lines that say what a family is used for.
    private static final double USE_WIDTH = 266;

    private final MemberViewModel model;
    private final Label name = new Label();
    private final Label use = Labels.wrapped("");
    private final ToggleButton browse = new ToggleButton("other families");
    private final TextField search = new TextField();
    private final VBox list = new VBox(1);
    private final VBox catalogue;
    private final MemberFields fields;
    private final VBox all;

    FamilyForm(MemberViewModel model) {
        this.model = model;
        name.getStyleClass().addAll(Styles.MATHS, "family-name");
        browse.setId("families");
        browse.getStyleClass().setAll("toggle-button", "small");
        browse.setMinWidth(ToggleButton.USE_PREF_SIZE);
        browse.setTooltip(new Tooltip("The catalogue of families, with what each is used for"));
        search.setId("family-search");
        search.setAccessibleText("Search the families by what they are used for");
        search.setPromptText("search: gusts, waiting, strength, count \u2026");
        search.textProperty().addListener((_, _, _) -> list());
        search.addEventHandler(KeyEvent.KEY_PRESSED, e -> {
            if (e.getCode() == KeyCode.DOWN && !list.getChildren().isEmpty()) {
                list.getChildren().stream()
                        .filter(Node::isFocusTraversable)
                        .findFirst()
                        .ifPresent(Node::requestFocus);
                e.consume();
            }
        });
        catalogue = new VBox(6, search, list);
        catalogue.getStyleClass().add("catalogue");
        browse.selectedProperty().addListener((_, _, open) -> {
            Labels.see(catalogue, open);
            if (open) {
                search.clear();
                search.requestFocus();
            }
        });
        fields = new MemberFields(model, "parameter");
        HBox.setHgrow(name, Priority.ALWAYS);
        name.setMaxWidth(Double.MAX_VALUE);
        all = new VBox(6, Labels.line(name, browse), use, fields, catalogue);
        list();
        browse.setSelected(model.family().isEmpty());
        Labels.see(catalogue, browse.isSelected());
    }

    @Override
    public Node node() {
        return all;
    }

    @Override
    public void focus() {
        search.requestFocus();
    }

    @Override
    public void update() {
        var family = model.family();
        name.setText(family.map(Family::name).orElse("no family yet"));
        use.setText(family.map(Family::use).orElse("Search by the trade's words, or go through the groups."));
        fields.update();
    }

    private void list() {
        list.getChildren().clear();
        String words = search.getText().strip().toLowerCase(Locale.ROOT);
        FamilyGroup.of(Catalogue.families()).forEach((group, families) -> {
            var found = families.stream().filter(f -> isFound(group, f, words)).toList();
            if (!found.isEmpty()) {
                var head = Labels.of(group.title());
                head.getStyleClass().add("catalogue-group");
                list.getChildren().add(head);
                found.forEach(f -> list.getChildren().add(entry(f)));
            }
        });
        if (list.getChildren().isEmpty()) {
            list.getChildren()
                    .add(Labels.wrapped(
                            "No family is used for \u201c" + search.getText().strip() + "\u201d."));
        }
    }

    private static boolean isFound(FamilyGroup group, Family family, String words) {
        String text = (family.name() + " " + family.use() + " " + group.title()).toLowerCase(Locale.ROOT);
        return Arrays.stream(words.split("\\s+")).allMatch(text::contains);
    }

    private Node entry(Family family) {
        var title = new Label(family.name());
        title.getStyleClass().add(Styles.MATHS);
        var button = new javafx.scene.control.Button();
        var what = Labels.wrapped(family.use());
        what.setMinWidth(USE_WIDTH);
        what.setPrefWidth(USE_WIDTH);
        button.setGraphic(new VBox(title, what));
        button.getStyleClass().setAll("button", "choice");
        button.setMaxWidth(Double.MAX_VALUE);
        button.setAccessibleText(family.name() + ": " + family.use());
        button.setId("family-" + family.name());
        button.setOnAction(_ -> {
            model.family(family.name());
            browse.setSelected(false);
        });
        return button;
    }
}
