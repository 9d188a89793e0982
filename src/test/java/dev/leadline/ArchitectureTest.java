package dev.leadline;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.core.domain.AccessTarget.CodeUnitAccessTarget;
import com.tngtech.archunit.core.domain.Dependency;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.lang.ArchCondition;
import com.tngtech.archunit.lang.ArchRule;
import com.tngtech.archunit.lang.ConditionEvents;
import com.tngtech.archunit.lang.SimpleConditionEvent;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.Function;
import java.util.function.Predicate;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/// Holds the code to the table of `architecture/may-use.txt` and to a few habits a compiler cannot see.
///
/// Every rule is also run on the classes of `dev.leadline.planted`, each of which breaks exactly one, and must name
/// them.
class ArchitectureTest {

    private static final String ROOT = "dev.leadline";
    private static final String PLANTED = "dev.leadline.planted";
    private static final MayUse TABLE = MayUse.ofResource("/architecture/may-use.txt");

    /// Packages whose numbers stand in a run record and must have the same bits on every machine.
    private static final Set<String> DRAW_PATH =
            Set.of("numeric", "stream", "formula", "density", "scheme", "estimate", "engine");

    /// `Math` allows these to differ by an ulp between machines and between the interpreter and compiled code.
    private static final Set<String> UNSTABLE = Set.of(
            "sin", "cos", "tan", "asin", "acos", "atan", "atan2", "sinh", "cosh", "tanh", "exp", "expm1", "log",
            "log10", "log1p", "pow", "cbrt", "hypot");

    private static final JavaClasses PROGRAM = new ClassFileImporter()
            .withImportOption(new ImportOption.DoNotIncludeTests())
            .importPackages(ROOT);
    private static final JavaClasses OFFENDERS = new ClassFileImporter().importPackages(PLANTED);

    /// A rule for the code below a root package, and the planted classes that it must find.
    private record Rule(String name, Function<String, ArchRule> below, Set<String> planted) {
        @Override
        public String toString() {
            return name;
        }
    }

    static Stream<Rule> rules() {
        return Stream.of(
                new Rule(
                        "every package has a line in the table",
                        root -> everyClass(
                                root,
                                "stand in a package that may-use.txt lists",
                                c -> TABLE.packages().containsKey(topic(c, root))
                                        ? List.of()
                                        : List.of(topic(c, root))),
                        Set.of("stray.Unlisted")),
                new Rule(
                        "a package uses only what the table allows",
                        root -> everyClass(
                                root,
                                "use only packages that may-use.txt allows",
                                c -> uses(c, root)
                                        .filter(used -> !allowed(topic(c, root), topic(used, root)))
                                        .map(JavaClass::getName)
                                        .toList()),
                        Set.of("numeric.UsesDensity")),
                new Rule(
                        "a library is imported only where the table allows",
                        root -> everyClass(
                                root,
                                "import only libraries that may-use.txt allows",
                                c -> targets(c)
                                        .filter(used -> !importAllowed(topic(c, root), used.getName()))
                                        .map(JavaClass::getName)
                                        .toList()),
                        Set.of("formula.ReadsJson", "desktop.stage.DrawsChart")),
                new Rule(
                        "no package imports both JavaFX and JFreeChart",
                        ArchitectureTest::chartsApartFromTheWindow,
                        Set.of("desktop.stage.DrawsChart")),
                new Rule(
                        "view-models know no node, stage or thread",
                        root -> noClasses()
                                .that()
                                .resideInAPackage(root + "..")
                                .and()
                                .haveSimpleNameEndingWith("ViewModel")
                                .should()
                                .dependOnClassesThat()
                                .resideInAnyPackage("javafx.scene..", "javafx.stage..", "javafx.application.."),
                        Set.of("desktop.NodeViewModel")),
                new Rule(
                        "one door to the FX thread",
                        root -> everyClass(
                                root,
                                "leave Platform.runLater to FxBackground",
                                c -> c.getSimpleName().equals("FxBackground")
                                        ? List.of()
                                        : calls(c, "javafx.application.Platform", Set.of("runLater"))),
                        Set.of("desktop.SecondDoor")),
                new Rule(
                        "the draw path has the same bits everywhere",
                        root -> everyClass(
                                root,
                                "call no Math function whose bits may differ",
                                c -> DRAW_PATH.contains(topic(c, root))
                                        ? calls(c, "java.lang.Math", UNSTABLE)
                                        : List.of()),
                        Set.of("numeric.CallsSin", "engine.RefersToExp")),
                new Rule(
                        "a formula cannot reach the machine",
                        root -> everyClass(
                                root,
                                "use no file, network, process or reflection in a formula",
                                c -> topic(c, root).equals("formula")
                                        ? targets(c)
                                                .map(JavaClass::getName)
                                                .filter(ArchitectureTest::reachesTheMachine)
                                                .toList()
                                        : List.of()),
                        Set.of("formula.OpensFile")),
                new Rule(
                        "a class is named after what it is",
                        root -> everyClass(
                                root,
                                "not be called Util, Manager, Helper or Impl",
                                c -> c.getSimpleName().matches(".*(Utils?|Manager|Helper|Impl)")
                                        ? List.of(c.getSimpleName())
                                        : List.of()),
                        Set.of("problem.TextUtil")));
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("rules")
    void holdsInTheProgram(Rule rule) {
        rule.below.apply(ROOT).allowEmptyShould(true).check(PROGRAM);
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("rules")
    void findsWhatWasPlanted(Rule rule) {
        var report = rule.below.apply(PLANTED).evaluate(OFFENDERS).getFailureReport();
        var found = OFFENDERS.stream()
                .map(JavaClass::getName)
                .filter(name -> report.getDetails().stream().anyMatch(line -> line.contains("<" + name)))
                .map(name -> name.substring(PLANTED.length() + 1))
                .collect(Collectors.toCollection(TreeSet::new));
        assertEquals(new TreeSet<>(rule.planted), found, report::toString);
    }

    @Test
    void seesTheProgram() {
        assertTrue(PROGRAM.contain(ROOT + ".Main"));
    }

    @Test
    void tableCannotHoldACycle() {
        assertThrows(
                IllegalArgumentException.class,
                () -> MayUse.parse(List.of("package density: formula", "package formula: density")));
        assertThrows(IllegalArgumentException.class, () -> MayUse.parse(List.of("package density: density")));
    }

    @Test
    void tableRefusesWhatItCannotRead() {
        for (String line : List.of("package density", "packages density: ", "package a: above but b", "library x: y")) {
            assertThrows(IllegalArgumentException.class, () -> MayUse.parse(List.of(line)), line);
        }
        assertThrows(IllegalArgumentException.class, () -> MayUse.parse(List.of("package a:", "package a:")));
    }

    @Test
    void aboveMeansEveryLineAbove() {
        var table = MayUse.parse(List.of("package a:", "package b: above", "package c: above but a"));
        assertEquals(Set.of("a"), table.packages().get("b"));
        assertEquals(Set.of("b"), table.packages().get("c"));
    }

    private static ArchRule everyClass(String root, String should, Function<JavaClass, List<String>> faults) {
        return classes().that().resideInAPackage(root + "..").should(new ArchCondition<JavaClass>(should) {
            @Override
            public void check(JavaClass c, ConditionEvents events) {
                faults.apply(c)
                        .forEach(fault -> events.add(
                                SimpleConditionEvent.violated(c, "<%s> (%s)".formatted(c.getName(), fault))));
            }
        });
    }

    private static ArchRule chartsApartFromTheWindow(String root) {
        return everyClass(root, "keep JFreeChart out of packages that import JavaFX", c -> {
            Predicate<JavaClass> drawsCharts =
                    other -> targets(other).anyMatch(t -> t.getName().startsWith("org.jfree."));
            Predicate<JavaClass> showsNodes =
                    other -> targets(other).anyMatch(t -> t.getName().startsWith("javafx."));
            return drawsCharts.test(c) && c.getPackage().getClasses().stream().anyMatch(showsNodes)
                    ? List.of("JavaFX and JFreeChart in " + c.getPackageName())
                    : List.of();
        });
    }

    /// The package's name below the root, without its inner packages; for a class of the root itself, the class's name.
    private static String topic(JavaClass c, String root) {
        if (c.getPackageName().equals(root)) {
            return c.getName().substring(root.length() + 1).replaceAll("\\$.*", "");
        }
        return c.getPackageName().substring(root.length() + 1).replaceAll("\\..*", "");
    }

    private static boolean allowed(String from, String to) {
        return from.equals(to) || TABLE.packages().getOrDefault(from, Set.of()).contains(to);
    }

    private static boolean importAllowed(String from, String className) {
        if (className.startsWith("java.") || className.startsWith("javax.") || className.startsWith(ROOT + ".")) {
            return true;
        }
        return TABLE.importersOf(className).map(who -> who.contains(from)).orElse(false);
    }

    private static boolean reachesTheMachine(String className) {
        return Stream.of(
                                "java.nio.file.",
                                "java.nio.channels.",
                                "java.net.",
                                "java.lang.reflect.",
                                "java.lang.foreign.")
                        .anyMatch(className::startsWith)
                || className.startsWith("java.io.File")
                || Set.of("java.lang.ProcessBuilder", "java.lang.Process", "java.lang.Runtime", "java.lang.ClassLoader")
                        .contains(className);
    }

    private static Stream<JavaClass> uses(JavaClass c, String root) {
        return targets(c)
                .filter(used -> used.getPackageName().equals(root)
                        || used.getPackageName().startsWith(root + "."));
    }

    private static Stream<JavaClass> targets(JavaClass c) {
        return c.getDirectDependenciesFromSelf().stream()
                .map(Dependency::getTargetClass)
                .map(JavaClass::getBaseComponentType)
                .filter(used -> !used.isPrimitive())
                .distinct();
    }

    private static List<String> calls(JavaClass c, String owner, Set<String> methods) {
        return Stream.<CodeUnitAccessTarget>concat(
                        c.getCodeUnitCallsFromSelf().stream().map(call -> call.getTarget()),
                        c.getCodeUnitReferencesFromSelf().stream().map(reference -> reference.getTarget()))
                .filter(target -> target.getOwner().getName().equals(owner) && methods.contains(target.getName()))
                .map(CodeUnitAccessTarget::getFullName)
                .toList();
    }
}
