/// Pictures of runs and of densities, drawn into an image or a vector file, that also say which value stands at a
/// pixel.
///
/// Start with [Settling][dev.leadline.chart.Settling], the plain data of a picture;
/// [View][dev.leadline.chart.View], what part of it is looked at; and [Picture][dev.leadline.chart.Picture], both
/// laid out for a size and a [Theme][dev.leadline.chart.Theme].
///
/// - **A window** keeps a view. For each newer trace it makes a picture off its own thread and shows
///   [image][dev.leadline.chart.Picture#image(double)]. It passes mouse positions to the picture and gets a
///   [Reading][dev.leadline.chart.Reading] for a hover, or the next view for wheel and drag; a double click is
///   [reset][dev.leadline.chart.View#reset()]. A table shows [rows][dev.leadline.chart.Settling#rows()].
/// - **A figure** is the bytes of an [Export][dev.leadline.chart.Export], always light, with its
///   [Caption][dev.leadline.chart.Caption] inside for people who cannot see it.
/// - **An input's row** shows a [DensitySketch][dev.leadline.chart.DensitySketch].
///
/// What ranges a picture chooses by itself is told in `Framing`, how lanes look in
/// [LaneLook][dev.leadline.chart.LaneLook], what is named along an axis in `Ticks`. The charting library gives axes
/// and grid; bands, lines, markers and key are drawn here. Layout does not depend on where a picture is drawn, so
/// screen, image and vector file agree.
///
/// Nothing here knows a window's nodes or touches a file. A machine without any font is told so in a
/// [Refusal][dev.leadline.problem.Refusal].
package dev.leadline.chart;
