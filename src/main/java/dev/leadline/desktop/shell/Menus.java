package dev.leadline.desktop.shell;

import dev.leadline.desktop.run.RunViewModel;
import javafx.beans.binding.Bindings;
import javafx.beans.binding.BooleanBinding;
import javafx.beans.value.ObservableValue;
import javafx.scene.control.CheckMenuItem;
import javafx.scene.control.Menu;
import javafx.scene.control.MenuBar;
import javafx.scene.control.MenuItem;
import javafx.scene.control.RadioMenuItem;
import javafx.scene.control.SeparatorMenuItem;
import javafx.scene.control.ToggleGroup;
import javafx.scene.input.KeyCombination;

/// The menus, with the shortcuts a person expects.
final class Menus {
    private Menus() {}

    static MenuBar of(WorkbenchViewModel model, Runnable copy, Runnable look, Runnable about, Runnable quit) {
        var bar = new MenuBar(file(model, about, quit), edit(model, copy), run(model, look), view(model), help(model));
        bar.setUseSystemMenuBar(true);
        return bar;
    }

    private static Menu file(WorkbenchViewModel model, Runnable about, Runnable quit) {
        BooleanBinding closed = model.started().not();
        var samples = new Menu("Sample _projects");
        Samples.TITLES.forEach(
                (name, title) -> samples.getItems().add(item(title, null, () -> model.openSample(name))));
        var png = item("As _PNG\u2026", "Shortcut+E", () -> model.exportFigure("png"));
        var svg = item("As _SVG\u2026", "Shortcut+Shift+E", () -> model.exportFigure("svg"));
        var export = new Menu("_Export picture", null, png, svg);
        export.disableProperty().bind(closed);
        return menu(
                "_File",
                item("_New question", "Shortcut+N", () -> model.newProject("mean")),
                item("_Open\u2026", "Shortcut+O", model::open),
                samples,
                new SeparatorMenuItem(),
                disabled(item("_Save", "Shortcut+S", model::save), closed),
                disabled(item("Save _as\u2026", "Shortcut+Shift+S", model::saveAs), closed),
                disabled(item("About this _project", null, about), closed),
                new SeparatorMenuItem(),
                export,
                new SeparatorMenuItem(),
                disabled(item("_Close project", "Shortcut+W", model::closeProject), closed),
                item("_Quit", "Shortcut+Q", quit));
    }

    private static Menu edit(WorkbenchViewModel model, Runnable copy) {
        var project = model.project();
        return menu(
                "_Edit",
                disabled(
                        item("_Undo", "Shortcut+Z", project::undo),
                        project.canUndo().not()),
                disabled(
                        item("_Redo", "Shortcut+Shift+Z", project::redo),
                        project.canRedo().not()),
                new SeparatorMenuItem(),
                disabled(
                        item("_Copy answer", "Shortcut+Shift+C", copy),
                        model.answer().isEmpty()));
    }

    private static Menu run(WorkbenchViewModel model, Runnable look) {
        var state = model.run().state();
        var idle = Bindings.createBooleanBinding(() -> !RunViewModel.isUnderWay(state.get()), state);
        var pause = item("_Pause", "Shortcut+P", model.run()::pauseOrResume);
        pause.textProperty().bind(state.map(s -> RunViewModel.isPaused(s) ? "Re_sume" : "_Pause"));
        return menu(
                "_Run",
                disabled(
                        item("_Run", "Shortcut+R", model::startRun),
                        model.canRun().not()),
                disabled(pause, idle),
                disabled(item("S_top", "Shortcut+Period", model.run()::stop), idle),
                new SeparatorMenuItem(),
                disabled(
                        item("_Look at a draw", "Shortcut+L", look),
                        model.started().not()),
                new SeparatorMenuItem(),
                disabled(
                        item("See_d\u2026", null, model::askSeed),
                        model.started().not()),
                threads(model));
    }

    private static Menu threads(WorkbenchViewModel model) {
        var menu = new Menu("T_hreads");
        var group = new ToggleGroup();
        int processors = Runtime.getRuntime().availableProcessors();
        for (int n = 1; n <= processors; n++) {
            int threads = n;
            var item = new RadioMenuItem(n == processors ? n + " (all)" : Integer.toString(n));
            item.setToggleGroup(group);
            item.setSelected(n == model.run().threads().get());
            item.setOnAction(_ -> model.run().threads().set(threads));
            menu.getItems().add(item);
        }
        return menu;
    }

    private static Menu view(WorkbenchViewModel model) {
        var dark = new CheckMenuItem("_Dark");
        dark.setAccelerator(KeyCombination.valueOf("Shortcut+D"));
        dark.selectedProperty().bindBidirectional(model.dark());
        var log = new CheckMenuItem("Draws on a _logarithmic axis");
        log.selectedProperty().bindBidirectional(model.stage().logDraws());
        return menu(
                "_View",
                dark,
                new SeparatorMenuItem(),
                log,
                item("Axes _follow the run", "Shortcut+DIGIT0", model.stage()::reset));
    }

    private static Menu help(WorkbenchViewModel model) {
        return menu("_Help", item("_About Leadline, and cautions", "F1", model::about));
    }

    private static Menu menu(String name, MenuItem... items) {
        return new Menu(name, null, items);
    }

    private static MenuItem item(String text, String keys, Runnable action) {
        var item = new MenuItem(text);
        if (keys != null) {
            item.setAccelerator(KeyCombination.valueOf(keys));
        }
        item.setOnAction(_ -> action.run());
        return item;
    }

    private static <M extends MenuItem> M disabled(M item, ObservableValue<Boolean> when) {
        item.disableProperty().bind(when);
        return item;
    }
}
