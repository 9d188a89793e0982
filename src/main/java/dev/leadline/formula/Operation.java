package dev.leadline.formula;

import dev.leadline.numeric.ErrorFunction;
import dev.leadline.numeric.Exp;
import dev.leadline.numeric.GammaFunction;
import dev.leadline.numeric.Log;
import dev.leadline.numeric.Normal;
import dev.leadline.numeric.Power;
import dev.leadline.numeric.Trigonometry;
import java.util.List;
import java.util.Objects;
import java.util.function.DoubleBinaryOperator;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.Stream;

/// What a node of an expression does with its operands: once for one draw, which is the definition, and as kernels
/// over a block of draws, which give the same bits.
///
/// Left alone are the operations that others make up: `a > b` is `b < a`, `a - 3` is `a + -3`, `a & b` is a product of
/// truths and `a | b` the larger of two ([Expression]).
enum Operation {
    NEGATE(a -> -a, Kernels::negate),
    ADD((a, b) -> a + b, Kernels::add, Kernels::addNumber, null),
    SUBTRACT((a, b) -> a - b, Kernels::subtract, null, Kernels::subtractFromNumber),
    MULTIPLY((a, b) -> a * b, Kernels::multiply, Kernels::multiplyByNumber, null),
    DIVIDE((a, b) -> a / b, Kernels::divide, Kernels::divideByNumber, Kernels::divideNumber),

    POWER(Power::pow, Power::pow, Power::pow, null),

    LESS(Kernels::isLess, Kernels::less, Kernels::lessThanNumber, Kernels::numberLess),
    LESS_OR_EQUAL(Kernels::isLessOrEqual, Kernels::lessOrEqual, Kernels::lessOrEqualNumber, Kernels::numberLessOrEqual),
    EQUAL(Kernels::isEqual, Kernels::equal, Kernels::equalNumber, null),
    UNEQUAL(Kernels::isUnequal, Kernels::unequal, Kernels::unequalNumber, null),
    /// 1 where the value is not 0.
    TRUTH(Kernels::truthOf, Kernels::truth),
    IF(Kernels::chosen, 3, Kernels::choose),
    /// `-∞` where the value is `NaN`; no formula can say it ([EventScore]).
    NAN_IS_NEVER(Kernels::numberOrNever, Kernels::numberOrNever),

    EXP(Exp::exp, Exp::exp),
    LOG(Log::log, Log::log),
    LOG10(StrictMath::log10, Kernels::log10),
    LOG1P(StrictMath::log1p, Kernels::log1p),
    EXPM1(StrictMath::expm1, Kernels::expm1),
    SQRT(Math::sqrt, Kernels::sqrt),
    CBRT(StrictMath::cbrt, Kernels::cbrt),
    ABS(Math::abs, Kernels::abs),
    SIGN(Math::signum, Kernels::sign),
    MIN(Math::min, Kernels::min, Kernels::minWithNumber, null),
    MAX(Math::max, Kernels::max, Kernels::maxWithNumber, null),
    FLOOR(Math::floor, Kernels::floor),
    CEIL(Math::ceil, Kernels::ceil),
    ROUND(Math::rint, Kernels::round),
    HYPOT(StrictMath::hypot, Kernels::hypot, null, null),
    SIN(Trigonometry::sin, Trigonometry::sin),
    COS(Trigonometry::cos, Trigonometry::cos),
    TAN(Trigonometry::tan, Trigonometry::tan),
    ASIN(StrictMath::asin, Kernels::asin),
    ACOS(StrictMath::acos, Kernels::acos),
    ATAN(StrictMath::atan, Kernels::atan),
    ATAN2(StrictMath::atan2, Kernels::atan2, null, null),
    SINH(StrictMath::sinh, Kernels::sinh),
    COSH(StrictMath::cosh, Kernels::cosh),
    TANH(StrictMath::tanh, Kernels::tanh),
    ERF(ErrorFunction::erf, ErrorFunction::erf),
    ERFC(ErrorFunction::erfc, ErrorFunction::erfc),
    LGAMMA(GammaFunction::log, Kernels::logGamma),
    GAMMA_FN(GammaFunction::gamma, Kernels::gamma),
    NORMAL_CDF(Normal::cdf, Normal::cdf),
    NORMAL_PDF(Normal::pdf, Normal::pdf),
    NORMAL_QUANTILE(Normal::quantile, Normal::quantile);

    /// The definition for one draw; operands that the operation does not have are ignored.
    interface Scalar {
        double of(double a, double b, double c);
    }

    interface OneColumn {
        void fill(double[] a, double[] z, int n);
    }

    interface TwoColumns {
        void fill(double[] a, double[] b, double[] z, int n);
    }

    interface ThreeColumns {
        void fill(double[] a, double[] b, double[] c, double[] z, int n);
    }

    interface WithNumber {
        void fill(double[] a, double k, double[] z, int n);
    }

    private final Scalar scalar;
    private final int operands;
    private final Kernel columns;
    private final Kernel numberRight;
    private final Kernel numberLeft;

    Operation(DoubleUnaryOperator scalar, OneColumn columns) {
        this((a, b, c) -> scalar.applyAsDouble(a), 1, (a, b, c, k, z, n) -> columns.fill(a, z, n), null, null);
    }

    Operation(DoubleBinaryOperator scalar, TwoColumns columns, WithNumber numberRight, WithNumber numberLeft) {
        this(
                (a, b, c) -> scalar.applyAsDouble(a, b),
                2,
                (a, b, c, k, z, n) -> columns.fill(a, b, z, n),
                numberRight == null ? null : (a, b, c, k, z, n) -> numberRight.fill(a, k, z, n),
                numberLeft == null ? null : (a, b, c, k, z, n) -> numberLeft.fill(b, k, z, n));
    }

    Operation(Scalar scalar, int operands, ThreeColumns columns) {
        this(scalar, operands, (a, b, c, k, z, n) -> columns.fill(a, b, c, z, n), null, null);
    }

    Operation(Scalar scalar, int operands, Kernel columns, Kernel numberRight, Kernel numberLeft) {
        this.scalar = scalar;
        this.operands = operands;
        this.columns = columns;
        this.numberRight = numberRight;
        this.numberLeft = numberLeft;
    }

    double of(double a, double b, double c) {
        return scalar.of(a, b, c);
    }

    int operands() {
        return operands;
    }

    /// Every operand is a column.
    Kernel columns() {
        return columns;
    }

    /// The second operand is a number, the first a column; `null` where there is no such kernel.
    Kernel numberRight() {
        return numberRight;
    }

    /// The first operand is a number, the second a column; `null` where there is no such kernel.
    Kernel numberLeft() {
        return numberLeft;
    }

    List<Kernel> kernels() {
        return Stream.of(columns, numberRight, numberLeft)
                .filter(Objects::nonNull)
                .toList();
    }

    /// Whether the results may replace an operand: comparisons look at their operands twice.
    boolean inPlace() {
        return switch (this) {
            case LESS, LESS_OR_EQUAL, EQUAL, UNEQUAL -> false;
            default -> true;
        };
    }
}
