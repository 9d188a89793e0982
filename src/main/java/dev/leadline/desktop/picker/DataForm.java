package dev.leadline.desktop.picker;

import dev.leadline.desktop.working.Field;
import java.nio.file.Path;
import java.util.Optional;
import java.util.function.Supplier;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.ComboBox;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.HBox;
import javafx.scene.layout.VBox;
import javafx.util.StringConverter;

/// A column of a file, and how it is drawn from.
final class DataForm implements Form {
    private final DataViewModel model;
    private final Field file;
    private final Field column;
    private final ComboBox<String> kind = new ComboBox<>();
    private final Field bandwidth;
    private final HBox bandwidthLine;
    private final FitsTable fits;
    private final VBox all;
    private boolean showing;

    /// @param choose asks for a file
    DataForm(DataViewModel model, Supplier<Optional<Path>> choose) {
        this.model = model;
        Runnable settle = model.project()::settle;
        file = new Field("file of data", "A text file below the folder of the project", 12, model::file, settle)
                .prompt("waits.csv")
                .growing();
        file.setId("data-file");
        var chooser = new Button("choose\u2026");
        chooser.getStyleClass().add("small");
        chooser.setMinWidth(Button.USE_PREF_SIZE);
        chooser.setTooltip(new Tooltip("A file below the folder of the project"));
        chooser.setOnAction(_ -> choose.get().ifPresent(model::choose));
        column = new Field(
                        "column of the file",
                        "Its header, or its number from 1; empty where there is only one",
                        10,
                        model::column,
                        settle)
                .prompt("the only one")
                .growing();
        column.setId("data-column");
        kind.getItems().setAll(DataViewModel.KINDS);
        kind.setId("data-kind");
        kind.setAccessibleText("How the data are drawn from");
        kind.setConverter(new KindWords());
        kind.setOnAction(_ -> {
            if (!showing && kind.getValue() != null) {
                model.kind(kind.getValue());
            }
        });
        bandwidth = new Field(
                        "bandwidth",
                        "Spread of each kernel, in the unit of the data; empty: by rule",
                        7,
                        model::bandwidth,
                        settle)
                .prompt("by rule");
        bandwidth.setId("data-bandwidth");
        bandwidthLine = Labels.line(Labels.of("bandwidth"), bandwidth);
        fits = new FitsTable(model);
        all = new VBox(
                6,
                Labels.line(Labels.of("file"), file, chooser),
                Labels.line(Labels.of("column"), column),
                kind,
                bandwidthLine,
                fits);
    }

    @Override
    public Node node() {
        return all;
    }

    @Override
    public void focus() {
        file.requestFocus();
    }

    @Override
    public void update() {
        file.show(model.fileText());
        file.showFault(model.isFaulty("data"));
        column.show(model.columnText());
        column.showFault(model.isFaulty("column"));
        showing = true;
        kind.setValue(model.kind());
        showing = false;
        boolean fitted = model.data().fitted().isPresent();
        Labels.see(kind, model.isData() && !fitted);
        fits.update();
        bandwidth.show(model.bandwidthText());
        bandwidth.showFault(model.isFaulty("bandwidth"));
        Labels.see(bandwidthLine, model.kind().equals("kernel") && !fitted);
    }

    private static final class KindWords extends StringConverter<String> {
        @Override
        public String toString(String kind) {
            return kind == null ? "" : kind.equals("kernel") ? "smoothed by a kernel" : "drawn as they are";
        }

        @Override
        public String fromString(String text) {
            throw new UnsupportedOperationException("kinds are chosen, not typed");
        }
    }
}
