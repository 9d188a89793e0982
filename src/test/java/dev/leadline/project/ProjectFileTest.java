package dev.leadline.project;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.interval.Bounds;
import dev.leadline.model.DensityDraft;
import dev.leadline.model.DensityDraft.Column;
import dev.leadline.model.DensityDraft.Data;
import dev.leadline.model.DensityDraft.Ends;
import dev.leadline.model.DensityDraft.Member;
import dev.leadline.model.DensityDraft.Mixture;
import dev.leadline.model.DensityDraft.Part;
import dev.leadline.model.DensityDraft.Typed;
import dev.leadline.model.DensityDraft.Values;
import dev.leadline.model.Draft;
import dev.leadline.model.Draft.AskDraft;
import dev.leadline.model.Draft.ConstantDraft;
import dev.leadline.model.Draft.DependenceDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.GuardDraft;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Draft.IntervalDraft;
import dev.leadline.model.Draft.PairDraft;
import dev.leadline.model.Draft.ReferenceDraft;
import dev.leadline.model.Draft.StopDraft;
import dev.leadline.model.Draft.ToleranceDraft;
import dev.leadline.model.LaneDraft;
import dev.leadline.model.LaneDraft.ControlDraft;
import dev.leadline.model.LaneDraft.DrawFrom;
import dev.leadline.model.LaneDraft.Mean;
import dev.leadline.model.LaneDraft.Other;
import dev.leadline.model.LaneDraft.Settings;
import dev.leadline.model.Project;
import dev.leadline.problem.Refusal;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.SplittableRandom;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ProjectFileTest {

    private static final DensityDraft CHANGED = new DensityDraft(
            new Member("weibull", new LinkedHashMap<>(Map.of("shape", 2.0, "scale", 3.0))),
            OptionalDouble.of(1),
            OptionalDouble.empty(),
            Optional.of(new Ends(2, Double.POSITIVE_INFINITY)));

    /// Every field that a draft can hold.
    private static final Draft FULL = new Draft(
            "Load on a mooring — \"windy\"",
            "Two lines:\nthe second has a tab\t and a \\.",
            true,
            List.of(new ConstantDraft("g", 9.80665, "m/s2", "gravity", "by definition"), constant("n", -1e-300)),
            List.of(
                    new InputDraft(
                            "v", "m/s", "gust", "31 maxima", new From.Density(density("gumbel", "location", 24.5))),
                    new InputDraft("x", "m", "", "", new From.Range(0, 420, Optional.empty())),
                    new InputDraft(
                            "z",
                            "",
                            "",
                            "",
                            new From.Range(
                                    Double.NEGATIVE_INFINITY,
                                    Double.POSITIVE_INFINITY,
                                    Optional.of(density("normal", "sd", 2)))),
                    input("t", new Typed("exp(-abs(t)^3)", Double.NEGATIVE_INFINITY, 7, List.of(0.0, .5), true)),
                    input("k", new Values(List.of(0.0, 10.0), List.of(.93, .07))),
                    input(
                            "m",
                            new Mixture(List.of(
                                    new Part(.9, density("exponential", "mean", 3)),
                                    new Part(.1, DensityDraft.of(new Mixture(List.of(new Part(1, CHANGED)))))))),
                    new InputDraft("c", "", "", "", new From.Density(CHANGED)),
                    input("d", data(new Column.Named("hours"))),
                    input("e", data(new Column.At(2))),
                    input("f", data(new Column.Only()))),
            Optional.of(new DependenceDraft(
                    "student",
                    OptionalDouble.of(4),
                    true,
                    List.of(new PairDraft("v", "t", "spearman", .4), new PairDraft("t", "m", "pearson", -.1)))),
            List.of("q = 0.5*v^2   # Pa"),
            List.of(
                    new AskDraft("integral", "q*x", "m3", "volume"),
                    new AskDraft("mean", "q", "", ""),
                    new AskDraft("quantile", List.of("q"), OptionalDouble.of(.99), OptionalDouble.empty(), "", ""),
                    new AskDraft("ratio", List.of("q", "v"), OptionalDouble.empty(), OptionalDouble.empty(), "", "of"),
                    new AskDraft(
                            "distribution", List.of("q"), OptionalDouble.empty(), OptionalDouble.of(.9), "Pa", "")),
            Optional.of(new ReferenceDraft.Value(1.2568e-5, OptionalDouble.of(4e-9), "closed form")),
            OptionalDouble.of(.99),
            Optional.of(new ToleranceDraft(OptionalDouble.of(25), OptionalDouble.of(.1), Optional.of("both"))),
            Optional.of(new IntervalDraft(Optional.of("hoeffding"), Optional.of(new Bounds(-1, 2)))),
            Optional.of(new StopDraft(
                    "any-time",
                    OptionalLong.of(200_000_000),
                    OptionalDouble.of(.5),
                    OptionalLong.of(385),
                    Optional.of(new GuardDraft(OptionalLong.of(2000), OptionalLong.of(30))),
                    OptionalLong.of(5000),
                    OptionalDouble.of(1.1),
                    OptionalLong.of(1))),
            OptionalLong.of(Long.MAX_VALUE),
            true,
            List.of(
                    LaneDraft.of("A", "independent"),
                    new LaneDraft(
                            "B",
                            "stratified",
                            new Settings(
                                    OptionalLong.of(16),
                                    OptionalLong.of(1000),
                                    new LinkedHashMap<>(Map.of("v", 8L)),
                                    Optional.of("nested"),
                                    OptionalLong.of(100),
                                    OptionalLong.of(20),
                                    Optional.of("neyman")),
                            new DrawFrom.Adapted("grid"),
                            OptionalDouble.of(.2),
                            true,
                            List.of(
                                    new ControlDraft("v", new Mean.Exact()),
                                    new ControlDraft("v^2", new Mean.Stated(3)),
                                    new ControlDraft("x", new Mean.Quadrature())),
                            true,
                            OptionalLong.of(50_000)),
                    new LaneDraft(
                            "C",
                            "independent",
                            Settings.NONE,
                            others(),
                            OptionalDouble.empty(),
                            false,
                            List.of(),
                            false,
                            OptionalLong.empty())));

    private static final long MUTATED_PROJECTS = 1_000;

    private static DrawFrom others() {
        var others = new LinkedHashMap<String, Other>();
        others.put("v", new Other.Another(DensityDraft.of("normal", new LinkedHashMap<>(Map.of("mean", 1.0)))));
        others.put("w", new Other.Shift(3));
        others.put("x", new Other.Widen(1.5));
        others.put("y", new Other.Tilt(-2));
        others.put("z", new Other.Adapt());
        return new DrawFrom.Inputs(others);
    }

    private static InputDraft input(String name, DensityDraft.Of of) {
        return new InputDraft(name, "", "", "", new From.Density(DensityDraft.of(of)));
    }

    private static Data data(Column column) {
        return new Data(
                "waits.csv",
                column,
                Optional.of("kernel"),
                OptionalDouble.of(.3),
                Optional.of(new Member("gamma", new LinkedHashMap<>(Map.of("scale", 2.0)))));
    }

    private static ConstantDraft constant(String name, double value) {
        return new ConstantDraft(name, value, "", "", "");
    }

    private static DensityDraft density(String family, String parameter, double value) {
        return DensityDraft.of(family, new LinkedHashMap<>(Map.of(parameter, value)));
    }

    @Test
    void readsBackWhatItWrote() {
        String text = ProjectFile.format(FULL);
        assertEquals(FULL, ProjectFile.parse(text), text);
        assertEquals(text, ProjectFile.format(ProjectFile.parse(text)));
        assertTrue(text.startsWith("{\n  \"leadline\": 1,\n"), text);
    }

    @Test
    void asksOfOneStandByThemselvesOrInAList() {
        var inList = ProjectFile.parse("{\"leadline\": 1, \"ask\": [{\"mean\": \"x\"}]}");
        assertEquals(inList, ProjectFile.parse("{\"leadline\": 1, \"ask\": {\"mean\": \"x\"}}"));
    }

    @Test
    void savesWhatIsUnfinished() {
        var unfinished = ProjectFile.format(new Draft(
                "",
                "",
                false,
                List.of(constant("", Double.NaN)),
                List.of(new InputDraft("", "", "", "", new From.Density(DensityDraft.unchosen()))),
                Optional.empty(),
                List.of(""),
                List.of(new AskDraft("mean", "", "", "")),
                Optional.empty(),
                OptionalDouble.empty(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                OptionalLong.empty(),
                false,
                List.of()));
        var reading = ProjectFile.examine(unfinished.getBytes(StandardCharsets.UTF_8));
        assertEquals(
                List.of("$.constants[0].value"),
                reading.problems().stream().map(p -> p.place().path()).toList());
        assertEquals(1, reading.draft().inputs().size());
    }

    @Test
    void takesAByteOrderMark() {
        assertEquals(
                "x",
                ProjectFile.parse("\ufeff{\"leadline\": 1, \"title\": \"x\"}").title());
    }

    @Test
    void writesWholeFilesAndKeepsPermissions(@TempDir Path folder) throws IOException {
        Path file = folder.resolve("a.leadline");
        ProjectFile.write(file, FULL);
        assertEquals(FULL, ProjectFile.read(file));
        Files.setPosixFilePermissions(file, PosixFilePermissions.fromString("rw-r-----"));
        ProjectFile.write(file, FULL);
        assertEquals("rw-r-----", PosixFilePermissions.toString(Files.getPosixFilePermissions(file)));
        try (Stream<Path> left = Files.list(folder)) {
            assertEquals(List.of(file), left.toList());
        }
    }

    @Test
    void followsALinkInsteadOfReplacingIt(@TempDir Path folder) throws IOException {
        Path file = Files.writeString(folder.resolve("a.leadline"), "old");
        Path link = Files.createSymbolicLink(folder.resolve("link.leadline"), file);
        ProjectFile.write(link, FULL);
        assertTrue(Files.isSymbolicLink(link));
        assertEquals(FULL, ProjectFile.read(file));
    }

    @Test
    void refusesToWriteWhereItCannot(@TempDir Path folder) throws IOException {
        Path notes = Files.writeString(folder.resolve("notes.txt"), "keep me");
        for (Path place : List.of(folder.resolve("nowhere/a.leadline"), notes.resolve("a.leadline"), folder)) {
            var refusal = assertThrows(Refusal.class, () -> ProjectFile.write(place, FULL), place.toString());
            assertTrue(refusal.problems().getFirst().primary().endsWith("cannot be written"), refusal.getMessage());
        }
        assertEquals("keep me", Files.readString(notes));
        try (Stream<Path> left = Files.list(folder)) {
            assertEquals(List.of(notes), left.toList());
        }
    }

    @Test
    void refusesWhatIsNoFile(@TempDir Path folder) throws IOException {
        Files.writeString(folder.resolve("mooring-line.leadline"), "{}");
        var refusal = assertThrows(Refusal.class, () -> ProjectFile.read(folder.resolve("moring-line.leadline")));
        assertTrue(refusal.problems().getFirst().hint().orElseThrow().contains("mooring-line.leadline"));
        assertThrows(Refusal.class, () -> ProjectFile.read(folder));
        Path large = folder.resolve("large.leadline");
        try (var channel = Files.newByteChannel(large, StandardOpenOption.CREATE_NEW, StandardOpenOption.WRITE)) {
            channel.position(ProjectFile.MOST_BYTES).write(ByteBuffer.wrap(new byte[1]));
        }
        assertThrows(Refusal.class, () -> ProjectFile.read(large));
    }

    /// Bytes changed, dropped, doubled and moved at random: whatever comes, it is a draft or a refusal.
    @Test
    void givesADraftOrARefusalWhateverTheBytes() {
        byte[] sound = ProjectFile.format(FULL).getBytes(StandardCharsets.UTF_8);
        int drafts = 0;
        for (long seed = 0; seed < 5_000; seed++) {
            byte[] bytes = mutated(sound, new SplittableRandom(seed));
            try {
                String text = ProjectFile.format(ProjectFile.parse(bytes));
                assertArrayEquals(
                        text.getBytes(StandardCharsets.UTF_8),
                        ProjectFile.format(ProjectFile.parse(text)).getBytes(StandardCharsets.UTF_8));
                drafts++;
            } catch (Refusal refusal) {
                assertFalse(refusal.problems().isEmpty());
            } catch (RuntimeException | StackOverflowError | AssertionError e) {
                throw new AssertionError("seed " + seed + ": " + e, e);
            }
        }
        assertTrue(drafts > 50 && drafts < 4_950, drafts + " of 5,000 were drafts: the mutations test little");
    }

    /// The same of a sample, checked as a whole: every mutation is a project or a refusal.
    @Test
    void givesAProjectOrARefusalWhateverTheBytes() throws IOException {
        byte[] sound = Files.readAllBytes(Path.of("sample-projects/mooring-line.leadline"));
        int projects = 0;
        for (long seed = 0; seed < MUTATED_PROJECTS; seed++) {
            byte[] bytes = mutated(sound, new SplittableRandom(seed));
            try {
                ProjectFile.examine(bytes).project();
                projects++;
            } catch (Refusal refusal) {
                assertFalse(refusal.problems().isEmpty());
            } catch (RuntimeException | StackOverflowError | AssertionError e) {
                throw new AssertionError("seed " + seed + ": " + e, e);
            }
        }
        assertTrue(projects > MUTATED_PROJECTS / 100, projects + " were projects: the mutations test little");
    }

    private static byte[] mutated(byte[] sound, SplittableRandom random) {
        byte[] bytes = sound.clone();
        for (int edits = random.nextInt(1, 4); edits > 0; edits--) {
            int at = random.nextInt(bytes.length);
            int length = Math.min(random.nextInt(1, 12), bytes.length - at);
            switch (random.nextInt(4)) {
                case 0 -> bytes[at] = (byte) random.nextInt(256);
                case 1 -> bytes[at] = (byte) "{}[]\",:0-.eEtfn\\ ".charAt(random.nextInt(17));
                case 2 -> System.arraycopy(bytes, at, bytes, random.nextInt(bytes.length - length + 1), length);
                default -> bytes = Arrays.copyOf(bytes, Math.max(1, bytes.length - random.nextInt(40)));
            }
        }
        return bytes;
    }

    @Test
    void aRuleAndACopulaThatAreNotNamedAreTheUsualOnes() {
        var draft = ProjectFile.parse("""
                {"leadline": 1, "inputs": [{"name": "x", "density": {"family": "normal", "mean": 0, "sd": 1}},
                 {"name": "y", "density": {"family": "normal", "mean": 0, "sd": 1}}],
                 "dependence": {"pairs": [{"of": ["x", "y"], "spearman": 0.4}]}, "ask": {"mean": "x*y"}, "stop": {"draws": 5000}}
                """);
        assertEquals("fixed", Project.stopRule(draft));
        assertEquals("gaussian", draft.dependence().orElseThrow().copula());
        assertEquals(5000, Project.of(draft).plan().stop().draws());
    }

    @Test
    void readsAndWritesEachKindOfReference() {
        for (String reference : List.of(
                "{\"value\": 0.5, \"error\": 0.001, \"source\": \"by hand\"}",
                "{\"formula\": \"pi/4\"}",
                "{\"quadrature\": true}")) {
            var draft = ProjectFile.parse("""
                    {"leadline": 1, "inputs": [{"name": "x", "range": [0, 1]}], "ask": {"integral": "x"},
                     "reference": %s}""".formatted(reference));
            assertTrue(ProjectFile.format(draft).contains("\"reference\": " + reference), ProjectFile.format(draft));
            assertEquals(draft, ProjectFile.parse(ProjectFile.format(draft)));
        }
    }
}
