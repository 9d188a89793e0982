package dev.leadline.desktop.picker;

import dev.leadline.desktop.working.NumberText;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.DensityDraft.Values;
import dev.leadline.problem.Problem;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/// Single values with their probabilities, typed as lines of two numbers.
final class ValuesViewModel {
    private final DensityAt at;

    ValuesViewModel(DensityAt at) {
        this.at = at;
    }

    ProjectViewModel project() {
        return at.project();
    }

    private Optional<Values> values() {
        return at.now().of() instanceof Values values ? Optional.of(values) : Optional.empty();
    }

    void type(String text) {
        var values = new ArrayList<Double>();
        var probabilities = new ArrayList<Double>();
        String[] lines = text.split("\n");
        for (int i = 0; i < lines.length; i++) {
            String line = lines[i].strip();
            if (line.isEmpty()) {
                continue;
            }
            String[] words = line.split("[\\s;]+");
            var value = NumberText.read(words[0]);
            var probability = words.length == 2 ? NumberText.read(words[1]) : OptionalDouble.empty();
            if (value.isEmpty() || probability.isEmpty()) {
                project()
                        .unread(
                                at.path() + ".values",
                                text,
                                Problem.of("line %d is \u201c%s\u201d but must be a value and its probability"
                                                .formatted(i + 1, line))
                                        .tryThis("Write two numbers with a blank between them: 3 0.25"));
                return;
            }
            values.add(value.getAsDouble());
            probabilities.add(probability.getAsDouble());
        }
        project().forget(at.path() + ".values");
        if (!values.isEmpty() || values().isPresent()) {
            at.edit(".values", old -> DensityAt.become(old, new Values(values, probabilities)));
        }
    }

    String text() {
        return project()
                .unreadText(at.path() + ".values")
                .orElseGet(() -> values().map(v -> IntStream.range(
                                        0,
                                        Math.min(
                                                v.values().size(),
                                                v.probabilities().size()))
                                .mapToObj(i -> NumberText.show(v.values().get(i)) + " "
                                        + NumberText.show(v.probabilities().get(i)))
                                .collect(Collectors.joining("\n")))
                        .orElse(""));
    }

    /// Whether a text says the same: blanks and lines apart.
    boolean says(String text) {
        return normal(text).equals(normal(text()));
    }

    private static String normal(String text) {
        return text.strip()
                .lines()
                .map(line -> line.strip().replaceAll("[\\s;]+", " "))
                .filter(line -> !line.isEmpty())
                .map(line -> Arrays.stream(line.split(" "))
                        .map(word -> NumberText.read(word).isPresent()
                                ? NumberText.show(NumberText.read(word).getAsDouble())
                                : word)
                        .collect(Collectors.joining(" ")))
                .collect(Collectors.joining("\n"));
    }

    /// The probabilities together, as `0.95 in all`.
    String sum() {
        return values().map(v -> NumberText.show(Math.round(1e12
                                        * v.probabilities().stream()
                                                .mapToDouble(Double::doubleValue)
                                                .sum())
                                / 1e12)
                        + " in all")
                .orElse("");
    }
}
