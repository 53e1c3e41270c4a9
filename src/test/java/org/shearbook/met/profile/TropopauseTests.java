package org.shearbook.met.profile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Expected values are exact: the profiles are made of straight lines. */
class TropopauseTests {

    /** Straight lines through (height, temperature) corners, every {@code step} m, hydrostatic, with noise. */
    private static VerticalProfile of(double[][] corners, double step, double noise) {
        Random random = new Random(5);
        List<ThermodynamicLevel> levels = new ArrayList<>();
        double pressure = 101_325;
        double previous = Double.NaN;
        for (double z = corners[0][0]; z <= corners[corners.length - 1][0]; z += step) {
            int k = 0;
            while (k < corners.length - 2 && z >= corners[k + 1][0]) {
                k++;
            }
            double t = corners[k][1] + (z - corners[k][0]) / (corners[k + 1][0] - corners[k][0]) * (corners[k + 1][1] - corners[k][1]);
            if (!Double.isNaN(previous)) {
                pressure *= Math.exp(-AtmosphericConstants.GRAVITY * step
                        / (AtmosphericConstants.GAS_CONSTANT_DRY_AIR * 0.5 * (t + previous)));
            }
            previous = t;
            levels.add(new ThermodynamicLevel(z, pressure, t + noise * random.nextGaussian(), Double.NaN));
        }
        return new VerticalProfile(levels, List.of());
    }

    @Test
    void theStandardAtmosphereHasItsTropopauseAtElevenKilometres() {
        VerticalProfile profile = of(new double[][] {{0, 288.15}, {11_000, 216.65}, {20_000, 216.65}}, 500, 0);
        List<Tropopause> found = Tropopause.of(profile);
        assertEquals(1, found.size());
        assertEquals(11_000, found.get(0).height(), 1e-9);
        assertEquals(216.65, found.get(0).temperature(), 1e-9);
        assertEquals(226.32, found.get(0).pressure() / 100, 0.3);
    }

    @Test
    void inADenseNoisyAscentTheTropopauseIsFoundWithin100Metres() {
        VerticalProfile profile = of(new double[][] {{0, 288.15}, {11_000, 216.65}, {20_000, 216.65}}, 10, 0.1);
        List<Tropopause> found = Tropopause.of(profile);
        assertEquals(1, found.size());
        assertEquals(11_000, found.get(0).height(), 100);
    }

    @Test
    void aShallowStableLayerIsNotATropopause() {
        // isothermal from 7000 to 8000 m, then falling again at 6.5 K/km: over 2 km the mean lapse rate is 3.25 K/km
        VerticalProfile profile = of(new double[][] {{0, 288}, {7000, 242.5}, {8000, 242.5}, {12_000, 216.5}, {20_000, 216.5}}, 250, 0);
        assertEquals(12_000, Tropopause.of(profile).get(0).height(), 1e-9);
    }

    @Test
    void aSecondTropopauseNeedsALapseRateAboveThreeKelvinInBetween() {
        double[][] steep = {{0, 288}, {10_000, 223}, {13_000, 223}, {15_000, 213}, {20_000, 213}};
        List<Tropopause> two = Tropopause.of(of(steep, 250, 0));
        assertEquals(2, two.size());
        assertEquals(10_000, two.get(0).height(), 1e-9);
        assertEquals(15_000, two.get(1).height(), 1e-9);
        double[][] gentle = {{0, 288}, {10_000, 223}, {13_000, 223}, {15_000, 218}, {20_000, 218}};
        assertEquals(1, Tropopause.of(of(gentle, 250, 0)).size());
    }

    @Test
    void aGroundInversionIsNotATropopause() {
        VerticalProfile profile = of(new double[][] {{0, 250}, {2500, 260}, {10_000, 210}, {20_000, 210}}, 250, 0);
        assertEquals(10_000, Tropopause.of(profile).get(0).height(), 1e-9);
    }

    @Test
    void anAscentThatEndsTooSoonHasNone() {
        assertTrue(Tropopause.of(of(new double[][] {{0, 288.15}, {11_000, 216.65}, {11_500, 216.65}}, 250, 0)).isEmpty());
        assertTrue(Tropopause.of(of(new double[][] {{0, 288.15}, {9000, 229.65}}, 250, 0)).isEmpty());
    }

    @Test
    void theStrongestWindIsMarkedWhenItIsTheHighestLevel() {
        List<ThermodynamicLevel> levels = List.of(
                new ThermodynamicLevel(0, 100_000, 280, Double.NaN), new ThermodynamicLevel(12_000, 20_000, 220, Double.NaN));
        WindMaximum inside = WindMaximum.of(new VerticalProfile(levels,
                List.of(new WindLevel(0, 1, 0), new WindLevel(9000, 40, 30), new WindLevel(10_000, 20, 0)))).orElseThrow();
        assertEquals(50, inside.speed(), 1e-12);
        assertFalse(inside.atTopOfWind());
        assertTrue(WindMaximum.of(new VerticalProfile(levels,
                List.of(new WindLevel(0, 1, 0), new WindLevel(9000, 40, 30)))).orElseThrow().atTopOfWind());
        assertTrue(WindMaximum.of(new VerticalProfile(levels, List.of())).isEmpty());
    }
}
