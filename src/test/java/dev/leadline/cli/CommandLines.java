package dev.leadline.cli;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.util.ArrayList;
import java.util.List;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/// Commands run as from a shell, in this process.
public final class CommandLines {

    /// What came of one.
    public record Outcome(int exitCode, String out, String err) {

        /// The one JSON object on standard output; anything beside it is an error.
        public JsonNode json() {
            var mapper = JsonMapper.builder()
                    .enable(tools.jackson.databind.DeserializationFeature.FAIL_ON_TRAILING_TOKENS)
                    .build();
            return mapper.readTree(out);
        }
    }

    private CommandLines() {}

    public static Outcome leadline(Object... arguments) {
        return run(false, arguments);
    }

    /// With a terminal as standard error.
    static Outcome leadlineOnTerminal(Object... arguments) {
        return run(true, arguments);
    }

    private static Outcome run(boolean live, Object[] arguments) {
        var out = new StringWriter();
        var err = new StringWriter();
        List<String> words = new ArrayList<>();
        for (Object argument : arguments) {
            words.add(argument.toString());
        }
        var console = new Console(new PrintWriter(out), new PrintWriter(err), live, false);
        int exitCode = Commands.run(words.toArray(String[]::new), console, file -> {
            err.write("opened " + file.map(Object::toString).orElse("nothing"));
            return 0;
        });
        return new Outcome(exitCode, out.toString(), err.toString());
    }
}
