package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.junit.jupiter.api.Test;

class CorrelationsTest {
    @Test
    void threeArePossibleWhereTheirDeterminantIsPositive() {
        // 1 + 2abc - a² - b² - c² with a = b = .8 is 0 for c = .28
        var pairs = Correlations.none(3).with(0, 1, .8).with(1, 2, .8);
        assertTrue(pairs.with(0, 2, .281).arePossible());
        assertFalse(pairs.with(0, 2, .279).arePossible());
    }

    /// Both examples of Higham (2002), section 4, to the four decimals printed there.
    @Test
    void nearestOfPublishedExamples() {
        var three = Correlations.none(3).with(0, 1, 1).with(1, 2, 1).nearest();
        assertEquals(.7607, three.at(0, 1), 5e-5);
        assertEquals(.7607, three.at(1, 2), 5e-5);
        assertEquals(.1573, three.at(0, 2), 5e-5);
        var four = Correlations.none(4)
                .with(0, 1, -1)
                .with(1, 2, -1)
                .with(2, 3, -1)
                .nearest();
        assertEquals(-.8084, four.at(0, 1), 5e-5);
        assertEquals(.1916, four.at(0, 2), 5e-5);
        assertEquals(.1068, four.at(0, 3), 5e-5);
        assertEquals(-.6562, four.at(1, 2), 5e-5);
        assertTrue(three.arePossible() && four.arePossible());
    }

    @Test
    void nearestOfManyIsPossible() {
        int size = 30;
        var given = Correlations.none(size);
        for (int i = 0; i < size; i++) {
            for (int j = i + 1; j < size; j++) {
                given = given.with(i, j, .9 * Math.sin(7 * i + 13 * j));
            }
        }
        assertFalse(given.arePossible());
        var nearest = given.nearest();
        assertTrue(nearest.arePossible());
        double least = new EigenDecomposition(new Array2DRowRealMatrix(nearest.rows())).getRealEigenvalue(size - 1);
        assertTrue(least > 0 && least < 1e-6, "least eigenvalue " + least);
    }

    @Test
    void nearestOfPossibleOnesIsThemselves() {
        var possible = Correlations.none(3).with(0, 1, .5).with(1, 2, -.3);
        var nearest = possible.nearest();
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                assertEquals(possible.at(i, j), nearest.at(i, j), 1e-12);
            }
        }
    }
}
