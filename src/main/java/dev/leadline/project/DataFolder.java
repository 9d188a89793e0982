package dev.leadline.project;

import dev.leadline.model.DataColumn;
import dev.leadline.model.DataFiles;
import dev.leadline.model.DensityDraft.Column;
import dev.leadline.model.Draft;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.nio.file.attribute.BasicFileAttributes;
import java.nio.file.attribute.FileTime;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/// The data files below a folder; nothing outside it is read, whatever the links say.
///
/// What was read stays until time or size of the file change, so that the window does not read again at each
/// keystroke: at most eight columns, and at most 2,000,000 values. Safe for all threads.
public final class DataFolder implements DataFiles {

    public static final int MOST_BYTES = 50 << 20;

    private static final int KEPT_COLUMNS = 8;
    private static final int KEPT_VALUES = 2_000_000;
    private static final int MOST_NAMES = 1000;
    private static final Pattern DRIVE = Pattern.compile("[A-Za-z]:.*");

    private final Path folder;
    private final Map<Key, Kept> kept = new LinkedHashMap<>(16, .75f, true);

    private record Key(Path file, Column column) {}

    private record Kept(FileTime time, long size, Optional<DataColumn> column, List<Problem> problems) {
        int values() {
            return column.map(c -> c.values().size()).orElse(0);
        }
    }

    private DataFolder(Path folder) {
        this.folder = folder;
    }

    public static DataFiles of(Path folder) {
        return new DataFolder(folder);
    }

    /// The data beside a project.
    public static DataFiles beside(Path project) {
        return of(project.toAbsolutePath().getParent());
    }

    @Override
    public DataColumn column(String file, Column column) {
        try {
            return column(found(file), Shown.plain(file), column);
        } catch (IOException e) {
            throw refusal(Problem.of("%s cannot be read".formatted(Shown.plain(file)))
                    .because(Shown.plain(String.valueOf(e.getMessage())))
                    .tryThis("See whether you may read it."));
        }
    }

    @Override
    public Optional<byte[]> whole(String file) {
        try {
            return Optional.of(bytes(found(file), Shown.plain(file)));
        } catch (IOException | Refusal e) {
            return Optional.empty();
        }
    }

    /// Puts the data files that a project speaks of beside a copy of it, where there are none of these names yet.
    ///
    /// @param from where they can be had
    /// @return names of those that were copied
    /// @throws Refusal where one cannot be written
    public static List<String> bring(Path project, Draft draft, DataFiles from) {
        var copied = new ArrayList<String>();
        for (String name : draft.dataFiles()) {
            var whole = from.whole(name);
            if (whole.isPresent()) {
                Path target = project.toAbsolutePath().getParent().resolve(relative(name, Shown.plain(name)));
                if (Files.notExists(target)) {
                    folders(target.getParent());
                    WholeFile.write(target, whole.get());
                    copied.add(name);
                }
            }
        }
        return copied;
    }

    private static void folders(Path folder) {
        try {
            Files.createDirectories(folder);
        } catch (IOException e) {
            throw new Refusal(Problem.of("there can be no folder %s".formatted(Shown.plain(folder.toString())))
                    .because(Shown.plain(String.valueOf(e.getMessage())))
                    .tryThis("See whether you may write there."));
        }
    }

    private synchronized DataColumn column(Path path, String name, Column column) throws IOException {
        var key = new Key(path, column);
        var now = Files.readAttributes(path, BasicFileAttributes.class);
        var known = kept.get(key);
        if (known == null || !known.time.equals(now.lastModifiedTime()) || known.size != now.size()) {
            known = read(path, name, column, now);
            kept.put(key, known);
            forgetOldest();
        }
        var problems = known.problems;
        return known.column.orElseThrow(() -> new Refusal(problems));
    }

    private static Kept read(Path path, String name, Column column, BasicFileAttributes now) throws IOException {
        try {
            var values = ColumnReader.read(name, bytes(path, name), column);
            return new Kept(now.lastModifiedTime(), now.size(), Optional.of(values), List.of());
        } catch (Refusal refusal) {
            return new Kept(now.lastModifiedTime(), now.size(), Optional.empty(), refusal.problems());
        }
    }

    private void forgetOldest() {
        var oldest = kept.values().iterator();
        long values = kept.values().stream().mapToLong(Kept::values).sum();
        for (int n = kept.size(); n > 1 && (n > KEPT_COLUMNS || values > KEPT_VALUES); n--) {
            values -= oldest.next().values();
            oldest.remove();
        }
    }

    /// The real path of a file below the folder.
    private Path found(String file) throws IOException {
        String shown = Shown.plain(file);
        if (file.isBlank()) {
            throw refusal(Problem.of("the data file has no name")
                    .tryThis("Write the name of a file that lies beside the project."));
        }
        if (file.indexOf('\\') >= 0) {
            throw refusal(Problem.of("the name \"%s\" of the data file has a backslash".formatted(shown))
                    .because("Only / is understood on every machine.")
                    .tryThis("Write folder/file with a slash."));
        }
        Path relative = relative(file, shown);
        Path root = folder.toRealPath();
        Path at = root.resolve(relative);
        Path parent = at.getParent();
        if (!Files.isDirectory(parent)) {
            throw missing(shown, root, parent.getParent(), parent.getFileName().toString());
        }
        // where links lead is told before anything is told about what lies there
        if (!parent.toRealPath().startsWith(root)) {
            throw outside(shown, "It passes through a link that leads out of the folder of the project.");
        }
        Path real;
        try {
            real = at.toRealPath();
        } catch (NoSuchFileException e) {
            throw missing(shown, root, parent, at.getFileName().toString());
        }
        if (!real.startsWith(root)) {
            throw outside(shown, "It is a link that leads out of the folder of the project.");
        }
        if (Files.isDirectory(real)) {
            throw refusal(Problem.of("there is a folder at %s, not a file".formatted(shown))
                    .tryThis("Name a file in it, as %s/waits.csv.".formatted(shown.replaceAll("/+$", ""))));
        }
        if (!Files.isRegularFile(real)) {
            throw refusal(Problem.of("%s is not a file that can be read twice".formatted(shown))
                    .because("The same data are read again whenever the project is opened.")
                    .tryThis("Save the data in a file."));
        }
        return real;
    }

    private static Path relative(String file, String shown) {
        Path path;
        try {
            path = Path.of(file);
        } catch (InvalidPathException e) {
            throw refusal(Problem.of("\"%s\" cannot be the name of a file".formatted(shown))
                    .tryThis("Write the name of a file that lies beside the project."));
        }
        if (path.isAbsolute() || file.startsWith("/") || DRIVE.matcher(file).matches()) {
            throw outside(shown, "It begins at the root of the machine.");
        }
        for (Path part : path) {
            if (part.toString().equals("..")) {
                throw outside(shown, "It leads upwards by \"..\".");
            }
        }
        return path;
    }

    private static Refusal outside(String shown, String how) {
        return refusal(Problem.of("the data file %s may lie outside the folder of the project".formatted(shown))
                .because(how + " A project reads only below its own folder, so that it can be passed on whole.")
                .tryThis("Copy the file beside the project and name it alone."));
    }

    /// @param parent where it was looked for; its names are told only where it lies below the root
    private static Refusal missing(String shown, Path root, Path parent, String name) throws IOException {
        Problem problem = Problem.of("there is no data file %s".formatted(shown))
                .because("It is looked for below the folder of the project.");
        boolean below = Files.isDirectory(parent) && parent.toRealPath().startsWith(root);
        Optional<String> near = below ? Nearest.to(name, names(parent)) : Optional.empty();
        return refusal(problem.tryThis(near.map(
                        other -> "Was %s meant?".formatted(Shown.plain(asWritten(shown, name, other))))
                .orElse("Put the file beside the project, or write its name as it is there.")));
    }

    private static String asWritten(String shown, String name, String other) {
        return shown.endsWith(name)
                ? shown.substring(0, shown.length() - name.length()) + other
                : shown.replace(name + "/", other + "/");
    }

    private static List<String> names(Path folder) throws IOException {
        try (Stream<Path> files = Files.list(folder)) {
            return files.map(path -> path.getFileName().toString())
                    .limit(MOST_NAMES)
                    .toList();
        }
    }

    private static byte[] bytes(Path path, String shown) throws IOException {
        try (InputStream in = Files.newInputStream(path)) {
            byte[] bytes = in.readNBytes(MOST_BYTES + 1);
            if (bytes.length > MOST_BYTES) {
                throw refusal(Problem.of(String.format(Locale.ROOT, "%s has more than %,d bytes", shown, MOST_BYTES))
                        .because("A file of data has at most 50 MiB.")
                        .tryThis("Keep the one column that is needed."));
            }
            return bytes;
        }
    }

    static Refusal refusal(Problem problem) {
        return new Refusal(problem.at(Place.of("data")));
    }
}
