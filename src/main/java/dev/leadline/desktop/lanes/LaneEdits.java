package dev.leadline.desktop.lanes;

import dev.leadline.model.LaneDraft;
import dev.leadline.model.LaneDraft.ControlDraft;
import dev.leadline.model.LaneDraft.DrawFrom;
import dev.leadline.model.LaneDraft.Other;
import dev.leadline.model.LaneDraft.Settings;
import dev.leadline.model.Layouts;
import dev.leadline.scheme.Repetitions;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.SequencedMap;

/// Lanes with one part changed.
final class LaneEdits {
    private LaneEdits() {}

    /// Settings that the other layout does not take are left out.
    static LaneDraft points(LaneDraft l, String points) {
        var takes = Layouts.takes(points);
        var s = l.settings();
        return new LaneDraft(
                l.name(),
                points,
                new Settings(
                        takes.contains("replicates") ? s.replicates() : OptionalLong.empty(),
                        takes.contains("cube") ? s.cube() : OptionalLong.empty(),
                        takes.contains("cells") ? s.cells() : new LinkedHashMap<>(),
                        takes.contains("scrambling") ? s.scrambling() : Optional.empty(),
                        takes.contains("particles") ? s.particles() : OptionalLong.empty(),
                        takes.contains("repetitions") ? s.repetitions() : OptionalLong.empty(),
                        takes.contains("allocation") ? s.allocation() : Optional.empty()),
                l.drawFrom(),
                l.nominalShare(),
                l.selfNormalised(),
                l.controls(),
                l.crossFitted(),
                l.audit());
    }

    /// A count of the layout, by the word of the file.
    static LaneDraft count(LaneDraft l, String word, OptionalLong count) {
        var s = l.settings();
        return l.with(new Settings(
                word.equals("replicates") ? count : s.replicates(),
                word.equals("cube") ? count : s.cube(),
                s.cells(),
                s.scrambling(),
                word.equals("particles") ? count : s.particles(),
                word.equals("repetitions") ? count : s.repetitions(),
                s.allocation()));
    }

    static OptionalLong count(LaneDraft l, String word) {
        var s = l.settings();
        return switch (word) {
            case "replicates" -> s.replicates();
            case "cube" -> s.cube();
            case "particles" -> s.particles();
            case "repetitions" -> s.repetitions();
            default -> throw new IllegalArgumentException(word);
        };
    }

    static LaneDraft cells(LaneDraft l, String input, OptionalLong cells) {
        var s = l.settings();
        return l.with(new Settings(
                s.replicates(),
                s.cube(),
                with(s.cells(), input, cells.isPresent() ? Optional.of(cells.getAsLong()) : Optional.empty()),
                s.scrambling(),
                s.particles(),
                s.repetitions(),
                s.allocation()));
    }

    static LaneDraft scrambling(LaneDraft l, Optional<String> scrambling) {
        var s = l.settings();
        return l.with(new Settings(
                s.replicates(), s.cube(), s.cells(), scrambling, s.particles(), s.repetitions(), s.allocation()));
    }

    static LaneDraft allocation(LaneDraft l, Optional<String> allocation) {
        var s = l.settings();
        return l.with(new Settings(
                s.replicates(), s.cube(), s.cells(), s.scrambling(), s.particles(), s.repetitions(), allocation));
    }

    /// Only what may be missed is audited.
    static LaneDraft audit(LaneDraft l, OptionalLong draws) {
        return l.audited(isAuditable(l) ? draws : OptionalLong.empty());
    }

    static boolean isAuditable(LaneDraft l) {
        return !l.drawFrom().equals(DrawFrom.NOTHING) || l.points().equals(Repetitions.WORD);
    }

    /// What belongs to weights goes with the last other density.
    static LaneDraft drawFrom(LaneDraft l, DrawFrom drawFrom) {
        boolean weighted = !drawFrom.equals(DrawFrom.NOTHING);
        boolean stated = drawFrom instanceof DrawFrom.Inputs;
        return new LaneDraft(
                l.name(),
                l.points(),
                l.settings(),
                drawFrom,
                weighted ? l.nominalShare() : OptionalDouble.empty(),
                weighted && stated && l.selfNormalised(),
                l.controls(),
                l.crossFitted(),
                l.audit());
    }

    /// @param other empty for the input's own density
    static LaneDraft other(LaneDraft l, String input, Optional<Other> other) {
        return drawFrom(l, new DrawFrom.Inputs(with(others(l), input, other)));
    }

    static SequencedMap<String, Other> others(LaneDraft l) {
        return l.drawFrom() instanceof DrawFrom.Inputs(var others) ? others : new LinkedHashMap<>();
    }

    static LaneDraft nominalShare(LaneDraft l, OptionalDouble share) {
        return new LaneDraft(
                l.name(),
                l.points(),
                l.settings(),
                l.drawFrom(),
                share,
                l.selfNormalised(),
                l.controls(),
                l.crossFitted(),
                l.audit());
    }

    static LaneDraft selfNormalised(LaneDraft l, boolean self) {
        return new LaneDraft(
                l.name(),
                l.points(),
                l.settings(),
                l.drawFrom(),
                l.nominalShare(),
                self,
                l.controls(),
                l.crossFitted(),
                l.audit());
    }

    static LaneDraft controls(LaneDraft l, List<ControlDraft> controls) {
        return new LaneDraft(
                l.name(),
                l.points(),
                l.settings(),
                l.drawFrom(),
                l.nominalShare(),
                l.selfNormalised(),
                controls,
                l.crossFitted() && !controls.isEmpty(),
                l.audit());
    }

    private static <V> SequencedMap<String, V> with(SequencedMap<String, V> map, String key, Optional<V> value) {
        var changed = new LinkedHashMap<>(map);
        value.ifPresentOrElse(v -> changed.put(key, v), () -> changed.remove(key));
        return changed;
    }
}
