package dev.leadline.desktop.picker;

import dev.leadline.density.Parameter;
import java.util.List;
import javafx.util.StringConverter;

/// A way of entry as `by mean, sd`.
final class EntryWords extends StringConverter<Integer> {
    private final List<List<Parameter>> entries;

    EntryWords(List<List<Parameter>> entries) {
        this.entries = entries;
    }

    @Override
    public String toString(Integer entry) {
        return entry == null
                ? ""
                : "by "
                        + String.join(
                                ", ",
                                entries.get(entry).stream().map(Parameter::name).toList());
    }

    @Override
    public Integer fromString(String text) {
        throw new UnsupportedOperationException("entries are chosen, not typed");
    }
}
