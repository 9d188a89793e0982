package dev.leadline.desktop;

import dev.leadline.model.Draft;
import dev.leadline.project.ProjectFile;

/// Small projects for tests.
public final class Drafts {
    private Drafts() {}

    /// The mean of `2*x` with x uniform on 0 to 1: 1.
    public static Draft mean() {
        return ProjectFile.parse("""
                {"leadline": 1, "title": "Twice", "inputs": [{"name": "x", "unit": "m", "density": {"family": "uniform", "from": 0, "to": 1}}],
                 "steps": ["twice = 2*x   # m"], "ask": {"mean": "twice", "unit": "m"},
                 "tolerance": {"absolute": 0.01}, "stop": {"rule": "fixed", "draws": 20000}, "seed": 7}
                """);
    }

    /// The chance that x is above .9.
    public static Draft probability() {
        return ProjectFile.parse("""
                {"leadline": 1, "title": "Above", "safety": true,
                 "inputs": [{"name": "x", "density": {"family": "uniform", "from": 0, "to": 1}}],
                 "ask": {"probability": "x > 0.9", "unit": "1/a"},
                 "tolerance": {"relative": 0.1}, "stop": {"rule": "fixed", "draws": 1000000}, "seed": 7}
                """);
    }

    /// The integral of x*y over a rectangle.
    public static Draft integral() {
        return ProjectFile.parse("""
                {"leadline": 1, "title": "Volume", "inputs": [{"name": "x", "range": [0, 2]}, {"name": "y", "range": [0, 3]}],
                 "ask": {"integral": "x*y", "unit": "m3"}, "stop": {"rule": "fixed", "draws": 1000}, "seed": 7}
                """);
    }
}
