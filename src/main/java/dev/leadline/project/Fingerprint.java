package dev.leadline.project;

import dev.leadline.estimate.Estimand;
import dev.leadline.formula.Step;
import dev.leadline.model.Ask;
import dev.leadline.model.Components;
import dev.leadline.model.Draft.ConstantDraft;
import dev.leadline.model.Draft.From;
import dev.leadline.model.Draft.InputDraft;
import dev.leadline.model.Project;
import dev.leadline.model.Question;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.List;
import java.util.stream.IntStream;

/// What tells one question from another: the SHA-256 of its canonical JSON (RFC 8785), in hexadecimal.
///
/// Title, notes, labels, seed, lanes, tolerance, stop rule, reference and confidence do not enter: they may change
/// while the question stays the same. Formulas enter as their tokens joined by one space, what is asked always as a
/// list, what is not stated as absent, files of data as their SHA-256.
public final class Fingerprint {

    private Fingerprint() {}

    public static String of(Project project) {
        return sha256(JsonWriter.canonical(content(project)));
    }

    static Json content(Project project) {
        Question question = project.question();
        var content = Json.object();
        content.put("leadline", Json.of(DraftReader.FORMAT));
        if (question.safety()) {
            content.put("safety", Json.of(true));
        }
        content.put(
                "constants",
                Json.list(project.draft().constants().stream()
                        .map(Fingerprint::constant)
                        .toList()));
        content.put(
                "inputs",
                Json.list(project.draft().inputs().stream()
                        .map(Fingerprint::input)
                        .toList()));
        project.draft().dependence().ifPresent(tied -> content.put("dependence", DraftWriter.dependence(tied)));
        content.put(
                "steps",
                Json.list(question.working().steps().stream()
                        .map(Fingerprint::step)
                        .toList()));
        content.put(
                "ask",
                Json.list(IntStream.range(0, question.asks().size())
                        .mapToObj(k -> ask(question, k))
                        .toList()));
        if (!project.data().isEmpty()) {
            var files = Json.object();
            project.data().forEach(files::put);
            content.put("data", files.build());
        }
        return content.build();
    }

    private static Json constant(ConstantDraft constant) {
        return Json.object()
                .put("name", constant.name())
                .put("value", Json.of(constant.value()))
                .putUnlessEmpty("unit", constant.unit())
                .putUnlessEmpty("source", constant.source())
                .build();
    }

    private static Json input(InputDraft input) {
        var fields = Json.object()
                .put("name", input.name())
                .putUnlessEmpty("unit", input.unit())
                .putUnlessEmpty("provenance", input.provenance());
        switch (input.from()) {
            case From.Density(var density) -> fields.put("density", DraftWriter.density(density));
            case From.Range(double low, double high, var drawFrom) -> {
                fields.put("range", Json.list(List.of(DraftWriter.end(low), DraftWriter.end(high))));
                drawFrom.ifPresent(density -> fields.put("drawFrom", DraftWriter.density(density)));
            }
        }
        return fields.build();
    }

    private static Json step(Step step) {
        return Json.of(step.name() + " = " + step.formula().canonical());
    }

    private static Json ask(Question question, int index) {
        Ask ask = question.asks().get(index);
        int first = Components.firstFormula(question.asks(), index);
        List<Json> formulas = question
                .working()
                .asked()
                .subList(first, first + ask.estimand().formulas())
                .stream()
                .map(formula -> Json.of(formula.canonical()))
                .toList();
        var fields = Json.object()
                .put(ask.estimand().word(), formulas.size() == 1 ? formulas.getFirst() : Json.list(formulas));
        switch (ask.estimand()) {
            case Estimand.Quantile(double at) -> fields.put("at", Json.of(at));
            case Estimand.TailMean(double at) -> fields.put("at", Json.of(at));
            case Estimand.Distribution(double coverage) -> fields.put("coverage", Json.of(coverage));
            case Estimand.Mean _,
                    Estimand.Integral _,
                    Estimand.Probability _,
                    Estimand.Ratio _,
                    Estimand.StandardDeviation _ -> {}
        }
        return fields.putUnlessEmpty("unit", ask.unit()).build();
    }

    private static String sha256(String text) {
        return sha256(text.getBytes(StandardCharsets.UTF_8));
    }

    static String sha256(byte[] bytes) {
        try {
            byte[] hash = MessageDigest.getInstance("SHA-256").digest(bytes);
            return HexFormat.of().formatHex(hash);
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java has SHA-256", e);
        }
    }
}
