package dev.leadline.desktop.picker;

import dev.leadline.density.Fit;
import dev.leadline.density.Fits;
import dev.leadline.desktop.working.Messages;
import dev.leadline.model.DensityDraft;
import dev.leadline.model.DensityWords;
import dev.leadline.numeric.Significant;
import java.util.List;
import javafx.geometry.HPos;
import javafx.scene.Node;
import javafx.scene.control.Button;
import javafx.scene.control.Label;
import javafx.scene.control.Tooltip;
import javafx.scene.layout.ColumnConstraints;
import javafx.scene.layout.GridPane;
import javafx.scene.layout.Priority;
import javafx.scene.layout.VBox;

/// Families fitted to the data, beside one another; one of them may be drawn from in place of the data.
final class FitsTable extends VBox {
    private static final int LOG_DIGITS = 4;
    private static final int DIGITS = 3;

    /// Letters of a name that find room beside the figures.
    private static final int LONG = 18;

    private final DataViewModel model;
    private final Button fit = new Button("fit families to it");
    private final Label chosen = Labels.wrapped("");
    private final Button unfit;
    private final GridPane table = new GridPane(8, 1);
    private final Messages messages = new Messages();
    private final Label remark = Labels.wrapped("");

    FitsTable(DataViewModel model) {
        super(6);
        this.model = model;
        fit.setId("fit");
        fit.getStyleClass().add("small");
        fit.setTooltip(new Tooltip("Every family that can be, by maximum likelihood"));
        fit.setOnAction(_ -> model.fit());
        unfit = Labels.link("draw from the data again", "Leaves the fitted density out", model::unfit);
        unfit.setId("unfit");
        table.setId("fits");
        var family = new ColumnConstraints();
        family.setHgrow(Priority.ALWAYS);
        table.getColumnConstraints().add(family);
        for (int c = 0; c < 3; c++) {
            var column = new ColumnConstraints();
            column.setHalignment(HPos.RIGHT);
            table.getColumnConstraints().add(column);
        }
        getChildren().addAll(chosen, unfit, fit, messages, table, remark);
        model.fits().addListener((_, _, state) -> show(state));
        show(model.fits().get());
    }

    void update() {
        var fitted = model.data().fitted();
        Labels.see(this, model.isData());
        Labels.see(chosen, fitted.isPresent());
        Labels.see(unfit, fitted.isPresent());
        chosen.setText(
                fitted.map(member -> "Drawn from " + DensityWords.of(DensityDraft.of(member)) + ", fitted to the data.")
                        .orElse(""));
    }

    private void show(DataViewModel.State state) {
        table.getChildren().clear();
        messages.show(state instanceof DataViewModel.State.Refused(var problems) ? problems : List.of());
        fit.setDisable(state instanceof DataViewModel.State.Fitting);
        fit.setText(state instanceof DataViewModel.State.Fitting ? "fitting\u2026" : "fit families to it");
        remark.setText("");
        if (state instanceof DataViewModel.State.Fitted(Fits fits)) {
            fill(fits);
        }
        Labels.see(table, !table.getChildren().isEmpty());
        Labels.see(remark, !remark.getText().isEmpty());
    }

    private void fill(Fits fits) {
        table.addRow(
                0,
                head("family", "Draws from it, once it is chosen"),
                head("AIC", "Akaike's criterion, which counts the parameters: smaller is better"),
                head("KS", "Kolmogorov and Smirnov: largest difference between shares of data and chances"),
                head("AD", "Anderson and Darling: all differences, those in the tails counting more"));
        int row = 1;
        for (Fit one : fits.fits()) {
            var use = Labels.link(
                    broken(one.family()),
                    "Use this fit: "
                            + DensityWords.of(DensityDraft.of(new DensityDraft.Member(one.family(), one.parameters()))),
                    () -> model.use(one));
            use.setId("use-" + one.family());
            use.setAccessibleText("Use the fit of " + one.family());
            use.setMinWidth(0);
            var aic = figure(one.aic(), LOG_DIGITS);
            aic.setTooltip(
                    new Tooltip("Logarithm of the likelihood: " + Significant.text(one.logLikelihood(), LOG_DIGITS)));
            table.addRow(
                    row++, use, aic, figure(one.kolmogorovSmirnov(), DIGITS), figure(one.andersonDarling(), DIGITS));
        }
        String lost = fits.refused().isEmpty()
                ? ""
                : " Not fitted: "
                        + String.join(
                                ", ",
                                fits.refused().stream()
                                        .map(Fits.Refused::family)
                                        .toList())
                        + ".";
        remark.setText("Advice, no proof: which family is right the data alone do not say." + lost);
        remark.setTooltip(new Tooltip(
                fits.refused().isEmpty()
                        ? "Look at the data against the density before choosing"
                        : String.join(
                                "\n",
                                fits.refused().stream()
                                        .map(r -> r.family() + ": " + r.why().primary())
                                        .toList())));
    }

    private static Node head(String text, String tip) {
        var head = Labels.of(text);
        head.setTooltip(new Tooltip(tip));
        return head;
    }

    /// In two lines where it is long.
    private static String broken(String family) {
        return family.length() > LONG ? family.replaceFirst("-", "-\n") : family;
    }

    private static Label figure(double value, int digits) {
        var figure = new Label(Double.isNaN(value) ? "none" : Significant.text(value, digits));
        figure.getStyleClass().addAll("figure", "fit-figure");
        figure.setMinWidth(Label.USE_PREF_SIZE);
        return figure;
    }
}
