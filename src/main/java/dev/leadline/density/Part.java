package dev.leadline.density;

/// A mean over some of the variables of an [Expectation], of the distance from its shift.
///
/// @param size of the distance
/// @param square of the distance
/// @param rest of the squares, beyond what was looked at
/// @param tails what of the error lies beyond what was looked at
record Part(double mean, double error, double size, double square, double rest, double tails) {

    /// Parts at several points.
    record Several(double[] mean, double[] error, double[] size, double[] square, double[] rest, double[] tails) {
        Several(int n) {
            this(new double[n], new double[n], new double[n], new double[n], new double[n], new double[n]);
        }

        void set(int i, Part part) {
            mean[i] = part.mean;
            error[i] = part.error;
            size[i] = part.size;
            square[i] = part.square;
            rest[i] = part.rest;
            tails[i] = part.tails;
        }

        /// At a point of all variables.
        void set(int i, double value) {
            mean[i] = value;
            size[i] = Math.abs(value);
            square[i] = value * value;
        }

        Part get(int i) {
            return new Part(mean[i], error[i], size[i], square[i], rest[i], tails[i]);
        }
    }
}
