/// Numerical work that knows nothing of draws: elementary kernels, the normal distribution, rounding to the
/// uncertainty.
///
/// Start with [dev.leadline.numeric.Exp], whose two forms are those of every kernel, [dev.leadline.numeric.Normal]
/// and [dev.leadline.numeric.Rounding].
///
/// A **kernel** is a function in two forms, one value and a block of values. Both give the same bits, on every machine,
/// JDK and compiler tier, because they use only `+ - * /`, `Math.sqrt`, `Math.fma` and moves of bits, all of which
/// the language defines to the bit, and `StrictMath` for arguments far outside. `Math.exp` and its kin do not promise
/// that. Only the payload of a NaN is left open.
///
/// The block forms are written so that the compiler turns them into vector instructions: loops without branches over
/// separate arrays with one index, short enough to be unrolled, moves between doubles and their bits in loops that load
/// from and store to memory directly. Rare arguments are found by a loop that only gathers sign bits, and done singly
/// afterwards. Arrays may be the same; they belong to the caller; nothing beyond the first `n` values is read or
/// written. All functions are safe for all threads: working columns belong to the thread.
///
/// Every kernel states its error in ulp, the spacing of doubles at the exact result, and names the test that
/// measures it against an oracle of more than 80 digits.
///
/// May use no other package.
package dev.leadline.numeric;
