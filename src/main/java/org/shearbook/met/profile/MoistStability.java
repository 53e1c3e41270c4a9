package org.shearbook.met.profile;

import static org.shearbook.met.profile.AtmosphericConstants.ZERO_CELSIUS;

import java.util.Arrays;

/**
 * Stability of saturated air: what pushes back a parcel that condenses as it rises. It is less than in unsaturated air
 * of the same temperature profile, so the moist Richardson number is lower than the dry one.
 *
 * @param gravity            g [m s⁻²]
 * @param gasConstantDryAir  R [J kg⁻¹ K⁻¹]
 * @param epsilon            ratio of the gas constants of dry air and vapour [1]
 * @param heatCapacityDryAir c_p [J kg⁻¹ K⁻¹]
 * @param heatCapacityVapour c_pv [J kg⁻¹ K⁻¹]
 * @param heatCapacityWater  c_w [J kg⁻¹ K⁻¹]
 */
public record MoistStability(
        double gravity, double gasConstantDryAir, double epsilon, double heatCapacityDryAir, double heatCapacityVapour, double heatCapacityWater) {

    /** With the constants of the house. */
    public static final MoistStability OF_THE_HOUSE = new MoistStability(AtmosphericConstants.GRAVITY,
            AtmosphericConstants.GAS_CONSTANT_DRY_AIR, AtmosphericConstants.EPSILON,
            AtmosphericConstants.GAS_CONSTANT_DRY_AIR / AtmosphericConstants.KAPPA, 1850, 4190);

    /** Latent heat of sublimation [J kg⁻¹]; it changes by half a percent between 0 and −60 °C. From memory. */
    public static final double LATENT_HEAT_OF_SUBLIMATION = 2.834e6;

    /**
     * Latent heat of vaporisation {@code 2.501e6 − 2370 t}, t in °C.
     *
     * @param temperature [K]
     * @return [J kg⁻¹]
     */
    public static double latentHeatOfVaporisation(double temperature) {
        return 2.501e6 - 2370 * (temperature - ZERO_CELSIUS);
    }

    /**
     * Moist-adiabatic lapse rate
     * {@code Γ_m = Γ_d (1 + q_w)(1 + L q_s/(R T)) / [1 + (c_pv q_s + c_w q_L)/c_p + ε L² q_s (1 + q_s/ε)/(c_p R T²)]},
     * {@code Γ_d = g/c_p}.
     *
     * @param temperature           T [K]
     * @param saturationMixingRatio q_s [kg kg⁻¹]
     * @param liquidWater           q_L [kg kg⁻¹]; {@code q_w = q_s + q_L}
     * @param latentHeat            L [J kg⁻¹]
     * @return Γ_m [K m⁻¹], positive
     * @see <a href="https://doi.org/10.1175/1520-0469(1982)039%3C2152:OTEOMO%3E2.0.CO;2">Durran and Klemp (1982), J. Atmos.
     *      Sci. 39, 2152–2158, eq. 36 as remembered</a>
     */
    public double moistLapseRate(double temperature, double saturationMixingRatio, double liquidWater, double latentHeat) {
        double rt = gasConstantDryAir * temperature;
        double above = (1 + saturationMixingRatio + liquidWater) * (1 + latentHeat * saturationMixingRatio / rt);
        double below = 1 + (heatCapacityVapour * saturationMixingRatio + heatCapacityWater * liquidWater) / heatCapacityDryAir
                + epsilon * latentHeat * latentHeat * saturationMixingRatio * (1 + saturationMixingRatio / epsilon)
                        / (heatCapacityDryAir * rt * temperature);
        return gravity / heatCapacityDryAir * above / below;
    }

    /**
     * Buoyancy frequency squared of saturated air,
     * {@code N_m² = (g/T)(dT/dz + Γ_m)(1 + L q_s/(R T)) − g/(1 + q_w) dq_w/dz}.
     *
     * <p><b>Limits.</b> Reversible: condensed water stays with the parcel. A sonde does not measure it, so callers set
     * {@code q_L = 0} and {@code dq_w/dz = dq_s/dz}. Against a parcel lifted and weighed it is within 1.5 %, and most of
     * that is the neglected part.
     *
     * @param temperature           T [K], positive
     * @param temperatureGradient   dT/dz [K m⁻¹], negative where it cools upward
     * @param saturationMixingRatio q_s [kg kg⁻¹], 0 or more
     * @param liquidWater           q_L [kg kg⁻¹], 0 or more
     * @param totalWaterGradient    dq_w/dz [m⁻¹]
     * @param latentHeat            L [J kg⁻¹]
     * @return N_m² [s⁻²]; negative where saturated air is unstable
     * @throws IllegalArgumentException if a value is not finite, or temperature or a mixing ratio out of range
     * @see <a href="https://doi.org/10.1175/1520-0469(1982)039%3C2152:OTEOMO%3E2.0.CO;2">Durran and Klemp (1982), J. Atmos.
     *      Sci. 39, 2152–2158, eq. 36 as remembered</a>
     */
    public double saturatedBuoyancyFrequencySquared(double temperature, double temperatureGradient,
            double saturationMixingRatio, double liquidWater, double totalWaterGradient, double latentHeat) {
        require(temperature, saturationMixingRatio, latentHeat, temperatureGradient, liquidWater, totalWaterGradient);
        double lapse = moistLapseRate(temperature, saturationMixingRatio, liquidWater, latentHeat);
        return gravity / temperature * (temperatureGradient + lapse)
                        * (1 + latentHeat * saturationMixingRatio / (gasConstantDryAir * temperature))
                - gravity / (1 + saturationMixingRatio + liquidWater) * totalWaterGradient;
    }

    /**
     * The same quantity in its approximate form, which neglects the heat capacity of water,
     * {@code N_m² = g { (1 + L q_s/(R T)) / (1 + ε L² q_s/(c_p R T²)) (d ln θ/dz + (L/(c_p T)) dq_s/dz) − dq_w/dz }}.
     * Within 3 % of {@link #saturatedBuoyancyFrequencySquared} where N_m² is not near zero; kept to check that one.
     *
     * @param temperature            T [K], positive
     * @param logThetaGradient       d ln θ/dz [m⁻¹]
     * @param saturationMixingRatio  q_s [kg kg⁻¹], 0 or more
     * @param saturationGradient     dq_s/dz [m⁻¹]
     * @param totalWaterGradient     dq_w/dz [m⁻¹]
     * @param latentHeat             L [J kg⁻¹]
     * @return N_m² [s⁻²]
     * @throws IllegalArgumentException if a value is not finite, or temperature or a mixing ratio out of range
     * @see <a href="https://doi.org/10.1175/1520-0469(1982)039%3C2152:OTEOMO%3E2.0.CO;2">Durran and Klemp (1982), J. Atmos.
     *      Sci. 39, 2152–2158, eq. 37</a>
     */
    public double approximateSaturatedBuoyancyFrequencySquared(double temperature, double logThetaGradient,
            double saturationMixingRatio, double saturationGradient, double totalWaterGradient, double latentHeat) {
        require(temperature, saturationMixingRatio, latentHeat, logThetaGradient, saturationGradient, totalWaterGradient);
        double rt = gasConstantDryAir * temperature;
        double ratio = (1 + latentHeat * saturationMixingRatio / rt)
                / (1 + epsilon * latentHeat * latentHeat * saturationMixingRatio / (heatCapacityDryAir * rt * temperature));
        return gravity * (ratio * (logThetaGradient + latentHeat / (heatCapacityDryAir * temperature) * saturationGradient)
                - totalWaterGradient);
    }

    /**
     * N_m² between two levels, both saturated: gradients are differences between the levels, T and q_s their means, no
     * condensed water.
     *
     * @param below   the lower level
     * @param above   the upper level, higher than {@code below}
     * @param overIce whether saturation is over ice
     * @return N_m² [s⁻²]
     */
    public double between(ThermodynamicLevel below, ThermodynamicLevel above, boolean overIce) {
        double depth = above.height() - below.height();
        double temperature = 0.5 * (below.temperature() + above.temperature());
        double lower = saturationMixingRatio(below, overIce);
        double upper = saturationMixingRatio(above, overIce);
        return saturatedBuoyancyFrequencySquared(temperature, (above.temperature() - below.temperature()) / depth,
                0.5 * (lower + upper), 0, (upper - lower) / depth,
                overIce ? LATENT_HEAT_OF_SUBLIMATION : latentHeatOfVaporisation(temperature));
    }

    private double saturationMixingRatio(ThermodynamicLevel level, boolean overIce) {
        double e = overIce ? MoistThermodynamics.saturationVapourPressureOverIce(level.temperature())
                : MoistThermodynamics.saturationVapourPressureOverWater(level.temperature());
        // in the stratosphere's thin warm air the formula may exceed the pressure; such air is never saturated
        return epsilon * e / Math.max(level.pressure() - e, 0.5 * level.pressure());
    }

    private static void require(double temperature, double saturationMixingRatio, double latentHeat, double... others) {
        boolean finite = Double.isFinite(temperature) && Double.isFinite(saturationMixingRatio) && Double.isFinite(latentHeat);
        for (double other : others) {
            finite &= Double.isFinite(other);
        }
        if (!finite || temperature <= 0 || saturationMixingRatio < 0 || latentHeat <= 0) {
            throw new IllegalArgumentException("moist stability needs finite numbers, positive temperature and latent heat, and a mixing"
                    + " ratio of 0 or more, not T " + temperature + " K, q_s " + saturationMixingRatio + ", L " + latentHeat
                    + " J/kg, others " + Arrays.toString(others));
        }
    }
}
