package dev.leadline.scheme;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class AllocationTest {
    private static double variance(double[] sds, List<Integer> draws) {
        double sum = 0;
        for (int c = 0; c < sds.length; c++) {
            sum += sds[c] * sds[c] / draws.get(c);
        }
        return sum;
    }

    /// No way to share 12 draws among three cells does better.
    @Test
    void noOtherSharesHaveALesserVariance() {
        var random = new Random(5);
        for (int i = 0; i < 200; i++) {
            double[] sds = {random.nextDouble(), random.nextDouble(), random.nextDouble() * random.nextDouble()};
            double found = variance(sds, Allocation.Found.of(sds, 12, 0).draws());
            for (int a = 1; a <= 10; a++) {
                for (int b = 1; a + b <= 11; b++) {
                    assertTrue(found <= variance(sds, List.of(a, b, 12 - a - b)) * (1 + 1e-15));
                }
            }
        }
    }

    @Test
    void sharesAreInProportionToDeviations() {
        assertEquals(
                List.of(10, 20, 40, 10),
                Allocation.Found.of(new double[] {1, 2, 4, 1}, 80, 0).draws());
    }

    @Test
    void everyCellHasADraw() {
        assertEquals(
                List.of(1, 22, 1),
                Allocation.Found.of(new double[] {0, 3, 1e-9}, 24, 0).draws());
    }

    @Test
    void whatIsNotKnownIsSharedEqually() {
        for (double odd : new double[] {Double.NaN, Double.POSITIVE_INFINITY, 0}) {
            assertEquals(
                    List.of(8, 8, 8),
                    Allocation.Found.of(new double[] {odd, odd == 0 ? 0 : 3, 0}, 24, 0)
                            .draws());
        }
        assertEquals(
                List.of(8, 8, 8),
                Allocation.Found.of(new double[] {.1, .1, .1}, 24, 0).draws());
    }

    @Test
    void aDrawCountsByItsCell() {
        var found = Allocation.Found.of(new double[] {1, 2, 1}, 12, 0);
        assertEquals(List.of(3, 6, 3), found.draws());
        double[] counts = found.counts();
        double[] each = {4.0 / 3, 4.0 / 3, 4.0 / 3, 2.0 / 3, 2.0 / 3, 2.0 / 3, 2.0 / 3, 2.0 / 3, 2.0 / 3, 4.0 / 3};
        for (int draw = 0; draw < each.length; draw++) {
            assertEquals(each[draw], counts[found.cellOf(draw)], 1e-15);
            assertEquals(each[draw], counts[found.cellOf(draw + 36)], 1e-15);
        }
    }
}
