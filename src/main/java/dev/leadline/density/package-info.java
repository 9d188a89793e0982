/// Densities: families with the rules of their parameters, and draws of them by inversion.
///
/// Start with [Catalogue][dev.leadline.density.Catalogue], which lists the families,
/// [Density][dev.leadline.density.Density], what every member can answer, and
/// [Inversion][dev.leadline.density.Inversion], which turns probabilities into draws.
///
/// A member is made by [Family.of][dev.leadline.density.Family#of(java.util.Map)] from named values, and refused with
/// every problem that was found; the records (`new Gumbel(24.5, 2.6)`) refuse the same values with the same words.
///
/// Draws: every density is `location + scale * shape`. The quantile function of the shape is tabulated once, measured,
/// and shared by all densities of that shape; a draw costs one polynomial of degree 5. The hash of the table stands in
/// the run record: the tables are built from functions that have the same bits everywhere (kernels of `numeric`,
/// `StrictMath`, arithmetic), and if one ever differed the record would say so.
///
/// A density that is known by its heights alone is [Integrated][dev.leadline.density.Integrated]: one that
/// is typed as a formula ([Typed][dev.leadline.density.Typed]), or any function. `Peaks` looks for where
/// it is high, `Landscape` lays a first grid there, `Refinement` cuts the line into pieces, and each is a polynomial
/// (`Smooth`) or a power of the distance (`Flank`).
///
/// Dependence: a [Copula][dev.leadline.density.Copula] turns independent probabilities into tied ones, whatever the
/// densities; a [Measure][dev.leadline.density.Measure] finds the correlation to draw with for the one that was stated.
///
/// How to add a family:
/// 1. One file, `Name.java`: a record whose components are the parameters as the project file calls them, with an
///    `Entry` for each way to enter it, a `FAMILY` that describes it, and a nested `Standard`, the shape at location 0
///    and scale 1, whose components are only what distinguishes shapes. Both tails need their own functions. Where the
///    quantiles span hundreds of decades, `Standard` is also `Linked`; where the quantile is a square root or less, it
///    has a `ClosedForm`. Skewness and kurtosis have closed forms that do not cancel; without one `Moments` computes
///    them from the quantiles.
///    - A family that is another one by a name of its own is `Renamed`.
///    - A discrete one is itself the shape: `WholeNumbers` asks for the logarithm of a probability and both tails at a
///      whole number, and does the rest. `Staircase` draws of it.
/// 2. One line in `Catalogue`, and its name in a `FamilyGroup`.
/// 3. Two tables, `src/test/resources/density/name.csv` and `density/moments/name.csv`, from a source that is not this
///    code: a class in one of `src/test/python/density_tables*.py`, which write them.
/// 4. In the tests, a member near each limit of its rules in `Examples`, and in `CatalogueTest` the name of the library
///    distribution to compare with, in `ReferenceDistributionsTest` what the reference set calls it.
///
/// The tests of the catalogue then hold it to everything: round trips, both tails, moments, the table of draws, refused
/// parameters.
///
/// May use: `numeric`, `formula`, `problem`.
package dev.leadline.density;
