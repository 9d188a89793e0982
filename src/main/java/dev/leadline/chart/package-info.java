/// Pictures of a run, drawn into an image or a vector file, that also say which value stands at a pixel.
///
/// Start with [Settling][dev.leadline.chart.Settling], the plain data of a picture; [View][dev.leadline.chart.View],
/// what part of it is looked at; and [Picture][dev.leadline.chart.Picture], both laid out for a size and a
/// [Theme][dev.leadline.chart.Theme]. A window keeps a view, makes a picture off its own thread, shows
/// [image][dev.leadline.chart.Picture#image(double)] and passes mouse positions to the picture to get a
/// [Reading][dev.leadline.chart.Reading] or the next view.
///
/// This package alone imports the charting library, and only for axes and grid; it knows no JavaFX.
package dev.leadline.chart;
