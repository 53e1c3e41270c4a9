package org.shearbook.met.decode;

import java.util.Set;

/**
 * One level of a sounding as reported. {@code NaN} is missing; values are the message's own, in SI units.
 *
 * @param pressure          [Pa]
 * @param height            geopotential height above mean sea level [gpm]
 * @param temperature       [K]
 * @param dewPoint          [K], with respect to water
 * @param windFromDirection from true north [degrees], 0 to 360; calm has 0 and speed 0
 * @param windSpeed         [m s⁻¹]
 * @param elapsed           since release [s]
 * @param latitude          of the balloon [degrees north]
 * @param longitude         of the balloon [degrees east]
 * @param significance      why the level is in the message
 */
public record ReportedLevel(
        double pressure, double height, double temperature, double dewPoint,
        double windFromDirection, double windSpeed, double elapsed, double latitude, double longitude,
        Set<Significance> significance) {

    /** Why a level is in the message. An ordinary level of a high-resolution ascent has none. */
    public enum Significance {
        SURFACE, STANDARD, TROPOPAUSE, MAXIMUM_WIND, SIGNIFICANT_TEMPERATURE, SIGNIFICANT_HUMIDITY, SIGNIFICANT_WIND,
        /** Reported for a pressure above that of the surface: extrapolated, never to be drawn or used. */
        BELOW_GROUND,
        /** Bounds a gap: nothing may be interpolated between two of these. */
        TEMPERATURE_MISSING_BOUNDARY, WIND_MISSING_BOUNDARY
    }

    public ReportedLevel {
        significance = Set.copyOf(significance);
    }

    public boolean hasTemperature() {
        return !Double.isNaN(temperature);
    }

    public boolean hasWind() {
        return !Double.isNaN(windFromDirection) && !Double.isNaN(windSpeed);
    }
}
