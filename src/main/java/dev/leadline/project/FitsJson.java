package dev.leadline.project;

import dev.leadline.density.Fit;
import dev.leadline.density.Fits;
import dev.leadline.model.DensityDraft;
import dev.leadline.model.DensityDraft.Column;
import dev.leadline.model.DensityDraft.Data;
import dev.leadline.model.DensityDraft.Member;
import java.util.Optional;
import java.util.OptionalDouble;

/// Fits as the command `families --fit` prints them: `{"fits": [{"family", "parameters", "values", "logLikelihood",
/// "aic", "kolmogorovSmirnov", "andersonDarling", "density"}], "refused": [{"family", "why"}]}`; a number that does not
/// exist is `null`.
public final class FitsJson {

    private FitsJson() {}

    /// @param file that the values stand in, as a project beside it names it
    public static String of(Fits fits, String file, Column column) {
        return JsonWriter.pretty(Json.object()
                .put(
                        "fits",
                        Json.list(fits.fits().stream()
                                .map(fit -> fit(fit, file, column))
                                .toList()))
                .put(
                        "refused",
                        Json.list(fits.refused().stream().map(FitsJson::refused).toList()))
                .build());
    }

    /// As an input of a project has it, in one line.
    public static String density(Fit fit, String file, Column column) {
        return JsonWriter.compact(drawn(fit, file, column));
    }

    private static Json drawn(Fit fit, String file, Column column) {
        var member = new Member(fit.family(), fit.parameters());
        return DraftWriter.density(
                DensityDraft.of(new Data(file, column, Optional.empty(), OptionalDouble.empty(), Optional.of(member))));
    }

    private static Json fit(Fit fit, String file, Column column) {
        var parameters = Json.object();
        fit.parameters().forEach((name, value) -> parameters.put(name, Json.of(value.doubleValue())));
        return Json.object()
                .put("family", fit.family())
                .put("parameters", parameters.build())
                .put("values", Json.of(fit.used()))
                .put("logLikelihood", Json.orNull(fit.logLikelihood()))
                .put("aic", Json.orNull(fit.aic()))
                .put("kolmogorovSmirnov", Json.orNull(fit.kolmogorovSmirnov()))
                .put("andersonDarling", Json.orNull(fit.andersonDarling()))
                .put("density", drawn(fit, file, column))
                .build();
    }

    private static Json refused(Fits.Refused refused) {
        return Json.object()
                .put("family", refused.family())
                .put("why", refused.why().primary())
                .build();
    }
}
