package org.shearbook.met.profile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * ISO 2533:1975, equal to ICAO Doc 7488, by geopotential height. The figures were computed from the published formulas
 * and constants (the printed table was not seen).
 */
class StandardAtmospherePublishedValueTests {

    @ParameterizedTest
    @CsvSource({
        "0, 288.150, 1013.2500, 1.225000", "1000, 281.650, 898.7456, 1.111643", "3000, 268.650, 701.0853, 0.909122",
        "5000, 255.650, 540.1989, 0.736116", "10000, 223.150, 264.3624, 0.412706", "11000, 216.650, 226.3204, 0.363918",
        "15000, 216.650, 120.4455, 0.193673", "20000, 216.650, 54.7488, 0.088035", "25000, 221.650, 25.1102, 0.039466",
        "30000, 226.650, 11.7186, 0.018012"})
    void temperaturePressureAndDensityFollowTheStandard(double height, double temperature, double hectopascals, double density) {
        assertEquals(temperature, StandardAtmosphere.temperature(height), 1e-9);
        assertEquals(hectopascals, StandardAtmosphere.pressure(height) / 100, 1e-4);
        assertEquals(density, StandardAtmosphere.density(height), 1e-6);
    }

    @ParameterizedTest
    @CsvSource({
        "1000, 110.88, 363.8", "925, 761.97, 2499.9", "850, 1457.30, 4781.2", "700, 3012.18, 9882.5", "500, 5574.43, 18288.8",
        "400, 7185.43, 23574.3", "300, 9163.95, 30065.5", "200, 11784.04, 38661.6", "150, 13608.41, 44647.0",
        "100, 16179.71, 53083.1", "50, 20576.15, 67507.1"})
    void pressureAltitudeFollowsTheStandard(double hectopascals, double metres, double feet) {
        assertEquals(metres, StandardAtmosphere.pressureAltitude(hectopascals * 100), 0.01);
        assertEquals(feet, Units.metresToFeet(StandardAtmosphere.pressureAltitude(hectopascals * 100)), 0.1);
        assertEquals(feet / 100, StandardAtmosphere.flightLevel(hectopascals * 100), 0.001);
    }

    @Test
    void tenKilometresOfGeometricHeightLieLower() {
        // exact: H = r z / (r + z) with r = 6 356 766 m gives 9984.293 m, where the standard has 265.0 hPa, not 264.4
        double geopotential = 6_356_766.0 * 10_000 / (6_356_766.0 + 10_000);
        assertEquals(9984.293, geopotential, 1e-3);
        assertEquals(265.0, StandardAtmosphere.pressure(geopotential) / 100, 0.05);
    }

    @Test
    void pressureAltitudeInvertsPressureEverywhere() {
        for (double height = StandardAtmosphere.LOWEST; height <= StandardAtmosphere.HIGHEST; height += 37) {
            assertEquals(height, StandardAtmosphere.pressureAltitude(StandardAtmosphere.pressure(height)), 1e-6);
        }
        for (int level = 0; level <= 650; level++) {
            assertEquals(level, StandardAtmosphere.flightLevel(StandardAtmosphere.pressureOfFlightLevel(level)), 1e-9);
        }
    }

    @Test
    void outsideItsRangeTheStandardIsRefused() {
        assertThrows(IllegalArgumentException.class, () -> StandardAtmosphere.temperature(47_001));
        assertThrows(IllegalArgumentException.class, () -> StandardAtmosphere.pressure(Double.NaN));
        assertThrows(IllegalArgumentException.class, () -> StandardAtmosphere.pressureAltitude(0));
        assertFalse(StandardAtmosphere.covers(Double.NaN));
    }
}
