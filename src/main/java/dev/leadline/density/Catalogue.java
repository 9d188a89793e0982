package dev.leadline.density;

import java.util.List;
import java.util.Optional;

/// Every family that there is.
public final class Catalogue {
    private static final List<Family> FAMILIES = List.of(
            Uniform.FAMILY,
            Normal.FAMILY,
            Lognormal.FAMILY,
            Triangular.FAMILY,
            Exponential.FAMILY,
            Gamma.FAMILY,
            Beta.FAMILY,
            Weibull.FAMILY,
            Gumbel.FAMILY,
            Student.FAMILY,
            Arcsine.FAMILY,
            Pert.FAMILY,
            HalfNormal.FAMILY,
            Rayleigh.FAMILY,
            ChiSquare.FAMILY,
            Fisher.FAMILY,
            Laplace.FAMILY,
            Logistic.FAMILY,
            Cauchy.FAMILY);

    private Catalogue() {}

    public static List<Family> families() {
        return FAMILIES;
    }

    public static Optional<Family> family(String name) {
        return families().stream().filter(f -> f.name().equals(name)).findFirst();
    }
}
