package org.shearbook.met.profile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Stability of saturated air after Durran and Klemp (1982). The figures were computed elsewhere, not published: by both
 * forms of the paper's equation, and by weighing a parcel lifted reversibly.
 */
class MoistStabilityPublishedValueTests {

    private static final double R = 287.05;
    private static final MoistStability CONSTANTS_OF_THE_FIGURES = new MoistStability(9.80665, R, R / 461.52, 1005, 1850, 4190);

    @ParameterizedTest
    @CsvSource({
        "273.15, 700, -5.0, 5.4785, 5.7370, 1.7082e-4, 4.3899e-5, 4.4426e-5, 4.418e-5",
        "273.15, 700, -6.5, 5.4785, 5.7370, 1.1696e-4, -1.3505e-5, -1.3154e-5, -1.320e-5",
        "258.15, 500, -6.5, 2.3959, 7.0319, 1.2376e-4, 3.1345e-5, 3.1771e-5, 3.154e-5",
        "233.15, 300, -8.0, 0.3946, 8.9592, 7.3938e-5, 4.3611e-5, 4.3604e-5, 4.349e-5"})
    void bothFormsGiveTheFiguresAndAgreeWithALiftedParcel(double temperature, double hectopascals, double kelvinPerKilometre,
            double gramsPerKilogram, double lapse, double dry, double exact, double approximate, double parcel) {
        MoistStability m = CONSTANTS_OF_THE_FIGURES;
        double latent = MoistStability.latentHeatOfVaporisation(temperature);
        double e = MoistThermodynamics.saturationVapourPressureOverWater(temperature) / 100;
        double q = m.epsilon() * e / (hectopascals - e);
        double gradient = kelvinPerKilometre / 1000;
        // slope of the Magnus formula and hydrostatics with virtual temperature, as the figures were made
        double celsius = temperature - 273.15;
        double virtual = temperature * (1 + q / m.epsilon()) / (1 + q);
        double saturationGradient = q * hectopascals / (hectopascals - e)
                * (17.62 * 243.12 / Math.pow(243.12 + celsius, 2) * gradient + m.gravity() / (R * virtual));
        double logTheta = gradient / temperature + m.gravity() / (m.heatCapacityDryAir() * temperature);

        assertEquals(gramsPerKilogram, 1000 * q, 1e-4);
        assertEquals(lapse, 1000 * m.moistLapseRate(temperature, q, 0, latent), 1e-4);
        assertEquals(dry, m.gravity() * logTheta, 1e-4 * dry);
        double full = m.saturatedBuoyancyFrequencySquared(temperature, gradient, q, 0, saturationGradient, latent);
        double simple = m.approximateSaturatedBuoyancyFrequencySquared(temperature, logTheta, q, saturationGradient, saturationGradient, latent);
        assertEquals(exact, full, 1e-9);
        assertEquals(approximate, simple, 1e-9);
        assertEquals(parcel, full, 0.025 * Math.abs(parcel));
        assertEquals(parcel, simple, 0.015 * Math.abs(parcel));
    }

    @Test
    void withoutVapourTheMoistValueIsTheDryOne() {
        // exact: q_s = 0 leaves (g/T)(dT/dz + g/c_p)
        MoistStability m = MoistStability.OF_THE_HOUSE;
        assertEquals(9.80665 / 250 * (-0.006 + 9.80665 / m.heatCapacityDryAir()),
                m.saturatedBuoyancyFrequencySquared(250, -0.006, 0, 0, 0, 2.5e6), 1e-12);
    }

    @Test
    void betweenTwoLevelsTheHouseConstantsComeCloseToTheFigures() {
        // 700 hPa, 0 °C, −5 K/km: 4.39e-5 at a point in slightly other constants; over 20 m of ascent only those differ
        double scale = 287.05287 * 273.15 / 9.80665;
        ThermodynamicLevel below = new ThermodynamicLevel(-10, 70_000 * Math.exp(10 / scale), 273.2, 273.2);
        ThermodynamicLevel above = new ThermodynamicLevel(10, 70_000 * Math.exp(-10 / scale), 273.1, 273.1);
        assertEquals(4.39e-5, MoistStability.OF_THE_HOUSE.between(below, above, false), 0.06e-5);
        // more heat is freed by freezing out, but there is less vapour over ice: close to the same at 0 °C
        assertTrue(MoistStability.OF_THE_HOUSE.between(below, above, true) < 4.39e-5);
    }

    @Test
    void theSaturationRuleSaysWhatIsMeasuredAndWhatIsAssumed() {
        SaturationRule rule = SaturationRule.DEFAULT;
        double warm = 280;
        double cold = 240;
        assertEquals(Saturation.OVER_WATER, rule.of(warm, MoistThermodynamics.dewPointFromRelativeHumidity(warm, 0.951)));
        assertEquals(Saturation.UNSATURATED, rule.of(warm, MoistThermodynamics.dewPointFromRelativeHumidity(warm, 0.949)));
        // 80 % over water at −33 °C is 110 % over ice
        double moist = MoistThermodynamics.dewPointFromRelativeHumidity(cold, 0.80);
        assertEquals(Saturation.OVER_ICE_ASSUMED, rule.of(cold, moist));
        assertTrue(rule.of(cold, moist).isAssumed());
        assertEquals(Saturation.UNSATURATED, rule.of(cold, MoistThermodynamics.dewPointFromRelativeHumidity(cold, 0.60)));
        // −14 °C: above 100 % over ice at 90 % over water, but too warm to assume ice
        double mild = 259.15;
        assertEquals(Saturation.UNSATURATED, rule.of(mild, MoistThermodynamics.dewPointFromRelativeHumidity(mild, 0.90)));
        assertEquals(Saturation.UNKNOWN, rule.of(warm, Double.NaN));
        assertEquals(Saturation.UNKNOWN, rule.of(Double.NaN, 270));
        assertFalse(Saturation.UNKNOWN.isSaturated());
    }

    @Test
    void nonsenseIsRefused() {
        MoistStability m = MoistStability.OF_THE_HOUSE;
        assertThrows(IllegalArgumentException.class, () -> m.saturatedBuoyancyFrequencySquared(Double.NaN, 0, 0, 0, 0, 2.5e6));
        assertThrows(IllegalArgumentException.class, () -> m.saturatedBuoyancyFrequencySquared(250, Double.NaN, 0, 0, 0, 2.5e6));
        assertThrows(IllegalArgumentException.class, () -> m.saturatedBuoyancyFrequencySquared(250, 0, -1e-3, 0, 0, 2.5e6));
        assertThrows(IllegalArgumentException.class, () -> new SaturationRule(0, 1, 258));
        assertThrows(IllegalArgumentException.class, () -> new SaturationRule(0.95, Double.NaN, 258));
        assertThrows(IllegalArgumentException.class, () -> new SaturationRule(0.95, 1, 300));
    }
}
