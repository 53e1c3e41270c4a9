package org.shearbook.met.richardson;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.shearbook.met.profile.AtmosphericConstants;

/** Expected values are exact. */
class RichardsonNumberTests {

    @Test
    void betweenTwoLevelsRiIsStabilityOverShearSquared() {
        // θv 300 → 302 K and 0 → 10 m/s over 500 m
        double n2 = AtmosphericConstants.GRAVITY / 301 * 2 / 500;
        double s2 = 10.0 / 500 * (10.0 / 500);
        double[] ri = RichardsonNumber.gradient(new double[] {0, 500}, new double[] {300, 302}, new double[] {0, 6}, new double[] {0, 8});
        assertArrayEquals(new double[] {n2 / s2}, ri, 1e-12);
        assertEquals(n2 / s2, RichardsonNumber.bulk(500, 300, 302, 6, 8), 1e-12);
    }

    @Test
    void unstableAirHasNegativeRi() {
        assertTrue(RichardsonNumber.gradient(new double[] {0, 10}, new double[] {300, 299}, new double[] {0, 1}, new double[2])[0] < 0);
    }

    @Test
    void withoutShearRiIsInfiniteOrUndefined() {
        double[] ri = RichardsonNumber.gradient(
                new double[] {0, 10, 20, 30}, new double[] {300, 301, 300, 300}, new double[4], new double[4]);
        assertEquals(Double.POSITIVE_INFINITY, ri[0]);
        assertEquals(Double.NEGATIVE_INFINITY, ri[1]);
        assertTrue(Double.isNaN(ri[2]));
    }

    @Test
    void badLevelsAreRefusedByNumber() {
        IllegalArgumentException refusal = assertThrows(IllegalArgumentException.class, () -> RichardsonNumber.gradient(
                new double[] {0, 10, 10}, new double[] {300, 300, 300}, new double[3], new double[3]));
        assertTrue(refusal.getMessage().contains("level 2"), refusal.getMessage());
        assertThrows(IllegalArgumentException.class,
                () -> RichardsonNumber.gradient(new double[] {0}, new double[] {300}, new double[1], new double[1]));
        assertThrows(IllegalArgumentException.class, () -> RichardsonNumber.gradient(
                new double[] {0, 1}, new double[] {300, Double.NaN}, new double[2], new double[2]));
        assertThrows(IllegalArgumentException.class, () -> RichardsonNumber.gradient(
                new double[] {0, 1}, new double[] {300, 301}, new double[1], new double[2]));
        assertThrows(IllegalArgumentException.class, () -> RichardsonNumber.bulk(0, 300, 301, 1, 1));
    }
}
