package org.shearbook.met.profile;

import static org.shearbook.met.profile.AtmosphericConstants.GAS_CONSTANT_DRY_AIR;
import static org.shearbook.met.profile.AtmosphericConstants.GRAVITY;

/**
 * The ICAO standard atmosphere as a function of geopotential height, and its inverse, from which pressure
 * altitude and flight level follow.
 *
 * <p>In each layer temperature is linear, {@code T = T_b + L (H − H_b)}, and pressure hydrostatic:
 * {@code p = p_b (T / T_b)^(−g / (R L))}, or {@code p = p_b exp(−g (H − H_b) / (R T_b))} where {@code L = 0}.
 * Exact to rounding. Heights are geopotential: tables by geometric height differ (265.0 against 264.4 hPa at 10 km).
 *
 * <p><b>Limits.</b> Defined from −5 to 47 km; outside it is refused. Flight levels need only the first 20 km.
 *
 * <p>Source: ISO 2533:1975, equal to ICAO Doc 7488 in this range.
 */
public final class StandardAtmosphere {

    /** Sea-level pressure [Pa]. */
    public static final double SEA_LEVEL_PRESSURE = 101_325;

    /** Sea-level temperature [K]. */
    public static final double SEA_LEVEL_TEMPERATURE = 288.15;

    /** Lowest geopotential height [m]. */
    public static final double LOWEST = -5_000;

    /** Highest geopotential height [m]. */
    public static final double HIGHEST = 47_000;

    private static final double[] BASE_HEIGHT = {0, 11_000, 20_000, 32_000};
    private static final double[] LAPSE = {-0.0065, 0, 0.001, 0.0028};
    private static final double[] BASE_TEMPERATURE = new double[4];
    private static final double[] BASE_PRESSURE = new double[4];

    static {
        BASE_TEMPERATURE[0] = SEA_LEVEL_TEMPERATURE;
        BASE_PRESSURE[0] = SEA_LEVEL_PRESSURE;
        for (int i = 1; i < BASE_HEIGHT.length; i++) {
            BASE_TEMPERATURE[i] = BASE_TEMPERATURE[i - 1] + LAPSE[i - 1] * (BASE_HEIGHT[i] - BASE_HEIGHT[i - 1]);
            BASE_PRESSURE[i] = pressureInLayer(i - 1, BASE_HEIGHT[i]);
        }
    }

    private static final double LOWEST_LEVEL_PRESSURE = pressureInLayer(0, LOWEST);
    private static final double HIGHEST_LEVEL_PRESSURE = pressureInLayer(3, HIGHEST);

    private StandardAtmosphere() {
    }

    /**
     * @param height geopotential height [m], {@value #LOWEST} to {@value #HIGHEST}
     * @return [K]
     * @throws IllegalArgumentException outside the defined range, and for NaN
     */
    public static double temperature(double height) {
        int i = layerOfHeight(height);
        return BASE_TEMPERATURE[i] + LAPSE[i] * (height - BASE_HEIGHT[i]);
    }

    /**
     * @param height geopotential height [m], {@value #LOWEST} to {@value #HIGHEST}
     * @return [Pa]
     * @throws IllegalArgumentException outside the defined range, and for NaN
     */
    public static double pressure(double height) {
        return pressureInLayer(layerOfHeight(height), height);
    }

    /**
     * @param height geopotential height [m], {@value #LOWEST} to {@value #HIGHEST}
     * @return [kg m⁻³]
     * @throws IllegalArgumentException outside the defined range, and for NaN
     */
    public static double density(double height) {
        return pressure(height) / (GAS_CONSTANT_DRY_AIR * temperature(height));
    }

    /**
     * Pressure altitude: the geopotential height at which the standard atmosphere has this pressure.
     *
     * @param pressure [Pa], about 110.9 to 177 700
     * @return [m]
     * @throws IllegalArgumentException outside the defined range, and for NaN
     */
    public static double pressureAltitude(double pressure) {
        if (!covers(pressure)) {
            throw new IllegalArgumentException("pressure " + pressure + " Pa is outside the standard atmosphere from "
                    + HIGHEST_LEVEL_PRESSURE + " to " + LOWEST_LEVEL_PRESSURE + " Pa");
        }
        int i = BASE_PRESSURE.length - 1;
        while (i > 0 && pressure > BASE_PRESSURE[i]) {
            i--;
        }
        double logRatio = Math.log(pressure / BASE_PRESSURE[i]);
        if (LAPSE[i] == 0) {
            return BASE_HEIGHT[i] - logRatio * GAS_CONSTANT_DRY_AIR * BASE_TEMPERATURE[i] / GRAVITY;
        }
        double temperatureRatio = Math.exp(-logRatio * GAS_CONSTANT_DRY_AIR * LAPSE[i] / GRAVITY);
        return BASE_HEIGHT[i] + BASE_TEMPERATURE[i] * (temperatureRatio - 1) / LAPSE[i];
    }

    /** Whether a pressure [Pa] occurs in the defined range; false for NaN. */
    public static boolean covers(double pressure) {
        return pressure <= LOWEST_LEVEL_PRESSURE && pressure >= HIGHEST_LEVEL_PRESSURE;
    }

    /**
     * Flight level: pressure altitude in hundreds of feet, not rounded.
     *
     * @param pressure [Pa]
     * @throws IllegalArgumentException as {@link #pressureAltitude}
     */
    public static double flightLevel(double pressure) {
        return Units.pressureAltitudeToFlightLevel(pressureAltitude(pressure));
    }

    /**
     * @param flightLevel hundreds of feet of pressure altitude
     * @return pressure [Pa]
     * @throws IllegalArgumentException outside the defined range, and for NaN
     */
    public static double pressureOfFlightLevel(double flightLevel) {
        return pressure(Units.flightLevelToPressureAltitude(flightLevel));
    }

    private static int layerOfHeight(double height) {
        if (!(height >= LOWEST && height <= HIGHEST)) {
            throw new IllegalArgumentException(
                    "height " + height + " m is outside the standard atmosphere from " + LOWEST + " to " + HIGHEST + " m");
        }
        int i = BASE_HEIGHT.length - 1;
        while (i > 0 && height < BASE_HEIGHT[i]) {
            i--;
        }
        return i;
    }

    private static double pressureInLayer(int i, double height) {
        double rise = height - BASE_HEIGHT[i];
        if (LAPSE[i] == 0) {
            return BASE_PRESSURE[i] * Math.exp(-GRAVITY * rise / (GAS_CONSTANT_DRY_AIR * BASE_TEMPERATURE[i]));
        }
        double exponent = -GRAVITY / (GAS_CONSTANT_DRY_AIR * LAPSE[i]);
        return BASE_PRESSURE[i] * Math.pow(1 + LAPSE[i] * rise / BASE_TEMPERATURE[i], exponent);
    }
}
