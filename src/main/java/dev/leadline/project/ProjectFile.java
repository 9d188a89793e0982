package dev.leadline.project;

import dev.leadline.model.DataFiles;
import dev.leadline.model.Draft;
import dev.leadline.problem.Nearest;
import dev.leadline.problem.Place;
import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import dev.leadline.problem.Span;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;

/// The project file: UTF-8 JSON of at most 10 MiB, extension `.leadline`.
public final class ProjectFile {

    public static final String EXTENSION = ".leadline";
    public static final int MOST_BYTES = 10 << 20;

    private ProjectFile() {}

    /// @throws Refusal where there is no such file, or its text cannot be taken as a project at all
    public static Reading examine(Path file) {
        return examine(bytes(file), DataFolder.beside(file));
    }

    /// @throws Refusal where the text cannot be taken as a project at all
    public static Reading examine(byte[] bytes) {
        return examine(bytes, DataFiles.NONE);
    }

    private static Reading examine(byte[] bytes, DataFiles files) {
        if (bytes.length > MOST_BYTES) {
            throw tooLarge(bytes.length);
        }
        var problems = new Problems();
        Json json = JsonReader.read(text(bytes), problems);
        Draft draft = DraftReader.read(json, problems);
        boolean asksInList = ((Json.Members) json).map().get("ask") instanceof Json.Elements;
        return new Reading(draft, files, problems.found(), asksInList);
    }

    /// @throws Refusal with every problem of the file
    public static Draft read(Path file) {
        return draft(examine(file));
    }

    /// @throws Refusal with every problem of the text
    public static Draft parse(byte[] bytes) {
        return draft(examine(bytes));
    }

    /// @throws Refusal with every problem of the text
    public static Draft parse(String text) {
        return parse(text.getBytes(StandardCharsets.UTF_8));
    }

    /// The text of the file that holds a draft.
    public static String format(Draft draft) {
        return JsonWriter.pretty(DraftWriter.write(draft));
    }

    /// Replaces the file as a whole, or leaves it as it was.
    ///
    /// @throws Refusal where that cannot be done
    public static void write(Path file, Draft draft) {
        byte[] bytes = format(draft).getBytes(StandardCharsets.UTF_8);
        if (bytes.length > MOST_BYTES) {
            throw tooLarge(bytes.length);
        }
        WholeFile.write(file, bytes);
    }

    private static Draft draft(Reading reading) {
        if (!reading.problems().isEmpty()) {
            throw new Refusal(reading.problems());
        }
        return reading.draft();
    }

    private static byte[] bytes(Path file) {
        if (Files.notExists(file)) {
            Problem problem = Problem.of("there is no file %s".formatted(Shown.plain(file.toString())));
            throw new Refusal(neighbour(file)
                    .map(near -> problem.tryThis("Was %s meant?".formatted(near)))
                    .orElse(problem));
        }
        if (Files.isDirectory(file)) {
            throw new Refusal(Problem.of("there is a folder at %s, not a file".formatted(Shown.plain(file.toString())))
                    .tryThis("Give a project file, by habit name%s.".formatted(EXTENSION)));
        }
        if (!Files.isRegularFile(file)) {
            throw new Refusal(Problem.of("%s is not a file".formatted(Shown.plain(file.toString())))
                    .tryThis("Give a project file, by habit name%s.".formatted(EXTENSION)));
        }
        try {
            long size = Files.size(file);
            if (size > MOST_BYTES) {
                throw tooLarge(size);
            }
            return Files.readAllBytes(file);
        } catch (IOException e) {
            throw new Refusal(Problem.of("%s cannot be read".formatted(Shown.plain(file.toString())))
                    .because(Shown.plain(String.valueOf(e.getMessage())))
                    .tryThis("See whether you may read it."));
        }
    }

    private static Refusal tooLarge(long size) {
        return new Refusal(Problem.of(String.format(Locale.ROOT, "the project has %,d bytes", size))
                .because(String.format(Locale.ROOT, "A project has at most %,d bytes.", MOST_BYTES)));
    }

    /// A project beside the missing one whose name is close to it.
    private static Optional<Path> neighbour(Path file) {
        Path whole = file.resolveSibling(file.getFileName() + EXTENSION);
        if (Files.isRegularFile(whole)) {
            return Optional.of(whole);
        }
        Path folder = file.toAbsolutePath().getParent();
        if (folder == null || !Files.isDirectory(folder)) {
            return Optional.empty();
        }
        try (Stream<Path> files = Files.list(folder)) {
            List<String> names = files.map(path -> path.getFileName().toString())
                    .filter(name -> name.endsWith(EXTENSION))
                    .limit(1000)
                    .toList();
            return Nearest.to(file.getFileName().toString(), names).map(file::resolveSibling);
        } catch (IOException e) {
            return Optional.empty();
        }
    }

    private static String text(byte[] bytes) {
        ByteBuffer rest = ByteBuffer.wrap(bytes);
        try {
            String text = StandardCharsets.UTF_8.newDecoder().decode(rest).toString();
            return text.startsWith("\ufeff") ? text.substring(1) : text;
        } catch (CharacterCodingException e) {
            // the decoder stops before the first byte that is no UTF-8
            String before = new String(bytes, 0, rest.position(), StandardCharsets.UTF_8);
            long line = 1 + before.chars().filter(c -> c == '\n').count();
            throw new Refusal(Problem.of(String.format(
                            Locale.ROOT, "the file is not UTF-8 text (byte %,d, line %d)", rest.position(), line))
                    .tryThis("Save it as UTF-8, or see whether it is a project at all.")
                    .at(Place.of(new Span(before.length(), before.length()))));
        }
    }
}
