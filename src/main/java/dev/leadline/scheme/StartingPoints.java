package dev.leadline.scheme;

import dev.leadline.numeric.Normal;
import dev.leadline.stream.Stream;

/// The particles of one repetition of splitting before they climb: independent normal points that can be evaluated.
///
/// @param z one row of coordinates for each particle
/// @param drawn points, those that could not be evaluated among them
/// @param complete whether there are as many particles as were wanted; the others have no score
record StartingPoints(double[][] z, double[] score, long drawn, long failed, boolean complete) {
    /// Points drawn for each particle at most: where fewer can be evaluated, there is no use in climbing.
    private static final int PATIENCE = 100;

    static StartingPoints draw(Score distance, int particles, int dimensions, Stream randomness) {
        double[][] z = new double[particles][dimensions];
        double[] score = new double[particles];
        int rows = Math.min(particles, Splitting.BLOCK);
        double[][] columns = new double[dimensions][rows];
        double[] found = new double[rows];
        int have = 0;
        long drawn = 0;
        while (have < particles && drawn < (long) PATIENCE * particles) {
            int n = Math.min(rows, particles - have);
            for (double[] column : columns) {
                randomness.fill(column, 0, n);
                Normal.quantile(column, column, n);
            }
            distance.at(columns, n, found);
            drawn += n;
            for (int i = 0; i < n; i++) {
                if (!Double.isNaN(found[i])) {
                    score[have] = found[i];
                    for (int j = 0; j < dimensions; j++) {
                        z[have][j] = columns[j][i];
                    }
                    have++;
                }
            }
        }
        return new StartingPoints(z, score, drawn, drawn - have, have == particles);
    }
}
