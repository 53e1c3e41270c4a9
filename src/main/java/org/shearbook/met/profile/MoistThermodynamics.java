package org.shearbook.met.profile;

import static org.shearbook.met.profile.AtmosphericConstants.EPSILON;
import static org.shearbook.met.profile.AtmosphericConstants.GAS_CONSTANT_DRY_AIR;
import static org.shearbook.met.profile.AtmosphericConstants.GRAVITY;
import static org.shearbook.met.profile.AtmosphericConstants.KAPPA;
import static org.shearbook.met.profile.AtmosphericConstants.REFERENCE_PRESSURE;
import static org.shearbook.met.profile.AtmosphericConstants.ZERO_CELSIUS;

/**
 * Moist air at one level. All pressures [Pa], temperatures [K], ratios [kg kg⁻¹], relative humidity as a
 * fraction (1 = saturated). Relative humidity and dew point refer to water at every temperature, as radiosondes
 * report them; ice has its own methods.
 *
 * <p>Saturation vapour pressure is the Magnus form of WMO-No. 8, Vol. I (annex on vapour pressure), without the
 * enhancement factor: over water {@code 611.2 exp(17.62 t / (243.12 + t))}, over ice
 * {@code 611.2 exp(22.46 t / (272.62 + t))}, t in °C. Against the formulation of Wagner and Pruss (2002) it is
 * within 0.35 % from −10 to 30 °C; below −40 °C over water it drifts to 2 % at −60 °C.
 */
public final class MoistThermodynamics {

    private static final double TRIPLE_POINT_PRESSURE = 611.2;
    private static final double WATER_A = 17.62;
    private static final double WATER_B = 243.12;
    private static final double ICE_A = 22.46;
    private static final double ICE_B = 272.62;

    private MoistThermodynamics() {
    }

    /**
     * @param temperature [K], above 30.03 K, where the formula has its pole
     * @return [Pa]
     */
    public static double saturationVapourPressureOverWater(double temperature) {
        double celsius = temperature - ZERO_CELSIUS;
        return TRIPLE_POINT_PRESSURE * Math.exp(WATER_A * celsius / (WATER_B + celsius));
    }

    /**
     * @param temperature [K], above 0.53 K; meant for 0 °C and below
     * @return [Pa]
     */
    public static double saturationVapourPressureOverIce(double temperature) {
        double celsius = temperature - ZERO_CELSIUS;
        return TRIPLE_POINT_PRESSURE * Math.exp(ICE_A * celsius / (ICE_B + celsius));
    }

    /**
     * Inverse of {@link #saturationVapourPressureOverWater}.
     *
     * @param vapourPressure [Pa], positive
     * @return dew point [K]
     */
    public static double dewPoint(double vapourPressure) {
        double log = Math.log(vapourPressure / TRIPLE_POINT_PRESSURE);
        return ZERO_CELSIUS + WATER_B * log / (WATER_A - log);
    }

    /**
     * @param temperature      [K]
     * @param relativeHumidity over water [1], positive
     * @return dew point [K]
     */
    public static double dewPointFromRelativeHumidity(double temperature, double relativeHumidity) {
        return dewPoint(relativeHumidity * saturationVapourPressureOverWater(temperature));
    }

    /**
     * @param temperature [K]
     * @param dewPoint    over water [K]
     * @return relative humidity over water [1]
     */
    public static double relativeHumidityOverWater(double temperature, double dewPoint) {
        return saturationVapourPressureOverWater(dewPoint) / saturationVapourPressureOverWater(temperature);
    }

    /**
     * @param temperature [K]
     * @param dewPoint    over water [K]
     * @return relative humidity over ice [1]; above 1 is common in cirrus
     */
    public static double relativeHumidityOverIce(double temperature, double dewPoint) {
        return saturationVapourPressureOverWater(dewPoint) / saturationVapourPressureOverIce(temperature);
    }

    /**
     * {@code r = ε e / (p − e)}.
     *
     * @param pressure       [Pa]
     * @param vapourPressure [Pa], below {@code pressure}
     * @return mixing ratio [kg kg⁻¹]
     */
    public static double mixingRatio(double pressure, double vapourPressure) {
        return EPSILON * vapourPressure / (pressure - vapourPressure);
    }

    /**
     * {@code T_v = T (1 + r / ε) / (1 + r)}; exact for a mixture of ideal gases, no linearisation.
     *
     * @param temperature [K]
     * @param mixingRatio [kg kg⁻¹]
     * @return [K]
     */
    public static double virtualTemperature(double temperature, double mixingRatio) {
        return temperature * (1 + mixingRatio / EPSILON) / (1 + mixingRatio);
    }

    /**
     * @param pressure    [Pa]
     * @param temperature [K]
     * @param dewPoint    over water [K]; NaN counts as dry air
     * @return virtual temperature [K]
     */
    public static double virtualTemperature(double pressure, double temperature, double dewPoint) {
        if (Double.isNaN(dewPoint)) {
            return temperature;
        }
        return virtualTemperature(temperature, mixingRatio(pressure, saturationVapourPressureOverWater(dewPoint)));
    }

    /**
     * {@code θ = T (100 000 Pa / p)^κ}.
     *
     * @param pressure    [Pa]
     * @param temperature [K]
     * @return [K]
     */
    public static double potentialTemperature(double pressure, double temperature) {
        return temperature * Math.pow(REFERENCE_PRESSURE / pressure, KAPPA);
    }

    /**
     * {@code θ_v = θ (1 + r / ε) / (1 + r)}.
     *
     * @param pressure    [Pa]
     * @param temperature [K]
     * @param dewPoint    over water [K]; NaN counts as dry air
     * @return [K]
     */
    public static double virtualPotentialTemperature(double pressure, double temperature, double dewPoint) {
        return potentialTemperature(pressure, virtualTemperature(pressure, temperature, dewPoint));
    }

    /**
     * Hypsometric thickness {@code (R T_v / g) ln(p_bottom / p_top)}.
     *
     * @param bottomPressure         [Pa]
     * @param topPressure            [Pa]
     * @param meanVirtualTemperature [K], mean over ln p
     * @return [gpm], positive when {@code bottomPressure > topPressure}
     */
    public static double thickness(double bottomPressure, double topPressure, double meanVirtualTemperature) {
        return GAS_CONSTANT_DRY_AIR * meanVirtualTemperature / GRAVITY * Math.log(bottomPressure / topPressure);
    }
}
