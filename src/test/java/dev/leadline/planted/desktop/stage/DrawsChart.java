package dev.leadline.planted.desktop.stage;

import org.jfree.chart.JFreeChart;

/// Draws a chart in a package that also shows nodes.
record DrawsChart(JFreeChart chart) {}
