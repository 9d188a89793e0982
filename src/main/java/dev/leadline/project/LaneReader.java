package dev.leadline.project;

import dev.leadline.model.LaneDraft;
import dev.leadline.model.LaneDraft.ControlDraft;
import dev.leadline.model.LaneDraft.DrawFrom;
import dev.leadline.model.LaneDraft.Mean;
import dev.leadline.model.LaneDraft.Other;
import dev.leadline.model.LaneDraft.Settings;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SequencedMap;

/// Takes the JSON of a lane apart.
final class LaneReader {
    private static final long MOST = 1_000_000_000;
    private static final int MOST_CONTROLS = 100;
    private static final String ADAPT = "adapt";
    private static final List<String> CHANGES = List.of("shift", "widen", "tilt");

    private final Problems problems;

    private LaneReader(Problems problems) {
        this.problems = problems;
    }

    static LaneDraft read(Fields fields, Problems problems) {
        return new LaneReader(problems).lane(fields);
    }

    private LaneDraft lane(Fields fields) {
        var lane = new LaneDraft(
                fields.requiredText("name", DraftReader.NAME),
                fields.requiredText("points", DraftReader.NAME),
                settings(fields),
                fields.object("drawFrom", "what inputs are drawn from {\"v\": {\"family\": …}}")
                        .map(this::drawFrom)
                        .orElse(DrawFrom.NOTHING),
                fields.number("nominalShare"),
                fields.flag("selfNormalised"),
                controls(fields),
                fields.flag("crossFitted"),
                fields.count("audit", 1, Long.MAX_VALUE));
        fields.close(Map.of());
        return lane;
    }

    private Settings settings(Fields fields) {
        return new Settings(
                fields.count("replicates", 1, MOST),
                fields.count("cube", 1, MOST),
                fields.object("cells", "cells by input {\"v\": 8}")
                        .map(this::cells)
                        .orElse(new LinkedHashMap<>()),
                fields.has("scrambling") ? Optional.of(fields.text("scrambling", DraftReader.NAME)) : Optional.empty(),
                fields.count("particles", 1, MOST),
                fields.count("repetitions", 1, MOST),
                fields.has("allocation") ? Optional.of(fields.text("allocation", DraftReader.NAME)) : Optional.empty());
    }

    private SequencedMap<String, Long> cells(Fields fields) {
        var cells = new LinkedHashMap<String, Long>();
        fields.names().forEach(name -> fields.count(name, 1, MOST).ifPresent(count -> cells.put(name, count)));
        return cells;
    }

    private DrawFrom drawFrom(Fields fields) {
        if (fields.names().contains(ADAPT) && fields.take(ADAPT).orElseThrow() instanceof Json.Text(String way)) {
            fields.close(Map.of());
            return new DrawFrom.Adapted(way);
        }
        var others = new LinkedHashMap<String, Other>();
        for (String name : fields.names()) {
            if (fields.take(name).orElseThrow() instanceof Json.Text(String word)) {
                if (word.equals(ADAPT)) {
                    others.put(name, new Other.Adapt());
                } else {
                    problems.add(Problem.of("%s cannot be drawn from %s".formatted(name, Shown.quoted(word)))
                            .because(
                                    "An input is drawn from a density, from a change of its own, or from what \"adapt\" finds.")
                            .at(Place.of(fields.pathOf(name))));
                }
            } else {
                fields.object(name, "a density {\"family\": …} or a change of its own {\"shift\": …}")
                        .ifPresent(other -> others.put(name, other(other)));
            }
        }
        return new DrawFrom.Inputs(others);
    }

    /// `shift` beside a family belongs to the density.
    private Other other(Fields fields) {
        if (fields.names().size() != 1
                || !CHANGES.contains(fields.names().iterator().next())) {
            return new Other.Another(DensityReader.read(fields, problems));
        }
        String change = fields.names().iterator().next();
        double by = fields.requiredNumber(change);
        return switch (change) {
            case "shift" -> new Other.Shift(by);
            case "widen" -> new Other.Widen(by);
            default -> new Other.Tilt(by);
        };
    }

    private List<ControlDraft> controls(Fields fields) {
        var controls = new ArrayList<ControlDraft>();
        List<Json> list = fields.list("controlVariates", MOST_CONTROLS);
        for (int i = 0; i < list.size(); i++) {
            Fields.of(
                            JsonPath.element(fields.pathOf("controlVariates"), i),
                            list.get(i),
                            "a control variate {\"formula\": …, \"mean\": …}",
                            problems)
                    .ifPresent(control -> {
                        controls.add(
                                new ControlDraft(control.requiredText("formula", DraftReader.FORMULA), mean(control)));
                        control.close(Map.of());
                    });
        }
        return controls;
    }

    private Mean mean(Fields control) {
        return switch (control.take("mean").orElse(new Json.Null())) {
            case Json.Text(String word) when word.equals("exact") -> new Mean.Exact();
            case Json.Text(String word) when word.equals("quadrature") -> new Mean.Quadrature();
            case Json.Number _ -> new Mean.Stated(control.requiredNumber("mean"));
            case Json other -> {
                problems.add(Problem.of("the mean of a control variate is %s".formatted(Shown.what(other)))
                        .because("What is known of it corrects the estimate.")
                        .tryThis("Give a number, \"exact\" or \"quadrature\".")
                        .at(Place.of(control.pathOf("mean"))));
                yield new Mean.Exact();
            }
        };
    }
}
