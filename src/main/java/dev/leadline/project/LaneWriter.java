package dev.leadline.project;

import dev.leadline.model.LaneDraft;
import dev.leadline.model.LaneDraft.ControlDraft;
import dev.leadline.model.LaneDraft.DrawFrom;
import dev.leadline.model.LaneDraft.Mean;
import dev.leadline.model.LaneDraft.Other;
import java.util.OptionalLong;

/// Writes a lane as it stands in a project.
final class LaneWriter {
    private LaneWriter() {}

    static Json lane(LaneDraft lane) {
        var fields = Json.object().put("name", lane.name()).put("points", lane.points());
        var settings = lane.settings();
        count(fields, "replicates", settings.replicates());
        count(fields, "cube", settings.cube());
        if (!settings.cells().isEmpty()) {
            var cells = Json.object();
            settings.cells().forEach((input, count) -> cells.put(input, Json.of(count)));
            fields.put("cells", cells.build());
        }
        settings.allocation().ifPresent(word -> fields.put("allocation", word));
        settings.scrambling().ifPresent(word -> fields.put("scrambling", word));
        count(fields, "particles", settings.particles());
        count(fields, "repetitions", settings.repetitions());
        if (!lane.drawFrom().equals(DrawFrom.NOTHING)) {
            fields.put("drawFrom", drawFrom(lane.drawFrom()));
        }
        lane.nominalShare().ifPresent(share -> fields.put("nominalShare", Json.orNull(share)));
        if (lane.selfNormalised()) {
            fields.put("selfNormalised", Json.of(true));
        }
        if (!lane.controls().isEmpty()) {
            fields.put(
                    "controlVariates",
                    Json.list(lane.controls().stream().map(LaneWriter::control).toList()));
        }
        if (lane.crossFitted()) {
            fields.put("crossFitted", Json.of(true));
        }
        count(fields, "audit", lane.audit());
        return fields.build();
    }

    private static void count(Json.Builder fields, String name, OptionalLong count) {
        count.ifPresent(value -> fields.put(name, Json.of(value)));
    }

    private static Json drawFrom(DrawFrom drawFrom) {
        var fields = Json.object();
        switch (drawFrom) {
            case DrawFrom.Adapted(String way) -> fields.put("adapt", way);
            case DrawFrom.Inputs(var others) -> others.forEach((input, other) -> fields.put(input, other(other)));
        }
        return fields.build();
    }

    private static Json other(Other other) {
        return switch (other) {
            case Other.Another(var density) -> DraftWriter.density(density);
            case Other.Shift(double by) ->
                Json.object().put("shift", Json.orNull(by)).build();
            case Other.Widen(double by) ->
                Json.object().put("widen", Json.orNull(by)).build();
            case Other.Tilt(double by) ->
                Json.object().put("tilt", Json.orNull(by)).build();
            case Other.Adapt _ -> Json.of("adapt");
        };
    }

    private static Json control(ControlDraft control) {
        return Json.object()
                .put("formula", control.formula())
                .put(
                        "mean",
                        switch (control.mean()) {
                            case Mean.Stated(double value) -> Json.orNull(value);
                            case Mean.Exact _ -> Json.of("exact");
                            case Mean.Quadrature _ -> Json.of("quadrature");
                        })
                .build();
    }
}
