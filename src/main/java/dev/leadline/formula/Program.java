package dev.leadline.formula;

import dev.leadline.formula.Node.Apply;
import dev.leadline.formula.Node.Column;
import dev.leadline.formula.Node.Number;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.BitSet;
import java.util.Deque;
import java.util.List;
import java.util.function.IntConsumer;

/// Formulas compiled to kernels over blocks of draws. Immutable, safe for all threads.
///
/// A list of instructions in the order of a postfix notation. Each names the places of its operands and of its result:
/// first the scratch columns, then the inputs, then the results. A scratch column is given on as soon as its last
/// reader is done, so that few are needed and they stay in the cache.
public final class Program {
    /// Draws in a block at most.
    public static final int BLOCK = 1024;

    /// HotSpot compiles a method for good after 600 calls, if its loops have turned 15,000 times.
    private static final int WARM_RUNS = 1_000;

    private static final int WARM_ROWS = 64;

    private static final Kernel FILL = (a, b, c, k, z, n) -> Arrays.fill(z, 0, n, k);
    private static final Kernel COPY = (a, b, c, k, z, n) -> System.arraycopy(a, 0, z, 0, n);

    private final Instruction[] instructions;
    private final int scratch;
    private final int inputs;
    private final int outputs;
    private final BitSet used;

    /// Places that are not needed are -1.
    private record Instruction(Kernel kernel, int a, int b, int c, double k, int z) {}

    /// Scratch of one worker for the program that made it; confined to that worker.
    public static final class Workspace {
        private final Program program;

        /// Scratch columns, then those of the inputs and the results of the block at hand; the last is never filled and
        /// stands where an operand is not needed.
        private final double[][] places;

        private Workspace(Program program) {
            this.program = program;
            this.places = new double[program.scratch + program.inputs + program.outputs + 1][];
            for (int i = 0; i < program.scratch; i++) places[i] = new double[BLOCK];
        }

        int scratchColumns() {
            return program.scratch;
        }
    }

    private Program(Instruction[] instructions, int scratch, int inputs, int outputs, BitSet used) {
        this.instructions = instructions;
        this.scratch = scratch;
        this.inputs = inputs;
        this.outputs = outputs;
        this.used = used;
    }

    /// @param inputs number of columns
    /// @param results nodes of the expression, one for each output
    static Program of(Expression expression, int inputs, List<Integer> results) {
        return new Compilation(expression.nodes(), inputs, results).program();
    }

    /// Runs every kernel often enough to be compiled, so that the first formula is fast. Takes some tenths of a second,
    /// and belongs on a thread of its own at the start of a program that stays open.
    public static void warmUp() {
        double[][] columns = new double[3][WARM_ROWS];
        for (double[] column : columns) Arrays.fill(column, 0.5);
        double[] z = new double[WARM_ROWS];
        for (Operation operation : Operation.values()) {
            for (Kernel kernel : operation.kernels()) {
                for (int i = 0; i < WARM_RUNS; i++) {
                    kernel.fill(columns[0], columns[1], columns[2], 0.5, z, WARM_ROWS);
                }
            }
        }
    }

    public int outputs() {
        return outputs;
    }

    /// Steps that an evaluation takes.
    public int length() {
        return instructions.length;
    }

    /// Whether any output depends on the input at `index`; a column that is not used may be `null`.
    public boolean uses(int index) {
        return used.get(index);
    }

    public Workspace workspace() {
        return new Workspace(this);
    }

    /// @param columns draws, one array for each input, at least `rows` long; not changed
    /// @param rows number of draws, at most [#BLOCK]
    /// @param results one array for each output, at least `rows` long, all distinct and none of the columns; filled
    /// @param workspace made by this program; no other thread may use it meanwhile
    public void evaluate(double[][] columns, int rows, double[][] results, Workspace workspace) {
        if (workspace.program != this || rows < 0 || rows > BLOCK) {
            throw new IllegalArgumentException("a block has at most " + BLOCK + " rows, and a workspace its program");
        }
        double[][] places = workspace.places;
        System.arraycopy(columns, 0, places, scratch, inputs);
        System.arraycopy(results, 0, places, scratch + inputs, outputs);
        for (Instruction now : instructions) {
            now.kernel.fill(places[now.a], places[now.b], places[now.c], now.k, places[now.z], rows);
        }
    }

    /// Gives every node that is needed a place, once; used up by [#program()].
    private static final class Compilation {
        private final List<Node> nodes;
        private final int inputs;
        private final List<Integer> results;

        private final List<Instruction> instructions = new ArrayList<>();
        /// Place of each node; until all is placed, results are counted from `RESULTS` and columns from `COLUMNS`.
        private final int[] place;

        /// For each node, how many of its readers are still to come.
        private final int[] readers;

        private final BitSet used = new BitSet();
        private final Deque<Integer> free = new ArrayDeque<>();
        private int scratch;

        private static final int COLUMNS = 1 << 29;
        private static final int RESULTS = 1 << 30;
        private static final int NONE = -1;

        Compilation(List<Node> nodes, int inputs, List<Integer> results) {
            this.nodes = nodes;
            this.inputs = inputs;
            this.results = results;
            this.place = new int[nodes.size()];
            this.readers = new int[nodes.size()];
        }

        Program program() {
            Arrays.fill(place, NONE);
            countReaders();
            for (int k = 0; k < results.size(); k++) {
                int node = results.get(k);
                if (nodes.get(node) instanceof Apply && place[node] == NONE) place[node] = RESULTS + k;
            }
            for (int i = 0; i < nodes.size(); i++) {
                if (readers[i] > 0 && nodes.get(i) instanceof Apply apply) compile(i, apply);
            }
            for (int k = 0; k < results.size(); k++) {
                int node = results.get(k);
                int z = RESULTS + k;
                if (nodes.get(node) instanceof Number(double value)) {
                    instructions.add(new Instruction(FILL, NONE, NONE, NONE, value, z));
                } else if (placeOf(node) != z) {
                    instructions.add(new Instruction(COPY, placeOf(node), NONE, NONE, 0, z));
                }
            }
            return new Program(
                    instructions.stream().map(this::placed).toArray(Instruction[]::new),
                    scratch,
                    inputs,
                    results.size(),
                    used);
        }

        /// A result counts as a reader that never comes, so that its place is not given on.
        private void countReaders() {
            results.forEach(node -> readers[node]++);
            for (int i = nodes.size() - 1; i >= 0; i--) {
                if (readers[i] == 0) continue;
                switch (nodes.get(i)) {
                    case Apply apply -> forEachColumn(apply, operand -> readers[operand]++);
                    case Column(int index) -> used.set(index);
                    case Number _ -> {}
                }
            }
        }

        private void compile(int node, Apply apply) {
            Operation operation = apply.operation();
            Kernel kernel = operation.columns();
            double k = 0;
            if (numberIsRight(apply)) {
                kernel = operation.numberRight();
                k = value(apply.b());
            } else if (numberIsLeft(apply)) {
                kernel = operation.numberLeft();
                k = value(apply.a());
            }
            forEachColumn(apply, this::fillNumber);
            int a = operandPlace(apply, apply.a());
            int b = operandPlace(apply, apply.b());
            int c = operandPlace(apply, apply.c());
            if (operation.inPlace()) release(apply);
            if (place[node] == NONE) place[node] = takeScratch();
            if (!operation.inPlace()) release(apply);
            instructions.add(new Instruction(kernel, a, b, c, k, place[node]));
        }

        private boolean numberIsRight(Apply apply) {
            return apply.operation().numberRight() != null && isNumber(apply.b());
        }

        private boolean numberIsLeft(Apply apply) {
            return apply.operation().numberLeft() != null && isNumber(apply.a());
        }

        /// Calls for each operand that the kernel reads as a column, twice for one that stands twice.
        private void forEachColumn(Apply apply, IntConsumer action) {
            if (!numberIsLeft(apply)) action.accept(apply.a());
            if (apply.b() >= 0 && !numberIsRight(apply)) action.accept(apply.b());
            if (apply.c() >= 0) action.accept(apply.c());
        }

        private int operandPlace(Apply apply, int operand) {
            boolean asNumber = operand >= 0
                    && isNumber(operand)
                    && (operand == apply.a() && numberIsLeft(apply) || operand == apply.b() && numberIsRight(apply));
            return operand < 0 || asNumber ? NONE : placeOf(operand);
        }

        /// A number that a kernel reads as a column gets one when its first reader comes.
        private void fillNumber(int operand) {
            if (isNumber(operand) && place[operand] == NONE) {
                place[operand] = takeScratch();
                instructions.add(new Instruction(FILL, NONE, NONE, NONE, value(operand), place[operand]));
            }
        }

        private void release(Apply apply) {
            forEachColumn(apply, operand -> {
                if (--readers[operand] == 0 && place[operand] != NONE && place[operand] < COLUMNS) {
                    free.push(place[operand]);
                }
            });
        }

        private int takeScratch() {
            return free.isEmpty() ? scratch++ : free.pop();
        }

        private int placeOf(int node) {
            return nodes.get(node) instanceof Column(int index) ? COLUMNS + index : place[node];
        }

        private boolean isNumber(int node) {
            return node >= 0 && nodes.get(node) instanceof Number;
        }

        private double value(int node) {
            return ((Number) nodes.get(node)).value();
        }

        private Instruction placed(Instruction i) {
            return new Instruction(i.kernel, placed(i.a), placed(i.b), placed(i.c), i.k, placed(i.z));
        }

        private int placed(int place) {
            if (place == NONE) return scratch + inputs + results.size();
            if (place >= RESULTS) return scratch + inputs + place - RESULTS;
            if (place >= COLUMNS) return scratch + place - COLUMNS;
            return place;
        }
    }
}
