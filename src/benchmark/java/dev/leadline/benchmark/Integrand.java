package dev.leadline.benchmark;

import dev.leadline.engine.Questions;
import dev.leadline.model.Question;
import java.util.List;

/// One of the four integrands that are measured: between them they need uniform and normal draws, elementary functions
/// and an event.
///
/// @param expected its exact mean from a closed form; `NaN` where there is none, and the two sides check each other
record Integrand(String name, String text, Question question, double expected) {

    /// In the order in which the peer knows them.
    static List<Integrand> all() {
        return List.of(
                // sqrt(3 pi)/2 erf(1/sqrt(3))
                mean("A", "exp(-x^2/3)", new Questions().uniform("x", 0, 1), 0.8991723448310841),
                // sin(3)/9 - cos(3)/3 + 2 log 2 - 1
                mean("B", "x*sin(3*x) + log(1+x)", new Questions().uniform("x", 0, 1), 0.7319718608822465),
                event(
                        "C",
                        "a*b - c*d - e^2/4 < 0",
                        new Questions()
                                .normal("a")
                                .normal("b")
                                .normal("c")
                                .normal("d")
                                .normal("e")),
                // 100 e^0.05 Phi(d + 0.2) - 105 Phi(d), d = (log(100/105) + 0.03)/0.2
                mean("D", "max(0, 100*exp(0.03 + 0.2*z) - 105)", new Questions().normal("z"), 8.43261575865725));
    }

    private static Integrand mean(String name, String text, Questions inputs, double expected) {
        return new Integrand(name, text, inputs.mean(text).build(), expected);
    }

    private static Integrand event(String name, String text, Questions inputs) {
        return new Integrand(name, "[" + text + "]", inputs.probability(text).build(), Double.NaN);
    }
}
