package dev.leadline.desktop.shell;

import dev.leadline.model.DataColumn;
import dev.leadline.model.DataFiles;
import dev.leadline.model.DensityDraft.Column;
import dev.leadline.model.Draft;
import dev.leadline.project.ColumnReader;
import dev.leadline.project.ProjectFile;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Optional;
import java.util.SequencedMap;
import java.util.Set;

/// The sample projects that come with the program. They are opened as copies without a file.
final class Samples {
    /// What menus call them, by the name of the file; in the order in which they are best read.
    static final SequencedMap<String, String> TITLES = new LinkedHashMap<>();

    static {
        TITLES.put("mooring-line", "Mooring line: a rare event");
        TITLES.put("berth-delay", "Berth delay: a heavy tail, and inputs from data");
        TITLES.put("dredging-volume", "Dredging volume: an integral over an area");
        TITLES.put("tide-gauge", "Tide gauge: a correction and its uncertainty");
        TITLES.put("ferry-fuel", "Ferry fuel: a quantile, inputs that go together");
        TITLES.put("spare-parts", "Spare parts: whole numbers");
        TITLES.put("quay-lighting", "Quay lighting: a smooth integral");
    }

    private static final Set<String> DATA_NAMES = Set.of("waits.csv");

    /// Their data.
    static final DataFiles DATA = new DataFiles() {
        @Override
        public DataColumn column(String file, Column column) {
            return DATA_NAMES.contains(file)
                    ? ColumnReader.read(file, bytes(file), column)
                    : DataFiles.NONE.column(file, column);
        }

        @Override
        public Optional<byte[]> whole(String file) {
            return DATA_NAMES.contains(file) ? Optional.of(bytes(file)) : Optional.empty();
        }
    };

    /// @param name of its file, without extension
    record Sample(String name, Draft draft) {}

    private Samples() {}

    static List<Sample> all() {
        return TITLES.keySet().stream()
                .map(name -> new Sample(name, read(name)))
                .toList();
    }

    static Draft read(String name) {
        return ProjectFile.parse(bytes(name + ProjectFile.EXTENSION));
    }

    private static byte[] bytes(String file) {
        try (InputStream in = Samples.class.getResourceAsStream("/dev/leadline/sample-projects/" + file)) {
            if (in == null) {
                throw new IllegalStateException("the program was built without the sample " + file);
            }
            return in.readAllBytes();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
