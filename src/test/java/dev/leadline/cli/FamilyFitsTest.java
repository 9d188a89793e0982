package dev.leadline.cli;

import static dev.leadline.cli.CommandLines.leadline;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class FamilyFitsTest {

    @TempDir
    Path folder;

    private Path data;

    @BeforeEach
    void write() throws IOException {
        data = Files.writeString(folder.resolve("waits.csv"), "call,hours\n1,1\n2,2\n3,4\n4,9\n5,\n");
    }

    @Test
    void printsATable() {
        var run = leadline("families", "--fit", data, "--column", "hours", "normal", "uniform", "beta");
        assertEquals(0, run.exitCode(), run.err());
        // closed forms: from 1 to 9, 4 log 8; mean 4, variance 9.5, 2 log(2 pi e 9.5)
        assertTrue(
                run.out()
                        .replaceAll(" +", " ")
                        .startsWith(
                                "family log-likelihood AIC KS AD parameters%nuniform -8.31777 20.6355 0.375 - from=1 to=9"
                                        .formatted()),
                run.out());
        assertTrue(run.out().contains("normal         -10.1783  24.3567"), run.out());
        assertTrue(run.out().contains("beta: the values reach from 1 to 9 but must lie between 0 and 1."), run.out());
        assertTrue(run.out().contains("no p-values"), run.out());
        assertTrue(run.err().contains("has no number in row 6"), run.err());
    }

    @Test
    void takesGivenParametersAndPrintsJson() {
        var json = leadline(
                        "families",
                        "--fit",
                        data,
                        "--column",
                        2,
                        "--json",
                        "beta",
                        "from=0",
                        "to=10",
                        "lognormal",
                        "gamma")
                .json();
        assertEquals(3, json.required("fits").size());
        assertEquals(0, json.required("refused").size());
        var beta = json.required("fits")
                .valueStream()
                .filter(fit -> fit.required("family").asString().equals("beta"))
                .findFirst()
                .orElseThrow();
        assertEquals(10, beta.required("parameters").required("to").asDouble());
        assertEquals(4, beta.required("values").asInt());
    }

    /// A project that was given the line draws from the fitted member, and knows which data it was fitted to.
    @Test
    void printsDensitiesThatAProjectTakes() throws IOException {
        String out = leadline("families", "--fit", data, "--column", "hours", "normal", "uniform")
                .out();
        var lines = out.lines().filter(line -> line.startsWith("{")).toList();
        assertEquals(
                "{\"data\": \"waits.csv\", \"column\": \"hours\", \"fitted\": {\"family\": \"uniform\", \"from\": 1, \"to\":"
                        + " 9}}",
                lines.getFirst());
        assertEquals(2, lines.size());
        for (String line : lines) {
            var project = Files.writeString(
                    folder.resolve("pasted.leadline"),
                    "{\"leadline\": 1, \"inputs\": [{\"name\": \"t\", \"density\": %s}], \"ask\": {\"mean\": \"t\"}}"
                            .formatted(line));
            assertEquals(0, leadline("check", project).exitCode(), line);
        }
        var json = leadline("families", "--fit", data, "--column", "hours", "--json", "normal")
                .json();
        var density = json.required("fits").get(0).required("density");
        assertEquals("waits.csv", density.required("data").asString());
        assertEquals(4, density.required("fitted").required("mean").asDouble(), 1e-12);
    }

    @Test
    void fitsAllWhereNoneIsNamed() {
        var json = leadline("families", "--fit", data, "--column", 2, "--json").json();
        assertTrue(json.required("fits").size() > 10);
    }

    @Test
    void refusesWhatItCannotTake() {
        assertEquals(2, leadline("families", "--fit", data).exitCode());
        refuses("--column has no use without --fit", "--column", "2");
        refuses("The family \"gama\" is not available", "--fit", data, "--column", "2", "gama");
        refuses("\"from=1\" stands before any family", "--fit", data, "--column", "2", "from=1");
        refuses("\"from=x\" has no number behind its =", "--fit", data, "--column", "2", "beta", "from=x");
        refuses("There is no data file wait.csv", "--fit", folder.resolve("wait.csv"));
        refuses("Waits.csv has no column \"huors\"", "--fit", data, "--column", "huors");
    }

    private static void refuses(String said, Object... arguments) {
        Object[] all = new Object[arguments.length + 1];
        all[0] = "families";
        System.arraycopy(arguments, 0, all, 1, arguments.length);
        var run = leadline(all);
        assertEquals(2, run.exitCode());
        assertTrue(run.err().contains(said), run.err());
    }
}
