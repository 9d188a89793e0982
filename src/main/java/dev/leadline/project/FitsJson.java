package dev.leadline.project;

import dev.leadline.density.Fit;
import dev.leadline.density.Fits;

/// Fits as the command `families --fit` prints them: `{"fits": [{"family", "parameters", "values", "logLikelihood",
/// "aic", "kolmogorovSmirnov", "andersonDarling"}], "refused": [{"family", "why"}]}`; a number that does not exist is
/// `null`.
public final class FitsJson {

    private FitsJson() {}

    public static String of(Fits fits) {
        return JsonWriter.pretty(Json.object()
                .put("fits", Json.list(fits.fits().stream().map(FitsJson::fit).toList()))
                .put(
                        "refused",
                        Json.list(fits.refused().stream().map(FitsJson::refused).toList()))
                .build());
    }

    private static Json fit(Fit fit) {
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
                .build();
    }

    private static Json refused(Fits.Refused refused) {
        return Json.object()
                .put("family", refused.family())
                .put("why", refused.why().primary())
                .build();
    }
}
