package org.shearbook.met.profile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Each figure says where it comes from. "From the published formula" means the printed table was not seen. */
class MoistThermodynamicsPublishedValueTests {

    private static double kelvin(double celsius) {
        return celsius + 273.15;
    }

    @ParameterizedTest
    @CsvSource({"30, 42.33724", "20, 23.32596", "10, 12.26030", "0.01, 6.11643", "0, 6.11200", "-10, 2.87031", "-20, 1.25965", "-60, 0.01901"})
    void saturationOverWaterFollowsTheGuide(double celsius, double hectopascals) {
        // computed from the published formula: WMO-No. 8, Vol. I, annex on vapour pressure
        assertEquals(hectopascals, MoistThermodynamics.saturationVapourPressureOverWater(kelvin(celsius)) / 100, 6e-6);
    }

    @ParameterizedTest
    @CsvSource({"0.01, 6.117037", "0, 6.112000", "-10, 2.598738", "-20, 1.032610", "-60, 0.010804"})
    void saturationOverIceFollowsTheGuide(double celsius, double hectopascals) {
        // computed from the published formula: WMO-No. 8, Vol. I, annex on vapour pressure
        assertEquals(hectopascals, MoistThermodynamics.saturationVapourPressureOverIce(kelvin(celsius)) / 100, 6e-7);
    }

    @ParameterizedTest
    @CsvSource({"30, 42.46920", "20, 23.39194", "10, 12.28112", "0.01, 6.11657", "0, 6.11213", "-10, 2.86533"})
    void overWaterTheInternationalFormulationIsMetWithin035Percent(double celsius, double hectopascals) {
        // computed from the published formula: Wagner and Pruss 2002, J. Phys. Chem. Ref. Data 31, 387
        assertEquals(1, MoistThermodynamics.saturationVapourPressureOverWater(kelvin(celsius)) / (100 * hectopascals), 0.0035);
    }

    @ParameterizedTest
    @CsvSource({"0.01, 6.116570", "0, 6.111535", "-10, 2.598738", "-20, 1.032390", "-60, 0.010813"})
    void overIceTheInternationalFormulationIsMetWithinATenthOfAPercent(double celsius, double hectopascals) {
        // computed from the published formula: IAPWS sublimation pressure
        assertEquals(1, MoistThermodynamics.saturationVapourPressureOverIce(kelvin(celsius)) / (100 * hectopascals), 0.001);
    }

    @ParameterizedTest
    @CsvSource({"0, 6.11213, 0.0035", "-20, 1.25504, 0.006", "-40, 0.18912, 0.006", "-60, 0.01864, 0.021"})
    void supercooledWaterIsMetWithinTheStatedDrift(double celsius, double hectopascals, double tolerance) {
        // computed from the published formula: Murphy and Koop 2005, Q. J. R. Meteorol. Soc. 131, 1539
        assertEquals(1, MoistThermodynamics.saturationVapourPressureOverWater(kelvin(celsius)) / (100 * hectopascals), tolerance);
    }

    @ParameterizedTest
    @CsvSource({"850, 283.15, 296.6078", "500, 253.15, 308.5933", "300, 228.15, 321.8210", "200, 216.65, 343.1345"})
    void potentialTemperatureHasKappaTwoSevenths(double hectopascals, double temperature, double theta) {
        // exact: closed form with κ = 2/7
        assertEquals(theta, MoistThermodynamics.potentialTemperature(hectopascals * 100, temperature), 1e-4);
    }

    @ParameterizedTest
    @CsvSource({
        "1000, 20, 1.00, 23.3260, 14.85478, 295.7579, 20.0000", "850, 10, 0.80, 9.8082, 7.26088, 284.3905, 6.7060",
        "700, 0, 0.50, 3.0560, NaN, 273.6015, -9.2020"})
    void moistAirHasItsMixingRatioVirtualTemperatureAndDewPoint(
            double hectopascals, double celsius, double humidity, double vapour, double gramsPerKilogram, double virtual, double dewPoint) {
        // computed elsewhere from closed forms and the formula of WMO-No. 8
        double dew = MoistThermodynamics.dewPointFromRelativeHumidity(kelvin(celsius), humidity);
        double e = MoistThermodynamics.saturationVapourPressureOverWater(dew);
        assertEquals(dewPoint, dew - 273.15, 1e-4);
        assertEquals(vapour, e / 100, 1e-4);
        double r = MoistThermodynamics.mixingRatio(hectopascals * 100, e);
        if (!Double.isNaN(gramsPerKilogram)) {
            // the figure was computed with ε = 0.62198; r is proportional to ε
            assertEquals(gramsPerKilogram, 1000 * r * 0.62198 / 0.622, 2e-5);
        }
        // the other ε moves Tv by 1.4e-4 K at most
        assertEquals(virtual, MoistThermodynamics.virtualTemperature(kelvin(celsius), r), 2e-4);
        assertEquals(virtual, MoistThermodynamics.virtualTemperature(hectopascals * 100, kelvin(celsius), dew), 2e-4);
        assertEquals(humidity, MoistThermodynamics.relativeHumidityOverWater(kelvin(celsius), dew), 1e-12);
    }

    @Test
    void thicknessFollowsTheMeanVirtualTemperature() {
        // exact: (R Tv / g) ln 2
        assertEquals(5275.213, MoistThermodynamics.thickness(100_000, 50_000, 260), 1e-3);
        assertEquals(4767.981, MoistThermodynamics.thickness(50_000, 25_000, 235), 1e-3);
    }

    @Test
    void dewPointInvertsVapourPressure() {
        for (double temperature = 150; temperature <= 330; temperature += 0.7) {
            assertEquals(temperature,
                    MoistThermodynamics.dewPoint(MoistThermodynamics.saturationVapourPressureOverWater(temperature)), 1e-8);
        }
    }

    @Test
    void coldAirSaturatedOverWaterIsSupersaturatedOverIce() {
        // computed from the published formulas above: 1.25965 / 1.03261 at −20 °C
        assertEquals(1.2199, MoistThermodynamics.relativeHumidityOverIce(kelvin(-20), kelvin(-20)), 1e-4);
    }

    @Test
    void missingHumidityCountsAsDry() {
        assertEquals(250, MoistThermodynamics.virtualTemperature(50_000, 250, Double.NaN));
        assertTrue(MoistThermodynamics.virtualPotentialTemperature(90_000, 290, 285)
                > MoistThermodynamics.virtualPotentialTemperature(90_000, 290, Double.NaN));
    }
}
