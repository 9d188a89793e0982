/*
 * The C that the engine is measured against: the same four integrands, the same generator (xoshiro256++, uniform
 * ((r >> 12) + 0.5) * 2^-52), inversion for normals, plain libm, and the sums for mean and variance, on one thread.
 *
 *   A  exp(-x^2/3)                                 x uniform on (0, 1)
 *   B  x*sin(3*x) + log(1 + x)                     x uniform on (0, 1)
 *   C  [a*b - c*d - e^2/4 < 0]                     five standard normals
 *   D  max(0, 100*exp(0.03 + 0.2*z) - 105)         z standard normal
 *
 * Built twice by the benchmark and called in its own process, in turn with the engine:
 *   gcc -std=gnu17 -O3 -march=native -fno-math-errno              the peer
 *   the same with -ffast-math                                   the peer with everything allowed: gcc then calls libmvec's
 *                                                               vector exp, log and sin (up to 4 ulp) and reorders sums
 *
 * What was tried to make it faster (ns per draw of C unless said otherwise, gcc 12, AVX-512; every variant that is kept is in
 * the results):
 *   - inverting by Wichura's rational functions, draw by draw 54, in blocks 37; by the octave table 31 and 13: the table stays
 *   - the table's words through memcpy: gcc does not vectorise the loop, 16; through a union it gathers, 13
 *   - one column for each coefficient instead of one row for each cell: 15
 *   - -mtune=icelake-server, -mprefer-vector-width=512: no difference; -fno-trapping-math: slower draw by draw, else none
 *   - a block's words before their conversion to doubles: no difference
 *   - eight generators in one vector: A 3.9 instead of 4.5, C 9.6; a different order of numbers, so it stands apart
 *   - sums of h and h^2 in eight parts, so that gcc may vectorise them without reordering: under .2. The engine's block moments
 *     to the fourth would cost C more, and are not asked of it
 *   - what is left of A, B and D is libm's exp, log and sin; -ffast-math replaces them by libmvec's
 */
#include <math.h>
#include <stdint.h>
#include <string.h>

enum { BLOCK = 1024, LANES = 8, MOST_INPUTS = 5 };

/* ---- generator ------------------------------------------------------------------------------------------------- */

static inline uint64_t rotl(uint64_t x, int k) { return x << k | x >> (64 - k); }

static inline uint64_t next(uint64_t s[4]) {
    const uint64_t r = rotl(s[0] + s[3], 23) + s[0];
    const uint64_t t = s[1] << 17;
    s[2] ^= s[0];
    s[3] ^= s[1];
    s[1] ^= s[2];
    s[0] ^= s[3];
    s[2] ^= t;
    s[3] = rotl(s[3], 45);
    return r;
}

static inline double uniform(uint64_t r) { return ((double)(int64_t)(r >> 12) + 0.5) * 0x1p-52; }

static void fill_one(uint64_t state[4], double *restrict u) {
    uint64_t s[4] = {state[0], state[1], state[2], state[3]};
    for (int i = 0; i < BLOCK; i++) u[i] = uniform(next(s));
    memcpy(state, s, sizeof s);
}

/* Raw words first, so that gcc vectorises the conversion. */
static void fill_one_split(uint64_t state[4], double *restrict u) {
    uint64_t r[BLOCK];
    uint64_t s[4] = {state[0], state[1], state[2], state[3]};
    for (int i = 0; i < BLOCK; i++) r[i] = next(s);
    memcpy(state, s, sizeof s);
    for (int i = 0; i < BLOCK; i++) u[i] = uniform(r[i]);
}

/* Eight generators side by side in one vector: another order of the same kind of numbers. */
typedef uint64_t lanes __attribute__((vector_size(8 * LANES)));
typedef double reals __attribute__((vector_size(8 * LANES)));

static void fill_lanes(uint64_t (*state)[LANES], double *restrict u) {
    lanes s0, s1, s2, s3;
    memcpy(&s0, state[0], sizeof s0);
    memcpy(&s1, state[1], sizeof s1);
    memcpy(&s2, state[2], sizeof s2);
    memcpy(&s3, state[3], sizeof s3);
    for (int i = 0; i < BLOCK; i += LANES) {
        const lanes sum = s0 + s3;
        const lanes r = (sum << 23 | sum >> 41) + s0;
        const lanes t = s1 << 17;
        s2 ^= s0;
        s3 ^= s1;
        s1 ^= s2;
        s0 ^= s3;
        s2 ^= t;
        s3 = s3 << 45 | s3 >> 19;
        const reals v = (__builtin_convertvector(r >> 12, reals) + 0.5) * 0x1p-52;
        memcpy(u + i, &v, sizeof v);
    }
    memcpy(state[0], &s0, sizeof s0);
    memcpy(state[1], &s1, sizeof s1);
    memcpy(state[2], &s2, sizeof s2);
    memcpy(state[3], &s3, sizeof s3);
}

/* ---- normal quantile ------------------------------------------------------------------------------------------- */

static double ratio(double r, const double *a, const double *b) {
    return (((((((a[7] * r + a[6]) * r + a[5]) * r + a[4]) * r + a[3]) * r + a[2]) * r + a[1]) * r + a[0]) /
           (((((((b[6] * r + b[5]) * r + b[4]) * r + b[3]) * r + b[2]) * r + b[1]) * r + b[0]) * r + 1.0);
}

/* Wichura 1988, Applied Statistics algorithm 241, PPND16: about 1e-16 relative. Branches on the tail. */
static double wichura(double p) {
    static const double a[8] = {3.3871328727963666080e0, 1.3314166789178437745e+2, 1.9715909503065514427e+3,
                                1.3731693765509461125e+4, 4.5921953931549871457e+4, 6.7265770927008700853e+4,
                                3.3430575583588128105e+4, 2.5090809287301226727e+3};
    static const double b[7] = {4.2313330701600911252e+1, 6.8718700749205790830e+2, 5.3941960214247511077e+3,
                                2.1213794301586595867e+4, 3.9307895800092710610e+4, 2.8729085735721942674e+4,
                                5.2264952788528545610e+3};
    static const double c[8] = {1.42343711074968357734e0, 4.63033784615654529590e0, 5.76949722146069140550e0,
                                3.64784832476320460504e0, 1.27045825245236838258e0, 2.41780725177450611770e-1,
                                2.27238449892691845833e-2, 7.74545014278341407640e-4};
    static const double d[7] = {2.05319162663775882187e0, 1.67638483018380384940e0, 6.89767334985100004550e-1,
                                1.48103976427480074590e-1, 1.51986665636164571966e-2, 5.47593808499534494600e-4,
                                1.05075007164441684324e-9};
    static const double e[8] = {6.65790464350110377720e0, 5.46378491116411436990e0, 1.78482653991729133580e0,
                                2.96560571828504891230e-1, 2.65321895265761230930e-2, 1.24266094738807843860e-3,
                                2.71155556874348757815e-5, 2.01033439929228813265e-7};
    static const double f[7] = {5.99832206555887937690e-1, 1.36929880922735805310e-1, 1.48753612908506148525e-2,
                                7.86869131145613259100e-4, 1.84631831751005468180e-5, 1.42151175831644588870e-7,
                                2.04426310338993978564e-15};
    const double q = p - 0.5;
    if (fabs(q) <= 0.425) return q * ratio(0.180625 - q * q, a, b);
    const double r = sqrt(-log(q < 0 ? p : 1.0 - p));
    return copysign(r <= 5.0 ? ratio(r - 1.6, c, d) : ratio(r - 5.0, e, f), q);
}

/*
 * The octave table: p = min(u, 1 - u) is addressed by its exponent and the top five bits of its mantissa, and a polynomial
 * of degree 5 stands in each cell. u is never below 2^-53, so 53 octaves; the normal's symmetry makes one tail enough.
 */
enum { CELLS = 32, OCTAVES = 53, DEGREE = 5, STRIDE = 8 };
static double cell[OCTAVES * CELLS][STRIDE] __attribute__((aligned(64)));
static double column[DEGREE + 1][OCTAVES * CELLS] __attribute__((aligned(64)));

/* Interpolates Wichura's quantile at the Chebyshev points of each cell, in t = p's place in the cell, -1 to 1. */
void peer_prepare(void) {
    for (int k = 0; k < OCTAVES * CELLS; k++) {
        const double low = ldexp(1.0 + (k % CELLS) / (double)CELLS, k / CELLS - OCTAVES);
        const double width = ldexp(1.0 / CELLS, k / CELLS - OCTAVES);
        double x[DEGREE + 1], y[DEGREE + 1];
        for (int i = 0; i <= DEGREE; i++) {
            x[i] = cos(M_PI * (i + 0.5) / (DEGREE + 1));
            y[i] = wichura(low + width * (0.5 + 0.5 * x[i]));
        }
        for (int j = 1; j <= DEGREE; j++) /* Newton's divided differences */
            for (int i = DEGREE; i >= j; i--) y[i] = (y[i] - y[i - 1]) / (x[i] - x[i - j]);
        double c[DEGREE + 1] = {y[DEGREE]};
        for (int j = DEGREE - 1; j >= 0; j--) { /* to powers of t */
            for (int i = DEGREE; i > 0; i--) c[i] = c[i - 1] - x[j] * c[i];
            c[0] = y[j] - x[j] * c[0];
        }
        for (int i = 0; i <= DEGREE; i++) cell[k][i] = column[i][k] = c[i];
    }
}

#ifndef AT
#define AT(i) cell[k][i]
#endif
typedef union {
    double real;
    uint64_t bits;
} word;

static inline double octave(double u) {
    const uint64_t bits = ((word){.real = u < 1.0 - u ? u : 1.0 - u}).bits;
    const int64_t k = (int64_t)(bits >> 47) - ((1023 - OCTAVES) << 5);
    /* The bits below the cell's address, as a number of [1, 2), give the place in the cell. */
    const double t = 2.0 * ((word){.bits = bits << 17 >> 12 | 0x3ff0000000000000u}).real - 3.0;
    const double x = fma(fma(fma(fma(fma(AT(5), t, AT(4)), t, AT(3)), t, AT(2)), t, AT(1)), t, AT(0));
    return copysign(x, u - 0.5);
}

double peer_quantile(int which, double u) { return which ? octave(u) : wichura(u); }

static void invert_wichura(double *restrict z) {
    for (int i = 0; i < BLOCK; i++) z[i] = wichura(z[i]);
}

static void invert_octave(double *restrict z) {
    for (int i = 0; i < BLOCK; i++) z[i] = octave(z[i]);
}

/* ---- integrands ------------------------------------------------------------------------------------------------ */

static inline double a(const double *x) { return exp(-x[0] * x[0] / 3.0); }
static inline double b(const double *x) { return x[0] * sin(3.0 * x[0]) + log(1.0 + x[0]); }
static inline double c(const double *x) { return x[0] * x[1] - x[2] * x[3] - x[4] * x[4] / 4.0 < 0.0; }
static inline double d(const double *x) { return fmax(0.0, 100.0 * exp(0.03 + 0.2 * x[0]) - 105.0); }

/* ---- variant 0 and 1: draw by draw ------------------------------------------------------------------------------ */

/* Sums of h and h^2: less work than the block moments of the engine, and less accurate. */
#define PER_DRAW(name, inputs, normal, h)                                                                              \
    static void name(int64_t n, const uint64_t *state, double *sums) {                                                 \
        uint64_t s[4] = {state[0], state[1], state[2], state[3]};                                                      \
        double sum = 0, squares = 0, x[inputs];                                                                        \
        for (int64_t i = 0; i < n; i++) {                                                                              \
            for (int j = 0; j < inputs; j++) x[j] = normal(uniform(next(s)));                                          \
            const double y = h(x);                                                                                     \
            sum += y;                                                                                                  \
            squares += y * y;                                                                                          \
        }                                                                                                              \
        sums[0] = sum;                                                                                                 \
        sums[1] = squares;                                                                                             \
    }
#define AS_IS(u) (u)
PER_DRAW(draw_a, 1, AS_IS, a)
PER_DRAW(draw_b, 1, AS_IS, b)
PER_DRAW(draw_c_wichura, 5, wichura, c)
PER_DRAW(draw_d_wichura, 1, wichura, d)
PER_DRAW(draw_c_octave, 5, octave, c)
PER_DRAW(draw_d_octave, 1, octave, d)

/* ---- the other variants: blocks --------------------------------------------------------------------------------- */

#define EVALUATE(h)                                                                                                    \
    for (int i = 0; i < BLOCK; i++) {                                                                                  \
        const double row[MOST_INPUTS] = {x[0][i], x[1][i], x[2][i], x[3][i], x[4][i]};                                 \
        y[i] = h(row);                                                                                                 \
    }

static void evaluate(int integrand, double x[MOST_INPUTS][BLOCK], double *restrict y) {
    switch (integrand) {
        case 0: EVALUATE(a) break;
        case 1: EVALUATE(b) break;
        case 2: EVALUATE(c) break;
        default: EVALUATE(d) break;
    }
}

/* Eight partial sums, which gcc keeps in one vector register without being allowed to reorder anything. */
static void add(const double *restrict y, double *restrict sum, double *restrict squares) {
    for (int i = 0; i < BLOCK; i += LANES)
        for (int l = 0; l < LANES; l++) {
            sum[l] += y[i + l];
            squares[l] += y[i + l] * y[i + l];
        }
}

static void blocks(int integrand, int variant, int64_t n, const uint64_t *state, double *sums) {
    static _Thread_local double x[MOST_INPUTS][BLOCK] __attribute__((aligned(64)));
    static _Thread_local double y[BLOCK] __attribute__((aligned(64)));
    const int inputs = integrand == 2 ? 5 : 1;
    const int normal = integrand >= 2;
    uint64_t one[4], many[4][LANES];
    memcpy(one, state, sizeof one);
    for (int l = 0; l < LANES; l++)
        for (int w = 0; w < 4; w++) many[w][l] = state[4 * l + w];
    double sum[LANES] = {0}, squares[LANES] = {0};
    for (int64_t done = 0; done < n; done += BLOCK) {
        for (int j = 0; j < inputs; j++) {
            if (variant == 5) fill_lanes(many, x[j]);
            else if (variant == 4) fill_one_split(one, x[j]);
            else fill_one(one, x[j]);
            if (normal && variant == 2) invert_wichura(x[j]);
            else if (normal) invert_octave(x[j]);
        }
        evaluate(integrand, x, y);
        add(y, sum, squares);
    }
    sums[0] = sums[1] = 0;
    for (int l = 0; l < LANES; l++) {
        sums[0] += sum[l];
        sums[1] += squares[l];
    }
}

/*
 * Runs integrand 0 to 3 (A to D) in variant
 *   0  draw by draw, Wichura     1  draw by draw, octave table
 *   2  blocks, Wichura           3  blocks, octave table
 *   4  as 3, the words of a block before their conversion        5  as 3, eight generators in one vector
 * for n draws (a multiple of 1,024) from eight generator states of four words, of which all but 5 use the first; leaves the sum of
 * the outcomes and the sum of their squares.
 */
void peer_run(int integrand, int variant, int64_t n, const uint64_t *state, double *sums) {
    static void (*const loops[2][4])(int64_t, const uint64_t *, double *) = {
        {draw_a, draw_b, draw_c_wichura, draw_d_wichura}, {draw_a, draw_b, draw_c_octave, draw_d_octave}};
    if (variant < 2) loops[variant][integrand](n, state, sums);
    else blocks(integrand, variant, n, state, sums);
}
