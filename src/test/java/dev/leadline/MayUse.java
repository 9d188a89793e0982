package dev.leadline;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;

/// The table of `architecture/may-use.txt`: what each package may use, and who may import each library. Immutable once
/// read.
///
/// A package may name only packages of the lines above its own, so a table that can be read has no cycle.
record MayUse(Map<String, Set<String>> packages, Map<String, Set<String>> libraries) {

    static MayUse ofResource(String resource) {
        try (var in = MayUse.class.getResourceAsStream(resource)) {
            return parse(new String(in.readAllBytes(), StandardCharsets.UTF_8)
                    .lines()
                    .toList());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    static MayUse parse(List<String> lines) {
        var packages = new LinkedHashMap<String, Set<String>>();
        var libraries = new TreeMap<String, Set<String>>();
        for (String line : lines) {
            if (line.isBlank() || line.startsWith("#")) {
                continue;
            }
            var parts = line.split(":", 2);
            var head = parts[0].split(" ");
            if (parts.length != 2 || head.length != 2) {
                throw new IllegalArgumentException("not \"package NAME: …\" or \"library PREFIX: …\": " + line);
            }
            var into = head[0].equals("package") ? packages : head[0].equals("library") ? libraries : null;
            if (into == null || into.containsKey(head[1])) {
                throw new IllegalArgumentException("neither package nor library, or written twice: " + line);
            }
            into.put(head[1], Set.copyOf(names(parts[1].strip(), packages.keySet(), line)));
        }
        return new MayUse(packages, libraries);
    }

    private static Set<String> names(String text, Set<String> above, String line) {
        if (text.equals("above") || text.startsWith("above but ")) {
            var all = new LinkedHashSet<>(above);
            if (text.startsWith("above but ") && !all.remove(text.substring("above but ".length()))) {
                throw new IllegalArgumentException("no such package above: " + line);
            }
            return all;
        }
        var named = text.isEmpty() ? Set.<String>of() : new LinkedHashSet<>(List.of(text.split(" +")));
        if (!above.containsAll(named)) {
            throw new IllegalArgumentException("names a package that has no line above: " + line);
        }
        return named;
    }

    /// Who may import the class of this full name; empty where no line speaks of its library.
    Optional<Set<String>> importersOf(String className) {
        return libraries.entrySet().stream()
                .filter(line -> className.startsWith(line.getKey() + "."))
                .max(Map.Entry.comparingByKey())
                .map(Map.Entry::getValue);
    }
}
