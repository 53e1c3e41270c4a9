package org.shearbook.met.profile;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Random;
import org.junit.jupiter.api.Test;

class UnitsTests {

    @Test
    void aKnotAndAFootHaveTheirDefinedLengths() {
        // exact by definition: 1852 m per hour, 0.3048 m
        assertEquals(0.514444, Units.knotsToMetresPerSecond(1), 1e-6);
        assertEquals(0.3048, Units.feetToMetres(1));
        assertEquals(1000, Units.metresToFeet(304.8), 1e-9);
    }

    @Test
    void shearConvertsToKnotsPerThousandFeet() {
        // exact: 1 s⁻¹ = 592.48 kt/1000 ft, 0.01 s⁻¹ = 5.925, 1 kt/1000 ft = 1.688e-3 s⁻¹
        assertEquals(592.48, Units.perSecondToKnotsPerThousandFeet(1), 0.01);
        assertEquals(5.925, Units.perSecondToKnotsPerThousandFeet(0.01), 0.0005);
        assertEquals(1.688e-3, Units.knotsPerThousandFeetToPerSecond(1), 5e-7);
    }

    @Test
    void nineMetresPerSecondIn200MetresIsAbout27KnotsPerThousandFeet() {
        // Browning 1971, Q. J. R. Meteorol. Soc. 97, 283: strongest case; the conversion is exact
        assertEquals(27, Units.perSecondToKnotsPerThousandFeet(9.0 / 200), 0.5);
    }

    @Test
    void aWesterlyBlowsTowardsTheEast() {
        assertEquals(10, Units.eastward(10, 270), 1e-12);
        assertEquals(0, Units.northward(10, 270), 1e-12);
        assertEquals(-10, Units.northward(10, 360), 1e-12);
        assertEquals(270, Units.fromDirection(10, 0), 1e-12);
        assertEquals(90, Units.towardsDirection(10, 0), 1e-12);
    }

    @Test
    void northIs360AndCalmIsZero() {
        assertEquals(360, Units.fromDirection(0, -5), 1e-12);
        assertEquals(0, Units.fromDirection(0, 0));
        assertEquals(0, Units.towardsDirection(0, 0));
    }

    @Test
    void directionAndSpeedComeBackFromComponents() {
        long seed = 20310311;
        Random random = new Random(seed);
        for (int i = 0; i < 1000; i++) {
            double direction = 360 * (1 - random.nextDouble());
            double speed = 0.1 + 100 * random.nextDouble();
            double u = Units.eastward(speed, direction);
            double v = Units.northward(speed, direction);
            assertEquals(speed, Math.hypot(u, v), 1e-10, "seed " + seed);
            assertEquals(0, Math.IEEEremainder(direction - Units.fromDirection(u, v), 360), 1e-9, "seed " + seed);
        }
    }

    @Test
    void flightLevelIsPressureAltitudeInHundredsOfFeet() {
        assertEquals(290, Units.pressureAltitudeToFlightLevel(8839.2), 1e-9);
        assertEquals(8839.2, Units.flightLevelToPressureAltitude(290), 1e-9);
    }
}
