package dev.leadline.formula;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.Executors;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class ProgramTest {
    private static final double[] SPECIAL = {
        0,
        -0.0,
        1,
        -1,
        Double.NaN,
        Double.POSITIVE_INFINITY,
        Double.NEGATIVE_INFINITY,
        Double.MIN_VALUE,
        Double.MAX_VALUE,
        -Double.MAX_VALUE,
        .5,
        2.5,
        -2.5,
        1e-300,
        171.5,
        -170.5
    };

    private static Program program(String... asked) {
        return Working.of(List.of("x", "y", "c"), new LinkedHashMap<>(), List.of(), List.of(asked))
                .program();
    }

    private static double[][] columns(int count, int rows, long seed) {
        var random = new SplittableRandom(seed);
        double[][] columns = new double[count][rows];
        for (double[] column : columns) {
            for (int i = 0; i < rows; i++) {
                column[i] = random.nextInt(4) == 0
                        ? SPECIAL[random.nextInt(SPECIAL.length)]
                        : (random.nextDouble() - .5) * Math.scalb(1.0, random.nextInt(-3, 8));
            }
        }
        return columns;
    }

    private static double[] evaluate(Program program, double[][] columns, int rows) {
        double[][] results = new double[program.outputs()][rows];
        program.evaluate(columns, rows, results, program.workspace());
        return results[0];
    }

    /// The definition for one draw says what every kernel must give, for columns and for a number on either side.
    @ParameterizedTest
    @EnumSource(Operation.class)
    void kernelsAgreeWithTheDefinition(Operation operation) {
        int rows = Program.BLOCK;
        double[][] columns = columns(3, rows, operation.ordinal());
        if (operation == Operation.IF) {
            for (int i = 0; i < rows; i++) columns[0][i] = i % 5 == 0 ? Double.NaN : i % 2;
        }
        double[] z = new double[rows];
        operation.columns().fill(columns[0], columns[1], columns[2], 0, z, rows);
        for (int i = 0; i < rows; i++) {
            assertSame(operation.of(columns[0][i], columns[1][i], columns[2][i]), z[i], operation + " row " + i);
        }
        for (double k : SPECIAL) {
            if (operation.numberRight() != null) {
                operation.numberRight().fill(columns[0], null, null, k, z, rows);
                for (int i = 0; i < rows; i++) {
                    assertSame(operation.of(columns[0][i], k, 0), z[i], operation + " of " + columns[0][i] + ", " + k);
                }
            }
            if (operation.numberLeft() != null) {
                operation.numberLeft().fill(null, columns[1], null, k, z, rows);
                for (int i = 0; i < rows; i++) {
                    assertSame(operation.of(k, columns[1][i], 0), z[i], operation + " of " + k + ", " + columns[1][i]);
                }
            }
        }
    }

    @ParameterizedTest
    @EnumSource(Operation.class)
    void resultsMayReplaceAnOperand(Operation operation) {
        if (!operation.inPlace()) return;
        int rows = Program.BLOCK;
        double[][] columns = columns(3, rows, operation.ordinal());
        if (operation == Operation.IF) {
            for (int i = 0; i < rows; i++) columns[0][i] = i % 2;
        }
        double[] expected = new double[rows];
        operation.columns().fill(columns[0], columns[1], columns[2], 0, expected, rows);
        for (int replaced = 0; replaced < operation.operands(); replaced++) {
            double[][] copies = Stream.of(columns).map(double[]::clone).toArray(double[][]::new);
            operation.columns().fill(copies[0], copies[1], copies[2], 0, copies[replaced], rows);
            assertArrayEquals(expected, copies[replaced], operation + " into operand " + replaced);
        }
    }

    static Stream<String> formulas() {
        return Stream.of(
                "exp(-x^2/3)",
                "x*sin(3*x) + log(1 + x)",
                "[x*y - c*x - y^2/4 < 0]",
                "max(0, 100*exp(0.03 + 0.2*x) - 105)",
                "if(x > y, exp(c), hypot(3, c))",
                "x^y + 2^x + x^2.5",
                "atan2(1, x) - atan2(x, 1)",
                "lgamma(x) + erf(y)");
    }

    @ParameterizedTest
    @MethodSource("formulas")
    void anyNumberOfRowsGivesTheSameBits(String formula) {
        var program = program(formula);
        double[][] columns = columns(3, Program.BLOCK, 42);
        double[] whole = evaluate(program, columns, Program.BLOCK);
        for (int from = 0; from < Program.BLOCK; from += 31) {
            int rows = Math.min(from % 3 == 0 ? 1 : 31, Program.BLOCK - from);
            int start = from;
            double[][] part = Stream.of(columns)
                    .map(column -> java.util.Arrays.copyOfRange(column, start, start + rows))
                    .toArray(double[][]::new);
            assertArrayEquals(
                    java.util.Arrays.copyOfRange(whole, from, from + rows),
                    evaluate(program, part, rows),
                    "from " + from);
        }
    }

    @Test
    void oneProgramServesManyThreads() throws Exception {
        var program = program("exp(-x^2/3)*[y < c] + if(x > 1, log(y), x^y)");
        double[][] columns = columns(3, Program.BLOCK, 7);
        double[] expected = evaluate(program, columns, Program.BLOCK);
        try (var threads = Executors.newFixedThreadPool(4)) {
            var runs = IntStream.range(0, 8)
                    .mapToObj(_ -> threads.submit(() -> {
                        var workspace = program.workspace();
                        double[][] results = new double[1][Program.BLOCK];
                        for (int i = 0; i < 200; i++) {
                            program.evaluate(columns, Program.BLOCK, results, workspace);
                            assertArrayEquals(expected, results[0]);
                        }
                        return true;
                    }))
                    .toList();
            for (var run : runs) assertTrue(run.get());
        }
    }

    @Test
    void compiledKernelsGiveTheSameBits() {
        var program = program("exp(-x^2/3)*[y < c] + if(x > 1, log(y), tanh(x^2.5))");
        double[][] columns = columns(3, Program.BLOCK, 8);
        double[] cold = evaluate(program, columns, Program.BLOCK);
        Program.warmUp();
        assertArrayEquals(cold, evaluate(program, columns, Program.BLOCK));
    }

    @Test
    void knowsWhichInputsItUses() {
        var program = program("x + 1", "0*c");
        assertEquals(2, program.outputs());
        assertTrue(program.uses(0));
        assertFalse(program.uses(1));
        assertTrue(program.uses(2));
        double[][] results = new double[2][1];
        program.evaluate(new double[][] {{1}, null, {Double.NaN}}, 1, results, program.workspace());
        assertEquals(2, results[0][0]);
        assertEquals(Double.NaN, results[1][0]);
    }

    @Test
    void stepsThatNobodyAsksForAreNotComputed() {
        var working = Working.of(List.of("x", "y"), new LinkedHashMap<>(), List.of("a = y^2", "b = x"), List.of("b"));
        assertFalse(working.program().uses(1));
        assertTrue(working.everyStep().uses(1));
    }

    @Test
    void inputsNumbersAndEqualFormulasAsResults() {
        var program = program("x", "2", "x + y", "y + x", "(x + y)*2", "x");
        double[][] results = new double[6][1];
        program.evaluate(new double[][] {{3}, {4}, null}, 1, results, program.workspace());
        assertArrayEquals(new double[][] {{3}, {2}, {7}, {7}, {14}, {3}}, results);
    }

    @Test
    void columnsStayAsTheyWere() {
        double[][] columns = columns(3, Program.BLOCK, 3);
        double[][] before = Stream.of(columns).map(double[]::clone).toArray(double[][]::new);
        evaluate(program("exp(-x^2/3) + sin(y)/c + (x < y) + max(x, 3)"), columns, Program.BLOCK);
        assertArrayEquals(before, columns);
    }

    @Test
    void fewColumnsOfScratch() {
        String sum =
                IntStream.range(0, 500).mapToObj(i -> "sin(x + " + i + ")*y").reduce("c", (a, b) -> a + " + " + b);
        assertTrue(program(sum).workspace().scratchColumns() <= 3);
    }

    @ParameterizedTest
    @ValueSource(ints = {-1, Program.BLOCK + 1})
    void refusesRows(int rows) {
        var program = program("x");
        var workspace = program.workspace();
        double[][] columns = new double[3][2000];
        assertThrows(
                IllegalArgumentException.class, () -> program.evaluate(columns, rows, new double[1][2000], workspace));
    }

    @Test
    void refusesTheWorkspaceOfAnother() {
        var program = program("x");
        var workspace = program("y").workspace();
        assertThrows(
                IllegalArgumentException.class,
                () -> program.evaluate(new double[3][1], 1, new double[1][1], workspace));
    }

    private static void assertSame(double expected, double actual, String where) {
        if (Double.doubleToLongBits(expected) != Double.doubleToLongBits(actual)) {
            assertEquals(expected, actual, where);
            assertEquals(1 / expected, 1 / actual, where);
        }
    }
}
