/// From the text of a formula to kernels over blocks of draws.
///
/// Start with [Working][dev.leadline.formula.Working], which checks the steps and what is asked of a question
/// together, [Program][dev.leadline.formula.Program], which computes them for up to 1024 draws at a time, and
/// [Reader][dev.leadline.formula.Reader], which an editor asks for words, colours and faults.
///
/// **The way of a formula.** `Tokens` splits the text; `Reading` and `Grammar` say everything that is wrong with
/// it, each fault with its place, what was expected and what to try; exp4j brings what is left into postfix order
/// (`Ordering`, the only class that knows it); `ExpressionWriter` turns that into nodes, each of which stands
/// once however often it is written (`Expression`); `Program` gives every node a kernel (`Operation`, `Kernels`)
/// and a column of scratch.
///
/// **What may be written.** Numbers (`2`, `.5`, `1.5e-3`), names (a letter or `_`, then letters, digits, `_`,
/// compared in Unicode's composed form), `+ - * / ^`, `< <= > >= == !=`, `&` and, `|` or, `( )`, `[ ]`, the
/// functions of [Functions][dev.leadline.formula.Functions], the constants `pi`, `e` and `deg`, and a comment
/// from `#` to the end of the line. From strongest to weakest bind: `^` (to the right: `2^3^2` is `2^9`), the
/// sign (`-2^2` is -4), `* /`, `+ -`, comparisons, `&`, `|`. One sign may stand before a value, but not directly
/// after `+` or `-`. Products are always written out, comparisons cannot be chained.
///
/// **Conditions** are numbers: what is not 0 holds, and every comparison gives 1 or 0. `[c]` is Iverson's
/// bracket, 1 where `c` holds; it refuses arithmetic such as `[a + b]`, which is more often meant as a group.
/// What cannot be compared gives `NaN`, and so does all that is built on it, even where the other operand would
/// settle the matter:
///
/// | a | b | `a & b` | `a \| b` | `not(a)` | `a < 1` | `if(a, 2, b)` |
/// |---|---|---|---|---|---|---|
/// | 1 | 0 | 0 | 1 | 0 | 0 | 2 |
/// | 0 | 0 | 0 | 0 | 1 | 1 | 0 |
/// | `NaN` | 0 | `NaN` | `NaN` | `NaN` | `NaN` | `NaN` |
/// | `NaN` | 1 | `NaN` | `NaN` | `NaN` | `NaN` | `NaN` |
/// | 0 | `NaN` | `NaN` | `NaN` | 1 | 1 | `NaN` |
/// | 1 | `NaN` | `NaN` | `NaN` | 0 | 0 | 2 |
///
/// `if(c, a, b)` selects: what the branch not taken gives does not count, so `if(x > 0, log(x), 0)` is never
/// `NaN` where `x` is a number. `round` takes halves to the even neighbour. Division by 0, `log(0)` and the like
/// follow IEEE 754.
///
/// **Score.** An event made of `<`, `<=`, `>` and `>=` also has a number that says how far it is from happening
/// (`EventScore`): splitting climbs by it.
///
/// **Bits.** Kernels use `+ - * /`, square roots, bit moves, `dev.leadline.numeric` and `StrictMath` only, so a
/// formula has the same bits on every machine, in a block of any size, compiled or not. Exchanged are only forms
/// that keep them: `a - 3` for `a + -3`, `x / 4` for `x * 0.25`; `x^2` and `x*x` are the same product.
///
/// **Cost**, formula alone, ns for a draw on one core of an AMD EPYC with AVX-512, JDK 25, December 2026, best of
/// three runs: `exp(-x^2/3)` 1.4, `x*sin(3*x) + log(1 + x)` 3.4, `[a*b - c*d - g^2/4 < 0]` .8, `max(0,
/// 100*exp(0.03 + 0.2*z) - 105)` 1.4; a sum .1, a comparison .2 to .3, `if` .7, `x^3` 1.1, `x^2.5` 4.3.
///
/// **Limits.** 100,000 characters, brackets 500 deep; every answer in less than a second. A formula cannot reach
/// the machine: no files, no reflection, no loops.
package dev.leadline.formula;
